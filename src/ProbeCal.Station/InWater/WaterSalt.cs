using System;
using System.Globalization;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Station.InWater;

/// <summary>How salty a water is: the salinity as every command reads it (<see cref="WaterSalinity"/>), with the conductivities that belong to it.</summary>
public sealed record WaterSalt
{
    private WaterSalt() { }

    /// <summary>Practical salinity.</summary>
    public required double Salinity { get; init; }

    /// <summary>Its standard uncertainty, with that of the water's temperature where a conductivity was measured at it; 0 when it was given as exact.</summary>
    public required double Uncertainty { get; init; }

    /// <summary>What it was taken from.</summary>
    public required SalinitySource Source { get; init; }

    /// <summary>Conductivity at the temperature it was measured at, mS/cm; null unless given.</summary>
    public double? ConductivityMillisiemensPerCentimetre { get; private init; }

    /// <summary>Specific conductance at 25 °C by linear compensation, or as given, µS/cm; null where there is none.</summary>
    public double? LinearAt25MicrosiemensPerCentimetre { get; private init; }

    /// <summary>Specific conductance at 25 °C by the compensation of natural waters, µS/cm; null outside its range.</summary>
    public double? NaturalAt25MicrosiemensPerCentimetre { get; private init; }

    /// <summary>Salinity by the field manual's relation from the linear specific conductance, where that was not the way taken; null elsewhere.</summary>
    public double? FieldRelationSalinity { get; private init; }

    /// <summary>Chlorinity, g/kg.</summary>
    public double ChlorinityGramsPerKilogram => Salinity / Chlorinity.SalinityPerGramPerKilogram;

    /// <summary>Reads what the words say of it.</summary>
    /// <param name="entry">The words.</param>
    /// <param name="celsius">Temperature of the water, °C.</param>
    /// <param name="uCelsius">Its standard uncertainty, K.</param>
    /// <exception cref="InputException">As <see cref="WaterSalinity.Read"/>, or more salt than water is described for.</exception>
    internal static WaterSalt Read(EquilibriumEntry entry, double celsius, double uCelsius)
    {
        WaterSalinity water = WaterSalinity.Read(entry, celsius);
        if (!(0 <= water.Salinity && water.Salinity <= DensityEos80.HighestSalinity))
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{water.Described}: water is described here for practical salinities of 0 to {DensityEos80.HighestSalinity}"));
        }

        double shared = water.ConductivityTemperature is null ? water.PerKelvin * uCelsius : 0;
        WaterSalt salt = new()
        {
            Salinity = water.Salinity,
            Uncertainty = Math.Sqrt((water.SalinityUncertainty * water.SalinityUncertainty) + (shared * shared)),
            Source = water.Source,
            LinearAt25MicrosiemensPerCentimetre = water.Source == SalinitySource.SpecificConductance ? water.Given.Value * WaterSalinity.MicrosiemensPerMillisiemens : null,
        };
        return water.Source == SalinitySource.Conductivity ? Compensated(salt, water.Given.Value, water.ConductivityTemperature?.Value ?? celsius) : salt;
    }

    private static WaterSalt Compensated(WaterSalt salt, double conductivity, double celsius)
    {
        double micro = conductivity * WaterSalinity.MicrosiemensPerMillisiemens;
        ConductivityCompensation.Linear(micro, celsius, RangeRule.NearEdge, out double at25);
        ConductivityCompensation.NaturalWater(micro, celsius, RangeRule.NearEdge, out double naturalAt25);
        SpecificConductance.Salinity(at25, RangeRule.Refuse, out double field);
        return salt with
        {
            ConductivityMillisiemensPerCentimetre = conductivity,
            LinearAt25MicrosiemensPerCentimetre = OrNull(at25),
            NaturalAt25MicrosiemensPerCentimetre = OrNull(naturalAt25),
            FieldRelationSalinity = OrNull(field),
        };
    }

    private static double? OrNull(double value)
    {
        return double.IsNaN(value) ? null : value;
    }
}
