using System;
using System.Buffers;
using System.Text.Json;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Journal;
using ProbeCal.Station.Sources;

namespace ProbeCal.Station.Engine;

/// <summary>
/// A reading as JSON, version 1: <c>docs/schemas/reading.schema.json</c>. Numbers carry every digit, so that a receiver can
/// compute on; what is not a number is null beside a flag and its reason.
/// </summary>
internal sealed class ReadingJson
{
    internal const string Format = "probecal-reading";
    internal const int Version = 1;
    internal const string ContentType = "application/json";

    private static readonly (ReadingQuantity Quantity, string Name)[] _quantities =
    [
        (ReadingQuantity.PartialPressure, "partialPressureHPa"),
        (ReadingQuantity.MilligramsPerLitre, "mgPerL"),
        (ReadingQuantity.MicromolesPerLitre, "umolPerL"),
        (ReadingQuantity.MicromolesPerKilogram, "umolPerKg"),
        (ReadingQuantity.PercentLocal, "percentLocal"),
        (ReadingQuantity.PercentOneAtmosphere, "percentOneAtmosphere"),
    ];

    private readonly StationConfiguration _configuration;
    private readonly LoadedCalibration? _calibration;
    private readonly string _software;
    private readonly string _signalUnit;
    private readonly bool _simulated;
    private readonly ArrayBufferWriter<byte> _buffer = new(2048);

    internal ReadingJson(StationConfiguration configuration, LoadedCalibration? calibration, string software)
    {
        _configuration = configuration;
        _calibration = calibration;
        _software = software;
        _signalUnit = configuration.Line.SignalUnit.Length != 0 ? configuration.Line.SignalUnit : calibration?.Record.Probe.SignalUnit ?? "";
        _simulated = IsSimulated(configuration, calibration);
    }

    /// <summary>True when anything behind a reading was simulated.</summary>
    internal static bool IsSimulated(StationConfiguration configuration, LoadedCalibration? calibration)
    {
        return configuration.Simulated || configuration.Source is SimulatedAddress || calibration is { Record.Simulated: true };
    }

    /// <summary>The bytes of one message.</summary>
    /// <param name="raw">The sample.</param>
    /// <param name="sequence">Its number.</param>
    /// <param name="inputs">What it was corrected with.</param>
    /// <param name="reading">What Core made; null without a calibration.</param>
    /// <param name="doubt">A reason to doubt all of it, or empty.</param>
    /// <param name="noReading">Why there is no reading, or null.</param>
    internal byte[] Encode(RawSample raw, long sequence, SampleInputs inputs, Reading? reading, string doubt, string? noReading)
    {
        _buffer.ResetWrittenCount();
        using Utf8JsonWriter writer = new(_buffer, Json.Options);
        writer.WriteStartObject();
        writer.WriteString("format", Format);
        writer.WriteNumber("version", Version);
        writer.WriteString("station", _configuration.Station);
        writer.WriteString("probe", _configuration.Probe);
        writer.WriteNumber("sequence", sequence);
        writer.WriteString("timeUtc", Json.Time(raw.TimeUtc));
        writer.WriteString("timeSource", raw.TimeFromLine ? "line" : "receipt");
        writer.WriteString("receivedUtc", Json.Time(raw.ReceivedUtc));
        writer.WriteString("software", _software);
        writer.WriteBoolean("simulated", _simulated);
        writer.WriteString("calibration", _calibration?.Record.Id);
        writer.WriteString("equation", EquationNames.NameOf(_configuration.Equation));
        writer.WriteString("stirring", ReadingMaker.Words(_configuration.Stirring));
        WriteRaw(writer, raw);
        WriteInputs(writer, inputs, reading);
        foreach ((ReadingQuantity quantity, string name) in _quantities)
        {
            WriteQuantity(writer, quantity, name, inputs, reading, doubt);
        }

        WriteGrowth(writer, raw.TimeUtc);
        writer.WriteString("noReadingReason", noReading);
        writer.WriteEndObject();
        writer.Flush();
        return _buffer.WrittenSpan.ToArray();
    }

