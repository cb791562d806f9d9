using System;
using System.Collections.Generic;
using Xunit;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>
/// Probes whose responses themselves follow the temperature (luminescence, a residual current with a temperature coefficient), calibrated by a 100 % point and a zero: slope and reading
/// against difference quotients of the whole chain, by the thermometer of the calibration and by another.
/// </summary>
public class TemperatureInResponseTests
{
    private const double ZeroCelsius = 18.0;
    private const double Pressure = 985.0;
    private const double UOffset = 0.2;
    private const double UAtPoint = 0.03;

    private static readonly Dictionary<string, (IProbeModel Model, double Zero, double Slope)> Probes = new()
    {
        ["phase"] = (new SternVolmerProbe(LuminescenceSignal.PhaseDegrees, TemperatureCoefficientForm.Exponential, 0.01, 0, 0, -0.003, 1e-5, 0, 20, 0, 40), 0.6, 0.009),
        ["lifetime"] = (new SternVolmerProbe(LuminescenceSignal.Lifetime, TemperatureCoefficientForm.Linear, 0.01, 0, 0, -0.003, 0, 0, 20, 0, 40), 0.02, 0.0003),
        ["film"] = (Core.Tests.Probes.ProbeModelTests.Bittig(0), 0.3, 1.02),
        ["residual current"] = (new AmperometricProbe(TemperatureCoefficientForm.Exponential, 0.03, 0, 0, 25, 0, 40, 0, 1.5, 0.06, 1), 0.1, 0.31),
    };

    public static TheoryData<string, double> Cases()
    {
        TheoryData<string, double> cases = [];
        foreach (string name in Probes.Keys)
        {
            foreach (double hectopascal in new[] { 1.0, 90.0, 210.0 }) { cases.Add(name, hectopascal); }
        }

        return cases;
    }

    [Theory]
    [MemberData(nameof(Cases))]
    public void AnOffsetOfTheThermometer_CountsAtPointZeroAndReading(string name, double hectopascal)
    {
        double signal = Signal(name, hectopascal, 9);
        double atPoint = PerUnit(by => Read(name, signal, then: by, zero: 0, now: 0));
        double atZero = PerUnit(by => Read(name, signal, then: 0, zero: by, now: 0));
        double atReading = PerUnit(by => Read(name, signal, then: 0, zero: 0, now: by));
        Assert.NotEqual(0, atZero);

        Reading same = Correct(name, signal, isSame: true);
        // Central differences: the third derivative times the step squared.
        Near((atPoint + atZero + atReading) * UOffset, same.Contribution(UncertaintySource.ThermometerOffset, ReadingQuantity.PartialPressure), same);
        Near(Math.Abs(atPoint) * UAtPoint, Math.Abs(same.Contribution(UncertaintySource.TemperatureAtCalibration, ReadingQuantity.PartialPressure)), same);

        // Another thermometer reads now: what the first was off by stays in point and zero, the second's own error is in the reading alone.
        Reading other = Correct(name, signal, isSame: false);
        Assert.Equal(0, other.Contribution(UncertaintySource.ThermometerOffset, ReadingQuantity.PartialPressure));
        double expected = Math.Sqrt(Math.Pow((atPoint + atZero) * UOffset, 2) + Math.Pow(atPoint * UAtPoint, 2));
        Near(expected, Math.Abs(other.Contribution(UncertaintySource.TemperatureAtCalibration, ReadingQuantity.PartialPressure)), other);
    }

    [Theory]
    [InlineData("phase")]
    [InlineData("lifetime")]
    [InlineData("film")]
    [InlineData("residual current")]
    public void TheSlope_FollowsTheThermometerAsStated(string name)
    {
        ProbeCalibration calibration = Calibrate(name, 0, 0);
        double atPoint = PerUnit(by => Math.Log(Calibrate(name, by, 0).Slope));
        double atZero = PerUnit(by => Math.Log(Calibrate(name, 0, by).Slope));
        Assert.Equal((atPoint + atZero) * UOffset, calibration.SlopeContribution(UncertaintySource.ThermometerOffset), 1e-8);
        Assert.Equal(atPoint * UAtPoint, calibration.SlopeContribution(UncertaintySource.TemperatureAtCalibration), 1e-8);
    }

