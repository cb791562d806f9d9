using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// A reference titration as one line: the titres, then keywords with values in any order. <c>8.02mL,8.05mL,8.03mL flask 300.2mL u 0.1mL titrant 0.02501mol/L u 0.00003mol/L drawn 20.1C</c>, and
/// where wanted <c>blank 0.01mL u 0.005mL</c>, <c>aliquot 201mL</c>, <c>displaced 2mL</c>, <c>reagents 0.0024mg</c>, <c>burette u 0.01mL</c>. The titrant is its concentration, the id of one in the
/// register, or what its standardisation says: <c>standard 10mL normality 0.01mol/L against 9.98mL 9.99mL 9.97mL [standard-blank 0.02mL]</c>.
/// </summary>
/// <remarks>
/// Two titres or more. Uncertainties by <c>u</c> (standard) or <c>within</c> (limits); what is left out is that of <see cref="MethodDefaults"/>. Aliquot: what was titrated out of the flask; without it the
/// whole flask was. A bottle of 300 mL of which 201 mL are titrated is <c>flask 300mL aliquot 201mL displaced 2mL</c>: the 2 mL are then counted once, here. Drawn: temperature of the samples
/// when they were drawn. Normality: equivalents of electrons, six times the amount concentration of KIO3, twelve times that of KH(IO3)2.
/// </remarks>
internal static class TitrationText
{
    private const string Flask = "flask";
    private const string Titrant = "titrant";
    private const string Drawn = "drawn";
    private const string Blank = "blank";
    private const string Aliquot = "aliquot";
    private const string Displaced = "displaced";
    private const string Reagents = "reagents";
    private const string Burette = "burette";
    private const string Standard = "standard";
    private const string Normality = "normality";
    private const string Against = "against";
    private const string StandardBlank = "standard-blank";
    private const string Wanted = "write for example '8.02mL,8.05mL,8.03mL flask 300.2mL titrant 0.025mol/L u 0.0001mol/L drawn 20.1C blank 0.01mL'";

    private static readonly string[] Words = [Flask, Titrant, Drawn, Blank, Aliquot, Displaced, Reagents, Burette, Standard, Normality, Against, StandardBlank];

