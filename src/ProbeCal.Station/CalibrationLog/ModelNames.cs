namespace ProbeCal.Station.Calibrating;

/// <summary>The names of the response models, as records and options use them.</summary>
public static class ModelNames
{
    /// <summary>Membrane current, galvanic or polarographic.</summary>
    public const string Amperometric = "amperometric";

    /// <summary>A meter that shows only mg/L or %.</summary>
    public const string MeterDisplay = "meter-display";

    /// <summary>All of them, in the order in which they are offered.</summary>
    public static string[] All { get; } =
        [Amperometric, MeterDisplay, "stern-volmer", "uchida-2008", "bittig-2018", "severinghaus", "total-gas", "linear", "quadratic"];
}
