using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Threading;
using Microsoft.Data.Sqlite;
using ProbeCal.Station.Storage;

namespace ProbeCal.Station.Journal;

/// <summary>
/// Everything a station took in and has not delivered: samples with their readings, rejected lines, events, and the outbox.
/// One writer connection; the methods may be called from any thread and take turns. A fault of the disk reaches the caller
/// as <see cref="JournalException"/>, and then nothing of that call was written.
/// </summary>
internal sealed class StationJournal : IDisposable
{
    /// <summary>Rejected lines kept before the oldest go. Our choice, no source: a day of garbage at one line in ten seconds.</summary>
    public const int DefaultRejectedLinesKept = 10_000;

    private readonly Lock _turn = new();
    private readonly SqliteFile _file;
    private readonly JournalTransaction _transaction;
    private readonly Statement _pending;
    private readonly Statement _removePending;
    private readonly Statement _countPending;
    private readonly Statement _expireSamples;
    private readonly Statement _expireEvents;
    private readonly Statement _lastTime;

    private StationJournal(SqliteFile file, int rejectedLinesKept, long firstSequence)
    {
        _file = file;
        _transaction = new JournalTransaction(file.Connection, rejectedLinesKept, firstSequence);
        _pending = new Statement(file.Connection, "SELECT id, topic, content_type, payload FROM outbox WHERE $1 < id ORDER BY id LIMIT $2", 2);
        _removePending = new Statement(file.Connection, "DELETE FROM outbox WHERE id <= $1", 1);
        _countPending = new Statement(file.Connection, "SELECT count(*) FROM outbox WHERE $1 < id", 1);
        _expireSamples = new Statement(file.Connection, "DELETE FROM sample WHERE id IN (SELECT id FROM sample WHERE received_us < $1 ORDER BY received_us LIMIT $2)", 2);
        _expireEvents = new Statement(file.Connection, "DELETE FROM event WHERE id IN (SELECT id FROM event WHERE time_us < $1 ORDER BY id LIMIT $2)", 2);
        _lastTime = new Statement(file.Connection, "SELECT time_us FROM sample WHERE station = $1 AND probe = $2 ORDER BY sequence DESC LIMIT 1", 2);
    }

    /// <summary>The file.</summary>
    public string Path => _file.Path;

    /// <summary>Where a damaged journal was put when this one was begun in its place, or null.</summary>
    public string? SetAsidePath => _file.SetAsidePath;

    /// <summary>The copy that was made before an older journal was migrated, or null.</summary>
    public string? BackupPath => _file.BackupPath;

    /// <summary>Opens the journal, making it when it is not there. A damaged one is renamed and a new one begun.</summary>
    /// <param name="path">The file.</param>
    /// <param name="time">Gives the time in the names of copies and the sequence after a damaged journal.</param>
    /// <param name="rejectedLinesKept">How many rejected lines are kept before the oldest go.</param>
    /// <exception cref="Entry.InputException">It is from a newer version, or no journal. It is untouched.</exception>
    /// <exception cref="Entry.WorkFailedException">The system refuses it.</exception>
    public static StationJournal Open(string path, TimeProvider time, int rejectedLinesKept = DefaultRejectedLinesKept)
    {
        SqliteFile file = SqliteFile.OpenForWriting(path, JournalFormat.Format, DamagePolicy.SetAside, time);
        try
        {
            // The counter went with a damaged journal. The clock in milliseconds lies beyond every number it can have given.
            bool counterIsLost = file.SetAsidePath != null || SetAsideEarlier(file.Path);
            return new StationJournal(file, rejectedLinesKept, counterIsLost ? time.GetUtcNow().ToUnixTimeMilliseconds() : 1);
        }
        catch (SqliteException fault)
        {
            file.Dispose();
            throw SqliteFaults.AsWorkFailed(fault, path);
        }
    }

