using System;
using System.Globalization;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>A report as one HTML page: black on white, nothing fetched, no script, one side of A4 or Letter where it fits.</summary>
internal static class ReportHtml
{
    private const string Style = """
        @page { size: auto; margin: 8.5mm 9mm 9.5mm; 
            @bottom-left { content: "FOOT"; font: 7pt FACES; color: #000; vertical-align: top; white-space: nowrap; }
            @bottom-right { content: "page " counter(page) " of " counter(pages); font: 7pt FACES; color: #000; vertical-align: top; } }
        * { box-sizing: border-box; }
        body { font: 7.3pt/8.5pt FACES; color: #000; background: #fff; width: 188mm; margin: 0 auto; overflow-wrap: anywhere; }
        header { display: flex; justify-content: space-between; align-items: flex-start; gap: 4mm; }
        h1 { font-size: 12pt; line-height: 15pt; margin: 0 0 0.6mm; }
        h2 { font-size: 8.2pt; line-height: 8.6pt; margin: 0.6mm 0 0.2mm; padding-top: 0.4mm; border-top: 0.3mm solid #000; break-after: avoid; }
        p { margin: 0; }
        p:has(+ .on), p.on { display: inline; }
        .verdict { font-size: 12pt; line-height: 15pt; font-weight: bold; border: 0.4mm solid #000; padding: 0.3mm 2.4mm; margin: 0; white-space: nowrap; }
        .warning { font-size: 8.4pt; line-height: 10.2pt; font-weight: bold; }
        dl { display: grid; grid-template-columns: 30mm 1fr 30mm 1fr; column-gap: 0; margin: 0; }
        dl.one { grid-template-columns: 30mm 1fr; align-content: start; }
        dt, dd { margin: 0; padding-right: 1.4mm; break-inside: avoid; }
        dd { font-weight: bold; min-width: 0; }
        dl:not(.one) dt.wide { grid-column: 1; }
        dl:not(.one) dd.wide { grid-column: 2 / -1; }
        .beside { display: grid; grid-template-columns: 1fr auto; column-gap: 2mm; break-inside: avoid; }
        table { border-collapse: collapse; table-layout: fixed; width: 100%; font-size: 7pt; line-height: 8.1pt; font-variant-numeric: tabular-nums; }
        th, td { text-align: left; vertical-align: top; padding: 0 6pt 0 0; border-bottom: 0.09mm solid #000; }
        th { border-bottom: 0.2mm solid #000; vertical-align: bottom; overflow-wrap: normal; }
        tr { break-inside: avoid; }
        .narrow th, .narrow td { padding-right: 4pt; }
        tr > :last-child { padding-right: 0 !important; }
        .figure { text-align: right; }
        svg { display: block; max-width: 100%; }
        .ink { display: grid; grid-template-columns: 30mm 1fr; align-items: end; height: 7.4mm; break-inside: avoid; }
        .ink span { border-bottom: 0.2mm solid #000; height: 100%; }
        """;

    /// <summary>The whole page.</summary>
    internal static string Write(Report report)
    {
        StringBuilder page = new();
        page.Append("<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\"/>\n<meta name=\"viewport\" content=\"width=device-width\"/>\n<title>").Append(PageText.Escape(report.Title)).Append("</title>\n<style>\n")
            .Append(Style.Replace("FACES", PlotSvg.Faces, StringComparison.Ordinal).Replace("FOOT", CssString(report.Foot), StringComparison.Ordinal)).Append("\n</style>\n</head>\n<body>\n<header>\n<h1 dir=\"auto\">").Append(PageText.Escape(report.Title)).Append("</h1>\n");
        if (report.Verdict.Length != 0)
        {
            page.Append("<p class=\"verdict\">").Append(PageText.Escape(report.Verdict)).Append("</p>\n");
        }

        page.Append("</header>\n");
        foreach (string warning in report.Warnings)
        {
            page.Append("<p class=\"warning\" dir=\"auto\">").Append(PageText.Escape(warning)).Append("</p>\n");
        }

        if (!ReportPdf.FitsOnePage(report))
        {
            page.Append("<p>").Append(ReportPdf.Continues).Append("</p>\n");
        }

        page.Append("<main>\n");
        foreach (ReportSection section in report.Sections)
        {
            Section(page, section);
        }

        page.Append("</main>\n</body>\n</html>\n");
        return page.ToString();
    }

