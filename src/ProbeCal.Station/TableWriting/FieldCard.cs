using System;
using System.Collections.Generic;
using System.Globalization;
using System.Threading;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.TableWriting;

/// <summary>
/// Lays out a card for one site: what water in equilibrium with air holds there, temperature down, the station pressures that weather makes at its
/// altitude across, the one that the standard atmosphere gives marked.
/// </summary>
internal static class FieldCard
{
    /// <summary>Columns on either side of the expected pressure: with them the card reaches about 3 % either way near sea level.</summary>
    private const int ColumnsBeside = 6;

    /// <summary>What fits one page of the smaller of A4 and Letter.</summary>
    internal const int MostRows = 42;

    /// <summary>What a column of the page has room for.</summary>
    private const int MostDecimals = 6;

    private const int LongestSite = 60;

    private static readonly (string Unit, double Step, int Decimals)[] PressureUnits = [("hPa", 5, 0), ("mmHg", 4, 0), ("kPa", 0.5, 1), ("inHg", 0.15, 2)];
    private static readonly (string Unit, double PerMilligram)[] ConcentrationUnits = [("mg/L", 1), ("µg/L", 1e3), ("ng/L", 1e6), ("pg/L", 1e9)];

    internal static WrittenTable Make(TableOptions o, Action<double>? progress, CancellationToken stop)
    {
        if (o.Quantity is not null and not ConcentrationSubject.Name)
        {
            throw Wrong.Input("--quantity", o.Quantity, "a field card tells the concentration");
        }

        TableRequest.NotWith(o.Pressure, "--pressure", "a card takes its pressures from --site-altitude");
        TableRequest.NotWith(o.PressureStep, "--pressure-step", "a card takes its pressures from --site-altitude");
        TableRequest.NotWith(o.SalinityStep, "--salinity-step", "a card has one salinity");
        (Gas gas, SolubilityEquation equation, double fraction) = TableRequest.GasOf(o);
        string altitude = TableRequest.Needed(o.SiteAltitude, "--site-altitude", "the altitude of the site with its unit, for example 640m");
        double salinity = Quantity.Salinity("--salinity", TableRequest.Needed(o.Salinity, "--salinity", "practical salinity, 0 for fresh water"));
        string temperatures = TableRequest.Needed(o.Temperature, "--temperature", "the range of the card, for example 0..30C");
        TableAxis rows = TableRange.Axis(AxisQuantity.Temperature, "--temperature", temperatures, "--temperature-step", o.TemperatureStep ?? (o.Error is null ? "1K" : null));
        CardPressures pressures = CardPressures.At(altitude, o.PressureUnit ?? PressureUnits[0].Unit);
        TableAxis columns = pressures.Axis;
        FitsThePage(rows);

        ConcentrationSubject subject = new(gas, equation) { Salinity = salinity, MoleFraction = fraction };
        foreach (double hectopascal in new[] { columns.First, columns.Last })
        {
            if (StatusParts.Input(subject.Evaluate(rows.First, AxisQuantity.Pressure, hectopascal, out _)) == InputQuantity.Pressure)
            {
                throw Wrong.Input("--site-altitude", altitude, $"the pressures there, {pressures.Print(0)} to {pressures.Print(columns.Count - 1)} {pressures.Unit.Name}, leave the range of {subject.Equation}");
            }
        }

        double smallest = new StepSearch(subject, TablePrecision.Double, null, null, stop).Smallest(rows, columns);
        (string unit, double perMilligram) = UnitFor(smallest);
        subject = new ConcentrationSubject(gas, equation) { Salinity = salinity, MoleFraction = fraction, UnitName = unit, PerMilligram = perMilligram };
        // Three figures in the smallest value, two decimals at least: what a meter shows.
        int decimals = Math.Max(2, 2 - (int)Math.Floor(Math.Log10(smallest * perMilligram)));
        if (MostDecimals < decimals)
        {
            throw new InputException($"the values of this card are too small to be printed even in {unit}; look at --mole-fraction and its unit");
        }

        AllowedError? allowed = o.Error is null ? null : AllowedError.Parse(o.Error, new ConcentrationSubject(gas, equation));
        if (allowed is { IsPercent: false })
        {
            allowed = allowed with { Value = allowed.Value * perMilligram };
        }

        (GasTable table, ErrorProof proof) = new StepSearch(subject, TablePrecision.Double, allowed, progress, stop).Find(rows, columns, decimals);
        FitsThePage(table.Rows);
        string name = TableRequest.NameOf(o, subject, columns);
        string? site = o.Site is null ? null : PlainText.OneLine("--site", o.Site.Trim());
        if (LongestSite < site?.Length)
        {
            throw Wrong.Input("--site", site, "at most " + Number.Print(LongestSite) + " characters fit the card");
        }

        CardPage page = new(table, proof, pressures, Catalogue.Gas(gas).Name, site, name, o.Program);
        return new WrittenTable(name + ".html", page.Write(), TableWriter.Summary(table, proof, allowed));

        void FitsThePage(TableAxis axis)
        {
            if (MostRows < axis.Count)
            {
                throw new InputException($"--temperature {temperatures}: {Number.Print(axis.Count)} rows do not fit one page; at most {Number.Print(MostRows)} do: take a smaller range or a larger --temperature-step");
            }
        }
    }

