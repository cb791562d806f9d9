using System;
using Xunit;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>Every contribution against a difference quotient of the whole chain, calibration and correction together.</summary>
public class ReadingUncertaintyTests
{
    // The chain's inputs, each to be shifted alone.
    private sealed class Inputs
    {
        public double CalibrationSignal = 58.0;
        public double CalibrationTemperature = 21.0;
        public double CalibrationPressure = 985.0;
        public double Ratio = 1.02;
        public double State = 1.0;
        public double ZeroSignal = 0.4;
        public double Coefficient = 0.031;
        public double Flow = 1.0;
        public double Signal = 35.0;
        public double Temperature = 9.0;
        public double Pressure = 1002.0;
        public double Salinity = 12.0;
    }

    private const double UOffset = 0.1;
    private const double UTemperatureAtPoint = 0.03;
    private const double UTemperature = 0.04;
    private const double UPressureAtPoint = 0.8;
    private const double UPressure = 1.1;
    private const double USalinity = 0.25;
    private const double USignalAtPoint = 0.06;
    private const double USignal = 0.08;
    private const double UZero = 0.05;
    private const double UCoefficient = 0.0004;
    private const double URatio = 0.015;
    private const double UState = 0.0075;
    private const double UStirring = 0.01;

    [Theory]
    [InlineData(SolubilityEquation.BensonKrause1984, TemperatureCoefficientForm.Exponential, 0.031)]
    [InlineData(SolubilityEquation.GarciaGordon1992, TemperatureCoefficientForm.Arrhenius, 22000.0)]
    [InlineData(SolubilityEquation.BensonKrause1984, TemperatureCoefficientForm.Linear, 0.02)]
    [InlineData(SolubilityEquation.BensonKrause1984, TemperatureCoefficientForm.Compound, 0.04)]
    public void Contributions_AreTheChainsDerivatives(SolubilityEquation equation, TemperatureCoefficientForm form, double coefficient)
    {
        double uCoefficient = coefficient * (UCoefficient / 0.031);
        foreach (double signal in new[] { 35.0, 0.2 })
        {
            Reading reading = Chain(equation, form, i => Base(i, coefficient, signal), uCoefficient, true);
            foreach (ReadingQuantity quantity in Enum.GetValues<ReadingQuantity>())
            {
                Check(UncertaintySource.ThermometerOffset, UOffset, (i, d) =>
                {
                    i.CalibrationTemperature += d;
                    i.Temperature += d;
                });
                Check(UncertaintySource.TemperatureAtCalibration, UTemperatureAtPoint, (i, d) => i.CalibrationTemperature += d);
                Check(UncertaintySource.TemperatureAtReading, UTemperature, (i, d) => i.Temperature += d);
                Check(UncertaintySource.PressureAtCalibration, UPressureAtPoint, (i, d) => i.CalibrationPressure += d);
                Check(UncertaintySource.PressureAtReading, UPressure, (i, d) => i.Pressure += d);
                Check(UncertaintySource.SalinityAtReading, USalinity, (i, d) => i.Salinity += d);
                Check(UncertaintySource.SignalAtCalibration, USignalAtPoint, (i, d) => i.CalibrationSignal += d);
                Check(UncertaintySource.SignalAtReading, USignal, (i, d) => i.Signal += d);
                Check(UncertaintySource.Zero, UZero, (i, d) => i.ZeroSignal += d);
                Check(UncertaintySource.TemperatureCoefficient, uCoefficient, (i, d) => i.Coefficient += d);
                Check(UncertaintySource.AirToWaterRatio, URatio, (i, d) => i.Ratio *= 1.0 + d);
                Check(UncertaintySource.Stirring, UStirring, (i, d) => i.Flow *= 1.0 + d);

                double equationRelative = quantity is ReadingQuantity.PartialPressure or ReadingQuantity.PercentLocal or ReadingQuantity.PercentOneAtmosphere
                    ? 0.0 : 0.001 + (0.001 * 12.0 / 40.0);
                Assert.Equal(equationRelative * reading.Value(quantity), reading.Contribution(UncertaintySource.Equation, quantity), 10);
                Assert.Equal(UState * reading.Value(quantity), reading.Contribution(UncertaintySource.ReferenceState, quantity), 10);

                double squares = 0.0;
                foreach (UncertaintySource source in Enum.GetValues<UncertaintySource>())
                {
                    squares += reading.Contribution(source, quantity) * reading.Contribution(source, quantity);
                }

                Assert.Equal(1.0, reading.StandardUncertainty(quantity) / Math.Sqrt(squares), 12);

                void Check(UncertaintySource source, double uncertainty, Action<Inputs, double> shift)
                {
                    double step = uncertainty * 1e-2;
                    double Shifted(double by) => Chain(equation, form, i =>
                    {
                        Base(i, coefficient, signal);
                        shift(i, by);
                    }, uCoefficient, true).Value(quantity);
                    double numeric = (Shifted(step) - Shifted(-step)) / (2.0 * step) * uncertainty;
                    double analytic = reading.Contribution(source, quantity);
                    // What the difference quotient itself can resolve: rounding of two values over the step.
                    double resolution = Math.Abs(reading.Value(quantity)) * 1e-12;
                    Assert.True(
                        Math.Abs(numeric - analytic) <= (Math.Abs(numeric) * 2e-5) + resolution,
                        $"{source} of {quantity}: analytic {analytic:R}, difference {numeric:R}");
                }
            }
        }
    }

