using System;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// How well the error of a reading at a point is known. Error = k · (pO2 read − pO2 of the reference). The factor k to mg/L is one and the same for
/// both, so that the solubility equation and the salinity cancel, and what the thermometer's offset does to k with them. What remains: the partial
/// pressure of the reference (barometer, vapour, state of the bath), the signal in the window, and the temperature by which the reading is compensated.
/// How well the calibration that reads was made is no part of it: its error is what is judged.
/// </summary>
internal static class ErrorUncertainty
{
    private const double KelvinStep = 0.01;

    /// <summary>Standard uncertainty of the error at a point, in mg/L where the point has a concentration and in hPa otherwise; null where it cannot be said.</summary>
    /// <param name="setup">The set-up.</param>
    /// <param name="point">The point.</param>
    /// <param name="calibration">A calibration of the probe; it gives the sensitivities of the reading.</param>
    /// <param name="perHectopascal">mg/L per hPa at the point; 1 for an error in hPa.</param>
    internal static double? Of(CalibrationSetup setup, RecordedPoint point, ProbeCalibration calibration, double perHectopascal)
    {
        // Among several points each carries the ratio itself: in its flow factor, and in the uncertainty of its reference.
        RecordedQuantity? beside = PlanCheck.IsOnePoint(setup) ? setup.AirToWaterRatio : null;
        double ratio = beside != null && (point.Method ?? setup.PlannedFor(point.Role).Method) == MethodIds.WaterSaturatedAir ? beside.Value : 1;
        double step = Math.Max(Math.Abs(point.Signal.Mean) * 1e-4, point.SignalStandardUncertainty);
        double perSignal = step == 0 ? 0 : (Read(point.Signal.Mean + step, 0) - Read(point.Signal.Mean - step, 0)) / (2 * step);
        double perKelvin = (Read(point.Signal.Mean, KelvinStep) - Read(point.Signal.Mean, -KelvinStep)) / (2 * KelvinStep);
        // A meter's display was made at the meter's temperature, and is turned back at the one given here: the two may be different thermometers.
        double ownKelvin = point.Temperature.StandardUncertainty;
        double kelvin = setup.Probe.MeterSettings == null ? ownKelvin : PointMaker.Combine(ownKelvin, setup.Probe.Thermometer.CommonStandardUncertaintyCelsius);
        // In the chamber the ratio of air to water stands on both sides, unless a calibration made elsewhere reads the point.
        bool shared = point.ReadBy is null or "this" or "meter";
        double air = shared || beside == null ? 0 : point.ReferencePartialPressureHectopascal * beside.StandardUncertainty / ratio;
        double hectopascal = PointMaker.Combine(
            point.ReferencePartialPressureUncertaintyHectopascal, perSignal * point.SignalStandardUncertainty, perKelvin * kelvin, air);
        double whole = hectopascal * perHectopascal;
        return double.IsFinite(whole) ? whole : null;

        double Read(double signal, double warmer)
        {
            _ = Correction.PartialPressure(
                calibration, point.FlowFactor * ratio, signal, point.Temperature.Value + warmer, point.Pressure.Value, 0, RangeRule.Extrapolate, out double read);
            return read;
        }
    }

    /// <summary>The same in mg/L; null where the point has no concentration.</summary>
    internal static double? InMilligramsPerLitre(CalibrationSetup setup, RecordedPoint point, ProbeCalibration calibration)
    {
        return Fitting.MilligramsPerHectopascal(setup, point) is double per ? Of(setup, point, calibration, per) : null;
    }
}
