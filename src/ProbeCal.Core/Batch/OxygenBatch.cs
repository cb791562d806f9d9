using System;

namespace ProbeCal;

/// <summary>
/// The oxygen functions over whole arrays (desktop only): each value and each status has the very bits of the scalar call with the same inputs, computed
/// several at once with the widest vectors that the machine has. Nothing is allocated.
/// </summary>
/// <remarks>
/// Ranges, accuracy and sources stand with the scalar functions. All spans of a call must have one length. The output may be the very same span as an
/// input, which it then replaces; any other overlap of an input with the output is refused, and the statuses must not share memory with numbers.
/// <see cref="SolubilityEquation.BensonKrause1984"/> and <see cref="SolubilityEquation.GarciaGordon1992"/> run in vectors, and values whose status is not Ok
/// one at a time. Other equations are refused as <see cref="OxygenEquilibrium"/> refuses them; <see cref="GasBatch"/> takes them. May be called from several threads at once.
/// </remarks>
public static class OxygenBatch
{
    /// <summary><see cref="GarciaGordon1992.MicromolesPerKilogramAtOneAtmosphere"/> for each temperature and salinity.</summary>
    /// <param name="celsius">Temperatures on ITS-90, freezing point or −2 to 40 °C.</param>
    /// <param name="salinity">Practical salinities, 0–42.</param>
    /// <param name="rule">What to do outside the range.</param>
    /// <param name="micromolesPerKilogram">Concentrations, µmol per kg of water; NaN unless Ok or let pass by the rule.</param>
    /// <param name="statuses">Status of each value.</param>
    /// <returns>How many statuses are not Ok.</returns>
    /// <exception cref="ArgumentException">The spans differ in length, or overlap in a way that is not possible.</exception>
    public static int GarciaGordon1992MicromolesPerKilogramAtOneAtmosphere(
        ReadOnlySpan<double> celsius, ReadOnlySpan<double> salinity, RangeRule rule, Span<double> micromolesPerKilogram, Span<Status> statuses)
    {
        return BatchLoop.Run(
            default(OxygenFunctions.GarciaGordonAtOneAtmosphere), celsius, salinity, celsius, celsius, rule, micromolesPerKilogram, statuses,
            LaneWidths.Widest);
    }

    /// <summary><see cref="GarciaGordon1992.MicromolesPerKilogram"/> for each temperature, salinity and pressure.</summary>
    /// <param name="celsius">Temperatures on ITS-90, freezing point or −2 to 40 °C.</param>
    /// <param name="salinity">Practical salinities, 0–42.</param>
    /// <param name="pressureHectopascal">Absolute pressures at the water surface, 506.625–1114.575 hPa.</param>
    /// <param name="rule">What to do outside the range.</param>
    /// <param name="micromolesPerKilogram">Concentrations, µmol per kg of water; NaN unless Ok or let pass by the rule.</param>
    /// <param name="statuses">Status of each value.</param>
    /// <returns>How many statuses are not Ok.</returns>
    /// <exception cref="ArgumentException">The spans differ in length, or overlap in a way that is not possible.</exception>
    public static int GarciaGordon1992MicromolesPerKilogram(
        ReadOnlySpan<double> celsius, ReadOnlySpan<double> salinity, ReadOnlySpan<double> pressureHectopascal, RangeRule rule,
        Span<double> micromolesPerKilogram, Span<Status> statuses)
    {
        return BatchLoop.Run(
            default(OxygenFunctions.GarciaGordon), celsius, salinity, pressureHectopascal, celsius, rule, micromolesPerKilogram, statuses,
            LaneWidths.Widest);
    }

    /// <summary><see cref="OxygenEquilibrium.MilligramsPerLitre"/> for each temperature, salinity and pressure.</summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="celsius">Temperatures, the range of the equation.</param>
    /// <param name="salinity">Practical salinities, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute pressures at the water surface, 506.625–1114.575 hPa.</param>
    /// <param name="rule">What to do outside the range.</param>
    /// <param name="milligramsPerLitre">Concentrations, mg/L; NaN unless Ok or let pass by the rule.</param>
    /// <param name="statuses">Status of each value.</param>
    /// <returns>How many statuses are not Ok.</returns>
    /// <exception cref="ArgumentException">The spans differ in length, or overlap in a way that is not possible.</exception>
    public static int MilligramsPerLitre(
        SolubilityEquation equation, ReadOnlySpan<double> celsius, ReadOnlySpan<double> salinity, ReadOnlySpan<double> pressureHectopascal,
        RangeRule rule, Span<double> milligramsPerLitre, Span<Status> statuses)
    {
        return equation switch
        {
            SolubilityEquation.BensonKrause1984 => BatchLoop.Run(
                default(OxygenFunctions.MilligramsPerLitre<OxygenSolubility.BensonKrause1984Lanes>),
                celsius, salinity, pressureHectopascal, celsius, rule, milligramsPerLitre, statuses, LaneWidths.Widest),
            SolubilityEquation.GarciaGordon1992 => BatchLoop.Run(
                default(OxygenFunctions.MilligramsPerLitre<OxygenSolubility.GarciaGordon1992Lanes>),
                celsius, salinity, pressureHectopascal, celsius, rule, milligramsPerLitre, statuses, LaneWidths.Widest),
            _ => BatchLoop.RunScalar(
                default(OxygenFunctions.UnknownEquation),
                celsius, salinity, pressureHectopascal, celsius, rule, milligramsPerLitre, statuses),
        };
    }

