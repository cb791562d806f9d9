using System.Globalization;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.TableWriting;

/// <summary>
/// A table as a C99 header that needs nothing else: the values and a reader that does the operations of <see cref="TableLookup"/> (double) or
/// <see cref="SingleLookup"/> (float) in the same order. No memory is taken, no function called.
/// </summary>
internal static class CHeader
{
    private const int Widest = 110;

    internal static string Write(string name, GasTable table, ErrorProof proof, AllowedError? allowed, string program)
    {
        bool single = table.Precision == TablePrecision.Single;
        string type = single ? "float" : "double";
        string snake = TableNames.Snake(name);
        string capitals = TableNames.Capitals(name);
        StringBuilder text = new();
        text.Append("/*\n");
        foreach ((string key, string said) in TableStatements.Of(name, table, proof, allowed, program))
        {
            text.Append(" * ").Append(key).Append(": ").Append(PlainAscii.Of(said).Replace("*/", "* /", System.StringComparison.Ordinal)).Append('\n');
        }

        text.Append(CultureInfo.InvariantCulture, $" * size: {table.Texts.Length * (single ? 4 : 8)} bytes of constant values\n");
        text.Append(" */\n");
        text.Append(CultureInfo.InvariantCulture, $"#ifndef PROBECAL_TABLE_{capitals}_H\n#define PROBECAL_TABLE_{capitals}_H\n\n");
        text.Append(Statuses);
        text.Append(CultureInfo.InvariantCulture, $"#define {capitals}_ROWS {table.Rows.Count}\n");
        Ends(text, capitals, "CELSIUS", table.Rows, single);
        if (table.Columns is TableAxis columns)
        {
            text.Append(CultureInfo.InvariantCulture, $"#define {capitals}_COLUMNS {columns.Count}\n");
            Ends(text, capitals, Word(columns), columns, single);
        }

        Values(text, table, snake, capitals, type, single);
        if (table.Columns is null) { ReaderOfOne(text, table, snake, capitals, type); } else { ReaderOfTwo(text, table, snake, capitals, type); }
        return text.Append(CultureInfo.InvariantCulture, $"\n#endif /* PROBECAL_TABLE_{capitals}_H */\n").ToString();
    }

    private const string Statuses = """
        #ifndef PROBECAL_TABLE_STATUS
        #define PROBECAL_TABLE_STATUS
        /* What a reader answers; the value is written only with PROBECAL_TABLE_OK. */
        enum probecal_table_status {
            PROBECAL_TABLE_OK = 0,
            PROBECAL_TABLE_TEMPERATURE_IS_NAN = 1,
            PROBECAL_TABLE_TEMPERATURE_BELOW = 2,
            PROBECAL_TABLE_TEMPERATURE_ABOVE = 3,
            PROBECAL_TABLE_PRESSURE_IS_NAN = 4,
            PROBECAL_TABLE_PRESSURE_BELOW = 5,
            PROBECAL_TABLE_PRESSURE_ABOVE = 6,
            PROBECAL_TABLE_SALINITY_IS_NAN = 7,
            PROBECAL_TABLE_SALINITY_BELOW = 8,
            PROBECAL_TABLE_SALINITY_ABOVE = 9
        };
        #endif


        """;

    private static void Ends(StringBuilder text, string capitals, string word, TableAxis axis, bool single)
    {
        text.Append(CultureInfo.InvariantCulture, $"#define {capitals}_FIRST_{word} {Literal(axis.First, single)}\n");
        text.Append(CultureInfo.InvariantCulture, $"#define {capitals}_LAST_{word} {Literal(axis.Last, single)}\n");
        text.Append(CultureInfo.InvariantCulture, $"#define {capitals}_{(axis.Quantity == AxisQuantity.Temperature ? "ROWS" : "COLUMNS")}_PER_{(axis.Quantity == AxisQuantity.Temperature ? "KELVIN" : word)} {Literal(axis.PerUnit, single)}\n");
    }

    private static void Values(StringBuilder text, GasTable table, string snake, string capitals, string type, bool single)
    {
        text.Append(CultureInfo.InvariantCulture, $"\nstatic const {type} {snake}_values[{capitals}_ROWS]{(table.Columns is null ? "" : "[" + capitals + "_COLUMNS]")} = {{\n");
        string end = single ? "f" : "";
        if (table.Columns is null)
        {
            Wrapped(text, "    ", table.Texts, 0, table.Texts.Length, end, "\n");
        }
        else
        {
            for (int row = 0; row < table.Rows.Count; row++)
            {
                Wrapped(text, "    { ", table.Texts, row * table.ColumnCount, table.ColumnCount, end, row == table.Rows.Count - 1 ? " }\n" : " },\n");
            }
        }

        text.Append("};\n\n");
    }

