using System.Collections.Generic;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Host.Commands;

/// <summary>Where the inputs of an explanation came from that were not given as they enter the chain.</summary>
internal static class ExplanationOrigins
{
    internal static List<string> Of(EquilibriumCase asked)
    {
        List<string> origins = [];
        if (asked.PressureSource != "given")
        {
            origins.Add("P from the altitude alone, by the standard atmosphere: second best");
        }

        if (asked.Water.Source != SalinitySource.Given)
        {
            origins.Add("S: " + WaterWords.Of(asked.Water));
        }

        if (asked.Measured is MeasuredConcentration measured && measured.Kind != QuantityKind.MassConcentration)
        {
            string by = measured.Kind == QuantityKind.AmountPerKilogram ? "with molar mass and EOS-80 density"
                : measured.Kind == QuantityKind.AmountConcentration ? "with the molar mass" : "with the density of the gas at 0 °C and 1 atm";
            origins.Add("C from " + measured.Text + ", " + by);
        }

        return origins;
    }
}
