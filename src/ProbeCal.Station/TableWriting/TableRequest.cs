using System;
using System.Collections.Generic;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.TableWriting;

/// <summary>The options of a table, read: what it tells, its axes and the error it must keep to.</summary>
internal sealed record TableRequest(
    string Format, string Name, TableSubject Subject, TableAxis Rows, TableAxis? Columns, AllowedError? Allowed, TablePrecision Precision, int? Decimals)
{
    internal const string Card = "card";
    internal static readonly string[] Formats = ["csv", "json", "c-float", "c-double", "csharp", Card];
    private static readonly string[] Quantities = [ConcentrationSubject.Name, SalinityFactorSubject.Name, VapourPressureSubject.Name];
    private const int LongestName = 64;

    /// <summary>The word among some, or a line that lists them.</summary>
    internal static string Choice(string option, string given, string[] choices)
    {
        return Array.IndexOf(choices, given) >= 0
            ? given
            : throw Wrong.Input(option, given, $"there is no such choice{NearestName.DidYouMean(given, choices)}; there are {string.Join(", ", choices)}");
    }

    internal static TableRequest Parse(TableOptions o)
    {
        Choice("--format", o.Format, Formats);
        if (o.Format == Card)
        {
            throw new InvalidOperationException("a card is laid out by FieldCard");
        }

        NotWith(o.SiteAltitude, "--site-altitude", "only a field card (--format card) has a site");
        NotWith(o.Site, "--site", "only a field card (--format card) has a site");
        NotWith(o.PressureUnit, "--pressure-unit", "only a field card (--format card) chooses it; the pressures of other tables are hPa");
        string quantity = Choice("--quantity", o.Quantity ?? ConcentrationSubject.Name, Quantities);
        TableAxis rows = TableRange.Axis(AxisQuantity.Temperature, "--temperature", Needed(o.Temperature, "--temperature", "the range of the table, for example 0..40C"), "--temperature-step", o.TemperatureStep);
        TableAxis? salinities = o.Salinity is string s && TableRange.IsRange(s) ? TableRange.Axis(AxisQuantity.Salinity, "--salinity", s, "--salinity-step", o.SalinityStep) : null;
        TableAxis? pressures = o.Pressure is string p && TableRange.IsRange(p) ? TableRange.Axis(AxisQuantity.Pressure, "--pressure", p, "--pressure-step", o.PressureStep) : null;
        if (salinities is null) { NotWith(o.SalinityStep, "--salinity-step", "there is no range of salinities, for example --salinity 0..40"); }
        if (pressures is null) { NotWith(o.PressureStep, "--pressure-step", "there is no range of pressures, for example --pressure 600..1100hPa"); }
        if (salinities is not null && pressures is not null)
        {
            throw new InputException("--salinity and --pressure are both ranges: a table has two sides, and temperature is one of them; fix one, for example --pressure 1atm");
        }

        TableSubject subject = SubjectOf(quantity, o, salinities, pressures);
        TableAxis? columns = salinities ?? pressures;
        // The corners tell about the ranges before any time is spent.
        foreach (double celsius in new[] { rows.First, rows.Last })
        {
            foreach (double at in columns is null ? [0.0] : new[] { columns.First, columns.Last })
            {
                subject.Value(celsius, columns?.Quantity ?? AxisQuantity.Temperature, at);
            }
        }

        return new TableRequest(
            o.Format, NameOf(o, subject, columns), subject, rows, columns, o.Error is null ? null : AllowedError.Parse(o.Error, subject),
            o.Format == "c-float" ? TablePrecision.Single : TablePrecision.Double, null);
    }

    /// <summary>The gas and its equation, or a line that lists them.</summary>
    internal static (Gas Gas, SolubilityEquation Equation, double MoleFraction) GasOf(TableOptions o)
    {
        Gas gas = o.Gas is null ? Gas.Oxygen : GasNames.Parse("--gas", o.Gas);
        SolubilityEquation equation = EquationNames.ParseOrDefault("--equation", o.Equation, gas);
        double fraction = o.MoleFraction is null ? DryAir.MoleFraction(gas) : Quantity.Parse(QuantityKind.MoleFraction, "--mole-fraction", o.MoleFraction);
        if (double.IsNaN(fraction))
        {
            throw new InputException($"--mole-fraction is missing: air holds no settled share of {GasNames.NameOf(gas)}; give the mole fraction in the dry gas phase, for example --mole-fraction 1e-6");
        }

        return 0 < fraction && fraction <= 1 ? (gas, equation, fraction) : throw Wrong.Input("--mole-fraction", o.MoleFraction!, "a mole fraction lies above 0 and is at most 1");
    }

    internal static void NotWith(string? given, string option, string why)
    {
        if (given is not null)
        {
            throw Wrong.Input(option, given, why);
        }
    }

    internal static string Needed(string? given, string option, string what)
    {
        return given ?? throw new InputException($"{option} is missing: {what}");
    }

    internal static string NameOf(TableOptions o, TableSubject subject, TableAxis? columns)
    {
        string name = o.Name ?? Default();
        bool fits = name.Length is > 0 and <= LongestName && char.IsAsciiLetterLower(name[0]) && name[^1] != '-' && !name.Contains("--", StringComparison.Ordinal);
        foreach (char c in name)
        {
            fits &= char.IsAsciiLetterLower(c) || char.IsAsciiDigit(c) || c == '-';
        }

        return fits ? name : throw Wrong.Input("--name", name, "a table is called with small letters, digits and single hyphens, at most 64, a letter first: oxygen-fresh-water");

        string Default()
        {
            string gas = subject.Gas is string symbol ? symbol.ToLower(CultureInfo.InvariantCulture) + "-" : "";
            string by = columns?.Quantity switch
            {
                AxisQuantity.Pressure => "-temperature-pressure",
                AxisQuantity.Salinity => "-temperature-salinity",
                _ => "-temperature",
            };
            return gas + subject.Quantity + by;
        }
    }

    private static TableSubject SubjectOf(string quantity, TableOptions o, TableAxis? salinities, TableAxis? pressures)
    {
        if (quantity == VapourPressureSubject.Name)
        {
            foreach ((string? given, string option) in new[] { (o.Gas, "--gas"), (o.Equation, "--equation"), (o.Salinity, "--salinity"), (o.Pressure, "--pressure"), (o.MoleFraction, "--mole-fraction") })
            {
                NotWith(given, option, "the vapour pressure of pure water depends on the temperature alone");
            }

            return new VapourPressureSubject();
        }

        (Gas gas, SolubilityEquation equation, double fraction) = GasOf(o);
        if (quantity == SalinityFactorSubject.Name)
        {
            NotWith(o.Pressure, "--pressure", "the salinity factor is that at 1 atm; leave it out");
            return salinities is null
                ? throw new InputException("--salinity is a range for the salinity factor, for example --salinity 0..40")
                : new SalinityFactorSubject(gas, equation) { MoleFraction = fraction, Hectopascal = PressureUnits.HectopascalPerAtmosphere };
        }

        double? salinity = salinities is null
            ? Quantity.Salinity("--salinity", Needed(o.Salinity, "--salinity", "practical salinity, 0 for fresh water, or a range, for example 0..40"))
            : null;
        double? hectopascal = pressures is null
            ? Quantity.PressureHectopascal("--pressure", Needed(o.Pressure, "--pressure", "absolute pressure with its unit, for example 1atm, or a range, for example 600..1100hPa"))
            : null;
        return new ConcentrationSubject(gas, equation) { Salinity = salinity, Hectopascal = hectopascal, MoleFraction = fraction };
    }
}

