using System;
using System.Collections.Generic;
using System.IO;

namespace ProbeCal.Host.Commands;

/// <summary>Columns of plain text, as wide as their widest cell.</summary>
internal static class TextTable
{
    internal static void Write(TextWriter output, IReadOnlyList<string[]> rows, string indent)
    {
        int columns = 0;
        foreach (string[] row in rows)
        {
            columns = Math.Max(columns, row.Length);
        }

        int[] widths = new int[columns];
        foreach (string[] row in rows)
        {
            for (int i = 0; i < row.Length; i++)
            {
                widths[i] = Math.Max(widths[i], row[i].Length);
            }
        }

        foreach (string[] row in rows)
        {
            string line = indent;
            for (int i = 0; i < row.Length; i++)
            {
                line += i == row.Length - 1 ? row[i] : row[i].PadRight(widths[i] + 2);
            }

            output.WriteLine(line.TrimEnd());
        }
    }
}
