using System;
using System.Linq;

namespace ProbeCal.Station.Correcting;

/// <summary>
/// What a service visit says about a continuous monitor: the arithmetic of Wagner et al. 2006 (USGS Techniques and Methods 1-D3,
/// doi:10.3133/tm1D3). The field meter stands only in the fouling error, and there only with its change between two moments: it is never a standard.
/// </summary>
internal static class ServiceErrors
{
    /// <summary>What the doubles of decimal readings may be off by, mg/L: 8.97 less 8.67 is 0.3 and not above it.</summary>
    private const double Rounding = 1e-9;

    /// <summary>
    /// Fouling error Ef = (Ma − Mb) − (Fe − Fs), in the unit of the readings: what cleaning changed, less what the water changed meanwhile. It is added
    /// to readings of the fouled monitor.
    /// </summary>
    /// <param name="before">Monitor before cleaning, Mb.</param>
    /// <param name="after">Monitor after cleaning, Ma.</param>
    /// <param name="fieldBefore">Field meter when the first was read, Fs.</param>
    /// <param name="fieldAfter">Field meter when the second was read, Fe.</param>
    internal static double Fouling(double before, double after, double fieldBefore, double fieldAfter)
    {
        return (after - before) - (fieldAfter - fieldBefore);
    }

    /// <summary>Fouling error in per cent of the fouled reading, 100 Ef/Mb; NaN where the monitor read zero.</summary>
    internal static double FoulingPercent(double error, double before)
    {
        return before == 0 ? double.NaN : 100 * error / before;
    }

    /// <summary>Drift error Ed = Vs − Vc: the standard less the reading of the cleaned monitor in it. It is added to readings of the drifted monitor.</summary>
    /// <param name="standard">Value of the standard, Vs.</param>
    /// <param name="reading">What the monitor read in it, Vc.</param>
    internal static double Drift(double standard, double reading)
    {
        return standard - reading;
    }

    /// <summary>Drift error in per cent of the reading in the standard, 100 Ed/Vc; NaN where the monitor read zero.</summary>
    internal static double DriftPercent(double error, double reading)
    {
        return reading == 0 ? double.NaN : 100 * error / reading;
    }

    /// <summary>Share of an error that has come about by a time: 0 at the onset, 1 at the visit, linear between.</summary>
    internal static double Prorated(long ticks, long onset, long visit)
    {
        return ticks <= onset ? 0 : visit <= ticks ? 1 : (double)(ticks - onset) / (visit - onset);
    }

    /// <summary>read = zero + slope · true: through the origin with one level, a straight line with more (least squares).</summary>
    internal static (double Slope, double Zero) Line((double True, double Read)[] levels)
    {
        double meanTrue = levels.Average(static each => each.True);
        double meanRead = levels.Average(static each => each.Read);
        double spread = levels.Sum(each => (each.True - meanTrue) * (each.True - meanTrue));
        if (spread == 0)
        {
            return meanTrue == 0 ? (1, meanRead) : (meanRead / meanTrue, 0);
        }

        double slope = levels.Sum(each => (each.True - meanTrue) * (each.Read - meanRead)) / spread;
        return (slope, meanRead - (slope * meanTrue));
    }

    /// <summary>What is true where a probe of a moved slope and zero reads so: read = zero + slope · true.</summary>
    internal static double Undo(double reading, double slope, double zero)
    {
        return (reading - zero) / slope;
    }

    /// <summary>True when a sum of absolute errors is above the limit from which they are taken back.</summary>
    internal static bool IsApplied(double total, ServiceLimits limits)
    {
        return limits.ApplyAbove < total - Rounding;
    }

    /// <summary>Rates a value by the sum of the absolute corrections that went into it.</summary>
    /// <param name="sum">That sum, mg/L.</param>
    /// <param name="value">The value before drift and fouling, mg/L.</param>
    /// <param name="limits">Where the ratings end.</param>
    internal static Rating Rate(double sum, double value, ServiceLimits limits)
    {
        sum -= Rounding;
        double largest = Math.Max(limits.LargestMilligramsPerLitre, Math.Abs(value) * limits.LargestPercent / 100);
        return largest < sum ? Rating.ConsiderDeletion
            : limits.FairUpTo < sum ? Rating.Poor
            : limits.GoodUpTo < sum ? Rating.Fair
            : limits.ExcellentUpTo < sum ? Rating.Good
            : Rating.Excellent;
    }
}

/// <summary>How good a value is after its corrections, best first.</summary>
internal enum Rating
{
    /// <summary>Hardly corrected.</summary>
    Excellent,
    /// <summary>Little corrected.</summary>
    Good,
    /// <summary>Corrected.</summary>
    Fair,
    /// <summary>Corrected by much.</summary>
    Poor,
    /// <summary>Corrected by more than is allowed: not to be published.</summary>
    ConsiderDeletion,
}

/// <summary>
/// Limits of the record's corrections for dissolved oxygen. The defaults are those of USGS TM 1-D3 as it is known, not read again for this program: confirm
/// them before they decide. Each can be changed.
/// </summary>
public sealed record ServiceLimits
{
    /// <summary>Where the defaults come from, for every place that shows one.</summary>
    public const string DefaultSource = "Wagner et al. 2006, USGS TM 1-D3 (known, not re-read: confirm before it decides)";

    /// <summary>Sum of the absolute fouling and drift errors above which they are applied, mg/L.</summary>
    public double ApplyAbove { get; init; } = 0.3;

    /// <summary>Largest sum of corrections of a value that is excellent, mg/L.</summary>
    public double ExcellentUpTo { get; init; } = 0.3;

    /// <summary>Largest sum of a good one, mg/L.</summary>
    public double GoodUpTo { get; init; } = 0.5;

    /// <summary>Largest sum of a fair one, mg/L; above it is poor.</summary>
    public double FairUpTo { get; init; } = 0.8;

    /// <summary>Largest sum that is published at all, mg/L, or <see cref="LargestPercent"/> where that is more.</summary>
    public double LargestMilligramsPerLitre { get; init; } = 2.0;

    /// <summary>Largest sum that is published at all, % of the value.</summary>
    public double LargestPercent { get; init; } = 20;

    /// <summary>Where they come from: <see cref="DefaultSource"/>, or <c>entered</c> as soon as one was.</summary>
    public string Source { get; init; } = DefaultSource;

    /// <summary>Names of the ratings as records write them, best first.</summary>
    internal static string[] RatingNames { get; } = ["excellent", "good", "fair", "poor", "consider deletion"];
}
