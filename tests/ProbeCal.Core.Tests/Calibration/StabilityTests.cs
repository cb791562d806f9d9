using System;
using System.Globalization;
using ProbeCal.Core.Tests.Readings;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Calibration;

public class StabilityTests(ITestOutputHelper output)
{
    // One unit of signal is 0.1 mg/L at the reference, so that the limit of 0.05 mg/L is 0.5 units.
    private const double Size = 0.1;
    private static readonly StabilityCriterion Criterion = new();

    [Fact]
    public void Evaluate_FiveSamples_GivesTheLineByHand()
    {
        // By hand: Sxx = 10, slope 0.8, residuals −0.4 0.8 −1.0 1.2 −0.6 (negatively correlated), their squares 3.6.
        var statistics = new WindowStatistics();
        Assert.Equal(Status.Ok, Stability.Evaluate([0, 1, 2, 3, 4], [1, 3, 2, 5, 4], 0, 5, statistics));
        Assert.Equal(3.0, statistics.Mean, 14);
        Assert.Equal(0.8, statistics.SlopePerSecond, 14);
        Assert.Equal(Math.Sqrt(1.2), statistics.ResidualDeviation, 14);
        Assert.Equal(Math.Sqrt(0.12), statistics.SlopeStandardError, 14);
        Assert.Equal(0.0, statistics.ResidualCorrelation);
        Assert.Equal(4.0, statistics.SpanSeconds);
        Assert.Equal(1.0, statistics.Minimum);
        Assert.Equal(5.0, statistics.Maximum);
        Assert.Equal(Math.Sqrt((1.2 / 5.0) + (3.2 * 3.2 / 12.0)), statistics.MeanUncertainty, 14);
    }

    [Fact]
    public void Evaluate_APartOfTheArray_UsesOnlyIt()
    {
        var part = new WindowStatistics();
        Assert.Equal(Status.Ok, Stability.Evaluate([-9, 0, 1, 2, 3, 4, 99], [1e9, 1, 3, 2, 5, 4, double.NaN], 1, 5, part));
        Assert.Equal(0.8, part.SlopePerSecond, 14);
    }

    [Fact]
    public void Evaluate_LargeOffset_KeepsItsDigits()
    {
        double[] times = Times(181);
        var statistics = new WindowStatistics();
        double[] values = Series(times, t => 1e9 + (0.25 * t));
        for (int i = 0; i < times.Length; i++) { times[i] += 1.7e9; }
        Assert.Equal(Status.Ok, Stability.Evaluate(times, values, 0, 181, statistics));
        Assert.Equal(0.25, statistics.SlopePerSecond, 12);
        Assert.Equal(0.0, statistics.ResidualDeviation, 6);
    }

    [Fact]
    public void Evaluate_UnusableInput_NamesIt()
    {
        var statistics = new WindowStatistics();
        Assert.Equal(Status.PointsBelowRange, Stability.Evaluate([0, 1], [1, 2], 0, 2, statistics));
        Assert.Equal(Status.PointsBelowRange, Stability.Evaluate([0, 1, 2], [1, 2, 3], -1, 3, statistics));
        Assert.Equal(Status.PointsAboveRange, Stability.Evaluate([0, 1, 2], [1, 2, 3], 1, 3, statistics));
        Assert.Equal(Status.PointsNotFinite, Stability.Evaluate([0, 1, 2], [1, double.NaN, 3], 0, 3, statistics));
        Assert.Equal(Status.PointsNotFinite, Stability.Evaluate([0, 1, double.PositiveInfinity], [1, 2, 3], 0, 3, statistics));
        Assert.Equal(Status.PointsNotFinite, Stability.Evaluate([0, 1, 2], [1e300, -1e300, 1e300], 0, 3, statistics));
        Assert.Equal(Status.PointsDegenerate, Stability.Evaluate([5, 5, 5], [1, 2, 3], 0, 3, statistics));
        Assert.Equal(Status.PointsDegenerate, Stability.Evaluate([0, 2, 1], [1, 2, 3], 0, 3, statistics));
        Assert.True(double.IsNaN(statistics.Mean));
        Assert.Equal(0, statistics.Count);
    }

    [Fact]
    public void WindowStart_IsTheLatestThatStillSpansTheWindow()
    {
        Assert.Equal(2, Stability.WindowStart([0, 10, 20, 110, 200], 5, 180.0));
        Assert.Equal(1, Stability.WindowStart([0, 10, 20, 110, 200], 5, 185.0));
        Assert.Equal(0, Stability.WindowStart([0, 10, 20, 110, 200], 4, 180.0));
        Assert.Equal(0, Stability.WindowStart([], 0, 180.0));
        Assert.Equal(0, Stability.WindowStart([0, 1], 3, 180.0));
    }

    [Fact]
    public void Steady_IsStable()
    {
        Assert.Equal(StabilityFinding.Stable, Judge(t => 100.0 + Noise(t, 0.2), t => 20.0 + Noise(t, 0.01)));
        Assert.Equal(StabilityFinding.Stable, Judge(t => 100.0 + Noise(t, 0.2), t => 20.0 + Noise(t, 0.01), size: -Size));
    }

