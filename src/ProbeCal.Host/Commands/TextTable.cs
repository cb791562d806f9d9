using System;
using System.Collections.Generic;
using System.IO;

namespace ProbeCal.Host.Commands;

/// <summary>Plain text that fits a terminal: columns as wide as their widest cell, the last one wrapped between words.</summary>
internal static class TextTable
{
    /// <summary>Widest line, characters: two windows beside each other on a field laptop still show it whole.</summary>
    internal const int Widest = 100;

    /// <summary>Least room that the last column is wrapped in; a narrower one would be a ribbon.</summary>
    private const int Narrowest = 24;

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
            for (int i = 0; i < row.Length - 1; i++)
            {
                line += row[i].PadRight(widths[i] + 2);
            }

            WriteWrapped(output, line, new string(' ', line.Length), row[^1]);
        }
    }

    /// <summary>Writes text behind a beginning, its further lines behind another.</summary>
    internal static void WriteWrapped(TextWriter output, string first, string further, string text)
    {
        string line = first;
        bool begun = false;
        int widest = Math.Max(Widest, further.Length + Narrowest);
        foreach (string word in text.Split(' '))
        {
            if (begun && widest < line.Length + 1 + word.Length)
            {
                output.WriteLine(line.TrimEnd());
                line = further;
                begun = false;
            }

            line += begun ? " " + word : word;
            begun = true;
        }

        output.WriteLine(line.TrimEnd());
    }
}
