namespace ProbeCal;

/// <summary>
/// Saturation vapour pressure of pure water, Antoine's form of an older field practice: log10(u/mmHg) = 8.10765 − 1750.286/(235 + t).
/// </summary>
/// <remarks>
/// US Geological Survey, Quality of Water Branch Technical Memorandum 81.11 (1981), which fed the pressure corrections of its time; coefficients seen in three second-hand
/// places. 0–60 °C. It lies 0.08 to 0.38 % below Wagner and Pruss 1993 between 0 and 40 °C.
/// </remarks>
public static class VapourAntoine8111
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 60.0;

    private const double A = 8.10765;
    private const double B = 1750.286;
    private const double C = 235.0;
    private const double LnTen = 2.302585092994046;

    /// <summary>Saturation vapour pressure.</summary>
    /// <param name="celsius">Temperature, 0 to 60 °C.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="hectopascal">Vapour pressure, hPa; NaN unless Ok or let pass by the rule.</param>
    public static Status Pressure(double celsius, RangeRule rule, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double divisor = C + celsius;
        if (divisor <= 0.0) { return status; }
        hectopascal = InputCheck.FiniteOrNaN(
            PressureUnits.HectopascalPerMillimetreOfMercury * Numerics.Exp(LnTen * (A - (B / divisor))));
        return status;
    }
}
