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

    internal static TakenReading FromWindow(string role, CalibrationSetup setup, StabilityWatch watch)
    {
        bool typed = setup.TypedTemperatureCelsius != null;
        double step = (setup.Probe.SignalResolution ?? 0) * RectangularPerStep;
        return new TakenReading
        {
            Role = role,
            FirstUtc = watch.FirstUtc,
            LastUtc = watch.LastUtc,
            Typed = false,
            Signal = Statistics(watch.Signal),
            SignalStandardUncertainty = Combine(watch.Signal.MeanUncertainty, step),
            TemperatureStatistics = typed ? null : Statistics(watch.Temperature),
            TemperatureCelsius = setup.TypedTemperatureCelsius ?? watch.Temperature.Mean,
            TemperatureSource = typed ? "typed" : RecordNames.FromLine,
            TemperatureStandardUncertaintyKelvin = typed
                ? setup.TemperatureStandardUncertaintyKelvin
                : Combine(setup.TemperatureStandardUncertaintyKelvin, watch.Temperature.MeanUncertainty),
            PressureHectopascal = setup.Pressure.Hectopascal is null ? watch.MeanPressure : setup.Pressure.At(null)!.Value,
        };
    }

    internal static TakenReading FromTyped(string role, CalibrationSetup setup, Conditions conditions, double shown, DateTimeOffset nowUtc)
    {
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
        return new TakenReading
        {
            Role = role,
            FirstUtc = nowUtc,
            LastUtc = nowUtc,
            Typed = true,
            Signal = once,
            SignalStandardUncertainty = (setup.Probe.MeterSettings?.Resolution ?? setup.Probe.SignalResolution ?? 0) * RectangularPerDigit,
            TemperatureCelsius = conditions.TemperatureCelsius,
            TemperatureSource = conditions.TemperatureSource,
            TemperatureStandardUncertaintyKelvin = setup.TemperatureStandardUncertaintyKelvin,
            PressureHectopascal = conditions.PressureHectopascal,
        };
    }

    /// <summary>The point of a reading: with what was true there.</summary>
    /// <exception cref="InputException">No truth can be computed there, in one line.</exception>
    internal static RecordedPoint Make(TakenReading reading, PlannedPoint planned, CalibrationSetup setup)
    {
        Conditions conditions = new(reading.TemperatureCelsius, reading.TemperatureSource, reading.PressureHectopascal);
        PointReference truth = References.Of(planned, setup, conditions, reading.TemperatureStandardUncertaintyKelvin);
        // With one point the record's ratio stands beside it; among several points each carries its own.
        bool carriesRatio = planned.Method == MethodIds.WaterSaturatedAir && setup.AirToWaterRatio != null && !PlanCheck.IsOnePoint(setup);
        if (carriesRatio)
        {
            truth = WithRatio(truth, setup.AirToWaterRatio!);
        }

        return new RecordedPoint
        {
            Role = reading.Role,
            Method = planned.Method,
            Reference = truth.Recorded,
            FirstUtc = reading.FirstUtc,
            LastUtc = reading.LastUtc,
            Typed = reading.Typed,
            Signal = reading.Signal,
            SignalStandardUncertainty = reading.SignalStandardUncertainty,
            TemperatureStatistics = reading.TemperatureStatistics,
            Temperature = new RecordedQuantity
            {
                Value = reading.TemperatureCelsius,
                Unit = "degC",
                StandardUncertainty = reading.TemperatureStandardUncertaintyKelvin,
                Source = reading.TemperatureSource,
            },
            Pressure = new RecordedQuantity
            {
                Value = reading.PressureHectopascal,
                Unit = "hPa",
                StandardUncertainty = setup.Pressure.StandardUncertaintyHectopascal,
                Source = setup.Pressure.Source,
                UncertaintySource = setup.Pressure.UncertaintySource,
            },
            Salinity = setup.Salinity,
            Stirring = RecordNames.Of(setup.Stirring),
            FlowFactor = carriesRatio ? setup.AirToWaterRatio!.Value : 1,
            ReferencePartialPressureHectopascal = truth.Hectopascal,
            ReferencePartialPressureUncertaintyHectopascal = truth.StandardUncertaintyHectopascal,
            ReferenceMilligramsPerLitre = truth.MilligramsPerLitre ?? 0,
            ReferenceUncertaintyMilligramsPerLitre = truth.StandardUncertaintyMilligramsPerLitre ?? 0,
        };
    }

    /// <summary>How well the ratio of air to water is known counts as if the reference were known less well.</summary>
    private static PointReference WithRatio(PointReference truth, RecordedQuantity ratio)
    {
        double relative = ratio.StandardUncertainty / ratio.Value;
        RecordedReferenceContribution line = new()
        {
            Input = ReferenceInputs.AirToWaterRatio,
            Value = ratio.Value,
            StandardUncertainty = ratio.StandardUncertainty,
            Unit = "1",
            Distribution = "normal",
            Hectopascal = -truth.Hectopascal * relative,
            Source = ratio.UncertaintySource ?? ratio.Source,
        };
        RecordedReference recorded = truth.Recorded ?? new RecordedReference();
        return truth with
        {
            StandardUncertaintyHectopascal = Combine(truth.StandardUncertaintyHectopascal, line.Hectopascal),
            StandardUncertaintyMilligramsPerLitre = truth.MilligramsPerLitre is double milligrams && truth.StandardUncertaintyMilligramsPerLitre is double of
                ? Combine(of, milligrams * relative)
                : truth.StandardUncertaintyMilligramsPerLitre,
            Recorded = recorded with { Budget = [.. recorded.Budget, line] },
        };
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
}
