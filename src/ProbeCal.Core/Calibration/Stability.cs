namespace ProbeCal;

/// <summary>
/// Judges whether signal and temperature have come to rest. Works on the caller's arrays, of which a part may be used, and
/// writes into the caller's buffers.
/// </summary>
public static class Stability
{
    // Beyond this the effective count loses its meaning: the noise is slower than the window.
    private const double HighestCorrelation = 0.99;

    // Two neighbouring codes are one step apart, less what their scaling and printing in few decimals rounds away: 0.1 of a
    // step is more than that for a step printed with two figures (our choice, no source).
    private const double LeastShareOfAStep = 0.9;

    /// <summary>Index of the first sample of the window that ends with the last sample.</summary>
    /// <param name="timesSeconds">Rising times, s.</param>
    /// <param name="count">How many of them are in use.</param>
    /// <param name="windowSeconds">Length of the window, s.</param>
    /// <returns>
    /// The latest index from which the samples still span the window; 0 while they do not span it. 0 for unusable input.
    /// </returns>
    public static int WindowStart(double[] timesSeconds, int count, double windowSeconds)
    {
        if (timesSeconds == null || count < 1 || timesSeconds.Length < count || double.IsNaN(windowSeconds)) { return 0; }
        double last = timesSeconds[count - 1];
        if (InputCheck.NotFinite(last)) { return 0; }
        int start = 0;
        for (int i = 0; i < count; i++)
        {
            double age = last - timesSeconds[i];
            if (windowSeconds <= age) { start = i; }
        }

        return start;
    }

    /// <summary>Mean, trend and scatter of a stretch of samples.</summary>
    /// <param name="timesSeconds">Times, s, not falling.</param>
    /// <param name="values">Samples.</param>
    /// <param name="start">Index of the first to use.</param>
    /// <param name="count">How many to use, at least 3.</param>
    /// <param name="statistics">Filled; all NaN unless Ok.</param>
    /// <returns>
    /// <see cref="Status.PointsBelowRange"/> below 3 samples, <see cref="Status.PointsAboveRange"/> when the arrays are shorter
    /// than the stretch, <see cref="Status.PointsNotFinite"/>, or <see cref="Status.PointsDegenerate"/> when a time falls or
    /// all times are the same.
    /// </returns>
    public static Status Evaluate(double[] timesSeconds, double[] values, int start, int count, WindowStatistics statistics)
    {
        statistics.Clear();
        if (timesSeconds == null || values == null || count < 3 || start < 0) { return Status.PointsBelowRange; }
        if (timesSeconds.Length - start < count || values.Length - start < count) { return Status.PointsAboveRange; }

        double first = timesSeconds[start];
        double origin = values[start];
        double previous = first;
        double timeSum = 0.0;
        double valueSum = 0.0;
        double minimum = origin;
        double maximum = origin;
        for (int i = start; i < start + count; i++)
        {
            double time = timesSeconds[i];
            double value = values[i];
            if (InputCheck.NotFinite(time) || InputCheck.NotFinite(value)) { return Status.PointsNotFinite; }
            if (time < previous) { return Status.PointsDegenerate; }
            previous = time;
            // Differences from the first sample: a large constant part would cost the sums their digits.
            timeSum += time - first;
            valueSum += value - origin;
            if (value < minimum) { minimum = value; }
            if (maximum < value) { maximum = value; }
        }

        double timeMean = timeSum / count;
        double valueMean = valueSum / count;
        double timeSquares = 0.0;
        double products = 0.0;
        for (int i = start; i < start + count; i++)
        {
            double time = (timesSeconds[i] - first) - timeMean;
            timeSquares += time * time;
            products += time * ((values[i] - origin) - valueMean);
        }

        if (timeSquares == 0.0) { return Status.PointsDegenerate; }
        double slope = products / timeSquares;
        double residualSquares = 0.0;
        double neighbourProducts = 0.0;
        double before = 0.0;
        for (int i = start; i < start + count; i++)
        {
            double residual = ((values[i] - origin) - valueMean) - (slope * ((timesSeconds[i] - first) - timeMean));
            residualSquares += residual * residual;
            neighbourProducts += residual * before;
            before = residual;
        }

        double span = timesSeconds[start + count - 1] - first;
        double deviation = Numerics.Sqrt(residualSquares / (count - 2));
        double correlation = residualSquares == 0.0 ? 0.0 : neighbourProducts / residualSquares;
        if (correlation < 0.0) { correlation = 0.0; }
        if (HighestCorrelation < correlation) { correlation = HighestCorrelation; }
        // Variance inflation of a mean or a slope under first-order autocorrelation, (1 + ρ)/(1 − ρ).
        double inflation = (1.0 + correlation) / (1.0 - correlation);
        double moved = slope * span;
        double slopeError = deviation * Numerics.Sqrt(inflation / timeSquares);
        double meanUncertainty = Numerics.Sqrt((deviation * deviation * inflation / count) + (moved * moved / 12.0));
        double mean = origin + valueMean;
        if (InputCheck.NotFinite(slopeError) || InputCheck.NotFinite(meanUncertainty) || InputCheck.NotFinite(mean)) { return Status.PointsNotFinite; }

        statistics.Count = count;
        statistics.SpanSeconds = span;
        statistics.Mean = mean;
        statistics.SlopePerSecond = slope;
        statistics.SlopeStandardError = slopeError;
        statistics.ResidualDeviation = deviation;
        statistics.ResidualCorrelation = correlation;
        statistics.Minimum = minimum;
        statistics.Maximum = maximum;
        statistics.MeanUncertainty = meanUncertainty;
        return Status.Ok;
    }

