using System.Runtime.CompilerServices;

namespace ProbeCal;

public static partial class BensonKrause1984
{
    /// <summary>The lanes that <see cref="Check"/> finds Ok, the pressure apart.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes WaterInRange<TLanes>(TLanes celsius, TLanes salinity)
        where TLanes : struct, ILanes<TLanes>
    {
        return LaneCheck.Within(celsius, LowestCelsius, HighestCelsius) & LaneCheck.Within(salinity, 0.0, HighestSalinity);
    }

    /// <summary>The lanes of <c>OneAtmosphere</c>, inside the range.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes OneAtmosphere<TLanes>(TLanes celsius, TLanes salinity)
        where TLanes : struct, ILanes<TLanes>
    {
        TLanes r = 1.0 / (celsius + TemperatureScale.KelvinAtZeroCelsius);
        TLanes fresh = A0 + (r * (A1 + (r * (A2 + (r * (A3 + (r * A4)))))));
        return Numerics.Exp(fresh - (salinity * (B0 + (r * (B1 + (r * B2))))));
    }
}