    [Fact]
    public void CommonThermometer_AddsLinearly_AnotherOneInSquares()
    {
        // JCGM 100:2008, 5.2.2: inputs that share one error add by their values, not by their squares.
        Reading same = Chain(SolubilityEquation.BensonKrause1984, TemperatureCoefficientForm.Exponential, i => { }, UCoefficient, true);
        Reading other = Chain(SolubilityEquation.BensonKrause1984, TemperatureCoefficientForm.Exponential, i => { }, UCoefficient, false);
        foreach (ReadingQuantity quantity in Enum.GetValues<ReadingQuantity>())
        {
            double atPoint = same.Contribution(UncertaintySource.TemperatureAtCalibration, quantity) / UTemperatureAtPoint;
            double atReading = same.Contribution(UncertaintySource.TemperatureAtReading, quantity) / UTemperature;
            Assert.Equal((atPoint + atReading) * UOffset, same.Contribution(UncertaintySource.ThermometerOffset, quantity), 12);
            Assert.Equal(0.0, other.Contribution(UncertaintySource.ThermometerOffset, quantity));
            Assert.Equal(
                Math.Abs(atPoint) * Math.Sqrt((UTemperatureAtPoint * UTemperatureAtPoint) + (UOffset * UOffset)),
                Math.Abs(other.Contribution(UncertaintySource.TemperatureAtCalibration, quantity)), 12);
            Assert.Equal(
                Math.Abs(atReading) * Math.Sqrt((UTemperature * UTemperature) + (UOffset * UOffset)),
                Math.Abs(other.Contribution(UncertaintySource.TemperatureAtReading, quantity)), 12);
        }
    }

    // A reading at 15 °C: about −2 %/K from solubility and −3 %/K from the membrane, −5 %/K together; an offset common to
    // calibration and reading leaves about −2.3 %/K. Computed figures without an outside source; ours at 15 °C are −5.04 and −2.16
    // for a calibration at 15 °C, −2.24 for one at 25 °C.
    [Theory]
    [InlineData(15.0, -2.16)]
    [InlineData(20.0, -2.20)]
    [InlineData(25.0, -2.24)]
    public void CommonThermometerOffset_LargelyCancels(double calibrationTemperature, double expected)
    {
        AmperometricProbe probe = Bench.Probe();
        double signal = Bench.Signal(probe, Bench.Slope, 0.0, 1.0, calibrationTemperature, 1013.25, Bench.Air(calibrationTemperature, 1013.25));
        ProbeCalibration calibration = Bench.Calibrate(
            probe, Bench.WaterPoint(signal, calibrationTemperature, 1013.25), new ZeroPoint(true, 0.0, 0.0, calibrationTemperature, 1013.25), 1.0);
        double raw = Bench.Signal(probe, Bench.Slope, 0.0, 1.0, 15.0, 1013.25, 200.0);
        var reading = new Reading();
        Correction.Correct(calibration, Bench.Conditions(temperature: 1.0), raw, 15.0, 1013.25, 0.0, 0.0, RangeRule.Refuse, reading);
        double value = reading.Value(ReadingQuantity.MilligramsPerLitre);
        double common = 100.0 * reading.Contribution(UncertaintySource.ThermometerOffset, ReadingQuantity.MilligramsPerLitre) / value;
        double alone = 100.0 * reading.Contribution(UncertaintySource.TemperatureAtReading, ReadingQuantity.MilligramsPerLitre) / value;
        Assert.Equal(-5.04, alone, 0.02);
        Assert.Equal(expected, common, 0.01);
        Assert.Equal(-2.3, common, 0.2);
    }

