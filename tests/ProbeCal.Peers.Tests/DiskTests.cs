using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Threading.Tasks;
using ProbeCal.Peers.Tests.Parts;
using Xunit;

namespace ProbeCal.Peers.Tests;

/// <summary>Disks that are full, on a real small file system, and outputs that nobody can write to.</summary>
public class DiskTests
{
    private static readonly TimeSpan Deadline = StationSite.Deadline;

    [SkippableFact]
    public async Task A_station_whose_disk_fills_says_so_keeps_what_it_had_and_goes_on_when_there_is_room()
    {
        using SmallDisk disk = SmallDisk.Mount("1m");
        using StationSite site = new() { Data = Path.Combine(disk.Path, "data") };

        // Without a broker the outbox fills the disk as well.
        site.Configure("simulated?faster=300&pressure=939hPa", """{ "address": "mqtt://127.0.0.1:""" + Mosquitto.FreePort().ToString(CultureInfo.InvariantCulture) + "\" }");
        using OutsideProcess station = site.Start();
        await station.WaitForErrorLineAsync("nothing can be journaled: ", Deadline);
        Assert.Contains(station.Error(), static line => line.Contains("no room is left on the disk", StringComparison.Ordinal));
        IReadOnlyList<string> before = station.Output();
        Assert.NotEmpty(before);
        site.CheckJournal(before);

        disk.Resize("64m");
        await station.WaitForErrorLineAsync("journal-resumed", Deadline);
        await station.WaitForOutputAsync(lines => lines.Count >= before.Count + 300, "readings after there was room", Deadline);
        await StationSite.StopAsync(station);
        site.CheckJournal(station.Output());
        Assert.Equal(1, site.Number("SELECT min(sequence) FROM sample"));
        Assert.Contains(site.Events(), static text => text.StartsWith("journal-resumed: ", StringComparison.Ordinal));
    }

    [SkippableFact]
    public async Task A_calibration_on_a_full_disk_ends_with_one_line_and_the_log_is_whole()
    {
        using SmallDisk disk = SmallDisk.Mount("1m");
        string data = Path.Combine(disk.Path, "data");
        using (OutsideProcess first = Programs.ProbeCal(CalibratedFolder.Calibrate(data)))
        {
            Assert.True(await first.ExitCodeAsync(Deadline) == 0, first.Tail());
        }

        string log = Path.Combine(data, "calibrations.db");
        byte[] bytes = await File.ReadAllBytesAsync(log);
        disk.Fill("filler");
        string line = await CalibratedFolder.RefusedAsync(CalibratedFolder.Calibrate(data), 1);
        Assert.Contains("no room is left on the disk", line, StringComparison.Ordinal);
        Assert.Equal(bytes, await File.ReadAllBytesAsync(log));

        File.Delete(Path.Combine(disk.Path, "filler"));
        using OutsideProcess again = Programs.ProbeCal(CalibratedFolder.Calibrate(data));
        Assert.True(await again.ExitCodeAsync(Deadline) == 0, again.Tail());
        using OutsideProcess list = Programs.ProbeCal(["calibrations", "list", "--data", data]);
        Assert.Equal(0, await list.ExitCodeAsync(Deadline));
        Assert.Contains(list.Error().Concat(list.Output()), static text => text.Contains("2 records, chain whole", StringComparison.Ordinal));
    }

    [SkippableFact]
    public async Task A_log_and_an_output_that_cannot_be_written_do_not_end_the_stream()
    {
        Skip.IfNot(File.Exists("/dev/full"), "there is no /dev/full, the device that is always full");
        using StationSite site = new();
        site.Configure("simulated?faster=50&pressure=939hPa");
        using OutsideProcess station = Redirected(site, "> /dev/full");
        await station.WaitForErrorLineAsync("readings cannot be printed", Deadline);
        await StationSite.StopAsync(station);
        Assert.Single(station.Error(), static line => line.Contains("cannot be printed", StringComparison.Ordinal));
        site.CheckJournal([]);

        using OutsideProcess silent = Redirected(site, "2> /dev/full");
        await silent.WaitForOutputAsync(static lines => lines.Count >= 20, "readings of a station without a log", Deadline);
        await StationSite.StopAsync(silent);
        site.CheckJournal(silent.Output());
    }

    [SkippableFact]
    public async Task A_result_that_cannot_be_written_is_a_failure_with_one_line()
    {
        Skip.IfNot(File.Exists("/dev/full"), "there is no /dev/full, the device that is always full");
        using OutsideProcess equilibrium = OutsideProcess.Start("/bin/sh", ["-c", "exec \"$0\" \"$@\" > /dev/full", .. Programs.CommandLine(["equilibrium", "--temperature", "20", "--salinity", "0", "--pressure", "760mmHg"])]);
        Assert.Equal(1, await equilibrium.ExitCodeAsync(Deadline));
        Assert.StartsWith("probecal: ", Assert.Single(equilibrium.Error()), StringComparison.Ordinal);
    }

    [SkippableFact]
    public async Task A_folder_that_cannot_be_written_is_named_as_such()
    {
        using SmallDisk disk = SmallDisk.Mount("1m");
        string data = Path.Combine(disk.Path, "data");
        using (OutsideProcess first = Programs.ProbeCal(CalibratedFolder.Calibrate(data)))
        {
            Assert.True(await first.ExitCodeAsync(Deadline) == 0, first.Tail());
        }

        disk.Resize("1m,ro");
        string line = await CalibratedFolder.RefusedAsync(CalibratedFolder.Calibrate(data), 1);
        Assert.Contains("name a folder that can be written", line, StringComparison.Ordinal);
        using OutsideProcess list = Programs.ProbeCal(["calibrations", "list", "--data", data]);
        Assert.True(await list.ExitCodeAsync(Deadline) == 0, list.Tail());
    }

    private static OutsideProcess Redirected(StationSite site, string where)
    {
        return OutsideProcess.Start("/bin/sh", ["-c", "exec \"$0\" \"$@\" " + where, .. Programs.CommandLine(["station", "--config", site.Configuration, "--data", site.Data, "--print"])]);
    }
}
