namespace ProbeCal;

/// <summary>Fifteen gases in fresh water as Henry's-law constants Hcp in mol/(m³·Pa): Hcp = Hcp(298.15 K)·exp[B·(1/T − 1/298.15 K)].</summary>
/// <remarks>
/// Sander, R. (2023) Atmos. Chem. Phys. 23, 10901–12440, doi:10.5194/acp-23-10901-2023. Two significant figures, taken as 5 %: for oxygen 5.0 % low at 0 °C
/// and 3.4 % high at 25 °C against Benson and Krause 1984. Never for a percentage of saturation. Coefficients read in one place, the topmost reviewed row of each gas
/// (neon, krypton and ammonia from memory). A law of dilute water: ammonia, 16 g/L at 10 hPa and 15 °C, leaves it early, and nothing here says where. Best within 20 K of 25 °C: range 5–40 °C, where the upper end is that of density and vapour. Fresh water only; the gas is taken as ideal.
/// </remarks>
internal static class Sander2023
{
    /// <summary>Lowest temperature, °C.</summary>
    internal const double LowestCelsius = 5.0;
    /// <summary>Highest temperature, °C.</summary>
    internal const double HighestCelsius = 40.0;
    /// <summary>Fresh water only.</summary>
    internal const double HighestSalinity = 0.0;

    private const double ReferenceKelvin = 298.15;

    /// <summary>ln of Hcp, mol/(m³·Pa), and its slope; NaN for a gas that it does not cover and at or below absolute zero.</summary>
    internal static double PressureLogarithm(Gas gas, double celsius, CalculationSteps? steps, out double perKelvin)
    {
        switch (gas)
        {
            case Gas.Oxygen:
                return Logarithm(celsius, 1.3e-05, 1500.0, steps, out perKelvin);
            case Gas.Nitrogen:
                return Logarithm(celsius, 6.4e-06, 1300.0, steps, out perKelvin);
            case Gas.CarbonDioxide:
                return Logarithm(celsius, 0.00034, 2300.0, steps, out perKelvin);
            case Gas.Methane:
                return Logarithm(celsius, 1.4e-05, 1600.0, steps, out perKelvin);
            case Gas.Hydrogen:
                return Logarithm(celsius, 7.8e-06, 530.0, steps, out perKelvin);
            case Gas.Helium:
                return Logarithm(celsius, 3.9e-06, 15.0, steps, out perKelvin);
            case Gas.Argon:
                return Logarithm(celsius, 1.4e-05, 1400.0, steps, out perKelvin);
            case Gas.NitrousOxide:
                return Logarithm(celsius, 0.00024, 2600.0, steps, out perKelvin);
            case Gas.CarbonMonoxide:
                return Logarithm(celsius, 9.7e-06, 1300.0, steps, out perKelvin);
            case Gas.Neon:
                return Logarithm(celsius, 4.5e-06, 490.0, steps, out perKelvin);
            case Gas.Krypton:
                return Logarithm(celsius, 2.4e-05, 1900.0, steps, out perKelvin);
            case Gas.Xenon:
                return Logarithm(celsius, 4.4e-05, 2200.0, steps, out perKelvin);
            case Gas.HydrogenSulfide:
                return Logarithm(celsius, 0.001, 2100.0, steps, out perKelvin);
            case Gas.Ozone:
                return Logarithm(celsius, 0.0001, 2800.0, steps, out perKelvin);
            case Gas.Ammonia:
                return Logarithm(celsius, 0.59, 4200.0, steps, out perKelvin);
            default:
                perKelvin = double.NaN;
                return double.NaN;
        }
    }

    private static double Logarithm(double celsius, double atReference, double b, CalculationSteps? steps, out double perKelvin)
    {
        perKelvin = double.NaN;
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return double.NaN; }
        double logarithm = Numerics.Ln(atReference) + (b * ((1.0 / kelvin) - (1.0 / ReferenceKelvin)));
        perKelvin = -b / kelvin / kelvin;
        if (steps != null)
        {
            steps.Add(StepQuantity.CoefficientA0, atReference);
            steps.Add(StepQuantity.CoefficientA1, b);
            steps.Add(StepQuantity.Kelvin, kelvin);
            steps.Add(StepQuantity.LogarithmOfEquation, logarithm);
        }

        return logarithm;
    }
}
