using System;
using System.IO;
using System.Linq;
using System.Net;
using System.Net.NetworkInformation;
using System.Net.Sockets;
using System.Security.Cryptography.X509Certificates;
using System.Text;
using System.Threading;
using System.Threading.Tasks;
using MQTTnet;
using MQTTnet.Protocol;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Journal;
using ProbeCal.Station.Publishing;
using ProbeCal.Station.Tests.Storage;
using Xunit;

namespace ProbeCal.Station.Tests.Publishing;

/// <summary>Against real brokers on loopback.</summary>
public class MqttLinkTests
{
    private const string Secret = "correct horse 7";

    [Fact]
    public async Task Message_ArrivesWithItsBytes_ContentType_AndQoS1()
    {
        await using TestBroker broker = await TestBroker.StartAsync();
        await using MqttLink link = new(Settings(broker.Port));
        Assert.Equal(LinkResult.Done, await link.ConnectAsync(CancellationToken.None));
        Assert.Equal(LinkResult.Done, await link.PublishAsync(Message("{}"), retain: false, CancellationToken.None));
        Assert.Equal(LinkResult.Done, await link.PublishAsync(Message("kept"), retain: true, CancellationToken.None));
        Assert.Equal(LinkResult.Done, await link.PingAsync(CancellationToken.None));

        Arrival first = await broker.NextAsync();
        Assert.Equal(("t", "{}", "application/json", false, 1), (first.Topic, first.Text, first.ContentType, first.Retained, first.QualityOfService));
        Assert.True((await broker.NextAsync()).Retained);
    }

    [Fact]
    public async Task WrongPassword_IsRefused_WithAReason_AndWithoutTheSecret()
    {
        await using TestBroker broker = await TestBroker.StartAsync();
        broker.Account = ("station-7", Secret);
        await using MqttLink link = new(Settings(broker.Port) with { User = "station-7", Password = PasswordSource.FromEnvironment("P", _ => "wrong one") });

        LinkResult result = await link.ConnectAsync(CancellationToken.None);

        Assert.Equal(LinkOutcome.Refused, result.Outcome);
        Assert.Contains("station-7", result.Reason);
        Assert.Contains("user name or password is wrong", result.Reason);
        Assert.DoesNotContain("wrong one", result.Reason);
    }

    [Fact]
    public async Task RightPassword_FromAFile_IsTaken()
    {
        using TemporaryFolder folder = new();
        File.WriteAllText(folder.File("secret"), Secret + "\nsecond line\n");
        await using TestBroker broker = await TestBroker.StartAsync();
        broker.Account = ("station-7", Secret);
        await using MqttLink link = new(Settings(broker.Port) with { User = "station-7", Password = PasswordSource.FromFile(folder.File("secret")) });
        Assert.Equal(LinkResult.Done, await link.ConnectAsync(CancellationToken.None));
    }

    [Theory]
    [InlineData("variable", "THE_VARIABLE")]
    [InlineData("file", "not-there")]
    public async Task PasswordThatIsNotThere_IsARefusalThatNamesThePlace(string place, string named)
    {
        PasswordSource source = place == "variable" ? PasswordSource.FromEnvironment("THE_VARIABLE", _ => null) : PasswordSource.FromFile("not-there");
        await using MqttLink link = new(Settings(1) with { User = "u", Password = source });
        LinkResult result = await link.ConnectAsync(CancellationToken.None);
        Assert.Equal(LinkOutcome.Refused, result.Outcome);
        Assert.Contains(named, result.Reason);
    }

    [Fact]
    public async Task DeniedMessage_IsRefused_WithTheCode_AndTheConnectionStands()
    {
        await using TestBroker broker = await TestBroker.StartAsync();
        broker.Judge = arrival => arrival.Text == "bad" ? MqttPubAckReasonCode.NotAuthorized : MqttPubAckReasonCode.Success;
        await using MqttLink link = new(Settings(broker.Port));
        await link.ConnectAsync(CancellationToken.None);

        LinkResult denied = await link.PublishAsync(Message("bad"), retain: false, CancellationToken.None);
        LinkResult taken = await link.PublishAsync(Message("good"), retain: false, CancellationToken.None);

        Assert.Equal(LinkOutcome.Refused, denied.Outcome);
        Assert.Contains("NotAuthorized", denied.Reason);
        Assert.Equal(LinkResult.Done, taken);
    }

