namespace ProbeCal;

/// <summary>
/// Vapour pressure over sea water as an older generation of oxygen tables has it: Goff's formula for pure water times (1 − 0.000537·S).
/// </summary>
/// <remarks>
/// Green, E.J., Carritt, D.E. (1967) J. Mar. Res. 25, 140–147; coefficients seen in one second-hand place. The temperature enters as given. 0–40 °C, S 0–40. It lies about
/// 0.15 % below Wagner and Pruss 1993 in fresh water; no accuracy of its own is known.
/// </remarks>
public static class VapourGreenCarritt1967
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 40.0;
    /// <summary>Highest practical salinity.</summary>
    public const double HighestSalinity = 40.0;

    private const double SteamKelvin = 373.16;
    private const double PerSalinity = 0.000537;

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
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return status; }
        double steam = SteamKelvin / kelvin;
        double sum = (18.1973 * (1.0 - steam))
            + (3.1813e-7 * (1.0 - Numerics.Exp(26.1205 * (1.0 - (kelvin / SteamKelvin)))))
            - (0.018726 * (1.0 - Numerics.Exp(8.03945 * (1.0 - steam))))
            + (5.02802 * Numerics.Ln(steam));
        hectopascal = InputCheck.FiniteOrNaN(
            PressureUnits.HectopascalPerAtmosphere * (1.0 - (PerSalinity * salinity)) * Numerics.Exp(sum));
        return status;
    }
}
