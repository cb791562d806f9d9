using System;

namespace ProbeCal.Station.Sources;

/// <summary>Waits between attempts: 1, 2, 4, 8, 16 and then 30 s, from the start again once something has come in.</summary>
internal sealed class Backoff
{
    private const double LongestSeconds = 30;

    private double _seconds = 1;

    internal TimeSpan Next()
    {
        TimeSpan wait = TimeSpan.FromSeconds(_seconds);
        _seconds = Math.Min(LongestSeconds, _seconds * 2);
        return wait;
    }

    internal void Reset()
    {
        _seconds = 1;
    }
}
