using ProbeCal.Core.Tests.Readings;
using Xunit;

namespace ProbeCal.Core.Tests.Calibration;

public class CalibrationFitTests
{
    private const SolubilityEquation Equation = SolubilityEquation.BensonKrause1984;

    [Fact]
    public void Slope_IsTheSpanOverGainFlowRatioAndReference()
    {
        Assert.Equal(Status.Ok, CalibrationFit.Slope(60.4, 0.4, 0.8, 1.25, 1.5, 200.0, out double slope));
        Assert.Equal(60.0 / (0.8 * 1.25 * 1.5 * 200.0), slope, 15);
    }

    [Theory]
    [InlineData(5.0, 5.0, 200.0, Status.PointsDegenerate)]
    [InlineData(5.0, 6.0, 200.0, Status.ZeroAboveRange)]
    [InlineData(5.0, 1.0, 0.0, Status.PartialPressureBelowRange)]
    [InlineData(5.0, 1.0, -3.0, Status.PartialPressureBelowRange)]
    [InlineData(1e300, -1e300, 1e-300, Status.SlopeAboveRange)]
    [InlineData(1e-320, 0.0, 1e300, Status.SlopeBelowRange)]
    public void Slope_ThatCannotBe_IsRefused(double response, double zero, double reference, Status expected)
    {
        Assert.Equal(expected, CalibrationFit.Slope(response, zero, 1.0, 1.0, 1.0, reference, out double slope));
        Assert.True(double.IsNaN(slope));
    }

    [Fact]
    public void AsFound_IsWhatTheOldCalibrationMakesOfThePoint()
    {
        // A probe that lost 5 % of its slope since: it reads 5 % low, and a 0.3 hPa zero shift adds its share.
        AmperometricProbe probe = Bench.Probe();
        double air = Bench.Air(18.0, 930.0);
        double signal = Bench.Signal(probe, 0.95 * Bench.Slope, Bench.Zero, 1.0, 18.0, 930.0, air);
        CalibrationPoint point = Bench.WaterPoint(signal, 18.0, 930.0);
        Assert.Equal(Status.Ok, CalibrationFit.AsFound(probe, Bench.Slope, Bench.Zero, point, Equation, 0.0, out double milligrams, out double percent));
        Assert.Equal(-5.0, percent, 10);
        OxygenEquilibrium.MilligramsPerLitre(Equation, 18.0, 0.0, 930.0, RangeRule.Refuse, out double reference);
        Assert.Equal(-0.05 * reference, milligrams, 10);
    }

    [Fact]
    public void AsFound_InAir_TakesTheRatioOut()
    {
        AmperometricProbe probe = Bench.Probe();
        double signal = Bench.Signal(probe, Bench.Slope, Bench.Zero, 1.0, 18.0, 930.0, 1.02 * Bench.Air(18.0, 930.0));
        var point = new CalibrationPoint(
            CalibrationMethod.WaterSaturatedAir, signal, 0.0, 18.0, 0.0, 930.0, 0.0, Stirring.Stirred, 1.0, 1.02, 0.0, 0.0);
        Assert.Equal(Status.Ok, CalibrationFit.AsFound(probe, Bench.Slope, Bench.Zero, point, Equation, 0.0, out double milligrams, out double percent));
        Assert.Equal(0.0, milligrams, 10);
        Assert.Equal(0.0, percent, 10);
    }

    [Fact]
    public void AsFound_OfAMeter_IsShownLessRight()
    {
        var meter = new MeterDisplay(
            MeterScale.MilligramsPerLitre, Equation, 0.0, double.NaN, double.NaN, TemperatureCoefficientForm.Exponential, 0.03, 25.0, 0.0, 40.0);
        OxygenEquilibrium.MilligramsPerLitre(Equation, 20.0, 0.0, 1000.0, RangeRule.Refuse, out double reference);
        CalibrationPoint point = Bench.WaterPoint(reference + 0.31, 20.0, 1000.0);
        Assert.Equal(Status.Ok, CalibrationFit.AsFound(meter, 1.0, 0.0, point, Equation, 0.0, out double milligrams, out double percent));
        Assert.Equal(0.31, milligrams, 10);
        Assert.Equal(31.0 / reference, percent, 10);
    }

    [Fact]
    public void AsFoundZero_IsItsReading()
    {
        AmperometricProbe probe = Bench.Probe();
        double signal = Bench.Signal(probe, Bench.Slope, Bench.Zero, 1.0, 18.0, 1013.25, 4.0);
        Assert.Equal(Status.Ok, CalibrationFit.AsFoundZero(
            probe, Bench.Slope, Bench.Zero, new ZeroPoint(true, signal, 0.0, 18.0, 1013.25), Equation, out double milligrams));
        OxygenEquilibrium.MilligramsPerLitre(Equation, 18.0, 0.0, 1013.25, RangeRule.Refuse, out double reference);
        Assert.Equal(reference * 4.0 / Bench.Air(18.0, 1013.25), milligrams, 10);
    }

