using System;
using System.Globalization;
using Microsoft.Data.Sqlite;

namespace ProbeCal.Station.Journal;

/// <summary>What may be written in one transaction of the journal. Handed out by <see cref="StationJournal.Commit"/> and good only inside it.</summary>
internal sealed class JournalTransaction : IDisposable
{
    private readonly Statement _start;
    private readonly Statement _next;
    private readonly Statement _sample;
    private readonly Statement _rejected;
    private readonly Statement _trimRejected;
    private readonly Statement _event;
    private readonly Statement _message;
    private readonly int _rejectedLinesKept;
    private readonly long _firstSequence;
    private SqliteTransaction? _current;
    private bool _rejectedAny;

    internal JournalTransaction(SqliteConnection connection, int rejectedLinesKept, long firstSequence)
    {
        _rejectedLinesKept = rejectedLinesKept;
        _firstSequence = firstSequence;
        _start = new Statement(connection, "INSERT INTO counter (station, probe, next_sequence) VALUES ($1, $2, $3) ON CONFLICT DO NOTHING", 3);
        _next = new Statement(connection, "UPDATE counter SET next_sequence = next_sequence + 1 WHERE station = $1 AND probe = $2 RETURNING next_sequence - 1", 2);
        _sample = new Statement(
            connection,
            """
            INSERT INTO sample (station, probe, sequence, time_us, time_from_line, received_us, raw_text, signal,
                temperature_celsius, temperature_source, pressure_hectopascal, pressure_source, salinity, salinity_source,
                calibration_id, reading, no_reading_reason)
            VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12, $13, $14, $15, $16, $17)
            """,
            17);
        _rejected = new Statement(connection, "INSERT INTO rejected_line (received_us, raw_text, reason) VALUES ($1, $2, $3)", 3);
        _trimRejected = new Statement(connection, "DELETE FROM rejected_line WHERE id <= (SELECT max(id) FROM rejected_line) - $1", 1);
        _event = new Statement(connection, "INSERT INTO event (time_us, kind, text) VALUES ($1, $2, $3)", 3);
        _message = new Statement(connection, "INSERT INTO outbox (topic, content_type, payload) VALUES ($1, $2, $3)", 3);
    }

    /// <summary>Takes the next number of this probe at this station. It is given once, and not at all if the transaction fails.</summary>
    public long NextSequence(string station, string probe)
    {
        _start.Run(_current, station, probe, _firstSequence);
        return Convert.ToInt64(_next.Value(_current, station, probe), CultureInfo.InvariantCulture);
    }

    /// <summary>Writes a sample.</summary>
    public void Add(SampleRow row)
    {
        _sample.Run(
            _current,
            row.Station,
            row.Probe,
            row.Sequence,
            Microseconds(row.Raw.TimeUtc),
            row.Raw.TimeFromLine ? 1 : 0,
            Microseconds(row.Raw.ReceivedUtc),
            row.Raw.RawText,
            row.Raw.Signal,
            row.TemperatureCelsius.Value,
            row.TemperatureCelsius.Source,
            row.PressureHectopascal.Value,
            row.PressureHectopascal.Source,
            row.Salinity.Value,
            row.Salinity.Source,
            row.CalibrationId,
            row.Reading,
            row.NoReadingReason);
    }

    /// <summary>Keeps a line that gave no sample. Its row number counts all there ever were; beyond the cap the oldest go.</summary>
    public void Add(RejectedLine line)
    {
        _rejected.Run(_current, Microseconds(line.ReceivedUtc), line.RawText, line.Reason);
        _rejectedAny = true;
    }

    /// <summary>Writes an event.</summary>
    public void Add(JournalEvent happened)
    {
        _event.Run(_current, Microseconds(happened.TimeUtc), happened.Kind, happened.Text);
    }

    /// <summary>Puts a message behind all others in the outbox.</summary>
    public void Enqueue(Message message)
    {
        _message.Run(_current, message.Topic, message.ContentType, message.Payload.ToArray());
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        _start.Dispose();
        _next.Dispose();
        _sample.Dispose();
        _rejected.Dispose();
        _trimRejected.Dispose();
        _event.Dispose();
        _message.Dispose();
    }

    internal static long Microseconds(DateTimeOffset time)
    {
        return (time.UtcTicks - DateTimeOffset.UnixEpoch.UtcTicks) / TimeSpan.TicksPerMicrosecond;
    }

    internal void Use(SqliteTransaction transaction)
    {
        _current = transaction;
        _rejectedAny = false;
    }

    internal void TrimRejectedLines()
    {
        if (_rejectedAny)
        {
            _trimRejected.Run(_current, _rejectedLinesKept);
        }
    }
}
