using Xunit;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>Forward model, calibration and correction undo each other: what the simulated water held comes out again.</summary>
public class ClosedLoopTests
{
    [Theory]
    [InlineData(20.0, 1013.25, 8.0, 0.0, 180.0)]
    [InlineData(5.0, 950.0, 30.0, 35.0, 60.0)]
    [InlineData(35.0, 640.0, 1.0, 10.0, 250.0)]
    [InlineData(15.0, 1013.25, 15.0, 0.0, 0.0)]
    [InlineData(15.0, 1013.25, 15.0, 0.0, -1.5)]
    public void TwoPoint_AirSaturatedWater_GivesBackTheTruth(
        double calibrationTemperature, double calibrationPressure, double temperature, double salinity, double truth)
    {
        AmperometricProbe probe = Bench.Probe();
        double air = Bench.Air(calibrationTemperature, calibrationPressure);
        double signal = Bench.Signal(probe, Bench.Slope, Bench.Zero, 1.0, calibrationTemperature, calibrationPressure, air);
        ProbeCalibration calibration = Bench.Calibrate(
            probe,
            Bench.WaterPoint(signal, calibrationTemperature, calibrationPressure),
            new ZeroPoint(true, Bench.Zero, 0.0, calibrationTemperature, calibrationPressure));
        Assert.Equal(Bench.Slope, calibration.Slope, 14);

        double raw = Bench.Signal(probe, Bench.Slope, Bench.Zero, 1.0, temperature, 1000.0, truth);
        var reading = new Reading();
        Assert.Equal(Status.Ok, Correction.Correct(
            calibration, Bench.Conditions(), raw, temperature, 1000.0, salinity, 0.0, RangeRule.Refuse, reading));

        Assert.Equal(truth, reading.Value(ReadingQuantity.PartialPressure), 10);
        OxygenEquilibrium.ConcentrationFromPartialPressure(
            SolubilityEquation.BensonKrause1984, temperature, salinity, 1000.0, truth, RangeRule.Refuse, out double milligrams);
        Assert.Equal(milligrams, reading.Value(ReadingQuantity.MilligramsPerLitre), 11);
        Assert.Equal(milligrams * 1000.0 / 31.9988, reading.Value(ReadingQuantity.MicromolesPerLitre), 9);
        Assert.Equal(100.0 * truth / Bench.Air(temperature, 1000.0), reading.Value(ReadingQuantity.PercentLocal), 10);
        Assert.Equal(100.0 * truth / Bench.Air(temperature, 1013.25), reading.Value(ReadingQuantity.PercentOneAtmosphere), 10);
        for (int i = 0; i < Reading.QuantityCount; i++) { Assert.Equal(Status.Ok, reading.StatusOf((ReadingQuantity)i)); }
    }
}
