using System.Runtime.CompilerServices;

namespace ProbeCal;

public static partial class VapourBensonKrause1980
{
    /// <summary>The lanes of <c>Atmospheres</c>, inside the range of the oxygen equations.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes Atmospheres<TLanes>(TLanes celsius)
        where TLanes : struct, ILanes<TLanes>
    {
        TLanes r = 1.0 / (celsius + TemperatureScale.KelvinAtZeroCelsius);
        return Numerics.Exp(W0 + (r * (W1 + (r * W2))));
    }
}