    /// <summary>A lifetime falls where oxygen rises: 1/τ = zero + slope·p, so that one unit of τ is 1/(τ²·slope) hPa, without a sign.</summary>
    [Fact]
    public void SignalSize_OfAFallingSignal_HasNoSign()
    {
        const double Lifetime = 40.0;
        const double Slope = 2e-4;
        var probe = new SternVolmerProbe(LuminescenceSignal.Lifetime, TemperatureCoefficientForm.Exponential, 0.01, 0, 0, -0.003, 0, 0, 20, 0, 40);
        Assert.Equal(Status.Ok, OxygenEquilibrium.MilligramsPerLitre(Equation, 20.0, 0.0, 1000.0, RangeRule.Refuse, out double milligrams));
        Assert.Equal(Status.Ok, OxygenEquilibrium.PartialPressure(20.0, 1000.0, RangeRule.Refuse, out double hectopascal));
        Assert.Equal(Status.Ok, CalibrationFit.SignalSize(probe, Slope, Lifetime, Equation, 20.0, 1000.0, 0.0, out double size));
        Assert.Equal(1.0 / (Lifetime * Lifetime * Slope) * milligrams / hectopascal, size, 1e-12);
    }

    [Fact]
    public void SignalSize_IsTheReferenceOverTheSpan()
    {
        AmperometricProbe probe = Bench.Probe();
        double signal = Bench.Signal(probe, Bench.Slope, Bench.Zero, 1.0, 12.0, 990.0, Bench.Air(12.0, 990.0));
        Assert.Equal(Status.Ok, CalibrationFit.SignalSize(probe, Bench.Slope, signal, Equation, 12.0, 990.0, 0.0, out double size));
        OxygenEquilibrium.MilligramsPerLitre(Equation, 12.0, 0.0, 990.0, RangeRule.Refuse, out double reference);
        Assert.Equal(1.0, size * (signal - Bench.Zero) / reference, 12);
    }

    [Fact]
    public void Create_FromTheSameInputs_GivesTheSameBits()
    {
        ProbeCalibration Make() => Bench.Calibrate(
            Bench.Probe(), Bench.WaterPoint(57.31, 17.3, 951.2, 0.05, 0.03, 0.8, 0.0075), new ZeroPoint(true, 0.37, 0.02, 17.0, 951.0), 0.1, 0.0003);
        ProbeCalibration first = Make();
        ProbeCalibration second = Make();
        Assert.Equal(first.Slope, second.Slope);
        Assert.Equal(first.PerKelvinAtPoint, second.PerKelvinAtPoint);
        Assert.Equal(first.SlopeRelativeUncertainty(), second.SlopeRelativeUncertainty());
    }

    [Fact]
    public void SlopeContributions_AreTheFitsDerivatives()
    {
        double Slope(double signal = 57.31, double temperature = 17.3, double pressure = 951.2, double zero = 0.37, double ratio = 1.01)
        {
            var point = new CalibrationPoint(
                CalibrationMethod.WaterSaturatedAir, signal, 0.05, temperature, 0.03, pressure, 0.8, Stirring.Stirred, 1.0, ratio, 0.015, 0.0075);
            return Bench.Calibrate(Bench.Probe(), point, new ZeroPoint(true, zero, 0.02, 17.0, 951.0), 0.1, 0.0003).Slope;
        }

        var at = new CalibrationPoint(
            CalibrationMethod.WaterSaturatedAir, 57.31, 0.05, 17.3, 0.03, 951.2, 0.8, Stirring.Stirred, 1.0, 1.01, 0.015, 0.0075);
        ProbeCalibration made = Bench.Calibrate(Bench.Probe(), at, new ZeroPoint(true, 0.37, 0.02, 17.0, 951.0), 0.1, 0.0003);
        double slope = made.Slope;
        Assert.Equal(((Slope(signal: 57.31 + 0.05) / slope) - 1.0), made.SlopeContribution(UncertaintySource.SignalAtCalibration), 8);
        Assert.Equal((Slope(temperature: 17.301) - Slope(temperature: 17.299)) / 0.002 * 0.03 / slope, made.SlopeContribution(UncertaintySource.TemperatureAtCalibration), 8);
        Assert.Equal((Slope(temperature: 17.301) - Slope(temperature: 17.299)) / 0.002 * 0.1 / slope, made.SlopeContribution(UncertaintySource.ThermometerOffset), 8);
        Assert.Equal((Slope(pressure: 951.3) - Slope(pressure: 951.1)) / 0.2 * 0.8 / slope, made.SlopeContribution(UncertaintySource.PressureAtCalibration), 8);
        Assert.Equal((Slope(zero: 0.39) / slope) - 1.0, made.SlopeContribution(UncertaintySource.Zero), 8);
        Assert.Equal(-0.015, made.SlopeContribution(UncertaintySource.AirToWaterRatio));
        Assert.Equal(-0.0075, made.SlopeContribution(UncertaintySource.ReferenceState));
        Assert.Equal(7.7 * 0.0003, made.SlopeContribution(UncertaintySource.TemperatureCoefficient), 12);
        Assert.Equal(0.0, made.SlopeContribution(UncertaintySource.SignalAtReading));
        double squares = 0.0;
        foreach (UncertaintySource source in System.Enum.GetValues<UncertaintySource>())
        {
            squares += made.SlopeContribution(source) * made.SlopeContribution(source);
        }

        Assert.Equal(System.Math.Sqrt(squares), made.SlopeRelativeUncertainty(), 12);
    }

