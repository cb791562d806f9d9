using System.Globalization;
using System.Security;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.TableWriting;

/// <summary>A table as C# source whose values <see cref="TableLookup"/> reads; it compiles for the device as well.</summary>
internal static class CSharpSource
{
    private const int Widest = 110;

    internal static string Write(string name, GasTable table, ErrorProof proof, AllowedError? allowed, string program)
    {
        string pascal = TableNames.Pascal(name);
        StringBuilder text = new();
        foreach ((string key, string said) in TableStatements.Of(name, table, proof, allowed, program))
        {
            text.Append("// ").Append(key).Append(": ").Append(said).Append('\n');
        }

        text.Append("using ProbeCal;\n\n");
        text.Append(CultureInfo.InvariantCulture, $"/// <summary>{Escaped(table.Subject.Title)}, by {table.Subject.Equation}.</summary>\n");
        text.Append(CultureInfo.InvariantCulture, $"internal static class {pascal}\n{{\n");
        Constant(text, "FirstCelsius", "Lowest temperature, °C.", table.Rows.First);
        Constant(text, "LastCelsius", "Highest temperature, °C.", table.Rows.Last);
        if (table.Columns is TableAxis columns)
        {
            (string word, string said) = columns.Quantity == AxisQuantity.Pressure ? ("Hectopascal", "absolute station pressure, hPa.") : ("Salinity", "practical salinity.");
            Constant(text, "First" + word, "Lowest " + said, columns.First);
            Constant(text, "Last" + word, "Highest " + said, columns.Last);
            text.Append(CultureInfo.InvariantCulture, $"    private const int Columns = {columns.Count};\n");
        }

        text.Append("\n    private static readonly double[] Values =\n    {\n");
        for (int row = 0; row < table.Rows.Count; row++)
        {
            Row(text, table, row);
        }

        text.Append("    };\n\n");
        Lookup(text, table);
        return text.Append("}\n").ToString();
    }

    private static void Constant(StringBuilder text, string name, string said, double value)
    {
        text.Append(CultureInfo.InvariantCulture, $"    /// <summary>{said}</summary>\n    public const double {name} = {Number.Print(value)};\n");
    }

    private static void Row(StringBuilder text, GasTable table, int row)
    {
        string line = "       ";
        for (int column = 0; column < table.ColumnCount; column++)
        {
            string value = " " + table.Texts[(row * table.ColumnCount) + column] + ",";
            if (Widest < line.Length + value.Length)
            {
                text.Append(line).Append('\n');
                line = "       ";
            }

            line += value;
        }

        text.Append(line).Append('\n');
    }

    private static void Lookup(StringBuilder text, GasTable table)
    {
        string what = table.Subject.Unit.Length == 0 ? "The factor" : "The value, " + table.Subject.Unit + ",";
        string name = table.Subject.CSharpName;
        switch (table.Columns?.Quantity)
        {
            case null:
                text.Append(CultureInfo.InvariantCulture, $$"""
                        /// <summary>{{what}} at a temperature (°C) inside the table; NaN unless Ok.</summary>
                        public static Status {{name}}(double celsius, out double value)
                        {
                            return TableLookup.ByTemperature(Values, FirstCelsius, LastCelsius, celsius, out value);
                        }

                    """);
                break;
            case AxisQuantity.Pressure:
                text.Append(CultureInfo.InvariantCulture, $$"""
                        /// <summary>{{what}} at a temperature (°C) and an absolute station pressure (hPa) inside the table; NaN unless Ok.</summary>
                        public static Status {{name}}(double celsius, double hectopascal, out double value)
                        {
                            return TableLookup.ByTemperatureAndPressure(
                                Values, Columns, FirstCelsius, LastCelsius, FirstHectopascal, LastHectopascal, celsius, hectopascal, out value);
                        }

                    """);
                break;
            default:
                text.Append(CultureInfo.InvariantCulture, $$"""
                        /// <summary>{{what}} at a temperature (°C) and a practical salinity inside the table; NaN unless Ok.</summary>
                        public static Status {{name}}(double celsius, double salinity, out double value)
                        {
                            return TableLookup.ByTemperatureAndSalinity(
                                Values, Columns, FirstCelsius, LastCelsius, FirstSalinity, LastSalinity, celsius, salinity, out value);
                        }

                    """);
                break;
        }
    }

    private static string Escaped(string text)
    {
        return SecurityElement.Escape(text);
    }
}
