using System;
using Xunit;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>What days add to the uncertainty of a reading.</summary>
public class ReadingGrowthTests
{
    private static Reading Corrected()
    {
        Reading reading = new();
        Assert.Equal(Status.Ok, Correction.Correct(Bench.Calibrate(Bench.Probe(), Bench.WaterPoint(60.0, 20.0, 1013.25, 0.05, 0.03, 0.8, 0.0075), new ZeroPoint(true, Bench.Zero, 0.02, 20.0, 1013.25), 0.1, 0.00024), Bench.Conditions(0.05), 50.0, 15.0, 1000.0, 0.0, 0.0, RangeRule.Refuse, reading));
        return reading;
    }

    private static Status Add(UncertaintySource source, double rate, double days, Reading reading)
    {
        return source == UncertaintySource.Drift ? ReadingGrowth.AddDrift(rate, days, reading) : ReadingGrowth.AddFouling(rate, days, reading);
    }

    /// <summary>Root of the sum of squares, by the test's own arithmetic, for every quantity; values stay to the bit.</summary>
    [Theory]
    [InlineData(UncertaintySource.Drift, 0.0005, 30.0)]
    [InlineData(UncertaintySource.Fouling, 0.004, 12.5)]
    public void Contribution_IsRateTimesDaysTimesValue(UncertaintySource source, double rate, double days)
    {
        Reading before = Corrected();
        Reading after = Corrected();
        Assert.Equal(Status.Ok, Add(source, rate, days, after));
        for (int i = 0; i < Reading.QuantityCount; i++)
        {
            ReadingQuantity quantity = (ReadingQuantity)i;
            Assert.Equal(before.Value(quantity), after.Value(quantity));
            double added = rate * days * before.Value(quantity);
            Assert.Equal(added, after.Contribution(source, quantity), 12);
            double expected = Math.Sqrt((before.StandardUncertainty(quantity) * before.StandardUncertainty(quantity)) + (added * added));
            Assert.Equal(1.0, after.StandardUncertainty(quantity) / expected, 12);
        }
    }

    [Fact]
    public void DayZero_AddsNothing_ToTheBit()
    {
        Reading before = Corrected();
        Reading after = Corrected();
        Assert.Equal(Status.Ok, ReadingGrowth.AddDrift(0.01, 0.0, after));
        for (int i = 0; i < Reading.QuantityCount; i++)
        {
            Assert.Equal(before.StandardUncertainty((ReadingQuantity)i), after.StandardUncertainty((ReadingQuantity)i));
        }
    }

    /// <summary>
    /// The published analyser: −0.0079 mg/L a day at 8.95 mg/L (Helm et al. 2018, Environ. Monit. Assess. 190:313, supplement). Taken as
    /// a relative standard uncertainty it is 0.0079/8.95 a day; after 30 days 0.237 mg/L at that value, which is the drift itself.
    /// </summary>
    [Fact]
    public void PublishedDrift_OfAMonth()
    {
        Reading reading = Corrected();
        Assert.Equal(Status.Ok, ReadingGrowth.AddDrift(0.0079 / 8.95, 30, reading));
        double share = reading.Contribution(UncertaintySource.Drift, ReadingQuantity.MilligramsPerLitre) / reading.Value(ReadingQuantity.MilligramsPerLitre);
        Assert.Equal(0.237, share * 8.95, 9);
    }

    [Theory]
    [InlineData(UncertaintySource.Drift, -0.001, 1.0, Status.CoefficientBelowRange)]
    [InlineData(UncertaintySource.Drift, double.NaN, 1.0, Status.CoefficientNotFinite)]
    [InlineData(UncertaintySource.Drift, double.PositiveInfinity, 1.0, Status.CoefficientNotFinite)]
    [InlineData(UncertaintySource.Fouling, 0.001, -1.0, Status.UncertaintyBelowRange)]
    [InlineData(UncertaintySource.Fouling, 0.001, double.NaN, Status.UncertaintyNotFinite)]
    [InlineData(UncertaintySource.Fouling, 1e300, 1e300, Status.UncertaintyAboveRange)]
    public void Refused_LeavesTheReadingAsItWas(UncertaintySource source, double rate, double days, Status expected)
    {
        Reading before = Corrected();
        Reading after = Corrected();
        Assert.Equal(expected, Add(source, rate, days, after));
        Assert.Equal(before.StandardUncertainty(ReadingQuantity.MilligramsPerLitre), after.StandardUncertainty(ReadingQuantity.MilligramsPerLitre));
    }

    [Fact]
    public void NoReading_NoGrowth()
    {
        Reading reading = new();
        Assert.NotEqual(Status.Ok, ReadingGrowth.AddDrift(0.001, 1.0, reading));
        Assert.True(double.IsNaN(reading.StandardUncertainty(ReadingQuantity.PartialPressure)));
    }

    [Fact]
    public void Allocates_Nothing()
    {
        Reading reading = Corrected();
        ReadingGrowth.AddDrift(0.001, 1.0, reading);
        long before = GC.GetAllocatedBytesForCurrentThread();
        for (int i = 0; i < 1000; i++)
        {
            ReadingGrowth.AddFouling(0.001, i, reading);
        }

        Assert.Equal(0, GC.GetAllocatedBytesForCurrentThread() - before);
    }
}
