using System;
using System.Numerics;

namespace ProbeCal.Core.Tests;

/// <summary>A number as significand · 2^exponent, without rounding.</summary>
internal readonly record struct BigFloat(BigInteger Significand, int Exponent);

/// <summary>
/// Exponential, logarithm, power and square root to more than 200 bits, in integer arithmetic on fixed-point numbers with
/// <see cref="Bits"/> fraction bits. It shares nothing with the functions under test: other series, other reduction,
/// no floating point except a starting value that the computation itself corrects.
/// </summary>
internal static class Oracle
{
    internal const int Bits = 256;
    private const int TableBits = 8;
    private const int TableHalf = 96; // ln 2 / 2 · 2^8 is 88.7

    internal static readonly BigInteger One = BigInteger.One << Bits;
    internal static readonly BigInteger Ln2 = LnOfTwo();
    private static readonly BigInteger[] ExpTable = MakeExpTable();

    /// <summary>A double as fixed point; bits below 2^-256 fall away.</summary>
    internal static BigInteger ToFixed(double x)
    {
        Take(x, out long significand, out int exponent);
        return Shift(significand, exponent + Bits);
    }

    /// <summary>e to a fixed-point power.</summary>
    internal static BigFloat Exp(BigInteger x)
    {
        BigInteger k = FloorDivide((x << 1) + Ln2, Ln2 << 1);
        BigInteger r = x - (k * Ln2);
        int j = (int)((r + (One >> (TableBits + 1))) >> (Bits - TableBits));
        r -= (BigInteger)j << (Bits - TableBits);

        // |r| <= 2^-9: the term of degree 26 is below 2^-320.
        BigInteger sum = One;
        for (int n = 26; n > 0; n--)
        {
            sum = One + ((sum * r) >> Bits) / n;
        }

        return new BigFloat((sum * ExpTable[j + TableHalf]) >> Bits, (int)k - Bits);
    }

    /// <summary>Natural logarithm of a positive double, in fixed point.</summary>
    internal static BigInteger Ln(double x)
    {
        // x = e^y0 · (1 + d), and ln(1 + d) from its series: a wrong start would show as a large d.
        double y0 = Math.Log(x);
        BigInteger start = ToFixed(y0);
        BigFloat inverse = Exp(-start);
        Take(x, out long significand, out int exponent);
        BigInteger d = Shift(significand * inverse.Significand, exponent + inverse.Exponent + Bits) - One;
        if (BigInteger.Abs(d) > (One >> 40))
        {
            throw new InvalidOperationException($"The starting value {y0:R} is not the logarithm of {x:R}.");
        }

        BigInteger power = d;
        BigInteger sum = d;
        for (int n = 2; n <= 7; n++)
        {
            power = -((power * d) >> Bits);
            sum += power / n;
        }

        return start + sum;
    }

    /// <summary>x to the power y for positive finite x and finite y with a result that is not absurdly large.</summary>
    internal static BigFloat Pow(double x, double y)
    {
        Take(y, out long significand, out int exponent);
        return Exp(Shift(significand * Ln(x), exponent));
    }

    /// <summary>Square root of an integer, rounded down, by Newton's iteration.</summary>
    internal static BigInteger SqrtFloor(BigInteger n)
    {
        BigInteger root = BigInteger.One << (int)((n.GetBitLength() + 1) / 2);
        while (true)
        {
            BigInteger next = (root + (n / root)) >> 1;
            if (next >= root)
            {
                return root;
            }

            root = next;
        }
    }

    /// <summary>
    /// How far <paramref name="actual"/> is from <paramref name="exact"/>, in units of the last place of the double binade that
    /// holds the exact value (2^-1074 below the normal range). An infinite result counts as 2^1024, and as right when the
    /// exact value is not smaller.
    /// </summary>
    internal static double ErrorInUlp(double actual, BigFloat exact)
    {
        const int GuardBits = 60;
        if (double.IsNaN(actual))
        {
            return double.PositiveInfinity;
        }

        int top = exact.Exponent + (int)BigInteger.Abs(exact.Significand).GetBitLength() - 1;
        if (top >= 1024 && double.IsInfinity(actual) && (actual > 0) == (exact.Significand.Sign > 0))
        {
            return 0.0;
        }

        int unit = Math.Max(Math.Min(top, 1023) - 52, -1074);
        BigInteger want = Shift(exact.Significand, exact.Exponent - unit + GuardBits);
        BigInteger have;
        if (double.IsInfinity(actual))
        {
            have = (actual > 0 ? BigInteger.One : BigInteger.MinusOne) << (1024 - unit + GuardBits);
        }
        else
        {
            Take(actual, out long significand, out int exponent);
            have = Shift(significand, exponent - unit + GuardBits);
        }

        return (double)(have - want) / (1L << GuardBits);
    }

