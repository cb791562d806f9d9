namespace ProbeCal;

/// <summary>Density of pure air-free water at one atmosphere: ρ = a5·[1 − (t + a1)²·(t + a2)/(a3·(t + a4))].</summary>
/// <remarks>
/// Tanaka, M., Girard, G., Davis, R., Peuto, A., Bignell, N. (2001) Metrologia 38, 301–309, doi:10.1088/0026-1394/38/4/3; coefficients seen in three
/// second-hand places. Standard mean ocean water (isotopes), ITS-90, 0–40 °C. Stated uncertainty 0.001 kg/m³. Fresh water in equilibrium with air is 0.003 kg/m³ lighter
/// (from memory), tap and lake water heavier by its salt: <see cref="DensityEos80"/>.
/// </remarks>
public static class DensityTanaka2001
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 40.0;

    private const double A1 = -3.983035;
    private const double A2 = 301.797;
    private const double A3 = 522528.9;
    private const double A4 = 69.34881;
    private const double A5 = 999.974950;

    /// <summary>Density.</summary>
    /// <param name="celsius">Temperature on ITS-90, 0–40 °C.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="kilogramsPerCubicMetre">Density, kg/m³; NaN unless Ok or let pass by the rule.</param>
    public static Status Density(double celsius, RangeRule rule, out double kilogramsPerCubicMetre)
    {
        kilogramsPerCubicMetre = double.NaN;
        Status status = InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius);
        double divisor = A3 * (celsius + A4);
        if (InputCheck.Refuses(status, rule) || divisor <= 0.0) { return status; }
        double d = celsius + A1;
        kilogramsPerCubicMetre = InputCheck.FiniteOrNaN(A5 * (1.0 - (d * d * (celsius + A2) / divisor)));
        return status;
    }
}
