using System.Collections.Generic;

namespace ProbeCal;

/// <summary>A published relation about water, its vapour, its salt or the pressure on it.</summary>
public sealed class WaterEntry
{
    private readonly string[] _aliases;

    internal WaterEntry(
        string name, string quantity, string unit, string citation, string doi, string range, string statedAccuracy, Evidence evidence, string use,
        params string[] aliases)
    {
        Name = name;
        Quantity = quantity;
        Unit = unit;
        Citation = citation;
        Doi = doi;
        Range = range;
        StatedAccuracy = statedAccuracy;
        Evidence = evidence;
        Use = use;
        _aliases = aliases;
    }

    /// <summary>Authors or body and year.</summary>
    public string Name { get; }

    /// <summary>What it gives.</summary>
    public string Quantity { get; }

    /// <summary>In which unit; empty for a ratio.</summary>
    public string Unit { get; }

    /// <summary>Full citation.</summary>
    public string Citation { get; }

    /// <summary>Digital object identifier; empty where there is none. They were not resolved.</summary>
    public string Doi { get; }

    /// <summary>Where it holds, in words made from the numbers that Core checks against.</summary>
    public string Range { get; }

    /// <summary>Accuracy as stated, and how that statement is known.</summary>
    public string StatedAccuracy { get; }

    /// <summary>Where its coefficients were seen and what they reproduce.</summary>
    public Evidence Evidence { get; }

    /// <summary>What it is used for here, and why.</summary>
    public string Use { get; }

    /// <summary>Other names it is known by.</summary>
    public IReadOnlyList<string> Aliases => _aliases;
}
