namespace ProbeCal;

/// <summary>
/// When a calibration window may be accepted. Over the window, the trend times the window, the scatter about the trend and
/// the trend's standard error times the window must each be below a quarter of the acceptance limit, for the signal
/// (expressed at the reference in mg/L) and for the temperature.
/// </summary>
/// <remarks>The quarter, the window and the least count are our choice, no source: published criteria are plain waits of 5–10 minutes with both readings "steady" (USGS TM 9-A6.2).</remarks>
public sealed class StabilityCriterion
{
    /// <summary>Default length of the window, s (our choice, no source).</summary>
    public const double DefaultWindowSeconds = 180.0;
    /// <summary>Default least number of samples (our choice, no source).</summary>
    public const int DefaultLeastCount = 30;
    /// <summary>Default limit for the signal, mg/L at the reference: a quarter of 0.2 mg/L (our choice, no source).</summary>
    public const double DefaultMilligramsPerLitre = 0.05;
    /// <summary>Default limit for the temperature, K: a quarter of the 0.2 °C of a thermistor check (our choice, no source).</summary>
    public const double DefaultKelvin = 0.05;

    /// <summary>Sets a criterion; the defaults are the constants of this class.</summary>
    /// <param name="windowSeconds">Length of the window, s, positive.</param>
    /// <param name="leastCount">Least number of samples, at least 3.</param>
    /// <param name="milligramsPerLitre">Limit for the signal, mg/L at the reference, positive.</param>
    /// <param name="kelvin">Limit for the temperature, K, positive.</param>
    public StabilityCriterion(
        double windowSeconds = DefaultWindowSeconds,
        int leastCount = DefaultLeastCount,
        double milligramsPerLitre = DefaultMilligramsPerLitre,
        double kelvin = DefaultKelvin)
    {
        WindowSeconds = windowSeconds;
        LeastCount = leastCount;
        MilligramsPerLitre = milligramsPerLitre;
        Kelvin = kelvin;
    }

    /// <summary>Length of the window, s.</summary>
    public double WindowSeconds { get; }

    /// <summary>Least number of samples.</summary>
    public int LeastCount { get; }

    /// <summary>Limit for the signal, mg/L at the reference.</summary>
    public double MilligramsPerLitre { get; }

    /// <summary>Limit for the temperature, K.</summary>
    public double Kelvin { get; }
}

/// <summary>
/// What is known of the analog input, so that a dead or saturated one is told from a stable one. NaN stands for "not known";
/// the check is then left out, except that a signal without any movement at all always counts as dead.
/// </summary>
public sealed class ConverterLimits
{
    /// <summary>Describes a converter.</summary>
    /// <param name="resolution">One step, in the signal's unit; NaN if not known.</param>
    /// <param name="lowest">Lowest value it can give; NaN if not known.</param>
    /// <param name="highest">Highest value it can give; NaN if not known.</param>
    public ConverterLimits(double resolution = double.NaN, double lowest = double.NaN, double highest = double.NaN)
    {
        Resolution = resolution;
        Lowest = lowest;
        Highest = highest;
    }

    /// <summary>One step, in the signal's unit.</summary>
    public double Resolution { get; }

    /// <summary>Lowest value it can give.</summary>
    public double Lowest { get; }

    /// <summary>Highest value it can give.</summary>
    public double Highest { get; }
}