    [Theory]
    [InlineData(ReadingQuantity.MilligramsPerLitre)]
    [InlineData(ReadingQuantity.PercentLocal)]
    [InlineData(ReadingQuantity.PercentOneAtmosphere)]
    public void AtDepth_TemperatureCountsThroughTheWaterAbove(ReadingQuantity quantity)
    {
        // 1000 dbar: 14 % more partial pressure at the probe, which warms away by 0.05 % per kelvin.
        ProbeCalibration calibration = Calibrate("residual current", 0, 0);
        Reading Now(double celsius)
        {
            var reading = new Reading();
            Assert.Equal(Status.Ok, Correction.Correct(calibration, Bench.Conditions(temperature: 0.1), 40, celsius, Pressure, 5, 1000, RangeRule.Refuse, reading));
            return reading;
        }

        double perKelvin = PerUnit(by => Now(9 + by).Value(quantity));
        Reading middle = Now(9);
        Assert.Equal(perKelvin * 0.1, middle.Contribution(UncertaintySource.TemperatureAtReading, quantity), 1e-6 * Math.Abs(perKelvin));
    }

    [Fact]
    public void TheZeroOfAFit_HasItsVarianceAndBothSharedInputs()
    {
        var fit = new FittedResponse(0.4, 0.31, 0, 0.0009, 0, 1e-6, 0, 0, 0, 0.2, 0, 0, 15, 0, 0, 0, 210);
        Assert.Equal(Status.Ok, ProbeCalibration.CreateFitted(Bench.Probe(), Gas.Oxygen, fit, Stirring.Stirred, 1, 0.1, 0.002, out ProbeCalibration? made));
        Assert.Equal(Math.Sqrt(0.0009 + (0.02 * 0.02) + (0.03 * 0.03)), made!.ZeroResponseUncertainty, 1e-14);
        Assert.Equal(0.001 / 0.31, made.SlopeContribution(UncertaintySource.Fit), 1e-14);
    }

    [Theory]
    [InlineData(0.0009, 1e-6, 3.1e-5)]
    [InlineData(0.0009, 1e-6, -3.1e-5)]
    public void ACovarianceThatItsVariancesDoNotAllow_IsRefused(double varianceZero, double varianceSlope, double covariance)
    {
        // The most that the two variances allow is 3e-5.
        var fit = new FittedResponse(0.4, 0.31, 0, varianceZero, covariance, varianceSlope, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 210);
        Assert.Equal(Status.UncertaintyAboveRange, ProbeCalibration.CreateFitted(Bench.Probe(), Gas.Oxygen, fit, Stirring.Stirred, 1, 0, 0, out _));
    }

    [Fact]
    public void APressureCoefficient_IsPerHundredDecibar()
    {
        var probe = new AmperometricProbe(TemperatureCoefficientForm.Exponential, 0.03, 0, 0, 25, 0, 40, -0.02, 0.5, 0, 1);
        Assert.Equal(Status.Ok, probe.Response(10.5, 25, double.NaN, 250, RangeRule.Refuse, out double response));
        // 10 without the residual, and the signal is short of 2 % for each 100 dbar.
        Assert.Equal(10 / 0.95, response, 1e-14 * response);
    }

    private static double PerUnit(Func<double, double> f)
    {
        const double Step = 1e-3;
        return (f(Step) - f(-Step)) / (2 * Step);
    }

    private static void Near(double expected, double actual, Reading reading)
    {
        Assert.Equal(expected, actual, 1e-6 * reading.StandardUncertainty(ReadingQuantity.PartialPressure));
    }

    private static double Signal(string name, double hectopascal, double celsius)
    {
        (IProbeModel model, double zero, double slope) = Probes[name];
        return Bench.Signal(model, slope, zero, 1, celsius, Pressure, hectopascal);
    }

    /// <summary>The calibration that comes of it when the thermometer is off at the point and at the zero.</summary>
    private static ProbeCalibration Calibrate(string name, double then, double zero)
    {
        (IProbeModel model, _, _) = Probes[name];
        return Bench.Calibrate(
            model, Bench.WaterPoint(Signal(name, Bench.Air(21, Pressure), 21), 21 + then, Pressure, temperatureUncertainty: UAtPoint),
            new ZeroPoint(true, Signal(name, 0, ZeroCelsius), 0, ZeroCelsius + zero, Pressure), UOffset);
    }

    private static double Read(string name, double signal, double then, double zero, double now)
    {
        Assert.Equal(Status.Ok, Correction.PartialPressure(Calibrate(name, then, zero), 1, signal, 9 + now, Pressure, 0, RangeRule.Refuse, out double value));
        return value;
    }

    private static Reading Correct(string name, double signal, bool isSame)
    {
        var reading = new Reading();
        Assert.Equal(Status.Ok, Correction.Correct(
            Calibrate(name, 0, 0), Bench.Conditions(sameThermometer: isSame, offset: 0.05), signal, 9, Pressure, 0, 0, RangeRule.Refuse, reading));
        return reading;
    }
}
