using System;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>From a record to what Core corrects readings with. Live and re-corrected data pass through the same call.</summary>
internal static class RecordConversion
{
    /// <summary>The calibration that the record describes. The same record gives the same bits.</summary>
    /// <exception cref="InputException">The record names something that this program does not know.</exception>
    /// <exception cref="WorkFailedException">Core refuses its figures: they make no calibration.</exception>
    public static ProbeCalibration ToProbeCalibration(this CalibrationRecord record)
    {
        RecordedPoint slopePoint = Array.Find(record.Points, point => point.Role == record.SlopeFrom)
            ?? throw new WorkFailedException($"calibration {record.Id}: it has no point '{record.SlopeFrom}' to take the slope from");
        Status status = ProbeCalibration.Create(
            Model(record.Probe),
            Point(record.Method, slopePoint, record.AirToWaterRatio, record.ReferenceState.StandardUncertainty),
            Zero(record.Zero),
            record.Probe.Thermometer.CommonStandardUncertaintyCelsius,
            record.Probe.TemperatureCoefficient.StandardUncertainty,
            out ProbeCalibration? calibration);
        return calibration ?? throw new WorkFailedException($"calibration {record.Id}: its figures make no calibration ({status})");
    }

    /// <summary>The probe's response model.</summary>
    public static IProbeModel Model(RecordedProbe probe)
    {
        RecordedTemperatureCoefficient coefficient = probe.TemperatureCoefficient;
        TemperatureCoefficientForm form = RecordNames.Form(coefficient.Form);
        if (probe.MeterSettings is RecordedMeterSettings meter)
        {
            return new MeterDisplay(
                RecordNames.Scale(meter.Shows),
                EquationNames.Parse("calibration record: equation", meter.Equation),
                meter.Salinity,
                meter.PressureHectopascal ?? double.NaN,
                meter.TemperatureCelsius ?? double.NaN,
                form,
                coefficient.Value,
                coefficient.ReferenceCelsius,
                coefficient.FittedLowCelsius,
                coefficient.FittedHighCelsius);
        }

        return new AmperometricProbe(form, coefficient.Value, coefficient.ReferenceCelsius, coefficient.FittedLowCelsius, coefficient.FittedHighCelsius);
    }

    /// <summary>A recorded point as Core takes it.</summary>
    /// <param name="method">The method's id.</param>
    /// <param name="point">The point.</param>
    /// <param name="airToWaterRatio">The ratio of an air point; null for water.</param>
    /// <param name="referenceStateRelative">Relative standard uncertainty of the state of the reference.</param>
    public static CalibrationPoint Point(string method, RecordedPoint point, RecordedQuantity? airToWaterRatio, double referenceStateRelative)
    {
        double ratio = airToWaterRatio?.Value ?? 1;
        return new CalibrationPoint(
            RecordNames.Method(method),
            point.Signal.Mean,
            point.SignalStandardUncertainty,
            point.Temperature.Value,
            point.Temperature.StandardUncertainty,
            point.Pressure.Value,
            point.Pressure.StandardUncertainty,
            RecordNames.StirringOf(point.Stirring),
            point.FlowFactor,
            ratio,
            airToWaterRatio == null ? 0 : airToWaterRatio.StandardUncertainty / ratio,
            referenceStateRelative);
    }

    /// <summary>A recorded zero as Core takes it.</summary>
    public static ZeroPoint Zero(RecordedZero zero)
    {
        return new ZeroPoint(zero.IsMeasured, zero.Signal, zero.SignalStandardUncertainty, zero.TemperatureCelsius, zero.PressureHectopascal);
    }
}
