using System;
using System.Collections.Generic;
using System.Globalization;
using System.Numerics;
using System.Threading;
using System.Threading.Channels;
using System.Threading.Tasks;
using Microsoft.Extensions.Logging;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Journal;
using ProbeCal.Station.Publishing;

namespace ProbeCal.Station.Engine;

/// <summary>
/// The loop: what the source delivers is corrected and journaled together with its message, in one transaction for all that
/// came meanwhile, and the publisher is told. The broker never holds it up; a journal that cannot be written holds up the
/// source, and nothing is thrown away.
/// </summary>
internal sealed class StationEngine
{
    private const int Waiting = 4096;
    private const int Batch = 500;
    private static readonly TimeSpan _retryJournal = TimeSpan.FromSeconds(5);

    private readonly ISampleSource _source;
    private readonly StationJournal _journal;
    private readonly Publisher _publisher;
    private readonly ReadingMaker _maker;
    private readonly StationMessages _messages;
    private readonly StationIdentity _identity;
    private readonly GapWatch _gaps;
    private readonly Retention _retention;
    private readonly TimeProvider _time;
    private readonly ILogger _log;
    private readonly Channel<SourceEvent> _arrived = Channel.CreateBounded<SourceEvent>(new BoundedChannelOptions(Waiting) { SingleReader = true, SingleWriter = true });

    internal StationEngine(
        ISampleSource source,
        StationJournal journal,
        Publisher publisher,
        ReadingMaker maker,
        StationMessages messages,
        StationIdentity identity,
        GapWatch gaps,
        Retention retention,
        TimeProvider time,
        ILogger log)
    {
        _source = source;
        _journal = journal;
        _publisher = publisher;
        _maker = maker;
        _messages = messages;
        _identity = identity;
        _gaps = gaps;
        _retention = retention;
        _time = time;
        _log = log;
    }

    /// <summary>Called with the payload of each reading once it is on the disk.</summary>
    internal Action<ReadOnlyMemory<byte>> Committed { get; init; } = static _ => { };

    internal long Samples { get; private set; }

    internal long Rejected { get; private set; }

    /// <summary>Journals something that happened to the station itself.</summary>
    /// <exception cref="JournalException">It could not be written.</exception>
    internal void Tell(JournalEvent happened)
    {
        EngineLog.Happened(_log, happened.Kind, happened.Text);
        _journal.Commit(work => Write(work, happened));
        _publisher.Wake();
    }

    /// <summary>Runs until the source ends or <paramref name="stop"/>, and everything that had arrived is journaled.</summary>
    /// <exception cref="WorkFailedException">The journal could not be written to the end; says how many lines are lost by it.</exception>
    internal async Task RunAsync(CancellationToken stop)
    {
        using CancellationTokenSource abandon = new();
        Task pump = PumpAsync(stop, abandon.Token);
        try
        {
            await JournalAllAsync(stop).ConfigureAwait(false);
        }
        finally
        {
            await abandon.CancelAsync().ConfigureAwait(false);
            await pump.ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
        }
    }

    private async Task PumpAsync(CancellationToken stop, CancellationToken abandon)
    {
        try
        {
            await foreach (SourceEvent arrived in _source.ReadAsync(stop).ConfigureAwait(false))
            {
                // What has been read is kept even when the stop comes now.
                await _arrived.Writer.WriteAsync(arrived, abandon).ConfigureAwait(false);
            }

            _arrived.Writer.Complete();
        }
        catch (OperationCanceledException) when (stop.IsCancellationRequested || abandon.IsCancellationRequested)
        {
            _arrived.Writer.Complete();
        }
        catch (Exception fault)
        {
            // The reader takes what arrived before and then meets the fault.
            _arrived.Writer.Complete(fault);
        }
    }

    private async Task JournalAllAsync(CancellationToken stop)
    {
        List<object> batch = [];
        while (await _arrived.Reader.WaitToReadAsync(CancellationToken.None).ConfigureAwait(false))
        {
            batch.Clear();
            while (batch.Count < Batch && _arrived.Reader.TryRead(out SourceEvent? arrived))
            {
                Prepare(batch, arrived);
            }

            JournalEvent? wait = await CommitAsync(batch, stop).ConfigureAwait(false);
            if (wait != null)
            {
                await CommitAsync([wait], stop).ConfigureAwait(false);
            }

            _publisher.Wake();
            _retention.Work();
        }
    }

