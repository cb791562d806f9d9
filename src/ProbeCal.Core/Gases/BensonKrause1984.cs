using System.Diagnostics;

namespace ProbeCal;

/// <summary>
/// Oxygen in water in equilibrium with water-saturated air, mg/L:
/// ln C = A0 + A1/T + A2/T² + A3/T³ + A4/T⁴ − S·(B0 + B1/T + B2/T²) at 1 atm, T in K, times the pressure factor F(P).
/// </summary>
/// <remarks>
/// Benson, B.B., Krause, D. (1984) Limnol. Oceanogr. 29(3), 620–632, doi:10.4319/lo.1984.29.3.0620, Eq. 32; pressure factor
/// Benson and Krause (1980, 1984). Range 0–40 °C, S 0–40, 0.5–1.1 atm total pressure at the water surface. Stated accuracy
/// about ±0.1 % in fresh and ±0.2 % in sea water (from memory). Coefficients seen in three second-hand places. The temperature
/// enters as given, without the scale conversion: so does the national field manual, whose tables are met to every printed
/// digit only in this way (docs/decisions/0004); the effect is at most 0.016 % (docs/methods.md).
/// </remarks>
public static partial class BensonKrause1984
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 40.0;
    /// <summary>Highest practical salinity.</summary>
    public const double HighestSalinity = 40.0;
    /// <summary>Lowest total pressure of the pressure factor, hPa: 0.5 atm.</summary>
    public const double LowestHectopascal = 0.5 * PressureUnits.HectopascalPerAtmosphere;
    /// <summary>Highest total pressure of the pressure factor, hPa: 1.1 atm.</summary>
    public const double HighestHectopascal = 1.1 * PressureUnits.HectopascalPerAtmosphere;

    private const double A0 = -139.34411;
    private const double A1 = 1.575701e5;
    private const double A2 = -6.642308e7;
    private const double A3 = 1.243800e10;
    private const double A4 = -8.621949e11;
    private const double B0 = 0.017674;
    private const double B1 = -10.754;
    private const double B2 = 2140.7;

    /// <summary>Concentration at equilibrium with water-saturated air.</summary>
    /// <param name="celsius">Temperature, 0–40 °C.</param>
    /// <param name="salinity">Practical salinity, 0–40.</param>
    /// <param name="pressureHectopascal">Absolute pressure at the water surface, 506.625–1114.575 hPa.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="milligramsPerLitre">Concentration, mg/L; NaN unless Ok or extrapolated.</param>
    public static Status MilligramsPerLitre(
        double celsius, double salinity, double pressureHectopascal, RangeRule rule, out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        Status status = Check(celsius, salinity, pressureHectopascal);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double factor = OxygenPressureFactor.Value(celsius, PressureUnits.AtmospheresFromHectopascal(pressureHectopascal));
        milligramsPerLitre = InputCheck.FiniteOrNaN(OneAtmosphere(celsius, salinity) * factor);
        return status;
    }

    /// <summary>
    /// The pressure factor F(P) = [(P − u)(1 − θP)] / [(1 − u)(1 − θ)]: what 1 atm values are multiplied with. P/1 atm alone
    /// would be 1.2 % high at 800 hPa and 30 °C.
    /// </summary>
    /// <param name="celsius">Temperature, 0–40 °C.</param>
    /// <param name="pressureHectopascal">Absolute pressure at the water surface, 506.625–1114.575 hPa.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="factor">Factor, 1 at 1013.25 hPa; NaN unless Ok or extrapolated.</param>
    public static Status PressureFactor(double celsius, double pressureHectopascal, RangeRule rule, out double factor)
    {
        factor = double.NaN;
        Status status = Check(celsius, 0.0, pressureHectopascal);
        if (InputCheck.Refuses(status, rule)) { return status; }
        factor = InputCheck.FiniteOrNaN(
            OxygenPressureFactor.Value(celsius, PressureUnits.AtmospheresFromHectopascal(pressureHectopascal)));
        return status;
    }

    /// <summary>How the equilibrium concentration answers to temperature, salinity and pressure.</summary>
    /// <param name="celsius">Temperature, 0–40 °C.</param>
    /// <param name="salinity">Practical salinity, 0–40.</param>
    /// <param name="pressureHectopascal">Absolute pressure at the water surface, 506.625–1114.575 hPa.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="perKelvin">∂C/∂T, mg/L per K; NaN unless Ok or extrapolated.</param>
    /// <param name="perSalinity">∂C/∂S, mg/L per unit of salinity; NaN unless Ok or extrapolated.</param>
    /// <param name="perHectopascal">∂C/∂P, mg/L per hPa; NaN unless Ok or extrapolated.</param>
    public static Status Sensitivities(
        double celsius, double salinity, double pressureHectopascal, RangeRule rule,
        out double perKelvin, out double perSalinity, out double perHectopascal)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        perHectopascal = double.NaN;
        Status status = Check(celsius, salinity, pressureHectopascal);
        if (InputCheck.Refuses(status, rule)) { return status; }
        LogarithmicSlopes(celsius, salinity, out double logPerKelvin, out double logPerSalinity);
        OxygenEquilibrium.ScaleSlopes(
            OneAtmosphere(celsius, salinity), logPerKelvin, logPerSalinity, celsius, pressureHectopascal,
            out perKelvin, out perSalinity, out perHectopascal);
        return status;
    }

    /// <summary>Ranges of the equation and its pressure factor.</summary>
    internal static Status Check(double celsius, double salinity, double pressureHectopascal)
    {
        Status status = InputCheck.Graver(
            InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius),
            InputCheck.Salinity(salinity, HighestSalinity));
        return InputCheck.Graver(status, InputCheck.Pressure(pressureHectopascal, LowestHectopascal, HighestHectopascal));
    }

    /// <summary>Eq. 32 at 1 atm, mg/L, without a range; NaN at or below absolute zero.</summary>
    internal static double OneAtmosphere(double celsius, double salinity, CalculationSteps? steps = null)
    {
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return double.NaN; }
        double r = 1.0 / kelvin;
        double fresh = A0 + (r * (A1 + (r * (A2 + (r * (A3 + (r * A4)))))));
        double salt = salinity * (B0 + (r * (B1 + (r * B2))));
        double logarithm = fresh - salt;
        if (steps != null) { AddSteps(steps, kelvin, r, fresh, -salt, logarithm); }
        return Numerics.Exp(logarithm);
    }

    /// <summary>∂(ln C)/∂T and ∂(ln C)/∂S at 1 atm, without a range.</summary>
    internal static void LogarithmicSlopes(double celsius, double salinity, out double perKelvin, out double perSalinity)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return; }
        double r = 1.0 / kelvin;
        double fresh = A1 + (r * ((2.0 * A2) + (r * ((3.0 * A3) + (r * 4.0 * A4)))));
        double salt = B1 + (2.0 * B2 * r);
        perKelvin = -r * r * (fresh - (salinity * salt));
        perSalinity = -(B0 + (r * (B1 + (r * B2))));
    }

    [Conditional("PROBECAL_STEPS")]
    private static void AddSteps(CalculationSteps steps, double kelvin, double r, double fresh, double salt, double logarithm)
    {
        steps.Add(StepQuantity.CoefficientA0, A0);
        steps.Add(StepQuantity.CoefficientA1, A1);
        steps.Add(StepQuantity.CoefficientA2, A2);
        steps.Add(StepQuantity.CoefficientA3, A3);
        steps.Add(StepQuantity.CoefficientA4, A4);
        steps.Add(StepQuantity.CoefficientB0, B0);
        steps.Add(StepQuantity.CoefficientB1, B1);
        steps.Add(StepQuantity.CoefficientB2, B2);
        steps.Add(StepQuantity.Kelvin, kelvin);
        steps.Add(StepQuantity.ReciprocalKelvin, r);
        steps.Add(StepQuantity.FreshTerm, fresh);
        steps.Add(StepQuantity.SaltTerm, salt);
        steps.Add(StepQuantity.LogarithmOfEquation, logarithm);
    }
}
