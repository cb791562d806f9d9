using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>One ion of a brine.</summary>
/// <param name="Name">What it is called: <c>Na+</c>.</param>
/// <param name="MolesPerLitre">Its concentration, mol/L.</param>
public sealed record BrineIon(string Name, double MolesPerLitre)
{
    internal Ion Ion { get; init; }
}

/// <summary>
/// Water whose salts are not sea salt: the gas is driven out of fresh water by each ion (Weisenberger and Schumpe 1996). Its density is not known here, so nothing
/// is given per kilogram, and its vapour pressure is taken as that of fresh water.
/// </summary>
public sealed class Brine
{
    private const double LnTen = 2.302585092994046;
    private const double MicromolesPerMole = 1e6;

    /// <summary>How far the charges may miss one another before it is worth a word: 5 % of all of them, a usual limit of water analyses (common practice, no source).</summary>
    private const double ChargeBalance = 0.05;

    private Brine(IReadOnlyList<BrineIon> ions)
    {
        Ions = ions;
    }

    /// <summary>The ions in the order given.</summary>
    public IReadOnlyList<BrineIon> Ions { get; }

    /// <summary>
    /// Relative standard uncertainty of what the ions leave: that of a salt's constant for each mol/L of salt. The salt is the scarcer of cations and anions, or
    /// what there is where only one side is given.
    /// </summary>
    internal double RelativeUncertainty
    {
        get
        {
            double cations = Ions.Where(static ion => 0 < IonNames.ChargeOf(ion.Ion)).Sum(static ion => ion.MolesPerLitre);
            double anions = Ions.Where(static ion => IonNames.ChargeOf(ion.Ion) < 0).Sum(static ion => ion.MolesPerLitre);
            double salt = cations == 0 || anions == 0 ? Math.Max(cations, anions) : Math.Min(cations, anions);
            return LnTen * SaltingOutWeisenbergerSchumpe1996.ConstantUncertaintyLitresPerMole * salt;
        }
    }

    /// <summary>What is unusual about the ions; null when nothing is.</summary>
    internal string? Note
    {
        get
        {
            double sum = Ions.Sum(static ion => IonNames.ChargeOf(ion.Ion) * ion.MolesPerLitre);
            double all = Ions.Sum(static ion => Math.Abs(IonNames.ChargeOf(ion.Ion)) * ion.MolesPerLitre);
            return ChargeBalance * all < Math.Abs(sum)
                ? string.Create(CultureInfo.InvariantCulture, $"--ions: their charges leave {sum:+0.###;-0.###} mol/L over; is an ion missing?")
                : null;
        }
    }

    /// <summary>What the ions leave of the fresh-water concentration at the same partial pressure.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="celsius">Temperature, °C.</param>
    /// <param name="rule">Near edge or extrapolate.</param>
    /// <param name="factor">The factor; NaN where there is none.</param>
    /// <param name="perKelvin">Its change with temperature, 1/K.</param>
    internal Status Factor(Gas gas, double celsius, RangeRule rule, out double factor, out double perKelvin)
    {
        double sum = 0;
        double slope = 0;
        Status found = Status.Ok;
        foreach (BrineIon ion in Ions)
        {
            Status status = SaltingOutWeisenbergerSchumpe1996.Term(ion.Ion, gas, celsius, ion.MolesPerLitre, rule, out double term);
            SaltingOutWeisenbergerSchumpe1996.Sensitivity(ion.Ion, gas, celsius, ion.MolesPerLitre, rule, out double termPerKelvin);
            found = status == Status.Ok ? found : status;
            sum += term;
            slope += termPerKelvin;
        }

        SaltingOutWeisenbergerSchumpe1996.Factor(sum, out factor);
        perKelvin = -LnTen * slope * factor;
        return found;
    }

    /// <summary>Reads <c>Na+=0.5mol/L, Cl-=0.5mol/L</c>.</summary>
    /// <exception cref="InputException">It cannot be read, an ion is unknown, twice in it or above what the constants take.</exception>
    internal static Brine Read(string text)
    {
        List<BrineIon> ions = [];
        foreach (string part in text.Split([',', ';']))
        {
            int equals = part.IndexOf('=', StringComparison.Ordinal);
            if (equals < 0)
            {
                throw Wrong.Input("--ions", text, "write each ion with its concentration, for example \"Na+=0.5mol/L, Cl-=0.5mol/L\"");
            }

            Ion ion = IonNames.Parse("--ions", part[..equals]);
            string name = IonNames.NameOf(ion);
            string amount = part[(equals + 1)..].Trim();
            double moles = Quantity.Parse(QuantityKind.AmountConcentration, "--ions " + name, amount) / MicromolesPerMole;
            if (moles < 0 || SaltingOutWeisenbergerSchumpe1996.HighestMolesPerLitre < moles)
            {
                throw Wrong.Input("--ions " + name, amount, $"the salting-out constants (weisenberger-schumpe-1996) take 0 to {Number.Print(SaltingOutWeisenbergerSchumpe1996.HighestMolesPerLitre)} mol/L of an ion");
            }

            if (ions.Exists(known => known.Ion == ion))
            {
                throw Wrong.Input("--ions", text, name + " is in it twice");
            }

            ions.Add(new BrineIon(name, moles) { Ion = ion });
        }

        return new Brine(ions);
    }
}
