using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using Microsoft.Data.Sqlite;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Storage;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>A record as the log keeps it.</summary>
/// <param name="Record">The record, read from the stored bytes.</param>
/// <param name="Sha256">SHA-256 over the stored bytes, lower-case hex.</param>
public sealed record StoredCalibration(CalibrationRecord Record, string Sha256);

/// <summary>
/// The append-only calibration log: each record as the exact bytes of its JSON, chained by SHA-256. The whole log is read
/// and verified on opening. One program writes at a time (<see cref="DataDirectory"/>); not for concurrent use.
/// </summary>
public sealed class CalibrationLogStore : IDisposable
{
    private readonly SqliteFile _file;
    private readonly List<StoredCalibration> _records;

    private CalibrationLogStore(SqliteFile file, LogReading reading)
    {
        _file = file;
        _records = reading.Records;
        LogId = reading.LogId;
        Chain = reading.Chain;
    }

    /// <summary>The log's own id: twelve hex digits, made once.</summary>
    public string LogId { get; }

    /// <summary>What the verification on opening found, kept up to date by appends.</summary>
    public ChainState Chain { get; private set; }

    /// <summary>Every record that can be read, oldest first. Where <see cref="Chain"/> has faults, trust none blindly.</summary>
    public IReadOnlyList<StoredCalibration> Records => _records;

    /// <summary>Opens the log for writing, making it when it is not there.</summary>
    /// <param name="path">The file, <see cref="DataDirectory.CalibrationLogFile"/>.</param>
    /// <param name="time">Gives the time in the names of backup copies.</param>
    /// <param name="newLogId">Source of the id of a new log.</param>
    /// <exception cref="InputException">The file is from a newer version or of another kind; it is untouched.</exception>
    /// <exception cref="WorkFailedException">The file is damaged, or the system refuses it; it is left as it is.</exception>
    public static CalibrationLogStore OpenForWriting(string path, TimeProvider time, Func<Guid> newLogId)
    {
        SqliteFile file = SqliteFile.OpenForWriting(path, CalibrationLogFormat.File, DamagePolicy.Refuse, time);
        return Open(file, () => BeginLog(file, newLogId()));
    }

    /// <summary>Opens an existing log for reading.</summary>
    /// <exception cref="InputException">There is none, it is from another version, or of another kind.</exception>
    /// <exception cref="WorkFailedException">It is damaged, or the system refuses it.</exception>
    public static CalibrationLogStore OpenForReading(string path)
    {
        SqliteFile file = SqliteFile.OpenForReading(path, CalibrationLogFormat.File);
        return Open(file, () => { });
    }

    /// <summary>Adds a record at the end. It is on the disk when this returns.</summary>
    /// <returns>The record with its id, index and the hash of the one before.</returns>
    /// <exception cref="WorkFailedException">The chain has a fault, or the record could not be stored; nothing was added.</exception>
    public StoredCalibration Append(CalibrationRecord record)
    {
        RequireWhole();
        long index = Chain.Count + 1;
        CalibrationRecord placed = record with
        {
            LogId = LogId,
            Index = index,
            Id = string.Create(CultureInfo.InvariantCulture, $"{LogId}-{index:0000}"),
            PreviousSha256 = Chain.HeadSha256,
        };
        byte[] bytes = RecordJson.ToBytes(placed);
        string hash = LogReading.Hash(bytes);
        try
        {
            Insert(placed, bytes, hash);
        }
        catch (SqliteException fault)
        {
            throw SqliteFaults.AsWorkFailed(fault, _file.Path);
        }

        StoredCalibration stored = new(placed, hash);
        _records.Add(stored);
        Chain = Chain with { Count = index, HeadSha256 = hash };
        return stored;
    }

    /// <summary>The record with this id, or null.</summary>
    public StoredCalibration? Find(string calibrationId)
    {
        return _records.FirstOrDefault(stored => stored.Record.Id == calibrationId);
    }

    /// <summary>
    /// The calibration in force for a probe at a time: the latest that passed and was complete by then, or null. A failed
    /// one is kept in the log and never takes over.
    /// </summary>
    public StoredCalibration? LatestFor(string probeId, DateTimeOffset atUtc)
    {
        StoredCalibration? latest = null;
        foreach (StoredCalibration stored in _records)
        {
            CalibrationRecord record = stored.Record;
            bool inForce = record.Probe.Id == probeId && record.Result.Pass && record.CompletedUtc <= atUtc;
            if (inForce && (latest == null || latest.Record.CompletedUtc <= record.CompletedUtc))
            {
                latest = stored;
            }
        }

        return latest;
    }

    /// <summary>The exact bytes of a record as they are stored.</summary>
    public byte[] BytesOf(StoredCalibration stored)
    {
        try
        {
            using SqliteCommand command = _file.Connection.CreateCommand();
            command.CommandText = "SELECT bytes FROM records WHERE idx = $idx";
            command.Parameters.AddWithValue("$idx", stored.Record.Index);
            return (byte[]?)command.ExecuteScalar() ?? throw new WorkFailedException($"{_file.Path}: record {stored.Record.Id} is no longer there");
        }
        catch (SqliteException fault)
        {
            throw SqliteFaults.AsWorkFailed(fault, _file.Path);
        }
    }

    /// <summary>Stops the work when the chain has a fault: nothing may rest on a log that was tampered with.</summary>
    /// <exception cref="WorkFailedException">The chain has a fault.</exception>
    public void RequireWhole()
    {
        if (!Chain.IsWhole)
        {
            throw new WorkFailedException($"{_file.Path}: the chain of calibration records is broken: {Chain.Faults[0]}; keep the file as evidence and put a sound copy in its place, or go on in another --data folder");
        }
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        _file.Dispose();
    }

    private static CalibrationLogStore Open(SqliteFile file, Action prepare)
    {
        try
        {
            prepare();
            return new CalibrationLogStore(file, LogReading.Of(file));
        }
        catch (SqliteException fault)
        {
            file.Dispose();
            throw SqliteFaults.AsWorkFailed(fault, file.Path);
        }
        catch
        {
            file.Dispose();
            throw;
        }
    }

    private static void BeginLog(SqliteFile file, Guid id)
    {
        using SqliteCommand command = file.Connection.CreateCommand();
        command.CommandText = "INSERT INTO log (only_one, log_id, format) SELECT 1, $id, $format WHERE NOT EXISTS (SELECT 1 FROM log)";
        command.Parameters.AddWithValue("$id", id.ToString("N", CultureInfo.InvariantCulture)[..12]);
        command.Parameters.AddWithValue("$format", CalibrationLogFormat.FormatName);
        command.ExecuteNonQuery();
    }

    private void Insert(CalibrationRecord placed, byte[] bytes, string hash)
    {
        using SqliteCommand command = _file.Connection.CreateCommand();
        command.CommandText = "INSERT INTO records (idx, calibration_id, probe_id, completed_us, bytes, sha256) VALUES ($idx, $id, $probe, $completed, $bytes, $sha256)";
        command.Parameters.AddWithValue("$idx", placed.Index);
        command.Parameters.AddWithValue("$id", placed.Id);
        command.Parameters.AddWithValue("$probe", placed.Probe.Id);
        command.Parameters.AddWithValue("$completed", LogReading.Microseconds(placed.CompletedUtc));
        command.Parameters.AddWithValue("$bytes", bytes);
        command.Parameters.AddWithValue("$sha256", hash);
        command.ExecuteNonQuery();
    }
}
