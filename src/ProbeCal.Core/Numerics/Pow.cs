namespace ProbeCal;

public static partial class Numerics
{
    // With s and z as for the logarithm: ln(1 + f) = 2s·(1 + z·(1/3 + z·(P0 + P1·z + … + P6·z^6))): minimax in the error
    // relative to 2s, rounded coefficients: below 2^-65.9. 1/3 is kept in two parts.
    private const double Third = 0.3333333333333333;
    private const double ThirdRest = 1.850371707708594E-17;
    private const double P0 = 0.20000000000001128;
    private const double P1 = 0.14285714285050022;
    private const double P2 = 0.11111111259914117;
    private const double P3 = 0.09090892188133123;
    private const double P4 = 0.0769337843750366;
    private const double P5 = 0.06628414548967791;
    private const double P6 = 0.06598108636057914;

    /// <summary><paramref name="x"/> to the power <paramref name="y"/>, defined as e^(y·ln x).</summary>
    /// <param name="x">The base, zero or positive.</param>
    /// <param name="y">The exponent, any double.</param>
    /// <returns>
    /// x^y. The special cases are those of <c>powr</c> in IEEE 754-2019, 9.2.1: NaN for a NaN argument, for a negative base,
    /// and for 0^0, ∞^0 and 1^±∞, which e^(y·ln x) leaves undefined; x^±0 is 1 for finite positive x; 0^y is 0 for y &gt; 0 and +∞
    /// for y &lt; 0; infinite arguments otherwise give the limit, 0 or +∞. The sign of a zero base does not matter.
    /// </returns>
    /// <remarks>
    /// <para>Range: all doubles. Error below 2 ulp: by the derivation at most 1.4 ulp where the result is normal.</para>
    /// <para>Method: ln x as a sum of two doubles with a relative error below 2^-63.2, by the same reduction as <see cref="Ln"/>
    /// with the leading terms carried in exact products of short factors (Dekker 1971); the product with y likewise;
    /// then the exponential of that sum. |y·ln x| is below 746 for every finite result, so that the error of the
    /// logarithm reaches the result as 0.63 ulp at most.</para>
    /// </remarks>
    public static double Pow(double x, double y)
    {
        if (double.IsNaN(x) || double.IsNaN(y) || x < 0.0)
        {
            return double.NaN;
        }

        if (x - x != 0.0 || y - y != 0.0 || x == 0.0)
        {
            return PowOfLimit(x, y);
        }

        if (x == 1.0)
        {
            return 1.0;
        }

        double k = 0.0;
        if (x < SmallestNormal)
        {
            x *= TwoTo54;
            k = -54.0;
        }

        long bits = System.BitConverter.DoubleToInt64Bits(x);
        long exponent = (bits - SqrtHalfBits) >> FractionBits;
        double f = System.BitConverter.Int64BitsToDouble(bits - (exponent << FractionBits)) - 1.0;
        k += exponent;

        // s = f/(2 + f) = sHigh + sLow: sHigh has 26 bits, dHigh 27, so that their product is exact, and the remainder
        // of the division is exact too before its last, tiny term.
        double d = 2.0 + f;
        double s = f / d;
        double split = s * Splitter;
        double sHigh = split - (split - s);
        double dHigh = (d + RoundTo25Bits) - RoundTo25Bits;
        double dLow = f - (dHigh - 2.0);
        double sLow = ((f - (sHigh * dHigh)) - (sHigh * dLow)) / d;

        // z = s² = zHigh + zLow, zHigh a multiple of 2^-32 below 2^-5.
        double square = sHigh * sHigh;
        double squareLow = sLow * (s + sHigh);
        double zHigh = ((square + squareLow) + RoundTo32Bits) - RoundTo32Bits;
        double zLow = (square - zHigh) + squareLow;
        double z = zHigh + zLow;

        // t = 1/3 + z·(P0 + …) = tHigh + tLow, tHigh a multiple of 2^-27.
        double z2 = z * z;
        double z4 = z2 * z2;
        double q = z * (((P0 + (P1 * z)) + (z2 * (P2 + (P3 * z)))) + (z4 * ((P4 + (P5 * z)) + (z2 * P6))));
        double t = Third + q;
        double tHigh = (t + RoundTo27Bits) - RoundTo27Bits;
        double tLow = ((Third - tHigh) + q) + ThirdRest;

        // p = z·t = pHigh + pLow, pHigh a multiple of 2^-33 below 2^-6.
        double product = zHigh * tHigh;
        double productLow = (zHigh * tLow) + (zLow * t);
        double pHigh = ((product + productLow) + RoundTo33Bits) - RoundTo33Bits;
        double pLow = (product - pHigh) + productLow;

        // ln x = k·ln 2 + 2s + 2s·p as b + bRest; each sum's first operand is the larger one or zero.
        double whole = k * Ln2High;
        double twoS = 2.0 * sHigh;
        double twoSp = twoS * pHigh;
        double a = whole + twoS;
        double aRest = (whole - a) + twoS;
        double b = a + twoSp;
        double bRest = ((a - b) + twoSp)
            + (aRest + ((k * Ln2Low) + (2.0 * (sLow + ((sHigh * pLow) + (sLow * (pHigh + pLow)))))));

        double estimate = y * b;
        if (estimate < ExpAlwaysZeroBelow)
        {
            return 0.0;
        }

        if (ExpAlwaysInfiniteAbove < estimate)
        {
            return double.PositiveInfinity;
        }

        // y·(b + bRest) with the product of the 26-bit parts exact. x is not 1, so that |ln x| >= 2^-53 and |y| is small enough to split.
        split = y * Splitter;
        double yHigh = split - (split - y);
        split = b * Splitter;
        double lnHigh = split - (split - b);
        double lnLow = (b - lnHigh) + bRest;
        double high = yHigh * lnHigh;
        double low = ((y - yHigh) * lnHigh) + (y * lnLow);
        double sum = high + low;
        return ExpOfSum(sum, (high - sum) + low);
    }

    // x zero or infinite, or y infinite; neither NaN, x not negative.
    private static double PowOfLimit(double x, double y)
    {
        bool baseAtLimit = x == 0.0 || x - x != 0.0;
        if (baseAtLimit ? y == 0.0 : x == 1.0)
        {
            return double.NaN;
        }

        return (1.0 < x) == (0.0 < y) ? double.PositiveInfinity : 0.0;
    }
}