    [Fact]
    public async Task BrokerThatHangsUp_BreaksTheLink_AndItIsNoticed()
    {
        await using TestBroker broker = await TestBroker.StartAsync();
        broker.HangUpOn = arrival => arrival.Text == "last straw";
        await using MqttLink link = new(Settings(broker.Port));
        await link.ConnectAsync(CancellationToken.None);
        Assert.False(link.Lost.IsCompleted);

        LinkResult result = await link.PublishAsync(Message("last straw"), retain: false, CancellationToken.None);

        Assert.Equal(LinkOutcome.Broken, result.Outcome);
        await link.Lost.WaitAsync(Deadline.Generous);
        Assert.Equal(LinkResult.Done, await link.ConnectAsync(CancellationToken.None));
    }

    [Fact]
    public async Task NoBrokerThere_IsBroken_NotAnException()
    {
        await using MqttLink link = new(Settings(TestBroker.FreePort()));
        LinkResult result = await link.ConnectAsync(CancellationToken.None);
        Assert.Equal(LinkOutcome.Broken, result.Outcome);
        Assert.Contains("refused", result.Reason, StringComparison.OrdinalIgnoreCase);
        Assert.Equal(LinkOutcome.Broken, (await link.PublishAsync(Message("x"), false, CancellationToken.None)).Outcome);
    }

    [Fact]
    public async Task SomethingThatIsNoBroker_IsBroken_NotAnException()
    {
        using TcpListener listener = new(IPAddress.Loopback, 0);
        listener.Start();
        Task answering = Task.Run(async () =>
        {
            using TcpClient peer = await listener.AcceptTcpClientAsync();
            await peer.GetStream().WriteAsync("HTTP/1.1 400 Bad Request\r\n\r\n"u8.ToArray());
        });
        await using MqttLink link = new(Settings(((IPEndPoint)listener.LocalEndpoint).Port));

        LinkResult result = await link.ConnectAsync(CancellationToken.None);

        await answering;
        Assert.Equal(LinkOutcome.Broken, result.Outcome);
    }

    [Fact]
    public async Task Will_IsPublishedWhenTheStationGoesWithoutGoodbye_AndNotAfterOne()
    {
        await using TestBroker broker = await TestBroker.StartAsync();
        using IMqttClient watcher = new MqttClientFactory().CreateMqttClient();
        TaskCompletionSource<string> seen = new(TaskCreationOptions.RunContinuationsAsynchronously);
        watcher.ApplicationMessageReceivedAsync += message =>
        {
            seen.TrySetResult(Encoding.UTF8.GetString(message.ApplicationMessage.Payload));
            return Task.CompletedTask;
        };
        await watcher.ConnectAsync(new MqttClientOptionsBuilder().WithTcpServer("127.0.0.1", broker.Port).Build());
        await watcher.SubscribeAsync("t/#");

        MqttLink orderly = new(Settings(broker.Port));
        await orderly.ConnectAsync(CancellationToken.None);
        await orderly.PublishAsync(new Message("t/s", "application/json", "before"u8.ToArray()), false, CancellationToken.None);
        await orderly.DisconnectAsync(CancellationToken.None);
        await orderly.DisposeAsync();
        Assert.Equal("before", await seen.Task.WaitAsync(Deadline.Generous));

        seen = new TaskCompletionSource<string>(TaskCreationOptions.RunContinuationsAsynchronously);
        MqttLink sudden = new(Settings(broker.Port));
        await sudden.ConnectAsync(CancellationToken.None);
        await sudden.DisposeAsync();
        Assert.Equal("will", await seen.Task.WaitAsync(Deadline.Generous));

        // Whoever comes later learns it too.
        using IMqttClient late = new MqttClientFactory().CreateMqttClient();
        TaskCompletionSource<(string Text, bool Retained)> kept = new(TaskCreationOptions.RunContinuationsAsynchronously);
        late.ApplicationMessageReceivedAsync += message =>
        {
            kept.TrySetResult((Encoding.UTF8.GetString(message.ApplicationMessage.Payload), message.ApplicationMessage.Retain));
            return Task.CompletedTask;
        };
        await late.ConnectAsync(new MqttClientOptionsBuilder().WithTcpServer("127.0.0.1", broker.Port).Build());
        await late.SubscribeAsync("t/#");
        Assert.Equal(("will", true), await kept.Task.WaitAsync(Deadline.Generous));
    }

