namespace ProbeCal;

/// <summary>
/// Vapour pressure over sea water: that of pure water (Wagner and Pruss 1993) lowered by what is dissolved, p·exp(−0.018·φ·M), M the molality of the salt and φ its osmotic coefficient.
/// </summary>
/// <remarks>
/// Dickson, A.G., Sabine, C.L., Christian, J.R. (2007) Guide to best practices for ocean CO2 measurements, PICES Special Publication 3, chapter 5; osmotic coefficient after
/// Millero (1974). Seen in one second-hand place, which prints no check value. ITS-90, 0–40 °C, S 0–40. S 35 lowers the vapour by 1.87 %, Weiss and Price 1980 by 1.89 %;
/// accuracy that of pure water's form and about 0.02 % for the salt (our estimate).
/// </remarks>
public static class VapourDickson2007
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 40.0;
    /// <summary>Highest practical salinity.</summary>
    public const double HighestSalinity = 40.0;

    private const double P0 = 0.90799;
    private const double P1 = -0.08992;
    private const double P2 = 0.18458;
    private const double P3 = -0.07395;
    private const double P4 = -0.00221;
    private const double WaterKilogramsPerMole = 0.018;

    /// <summary>Vapour pressure over water of a salinity.</summary>
    /// <param name="celsius">Temperature, 0–40 °C.</param>
    /// <param name="salinity">Practical salinity, 0–40.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="hectopascal">Vapour pressure, hPa; NaN unless Ok or let pass by the rule.</param>
    public static Status Pressure(double celsius, double salinity, RangeRule rule, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = InputCheck.Graver(
            InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius),
            InputCheck.Salinity(salinity, HighestSalinity));
        if (InputCheck.Refuses(status, rule)) { return status; }
        VapourWagnerPruss1993.Pressure(celsius, RangeRule.Extrapolate, out double pure);
        double water = 1000.0 - (1.005 * salinity);
        if (water <= 0.0) { return status; }
        double molality = 31.998 * salinity / water;
        double half = 0.5 * molality;
        double osmotic = P0 + (half * (P1 + (half * (P2 + (half * (P3 + (half * P4)))))));
        hectopascal = InputCheck.FiniteOrNaN(pure * Numerics.Exp(-WaterKilogramsPerMole * osmotic * molality));
        return status;
    }
}
