using System;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Host.Commands;

/// <summary>How the salinity was got, in words for people and for programs.</summary>
internal static class WaterWords
{
    internal static string SourceName(SalinitySource source)
    {
        return source switch
        {
            SalinitySource.Given => "given",
            SalinitySource.SpecificConductance => "specific-conductance",
            SalinitySource.Conductivity => "conductivity",
            SalinitySource.Chlorinity => "chlorinity",
            SalinitySource.Ions => "ions",
            _ => throw new ArgumentOutOfRangeException(nameof(source)),
        };
    }

    /// <summary>A temperature for people: what was read in °F has no more digits than a thermometer.</summary>
    internal static string Celsius(double celsius)
    {
        return celsius.ToString("G6", System.Globalization.CultureInfo.InvariantCulture) + " °C";
    }

    internal static string Of(WaterSalinity water)
    {
        return water.Source switch
        {
            SalinitySource.Given => "salinity " + Number.Print(water.Salinity),
            SalinitySource.SpecificConductance => $"salinity {Number.Significant(water.Salinity, 4)} from specific conductance {Number.Print(water.Given.Value)} mS/cm at 25 °C (field manual TM 9-A6.2)",
            SalinitySource.Conductivity => $"salinity {Number.Significant(water.Salinity, 5)} from conductivity {Number.Print(water.Given.Value)} mS/cm at {(water.ConductivityTemperature is UncertainQuantity cell ? Number.Print(cell.Value) + " °C" : "the water's temperature")} (PSS-78)",
            SalinitySource.Chlorinity => $"salinity {Number.Significant(water.Salinity, 5)} from chlorinity {Number.Print(water.Given.Value)} g/kg (S = 1.80655 Cl)",
            SalinitySource.Ions => "brine of " + string.Join(", ", water.Brine!.Ions.Select(static ion => $"{Number.Significant(ion.MolesPerLitre, 4)} mol/L {ion.Name}")),
            _ => throw new ArgumentOutOfRangeException(nameof(water)),
        };
    }
}

/// <summary>What a percentage of saturation refers to; without it the number says nothing.</summary>
internal static class SaturationWords
{
    internal static string Of(EquilibriumQuantity quantity, EquilibriumCase asked)
    {
        string phase = asked.Phase.Kind switch { GasPhaseKind.Air => "air", GasPhaseKind.Mixture => "mixture", _ => "partial pressure" };
        return quantity switch
        {
            EquilibriumQuantity.PercentOfOneAtmosphere => $"the partial pressure in this {phase} at the local pressure, in per cent of the same at 1 atm",
            EquilibriumQuantity.PercentLocal when asked.Phase.Kind == GasPhaseKind.PartialPressure => "the partial pressure in the water, in per cent of the one given",
            EquilibriumQuantity.PercentLocal => $"the partial pressure in the water, in per cent of that in the {phase} at the local pressure",
            EquilibriumQuantity.PercentOneAtmosphere => $"the partial pressure in the water, in per cent of that in the {phase} at 1 atm",
            _ => throw new ArgumentOutOfRangeException(nameof(quantity)),
        };
    }
}
