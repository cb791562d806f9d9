using System;
using System.Buffers;
using System.Collections.Generic;
using System.Runtime.CompilerServices;
using System.Text.Json;
using System.Threading;
using System.Threading.Channels;
using System.Threading.Tasks;
using MQTTnet;
using MQTTnet.Exceptions;

namespace ProbeCal.Host.Commands;

/// <summary>A reading as it came back from the broker.</summary>
internal sealed record DemoReading(DateTimeOffset Time, double Signal, double Temperature, double Pressure, double? MilligramsPerLitre, double? Uncertainty, double? PercentLocal, int Flag);

/// <summary>Somebody else at the broker: subscribes to the readings and hands them on.</summary>
internal sealed class DemoSubscriber(int port, TimeProvider time) : IAsyncDisposable
{
    private static readonly TimeSpan RetryAfter = TimeSpan.FromMilliseconds(200);

    private readonly IMqttClient _client = new MqttClientFactory().CreateMqttClient();

    internal async IAsyncEnumerable<DemoReading> ReadingsAsync([EnumeratorCancellation] CancellationToken stop)
    {
        Channel<DemoReading> arrived = Channel.CreateUnbounded<DemoReading>();
        _client.ApplicationMessageReceivedAsync += message =>
        {
            arrived.Writer.TryWrite(Read(message.ApplicationMessage.Payload));
            return Task.CompletedTask;
        };
        await ConnectAsync(stop).ConfigureAwait(false);
        await _client.SubscribeAsync("probecal/v1/+/+/reading", cancellationToken: stop).ConfigureAwait(false);
        await foreach (DemoReading reading in arrived.Reader.ReadAllAsync(stop).ConfigureAwait(false))
        {
            yield return reading;
        }
    }

    public ValueTask DisposeAsync()
    {
        _client.Dispose();
        return ValueTask.CompletedTask;
    }

    /// <summary>The broker starts with the station, a moment after this.</summary>
    private async Task ConnectAsync(CancellationToken stop)
    {
        MqttClientOptions options = new MqttClientOptionsBuilder().WithTcpServer("127.0.0.1", port).WithClientId("demo-subscriber").Build();
        while (true)
        {
            try
            {
                await _client.ConnectAsync(options, stop).ConfigureAwait(false);
                return;
            }
            catch (MqttCommunicationException)
            {
                await Task.Delay(RetryAfter, time, stop).ConfigureAwait(false);
            }
        }
    }

    private static DemoReading Read(ReadOnlySequence<byte> payload)
    {
        using JsonDocument document = JsonDocument.Parse(payload);
        JsonElement reading = document.RootElement;
        JsonElement milligrams = reading.GetProperty("mgPerL");
        return new DemoReading(
            reading.GetProperty("timeUtc").GetDateTimeOffset(),
            reading.GetProperty("raw").GetProperty("signal").GetDouble(),
            Value(reading.GetProperty("temperatureC"), "value") ?? double.NaN,
            Value(reading.GetProperty("pressureHPa"), "value") ?? double.NaN,
            Value(milligrams, "value"),
            Value(milligrams, "standardUncertainty"),
            Value(reading.GetProperty("percentLocal"), "value"),
            milligrams.GetProperty("flag").GetInt32());
    }

    private static double? Value(JsonElement part, string name)
    {
        JsonElement value = part.GetProperty(name);
        return value.ValueKind == JsonValueKind.Number ? value.GetDouble() : null;
    }
}
