using System;
using System.CommandLine;
using System.Globalization;
using System.IO;
using System.Net;
using System.Net.Sockets;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>
/// <c>probecal demo</c>: the whole job on a simulated probe at an invented site. It runs the same commands that a person
/// would, shows each, and reads the readings back from the broker.
/// </summary>
internal static class DemoCommand
{
    private const string Line = "{time},{signal:nA},{temperature},{pressure}";
    private const string Site = "Alder Tarn (invented)";
    private const string Probe = "demo-1";

    internal static Command Create(Terminal terminal)
    {
        Option<string> readings = new("--readings") { Description = "Stop after so many readings (default: run until Ctrl-C, or 20 where nobody watches).", HelpName = "N" };
        Option<string> seed = new("--seed") { Description = "Seed of the simulation.", DefaultValueFactory = static _ => "7", HelpName = "N" };
        Command command = new(
            "demo",
            """
            The main job on a simulated probe at an invented site: equilibrium, calibration, corrected readings over MQTT.
            Nothing in it is measured. It runs the commands a person would and shows each; nothing is left behind.

            Examples:
              probecal demo
              probecal demo --readings 30
            """)
        {
            readings, seed,
        };
        command.SetAction(async (parsed, stop) =>
        {
            long? limit = parsed.GetValue(readings) is string text ? Number.ParseWhole("--readings", text, 1, 1_000_000) : null;
            long seedNumber = Number.ParseWhole("--seed", parsed.GetValue(seed)!, 0, int.MaxValue);
            DirectoryInfo folder = Directory.CreateTempSubdirectory("probecal-demo-");
            try
            {
                return await RunAsync(terminal, folder.FullName, limit ?? (terminal.IsInteractive ? long.MaxValue : 20), seedNumber, stop).ConfigureAwait(false);
            }
            finally
            {
                folder.Delete(recursive: true);
            }
        });
        return command;
    }

    private static async Task<int> RunAsync(Terminal terminal, string folder, long readings, long seed, CancellationToken stop)
    {
        DemoScreen screen = new(terminal);
        screen.Title(Site);
        int port = FreePort();
        string truth = Path.Combine(folder, "truth.csv");
        using CancellationTokenSource end = CancellationTokenSource.CreateLinkedTokenSource(stop);
        using DemoShell shell = new(terminal, screen, end.Token);
        try
        {
            screen.Step(1, "What the water holds there");
            if (await shell.ShowAsync("equilibrium", "--temperature", "16C", "--salinity", "0", "--altitude", "640m").ConfigureAwait(false) is int refused && refused != ExitCode.Done)
            {
                return refused;
            }

            screen.Step(2, "A simulated probe, sixty times faster than life: in air-saturated water, then in the tarn");
            Task<int> simulation = shell.InBackgroundAsync(
                "simulate", "--tcp", Text(port), "--line", Line, "--altitude", "640m", "--temperature", "16C", "--phase", "air-saturated-water:20min,lake",
                "--faster", "60", "--seed", Text(seed), "--truth", truth);

            screen.Step(3, "Calibrate it");
            string data = Path.Combine(folder, "data");
            int calibrated = await shell.ShowAsync(
                "calibrate", "--unattended", "--simulated", "--data", data, "--source", "tcp:127.0.0.1:" + Text(port), "--line", Line, "--probe", Probe,
                "--method", "air-saturated-water", "--pressure-source", "barometer:simulated", "--altitude", "640m", "--salinity", "0", "--stirring", "stirred",
                "--coefficient", "arrhenius 22kJ/mol at 25C fitted 0..35C", "--site", Site).ConfigureAwait(false);
            if (calibrated != ExitCode.Done)
            {
                return calibrated;
            }

            screen.Step(4, "Stream corrected readings; they are read back from the broker");
            int broker = FreePort();
            string configuration = Path.Combine(folder, "station.json");
            await File.WriteAllTextAsync(configuration, Configuration(port, broker), end.Token).ConfigureAwait(false);
            Task<int> station = shell.InBackgroundAsync("station", "--config", configuration, "--data", data);
            await using DemoSubscriber subscriber = new(broker, terminal.Time);
            using DemoTruth known = new(truth);
            Task watching = screen.WatchAsync(subscriber.ReadingsAsync(end.Token), known, readings, end.Token);
            Task first = await Task.WhenAny(watching, station, simulation).ConfigureAwait(false);
            await end.CancelAsync().ConfigureAwait(false);
            await watching.ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
            int[] codes = await Task.WhenAll(station, simulation).ConfigureAwait(false);
            screen.End(shell.Complaint);
            return first == watching ? Math.Max(codes[0], codes[1]) : ExitCode.WorkFailed;
        }
        finally
        {
            await end.CancelAsync().ConfigureAwait(false);
            await shell.FinishAsync().ConfigureAwait(false);
        }
    }

    private static string Configuration(int source, int broker)
    {
        return $$"""
            {
              // Made by the demo; a real station's file looks the same.
              "format": "probecal-station-configuration", "version": 1,
              "station": "alder-tarn", "probe": "{{Probe}}", "simulated": true,
              "site": { "name": "{{Site}}", "altitude": "640 m" },
              "source": "tcp:127.0.0.1:{{Text(source)}}", "line": "{{Line}}",
              "pressure": { "source": "line:barometer:simulated" },
              "salinity": { "source": "fresh water", "value": "0" },
              "stirring": "stirred",
              "embeddedBroker": { "port": {{Text(broker)}} }
            }
            """;
    }

    private static string Text(long number)
    {
        return number.ToString(CultureInfo.InvariantCulture);
    }

    private static int FreePort()
    {
        using TcpListener listener = new(IPAddress.Loopback, 0);
        listener.Start();
        return ((IPEndPoint)listener.LocalEndpoint).Port;
    }
}
