namespace ProbeCal;

/// <summary>
/// What a window of samples shows: mean, straight-line trend and the scatter about it. A buffer that is filled again and
/// again, so that a running stability test allocates nothing; used by one thread at a time.
/// </summary>
public sealed class WindowStatistics
{
    /// <summary>An empty window: no samples, everything else NaN.</summary>
    public WindowStatistics()
    {
        Clear();
    }

    /// <summary>Number of samples.</summary>
    public int Count { get; internal set; }

    /// <summary>Time from the first sample to the last, s.</summary>
    public double SpanSeconds { get; internal set; }

    /// <summary>Mean, in the samples' unit.</summary>
    public double Mean { get; internal set; }

    /// <summary>Slope of the least-squares line, unit per second.</summary>
    public double SlopePerSecond { get; internal set; }

    /// <summary>
    /// Standard error of <see cref="SlopePerSecond"/>, unit per second, enlarged for the correlation between neighbouring
    /// residuals: a membrane smooths its own noise, and correlated noise holds less information than its count says.
    /// </summary>
    public double SlopeStandardError { get; internal set; }

    /// <summary>Standard deviation of the samples about the line (n − 2), in the samples' unit.</summary>
    public double ResidualDeviation { get; internal set; }

    /// <summary>Lag-1 autocorrelation of the residuals, within 0 and 0.99; a negative one counts as 0.</summary>
    public double ResidualCorrelation { get; internal set; }

    /// <summary>Smallest sample.</summary>
    public double Minimum { get; internal set; }

    /// <summary>Largest sample.</summary>
    public double Maximum { get; internal set; }

    /// <summary>
    /// Standard uncertainty of the mean as the value of a point: scatter over the root of the effective count, with what the
    /// trend moved in the window taken as rectangular. The converter's resolution is the caller's to add.
    /// </summary>
    public double MeanUncertainty { get; internal set; }

    internal void Clear()
    {
        Count = 0;
        SpanSeconds = double.NaN;
        Mean = double.NaN;
        SlopePerSecond = double.NaN;
        SlopeStandardError = double.NaN;
        ResidualDeviation = double.NaN;
        ResidualCorrelation = double.NaN;
        Minimum = double.NaN;
        Maximum = double.NaN;
        MeanUncertainty = double.NaN;
    }
}
