using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// A reference titration as lines of text. Titres (<c>--titres</c>): <c>8.02mL,8.05mL,8.03mL</c>, two or more. The rest (<c>--titration</c>): keywords with values in any order,
/// <c>flask 300.2mL u 0.1mL titrant 0.02501mol/L u 0.00003mol/L drawn 20.1C [blank 0.01mL u 0.005mL] [aliquot 201mL] [displaced 2mL] [reagents 0.0024mg] [burette u 0.01mL]</c>. Titrant: its
/// concentration, the id of one in the register, or nothing when <c>--standardisation</c> is given: <c>volume 10mL normality 0.01mol/L titres 9.98mL 9.99mL 9.97mL [blank 0.02mL]</c>.
/// </summary>
/// <remarks>
/// Uncertainties by <c>u</c> (standard) or <c>within</c> (limits); what is left out is that of <see cref="MethodDefaults"/>. Aliquot: what was titrated out of the flask; without it the whole flask was. A bottle of 300 mL
/// of which 201 mL are titrated is <c>flask 300mL aliquot 201mL displaced 2mL</c>: the 2 mL are then counted once, here. Normality: equivalents of electrons, six times the amount concentration of
/// KIO3, twelve times that of KH(IO3)2. The saved form is the record itself, so there is no way back to text.
/// </remarks>
public static class TitrationText
{
    private const string Flask = "flask";
    private const string Titrant = "titrant";
    private const string Drawn = "drawn";
    private const string Blank = "blank";
    private const string Aliquot = "aliquot";
    private const string Displaced = "displaced";
    private const string Reagents = "reagents";
    private const string Burette = "burette";
    private const string Volume = "volume";
    private const string Normality = "normality";
    private const string Titres = "titres";
    private const string WantedDetails = "write for example 'flask 300.2mL titrant 0.025mol/L u 0.0001mol/L drawn 20.1C blank 0.01mL'";
    private const string WantedTitres = "write two or more, for example 8.02mL,8.05mL,8.03mL";
    private const string WantedStandardisation = "write for example 'volume 10mL normality 0.01mol/L titres 9.98mL 9.99mL 9.97mL blank 0.02mL'";

    private static readonly string[] DetailWords = [Flask, Titrant, Drawn, Blank, Aliquot, Displaced, Reagents, Burette];
    private static readonly string[] StandardisationWords = [Volume, Normality, Titres, Blank];

    /// <summary>Reads a titration or refuses it in one line that names the option at fault.</summary>
    /// <param name="titres">What stands behind <c>--titres</c>.</param>
    /// <param name="details">What stands behind <c>--titration</c>.</param>
    /// <param name="standardisation">What stands behind <c>--standardisation</c>; null when the titrant's concentration is known otherwise.</param>
    /// <param name="register">Concentration of a titrant by its id, mol/L; null from it for one that is not there, and null when there is no register.</param>
    /// <exception cref="InputException">Something of it is missing or wrong.</exception>
    public static RecordedTitration Parse(string titres, string details, string? standardisation, Func<string, RecordedQuantity?>? register = null)
    {
        double[] read = ParseTitres("--titres", titres);
        double titre = read.Average();
        Clauses clauses = new("--titration", details, WantedDetails);
        HashSet<string> seen = [];
        RecordedQuantity blank = NoBlank(titre);
        RecordedQuantity displaced = UsualDisplaced();
        RecordedQuantity? flask = null;
        RecordedQuantity? titrant = null;
        RecordedQuantity? aliquot = null;
        RecordedQuantity? reagents = null;
        double burette = MethodDefaults.BuretteRelative * titre;
        double drawn = double.NaN;
        while (!clauses.IsAtEnd)
        {
            switch (clauses.Keyword(DetailWords, seen))
            {
                case Flask:
                    flask = Positive(clauses, Flask, KnownVolume(clauses, Flask));
                    break;
                case Titrant:
                    titrant = Positive(clauses, Titrant, ParseTitrant(clauses, register));
                    break;
                case Drawn:
                    drawn = clauses.Plain(Drawn, QuantityKind.Temperature);
                    break;
                case Blank:
                    blank = ParseBlank(clauses, titre);
                    break;
                case Aliquot:
                    aliquot = Positive(clauses, Aliquot, KnownVolume(clauses, Aliquot));
                    break;
                case Displaced:
                    displaced = NotNegative(clauses, Displaced, clauses.Value(
                        Displaced, QuantityKind.Volume, "mL", static value => MethodDefaults.DisplacedRelative * value, MethodDefaults.DisplacedUncertaintySource));
                    break;
                case Reagents:
                    reagents = NotNegative(clauses, Reagents, clauses.Value(
                        Reagents, QuantityKind.Mass, "mg", static value => MethodDefaults.ReagentOxygenRelative * value, MethodDefaults.ReagentOxygenUncertaintySource));
                    break;
                default:
                    burette = clauses.Known(Burette, QuantityKind.Volume, 0, "mL", null, null).StandardUncertainty;
                    break;
            }
        }

        RecordedStandardisation? standard = standardisation == null ? null : ParseStandardisation("--standardisation", standardisation);
        if (standard != null && titrant != null)
        {
            throw clauses.Wrong("--standardisation gives the titrant's concentration; give one of the two");
        }

        RecordedTitration titration = new()
        {
            TitreMillilitres = read,
            Blank = blank,
            Titrant = titrant ?? (standard != null
                ? TitrationReference.Titrant(standard, burette)
                : throw clauses.Wrong("the concentration of the titrant is missing (titrant, or --standardisation)")),
            Standardisation = standard,
            Flask = flask ?? throw clauses.Wrong("the volume of the flask is missing"),
            Aliquot = aliquot,
            Displaced = displaced,
            ReagentOxygenMilligrams = reagents ?? UsualReagents(displaced.Value),
            BuretteStandardUncertaintyMillilitres = burette,
            DrawCelsius = !double.IsNaN(drawn) ? drawn : throw clauses.Wrong("the temperature at which the samples were drawn is missing (drawn)"),
        };
        Judge(clauses, titration);
        return titration;
    }

