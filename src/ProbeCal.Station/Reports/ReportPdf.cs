using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>
/// Lays a report out on pages: one if it fits, numbered ones if not; the type is never made smaller to make it fit. Black on
/// white, lines in place of fills.
/// </summary>
internal sealed class ReportPdf
{
    /// <summary>What a report says of itself when one page does not hold it.</summary>
    internal const string Continues = "One page does not hold this record: it continues on further pages, which are numbered.";

    private const double ContentWidth = PageSizes.Content;
    private const double Margin = 22.7;
    private const double FootHeight = 10;
    private const double Size = PageSizes.Body;
    private const double Leading = PageSizes.Leading;
    private const double Gap = PageSizes.ColumnGap;

    private readonly List<PdfPage> _pages = [];
    private readonly Report _report;
    private readonly double _width;
    private readonly double _height;
    private readonly double _left;
    private PdfPage _page;
    private double _y;

    private ReportPdf(Report report, PaperSize paper, bool continues)
    {
        _report = report;
        (_width, _height) = paper.Points();
        _left = (_width - ContentWidth) / 2;
        _page = NewPage();
        Head(continues);
        foreach (ReportSection section in report.Sections)
        {
            Section(section);
        }

        Feet();
    }

    /// <summary>The report as a PDF file.</summary>
    /// <param name="report">The report.</param>
    /// <param name="paper">The paper.</param>
    /// <param name="producer">Program and version, for the properties of the file.</param>
    /// <param name="made">When it was made, UTC.</param>
    internal static byte[] Write(Report report, PaperSize paper, string producer, DateTimeOffset made)
    {
        return PdfFile.Write(Pages(report, paper), report.Title, producer, made);
    }

    /// <summary>True when one page of either paper holds the report.</summary>
    internal static bool FitsOnePage(Report report)
    {
        return Pages(report, PaperSize.A4).Count == 1 && Pages(report, PaperSize.Letter).Count == 1;
    }

    private static List<PdfPage> Pages(Report report, PaperSize paper)
    {
        List<PdfPage> pages = new ReportPdf(report, paper, continues: false)._pages;
        return pages.Count == 1 ? pages : new ReportPdf(report, paper, continues: true)._pages;
    }

    private PdfPage NewPage()
    {
        _page = new PdfPage(_width, _height);
        _pages.Add(_page);
        _y = Margin;
        return _page;
    }

    private void Need(double height)
    {
        if (_height - Margin - FootHeight < _y + height && Margin < _y)
        {
            NewPage();
        }
    }

    private void Head(bool continues)
    {
        double verdict = 0;
        if (_report.Verdict.Length != 0)
        {
            string shown = FontFile.Bold.Showable(_report.Verdict);
            verdict = FontFile.Bold.Width(shown, 12) + 14;
            _page.Box(_left + ContentWidth - verdict, _y, verdict, 18, 1.2);
            _page.Text(FontFile.Bold, 12, _left + ContentWidth - verdict + 7, _y + 13.4, shown);
        }

        foreach (string line in TextFlow.Lines(FontFile.Bold, 12, FontFile.Bold.Showable(_report.Title), ContentWidth - verdict - 8))
        {
            _page.Text(FontFile.Bold, 12, _left, _y + 13, line);
            _y += 15;
        }

        _y += 1.5;
        foreach (string warning in _report.Warnings)
        {
            Wrapped(FontFile.Bold, 8.4, 10.2, 0, ContentWidth, warning);
        }

        if (continues)
        {
            Wrapped(FontFile.Regular, Size, Leading, 0, ContentWidth, Continues);
        }
    }

    private void Feet()
    {
        for (int i = 0; i < _pages.Count; i++)
        {
            PdfPage page = _pages[i];
            double y = _height - Margin - 9;
            page.Line(PlotStroke.Thin, 0.4, [(_left, y), (_left + ContentWidth, y)]);
            string number = $"page {Number.Print(i + 1)} of {Number.Print(_pages.Count)}";
            double wide = FontFile.Regular.Width(number, 7);
            page.Text(FontFile.Regular, 7, _left + ContentWidth - wide, y + 9, number);
            // A foot is one line: whatever it must not lose stands in the report as well.
            page.Text(FontFile.Regular, 7, _left, y + 9, TextFlow.Lines(FontFile.Regular, 7, FontFile.Regular.Showable(_report.Foot), ContentWidth - wide - 12)[0]);
        }
    }

    private void Section(ReportSection section)
    {
        Need(13 + (3 * Leading));
        _y += 2.5;
        _page.Line(PlotStroke.Solid, 0.8, [(_left, _y), (_left + ContentWidth, _y)]);
        _y += 8.4;
        _page.Text(FontFile.Bold, 8.2, _left, _y, FontFile.Bold.Showable(section.Title));
        _y += 2.1;
        for (int i = 0; i < section.Blocks.Count; i++)
        {
            if (section.Blocks[i] is ReportSentence)
            {
                List<string> paragraph = [];
                while (i < section.Blocks.Count && section.Blocks[i] is ReportSentence sentence && (paragraph.Count == 0 || sentence.RunsOn))
                {
                    paragraph.Add(sentence.Text);
                    i++;
                }

                i--;
                Wrapped(FontFile.Regular, Size, Leading, 0, ContentWidth, string.Join(' ', paragraph));
            }
            else if (section.Blocks[i] is ReportFields fields && i + 1 < section.Blocks.Count && section.Blocks[i + 1] is ReportPlot beside)
            {
                Beside(fields, beside);
                i++;
            }
            else
            {
                Block(section.Blocks[i]);
            }
        }
    }

