using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text.Json;
using System.Threading.Tasks;
using Microsoft.Data.Sqlite;
using Xunit;

namespace ProbeCal.Peers.Tests.Parts;

/// <summary>An invented site: a configuration, a data folder, and what its journal holds as another program reads it.</summary>
internal sealed class StationSite : IDisposable
{
    internal const string Line = "{time},{signal:nA},{temperature},{pressure}";

    // Generous: a loaded two-core machine; a test goes on as soon as what it waits for is there.
    internal static readonly TimeSpan Deadline = TimeSpan.FromMinutes(2);

    private readonly TemporaryFolder _folder = new();

    internal StationSite()
    {
        Data = _folder["data"];
    }

    internal string Data { get; init; }

    internal string Configuration => _folder["station.json"];

    internal string this[string name] => _folder[name];

    /// <summary>Writes the configuration. It keeps raw samples only, so that no calibration is needed before it.</summary>
    /// <param name="source">Where lines come from.</param>
    /// <param name="broker">The section of the broker; null for the embedded one on a free port.</param>
    internal void Configure(string source, string? broker = null)
    {
        string where = broker is null
            ? "\"embeddedBroker\": { \"port\": " + Mosquitto.FreePort().ToString(CultureInfo.InvariantCulture) + " }"
            : "\"broker\": " + broker;
        File.WriteAllText(Configuration, $$"""
            {
              // An invented site.
              "format": "probecal-station-configuration", "version": 1,
              "station": "fern-pool", "probe": "P-17", "simulated": true, "calibration": "none",
              "site": { "name": "Fern Pool (invented)", "altitude": "640 m" },
              "source": "{{source}}", "line": "{{Line}}",
              "pressure": { "source": "line:barometer:B-1" },
              "salinity": { "source": "fresh water", "value": "0" },
              "stirring": "stirred",
              {{where}}
            }
            """);
    }

    internal OutsideProcess Start(params string[] more)
    {
        return Programs.ProbeCal(["station", "--config", Configuration, "--data", Data, "--print", .. more]);
    }

    /// <summary>Asks a station to stop as a service manager does; it ends with 0.</summary>
    internal static async Task StopAsync(OutsideProcess station)
    {
        Assert.True(await station.TerminateAsync(Deadline) == 0, station.Tail());
    }

    /// <summary>The raw text of every sample, by sequence.</summary>
    internal List<string> RawTexts()
    {
        return Column("SELECT raw_text FROM sample ORDER BY sequence");
    }

    internal List<string> Rejected()
    {
        return Column("SELECT raw_text || ' <- ' || reason FROM rejected_line ORDER BY id");
    }

    internal List<string> Events()
    {
        return Column("SELECT kind || ': ' || text FROM event ORDER BY id");
    }

    internal long Number(string sql)
    {
        return long.Parse(Assert.Single(Column(sql)), CultureInfo.InvariantCulture);
    }

    /// <summary>The journal is whole, its sequences have no gap, and everything that was printed is in it.</summary>
    internal void CheckJournal(IReadOnlyList<string> printed)
    {
        Assert.Equal("ok", Assert.Single(Column("PRAGMA integrity_check")));
        List<string> texts = RawTexts();
        Assert.Equal(texts.Count, Number("SELECT max(sequence) - min(sequence) + 1 FROM sample"));
        HashSet<string> kept = [.. texts];
        Assert.All(printed, line => Assert.Contains(Raw(line), kept));
    }

    /// <summary>Sequences of readings as they arrived.</summary>
    internal static List<long> Sequences(IReadOnlyList<string> readings)
    {
        return [.. readings.Select(static line =>
        {
            using JsonDocument document = JsonDocument.Parse(line);
            return document.RootElement.GetProperty("sequence").GetInt64();
        })];
    }

    public void Dispose()
    {
        _folder.Dispose();
    }

    private static string Raw(string reading)
    {
        using JsonDocument document = JsonDocument.Parse(reading);
        return document.RootElement.GetProperty("raw").GetProperty("text").GetString()!;
    }

    private List<string> Column(string sql)
    {
        SqliteConnectionStringBuilder options = new() { DataSource = Path.Combine(Data, "journal.db"), Mode = SqliteOpenMode.ReadOnly, Pooling = false };
        using SqliteConnection connection = new(options.ConnectionString);
        connection.Open();
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        using SqliteDataReader reader = command.ExecuteReader();
        List<string> values = [];
        while (reader.Read())
        {
            values.Add(reader.GetString(0));
        }

        return values;
    }
}
