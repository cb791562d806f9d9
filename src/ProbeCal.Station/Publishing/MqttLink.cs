using System;
using System.Buffers;
using System.IO;
using System.Net.Sockets;
using System.Security.Authentication;
using System.Security.Cryptography;
using System.Security.Cryptography.X509Certificates;
using System.Threading;
using System.Threading.Tasks;
using MQTTnet;
using MQTTnet.Exceptions;
using MQTTnet.Formatter;
using MQTTnet.Protocol;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Journal;

namespace ProbeCal.Station.Publishing;

/// <summary>An MQTT 5 connection to a broker, over TCP or TLS.</summary>
internal sealed class MqttLink : IBrokerLink
{
    /// <summary>How long the broker may take for any answer. The library's own default is 100 s.</summary>
    public static readonly TimeSpan AnswerTime = TimeSpan.FromSeconds(10);

    /// <summary>How long the connection may be silent before the library asks for a sign of life.</summary>
    public static readonly TimeSpan KeepAlive = TimeSpan.FromSeconds(30);

    private static readonly MqttClientFactory _factory = new();

    private readonly BrokerSettings _settings;
    private IMqttClient? _client;
    private TaskCompletionSource _lost = Completed();

    /// <summary>Makes one; nothing is connected yet.</summary>
    public MqttLink(BrokerSettings settings)
    {
        _settings = settings;
        Description = settings.Host + ":" + settings.Port.ToString(System.Globalization.CultureInfo.InvariantCulture) + (settings.UseTls ? " (TLS)" : "");
    }

    /// <inheritdoc/>
    public string Description { get; }

    /// <inheritdoc/>
    public Task Lost => _lost.Task;

    /// <inheritdoc/>
    public async Task<LinkResult> ConnectAsync(CancellationToken cancellationToken)
    {
        Drop();
        MqttClientOptions options;
        try
        {
            options = Options();
        }
        catch (InputException wrong)
        {
            return new LinkResult(LinkOutcome.Refused, wrong.Message);
        }

        TaskCompletionSource lost = new(TaskCreationOptions.RunContinuationsAsynchronously);
        IMqttClient client = _factory.CreateMqttClient();
        client.DisconnectedAsync += _ =>
        {
            lost.TrySetResult();
            return Task.CompletedTask;
        };
        _client = client;
        _lost = lost;
        return await AttemptAsync(
            async () =>
            {
                // A refusal is an answer, not an exception: it has to be looked at.
                MqttClientConnectResult answer = await client.ConnectAsync(options, cancellationToken).ConfigureAwait(false);
                return answer.ResultCode == MqttClientConnectResultCode.Success
                    ? LinkResult.Done
                    : new LinkResult(LinkOutcome.Refused, Explain(answer));
            },
            cancellationToken).ConfigureAwait(false);
    }

    /// <inheritdoc/>
    public Task<LinkResult> PublishAsync(Message message, bool retain, CancellationToken cancellationToken)
    {
        if (_client is not { } client)
        {
            return Task.FromResult(new LinkResult(LinkOutcome.Broken, "not connected"));
        }

        MqttApplicationMessage packet = new()
        {
            Topic = message.Topic,
            Payload = new ReadOnlySequence<byte>(message.Payload),
            ContentType = message.ContentType,
            PayloadFormatIndicator = MqttPayloadFormatIndicator.CharacterData,
            QualityOfServiceLevel = MqttQualityOfServiceLevel.AtLeastOnce,
            Retain = retain,
        };
        return AttemptAsync(
            async () =>
            {
                MqttClientPublishResult answer = await client.PublishAsync(packet, cancellationToken).ConfigureAwait(false);
                return answer.IsSuccess
                    ? LinkResult.Done
                    : new LinkResult(LinkOutcome.Refused, "the broker refused a message to " + message.Topic + ": " + answer.ReasonCode + Quoted(answer.ReasonString));
            },
            cancellationToken);
    }

    /// <inheritdoc/>
    public Task<LinkResult> PingAsync(CancellationToken cancellationToken)
    {
        if (_client is not { } client)
        {
            return Task.FromResult(new LinkResult(LinkOutcome.Broken, "not connected"));
        }

        return AttemptAsync(
            async () =>
            {
                await client.PingAsync(cancellationToken).ConfigureAwait(false);
                return LinkResult.Done;
            },
            cancellationToken);
    }

    /// <inheritdoc/>
    public async Task DisconnectAsync(CancellationToken cancellationToken)
    {
        if (_client is { IsConnected: true } client)
        {
            await AttemptAsync(
                async () =>
                {
                    await client.DisconnectAsync(new MqttClientDisconnectOptions(), cancellationToken).ConfigureAwait(false);
                    return LinkResult.Done;
                },
                cancellationToken).ConfigureAwait(false);
        }

        Drop();
    }

