using System.Collections.Generic;

namespace ProbeCal.Station.Configuration;

/// <summary>Every key a configuration may have. A test holds the published schema to these lists.</summary>
internal static class ConfigurationKeys
{
    internal const string Format = "probecal-station-configuration";

    internal const int Version = 1;

    internal static readonly string[] Root =
    [
        "format", "version", "station", "site", "probe", "source", "line", "simulated", "signalStandardUncertainty", "thermometer",
        "pressure", "salinity", "stirring", "drift", "fouling", "calibration", "equation", "broker", "embeddedBroker", "journal", "gapAfter",
    ];

    internal static readonly Dictionary<string, string[]> Sections = new()
    {
        ["site"] = ["name", "altitude"],
        ["thermometer"] = ["id", "standardUncertainty", "offsetStandardUncertainty"],
        ["pressure"] = ["source", "value", "standardUncertainty"],
        ["salinity"] = ["source", "value", "standardUncertainty"],
        ["drift"] = ["perDay", "source"],
        ["fouling"] = ["perDay", "source"],
        ["broker"] = ["address", "user", "passwordEnvironment", "passwordFile", "caFile", "checkRevocation"],
        ["embeddedBroker"] = ["port"],
        ["journal"] = ["keep", "rejectedLines"],
    };
}
