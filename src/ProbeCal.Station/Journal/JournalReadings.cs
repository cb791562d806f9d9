using System;
using System.Collections.Generic;
using System.Text.Json;
using Microsoft.Data.Sqlite;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Storage;

namespace ProbeCal.Station.Journal;

/// <summary>The readings of a probe that a journal keeps, read beside whoever writes.</summary>
internal static class JournalReadings
{
    /// <summary>Time and concentration of each reading, in order of time; NaN where there is none.</summary>
    /// <param name="path">The journal.</param>
    /// <param name="probe">Id of the probe.</param>
    /// <exception cref="InputException">There is no journal, or it is from another version.</exception>
    /// <exception cref="WorkFailedException">It is damaged, or the system refuses it.</exception>
    internal static List<(DateTimeOffset Time, double MilligramsPerLitre)> Of(string path, string probe)
    {
        using SqliteFile file = SqliteFile.OpenForReading(path, JournalFormat.Format);
        List<(DateTimeOffset Time, double MilligramsPerLitre)> readings = [];
        try
        {
            using SqliteCommand command = file.Connection.CreateCommand();
            command.CommandText = "SELECT time_us, reading FROM sample WHERE probe = $probe AND reading IS NOT NULL ORDER BY time_us";
            command.Parameters.AddWithValue("$probe", probe);
            using SqliteDataReader row = command.ExecuteReader();
            while (row.Read())
            {
                using JsonDocument reading = JsonDocument.Parse(row.GetString(1));
                JsonElement value = reading.RootElement.GetProperty("mgPerL").GetProperty("value");
                readings.Add((DateTimeOffset.UnixEpoch.AddMicroseconds(row.GetInt64(0)), value.ValueKind == JsonValueKind.Number ? value.GetDouble() : double.NaN));
            }
        }
        catch (SqliteException fault)
        {
            throw SqliteFaults.AsWorkFailed(fault, path);
        }

        return readings;
    }
}
