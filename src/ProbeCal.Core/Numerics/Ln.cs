namespace ProbeCal;

public static partial class Numerics
{
    // With s = f/(2 + f) and z = s²: ln(1 + f) = ln((1 + s)/(1 − s)) = 2s + s·R(z), R = z·(L1 + L2·z + … + L7·z^6)
    // for √½ <= 1 + f < √2 (z <= 0.02944): minimax in the error relative to 2s, rounded coefficients: below 2^-58.9.
    private const double L1 = 0.6666666666666734;
    private const double L2 = 0.39999999999414676;
    private const double L3 = 0.2857142874238823;
    private const double L4 = 0.22222198573109306;
    private const double L5 = 0.18183564330590946;
    private const double L6 = 0.15314050424994485;
    private const double L7 = 0.1479595108893595;

    // The bits of √½ rounded to a double: x's bits less these, shifted, give the k that puts x/2^k into [√½, √2).
    private const long SqrtHalfBits = 0x3FE6A09E667F3BCDL;

    /// <summary>Natural logarithm of <paramref name="x"/>.</summary>
    /// <param name="x">Any double; the logarithm exists for positive ones.</param>
    /// <returns>ln x; +0 for 1; −∞ for ±0; +∞ for +∞; NaN for NaN and for every negative number.</returns>
    /// <remarks>
    /// <para>Range: all positive doubles, subnormals included. Error below 1 ulp: by the derivation at most 0.83 ulp.</para>
    /// <para>Method: x = 2^k·(1 + f), k·ln 2 with ln 2 in two parts, and for ln(1 + f) the series of the inverse hyperbolic
    /// tangent (M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions, 4.1.27) as a polynomial in s². From
    /// 2s = f − f²/2 + s·f²/2 the two leading terms need no division and are summed with their exact rests,
    /// so that the rounding of s touches only terms of third order.</para>
    /// </remarks>
    public static double Ln(double x)
    {
        long bits = System.BitConverter.DoubleToInt64Bits(x);
        long exponent = (bits - SqrtHalfBits) >> FractionBits;
        double f = x - 1.0;
        if (exponent != 0L)
        {
            if (x - x != 0.0) // NaN or infinite
            {
                if (double.IsNaN(x))
                {
                    return double.NaN;
                }

                return 0.0 < x ? x : double.NaN;
            }

            if (x <= 0.0)
            {
                return x == 0.0 ? double.NegativeInfinity : double.NaN;
            }

            long shift = 0L;
            if (x < SmallestNormal)
            {
                bits = System.BitConverter.DoubleToInt64Bits(x * TwoTo54);
                exponent = (bits - SqrtHalfBits) >> FractionBits;
                shift = 54L;
            }

            f = System.BitConverter.Int64BitsToDouble(bits - (exponent << FractionBits)) - 1.0;
            exponent -= shift;
        }

        double s = f / (2.0 + f);
        double z = s * s;
        double z2 = z * z;
        double z4 = z2 * z2;
        double series = z * (((L1 + (L2 * z)) + (z2 * (L3 + (L4 * z)))) + (z4 * ((L5 + (L6 * z)) + (z2 * L7))));
        double halfSquare = 0.5 * (f * f);

        // Bound, in units of 2^-54 where the result is just above 1/4 and the terms are largest: last rounding 0.5, halfSquare
        // 0.13, rounding of s 0.07, of z and the series 0.05, of the small terms' product and sum 0.06, approximation 0.02.
        // Each sum's first operand is the larger one or zero, so that its rest is exact.
        if (exponent == 0L)
        {
            // The sums below with k = 0, whose terms then change no bit: x near 1 is the common case.
            double c = f - halfSquare;
            return c + ((s * (halfSquare + series)) + ((f - c) - halfSquare));
        }

        double k = exponent;
        double whole = k * Ln2High;
        double a = whole + f;
        double aRest = (whole - a) + f;
        double b = a - halfSquare;
        double bRest = (a - b) - halfSquare;
        return b + ((s * (halfSquare + series)) + ((aRest + bRest) + (k * Ln2Low)));
    }
}