    /// <summary>What time adds is in the uncertainty and told with its days, or is left out and told so.</summary>
    private void WriteGrowth(Utf8JsonWriter writer, DateTimeOffset at)
    {
        UncertaintyGrowth growth = _calibration?.Growth ?? UncertaintyGrowth.Unknown;
        double? drift = growth.DriftDays(at);
        double? fouling = growth.FoulingDays(at);
        writer.WriteStartArray("uncertaintyExcludes");
        if (drift == null)
        {
            writer.WriteStringValue("drift");
        }

        if (fouling == null)
        {
            writer.WriteStringValue("fouling");
        }

        writer.WriteEndArray();
        if (drift is double driftDays && growth.Drift is { } driftRate)
        {
            WriteRate(writer, "drift", driftRate, driftDays);
        }

        if (fouling is double foulingDays && growth.Fouling is { } foulingRate)
        {
            WriteRate(writer, "fouling", foulingRate, foulingDays);
        }
    }

    private static void WriteRate(Utf8JsonWriter writer, string name, (double RelativePerDay, string Source) rate, double days)
    {
        writer.WriteStartObject(name);
        Json.Number(writer, "days", days);
        Json.Number(writer, "percentPerDay", rate.RelativePerDay * 100);
        writer.WriteString("source", rate.Source);
        writer.WriteEndObject();
    }

    private void WriteRaw(Utf8JsonWriter writer, RawSample raw)
    {
        writer.WriteStartObject("raw");
        writer.WriteString("text", raw.RawText);
        Json.Number(writer, "signal", raw.Signal);
        writer.WriteString("signalUnit", _signalUnit);
        writer.WriteEndObject();
    }

    private void WriteInputs(Utf8JsonWriter writer, SampleInputs inputs, Reading? reading)
    {
        Judged unlooked = new(Quality.NotEvaluated, "no calibration is configured");
        WriteInput(writer, "temperatureC", inputs.Temperature, _configuration.Thermometer.StandardUncertaintyKelvin, reading == null ? unlooked : ReadingFlags.Temperature(inputs, reading));
        WriteInput(writer, "pressureHPa", inputs.Pressure, _configuration.Pressure.StandardUncertainty, reading == null ? unlooked : ReadingFlags.Pressure(inputs, reading));
        WriteInput(writer, "salinity", inputs.Salinity, _configuration.Salinity.StandardUncertainty, reading == null ? unlooked : ReadingFlags.Salinity(inputs, reading));
    }

    private static void WriteInput(Utf8JsonWriter writer, string name, SourcedValue input, double uncertainty, Judged judged)
    {
        writer.WriteStartObject(name);
        Json.Number(writer, "value", input.Value ?? double.NaN);
        Json.Number(writer, "standardUncertainty", input.Value == null ? double.NaN : uncertainty);
        writer.WriteString("source", input.Source);
        WriteFlag(writer, judged);
        writer.WriteEndObject();
    }

    private static void WriteQuantity(Utf8JsonWriter writer, ReadingQuantity quantity, string name, SampleInputs inputs, Reading? reading, string doubt)
    {
        writer.WriteStartObject(name);
        Json.Number(writer, "value", reading?.Value(quantity) ?? double.NaN);
        Json.Number(writer, "standardUncertainty", reading?.StandardUncertainty(quantity) ?? double.NaN);
        WriteFlag(writer, reading == null ? new Judged(Quality.Missing, "no calibration is configured") : ReadingFlags.Of(quantity, inputs, reading, doubt));
        writer.WriteEndObject();
    }

    private static void WriteFlag(Utf8JsonWriter writer, Judged judged)
    {
        writer.WriteNumber("flag", (int)judged.Flag);
        if (judged.Reason.Length != 0)
        {
            writer.WriteString("reason", judged.Reason);
        }
    }
}
