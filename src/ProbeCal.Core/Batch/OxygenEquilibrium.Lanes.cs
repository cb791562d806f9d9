using System.Runtime.CompilerServices;

namespace ProbeCal;

public static partial class OxygenEquilibrium
{
    /// <summary>The lanes that <see cref="CheckAir"/> finds Ok.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes AirInRange<TLanes>(TLanes celsius, TLanes pressureHectopascal)
        where TLanes : struct, ILanes<TLanes>
    {
        return LaneCheck.Within(celsius, LowestCelsius, HighestCelsius) & LaneCheck.Pressure(pressureHectopascal);
    }

    /// <summary>The lanes of <c>AirPartialPressure</c>, inside the range.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes AirPartialPressure<TLanes>(TLanes celsius, TLanes pressureHectopascal)
        where TLanes : struct, ILanes<TLanes>
    {
        TLanes vapour = VapourBensonKrause1980.Atmospheres(celsius) * PressureUnits.HectopascalPerAtmosphere;
        return DryAir.OxygenMoleFraction * (pressureHectopascal - vapour);
    }

    /// <summary>
    /// The lanes of <c>Solubility</c>, inside the range, where the denominator is positive, from the
    /// concentration at 1 atm.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static TLanes Solubility<TLanes>(TLanes oneAtmosphere, TLanes celsius, TLanes pressureHectopascal)
        where TLanes : struct, ILanes<TLanes>
    {
        TLanes theta = OxygenPressureFactor.Theta(celsius);
        TLanes atmospheres = pressureHectopascal / PressureUnits.HectopascalPerAtmosphere;
        TLanes denominator = AirPartialPressure<TLanes>(celsius, PressureUnits.HectopascalPerAtmosphere) * (1.0 - theta);
        return oneAtmosphere * (1.0 - (theta * atmospheres)) / denominator;
    }
}
