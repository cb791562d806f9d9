using System.Runtime.CompilerServices;

namespace ProbeCal;

internal static partial class OxygenPressureFactor
{
    /// <summary>The lanes of <c>Theta</c>.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes Theta<TLanes>(TLanes celsius)
        where TLanes : struct, ILanes<TLanes>
    {
        return Theta0 + (celsius * (Theta1 + (celsius * Theta2)));
    }

    /// <summary>The lanes of <c>Value</c>, inside the range, where the denominator is positive.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes Value<TLanes>(TLanes celsius, TLanes atmospheres)
        where TLanes : struct, ILanes<TLanes>
    {
        TLanes u = VapourBensonKrause1980.Atmospheres(celsius);
        TLanes theta = Theta(celsius);
        TLanes denominator = (1.0 - u) * (1.0 - theta);
        return (atmospheres - u) * (1.0 - (theta * atmospheres)) / denominator;
    }
}
