using System;
using System.Threading;
using System.Threading.Channels;
using System.Threading.Tasks;
using Microsoft.Extensions.Time.Testing;

namespace ProbeCal.Station.Tests.Publishing;

/// <summary>A clock that stands still until it is moved, and tells when somebody begins to wait on it and for how long.</summary>
public sealed class WatchedTime : FakeTimeProvider
{
    private readonly Channel<TimeSpan> _waits = Channel.CreateUnbounded<TimeSpan>();

    public WatchedTime()
        : base(new DateTimeOffset(2026, 12, 1, 8, 0, 0, TimeSpan.Zero))
    {
    }

    /// <summary>The next wait that was begun.</summary>
    public async Task<TimeSpan> NextWaitAsync()
    {
        return await _waits.Reader.ReadAsync().AsTask().WaitAsync(Deadline.Generous);
    }

    public override ITimer CreateTimer(TimerCallback callback, object? state, TimeSpan dueTime, TimeSpan period)
    {
        ITimer timer = base.CreateTimer(callback, state, dueTime, period);
        if (dueTime != Timeout.InfiniteTimeSpan)
        {
            _waits.Writer.TryWrite(dueTime);
        }

        return timer;
    }
}

/// <summary>How long a test waits for something that should come at once.</summary>
public static class Deadline
{
    public static readonly TimeSpan Generous = TimeSpan.FromSeconds(20);
}
