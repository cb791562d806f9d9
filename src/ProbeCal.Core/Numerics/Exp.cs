namespace ProbeCal;

public static partial class Numerics
{
    // e^r = 1 + r + r²·(E2 + E3·r + … + E12·r^10) for |r| <= ln 2 / 2: minimax in the relative error of e^r,
    // each coefficient rounded to a double; with the rounded ones the relative error is below 2^-60.2.
    private const double E2 = 0.5;
    private const double E3 = 0.16666666666666682;
    private const double E4 = 0.041666666666666095;
    private const double E5 = 0.008333333333317046;
    private const double E6 = 0.0013888888889115464;
    private const double E7 = 0.0001984126989635413;
    private const double E8 = 2.4801586926837716E-05;
    private const double E9 = 2.755723489218603E-06;
    private const double E10 = 2.755758175235418E-07;
    private const double E11 = 2.5112026091291138E-08;
    private const double E12 = 2.0826636417075237E-09;

    // Outside these the result is 0 or infinite whatever the rounding: e^-746 < 2^-1075 and e^710 > 2^1024.
    private const double ExpAlwaysZeroBelow = -746.0;
    private const double ExpAlwaysInfiniteAbove = 710.0;

    // The bits of 708: from −708 to 708 the scale 2^k is a normal number and one multiplication puts it on exactly. One comparison of the
    // bits without the sign also keeps out NaN and the infinities.
    private const long ExpOneStepBits = 0x4086200000000000L;

    /// <summary>e to the power <paramref name="x"/>.</summary>
    /// <param name="x">Any double.</param>
    /// <returns>
    /// e^x; 1 for ±0; 0 for −∞ and where e^x is below half the smallest subnormal; +∞ for +∞ and above the largest double
    /// (x &gt; 709.782712893384); NaN for NaN.
    /// </returns>
    /// <remarks>
    /// <para>Range: all doubles. Error below 1 ulp: by the derivation at most 0.77 ulp where the result is normal, at most
    /// 0.9 ulp where it is subnormal (there the scaling rounds a second time).</para>
    /// <para>Method: x = k·ln 2 + r with k the nearest integer (argument reduction with ln 2 in two parts: W. J. Cody and
    /// W. Waite, Software Manual for the Elementary Functions, Prentice-Hall 1980, chapter 6), a polynomial for e^r, and
    /// 2^k put on through the exponent bits. 1 + r is kept as a rounded sum and its exact rest, so that one rounding
    /// of full size remains.</para>
    /// </remarks>
    public static double Exp(double x)
    {
        return ExpOfSum(x, 0.0);
    }

    // e^(x + tail) for |tail| no larger than an ulp of x: Pow needs an argument of more than 53 bits.
    // Bound for the result before scaling, in units of 2^-53 with the result at its smallest, √½: last rounding 0.5; the
    // polynomial term r²·P <= 0.054 with four roundings 0.19; the sum of small terms 0.06; the approximation 0.01.
    private static double ExpOfSum(double x, double tail)
    {
        long magnitude = System.BitConverter.DoubleToInt64Bits(x) & long.MaxValue;
        if (ExpOneStepBits < magnitude)
        {
            if (x - x != 0.0) // NaN or infinite, and the one form that reads the same on the device
            {
                if (double.IsNaN(x))
                {
                    return double.NaN;
                }

                return 0.0 < x ? x : 0.0;
            }

            if (x < ExpAlwaysZeroBelow)
            {
                return 0.0;
            }

            if (ExpAlwaysInfiniteAbove < x)
            {
                return double.PositiveInfinity;
            }
        }

        double shifted = (x * OneOverLn2) + RoundToInteger;
        double k = shifted - RoundToInteger;

        // x − k·Ln2High is exact: both are multiples of an ulp small enough for a difference below 1/2.
        double high = x - (k * Ln2High);
        double low = (k * Ln2Low) - tail;
        double r = high - low;
        double rest = (high - r) - low;

        double r2 = r * r;
        double r4 = r2 * r2;
        double r8 = r4 * r4;
        double p = (((E2 + (E3 * r)) + (r2 * (E4 + (E5 * r))))
            + (r4 * ((E6 + (E7 * r)) + (r2 * (E8 + (E9 * r))))))
            + (r8 * ((E10 + (E11 * r)) + (r2 * E12)));

        double sum = 1.0 + r;
        double sumRest = r - (sum - 1.0);
        double y = sum + ((r2 * p) + (sumRest + (rest * sum)));

        // The integer k stands in the low bits of the sum that rounded to it.
        long exponent = System.BitConverter.DoubleToInt64Bits(shifted) - RoundToIntegerBits;
        if (magnitude <= ExpOneStepBits)
        {
            return y * System.BitConverter.Int64BitsToDouble((exponent + ExponentBias) << FractionBits);
        }

        // Two factors, each normal: the first product is exact, the second rounds once, to a subnormal or to infinity.
        long half = exponent >> 1;
        y *= System.BitConverter.Int64BitsToDouble((half + ExponentBias) << FractionBits);
        return y * System.BitConverter.Int64BitsToDouble((exponent - half + ExponentBias) << FractionBits);
    }
}
