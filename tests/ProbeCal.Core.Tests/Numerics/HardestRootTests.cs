using System;
using Xunit;

namespace ProbeCal.Core.Tests;

/// <summary>
/// Numbers whose root lies as near to the middle between two doubles as any can. The middles are N·2^j with N odd of 54 bits; a
/// radicand m·2^54 = N² − d or m·2^55 = N² − d with a small d has its root d/(2N) away from N. Since N² is 1 modulo 8, d = 1 + 8·i,
/// and each such d has four roots N modulo a power of two, which are found bit by bit.
/// </summary>
public class HardestRootTests
{
    private const int Reach = 1000;

    [Fact]
    public void RootsNextToTheMiddleAreCorrectlyRounded()
    {
        int tried = 0;
        for (int i = -Reach; i <= Reach; i++)
        {
            long d = 1L + (8L * i);
            tried += Try(d, 54) + Try(d, 55);
        }

        // Without candidates the loop would prove nothing.
        Assert.True(tried > 2 * Reach, $"only {tried} radicands were found");
    }

    private static int Try(long d, int bits)
    {
        ulong modulus = 1UL << bits;
        ulong root = RootModulo(d, bits);
        ulong half = modulus >> 1;
        int tried = 0;
        foreach (ulong candidate in new[] { root, modulus - root, (root + half) % modulus, (modulus - root + half) % modulus })
        {
            if (candidate < 1UL << 53 || candidate >= 1UL << 54)
            {
                continue;
            }

            UInt128 square = (UInt128)candidate * candidate;
            bool upper = square >> 107 != 0;
            if (upper != (bits == 55))
            {
                continue;
            }

            UInt128 radicand = d < 0 ? square + (UInt128)(-d) : square - (UInt128)d;
            Assert.Equal(UInt128.Zero, radicand & (((UInt128)1 << bits) - 1));
            double x = (double)(ulong)(radicand >> bits) * (upper ? 2.0 : 1.0);
            if (!Oracle.IsNearestRoot(Numerics.Sqrt(x), x))
            {
                Assert.Fail(FormattableString.Invariant($"the root of {x:R} is not the nearest double"));
            }

            tried++;
        }

        return tried;
    }

    private static ulong RootModulo(long d, int bits)
    {
        ulong want = unchecked((ulong)d);
        ulong root = 1;
        for (int k = 3; k < bits; k++)
        {
            if (((unchecked(root * root) - want) & ((1UL << (k + 1)) - 1)) != 0)
            {
                root += 1UL << (k - 1);
            }
        }

        return root & ((1UL << bits) - 1);
    }
}
