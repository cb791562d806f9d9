using System.Runtime.CompilerServices;

namespace ProbeCal;

public static partial class Numerics
{
    // 1024 in the exponent's place less √½: added to the bits of x, the exponent's place holds k + 1024, which is never negative.
    private const long LanesExponentOffset = (LanesExponentShift << FractionBits) - SqrtHalfBits;
    private const long LanesExponentShift = 1024L;

    /// <summary>
    /// The lanes of <c>Exp</c>, with its bits for −708 to 708 in each lane, where 2^k is put on in one step; outside a lane holds no
    /// meaningful number, and the caller takes the scalar function there.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes Exp<TLanes>(TLanes x)
        where TLanes : struct, ILanes<TLanes>
    {
        TLanes shifted = (x * OneOverLn2) + RoundToInteger;
        TLanes k = shifted - RoundToInteger;

        // The scalar function takes a tail of zero away from low, which changes no bit of it.
        TLanes high = x - (k * Ln2High);
        TLanes low = k * Ln2Low;
        TLanes r = high - low;
        TLanes rest = (high - r) - low;

        TLanes r2 = r * r;
        TLanes r4 = r2 * r2;
        TLanes r8 = r4 * r4;
        TLanes p = (((E2 + (E3 * r)) + (r2 * (E4 + (E5 * r))))
            + (r4 * ((E6 + (E7 * r)) + (r2 * (E8 + (E9 * r))))))
            + (r8 * ((E10 + (E11 * r)) + (r2 * E12)));

        TLanes sum = 1.0 + r;
        TLanes sumRest = r - (sum - 1.0);
        TLanes y = sum + ((r2 * p) + (sumRest + (rest * sum)));
        return y * TLanes.BitsUp(TLanes.BitsPlus(shifted, ExponentBias), FractionBits);
    }

    /// <summary>
    /// The lanes of <c>Ln</c>, with its bits for normal positive numbers; elsewhere a lane holds no meaningful number, and the caller
    /// takes the scalar function there.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes Ln<TLanes>(TLanes x)
        where TLanes : struct, ILanes<TLanes>
    {
        TLanes exponent = TLanes.BitsDown(TLanes.BitsPlus(x, LanesExponentOffset), FractionBits);
        TLanes k = TLanes.BitsPlus(exponent, RoundToIntegerBits) - (RoundToInteger + LanesExponentShift);
        TLanes f = TLanes.BitsPlus(TLanes.BitsMinus(x, TLanes.BitsUp(exponent, FractionBits)), LanesExponentShift << FractionBits) - 1.0;

        TLanes s = f / (2.0 + f);
        TLanes z = s * s;
        TLanes z2 = z * z;
        TLanes z4 = z2 * z2;
        TLanes series = z * (((L1 + (L2 * z)) + (z2 * (L3 + (L4 * z)))) + (z4 * ((L5 + (L6 * z)) + (z2 * L7))));
        TLanes halfSquare = 0.5 * (f * f);

        TLanes whole = k * Ln2High;
        TLanes a = whole + f;
        TLanes aRest = (whole - a) + f;
        TLanes b = a - halfSquare;
        TLanes bRest = (a - b) - halfSquare;
        return b + ((s * (halfSquare + series)) + ((aRest + bRest) + (k * Ln2Low)));
    }
}
