using System;
using System.Globalization;

namespace ProbeCal.Nano.Tests.Campaign;

/// <summary>The seed of everything random here: fixed, unless PROBECAL_SEED gives another.</summary>
internal static class Seed
{
    public static int Value { get; } =
        int.TryParse(Environment.GetEnvironmentVariable("PROBECAL_SEED"), NumberStyles.Integer, CultureInfo.InvariantCulture, out int seed) ? seed : 20261201;
}
