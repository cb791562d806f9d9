using System.Collections.Generic;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>How the salinity of the water was got.</summary>
public enum SalinitySource
{
    /// <summary>It was given.</summary>
    Given = 1,
    /// <summary>From the specific conductance at 25 °C.</summary>
    SpecificConductance = 2,
}

/// <summary>The salinity of the water and where it comes from.</summary>
public sealed record WaterSalinity
{
    private WaterSalinity() { }

    /// <summary>Practical salinity.</summary>
    public required double Salinity { get; init; }

    /// <summary>How it was got.</summary>
    public required SalinitySource Source { get; init; }

    /// <summary>What was given, in the unit that the source is kept in: a salinity, or mS/cm at 25 °C.</summary>
    public required UncertainQuantity Given { get; init; }

    /// <summary>Change of the salinity with what was given: 1, or per mS/cm.</summary>
    public required double PerGiven { get; init; }

    /// <summary>Reads the options that say how salty the water is: exactly one of them.</summary>
    /// <exception cref="InputException">None or several are given, or one cannot be read.</exception>
    public static WaterSalinity Read(EquilibriumEntry entry)
    {
        List<string> given = [];
        Note(given, "--salinity", entry.Salinity);
        Note(given, "--specific-conductance", entry.SpecificConductance);
        if (given.Count == 0)
        {
            throw new InputException("--salinity is missing: 0 for fresh water, or --specific-conductance 500uS/cm (at 25 °C) in its place");
        }

        if (1 < given.Count)
        {
            throw new InputException($"{string.Join(" and ", given)} each say how salty the water is; give one of them");
        }

        return entry.Salinity is not null ? OfSalinity(entry) : OfSpecificConductance(entry);
    }

    private static WaterSalinity OfSalinity(EquilibriumEntry entry)
    {
        double salinity = Quantity.Salinity("--salinity", entry.Salinity!);
        return new WaterSalinity
        {
            Salinity = salinity,
            Source = SalinitySource.Given,
            Given = UncertainQuantity.Read(salinity, QuantityKind.Salinity, "--salinity", entry.SalinityUncertainty, entry.SalinityWithin),
            PerGiven = 1,
        };
    }

    private static WaterSalinity OfSpecificConductance(EquilibriumEntry entry)
    {
        double conductance = Quantity.Parse(QuantityKind.Conductivity, "--specific-conductance", entry.SpecificConductance!);
        if (SpecificConductance.Salinity(conductance * 1000, RangeRule.Refuse, out double salinity) != Status.Ok)
        {
            throw Wrong.Input("--specific-conductance", entry.SpecificConductance!, $"the relation of the field manual (TM 9-A6.2) holds from 0 to {SpecificConductance.HighestMicrosiemensPerCentimetre} uS/cm at 25 °C");
        }

        // The relation is a parabola through the origin: a small step to either side gives its slope to the last digits.
        const double Step = 1;
        SpecificConductance.Salinity((conductance * 1000) + Step, RangeRule.Extrapolate, out double above);
        SpecificConductance.Salinity((conductance * 1000) - Step, RangeRule.Extrapolate, out double below);
        return new WaterSalinity
        {
            Salinity = salinity,
            Source = SalinitySource.SpecificConductance,
            Given = UncertainQuantity.Read(conductance, QuantityKind.Conductivity, "--conductivity", entry.ConductivityUncertainty, null),
            PerGiven = (above - below) / (2 * Step) * 1000,
        };
    }

    private static void Note(List<string> given, string option, string? text)
    {
        if (text is not null)
        {
            given.Add(option);
        }
    }
}
