using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Host.Commands;

/// <summary>An equilibrium printed for people at the water's edge: the number first, then what it rests on.</summary>
internal static class EquilibriumText
{
    /// <summary>Widest line, characters.</summary>
    internal const int Widest = 100;

    private const int LabelWidth = 19;

    internal static void Write(TextWriter output, GasAtEquilibrium r, MonteCarloReport? check)
    {
        EquilibriumCase c = r.Asked;
        output.WriteLine(MainLine(r));
        output.WriteLine();
        if (c.Measured is not null)
        {
            Rows(output, r,
            [
                ("measured", EquilibriumQuantity.MeasuredMilligramsPerLitre),
                ("", EquilibriumQuantity.MeasuredMicromolesPerLitre),
                ("", EquilibriumQuantity.MeasuredMicromolesPerKilogram),
                ("", EquilibriumQuantity.MeasuredMillilitresPerLitre),
                ("partial pressure", EquilibriumQuantity.MeasuredPartialPressure),
                ("saturation", EquilibriumQuantity.PercentLocal),
                ("", EquilibriumQuantity.PercentOneAtmosphere),
                ("excess", EquilibriumQuantity.ExcessMilligramsPerLitre),
            ]);
            output.WriteLine();
            output.WriteLine("  At equilibrium with the gas phase:");
        }

        Rows(output, r,
        [
            ("concentration", EquilibriumQuantity.MilligramsPerLitre),
            ("", EquilibriumQuantity.MicromolesPerLitre),
            ("", EquilibriumQuantity.MicromolesPerKilogram),
            ("", EquilibriumQuantity.MillilitresPerLitre),
            ("partial pressure", EquilibriumQuantity.PartialPressure),
            ("vapour pressure", EquilibriumQuantity.VapourPressure),
            ("saturation", EquilibriumQuantity.PercentOfOneAtmosphere),
        ]);
        output.WriteLine();
        Paragraph(output, "water", $"{WaterWords.Celsius(c.Temperature.Value)}, {WaterWords.Of(c.Water)}");
        Paragraph(output, "gas phase", Phase(c));
        if (r.AtDepth is ProbeDepth depth)
        {
            Paragraph(output, "at " + Number.Print(depth.Metres) + " m", Felt(r, depth));
        }

        Paragraph(output, "equation", Equation(r));
        Paragraph(output, "one more", Steps(r));
        Paragraph(output, "uncertainty", Budget(r));
        if (Exact(c) is string exact)
        {
            Paragraph(output, "", exact);
        }

        foreach (EquilibriumFlag flag in r.Flags)
        {
            Paragraph(output, "note", flag.Text);
        }

        Check(output, r, check);
    }

    /// <summary>The value that a check and a budget are about: of the water measured where there is one.</summary>
    private static EquilibriumResult Principal(GasAtEquilibrium r)
    {
        return r.Asked.Measured is null
            ? r.Value(EquilibriumQuantity.MilligramsPerLitre)
            : r.Find(EquilibriumQuantity.PercentLocal) ?? r.Value(EquilibriumQuantity.MeasuredPartialPressure);
    }

    private static string MainLine(GasAtEquilibrium r)
    {
        EquilibriumResult main = Principal(r);
        GasEntry gas = Catalogue.Gas(r.Asked.Gas);
        string name = string.Equals(gas.Name, gas.Symbol, StringComparison.OrdinalIgnoreCase) ? gas.Symbol : $"{gas.Symbol} ({gas.Name})";
        string value = Both(new UncertainNumber(main.Value, main.StandardUncertainty, EquilibriumUnits.Of(main.Quantity)));
        return main.Quantity switch
        {
            EquilibriumQuantity.PercentLocal => $"{value} of saturation with {name} at the local pressure, {Measured(r.Asked.Measured!)}",
            EquilibriumQuantity.MeasuredPartialPressure => $"{value} of {name} in the water, {Measured(r.Asked.Measured!)}",
            _ => $"{value} {name} in water in equilibrium with {Over(r.Asked.Phase)}",
        };
    }

