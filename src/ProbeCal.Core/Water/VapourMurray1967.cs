namespace ProbeCal;

/// <summary>
/// Saturation vapour pressure of pure water: e = 6.1078·exp[17.2693882·t'/(t' + 237.3)] hPa, t' = T − 273.16 K.
/// </summary>
/// <remarks>
/// Murray, F.W. (1967) J. Appl. Meteorol. 6, 203–204, doi:10.1175/1520-0450(1967)006&lt;0203:OTCOSV&gt;2.0.CO;2; coefficients seen in three second-hand places. The
/// 273.16 is the author's. −20 to 50 °C (super-cooled water below 0 °C). It lies 0.08 to 0.19 % below Wagner and Pruss 1993 between 0 and 40 °C.
/// </remarks>
public static class VapourMurray1967
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = -20.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 50.0;

    private const double A = 6.1078;
    private const double B = 17.2693882;
    private const double C = 237.3;
    // 273.16 − 273.15.
    private const double OffsetKelvin = 0.01;

    /// <summary>Saturation vapour pressure.</summary>
    /// <param name="celsius">Temperature, −20 to 50 °C.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="hectopascal">Vapour pressure, hPa; NaN unless Ok or let pass by the rule.</param>
    public static Status Pressure(double celsius, RangeRule rule, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius);
        if (InputCheck.Refuses(status, rule)) { return status; }
        hectopascal = InputCheck.FiniteOrNaN(MagnusForm.Value(celsius - OffsetKelvin, A, B, C));
        return status;
    }
}
