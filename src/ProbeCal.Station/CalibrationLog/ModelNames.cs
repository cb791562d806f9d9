namespace ProbeCal.Station.CalibrationLog;

/// <summary>The names of the response models, as records and options use them. They never change.</summary>
public static class ModelNames
{
    /// <summary>Membrane current, galvanic or polarographic.</summary>
    public const string Amperometric = "amperometric";

    /// <summary>A meter that shows only mg/L or %.</summary>
    public const string MeterDisplay = "meter-display";

    /// <summary>Luminescence, two points of an inverse signal.</summary>
    public const string SternVolmer = "stern-volmer";

    /// <summary>Luminescence, seven coefficients in concentration.</summary>
    public const string Uchida2008 = "uchida-2008";

    /// <summary>Luminescence, seven or eight coefficients in partial pressure.</summary>
    public const string Bittig2018 = "bittig-2018";

    /// <summary>Potentiometric carbon dioxide: volts by the logarithm of the partial pressure.</summary>
    public const string Severinghaus = "severinghaus";

    /// <summary>Total pressure of all dissolved gases behind a membrane.</summary>
    public const string TotalGas = "total-gas";

    /// <summary>A straight line through points.</summary>
    public const string Linear = "linear";

    /// <summary>A quadratic through points.</summary>
    public const string Quadratic = "quadratic";

    /// <summary>All of them, in the order in which they are offered.</summary>
    public static string[] All { get; } = [Amperometric, MeterDisplay, SternVolmer, Uchida2008, Bittig2018, Severinghaus, TotalGas, Linear, Quadratic];

    /// <summary>True for a model whose signal follows the logarithm of the partial pressure, so that its slope is per decade.</summary>
    /// <param name="model">Name of the model.</param>
    public static bool IsLogarithmic(string model)
    {
        return model == Severinghaus;
    }

    /// <summary>True for a model that answers to the total pressure of all dissolved gases.</summary>
    /// <param name="model">Name of the model.</param>
    public static bool IsTotalPressure(string model)
    {
        return model == TotalGas;
    }
}