    /// <summary>What was typed, 8.1mg/L, with the blank that print wants before a unit.</summary>
    private static string Measured(MeasuredConcentration measured)
    {
        int number = Number.LeadingLength(measured.Text);
        return $"measured {measured.Text[..number]} {measured.Text[number..].TrimStart()}";
    }

    private static string Over(GasPhase phase)
    {
        return phase.Kind switch
        {
            GasPhaseKind.Air => "air",
            GasPhaseKind.Mixture => "the gas mixture",
            _ => "the given partial pressure",
        };
    }

    private static string Both(UncertainNumber number)
    {
        return number.Uncertainty is null ? $"{number.Value} {number.Unit}" : $"{number.Value} ± {number.Uncertainty} {number.Unit}";
    }

    /// <summary>One line a value, decimal points under one another.</summary>
    private static void Rows(TextWriter output, GasAtEquilibrium r, (string Label, EquilibriumQuantity Quantity)[] wanted)
    {
        List<(string Label, UncertainNumber Number, string Extra)> rows = [];
        string label = "";
        foreach ((string given, EquilibriumQuantity quantity) in wanted)
        {
            label = given.Length == 0 ? label : given;
            if (r.Find(quantity) is EquilibriumResult value)
            {
                rows.Add((label, new UncertainNumber(value.Value, value.StandardUncertainty, EquilibriumUnits.Of(quantity)), Extra(r, value)));
                label = "";
            }
        }

        int whole = rows.Max(static row => Whole(row.Number.Value).Length);
        int fraction = rows.Max(static row => row.Number.Value.Length - Whole(row.Number.Value).Length);
        int uncertainty = rows.Max(static row => row.Number.Uncertainty is null ? 0 : row.Number.Uncertainty.Length + 2);
        foreach ((string name, UncertainNumber number, string extra) in rows)
        {
            string left = Whole(number.Value).PadLeft(whole);
            string value = (left + number.Value[Whole(number.Value).Length..]).PadRight(whole + fraction);
            string sure = (number.Uncertainty is null ? "" : "± " + number.Uncertainty).PadRight(uncertainty);
            output.WriteLine($"  {name.PadRight(LabelWidth - 2)}{value} {sure} {number.Unit,-8}{extra}".TrimEnd());
        }
    }

    private static string Whole(string number)
    {
        int point = number.IndexOf('.', StringComparison.Ordinal);
        return point < 0 ? number : number[..point];
    }

    private static string Extra(GasAtEquilibrium r, EquilibriumResult value)
    {
        return value.Quantity switch
        {
            EquilibriumQuantity.MilligramsPerLitre or EquilibriumQuantity.MeasuredMilligramsPerLitre => "(standard uncertainty, k = 1)",
            EquilibriumQuantity.PartialPressure or EquilibriumQuantity.MeasuredPartialPressure when 1 <= value.Value => string.Create(CultureInfo.InvariantCulture,
                $"({PressureUnits.KilopascalFromHectopascal(value.Value):G5} kPa, {PressureUnits.MillimetresOfMercuryFromHectopascal(value.Value):G5} mmHg)"),
            EquilibriumQuantity.PercentOfOneAtmosphere => "of the same gas phase at 1 atm",
            EquilibriumQuantity.PercentLocal => r.Asked.Phase.Kind == GasPhaseKind.PartialPressure ? "of the partial pressure given" : "at the local pressure",
            EquilibriumQuantity.PercentOneAtmosphere => "at 1 atm",
            EquilibriumQuantity.ExcessMilligramsPerLitre => value.Value < 0 ? "undersaturated" : "supersaturated",
            _ => "",
        };
    }

