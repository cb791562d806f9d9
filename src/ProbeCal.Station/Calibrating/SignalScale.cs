using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// What can be told of a signal before there is a fit: whether the probe has left the last point, and how much one unit of
/// signal is in mg/L. It decides when a window is taken, never what comes out of it.
/// </summary>
internal sealed class SignalScale
{
    /// <summary>A signal has left the last point when it differs by this many of the point's standard deviations (our choice, no source).</summary>
    private const double ScattersAway = 10;

    /// <summary>Two references that differ by less than this share are one for the signal (our choice, no source).</summary>
    private const double SameReference = 0.1;

    /// <summary>The same for total gas pressures, which all lie near that of the air: 5 hPa in 1000 are another level (our choice, no source).</summary>
    private const double SameTotalPressure = 0.005;

    /// <summary>Steadiness of a total gas pressure: 1 hPa counts as the usual limit for oxygen, 0.05 mg/L (our choice, no source).</summary>
    private const double MilligramsPerTotalHectopascal = 0.05;

    /// <summary>Ideal signal of a potentiometric probe, mV for ten times the partial pressure at 25 °C (2.303 R T/F).</summary>
    private const double IdealMillivoltsPerDecade = 59.16;

    private readonly CalibrationSetup _setup;
    private readonly string _role;
    private readonly RecordedPoint? _span;
    private readonly RecordedPoint? _last;
    private readonly ProbeCalibration? _before;
    private readonly bool _proportional;
    private readonly double _zeroGuess;

    internal SignalScale(CalibrationSetup setup, string role, IReadOnlyList<RecordedPoint> points, CalibrationRecord? previous)
    {
        _setup = setup;
        _role = role;
        _span = Fitting.Point(points, CalibrationIds.SpanPoint);
        _last = points.Count == 0 ? null : points[^1];
        _proportional = PlanCheck.IsProportional(setup.Probe);
        _zeroGuess = previous != null && Fitting.IsComparable(previous.Probe, setup.Probe) ? previous.Zero.Signal : 0;
        _before = !_proportional && previous != null && Fitting.IsComparable(previous.Probe, setup.Probe) ? previous.ToProbeCalibration() : null;
    }

    /// <summary>Why the probe is not where the step wants it, told by the signal alone; null when it is, or when that cannot be told.</summary>
    /// <param name="signal">The newest signal.</param>
    /// <param name="isFirst">True before the first sample of the window.</param>
    /// <param name="truth">What will be true at the point; null while nobody knows.</param>
    internal string? NotInPlace(double signal, bool isFirst, PointReference? truth)
    {
        if (_proportional && _span != null && _role is CalibrationIds.ZeroPoint or CalibrationIds.AsLeftPoint)
        {
            return ByShare(signal, isFirst);
        }

        if (_last == null || !isFirst || (_role == CalibrationIds.AsLeftPoint && _last.Role == CalibrationIds.SpanPoint))
        {
            return null;
        }

        double? target = _role == CalibrationIds.AsLeftPoint ? _span?.ReferencePartialPressureHectopascal : truth?.Hectopascal;
        double from = _last.ReferencePartialPressureHectopascal;
        if (target is not double to || Math.Abs(to - from) <= (ModelNames.IsTotalPressure(_setup.Probe.Model) ? SameTotalPressure : SameReference) * Math.Max(Math.Abs(to), Math.Abs(from)))
        {
            return null;
        }

        double moved = Math.Abs(signal - _last.Signal.Mean);
        bool still = _proportional && from != 0
            ? moved < 0.5 * Math.Abs(_last.Signal.Mean * ((to / from) - 1))
            : moved <= ScattersAway * _last.Signal.StandardDeviation;
        return still
            ? Finding.Text($"not at the {_role} point yet: its signal is {Number.Print(Math.Round(signal, 4))}, still near the {_last.Role} point ({Number.Print(Math.Round(_last.Signal.Mean, 4))})")
            : null;
    }

