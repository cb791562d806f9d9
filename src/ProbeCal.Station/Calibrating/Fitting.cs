using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>A fit and what it rests on.</summary>
/// <param name="Calibration">What Core made; null unless the status is Ok.</param>
/// <param name="Status">Why there is none.</param>
/// <param name="Zero">The zero it rests on.</param>
/// <param name="SlopeFrom">Role of the point that gave the slope.</param>
internal sealed record Fit(ProbeCalibration? Calibration, Status Status, RecordedZero Zero, string SlopeFrom);

/// <summary>Slope and zero from the points taken so far, and readings by a calibration, all through Core.</summary>
internal static class Fitting
{
    /// <summary>The fit, by the same call with which a record is loaded later.</summary>
    internal static Fit Of(CalibrationSetup setup, IReadOnlyList<RecordedPoint> points, CalibrationRecord? previous)
    {
        RecordedPoint span = Point(points, CalibrationIds.SpanPoint) ?? throw new InvalidOperationException("A fit needs the 100 % point.");
        // What a meter shows after it was set is what readings will be computed from.
        RecordedPoint slopePoint = setup.Readings == CalibrationIds.Typed ? Point(points, CalibrationIds.AsLeftPoint) ?? span : span;
        RecordedZero zero = Zero(setup, slopePoint, points, previous);
        Status status = ProbeCalibration.Create(
            RecordConversion.Model(setup.Probe),
            RecordConversion.Point(setup.Method, slopePoint, setup.AirToWaterRatio, setup.ReferenceStateRelative),
            RecordConversion.Zero(zero),
            setup.Probe.Thermometer.CommonStandardUncertaintyCelsius,
            setup.Probe.TemperatureCoefficient.StandardUncertainty,
            out ProbeCalibration? calibration);
        return new Fit(calibration, status, zero, slopePoint.Role);
    }

    /// <summary>The 100 % point as the previous calibration (or the meter itself) reads it.</summary>
    internal static RecordedPoint ReadAsFound(CalibrationSetup setup, RecordedPoint span, CalibrationRecord? previous)
    {
        bool meter = setup.Probe.MeterSettings != null;
        if (meter && (setup.Readings == CalibrationIds.Typed || previous == null))
        {
            return Read(setup, span, RecordConversion.Model(setup.Probe), 1, 0, "meter");
        }

        if (previous == null || !IsComparable(previous.Probe, setup.Probe))
        {
            return span;
        }

        ProbeCalibration before = previous.ToProbeCalibration();
        return Read(setup, span, before.Model, before.Slope, before.ZeroResponse, previous.Id);
    }

    /// <summary>The point after the adjustment as the new calibration (or the meter itself) reads it.</summary>
    internal static RecordedPoint ReadAsLeft(CalibrationSetup setup, RecordedPoint asLeft, ProbeCalibration calibration)
    {
        return setup.Readings == CalibrationIds.Typed
            ? Read(setup, asLeft, calibration.Model, 1, 0, "meter")
            : Read(setup, asLeft, calibration.Model, calibration.Slope, calibration.ZeroResponse, "this");
    }

    /// <summary>The zero point in mg/L: as the new calibration reads it, or before an adjustment to it as a zero of 0 would.</summary>
    internal static RecordedPoint ReadZero(CalibrationSetup setup, RecordedPoint zero, RecordedPoint span, CalibrationRecord? previous)
    {
        bool adjusts = setup.ZeroPlan == CalibrationIds.ZeroAdjust;
        CalibrationSetup before = adjusts ? setup with { ZeroPlan = CalibrationIds.ZeroKeep } : setup;
        ProbeCalibration? calibration = Of(before, [span], previous).Calibration;
        if (calibration == null)
        {
            return zero;
        }

        bool meter = setup.Readings == CalibrationIds.Typed;
        RecordedZero read = Measured(zero, span);
        Status status = CalibrationFit.AsFoundZero(
            calibration.Model, meter ? 1 : calibration.Slope, meter ? 0 : calibration.ZeroResponse, RecordConversion.Zero(read), setup.Equation, out double milligrams);
        return status == Status.Ok
            ? zero with { ReadingMilligramsPerLitre = milligrams, ErrorMilligramsPerLitre = milligrams, ReadBy = meter ? "meter" : adjusts ? "this before the zero was adjusted" : "this" }
            : zero;
    }

