using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using ProbeCal.Station.Reports;

namespace ProbeCal.Host.Commands;

/// <summary>A report on the terminal: the same fields and figures as its page.</summary>
internal static class ReportPage
{
    private const int NameWidth = 24;

    /// <summary>Most columns that a table is printed across; a wider one is printed as fields, row by row.</summary>
    private const int MostAcross = 8;

    internal static void Write(TextWriter output, Report report)
    {
        output.WriteLine(report.Title + (report.Verdict.Length == 0 ? "" : ": " + report.Verdict));
        foreach (string warning in report.Warnings)
        {
            TextTable.WriteWrapped(output, "", "  ", Line(warning));
        }

        foreach (ReportSection section in report.Sections)
        {
            output.WriteLine();
            output.WriteLine(section.Title);
            foreach (ReportBlock block in section.Blocks)
            {
                Block(output, block);
            }
        }
    }

    private static void Block(TextWriter output, ReportBlock block)
    {
        switch (block)
        {
            case ReportFields fields:
                foreach (ReportField field in fields.Fields)
                {
                    Field(output, "  ", field.Name, field.Value);
                }

                break;
            case ReportTable table:
                Table(output, table);
                break;
            case ReportSentence sentence:
                TextTable.WriteWrapped(output, "  ", "  ", Line(sentence.Text));
                break;
            case ReportPlot plot:
                CharacterPlot.Write(output, plot, "  ");
                break;
            case ReportInk ink:
                output.WriteLine("  " + ink.Name.PadRight(NameWidth) + new string('_', 40));
                break;
        }
    }

    private static void Table(TextWriter output, ReportTable table)
    {
        if (table.Columns.Count <= MostAcross)
        {
            TextTable.Write(output, [[.. table.Columns.Select(static column => column.Name)], .. table.Rows.Select(static row => row.Select(Line).ToArray())], "  ");
            return;
        }

        // A row of many columns reads better downwards than folded.
        foreach (string[] row in table.Rows)
        {
            for (int i = 0; i < row.Length; i++)
            {
                Field(output, i == 0 ? "  " : "    ", table.Columns[i].Name, row[i]);
            }
        }
    }

    private static void Field(TextWriter output, string indent, string name, string value)
    {
        string first = (indent + name).PadRight(NameWidth + 2) + " ";
        TextTable.WriteWrapped(output, first, new string(' ', first.Length), Line(value));
    }

    private static string Line(string text)
    {
        return Station.Entry.Wrong.OneLine(text);
    }
}
