using System.Runtime.CompilerServices;

namespace ProbeCal;

/// <summary>The oxygen functions that have lanes: what is Ok, and the value there.</summary>
internal static class OxygenFunctions
{
    /// <summary><see cref="GarciaGordon1992.MicromolesPerKilogramAtOneAtmosphere"/> of temperature and salinity.</summary>
    internal readonly struct GarciaGordonAtOneAtmosphere : ILaneFunction
    {
        public Status Scalar(double a, double b, double c, double d, RangeRule rule, out double value)
        {
            return GarciaGordon1992.MicromolesPerKilogramAtOneAtmosphere(a, b, rule, out value);
        }

        public static bool HasFirst => true;

        public static bool HasSecond => false;

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes First<TLanes>(TLanes a)
            where TLanes : struct, ILanes<TLanes>
        {
            return GarciaGordon1992.ScaledTemperature(a);
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Second<TLanes>(TLanes first, TLanes a, TLanes b)
            where TLanes : struct, ILanes<TLanes>
        {
            return first;
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Last<TLanes>(TLanes inHand, TLanes a, TLanes b, TLanes c, TLanes d, out TLanes ok)
            where TLanes : struct, ILanes<TLanes>
        {
            ok = GarciaGordon1992.WaterInRange(a, b);
            return GarciaGordon1992.OneAtmosphereOfScaled(inHand, b);
        }
    }

    /// <summary><see cref="GarciaGordon1992.MicromolesPerKilogram"/> of temperature, salinity and pressure.</summary>
    internal readonly struct GarciaGordon : ILaneFunction
    {
        public Status Scalar(double a, double b, double c, double d, RangeRule rule, out double value)
        {
            return GarciaGordon1992.MicromolesPerKilogram(a, b, c, rule, out value);
        }

        public static bool HasFirst => true;

        public static bool HasSecond => true;

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes First<TLanes>(TLanes a)
            where TLanes : struct, ILanes<TLanes>
        {
            return GarciaGordon1992.ScaledTemperature(a);
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Second<TLanes>(TLanes first, TLanes a, TLanes b)
            where TLanes : struct, ILanes<TLanes>
        {
            return GarciaGordon1992.OneAtmosphereOfScaled(first, b);
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Last<TLanes>(TLanes inHand, TLanes a, TLanes b, TLanes c, TLanes d, out TLanes ok)
            where TLanes : struct, ILanes<TLanes>
        {
            ok = GarciaGordon1992.WaterInRange(a, b) & LaneCheck.Pressure(c);
            return inHand * OxygenPressureFactor.Value(a, c / PressureUnits.HectopascalPerAtmosphere);
        }
    }

    /// <summary><see cref="OxygenEquilibrium.MilligramsPerLitre"/> of temperature, salinity and pressure.</summary>
    internal readonly struct MilligramsPerLitre<TEquation> : ILaneFunction
        where TEquation : struct, ILaneEquation
    {
        public Status Scalar(double a, double b, double c, double d, RangeRule rule, out double value)
        {
            return OxygenEquilibrium.MilligramsPerLitre(TEquation.Equation, a, b, c, rule, out value);
        }

        public static bool HasFirst => TEquation.IsPrepared;

        public static bool HasSecond => true;

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes First<TLanes>(TLanes a)
            where TLanes : struct, ILanes<TLanes>
        {
            return TEquation.Prepared(a);
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Second<TLanes>(TLanes first, TLanes a, TLanes b)
            where TLanes : struct, ILanes<TLanes>
        {
            return TEquation.OneAtmosphere(first, a, b);
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Last<TLanes>(TLanes inHand, TLanes a, TLanes b, TLanes c, TLanes d, out TLanes ok)
            where TLanes : struct, ILanes<TLanes>
        {
            ok = TEquation.WaterInRange(a, b) & LaneCheck.Pressure(c);
            return inHand * OxygenPressureFactor.Value(a, c / PressureUnits.HectopascalPerAtmosphere);
        }
    }

    /// <summary><see cref="OxygenEquilibrium.PartialPressure"/> of temperature and pressure.</summary>
    internal readonly struct PartialPressure : ILaneFunction
    {
        public Status Scalar(double a, double b, double c, double d, RangeRule rule, out double value)
        {
            return OxygenEquilibrium.PartialPressure(a, b, rule, out value);
        }

        public static bool HasFirst => false;

        public static bool HasSecond => false;

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes First<TLanes>(TLanes a)
            where TLanes : struct, ILanes<TLanes>
        {
            return a;
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Second<TLanes>(TLanes first, TLanes a, TLanes b)
            where TLanes : struct, ILanes<TLanes>
        {
            return first;
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Last<TLanes>(TLanes inHand, TLanes a, TLanes b, TLanes c, TLanes d, out TLanes ok)
            where TLanes : struct, ILanes<TLanes>
        {
            ok = OxygenEquilibrium.AirInRange(a, b);
            return OxygenEquilibrium.AirPartialPressure(a, b);
        }
    }

    /// <summary><see cref="OxygenEquilibrium.ConcentrationFromPartialPressure"/> of temperature, salinity, pressure and partial pressure.</summary>
    internal readonly struct ConcentrationFromPartialPressure<TEquation> : ILaneFunction
        where TEquation : struct, ILaneEquation
    {
        public Status Scalar(double a, double b, double c, double d, RangeRule rule, out double value)
        {
            return OxygenEquilibrium.ConcentrationFromPartialPressure(TEquation.Equation, a, b, c, d, rule, out value);
        }

        public static bool HasFirst => TEquation.IsPrepared;

        public static bool HasSecond => true;

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes First<TLanes>(TLanes a)
            where TLanes : struct, ILanes<TLanes>
        {
            return TEquation.Prepared(a);
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Second<TLanes>(TLanes first, TLanes a, TLanes b)
            where TLanes : struct, ILanes<TLanes>
        {
            return TEquation.OneAtmosphere(first, a, b);
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Last<TLanes>(TLanes inHand, TLanes a, TLanes b, TLanes c, TLanes d, out TLanes ok)
            where TLanes : struct, ILanes<TLanes>
        {
            ok = TEquation.WaterInRange(a, b) & LaneCheck.Pressure(c)
                & LaneCheck.Within(d, double.MinValue, OxygenEquilibrium.HighestPartialPressureHectopascal);
            return OxygenEquilibrium.Solubility(inHand, a, c) * d;
        }
    }

    /// <summary><see cref="OxygenEquilibrium.PartialPressureFromConcentration"/> of temperature, salinity, pressure and concentration.</summary>
    internal readonly struct PartialPressureFromConcentration<TEquation> : ILaneFunction
        where TEquation : struct, ILaneEquation
    {
        public Status Scalar(double a, double b, double c, double d, RangeRule rule, out double value)
        {
            return OxygenEquilibrium.PartialPressureFromConcentration(TEquation.Equation, a, b, c, d, rule, out value);
        }

        public static bool HasFirst => TEquation.IsPrepared;

        public static bool HasSecond => true;

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes First<TLanes>(TLanes a)
            where TLanes : struct, ILanes<TLanes>
        {
            return TEquation.Prepared(a);
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Second<TLanes>(TLanes first, TLanes a, TLanes b)
            where TLanes : struct, ILanes<TLanes>
        {
            return TEquation.OneAtmosphere(first, a, b);
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static TLanes Last<TLanes>(TLanes inHand, TLanes a, TLanes b, TLanes c, TLanes d, out TLanes ok)
            where TLanes : struct, ILanes<TLanes>
        {
            TLanes solubility = OxygenEquilibrium.Solubility(inHand, a, c);
            TLanes value = d / solubility;
            // A concentration far below zero overflows: the scalar call has a status for it.
            ok = TEquation.WaterInRange(a, b) & LaneCheck.Pressure(c)
                & (d <= solubility * OxygenEquilibrium.HighestPartialPressureHectopascal) & (value >= double.MinValue);
            return value;
        }
    }

    /// <summary>An equation that <see cref="OxygenEquilibrium"/> does not take: refused for every value before any of its inputs is looked at.</summary>
    internal readonly struct UnknownEquation : IBatchFunction
    {
        public Status Scalar(double a, double b, double c, double d, RangeRule rule, out double value)
        {
            value = double.NaN;
            return Status.EquationUnknown;
        }
    }
}
