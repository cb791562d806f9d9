using ProbeCal.Core.Tests.Readings;
using Xunit;

namespace ProbeCal.Core.Tests.Probes;

public class MeterDisplayTests
{
    private const SolubilityEquation Equation = SolubilityEquation.BensonKrause1984;

    // 20.0 °C, 750 mmHg: 8.97 mg/L in fresh water and 8.73 at 8,000 µS/cm; uncompensated 7.50 is 83.6 % (USGS 2020, TM 9-A6.2).
    [Fact]
    public void MilligramsPerLitre_TurnedBack_IsTheFieldManualsSaturation()
    {
        double pressure = PressureUnits.HectopascalFromMillimetresOfMercury(750.0);
        MeterDisplay fresh = Meter(MeterScale.MilligramsPerLitre, 0.0);
        Assert.Equal(Status.Ok, fresh.Response(7.50, 20.0, pressure, 0.0, RangeRule.Refuse, out double partialPressure));
        Saturation.PercentLocal(partialPressure, 20.0, pressure, RangeRule.Refuse, out double percent);
        Assert.Equal(83.6, percent, 0.05);
        Assert.Equal(Status.Ok, fresh.Signal(Bench.Air(20.0, pressure), 20.0, pressure, 0.0, RangeRule.Refuse, out double shown));
        Assert.Equal(8.97, shown, 0.005);
    }

    [Fact]
    public void SalinitySetInTheMeter_IsTakenOutOnce()
    {
        // The same water, read by a meter set to its salinity and by one left at fresh water, then computed for S 35.
        double truth = 150.0;
        foreach (double set in new[] { 0.0, 20.0, 35.0 })
        {
            MeterDisplay meter = Meter(MeterScale.MilligramsPerLitre, set);
            Assert.Equal(Status.Ok, meter.Signal(truth, 12.0, 1000.0, 0.0, RangeRule.Refuse, out double shown));
            ProbeCalibration calibration = Nominal(meter);
            var reading = new Reading();
            Assert.Equal(Status.Ok, Correction.Correct(
                calibration, Bench.Conditions(), shown, 12.0, 1000.0, 35.0, 0.0, RangeRule.Refuse, reading));
            Assert.Equal(truth, reading.Value(ReadingQuantity.PartialPressure), 10);
            OxygenEquilibrium.ConcentrationFromPartialPressure(Equation, 12.0, 35.0, 1000.0, truth, RangeRule.Refuse, out double expected);
            Assert.Equal(expected, reading.Value(ReadingQuantity.MilligramsPerLitre), 10);
        }
    }

    [Theory]
    [InlineData(MeterScale.MilligramsPerLitre)]
    [InlineData(MeterScale.PercentLocal)]
    [InlineData(MeterScale.PercentOneAtmosphere)]
    public void Signal_UndoesResponse(MeterScale scale)
    {
        foreach (double set in new[] { double.NaN, 18.0 })
        {
            foreach (double pressureSet in new[] { double.NaN, 900.0 })
            {
                var meter = new MeterDisplay(
                    scale, Equation, 10.0, pressureSet, set, TemperatureCoefficientForm.Exponential, 0.03, 25.0, 0.0, 40.0);
                foreach (double shown in new[] { -0.3, 0.0, 4.2, 11.5 })
                {
                    Assert.Equal(Status.Ok, meter.Response(shown, 12.0, 1000.0, 0.0, RangeRule.Refuse, out double response));
                    Assert.Equal(Status.Ok, meter.Signal(response, 12.0, 1000.0, 0.0, RangeRule.Refuse, out double back));
                    Assert.Equal(shown, back, 12);
                }
            }
        }
    }

