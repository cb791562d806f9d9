using System.Diagnostics;

namespace ProbeCal;

/// <summary>
/// Density of water and sea water at one atmosphere: ρ = ρw(t) + A(t)·S + B(t)·S^1.5 + C·S², t on IPTS-68.
/// </summary>
/// <remarks>
/// Millero, F.J., Poisson, A. (1981) Deep-Sea Res. 28A, 625–629, doi:10.1016/0198-0149(81)90122-9; UNESCO Technical Papers in
/// Marine Science 44 (1983). Range −2 to 40 °C, S 0–42. Stated standard error 0.0036 kg/m³. The ITS-90 input is converted. TEOS-10 differs from it by up to 0.0083 kg/m³ for S up to 35 and 0.011 up to 42 (docs/methods.md).
/// </remarks>
public static partial class DensityEos80
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = -2.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 40.0;
    /// <summary>Highest practical salinity.</summary>
    public const double HighestSalinity = 42.0;

    private const double W0 = 999.842594;
    private const double W1 = 6.793952e-2;
    private const double W2 = -9.095290e-3;
    private const double W3 = 1.001685e-4;
    private const double W4 = -1.120083e-6;
    private const double W5 = 6.536332e-9;

    private const double A0 = 8.24493e-1;
    private const double A1 = -4.0899e-3;
    private const double A2 = 7.6438e-5;
    private const double A3 = -8.2467e-7;
    private const double A4 = 5.3875e-9;

    private const double B0 = -5.72466e-3;
    private const double B1 = 1.0227e-4;
    private const double B2 = -1.6546e-6;

    private const double C0 = 4.8314e-4;

    /// <summary>Density at one atmosphere.</summary>
    /// <param name="celsius">Temperature on ITS-90, −2 to 40 °C.</param>
    /// <param name="salinity">Practical salinity, 0–42.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="kilogramsPerCubicMetre">Density, kg/m³; NaN unless Ok or extrapolated (a negative salinity has no value).</param>
    public static Status Density(double celsius, double salinity, RangeRule rule, out double kilogramsPerCubicMetre)
    {
        kilogramsPerCubicMetre = double.NaN;
        Status status = Check(celsius, salinity);
        if (InputCheck.Refuses(status, rule)) { return status; }
        kilogramsPerCubicMetre = InputCheck.FiniteOrNaN(Value(celsius, salinity));
        return status;
    }

    /// <summary>How the density answers to temperature and salinity.</summary>
    /// <param name="celsius">Temperature on ITS-90, −2 to 40 °C.</param>
    /// <param name="salinity">Practical salinity, 0–42.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="perKelvin">∂ρ/∂T, kg/m³ per K; NaN unless Ok or extrapolated.</param>
    /// <param name="perSalinity">∂ρ/∂S, kg/m³ per unit of salinity; NaN unless Ok or extrapolated.</param>
    public static Status Sensitivities(double celsius, double salinity, RangeRule rule, out double perKelvin, out double perSalinity)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        Status status = Check(celsius, salinity);
        if (InputCheck.Refuses(status, rule)) { return status; }
        Slopes(celsius, salinity, out perKelvin, out perSalinity);
        perKelvin = InputCheck.FiniteOrNaN(perKelvin);
        perSalinity = InputCheck.FiniteOrNaN(perSalinity);
        return status;
    }

    /// <summary>The polynomial without a range.</summary>
    internal static double Value(double celsius, double salinity, CalculationSteps? steps = null)
    {
        double t = TemperatureScale.Ipts68FromIts90(celsius);
        double water = W0 + (t * (W1 + (t * (W2 + (t * (W3 + (t * (W4 + (t * W5)))))))));
        double a = A0 + (t * (A1 + (t * (A2 + (t * (A3 + (t * A4)))))));
        double b = B0 + (t * (B1 + (t * B2)));
        if (steps != null) { AddSteps(steps, t, water, a, b); }
        return water + (salinity * (a + (b * Numerics.Sqrt(salinity)) + (C0 * salinity)));
    }

    /// <summary>Both derivatives without a range.</summary>
    internal static void Slopes(double celsius, double salinity, out double perKelvin, out double perSalinity)
    {
        double t = TemperatureScale.Ipts68FromIts90(celsius);
        double root = Numerics.Sqrt(salinity);
        double a = A0 + (t * (A1 + (t * (A2 + (t * (A3 + (t * A4)))))));
        double b = B0 + (t * (B1 + (t * B2)));
        perSalinity = a + (1.5 * b * root) + (2.0 * C0 * salinity);
        double waterSlope = W1 + (t * ((2.0 * W2) + (t * ((3.0 * W3) + (t * ((4.0 * W4) + (t * 5.0 * W5)))))));
        double aSlope = A1 + (t * ((2.0 * A2) + (t * ((3.0 * A3) + (t * 4.0 * A4)))));
        double bSlope = B1 + (t * 2.0 * B2);
        perKelvin = (waterSlope + (salinity * (aSlope + (bSlope * root)))) * TemperatureScale.Ipts68PerIts90;
    }

    [Conditional("PROBECAL_STEPS")]
    private static void AddSteps(CalculationSteps steps, double t, double water, double a, double b)
    {
        steps.Add(StepQuantity.DensityCoefficientW0, W0);
        steps.Add(StepQuantity.DensityCoefficientW1, W1);
        steps.Add(StepQuantity.DensityCoefficientW2, W2);
        steps.Add(StepQuantity.DensityCoefficientW3, W3);
        steps.Add(StepQuantity.DensityCoefficientW4, W4);
        steps.Add(StepQuantity.DensityCoefficientW5, W5);
        steps.Add(StepQuantity.DensityCoefficientA0, A0);
        steps.Add(StepQuantity.DensityCoefficientA1, A1);
        steps.Add(StepQuantity.DensityCoefficientA2, A2);
        steps.Add(StepQuantity.DensityCoefficientA3, A3);
        steps.Add(StepQuantity.DensityCoefficientA4, A4);
        steps.Add(StepQuantity.DensityCoefficientB0, B0);
        steps.Add(StepQuantity.DensityCoefficientB1, B1);
        steps.Add(StepQuantity.DensityCoefficientB2, B2);
        steps.Add(StepQuantity.DensityCoefficientC0, C0);
        steps.Add(StepQuantity.CelsiusIpts68, t);
        steps.Add(StepQuantity.PureWaterDensity, water);
        steps.Add(StepQuantity.DensityTermA, a);
        steps.Add(StepQuantity.DensityTermB, b);
    }

    private static Status Check(double celsius, double salinity)
    {
        return InputCheck.Graver(
            InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius),
            InputCheck.Salinity(salinity, HighestSalinity));
    }
}