    private static (string Unit, double PerMilligram) UnitFor(double smallestMilligrams)
    {
        foreach ((string unit, double perMilligram) in ConcentrationUnits)
        {
            if (0.1 <= smallestMilligrams * perMilligram)
            {
                return (unit, perMilligram);
            }
        }

        return ConcentrationUnits[^1];
    }

    /// <summary>The pressures of a card: even numbers in the unit asked for, about the standard pressure at the altitude.</summary>
    internal sealed record CardPressures(string Altitude, double Metres, double StandardHectopascal, QuantityUnit Unit, double Middle, double Step, int Decimals)
    {
        internal static int Expected => ColumnsBeside;

        internal TableAxis Axis => new(AxisQuantity.Pressure, Hectopascal(0), Hectopascal(2 * ColumnsBeside), (2 * ColumnsBeside) + 1);

        internal static CardPressures At(string altitude, string unitName)
        {
            double metres = Quantity.AltitudeMetres("--site-altitude", altitude);
            if (StandardAtmosphere.Pressure(metres, out double standard) != Status.Ok)
            {
                throw Wrong.Input("--site-altitude", altitude, string.Create(CultureInfo.InvariantCulture,
                    $"the standard atmosphere is used from {StandardAtmosphere.LowestAltitudeMetres} to {StandardAtmosphere.HighestAltitudeMetres} m"));
            }

            List<string> names = [];
            foreach ((string known, double step, int decimals) in PressureUnits)
            {
                if (known == unitName)
                {
                    QuantityUnit unit = QuantityKind.Pressure.Unit(known)!;
                    double middle = step * Math.Round(unit.FromCanonical(standard) / step);
                    return new CardPressures(altitude.Trim(), metres, standard, unit, middle, step, decimals);
                }

                names.Add(known);
            }

            throw Wrong.Input("--pressure-unit", unitName, $"there is no such choice{NearestName.DidYouMean(unitName, names)}; there are {string.Join(", ", names)}");
        }

        internal double InUnit(int column)
        {
            return Middle + ((column - ColumnsBeside) * Step);
        }

        internal double Hectopascal(int column)
        {
            return Unit.ToCanonical(InUnit(column));
        }

        internal string Print(int column)
        {
            return Number.Fixed(InUnit(column), Decimals);
        }

        /// <summary>The same in the other unit people have: mmHg, or hPa on a card that is not in hPa.</summary>
        internal string PrintOther(int column)
        {
            return Number.Fixed(Other.FromCanonical(Hectopascal(column)), 0);
        }

        internal QuantityUnit Other => QuantityKind.Pressure.Unit(Unit.Name == "hPa" ? "mmHg" : "hPa")!;
    }
}
