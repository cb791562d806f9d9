using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.TableWriting;

/// <summary>In which numbers the reader of a table computes.</summary>
internal enum TablePrecision
{
    /// <summary>64 bits.</summary>
    Double,
    /// <summary>32 bits: half the memory, and what a small controller computes fast.</summary>
    Single,
}

/// <summary>A table as it is written: its values are those that stand in the file, rounding included.</summary>
/// <param name="Subject">What it tells.</param>
/// <param name="Rows">Temperatures.</param>
/// <param name="Columns">Pressures or salinities; null for a table by temperature alone.</param>
/// <param name="Decimals">Decimals of the values.</param>
/// <param name="Texts">The values as written, row by row.</param>
/// <param name="Values">The same as numbers.</param>
/// <param name="Precision">In which numbers its reader computes.</param>
internal sealed record GasTable(
    TableSubject Subject, TableAxis Rows, TableAxis? Columns, int Decimals, string[] Texts, double[] Values, TablePrecision Precision)
{
    internal int ColumnCount => Columns?.Count ?? 1;

    /// <summary>Evaluates the subject at every node and rounds to the decimals.</summary>
    internal static GasTable Make(TableSubject subject, TableAxis rows, TableAxis? columns, int decimals, TablePrecision precision)
    {
        int across = columns?.Count ?? 1;
        string[] texts = new string[rows.Count * across];
        double[] values = new double[texts.Length];
        for (int row = 0; row < rows.Count; row++)
        {
            for (int column = 0; column < across; column++)
            {
                double value = subject.Value(rows.Node(row), columns?.Quantity ?? AxisQuantity.Temperature, columns?.Node(column) ?? 0);
                string text = Number.Fixed(value, decimals);
                texts[(row * across) + column] = text;
                values[(row * across) + column] = double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);
            }
        }

        return new GasTable(subject, rows, columns, decimals, texts, values, precision);
    }

    /// <summary>What a reader of this table gives; NaN outside.</summary>
    internal double Read(double celsius, double across)
    {
        double value;
        if (Columns is null)
        {
            TableLookup.ByTemperature(Values, Rows.First, Rows.Last, celsius, out value);
        }
        else if (Columns.Quantity == AxisQuantity.Pressure)
        {
            TableLookup.ByTemperatureAndPressure(Values, Columns.Count, Rows.First, Rows.Last, Columns.First, Columns.Last, celsius, across, out value);
        }
        else
        {
            TableLookup.ByTemperatureAndSalinity(Values, Columns.Count, Rows.First, Rows.Last, Columns.First, Columns.Last, celsius, across, out value);
        }

        return value;
    }
}
