using System;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>From titres to the concentration at the point: mean and scatter, Core's arithmetic, and the water's change of volume since the samples were drawn.</summary>
internal static class TitrationReference
{
    private const string ScatterSource = "scatter of the titres, enlarged by Student's t for their number (JCGM 100, table G.2)";

    /// <summary>The titrant's concentration from its standardisation.</summary>
    /// <param name="standardisation">As entered.</param>
    /// <param name="buretteMillilitres">Standard uncertainty of the burette, mL.</param>
    /// <exception cref="InputException">No concentration comes of it.</exception>
    internal static RecordedQuantity Titrant(RecordedStandardisation standardisation, double buretteMillilitres)
    {
        double titre = Mean("standardisation", standardisation.TitreMillilitres, standardisation.Blank.Value);
        double volume = standardisation.StandardVolume.Value;
        double normality = standardisation.StandardNormality.Value;
        Status status = WinklerTitration.Titrant(volume, normality, titre, standardisation.Blank.Value, out double concentration);
        if (status != Status.Ok)
        {
            throw new InputException($"standardisation: {Number.Print(volume)} mL of {Number.Print(normality)} mol/L against {Number.Print(titre)} mL gives no concentration of the titrant ({status})");
        }

        _ = WinklerTitration.TitrantSensitivities(
            volume, normality, titre, standardisation.Blank.Value, out double perVolume, out double perNormality, out double perTitre);
        double uncertainty = PointMaker.Combine(
            perVolume * standardisation.StandardVolume.StandardUncertainty,
            perNormality * standardisation.StandardNormality.StandardUncertainty,
            perTitre * Scatter(standardisation.TitreMillilitres),
            perTitre * buretteMillilitres,
            perTitre * standardisation.Blank.StandardUncertainty);
        return new RecordedQuantity { Value = concentration, Unit = "mol/L", StandardUncertainty = uncertainty, Source = "standardisation" };
    }

    internal static ReferenceSum Sum(References.Place at, RecordedTitration titration)
    {
        if (at.Gas != Gas.Oxygen)
        {
            throw References.Missing(at.Plan, $"this titration is one of oxygen, and the probe is one of {GasNames.NameOf(at.Gas)}");
        }

        double titre = Mean("titration", titration.TitreMillilitres, titration.Blank.Value);
        double aliquot = titration.Aliquot?.Value ?? double.NaN;
        Status status = WinklerTitration.MilligramsPerLitre(
            titre, titration.Blank.Value, titration.Titrant.Value, titration.Flask.Value, aliquot, titration.Displaced.Value, titration.ReagentOxygenMilligrams.Value, out double drawn);
        if (status != Status.Ok)
        {
            throw References.Missing(at.Plan, Refusal(status, titration, titre));
        }

        _ = WinklerTitration.MilligramsPerLitreSensitivities(
            titre, titration.Blank.Value, titration.Titrant.Value, titration.Flask.Value, aliquot, titration.Displaced.Value, titration.ReagentOxygenMilligrams.Value,
            out double perTitre, out double perTitrant, out double perFlask, out double perAliquot, out double perDisplaced, out double perReagent);
        double swelling = Swelling(at, titration.DrawCelsius, out double swellingPerKelvin);
        ReferenceSum sum = TransferReference.OfConcentration(at, drawn * swelling, drawn * swellingPerKelvin, out double hectopascal);
        Add(ReferenceInputs.Titre, Quantity(titre, Scatter(titration.TitreMillilitres), ScatterSource), perTitre);
        Add(ReferenceInputs.Burette, Quantity(0, titration.BuretteStandardUncertaintyMillilitres, BuretteSource(titration, titre)), perTitre);
        Add(ReferenceInputs.Blank, titration.Blank, -perTitre);
        Add(ReferenceInputs.Titrant, titration.Titrant, perTitrant);
        Add(ReferenceInputs.Flask, titration.Flask, perFlask);
        if (titration.Aliquot is RecordedQuantity part)
        {
            Add(ReferenceInputs.Aliquot, part, perAliquot);
        }

        Add(ReferenceInputs.Displaced, titration.Displaced, perDisplaced);
        Add(ReferenceInputs.ReagentOxygen, titration.ReagentOxygenMilligrams, perReagent);
        return sum;

        void Add(string name, RecordedQuantity quantity, double milligrams)
        {
            sum.Add(name, quantity, milligrams * swelling * hectopascal, milligrams * swelling);
        }

        static RecordedQuantity Quantity(double value, double uncertainty, string source)
        {
            return new RecordedQuantity { Value = value, Unit = "mL", StandardUncertainty = uncertainty, Source = source };
        }
    }