    /// <summary>Whether a finite positive root is the double nearest to √x: an exact comparison of squares.</summary>
    internal static bool IsNearestRoot(double root, double x)
    {
        Take(root, out long s, out int rootExponent);
        Take(x, out long m, out int exponent);

        // (2s − 1)² < 4·m·2^(exponent − 2·rootExponent) < (2s + 1)²; equality cannot happen, since an odd square is odd.
        BigInteger radicand = Shift(m, exponent - (2 * rootExponent) + 2, out bool exact);
        BigInteger above = ((BigInteger)2 * s) + 1;
        BigInteger below = ((BigInteger)2 * s) - 1;
        return exact && below * below < radicand && radicand < above * above;
    }

    /// <summary>The first decimals of a fixed-point number, cut off and not rounded.</summary>
    internal static string Digits(BigFloat value, int decimals)
    {
        BigInteger scaled = Shift(value.Significand * BigInteger.Pow(10, decimals), value.Exponent);
        string text = scaled.ToString(System.Globalization.CultureInfo.InvariantCulture).PadLeft(decimals + 1, '0');
        return text[..^decimals] + "." + text[^decimals..];
    }

    /// <summary>A finite double as integer · 2^exponent.</summary>
    internal static void Take(double x, out long significand, out int exponent)
    {
        long bits = BitConverter.DoubleToInt64Bits(x);
        int field = (int)((bits >> 52) & 0x7FF);
        if (field == 0x7FF)
        {
            throw new ArgumentOutOfRangeException(nameof(x), x, "Only finite numbers have a significand.");
        }

        significand = bits & 0xFFFFFFFFFFFFFL;
        exponent = field == 0 ? -1074 : field - 1075;
        if (field != 0)
        {
            significand |= 1L << 52;
        }

        if (bits < 0)
        {
            significand = -significand;
        }
    }

    internal static BigInteger Shift(BigInteger value, int left)
    {
        return left >= 0 ? value << left : value >> -left;
    }

    private static BigInteger Shift(BigInteger value, int left, out bool exact)
    {
        BigInteger shifted = Shift(value, left);
        exact = left >= 0 || shifted << -left == value;
        return shifted;
    }

    private static BigInteger FloorDivide(BigInteger dividend, BigInteger divisor)
    {
        BigInteger quotient = BigInteger.DivRem(dividend, divisor, out BigInteger remainder);
        return remainder.Sign < 0 ? quotient - 1 : quotient;
    }

    // ln 2 = 2·(1/3 + 1/(3·3³) + 1/(5·3⁵) + …), with 64 further bits against rounding.
    private static BigInteger LnOfTwo()
    {
        BigInteger power = (BigInteger.One << (Bits + 65)) / 3;
        BigInteger sum = power;
        for (int n = 3; power.Sign > 0; n += 2)
        {
            power /= 9;
            sum += power / n;
        }

        return sum >> 64;
    }

    // e^(j/256), each from its own series.
    private static BigInteger[] MakeExpTable()
    {
        BigInteger[] table = new BigInteger[(2 * TableHalf) + 1];
        for (int j = -TableHalf; j <= TableHalf; j++)
        {
            BigInteger x = (BigInteger)j << (Bits + 64 - TableBits);
            BigInteger term = One << 64;
            BigInteger sum = term;
            for (int n = 1; n < 80; n++)
            {
                term = ((term * x) >> (Bits + 64)) / n;
                sum += term;
            }

            table[j + TableHalf] = sum >> 64;
        }

        return table;
    }
}