    /// <summary>What a meter has to show at a reference so that it shows the truth in water afterwards.</summary>
    /// <returns>Value and its standard uncertainty in the unit the meter shows.</returns>
    internal static (double Value, double StandardUncertainty) ValueToSet(CalibrationSetup setup, RecordedPoint span)
    {
        Status status = MeterSetting.ValueToSet(
            (MeterDisplay)RecordConversion.Model(setup.Probe),
            RecordConversion.Point(setup.Method, span, setup.AirToWaterRatio, setup.ReferenceStateRelative),
            setup.Probe.Thermometer.CommonStandardUncertaintyCelsius,
            out double shown,
            out double uncertainty);
        return status == Status.Ok
            ? (shown, uncertainty)
            : throw new InputException($"the value to set in the meter cannot be computed ({status}); check what is set in it");
    }

    internal static RecordedPoint? Point(IReadOnlyList<RecordedPoint> points, string role)
    {
        foreach (RecordedPoint point in points)
        {
            if (point.Role == role)
            {
                return point;
            }
        }

        return null;
    }

    /// <summary>True when the signals of two calibrations mean the same.</summary>
    private static bool IsComparable(RecordedProbe before, RecordedProbe now)
    {
        return before.Model == now.Model && before.SignalUnit == now.SignalUnit;
    }

    private static RecordedPoint Read(CalibrationSetup setup, RecordedPoint point, IProbeModel model, double slope, double zero, string readBy)
    {
        Status status = CalibrationFit.AsFound(
            model,
            slope,
            zero,
            RecordConversion.Point(setup.Method, point, setup.AirToWaterRatio, setup.ReferenceStateRelative),
            setup.Equation,
            setup.Salinity.Value,
            out double error,
            out _);
        return status == Status.Ok
            ? point with { ReadingMilligramsPerLitre = point.ReferenceMilligramsPerLitre + error, ErrorMilligramsPerLitre = error, ReadBy = readBy }
            : point;
    }

    private static RecordedZero Zero(CalibrationSetup setup, RecordedPoint span, IReadOnlyList<RecordedPoint> points, CalibrationRecord? previous)
    {
        if (setup.ZeroPlan == CalibrationIds.ZeroAdjust && Point(points, CalibrationIds.ZeroPoint) is RecordedPoint measured)
        {
            return Measured(measured, span);
        }

        if (setup.ZeroPlan != CalibrationIds.ZeroAssume && CarriedOver(setup, previous) is RecordedZero carried)
        {
            return carried;
        }

        ZeroPoint assumed = ZeroPoint.Assume(RecordConversion.Point(setup.Method, span, setup.AirToWaterRatio, setup.ReferenceStateRelative));
        return new RecordedZero
        {
            IsMeasured = false,
            Signal = assumed.Signal,
            SignalStandardUncertainty = assumed.SignalUncertainty,
            TemperatureCelsius = assumed.TemperatureCelsius,
            PressureHectopascal = assumed.PressureHectopascal,
            Source = "assumed",
        };
    }

    private static RecordedZero Measured(RecordedPoint zero, RecordedPoint span)
    {
        double signalPerMilligram = (span.Signal.Mean - zero.Signal.Mean) / span.ReferenceMilligramsPerLitre;
        return new RecordedZero
        {
            IsMeasured = true,
            Signal = zero.Signal.Mean,
            SignalStandardUncertainty = PointMaker.Combine(zero.SignalStandardUncertainty, signalPerMilligram * PointMaker.ZeroSolutionMilligramsPerLitre),
            TemperatureCelsius = zero.Temperature.Value,
            PressureHectopascal = zero.Pressure.Value,
            Source = "measured",
        };
    }

    /// <summary>The last measured zero, as long as probe, signal and membrane are the same; a new membrane has a zero of its own.</summary>
    private static RecordedZero? CarriedOver(CalibrationSetup setup, CalibrationRecord? previous)
    {
        bool usable = previous != null && previous.Zero.IsMeasured
            && IsComparable(previous.Probe, setup.Probe)
            && previous.Probe.Membrane == setup.Probe.Membrane;
        if (!usable)
        {
            return null;
        }

        return previous!.Zero.Source == "measured" ? previous.Zero with { Source = "previous:" + previous.Id } : previous.Zero;
    }
}
