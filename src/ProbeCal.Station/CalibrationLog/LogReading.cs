using System;
using System.Collections.Generic;
using System.Globalization;
using System.Security.Cryptography;
using Microsoft.Data.Sqlite;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Storage;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>The walk over the whole log: every hash computed again over the stored bytes, every link and copy compared.</summary>
internal sealed class LogReading
{
    private const string NoHash = "0000000000000000000000000000000000000000000000000000000000000000";
    private readonly List<string> _faults = [];

    private LogReading(string logId)
    {
        LogId = logId;
        Chain = new ChainState(0, NoHash, _faults);
    }

    internal string LogId { get; }

    internal List<StoredCalibration> Records { get; } = [];

    internal ChainState Chain { get; private set; }

    internal static LogReading Of(SqliteFile file)
    {
        LogReading reading = new(ReadLogId(file));
        using SqliteCommand command = file.Connection.CreateCommand();
        command.CommandText = "SELECT idx, calibration_id, probe_id, completed_us, bytes, sha256 FROM records ORDER BY idx";
        using SqliteDataReader rows = command.ExecuteReader();
        while (rows.Read())
        {
            reading.Take(rows);
        }

        return reading;
    }

    internal static string Hash(byte[] bytes)
    {
        return Convert.ToHexStringLower(SHA256.HashData(bytes));
    }

    internal static long Microseconds(DateTimeOffset time)
    {
        return (time.UtcTicks - DateTimeOffset.UnixEpoch.UtcTicks) / TimeSpan.TicksPerMicrosecond;
    }

    private static string ReadLogId(SqliteFile file)
    {
        using SqliteCommand command = file.Connection.CreateCommand();
        command.CommandText = "SELECT log_id FROM log";
        return command.ExecuteScalar() as string
            ?? throw new WorkFailedException(file.Path + ": the calibration log has lost its id; keep the file as evidence and put a sound copy in its place");
    }

    private void Take(SqliteDataReader row)
    {
        long index = row.GetInt64(0);
        byte[] bytes = (byte[])row.GetValue(4);
        string kept = row.GetString(5);
        string actual = Hash(bytes);
        string name = string.Create(CultureInfo.InvariantCulture, $"record {index}");
        if (index != Chain.Count + 1)
        {
            _faults.Add(string.Create(CultureInfo.InvariantCulture, $"{name} follows record {Chain.Count}: records between them are missing"));
        }

        if (actual != kept)
        {
            _faults.Add($"{name} was changed after it was stored (its bytes do not give the hash kept beside them)");
        }

        try
        {
            CalibrationRecord record = RecordJson.Read(bytes, name);
            CompareWithRow(record, row, name);
            Records.Add(new StoredCalibration(record, actual));
        }
        catch (WorkFailedException unreadable)
        {
            _faults.Add(unreadable.Message);
        }

        Chain = Chain with { Count = index, HeadSha256 = actual };
    }

    private void CompareWithRow(CalibrationRecord record, SqliteDataReader row, string name)
    {
        if (record.PreviousSha256 != Chain.HeadSha256)
        {
            _faults.Add(name + " does not continue the record before it (the hash it names is another)");
        }

        if (record.LogId != LogId)
        {
            _faults.Add($"{name} belongs to log {record.LogId}, this is log {LogId}");
        }

        bool sameRow = record.Index == row.GetInt64(0)
            && record.Id == row.GetString(1)
            && record.Probe.Id == row.GetString(2)
            && Microseconds(record.CompletedUtc) == row.GetInt64(3);
        if (!sameRow)
        {
            _faults.Add(name + " is filed under another index, id, probe or time than it states itself");
        }
    }
}