    [Theory]
    [InlineData(0.45, StabilityFinding.Stable)]
    [InlineData(0.55, StabilityFinding.SignalDrifts)]
    [InlineData(-0.55, StabilityFinding.SignalDrifts)]
    public void SignalTrend_OverTheWindow_DecidesAtTheLimit(double unitsPerWindow, StabilityFinding expected)
    {
        Assert.Equal(expected, Judge(t => 100.0 + (unitsPerWindow * t / 180.0) + Alternating(t, 0.05), t => 20.0 + Alternating(t, 0.001)));
    }

    [Fact]
    public void Trend_CountsOverTheWindow_AlsoWhereTheSamplesSpanMore()
    {
        // 30 samples at 7 s span 203 s: 0.47 units in 180 s are 0.53 over all of them.
        Assert.Equal(StabilityFinding.Stable, Judge(
            t => 100.0 + (0.47 * t / 180.0) + Alternating(t, 0.01), t => 20.0 + (0.047 * t / 180.0) + Alternating(t, 0.0001), count: 30, interval: 7.0));
    }

    [Theory]
    [InlineData(0.045, StabilityFinding.Stable)]
    [InlineData(0.055, StabilityFinding.TemperatureDrifts)]
    public void TemperatureTrend_OverTheWindow_DecidesAtTheLimit(double kelvinPerWindow, StabilityFinding expected)
    {
        Assert.Equal(expected, Judge(t => 100.0 + Alternating(t, 0.05), t => 20.0 + (kelvinPerWindow * t / 180.0) + Alternating(t, 0.001)));
    }

    [Theory]
    [InlineData(0.45, 0.045, StabilityFinding.Stable)]
    [InlineData(0.55, 0.045, StabilityFinding.SignalScatters)]
    [InlineData(0.45, 0.055, StabilityFinding.TemperatureScatters)]
    public void Scatter_DecidesAtTheLimit(double units, double kelvin, StabilityFinding expected)
    {
        Assert.Equal(expected, Judge(t => 100.0 + Alternating(t, units), t => 20.0 + Alternating(t, kelvin)));
    }

    [Fact]
    public void SlowNoise_IsNotTakenForKnowledge()
    {
        // Scatter and trend both pass, but the noise is a slow wave: the trend's standard error, honestly counted, does not.
        StabilityFinding finding = Judge(t => 100.0 + (0.55 * Math.Cos(2.0 * Math.PI * t / 60.0)), t => 20.0 + Alternating(t, 0.001));
        Assert.Equal(StabilityFinding.SignalTrendUncertain, finding);
        finding = Judge(t => 100.0 + Alternating(t, 0.05), t => 20.0 + (0.055 * Math.Cos(2.0 * Math.PI * t / 60.0)));
        Assert.Equal(StabilityFinding.TemperatureTrendUncertain, finding);
    }

    [Fact]
    public void TooFewOrTooShort_IsNotYetStable()
    {
        Assert.Equal(StabilityFinding.WindowTooShort, Judge(t => 100.0 + Alternating(t, 0.05), t => 20.0, count: 180));
        Assert.Equal(StabilityFinding.Stable, Judge(t => 100.0 + Alternating(t, 0.05), t => 20.0, count: 181));
        Assert.Equal(StabilityFinding.TooFewSamples, Judge(t => 100.0 + Alternating(t, 0.05), t => 20.0, count: 29, interval: 7.0));
        Assert.Equal(StabilityFinding.Stable, Judge(t => 100.0 + Alternating(t, 0.05), t => 20.0, count: 30, interval: 7.0));
        Assert.Equal(
            StabilityFinding.TooFewSamples | StabilityFinding.WindowTooShort,
            Stability.Judge(new WindowStatistics(), new WindowStatistics(), Size, new ConverterLimits(), Criterion));
    }

    [Fact]
    public void DeadInput_IsRefused_AndAQuantisedLiveOneIsNot()
    {
        var known = new ConverterLimits(0.1, 0.0, 500.0);
        Assert.Equal(StabilityFinding.SignalDead, Judge(t => 100.0, t => 20.0));
        Assert.Equal(StabilityFinding.SignalDead, Judge(t => 100.0, t => 20.0, converter: known));
        Assert.Equal(StabilityFinding.SignalDead, Judge(t => 100.0 + Alternating(t, 0.01), t => 20.0, converter: known));
        Assert.Equal(StabilityFinding.SignalDead, Judge(t => 100.0 + Alternating(t, 0.04), t => 20.0, converter: known));
        // A step of 0.0625 printed with two decimals moves by 0.06.
        Assert.Equal(StabilityFinding.Stable, Judge(t => 100.0 + Alternating(t, 0.03), t => 20.0, converter: new ConverterLimits(0.0625)));
        // Two neighbouring codes, as a steady signal between them gives; 0.1 has no exact binary form.
        Assert.Equal(StabilityFinding.Stable, Judge(t => 0.1 * (1000 + ((int)t % 2)), t => 20.0, converter: known));
    }

