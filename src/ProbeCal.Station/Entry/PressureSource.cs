using System;

namespace ProbeCal.Station.Entry;

/// <summary>
/// Where a pressure came from: <c>barometer:ID</c>, <c>weather-service:NAME</c>, <c>airport:NAME</c>, <c>telephone</c> or
/// <c>altitude</c>. Without it a pressure is worth nothing: what services report is nearly always reduced to sea level.
/// </summary>
public sealed class PressureSource
{
    private const string Choices = "write barometer:ID, weather-service:NAME, airport:NAME, telephone or altitude";
    private static readonly string[] Kinds = ["barometer", "weather-service", "airport", "telephone", "altitude"];

    private PressureSource(string text, string kind)
    {
        Text = text;
        Kind = kind;
    }

    /// <summary>The source as records keep it.</summary>
    public string Text { get; }

    /// <summary>Its kind: the part before the colon.</summary>
    public string Kind { get; }

    /// <summary>True for what others report, which is usually reduced to sea level.</summary>
    public bool IsReported => Kind is "weather-service" or "airport" or "telephone";

    /// <summary>True when there was no pressure at all, only an altitude.</summary>
    public bool IsAltitudeOnly => Kind == "altitude";

    /// <summary>Standard uncertainty when none is entered, hPa.</summary>
    public double DefaultUncertaintyHectopascal => Kind switch
    {
        "barometer" => UncertaintyDefaults.BarometerHectopascal,
        "altitude" => UncertaintyDefaults.AltitudeOnlyHectopascal,
        _ => UncertaintyDefaults.ReportedPressureHectopascal,
    };

    /// <summary>Where <see cref="DefaultUncertaintyHectopascal"/> comes from.</summary>
    public string DefaultUncertaintySource => Kind switch
    {
        "barometer" => "read to 1 mmHg, rectangular (TM 9-A6.2)",
        "altitude" => "weather of about 1 % (from memory)",
        _ => "5 hPa either way, rectangular (our choice, no source)",
    };

    /// <summary>Reads a source or refuses it in one line.</summary>
    /// <exception cref="InputException">It is none of the known ones, or a barometer without an id.</exception>
    public static PressureSource Parse(string what, string text)
    {
        string trimmed = text.Trim();
        int colon = trimmed.IndexOf(':', StringComparison.Ordinal);
        string kind = (colon < 0 ? trimmed : trimmed[..colon]).ToLowerInvariant();
        string name = colon < 0 ? "" : trimmed[(colon + 1)..].Trim();
        if (Array.IndexOf(Kinds, kind) < 0)
        {
            throw Wrong.Input(what, text, "no such source of a pressure" + NearestName.DidYouMean(kind, Kinds) + "; " + Choices);
        }

        if (kind == "barometer" && name.Length == 0)
        {
            throw Wrong.Input(what, text, "a barometer has an id, so that its last check can be looked up; write for example barometer:B-12");
        }

        return new PressureSource(name.Length == 0 ? kind : kind + ":" + name, kind);
    }
}
