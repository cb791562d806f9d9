namespace ProbeCal.Station.Uncertainty;

/// <summary>How an input may lie about its estimate.</summary>
internal enum Distribution
{
    /// <summary>Normal.</summary>
    Normal = 0,
    /// <summary>Rectangular: a limit of ±a is a standard uncertainty of a/√3.</summary>
    Rectangular = 1,
}
