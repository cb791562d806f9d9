using System.Runtime.CompilerServices;

namespace ProbeCal;

public static partial class GarciaGordon1992
{
    /// <summary>The lanes that <see cref="Check"/> finds Ok, the pressure apart.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes WaterInRange<TLanes>(TLanes celsius, TLanes salinity)
        where TLanes : struct, ILanes<TLanes>
    {
        TLanes ok = LaneCheck.Within(celsius, LowestCelsius, HighestCelsius) & LaneCheck.Within(salinity, 0.0, HighestSalinity);
        // The freezing point is never above 0 °C: only cold water asks for it.
        if (LaneCheck.All(celsius >= 0.0)) { return ok; }
        return ok & (celsius >= FreezingPoint.Value(salinity));
    }

    /// <summary>The lanes of <c>ScaledTemperature</c>, inside the range.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes ScaledTemperature<TLanes>(TLanes celsius)
        where TLanes : struct, ILanes<TLanes>
    {
        TLanes t = celsius * TemperatureScale.Ipts68PerIts90;
        return Numerics.Ln((UpperKelvinOfScaling - t) / (TemperatureScale.KelvinAtZeroCelsius + t));
    }

    /// <summary>The lanes of <c>OneAtmosphere</c>, inside the range, from the scaled temperature.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes OneAtmosphereOfScaled<TLanes>(TLanes ts, TLanes salinity)
        where TLanes : struct, ILanes<TLanes>
    {
        TLanes fresh = A0 + (ts * (A1 + (ts * (A2 + (ts * (A3 + (ts * (A4 + (ts * A5)))))))));
        TLanes salt = B0 + (ts * (B1 + (ts * (B2 + (ts * B3)))));
        return Numerics.Exp(fresh + (salinity * (salt + (C0 * salinity))));
    }
}
