using System.Runtime.CompilerServices;

namespace ProbeCal;

public static partial class DensityEos80
{
    /// <summary>The lanes of <c>Value</c>.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes Value<TLanes>(TLanes celsius, TLanes salinity)
        where TLanes : struct, ILanes<TLanes>
    {
        TLanes t = celsius * TemperatureScale.Ipts68PerIts90;
        TLanes water = W0 + (t * (W1 + (t * (W2 + (t * (W3 + (t * (W4 + (t * W5)))))))));
        TLanes a = A0 + (t * (A1 + (t * (A2 + (t * (A3 + (t * A4)))))));
        TLanes b = B0 + (t * (B1 + (t * B2)));
        return water + (salinity * (a + (b * TLanes.Sqrt(salinity)) + (C0 * salinity)));
    }
}
