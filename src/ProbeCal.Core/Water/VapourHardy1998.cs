namespace ProbeCal;

/// <summary>
/// Saturation vapour pressure of pure water on ITS-90: ln(p/Pa) = Σ gᵢ·T^(i−2), i = 0 … 6, + g7·ln T.
/// </summary>
/// <remarks>
/// Hardy, B. (1998) ITS-90 formulations for vapor pressure, Proc. 3rd Int. Symp. Humidity and Moisture, 214–221: Wexler's equation of 1976 on the new scale;
/// coefficients seen in four second-hand places. 0–100 °C. Stated accuracy 0.01 % (from memory); it lies within 0.005 % of Wagner and Pruss 1993 between 0 and 40 °C.
/// </remarks>
public static class VapourHardy1998
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 100.0;

    private const double G0 = -2.8365744e3;
    private const double G1 = -6.028076559e3;
    private const double G2 = 1.954263612e1;
    private const double G3 = -2.737830188e-2;
    private const double G4 = 1.6261698e-5;
    private const double G5 = 7.0229056e-10;
    private const double G6 = -1.8680009e-13;
    private const double G7 = 2.7150305;

    /// <summary>Saturation vapour pressure.</summary>
    /// <param name="celsius">Temperature, 0 to 100 °C.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="hectopascal">Vapour pressure, hPa; NaN unless Ok or let pass by the rule.</param>
    public static Status Pressure(double celsius, RangeRule rule, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return status; }
        double r = 1.0 / kelvin;
        double sum = (r * (G1 + (r * G0))) + G2 + (kelvin * (G3 + (kelvin * (G4 + (kelvin * (G5 + (kelvin * G6)))))));
        hectopascal = InputCheck.FiniteOrNaN(Numerics.Exp(sum + (G7 * Numerics.Ln(kelvin))) / 100.0);
        return status;
    }
}
