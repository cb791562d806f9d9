using System.Collections.Generic;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.TableWriting;

/// <summary>A table as JSON, one row of it a line; the fields are in <c>docs/schemas/table.schema.json</c>.</summary>
internal static class JsonTable
{
    internal static string Write(string name, GasTable table, ErrorProof proof, AllowedError? allowed, string program)
    {
        TableSubject subject = table.Subject;
        List<string> members =
        [
            "\"format\": " + Quoted(TableStatements.Format),
            "\"version\": " + Number.Print(TableStatements.Version),
            "\"program\": " + Quoted(program),
            "\"name\": " + Quoted(name),
            "\"quantity\": " + Quoted(subject.Quantity),
            "\"title\": " + Quoted(subject.Title),
            "\"unit\": " + Quoted(subject.Unit.Length == 0 ? "1" : subject.Unit),
        ];
        if (subject.Gas is string gas) { members.Add("\"gas\": " + Quoted(gas)); }
        members.Add("\"equation\": " + Quoted(subject.Equation));
        members.Add("\"citation\": " + Quoted(subject.Citation));
        if (subject.Salinity is double salinity) { members.Add("\"salinity\": " + Number.Print(salinity)); }
        if (subject.Hectopascal is double pressure) { members.Add("\"pressureHPa\": " + Number.Print(pressure)); }
        if (subject.MoleFraction is double fraction)
        {
            members.Add("\"moleFraction\": " + Number.Print(fraction));
            members.Add("\"humidityPercent\": 100");
        }

        members.Add("\"rows\": " + Axis(table.Rows));
        if (table.Columns is TableAxis columns) { members.Add("\"columns\": " + Axis(columns)); }
        members.Add("\"interpolation\": " + Quoted(table.Columns is null ? "linear" : "bilinear"));
        members.Add("\"error\": " + Error(table, proof, allowed));
        StringBuilder text = new("{\n");
        foreach (string member in members)
        {
            text.Append("  ").Append(member).Append(",\n");
        }

        text.Append("  \"values\": [\n");
        for (int row = 0; row < table.Rows.Count; row++)
        {
            text.Append("    [");
            for (int column = 0; column < table.ColumnCount; column++)
            {
                text.Append(column == 0 ? "" : ", ").Append(table.Texts[(row * table.ColumnCount) + column]);
            }

            text.Append(row == table.Rows.Count - 1 ? "]\n" : "],\n");
        }

        return text.Append("  ]\n}\n").ToString();
    }

    private static string Axis(TableAxis axis)
    {
        string quantity = axis.Quantity switch { AxisQuantity.Temperature => "temperature", AxisQuantity.Pressure => "pressure", _ => "salinity" };
        string unit = axis.Unit.Length == 0 ? "1" : axis.Unit;
        return $"{{ \"quantity\": {Quoted(quantity)}, \"unit\": {Quoted(unit)}, \"first\": {axis.Text(0)}, \"last\": {axis.Text(axis.Count - 1)}, \"count\": {Number.Print(axis.Count)} }}";
    }

    private static string Error(GasTable table, ErrorProof proof, AllowedError? allowed)
    {
        string unit = table.Subject.Unit.Length == 0 ? "1" : table.Subject.Unit;
        string first = allowed is null ? "" : $"\"allowed\": {{ \"value\": {Number.Print(allowed.Value)}, \"unit\": {Quoted(allowed.IsPercent ? "%" : unit)} }}, ";
        return "{ " + first
            + $"\"largestFound\": {{ \"value\": {Rounding.Up(proof.Largest, 3)}, \"unit\": {Quoted(unit)}{Place(table, proof.At, proof.AtAcross)} }}, "
            + $"\"largestFoundPercent\": {{ \"value\": {Rounding.Up(proof.LargestPercent, 3)}, \"unit\": \"%\"{Place(table, proof.PercentAt, proof.PercentAtAcross)} }}, "
            + $"\"gridRows\": {Number.Print(proof.RowPoints)}, \"gridColumns\": {Number.Print(proof.ColumnPoints)} }}";
    }

    private static string Place(GasTable table, double at, double across)
    {
        return ", \"row\": " + Number.Significant(at, 6) + (table.Columns is null ? "" : ", \"column\": " + Number.Significant(across, 6));
    }

    private static string Quoted(string text)
    {
        return "\"" + JsonEncodedText.Encode(text, JavaScriptEncoder.UnsafeRelaxedJsonEscaping).ToString() + "\"";
    }
}
