using System;
using System.Text;
using System.Threading;
using System.Threading.Tasks;
using Microsoft.Data.Sqlite;
using ProbeCal.Station.Journal;
using ProbeCal.Station.Publishing;
using ProbeCal.Station.Tests.Storage;
using Xunit;

namespace ProbeCal.Station.Tests.Publishing;

public sealed class PublisherTests : IDisposable
{
    private static readonly LinkResult _refused = new(LinkOutcome.Refused, "not authorised");
    private static readonly LinkResult _broken = new(LinkOutcome.Broken, "no route");

    private readonly TemporaryFolder _folder = new();
    private readonly WatchedTime _time = new();
    private readonly ScriptedLink _link = new();
    private readonly KeptLog _log = new();
    private readonly CancellationTokenSource _stop = new();
    private readonly StationJournal _journal;
    private readonly Publisher _publisher;

    public PublisherTests()
    {
        _journal = StationJournal.Open(_folder.File("journal.db"), _time);
        PublisherOptions options = new() { Farewell = () => Message("farewell") };
        _publisher = new Publisher(_journal, _link, options, _time, new FixedRandom(0.5), _log);
    }

    public void Dispose()
    {
        _journal.Dispose();
        _folder.Dispose();
        _stop.Dispose();
    }

    [Fact]
    public async Task Outbox_IsSentInOrder_AndEmptiedOnlyByGoodAnswers()
    {
        Enqueue("1", "2", "3");
        Task run = _publisher.RunAsync(_stop.Token);
        await _link.ExpectAsync("connect", "publish 1", "publish 2", "publish 3");
        await _time.NextWaitAsync();

        Assert.Equal(0, _journal.CountPending());
        await StopAsync(run, "retain farewell", "disconnect");
    }

    [Fact]
    public async Task RefusedMessage_StaysFirst_AndIsTriedAgainWithoutBeingOvertaken()
    {
        Enqueue("1", "2", "3");
        int answers = 0;
        _link.PublishAnswer = message => Text(message) == "2" && answers++ < 2 ? _refused : LinkResult.Done;
        Task run = _publisher.RunAsync(_stop.Token);

        await _link.ExpectAsync("connect", "publish 1", "publish 2");
        Assert.Equal(TimeSpan.FromMilliseconds(750), await _time.NextWaitAsync());
        Assert.Equal(2, _journal.CountPending());
        _time.Advance(TimeSpan.FromMilliseconds(750));
        await _link.ExpectAsync("publish 2");
        Assert.Equal(TimeSpan.FromMilliseconds(1500), await _time.NextWaitAsync());
        Assert.Equal(2, _journal.CountPending());
        _time.Advance(TimeSpan.FromMilliseconds(1500));
        await _link.ExpectAsync("publish 2", "publish 3");

        await _time.NextWaitAsync();
        Assert.Equal(0, _journal.CountPending());
        Assert.Contains(_log.Lines, line => line.Contains("2102") && line.Contains("not authorised") && line.Contains("everything is kept"));
        await StopAsync(run, "retain farewell", "disconnect");
    }

    [Fact]
    public async Task BrokenLink_IsConnectedAgain_AndTheSameBytesAreSentAgain()
    {
        Enqueue("1", "2");
        int answers = 0;
        _link.PublishAnswer = message => Text(message) == "2" && answers++ == 0 ? _broken : LinkResult.Done;
        Task run = _publisher.RunAsync(_stop.Token);

        await _link.ExpectAsync("connect", "publish 1", "publish 2");
        Assert.Equal(TimeSpan.FromMilliseconds(750), await _time.NextWaitAsync());
        _time.Advance(TimeSpan.FromMilliseconds(750));
        await _link.ExpectAsync("connect", "publish 2");

        await _time.NextWaitAsync();
        Assert.Equal(0, _journal.CountPending());
        await StopAsync(run, "retain farewell", "disconnect");
    }

    [Fact]
    public async Task RefusedConnections_AreSpacedOut_UpToAMinute_AndTheReasonIsTold()
    {
        double[] expected = [0.75, 1.5, 3, 6, 12, 24, 45, 45, 45];
        for (int i = 0; i < expected.Length; i++)
        {
            _link.ConnectAnswers.Enqueue(_refused);
        }

        Task run = _publisher.RunAsync(_stop.Token);
        foreach (double seconds in expected)
        {
            await _link.ExpectAsync("connect");
            Assert.Equal(TimeSpan.FromSeconds(seconds), await _time.NextWaitAsync());
            Assert.False(_publisher.IsConnected);
            _time.Advance(TimeSpan.FromSeconds(seconds));
        }

        await _link.ExpectAsync("connect");
        Assert.Contains(_log.Lines, line => line.Contains("not authorised") && line.Contains("next try in 45.0 s"));
        await _time.NextWaitAsync();
        await StopAsync(run, "retain farewell", "disconnect");
    }

    [Fact]
    public async Task GoodAnswer_StartsTheWaitsFromTheBeginning()
    {
        _link.ConnectAnswers.Enqueue(_broken);
        _link.ConnectAnswers.Enqueue(_broken);
        Enqueue("1");
        Task run = _publisher.RunAsync(_stop.Token);
        await _link.ExpectAsync("connect");
        _time.Advance(await _time.NextWaitAsync());
        await _link.ExpectAsync("connect");
        _time.Advance(await _time.NextWaitAsync());
        await _link.ExpectAsync("connect", "publish 1");
        await _time.NextWaitAsync();

        _link.Lose();
        Assert.Equal(TimeSpan.FromMilliseconds(750), await _time.NextWaitAsync());
        await StopAsync(run);
    }

