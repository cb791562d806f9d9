using System.Linq;

namespace ProbeCal.Station.Reports;

/// <summary>The paper of a PDF. A page of HTML takes what the browser is set to; its contents fit both.</summary>
public enum PaperSize
{
    /// <summary>ISO 216: 210 mm × 297 mm.</summary>
    A4,

    /// <summary>8.5 in × 11 in.</summary>
    Letter,
}

/// <summary>The measures that the page and the PDF share, in points. The smallest type is 7 points: it can be read on paper.</summary>
internal static class PageSizes
{
    internal const double Content = 533;
    internal const double ColumnGap = 6;
    internal const double Body = 7.3;
    internal const double Leading = 8.5;
    internal const double Table = 7;
    internal const double TableLeading = 8;
    internal const double NameWidth = 86;
    internal const double PlotHeight = 150;
    internal const double SmallPlotWidth = 285;
    internal const double SmallPlotHeight = 80;
    internal const double InkHeight = 21;

    /// <summary>Room of a value in one of two columns; what would take more than two lines of it gets the whole width.</summary>
    private const double HalfValue = 177;

    /// <summary>Room between the columns of a table: less where there are many.</summary>
    internal static double Gap(ReportTable table)
    {
        return 12 < table.Columns.Count ? 4 : ColumnGap;
    }

    /// <summary>Width and height of a paper.</summary>
    internal static (double Width, double Height) Points(this PaperSize paper)
    {
        return paper == PaperSize.Letter ? (612, 792) : (595.28, 841.89);
    }

    /// <summary>True when a field takes the whole width; a hash is not broken for the sake of half of it.</summary>
    internal static bool IsWide(ReportField field)
    {
        string value = FontFile.Bold.Showable(field.Value);
        return 1.8 * HalfValue < FontFile.Bold.Width(value, Body) || value.Split(' ').Any(static word => HalfValue < FontFile.Bold.Width(word, Body));
    }
}
