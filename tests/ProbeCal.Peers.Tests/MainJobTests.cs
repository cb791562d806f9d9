using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text.Json;
using System.Threading.Tasks;
using ProbeCal.Peers.Tests.Parts;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Peers.Tests;

/// <summary>
/// The whole job with real parts: simulated probe → pseudo-terminal → calibrate → station → mosquitto → an independent
/// subscriber (mosquitto_sub), with the broker stopped and started, and the station killed outright, in the middle.
/// </summary>
public class MainJobTests(ITestOutputHelper output)
{
    private const string Line = "{time},{signal:nA},{temperature},{pressure}";

    // Generous: a loaded two-core machine; the test goes on as soon as what it waits for is there.
    private static readonly TimeSpan Deadline = TimeSpan.FromMinutes(3);

    // After the probe is moved, membrane and thermometer follow with 12 s and 6 s (SimulatedProbe); the lag is not modelled in a
    // reading and not part of its uncertainty. Ten time constants leave e^-10 of the step.
    private static readonly TimeSpan Settling = TimeSpan.FromSeconds(120);

    [SkippableFact]
    public async Task Calibrated_readings_reach_the_subscriber_through_broker_restart_and_kill()
    {
        Mosquitto.SkipUnlessPresent();
        Skip.IfNot(OperatingSystem.IsLinux(), "pseudo-terminals of this kind are there on Linux only");
        using TemporaryFolder folder = new();
        using Mosquitto broker = await Mosquitto.StartAsync(folder["broker"]);
        using OutsideProcess subscriber = Subscribe(broker);
        using OutsideProcess probe = Programs.ProbeCal(
        [
            "simulate", "--pty", folder["probe"], "--line", Line, "--truth", folder["truth.csv"], "--altitude", "640m", "--temperature", "16C",
            "--phase", "air-saturated-water:30min,lake", "--faster", "60", "--rate", "1Hz", "--seed", "7",
        ]);
        await probe.WaitForErrorLineAsync("nothing here is measured", Deadline);

        await CalibrateAsync(folder);
        string configuration = WriteConfiguration(folder, broker);
        List<string> journaled = [];

        using (OutsideProcess station = StartStation(folder, configuration))
        {
            await subscriber.WaitForOutputAsync(static lines => lines.Count >= 300, "300 readings at the subscriber", Deadline);
            await broker.StopAsync();
            int before = station.Output().Count;
            await station.WaitForOutputAsync(lines => lines.Count >= before + 300, "300 readings journaled without a broker", Deadline);
            await station.KillAsync();
            journaled.AddRange(station.Output());
        }

        await broker.StartAsync();
        long lastBeforeKill = Sequence(journaled[^1]);
        using (OutsideProcess station = StartStation(folder, configuration))
        {
            DateTimeOffset enough = ReadTruth(folder["truth.csv"])[0].Time + TimeSpan.FromMinutes(30) + Settling + TimeSpan.FromMinutes(10);
            await subscriber.WaitForOutputAsync(
                lines => Sequence(lines[^1]) > lastBeforeKill + 300 && Time(lines[^1]) >= enough, "ten minutes of readings in the lake, after the kill", Deadline);
            Assert.Equal(0, await station.TerminateAsync(Deadline));
            journaled.AddRange(station.Output());
        }

        long last = journaled.Max(Sequence);
        await subscriber.WaitForOutputAsync(lines => lines.Any(line => Sequence(line) == last), "the last reading at the subscriber", Deadline);
        Check(journaled, subscriber.Output(), last);
        CompareWithTruth(subscriber.Output(), folder["truth.csv"]);
    }

    private static OutsideProcess Subscribe(Mosquitto broker)
    {
        return OutsideProcess.Start(
            Programs.Find("mosquitto_sub")!,
            ["-h", "127.0.0.1", "-p", broker.Port.ToString(CultureInfo.InvariantCulture), "-i", "independent", "-c", "-q", "1", "-t", "probecal/v1/+/+/reading"]);
    }

    private static async Task CalibrateAsync(TemporaryFolder folder)
    {
        using OutsideProcess calibrate = Programs.ProbeCal(
        [
            "calibrate", "--unattended", "--simulated", "--data", folder["data"], "--source", "serial:" + folder["probe"], "--line", Line,
            "--probe", "P-17", "--method", "air-saturated-water", "--pressure-source", "barometer:B-1", "--altitude", "640m", "--salinity", "0",
            "--stirring", "stirred", "--coefficient", "arrhenius 22kJ/mol at 25C fitted 0..35C", "--site", "Alder Tarn (invented)",
        ]);
        Assert.True(await calibrate.ExitCodeAsync(Deadline) == 0, calibrate.Tail());
    }

    private static string WriteConfiguration(TemporaryFolder folder, Mosquitto broker)
    {
        string path = folder["station.json"];
        File.WriteAllText(path, $$"""
            {
              // An invented site.
              "format": "probecal-station-configuration", "version": 1,
              "station": "alder-tarn", "probe": "P-17", "simulated": true,
              "site": { "name": "Alder Tarn (invented)", "altitude": "640 m" },
              "source": "serial:{{folder["probe"]}}", "line": "{{Line}}",
              "pressure": { "source": "line:barometer:B-1" },
              "salinity": { "source": "fresh water", "value": "0" },
              "stirring": "stirred",
              "broker": { "address": "mqtt://{{broker.Address}}" }
            }
            """);
        return path;
    }