    /// <summary>Reads titres or refuses them in one line.</summary>
    /// <exception cref="InputException">One is no volume or negative, or there are fewer than two.</exception>
    public static double[] ParseTitres(string what, string text)
    {
        Clauses clauses = new(what, text, WantedTitres);
        List<double> titres = [];
        while (!clauses.IsAtEnd)
        {
            titres.Add(Titre(clauses));
        }

        return titres.Count < MethodFacts.LeastTitres
            ? throw clauses.Wrong($"one titre has no scatter, and nobody could say how good it is ({MethodFacts.UsualTitresSource})")
            : [.. titres];
    }

    private static RecordedStandardisation ParseStandardisation(string what, string text)
    {
        Clauses clauses = new(what, text, WantedStandardisation);
        HashSet<string> seen = [];
        RecordedQuantity? volume = null;
        RecordedQuantity? normality = null;
        RecordedQuantity? blank = null;
        List<double> titres = [];
        while (!clauses.IsAtEnd)
        {
            switch (clauses.Keyword(StandardisationWords, seen))
            {
                case Volume:
                    volume = Positive(clauses, Volume, KnownVolume(clauses, Volume));
                    break;
                case Normality:
                    normality = Positive(clauses, Normality, clauses.Value(
                        Normality, QuantityKind.TitrantConcentration, "mol/L", static value => MethodDefaults.VolumeRelative * value, MethodDefaults.StandardSource));
                    break;
                case Blank:
                    blank = ParseBlank(clauses, 0);
                    break;
                default:
                    while (clauses.IsNumberNext)
                    {
                        titres.Add(Titre(clauses));
                    }

                    break;
            }
        }

        if (titres.Count < MethodFacts.LeastTitres)
        {
            throw clauses.Wrong(titres.Count == 0 ? "the titres are missing" : "one titre has no scatter; titrate the standard at least twice");
        }

        RecordedStandardisation standardisation = new()
        {
            StandardVolume = volume ?? throw clauses.Wrong("the volume of the standard is missing"),
            StandardNormality = normality ?? throw clauses.Wrong("the normality of the standard is missing"),
            TitreMillilitres = [.. titres],
            Blank = blank is { UncertaintySource: null } given ? given : (blank ?? NoBlank(0)) with { StandardUncertainty = MethodDefaults.BlankRelative * titres.Average() },
        };
        BelowBlank(clauses, standardisation.TitreMillilitres, standardisation.Blank.Value);
        return standardisation;
    }

