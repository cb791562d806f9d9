using System;
using System.Collections.Generic;
using System.Linq;
using Xunit;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>Readings by a fit through several points: lines, curves, logarithms, other gases, total pressure, depth.</summary>
public class FittedCorrectionTests
{
    private const double Offset = 0.1;
    private const double Coefficient = 0.002;
    private const double Flow = 0.95;

    private static readonly Dictionary<string, (IProbeModel Model, Gas Gas, FittedResponse Fit, double Signal)> Cases = new()
    {
        ["line"] = (Bench.Probe(), Gas.Oxygen, Fit(0.4, 0.31, 0), 40),
        ["curve"] = (Bench.Probe(), Gas.Oxygen, Fit(0.4, 0.31, -2e-4), 40),
        ["falling line"] = (new GenericProbe(0.004, 25, 0, 40), Gas.CarbonDioxide, Fit(90, -0.4, 0), 40),
        ["curve of methane"] = (new GenericProbe(0, 25, 0, 40), Gas.Methane, Fit(0.2, 0.5, 3e-4), 60),
        ["logarithm"] = (new SeveringhausProbe(-0.2, 25, 0, 40), Gas.CarbonDioxide, Fit(-110, 57, 0, 0.5), -75),
        ["total"] = (new TotalGasProbe(0, 40), Gas.Oxygen, Fit(2, 1.001, 0, 700, 1100), 960),
        ["foil"] = (Probes.ProbeModelTests.Bittig(0), Gas.Oxygen, Fit(0.3, 1.02, 0), 42),
    };

    public static TheoryData<string> Names => new(Cases.Keys);

