using System;
using System.Collections.Concurrent;
using System.Threading;
using System.Threading.Tasks;
using Microsoft.Extensions.Time.Testing;

namespace ProbeCal.Station.Tests.Sources;

/// <summary>
/// A clock that moves only while somebody waits on it. A clock that is simply moved on runs away from the code under test on
/// a busy machine, and what took 20 s of it seems to have taken many minutes.
/// </summary>
internal sealed class PacedTime(DateTimeOffset start) : FakeTimeProvider(start)
{
    private readonly ConcurrentQueue<CountedTimer> _ticked = new();
    private int _waiting;

    /// <summary>Somebody waits for the next event: periodic timers that have ticked count again.</summary>
    internal void BeginWait()
    {
        while (_ticked.TryDequeue(out CountedTimer? timer))
        {
            timer.Arm(TimeSpan.Zero);
        }
    }

    /// <summary>Moves on by a step when a wait is open; otherwise lets the others run.</summary>
    internal async ValueTask StepAsync(TimeSpan step)
    {
        if (0 < Volatile.Read(ref _waiting))
        {
            Advance(step);
        }

        await Task.Yield();
    }

    public override ITimer CreateTimer(TimerCallback callback, object? state, TimeSpan dueTime, TimeSpan period)
    {
        CountedTimer timer = new(this);
        timer.Arm(dueTime);
        timer.Inner = base.CreateTimer(
            _ =>
            {
                timer.Disarm();
                if (period != Timeout.InfiniteTimeSpan)
                {
                    _ticked.Enqueue(timer);
                }

                callback(state);
            },
            null,
            dueTime,
            period);
        return timer;
    }

    /// <summary>A timer that is counted from when it is set until it has fired or is given up.</summary>
    private sealed class CountedTimer(PacedTime clock) : ITimer
    {
        private int _armed;

        internal ITimer? Inner { get; set; }

        internal void Arm(TimeSpan dueTime)
        {
            if (dueTime != Timeout.InfiniteTimeSpan && Interlocked.Exchange(ref _armed, 1) == 0)
            {
                Interlocked.Increment(ref clock._waiting);
            }
        }

        internal void Disarm()
        {
            if (Interlocked.Exchange(ref _armed, 0) == 1)
            {
                Interlocked.Decrement(ref clock._waiting);
            }
        }

        public bool Change(TimeSpan dueTime, TimeSpan period)
        {
            Disarm();
            Arm(dueTime);
            return Inner!.Change(dueTime, period);
        }

        public void Dispose()
        {
            Disarm();
            Inner!.Dispose();
        }

        public ValueTask DisposeAsync()
        {
            Dispose();
            return ValueTask.CompletedTask;
        }
    }
}
