using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Runtime.CompilerServices;
using System.Text;
using System.Threading;
using System.Threading.Tasks;
using Microsoft.Data.Sqlite;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Engine;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Journal;
using ProbeCal.Station.Publishing;
using ProbeCal.Station.Storage;
using ProbeCal.Station.Tests.Publishing;
using ProbeCal.Station.Tests.Storage;
using Xunit;

namespace ProbeCal.Station.Tests.Engine;

/// <summary>The loop with a real journal on disk, a scripted source and no broker.</summary>
public sealed class StationEngineTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();
    private readonly WatchedTime _time = new();
    private readonly ScriptedSource _source = new();
    private readonly KeptLog _log = new();
    private readonly CancellationTokenSource _stop = new();
    private readonly List<string> _committed = [];
    private readonly TaskCompletionSource _firstCommit = new(TaskCreationOptions.RunContinuationsAsynchronously);
    private readonly StationJournal _journal;
    private readonly StationConfiguration _configuration = StationParts.Configuration(("gapAfter", "\"1 min\""));

    public StationEngineTests()
    {
        _journal = StationJournal.Open(_folder.File("journal.db"), _time);
    }

    public void Dispose()
    {
        _journal.Dispose();
        _folder.Dispose();
        _stop.Dispose();
    }

    [Fact]
    public async Task EveryEvent_IsJournaled_SamplesWithTheirMessage_InOrder()
    {
        _source.Deliver(
            new SourceStateChanged(StationParts.Time, SourceState.Open, "opened"),
            StationParts.Sample,
            new RejectedLine(StationParts.Time, "###", "too few fields"),
            StationParts.Sample with { TemperatureCelsius = null },
            new SourceStateChanged(StationParts.Time, SourceState.Lost, "the port was pulled out"));
        _source.End();

        StationEngine engine = Engine();
        await engine.RunAsync(_stop.Token).WaitAsync(Deadline.Generous);

        Assert.Equal((2L, 1L), (engine.Samples, engine.Rejected));
        Assert.Equal("1|1|,2|0|temperature is missing", Column("SELECT sequence || '|' || (reading IS NOT NULL) || '|' || coalesce(no_reading_reason, '') FROM sample ORDER BY id"));
        Assert.Equal("###|too few fields", Column("SELECT raw_text || '|' || reason FROM rejected_line"));
        Assert.Equal("source-open|opened,source-lost|the port was pulled out", Column("SELECT kind || '|' || text FROM event ORDER BY id"));
        Assert.Equal(["event", "reading", "reading", "event"], _journal.Pending(0, 10).Select(row => row.Message.Topic.Split('/')[^1]));
        Assert.Equal(_journal.Pending(0, 10).Where(row => row.Message.Topic.EndsWith("reading", StringComparison.Ordinal)).Select(Text), _committed);
    }

    [Fact]
    public async Task RawText_IsKeptExactly_WhateverStandsInIt()
    {
        string odd = "\u00b5 \"quoted\" '; DROP TABLE sample; -- \u4e2d\t\u0001 \0 end";
        _source.Deliver(new RawSample(StationParts.Time, odd, 100) { TemperatureCelsius = 18, PressureHectopascal = 940, Salinity = 0 });
        _source.End();
        await Engine().RunAsync(_stop.Token).WaitAsync(Deadline.Generous);
        Assert.Equal(odd, Column("SELECT raw_text FROM sample"));
    }

    [Fact]
    public async Task Gap_IsAnEvent_AlsoAcrossARestart()
    {
        _source.Deliver(StationParts.Sample, At(30), At(120));
        _source.End();
        await Engine(lastSample: StationParts.Time.AddHours(-1)).RunAsync(_stop.Token).WaitAsync(Deadline.Generous);
        Assert.Equal(
            "no sample from 2026-06-02T11:00:00.000000Z to 2026-06-02T12:00:00.000000Z, 3600.0 s,no sample from 2026-06-02T12:00:30.000000Z to 2026-06-02T12:02:00.000000Z, 90.0 s",
            Column("SELECT text FROM event WHERE kind = 'gap' ORDER BY id"));
    }

    [Fact]
    public async Task FullDisk_StopsNothingButTheJournal_AndWhatWaitedIsWrittenWhenThereIsRoom()
    {
        StationEngine engine = Engine();
        Task run = engine.RunAsync(_stop.Token);
        _journal.CapPages(20);
        string big = new('x', 200_000);
        _source.Deliver(new RawSample(StationParts.Time, big, 100));
        Assert.Equal(TimeSpan.FromSeconds(5), await _time.NextWaitAsync());
        _source.Deliver(StationParts.Sample);
        Assert.Contains(_log.Lines, line => line.Contains("Error 2204") && line.Contains("no room is left on the disk"));

        _time.Advance(TimeSpan.FromSeconds(5));
        await _time.NextWaitAsync();
        _journal.CapPages(1_000_000);
        _time.Advance(TimeSpan.FromSeconds(5));
        _source.End();
        await run.WaitAsync(Deadline.Generous);

        Assert.Equal("1,2", Column("SELECT sequence FROM sample ORDER BY id"));
        Assert.Equal("journal-resumed", Column("SELECT kind FROM event"));
    }

    [Fact]
    public async Task StopWhileTheDiskIsFull_FailsTheWork_AndSaysHowMuchIsLost()
    {
        _source.Deliver(StationParts.Sample);
        Task run = Engine().RunAsync(_stop.Token);
        await _firstCommit.Task.WaitAsync(Deadline.Generous);
        _journal.CapPages(20);
        _source.Deliver(new RawSample(StationParts.Time, new string('x', 200_000), 100));
        await _time.NextWaitAsync();

        await _stop.CancelAsync();
        WorkFailedException failed = await Assert.ThrowsAsync<WorkFailedException>(() => run.WaitAsync(Deadline.Generous));

        Assert.Contains("the last 1 lines and events could not be journaled", failed.Message);
        Assert.Equal("1", Column("SELECT sequence FROM sample"));
    }

    [Fact]
    public async Task Stop_JournalsWhatHadArrived()
    {
        Task run = Engine().RunAsync(_stop.Token);
        _source.Deliver(StationParts.Sample, At(1), At(2));
        await _stop.CancelAsync();
        await run.WaitAsync(Deadline.Generous);

        // What the source had not handed over yet may stay with it; nothing in between is lost.
        string[] journaled = Column("SELECT sequence FROM sample ORDER BY id").Split(',', StringSplitOptions.RemoveEmptyEntries);
        Assert.Equal(Enumerable.Range(1, journaled.Length).Select(n => n.ToString(CultureInfo.InvariantCulture)), journaled);
        Assert.Equal(journaled.Length, _committed.Count);
    }

    [Fact]
    public async Task StopAfterTheLastSample_JournalsEverythingThatWasHandedOver()
    {
        StationEngine engine = Engine(source: new StoppingSource(_stop, StationParts.Sample, At(1), At(2)));
        await engine.RunAsync(_stop.Token).WaitAsync(Deadline.Generous);

        Assert.Equal("1,2,3", Column("SELECT sequence FROM sample ORDER BY id"));
        Assert.Equal(3, _committed.Count);
    }

    [Fact]
    public async Task SourceThatFails_EndsTheRun_AfterWhatCameBeforeWasJournaled()
    {
        _source.Deliver(StationParts.Sample);
        _source.End(new WorkFailedException("the file went away"));
        WorkFailedException failed = await Assert.ThrowsAsync<WorkFailedException>(() => Engine().RunAsync(_stop.Token).WaitAsync(Deadline.Generous));
        Assert.Equal("the file went away", failed.Message);
        Assert.Equal("1", Column("SELECT sequence FROM sample"));
    }

    [Fact]
    public async Task ManyRejectedLines_AreAllCounted_AndLoggedAtTheirPowersOfTwo()
    {
        for (int i = 0; i < 100; i++)
        {
            _source.Deliver(new RejectedLine(StationParts.Time, "#", "no number"));
        }

        _source.End();
        await Engine().RunAsync(_stop.Token).WaitAsync(Deadline.Generous);
        Assert.Equal("100", Column("SELECT count(*) FROM rejected_line"));
        Assert.Equal(7, _log.Lines.Count(line => line.Contains(" 2203 ")));
    }

    [Fact]
    public async Task OldSamples_AreDeleted_WhileNewOnesCome()
    {
        _source.Deliver(StationParts.Sample);
        _source.End();
        await Engine().RunAsync(_stop.Token).WaitAsync(Deadline.Generous);
        Assert.Equal(1, _journal.CountPending());

        ScriptedSource later = new();
        later.Deliver(new RawSample(_time.GetUtcNow(), "new", 1));
        later.End();
        await Engine(source: later, keepFor: TimeSpan.FromDays(30)).RunAsync(_stop.Token).WaitAsync(Deadline.Generous);

        Assert.Equal("new", Column("SELECT raw_text FROM sample"));
        Assert.Equal(2, _journal.CountPending());
    }

    private static RawSample At(double seconds)
    {
        return StationParts.Sample with { TimeUtc = StationParts.Time.AddSeconds(seconds) };
    }

    private static string Text(OutboxRow row)
    {
        return Encoding.UTF8.GetString(row.Message.Payload.Span);
    }

    private StationEngine Engine(DateTimeOffset? lastSample = null, ISampleSource? source = null, TimeSpan? keepFor = null)
    {
        LoadedCalibration calibration = StationParts.Calibration();
        StationMessages messages = new(_configuration, calibration, "probecal 9.9.9", "scripted");
        PublisherOptions options = new() { Farewell = () => messages.Stopped(_time.GetUtcNow()) };
        Publisher publisher = new(_journal, new ScriptedLink(), options, _time, new Random(1), _log);
        return new StationEngine(
            source ?? _source,
            _journal,
            publisher,
            new ReadingMaker(_configuration, calibration, "probecal 9.9.9"),
            messages,
            new StationIdentity("tarn", "do-1"),
            new GapWatch(_configuration.GapAfter, lastSample),
            new Retention(_journal, keepFor ?? TimeSpan.FromDays(10_000), _time, _log),
            _time,
            _log)
        {
            Committed = payload =>
            {
                _committed.Add(Encoding.UTF8.GetString(payload.Span));
                _firstCommit.TrySetResult();
            },
        };
    }

    private string Column(string sql)
    {
        using SqliteFile file = SqliteFile.OpenForReading(_folder.File("journal.db"), JournalFormat.Format);
        using SqliteCommand command = file.Connection.CreateCommand();
        command.CommandText = sql;
        using SqliteDataReader reader = command.ExecuteReader();
        List<string> values = [];
        while (reader.Read())
        {
            values.Add(Convert.ToString(reader.GetValue(0), CultureInfo.InvariantCulture)!);
        }

        return string.Join(',', values);
    }

    /// <summary>Hands everything over in one go and is stopped then.</summary>
    private sealed class StoppingSource(CancellationTokenSource stop, params SourceEvent[] events) : ISampleSource
    {
        public string Description => "stopping";

        public async IAsyncEnumerable<SourceEvent> ReadAsync([EnumeratorCancellation] CancellationToken cancellationToken)
        {
            foreach (SourceEvent each in events)
            {
                yield return each;
            }

            await stop.CancelAsync();
            cancellationToken.ThrowIfCancellationRequested();
        }

        public ValueTask DisposeAsync()
        {
            return ValueTask.CompletedTask;
        }
    }
}
