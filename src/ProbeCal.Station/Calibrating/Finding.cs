using System.Collections.Generic;
using System.Globalization;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Calibrating;

/// <summary>How much weight a finding has.</summary>
public enum FindingSeverity
{
    /// <summary>Written down; the work goes on.</summary>
    Note,

    /// <summary>The work goes on only with a reason, which the record keeps.</summary>
    NeedsReason,

    /// <summary>No reason helps: it cannot be true, or nothing can be calibrated from it.</summary>
    Refuse,
}

/// <summary>What a guard saw.</summary>
/// <param name="Guard">Which guard: one of <see cref="GuardNames"/>.</param>
/// <param name="Severity">Its weight.</param>
/// <param name="Saw">What it saw and what to do, in one sentence.</param>
/// <param name="PossibleErrorMilligramsPerLitre">The error that this could put into a reading at these conditions, mg/L; null when it cannot be said.</param>
public sealed record Finding(string Guard, FindingSeverity Severity, string Saw, double? PossibleErrorMilligramsPerLitre)
{
    /// <summary>The finding as the record keeps it.</summary>
    /// <param name="reason">The reason for going on, or null.</param>
    public RecordedFinding ToRecord(string? reason)
    {
        string severity = Severity switch
        {
            FindingSeverity.Note => "note",
            FindingSeverity.NeedsReason when reason != null => "overridden",
            _ => "refused",
        };
        return new RecordedFinding
        {
            Guard = Guard,
            Severity = severity,
            Saw = Saw,
            PossibleErrorMilligramsPerLitre = PossibleErrorMilligramsPerLitre,
            Reason = Severity == FindingSeverity.NeedsReason ? reason : null,
        };
    }

    /// <summary>Text with numbers in it, the same in every culture.</summary>
    internal static string Text(System.FormattableString text)
    {
        return text.ToString(CultureInfo.InvariantCulture);
    }
}

/// <summary>The names of the guards, as records, options and messages use them.</summary>
public static class GuardNames
{
    /// <summary>Pressure that cannot be, or hardly can be, at the altitude.</summary>
    public const string PressureAtAltitude = "pressure-at-altitude";

    /// <summary>Pressure that may have been reduced to sea level.</summary>
    public const string PressureReduced = "pressure-reduced-to-sea-level";

    /// <summary>Pressure far from the last one at this site.</summary>
    public const string PressureHere = "pressure-against-last-here";

    /// <summary>Temperature outside what water or the equation allows.</summary>
    public const string TemperatureRange = "temperature-range";

    /// <summary>Typed temperature against the probe's own thermometer.</summary>
    public const string TemperatureTwice = "temperature-against-probe";

    /// <summary>Temperature outside the fitted range of the coefficient.</summary>
    public const string CoefficientRange = "coefficient-range";

    /// <summary>An input that does not move at all.</summary>
    public const string DeadInput = "dead-input";

    /// <summary>An input at the end of its range.</summary>
    public const string SaturatedInput = "saturated-input";

    /// <summary>A slope that has no right sign, or is far from the last one.</summary>
    public const string Slope = "slope";

    /// <summary>A zero that is above the 100 % point or larger than the limit.</summary>
    public const string Zero = "zero";

    /// <summary>Stirring that a probe of this kind needs and did not get.</summary>
    public const string StirringStill = "stirring";

    /// <summary>A reading before adjustment far from saturation.</summary>
    public const string AsFound = "as-found";

    /// <summary>A clock that stands before the last calibration of this probe.</summary>
    public const string Clock = "clock";

    /// <summary>The guards that a reason can get past.</summary>
    public static IReadOnlyList<string> WithReason { get; } = [PressureAtAltitude, PressureReduced, PressureHere, TemperatureTwice, Slope];
}
