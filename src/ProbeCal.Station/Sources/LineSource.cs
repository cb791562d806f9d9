using System;
using System.Collections.Generic;
using System.Runtime.CompilerServices;
using System.Threading;
using System.Threading.Channels;
using System.Threading.Tasks;
using Microsoft.Extensions.Logging;

namespace ProbeCal.Station.Sources;

/// <summary>
/// Lines from a channel as events: opens it, reads it, notices silence and loss, and opens it again. Every fault is a
/// <see cref="SourceStateChanged"/>; only an end that cannot be mended, or a first opening that must succeed, throws.
/// </summary>
/// <remarks>
/// Reading goes on in a task of its own, so that bytes are taken and stamped while the consumer still writes the last
/// sample to disk. Nothing is ever written to the channel, and a lost one is closed aside, for closing may hang.
/// </remarks>
internal sealed partial class LineSource : ISampleSource
{
    /// <summary>Events that may wait for the consumer.</summary>
    private const int Waiting = 4096;

    private readonly IByteChannelOpener _opener;
    private readonly LineTemplate _template;
    private readonly TimeProvider _time;
    private readonly ILogger _logger;
    private readonly bool _mustOpen;
    private readonly ReplayPace? _pace;

    internal LineSource(IByteChannelOpener opener, LineTemplate template, TimeProvider time, ILogger logger, bool mustOpen, ReplayPace? pace = null)
    {
        _opener = opener;
        _template = template;
        _time = time;
        _logger = logger;
        _mustOpen = mustOpen;
        _pace = pace;
    }

    public string Description => _opener.Description;

    public async IAsyncEnumerable<SourceEvent> ReadAsync([EnumeratorCancellation] CancellationToken cancellationToken)
    {
        using CancellationTokenSource stop = CancellationTokenSource.CreateLinkedTokenSource(cancellationToken);
        Channel<SourceEvent> events = Channel.CreateBounded<SourceEvent>(new BoundedChannelOptions(Waiting) { SingleReader = true, SingleWriter = true });
        Task pump = Task.Run(() => PumpAsync(events.Writer, stop.Token), CancellationToken.None);
        try
        {
            // What has been received is delivered even when the stop has come.
            await foreach (SourceEvent received in events.Reader.ReadAllAsync(CancellationToken.None).ConfigureAwait(false))
            {
                yield return received;
            }
        }
        finally
        {
            await stop.CancelAsync().ConfigureAwait(false);
            await pump.ConfigureAwait(false);
        }
    }

    public ValueTask DisposeAsync()
    {
        return ValueTask.CompletedTask;
    }

    private async Task PumpAsync(ChannelWriter<SourceEvent> events, CancellationToken stop)
    {
        Exception? fault = null;
        try
        {
            await new Run(this, events, stop).Async().ConfigureAwait(false);
        }
        catch (Exception caught)
        {
            // Handed to the consumer, who sees it where it reads. Whatever breaks while stopping is the stop.
            fault = stop.IsCancellationRequested ? null : caught;
            _logger.LogDebug(SourceEventIds.Stopped, caught, "{Source}: stopped", Description);
        }

        events.TryComplete(fault);
    }
}
