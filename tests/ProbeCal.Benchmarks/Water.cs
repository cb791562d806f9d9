using System;

namespace ProbeCal.Benchmarks;

/// <summary>Random water and air inside the ranges of both oxygen equations.</summary>
internal sealed class Water
{
    /// <summary>The same every time: a measurement is repeated on the same numbers.</summary>
    internal const int Seed = 19920637;

    internal Water(int count)
    {
        Random random = new(Seed);
        Celsius = Draw(random, count, 0.0, 40.0);
        Salinity = Draw(random, count, 0.0, 40.0);
        PressureHectopascal = Draw(random, count, 510.0, 1110.0);
        Values = new double[count];
        Statuses = new Status[count];
    }

    internal double[] Celsius { get; }

    internal double[] Salinity { get; }

    internal double[] PressureHectopascal { get; }

    internal double[] Values { get; }

    internal Status[] Statuses { get; }

    private static double[] Draw(Random random, int count, double low, double high)
    {
        double[] values = new double[count];
        for (int i = 0; i < count; i++) { values[i] = low + ((high - low) * random.NextDouble()); }
        return values;
    }
}
