using System;
using System.IO;
using Microsoft.Data.Sqlite;
using Microsoft.Extensions.Time.Testing;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Tests.CalibrationLog;

/// <summary>A calibration log in a folder of its own, and the ways to get at it behind its back.</summary>
internal sealed class TemporaryLog : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-log-").FullName;

    internal string Path => System.IO.Path.Combine(_folder, "calibrations.db");

    internal FakeTimeProvider Time { get; } = new(SampleRecords.Noon);

    internal static Guid Id { get; } = new("c3a41f09-b2e7-4d11-8000-000000000000");

    internal CalibrationLogStore Write()
    {
        return CalibrationLogStore.OpenForWriting(Path, Time, () => Id);
    }

    internal CalibrationLogStore Read()
    {
        return CalibrationLogStore.OpenForReading(Path);
    }

    /// <summary>Runs SQL on the file as any other program could.</summary>
    internal void Raw(string sql, params (string Name, object Value)[] parameters)
    {
        using SqliteConnection connection = new(new SqliteConnectionStringBuilder { DataSource = Path, Pooling = false }.ConnectionString);
        connection.Open();
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        foreach ((string name, object value) in parameters)
        {
            command.Parameters.AddWithValue(name, value);
        }

        command.ExecuteNonQuery();
    }

    internal byte[] RawBytes(long index)
    {
        using SqliteConnection connection = new(new SqliteConnectionStringBuilder { DataSource = Path, Pooling = false }.ConnectionString);
        connection.Open();
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = "SELECT bytes FROM records WHERE idx = $idx";
        command.Parameters.AddWithValue("$idx", index);
        return (byte[])command.ExecuteScalar()!;
    }

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
    }
}
