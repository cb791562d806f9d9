namespace ProbeCal;

/// <summary>Salinity from chlorinity: S = 1.80655·Cl.</summary>
/// <remarks>
/// Joint panel of 1967 (Wooster, W.S., Lee, A.J., Dietrich, G. 1969, Deep-Sea Res. 16, 321–322, from memory). For sea water and sea water diluted; it
/// departs from practical salinity by what the composition departs from sea salt. Chlorinity 0–23.2 g/kg (S 42).
/// </remarks>
public static class Chlorinity
{
    /// <summary>Salinity for each g/kg of chlorinity.</summary>
    public const double SalinityPerGramPerKilogram = 1.80655;
    /// <summary>Highest chlorinity, g/kg: salinity 42.</summary>
    public const double HighestGramsPerKilogram = 42.0 / SalinityPerGramPerKilogram;

    /// <summary>Salinity from chlorinity.</summary>
    /// <param name="gramsPerKilogram">Chlorinity, 0–23.2 g/kg.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="salinity">Salinity; NaN unless Ok or extrapolated. The status names the salinity.</param>
    public static Status Salinity(double gramsPerKilogram, RangeRule rule, out double salinity)
    {
        salinity = double.NaN;
        Status status = InputCheck.Salinity(gramsPerKilogram, HighestGramsPerKilogram);
        if (InputCheck.Refuses(status, rule)) { return status; }
        salinity = InputCheck.FiniteOrNaN(SalinityPerGramPerKilogram * gramsPerKilogram);
        return status;
    }
}
