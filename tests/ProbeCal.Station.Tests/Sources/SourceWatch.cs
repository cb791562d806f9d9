using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Sources;
using Xunit.Sdk;

namespace ProbeCal.Station.Tests.Sources;

/// <summary>Reads a source event by event; a fake clock is moved on for as long as nothing comes, a real deadline ends the wait.</summary>
internal sealed class SourceWatch : IAsyncDisposable
{
    private static readonly TimeSpan Deadline = TimeSpan.FromSeconds(30);

    private readonly PacedTime? _time;
    private readonly CancellationTokenSource _stop = new();
    private readonly IAsyncEnumerator<SourceEvent> _events;

    internal SourceWatch(ISampleSource source, PacedTime? time = null)
    {
        _time = time;
        _events = source.ReadAsync(_stop.Token).GetAsyncEnumerator();
    }

    internal List<SourceEvent> Seen { get; } = [];

    internal void Stop()
    {
        _stop.Cancel();
    }

    /// <summary>The next event; null when the source has ended.</summary>
    internal async Task<SourceEvent?> NextAsync()
    {
        _time?.BeginWait();
        Task<bool> next = _events.MoveNextAsync().AsTask();
        if (_time is null)
        {
            await next.WaitAsync(Deadline);
        }
        else
        {
            Stopwatch passed = Stopwatch.StartNew();
            while (!next.IsCompleted)
            {
                if (Deadline < passed.Elapsed)
                {
                    throw new XunitException("no event came; seen so far:\n" + string.Join('\n', Seen));
                }

                await _time.StepAsync(TimeSpan.FromMilliseconds(250));
            }
        }

        if (!await next)
        {
            return null;
        }

        Seen.Add(_events.Current);
        return _events.Current;
    }

    internal async Task<SourceStateChanged> StateAsync(SourceState state)
    {
        while (await NextAsync() is SourceEvent seen)
        {
            if (seen is SourceStateChanged changed && changed.State == state)
            {
                return changed;
            }
        }

        throw new XunitException($"{state} did not come; seen:\n" + string.Join('\n', Seen));
    }

    internal async Task<RawSample> SampleAsync()
    {
        while (await NextAsync() is SourceEvent seen)
        {
            if (seen is RawSample sample)
            {
                return sample;
            }
        }

        throw new XunitException("no sample came; seen:\n" + string.Join('\n', Seen));
    }

    internal async Task ToEndAsync()
    {
        while (await NextAsync() is not null)
        {
        }
    }

    public async ValueTask DisposeAsync()
    {
        await _stop.CancelAsync();
        await _events.DisposeAsync().AsTask().WaitAsync(Deadline);
        _stop.Dispose();
    }
}

/// <summary>A channel that a test feeds: bytes, an end, a fault, silence, disappearance, a close that hangs.</summary>
internal sealed class FedChannel : IByteChannel
{
    private readonly System.Threading.Channels.Channel<Func<byte[]>> _feed = System.Threading.Channels.Channel.CreateUnbounded<Func<byte[]>>();

    public bool IsPresent { get; set; } = true;

    internal TaskCompletionSource? HangingClose { get; init; }

    internal bool IsClosed { get; private set; }

    internal FedChannel Give(string text)
    {
        byte[] bytes = System.Text.Encoding.UTF8.GetBytes(text);
        _feed.Writer.TryWrite(() => bytes);
        return this;
    }

    internal FedChannel Break(Exception fault)
    {
        _feed.Writer.TryWrite(() => throw fault);
        return this;
    }

    public async ValueTask<int> ReadAsync(Memory<byte> buffer, CancellationToken cancellationToken)
    {
        byte[] bytes = (await _feed.Reader.ReadAsync(cancellationToken))();
        bytes.CopyTo(buffer);
        return bytes.Length;
    }

    public async ValueTask DisposeAsync()
    {
        if (HangingClose is not null)
        {
            await HangingClose.Task;
        }

        IsClosed = true;
    }
}

/// <summary>Opens what a test has prepared, one after the other, and notes when.</summary>
internal sealed class FedOpener(TimeProvider time, params object[] results) : IByteChannelOpener
{
    private int _next;

    public string Description => "fed";

    public bool EndsForGood { get; init; }

    public bool MayStartInTheMiddle { get; init; }

    public TimeSpan? Silence { get; init; } = TimeSpan.FromSeconds(60);

    internal List<DateTimeOffset> Attempts { get; } = [];

    public Task<IByteChannel> OpenAsync(CancellationToken cancellationToken)
    {
        Attempts.Add(time.GetUtcNow());
        object result = results[Math.Min(_next++, results.Length - 1)];
        return result is IByteChannel channel ? Task.FromResult(channel) : throw new ChannelException((string)result);
    }
}
