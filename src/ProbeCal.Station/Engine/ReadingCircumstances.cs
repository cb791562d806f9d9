using System;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Engine;

/// <summary>How readings are made under a calibration: one place for live and for recorded data, so that both make the same conditions.</summary>
internal static class ReadingCircumstances
{
    /// <summary>The conditions that Core takes.</summary>
    /// <param name="calibration">The calibration.</param>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="signalUncertainty">Standard uncertainty of one signal; null takes it from the calibration.</param>
    /// <param name="hasSameThermometer">True when the calibration's thermometer reads the water.</param>
    /// <param name="thermometerOffsetKelvin">Offset of another thermometer, standard uncertainty, K.</param>
    /// <param name="temperatureKelvin">Standard uncertainty of a temperature without the offset, K.</param>
    /// <param name="pressureHectopascal">Standard uncertainty of the pressure, hPa.</param>
    /// <param name="salinity">Standard uncertainty of the salinity.</param>
    /// <param name="stirring">How the water moves.</param>
    /// <exception cref="InputException">The uncertainties make no conditions that Core takes.</exception>
    internal static ReadingConditions Of(
        LoadedCalibration calibration, SolubilityEquation equation, double? signalUncertainty, bool hasSameThermometer, double thermometerOffsetKelvin,
        double temperatureKelvin, double pressureHectopascal, double salinity, Stirring stirring)
    {
        ReadingConditions conditions = new(
            calibration.Core.Gas == Gas.Oxygen ? equation : GasDefaults.Equation(calibration.Core.Gas),
            signalUncertainty ?? calibration.SignalUncertainty,
            hasSameThermometer,
            thermometerOffsetKelvin,
            temperatureKelvin,
            pressureHectopascal,
            salinity,
            stirring,
            FlowFactor(stirring, calibration.Core),
            UncertaintyDefaults.StirringRelative(stirring));
        Status status = conditions.Check();
        return status == Status.Ok ? conditions : throw new InputException("the station's uncertainties make no conditions for a reading: " + status);
    }

    /// <summary>
    /// The calibration's flow factor, and where the water moves otherwise now, times what the probe was characterised to give in still water over stirred.
    /// </summary>
    private static double FlowFactor(Stirring stirring, ProbeCalibration calibration)
    {
        double still = calibration.Model is AmperometricProbe { StillFactor: > 0 } probe ? probe.StillFactor : 1;
        Stirring calibrated = calibration.IsAirPoint ? Stirring.Stirred : calibration.Stirring;
        return (calibrated, stirring) switch
        {
            (Stirring.Stirred, Stirring.Still) => calibration.FlowFactor * still,
            (Stirring.Still, Stirring.Stirred) => calibration.FlowFactor / still,
            _ => calibration.FlowFactor,
        };
    }

    /// <summary>
    /// Whether the thermometer of the calibration reads the water, so that its offset largely cancels. Where nobody names one, the
    /// line does: it is the same when the calibration went by the line too, or by the probe's own display.
    /// </summary>
    internal static bool IsSameThermometer(string? id, CalibrationRecord record)
    {
        if (id != null)
        {
            return id == record.Probe.Thermometer.Id;
        }

        bool fromLine = Array.Exists(record.Points, point => (record.Fit != null || point.Role == record.SlopeFrom) && point.Temperature.Source == RecordNames.FromLine);
        return fromLine || record.Probe.Thermometer.Id == record.Probe.Id;
    }
}
