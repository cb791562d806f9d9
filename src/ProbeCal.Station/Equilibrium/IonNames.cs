using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>How ions are written: <c>Na+</c>, <c>SO4 2-</c>; also <c>SO42-</c>, <c>SO4--</c>, <c>SO4^2-</c> and with raised signs.</summary>
internal static class IonNames
{
    private static readonly (Ion Ion, string Formula, int Charge)[] Known =
    [
        (Ion.Hydrogen, "H", 1), (Ion.Lithium, "Li", 1), (Ion.Sodium, "Na", 1), (Ion.Potassium, "K", 1), (Ion.Rubidium, "Rb", 1), (Ion.Caesium, "Cs", 1),
        (Ion.Ammonium, "NH4", 1), (Ion.Magnesium, "Mg", 2), (Ion.Calcium, "Ca", 2), (Ion.Strontium, "Sr", 2), (Ion.Barium, "Ba", 2), (Ion.Manganese, "Mn", 2),
        (Ion.Iron2, "Fe", 2), (Ion.Cobalt, "Co", 2), (Ion.Nickel, "Ni", 2), (Ion.Copper, "Cu", 2), (Ion.Zinc, "Zn", 2), (Ion.Cadmium, "Cd", 2),
        (Ion.Aluminium, "Al", 3), (Ion.Chromium3, "Cr", 3), (Ion.Iron3, "Fe", 3), (Ion.Lanthanum, "La", 3), (Ion.Cerium3, "Ce", 3), (Ion.Thorium, "Th", 4),
        (Ion.Hydroxide, "OH", -1), (Ion.Hydrosulfide, "HS", -1), (Ion.Fluoride, "F", -1), (Ion.Chloride, "Cl", -1), (Ion.Bromide, "Br", -1), (Ion.Iodide, "I", -1),
        (Ion.Nitrite, "NO2", -1), (Ion.Nitrate, "NO3", -1), (Ion.Chlorate, "ClO3", -1), (Ion.Bromate, "BrO3", -1), (Ion.Iodate, "IO3", -1), (Ion.Perchlorate, "ClO4", -1),
        (Ion.Periodate, "IO4", -1), (Ion.Cyanide, "CN", -1), (Ion.Thiocyanate, "SCN", -1), (Ion.Hydrogenchromate, "HCrO4", -1), (Ion.Bicarbonate, "HCO3", -1),
        (Ion.DihydrogenPhosphate, "H2PO4", -1), (Ion.Bisulfite, "HSO3", -1), (Ion.Carbonate, "CO3", -2), (Ion.HydrogenPhosphate, "HPO4", -2), (Ion.Sulfite, "SO3", -2),
        (Ion.Sulfate, "SO4", -2), (Ion.Thiosulfate, "S2O3", -2), (Ion.Phosphate, "PO4", -3), (Ion.Hexacyanoferrate2, "Fe(CN)6", -4),
    ];

    /// <summary>The name it is printed with: <c>Na+</c>, <c>SO4 2-</c>.</summary>
    internal static string NameOf(Ion ion)
    {
        (_, string formula, int charge) = Known.First(known => known.Ion == ion);
        string sign = charge < 0 ? "-" : "+";
        // A digit at the end of the formula would run into the charge.
        string gap = char.IsAsciiDigit(formula[^1]) ? " " : "";
        return Math.Abs(charge) == 1 ? formula + sign : formula + gap + Number.Print(Math.Abs(charge)) + sign;
    }

    /// <summary>The charge in units of the elementary charge.</summary>
    internal static int ChargeOf(Ion ion)
    {
        return Known.First(known => known.Ion == ion).Charge;
    }

    /// <summary>The ion of a name, in any case of letters.</summary>
    /// <exception cref="InputException">There is no such ion; the message lists those that there are.</exception>
    internal static Ion Parse(string what, string text)
    {
        string given = Plain(text);
        foreach ((Ion ion, _, _) in Known)
        {
            if (string.Equals(Plain(NameOf(ion)), given, StringComparison.OrdinalIgnoreCase))
            {
                return ion;
            }
        }

        string[] names = [.. Known.Select(static known => NameOf(known.Ion))];
        throw Wrong.Input(what, text.Trim(), "no such ion is known here" + NearestName.DidYouMean(text.Trim(), names) + "; there are " + string.Join(", ", names));
    }

    /// <summary>Without blanks and hats, signs and digits on the line, repeated signs counted.</summary>
    private static string Plain(string text)
    {
        List<char> plain = [];
        foreach (char c in text)
        {
            if (c is ' ' or '^')
            {
                continue;
            }

            plain.Add(c switch { '⁺' => '+', '⁻' or '−' => '-', '¹' => '1', '²' => '2', '³' => '3', '⁴' => '4', _ => c });
        }

        int signs = 0;
        while (signs < plain.Count && plain[^(signs + 1)] is '+' or '-' && plain[^(signs + 1)] == plain[^1])
        {
            signs++;
        }

        string all = new([.. plain]);
        return signs < 2 ? all : all[..^signs] + Number.Print(signs) + all[^1];
    }
}