    private static string Phase(EquilibriumCase c)
    {
        string gas = GasNames.NameOf(c.Gas);
        string pressure = string.Create(CultureInfo.InvariantCulture,
            $"{c.Pressure.Value:F2} hPa ({PressureUnits.MillimetresOfMercuryFromHectopascal(c.Pressure.Value):F1} mmHg)");
        if (c.Phase.Kind == GasPhaseKind.PartialPressure)
        {
            return $"{gas} of {Number.Print(c.Phase.PartialPressureHectopascal.Value)} hPa as given, under {pressure} in all";
        }

        string humidity = $"humidity {Number.Print(c.Phase.HumidityPercent.Value)} %{(c.Phase.HumidityAssumed ? " (assumed)" : "")}";
        string what = c.Phase.Kind == GasPhaseKind.Air
            ? $"air with {Fraction(c.Phase.MoleFraction.Value)} {gas} when dry ({(c.Phase.FractionAssumed ? "the usual" : "as given")})"
            : "mixture of " + string.Join(", ", c.Phase.Parts.Select(static part => Fraction(part.MoleFraction) + " " + GasNames.NameOf(part.Gas)))
                + (c.Phase.Unnamed == 0 ? "" : $"; the rest, {Fraction(c.Phase.Unnamed)}, is unnamed and taken as inert") + ", when dry";
        return $"{what}, {humidity}, {pressure}";
    }

    /// <summary>What a probe feels under water.</summary>
    private static string Felt(GasAtEquilibrium r, ProbeDepth depth)
    {
        EquilibriumResult surface = r.Find(EquilibriumQuantity.MeasuredPartialPressure) ?? r.Value(EquilibriumQuantity.PartialPressure);
        UncertainQuantity felt = depth.Of(surface.Value, surface.StandardUncertainty);
        return string.Create(CultureInfo.InvariantCulture,
            $"a probe feels {Both(new UncertainNumber(felt.Value, felt.StandardUncertainty, "hPa"))} at the same concentration: × {depth.Factor:F5} under {depth.HydrostaticHectopascal:F1} hPa of water (Enns 1965)");
    }

    private static string Fraction(double fraction)
    {
        (double factor, string unit) = fraction switch { 0 or >= 1e-3 => (1e2, "%"), >= 1e-7 => (1e6, "ppm"), >= 1e-9 => (1e9, "ppb"), _ => (1e12, "pmol/mol") };
        return Number.Significant(fraction * factor, 6) + " " + unit;
    }

    private static string Equation(GasAtEquilibrium r)
    {
        SolubilityEntry entry = Catalogue.Solubility(r.Asked.Gas, r.Asked.Equation)!;
        string doi = entry.Source.Doi.Length == 0 ? "" : ", doi:" + entry.Source.Doi;
        return string.Create(CultureInfo.InvariantCulture,
            $"{entry.Source.Name}{(r.Asked.EquationAssumed ? " (the default)" : "")}, ± {100 * r.EquationRelative:G2} %{doi}");
    }

    private static string Steps(GasAtEquilibrium r)
    {
        EquilibriumResult milligrams = r.Value(EquilibriumQuantity.MilligramsPerLitre);
        UncertainNumber number = new(milligrams.Value, milligrams.StandardUncertainty, "mg/L");
        EquilibriumSensitivities s = r.ConcentrationSensitivities;
        return $"°C: {Signed(s.PerKelvin * number.Factor)} {number.Unit}"
            + Further("hPa", s.PerHectopascal) + Further("of salinity", s.PerSalinity);

        // What the value does not hang on, pressure under a given partial pressure or salt in a constant of fresh water, is left out.
        string Further(string what, double slope)
        {
            return double.IsNaN(slope) || slope == 0 ? "" : $"   {what}: {Signed(slope * number.Factor)} {number.Unit}";
        }
    }

    private static string Signed(double value)
    {
        string digits = Number.Significant(value, 3);
        return value <= 0 ? digits : "+" + digits;
    }

    private static string Budget(GasAtEquilibrium r)
    {
        EquilibriumResult main = Principal(r);
        UncertainNumber number = new(main.Value, main.StandardUncertainty, EquilibriumUnits.Of(main.Quantity));
        string interval = string.Create(CultureInfo.InvariantCulture,
            $"95 %: {number.Beside(main.Low)} to {number.Beside(main.High)} {number.Unit} (k = {main.CoverageFactor:F2})");
        IEnumerable<string> parts = main.Parts.Where(static part => 0.005 <= part.Share).OrderByDescending(static part => part.Share).Select(part => Part(r, part));
        string shares = string.Join(", ", parts);
        return interval + (shares.Length == 0 ? "" : "; variance: " + shares) + (main.Note is string note ? "; " + note : "");
    }

