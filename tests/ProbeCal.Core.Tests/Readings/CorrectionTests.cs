using System;
using Xunit;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>What a bad input spoils, and what it leaves standing.</summary>
public class CorrectionTests
{
    private static readonly ReadingQuantity[] All = Enum.GetValues<ReadingQuantity>();
    private static readonly ReadingQuantity[] Concentrations =
        [ReadingQuantity.MilligramsPerLitre, ReadingQuantity.MicromolesPerLitre, ReadingQuantity.MicromolesPerKilogram];

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity)]
    public void BadTemperature_SpoilsEverything(double temperature)
    {
        foreach (RangeRule rule in Enum.GetValues<RangeRule>())
        {
            Reading reading = Correct(50.0, temperature, 1000.0, 0.0, rule);
            foreach (ReadingQuantity quantity in All) { AssertRefused(reading, quantity, Status.TemperatureNotFinite); }
        }
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity)]
    public void BadSignal_SpoilsEverything(double signal)
    {
        Reading reading = Correct(signal, 15.0, 1000.0, 0.0, RangeRule.Extrapolate);
        foreach (ReadingQuantity quantity in All) { AssertRefused(reading, quantity, Status.SignalNotFinite); }
        Assert.Equal(Status.SignalNotFinite, reading.UncertaintyStatus);
    }

    [Theory]
    [InlineData(double.NaN, Status.SalinityNotFinite)]
    [InlineData(double.NegativeInfinity, Status.SalinityNotFinite)]
    [InlineData(-0.1, Status.SalinityBelowRange)]
    [InlineData(43.0, Status.SalinityAboveRange)]
    public void BadSalinity_SpoilsOnlyConcentrations(double salinity, Status expected)
    {
        Reading good = Correct(50.0, 15.0, 1000.0, 0.0, RangeRule.Refuse);
        Reading reading = Correct(50.0, 15.0, 1000.0, salinity, RangeRule.Refuse);
        foreach (ReadingQuantity quantity in All)
        {
            if (Array.IndexOf(Concentrations, quantity) < 0) { AssertSame(good, reading, quantity); }
            else { AssertRefused(reading, quantity, expected); }
        }

        Assert.Equal(Status.Ok, reading.UncertaintyStatus);
    }

    [Theory]
    [InlineData(double.NaN, Status.PressureNotFinite)]
    [InlineData(double.PositiveInfinity, Status.PressureNotFinite)]
    [InlineData(300.0, Status.PressureBelowRange)]
    [InlineData(1200.0, Status.PressureAboveRange)]
    public void BadPressure_SpoilsOnlyPercentOfLocalPressure(double pressure, Status expected)
    {
        Reading good = Correct(50.0, 15.0, 1013.25, 0.0, RangeRule.Refuse);
        Reading reading = Correct(50.0, 15.0, pressure, 0.0, RangeRule.Refuse);
        AssertRefused(reading, ReadingQuantity.PercentLocal, expected);
        AssertSame(good, reading, ReadingQuantity.PartialPressure);
        AssertSame(good, reading, ReadingQuantity.PercentOneAtmosphere);
        foreach (ReadingQuantity quantity in Concentrations)
        {
            Assert.Equal(Status.Ok, reading.StatusOf(quantity));
            Assert.Equal(good.Value(quantity), reading.Value(quantity));
            Assert.InRange(reading.StandardUncertainty(quantity) / good.StandardUncertainty(quantity), 1.0, 1.001);
        }
    }

    [Fact]
    public void OutsideTheFittedRange_IsRefused_OrComputedAndFlagged()
    {
        foreach (ReadingQuantity quantity in All)
        {
            AssertRefused(Correct(50.0, 40.5, 1000.0, 0.0, RangeRule.Refuse), quantity, Status.TemperatureAboveRange);
            Reading reading = Correct(50.0, 40.5, 1000.0, 0.0, RangeRule.Extrapolate);
            Assert.Equal(Status.TemperatureAboveRange, reading.StatusOf(quantity));
            Assert.True(double.IsFinite(reading.Value(quantity)));
            Assert.True(reading.StandardUncertainty(quantity) > 0.0);
        }
    }

    /// <summary>
    /// A thermistor at the end of the equation's range: up to 0.2 K outside everything is computed and named, and the concentrations' uncertainty holds what the temperature alone would change
    /// them by over the distance outside, in quadrature.
    /// </summary>
    [Theory]
    [InlineData(-0.15, Status.TemperatureJustBelowRange, 0.15)]
    [InlineData(-0.2, Status.TemperatureJustBelowRange, 0.2)]
    [InlineData(40.12, Status.TemperatureJustAboveRange, 0.12)]
    public void NearTheEdge_IsComputedNamedAndLessCertain(double temperature, Status expected, double outside)
    {
        Reading reading = Correct(50.0, temperature, 1000.0, 0.0, RangeRule.NearEdge);
        Reading extrapolated = Correct(50.0, temperature, 1000.0, 0.0, RangeRule.Extrapolate);
        foreach (ReadingQuantity quantity in All)
        {
            Assert.Equal(expected, reading.StatusOf(quantity));
            Assert.Equal(extrapolated.Value(quantity), reading.Value(quantity));
            Assert.True(reading.StandardUncertainty(quantity) > 0.0);
        }

        // The slope of ln(mg/L per hPa) by differences, at the reading.
        OxygenEquilibrium.ConcentrationFromPartialPressure(SolubilityEquation.BensonKrause1984, temperature + 0.01, 0.0, 1000.0, 1.0, RangeRule.Extrapolate, out double up);
        OxygenEquilibrium.ConcentrationFromPartialPressure(SolubilityEquation.BensonKrause1984, temperature - 0.01, 0.0, 1000.0, 1.0, RangeRule.Extrapolate, out double down);
        BensonKrause1984.MilligramsPerLitre(temperature + 0.01, 0.0, 1013.25, RangeRule.Extrapolate, out double high);
        BensonKrause1984.MilligramsPerLitre(temperature - 0.01, 0.0, 1013.25, RangeRule.Extrapolate, out double low);
        double slope = Math.Log(high / low) / 0.02;
        Assert.True(slope < 0.0 && up < down);
        foreach (ReadingQuantity quantity in Concentrations)
        {
            double equation = reading.Contribution(UncertaintySource.Equation, quantity) / reading.Value(quantity);
            Assert.Equal(Math.Sqrt((0.001 * 0.001) + (slope * outside * slope * outside)), equation, 1.0e-5);
        }
    }

    /// <summary>Further outside the concentrations are refused with the input's name; partial pressure and saturation stay, as extrapolated before.</summary>
    [Theory]
    [InlineData(-0.21, Status.TemperatureBelowRange)]
    [InlineData(40.5, Status.TemperatureAboveRange)]
    public void BeyondTheEdge_ConcentrationsAreRefusedAndPartialPressureStays(double temperature, Status expected)
    {
        Reading reading = Correct(50.0, temperature, 1000.0, 0.0, RangeRule.NearEdge);
        Reading extrapolated = Correct(50.0, temperature, 1000.0, 0.0, RangeRule.Extrapolate);
        foreach (ReadingQuantity quantity in All)
        {
            if (Array.IndexOf(Concentrations, quantity) >= 0)
            {
                AssertRefused(reading, quantity, expected);
                // No contribution stands beside a value that is not there, but those that are nothing.
                foreach (UncertaintySource source in Enum.GetValues<UncertaintySource>())
                {
                    Assert.False(Math.Abs(reading.Contribution(source, quantity)) > 0.0, $"{source} of {quantity}");
                }

                continue;
            }

            Assert.Equal(expected, reading.StatusOf(quantity));
            Assert.Equal(extrapolated.Value(quantity), reading.Value(quantity));
            Assert.Equal(extrapolated.StandardUncertainty(quantity), reading.StandardUncertainty(quantity));
        }
    }

    /// <summary>Inside every range the rule changes nothing.</summary>
    [Fact]
    public void InRange_NearEdgeChangesNothing()
    {
        Reading refuse = Correct(50.0, 15.0, 1000.0, 0.0, RangeRule.Refuse);
        Reading near = Correct(50.0, 15.0, 1000.0, 0.0, RangeRule.NearEdge);
        foreach (ReadingQuantity quantity in All) { AssertSame(refuse, near, quantity); }
    }

    [Fact]
    public void AnoxicWater_GivesANegativeValue_NotAClippedOne()
    {
        Reading reading = Correct(Bench.Zero - 0.1, 15.0, 1000.0, 0.0, RangeRule.Refuse);
        foreach (ReadingQuantity quantity in All)
        {
            Assert.Equal(Status.Ok, reading.StatusOf(quantity));
            Assert.True(reading.Value(quantity) < 0.0);
            Assert.True(reading.StandardUncertainty(quantity) > 0.0);
        }
    }

    [Fact]
    public void PartialPressureBeyondPureOxygen_HasNoConcentration()
    {
        Reading reading = Correct(1000.0, 15.0, 1000.0, 0.0, RangeRule.Refuse);
        Assert.Equal(Status.Ok, reading.StatusOf(ReadingQuantity.PartialPressure));
        AssertRefused(reading, ReadingQuantity.MilligramsPerLitre, Status.PartialPressureAboveRange);
        AssertRefused(reading, ReadingQuantity.PercentLocal, Status.PartialPressureAboveRange);
    }

    [Fact]
    public void BadUncertainty_LeavesTheValues()
    {
        ProbeCalibration calibration = Calibration();
        var reading = new Reading();
        Assert.Equal(Status.Ok, Correction.Correct(
            calibration, Bench.Conditions(signalUncertainty: double.NaN), 50.0, 15.0, 1000.0, 0.0, 0.0, RangeRule.Refuse, reading));
        Assert.Equal(Status.UncertaintyNotFinite, reading.UncertaintyStatus);
        Assert.True(double.IsFinite(reading.Value(ReadingQuantity.MilligramsPerLitre)));
        Assert.True(double.IsNaN(reading.StandardUncertainty(ReadingQuantity.MilligramsPerLitre)));
        Correction.Correct(
            calibration, Bench.Conditions(pressure: -1.0), 50.0, 15.0, 1000.0, 0.0, 0.0, RangeRule.Refuse, reading);
        Assert.Equal(Status.UncertaintyBelowRange, reading.UncertaintyStatus);
    }

    [Fact]
    public void ReusedReading_KeepsNothingOfTheOneBefore()
    {
        ProbeCalibration calibration = Calibration();
        var reading = new Reading();
        Correction.Correct(calibration, Bench.Conditions(), 50.0, 15.0, 1000.0, 0.0, 0.0, RangeRule.Refuse, reading);
        Correction.Correct(calibration, Bench.Conditions(), 50.0, 15.0, 1000.0, double.NaN, 0.0, RangeRule.Refuse, reading);
        AssertRefused(reading, ReadingQuantity.MilligramsPerLitre, Status.SalinityNotFinite);
        Assert.True(double.IsNaN(reading.Contribution(UncertaintySource.Zero, ReadingQuantity.MilligramsPerLitre)));
        Correction.Correct(calibration, Bench.Conditions(), 50.0, double.NaN, 1000.0, 0.0, 0.0, RangeRule.Refuse, reading);
        foreach (ReadingQuantity quantity in All) { AssertRefused(reading, quantity, Status.TemperatureNotFinite); }
    }

    [Fact]
    public void GarciaGordon_GivesItsOwnContent()
    {
        ProbeCalibration calibration = Calibration();
        double raw = Bench.Signal(Bench.Probe(), Bench.Slope, Bench.Zero, 1.0, 10.0, 1013.25, Bench.Air(10.0, 1013.25));
        var reading = new Reading();
        Correction.Correct(
            calibration, Bench.Conditions(equation: SolubilityEquation.GarciaGordon1992), raw, 10.0, 1013.25, 35.0, 0.0, RangeRule.Refuse, reading);
        GarciaGordon1992.MicromolesPerKilogram(10.0, 35.0, 1013.25, RangeRule.Refuse, out double expected);
        Assert.Equal(1.0, reading.Value(ReadingQuantity.MicromolesPerKilogram) / expected, 12);
    }

    [Fact]
    public void StirringMismatch_IsSeen()
    {
        var zero = new ZeroPoint(true, Bench.Zero, 0.0, 20.0, 1013.25);
        ProbeCalibration stirred = Bench.Calibrate(Bench.Probe(), Bench.WaterPoint(60.0, 20.0, 1013.25), zero);
        Assert.False(Water(Stirring.Stirred).IsStirringMismatch(stirred));
        Assert.True(Water(Stirring.Still).IsStirringMismatch(stirred));
        Assert.False(Water(Stirring.FlowInsensitive).IsStirringMismatch(stirred));
        ProbeCalibration air = Bench.Calibrate(
            Bench.Probe(), new CalibrationPoint(CalibrationMethod.WaterSaturatedAir, 60.0, 0.0, 20.0, 0.0, 1013.25, 0.0, Stirring.Still, 1.0, 1.0, 0.0, 0.0), zero);
        Assert.False(Water(Stirring.Stirred).IsStirringMismatch(air));
        Assert.True(Water(Stirring.Still).IsStirringMismatch(air));
    }

    [Fact]
    public void Correct_AllocatesNothing()
    {
        ProbeCalibration calibration = Calibration();
        ReadingConditions conditions = Bench.Conditions(0.05, true, 0.0, 0.03, 0.8, 0.25, 0.01);
        var reading = new Reading();
        Correction.Correct(calibration, conditions, 50.0, 15.0, 1000.0, 5.0, 0.0, RangeRule.Refuse, reading);
        long before = GC.GetAllocatedBytesForCurrentThread();
        for (int i = 0; i < 1000; i++)
        {
            Correction.Correct(calibration, conditions, 50.0 + (0.01 * i), 15.0, 1000.0, 5.0, 0.0, RangeRule.Refuse, reading);
        }

        Assert.Equal(0L, GC.GetAllocatedBytesForCurrentThread() - before);
        Assert.Equal(Status.Ok, reading.UncertaintyStatus);
    }

    private static ReadingConditions Water(Stirring stirring)
    {
        return new ReadingConditions(SolubilityEquation.BensonKrause1984, 0.0, true, 0.0, 0.0, 0.0, 0.0, stirring, 1.0, 0.0);
    }

    private static ProbeCalibration Calibration()
    {
        double signal = Bench.Signal(Bench.Probe(), Bench.Slope, Bench.Zero, 1.0, 20.0, 1013.25, Bench.Air(20.0, 1013.25));
        return Bench.Calibrate(
            Bench.Probe(), Bench.WaterPoint(signal, 20.0, 1013.25, 0.05, 0.03, 0.8, 0.0075), new ZeroPoint(true, Bench.Zero, 0.02, 20.0, 1013.25), 0.1, 0.00024);
    }

    private static Reading Correct(double signal, double temperature, double pressure, double salinity, RangeRule rule)
    {
        var reading = new Reading();
        Correction.Correct(
            Calibration(), Bench.Conditions(0.05, true, 0.0, 0.03, 0.8, 0.25, 0.01), signal, temperature, pressure, salinity, 0.0, rule, reading);
        return reading;
    }

    private static void AssertRefused(Reading reading, ReadingQuantity quantity, Status expected)
    {
        Assert.Equal(expected, reading.StatusOf(quantity));
        Assert.True(double.IsNaN(reading.Value(quantity)));
        Assert.True(double.IsNaN(reading.StandardUncertainty(quantity)));
    }

    private static void AssertSame(Reading expected, Reading actual, ReadingQuantity quantity)
    {
        Assert.Equal(Status.Ok, actual.StatusOf(quantity));
        Assert.Equal(expected.Value(quantity), actual.Value(quantity));
        Assert.Equal(expected.StandardUncertainty(quantity), actual.StandardUncertainty(quantity));
    }
}
