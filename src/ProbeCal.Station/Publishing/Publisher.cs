using System;
using System.Collections.Generic;
using System.Threading;
using System.Threading.Tasks;
using Microsoft.Extensions.Logging;
using ProbeCal.Station.Journal;

namespace ProbeCal.Station.Publishing;

/// <summary>
/// Carries the outbox to the broker: connect, announce, drain in order, watch the link, wait and try again. One message is
/// on its way at a time and leaves the outbox only when the broker acknowledged it, so order is kept and each is delivered
/// at least once. Nothing here ever holds up the journal. <see cref="Wake"/>, <see cref="Announce"/> and the properties may
/// be used from any thread; <see cref="RunAsync"/> runs once.
/// </summary>
internal sealed class Publisher
{
    private const int BatchSize = 100;

    private readonly StationJournal _journal;
    private readonly IBrokerLink _link;
    private readonly PublisherOptions _options;
    private readonly TimeProvider _time;
    private readonly Random _random;
    private readonly ILogger _log;
    private readonly Lock _announcing = new();
    private readonly SortedDictionary<string, Message> _announced = new(StringComparer.Ordinal);
    private readonly SortedSet<string> _unsent = new(StringComparer.Ordinal);
    private TaskCompletionSource _work = NewSignal();
    private long _delivered;
    private int _failures;

    /// <summary>Makes one; nothing is connected yet.</summary>
    public Publisher(StationJournal journal, IBrokerLink link, PublisherOptions options, TimeProvider time, Random random, ILogger log)
    {
        _journal = journal;
        _link = link;
        _options = options;
        _time = time;
        _random = random;
        _log = log;
    }

    /// <summary>True while the broker takes what it is given.</summary>
    public bool IsConnected { get; private set; }

    /// <summary>Tells the loop that something was put into the outbox.</summary>
    public void Wake()
    {
        Interlocked.Exchange(ref _work, NewSignal()).TrySetResult();
    }

    /// <summary>Sets the retained message of a topic: sent now, and again at every new connection.</summary>
    public void Announce(Message message)
    {
        lock (_announcing)
        {
            _announced[message.Topic] = message;
            _unsent.Add(message.Topic);
        }

        Wake();
    }

    /// <summary>
    /// Runs until <paramref name="stop"/>, then delivers what waits for as long as <see cref="PublisherOptions.FarewellTime"/>
    /// allows and says goodbye. What could not be delivered stays in the outbox.
    /// </summary>
    public async Task RunAsync(CancellationToken stop)
    {
        using CancellationTokenSource end = new(Timeout.InfiniteTimeSpan, _time);
        using CancellationTokenRegistration asked = stop.Register(() => end.CancelAfter(_options.FarewellTime));
        try
        {
            // Even a run that is over before it began tries once: a short replay is delivered like a long stream.
            do
            {
                LinkResult result = await _link.ConnectAsync(end.Token).ConfigureAwait(false);
                if (result.Outcome == LinkOutcome.Done)
                {
                    IsConnected = true;
                    PublisherLog.Connected(_log, _link.Description);
                    MarkAllUnsent();
                    result = await ServeAsync(stop, end.Token).ConfigureAwait(false);
                    IsConnected = false;
                }

                if (result.Outcome != LinkOutcome.Done)
                {
                    await WaitAfterFailureAsync(result, stop).ConfigureAwait(false);
                }
            }
            while (!stop.IsCancellationRequested);
        }
        catch (OperationCanceledException) when (end.IsCancellationRequested)
        {
            PublisherLog.FarewellCutShort(_log, _link.Description);
        }
        finally
        {
            IsConnected = false;
        }
    }

    private static TaskCompletionSource NewSignal()
    {
        return new TaskCompletionSource(TaskCreationOptions.RunContinuationsAsynchronously);
    }

    /// <summary>Uses one connection until it breaks or the end is asked for. Done means that goodbye was said.</summary>
    private async Task<LinkResult> ServeAsync(CancellationToken stop, CancellationToken end)
    {
        while (true)
        {
            Task work = Volatile.Read(ref _work).Task;
            LinkResult result = await DrainAsync(end).ConfigureAwait(false);
            if (result.Outcome != LinkOutcome.Broken && stop.IsCancellationRequested)
            {
                return await FarewellAsync(result, end).ConfigureAwait(false);
            }

            if (result.Outcome == LinkOutcome.Done)
            {
                result = await IdleAsync(work, stop, end).ConfigureAwait(false);
            }

            if (result.Outcome == LinkOutcome.Refused)
            {
                // The connection stands. The message stays first in the outbox: overtaking it would break the order.
                await WaitAfterFailureAsync(result, stop).ConfigureAwait(false);
                continue;
            }

            if (result.Outcome != LinkOutcome.Done)
            {
                return result;
            }
        }
    }

