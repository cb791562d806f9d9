using System;
using System.Collections.Generic;
using System.IO;
using System.Threading;
using System.Threading.Tasks;
using Microsoft.Extensions.Logging;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Journal;
using ProbeCal.Station.Publishing;
using ProbeCal.Station.Sources;

namespace ProbeCal.Station.Engine;

/// <summary>What a station needs of its host.</summary>
public sealed record StationSurroundings
{
    /// <summary>The clock.</summary>
    public required TimeProvider Time { get; init; }

    /// <summary>Spreads waits.</summary>
    public required Random Random { get; init; }

    /// <summary>The log.</summary>
    public required ILoggerFactory Logs { get; init; }

    /// <summary>Program and version, as readings carry it.</summary>
    public required string Software { get; init; }

    /// <summary>Looks up a variable of the environment, for the broker's password.</summary>
    public required Func<string, string?> Environment { get; init; }

    /// <summary>Standard input, for a source that reads it.</summary>
    public TextReader? StandardInput { get; init; }

    /// <summary>Called with the JSON of each reading once it is on the disk.</summary>
    public Action<ReadOnlyMemory<byte>> Reading { get; init; } = static _ => { };
}

/// <summary>A station from start to stop: opens what the configuration names, runs it, and closes it in order.</summary>
public static class StationRun
{
    /// <summary>Runs until the source ends, the time is up or <paramref name="stop"/>. What arrived is journaled; what could not be sent is kept.</summary>
    /// <param name="configuration">What the station is told.</param>
    /// <param name="data">The folder it keeps things in, held open for writing.</param>
    /// <param name="around">What it needs of its host.</param>
    /// <param name="duration">How long to read the source; null for as long as it goes.</param>
    /// <param name="stop">Ends it in order.</param>
    /// <exception cref="InputException">Configuration, calibration or a file does not fit. Nothing was changed.</exception>
    /// <exception cref="WorkFailedException">The journal or the embedded broker could not be opened, or the journal not be written to the end.</exception>
    public static async Task RunAsync(StationConfiguration configuration, DataDirectory data, StationSurroundings around, TimeSpan? duration, CancellationToken stop)
    {
        ILogger log = around.Logs.CreateLogger("station");
        LoadedCalibration? calibration = LoadedCalibration.Find(data.CalibrationLogFile, configuration, around.Time.GetUtcNow());
        ReadingMaker maker = new(configuration, calibration, around.Software);
        ISampleSource source = SourceFactory.Create(configuration.Source, configuration.Line, around.Time, around.Logs.CreateLogger("source"), around.StandardInput);
        await using (source.ConfigureAwait(false))
        {
            using StationJournal journal = StationJournal.Open(data.JournalFile, around.Time, configuration.RejectedLinesKept);
            EmbeddedBroker? embedded = configuration.Broker == null ? await EmbeddedBroker.StartAsync(configuration.EmbeddedBrokerPort).ConfigureAwait(false) : null;
            try
            {
                StationMessages messages = new(configuration, calibration, around.Software, source.Description);
                MqttLink link = new(Settings(configuration, messages, around));
                await using (link.ConfigureAwait(false))
                {
                    PublisherOptions options = new() { Farewell = () => messages.Stopped(around.Time.GetUtcNow()) };
                    Publisher publisher = new(journal, link, options, around.Time, around.Random, around.Logs.CreateLogger("publisher"));
                    StationEngine engine = new(
                        source,
                        journal,
                        publisher,
                        maker,
                        messages,
                        new StationIdentity(configuration.Station, configuration.Probe),
                        new GapWatch(configuration.GapAfter, LastSample(journal, configuration)),
                        new Retention(journal, configuration.KeepFor, around.Time, log),
                        around.Time,
                        log)
                    {
                        Committed = around.Reading,
                    };
                    EngineLog.Started(log, configuration.Station, configuration.Probe, source.Description, calibration?.Record.Id ?? "none", journal.Path);
                    if (configuration.Broker is { ExposesPassword: true } exposed)
                    {
                        EngineLog.Unencrypted(log, exposed.Host);
                    }

                    publisher.Announce(messages.Calibration());
                    using CancellationTokenSource timeUp = new(duration ?? Timeout.InfiniteTimeSpan, around.Time);
                    using CancellationTokenSource either = CancellationTokenSource.CreateLinkedTokenSource(timeUp.Token, stop);
                    await RunAsync(engine, publisher, Beginning(journal, configuration, around.Time), either.Token).ConfigureAwait(false);
                    EngineLog.Stopped(log, engine.Samples, engine.Rejected, journal.CountPending());
                }
            }
            catch (JournalException fault)
            {
                throw new WorkFailedException(fault.Message, fault);
            }
            finally
            {
                if (embedded != null)
                {
                    await embedded.DisposeAsync().ConfigureAwait(false);
                }
            }
        }
    }

