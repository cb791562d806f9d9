// format: probecal-table/1
// table: oxygen-fresh
// values: oxygen in water in equilibrium with water-saturated air, mg/L
// equation: benson-krause-1984
// citation: Benson, B.B., Krause, D. (1984) The concentration and isotopic fractionation of oxygen dissolved in freshwater and seawater in equilibrium with the atmosphere. Limnol. Oceanogr. 29(3), 620–632, Eq. 32
// rows: water temperature 0 to 40 °C (ITS-90), 21 of them in steps of 2
// columns: absolute station pressure 600 to 1100 hPa, 2 of them in steps of 500
// salinity: 0 (fresh water)
// air: water-saturated; mole fraction in dry air 0.20946
// interpolation: linear between columns, then linear between rows
// error allowed: 0.01 mg/L
// largest error found: 0.00987 mg/L at 1 °C and 1100 hPa; 0.0641% at 1 °C and 600 hPa
// error found over: 241 x 203 = 48923 points (nodes, both sides of each, cells with their middles), values as written, read in 64-bit numbers
// outside the table: nothing is extrapolated or clamped
// made by: probecal 0.1.0
using ProbeCal;

/// <summary>oxygen in water in equilibrium with water-saturated air, by benson-krause-1984.</summary>
internal static class OxygenFresh
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double FirstCelsius = 0;
    /// <summary>Highest temperature, °C.</summary>
    public const double LastCelsius = 40;
    /// <summary>Lowest absolute station pressure, hPa.</summary>
    public const double FirstHectopascal = 600;
    /// <summary>Highest absolute station pressure, hPa.</summary>
    public const double LastHectopascal = 1100;
    private const int Columns = 2;

    private static readonly double[] Values =
    {
        8.6251, 15.8789,
        8.1532, 15.0213,
        7.7218, 14.2386,
        7.3266, 13.5229,
        6.9639, 12.8672,
        6.6300, 12.2653,
        6.3220, 11.7118,
        6.0372, 11.2015,
        5.7730, 10.7302,
        5.5273, 10.2937,
        5.2981, 9.8887,
        5.0835, 9.5118,
        4.8821, 9.1603,
        4.6922, 8.8316,
        4.5127, 8.5235,
        4.3423, 8.2338,
        4.1800, 7.9608,
        4.0247, 7.7027,
        3.8756, 7.4582,
        3.7319, 7.2259,
        3.5927, 7.0046,
    };

    /// <summary>The value, mg/L, at a temperature (°C) and an absolute station pressure (hPa) inside the table; NaN unless Ok.</summary>
    public static Status MilligramsPerLitre(double celsius, double hectopascal, out double value)
    {
        return TableLookup.ByTemperatureAndPressure(
            Values, Columns, FirstCelsius, LastCelsius, FirstHectopascal, LastHectopascal, celsius, hectopascal, out value);
    }
}
