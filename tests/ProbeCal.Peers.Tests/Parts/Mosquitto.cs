using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Net;
using System.Net.Sockets;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Peers.Tests.Parts;

/// <summary>A real mosquitto on a free loopback port, with its sessions kept on disk so that it can be stopped and started again.</summary>
internal sealed class Mosquitto : IDisposable
{
    private readonly string _configuration;
    private OutsideProcess? _process;

    private Mosquitto(string configuration, int port)
    {
        _configuration = configuration;
        Port = port;
    }

    internal int Port { get; }

    internal string Address => "127.0.0.1:" + Port.ToString(CultureInfo.InvariantCulture);

    /// <summary>Skips the calling test, saying so, where the machine has no mosquitto.</summary>
    internal static void SkipUnlessPresent()
    {
        Skip.If(Programs.Find("mosquitto") is null || Programs.Find("mosquitto_sub") is null, "mosquitto or mosquitto_sub is not installed");
    }

    internal static async Task<Mosquitto> StartAsync(string folder, string? passwordFile = null, string? extraListener = null)
    {
        Directory.CreateDirectory(folder);
        int port = FreePort();
        List<string> lines =
        [
            // Only a root user may keep its own rights; for any other user the line is not used by mosquitto.
            "user root",
            $"listener {port.ToString(CultureInfo.InvariantCulture)} 127.0.0.1",
            passwordFile is null ? "allow_anonymous true" : "allow_anonymous false",
            "persistence true",
            "persistence_location " + folder + "/",
            "autosave_on_changes true",
            "autosave_interval 1",
            "max_queued_messages 0",
            "log_dest stderr",
        ];
        if (passwordFile is not null)
        {
            lines.Add("password_file " + passwordFile);
        }

        if (extraListener is not null)
        {
            lines.Add(extraListener);
        }

        string configuration = Path.Combine(folder, "mosquitto.conf");
        await File.WriteAllLinesAsync(configuration, lines);
        Mosquitto broker = new(configuration, port);
        await broker.StartAsync();
        return broker;
    }

    internal async Task StartAsync()
    {
        _process = OutsideProcess.Start(Programs.Find("mosquitto")!, ["-c", _configuration]);
        await _process.WaitForErrorLineAsync(" running", TimeSpan.FromSeconds(20));
    }

    internal async Task StopAsync()
    {
        await _process!.TerminateAsync(TimeSpan.FromSeconds(20));
        _process.Dispose();
        _process = null;
    }

    public void Dispose()
    {
        _process?.Dispose();
    }

    internal static int FreePort()
    {
        using TcpListener listener = new(IPAddress.Loopback, 0);
        listener.Start();
        return ((IPEndPoint)listener.LocalEndpoint).Port;
    }
}
