namespace ProbeCal;

/// <summary>
/// What total pressure above 1.1 atm does to the gas in the water: exp[−V·(P − 1.1 atm)/(R·T)]. Up to 1.1 atm it is 1: the equations were measured there,
/// and the whole effect from 0.5 atm on is below 0.1 %.
/// </summary>
internal static class PoyntingFactor
{
    /// <summary>Total pressure up to which the equations hold as they stand, atm.</summary>
    internal const double HighestAtmospheresWithout = 1.1;

    /// <summary>The factor and the slopes of its logarithm; 1 for a gas without a volume.</summary>
    internal static double Value(Gas gas, double celsius, double atmospheres, CalculationSteps? steps, out double logPerKelvin, out double logPerAtmosphere)
    {
        logPerKelvin = 0.0;
        logPerAtmosphere = 0.0;
        double excess = atmospheres - HighestAtmospheresWithout;
        double volume = PartialMolarVolume.CubicCentimetresPerMole(gas);
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (excess <= 0.0 || double.IsNaN(volume) || kelvin <= 0.0) { return 1.0; }
        logPerAtmosphere = -volume / (FugacityCoefficient.CubicCentimetreAtmospheresPerKelvin * kelvin);
        logPerKelvin = -logPerAtmosphere * excess / kelvin;
        double factor = Numerics.Exp(logPerAtmosphere * excess);
        if (steps != null)
        {
            steps.Add(StepQuantity.GasKelvin, kelvin);
            steps.Add(StepQuantity.ExcessAtmospheres, excess);
            steps.Add(StepQuantity.PartialMolarVolume, volume);
            steps.Add(StepQuantity.PoyntingFactor, factor);
        }

        return factor;
    }
}