    private void Block(ReportBlock block)
    {
        switch (block)
        {
            case ReportFields fields:
                Fields(fields);
                break;
            case ReportTable table:
                Table(table);
                break;
            case ReportPlot plot:
                Need(PageSizes.PlotHeight);
                _page.Plot(plot, _left, _y, ContentWidth, PageSizes.PlotHeight);
                _y += PageSizes.PlotHeight;
                break;
            case ReportInk ink:
                Need(PageSizes.InkHeight);
                _page.Text(FontFile.Regular, Size, _left, _y + PageSizes.InkHeight - 3, ink.Name);
                _page.Line(PlotStroke.Solid, 0.6, [(_left + PageSizes.NameWidth, _y + PageSizes.InkHeight - 2), (_left + ContentWidth, _y + PageSizes.InkHeight - 2)]);
                _y += PageSizes.InkHeight;
                break;
        }
    }

    /// <summary>Fields down the left half, a plot in the right one.</summary>
    private void Beside(ReportFields fields, ReportPlot plot)
    {
        double room = ContentWidth - PageSizes.SmallPlotWidth - Gap;
        double needed = fields.Fields.Sum(field => Leading * Value(field, room - PageSizes.NameWidth).Count);
        Need(Math.Max(needed, PageSizes.SmallPlotHeight));
        double top = _y;
        foreach (ReportField field in fields.Fields)
        {
            Field(field, 0, room);
        }

        _page.Plot(plot, _left + ContentWidth - PageSizes.SmallPlotWidth, top, PageSizes.SmallPlotWidth, PageSizes.SmallPlotHeight);
        _y = Math.Max(_y, top + PageSizes.SmallPlotHeight);
    }

    /// <summary>Fields two beside each other; a long value takes the whole width.</summary>
    private void Fields(ReportFields fields)
    {
        double half = (ContentWidth - Gap) / 2;
        for (int i = 0; i < fields.Fields.Count; i++)
        {
            ReportField field = fields.Fields[i];
            if (PageSizes.IsWide(field))
            {
                Field(field, 0, ContentWidth);
                continue;
            }

            ReportField? next = i + 1 < fields.Fields.Count && !PageSizes.IsWide(fields.Fields[i + 1]) ? fields.Fields[i + 1] : null;
            double room = half - PageSizes.NameWidth;
            Need(Leading * Math.Max(Value(field, room).Count, next is null ? 0 : Value(next, room).Count));
            double top = _y;
            Field(field, 0, half);
            if (next is not null)
            {
                double below = _y;
                _y = top;
                Field(next, half + Gap, half);
                _y = Math.Max(_y, below);
                i++;
            }
        }
    }

    private void Field(ReportField field, double indent, double width)
    {
        List<string> lines = Value(field, width - PageSizes.NameWidth);
        for (int i = 0; i < lines.Count; i++)
        {
            Need(Leading);
            if (i == 0)
            {
                _page.Text(FontFile.Regular, Size, _left + indent, _y + Size, field.Name);
            }

            _page.Text(FontFile.Bold, Size, _left + indent + PageSizes.NameWidth, _y + Size, lines[i]);
            _y += Leading;
        }
    }

    private static List<string> Value(ReportField field, double width)
    {
        return TextFlow.Lines(FontFile.Bold, Size, FontFile.Bold.Showable(field.Value), width);
    }

    private void Table(ReportTable table)
    {
        double room = ContentWidth - (PageSizes.Gap(table) * (table.Columns.Count - 1));
        double[] widths = TableWidths.Of(table, PageSizes.Table, room);
        string[] heads = [.. table.Columns.Select(static column => column.Name)];
        Need(3 * PageSizes.TableLeading);
        Row(table, widths, heads, FontFile.Bold);
        foreach (string[] row in table.Rows)
        {
            if (Row(table, widths, row, FontFile.Regular, dry: true))
            {
                NewPage();
                Row(table, widths, heads, FontFile.Bold);
            }

            Row(table, widths, row, FontFile.Regular);
        }

        _y += 1;
    }

    /// <summary>Draws a row, or only says whether it wants another page.</summary>
    private bool Row(ReportTable table, double[] widths, string[] cells, FontFile font, bool dry = false)
    {
        List<string>[] lines = [.. cells.Select((cell, i) => TextFlow.Lines(font, PageSizes.Table, font.Showable(cell), widths[i]))];
        int most = lines.Max(static cell => cell.Count);
        if (dry)
        {
            return _height - Margin - FootHeight < _y + (most * PageSizes.TableLeading) + 1;
        }

        double x = _left;
        for (int i = 0; i < lines.Length; i++)
        {
            for (int line = 0; line < lines[i].Count; line++)
            {
                double back = table.Columns[i].IsNumber ? widths[i] - font.Width(lines[i][line], PageSizes.Table) : 0;
                _page.Text(font, PageSizes.Table, x + back, _y + (line * PageSizes.TableLeading) + PageSizes.Table, lines[i][line]);
            }

            x += widths[i] + PageSizes.Gap(table);
        }

        _y += (most * PageSizes.TableLeading) + 0.8;
        _page.Line(PlotStroke.Thin, font == FontFile.Bold ? 0.6 : 0.25, [(_left, _y), (_left + ContentWidth, _y)]);
        return false;
    }

    private void Wrapped(FontFile font, double size, double leading, double indent, double width, string text)
    {
        foreach (string line in TextFlow.Lines(font, size, font.Showable(text), width))
        {
            Need(leading);
            _page.Text(font, size, _left + indent, _y + size, line);
            _y += leading;
        }
    }
}