    // Published budget of one analyser at 8.95 mg/L (Helm et al. 2018, Environ. Monit. Assess. 190:313): reference 0.031,
    // repeatability at calibration 0.0039, at zero 0.0049, field 0.0686 mg/L; root of the sum of squares 0.0756. At the
    // calibrated value itself an error of the zero cancels, so the same inputs give 0.0754 here and 0.0756 with it at half the value.
    [Fact]
    public void PublishedBudget_IsReproduced_WithTheZeroWhereItActs()
    {
        var meter = new MeterDisplay(
            MeterScale.MilligramsPerLitre, SolubilityEquation.BensonKrause1984, 0.0, double.NaN, double.NaN,
            TemperatureCoefficientForm.Exponential, 0.03, 25.0, 0.0, 40.0);
        Assert.Equal(Status.Ok, meter.Signal(Bench.Air(20.65, 1013.25), 20.65, 1013.25, 0.0, RangeRule.Refuse, out double shown));
        Assert.Equal(8.97, shown, 0.02);
        ProbeCalibration calibration = Bench.Calibrate(
            meter, Bench.WaterPoint(shown, 20.65, 1013.25, 0.0039, stateUncertainty: 0.031 / shown), new ZeroPoint(true, 0.0, 0.0049, 20.65, 1013.25));
        double Uncertainty(double reading, out double zero)
        {
            var result = new Reading();
            Correction.Correct(calibration, Bench.Conditions(0.0686), reading, 20.65, 1013.25, 0.0, 0.0, RangeRule.Refuse, result);
            zero = result.Contribution(UncertaintySource.Zero, ReadingQuantity.MilligramsPerLitre);
            double equation = result.Contribution(UncertaintySource.Equation, ReadingQuantity.MilligramsPerLitre);
            double combined = result.StandardUncertainty(ReadingQuantity.MilligramsPerLitre);
            return Math.Sqrt((combined * combined) - (equation * equation));
        }

        Assert.Equal(0.07538, Uncertainty(shown, out double atPoint), 0.00002);
        Assert.Equal(0.0, atPoint, 12);
        Uncertainty(0.0, out double atZero);
        Assert.Equal(-0.0049, atZero, 8);
        Uncertainty(shown / 2.0, out double halfWay);
        Assert.Equal(-0.00245, halfWay, 8);
    }

    private static void Base(Inputs inputs, double coefficient, double signal)
    {
        inputs.Coefficient = coefficient;
        inputs.Signal = signal;
    }

    private static Reading Chain(
        SolubilityEquation equation, TemperatureCoefficientForm form, Action<Inputs> change, double uCoefficient, bool sameThermometer)
    {
        var inputs = new Inputs();
        change(inputs);
        var probe = new AmperometricProbe(form, inputs.Coefficient, 25.0, 0.0, 40.0);
        var point = new CalibrationPoint(
            CalibrationMethod.WaterSaturatedAir, inputs.CalibrationSignal, USignalAtPoint, inputs.CalibrationTemperature, UTemperatureAtPoint,
            inputs.CalibrationPressure, UPressureAtPoint, Stirring.Stirred, 1.0, inputs.Ratio, URatio, UState);
        ProbeCalibration calibration = Bench.Calibrate(
            probe, point, new ZeroPoint(true, inputs.ZeroSignal, UZero, inputs.CalibrationTemperature, inputs.CalibrationPressure), UOffset, uCoefficient);
        var conditions = new ReadingConditions(
            equation, USignal, sameThermometer, UOffset, UTemperature, UPressure, USalinity, Stirring.Stirred, inputs.Flow, UStirring);
        var reading = new Reading();
        Assert.Equal(Status.Ok, Correction.Correct(
            calibration, conditions, inputs.Signal, inputs.Temperature, inputs.Pressure, inputs.Salinity, 0.0, RangeRule.Refuse, reading));
        Assert.Equal(Status.Ok, reading.UncertaintyStatus);
        return reading;
    }
}