    // The slope of a meter: its coefficient acts only where the temperature is set by hand, by the distance from the water's.
    [Theory]
    [InlineData(double.NaN, 0.0)]
    [InlineData(18.0, 0.0)]
    [InlineData(12.0, -6.0)]
    public void SlopeContributionOfACoefficient_IsTheFitsDerivative(double temperatureSet, double perCoefficient)
    {
        ProbeCalibration Make(double coefficient)
        {
            var meter = new MeterDisplay(
                MeterScale.MilligramsPerLitre, Equation, 0.0, double.NaN, temperatureSet, TemperatureCoefficientForm.Exponential, coefficient, 25.0, 0.0, 40.0);
            return Bench.Calibrate(meter, Bench.WaterPoint(9.1, 18.0, 951.2), new ZeroPoint(true, 0.0, 0.0, 18.0, 951.2), 0.1, 0.0003);
        }

        ProbeCalibration made = Make(0.03);
        double numeric = (Make(0.03001).Slope - Make(0.02999).Slope) / 0.00002 / made.Slope;
        Assert.Equal(perCoefficient, numeric, 6);
        Assert.Equal(perCoefficient * 0.0003, made.SlopeContribution(UncertaintySource.TemperatureCoefficient), 12);
    }

    public static TheoryData<string, Status> BadPoints => new()
    {
        { "signal", Status.SignalNotFinite },
        { "temperature", Status.TemperatureNotFinite },
        { "pressure", Status.PressureNotFinite },
        { "flow", Status.CoefficientNotFinite },
        { "ratio", Status.CoefficientNotFinite },
        { "zero", Status.ZeroNotFinite },
        { "uSignal", Status.UncertaintyNotFinite },
        { "uTemperature", Status.UncertaintyNotFinite },
        { "uPressure", Status.UncertaintyNotFinite },
        { "uRatio", Status.UncertaintyNotFinite },
        { "uState", Status.UncertaintyNotFinite },
        { "uZero", Status.UncertaintyNotFinite },
        { "uOffset", Status.UncertaintyNotFinite },
        { "uCoefficient", Status.UncertaintyNotFinite },
    };

    [Theory]
    [MemberData(nameof(BadPoints))]
    public void Create_WithABadInput_NamesIt(string input, Status expected)
    {
        foreach (double bad in new[] { double.NaN, double.PositiveInfinity, double.NegativeInfinity })
        {
            double Or(string name, double good) => name == input ? bad : good;
            var point = new CalibrationPoint(
                CalibrationMethod.AirSaturatedWater, Or("signal", 57.0), Or("uSignal", 0.05), Or("temperature", 17.0), Or("uTemperature", 0.03),
                Or("pressure", 950.0), Or("uPressure", 0.8), Stirring.Stirred, Or("flow", 1.0), Or("ratio", 1.0), Or("uRatio", 0.0), Or("uState", 0.0075));
            Assert.Equal(expected, ProbeCalibration.Create(
                Bench.Probe(), point, new ZeroPoint(true, Or("zero", 0.4), Or("uZero", 0.02), 17.0, 950.0), Or("uOffset", 0.1), Or("uCoefficient", 0.0003),
                out ProbeCalibration? calibration));
            Assert.Null(calibration);
        }
    }

    [Theory]
    [InlineData(-0.1, 950.0, Status.TemperatureJustBelowRange)]
    [InlineData(-0.3, 950.0, Status.TemperatureBelowRange)]
    [InlineData(40.1, 950.0, Status.TemperatureJustAboveRange)]
    [InlineData(40.3, 950.0, Status.TemperatureAboveRange)]
    [InlineData(17.0, 400.0, Status.PressureBelowRange)]
    [InlineData(17.0, 1150.0, Status.PressureAboveRange)]
    public void Create_OutsideARange_IsRefused(double temperature, double pressure, Status expected)
    {
        Assert.Equal(expected, ProbeCalibration.Create(
            Bench.Probe(), Bench.WaterPoint(57.0, temperature, pressure), new ZeroPoint(true, 0.4, 0.0, temperature, pressure), 0.1, 0.0003, out _));
    }

    [Fact]
    public void AssumedZero_CarriesItsDefault()
    {
        ZeroPoint zero = ZeroPoint.Assume(Bench.WaterPoint(60.0, 17.0, 950.0));
        Assert.False(zero.IsMeasured);
        Assert.Equal(0.0, zero.Signal);
        Assert.Equal(0.6 / System.Math.Sqrt(3.0), zero.SignalUncertainty, 12);
        Assert.Equal(17.0, zero.TemperatureCelsius);
        Assert.Equal(950.0, zero.PressureHectopascal);
    }
}
