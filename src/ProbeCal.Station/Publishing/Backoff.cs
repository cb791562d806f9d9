using System;

namespace ProbeCal.Station.Publishing;

/// <summary>
/// How long to wait before the next try: doubling from <see cref="First"/> to <see cref="Longest"/>, each shortened by up to a
/// half at random, so that stations which lost the same broker do not all come back in the same second.
/// </summary>
/// <param name="First">The wait after the first failure, before shortening.</param>
/// <param name="Longest">No wait is longer.</param>
internal sealed record Backoff(TimeSpan First, TimeSpan Longest)
{
    /// <summary>One second to one minute. Our choice, no source.</summary>
    public static Backoff Default { get; } = new(TimeSpan.FromSeconds(1), TimeSpan.FromMinutes(1));

    /// <summary>The wait after <paramref name="failures"/> failures in a row, from 1 on.</summary>
    public TimeSpan After(int failures, Random random)
    {
        // Beyond 30 doublings the cap has long been reached and a larger exponent would overflow.
        double doublings = 1L << Math.Clamp(failures - 1, 0, 30);
        double milliseconds = Math.Min(First.TotalMilliseconds * doublings, Longest.TotalMilliseconds);
        return TimeSpan.FromMilliseconds(milliseconds * (1 - (0.5 * random.NextDouble())));
    }
}