    private static string Part(GasAtEquilibrium r, EquilibriumPart part)
    {
        string share = string.Create(CultureInfo.InvariantCulture, $"{100 * part.Share:F0} % ");
        if (part.Input is "equation" or "vapour formula" or "salting-out constants")
        {
            return share + part.Input;
        }

        double half = part.IsRectangular ? part.StandardUncertainty * Math.Sqrt(3) : part.StandardUncertainty;
        string unit = part.Unit.Length == 0 ? "" : " " + part.Unit;
        string size = part.Input == "mole fraction" ? Fraction(half) : Number.Significant(half, 3) + unit;
        return share + part.Input + (part.IsRectangular ? " within ± " : " ± ") + size;
    }

    /// <summary>What nobody stated an uncertainty of.</summary>
    private static string? Exact(EquilibriumCase c)
    {
        List<(string Name, string Option)> exact = [];
        void Add(UncertainQuantity known, string name, string option)
        {
            if (known.IsExact)
            {
                exact.Add((name, option));
            }
        }

        Add(c.Temperature, "temperature", "--temperature-uncertainty");
        Add(c.Pressure, "pressure", "--pressure-uncertainty");
        if (c.Water.Brine is not null)
        {
            exact.Add(("ions", "--temperature-uncertainty"));
        }
        else
        {
            AddWater();
        }

        void AddWater() => Add(c.Water.Given, c.Water.Source switch { SalinitySource.Given => "salinity", SalinitySource.Chlorinity => "chlorinity", _ => "conductivity" },
            c.Water.Source switch { SalinitySource.Given => "--salinity-uncertainty", SalinitySource.Chlorinity => "--chlorinity-uncertainty", _ => "--conductivity-uncertainty" });
        if (c.Phase.Kind == GasPhaseKind.PartialPressure)
        {
            Add(c.Phase.PartialPressureHectopascal, "partial pressure", "--partial-pressure-uncertainty");
        }
        else
        {
            Add(c.Phase.MoleFraction, "mole fraction", "--mole-fraction-uncertainty");
            Add(c.Phase.HumidityPercent, "humidity", "--humidity-uncertainty");
        }

        if (c.Measured is not null)
        {
            Add(c.Measured.Given, "concentration", "--concentration-uncertainty");
        }

        return exact.Count == 0 ? null
            : $"{string.Join(", ", exact.Select(static e => e.Name))} taken as exact ({exact[0].Option}{(exact.Count == 1 ? "" : " and so on")})";
    }

    private static void Check(TextWriter output, GasAtEquilibrium r, MonteCarloReport? check)
    {
        if (check is null)
        {
            return;
        }

        foreach (EquilibriumCheck value in check.Checks)
        {
            EquilibriumResult analytic = r.Value(value.Quantity);
            UncertainNumber number = new(analytic.Value, analytic.StandardUncertainty, EquilibriumUnits.Of(value.Quantity));
            string refused = value.Refused == 0 ? "" : string.Create(CultureInfo.InvariantCulture, $", {value.Refused} without a value");
            Paragraph(output, "Monte Carlo", string.Create(CultureInfo.InvariantCulture,
                $"{number.Beside(value.Mean)} ± {number.Beside(value.StandardDeviation)} {number.Unit}, 95 %: {number.Beside(value.Low)} to {number.Beside(value.High)} {number.Unit} ({value.Trials} trials, seed {check.Seed}{refused}); by the budget {number.Beside(analytic.Low)} to {number.Beside(analytic.High)}"));
        }
    }

    /// <summary>A label and text wrapped between words.</summary>
    private static void Paragraph(TextWriter output, string label, string text)
    {
        string line = "  " + label.PadRight(LabelWidth - 2);
        bool begun = false;
        foreach (string word in text.Split(' '))
        {
            if (begun && Widest < line.Length + 1 + word.Length)
            {
                output.WriteLine(line.TrimEnd());
                line = new string(' ', LabelWidth);
                begun = false;
            }

            line += begun ? " " + word : word;
            begun = true;
        }

        output.WriteLine(line.TrimEnd());
    }
}
