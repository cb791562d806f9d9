namespace ProbeCal;

/// <summary>
/// Freezing point of sea water at one atmosphere: tf = −0.0575·S + 1.710523·10⁻³·S^1.5 − 2.154996·10⁻⁴·S². It is the lower
/// end of equations whose stated range begins at freezing.
/// </summary>
/// <remarks>
/// Millero, F.J., Leung, W.H. (1976), as fixed by UNESCO Technical Papers in Marine Science 44 (1983); coefficients from
/// memory, held against gsw in the peer tests. Range S 4–40, stated accuracy 0.004 K (from memory); used here from S 0, where it gives 0 °C, to S 42.
/// </remarks>
public static partial class FreezingPoint
{
    /// <summary>Highest practical salinity.</summary>
    public const double HighestSalinity = 42.0;

    private const double A0 = -0.0575;
    private const double A1 = 1.710523e-3;
    private const double A2 = -2.154996e-4;

    /// <summary>Freezing point at one atmosphere.</summary>
    /// <param name="salinity">Practical salinity, 0–42.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="celsius">Freezing point, °C; NaN unless Ok or extrapolated (a negative salinity has no value).</param>
    public static Status Celsius(double salinity, RangeRule rule, out double celsius)
    {
        celsius = double.NaN;
        Status status = InputCheck.Salinity(salinity, HighestSalinity);
        if (InputCheck.Refuses(status, rule)) { return status; }
        celsius = InputCheck.FiniteOrNaN(Value(salinity));
        return status;
    }

    /// <summary>The formula without a range; NaN for a negative salinity.</summary>
    internal static double Value(double salinity)
    {
        return salinity * (A0 + (A1 * Numerics.Sqrt(salinity)) + (A2 * salinity));
    }
}
