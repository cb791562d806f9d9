using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;

namespace ProbeCal.Station.Uncertainty;

/// <summary>
/// The uncertainty budget of one value (JCGM 100:2008, independent inputs): what each input adds, the combined standard uncertainty, and the interval
/// that holds 95 %.
/// </summary>
internal sealed class UncertaintyBudget
{
    /// <summary>Share of the variance from which on one non-normal contribution decides the shape of the whole.</summary>
    public const double DominantShare = 0.70;

    private UncertaintyBudget(double value, string unit, IReadOnlyList<UncertaintyContribution> contributions, double standardUncertainty)
    {
        Value = value;
        Unit = unit;
        Contributions = contributions;
        StandardUncertainty = standardUncertainty;
        Dominant = contributions.FirstOrDefault(static c => c.Distribution != Distribution.Normal && DominantShare < c.Share);
        EffectiveDegreesOfFreedom = Effective(contributions, standardUncertainty);
        CoverageFactor = Dominant is not null
            ? Uncertainty.CoverageFactor.Of(Math.Min(1.0, Dominant.Share))
            : double.IsInfinity(EffectiveDegreesOfFreedom) ? Uncertainty.CoverageFactor.Normal : FactorFor(0.95);
    }

    /// <summary>The value.</summary>
    public double Value { get; }

    /// <summary>Unit of the value.</summary>
    public string Unit { get; }

    /// <summary>What each input adds, in the order given.</summary>
    public IReadOnlyList<UncertaintyContribution> Contributions { get; }

    /// <summary>Combined standard uncertainty (k = 1), in the unit of the value.</summary>
    public double StandardUncertainty { get; }

    /// <summary>
    /// Degrees of freedom of the combined uncertainty by the Welch–Satterthwaite formula (JCGM 100, G.4.1); infinite where every contribution's are.
    /// </summary>
    public double EffectiveDegreesOfFreedom { get; }

    /// <summary>
    /// How many standard uncertainties hold 95 %: 1.96, or Student's t for the <see cref="EffectiveDegreesOfFreedom"/>, or from the shape of the <see cref="Dominant"/> contribution.
    /// </summary>
    public double CoverageFactor { get; }

    /// <summary>Low end of the interval that holds 95 %.</summary>
    public double Low => Value - (CoverageFactor * StandardUncertainty);

    /// <summary>High end of the interval that holds 95 %.</summary>
    public double High => Value + (CoverageFactor * StandardUncertainty);

    /// <summary>The non-normal contribution that makes more than <see cref="DominantShare"/> of the variance; null where none does.</summary>
    public UncertaintyContribution? Dominant { get; }

    /// <summary>What a reader must know about the interval; null where it is the ordinary one.</summary>
    public string? Note => Dominant is null
        ? null
        : string.Create(CultureInfo.InvariantCulture,
            $"{Dominant.Name} ({Dominant.Distribution.ToString().ToLowerInvariant()}) makes {100.0 * Dominant.Share:F0} % of the variance: the interval takes k = {CoverageFactor:F2} from its distribution; with the usual k = 1.96 it would be too wide");

    /// <summary>Student's t for another level, the degrees of freedom cut to a whole number (JCGM 100, G.4.1).</summary>
    /// <param name="level">What the interval holds: 0.99.</param>
    /// <exception cref="InvalidOperationException">Fewer than one degree of freedom: nothing can be said of an interval.</exception>
    public double FactorFor(double level)
    {
        double whole = Math.Floor(EffectiveDegreesOfFreedom);
        return 1.0 <= whole ? Quantiles.StudentHalfWidth(level, whole) : throw new InvalidOperationException("less than one effective degree of freedom");
    }

    /// <summary>Makes the budget of a value.</summary>
    /// <param name="value">The value.</param>
    /// <param name="unit">Its unit.</param>
    /// <param name="contributions">Its inputs; the shares are filled in here.</param>
    /// <exception cref="ArgumentException">There is no input, an uncertainty is negative, or a number is not finite.</exception>
    public static UncertaintyBudget Of(double value, string unit, IReadOnlyList<UncertaintyContribution> contributions)
    {
        if (contributions.Count == 0)
        {
            throw new ArgumentException("a budget needs at least one input", nameof(contributions));
        }

        if (!double.IsFinite(value))
        {
            throw new ArgumentException("the value of a budget is finite", nameof(value));
        }

        foreach (UncertaintyContribution c in contributions)
        {
            if (!(1.0 <= c.DegreesOfFreedom))
            {
                throw new ArgumentException(string.Create(CultureInfo.InvariantCulture, $"{c.Name}: {c.DegreesOfFreedom:R} degrees of freedom; at least one"), nameof(contributions));
            }

            if (!(0.0 <= c.StandardUncertainty) || !double.IsFinite(c.Estimate) || !double.IsFinite(c.Part))
            {
                throw new ArgumentException(string.Create(CultureInfo.InvariantCulture,
                    $"{c.Name}: estimate {c.Estimate:R}, standard uncertainty {c.StandardUncertainty:R}, sensitivity {c.Sensitivity:R}; all are finite and the uncertainty is zero or above"), nameof(contributions));
            }
        }

        double combined = Combined(contributions);
        double variance = combined * combined;
        UncertaintyContribution[] shared =
            [.. contributions.Select(c => c with { Share = variance == 0.0 ? 0.0 : c.Part * c.Part / variance })];
        return new UncertaintyBudget(value, unit, shared, combined);
    }

    private static double Effective(IReadOnlyList<UncertaintyContribution> contributions, double combined)
    {
        double sum = 0.0;
        foreach (UncertaintyContribution c in contributions)
        {
            double share = combined == 0.0 ? 0.0 : c.Part / combined;
            sum += share * share * share * share / c.DegreesOfFreedom;
        }

        return sum == 0.0 ? double.PositiveInfinity : 1.0 / sum;
    }

    /// <summary>Core's own sum, six at a time, so that an equilibrium value carries the very figure that a device gives.</summary>
    private static double Combined(IReadOnlyList<UncertaintyContribution> contributions)
    {
        double Part(int i) => i < contributions.Count ? contributions[i].Part : 0.0;

        Require(GasUncertainty.Combined(Part(0), Part(1), Part(2), Part(3), Part(4), Part(5), out double combined));
        for (int i = 6; i < contributions.Count; i += 5)
        {
            Require(GasUncertainty.Combined(combined, Part(i), Part(i + 1), Part(i + 2), Part(i + 3), Part(i + 4), out combined));
        }

        return combined;
    }

    private static void Require(Status status)
    {
        if (status != Status.Ok)
        {
            throw new ArgumentException("the combined uncertainty is too large for a number: " + status);
        }
    }
}