    /// <summary>Standard uncertainty of the mean of a few titres from their scatter, mL; 0 for titres that are all alike.</summary>
    internal static double Scatter(double[] titres)
    {
        double mean = titres.Average();
        double squares = titres.Sum(titre => (titre - mean) * (titre - mean));
        return MethodDefaults.FewTitres(titres.Length) * Math.Sqrt(squares / (titres.Length - 1) / titres.Length);
    }

    /// <summary>Mean of the titres, each judged.</summary>
    /// <exception cref="InputException">There are too few, or one cannot be.</exception>
    internal static double Mean(string what, double[] titres, double blank)
    {
        if (titres.Length < MethodFacts.LeastTitres)
        {
            throw new InputException($"{what}: {Count(titres.Length)}; a scatter needs {MethodFacts.LeastTitres} or more ({MethodFacts.UsualTitresSource})");
        }

        foreach (double titre in titres)
        {
            if (!(0 <= titre))
            {
                throw new InputException($"{what}: a titre of {Number.Print(titre)} mL cannot be; titres are zero or above");
            }

            if (titre < blank)
            {
                throw new InputException($"{what}: a titre of {Number.Print(titre)} mL is below the blank of {Number.Print(blank)} mL; look at burette and blank");
            }
        }

        return titres.Average();
    }

    /// <summary>Density at the point over density when the samples were drawn: the same oxygen in the litre that the water is now.</summary>
    private static double Swelling(References.Place at, double drawCelsius, out double perKelvin)
    {
        Status drawn = DensityEos80.Density(drawCelsius, at.Salinity, RangeRule.Refuse, out double then);
        if (drawn != Status.Ok)
        {
            throw References.Missing(at.Plan, $"samples drawn at {Number.Print(drawCelsius)} C, salinity {Number.Print(at.Salinity)}: there is no density of such water ({drawn})");
        }

        at.Require(DensityEos80.Density(at.Celsius, at.Salinity, RangeRule.Refuse, out double now));
        at.Require(DensityEos80.Sensitivities(at.Celsius, at.Salinity, RangeRule.Refuse, out double nowPerKelvin, out _));
        perKelvin = nowPerKelvin / then;
        return now / then;
    }

    private static string BuretteSource(RecordedTitration titration, double titre)
    {
        return titration.BuretteStandardUncertaintyMillilitres == MethodDefaults.BuretteRelative * titre ? MethodDefaults.BuretteSource : "entered";
    }

    private static string Refusal(Status status, RecordedTitration titration, double titre)
    {
        return status switch
        {
            Status.ConcentrationBelowRange =>
                $"a titre of {Number.Print(titre)} mL is less oxygen than the reagents brought in ({Number.Print(titration.ReagentOxygenMilligrams.Value)} mg); a titration is not for water so poor ({MethodFacts.TitrationLowestSource}: not below {Number.Print(MethodFacts.TitrationLowestMicromolesPerKilogram)} umol/kg)",
            Status.VolumeBelowRange =>
                $"a flask of {Number.Print(titration.Flask.Value)} mL from which {Number.Print(titration.Displaced.Value)} mL were displaced holds no sample; the flask is larger than what the reagents displace, and an aliquot is above zero",
            Status.VolumeAboveRange =>
                $"an aliquot of {Number.Print(titration.Aliquot?.Value ?? double.NaN)} mL is more than the flask of {Number.Print(titration.Flask.Value)} mL",
            Status.CoefficientBelowRange => $"a titrant of {Number.Print(titration.Titrant.Value)} mol/L titrates nothing; its concentration is above zero",
            _ => $"no concentration comes of a titre of {Number.Print(titre)} mL ({status})",
        };
    }

    private static string Count(int count)
    {
        return count == 1 ? "one titre" : count == 0 ? "no titre" : Number.Print(count) + " titres";
    }
}
