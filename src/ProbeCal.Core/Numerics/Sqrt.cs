namespace ProbeCal;

public static partial class Numerics
{
    // 1/√m ≈ G0 + G1·m + … + G4·m⁴ for 1 <= m < 4: minimax in the relative error, which is below 0.00212.
    private const double G0 = 1.7490151871542847;
    private const double G1 = -1.1230733599845302;
    private const double G2 = 0.4580523675975511;
    private const double G3 = -0.09354243886075723;
    private const double G4 = 0.007430528578394575;

    private const double UlpOfOne = 2.220446049250313E-16;

    /// <summary>Square root of <paramref name="x"/>, correctly rounded.</summary>
    /// <param name="x">Any double; the root exists for zero and positive ones.</param>
    /// <returns>√x; −0 for −0; +∞ for +∞; NaN for NaN and for every negative number.</returns>
    /// <remarks>
    /// <para>Range: all doubles from zero up, subnormals included. Correctly rounded (to nearest, error at most 0.5 ulp), as IEEE 754
    /// asks of a square-root instruction: the two agree bit for bit.</para>
    /// <para>Method: x = m·4^e with 1 &lt;= m &lt; 4; Newton's iteration for 1/√m from a polynomial; one Newton step for the root from a
    /// value of 26 bits, whose square is exact; this is within 1.1 units u = 2^-52 of √m. Then the residual m − s² is computed
    /// exactly (Dekker 1971). Since s² and s·u are multiples of u², s is the nearest double exactly when
    /// −s·u &lt; m − s² &lt;= s·u; otherwise its neighbour on that side is.</para>
    /// </remarks>
    public static double Sqrt(double x)
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
            return x == 0.0 ? x : double.NaN;
        }

        long half = 0L;
        if (x < SmallestNormal)
        {
            x *= TwoTo54;
            half = -27L;
        }

        long bits = System.BitConverter.DoubleToInt64Bits(x);
        long evenHalf = ((bits >> FractionBits) - ExponentBias) >> 1;
        double m = System.BitConverter.Int64BitsToDouble(bits - (evenHalf << (FractionBits + 1)));
        half += evenHalf;

        // 1/√m: relative error 0.00212, then 6.8E-6, then 7E-11 (an error e becomes 1.5·e²).
        double m2 = m * m;
        double g = (G0 + (G1 * m)) + (m2 * ((G2 + (G3 * m)) + (m2 * G4)));
        double halfM = 0.5 * m;
        g *= 1.5 - ((halfM * g) * g);
        g *= 1.5 - ((halfM * g) * g);

        double start = ((m * g) + RoundTo25Bits) - RoundTo25Bits;
        double s = start + ((m - (start * start)) * (0.5 * g));

        double high = (s + RoundTo25Bits) - RoundTo25Bits;
        double low = s - high;
        double residual = ((m - (high * high)) - (2.0 * high * low)) - (low * low);
        double limit = s * UlpOfOne;
        if (limit < residual)
        {
            s += UlpOfOne;
        }
        else if (residual <= -limit)
        {
            s -= UlpOfOne;
        }

        return s * System.BitConverter.Int64BitsToDouble((half + ExponentBias) << FractionBits);
    }
}
