using System.Diagnostics;

namespace ProbeCal;

/// <summary>
/// Oxygen in water in equilibrium with water-saturated air, µmol/kg, the fit to the data of Benson and Krause:
/// ln C = ΣAi·Ts^i (i = 0–5) + S·(B0 + B1·Ts + B2·Ts² + B3·Ts³) + C0·S², Ts = ln[(298.15 − t)/(273.15 + t)] at 1 atm, t on
/// IPTS-68, times the pressure factor of Benson and Krause.
/// </summary>
/// <remarks>
/// Garcia, H.E., Gordon, L.I. (1992) Limnol. Oceanogr. 37(6), 1307–1312, doi:10.4319/lo.1992.37.6.1307, Eq. 8 with the
/// Benson–Krause column of Table 1; erratum Limnol. Oceanogr. 38, 656 (1993): the term A3·Ts² printed in Eq. 8 is not part of
/// it. Range freezing point (but not below −2 °C) to 40 °C, S 0–42, 0.5–1.1 atm. Accuracy ±0.1–0.3 % (from memory). The ITS-90 input is converted,
/// as gsw does. The vapour and virial terms of the pressure factor are stated for 0–40 °C; below 0 °C they are continued, which changes the factor by less than 0.001 %.
/// </remarks>
public static partial class GarciaGordon1992
{
    /// <summary>Lowest temperature, °C, where the water is not frozen before: the end of the density and vapour formulas that go with the equation.</summary>
    public const double LowestCelsius = -2.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 40.0;
    /// <summary>Highest practical salinity.</summary>
    public const double HighestSalinity = 42.0;

    private const double A0 = 5.80871;
    private const double A1 = 3.20291;
    private const double A2 = 4.17887;
    private const double A3 = 5.10006;
    private const double A4 = -9.86643e-2;
    private const double A5 = 3.80369;
    private const double B0 = -7.01577e-3;
    private const double B1 = -7.70028e-3;
    private const double B2 = -1.13864e-2;
    private const double B3 = -9.51519e-3;
    private const double C0 = -2.75915e-7;

    private const double UpperKelvinOfScaling = 298.15;

    /// <summary>Concentration at equilibrium with water-saturated air.</summary>
    /// <param name="celsius">Temperature on ITS-90, freezing point or −2 to 40 °C.</param>
    /// <param name="salinity">Practical salinity, 0–42.</param>
    /// <param name="pressureHectopascal">Absolute pressure at the water surface, 506.625–1114.575 hPa.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="micromolesPerKilogram">Concentration, µmol per kg of water; NaN unless Ok or extrapolated.</param>
    public static Status MicromolesPerKilogram(
        double celsius, double salinity, double pressureHectopascal, RangeRule rule, out double micromolesPerKilogram)
    {
        micromolesPerKilogram = double.NaN;
        Status status = Check(celsius, salinity, pressureHectopascal);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double factor = OxygenPressureFactor.Value(celsius, PressureUnits.AtmospheresFromHectopascal(pressureHectopascal));
        micromolesPerKilogram = InputCheck.FiniteOrNaN(OneAtmosphere(celsius, salinity) * factor);
        return status;
    }

    /// <summary>Concentration at equilibrium with water-saturated air at a total pressure of 1 atm: the fit alone, without a pressure factor.</summary>
    /// <param name="celsius">Temperature on ITS-90, freezing point or −2 to 40 °C.</param>
    /// <param name="salinity">Practical salinity, 0–42.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="micromolesPerKilogram">Concentration, µmol per kg of water; NaN unless Ok or extrapolated. Inside the range it has the bits of 1013.25 hPa.</param>
    public static Status MicromolesPerKilogramAtOneAtmosphere(
        double celsius, double salinity, RangeRule rule, out double micromolesPerKilogram)
    {
        micromolesPerKilogram = double.NaN;
        Status status = CheckWater(celsius, salinity);
        if (InputCheck.Refuses(status, rule)) { return status; }
        micromolesPerKilogram = InputCheck.FiniteOrNaN(OneAtmosphere(celsius, salinity));
        return status;
    }

    /// <summary>How the equilibrium concentration answers to temperature, salinity and pressure.</summary>
    /// <param name="celsius">Temperature on ITS-90, freezing point or −2 to 40 °C.</param>
    /// <param name="salinity">Practical salinity, 0–42.</param>
    /// <param name="pressureHectopascal">Absolute pressure at the water surface, 506.625–1114.575 hPa.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="perKelvin">∂C/∂T, µmol/kg per K; NaN unless Ok or extrapolated.</param>
    /// <param name="perSalinity">∂C/∂S, µmol/kg per unit of salinity; NaN unless Ok or extrapolated.</param>
    /// <param name="perHectopascal">∂C/∂P, µmol/kg per hPa; NaN unless Ok or extrapolated.</param>
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

