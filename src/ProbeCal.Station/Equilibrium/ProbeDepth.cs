using System;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>
/// A probe under water: what the pressure of the water above does to the partial pressure that it feels, at the same concentration (Enns 1965, hydrostatic pressure
/// by EOS-80 density).
/// </summary>
/// <param name="Metres">Depth, m.</param>
/// <param name="HydrostaticHectopascal">Pressure of the water above, hPa.</param>
/// <param name="Factor">Partial pressure at the depth over that at the surface.</param>
/// <param name="FactorUncertainty">Standard uncertainty of the factor, from that of the volumes.</param>
public sealed record ProbeDepth(double Metres, double HydrostaticHectopascal, double Factor, double FactorUncertainty)
{
    /// <summary>Relative standard uncertainty of the partial molar volumes, as <see cref="Enns1965"/> states their accuracy.</summary>
    private const double VolumeRelative = 0.03;

    /// <summary>A partial pressure of the surface as it is at the depth.</summary>
    /// <param name="surface">Partial pressure at the surface, hPa.</param>
    /// <param name="uSurface">Its standard uncertainty, hPa.</param>
    public UncertainQuantity Of(double surface, double uSurface)
    {
        double byFactor = surface * FactorUncertainty;
        return new UncertainQuantity(surface * Factor, Math.Sqrt((Factor * Factor * uSurface * uSurface) + (byFactor * byFactor)));
    }

    /// <summary>Reads a depth, m.</summary>
    /// <exception cref="InputException">It is none, negative, or deeper than is computed, or the density of the water is not known.</exception>
    internal static double Read(string text, WaterSalinity water)
    {
        if (water.Brine is not null)
        {
            throw Wrong.Input("--depth", text, "the density of a brine (--ions) is not known here, and with it not the pressure of the water");
        }

        double metres = Quantity.Parse(QuantityKind.Depth, "--depth", text);
        return 0 <= metres && metres <= HydrostaticPressure.GreatestDepthMetres
            ? metres
            : throw Wrong.Input("--depth", text, string.Create(CultureInfo.InvariantCulture, $"the pressure of the water is computed from 0 to {HydrostaticPressure.GreatestDepthMetres} m"));
    }

    /// <summary>Computes it for a gas in a water.</summary>
    /// <exception cref="InputException">The volume of the gas in water is not known, or the water lies outside the ranges.</exception>
    internal static ProbeDepth Compute(Gas gas, double celsius, double salinity, double metres)
    {
        if (Enns1965.Factor(gas, 20, 0, RangeRule.Refuse, out _) == Status.GasUnknown)
        {
            throw new InputException($"--depth: what depth does to {GasNames.NameOf(gas)} is not known here; it is for O2, N2, Ar, He and CO2 (Enns 1965)");
        }

        Status status = DensityEos80.Density(celsius, salinity, RangeRule.NearEdge, out double density);
        double water = double.NaN, factor = double.NaN;
        if (!double.IsNaN(density))
        {
            status = HydrostaticPressure.Hectopascal(metres, density, RangeRule.Refuse, out water);
        }

        if (!double.IsNaN(water))
        {
            status = Enns1965.Factor(gas, celsius, water, RangeRule.NearEdge, out factor);
        }

        return double.IsNaN(factor)
            ? throw new InputException(string.Create(CultureInfo.InvariantCulture, $"--depth: what depth does is computed from {Enns1965.LowestCelsius} to {Enns1965.HighestCelsius} °C and salinities to {DensityEos80.HighestSalinity} ({status})"))
            : new ProbeDepth(metres, water, factor, factor * Math.Log(factor) * VolumeRelative);
    }
}