    private static void Wrapped(StringBuilder text, string start, string[] values, int from, int count, string suffix, string end)
    {
        int width = start.Length;
        text.Append(start);
        for (int i = 0; i < count; i++)
        {
            string value = WithPoint(values[from + i]) + suffix + (i == count - 1 ? "" : ",");
            if (i != 0 && Widest < width + 1 + value.Length)
            {
                text.Append("\n      ");
                width = 6;
            }
            else if (i != 0)
            {
                text.Append(' ');
                width++;
            }

            text.Append(value);
            width += value.Length;
        }

        text.Append(end);
    }

    private static void ReaderOfOne(StringBuilder text, GasTable table, string snake, string capitals, string type)
    {
        text.Append(CultureInfo.InvariantCulture, $$"""
            /* The value at a temperature (degC); *{{table.Subject.CUnit}} is left as it was unless PROBECAL_TABLE_OK is answered. */
            static inline int {{snake}}_lookup({{type}} celsius, {{type}} *{{table.Subject.CUnit}})
            {
                {{type}} down, low;
                int row;

            {{NanCheck("celsius", "TEMPERATURE")}}
            {{RangeChecks("celsius", capitals, "CELSIUS", "TEMPERATURE")}}
                down = (celsius - {{capitals}}_FIRST_CELSIUS) * {{capitals}}_ROWS_PER_KELVIN;
                row = down < {{capitals}}_ROWS - 2 ? (int)down : {{capitals}}_ROWS - 2;
                low = {{snake}}_values[row];
                *{{table.Subject.CUnit}} = low + ({{snake}}_values[row + 1] - low) * (down - ({{type}})row);
                return PROBECAL_TABLE_OK;
            }

            """);
    }

    private static void ReaderOfTwo(StringBuilder text, GasTable table, string snake, string capitals, string type)
    {
        TableAxis columns = table.Columns!;
        string word = Word(columns);
        string argument = columns.Quantity == AxisQuantity.Pressure ? "hectopascal" : "salinity";
        string quantity = columns.Quantity == AxisQuantity.Pressure ? "PRESSURE" : "SALINITY";
        string said = columns.Quantity == AxisQuantity.Pressure ? "an absolute station pressure (hPa)" : "a practical salinity";
        text.Append(CultureInfo.InvariantCulture, $$"""
            /* The value at a temperature (degC) and {{said}}; *{{table.Subject.CUnit}} is left as it was
             * unless PROBECAL_TABLE_OK is answered. */
            static inline int {{snake}}_lookup({{type}} celsius, {{type}} {{argument}}, {{type}} *{{table.Subject.CUnit}})
            {
                {{type}} down, along, part, above, below;
                int row, column;

            {{NanCheck("celsius", "TEMPERATURE")}}
            {{NanCheck(argument, quantity)}}
            {{RangeChecks("celsius", capitals, "CELSIUS", "TEMPERATURE")}}
            {{RangeChecks(argument, capitals, word, quantity)}}
                down = (celsius - {{capitals}}_FIRST_CELSIUS) * {{capitals}}_ROWS_PER_KELVIN;
                along = ({{argument}} - {{capitals}}_FIRST_{{word}}) * {{capitals}}_COLUMNS_PER_{{word}};
                row = down < {{capitals}}_ROWS - 2 ? (int)down : {{capitals}}_ROWS - 2;
                column = along < {{capitals}}_COLUMNS - 2 ? (int)along : {{capitals}}_COLUMNS - 2;
                part = along - ({{type}})column;
                above = {{snake}}_values[row][column];
                above = above + ({{snake}}_values[row][column + 1] - above) * part;
                below = {{snake}}_values[row + 1][column];
                below = below + ({{snake}}_values[row + 1][column + 1] - below) * part;
                *{{table.Subject.CUnit}} = above + (below - above) * (down - ({{type}})row);
                return PROBECAL_TABLE_OK;
            }

            """);
    }

    private static string NanCheck(string argument, string name)
    {
        return $$"""
                if ({{argument}} != {{argument}}) { return PROBECAL_TABLE_{{name}}_IS_NAN; }
            """;
    }

    private static string RangeChecks(string argument, string capitals, string word, string name)
    {
        return $$"""
                if ({{argument}} < {{capitals}}_FIRST_{{word}}) { return PROBECAL_TABLE_{{name}}_BELOW; }
                if ({{capitals}}_LAST_{{word}} < {{argument}}) { return PROBECAL_TABLE_{{name}}_ABOVE; }
            """;
    }

    private static string Word(TableAxis axis)
    {
        return axis.Quantity switch { AxisQuantity.Temperature => "CELSIUS", AxisQuantity.Pressure => "HECTOPASCAL", _ => "SALINITY" };
    }

    private static string Literal(double value, bool single)
    {
        string number = single ? ((float)value).ToString("R", CultureInfo.InvariantCulture) + "f" : Number.Print(value);
        string literal = single ? WithPoint(number[..^1]) + "f" : WithPoint(number);
        return literal[0] == '-' ? "(" + literal + ")" : literal;
    }

    /// <summary>A C number is a whole number without a point; these are none.</summary>
    private static string WithPoint(string number)
    {
        return number.Contains('.', System.StringComparison.Ordinal) || number.Contains('E', System.StringComparison.Ordinal) ? number : number + ".0";
    }
}