    [Theory]
    [InlineData("good", nameof(LinkOutcome.Done), "")]
    [InlineData("other authority", nameof(LinkOutcome.Broken), "nothing was sent")]
    [InlineData("machine's authorities", nameof(LinkOutcome.Broken), "nothing was sent")]
    [InlineData("wrong host", nameof(LinkOutcome.Broken), "nothing was sent")]
    [InlineData("expired", nameof(LinkOutcome.Broken), "nothing was sent")]
    [InlineData("authority that cannot be asked", nameof(LinkOutcome.Done), "")]
    [InlineData("no such file", nameof(LinkOutcome.Refused), "cannot be read")]
    [InlineData("no certificate in the file", nameof(LinkOutcome.Refused), "no certificate")]
    public async Task Tls_LetsOnlyTheRightBrokerIn(string which, string outcome, string reason)
    {
        using TemporaryFolder folder = new();
        using TestAuthority authority = new();
        using TestAuthority other = new();
        using X509Certificate2 certificate = authority.Issue(which == "wrong host" ? "broker.invalid" : "localhost", which == "expired");
        await using TestBroker broker = await TestBroker.StartAsync(certificate: certificate);
        File.WriteAllText(folder.File("ca.pem"), which switch { "other authority" => other.Pem, "no certificate in the file" => "words", _ => authority.Pem });
        BrokerSettings settings = Settings(broker.Port) with
        {
            Host = "localhost",
            UseTls = true,
            CheckRevocation = which == "authority that cannot be asked",
            AuthorityFile = which switch { "machine's authorities" => null, "no such file" => folder.File("absent.pem"), _ => folder.File("ca.pem") },
        };
        await using MqttLink link = new(settings);

        LinkResult result = await link.ConnectAsync(CancellationToken.None);

        Assert.Equal(outcome, result.Outcome.ToString());
        Assert.Contains(reason, result.Reason);
        Assert.True(broker.NothingArrived());
    }

    [Fact]
    public async Task EmbeddedBroker_TakesMessages_AndListensOnLoopbackOnly()
    {
        int port = TestBroker.FreePort();
        await using EmbeddedBroker broker = await EmbeddedBroker.StartAsync(port);
        await using MqttLink link = new(Settings(port));
        Assert.Equal(LinkResult.Done, await link.ConnectAsync(CancellationToken.None));
        Assert.Equal(LinkResult.Done, await link.PublishAsync(Message("x"), false, CancellationToken.None));

        IPEndPoint[] listening = IPGlobalProperties.GetIPGlobalProperties().GetActiveTcpListeners().Where(end => end.Port == port).ToArray();
        Assert.Equal([new IPEndPoint(IPAddress.Loopback, port)], listening);
    }

    [Fact]
    public async Task EmbeddedBroker_OnAPortInUse_SaysWhatToDo()
    {
        await using TestBroker taken = await TestBroker.StartAsync();
        WorkFailedException failed = await Assert.ThrowsAsync<WorkFailedException>(() => EmbeddedBroker.StartAsync(taken.Port));
        Assert.Contains("embeddedBroker.port", failed.Message);
    }

    private static BrokerSettings Settings(int port)
    {
        return new BrokerSettings
        {
            Host = "127.0.0.1",
            Port = port,
            ClientId = "probecal-test",
            Will = new Message("t/will", "application/json", "will"u8.ToArray()),
        };
    }

    private static Message Message(string text)
    {
        return new Message("t", "application/json", Encoding.UTF8.GetBytes(text));
    }
}