    /// <summary>Runs engine and publisher side by side; the publisher stops last, so that it can deliver what came at the end.</summary>
    private static async Task RunAsync(StationEngine engine, Publisher publisher, IReadOnlyList<JournalEvent> beginning, CancellationToken stop)
    {
        using CancellationTokenSource stopEngine = CancellationTokenSource.CreateLinkedTokenSource(stop);
        using CancellationTokenSource stopPublisher = new();
        foreach (JournalEvent happened in beginning)
        {
            engine.Tell(happened);
        }

        Task publishing = publisher.RunAsync(stopPublisher.Token);
        Task working = engine.RunAsync(stopEngine.Token);
        await Task.WhenAny(publishing, working).ConfigureAwait(false);

        // Either the work is done, or a fault nobody foresaw has ended the publisher: then the station ends with it.
        await stopEngine.CancelAsync().ConfigureAwait(false);
        await working.ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
        await stopPublisher.CancelAsync().ConfigureAwait(false);
        await publishing.ConfigureAwait(false);
        await working.ConfigureAwait(false);
    }

    private static List<JournalEvent> Beginning(StationJournal journal, StationConfiguration configuration, TimeProvider time)
    {
        DateTimeOffset now = time.GetUtcNow();
        List<JournalEvent> beginning = [];
        if (journal.SetAsidePath is { } aside)
        {
            beginning.Add(new JournalEvent(now, "journal-set-aside", "the journal was damaged; it is kept as " + Path.GetFileName(aside) + " and a new one was begun"));
        }

        if (journal.BackupPath is { } backup)
        {
            beginning.Add(new JournalEvent(now, "journal-migrated", "the journal was of an older version; a copy is kept as " + Path.GetFileName(backup)));
        }

        beginning.Add(new JournalEvent(now, "started", "station " + configuration.Station + " started"));
        return beginning;
    }

    private static DateTimeOffset? LastSample(StationJournal journal, StationConfiguration configuration)
    {
        return configuration.GapAfter == null ? null : journal.LastSampleTime(configuration.Station, configuration.Probe);
    }

    /// <summary>How the broker is entered, and what it says when the station goes without a word.</summary>
    internal static BrokerSettings Settings(StationConfiguration configuration, StationMessages messages, StationSurroundings around)
    {
        BrokerSettings common = new()
        {
            Host = "127.0.0.1",
            Port = configuration.EmbeddedBrokerPort,
            ClientId = "probecal-" + configuration.Station + "-" + configuration.Probe,
            Will = messages.Lost(),
        };
        if (configuration.Broker is not { } broker)
        {
            return common;
        }

        PasswordSource? password = broker switch
        {
            { PasswordVariable: { } variable } => PasswordSource.FromEnvironment(variable, around.Environment),
            { PasswordFile: { } file } => PasswordSource.FromFile(file),
            _ => null,
        };
        return common with
        {
            Host = broker.Host,
            Port = broker.Port,
            UseTls = broker.UseTls,
            AuthorityFile = broker.AuthorityFile,
            CheckRevocation = broker.CheckRevocation,
            User = broker.User,
            Password = password,
        };
    }
}
