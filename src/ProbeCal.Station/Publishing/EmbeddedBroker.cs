using System;
using System.Globalization;
using System.IO;
using System.Net;
using System.Net.Sockets;
using System.Threading.Tasks;
using MQTTnet.Server;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Publishing;

/// <summary>
/// A broker inside the station, for whoever has none: on loopback only, so that nothing is open to the network. It keeps
/// retained messages while it runs and no session across restarts.
/// </summary>
internal sealed class EmbeddedBroker : IAsyncDisposable
{
    private readonly MqttServer _server;

    private EmbeddedBroker(MqttServer server)
    {
        _server = server;
    }

    /// <summary>Starts one on 127.0.0.1.</summary>
    /// <exception cref="WorkFailedException">The port is in use or may not be opened.</exception>
    public static async Task<EmbeddedBroker> StartAsync(int port)
    {
        MqttServerOptions options = new MqttServerOptionsBuilder()
            .WithDefaultEndpoint()
            .WithDefaultEndpointBoundIPAddress(IPAddress.Loopback)
            .WithDefaultEndpointBoundIPV6Address(IPAddress.None) // otherwise it listens on every IPv6 address
            .WithDefaultEndpointPort(port)
            .Build();
        MqttServer server = new MqttServerFactory().CreateMqttServer(options);
        try
        {
            await server.StartAsync().ConfigureAwait(false);
            return new EmbeddedBroker(server);
        }
        catch (Exception fault) when (fault is SocketException or IOException)
        {
            server.Dispose();
            throw new WorkFailedException(string.Create(CultureInfo.InvariantCulture, $"the embedded broker cannot listen on 127.0.0.1:{port}: {fault.Message}; choose another embeddedBroker.port, or name the broker that is there as broker.address"), fault);
        }
    }

    /// <inheritdoc/>
    public async ValueTask DisposeAsync()
    {
        await _server.StopAsync(new MqttServerStopOptionsBuilder().Build()).ConfigureAwait(false);
        _server.Dispose();
    }
}
