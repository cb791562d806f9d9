using System;
using System.Buffers;
using System.Collections.Generic;
using System.Net;
using System.Net.Sockets;
using System.Security.Cryptography.X509Certificates;
using System.Threading.Channels;
using System.Threading.Tasks;
using MQTTnet.Protocol;
using MQTTnet.Server;

namespace ProbeCal.Station.Tests.Publishing;

/// <summary>A real broker on loopback whose manners a test can spoil.</summary>
public sealed class TestBroker : IAsyncDisposable
{
    private readonly MqttServer _server;
    private readonly Channel<Arrival> _arrivals = Channel.CreateUnbounded<Arrival>();

    private TestBroker(MqttServer server, int port)
    {
        _server = server;
        Port = port;
        server.ValidatingConnectionAsync += ValidateAsync;
        server.InterceptingPublishAsync += InterceptAsync;
    }

    public int Port { get; }

    /// <summary>The only user and password that may enter, or null for all.</summary>
    public (string User, string Password)? Account { get; set; }

    /// <summary>What is answered to a message; it is taken only if this is success.</summary>
    public Func<Arrival, MqttPubAckReasonCode> Judge { get; set; } = _ => MqttPubAckReasonCode.Success;

    /// <summary>True for a message after which the broker hangs up without an answer.</summary>
    public Func<Arrival, bool> HangUpOn { get; set; } = _ => false;

    public static int FreePort()
    {
        using TcpListener listener = new(IPAddress.Loopback, 0);
        listener.Start();
        return ((IPEndPoint)listener.LocalEndpoint).Port;
    }

    public static async Task<TestBroker> StartAsync(int? port = null, X509Certificate2? certificate = null)
    {
        int chosen = port ?? FreePort();
        MqttServerOptionsBuilder options = new();
        if (certificate == null)
        {
            options.WithDefaultEndpoint().WithDefaultEndpointPort(chosen)
                .WithDefaultEndpointBoundIPAddress(IPAddress.Loopback).WithDefaultEndpointBoundIPV6Address(IPAddress.None);
        }
        else
        {
            options.WithoutDefaultEndpoint().WithEncryptedEndpoint().WithEncryptedEndpointPort(chosen)
                .WithEncryptedEndpointBoundIPAddress(IPAddress.Loopback).WithEncryptedEndpointBoundIPV6Address(IPAddress.None)
                .WithEncryptionCertificate(certificate);
        }

        TestBroker broker = new(new MqttServerFactory().CreateMqttServer(options.Build()), chosen);
        await broker._server.StartAsync();
        return broker;
    }

    /// <summary>The next message that reached the broker, taken or not.</summary>
    public async Task<Arrival> NextAsync()
    {
        return await _arrivals.Reader.ReadAsync().AsTask().WaitAsync(Deadline.Generous);
    }

    /// <summary>All messages that reached the broker and were not looked at yet, taken or not.</summary>
    public List<Arrival> Arrived()
    {
        List<Arrival> arrived = [];
        while (_arrivals.Reader.TryRead(out Arrival? arrival))
        {
            arrived.Add(arrival);
        }

        return arrived;
    }

    public bool NothingArrived()
    {
        return !_arrivals.Reader.TryPeek(out _);
    }

    public async ValueTask DisposeAsync()
    {
        await _server.StopAsync(new MqttServerStopOptionsBuilder().Build());
        _server.Dispose();
    }

    private Task ValidateAsync(ValidatingConnectionEventArgs connection)
    {
        if (Account is { } account && (connection.UserName != account.User || connection.Password != account.Password))
        {
            connection.ReasonCode = MqttConnectReasonCode.BadUserNameOrPassword;
        }

        return Task.CompletedTask;
    }

    private Task InterceptAsync(InterceptingPublishEventArgs publish)
    {
        Arrival arrival = new(
            publish.ApplicationMessage.Topic,
            publish.ApplicationMessage.Payload.ToArray(),
            publish.ApplicationMessage.ContentType,
            publish.ApplicationMessage.Retain,
            (int)publish.ApplicationMessage.QualityOfServiceLevel);
        _arrivals.Writer.TryWrite(arrival);
        publish.Response.ReasonCode = Judge(arrival);
        publish.ProcessPublish = publish.Response.ReasonCode == MqttPubAckReasonCode.Success;
        publish.CloseConnection = HangUpOn(arrival);
        return Task.CompletedTask;
    }
}

public sealed record Arrival(string Topic, byte[] Payload, string ContentType, bool Retained, int QualityOfService)
{
    public string Text => System.Text.Encoding.UTF8.GetString(Payload);
}
