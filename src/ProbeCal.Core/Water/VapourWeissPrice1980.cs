namespace ProbeCal;

/// <summary>
/// Saturation vapour pressure over fresh and sea water: ln(u/atm) = 24.4543 − 67.4509·(100/T) − 4.8489·ln(T/100) − 0.000544·S,
/// T in K on IPTS-68.
/// </summary>
/// <remarks>
/// Weiss, R.F., Price, B.A. (1980) Mar. Chem. 8, 347–359, doi:10.1016/0304-4203(80)90024-9, Eq. 10; coefficients seen in four second-hand
/// places. Range 0–40 °C, S 0–40; stated accuracy 0.015 % as a fit to Goff and Gratch. It lies 0.08–0.12 % below Wagner and Pruss 1993.
/// The ITS-90 input is converted.
/// </remarks>
public static class VapourWeissPrice1980
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 40.0;
    /// <summary>Highest practical salinity.</summary>
    public const double HighestSalinity = 40.0;

    private const double W0 = 24.4543;
    private const double W1 = -67.4509;
    private const double W2 = -4.8489;
    private const double W3 = -0.000544;

    private const double KelvinPerUnit = 100.0;

    /// <summary>Saturation vapour pressure.</summary>
    /// <param name="celsius">Temperature on ITS-90, 0–40 °C.</param>
    /// <param name="salinity">Practical salinity, 0–40.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="hectopascal">Vapour pressure, hPa; NaN unless Ok or let pass by the rule.</param>
    public static Status Pressure(double celsius, double salinity, RangeRule rule, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = InputCheck.Graver(
            InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius), InputCheck.Salinity(salinity, HighestSalinity));
        if (InputCheck.Refuses(status, rule)) { return status; }
        hectopascal = InputCheck.FiniteOrNaN(Atmospheres(celsius, salinity, out _, out _) * PressureUnits.HectopascalPerAtmosphere);
        return status;
    }

    /// <summary>The formula in atmospheres with ∂(ln u)/∂T, 1/K, and ∂(ln u)/∂S, without a range; NaN at or below absolute zero.</summary>
    internal static double Atmospheres(
        double celsius, double salinity, out double logPerKelvin, out double logPerSalinity, CalculationSteps? steps = null)
    {
        logPerKelvin = double.NaN;
        logPerSalinity = W3;
        double kelvin = TemperatureScale.Ipts68FromIts90(celsius) + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return double.NaN; }
        double r = KelvinPerUnit / kelvin;
        if (steps != null)
        {
            steps.Add(StepQuantity.VapourCoefficient0, W0);
            steps.Add(StepQuantity.VapourCoefficient1, W1);
            steps.Add(StepQuantity.VapourCoefficient2, W2);
            steps.Add(StepQuantity.VapourCoefficient3, W3);
            steps.Add(StepQuantity.VapourKelvin, kelvin);
        }

        logPerKelvin = TemperatureScale.Ipts68PerIts90 * r * (W2 - (W1 * r)) / KelvinPerUnit;
        return Numerics.Exp(W0 + (W1 * r) + (W2 * Numerics.Ln(kelvin / KelvinPerUnit)) + (W3 * salinity));
    }
}
