namespace ProbeCal;

/// <summary>
/// Saturation vapour pressure of pure water: e = 6.1121·exp{(18.678 − t/234.5)·[t/(257.14 + t)]} hPa.
/// </summary>
/// <remarks>
/// Buck, A.L. (1996), the revision of his form of 1981 in a research manual; coefficients seen in two second-hand places. 0–100 °C. Stated accuracy 0.02 % between 0 and
/// 50 °C; it lies up to 0.045 % below Wagner and Pruss 1993 between 0 and 40 °C. Without the enhancement factor of moist air.
/// </remarks>
public static class VapourBuck1996
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 100.0;

    private const double A = 6.1121;
    private const double B = 18.678;
    private const double C = 257.14;
    private const double D = 234.5;

    /// <summary>Saturation vapour pressure.</summary>
    /// <param name="celsius">Temperature, 0 to 100 °C.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="hectopascal">Vapour pressure, hPa; NaN unless Ok or let pass by the rule.</param>
    public static Status Pressure(double celsius, RangeRule rule, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius);
        if (InputCheck.Refuses(status, rule)) { return status; }
        hectopascal = InputCheck.FiniteOrNaN(MagnusForm.Value(celsius, A, B - (celsius / D), C));
        return status;
    }
}