    private static RecordedQuantity ParseTitrant(Clauses clauses, Func<string, RecordedQuantity?>? register)
    {
        if (clauses.IsNumberNext)
        {
            return clauses.Value(Titrant, QuantityKind.TitrantConcentration, "mol/L", null, null);
        }

        string id = clauses.Next("the value of 'titrant' is missing");
        return register?.Invoke(id) ?? throw clauses.Wrong(register == null
            ? $"'{Wrong.Shown(id)}' is no concentration of a titrant"
            : $"'{Wrong.Shown(id)}' is no concentration, and the register holds no titrant of that id");
    }

    private static RecordedQuantity ParseBlank(Clauses clauses, double titre)
    {
        return clauses.Value(Blank, QuantityKind.Volume, "mL", _ => MethodDefaults.BlankRelative * titre, MethodDefaults.BlankSource);
    }

    private static RecordedQuantity KnownVolume(Clauses clauses, string name)
    {
        return clauses.Value(name, QuantityKind.Volume, "mL", static value => MethodDefaults.VolumeRelative * value, MethodDefaults.VolumeSource);
    }

    private static RecordedQuantity NoBlank(double titre)
    {
        return new RecordedQuantity { Value = 0, Unit = "mL", StandardUncertainty = MethodDefaults.BlankRelative * titre, Source = "default", UncertaintySource = MethodDefaults.BlankSource };
    }

    private static RecordedQuantity UsualDisplaced()
    {
        return new RecordedQuantity
        {
            Value = MethodDefaults.DisplacedMillilitres,
            Unit = "mL",
            StandardUncertainty = MethodDefaults.DisplacedRelative * MethodDefaults.DisplacedMillilitres,
            Source = MethodDefaults.DisplacedSource,
            UncertaintySource = MethodDefaults.DisplacedUncertaintySource,
        };
    }

    /// <summary>Oxygen in proportion to the volume of reagents.</summary>
    private static RecordedQuantity UsualReagents(double displaced)
    {
        double milligrams = WinklerTitration.ReagentOxygenMilligrams * displaced / MethodDefaults.DisplacedMillilitres;
        return new RecordedQuantity
        {
            Value = milligrams,
            Unit = "mg",
            StandardUncertainty = MethodDefaults.ReagentOxygenRelative * milligrams,
            Source = MethodDefaults.ReagentOxygenSource,
            UncertaintySource = MethodDefaults.ReagentOxygenUncertaintySource,
        };
    }

    private static double Titre(Clauses clauses)
    {
        double titre = clauses.Plain("titre", QuantityKind.Volume);
        return 0 <= titre ? titre : throw clauses.Wrong($"a titre of {Number.Print(titre)} mL cannot be; titres are zero or above");
    }

    private static void Judge(Clauses clauses, RecordedTitration titration)
    {
        BelowBlank(clauses, titration.TitreMillilitres, titration.Blank.Value);
        if (titration.Flask.Value <= titration.Displaced.Value)
        {
            throw clauses.Wrong($"a flask of {Number.Print(titration.Flask.Value)} mL from which the reagents displaced {Number.Print(titration.Displaced.Value)} mL holds no sample");
        }

        if (titration.Flask.Value < titration.Aliquot?.Value)
        {
            throw clauses.Wrong($"an aliquot of {Number.Print(titration.Aliquot.Value)} mL is more than the flask of {Number.Print(titration.Flask.Value)} mL");
        }
    }

    private static void BelowBlank(Clauses clauses, double[] titres, double blank)
    {
        foreach (double titre in titres)
        {
            if (titre < blank)
            {
                throw clauses.Wrong($"a titre of {Number.Print(titre)} mL is below the blank of {Number.Print(blank)} mL; look at burette and blank");
            }
        }
    }

    private static RecordedQuantity Positive(Clauses clauses, string name, RecordedQuantity quantity)
    {
        return 0 < quantity.Value ? quantity : throw clauses.Wrong($"'{name}' {Number.Print(quantity.Value)} {quantity.Unit} cannot be; it is above zero");
    }

    private static RecordedQuantity NotNegative(Clauses clauses, string name, RecordedQuantity quantity)
    {
        return 0 <= quantity.Value ? quantity : throw clauses.Wrong($"'{name}' {Number.Print(quantity.Value)} {quantity.Unit} cannot be; it is zero or above");
    }
}
