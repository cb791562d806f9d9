using System.Collections.Generic;
using System.Linq;

namespace ProbeCal.Station.Entry;

/// <summary>How a gas is called in commands, files, records and messages: by its formula, or by its English name. The names are the catalogue's.</summary>
public static class GasNames
{
    /// <summary>The name of a gas: its formula, or CFC-11 and CFC-12.</summary>
    public static string NameOf(Gas gas)
    {
        return Catalogue.Gas(gas).Symbol;
    }

    /// <summary>The gas of a formula or an English name, whatever the case.</summary>
    /// <param name="what">The option or key that it was given for.</param>
    /// <param name="name">What was given.</param>
    /// <exception cref="InputException">There is no such gas; the message lists those that there are.</exception>
    public static Gas Parse(string what, string name)
    {
        string given = name.Trim();
        if (Catalogue.Gases.FirstOrDefault(gas => gas.IsCalled(given)) is GasEntry found)
        {
            return found.Gas;
        }

        string symbols = string.Join(", ", Catalogue.Gases.Select(static gas => gas.Symbol));
        throw Wrong.Input(what, given, "no such gas is known here" + NearestName.DidYouMean(given, Spellings()) + "; there are " + symbols);
    }

    /// <summary>English names first: a formula of two or three letters is near to anything.</summary>
    private static IEnumerable<string> Spellings()
    {
        return Catalogue.Gases.Select(static gas => gas.Name).Concat(Catalogue.Gases.Select(static gas => gas.Symbol));
    }
}
