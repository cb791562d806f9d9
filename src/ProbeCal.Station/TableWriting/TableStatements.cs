using System.Collections.Generic;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.TableWriting;

/// <summary>What the header of a table says, one statement a line, the same in every form.</summary>
internal static class TableStatements
{
    internal const string Format = "probecal-table";
    internal const int Version = 1;

    internal static List<(string Key, string Text)> Of(string name, GasTable table, ErrorProof proof, AllowedError? allowed, string program)
    {
        TableSubject subject = table.Subject;
        List<(string, string)> lines =
        [
            ("format", Format + "/" + Number.Print(Version)),
            ("table", name),
            ("values", subject.Title + (subject.Unit.Length == 0 ? "" : ", " + subject.Unit)),
            ("equation", subject.Equation),
            ("citation", subject.Citation),
            ("rows", Axis(table.Rows)),
        ];
        if (table.Columns is TableAxis columns)
        {
            lines.Add(("columns", Axis(columns)));
        }

        if (subject.Salinity is double salinity)
        {
            lines.Add(("salinity", Number.Print(salinity) + (salinity == 0 ? " (fresh water)" : " (practical salinity)")));
        }

        if (subject.Hectopascal is double hectopascal)
        {
            lines.Add(("pressure", Number.Print(hectopascal) + " hPa, absolute"));
        }

        if (subject.MoleFraction is double fraction)
        {
            lines.Add(("air", "water-saturated; mole fraction in dry air " + Number.Print(fraction)));
        }

        lines.Add(("interpolation", table.Columns is null ? "linear between rows" : "linear between columns, then linear between rows"));
        if (allowed is not null)
        {
            lines.Add(("error allowed", allowed.Print(allowed.Value, subject.Unit)));
        }

        lines.Add(("largest error found", Found(table, proof, allowed?.IsPercent ?? false)));
        lines.Add(("error found over", Grid(table, proof)));
        lines.Add(("outside the table", "nothing is extrapolated or clamped"));
        lines.Add(("made by", program));
        return lines;
    }

    /// <summary>Both forms of the largest error, the one that counts first.</summary>
    internal static string Found(GasTable table, ErrorProof proof, bool percentFirst)
    {
        string unit = table.Subject.Unit.Length == 0 ? "" : " " + table.Subject.Unit;
        string absolute = Rounding.Up(proof.Largest, 3) + unit + " at " + Where(table, proof.At, proof.AtAcross);
        string relative = Rounding.Up(proof.LargestPercent, 3) + "% at " + Where(table, proof.PercentAt, proof.PercentAtAcross);
        return percentFirst ? relative + "; " + absolute : absolute + "; " + relative;
    }

    internal static string Grid(GasTable table, ErrorProof proof)
    {
        string numbers = table.Precision == TablePrecision.Single ? "32-bit" : "64-bit";
        long points = (long)proof.RowPoints * proof.ColumnPoints;
        string grid = table.Columns is null ? Count(proof.RowPoints) + " points" : Count(proof.RowPoints) + " x " + Count(proof.ColumnPoints) + " = " + Count(points) + " points";
        return grid + " (nodes, both sides of each, cells with their middles), values as written, read in " + numbers + " numbers";

        static string Count(long number)
        {
            return number.ToString(CultureInfo.InvariantCulture);
        }
    }

    /// <summary>How many points were compared.</summary>
    internal static string PointCount(GasTable table, ErrorProof proof)
    {
        return ((long)proof.RowPoints * proof.ColumnPoints).ToString(CultureInfo.InvariantCulture);
    }

    private static string Where(GasTable table, double at, double across)
    {
        string place = table.Rows.Place(at);
        return table.Columns is TableAxis columns ? place + " and " + columns.Place(across) : place;
    }

    private static string Axis(TableAxis axis)
    {
        string unit = axis.Unit.Length == 0 ? "" : " " + axis.Unit;
        string scale = axis.Quantity == AxisQuantity.Temperature ? " (ITS-90)" : "";
        return $"{axis.Name} {axis.Text(0)} to {axis.Text(axis.Count - 1)}{unit}{scale}, {Number.Print(axis.Count)} of them in steps of {Number.Significant(axis.Step, 8)}";
    }
}