    /// <summary>Does all of <paramref name="work"/> and flushes it to the disk, or does none of it.</summary>
    /// <exception cref="JournalException">The disk is full or refuses. Nothing of it was written.</exception>
    public void Commit(Action<JournalTransaction> work)
    {
        InTurn(() =>
        {
            using SqliteTransaction transaction = _file.Connection.BeginTransaction();
            _transaction.Use(transaction);
            work(_transaction);
            _transaction.TrimRejectedLines();
            transaction.Commit();
            return 0;
        });
    }

    /// <summary>The oldest messages behind <paramref name="after"/>, in order.</summary>
    /// <exception cref="JournalException">It could not be read.</exception>
    public IReadOnlyList<OutboxRow> Pending(long after, int most)
    {
        return InTurn(() =>
        {
            List<OutboxRow> rows = [];
            using SqliteDataReader reader = _pending.Rows(after, most);
            while (reader.Read())
            {
                Message message = new(reader.GetString(1), reader.GetString(2), reader.GetFieldValue<byte[]>(3));
                rows.Add(new OutboxRow(reader.GetInt64(0), message));
            }

            return rows;
        });
    }

    /// <summary>How many messages behind <paramref name="after"/> wait to be delivered.</summary>
    /// <exception cref="JournalException">It could not be read.</exception>
    public long CountPending(long after = 0)
    {
        return InTurn(() => Convert.ToInt64(_countPending.Value(null, after), CultureInfo.InvariantCulture));
    }

    /// <summary>Takes the messages up to and with <paramref name="id"/> out of the outbox: the broker has them.</summary>
    /// <exception cref="JournalException">It could not be written.</exception>
    public void Delivered(long id)
    {
        InTurn(() => _removePending.Run(null, id));
    }

    /// <summary>
    /// Deletes at most <paramref name="most"/> samples and events older than <paramref name="beforeUtc"/>, samples first, each
    /// oldest first. Messages that still wait to be delivered stay: they are whole in the outbox.
    /// </summary>
    /// <returns>How many were deleted.</returns>
    /// <exception cref="JournalException">It could not be written.</exception>
    public int Expire(DateTimeOffset beforeUtc, int most)
    {
        long before = JournalTransaction.Microseconds(beforeUtc);
        return InTurn(() =>
        {
            int samples = _expireSamples.Run(null, before, most);
            return samples + _expireEvents.Run(null, before, most - samples);
        });
    }

    /// <summary>When the last sample of this probe was taken, or null when there is none.</summary>
    /// <exception cref="JournalException">It could not be read.</exception>
    public DateTimeOffset? LastSampleTime(string station, string probe)
    {
        object? microseconds = InTurn(() => _lastTime.Value(null, station, probe));
        return microseconds is long value ? DateTimeOffset.UnixEpoch.AddTicks(value * TimeSpan.TicksPerMicrosecond) : null;
    }

    /// <summary>Lets the file grow to so many pages and no further, as a full disk would. For tests.</summary>
    internal void CapPages(int pages)
    {
        InTurn(() =>
        {
            using SqliteCommand command = _file.Connection.CreateCommand();
            command.CommandText = string.Create(CultureInfo.InvariantCulture, $"PRAGMA max_page_count={pages}");
            return command.ExecuteScalar();
        });
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        lock (_turn)
        {
            _transaction.Dispose();
            _pending.Dispose();
            _removePending.Dispose();
            _countPending.Dispose();
            _expireSamples.Dispose();
            _expireEvents.Dispose();
            _lastTime.Dispose();
            _file.Dispose();
        }
    }

    /// <summary>True when a damaged journal was put aside by an earlier run, which may have stopped before its first sample.</summary>
    private static bool SetAsideEarlier(string path)
    {
        string folder = System.IO.Path.GetDirectoryName(path)!;
        return Directory.GetFiles(folder, System.IO.Path.GetFileName(path) + ".damaged-*").Length != 0;
    }

    private T InTurn<T>(Func<T> work)
    {
        lock (_turn)
        {
            try
            {
                return work();
            }
            catch (SqliteException fault)
            {
                throw new JournalException(SqliteFaults.Describe(fault, Path), SqliteFaults.KindOf(fault) == StorageFault.DiskFull, fault);
            }
        }
    }
}
