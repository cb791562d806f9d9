namespace ProbeCal;

/// <summary>
/// Saturation vapour pressure of pure water, a short form for instruments: e = 6.1121·exp[17.502·t/(240.97 + t)] hPa.
/// </summary>
/// <remarks>
/// Buck, A.L. (1981) J. Appl. Meteorol. 20, 1527–1532, doi:10.1175/1520-0450(1981)020&lt;1527:NEFCVP&gt;2.0.CO;2; coefficients seen in one second-hand place.
/// −20 to 50 °C (super-cooled water below 0 °C). Stated accuracy 0.05 %; it lies up to 0.09 % below Wagner and Pruss 1993 between 0 and 40 °C. Without the enhancement factor of moist air.
/// </remarks>
public static class VapourBuck1981
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = -20.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 50.0;

    private const double A = 6.1121;
    private const double B = 17.502;
    private const double C = 240.97;

    /// <summary>Saturation vapour pressure.</summary>
    /// <param name="celsius">Temperature, −20 to 50 °C.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="hectopascal">Vapour pressure, hPa; NaN unless Ok or let pass by the rule.</param>
    public static Status Pressure(double celsius, RangeRule rule, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius);
        if (InputCheck.Refuses(status, rule)) { return status; }
        hectopascal = InputCheck.FiniteOrNaN(MagnusForm.Value(celsius, A, B, C));
        return status;
    }
}