    private async Task<LinkResult> DrainAsync(CancellationToken end)
    {
        while (true)
        {
            LinkResult announced = await SendAnnouncementsAsync(end).ConfigureAwait(false);
            if (announced.Outcome != LinkOutcome.Done)
            {
                return announced;
            }

            IReadOnlyList<OutboxRow> rows;
            try
            {
                rows = _journal.Pending(_delivered, BatchSize);
            }
            catch (JournalException fault)
            {
                return new LinkResult(LinkOutcome.Refused, "the outbox could not be read: " + fault.Message);
            }

            if (rows.Count == 0)
            {
                return LinkResult.Done;
            }

            LinkResult result = await SendAsync(rows, end).ConfigureAwait(false);
            if (result.Outcome != LinkOutcome.Done)
            {
                return result;
            }
        }
    }

    private async Task<LinkResult> SendAsync(IReadOnlyList<OutboxRow> rows, CancellationToken end)
    {
        long before = _delivered;
        try
        {
            foreach (OutboxRow row in rows)
            {
                LinkResult result = await _link.PublishAsync(row.Message, retain: false, end).ConfigureAwait(false);
                if (result.Outcome != LinkOutcome.Done)
                {
                    return result;
                }

                _delivered = row.Id;
                _failures = 0;
            }

            return LinkResult.Done;
        }
        finally
        {
            if (_delivered != before)
            {
                RemoveDelivered();
            }
        }
    }

    private void RemoveDelivered()
    {
        try
        {
            _journal.Delivered(_delivered);
        }
        catch (JournalException fault)
        {
            // They are not sent again by this run, which remembers how far it came; they go with the next removal.
            PublisherLog.RemovalFailed(_log, fault.Message);
        }
    }

    private async Task<LinkResult> SendAnnouncementsAsync(CancellationToken end)
    {
        while (TakeUnsent() is { } message)
        {
            LinkResult result = await _link.PublishAsync(message, retain: true, end).ConfigureAwait(false);
            if (result.Outcome != LinkOutcome.Done)
            {
                MarkUnsent(message.Topic);
                return result;
            }

            _failures = 0;
        }

        return LinkResult.Done;
    }

    /// <summary>Waits for work, for the loss of the link, or for the time to ask the broker for a sign of life.</summary>
    private async Task<LinkResult> IdleAsync(Task work, CancellationToken stop, CancellationToken end)
    {
        using CancellationTokenSource waiting = CancellationTokenSource.CreateLinkedTokenSource(stop);
        Task due = Task.Delay(_options.PingEvery, _time, waiting.Token);
        Task first = await Task.WhenAny(work, _link.Lost, due).ConfigureAwait(false);
        await waiting.CancelAsync().ConfigureAwait(false);
        if (_link.Lost.IsCompleted)
        {
            return new LinkResult(LinkOutcome.Broken, "the connection was closed");
        }

        return first == due && due.IsCompletedSuccessfully ? await _link.PingAsync(end).ConfigureAwait(false) : LinkResult.Done;
    }

    private async Task<LinkResult> FarewellAsync(LinkResult last, CancellationToken end)
    {
        LinkResult farewell = await _link.PublishAsync(_options.Farewell(), retain: true, end).ConfigureAwait(false);
        foreach (LinkResult result in new[] { last, farewell })
        {
            if (result.Outcome != LinkOutcome.Done)
            {
                PublisherLog.NotDelivered(_log, _link.Description, result.Reason);
            }
        }

        await _link.DisconnectAsync(end).ConfigureAwait(false);
        return LinkResult.Done;
    }

    private async Task WaitAfterFailureAsync(LinkResult result, CancellationToken stop)
    {
        _failures++;
        TimeSpan wait = _options.Backoff.After(_failures, _random);
        PublisherLog.Failed(_log, _link.Description, result.Reason, wait.TotalSeconds);
        await Task.Delay(wait, _time, stop).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
    }

    private void MarkAllUnsent()
    {
        lock (_announcing)
        {
            _unsent.UnionWith(_announced.Keys);
        }
    }

    private void MarkUnsent(string topic)
    {
        lock (_announcing)
        {
            _unsent.Add(topic);
        }
    }

    private Message? TakeUnsent()
    {
        lock (_announcing)
        {
            if (_unsent.Min is not { } topic)
            {
                return null;
            }

            _unsent.Remove(topic);
            return _announced[topic];
        }
    }
}
