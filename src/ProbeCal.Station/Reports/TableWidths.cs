using System;
using System.Collections.Generic;
using System.Linq;

namespace ProbeCal.Station.Reports;

/// <summary>How the columns of a table share the width of a page.</summary>
internal static class TableWidths
{
    /// <summary>Widest that the longest word of a column may claim; longer ones are broken.</summary>
    private const double WidestWord = 110;

    /// <summary>The widths, points, without the gaps between.</summary>
    internal static double[] Of(ReportTable table, double size, double room)
    {
        double[] least = new double[table.Columns.Count];
        double[] whole = new double[table.Columns.Count];
        for (int i = 0; i < least.Length; i++)
        {
            // A head may stand in two lines, a cell of words in as many as it must; figures stay in one.
            least[i] = Words(FontFile.Bold, table.Columns[i].Name);
            whole[i] = Math.Max(least[i], (0.5 * FontFile.Bold.Width(table.Columns[i].Name, size)) + 6);
            foreach (string[] row in table.Rows)
            {
                string cell = FontFile.Regular.Showable(row[i]);
                double wide = FontFile.Regular.Width(cell, size) + 0.5;
                least[i] = Math.Max(least[i], table.Columns[i].IsNumber ? Math.Min(WidestWord, wide) : Words(FontFile.Regular, cell));
                whole[i] = Math.Max(whole[i], wide);
            }
        }

        double wanted = whole.Sum();
        double needed = least.Sum();
        if (room < needed)
        {
            return [.. least.Select(width => width * room / needed)];
        }

        double share = wanted <= room ? 1 : (room - needed) / (wanted - needed);
        double[] widths = [.. least.Select((width, i) => width + (share * (whole[i] - width)))];
        // What is left goes to the last column of words, or lies behind the last one.
        int last = Enumerable.Range(0, widths.Length).LastOrDefault(i => !table.Columns[i].IsNumber, -1);
        if (0 <= last)
        {
            widths[last] += room - widths.Sum();
        }

        return widths;

        double Words(FontFile font, string text)
        {
            return text.Split(' ').Select(word => Math.Min(WidestWord, font.Width(word, size))).DefaultIfEmpty(0).Max() + 0.5;
        }
    }
}
