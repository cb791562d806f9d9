using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>A fit and what it rests on.</summary>
/// <param name="Calibration">What Core made; null unless the status is Ok.</param>
/// <param name="Status">Why there is none.</param>
/// <param name="Zero">The zero it rests on.</param>
/// <param name="SlopeFrom">Role of the point that gave the slope, <c>fit</c> for several points, <c>previous</c> for a check.</param>
internal sealed record Fit(ProbeCalibration? Calibration, Status Status, RecordedZero Zero, string SlopeFrom)
{
    /// <summary>The fit through several points; null where one point and a zero give the slope.</summary>
    public RecordedFit? Several { get; init; }

    /// <summary>The points that went into <see cref="Several"/>, with a zero that was assumed or carried over.</summary>
    public IReadOnlyList<RecordedPoint> Fitted { get; init; } = [];

    /// <summary>Why several points make no fit, in one line; null when they do.</summary>
    public string? Why { get; init; }
}

/// <summary>Slope and zero from the points taken so far, and readings by a calibration, all through Core.</summary>
internal static class Fitting
{
    /// <summary>What <see cref="Fit.SlopeFrom"/> says of several points.</summary>
    internal const string FromFit = "fit";

    /// <summary>What <see cref="Fit.SlopeFrom"/> says of a check, which changes nothing.</summary>
    internal const string FromPrevious = "previous";

