using System.Text;

namespace ProbeCal.Station.TableWriting;

/// <summary>A table as CSV: header lines that begin with #, one line of columns, one line a temperature.</summary>
internal static class CsvTable
{
    internal static string Write(string name, GasTable table, ErrorProof proof, AllowedError? allowed, string program)
    {
        StringBuilder text = new();
        foreach ((string key, string said) in TableStatements.Of(name, table, proof, allowed, program))
        {
            text.Append("# ").Append(key).Append(": ").Append(PlainAscii.Of(said)).Append('\n');
        }

        // The first column holds the temperatures; the further ones are called by what they are the column of.
        text.Append("temperatureC");
        if (table.Columns is TableAxis columns)
        {
            for (int column = 0; column < columns.Count; column++)
            {
                text.Append(',').Append(columns.Text(column));
            }
        }
        else
        {
            text.Append(',').Append(table.Subject.Quantity == VapourPressureSubject.Name ? "hPa" : "mgPerL");
        }

        text.Append('\n');
        for (int row = 0; row < table.Rows.Count; row++)
        {
            text.Append(table.Rows.Text(row));
            for (int column = 0; column < table.ColumnCount; column++)
            {
                text.Append(',').Append(table.Texts[(row * table.ColumnCount) + column]);
            }

            text.Append('\n');
        }

        return text.ToString();
    }
}
