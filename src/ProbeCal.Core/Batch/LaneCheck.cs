using System.Runtime.CompilerServices;

namespace ProbeCal;

/// <summary>
/// The ranges of <see cref="InputCheck"/> as masks of the lanes that are Ok. A lane outside the mask goes to the scalar function, which says why.
/// </summary>
internal static class LaneCheck
{
    /// <summary>The lanes from lowest to highest: neither NaN nor infinite, where both ends are finite.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes Within<TLanes>(TLanes value, double lowest, double highest)
        where TLanes : struct, ILanes<TLanes>
    {
        return (value >= lowest) & (value <= highest);
    }

    /// <summary>Total pressures of the pressure factor, hPa.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes Pressure<TLanes>(TLanes hectopascal)
        where TLanes : struct, ILanes<TLanes>
    {
        return Within(hectopascal, BensonKrause1984.LowestHectopascal, BensonKrause1984.HighestHectopascal);
    }

    /// <summary>Whether every lane is in the mask.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static bool All<TLanes>(TLanes mask)
        where TLanes : struct, ILanes<TLanes>
    {
        return mask.MaskBits() == (1u << TLanes.Count) - 1u;
    }
}
