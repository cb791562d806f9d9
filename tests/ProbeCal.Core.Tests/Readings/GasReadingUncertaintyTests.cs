using System;
using Xunit;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>Readings of carbon dioxide at depth: every quantity's contributions against difference quotients of the whole correction.</summary>
public class GasReadingUncertaintyTests
{
    private const double UOffset = 0.15;

    private static readonly FittedResponse Fit = new(
        -110, 57, 0, 0.04, -0.01, 0.05, 0, 0, 0, -0.3, 0.2, 0, 0, 0, 0, 0.5, 50);

    public static TheoryData<ReadingQuantity> Quantities => new(Enum.GetValues<ReadingQuantity>());

    [Theory]
    [MemberData(nameof(Quantities))]
    public void Contributions_AreTheCorrectionsDerivatives(ReadingQuantity quantity)
    {
        Reading reading = Read(true);
        Check(UncertaintySource.SignalAtReading, 0.2, by => Read(true, signal: by));
        Check(UncertaintySource.TemperatureAtReading, 0.05, by => Read(true, celsius: by));
        Check(UncertaintySource.PressureAtReading, 1.1, by => Read(true, hectopascal: by));
        Check(UncertaintySource.SalinityAtReading, 0.25, by => Read(true, salinity: by));
        // The offset was in the points and is in the reading; by another thermometer only what it did to the points is left of it.
        double throughPoints = Slope(by => Read(true, zero: by * Fit.ZeroPerKelvin, slope: by * Fit.SlopePerKelvin));
        double throughReading = Slope(by => Read(true, celsius: by));
        Near((throughPoints + throughReading) * UOffset, reading.Contribution(UncertaintySource.ThermometerOffset, quantity));
        Reading other = Read(false);
        Near(throughPoints * UOffset, other.Contribution(UncertaintySource.TemperatureAtCalibration, quantity));
        Assert.Equal(0, other.Contribution(UncertaintySource.ThermometerOffset, quantity));

        void Check(UncertaintySource source, double uncertainty, Func<double, Reading> moved)
        {
            Near(Slope(moved) * uncertainty, reading.Contribution(source, quantity));
        }

        double Slope(Func<double, Reading> moved)
        {
            const double Step = 1e-3;
            return (moved(Step).Value(quantity) - moved(-Step).Value(quantity)) / (2 * Step);
        }

        // Central differences: the third derivative times the step squared, and rounding over the step.
        void Near(double expected, double actual)
        {
            Assert.Equal(expected, actual, 1e-6 * reading.StandardUncertainty(quantity));
        }
    }

    private static Reading Read(
        bool isSame, double signal = 0, double celsius = 0, double hectopascal = 0, double salinity = 0, double zero = 0, double slope = 0)
    {
        var moved = new FittedResponse(
            Fit.Zero + zero, Fit.Slope + slope, 0, Fit.VarianceZero, Fit.CovarianceZeroSlope, Fit.VarianceSlope, 0, 0, 0, Fit.ZeroPerKelvin, Fit.SlopePerKelvin, 0, 0, 0, 0, 0.5, 50);
        Assert.Equal(Status.Ok, ProbeCalibration.CreateFitted(
            new SeveringhausProbe(-0.2, 25, 0, 40), Gas.CarbonDioxide, moved, Stirring.FlowInsensitive, 1, UOffset, 0, out ProbeCalibration? calibration));
        var conditions = new ReadingConditions(GasDefaults.Equation(Gas.CarbonDioxide), 0.2, isSame, 0, 0.05, 1.1, 0.25, Stirring.FlowInsensitive, 1, 0);
        var reading = new Reading();
        Assert.Equal(Status.Ok, Correction.Correct(
            calibration!, conditions, -75 + signal, 14 + celsius, 985 + hectopascal, 21 + salinity, 500, RangeRule.Refuse, reading));
        Assert.Equal(Status.Ok, reading.UncertaintyStatus);
        return reading;
    }
}
