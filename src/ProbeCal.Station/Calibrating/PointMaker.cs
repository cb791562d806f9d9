using System;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>What is known about the conditions at one moment.</summary>
/// <param name="TemperatureCelsius">Temperature the calibration goes by, °C.</param>
/// <param name="TemperatureSource">Where it comes from.</param>
/// <param name="PressureHectopascal">Absolute station pressure, hPa.</param>
internal sealed record Conditions(double TemperatureCelsius, string TemperatureSource, double PressureHectopascal);

/// <summary>Makes recorded points of steady windows and of typed readings: the reference there, and how well it is known.</summary>
internal static class PointMaker
{
    private const double RectangularPerStep = 0.28867513459481288;

    /// <summary>A typed display may sit one last digit either way, rectangular (our choice, no source).</summary>
    private const double RectangularPerDigit = 0.57735026918962576;

    /// <summary>Oxygen left in a fresh sulfite solution or under flowing nitrogen, k = 1, mg/L (our choice, no source).</summary>
    internal const double ZeroSolutionMilligramsPerLitre = 0.02;

    internal static RecordedPoint FromWindow(string role, CalibrationSetup setup, StabilityWatch watch)
    {
        bool typed = setup.TypedTemperatureCelsius != null;
        Conditions conditions = new(
            setup.TypedTemperatureCelsius ?? watch.Temperature.Mean,
            typed ? "typed" : RecordNames.FromLine,
            setup.Pressure.Hectopascal ?? watch.MeanPressure);
        double step = (setup.Probe.SignalResolution ?? 0) * RectangularPerStep;
        double uncertainty = Combine(watch.Signal.MeanUncertainty, step);
        double temperatureUncertainty = typed
            ? setup.TemperatureStandardUncertaintyKelvin
            : Combine(setup.TemperatureStandardUncertaintyKelvin, watch.Temperature.MeanUncertainty);
        RecordedPoint point = Make(role, setup, conditions, Statistics(watch.Signal), uncertainty, temperatureUncertainty);
        return point with
        {
            FirstUtc = watch.FirstUtc,
            LastUtc = watch.LastUtc,
            TemperatureStatistics = typed ? null : Statistics(watch.Temperature),
        };
    }

    internal static RecordedPoint FromTyped(string role, CalibrationSetup setup, Conditions conditions, double shown, DateTimeOffset nowUtc)
    {
        double uncertainty = (setup.Probe.MeterSettings?.Resolution ?? setup.Probe.SignalResolution ?? 0) * RectangularPerDigit;
        RecordedStatistics once = new()
        {
            Count = 1,
            Mean = shown,
            StandardDeviation = 0,
            SlopePerMinute = 0,
            SlopeStandardErrorPerMinute = 0,
            Minimum = shown,
            Maximum = shown,
            WindowSeconds = 0,
        };
        RecordedPoint point = Make(role, setup, conditions, once, uncertainty, setup.TemperatureStandardUncertaintyKelvin);
        return point with { Typed = true, FirstUtc = nowUtc, LastUtc = nowUtc };
    }

    /// <summary>Root of the sum of squares.</summary>
    internal static double Combine(params ReadOnlySpan<double> parts)
    {
        double squares = 0;
        foreach (double part in parts)
        {
            squares += part * part;
        }

        return Math.Sqrt(squares);
    }

    private static RecordedPoint Make(string role, CalibrationSetup setup, Conditions conditions, RecordedStatistics signal, double signalUncertainty, double temperatureUncertainty)
    {
        bool zero = role == CalibrationIds.ZeroPoint;
        double celsius = conditions.TemperatureCelsius;
        double hectopascal = conditions.PressureHectopascal;
        double salinity = setup.Salinity.Value;
        double wholeTemperature = Combine(temperatureUncertainty, setup.Probe.Thermometer.CommonStandardUncertaintyCelsius);
        double pressureUncertainty = setup.Pressure.StandardUncertaintyHectopascal;
        Require(OxygenEquilibrium.PartialPressure(celsius, hectopascal, RangeRule.Refuse, out double reference), conditions);
        Require(OxygenEquilibrium.MilligramsPerLitre(setup.Equation, celsius, salinity, hectopascal, RangeRule.Refuse, out double concentration), conditions);
        Require(OxygenUncertainty.PartialPressure(celsius, hectopascal, wholeTemperature, pressureUncertainty, RangeRule.Refuse, out double ofReference), conditions);
        Require(OxygenUncertainty.MilligramsPerLitre(
            setup.Equation, celsius, salinity, hectopascal, wholeTemperature, setup.Salinity.StandardUncertainty, pressureUncertainty, RangeRule.Refuse, out double ofConcentration), conditions);
        double perConcentration = reference / concentration;
        return new RecordedPoint
        {
            Role = role,
            FirstUtc = DateTimeOffset.UnixEpoch,
            LastUtc = DateTimeOffset.UnixEpoch,
            Typed = false,
            Signal = signal,
            SignalStandardUncertainty = signalUncertainty,
            Temperature = new RecordedQuantity { Value = celsius, Unit = "degC", StandardUncertainty = temperatureUncertainty, Source = conditions.TemperatureSource },
            Pressure = new RecordedQuantity
            {
                Value = hectopascal,
                Unit = "hPa",
                StandardUncertainty = pressureUncertainty,
                Source = setup.Pressure.Source,
                UncertaintySource = setup.Pressure.UncertaintySource,
            },
            Salinity = setup.Salinity,
            Stirring = RecordNames.Of(setup.Stirring),
            FlowFactor = 1,
            ReferencePartialPressureHectopascal = zero ? 0 : reference,
            ReferencePartialPressureUncertaintyHectopascal = zero ? ZeroSolutionMilligramsPerLitre * perConcentration : Combine(ofReference, reference * setup.ReferenceStateRelative),
            ReferenceMilligramsPerLitre = zero ? 0 : concentration,
            ReferenceUncertaintyMilligramsPerLitre = zero ? ZeroSolutionMilligramsPerLitre : Combine(ofConcentration, concentration * setup.ReferenceStateRelative),
        };
    }

    private static RecordedStatistics Statistics(WindowStatistics window)
    {
        return new RecordedStatistics
        {
            Count = window.Count,
            Mean = window.Mean,
            StandardDeviation = window.ResidualDeviation,
            SlopePerMinute = window.SlopePerSecond * 60,
            SlopeStandardErrorPerMinute = window.SlopeStandardError * 60,
            Minimum = window.Minimum,
            Maximum = window.Maximum,
            WindowSeconds = window.SpanSeconds,
        };
    }

    private static void Require(Status status, Conditions conditions)
    {
        if (status != Status.Ok)
        {
            throw new InputException($"temperature {Number.Print(conditions.TemperatureCelsius)} C, pressure {Number.Print(conditions.PressureHectopascal)} hPa: no reference can be computed there ({status}); "
                + "the equation holds from 0 to 40 C and from 507 to 1114 hPa");
        }
    }
}
