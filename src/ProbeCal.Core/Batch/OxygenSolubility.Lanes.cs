using System.Runtime.CompilerServices;

namespace ProbeCal;

/// <summary>An equation that has lane formulas, as a type, so that the switch over the equations is out of the loop.</summary>
internal interface ILaneEquation
{
    static abstract SolubilityEquation Equation { get; }

    /// <summary>The lanes whose water is in the equation's range.</summary>
    static abstract TLanes WaterInRange<TLanes>(TLanes celsius, TLanes salinity)
        where TLanes : struct, ILanes<TLanes>;

    /// <summary>Whether the equation has a <see cref="Prepared"/> stage.</summary>
    static abstract bool IsPrepared { get; }

    /// <summary>What <see cref="OneAtmosphere"/> takes from the temperature.</summary>
    static abstract TLanes Prepared<TLanes>(TLanes celsius)
        where TLanes : struct, ILanes<TLanes>;

    /// <summary>The lanes of <see cref="OxygenSolubility.OneAtmosphere"/>, mg/L.</summary>
    static abstract TLanes OneAtmosphere<TLanes>(TLanes prepared, TLanes celsius, TLanes salinity)
        where TLanes : struct, ILanes<TLanes>;
}

internal static partial class OxygenSolubility
{
    internal readonly struct BensonKrause1984Lanes : ILaneEquation
    {
        public static SolubilityEquation Equation => SolubilityEquation.BensonKrause1984;

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes WaterInRange<TLanes>(TLanes celsius, TLanes salinity)
            where TLanes : struct, ILanes<TLanes>
        {
            return BensonKrause1984.WaterInRange(celsius, salinity);
        }

        public static bool IsPrepared => false;

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Prepared<TLanes>(TLanes celsius)
            where TLanes : struct, ILanes<TLanes>
        {
            return celsius;
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes OneAtmosphere<TLanes>(TLanes prepared, TLanes celsius, TLanes salinity)
            where TLanes : struct, ILanes<TLanes>
        {
            return BensonKrause1984.OneAtmosphere(celsius, salinity);
        }
    }

    internal readonly struct GarciaGordon1992Lanes : ILaneEquation
    {
        public static SolubilityEquation Equation => SolubilityEquation.GarciaGordon1992;

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes WaterInRange<TLanes>(TLanes celsius, TLanes salinity)
            where TLanes : struct, ILanes<TLanes>
        {
            return GarciaGordon1992.WaterInRange(celsius, salinity);
        }

        public static bool IsPrepared => true;

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Prepared<TLanes>(TLanes celsius)
            where TLanes : struct, ILanes<TLanes>
        {
            return GarciaGordon1992.ScaledTemperature(celsius);
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes OneAtmosphere<TLanes>(TLanes prepared, TLanes celsius, TLanes salinity)
            where TLanes : struct, ILanes<TLanes>
        {
            TLanes perKilogram = GarciaGordon1992.OneAtmosphereOfScaled(prepared, salinity);
            return perKilogram * DensityEos80.Value(celsius, salinity) * MilligramsPerLitreScale;
        }
    }
}
