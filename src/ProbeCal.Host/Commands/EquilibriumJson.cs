using System;
using System.Collections.Generic;
using System.IO;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Host.Commands;

/// <summary>An equilibrium printed for programs; the fields are in <c>docs/schemas/equilibrium.schema.json</c>.</summary>
internal static class EquilibriumJson
{
    private static readonly (EquilibriumQuantity Quantity, string Name)[] Equilibrium =
    [
        (EquilibriumQuantity.VapourPressure, "vapourPressureHPa"),
        (EquilibriumQuantity.PartialPressure, "partialPressureHPa"),
        (EquilibriumQuantity.MilligramsPerLitre, "mgPerL"),
        (EquilibriumQuantity.MicromolesPerLitre, "umolPerL"),
        (EquilibriumQuantity.MicromolesPerKilogram, "umolPerKg"),
        (EquilibriumQuantity.MillilitresPerLitre, "mLPerL"),
        (EquilibriumQuantity.PercentOfOneAtmosphere, "percentOfOneAtmosphere"),
    ];

    private static readonly (EquilibriumQuantity Quantity, string Name)[] Measurement =
    [
        (EquilibriumQuantity.MeasuredMilligramsPerLitre, "mgPerL"),
        (EquilibriumQuantity.MeasuredMicromolesPerLitre, "umolPerL"),
        (EquilibriumQuantity.MeasuredMicromolesPerKilogram, "umolPerKg"),
        (EquilibriumQuantity.MeasuredMillilitresPerLitre, "mLPerL"),
        (EquilibriumQuantity.MeasuredPartialPressure, "partialPressureHPa"),
        (EquilibriumQuantity.PercentLocal, "percentLocal"),
        (EquilibriumQuantity.PercentOneAtmosphere, "percentOneAtmosphere"),
        (EquilibriumQuantity.ExcessMilligramsPerLitre, "excessMgPerL"),
    ];

    // The degree sign and the like stand as they are: the output is UTF-8 and goes into no web page unescaped.
    private static readonly JsonWriterOptions Options = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    internal static string Of(GasAtEquilibrium r, MonteCarloReport? check)
    {
        using MemoryStream bytes = new();
        using (Utf8JsonWriter w = new(bytes, Options))
        {
            w.WriteStartObject();
            Conditions(w, r.Asked);
            if (r.SaltingOutFactor is double factor)
            {
                w.WriteNumber("saltingOutFactor", factor);
            }

            Values(w, r, Equilibrium);
            StandardUncertainty(w, r);
            Intervals(w, r, Equilibrium);
            Sensitivities(w, r);
            Budget(w, r, Equilibrium);
            Saturation(w, r);
            Measured(w, r);
            Depth(w, r);
            Source(w, r);
            Check(w, check);
            w.WriteStartArray("flags");
            foreach (EquilibriumFlag flag in r.Flags)
            {
                w.WriteStartObject();
                w.WriteString("code", flag.Code);
                w.WriteString("text", flag.Text);
                w.WriteEndObject();
            }

            w.WriteEndArray();
            w.WriteStartArray("notes");
            foreach (string note in r.Asked.Notes)
            {
                w.WriteStringValue(note);
            }

            w.WriteEndArray();
            w.WriteEndObject();
        }

        return Encoding.UTF8.GetString(bytes.GetBuffer(), 0, (int)bytes.Length);
    }