    /// <summary>Reads a titration or refuses it in one line.</summary>
    /// <param name="what">The option or key it was given for.</param>
    /// <param name="text">What was given.</param>
    /// <param name="register">Concentration of a titrant by its id, mol/L; null from it for one that is not there, and null when there is no register.</param>
    /// <exception cref="InputException">Something of it is missing or wrong.</exception>
    public static RecordedTitration Parse(string what, string text, Func<string, RecordedQuantity?>? register = null)
    {
        Clauses clauses = new(what, text, Wanted);
        double[] titres = Titres(clauses, "the titres come first");
        double titre = titres.Average();
        HashSet<string> seen = [];
        RecordedQuantity blank = NoBlank(titre);
        RecordedQuantity displaced = UsualDisplaced();
        RecordedQuantity? flask = null;
        RecordedQuantity? titrant = null;
        RecordedQuantity? aliquot = null;
        RecordedQuantity? reagents = null;
        RecordedQuantity? standard = null;
        RecordedQuantity? normality = null;
        RecordedQuantity? standardBlank = null;
        double[] against = [];
        double burette = MethodDefaults.BuretteRelative * titre;
        double drawn = double.NaN;
        while (!clauses.IsAtEnd)
        {
            switch (clauses.Keyword(Words, seen))
            {
                case Flask:
                    flask = KnownVolume(clauses, Flask);
                    break;
                case Titrant:
                    titrant = Positive(clauses, Titrant, ParseTitrant(clauses, register));
                    break;
                case Drawn:
                    drawn = clauses.Plain(Drawn, QuantityKind.Temperature);
                    break;
                case Blank:
                    blank = ParseBlank(clauses, Blank, titre);
                    break;
                case Aliquot:
                    aliquot = KnownVolume(clauses, Aliquot);
                    break;
                case Displaced:
                    displaced = NotNegative(clauses, Displaced, clauses.Value(
                        Displaced, QuantityKind.Volume, "mL", static value => MethodDefaults.DisplacedRelative * value, MethodDefaults.DisplacedUncertaintySource));
                    break;
                case Reagents:
                    reagents = NotNegative(clauses, Reagents, clauses.Value(
                        Reagents, QuantityKind.Mass, "mg", static value => MethodDefaults.ReagentOxygenRelative * value, MethodDefaults.ReagentOxygenUncertaintySource));
                    break;
                case Burette:
                    burette = clauses.Known(Burette, QuantityKind.Volume, 0, "mL", null, null).StandardUncertainty;
                    break;
                case Standard:
                    standard = KnownVolume(clauses, Standard);
                    break;
                case Normality:
                    normality = Positive(clauses, Normality, clauses.Value(
                        Normality, QuantityKind.TitrantConcentration, "mol/L", static value => MethodDefaults.VolumeRelative * value, MethodDefaults.StandardSource));
                    break;
                case StandardBlank:
                    standardBlank = ParseBlank(clauses, StandardBlank, titre);
                    break;
                default:
                    against = Titres(clauses, "the titres of the standard are missing");
                    break;
            }
        }

        RecordedStandardisation? standardisation = Standardisation(clauses, standard, normality, against, standardBlank);
        if (standardisation != null && titrant != null)
        {
            throw clauses.Wrong("titrant and standard both give the titrant's concentration; give one of the two");
        }

        RecordedTitration titration = new()
        {
            TitreMillilitres = titres,
            Blank = blank,
            Titrant = titrant ?? (standardisation != null
                ? TitrationReference.Titrant(standardisation, burette)
                : throw clauses.Wrong("the concentration of the titrant is missing (titrant, or standard with normality and against)")),
            Standardisation = standardisation,
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

    /// <summary>None of its four parts, or all that it needs.</summary>
    private static RecordedStandardisation? Standardisation(
        Clauses clauses, RecordedQuantity? volume, RecordedQuantity? normality, double[] titres, RecordedQuantity? blank)
    {
        if (volume == null && normality == null && titres.Length == 0 && blank == null)
        {
            return null;
        }

        if (titres.Length == 0)
        {
            throw clauses.Wrong("the titres of the standard are missing (against)");
        }

        double titre = titres.Average();
        RecordedStandardisation standardisation = new()
        {
            StandardVolume = volume ?? throw clauses.Wrong("the volume of the standard is missing (standard)"),
            StandardNormality = normality ?? throw clauses.Wrong("the normality of the standard is missing (normality)"),
            TitreMillilitres = titres,
            // A blank's usual uncertainty is a share of the titre that it is taken from.
            Blank = blank == null ? NoBlank(titre)
                : blank.UncertaintySource == MethodDefaults.BlankSource ? blank with { StandardUncertainty = MethodDefaults.BlankRelative * titre }
                : blank,
        };
        BelowBlank(clauses, titres, standardisation.Blank.Value);
        return standardisation;
    }

    private static double[] Titres(Clauses clauses, string missing)
    {
        List<double> titres = [];
        while (clauses.IsNumberNext)
        {
            double titre = clauses.Plain("titre", QuantityKind.Volume);
            titres.Add(0 <= titre ? titre : throw clauses.Wrong($"a titre of {Number.Print(titre)} mL cannot be; titres are zero or above"));
        }

        return titres.Count switch
        {
            0 => throw clauses.Wrong(missing),
            1 => throw clauses.Wrong($"one titre has no scatter, and nobody could say how good it is; give two or more ({MethodFacts.UsualTitresSource})"),
            _ => [.. titres],
        };
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

    private static RecordedQuantity ParseBlank(Clauses clauses, string name, double titre)
    {
        return clauses.Value(name, QuantityKind.Volume, "mL", _ => MethodDefaults.BlankRelative * titre, MethodDefaults.BlankSource);
    }

    private static RecordedQuantity KnownVolume(Clauses clauses, string name)
    {
        return Positive(clauses, name, clauses.Value(name, QuantityKind.Volume, "mL", static value => MethodDefaults.VolumeRelative * value, MethodDefaults.VolumeSource));
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
