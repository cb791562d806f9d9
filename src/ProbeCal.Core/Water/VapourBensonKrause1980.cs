namespace ProbeCal;

/// <summary>
/// Saturation vapour pressure of fresh water, the form that belongs to the oxygen pressure factor:
/// ln(u/atm) = 11.8571 − 3840.70/T − 216961/T², T in K.
/// </summary>
/// <remarks>
/// Benson, B.B., Krause, D. (1980) Limnol. Oceanogr. 25(4), 662–671, doi:10.4319/lo.1980.25.4.0662; coefficients seen in
/// three second-hand places. Range 0–40 °C. It lies 0.035 to 0.123 % below Wagner and Pruss 1993, which moves an oxygen value
/// by less than 0.005 %. The temperature is used as given: the scale difference is below 0.06 % of u.
/// </remarks>
public static partial class VapourBensonKrause1980
{
    /// <summary>Lowest temperature of the published range, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature of the published range, °C.</summary>
    public const double HighestCelsius = 40.0;

    private const double W0 = 11.8571;
    private const double W1 = -3840.70;
    private const double W2 = -216961.0;

    /// <summary>Saturation vapour pressure.</summary>
    /// <param name="celsius">Temperature, 0–40 °C.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="hectopascal">Vapour pressure, hPa; NaN unless Ok or extrapolated.</param>
    public static Status Pressure(double celsius, RangeRule rule, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius);
        if (InputCheck.Refuses(status, rule)) { return status; }
        hectopascal = InputCheck.FiniteOrNaN(Atmospheres(celsius) * PressureUnits.HectopascalPerAtmosphere);
        return status;
    }

    /// <summary>The formula in atmospheres, without a range; NaN at or below absolute zero.</summary>
    internal static double Atmospheres(double celsius, CalculationSteps? steps = null)
    {
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return double.NaN; }
        double r = 1.0 / kelvin;
        if (steps != null)
        {
            steps.Add(StepQuantity.VapourCoefficient0, W0);
            steps.Add(StepQuantity.VapourCoefficient1, W1);
            steps.Add(StepQuantity.VapourCoefficient2, W2);
            steps.Add(StepQuantity.VapourKelvin, kelvin);
        }

        return Numerics.Exp(W0 + (r * (W1 + (r * W2))));
    }

    /// <summary>d(ln u)/dT, 1/K, without a range; NaN at or below absolute zero.</summary>
    internal static double LogarithmicSlope(double celsius)
    {
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return double.NaN; }
        double r = 1.0 / kelvin;
        return -r * r * (W1 + (2.0 * W2 * r));
    }
}
