using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Net;
using System.Net.Sockets;
using System.Text;
using System.Threading.Tasks;
using ProbeCal.Peers.Tests.Parts;
using Xunit;

namespace ProbeCal.Peers.Tests;

/// <summary>Ports that are not there, pulled out, taken or full of garbage, with a real pseudo-terminal and real sockets.</summary>
public class PortTests
{
    private static readonly TimeSpan Deadline = StationSite.Deadline;

    [SkippableFact]
    public async Task A_port_that_comes_late_and_is_pulled_out_is_taken_up_again()
    {
        SkipUnlessLinux();
        using StationSite site = new();
        site.Configure("serial:" + site["probe"]);
        using OutsideProcess station = site.Start();
        await station.WaitForErrorLineAsync("Lost: there is no such port", Deadline);

        int before = 0;
        for (int plugged = 1; plugged <= 2; plugged++)
        {
            using OutsideProcess probe = await PlugInAsync(site);
            int wanted = before + 20;
            await station.WaitForOutputAsync(lines => lines.Count >= wanted, "20 readings after plugging in", Deadline);

            // The far end of the pseudo-terminal goes, and the link to it stays: a cable pulled out.
            await probe.KillAsync();
            await WaitForCountAsync(station, "Lost: it is", plugged);
            before = station.Output().Count;
        }

        await StationSite.StopAsync(station);
        site.CheckJournal(station.Output());
        Assert.Equal(2, site.Events().Count(static text => text.StartsWith("source-open: ", StringComparison.Ordinal)));
        Assert.Equal(2, site.Events().Count(static text => text.StartsWith("source-lost: it is", StringComparison.Ordinal)));
    }

    [SkippableFact]
    public async Task A_port_in_use_is_told_and_the_first_reader_loses_nothing()
    {
        SkipUnlessLinux();
        using StationSite first = new();
        first.Configure("serial:" + first["probe"]);
        using OutsideProcess probe = await PlugInAsync(first);
        using OutsideProcess station = first.Start();
        await station.WaitForOutputAsync(static lines => lines.Count >= 5, "readings", Deadline);

        using StationSite second = new();
        second.Configure("serial:" + first["probe"]);
        using OutsideProcess other = second.Start();
        await other.WaitForErrorLineAsync("Lost: another program is reading", Deadline);
        await StationSite.StopAsync(other);
        string line = await CalibratedFolder.RefusedAsync(CalibratedFolder.Calibrate(second["calibration"], "--source", "serial:" + first["probe"], "--line", StationSite.Line), 1);
        Assert.Contains("another program is reading", line, StringComparison.Ordinal);

        int before = station.Output().Count;
        await station.WaitForOutputAsync(lines => lines.Count >= before + 20, "readings of the first", Deadline);
        await StationSite.StopAsync(station);
        first.CheckJournal(station.Output());
        Assert.All(first.Rejected(), static text => Assert.Contains("cut at its start", text, StringComparison.Ordinal));
    }

    [SkippableFact]
    public async Task A_calibration_that_is_stopped_keeps_its_points_and_goes_on()
    {
        SkipUnlessLinux();
        using StationSite site = new();
        using OutsideProcess probe = await PlugInAsync(site, "air-saturated-water");
        List<string> arguments = [.. CalibratedFolder.Calibrate(site.Data, "--source", "serial:" + site["probe"], "--line", StationSite.Line), "--simulated"];
        using (OutsideProcess first = Programs.ProbeCal(arguments))
        {
            await first.WaitForErrorLineAsync("100 % point taken", Deadline);
            Assert.Equal(1, await first.TerminateAsync(Deadline));
            Assert.StartsWith("probecal: stopped before the ", first.Error()[^1], StringComparison.Ordinal);
            Assert.Empty(first.Output());
        }

        using OutsideProcess second = Programs.ProbeCal(arguments);
        Assert.True(await second.ExitCodeAsync(Deadline) == 0, second.Tail());
        Assert.Contains(second.Error(), static line => line.Contains("with span taken", StringComparison.Ordinal));
        Assert.DoesNotContain(second.Error(), static line => line.StartsWith("100 % point taken", StringComparison.Ordinal));
        Assert.Empty(Directory.GetFiles(Path.Combine(site.Data, "sessions")));
    }