    /// <summary>What still moves, or why the window is refused.</summary>
    /// <param name="signal">Statistics of the signal.</param>
    /// <param name="temperature">Statistics of the temperature over the same window.</param>
    /// <param name="milligramsPerLitrePerSignal">Size of one unit of signal at the reference, mg/L; its sign does not matter.</param>
    /// <param name="converter">What is known of the signal's converter.</param>
    /// <param name="criterion">The criterion.</param>
    /// <returns>All findings together; <see cref="StabilityFinding.Stable"/> when there is none.</returns>
    public static StabilityFinding Judge(
        WindowStatistics signal,
        WindowStatistics temperature,
        double milligramsPerLitrePerSignal,
        ConverterLimits converter,
        StabilityCriterion criterion)
    {
        if (signal.Count < 1 || temperature.Count < 1) { return StabilityFinding.TooFewSamples | StabilityFinding.WindowTooShort; }
        StabilityFinding finding = StabilityFinding.Stable;
        if (signal.Count < criterion.LeastCount || temperature.Count < criterion.LeastCount) { finding |= StabilityFinding.TooFewSamples; }
        if (!(criterion.WindowSeconds <= signal.SpanSeconds)) { finding |= StabilityFinding.WindowTooShort; }
        if (IsDead(signal, converter)) { finding |= StabilityFinding.SignalDead; }
        if (IsSaturated(signal, converter)) { finding |= StabilityFinding.SignalSaturated; }

        double size = Magnitude(milligramsPerLitrePerSignal);
        if (InputCheck.NotFinite(size) || size == 0.0)
        {
            finding |= StabilityFinding.Unusable;
        }
        else
        {
            double limit = criterion.MilligramsPerLitre;
            if (!(Magnitude(signal.SlopePerSecond) * criterion.WindowSeconds * size < limit)) { finding |= StabilityFinding.SignalDrifts; }
            if (!(signal.ResidualDeviation * size < limit)) { finding |= StabilityFinding.SignalScatters; }
            if (!(signal.SlopeStandardError * criterion.WindowSeconds * size < limit)) { finding |= StabilityFinding.SignalTrendUncertain; }
        }

        double kelvin = criterion.Kelvin;
        if (!(Magnitude(temperature.SlopePerSecond) * criterion.WindowSeconds < kelvin)) { finding |= StabilityFinding.TemperatureDrifts; }
        if (!(temperature.ResidualDeviation < kelvin)) { finding |= StabilityFinding.TemperatureScatters; }
        if (!(temperature.SlopeStandardError * criterion.WindowSeconds < kelvin)) { finding |= StabilityFinding.TemperatureTrendUncertain; }
        return finding;
    }

    /// <summary>
    /// An estimate of the time until the trend is below its limit, from how much it has slowed between the two halves of the
    /// window, as for an exponential approach.
    /// </summary>
    /// <param name="firstHalf">Statistics of the older half.</param>
    /// <param name="secondHalf">Statistics of the newer half.</param>
    /// <param name="limitPerSecond">The trend to reach, unit per second, positive.</param>
    /// <param name="seconds">Time from the middle of the newer half, s, 0 when already reached; NaN when the trend does not slow down.</param>
    /// <returns><see cref="Status.PointsNotFinite"/> for statistics or a limit that are not finite, <see cref="Status.PointsDegenerate"/> when the trend does not slow down.</returns>
    public static Status SecondsToTrend(WindowStatistics firstHalf, WindowStatistics secondHalf, double limitPerSecond, out double seconds)
    {
        seconds = double.NaN;
        double early = Magnitude(firstHalf.SlopePerSecond);
        double late = Magnitude(secondHalf.SlopePerSecond);
        double apart = 0.5 * (firstHalf.SpanSeconds + secondHalf.SpanSeconds);
        if (InputCheck.NotFinite(early) || InputCheck.NotFinite(late) || InputCheck.NotFinite(apart)) { return Status.PointsNotFinite; }
        if (InputCheck.NotFinite(limitPerSecond)) { return Status.PointsNotFinite; }
        if (limitPerSecond <= 0.0) { return Status.PointsDegenerate; }
        if (late <= limitPerSecond)
        {
            seconds = 0.0;
            return Status.Ok;
        }

        if (early <= late || firstHalf.SlopePerSecond * secondHalf.SlopePerSecond <= 0.0) { return Status.PointsDegenerate; }
        // late is above the positive limit and early above late, so both quotients and the logarithm are positive unless two
        // slopes so close that their quotient rounds to 1.
        double slowing = Numerics.Ln(early / late);
        if (slowing <= 0.0) { return Status.PointsDegenerate; }
        double value = apart * Numerics.Ln(late / limitPerSecond) / slowing;
        if (InputCheck.NotFinite(value)) { return Status.PointsDegenerate; }
        seconds = value;
        return Status.Ok;
    }

    private static bool IsDead(WindowStatistics signal, ConverterLimits converter)
    {
        double spread = signal.Maximum - signal.Minimum;
        if (spread <= 0.0) { return true; }
        if (InputCheck.NotFinite(converter.Resolution)) { return false; }
        return spread < LeastShareOfAStep * converter.Resolution;
    }

    private static bool IsSaturated(WindowStatistics signal, ConverterLimits converter)
    {
        // A comparison with NaN must not decide: on the device it would say yes.
        if (!double.IsNaN(converter.Lowest) && signal.Minimum <= converter.Lowest) { return true; }
        return !double.IsNaN(converter.Highest) && converter.Highest <= signal.Maximum;
    }

    private static double Magnitude(double value)
    {
        return value < 0.0 ? -value : value;
    }
}