    private static void Conditions(Utf8JsonWriter w, EquilibriumCase c)
    {
        w.WriteString("format", "probecal-equilibrium");
        w.WriteNumber("version", 2);
        w.WriteString("gas", GasNames.NameOf(c.Gas));
        w.WriteString("equation", EquationNames.NameOf(c.Equation));
        w.WriteNumber("temperatureC", c.Temperature.Value);
        w.WriteNumber("salinity", c.Water.Salinity);
        w.WriteString("salinitySource", WaterWords.SourceName(c.Water.Source));
        if (c.Water.Brine is Brine brine)
        {
            w.WriteStartObject("ions");
            foreach (BrineIon ion in brine.Ions)
            {
                w.WriteNumber(ion.Name, ion.MolesPerLitre);
            }

            w.WriteEndObject();
        }
        else if (c.Water.Source != SalinitySource.Given)
        {
            w.WriteStartObject("salinityFrom");
            w.WriteNumber("value", c.Water.Given.Value);
            w.WriteString("unit", c.Water.GivenUnit);
            w.WriteNumber("standardUncertainty", c.Water.Given.StandardUncertainty);
            if (c.Water.ConductivityTemperature is UncertainQuantity cell)
            {
                w.WriteNumber("temperatureC", cell.Value);
            }

            w.WriteEndObject();
        }

        w.WriteNumber("pressureHPa", c.Pressure.Value);
        w.WriteString("pressureSource", c.PressureSource);
        w.WriteStartObject("gasPhase");
        w.WriteString("kind", c.Phase.Kind switch { GasPhaseKind.Air => "air", GasPhaseKind.Mixture => "mixture", _ => "partial-pressure" });
        if (c.Phase.Kind != GasPhaseKind.PartialPressure)
        {
            w.WriteNumber("moleFraction", c.Phase.MoleFraction.Value);
            w.WriteString("moleFractionSource", c.Phase.Kind == GasPhaseKind.Mixture ? "mixture" : c.Phase.FractionAssumed ? "usual" : "given");
            w.WriteNumber("humidityPercent", c.Phase.HumidityPercent.Value);
            w.WriteString("humiditySource", c.Phase.HumidityAssumed ? "assumed" : "given");
        }

        if (c.Phase.Kind == GasPhaseKind.Mixture)
        {
            w.WriteStartObject("mixture");
            foreach (MixturePart part in c.Phase.Parts)
            {
                w.WriteNumber(GasNames.NameOf(part.Gas), part.MoleFraction);
            }

            w.WriteEndObject();
            w.WriteNumber("unnamed", c.Phase.Unnamed);
        }

        w.WriteEndObject();
    }

    private static void Values(Utf8JsonWriter w, GasAtEquilibrium r, (EquilibriumQuantity Quantity, string Name)[] list)
    {
        foreach ((EquilibriumResult value, string name) in Present(r, list))
        {
            w.WriteNumber(name, value.Value);
        }
    }

    private static void StandardUncertainty(Utf8JsonWriter w, GasAtEquilibrium r)
    {
        EquilibriumCase c = r.Asked;
        w.WriteStartObject("standardUncertainty");
        Uncertainties(w, r, Equilibrium);
        w.WriteNumber("temperatureK", c.Temperature.StandardUncertainty);
        w.WriteNumber("salinity", c.Water.SalinityUncertainty);
        w.WriteNumber("pressureHPa", c.Pressure.StandardUncertainty);
        if (c.Phase.Kind != GasPhaseKind.PartialPressure)
        {
            w.WriteNumber("moleFraction", c.Phase.MoleFraction.StandardUncertainty);
            w.WriteNumber("humidityPercent", c.Phase.HumidityPercent.StandardUncertainty);
        }

        w.WriteNumber("equationRelative", r.EquationRelative);
        if (c.Water.Brine is not null)
        {
            w.WriteNumber("saltingOutRelative", r.SaltingOutRelative);
        }

        w.WriteEndObject();
    }

    private static void Uncertainties(Utf8JsonWriter w, GasAtEquilibrium r, (EquilibriumQuantity Quantity, string Name)[] list)
    {
        foreach ((EquilibriumResult value, string name) in Present(r, list))
        {
            w.WriteNumber(name, value.StandardUncertainty);
        }
    }

    private static void Intervals(Utf8JsonWriter w, GasAtEquilibrium r, (EquilibriumQuantity Quantity, string Name)[] list)
    {
        w.WriteStartObject("interval95");
        foreach ((EquilibriumResult value, string name) in Present(r, list))
        {
            w.WriteStartObject(name);
            w.WriteNumber("low", value.Low);
            w.WriteNumber("high", value.High);
            w.WriteNumber("coverageFactor", value.CoverageFactor);
            if (value.Note is string note)
            {
                w.WriteString("note", note);
            }

            w.WriteEndObject();
        }

        w.WriteEndObject();
    }