    /// <summary>Ranges of the equation and of the pressure factor.</summary>
    internal static Status Check(double celsius, double salinity, double pressureHectopascal)
    {
        return InputCheck.Graver(
            CheckWater(celsius, salinity),
            InputCheck.Pressure(pressureHectopascal, BensonKrause1984.LowestHectopascal, BensonKrause1984.HighestHectopascal));
    }

    /// <summary>The freezing point, not below −2 °C; 0 °C for a salinity outside the range.</summary>
    internal static double LowestLiquidCelsius(double salinity)
    {
        if (InputCheck.Salinity(salinity, HighestSalinity) != Status.Ok) { return 0.0; }
        double lowest = FreezingPoint.Value(salinity);
        return lowest < LowestCelsius ? LowestCelsius : lowest;
    }

    /// <summary>
    /// Ranges of the equation. The freezing point is never above 0 °C, so that only cold water asks for it.
    /// </summary>
    private static Status CheckWater(double celsius, double salinity)
    {
        Status salinityStatus = InputCheck.Salinity(salinity, HighestSalinity);
        double lowest = celsius < 0.0 ? LowestLiquidCelsius(salinity) : 0.0;
        return InputCheck.Graver(InputCheck.Temperature(celsius, lowest, HighestCelsius), salinityStatus);
    }

    /// <summary>The fit at 1 atm, µmol/kg, without a range; NaN where the scaled temperature does not exist.</summary>
    internal static double OneAtmosphere(double celsius, double salinity, CalculationSteps? steps = null)
    {
        double ts = ScaledTemperature(celsius);
        double fresh = A0 + (ts * (A1 + (ts * (A2 + (ts * (A3 + (ts * (A4 + (ts * A5)))))))));
        double saltSlope = B0 + (ts * (B1 + (ts * (B2 + (ts * B3)))));
        double salt = salinity * (saltSlope + (C0 * salinity));
        double logarithm = fresh + salt;
        if (steps != null) { AddSteps(steps, TemperatureScale.Ipts68FromIts90(celsius), ts, fresh, salt, logarithm); }
        return Numerics.Exp(logarithm);
    }

    /// <summary>∂(ln C)/∂T and ∂(ln C)/∂S at 1 atm, without a range.</summary>
    internal static void LogarithmicSlopes(double celsius, double salinity, out double perKelvin, out double perSalinity)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        double t = TemperatureScale.Ipts68FromIts90(celsius);
        double above = UpperKelvinOfScaling - t;
        double kelvin = TemperatureScale.KelvinAtZeroCelsius + t;
        if (above <= 0.0 || kelvin <= 0.0) { return; }
        double ts = Numerics.Ln(above / kelvin);
        double tsSlope = -TemperatureScale.Ipts68PerIts90 * ((1.0 / above) + (1.0 / kelvin));
        double fresh = A1 + (ts * ((2.0 * A2) + (ts * ((3.0 * A3) + (ts * ((4.0 * A4) + (ts * 5.0 * A5)))))));
        double salt = B1 + (ts * ((2.0 * B2) + (ts * 3.0 * B3)));
        perKelvin = (fresh + (salinity * salt)) * tsSlope;
        perSalinity = B0 + (ts * (B1 + (ts * (B2 + (ts * B3))))) + (2.0 * C0 * salinity);
    }

    private static double ScaledTemperature(double celsius)
    {
        double t = TemperatureScale.Ipts68FromIts90(celsius);
        double above = UpperKelvinOfScaling - t;
        double kelvin = TemperatureScale.KelvinAtZeroCelsius + t;
        if (above <= 0.0 || kelvin <= 0.0) { return double.NaN; }
        return Numerics.Ln(above / kelvin);
    }

    [Conditional("PROBECAL_STEPS")]
    private static void AddSteps(CalculationSteps steps, double t, double ts, double fresh, double salt, double logarithm)
    {
        steps.Add(StepQuantity.CelsiusIpts68, t);
        steps.Add(StepQuantity.CoefficientA0, A0);
        steps.Add(StepQuantity.CoefficientA1, A1);
        steps.Add(StepQuantity.CoefficientA2, A2);
        steps.Add(StepQuantity.CoefficientA3, A3);
        steps.Add(StepQuantity.CoefficientA4, A4);
        steps.Add(StepQuantity.CoefficientA5, A5);
        steps.Add(StepQuantity.CoefficientB0, B0);
        steps.Add(StepQuantity.CoefficientB1, B1);
        steps.Add(StepQuantity.CoefficientB2, B2);
        steps.Add(StepQuantity.CoefficientB3, B3);
        steps.Add(StepQuantity.CoefficientC0, C0);
        steps.Add(StepQuantity.ScaledTemperature, ts);
        steps.Add(StepQuantity.FreshTerm, fresh);
        steps.Add(StepQuantity.SaltTerm, salt);
        steps.Add(StepQuantity.LogarithmOfEquation, logarithm);
    }
}