    /// <inheritdoc/>
    public ValueTask DisposeAsync()
    {
        Drop();
        return ValueTask.CompletedTask;
    }

    /// <summary>Turns the ways in which the library reports a fault of the network or the broker into a result.</summary>
    private static async Task<LinkResult> AttemptAsync(Func<Task<LinkResult>> step, CancellationToken cancellationToken)
    {
        try
        {
            return await step().ConfigureAwait(false);
        }
        catch (OperationCanceledException) when (cancellationToken.IsCancellationRequested)
        {
            throw;
        }
        catch (Exception fault) when (fault is MqttCommunicationException or MqttProtocolViolationException or MqttClientDisconnectedException
            or MqttClientNotConnectedException or SocketException or IOException or AuthenticationException or OperationCanceledException
            or ObjectDisposedException)
        {
            return new LinkResult(LinkOutcome.Broken, Explain(fault));
        }
    }

    private static string Explain(Exception fault)
    {
        Exception root = fault;
        while (root.InnerException != null)
        {
            root = root.InnerException;
        }

        return root switch
        {
            MqttCommunicationTimedOutException or TimeoutException or OperationCanceledException => "no answer within " + AnswerTime.TotalSeconds.ToString(System.Globalization.CultureInfo.InvariantCulture) + " s",
            AuthenticationException => "TLS failed, nothing was sent: " + root.Message,
            _ => root.Message,
        };
    }

    private static string Quoted(string? reason)
    {
        return string.IsNullOrEmpty(reason) ? "" : " (\"" + reason + "\")";
    }

    private static TaskCompletionSource Completed()
    {
        TaskCompletionSource source = new();
        source.SetResult();
        return source;
    }

    private string Explain(MqttClientConnectResult answer)
    {
        string user = _settings.User == null ? "without a user name" : "as user " + _settings.User;
        string what = answer.ResultCode switch
        {
            // Some brokers answer "not authorised" to a wrong password.
            MqttClientConnectResultCode.BadUserNameOrPassword or MqttClientConnectResultCode.NotAuthorized => "user name or password is wrong, or this user may not connect",
            MqttClientConnectResultCode.ClientIdentifierNotValid => "it does not take the client id " + _settings.ClientId,
            MqttClientConnectResultCode.UnsupportedProtocolVersion => "it does not speak MQTT 5",
            _ => "its reason is in the code",
        };
        return "the broker refused the connection " + user + ": " + what + " (" + answer.ResultCode + ")" + Quoted(answer.ReasonString);
    }

    private MqttClientOptions Options()
    {
        MqttClientOptionsBuilder builder = new MqttClientOptionsBuilder()
            .WithTcpServer(_settings.Host, _settings.Port)
            .WithProtocolVersion(MqttProtocolVersion.V500)
            .WithClientId(_settings.ClientId)
            .WithCleanStart(true)
            .WithKeepAlivePeriod(KeepAlive)
            .WithTimeout(AnswerTime)
            .WithWillTopic(_settings.Will.Topic)
            .WithWillPayload(_settings.Will.Payload.ToArray())
            .WithWillContentType(_settings.Will.ContentType)
            .WithWillQualityOfServiceLevel(MqttQualityOfServiceLevel.AtLeastOnce)
            .WithWillRetain(true);
        if (_settings.User != null)
        {
            builder.WithCredentials(_settings.User, _settings.Password?.Fetch());
        }

        if (_settings.UseTls)
        {
            builder.WithTlsOptions(Tls);
        }

        return builder.Build();
    }

    private void Tls(MqttClientTlsOptionsBuilder tls)
    {
        tls.UseTls()
            .WithTargetHost(_settings.Host)
            .WithRevocationMode(_settings.CheckRevocation ? X509RevocationMode.Online : X509RevocationMode.NoCheck);
        if (_settings.AuthorityFile != null)
        {
            tls.WithTrustChain(Authorities(_settings.AuthorityFile));
        }
    }

    private static X509Certificate2Collection Authorities(string file)
    {
        X509Certificate2Collection trusted = [];
        try
        {
            trusted.ImportFromPemFile(file);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or CryptographicException)
        {
            throw new InputException(file + ": the file with the trusted authority cannot be read: " + fault.Message, fault);
        }

        return trusted.Count != 0 ? trusted : throw new InputException(file + ": no certificate in the file with the trusted authority; PEM is expected");
    }

    private void Drop()
    {
        _client?.Dispose();
        _client = null;
        _lost.TrySetResult();
    }
}
