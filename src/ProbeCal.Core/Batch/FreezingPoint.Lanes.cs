using System.Runtime.CompilerServices;

namespace ProbeCal;

public static partial class FreezingPoint
{
    /// <summary>The lanes of <c>Value</c>.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes Value<TLanes>(TLanes salinity)
        where TLanes : struct, ILanes<TLanes>
    {
        return salinity * (A0 + (A1 * TLanes.Sqrt(salinity)) + (A2 * salinity));
    }
}
