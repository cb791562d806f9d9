namespace ProbeCal;

/// <summary>
/// Exponential, natural logarithm, power and square root in plain double arithmetic: only +, −, ×, ÷, comparisons and
/// the bits of a number, each of which IEEE 754 defines to the last bit. No library of the machine takes part, so that
/// the result has the same bits on every runtime that follows IEEE 754 binary64 without fusing or widening.
/// </summary>
/// <remarks>
/// The functions hold no table and no state, throw nothing, allocate nothing, and never divide by a number that can be zero.
/// Error bounds stand with each function; the largest errors found by measurement are in <c>docs/accuracy.md</c>.
/// <see cref="SelfCheck"/> tells whether the runtime at hand keeps the promise.
/// All functions may be called from several threads at once.
/// </remarks>
public static partial class Numerics
{
    // ln 2 = Ln2High + Ln2Low. The high part has 42 significant bits, so that its product with an integer of up to
    // 11 bits is exact; the low part is the rest of ln 2 rounded to a double, and leaves out less than 2^-98.
    private const double Ln2High = 0.6931471805598903;
    private const double Ln2Low = 5.497923018708371E-14;
    private const double OneOverLn2 = 1.4426950408889634;

    // 1.5·2^52: adding and subtracting it rounds a double below 2^51 to the nearest integer, ties to even.
    // Divided by 2^n it rounds to a multiple of 2^-n in the same way.
    private const double RoundToInteger = 6755399441055744.0;
    // The bits of RoundToInteger: an integer added to them is added to the number that they stand for.
    private const long RoundToIntegerBits = 0x4338000000000000L;
    private const double RoundTo25Bits = 201326592.0;
    private const double RoundTo27Bits = 50331648.0;
    private const double RoundTo32Bits = 1572864.0;
    private const double RoundTo33Bits = 786432.0;

    // 2^27 + 1: c = v·Splitter; c − (c − v) is v rounded to 26 bits, and v minus that is exact (Veltkamp's split;
    // T. J. Dekker, Numer. Math. 18 (1971) 224–242, section 5).
    private const double Splitter = 134217729.0;

    private const double SmallestNormal = 2.2250738585072014E-308;
    private const double TwoTo54 = 18014398509481984.0;
    private const long ExponentBias = 1023L;
    private const int FractionBits = 52;
}
