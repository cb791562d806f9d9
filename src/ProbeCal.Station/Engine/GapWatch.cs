using System;
using System.Globalization;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Journal;

namespace ProbeCal.Station.Engine;

/// <summary>Tells when no sample came for longer than allowed, the time in which the station itself was off included.</summary>
internal sealed class GapWatch
{
    private readonly TimeSpan? _allowed;
    private DateTimeOffset? _last;

    /// <param name="allowed">A longer time is a gap; null tells none.</param>
    /// <param name="last">When the last sample of an earlier run was taken.</param>
    internal GapWatch(TimeSpan? allowed, DateTimeOffset? last)
    {
        _allowed = allowed;
        _last = last;
    }

    /// <summary>The gap that ends with this sample, or null.</summary>
    internal JournalEvent? Sample(DateTimeOffset time)
    {
        DateTimeOffset? before = _last;
        _last = time;
        if (_allowed is not { } allowed || before is not { } start || time - start <= allowed)
        {
            return null;
        }

        string seconds = Number.Fixed((time - start).TotalSeconds, 1);
        return new JournalEvent(time, "gap", string.Create(CultureInfo.InvariantCulture, $"no sample from {Json.Time(start)} to {Json.Time(time)}, {seconds} s"));
    }
}
