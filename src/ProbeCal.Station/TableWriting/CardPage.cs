using System;
using System.Globalization;
using System.Net;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.TableWriting;

/// <summary>The card as one HTML page: black on white, lines in place of fills, nothing fetched, one side of A4 or Letter.</summary>
internal sealed class CardPage(
    GasTable table, ErrorProof proof, FieldCard.CardPressures pressures, string gas, string? site, string name, string program)
{
    private const int RowsToTheLine = 5;

    // Sizes leave room on the lower of the two papers (Letter) and the narrower (A4).
    private const string Style = """
        @page { size: auto; margin: 10mm; }
        body { font: 8.3pt/1.22 "Liberation Sans", Arial, Helvetica, sans-serif; color: #000; background: #fff; width: 188mm; margin: 0 auto; }
        h1 { font-size: 13pt; line-height: 1.1; margin: 0 0 0.6mm; }
        p { margin: 0 0 1mm; }
        .site { font-size: 9.5pt; margin-bottom: 1.4mm; }
        table { border-collapse: collapse; width: 100%; table-layout: fixed; font-variant-numeric: tabular-nums; margin-bottom: 1.6mm; }
        th, td { text-align: center; padding: 0; height: 3.85mm; line-height: 3.85mm; font-size: 8.6pt; border: 0; white-space: nowrap; }
        th { font-weight: bold; }
        thead tr:nth-child(2) th { border-top: 0.35mm solid #000; }
        thead tr:last-child th { border-bottom: 0.35mm solid #000; }
        thead .mark th { border-right: 0; font-weight: normal; font-size: 7.6pt; }
        thead .other th { font-weight: normal; font-size: 7.6pt; }
        tbody tr.line td, tbody tr.line th { border-bottom: 0.12mm solid #000; }
        tbody tr:last-child td, tbody tr:last-child th { border-bottom: 0.35mm solid #000; }
        th:first-child { width: 17mm; border-right: 0.12mm solid #000; }
        .expected { border-left: 0.5mm solid #000; border-right: 0.5mm solid #000; font-weight: bold; }
        .source { border-top: 0.12mm solid #000; padding-top: 0.8mm; font-size: 7.2pt; }
        """;

    internal string Write()
    {
        StringBuilder page = new();
        string title = Upper(gas) + " in water at equilibrium with air, " + table.Subject.Unit;
        page.Append("<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n");
        page.Append("<title>").Append(Html(title + (site is null ? "" : ": " + site))).Append("</title>\n<style>\n").Append(Style).Append("\n</style>\n</head>\n<body>\n");
        page.Append("<h1>").Append(Html(title)).Append("</h1>\n");
        page.Append("<p class=\"site\">").Append(Html(SiteLine())).Append("</p>\n");
        Table(page);
        Paragraph(page, "Reading the card.", Reading());
        Paragraph(page, "Pressure.", Pressure());
        Paragraph(page, "Water.", Water());
        page.Append("<p class=\"source\">").Append(Html(Source())).Append("</p>\n</body>\n</html>\n");
        return page.ToString();
    }

    private string SiteLine()
    {
        string salinity = table.Subject.Salinity == 0 ? "fresh water (salinity 0)" : "practical salinity " + Number.Print(table.Subject.Salinity!.Value);
        return (site is null ? "" : site + " · ") + "altitude " + pressures.Altitude + " · " + salinity + " · expected station pressure "
            + InUnit(pressures.StandardHectopascal);
    }

    private void Table(StringBuilder page)
    {
        page.Append("<table>\n<thead>\n<tr class=\"mark\"><th></th>");
        for (int column = 0; column < table.ColumnCount; column++)
        {
            page.Append(column == FieldCard.CardPressures.Expected ? "<th>expected</th>" : "<th></th>");
        }

        page.Append("</tr>\n");
        HeadRow(page, "", "°C \\ " + pressures.Unit.Name, pressures.Print);
        HeadRow(page, " class=\"other\"", pressures.Other.Name, pressures.PrintOther);
        page.Append("</thead>\n<tbody>\n");
        for (int row = 0; row < table.Rows.Count; row++)
        {
            bool line = row != table.Rows.Count - 1 && Math.Round(table.Rows.Node(row + 1) / table.Rows.Step, 6) % RowsToTheLine == 0;
            page.Append(line ? "<tr class=\"line\"><th>" : "<tr><th>").Append(table.Rows.Text(row)).Append("</th>");
            for (int column = 0; column < table.ColumnCount; column++)
            {
                page.Append(column == FieldCard.CardPressures.Expected ? "<td class=\"expected\">" : "<td>")
                    .Append(table.Texts[(row * table.ColumnCount) + column]).Append("</td>");
            }

            page.Append("</tr>\n");
        }

        page.Append("</tbody>\n</table>\n");
    }

    private void HeadRow(StringBuilder page, string attributes, string first, Func<int, string> text)
    {
        page.Append("<tr").Append(attributes).Append("><th>").Append(Html(first)).Append("</th>");
        for (int column = 0; column < table.ColumnCount; column++)
        {
            page.Append(column == FieldCard.CardPressures.Expected ? "<th class=\"expected\">" : "<th>").Append(text(column)).Append("</th>");
        }

        page.Append("</tr>\n");
    }

    private string Reading()
    {
        int row = (table.Rows.Count - 2) / 2;
        string upper = table.Texts[(row * table.ColumnCount) + FieldCard.CardPressures.Expected];
        string lower = table.Texts[((row + 1) * table.ColumnCount) + FieldCard.CardPressures.Expected];
        decimal middle = (decimal.Parse(upper, CultureInfo.InvariantCulture) + decimal.Parse(lower, CultureInfo.InvariantCulture)) / 2;
        double half = 0.5 * (table.Rows.Node(row) + table.Rows.Node(row + 1));
        string value = middle.ToString("F" + (table.Decimals + 1).ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return $"Water temperature down, absolute station pressure across; the value is what the water holds when it is in equilibrium with water-saturated air (100 % at the local pressure). Between rows and columns go in proportion: {Number.Significant(half, 6)} °C in the marked column lies half way between {upper} and {lower}, {value} {table.Subject.Unit}. So read, the card is within {Rounding.Up(proof.Largest, 2)} {table.Subject.Unit} of the equation (the figures' own rounding included; largest of {TableStatements.PointCount(table, proof)} points compared). Nothing outside the card may be guessed from it.";
    }

    private string Pressure()
    {
        string first = pressures.Print(0) + " to " + pressures.Print(table.ColumnCount - 1) + " " + pressures.Unit.Name;
        string text = $"Use the absolute pressure of a barometer at the site. The marked column is only the standard pressure at this altitude, {InUnit(pressures.StandardHectopascal)}; weather moves the pressure by up to about 3 % either way and the value with it. A pressure outside {first} wants another look at barometer, unit and altitude.";
        return text + SeaLevel();
    }

    private string SeaLevel()
    {
        double celsius = table.Rows.Node((table.Rows.Count - 1) / 2);
        bool known = table.Subject.Evaluate(celsius, AxisQuantity.Pressure, StandardAtmosphere.SeaLevelHectopascal, out double there) == Status.Ok
            & table.Subject.Evaluate(celsius, AxisQuantity.Pressure, pressures.StandardHectopascal, out double here) == Status.Ok;
        double percent = 100 * ((there / here) - 1);
        return known && 0.5 <= percent
            ? $" Never use a pressure that a weather service has reduced to sea level: here it would give a value {Number.Fixed(percent, 0)} % ({Number.Fixed(there - here, 1)} {table.Subject.Unit} at {Number.Significant(celsius, 6)} °C) too high."
            : " A weather service's pressure is reduced to sea level; ask for the station pressure.";
    }

    private string Water()
    {
        string salt = table.Subject.Salinity == 0 ? "Salt lowers the value: for brackish water make a card of its salinity." : "For water of another salinity make another card.";
        return "Air-saturated water is made by stirring or bubbling with fresh air until the reading is steady. Bubbles let in at depth over-saturate (up to 1 % for each 0.1 m): stop the pump and stir gently some minutes with the surface open. Warming or cooling afterwards spoils it: " + PerKelvin() + ". Measure the temperature in the same water, beside the probe, with a checked thermometer, and keep drops and bubbles off the membrane (common practice, no source). "
            + salt + " Work at the water with a lifejacket and not alone; the site's rules come first.";
    }

    private string PerKelvin()
    {
        double celsius = table.Rows.Node((table.Rows.Count - 1) / 2);
        double here = table.Subject.Value(celsius, AxisQuantity.Pressure, pressures.Hectopascal(FieldCard.CardPressures.Expected));
        double next = table.Subject.Value(celsius - table.Rows.Step, AxisQuantity.Pressure, pressures.Hectopascal(FieldCard.CardPressures.Expected));
        double percent = 100 * Math.Abs(next - here) / here / table.Rows.Step;
        return "1 °C is about " + Number.Fixed(percent, 1) + " % near " + Number.Significant(celsius, 6) + " °C";
    }

    private string Source()
    {
        TableSubject subject = table.Subject;
        return $"Equation {subject.Equation}: {subject.Citation}. Water-saturated air, mole fraction of {subject.Gas} in dry air {Number.Print(subject.MoleFraction!.Value)}; temperature ITS-90; {pressures.Other.Name} figures are rounded. "
            + $"Largest error found: {TableStatements.Found(table, proof, false)}; error found over {TableStatements.Grid(table, proof)}. "
            + $"Card {name}, {TableStatements.Format}/{Number.Print(TableStatements.Version)}, made by {program}; the same command makes the same card.";
    }

    private string InUnit(double hectopascal)
    {
        string own = Number.Fixed(pressures.Unit.FromCanonical(hectopascal), pressures.Decimals + 1) + " " + pressures.Unit.Name;
        return own + " (" + Number.Fixed(pressures.Other.FromCanonical(hectopascal), 1) + " " + pressures.Other.Name + ")";
    }

    private static void Paragraph(StringBuilder page, string heading, string text)
    {
        page.Append("<p><b>").Append(Html(heading)).Append("</b> ").Append(Html(text)).Append("</p>\n");
    }

    private static string Upper(string text)
    {
        return char.ToUpperInvariant(text[0]) + text[1..];
    }

    private static string Html(string text)
    {
        return WebUtility.HtmlEncode(text).Replace("&#181;", "µ", StringComparison.Ordinal).Replace("&#176;", "°", StringComparison.Ordinal).Replace("&#183;", "·", StringComparison.Ordinal);
    }
}
