using System;
using System.Threading;
using System.Threading.Tasks;

namespace ProbeCal.Station.Sources;

/// <summary>Lets recorded samples go when their time has come, counted from the first one and sped up by a factor.</summary>
internal sealed class ReplayPace(double faster)
{
    private DateTimeOffset? _firstRecorded;
    private long _firstReleased;

    internal async ValueTask WaitForAsync(DateTimeOffset recorded, TimeProvider time, CancellationToken cancellationToken)
    {
        if (_firstRecorded is not DateTimeOffset first)
        {
            _firstRecorded = recorded;
            _firstReleased = time.GetTimestamp();
            return;
        }

        TimeSpan due = (recorded - first) / faster - time.GetElapsedTime(_firstReleased);
        if (TimeSpan.Zero < due)
        {
            await Task.Delay(due, time, cancellationToken).ConfigureAwait(false);
        }
    }
}