/// <summary>Reads <c>0..40C</c> and the like.</summary>
internal static class TableRange
{
    private const double Widest = 1e6;

    internal static bool IsRange(string text)
    {
        return text.Contains("..", StringComparison.Ordinal);
    }

    /// <summary>An axis; its count is 0 where the step is left to the search.</summary>
    internal static TableAxis Axis(AxisQuantity quantity, string option, string text, string stepOption, string? step)
    {
        (double first, double last) = Read(quantity, option, text);
        TableAxis axis = new(quantity, first, last, 0);
        if (step is null)
        {
            return axis;
        }

        double length = Quantity.Parse(KindOfStep(quantity), stepOption, step);
        if (!(0 < length))
        {
            throw Wrong.Input(stepOption, step, "a step is above zero");
        }

        return length < 1e-6 || axis.StepsOf(length) is not int steps
            ? throw Wrong.Input(stepOption, step, string.Create(CultureInfo.InvariantCulture,
                $"the range {text.Trim()} is no whole number of such steps, or more than {TableLimits.MostSteps} of them"))
            : axis.With(steps);
    }

    /// <summary>The ends of a range in the canonical unit, low first.</summary>
    internal static (double First, double Last) Read(AxisQuantity quantity, string option, string text)
    {
        QuantityKind kind = quantity switch
        {
            AxisQuantity.Temperature => QuantityKind.Temperature,
            AxisQuantity.Pressure => QuantityKind.Pressure,
            _ => QuantityKind.Salinity,
        };
        int dots = text.IndexOf("..", StringComparison.Ordinal);
        string example = quantity switch { AxisQuantity.Temperature => "0..40C", AxisQuantity.Pressure => "600..1100hPa", _ => "0..40" };
        if (dots < 0)
        {
            throw Wrong.Input(option, text, "write a range as " + example);
        }

        string upper = text[(dots + 2)..];
        if (upper.StartsWith('.'))
        {
            throw Wrong.Input(option, text, "a range has two dots; write for example " + example);
        }

        string lower = text[..dots];
        string what = option + " " + Wrong.Shown(text) + ":";
        // The unit behind the upper end holds for the lower one too.
        if (!Quantity.TrySplit(kind, upper, kind.BareUnit, out double high, out QuantityUnit? unit, out string? problem))
        {
            throw Wrong.Input(what, upper, problem);
        }

        if (!Quantity.TrySplit(kind, lower, unit, out double low, out QuantityUnit? lowerUnit, out problem))
        {
            throw Wrong.Input(what, lower, problem);
        }

        if (unit != kind.CanonicalUnit || lowerUnit != kind.CanonicalUnit)
        {
            throw Wrong.Input(option, text, $"the sides of a table are in {kind.CanonicalUnit.Name}; write for example {example}");
        }

        if (!(Math.Abs(low) < Widest && Math.Abs(high) < Widest))
        {
            throw Wrong.Input(option, text, "the ends of a table lie within a million; write for example " + example);
        }

        if (Math.Round(low, 4) != low || Math.Round(high, 4) != high)
        {
            throw Wrong.Input(option, text, "the ends of a table are numbers of at most four decimals");
        }

        return low < high ? (low, high) : throw Wrong.Input(option, text, "the range runs from low to high");
    }

    private static QuantityKind KindOfStep(AxisQuantity quantity)
    {
        return quantity switch
        {
            AxisQuantity.Temperature => QuantityKind.TemperatureDifference,
            AxisQuantity.Pressure => QuantityKind.Pressure,
            _ => QuantityKind.Salinity,
        };
    }
}