    /// <summary>Text between the quotes of a style sheet: all but letters, digits and a few signs by their codes.</summary>
    private static string CssString(string text)
    {
        StringBuilder css = new();
        foreach (Rune rune in PageText.Shown(text).EnumerateRunes())
        {
            bool plain = rune.IsAscii && (Rune.IsLetterOrDigit(rune) || rune.Value is ' ' or '-' or '.' or '_');
            css.Append(plain ? rune.ToString() : string.Create(CultureInfo.InvariantCulture, $"\\{rune.Value:X} "));
        }

        return css.ToString();
    }

    private static void Section(StringBuilder page, ReportSection section)
    {
        page.Append("<section>\n<h2>").Append(PageText.Escape(section.Title)).Append("</h2>\n");
        for (int i = 0; i < section.Blocks.Count; i++)
        {
            if (section.Blocks[i] is ReportFields fields && i + 1 < section.Blocks.Count && section.Blocks[i + 1] is ReportPlot plot)
            {
                page.Append("<div class=\"beside\">\n");
                Fields(page, fields, one: true);
                page.Append(PlotSvg.Element(plot, PageSizes.SmallPlotWidth, PageSizes.SmallPlotHeight)).Append("</div>\n");
                i++;
            }
            else
            {
                Block(page, section.Blocks[i]);
            }
        }

        page.Append("</section>\n");
    }

    private static void Block(StringBuilder page, ReportBlock block)
    {
        switch (block)
        {
            case ReportFields fields:
                Fields(page, fields, one: false);
                break;
            case ReportTable table:
                Table(page, table);
                break;
            case ReportSentence sentence:
                page.Append(CultureInfo.InvariantCulture, $"<p id=\"{sentence.Id}\" dir=\"auto\"{(sentence.RunsOn ? " class=\"on\"" : "")}>{PageText.Escape(sentence.Text)}</p>\n");
                break;
            case ReportPlot plot:
                page.Append(PlotSvg.Element(plot, 532, PageSizes.PlotHeight));
                break;
            case ReportInk ink:
                page.Append(CultureInfo.InvariantCulture, $"<p class=\"ink\" id=\"{ink.Id}\">{PageText.Escape(ink.Name)}<span></span></p>\n");
                break;
        }
    }

    private static void Fields(StringBuilder page, ReportFields fields, bool one)
    {
        page.Append(one ? "<dl class=\"one\">\n" : "<dl>\n");
        foreach (ReportField field in fields.Fields)
        {
            string wide = PageSizes.IsWide(field) ? " class=\"wide\"" : "";
            page.Append(CultureInfo.InvariantCulture, $"<dt{wide}>{PageText.Escape(field.Name)}</dt><dd{wide} id=\"{field.Id}\" dir=\"auto\">{PageText.Escape(field.Value)}</dd>\n");
        }

        page.Append("</dl>\n");
    }

    private static void Table(StringBuilder page, ReportTable table)
    {
        double gap = PageSizes.Gap(table);
        double[] widths = TableWidths.Of(table, PageSizes.Table, PageSizes.Content - (gap * (table.Columns.Count - 1)));
        page.Append(gap < PageSizes.ColumnGap ? "<table class=\"narrow\">\n<colgroup>" : "<table>\n<colgroup>");
        for (int i = 0; i < widths.Length; i++)
        {
            double behind = i < widths.Length - 1 ? gap : 0;
            page.Append(CultureInfo.InvariantCulture, $"<col style=\"width: {Number.Fixed(100 * (widths[i] + behind) / PageSizes.Content, 2)}%\"/>");
        }

        page.Append("</colgroup>\n<thead>\n<tr>");
        foreach (ReportColumn column in table.Columns)
        {
            page.Append(column.IsNumber ? "<th scope=\"col\" class=\"figure\">" : "<th scope=\"col\">").Append(PageText.Escape(column.Name)).Append("</th>");
        }

        page.Append("</tr>\n</thead>\n<tbody>\n");
        foreach (string[] row in table.Rows)
        {
            page.Append("<tr>");
            for (int i = 0; i < row.Length; i++)
            {
                page.Append(table.Columns[i].IsNumber ? "<td class=\"figure\">" : "<td dir=\"auto\">").Append(PageText.Escape(row[i])).Append("</td>");
            }

            page.Append("</tr>\n");
        }

        page.Append("</tbody>\n</table>\n");
    }
}
