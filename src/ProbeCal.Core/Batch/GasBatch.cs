using System;

namespace ProbeCal;

/// <summary>
/// Any gas over whole arrays (desktop only), one value at a time: each value and each status is that of the scalar call. Nothing is allocated.
/// </summary>
/// <remarks>
/// Ranges, accuracy and sources stand with <see cref="GasEquilibrium"/>. All spans of a call must have one length; the output may be the very same
/// span as an input, any other overlap of an input with the output is refused, and the statuses must not share memory with numbers.
/// Oxygen from air runs faster through <see cref="OxygenBatch"/>. May be called from several threads at once.
/// </remarks>
public static class GasBatch
{
    /// <summary><c>GasEquilibrium.MilligramsPerLitre</c> for each temperature, salinity and pressure.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="equation">A solubility equation that covers it.</param>
    /// <param name="celsius">Temperatures (ITS-90), the range of the equation.</param>
    /// <param name="salinity">Practical salinities, the range of the equation.</param>
    /// <param name="pressureHectopascal">Absolute pressures of the gas phase at the water surface, hPa, the range of the scalar call.</param>
    /// <param name="moleFraction">Mole fraction of the gas in the dry gas phase, 0–1, the same for all values.</param>
    /// <param name="humidityPercent">Relative humidity of the gas phase, 0–100 %, the same for all values.</param>
    /// <param name="rule">What to do outside the range.</param>
    /// <param name="milligramsPerLitre">Concentrations, mg/L; NaN unless Ok or let pass by the rule.</param>
    /// <param name="statuses">Status of each value.</param>
    /// <returns>How many statuses are not Ok.</returns>
    /// <exception cref="ArgumentException">The spans differ in length, or overlap in a way that is not possible.</exception>
    public static int MilligramsPerLitre(
        Gas gas, SolubilityEquation equation, ReadOnlySpan<double> celsius, ReadOnlySpan<double> salinity, ReadOnlySpan<double> pressureHectopascal,
        double moleFraction, double humidityPercent, RangeRule rule, Span<double> milligramsPerLitre, Span<Status> statuses)
    {
        return BatchLoop.RunScalar(
            new Function(gas, equation, moleFraction, humidityPercent),
            celsius, salinity, pressureHectopascal, celsius, rule, milligramsPerLitre, statuses);
    }

    private readonly struct Function(Gas gas, SolubilityEquation equation, double moleFraction, double humidityPercent) : IBatchFunction
    {
        public Status Scalar(double a, double b, double c, double d, RangeRule rule, out double value)
        {
            return GasEquilibrium.MilligramsPerLitre(gas, equation, a, b, c, moleFraction, humidityPercent, rule, out value);
        }
    }
}
