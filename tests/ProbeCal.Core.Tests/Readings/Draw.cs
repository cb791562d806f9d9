using System;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>Random numbers of mean 0 and standard deviation 1.</summary>
internal static class Draw
{
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
