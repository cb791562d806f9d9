using System;
using System.Buffers;
using System.Text.Json;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Journal;

namespace ProbeCal.Station.Engine;

/// <summary>The messages beside the readings: status (also the will), calibration in use, events. Schemas in <c>docs/schemas</c>.</summary>
internal sealed class StationMessages
{
    private const int Version = 1;

    private readonly StationConfiguration _configuration;
    private readonly LoadedCalibration? _calibration;
    private readonly Topics _topics;
    private readonly string _software;
    private readonly string _source;

    internal StationMessages(StationConfiguration configuration, LoadedCalibration? calibration, string software, string source)
    {
        _configuration = configuration;
        _calibration = calibration;
        _topics = new Topics(configuration.Station, configuration.Probe);
        _software = software;
        _source = source;
    }

    /// <summary>The status of a running station.</summary>
    internal Message Running(SourceStateChanged source)
    {
        return Status("running", source.ReceivedUtc, source);
    }

    /// <summary>The last status of an orderly stop.</summary>
    internal Message Stopped(DateTimeOffset time)
    {
        return Status("stopped", time, null);
    }

    /// <summary>The will: what the broker says when the station goes without a word. Nobody knows when.</summary>
    internal Message Lost()
    {
        return Status("lost", null, null);
    }

    /// <summary>The calibration in use with its record, byte for byte as the log keeps it.</summary>
    internal Message Calibration()
    {
        return Write(_topics.Calibration, "probecal-calibration-in-use", writer =>
        {
            writer.WriteString("calibration", _calibration?.Record.Id);
            writer.WriteString("validFromUtc", _calibration == null ? null : Json.Time(_calibration.Record.CompletedUtc));
            writer.WriteString("recordSha256", _calibration?.Sha256);
            writer.WriteString("logHead", _calibration?.LogHead);
            writer.WritePropertyName("record");
            if (_calibration == null)
            {
                writer.WriteNullValue();
            }
            else
            {
                writer.WriteRawValue(_calibration.Bytes.Span);
            }
        });
    }

    internal Message Event(JournalEvent happened)
    {
        return Write(_topics.Event, "probecal-event", writer =>
        {
            writer.WriteString("timeUtc", Json.Time(happened.TimeUtc));
            writer.WriteString("kind", happened.Kind);
            writer.WriteString("text", happened.Text);
        });
    }

    private Message Status(string state, DateTimeOffset? since, SourceStateChanged? source)
    {
        return Write(_topics.Status, "probecal-status", writer =>
        {
            writer.WriteString("state", state);
            writer.WriteString("sinceUtc", since is { } time ? Json.Time(time) : null);
            writer.WriteString("site", _configuration.SiteName);
            writer.WriteString("software", _software);
            writer.WriteBoolean("simulated", ReadingJson.IsSimulated(_configuration, _calibration));
            writer.WriteString("source", _source);
            writer.WriteString("sourceState", source == null ? null : SourceWords.Of(source.State));
            writer.WriteString("sourceReason", source?.Reason);
            writer.WriteString("calibration", _calibration?.Record.Id);
        });
    }

    private Message Write(string topic, string format, Action<Utf8JsonWriter> content)
    {
        ArrayBufferWriter<byte> buffer = new();
        using Utf8JsonWriter writer = new(buffer, Json.Options);
        writer.WriteStartObject();
        writer.WriteString("format", format);
        writer.WriteNumber("version", Version);
        writer.WriteString("station", _configuration.Station);
        writer.WriteString("probe", _configuration.Probe);
        content(writer);
        writer.WriteEndObject();
        writer.Flush();
        return new Message(topic, ReadingJson.ContentType, buffer.WrittenMemory);
    }
}

/// <summary>States of a source as messages and events name them.</summary>
internal static class SourceWords
{
    internal static string Of(SourceState state)
    {
        return state.ToString().ToLowerInvariant();
    }
}
