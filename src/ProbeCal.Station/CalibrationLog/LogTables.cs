using System;
using System.Collections.Generic;
using Microsoft.Data.Sqlite;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Storage;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>The tables of the log's file, read and added to. Nothing here judges; <see cref="LogReading"/> does.</summary>
internal static class LogTables
{
    /// <summary>Gives a new log its id.</summary>
    internal static void Begin(SqliteFile file, string logId)
    {
        using SqliteCommand command = file.Connection.CreateCommand();
        command.CommandText = "INSERT INTO log (only_one, log_id, format) SELECT 1, $id, $format WHERE NOT EXISTS (SELECT 1 FROM log)";
        command.Parameters.AddWithValue("$id", logId);
        command.Parameters.AddWithValue("$format", CalibrationLogFormat.FormatName);
        command.ExecuteNonQuery();
    }

    /// <summary>Walks over the log of this file.</summary>
    internal static LogReading ReadOwn(SqliteFile file)
    {
        LogReading reading = new(ReadLogId(file));
        // Version 1 had calibrations only, and no column to say so.
        string kind = file.Version < 2 ? "'calibration'" : "kind";
        using SqliteCommand command = file.Connection.CreateCommand();
        command.CommandText = "SELECT idx, calibration_id, " + kind + ", probe_id, completed_us, bytes, sha256 FROM records ORDER BY idx";
        Walk(command, reading);
        return reading;
    }

    /// <summary>Walks over the logs that were imported.</summary>
    internal static List<ImportedLog> ReadImported(SqliteFile file)
    {
        List<ImportedLog> logs = [];
        if (file.Version < 2)
        {
            return logs;
        }

        List<(string LogId, string Origin, long Microseconds)> heads = [];
        using (SqliteCommand command = file.Connection.CreateCommand())
        {
            command.CommandText = "SELECT log_id, origin, imported_us FROM imported_logs ORDER BY rowid";
            using SqliteDataReader rows = command.ExecuteReader();
            while (rows.Read())
            {
                heads.Add((rows.GetString(0), rows.GetString(1), rows.GetInt64(2)));
            }
        }

        foreach ((string logId, string origin, long microseconds) in heads)
        {
            LogReading reading = new(logId);
            using SqliteCommand command = file.Connection.CreateCommand();
            command.CommandText = "SELECT idx, entry_id, kind, subject, at_us, bytes, sha256 FROM imported_records WHERE log_id = $log ORDER BY idx";
            command.Parameters.AddWithValue("$log", logId);
            Walk(command, reading);
            logs.Add(new ImportedLog(logId, origin, DateTimeOffset.UnixEpoch.AddMicroseconds(microseconds), reading.Entries, reading.Chain));
        }

        return logs;
    }

    /// <summary>Adds entries to the log of this file: all of them or none.</summary>
    internal static void Insert(SqliteFile file, IEnumerable<(LogEntry Entry, byte[] Bytes, string Hash)> entries)
    {
        using SqliteTransaction transaction = file.Connection.BeginTransaction();
        foreach ((LogEntry entry, byte[] bytes, string hash) in entries)
        {
            using SqliteCommand command = file.Connection.CreateCommand();
            command.Transaction = transaction;
            command.CommandText = "INSERT INTO records (idx, calibration_id, kind, probe_id, completed_us, bytes, sha256) VALUES ($idx, $id, $kind, $subject, $at, $bytes, $sha256)";
            AddEntry(command, entry, bytes, hash);
            command.ExecuteNonQuery();
        }

        transaction.Commit();
    }

    /// <summary>Adds entries to an imported log, which it begins when it is not there: all of them or none.</summary>
    internal static void InsertImported(SqliteFile file, string logId, string origin, DateTimeOffset time, IEnumerable<(LogEntry Entry, byte[] Bytes, string Hash)> entries)
    {
        using SqliteTransaction transaction = file.Connection.BeginTransaction();
        using (SqliteCommand begin = file.Connection.CreateCommand())
        {
            begin.Transaction = transaction;
            begin.CommandText = "INSERT INTO imported_logs (log_id, origin, imported_us) SELECT $log, $origin, $time WHERE NOT EXISTS (SELECT 1 FROM imported_logs WHERE log_id = $log)";
            begin.Parameters.AddWithValue("$log", logId);
            begin.Parameters.AddWithValue("$origin", origin);
            begin.Parameters.AddWithValue("$time", LogReading.Microseconds(time));
            begin.ExecuteNonQuery();
        }

        foreach ((LogEntry entry, byte[] bytes, string hash) in entries)
        {
            using SqliteCommand command = file.Connection.CreateCommand();
            command.Transaction = transaction;
            command.CommandText = "INSERT INTO imported_records (log_id, idx, entry_id, kind, subject, at_us, bytes, sha256) VALUES ($log, $idx, $id, $kind, $subject, $at, $bytes, $sha256)";
            command.Parameters.AddWithValue("$log", logId);
            AddEntry(command, entry, bytes, hash);
            command.ExecuteNonQuery();
        }

        transaction.Commit();
    }

    /// <summary>The exact bytes of an entry, or null when it is no longer there.</summary>
    /// <param name="file">The log.</param>
    /// <param name="ownLogId">Id of the log of this file; an entry of another is looked for among the imported.</param>
    /// <param name="entry">Which.</param>
    internal static byte[]? Bytes(SqliteFile file, string ownLogId, LogEntry entry)
    {
        using SqliteCommand command = file.Connection.CreateCommand();
        command.CommandText = entry.LogId == ownLogId
            ? "SELECT bytes FROM records WHERE idx = $idx"
            : "SELECT bytes FROM imported_records WHERE log_id = $log AND idx = $idx";
        command.Parameters.AddWithValue("$idx", entry.Index);
        command.Parameters.AddWithValue("$log", entry.LogId);
        return (byte[]?)command.ExecuteScalar();
    }

    private static string ReadLogId(SqliteFile file)
    {
        using SqliteCommand command = file.Connection.CreateCommand();
        command.CommandText = "SELECT log_id FROM log";
        return command.ExecuteScalar() as string
            ?? throw new WorkFailedException(file.Path + ": the calibration log has lost its id; keep the file as evidence and put a sound copy in its place");
    }

    private static void Walk(SqliteCommand command, LogReading reading)
    {
        using SqliteDataReader row = command.ExecuteReader();
        while (row.Read())
        {
            reading.Take(row.GetInt64(0), (byte[])row.GetValue(5), row.GetString(6), new FiledAs(row.GetString(1), row.GetString(2), row.GetString(3), row.GetInt64(4)));
        }
    }

    private static void AddEntry(SqliteCommand command, LogEntry entry, byte[] bytes, string hash)
    {
        FiledAs filed = FiledAs.Of(entry);
        command.Parameters.AddWithValue("$idx", entry.Index);
        command.Parameters.AddWithValue("$id", filed.Id);
        command.Parameters.AddWithValue("$kind", filed.Kind);
        command.Parameters.AddWithValue("$subject", filed.Subject);
        command.Parameters.AddWithValue("$at", filed.Microseconds);
        command.Parameters.AddWithValue("$bytes", bytes);
        command.Parameters.AddWithValue("$sha256", hash);
    }
}
