namespace ProbeCal;

/// <summary>
/// Saturation vapour pressure of pure water as weather services compute it (WMO-No. 8): e = 6.112·exp[17.62·t/(243.12 + t)] hPa.
/// </summary>
/// <remarks>
/// WMO-No. 8, Guide to Instruments and Methods of Observation, after Sonntag, D. (1990) Z. Meteorol. 70, 340–344; coefficients seen in three second-hand places.
/// −45 to 60 °C (super-cooled water below 0 °C). Stated accuracy 0.3 % between 0 and 50 °C. Without the enhancement factor of moist air.
/// </remarks>
public static class VapourSonntag1990
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = -45.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 60.0;

    private const double A = 6.112;
    private const double B = 17.62;
    private const double C = 243.12;

    /// <summary>Saturation vapour pressure.</summary>
    /// <param name="celsius">Temperature, −45 to 60 °C.</param>
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
