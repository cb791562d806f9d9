using System;

namespace ProbeCal.Nano.Tests.Campaign;

/// <summary>Random doubles.</summary>
internal static class Numbers
{
    /// <summary>Any bit pattern now and then, else a number of some everyday size, of either sign.</summary>
    public static double Wide(Random random)
    {
        if (random.Next(8) == 0)
        {
            return BitConverter.Int64BitsToDouble(random.NextInt64(long.MinValue, long.MaxValue));
        }
        double scale = random.Next(6) switch
        {
            0 => 1.0,
            1 => 100.0,
            2 => 2000.0,
            3 => 1e5,
            4 => 1e-3,
            _ => 1e12,
        };
        return ((random.NextDouble() * 2.0) - 1.0) * scale;
    }

    public static double Between(Random random, double lowest, double highest)
    {
        return lowest + (random.NextDouble() * (highest - lowest));
    }
}