    [Theory]
    [MemberData(nameof(Names))]
    public void A_reading_finds_back_the_partial_pressure_that_made_the_signal(string name)
    {
        (IProbeModel model, Gas gas, FittedResponse fit, _) = Cases[name];
        ProbeCalibration calibration = Calibrate(model, gas, fit);
        for (int i = 0; i <= 20; i++)
        {
            double truth = fit.LowestHectopascal + ((fit.HighestHectopascal - fit.LowestHectopascal) * i / 20);
            Assert.Equal(Status.Ok, model.Gain(15, RangeRule.Refuse, out double gain));
            Assert.Equal(Status.Ok, ResponseCurve.ResponseTo(truth, fit.Zero, fit.Slope, fit.Curvature, Flow, gain, model.IsLogarithmic, out double response));
            Assert.Equal(Status.Ok, model.Signal(response, 15, 1000, 0, RangeRule.Refuse, out double signal));
            Correction.PartialPressure(calibration, Flow, signal, 15, 1000, 0, RangeRule.Extrapolate, out double found);
            Assert.Equal(truth, found, 1e-10 * Math.Max(1, truth));
        }
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Sensitivities_are_those_of_differences(string name)
    {
        (IProbeModel model, Gas gas, FittedResponse fit, double signal) = Cases[name];
        ProbeCalibration calibration = Calibrate(model, gas, fit);
        var reading = new Reading();
        var conditions = new ReadingConditions(GasDefaults.Equation(gas), 0.05, true, 0, 0.2, 0, 0, Stirring.Stirred, Flow, 0.01);
        Assert.Equal(Status.Ok, Correction.Correct(calibration, conditions, signal, 15, 1000, 0, 0, RangeRule.Refuse, reading));
        Assert.Equal(Status.Ok, reading.UncertaintyStatus);

        double Value(double temperature = 15, double signalStep = 0, double flow = Flow, double zero = 0, double slope = 0, double curvature = 0, double coefficient = 0)
        {
            var moved = new FittedResponse(
                fit.Zero + zero, fit.Slope + slope, fit.Curvature + curvature, fit.VarianceZero, fit.CovarianceZeroSlope, fit.VarianceSlope,
                fit.CovarianceZeroCurvature, fit.CovarianceSlopeCurvature, fit.VarianceCurvature, 0, 0, 0, 0, 0, 0, fit.LowestHectopascal, fit.HighestHectopascal);
            IProbeModel with = coefficient == 0 ? model : new AmperometricProbe(TemperatureCoefficientForm.Exponential, 0.03 + coefficient, 25, 0, 40);
            Correction.PartialPressure(Calibrate(with, gas, moved), flow, signal + signalStep, temperature, 1000, 0, RangeRule.Extrapolate, out double value);
            return value;
        }

        double PerKelvin(double h)
        {
            return (Value(15 + h) - Value(15 - h)) / (2 * h);
        }

        const double Kelvin = 0.002;
        double scale = Math.Abs(reading.StandardUncertainty(ReadingQuantity.PartialPressure));
        void Same(UncertaintySource source, double expected)
        {
            Assert.Equal(expected, reading.Contribution(source, ReadingQuantity.PartialPressure), 1e-6 * scale);
        }

        Same(UncertaintySource.TemperatureAtReading, PerKelvin(Kelvin) * 0.2);
        Same(UncertaintySource.SignalAtReading, (Value(signalStep: 1e-4) - Value(signalStep: -1e-4)) / 2e-4 * 0.05);
        Same(UncertaintySource.Stirring, (Value(flow: Flow * 1.0001) - Value(flow: Flow * 0.9999)) / 2e-4 * 0.01);
        // The offset moves the reading's temperature and, through the points, the parameters: one input with the sum of its sensitivities.
        double throughPoints = (Value(zero: 1e-4 * fit.ZeroPerKelvin, slope: 1e-4 * fit.SlopePerKelvin, curvature: 1e-4 * fit.CurvaturePerKelvin)
            - Value(zero: -1e-4 * fit.ZeroPerKelvin, slope: -1e-4 * fit.SlopePerKelvin, curvature: -1e-4 * fit.CurvaturePerKelvin)) / 2e-4;
        Same(UncertaintySource.ThermometerOffset, (PerKelvin(Kelvin) + throughPoints) * Offset);
        double h = 1e-4;
        double perZero = (Value(zero: h) - Value(zero: -h)) / (2 * h);
        double perSlope = (Value(slope: h * 0.01) - Value(slope: -h * 0.01)) / (2 * h * 0.01);
        double perCurvature = (Value(curvature: 1e-8) - Value(curvature: -1e-8)) / 2e-8;
        double variance = (perZero * perZero * fit.VarianceZero) + (perSlope * perSlope * fit.VarianceSlope) + (perCurvature * perCurvature * fit.VarianceCurvature)
            + (2 * ((perZero * perSlope * fit.CovarianceZeroSlope) + (perZero * perCurvature * fit.CovarianceZeroCurvature) + (perSlope * perCurvature * fit.CovarianceSlopeCurvature)));
        Assert.Equal(Math.Sqrt(variance), Math.Abs(reading.Contribution(UncertaintySource.Fit, ReadingQuantity.PartialPressure)), 1e-5 * scale);
        if (model is AmperometricProbe)
        {
            double through = (Value(coefficient: 1e-6, zero: 1e-6 * fit.ZeroPerCoefficient, slope: 1e-6 * fit.SlopePerCoefficient, curvature: 1e-6 * fit.CurvaturePerCoefficient)
                - Value(coefficient: -1e-6, zero: -1e-6 * fit.ZeroPerCoefficient, slope: -1e-6 * fit.SlopePerCoefficient, curvature: -1e-6 * fit.CurvaturePerCoefficient)) / 2e-6;
            Same(UncertaintySource.TemperatureCoefficient, through * Coefficient);
        }
    }

    [Fact]
    public void A_line_through_points_covers_the_truth_as_a_Monte_Carlo_of_it_says()
    {
        // Five exact references, signal noise of 0.05: ordinary least squares, whose covariance is s²·(X'X)^-1; then a reading at 120 hPa with its own noise.
        const double Noise = 0.05;
        double[] p = [0, 50, 100, 150, 210];
        double mean = p.Average();
        double squares = p.Sum(x => (x - mean) * (x - mean));
        var random = new Random(20261201);
        double Normal()
        {
            return Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
        }

        Bench.Probe().Gain(25, RangeRule.Refuse, out double gain);
        Assert.Equal(1, gain);
        var reading = new Reading();
        var conditions = Bench.Conditions(Noise);
        double sum = 0;
        double claimed = 0;
        const int Trials = 20_000;
        for (int trial = 0; trial < Trials; trial++)
        {
            double[] y = [.. p.Select(x => 0.4 + (0.31 * x) + (Noise * Normal()))];
            double slope = p.Zip(y, (x, r) => (x - mean) * r).Sum() / squares;
            double zero = y.Average() - (slope * mean);
            double varianceSlope = Noise * Noise / squares;
            var fit = new FittedResponse(
                zero, slope, 0, Noise * Noise * ((1.0 / p.Length) + (mean * mean / squares)), -mean * varianceSlope, varianceSlope, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 210);
            Assert.Equal(Status.Ok, ProbeCalibration.CreateFitted(Bench.Probe(), Gas.Oxygen, fit, Stirring.Stirred, 1, 0, 0, out ProbeCalibration? made));
            Correction.Correct(made!, conditions, 0.4 + (0.31 * 120) + (Noise * Normal()), 25, 1013.25, 0, 0, RangeRule.Refuse, reading);
            double error = reading.Value(ReadingQuantity.PartialPressure) - 120;
            sum += error * error;
            claimed += reading.StandardUncertainty(ReadingQuantity.PartialPressure);
        }

        // The standard deviation of 20,000 trials is known to 0.5 %: three times that.
        Assert.Equal(1, claimed / Trials / Math.Sqrt(sum / Trials), 0.015);
    }

    [Fact]
    public void Beyond_the_points_of_a_fit_a_reading_is_named_and_refused_unless_asked_for()
    {
        ProbeCalibration calibration = Calibrate(Bench.Probe(), Gas.Oxygen, Fit(0.4, 0.31, 0));
        Assert.Equal(Status.PartialPressureAboveRange, Correction.PartialPressure(calibration, 1, 120, 25, 1000, 0, RangeRule.Refuse, out double value));
        Assert.True(double.IsNaN(value));
        Assert.Equal(Status.PartialPressureAboveRange, Correction.PartialPressure(calibration, 1, 120, 25, 1000, 0, RangeRule.Extrapolate, out value));
        Assert.Equal((120 - 0.4) / 0.31, value, 1e-10);
        Assert.Equal(Status.PartialPressureBelowRange, Correction.PartialPressure(calibration, 1, 0.1, 25, 1000, 0, RangeRule.Extrapolate, out _));
        var reading = new Reading();
        // As the station reads: every quantity carries the name.
        Correction.Correct(calibration, Bench.Conditions(), 120, 25, 1000, 0, 0, RangeRule.NearEdge, reading);
        foreach (ReadingQuantity quantity in Enum.GetValues<ReadingQuantity>())
        {
            Assert.NotEqual(Status.Ok, reading.StatusOf(quantity));
        }
    }

    [Fact]
    public void Total_pressure_is_a_percentage_and_no_concentration()
    {
        ProbeCalibration calibration = Calibrate(new TotalGasProbe(0, 40), Gas.Oxygen, Fit(0, 1, 0, 700, 1100));
        var reading = new Reading();
        Correction.Correct(calibration, Bench.Conditions(pressure: 1), 1030, 15, 980, 0, 0, RangeRule.Refuse, reading);
        Assert.Equal(100 * 1030 / 980.0, reading.Value(ReadingQuantity.PercentLocal), 1e-10);
        Assert.Equal(100 * 1030 / 1013.25, reading.Value(ReadingQuantity.PercentOneAtmosphere), 1e-10);
        Assert.Equal(Status.GasUnknown, reading.StatusOf(ReadingQuantity.MilligramsPerLitre));
        Assert.True(double.IsNaN(reading.Value(ReadingQuantity.MicromolesPerKilogram)));
        Assert.Equal(-100 * 1030 / (980.0 * 980.0), reading.Contribution(UncertaintySource.PressureAtReading, ReadingQuantity.PercentLocal), 1e-12);
    }

    [Fact]
    public void Another_gas_is_the_one_chain_of_all_gases()
    {
        ProbeCalibration calibration = Calibrate(new GenericProbe(0, 25, 0, 40), Gas.CarbonDioxide, Fit(0, 1, 0, 0.1, 50));
        var reading = new Reading();
        var conditions = new ReadingConditions(SolubilityEquation.Weiss1974, 0, true, 0, 0, 0, 0, Stirring.Stirred, 1, 0);
        Correction.Correct(calibration, conditions, 2, 15, 1000, 20, 0, RangeRule.Refuse, reading);
        GasEquilibrium.ConcentrationFromPartialPressure(Gas.CarbonDioxide, SolubilityEquation.Weiss1974, 15, 20, 1000, 2, RangeRule.Refuse, out double expected);
        Assert.Equal(expected, reading.Value(ReadingQuantity.MilligramsPerLitre));
        GasEquilibrium.PartialPressure(Gas.CarbonDioxide, 15, 0, 1000, DryAir.MoleFraction(Gas.CarbonDioxide), 100, RangeRule.Refuse, out double air);
        Assert.Equal(200 / air, reading.Value(ReadingQuantity.PercentLocal), 1e-9);
    }

    [Fact]
    public void At_depth_the_partial_pressure_is_that_at_the_probe_and_the_concentration_that_of_the_water()
    {
        ProbeCalibration calibration = Calibrate(Bench.Probe(), Gas.Oxygen, Fit(0.4, 0.31, 0));
        var deep = new Reading();
        var surface = new Reading();
        Correction.Correct(calibration, Bench.Conditions(0.05), 40, 10, 1000, 0, 200, RangeRule.Refuse, deep);
        Correction.Correct(calibration, Bench.Conditions(0.05), 40, 10, 1000, 0, 0, RangeRule.Refuse, surface);
        Assert.Equal(surface.Value(ReadingQuantity.PartialPressure), deep.Value(ReadingQuantity.PartialPressure));
        Enns1965.Factor(Gas.Oxygen, 10, 20_000, RangeRule.Refuse, out double factor);
        foreach (ReadingQuantity quantity in new[] { ReadingQuantity.MilligramsPerLitre, ReadingQuantity.PercentLocal })
        {
            Assert.Equal(factor, surface.Value(quantity) / deep.Value(quantity), 1e-12);
            Assert.Equal(
                factor,
                surface.Contribution(UncertaintySource.SignalAtReading, quantity) / deep.Contribution(UncertaintySource.SignalAtReading, quantity), 1e-12);
        }

        Assert.NotEqual(Status.Ok, Correction.Correct(calibration, Bench.Conditions(), 40, 10, 1000, 0, double.NaN, RangeRule.NearEdge, deep));
        Assert.True(double.IsNaN(deep.Value(ReadingQuantity.PartialPressure)));
    }

    [Fact]
    public void Fits_that_make_no_calibration_are_refused()
    {
        Status Of(FittedResponse fit, IProbeModel? model = null, Gas gas = Gas.Oxygen)
        {
            Status status = ProbeCalibration.CreateFitted(model ?? Bench.Probe(), gas, fit, Stirring.Stirred, 1, 0, 0, out ProbeCalibration? made);
            Assert.Null(made);
            return status;
        }

        Assert.Equal(Status.ZeroNotFinite, Of(Fit(double.NaN, 1, 0)));
        Assert.Equal(Status.SlopeBelowRange, Of(Fit(0, 0, 0)));
        Assert.Equal(Status.PointsDegenerate, Of(Fit(0, 1, 0, 100, 100)));
        // 1 − 2·0.003·250 is negative: the curve turns round among the points.
        Assert.Equal(Status.PointsDegenerate, Of(Fit(0, 1, -0.003)));
        Assert.Equal(Status.PartialPressureBelowRange, Of(Fit(0, 1, 0), new SeveringhausProbe(0, 25, 0, 40)));
        Assert.Equal(Status.GasUnknown, Of(Fit(0, 1, 0), null, 0));
        Assert.Equal(Status.UncertaintyAboveRange, Of(new FittedResponse(0, 1, 0, 1, 1.1, 1, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 200)));
        Assert.Equal(Status.UncertaintyBelowRange, Of(new FittedResponse(0, 1, 0, -1, 0, 1, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 200)));
        double signal = Bench.Signal(Bench.Probe(), Bench.Slope, Bench.Zero, 1, 20, 1000, Bench.Air(20, 1000));
        Assert.Equal(Status.PointsBelowRange, ProbeCalibration.Create(
            new SeveringhausProbe(0, 25, 0, 40), Bench.WaterPoint(signal, 20, 1000), new ZeroPoint(true, 0, 0, 20, 1000), 0, 0, out _));
    }

    [Fact]
    public void A_fit_allocates_nothing_when_it_reads()
    {
        ProbeCalibration calibration = Calibrate(Bench.Probe(), Gas.Oxygen, Fit(0.4, 0.31, -2e-4));
        var reading = new Reading();
        ReadingConditions conditions = Bench.Conditions(0.05, true, 0, 0.03, 0.8, 0.25, 0.01);
        Correction.Correct(calibration, conditions, 40, 15, 1000, 5, 12, RangeRule.Refuse, reading);
        long before = GC.GetAllocatedBytesForCurrentThread();
        for (int i = 0; i < 1000; i++)
        {
            Correction.Correct(calibration, conditions, 40 + (0.001 * i), 15, 1000, 5, 12, RangeRule.Refuse, reading);
        }

        Assert.Equal(0L, GC.GetAllocatedBytesForCurrentThread() - before);
        Assert.Equal(Status.Ok, reading.UncertaintyStatus);
    }

    private static FittedResponse Fit(double zero, double slope, double curvature, double lowest = 0, double highest = 250)
    {
        double curved = curvature == 0 ? 0 : 1;
        return new FittedResponse(
            zero, slope, curvature, 4e-4, -1e-6, 1e-8, curved * 1e-9, curved * -5e-12, curved * 1e-14, 0.002, 0.0004, curved * 1e-7, 0.003, -0.02, curved * 1e-6, lowest, highest);
    }

    private static ProbeCalibration Calibrate(IProbeModel model, Gas gas, FittedResponse fit)
    {
        Assert.Equal(Status.Ok, ProbeCalibration.CreateFitted(model, gas, fit, Stirring.Stirred, 1, Offset, Coefficient, out ProbeCalibration? made));
        return made!;
    }
}