    /// <summary>Size of one unit of signal at the reference, mg/L; NaN where it has none.</summary>
    internal double MilligramsPerSignal(double meanSignal, double celsius, double hectopascal, PointReference? truth)
    {
        if (_role == CalibrationIds.ZeroPoint && _span != null)
        {
            double below = _span.Signal.Mean - meanSignal;
            return below == 0 ? double.NaN : Concentration(_span, celsius, hectopascal) / below;
        }

        double reference = truth is { MilligramsPerLitre: double milligrams } && milligrams != 0 && IsOxygen ? milligrams : Saturation(celsius, hectopascal);
        if (_proportional || ModelNames.IsTotalPressure(_setup.Probe.Model))
        {
            double above = meanSignal - _zeroGuess;
            double size = above == 0 ? double.NaN : reference / above;
            return ModelNames.IsTotalPressure(_setup.Probe.Model) ? MilligramsPerTotalHectopascal : size;
        }

        if (_before != null && truth != null && truth.Hectopascal != 0 && Slope(meanSignal, celsius, hectopascal) is double perSignal)
        {
            return reference * perSignal / truth.Hectopascal;
        }

        if (ModelNames.IsLogarithmic(_setup.Probe.Model))
        {
            double millivolts = _setup.Probe.SignalUnit == "V" ? 1000 : 1;
            return reference * Math.Log(10) * millivolts / IdealMillivoltsPerDecade;
        }

        if (_last != null && truth != null && _last.Signal.Mean != meanSignal && _last.ReferencePartialPressureHectopascal != truth.Hectopascal)
        {
            double all = Math.Max(truth.Hectopascal, _last.ReferencePartialPressureHectopascal);
            return reference * (truth.Hectopascal - _last.ReferencePartialPressureHectopascal) / (all * (meanSignal - _last.Signal.Mean));
        }

        return meanSignal == 0 ? double.NaN : reference / meanSignal;
    }

    private bool IsOxygen => PlanCheck.IsOxygen(_setup);

    private string? ByShare(double signal, bool isFirst)
    {
        double share = signal / _span!.Signal.Mean;
        if (_role == CalibrationIds.ZeroPoint && isFirst && _setup.Waiting.ZeroEntryShare < share)
        {
            string where = _setup.PlannedFor(CalibrationIds.ZeroPoint).Method == MethodIds.ZeroGas ? "under the zero gas" : "in the zero solution";
            return Finding.Text($"not {where} yet: its signal is still {Number.Fixed(100 * share, 0)} % of the 100 % point");
        }

        return _role == CalibrationIds.AsLeftPoint && share < _setup.Waiting.SpanReturnShare
            ? Finding.Text($"not back at 100 % yet: its signal is {Number.Fixed(100 * share, 0)} % of the point as found")
            : null;
    }

    /// <summary>The reference of the 100 % point in mg/L; for another gas what oxygen would be there, so that steadiness means the same share.</summary>
    private double Concentration(RecordedPoint span, double celsius, double hectopascal)
    {
        return IsOxygen && span.ReferenceMilligramsPerLitre != 0 ? span.ReferenceMilligramsPerLitre : Saturation(celsius, hectopascal);
    }

    private double Saturation(double celsius, double hectopascal)
    {
        Status status = OxygenEquilibrium.MilligramsPerLitre(_setup.Equation, celsius, _setup.Salinity.Value, hectopascal, RangeRule.Refuse, out double saturation);
        return status == Status.Ok ? saturation : double.NaN;
    }

    /// <summary>Partial pressure per signal by the calibration in force, hPa; null where it cannot be told.</summary>
    private double? Slope(double signal, double celsius, double hectopascal)
    {
        double step = Math.Max(Math.Abs(signal) * 1e-4, 1e-9);
        Correction.PartialPressure(_before!, 1, signal - step, celsius, hectopascal, 0, RangeRule.Extrapolate, out double low);
        Correction.PartialPressure(_before!, 1, signal + step, celsius, hectopascal, 0, RangeRule.Extrapolate, out double high);
        double slope = (high - low) / (2 * step);
        return double.IsFinite(slope) && slope != 0 ? slope : null;
    }
}
