using System;
using System.Collections.Generic;
using System.Linq;

namespace ProbeCal.Station.Entry;

/// <summary>How a gas is called in commands, files and messages: by its formula, or by its English name.</summary>
public static class GasNames
{
    private static readonly (Gas Gas, string Formula, string English)[] Known =
    [
        (Gas.Oxygen, "O2", "oxygen"),
        (Gas.Nitrogen, "N2", "nitrogen"),
        (Gas.Argon, "Ar", "argon"),
        (Gas.Neon, "Ne", "neon"),
        (Gas.Helium, "He", "helium"),
        (Gas.Krypton, "Kr", "krypton"),
        (Gas.Xenon, "Xe", "xenon"),
        (Gas.CarbonDioxide, "CO2", "carbon dioxide"),
        (Gas.NitrousOxide, "N2O", "nitrous oxide"),
        (Gas.Methane, "CH4", "methane"),
        (Gas.CarbonMonoxide, "CO", "carbon monoxide"),
        (Gas.Hydrogen, "H2", "hydrogen"),
        (Gas.SulfurHexafluoride, "SF6", "sulfur hexafluoride"),
        (Gas.Cfc11, "CFC-11", "trichlorofluoromethane"),
        (Gas.Cfc12, "CFC-12", "dichlorodifluoromethane"),
        (Gas.HydrogenSulfide, "H2S", "hydrogen sulfide"),
        (Gas.Ozone, "O3", "ozone"),
        (Gas.Ammonia, "NH3", "ammonia"),
        (Gas.Ethane, "C2H6", "ethane"),
    ];

    /// <summary>The formula: <c>O2</c>.</summary>
    public static string NameOf(Gas gas)
    {
        return Known.First(known => known.Gas == gas).Formula;
    }

    /// <summary>The gas of a formula or an English name, whatever the case.</summary>
    /// <param name="what">The option or key that it was given for.</param>
    /// <param name="name">What was given.</param>
    /// <exception cref="InputException">There is no such gas; the message lists those that there are.</exception>
    public static Gas Parse(string what, string name)
    {
        string given = name.Trim();
        foreach ((Gas gas, string formula, string english) in Known)
        {
            if (string.Equals(formula, given, StringComparison.OrdinalIgnoreCase) || string.Equals(english, given, StringComparison.OrdinalIgnoreCase))
            {
                return gas;
            }
        }

        IEnumerable<string> names = Known.Select(static known => known.English).Concat(Known.Select(static known => known.Formula));
        throw new InputException($"{what} '{Wrong.Shown(given)}': no such gas{NearestName.DidYouMean(given, names)}; there are {string.Join(", ", Known.Select(static known => known.Formula))}");
    }
}