    [Fact]
    public void PercentScales_UseThePressureThatTheMeterUses()
    {
        Assert.Equal(Status.Ok, Meter(MeterScale.PercentLocal, 0.0).Response(100.0, 20.0, 850.0, 0.0, RangeRule.Refuse, out double own));
        Assert.Equal(Bench.Air(20.0, 850.0), own, 11);
        var set = new MeterDisplay(
            MeterScale.PercentLocal, Equation, 0.0, 1000.0, double.NaN, TemperatureCoefficientForm.Exponential, 0.03, 25.0, 0.0, 40.0);
        Assert.Equal(Status.Ok, set.Response(100.0, 20.0, 850.0, 0.0, RangeRule.Refuse, out double fromSet));
        Assert.Equal(Bench.Air(20.0, 1000.0), fromSet, 11);
        Assert.Equal(Status.Ok, Meter(MeterScale.PercentOneAtmosphere, 0.0).Response(100.0, 20.0, 850.0, 0.0, RangeRule.Refuse, out double standard));
        Assert.Equal(Bench.Air(20.0, 1013.25), standard, 11);
    }

    [Fact]
    public void MissingPressure_SpoilsOnlyTheMeterThatNeedsIt()
    {
        Assert.Equal(Status.PressureNotFinite, Meter(MeterScale.PercentLocal, 0.0).Response(90.0, 20.0, double.NaN, 0.0, RangeRule.Refuse, out double value));
        Assert.True(double.IsNaN(value));
        Assert.Equal(Status.Ok, Meter(MeterScale.MilligramsPerLitre, 0.0).Response(8.0, 20.0, double.NaN, 0.0, RangeRule.Refuse, out _));
        Assert.Equal(Status.Ok, Meter(MeterScale.PercentOneAtmosphere, 0.0).Response(90.0, 20.0, double.NaN, 0.0, RangeRule.Refuse, out _));
        Assert.Equal(Status.CoefficientUnknown, Meter((MeterScale)0, 0.0).Response(90.0, 20.0, 1000.0, 0.0, RangeRule.Refuse, out _));
    }

    [Fact]
    public void TemperatureSetByHand_CompensatesTheMembraneAtTheWatersTemperature()
    {
        // A meter told 20 °C in water of 10 °C: its membrane gives exp(0.03·(10 − 20)) of the current it expects.
        var meter = new MeterDisplay(
            MeterScale.PercentOneAtmosphere, Equation, 0.0, double.NaN, 20.0, TemperatureCoefficientForm.Exponential, 0.03, 25.0, 0.0, 40.0);
        Assert.Equal(Status.Ok, meter.Gain(10.0, RangeRule.Refuse, out double gain));
        Assert.Equal(0.74081822068171786, gain, 13);
        Assert.Equal(Status.Ok, Meter(MeterScale.PercentOneAtmosphere, 0.0).Gain(10.0, RangeRule.Refuse, out double own));
        Assert.Equal(1.0, own);
        Assert.Equal(Status.TemperatureAboveRange, meter.Gain(41.0, RangeRule.Refuse, out gain));
        Assert.True(double.IsNaN(gain));
        Assert.Equal(Status.TemperatureAboveRange, Meter(MeterScale.PercentOneAtmosphere, 0.0).Gain(41.0, RangeRule.Refuse, out own));
        Assert.True(double.IsNaN(own));
        Assert.Equal(Status.TemperatureAboveRange, Meter(MeterScale.PercentOneAtmosphere, 0.0).Gain(41.0, RangeRule.Extrapolate, out own));
        Assert.Equal(1.0, own);
    }

    private static MeterDisplay Meter(MeterScale scale, double salinity)
    {
        return new MeterDisplay(
            scale, Equation, salinity, double.NaN, double.NaN, TemperatureCoefficientForm.Exponential, 0.03, 25.0, 0.0, 40.0);
    }

    private static ProbeCalibration Nominal(MeterDisplay meter)
    {
        Assert.Equal(Status.Ok, meter.Signal(Bench.Air(20.0, 1000.0), 20.0, 1000.0, 0.0, RangeRule.Refuse, out double shown));
        ProbeCalibration made = Bench.Calibrate(meter, Bench.WaterPoint(shown, 20.0, 1000.0), new ZeroPoint(false, 0.0, 0.0, 20.0, 1000.0));
        Assert.Equal(1.0, made.Slope, 13);
        return made;
    }
}
