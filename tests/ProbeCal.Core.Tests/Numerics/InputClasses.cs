using System;

namespace ProbeCal.Core.Tests;

/// <summary>Inputs for the measurements of error: each class aims at another weak point of an algorithm.</summary>
internal static class InputClasses
{
    internal static double Uniform(Random random, double from, double to)
    {
        return from + ((to - from) * random.NextDouble());
    }

    /// <summary>A positive finite double, every exponent equally likely, subnormals too.</summary>
    internal static double AnyPositive(Random random)
    {
        return BitConverter.Int64BitsToDouble(random.NextInt64(1L, 0x7FF0000000000000L));
    }

    /// <summary>Both signs, magnitude from 2^low to 2^high, every magnitude equally likely.</summary>
    internal static double Magnitude(Random random, double low, double high)
    {
        double size = Math.Pow(2.0, Uniform(random, low, high));
        return random.Next(2) == 0 ? size : -size;
    }

    /// <summary>Up to <paramref name="reach"/> doubles to either side.</summary>
    internal static double Near(Random random, double x, int reach)
    {
        return BitConverter.Int64BitsToDouble(BitConverter.DoubleToInt64Bits(x) + random.Next(-reach, reach + 1));
    }

    /// <summary>A multiple of ln 2 / 2 (where exp changes its k, and where its reduced argument is smallest), and its neighbours.</summary>
    internal static double NearHalfLn2(Random random)
    {
        int multiple = random.Next(-2140, 2048);
        return Near(random, (multiple == 0 ? 1 : multiple) * 0.34657359027997264, 40);
    }

    /// <summary>√½ times a power of two (where ln changes its k), and its neighbours.</summary>
    internal static double NearRootHalf(Random random)
    {
        return Near(random, 0.70710678118654757 * Math.Pow(2.0, random.Next(-1000, 1000)), 40);
    }

    /// <summary>1 + t for t from 2^-52 to 2^-1, both signs.</summary>
    internal static double NearOne(Random random)
    {
        return 1.0 + Magnitude(random, -53.0, -1.1);
    }

    /// <summary>A square of 53 bits rounded to a double, or a number whose root lies next to the middle between two doubles.</summary>
    internal static double HardRoot(Random random)
    {
        double root = Uniform(random, 1.0, 2.0);
        double middle = random.Next(2) == 0 ? 0.0 : Math.Pow(2.0, -53.0);
        double square = (root * root) + (2.0 * root * middle);
        return Near(random, square, 1);
    }
}
