namespace ProbeCal;

/// <summary>Density of pure water at one atmosphere as a quotient of polynomials in t (IPTS-68), the older alternative to Tanaka 2001.</summary>
/// <remarks>
/// Kell, G.S. (1975) J. Chem. Eng. Data 20, 97–105, doi:10.1021/je60064a005; coefficients seen in three second-hand places (the denominator 16.879850·10⁻³;
/// a copy with two digits swapped circulates). The ITS-90 input is converted. 0–150 °C. It lies 0.003 to 0.004 kg/m³ below Tanaka 2001 between 0 and 40 °C.
/// </remarks>
public static class DensityKell1975
{
    /// <summary>Lowest temperature, °C.</summary>
    public const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    public const double HighestCelsius = 150.0;

    private const double N0 = 999.83952;
    private const double N1 = 16.945176;
    private const double N2 = -7.9870401e-3;
    private const double N3 = -46.170461e-6;
    private const double N4 = 105.56302e-9;
    private const double N5 = -280.54253e-12;
    private const double D1 = 16.879850e-3;

    /// <summary>Density.</summary>
    /// <param name="celsius">Temperature on ITS-90, 0–150 °C.</param>
    /// <param name="rule">Refuse, near edge or extrapolate.</param>
    /// <param name="kilogramsPerCubicMetre">Density, kg/m³; NaN unless Ok or let pass by the rule.</param>
    public static Status Density(double celsius, RangeRule rule, out double kilogramsPerCubicMetre)
    {
        kilogramsPerCubicMetre = double.NaN;
        Status status = InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius);
        double t = TemperatureScale.Ipts68FromIts90(celsius);
        double divisor = 1.0 + (D1 * t);
        if (InputCheck.Refuses(status, rule) || divisor <= 0.0) { return status; }
        kilogramsPerCubicMetre = InputCheck.FiniteOrNaN(
            (N0 + (t * (N1 + (t * (N2 + (t * (N3 + (t * (N4 + (t * N5)))))))))) / divisor);
        return status;
    }
}
