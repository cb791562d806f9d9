using System.Globalization;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Station.InWater;

/// <summary>Reads the words in which a person describes a water, by the rules of <see cref="EquilibriumEntry"/>, and computes.</summary>
public static class WaterDescription
{
    /// <summary>Understands the temperature and the salinity of an entry; the rest of it plays no part.</summary>
    /// <exception cref="InputException">Something is missing, said twice, cannot be read or lies outside every range; one line says what.</exception>
    public static WaterProperties Read(EquilibriumEntry entry)
    {
        UncertainQuantity temperature = entry.ReadTemperature();
        double celsius = temperature.Value;
        if (!(WaterProperties.LowestCelsius <= celsius && celsius <= WaterProperties.HighestCelsius))
        {
            throw Wrong.Input("--temperature", entry.Temperature!, string.Create(CultureInfo.InvariantCulture,
                $"water is described here from {WaterProperties.LowestCelsius} to {WaterProperties.HighestCelsius} °C"));
        }

        if (entry is { Salinity: null, Conductivity: null, SpecificConductance: null, Chlorinity: null })
        {
            throw new InputException("--salinity is missing: 0 for fresh water, or in its place --conductivity 42mS/cm (as measured), --specific-conductance 500uS/cm (at 25 °C) or --chlorinity 19.4");
        }

        return WaterProperties.Compute(celsius, temperature.StandardUncertainty, WaterSalt.Read(entry, celsius, temperature.StandardUncertainty));
    }
}
