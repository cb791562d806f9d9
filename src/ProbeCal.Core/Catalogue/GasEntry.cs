using System.Collections.Generic;

namespace ProbeCal;

/// <summary>What is known of a gas apart from its equations.</summary>
public sealed class GasEntry
{
    private readonly string[] _aliases;

    internal GasEntry(Gas gas, string symbol, string name, string formula, params string[] aliases)
    {
        Gas = gas;
        Symbol = symbol;
        Name = name;
        Formula = formula;
        _aliases = aliases;
    }

    /// <summary>The gas.</summary>
    public Gas Gas { get; }

    /// <summary>What it is called in commands, records and documents: O2, CFC-11.</summary>
    public string Symbol { get; }

    /// <summary>English name.</summary>
    public string Name { get; }

    /// <summary>Chemical formula.</summary>
    public string Formula { get; }

    /// <summary>Other names it is known by.</summary>
    public IReadOnlyList<string> Aliases => _aliases;

    /// <summary>Molar mass, g/mol.</summary>
    public double GramsPerMole => GasUnits.GramsPerMole(Gas);

    /// <summary>Usual mole fraction in dry air; NaN for a gas that air holds no settled amount of.</summary>
    public double DryAirMoleFraction => DryAir.MoleFraction(Gas);

    /// <summary>The equation taken where none is named.</summary>
    public SolubilityEquation DefaultEquation => GasDefaults.Equation(Gas);

    /// <summary>Is it called that, in any case of letters?</summary>
    /// <param name="text">A symbol, formula, English name or alias.</param>
    public bool IsCalled(string text)
    {
        return CatalogueText.Same(text, Symbol) || CatalogueText.Same(text, Name) || CatalogueText.Same(text, Formula)
            || CatalogueText.IsOneOf(text, _aliases);
    }
}
