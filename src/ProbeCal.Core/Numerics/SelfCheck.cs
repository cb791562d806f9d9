namespace ProbeCal;

public static partial class Numerics
{
    /// <summary>The value of <see cref="Checksum"/> on a runtime that computes as intended.</summary>
    /// <remarks>It changes only when a result of one of the functions changes, and then the release notes say so.</remarks>
    public const long PublishedChecksum = 3856342058131155613L;

    private const int RoundsOfSelfCheck = 128;

    // Knuth's 64-bit linear congruence (MMIX; The Art of Computer Programming 2, 3.3.4, table 1): any fixed sequence that
    // spreads over the inputs would do.
    private const long SequenceFactor = 6364136223846793005L;
    private const long SequenceStep = 1442695040888963407L;
    private const double TwoToMinus53 = 1.1102230246251565E-16;

    // The 64-bit FNV prime (G. Fowler, L. C. Noll, K.-P. Vo; RFC 9923): it only has to spread the bits.
    private const long FoldFactor = 0x100000001B3L;

    /// <summary>Whether this runtime gives the published results, to the last bit, for a fixed set of inputs.</summary>
    /// <returns>True when <see cref="Checksum"/> equals <see cref="PublishedChecksum"/>.</returns>
    /// <remarks>
    /// <para>True means: the elementary functions, and with them everything in Core that is made from them, give here the bits that
    /// the tests have measured. It is evidence from a sample, not a proof.</para>
    /// <para>False means that the runtime departs from IEEE 754 binary64 somewhere: it fuses a product and a sum, computes in a wider
    /// format (x87), flushes subnormals to zero, rounds in another direction, or has a faulty software arithmetic. Results may
    /// then still be close, but neither the error bounds nor the equality of bits between machines hold.</para>
    /// <para>Takes 658 evaluations; meant to be called once, at start.</para>
    /// </remarks>
    public static bool SelfCheck()
    {
        return Checksum() == PublishedChecksum;
    }

    /// <summary>The results of all functions for a fixed set of inputs, their bits folded into 64.</summary>
    /// <returns>The checksum of this runtime; compare it with <see cref="PublishedChecksum"/>.</returns>
    public static long Checksum()
    {
        long sum = FoldOfEdges();
        long state = 1L;
        for (int i = 0; i < RoundsOfSelfCheck; i++)
        {
            state = NextState(state);
            double u = ((state >> 11) & 0x1FFFFFFFFFFFFFL) * TwoToMinus53;
            state = NextState(state);
            double v = ((state >> 11) & 0x1FFFFFFFFFFFFFL) * TwoToMinus53;

            // A positive double of any magnitude: the sign bit cleared, and the top bit of the exponent so that none is infinite.
            double wide = System.BitConverter.Int64BitsToDouble(state & 0x3FFFFFFFFFFFFFFFL);

            sum = Fold(sum, Exp((u * 1455.0) - 745.5));
            sum = Fold(sum, Ln(wide));
            sum = Fold(sum, Ln(0.5 + v));
            sum = Fold(sum, Sqrt(wide));
            sum = Fold(sum, Pow(0.01 + (4.0 * u), (300.0 * v) - 150.0));
        }

        return sum;
    }

    private static long FoldOfEdges()
    {
        long sum = 0L;
        sum = Fold(sum, Exp(double.NaN));
        sum = Fold(sum, Exp(double.NegativeInfinity));
        sum = Fold(sum, Exp(-0.0));
        sum = Fold(sum, Exp(-745.0));
        sum = Fold(sum, Exp(709.78271289338397));
        sum = Fold(sum, Exp(709.78271289338409));
        sum = Fold(sum, Ln(0.0));
        sum = Fold(sum, Ln(-1.0));
        sum = Fold(sum, Ln(double.Epsilon));
        sum = Fold(sum, Ln(double.MaxValue));
        sum = Fold(sum, Ln(double.PositiveInfinity));
        sum = Fold(sum, Sqrt(-0.0));
        sum = Fold(sum, Sqrt(double.Epsilon));
        sum = Fold(sum, Sqrt(double.MaxValue));
        sum = Fold(sum, Pow(double.Epsilon, 0.5));
        sum = Fold(sum, Pow(0.0, -1.0));
        sum = Fold(sum, Pow(0.5, double.PositiveInfinity));
        return Fold(sum, Pow(1.0, double.PositiveInfinity));
    }

    private static long NextState(long state)
    {
        return unchecked((state * SequenceFactor) + SequenceStep);
    }

    private static long Fold(long sum, double value)
    {
        return unchecked((sum ^ System.BitConverter.DoubleToInt64Bits(value)) * FoldFactor) ^ (sum >> 29);
    }
}
