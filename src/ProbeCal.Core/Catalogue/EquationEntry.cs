using System.Collections.Generic;

namespace ProbeCal;

/// <summary>A published solubility equation: what it is called and where it was published.</summary>
public sealed class EquationEntry
{
    private readonly string[] _aliases;

    internal EquationEntry(SolubilityEquation equation, string name, string citation, string doi, params string[] aliases)
    {
        Equation = equation;
        Name = name;
        Citation = citation;
        Doi = doi;
        _aliases = aliases;
    }

    /// <summary>The equation.</summary>
    public SolubilityEquation Equation { get; }

    /// <summary>Authors and year, as in commands, records and documents.</summary>
    public string Name { get; }

    /// <summary>Full citation.</summary>
    public string Citation { get; }

    /// <summary>Digital object identifier; they were not resolved.</summary>
    public string Doi { get; }

    /// <summary>Other names it is known by.</summary>
    public IReadOnlyList<string> Aliases => _aliases;

    /// <summary>Is it called that, in any case of letters?</summary>
    /// <param name="text">A name or an alias.</param>
    public bool IsCalled(string text)
    {
        return CatalogueText.Same(text, Name) || CatalogueText.IsOneOf(text, _aliases);
    }
}