    [Fact]
    public async Task Garbage_between_good_lines_is_kept_with_its_reason_and_every_good_line_arrives()
    {
        using TcpListener device = new(IPAddress.Loopback, 0);
        device.Start();
        using StationSite site = new();
        site.Configure("tcp:127.0.0.1:" + ((IPEndPoint)device.LocalEndpoint).Port.ToString(CultureInfo.InvariantCulture));
        using OutsideProcess station = site.Start();
        using TcpClient client = await device.AcceptTcpClientAsync().WaitAsync(Deadline);
        client.NoDelay = true;
        NetworkStream wire = client.GetStream();

        // The first line after a connection may be half a line, and is never trusted.
        await wire.WriteAsync(Encoding.ASCII.GetBytes(Good(0)));
        byte[][] garbage =
        [
            [0, 0xFF, 0x1B, (byte)'[', (byte)'2', (byte)'J', (byte)'\n'],
            Encoding.ASCII.GetBytes("2026-06-01T00:00:"), // the rest of it is the next line's beginning
            Encoding.ASCII.GetBytes("\n"),
            Encoding.ASCII.GetBytes("2026-06-01T00:00:00Z,NaN,18,940\n"),
            Encoding.ASCII.GetBytes("2026-06-01T00:00:00Z,70,5,18,0,940,0\n"),
            Encoding.ASCII.GetBytes("2026-06-01T00:00:00Z,1e999,18,940\n"),
            Encoding.ASCII.GetBytes("2026-06-01T00:00:00Z,70,180,940\n"),
            Encoding.ASCII.GetBytes("9999999-99-99T99:99:99Z,70,18,940\n"),
            [.. Encoding.ASCII.GetBytes(new string('7', 8_000_000)), (byte)'\n'],
            [0xC3, 0x28, (byte)',', 0xE2, 0x80, 0xAE, (byte)'\n'],
        ];
        int good = 0;
        Random noise = new(20260601);
        foreach (byte[] bad in garbage)
        {
            await wire.WriteAsync(bad);
            if (bad[^1] == '\n')
            {
                await wire.WriteAsync(Encoding.ASCII.GetBytes(Good(++good)));
            }
        }

        for (int i = 0; i < 200; i++)
        {
            // Never a line end inside, so that each is one line; never empty, for empty lines are passed over.
            byte[] bytes = new byte[noise.Next(1, 200)];
            noise.NextBytes(bytes);
            await wire.WriteAsync(Array.ConvertAll(bytes, static b => b is (byte)'\n' or (byte)'\r' ? (byte)0 : b));
            await wire.WriteAsync(Encoding.ASCII.GetBytes("\n" + Good(++good)));
        }

        // A device that sends byte by byte.
        foreach (byte each in Encoding.ASCII.GetBytes(Good(++good)))
        {
            await wire.WriteAsync(new[] { each });
            await wire.FlushAsync();
        }

        await station.WaitForOutputAsync(lines => lines.Count >= good, good + " readings", Deadline);
        await StationSite.StopAsync(station);
        Assert.Equal(Enumerable.Range(1, good).Select(static i => Good(i).TrimEnd()), site.RawTexts());
        List<string> rejected = site.Rejected();
        int bads = garbage.Count(static bytes => bytes[^1] == '\n') + 200;
        Assert.Equal(1 + bads, rejected.Count);
        Assert.All(rejected, static text => Assert.True(text.IndexOf(" <- ", StringComparison.Ordinal) < text.Length - 10, text));
        Assert.Contains(rejected, static text => text.Contains("longer than 1024 bytes", StringComparison.Ordinal));
        Assert.Contains(station.Error(), line => line.Contains((1 + bads) + " rejected lines journaled", StringComparison.Ordinal));

        // What a device sends must not reach the terminal as a command to it.
        Assert.All(station.Error(), static line => Assert.DoesNotContain(line, static c => char.IsControl(c)));
    }

    private static string Good(int number)
    {
        return "2026-06-01T00:00:00Z," + (70 + number * 0.001).ToString("F3", CultureInfo.InvariantCulture) + ",18,940\n";
    }

    private static void SkipUnlessLinux()
    {
        Skip.IfNot(OperatingSystem.IsLinux(), "pseudo-terminals of this kind are there on Linux only");
    }

    private static async Task<OutsideProcess> PlugInAsync(StationSite site, string phase = "lake")
    {
        OutsideProcess probe = Programs.ProbeCal(
        [
            "simulate", "--pty", site["probe"], "--line", StationSite.Line, "--altitude", "640m", "--temperature", "16C", "--phase", phase,
            "--faster", "60", "--rate", "1Hz", "--seed", "11",
        ]);
        await probe.WaitForErrorLineAsync("nothing here is measured", Deadline);
        return probe;
    }

    private static Task WaitForCountAsync(OutsideProcess program, string part, int count)
    {
        return program.WaitForErrorAsync(lines => lines.Count(line => line.Contains(part, StringComparison.Ordinal)) >= count, count + " lines with '" + part + "'", Deadline);
    }
}
