using Xunit;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>An invented probe and its calibration, the common ground of the tests of this folder.</summary>
internal static class Bench
{
    internal const double Slope = 0.31;
    internal const double Zero = 0.42;

    internal static AmperometricProbe Probe()
    {
        return new AmperometricProbe(TemperatureCoefficientForm.Exponential, 0.03, 25.0, 0.0, 40.0);
    }

    internal static double Signal(IProbeModel model, double slope, double zero, double flow, double temperature, double pressure, double partialPressure)
    {
        Assert.Equal(Status.Ok, model.Gain(temperature, RangeRule.Refuse, out double gain));
        Assert.Equal(Status.Ok, AmperometricProbe.ResponseTo(partialPressure, zero, slope, flow, gain, out double response));
        Assert.Equal(Status.Ok, model.Signal(response, temperature, pressure, 0.0, RangeRule.Refuse, out double signal));
        return signal;
    }

    internal static double Air(double temperature, double pressure)
    {
        Assert.Equal(Status.Ok, OxygenEquilibrium.PartialPressure(temperature, pressure, RangeRule.Refuse, out double value));
        return value;
    }

    internal static CalibrationPoint WaterPoint(
        double signal, double temperature, double pressure, double signalUncertainty = 0.0, double temperatureUncertainty = 0.0,
        double pressureUncertainty = 0.0, double stateUncertainty = 0.0)
    {
        return new CalibrationPoint(
            CalibrationMethod.AirSaturatedWater, signal, signalUncertainty, temperature, temperatureUncertainty, pressure,
            pressureUncertainty, Stirring.Stirred, 1.0, 1.0, 0.0, stateUncertainty);
    }

    internal static ProbeCalibration Calibrate(
        IProbeModel model, CalibrationPoint point, ZeroPoint zero, double offsetUncertainty = 0.0, double coefficientUncertainty = 0.0)
    {
        Assert.Equal(Status.Ok, ProbeCalibration.Create(model, point, zero, offsetUncertainty, coefficientUncertainty, out ProbeCalibration? made));
        Assert.NotNull(made);
        return made;
    }

    internal static ReadingConditions Conditions(
        double signalUncertainty = 0.0, bool sameThermometer = true, double offset = 0.0, double temperature = 0.0,
        double pressure = 0.0, double salinity = 0.0, double stirring = 0.0, SolubilityEquation equation = SolubilityEquation.BensonKrause1984)
    {
        return new ReadingConditions(
            equation, signalUncertainty, sameThermometer, offset, temperature, pressure, salinity, Stirring.Stirred, 1.0, stirring);
    }
}
