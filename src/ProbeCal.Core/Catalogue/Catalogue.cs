using System;
using System.Collections.Generic;

namespace ProbeCal;

/// <summary>
/// What there is, as data for desktop programs: gases, published equations, and each gas by each equation that covers it. No equation file refers
/// to it; what an equation computes with (coefficients, ranges) is read from the equation.
/// </summary>
public static class Catalogue
{
    /// <summary>The gases, in the order of their numbers.</summary>
    public static IReadOnlyList<GasEntry> Gases => GasList.All;

    /// <summary>The published solubility equations, in the order of their numbers.</summary>
    public static IReadOnlyList<EquationEntry> Equations => EquationList.All;

    /// <summary>Each gas by each equation that covers it, the default of each gas first.</summary>
    public static IReadOnlyList<SolubilityEntry> Solubilities => SolubilityList.All;

    /// <summary>The published relations about water, its vapour, its salt and the pressure on it.</summary>
    public static IReadOnlyList<WaterEntry> Relations => WaterList.All;

    /// <summary>A relation about water by its name or an alias.</summary>
    /// <exception cref="ArgumentOutOfRangeException">There is no such relation.</exception>
    public static WaterEntry Relation(string name)
    {
        foreach (WaterEntry entry in WaterList.All)
        {
            if (CatalogueText.Same(name, entry.Name) || CatalogueText.IsOneOf(name, entry.Aliases)) { return entry; }
        }

        throw new ArgumentOutOfRangeException(nameof(name));
    }

    /// <summary>What is known of a gas.</summary>
    /// <exception cref="ArgumentOutOfRangeException">It is none of the gases of Core.</exception>
    public static GasEntry Gas(Gas gas)
    {
        foreach (GasEntry entry in GasList.All)
        {
            if (entry.Gas == gas) { return entry; }
        }

        throw new ArgumentOutOfRangeException(nameof(gas));
    }

    /// <summary>Name and citation of an equation.</summary>
    /// <exception cref="ArgumentOutOfRangeException">It is none of the equations of Core.</exception>
    public static EquationEntry Equation(SolubilityEquation equation)
    {
        foreach (EquationEntry entry in EquationList.All)
        {
            if (entry.Equation == equation) { return entry; }
        }

        throw new ArgumentOutOfRangeException(nameof(equation));
    }

    /// <summary>One gas by one equation; null when the equation does not cover the gas.</summary>
    public static SolubilityEntry? Solubility(Gas gas, SolubilityEquation equation)
    {
        foreach (SolubilityEntry entry in SolubilityList.All)
        {
            if (entry.Gas == gas && entry.Equation == equation) { return entry; }
        }

        return null;
    }

    /// <summary>The equations that cover a gas, its default first.</summary>
    public static IReadOnlyList<SolubilityEntry> SolubilitiesOf(Gas gas)
    {
        List<SolubilityEntry> found = [];
        foreach (SolubilityEntry entry in SolubilityList.All)
        {
            if (entry.Gas == gas) { found.Add(entry); }
        }

        return found;
    }
}
