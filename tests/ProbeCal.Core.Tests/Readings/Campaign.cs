using System;
using System.Globalization;
using Xunit.Abstractions;

namespace ProbeCal.Tests;

/// <summary>Seed and size of the random campaigns: a stated fraction in ordinary runs, all of it with PROBECAL_FULL=1.</summary>
internal static class Campaign
{
    internal static int Seed { get; } = int.TryParse(
        Environment.GetEnvironmentVariable("PROBECAL_SEED"), NumberStyles.Integer, CultureInfo.InvariantCulture, out int seed) ? seed : 20261201;

    internal static bool IsFull { get; } = Environment.GetEnvironmentVariable("PROBECAL_FULL") == "1";

    internal static Random Random(int salt)
    {
        return new Random(unchecked((Seed * 397) ^ salt));
    }

    internal static void Print(ITestOutputHelper output, int trials)
    {
        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"seed {Seed}, {trials} trials (PROBECAL_SEED, PROBECAL_FULL)"));
    }

    internal static double Gaussian(Random random)
    {
        // 1 − NextDouble keeps the logarithm away from zero.
        return Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
    }

    internal static double Rectangular(Random random)
    {
        return Math.Sqrt(3.0) * ((2.0 * random.NextDouble()) - 1.0);
    }
}
