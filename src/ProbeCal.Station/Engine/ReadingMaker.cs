using System;
using System.Text;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Journal;
using ProbeCal.Station.Sources;

namespace ProbeCal.Station.Engine;

/// <summary>A sample as the journal keeps it and the message that goes out. The bytes of the message never change afterwards.</summary>
internal sealed record MadeReading(SampleRow Row, Message Message);

/// <summary>
/// Sample and sequence number in, journal row and message out. The same sample with the same number gives the same bytes. Not
/// for concurrent use.
/// </summary>
internal sealed class ReadingMaker
{
    private readonly StationConfiguration _configuration;
    private readonly LoadedCalibration? _calibration;
    private readonly ReadingConditions? _conditions;
    private readonly ReadingJson _json;
    private readonly Topics _topics;
    private readonly bool _stirringDiffers;
    private readonly Reading _reading = new();

    /// <summary>Prepares for one station and calibration.</summary>
    /// <param name="configuration">The station.</param>
    /// <param name="calibration">What corrects; null keeps raw samples only.</param>
    /// <param name="software">Program and version, as readings carry it.</param>
    /// <exception cref="InputException">The uncertainties make no conditions that Core takes.</exception>
    public ReadingMaker(StationConfiguration configuration, LoadedCalibration? calibration, string software)
    {
        _configuration = configuration;
        _calibration = calibration;
        _topics = new Topics(configuration.Station, configuration.Probe);
        _json = new ReadingJson(configuration, calibration, software);
        if (calibration != null)
        {
            _conditions = Conditions(configuration, calibration);
            _stirringDiffers = _conditions.IsStirringMismatch(calibration.Core);
        }
    }

    /// <summary>Corrects a sample and writes it down.</summary>
    public MadeReading Make(RawSample raw, long sequence)
    {
        SampleInputs inputs = SampleInputs.Of(raw, _configuration);
        string? noReading = Correct(raw, inputs);
        byte[] payload = _json.Encode(raw, sequence, inputs, _calibration == null ? null : _reading, Doubt(raw), noReading);
        SampleRow row = new()
        {
            Station = _configuration.Station,
            Probe = _configuration.Probe,
            Sequence = sequence,
            Raw = raw,
            TemperatureCelsius = inputs.Temperature,
            PressureHectopascal = inputs.Pressure,
            Salinity = inputs.Salinity,
            CalibrationId = _calibration?.Record.Id,
            Reading = noReading == null ? Encoding.UTF8.GetString(payload) : null,
            NoReadingReason = noReading,
        };
        return new MadeReading(row, new Message(_topics.Reading, ReadingJson.ContentType, payload));
    }

    /// <summary>Fills the reading. Null when there is one; otherwise why there is none.</summary>
    private string? Correct(RawSample raw, SampleInputs inputs)
    {
        if (_calibration == null || _conditions == null)
        {
            return "no calibration is configured";
        }

        Correction.Correct(
            _calibration.Core,
            _conditions,
            raw.Signal,
            inputs.Temperature.Value ?? double.NaN,
            inputs.UsablePressure,
            inputs.Salinity.Value ?? double.NaN,
            0.0,
            RangeRule.NearEdge,
            _reading);
        _calibration.Growth.Add(raw.TimeUtc, driftIsCorrected: false, foulingIsCorrected: false, _reading);
        return double.IsNaN(_reading.Value(ReadingQuantity.PartialPressure))
            ? ReadingFlags.Of(ReadingQuantity.PartialPressure, inputs, _reading, "").Reason
            : null;
    }

    /// <summary>A reason to doubt everything in the reading, or empty.</summary>
    private string Doubt(RawSample raw)
    {
        if (_stirringDiffers)
        {
            return "calibrated " + Words(_calibration!.Core.Stirring) + " and used " + Words(_configuration.Stirring);
        }

        return _calibration != null && raw.TimeUtc < _calibration.Record.CompletedUtc ? "taken before its calibration was made" : "";
    }

    private static ReadingConditions Conditions(StationConfiguration configuration, LoadedCalibration calibration)
    {
        ThermometerConfiguration thermometer = configuration.Thermometer;
        return ReadingCircumstances.Of(
            calibration,
            configuration.Equation,
            configuration.SignalUncertainty,
            ReadingCircumstances.IsSameThermometer(thermometer.Id, calibration.Record),
            thermometer.OffsetStandardUncertaintyKelvin,
            thermometer.StandardUncertaintyKelvin,
            configuration.Pressure.StandardUncertainty,
            configuration.Salinity.StandardUncertainty,
            configuration.Stirring);
    }

    internal static string Words(Stirring stirring)
    {
        return stirring switch
        {
            Stirring.Stirred => "stirred",
            Stirring.Still => "still",
            _ => "flow-insensitive",
        };
    }
}