    /// <summary><see cref="OxygenEquilibrium.PartialPressure"/> for each temperature and pressure.</summary>
    /// <param name="celsius">Temperatures, −2 to 40 °C.</param>
    /// <param name="pressureHectopascal">Absolute pressures, 506.625–1114.575 hPa.</param>
    /// <param name="rule">What to do outside the range.</param>
    /// <param name="partialPressureHectopascal">Partial pressures, hPa; NaN unless Ok or let pass by the rule.</param>
    /// <param name="statuses">Status of each value.</param>
    /// <returns>How many statuses are not Ok.</returns>
    /// <exception cref="ArgumentException">The spans differ in length, or overlap in a way that is not possible.</exception>
    public static int PartialPressure(
        ReadOnlySpan<double> celsius, ReadOnlySpan<double> pressureHectopascal, RangeRule rule, Span<double> partialPressureHectopascal,
        Span<Status> statuses)
    {
        return BatchLoop.Run(
            default(OxygenFunctions.PartialPressure), celsius, pressureHectopascal, celsius, celsius, rule, partialPressureHectopascal, statuses,
            LaneWidths.Widest);
    }

    /// <summary><see cref="OxygenEquilibrium.ConcentrationFromPartialPressure"/> for each temperature, salinity, pressure and partial pressure.</summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="celsius">Temperatures, the range of the equation.</param>
    /// <param name="salinity">Practical salinities, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute station pressures, 506.625–1114.575 hPa.</param>
    /// <param name="partialPressureHectopascal">Partial pressures of oxygen, hPa, at most 1114.575; negative values pass through.</param>
    /// <param name="rule">What to do outside the range.</param>
    /// <param name="milligramsPerLitre">Concentrations, mg/L; NaN unless Ok or let pass by the rule.</param>
    /// <param name="statuses">Status of each value.</param>
    /// <returns>How many statuses are not Ok.</returns>
    /// <exception cref="ArgumentException">The spans differ in length, or overlap in a way that is not possible.</exception>
    public static int ConcentrationFromPartialPressure(
        SolubilityEquation equation, ReadOnlySpan<double> celsius, ReadOnlySpan<double> salinity, ReadOnlySpan<double> pressureHectopascal,
        ReadOnlySpan<double> partialPressureHectopascal, RangeRule rule, Span<double> milligramsPerLitre, Span<Status> statuses)
    {
        return equation switch
        {
            SolubilityEquation.BensonKrause1984 => BatchLoop.Run(
                default(OxygenFunctions.ConcentrationFromPartialPressure<OxygenSolubility.BensonKrause1984Lanes>),
                celsius, salinity, pressureHectopascal, partialPressureHectopascal, rule, milligramsPerLitre, statuses, LaneWidths.Widest),
            SolubilityEquation.GarciaGordon1992 => BatchLoop.Run(
                default(OxygenFunctions.ConcentrationFromPartialPressure<OxygenSolubility.GarciaGordon1992Lanes>),
                celsius, salinity, pressureHectopascal, partialPressureHectopascal, rule, milligramsPerLitre, statuses, LaneWidths.Widest),
            _ => BatchLoop.RunScalar(
                default(OxygenFunctions.UnknownEquation),
                celsius, salinity, pressureHectopascal, partialPressureHectopascal, rule, milligramsPerLitre, statuses),
        };
    }

    /// <summary><see cref="OxygenEquilibrium.PartialPressureFromConcentration"/> for each temperature, salinity, pressure and concentration.</summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="celsius">Temperatures, the range of the equation.</param>
    /// <param name="salinity">Practical salinities, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute station pressures, 506.625–1114.575 hPa.</param>
    /// <param name="milligramsPerLitre">Concentrations, mg/L, at most what pure oxygen at 1.1 atm gives; negative values pass through.</param>
    /// <param name="rule">What to do outside the range.</param>
    /// <param name="partialPressureHectopascal">Partial pressures, hPa; NaN unless Ok or let pass by the rule.</param>
    /// <param name="statuses">Status of each value.</param>
    /// <returns>How many statuses are not Ok.</returns>
    /// <exception cref="ArgumentException">The spans differ in length, or overlap in a way that is not possible.</exception>
    public static int PartialPressureFromConcentration(
        SolubilityEquation equation, ReadOnlySpan<double> celsius, ReadOnlySpan<double> salinity, ReadOnlySpan<double> pressureHectopascal,
        ReadOnlySpan<double> milligramsPerLitre, RangeRule rule, Span<double> partialPressureHectopascal, Span<Status> statuses)
    {
        return equation switch
        {
            SolubilityEquation.BensonKrause1984 => BatchLoop.Run(
                default(OxygenFunctions.PartialPressureFromConcentration<OxygenSolubility.BensonKrause1984Lanes>),
                celsius, salinity, pressureHectopascal, milligramsPerLitre, rule, partialPressureHectopascal, statuses, LaneWidths.Widest),
            SolubilityEquation.GarciaGordon1992 => BatchLoop.Run(
                default(OxygenFunctions.PartialPressureFromConcentration<OxygenSolubility.GarciaGordon1992Lanes>),
                celsius, salinity, pressureHectopascal, milligramsPerLitre, rule, partialPressureHectopascal, statuses, LaneWidths.Widest),
            _ => BatchLoop.RunScalar(
                default(OxygenFunctions.UnknownEquation),
                celsius, salinity, pressureHectopascal, milligramsPerLitre, rule, partialPressureHectopascal, statuses),
        };
    }
}