    /// <summary>The fit, by the same call with which a record is loaded later; for a check the calibration in force.</summary>
    internal static Fit Of(CalibrationSetup setup, IReadOnlyList<RecordedPoint> points, CalibrationRecord? previous)
    {
        if (setup.Purpose == CalibrationRecord.CheckPurpose)
        {
            CalibrationRecord inForce = previous ?? throw new InvalidOperationException("A check needs a calibration.");
            return new Fit(inForce.ToProbeCalibration(), Status.Ok, inForce.Zero, FromPrevious) { Several = inForce.Fit };
        }

        if (!PlanCheck.IsOnePoint(setup))
        {
            return ThroughSeveral(setup, points, previous);
        }

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

    /// <summary>A point as somebody would have read it: as found by the previous calibration, as left by the new one, a meter by itself.</summary>
    internal static RecordedPoint Read(CalibrationSetup setup, RecordedPoint point, IReadOnlyList<RecordedPoint> before, CalibrationRecord? previous)
    {
        bool onePoint = PlanCheck.IsOnePoint(setup) && setup.Purpose == CalibrationRecord.CalibrationPurpose;
        if (point.Role == CalibrationIds.AsLeftPoint)
        {
            ProbeCalibration fitted = Of(setup, before, previous).Calibration ?? throw new InvalidOperationException("The as-left point needs a fit.");
            return onePoint ? ReadAsLeft(setup, point, fitted) : ReadBy(setup, point, fitted, IsMeterOfItsOwn(setup) ? "meter" : "this");
        }

        if (onePoint && point.Role == CalibrationIds.ZeroPoint)
        {
            return ReadZero(setup, point, Point(before, CalibrationIds.SpanPoint) ?? throw new InvalidOperationException("The zero point comes after the 100 % point."), previous);
        }

        if (onePoint && point.Role == CalibrationIds.SpanPoint)
        {
            return ReadAsFound(setup, point, previous);
        }

        if (setup.Probe.MeterSettings != null && (setup.Readings == CalibrationIds.Typed || previous == null))
        {
            return ReadBy(setup, point, null, "meter");
        }

        return previous == null || !IsComparable(previous.Probe, setup.Probe)
            ? point
            : ReadBy(setup, point, previous.ToProbeCalibration(), previous.Id);
    }

    /// <summary>What a meter has to show at a reference so that it shows the truth in water afterwards.</summary>
    /// <returns>Value and its standard uncertainty in the unit the meter shows.</returns>
    internal static (double Value, double StandardUncertainty) ValueToSet(CalibrationSetup setup, RecordedPoint span)
    {
        MeterDisplay meter = (MeterDisplay)RecordConversion.Model(setup.Probe);
        Status status;
        double shown;
        double uncertainty;
        if (PlanCheck.IsOnePoint(setup))
        {
            status = MeterSetting.ValueToSet(
                meter,
                RecordConversion.Point(setup.Method, span, setup.AirToWaterRatio, setup.ReferenceStateRelative),
                setup.Probe.Thermometer.CommonStandardUncertaintyCelsius,
                out shown,
                out uncertainty);
        }
        else
        {
            // The response of a meter is the partial pressure that its display stands for.
            status = meter.Signal(span.ReferencePartialPressureHectopascal, span.Temperature.Value, span.Pressure.Value, 0, RangeRule.Refuse, out shown);
            uncertainty = 0 < span.ReferencePartialPressureHectopascal
                ? shown * span.ReferencePartialPressureUncertaintyHectopascal / span.ReferencePartialPressureHectopascal
                : 0;
        }

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
    internal static bool IsComparable(RecordedProbe before, RecordedProbe now)
    {
        return before.Model == now.Model && before.SignalUnit == now.SignalUnit;
    }

    private static Fit ThroughSeveral(CalibrationSetup setup, IReadOnlyList<RecordedPoint> points, CalibrationRecord? previous)
    {
        // A meter that was set is read again; what it shows then is what readings will be computed from.
        RecordedPoint? asLeft = IsMeterOfItsOwn(setup) ? Point(points, CalibrationIds.AsLeftPoint) : null;
        List<RecordedPoint> fitted = [.. points.Where(point => point.Role switch
        {
            CalibrationIds.AsLeftPoint => asLeft != null,
            CalibrationIds.SpanPoint => asLeft == null,
            CalibrationIds.ZeroPoint => setup.ZeroPlan == CalibrationIds.ZeroAdjust,
            _ => true,
        })];
        RecordedPoint main = asLeft ?? Point(points, CalibrationIds.SpanPoint) ?? fitted[0];
        RecordedZero? zero = null;
        if (PlanCheck.NeedsAZero(setup) && fitted.TrueForAll(static point => point.Role != CalibrationIds.ZeroPoint))
        {
            zero = Zero(setup, main, points, previous);
            fitted.Add(AsPoint(zero, main));
        }

        (RecordedFit? several, string? why) = SeveralPoints.Of(setup.Probe, setup.Gas, fitted, setup.FitForm);
        if (several == null)
        {
            return new Fit(null, Status.PointsDegenerate, zero ?? NoZero(main), FromFit) { Why = why };
        }

        Status status = FitConversion.Create(setup.Probe, setup.Gas, several, setup.Stirring, 1, out ProbeCalibration? calibration);
        return new Fit(calibration, status, zero ?? ZeroOf(setup, points, several, main), FromFit)
        {
            Several = several,
            Fitted = fitted,
            Why = calibration == null ? $"the points make no calibration ({status})" : null,
        };
    }

    private static bool IsMeterOfItsOwn(CalibrationSetup setup)
    {
        return setup.Probe.MeterSettings != null && setup.Readings == CalibrationIds.Typed;
    }

    /// <summary>A zero that was assumed or carried over, as a point of a fit.</summary>
    private static RecordedPoint AsPoint(RecordedZero zero, RecordedPoint main)
    {
        return main with
        {
            Role = CalibrationIds.ZeroPoint,
            Method = null,
            Reference = null,
            Signal = main.Signal with { Count = 1, Mean = zero.Signal, StandardDeviation = 0, SlopePerMinute = 0, SlopeStandardErrorPerMinute = 0, Minimum = zero.Signal, Maximum = zero.Signal, WindowSeconds = 0 },
            SignalStandardUncertainty = zero.SignalStandardUncertainty,
            Temperature = main.Temperature with { Value = zero.TemperatureCelsius },
            Pressure = main.Pressure with { Value = zero.PressureHectopascal },
            // What is left in the solution is part of the signal's uncertainty already.
            ReferencePartialPressureHectopascal = 0,
            ReferencePartialPressureUncertaintyHectopascal = 0,
            ReferenceMilligramsPerLitre = 0,
            ReferenceUncertaintyMilligramsPerLitre = 0,
        };
    }

    /// <summary>The zero of a fit for the record: the measured one, or where the line meets zero.</summary>
    private static RecordedZero ZeroOf(CalibrationSetup setup, IReadOnlyList<RecordedPoint> points, RecordedFit fit, RecordedPoint main)
    {
        RecordedPoint? measured = setup.ZeroPlan == CalibrationIds.ZeroAdjust ? Point(points, CalibrationIds.ZeroPoint) : null;
        if (measured != null && main.ReferenceMilligramsPerLitre != 0)
        {
            return Measured(setup, measured, main);
        }

        IProbeModel model = RecordConversion.Model(setup.Probe);
        Status status = model.Signal(fit.Zero, main.Temperature.Value, main.Pressure.Value, 0, RangeRule.Extrapolate, out double signal);
        Status size = model.ResponsePerSignal(signal, main.Temperature.Value, main.Pressure.Value, 0, RangeRule.Extrapolate, out double perSignal);
        bool known = status == Status.Ok && size == Status.Ok && perSignal != 0;
        return NoZero(main) with
        {
            Signal = known ? signal : 0,
            SignalStandardUncertainty = known ? Math.Abs(Math.Sqrt(Math.Max(0, fit.Covariance[0])) / perSignal) : 0,
        };
    }

    private static RecordedZero NoZero(RecordedPoint main)
    {
        return new RecordedZero
        {
            IsMeasured = false,
            Signal = 0,
            SignalStandardUncertainty = 0,
            TemperatureCelsius = main.Temperature.Value,
            PressureHectopascal = main.Pressure.Value,
            Source = FromFit,
        };
    }

    /// <summary>A point as a calibration reads it, or as a meter shows it, in mg/L.</summary>
    private static RecordedPoint ReadBy(CalibrationSetup setup, RecordedPoint point, ProbeCalibration? calibration, string readBy)
    {
        Status status;
        double hectopascal;
        bool asShown = readBy == "meter";
        if (asShown)
        {
            status = RecordConversion.Model(setup.Probe).Response(point.Signal.Mean, point.Temperature.Value, point.Pressure.Value, 0, RangeRule.Refuse, out hectopascal);
        }
        else
        {
            double ratio = point.Method == MethodIds.WaterSaturatedAir && PlanCheck.IsOnePoint(setup) ? setup.AirToWaterRatio?.Value ?? 1 : 1;
            status = Correction.PartialPressure(
                calibration!, point.FlowFactor * ratio, point.Signal.Mean, point.Temperature.Value, point.Pressure.Value, 0, RangeRule.Extrapolate, out hectopascal);
        }

        if (double.IsNaN(hectopascal) || (asShown && status != Status.Ok))
        {
            return point;
        }

        double reference = point.ReferencePartialPressureHectopascal;
        double off = hectopascal - reference;
        double? milligrams = MilligramsPerHectopascal(setup, point) * off;
        return point with
        {
            ReadingHectopascal = hectopascal,
            ErrorHectopascal = off,
            ReadingMilligramsPerLitre = milligrams + point.ReferenceMilligramsPerLitre,
            ErrorMilligramsPerLitre = milligrams,
            ReadBy = readBy,
        };
    }

    /// <summary>Concentration per partial pressure in the water of a point, mg/(L·hPa); null where the gas has none.</summary>
    internal static double? MilligramsPerHectopascal(CalibrationSetup setup, RecordedPoint point)
    {
        if (point.ReferencePartialPressureHectopascal != 0)
        {
            return point.ReferenceMilligramsPerLitre == 0 ? null : point.ReferenceMilligramsPerLitre / point.ReferencePartialPressureHectopascal;
        }

        if (ModelNames.IsTotalPressure(setup.Probe.Model))
        {
            return null;
        }

        double celsius = point.Temperature.Value;
        double pressure = point.Pressure.Value;
        Status status;
        double perHectopascal;
        if (setup.Gas == Gas.Oxygen)
        {
            status = OxygenEquilibrium.ConcentrationFromPartialPressure(setup.Equation, celsius, setup.Salinity.Value, pressure, 1, RangeRule.Refuse, out perHectopascal);
        }
        else
        {
            status = GasEquilibrium.ConcentrationFromPartialPressure(setup.Gas, GasDefaults.Equation(setup.Gas), celsius, setup.Salinity.Value, pressure, 1, RangeRule.Refuse, out perHectopascal);
        }

        return status == Status.Ok ? perHectopascal : null;
    }

    /// <summary>The 100 % point as the previous calibration (or the meter itself) reads it.</summary>
    private static RecordedPoint ReadAsFound(CalibrationSetup setup, RecordedPoint span, CalibrationRecord? previous)
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
    private static RecordedPoint ReadAsLeft(CalibrationSetup setup, RecordedPoint asLeft, ProbeCalibration calibration)
    {
        return setup.Readings == CalibrationIds.Typed
            ? Read(setup, asLeft, calibration.Model, 1, 0, "meter")
            : Read(setup, asLeft, calibration.Model, calibration.Slope, calibration.ZeroResponse, "this");
    }

    /// <summary>The zero point in mg/L: as the new calibration reads it, or before an adjustment to it as a zero of 0 would.</summary>
    private static RecordedPoint ReadZero(CalibrationSetup setup, RecordedPoint zero, RecordedPoint span, CalibrationRecord? previous)
    {
        bool adjusts = setup.ZeroPlan == CalibrationIds.ZeroAdjust;
        CalibrationSetup before = adjusts ? setup with { ZeroPlan = CalibrationIds.ZeroKeep } : setup;
        ProbeCalibration? calibration = Of(before, [span], previous).Calibration;
        if (calibration == null)
        {
            return zero;
        }

        bool meter = setup.Readings == CalibrationIds.Typed;
        RecordedZero read = Measured(setup, zero, span);
        Status status = CalibrationFit.AsFoundZero(
            calibration.Model, meter ? 1 : calibration.Slope, meter ? 0 : calibration.ZeroResponse, RecordConversion.Zero(read), setup.Equation, out double milligrams);
        return status == Status.Ok
            ? zero with { ReadingMilligramsPerLitre = milligrams, ErrorMilligramsPerLitre = milligrams, ReadBy = meter ? "meter" : adjusts ? "this before the zero was adjusted" : "this" }
            : zero;
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
            return Measured(setup, measured, span);
        }

        if (setup.ZeroPlan != CalibrationIds.ZeroAssume && CarriedOver(setup, previous) is RecordedZero carried)
        {
            return carried;
        }

        // A share of the signal at the point is assumed, whatever made its truth known.
        string usual = PlanCheck.IsOnePoint(setup) ? setup.Method : MethodIds.AirSaturatedWater;
        ZeroPoint assumed = ZeroPoint.Assume(RecordConversion.Point(usual, span, setup.AirToWaterRatio, setup.ReferenceStateRelative));
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

    private static RecordedZero Measured(CalibrationSetup setup, RecordedPoint zero, RecordedPoint span)
    {
        double signalPerMilligram = SignalPerMilligramAtZero(setup, zero, span);
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

    /// <summary>
    /// Signal for 1 mg/L next to zero. A membrane's signal is proportional, so that the 100 % point tells it; a luminescence falls much more steeply at zero than on average
    /// up to there, and only its response is a straight line.
    /// </summary>
    private static double SignalPerMilligramAtZero(CalibrationSetup setup, RecordedPoint zero, RecordedPoint span)
    {
        double average = (span.Signal.Mean - zero.Signal.Mean) / span.ReferenceMilligramsPerLitre;
        if (PlanCheck.IsProportional(setup.Probe))
        {
            return average;
        }

        IProbeModel model = RecordConversion.Model(setup.Probe);
        Status above = model.Response(span.Signal.Mean, span.Temperature.Value, span.Pressure.Value, 0, RangeRule.Refuse, out double full);
        Status below = model.Response(zero.Signal.Mean, zero.Temperature.Value, zero.Pressure.Value, 0, RangeRule.Refuse, out double none);
        Status slope = model.ResponsePerSignal(zero.Signal.Mean, zero.Temperature.Value, zero.Pressure.Value, 0, RangeRule.Refuse, out double perSignal);
        bool known = above == Status.Ok && below == Status.Ok && slope == Status.Ok && perSignal != 0;
        // Where the model refuses, it refuses the calibration itself a moment later.
        return known ? (full - none) / span.ReferenceMilligramsPerLitre / perSignal : average;
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