    [Fact]
    public async Task SilentLink_IsAskedForASignOfLife_AndReplacedWhenThereIsNone()
    {
        Task run = _publisher.RunAsync(_stop.Token);
        await _link.ExpectAsync("connect");
        Assert.Equal(TimeSpan.FromSeconds(15), await _time.NextWaitAsync());
        _time.Advance(TimeSpan.FromSeconds(15));
        await _link.ExpectAsync("ping");

        _link.PingAnswer = _broken;
        Assert.Equal(TimeSpan.FromSeconds(15), await _time.NextWaitAsync());
        _time.Advance(TimeSpan.FromSeconds(15));
        await _link.ExpectAsync("ping");
        Assert.Equal(TimeSpan.FromMilliseconds(750), await _time.NextWaitAsync());
        _time.Advance(TimeSpan.FromMilliseconds(750));
        await _link.ExpectAsync("connect");

        await _time.NextWaitAsync();
        await StopAsync(run, "retain farewell", "disconnect");
    }

    [Fact]
    public async Task Announcements_AreSentFirst_AtEveryConnection_WithTheirNewestContent()
    {
        _publisher.Announce(new Message("s", "application/json", Bytes("state 1")));
        Enqueue("1");
        Task run = _publisher.RunAsync(_stop.Token);
        await _link.ExpectAsync("connect", "retain state 1", "publish 1");
        await _time.NextWaitAsync();

        _publisher.Announce(new Message("s", "application/json", Bytes("state 2")));
        await _link.ExpectAsync("retain state 2");
        await _time.NextWaitAsync();

        _link.Lose();
        _time.Advance(await _time.NextWaitAsync());
        await _link.ExpectAsync("connect", "retain state 2");
        await _time.NextWaitAsync();
        await StopAsync(run, "retain farewell", "disconnect");
    }

    [Fact]
    public async Task WorkThatComesWhileTheLinkIsIdle_IsSentAtOnce()
    {
        Task run = _publisher.RunAsync(_stop.Token);
        await _link.ExpectAsync("connect");
        await _time.NextWaitAsync();
        Enqueue("1");
        await _link.ExpectAsync("publish 1");
        await _time.NextWaitAsync();
        await StopAsync(run, "retain farewell", "disconnect");
    }

    [Fact]
    public async Task RemovalThatFails_SendsNothingTwice_AndIsMadeUpForLater()
    {
        using SqliteConnection other = new(new SqliteConnectionStringBuilder { DataSource = _folder.File("journal.db"), Pooling = false }.ConnectionString);
        other.Open();
        Execute(other, "CREATE TRIGGER stuck BEFORE DELETE ON outbox BEGIN SELECT RAISE(ABORT, 'stuck'); END");
        Enqueue("1", "2");
        int sent = 0;
        _link.PublishAnswer = _ => sent++ < 10 ? LinkResult.Done : throw new InvalidOperationException("it sends the same again and again");
        Task run = _publisher.RunAsync(_stop.Token);
        await _link.ExpectAsync("connect", "publish 1", "publish 2");
        await _time.NextWaitAsync();
        Assert.Equal(2, _journal.CountPending());
        Assert.Contains(_log.Lines, line => line.Contains(" 2103 "));

        Execute(other, "DROP TRIGGER stuck");
        Enqueue("3");
        await _link.ExpectAsync("publish 3");
        await _time.NextWaitAsync();
        Assert.Equal(0, _journal.CountPending());
        await StopAsync(run, "retain farewell", "disconnect");
    }

    [Fact]
    public async Task Stop_DeliversWhatWaits_BeforeTheFarewell()
    {
        Task run = _publisher.RunAsync(_stop.Token);
        await _link.ExpectAsync("connect");
        await _time.NextWaitAsync();
        _journal.Commit(work => work.Enqueue(Message("late"))); // and nobody wakes the loop

        await StopAsync(run, "publish late", "retain farewell", "disconnect");
        Assert.Equal(0, _journal.CountPending());
    }

    [Fact]
    public async Task Stop_WhileTheBrokerIsAway_EndsAtOnce_AndKeepsTheOutbox()
    {
        Enqueue("1");
        _link.ConnectAnswers.Enqueue(_broken);
        Task run = _publisher.RunAsync(_stop.Token);
        await _link.ExpectAsync("connect");
        await _time.NextWaitAsync();
        await StopAsync(run);
        Assert.Equal(1, _journal.CountPending());
    }

    [Theory]
    [InlineData(1, 0.0, 1.0)]
    [InlineData(1, 1.0, 0.5)]
    [InlineData(3, 0.0, 4.0)]
    [InlineData(7, 0.0, 60.0)]
    [InlineData(int.MaxValue, 0.0, 60.0)]
    public void Backoff_DoublesToItsCap_AndIsShortenedByUpToHalf(int failures, double random, double seconds)
    {
        Assert.Equal(TimeSpan.FromSeconds(seconds), Backoff.Default.After(failures, new FixedRandom(random)));
    }

    private static void Execute(SqliteConnection connection, string sql)
    {
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        command.ExecuteNonQuery();
    }

    private async Task StopAsync(Task run, params string[] calls)
    {
        await _stop.CancelAsync();
        await run.WaitAsync(Deadline.Generous);
        await _link.ExpectAsync(calls);
    }

    private void Enqueue(params string[] texts)
    {
        foreach (string text in texts)
        {
            _journal.Commit(work => work.Enqueue(Message(text)));
        }

        _publisher.Wake();
    }

    private static Message Message(string text)
    {
        return new Message("t", "application/json", Bytes(text));
    }

    private static byte[] Bytes(string text)
    {
        return Encoding.UTF8.GetBytes(text);
    }

    private static string Text(Message message)
    {
        return Encoding.UTF8.GetString(message.Payload.Span);
    }

    private sealed class FixedRandom(double value) : Random
    {
        public override double NextDouble()
        {
            return value;
        }
    }
}