    private static OutsideProcess StartStation(TemporaryFolder folder, string configuration)
    {
        return Programs.ProbeCal(["station", "--config", configuration, "--data", folder["data"], "--print"]);
    }

    /// <summary>Nothing missing, nothing sent with two contents, everything that was journaled has arrived.</summary>
    private void Check(List<string> journaled, IReadOnlyList<string> arrived, long last)
    {
        Dictionary<long, string> received = [];
        int repeats = 0;
        foreach (string line in arrived)
        {
            long sequence = Sequence(line);
            if (received.TryGetValue(sequence, out string? first))
            {
                repeats++;
                Assert.Equal(first, line);
            }
            else
            {
                received.Add(sequence, line);
            }
        }

        Assert.DoesNotContain(LongRange(1, last), sequence => !received.ContainsKey(sequence));
        Assert.All(journaled, line => Assert.Equal(line, received[Sequence(line)]));
        output.WriteLine($"campaign: main job: {received.Count} readings, {repeats} repeats, none missing");
    }

    /// <summary>Corrected readings against what the simulation knows.</summary>
    private void CompareWithTruth(IReadOnlyList<string> arrived, string truthFile)
    {
        List<(DateTimeOffset Time, string Phase, double PartialPressure, double MilligramsPerLitre, double PercentLocal)> truth = ReadTruth(truthFile);
        Dictionary<DateTimeOffset, int> at = truth.Select(static (row, index) => (row.Time, index)).ToDictionary(static p => p.Time, static p => p.index);
        DateTimeOffset moved = truth.Where((row, index) => index > 0 && truth[index - 1].Phase != row.Phase).Select(static row => row.Time).DefaultIfEmpty(DateTimeOffset.MinValue).First();
        HashSet<string> phases = [];
        List<double> milligrams = [], pressures = [], percents = [];
        foreach (string line in arrived)
        {
            using JsonDocument document = JsonDocument.Parse(line);
            JsonElement reading = document.RootElement;
            DateTimeOffset time = reading.GetProperty("timeUtc").GetDateTimeOffset();
            var row = truth[at[time]];
            if (time >= moved && time < moved + Settling)
            {
                continue;
            }

            phases.Add(row.Phase);
            milligrams.Add(Deviation(reading, "mgPerL", row.MilligramsPerLitre));
            pressures.Add(Deviation(reading, "partialPressureHPa", row.PartialPressure));
            percents.Add(Deviation(reading, "percentLocal", row.PercentLocal));
        }

        Assert.Contains("lake", phases);
        foreach ((string name, List<double> deviations) in new[] { ("mg/L", milligrams), ("pO2", pressures), ("% local", percents) })
        {
            double within = deviations.Count(static d => Math.Abs(d) <= 2) / (double)deviations.Count;
            output.WriteLine(string.Create(CultureInfo.InvariantCulture,
                $"campaign: main job: {name}: {deviations.Count} readings, mean deviation {deviations.Average():F2} u, largest {deviations.Max(Math.Abs):F2} u, {100 * within:F1} % within 2 u"));
            // k = 2 covers about 95 % (JCGM 100, 6.3.3). The systematic parts are drawn once in a run, so nearly all or nearly none lie within.
            Assert.True(within >= 0.95, name);
        }
    }

    /// <summary>How far a value lies from the truth, in its own stated standard uncertainties.</summary>
    private static double Deviation(JsonElement reading, string quantity, double truth)
    {
        JsonElement part = reading.GetProperty(quantity);
        double u = part.GetProperty("standardUncertainty").GetDouble();
        // An uncertainty that is never wrong because it is huge would prove nothing: below 5 % of the value.
        Assert.InRange(u, 1e-6, 0.05 * truth);
        return (part.GetProperty("value").GetDouble() - truth) / u;
    }

    private static List<(DateTimeOffset Time, string Phase, double PartialPressure, double MilligramsPerLitre, double PercentLocal)> ReadTruth(string file)
    {
        using FileStream stream = new(file, FileMode.Open, FileAccess.Read, FileShare.ReadWrite);
        using StreamReader reader = new(stream);
        List<(DateTimeOffset, string, double, double, double)> rows = [];
        string[]? header = null;
        // What stands behind the last line end may be half a row: the simulation goes on writing.
        foreach (string text in reader.ReadToEnd().Split('\n')[..^1])
        {
            string[] cells = text.Split(',');
            if (text.StartsWith('#'))
            {
                continue;
            }

            if (header is null)
            {
                header = cells;
            }
            else if (cells.Length == header.Length)
            {
                double Cell(string name) => double.Parse(cells[Array.IndexOf(header, name)], CultureInfo.InvariantCulture);
                rows.Add((DateTimeOffset.Parse(cells[Array.IndexOf(header, "timeUtc")], CultureInfo.InvariantCulture), cells[Array.IndexOf(header, "phase")],
                    Cell("partialPressureHectopascal"), Cell("milligramsPerLitre"), Cell("percentLocal")));
            }
        }

        return rows;
    }

    private static IEnumerable<long> LongRange(long from, long to)
    {
        for (long value = from; value <= to; value++)
        {
            yield return value;
        }
    }

    private static DateTimeOffset Time(string line)
    {
        using JsonDocument document = JsonDocument.Parse(line);
        return document.RootElement.GetProperty("timeUtc").GetDateTimeOffset();
    }

    private static long Sequence(string line)
    {
        using JsonDocument document = JsonDocument.Parse(line);
        return document.RootElement.GetProperty("sequence").GetInt64();
    }
}
