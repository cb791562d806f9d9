namespace ProbeCal;

/// <summary>
/// Saturation vapour pressure of pure water, reference quality:
/// ln(p/pc) = (Tc/T)·(a1·v + a2·v^1.5 + a3·v³ + a4·v^3.5 + a5·v⁴ + a6·v^7.5), v = 1 − T/Tc.
/// </summary>
/// <remarks>
/// Wagner, W., Pruss, A. (1993) J. Phys. Chem. Ref. Data 22, 783–787, Eq. 1 (IAPWS SR1-86(1992)); coefficients seen in four
/// second-hand places. ITS-90, 0 °C to the critical point; stated uncertainty 0.01–0.02 % (from memory) near ambient.
/// </remarks>
public static class VapourWagnerPruss1993
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C: the critical point.</summary>
    public const double HighestCelsius = 373.946;

    private const double CriticalKelvin = 647.096;
    private const double CriticalHectopascal = 220640.0;
    private const double A1 = -7.85951783;
    private const double A2 = 1.84408259;
    private const double A3 = -11.7866497;
    private const double A4 = 22.6807411;
    private const double A5 = -15.9618719;
    private const double A6 = 1.80122502;

    /// <summary>Saturation vapour pressure.</summary>
    /// <param name="celsius">Temperature, 0–373.946 °C.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="hectopascal">Vapour pressure, hPa; NaN unless Ok or extrapolated.</param>
    public static Status Pressure(double celsius, RangeRule rule, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius);
        if (InputCheck.Refuses(status, rule)) { return status; }
        hectopascal = InputCheck.FiniteOrNaN(Value(celsius, out _));
        return status;
    }

    /// <summary>The formula in hPa with d(ln p)/dT, 1/K, without a range; NaN at or below absolute zero and above the critical point.</summary>
    internal static double Value(double celsius, out double logPerKelvin, CalculationSteps? steps = null)
    {
        logPerKelvin = double.NaN;
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return double.NaN; }
        double v = 1.0 - (kelvin / CriticalKelvin);
        // Above the critical point there is no saturation; the root gives NaN there.
        double root = Numerics.Sqrt(v);
        if (steps != null)
        {
            steps.Add(StepQuantity.PureVapourCoefficient1, A1);
            steps.Add(StepQuantity.PureVapourCoefficient2, A2);
            steps.Add(StepQuantity.PureVapourCoefficient3, A3);
            steps.Add(StepQuantity.PureVapourCoefficient4, A4);
            steps.Add(StepQuantity.PureVapourCoefficient5, A5);
            steps.Add(StepQuantity.PureVapourCoefficient6, A6);
            steps.Add(StepQuantity.CriticalPascal, CriticalHectopascal * 100.0);
            steps.Add(StepQuantity.CriticalDistance, v);
        }

        double v3 = v * v * v;
        double sum = (A1 * v) + (A2 * v * root) + (A3 * v3) + (A4 * v3 * root) + (A5 * v3 * v) + (A6 * v3 * v3 * v * root);
        double slope = A1 + (1.5 * A2 * root) + (3.0 * A3 * v * v) + (3.5 * A4 * v * v * root) + (4.0 * A5 * v3) + (7.5 * A6 * v3 * v3 * root);
        logPerKelvin = -((CriticalKelvin / kelvin * sum) + slope) / kelvin;
        return CriticalHectopascal * Numerics.Exp(CriticalKelvin / kelvin * sum);
    }
}
