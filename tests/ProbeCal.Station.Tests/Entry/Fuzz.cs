using System;

namespace ProbeCal.Station.Tests.Entry;

/// <summary>Size of the random campaigns on text and bytes: a tenth in ordinary runs, all of it with PROBECAL_FULL=1. A failure prints its seed.</summary>
internal static class Fuzz
{
    internal static int Count(int full)
    {
        return Environment.GetEnvironmentVariable("PROBECAL_FULL") == "1" ? full : full / 10;
    }
}