    /// <summary>Puts what arrived into the batch, with the events that it makes.</summary>
    private void Prepare(List<object> batch, SourceEvent arrived)
    {
        switch (arrived)
        {
            case RawSample sample:
                if (_gaps.Sample(sample.TimeUtc) is { } gap)
                {
                    EngineLog.Happened(_log, gap.Kind, gap.Text);
                    batch.Add(gap);
                }

                batch.Add(sample);
                break;
            case RejectedLine line:
                batch.Add(line);
                break;
            case SourceStateChanged changed:
                _publisher.Announce(_messages.Running(changed));
                batch.Add(new JournalEvent(changed.ReceivedUtc, "source-" + SourceWords.Of(changed.State), changed.Reason));
                break;
        }
    }

    /// <summary>Commits a batch, waiting for as long as the journal cannot be written.</summary>
    /// <returns>The event that tells of the wait, or null when there was none.</returns>
    private async Task<JournalEvent?> CommitAsync(List<object> batch, CancellationToken stop)
    {
        List<ReadOnlyMemory<byte>> readings = [];
        DateTimeOffset? stoppedAt = null;
        while (true)
        {
            try
            {
                readings.Clear();
                _journal.Commit(work =>
                {
                    foreach (object entry in batch)
                    {
                        Write(work, entry, readings);
                    }
                });
                break;
            }
            catch (JournalException fault)
            {
                if (stop.IsCancellationRequested)
                {
                    int lost = batch.Count + _arrived.Reader.Count;
                    throw new WorkFailedException(string.Create(CultureInfo.InvariantCulture, $"{fault.Message}; the last {lost} lines and events could not be journaled, what was journaled before is kept"), fault);
                }

                if (stoppedAt == null)
                {
                    EngineLog.JournalStopped(_log, fault.Message, _retryJournal.TotalSeconds);
                }

                stoppedAt ??= _time.GetUtcNow();
                await Task.Delay(_retryJournal, _time, stop).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
            }
        }

        Count(batch);
        foreach (ReadOnlyMemory<byte> reading in readings)
        {
            Committed(reading);
        }

        return stoppedAt is { } start ? JournalResumed(start) : null;
    }

    private JournalEvent JournalResumed(DateTimeOffset start)
    {
        DateTimeOffset now = _time.GetUtcNow();
        JournalEvent resumed = new(now, "journal-resumed", "the journal could not be written from " + Json.Time(start) + " on; lines that the source could not hold back meanwhile are missing");
        EngineLog.Happened(_log, resumed.Kind, resumed.Text);
        return resumed;
    }

    private void Write(JournalTransaction work, object entry, List<ReadOnlyMemory<byte>> readings)
    {
        switch (entry)
        {
            case RawSample sample:
                MadeReading made = _maker.Make(sample, work.NextSequence(_identity.Station, _identity.Probe));
                work.Add(made.Row);
                work.Enqueue(made.Message);
                readings.Add(made.Message.Payload);
                break;
            case RejectedLine line:
                work.Add(line);
                break;
            case JournalEvent happened:
                Write(work, happened);
                break;
        }
    }

    private void Write(JournalTransaction work, JournalEvent happened)
    {
        work.Add(happened);
        work.Enqueue(_messages.Event(happened));
    }

    private void Count(List<object> batch)
    {
        foreach (object entry in batch)
        {
            if (entry is RawSample)
            {
                Samples++;
            }
            else if (entry is RejectedLine line)
            {
                Rejected++;

                // A wrong template rejects every line: the 1st, 2nd, 4th, 8th ... tell enough.
                if (BitOperations.IsPow2(Rejected))
                {
                    EngineLog.Rejected(_log, Rejected, line.Reason);
                }
            }
        }
    }
}

/// <summary>What a sequence number counts within.</summary>
internal sealed record StationIdentity(string Station, string Probe);