    private static void Sensitivities(Utf8JsonWriter w, GasAtEquilibrium r)
    {
        w.WriteStartObject("sensitivities");
        One("mgPerL", r.ConcentrationSensitivities);
        One("partialPressureHPa", r.PartialPressureSensitivities);
        w.WriteEndObject();

        void One(string name, EquilibriumSensitivities s)
        {
            w.WriteStartObject(name);
            Number("perKelvin", s.PerKelvin);
            Number("perSalinity", s.PerSalinity);
            Number("perHPa", s.PerHectopascal);
            Number("perMoleFraction", s.PerMoleFraction);
            Number("perHumidityPercent", s.PerHumidityPercent);
            Number("perPartialPressureHPa", s.PerPartialPressureHectopascal);
            w.WriteEndObject();
        }

        void Number(string name, double value)
        {
            if (double.IsFinite(value))
            {
                w.WriteNumber(name, Plain(value));
            }
        }
    }

    private static void Budget(Utf8JsonWriter w, GasAtEquilibrium r, (EquilibriumQuantity Quantity, string Name)[] list)
    {
        w.WriteStartObject("budget");
        foreach ((EquilibriumResult value, string name) in Present(r, list))
        {
            if (value.Quantity is not (EquilibriumQuantity.MilligramsPerLitre or EquilibriumQuantity.PartialPressure
                or EquilibriumQuantity.MeasuredPartialPressure or EquilibriumQuantity.PercentLocal or EquilibriumQuantity.ExcessMilligramsPerLitre))
            {
                // The others are the same in another unit.
                continue;
            }

            w.WriteStartArray(name);
            foreach (EquilibriumPart part in value.Parts)
            {
                w.WriteStartObject();
                w.WriteString("input", part.Input);
                w.WriteString("unit", part.Unit);
                w.WriteNumber("standardUncertainty", part.StandardUncertainty);
                w.WriteString("distribution", part.IsRectangular ? "rectangular" : "normal");
                w.WriteNumber("sensitivity", Plain(part.Sensitivity));
                w.WriteNumber("part", Plain(part.Part));
                w.WriteNumber("share", part.Share);
                w.WriteEndObject();
            }

            w.WriteEndArray();
        }

        w.WriteEndObject();
    }

    /// <summary>Which pressure each percentage refers to.</summary>
    private static void Saturation(Utf8JsonWriter w, GasAtEquilibrium r)
    {
        w.WriteStartObject("saturation");
        foreach ((EquilibriumQuantity quantity, string name, double pressure) in new[]
        {
            (EquilibriumQuantity.PercentOfOneAtmosphere, "percentOfOneAtmosphere", PressureUnits.HectopascalPerAtmosphere),
            (EquilibriumQuantity.PercentLocal, "percentLocal", r.Asked.Pressure.Value),
            (EquilibriumQuantity.PercentOneAtmosphere, "percentOneAtmosphere", PressureUnits.HectopascalPerAtmosphere),
        })
        {
            if (r.Find(quantity) is not null)
            {
                w.WriteStartObject(name);
                w.WriteNumber("referencePressureHPa", pressure);
                w.WriteString("reference", SaturationWords.Of(quantity, r.Asked));
                w.WriteEndObject();
            }
        }

        w.WriteEndObject();
    }

    private static void Measured(Utf8JsonWriter w, GasAtEquilibrium r)
    {
        if (r.Asked.Measured is not MeasuredConcentration measured)
        {
            return;
        }

        w.WriteStartObject("measured");
        w.WriteString("given", measured.Text);
        Values(w, r, Measurement);
        w.WriteStartObject("standardUncertainty");
        Uncertainties(w, r, Measurement);
        w.WriteEndObject();
        Intervals(w, r, Measurement);
        Budget(w, r, Measurement);
        w.WriteEndObject();
    }

