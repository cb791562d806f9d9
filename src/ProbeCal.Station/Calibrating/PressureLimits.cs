using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// The limits that a person entered for errors in hPa: of a gas other than oxygen, or of the total gas pressure. The published
/// ones speak of dissolved oxygen only, so that there is no default.
/// </summary>
public sealed record PressureLimits
{
    /// <summary>Limit of the error, either sign, hPa; none when not entered.</summary>
    public double? Hectopascal { get; init; }

    /// <summary>Limit of the error in % of the reference; none when not entered. The larger of the two applies.</summary>
    public double? Percent { get; init; }

    /// <summary>Limit of the reading at zero, either sign, hPa; none when not entered, and <see cref="Hectopascal"/> stands in.</summary>
    public double? ZeroHectopascal { get; init; }

    /// <summary>The limit at zero, hPa; none when neither was entered.</summary>
    internal double? AtZero => ZeroHectopascal ?? Hectopascal;

    /// <summary>The limit in words.</summary>
    internal string Text => (Hectopascal, Percent) switch
    {
        (double hectopascal, double percent) => $"{Number.Print(hectopascal)} hPa or {Number.Print(percent)} % of the reference, the larger",
        (double hectopascal, null) => Number.Print(hectopascal) + " hPa",
        (null, double percent) => Number.Print(percent) + " % of the reference",
        _ => "none entered",
    };
}
