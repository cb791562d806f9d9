using System.Collections.Generic;
using System.Linq;

namespace ProbeCal.Station.Entry;

/// <summary>
/// How a solubility equation is called in commands, configurations, records and payloads: author and year. The names are the catalogue's.
/// </summary>
public static class EquationNames
{
    /// <summary>The equation of an oxygen probe where none is named: the one behind the tables of the public field standards.</summary>
    public const SolubilityEquation Default = SolubilityEquation.BensonKrause1984;

    /// <summary>The name of an equation.</summary>
    public static string NameOf(SolubilityEquation equation)
    {
        return Catalogue.Equation(equation).Name;
    }

    /// <summary>The equation of a name, for the readings of an oxygen probe.</summary>
    /// <param name="what">The option or key that it was given for.</param>
    /// <param name="name">What was given.</param>
    /// <exception cref="InputException">There is no such equation of oxygen; the message lists those that there are.</exception>
    public static SolubilityEquation Parse(string what, string name)
    {
        return Parse(what, name, Gas.Oxygen, [.. Catalogue.SolubilitiesOf(Gas.Oxygen).Where(static entry => GivesReadings(entry.Equation))]);
    }

    /// <summary>The equation of a name for a gas.</summary>
    /// <param name="what">The option or key that it was given for.</param>
    /// <param name="name">What was given.</param>
    /// <param name="gas">The gas that it must cover.</param>
    /// <exception cref="InputException">There is no such equation of that gas; the message lists those that there are.</exception>
    public static SolubilityEquation Parse(string what, string name, Gas gas)
    {
        return Parse(what, name, gas, Catalogue.SolubilitiesOf(gas));
    }

    /// <summary>The equation of a name for a gas, or the gas's default where none was given.</summary>
    /// <param name="what">The option or key that it was given for.</param>
    /// <param name="name">What was given; null when nothing was.</param>
    /// <param name="gas">The gas that it must cover.</param>
    /// <exception cref="InputException">There is no such equation of that gas; the message lists those that there are.</exception>
    public static SolubilityEquation ParseOrDefault(string what, string? name, Gas gas)
    {
        return name is null ? GasDefaults.Equation(gas) : Parse(what, name, gas);
    }

    private static SolubilityEquation Parse(string what, string name, Gas gas, IReadOnlyList<SolubilityEntry> offered)
    {
        if (offered.FirstOrDefault(entry => entry.Source.IsCalled(name)) is SolubilityEntry found)
        {
            return found.Equation;
        }

        string symbol = GasNames.NameOf(gas);
        string[] names = [.. offered.Select(static entry => entry.Source.Name)];
        string problem = Catalogue.Equations.FirstOrDefault(entry => entry.IsCalled(name)) is EquationEntry other
            ? other.Name + " does not cover " + symbol
            : "there is no such equation" + NearestName.DidYouMean(name, names);
        throw Wrong.Input(what, name, problem + "; for " + symbol + " there " + (names.Length == 1 ? "is " : "are ") + string.Join(", ", names));
    }

    /// <summary>Does Core turn this equation into readings of a probe, and not only into equilibrium values?</summary>
    private static bool GivesReadings(SolubilityEquation equation)
    {
        return OxygenEquilibrium.MilligramsPerLitre(equation, 20.0, 0.0, PressureUnits.HectopascalPerAtmosphere, RangeRule.Refuse, out _)
            != Status.EquationUnknown;
    }
}