    [Fact]
    public void SaturatedInput_IsRefused()
    {
        var known = new ConverterLimits(double.NaN, 0.0, 100.0);
        Assert.Equal(StabilityFinding.SignalSaturated, Judge(t => Math.Min(100.0, 99.95 + Alternating(t, 0.1)), t => 20.0, converter: known));
        Assert.Equal(StabilityFinding.SignalSaturated, Judge(t => Math.Max(0.0, Alternating(t, 0.1)), t => 20.0, converter: known));
        Assert.Equal(StabilityFinding.Stable, Judge(t => 99.8 + Alternating(t, 0.1), t => 20.0, converter: known));
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(double.NaN)]
    [InlineData(double.NegativeInfinity)]
    public void LimitThatCannotBeExpressed_IsUnusable(double size)
    {
        Assert.Equal(StabilityFinding.Unusable, Judge(t => 100.0 + Alternating(t, 0.05), t => 20.0, size: size));
    }

    [Fact]
    public void SecondsToTrend_OfAnExponentialApproach_IsItsOwn()
    {
        const double Tau = 60.0;
        double[] times = Times(181);
        double[] values = Series(times, t => 100.0 - (20.0 * Math.Exp(-t / Tau)));
        var first = new WindowStatistics();
        var second = new WindowStatistics();
        Stability.Evaluate(times, values, 0, 91, first);
        Stability.Evaluate(times, values, 90, 91, second);
        double limit = second.SlopePerSecond / Math.E;
        Assert.Equal(Status.Ok, Stability.SecondsToTrend(first, second, limit, out double seconds));
        Assert.Equal(Tau, seconds, 0.01);
        Assert.Equal(Status.Ok, Stability.SecondsToTrend(first, second, second.SlopePerSecond, out seconds));
        Assert.Equal(0.0, seconds);
        Assert.Equal(Status.PointsDegenerate, Stability.SecondsToTrend(second, first, limit, out seconds));
        Assert.True(double.IsNaN(seconds));
        Assert.Equal(Status.PointsDegenerate, Stability.SecondsToTrend(first, second, 0.0, out _));
        Assert.Equal(Status.PointsNotFinite, Stability.SecondsToTrend(first, second, double.NaN, out _));
        Assert.Equal(Status.PointsNotFinite, Stability.SecondsToTrend(new WindowStatistics(), second, limit, out _));
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(0.6)]
    [InlineData(0.9)]
    public void MeanUncertainty_HoldsForCorrelatedNoise(double correlation)
    {
        // The mean of 181 samples of first-order autocorrelated noise about a steady value, 2,000 times.
        var campaign = new Campaign(output, string.Create(CultureInfo.InvariantCulture, $"mean-uncertainty {correlation}"), 2000, 50000);
        Random random = campaign.Random;
        double[] times = Times(181);
        double[] values = new double[181];
        var statistics = new WindowStatistics();
        double errorSquares = 0.0;
        double claimedSquares = 0.0;
        for (int trial = 0; trial < campaign.Count; trial++)
        {
            double state = Draw.Gaussian(random);
            for (int i = 0; i < values.Length; i++)
            {
                state = (correlation * state) + (Math.Sqrt(1.0 - (correlation * correlation)) * Draw.Gaussian(random));
                values[i] = 50.0 + state;
            }

            Assert.Equal(Status.Ok, Stability.Evaluate(times, values, 0, values.Length, statistics));
            errorSquares += (statistics.Mean - 50.0) * (statistics.Mean - 50.0);
            claimedSquares += statistics.MeanUncertainty * statistics.MeanUncertainty;
        }

        // On the safe side: the trend that noise feigns is claimed as if the probe had moved.
        double ratio = Math.Sqrt(claimedSquares / errorSquares);
        campaign.Say($"claimed over true deviation of the mean: {ratio:F3}");
        campaign.Close();
        Assert.InRange(ratio, 1.0, 1.5);
    }

    private static StabilityFinding Judge(
        Func<double, double> signal, Func<double, double> temperature, double size = Size, ConverterLimits? converter = null,
        int count = 181, double interval = 1.0)
    {
        double[] times = Times(count, interval);
        var ofSignal = new WindowStatistics();
        var ofTemperature = new WindowStatistics();
        Assert.Equal(Status.Ok, Stability.Evaluate(times, Series(times, signal), 0, count, ofSignal));
        Assert.Equal(Status.Ok, Stability.Evaluate(times, Series(times, temperature), 0, count, ofTemperature));
        return Stability.Judge(ofSignal, ofTemperature, size, converter ?? new ConverterLimits(), Criterion);
    }

    private static double[] Times(int count, double interval = 1.0)
    {
        double[] times = new double[count];
        for (int i = 0; i < count; i++) { times[i] = i * interval; }
        return times;
    }

    private static double[] Series(double[] times, Func<double, double> value)
    {
        return Array.ConvertAll(times, t => value(t));
    }

    // Plus and minus in turn: a known scatter without a trend or a correlation.
    private static double Alternating(double time, double amplitude)
    {
        return (int)time % 2 == 0 ? amplitude : -amplitude;
    }

    private static double Noise(double time, double deviation)
    {
        return deviation * Draw.Gaussian(new Random(1000 + (int)time));
    }
}
