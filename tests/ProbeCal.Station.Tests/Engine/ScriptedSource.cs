using System;
using System.Collections.Generic;
using System.Runtime.CompilerServices;
using System.Threading;
using System.Threading.Channels;
using System.Threading.Tasks;

namespace ProbeCal.Station.Tests.Engine;

/// <summary>A source that delivers what a test puts into it.</summary>
public sealed class ScriptedSource : ISampleSource
{
    private readonly Channel<SourceEvent> _events = Channel.CreateUnbounded<SourceEvent>();

    public string Description => "scripted";

    public void Deliver(params SourceEvent[] events)
    {
        foreach (SourceEvent each in events)
        {
            _events.Writer.TryWrite(each);
        }
    }

    public void End(Exception? fault = null)
    {
        _events.Writer.Complete(fault);
    }

    public async IAsyncEnumerable<SourceEvent> ReadAsync([EnumeratorCancellation] CancellationToken cancellationToken)
    {
        await foreach (SourceEvent each in _events.Reader.ReadAllAsync(cancellationToken))
        {
            yield return each;
        }
    }

    public ValueTask DisposeAsync()
    {
        return ValueTask.CompletedTask;
    }
}
