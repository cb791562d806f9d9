using System;
using System.IO;
using System.Threading.Tasks;
using Microsoft.Data.Sqlite;
using ProbeCal.Peers.Tests.Parts;
using Xunit;

namespace ProbeCal.Peers.Tests;

/// <summary>Databases of a newer version, damaged ones, and two programs that want the same folder or port.</summary>
public class DatabaseTests(CalibratedFolder calibrated) : IClassFixture<CalibratedFolder>
{
    private const string Source = "simulated?faster=30&pressure=939hPa";

    private static readonly TimeSpan Deadline = StationSite.Deadline;

    [Fact]
    public async Task A_newer_calibration_log_is_refused_by_every_command_with_not_a_byte_changed()
    {
        using StationSite site = Copy();
        site.Configure(Source);
        await File.WriteAllTextAsync(site.Configuration, (await File.ReadAllTextAsync(site.Configuration)).Replace("\"calibration\": \"none\",", "", StringComparison.Ordinal));
        MakeNewer(Path.Combine(site.Data, "calibrations.db"));
        string before = CalibratedFolder.Fingerprint(site.Data);
        string[][] commands =
        [
            [.. CalibratedFolder.Calibrate(site.Data)],
            ["calibrations", "list", "--data", site.Data],
            ["station", "--config", site.Configuration, "--data", site.Data],
        ];
        foreach (string[] command in commands)
        {
            string line = await CalibratedFolder.RefusedAsync(command, 2);
            Assert.Contains("version 99", line, StringComparison.Ordinal);
            Assert.Equal(before, CalibratedFolder.Fingerprint(site.Data));
        }
    }

    [Fact]
    public async Task A_newer_journal_is_refused_and_a_damaged_one_is_kept_aside()
    {
        using StationSite site = new();
        site.Configure(Source);
        long last = await StreamAsync(site);
        string journal = Path.Combine(site.Data, "journal.db");
        byte[] good = await File.ReadAllBytesAsync(journal);

        MakeNewer(journal);
        string before = CalibratedFolder.Fingerprint(site.Data);
        string line = await CalibratedFolder.RefusedAsync(["station", "--config", site.Configuration, "--data", site.Data], 2);
        Assert.Contains("version 99, this program knows up to version 1; use the newer program, nothing was changed", line, StringComparison.Ordinal);
        Assert.Equal(before, CalibratedFolder.Fingerprint(site.Data));

        // The first page stays, so that it still says what it is; pages behind it are noise.
        byte[] damaged = [.. good];
        new Random(7).NextBytes(damaged.AsSpan(4096));
        await File.WriteAllBytesAsync(journal, damaged);
        await StreamAsync(site);
        Assert.Equal(damaged, await File.ReadAllBytesAsync(Assert.Single(Directory.GetFiles(site.Data, "journal.db.damaged-*"))));
        Assert.StartsWith("journal-set-aside: ", site.Events()[0], StringComparison.Ordinal);
        Assert.True(site.Number("SELECT min(sequence) FROM sample") > last);

        // A file that only begins as one, as a copy that was cut short.
        await File.WriteAllBytesAsync(journal, good[..100]);
        await StreamAsync(site);
        Assert.Contains(Directory.GetFiles(site.Data, "journal.db.damaged-*"), static file => new FileInfo(file).Length == 100);
    }

    [Fact]
    public async Task A_damaged_calibration_log_is_refused_and_left_as_it_is()
    {
        using StationSite site = Copy();
        string log = Path.Combine(site.Data, "calibrations.db");
        byte[] bytes = await File.ReadAllBytesAsync(log);
        new Random(7).NextBytes(bytes.AsSpan(4096));
        await File.WriteAllBytesAsync(log, bytes);
        string line = await CalibratedFolder.RefusedAsync(CalibratedFolder.Calibrate(site.Data), 1);
        Assert.Contains("damaged", line, StringComparison.Ordinal);
        Assert.Equal(bytes, await File.ReadAllBytesAsync(log));
    }

    [Fact]
    public async Task A_second_program_on_one_folder_or_one_port_is_told_and_the_first_goes_on()
    {
        using StationSite first = new();
        first.Configure(Source);
        using OutsideProcess station = first.Start();
        await station.WaitForOutputAsync(static lines => lines.Count >= 5, "readings", Deadline);

        Assert.Contains("another probecal is writing there", await CalibratedFolder.RefusedAsync(["station", "--config", first.Configuration, "--data", first.Data], 1), StringComparison.Ordinal);
        Assert.Contains("another probecal is writing there", await CalibratedFolder.RefusedAsync(CalibratedFolder.Calibrate(first.Data), 1), StringComparison.Ordinal);

        // The other folder is free; the port of the embedded broker is not.
        await station.WaitForErrorLineAsync(": connected", Deadline);
        using StationSite second = new();
        string line = await CalibratedFolder.RefusedAsync(["station", "--config", first.Configuration, "--data", second.Data], 1);
        Assert.Contains("the embedded broker cannot listen", line, StringComparison.Ordinal);

        int before = station.Output().Count;
        await station.WaitForOutputAsync(lines => lines.Count >= before + 10, "readings of the first", Deadline);
        await StationSite.StopAsync(station);
        first.CheckJournal(station.Output());
    }

    private static async Task<long> StreamAsync(StationSite site)
    {
        using OutsideProcess station = site.Start();
        await station.WaitForOutputAsync(static lines => lines.Count >= 30, "30 readings", Deadline);
        await StationSite.StopAsync(station);
        site.CheckJournal(station.Output());
        return site.Number("SELECT max(sequence) FROM sample");
    }

    private static void MakeNewer(string file)
    {
        using SqliteConnection connection = new(new SqliteConnectionStringBuilder { DataSource = file, Pooling = false }.ConnectionString);
        connection.Open();
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = "PRAGMA user_version=99";
        command.ExecuteNonQuery();
    }

    private StationSite Copy()
    {
        StationSite site = new();
        Directory.CreateDirectory(site.Data);
        File.Copy(Path.Combine(calibrated.Data, "calibrations.db"), Path.Combine(site.Data, "calibrations.db"));
        return site;
    }
}
