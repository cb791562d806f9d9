using System;
using System.Linq;

namespace ProbeCal.Station.Entry;

/// <summary>
/// How a solubility equation is called in commands, configurations, records and payloads: author and year.
/// </summary>
public static class EquationNames
{
    /// <summary>The equation taken where none is named: the one behind the tables of the public field standards.</summary>
    public const SolubilityEquation Default = SolubilityEquation.BensonKrause1984;

    private static readonly (string Name, SolubilityEquation Equation)[] Known =
    [
        ("benson-krause-1984", SolubilityEquation.BensonKrause1984),
        ("garcia-gordon-1992", SolubilityEquation.GarciaGordon1992),
    ];

    /// <summary>The name of an equation.</summary>
    public static string NameOf(SolubilityEquation equation)
    {
        return Known.First(known => known.Equation == equation).Name;
    }

    /// <summary>The equation of a name.</summary>
    /// <param name="what">The option or key that it was given for.</param>
    /// <param name="name">What was given.</param>
    /// <exception cref="InputException">There is no such equation; the message lists those that there are.</exception>
    public static SolubilityEquation Parse(string what, string name)
    {
        foreach ((string known, SolubilityEquation equation) in Known)
        {
            if (string.Equals(known, name, StringComparison.OrdinalIgnoreCase))
            {
                return equation;
            }
        }

        throw new InputException($"{what} '{name}': no such equation; there are {string.Join(" and ", Known.Select(static k => k.Name))}");
    }
}