    /// <summary>What a probe feels under water: the same concentration, a higher partial pressure.</summary>
    private static void Depth(Utf8JsonWriter w, GasAtEquilibrium r)
    {
        if (r.AtDepth is not ProbeDepth depth)
        {
            return;
        }

        w.WriteStartObject("depth");
        w.WriteNumber("depthM", depth.Metres);
        w.WriteNumber("hydrostaticPressureHPa", depth.HydrostaticHectopascal);
        w.WriteNumber("factor", depth.Factor);
        foreach ((EquilibriumQuantity quantity, string name) in new[] { (EquilibriumQuantity.PartialPressure, "partialPressureHPa"), (EquilibriumQuantity.MeasuredPartialPressure, "measuredPartialPressureHPa") })
        {
            if (r.Find(quantity) is EquilibriumResult surface)
            {
                UncertainQuantity felt = depth.Of(surface.Value, surface.StandardUncertainty);
                w.WriteNumber(name, felt.Value);
                w.WriteNumber(name + "StandardUncertainty", felt.StandardUncertainty);
            }
        }

        w.WriteEndObject();
    }

    private static void Source(Utf8JsonWriter w, GasAtEquilibrium r)
    {
        SolubilityEntry entry = Catalogue.Solubility(r.Asked.Gas, r.Asked.Equation)!;
        w.WriteStartObject("source");
        w.WriteString("equation", entry.Source.Name);
        w.WriteString("citation", entry.Source.Citation);
        w.WriteString("doi", entry.Source.Doi);
        w.WriteString("statedAccuracy", entry.StatedAccuracy);
        w.WriteString("evidence", entry.Evidence.Words);
        w.WriteBoolean("isDefault", entry.IsDefault);
        w.WriteStartObject("range");
        EquationRange range = r.Range;
        w.WriteNumber("lowestTemperatureC", range.LowestCelsius);
        w.WriteNumber("highestTemperatureC", range.HighestCelsius);
        w.WriteNumber("highestSalinity", range.HighestSalinity);
        w.WriteNumber("lowestPressureHPa", EquationRange.LowestHectopascal);
        w.WriteNumber("highestPressureHPa", range.HighestHectopascal);
        w.WriteEndObject();
        w.WriteEndObject();
    }

    private static void Check(Utf8JsonWriter w, MonteCarloReport? check)
    {
        if (check is null)
        {
            return;
        }

        w.WriteStartObject("monteCarlo");
        w.WriteNumber("seed", check.Seed);
        w.WriteStartArray("values");
        foreach (EquilibriumCheck value in check.Checks)
        {
            w.WriteStartObject();
            w.WriteString("value", NameOf(value.Quantity));
            w.WriteNumber("trials", value.Trials);
            w.WriteNumber("refused", value.Refused);
            w.WriteNumber("mean", value.Mean);
            w.WriteNumber("standardDeviation", value.StandardDeviation);
            w.WriteNumber("low", value.Low);
            w.WriteNumber("high", value.High);
            w.WriteEndObject();
        }

        w.WriteEndArray();
        w.WriteEndObject();
    }

    /// <summary>Zero without the minus sign that arithmetic may leave on it.</summary>
    private static double Plain(double value)
    {
        return value == 0 ? 0 : value;
    }

    private static string NameOf(EquilibriumQuantity quantity)
    {
        int at = Array.FindIndex(Equilibrium, entry => entry.Quantity == quantity);
        return 0 <= at ? Equilibrium[at].Name : "measured." + Array.Find(Measurement, entry => entry.Quantity == quantity).Name;
    }

    private static IEnumerable<(EquilibriumResult Value, string Name)> Present(GasAtEquilibrium r, (EquilibriumQuantity Quantity, string Name)[] list)
    {
        foreach ((EquilibriumQuantity quantity, string name) in list)
        {
            if (r.Find(quantity) is EquilibriumResult value)
            {
                yield return (value, name);
            }
        }
    }
}
