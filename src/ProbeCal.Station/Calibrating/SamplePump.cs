using System;
using System.Collections.Generic;
using System.Threading;
using System.Threading.Tasks;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// Reads a source one event at a time without ever losing the read that is under way: a wait can run into its deadline, and a
/// live source can be read on while a person thinks. One caller at a time.
/// </summary>
internal sealed class SamplePump : IAsyncDisposable
{
    private readonly CancellationTokenSource _stop;
    private readonly IAsyncEnumerator<SourceEvent> _events;
    private Task<bool>? _pending;

    internal SamplePump(ISampleSource source, CancellationToken cancellationToken)
    {
        _stop = CancellationTokenSource.CreateLinkedTokenSource(cancellationToken);
        _events = source.ReadAsync(_stop.Token).GetAsyncEnumerator(_stop.Token);
    }

    /// <summary>The next event; null when the source has ended, or when <paramref name="deadline"/> comes first.</summary>
    internal async ValueTask<SourceEvent?> NextAsync(Task deadline)
    {
        _pending ??= _events.MoveNextAsync().AsTask();
        if (!_pending.IsCompleted)
        {
            await Task.WhenAny(_pending, deadline).ConfigureAwait(false);
            if (!_pending.IsCompleted)
            {
                return null;
            }
        }

        // Taken off first: a read that failed has been told about once and is not waited for again.
        Task<bool> done = _pending;
        _pending = null;
        bool more = await done.ConfigureAwait(false);
        HasEnded = !more;
        return more ? _events.Current : null;
    }

    /// <summary>True once the source has no more.</summary>
    internal bool HasEnded { get; private set; }

    /// <summary>Reads and drops until the task is done: what a live source sends meanwhile belongs to no point.</summary>
    internal async Task DropUntilAsync(Task done)
    {
        while (!done.IsCompleted && !HasEnded)
        {
            await NextAsync(done).ConfigureAwait(false);
        }
    }

    public async ValueTask DisposeAsync()
    {
        await _stop.CancelAsync().ConfigureAwait(false);
        if (_pending != null)
        {
            try
            {
                await _pending.ConfigureAwait(false);
            }
            catch (OperationCanceledException)
            {
                // The read under way was just told to stop.
            }
        }

        await _events.DisposeAsync().ConfigureAwait(false);
        _stop.Dispose();
    }
}
