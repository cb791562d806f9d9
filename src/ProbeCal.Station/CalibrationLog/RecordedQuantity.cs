namespace ProbeCal.Station.CalibrationLog;

/// <summary>One input quantity of a calibration as the record keeps it: the value, how well it is known and where it came from.</summary>
public sealed record RecordedQuantity
{
    /// <summary>The value in <see cref="Unit"/>.</summary>
    public required double Value { get; init; }

    /// <summary>The unit as written for people: <c>degC</c>, <c>hPa</c>, <c>1</c> (practical salinity), <c>m</c>.</summary>
    public required string Unit { get; init; }

    /// <summary>Standard uncertainty (k = 1) in <see cref="Unit"/>.</summary>
    public required double StandardUncertainty { get; init; }

    /// <summary>Where the value came from: <c>line</c>, <c>typed</c>, <c>barometer:ID</c>, <c>weather-service:NAME</c>, <c>altitude</c> ….</summary>
    public required string Source { get; init; }

    /// <summary>Where the uncertainty came from, when it is a default and nobody entered it.</summary>
    public string? UncertaintySource { get; init; }
}
