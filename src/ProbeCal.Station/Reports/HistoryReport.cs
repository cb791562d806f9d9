using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>The history of a probe as a report, a picture or a table.</summary>
public static class HistoryReport
{
    private static readonly PlotMark[] _marks = [PlotMark.Ring, PlotMark.Disc, PlotMark.Square, PlotMark.Diamond, PlotMark.Triangle];

    private static readonly string[] _heads =
    [
        "time_utc", "record", "purpose", "membrane", "slope", "slope_u", "zero", "zero_u", "as_found_error_mg_per_L", "as_found_error_u_mg_per_L", "left_out",
    ];

    private static readonly ReportColumn[] _columns =
    [
        new("history-time", "time (UTC)", false), new("history-record", "record", false), new("history-purpose", "purpose", false), new("history-membrane", "membrane", false),
        new("history-slope", "slope", true), new("history-slope-uncertainty", "u", true), new("history-zero", "zero", true), new("history-zero-uncertainty", "u", true),
        new("history-error", "as found mg/L", true), new("history-error-uncertainty", "u", true), new("history-left-out", "not in trends", false),
    ];

    /// <summary>The history as a report: for each quantity the trends in words and a picture, then every figure.</summary>
    /// <param name="history">The history.</param>
    /// <param name="madeUtc">When the report is made.</param>
    /// <param name="software">Program and version that makes it.</param>
    public static Report Of(ProbeHistory history, DateTimeOffset madeUtc, string software)
    {
        return new Report
        {
            Title = "History of probe " + history.Probe,
            Verdict = "",
            Warnings = [],
            Sections =
            [
                .. Quantities(history).Select(quantity => new ReportSection(quantity.Title, [.. Sentences(history, quantity), Plot(history, quantity)])),
                new ReportSection("Calibrations and checks", [Table(history), .. Past(history)]),
                new ReportSection("How the trends are made",
                [
                    new ReportSentence("history-how", "A straight line for each membrane, weighted by the uncertainties of the values; where they scatter more than their uncertainties say, its covariance is widened by chi-squared over the degrees of freedom. Intervals are 95 % by Student's t; the date of leaving is given with the days between which a new calibration will first find the value outside. Failed and withdrawn calibrations are shown by crosses and left out."),
                    new ReportSentence("history-made", $"Made {ReportText.Time(madeUtc)} UTC by {software}."),
                ]),
            ],
            Foot = "History of probe " + history.Probe,
        };
    }

    /// <summary>The three pictures as one SVG file.</summary>
    public static string Svg(ProbeHistory history)
    {
        const double Width = 560;
        const double Height = 190;
        StringBuilder svg = new();
        List<Quantity> quantities = Quantities(history);
        svg.Append(CultureInfo.InvariantCulture, $"<svg xmlns=\"http://www.w3.org/2000/svg\" role=\"group\" aria-label=\"History of probe {PageText.Escape(history.Probe)}\" viewBox=\"0 0 {Width} {Height * quantities.Count}\" width=\"{Width}pt\" height=\"{Height * quantities.Count}pt\">\n<rect width=\"100%\" height=\"100%\" fill=\"#fff\"/>\n");
        for (int i = 0; i < quantities.Count; i++)
        {
            svg.Append(CultureInfo.InvariantCulture, $"<g transform=\"translate(0 {i * Height})\">\n{PlotSvg.Element(Plot(history, quantities[i]), Width, Height, unit: "")}</g>\n");
        }

        return svg.Append("</svg>\n").ToString();
    }

    /// <summary>Every figure as CSV, in full precision.</summary>
    public static string Csv(ProbeHistory history)
    {
        string unit = history.ErrorUnit.Replace("/", "_per_", StringComparison.Ordinal);
        StringBuilder csv = new(string.Join(',', _heads).Replace("mg_per_L", unit, StringComparison.Ordinal) + "\n");
        foreach (HistoryEntry entry in history.Entries)
        {
            string[] cells =
            [
                entry.AtUtc.UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture), entry.Id, entry.Purpose, history.Membranes[entry.Membrane],
                .. Both(entry.Slope), .. Both(entry.Zero), .. Both(entry.Error), entry.LeftOut,
            ];
            csv.AppendJoin(',', cells.Select(Cell)).Append('\n');
        }

        return csv.ToString();

        static string[] Both(HistoryValue? value)
        {
            return value is null ? ["", ""] : [Number.Print(value.Value), Number.Print(value.StandardUncertainty)];
        }
    }

    /// <summary>Writes the history as the ending of the file says: <c>.html</c>, <c>.pdf</c>, <c>.svg</c> or <c>.csv</c>.</summary>
    /// <exception cref="InputException">The ending is none of them.</exception>
    /// <exception cref="WorkFailedException">The system refuses the file.</exception>
    public static void Write(string path, ProbeHistory history, PaperSize paper, DateTimeOffset madeUtc, string software)
    {
        switch (ReportFile.Form(path, ".html", ".pdf", ".svg", ".csv"))
        {
            case ".svg":
                ReportFile.Save(path, Encoding.UTF8.GetBytes(Svg(history)));
                break;
            case ".csv":
                ReportFile.Save(path, Encoding.UTF8.GetBytes(Csv(history)));
                break;
            default:
                ReportFile.Write(path, Of(history, madeUtc, software), paper, software, madeUtc);
                break;
        }
    }

    /// <summary>What is followed over time.</summary>
    private sealed record Quantity(string Id, string Title, string Unit, Func<HistoryEntry, HistoryValue?> Value, HistoryWindow? Window, string NoWindow);

    private static List<Quantity> Quantities(ProbeHistory history)
    {
        string signal = history.SignalUnit.Length == 0 ? "signal" : history.SignalUnit;
        string slope = history.IsMeter ? "1" : signal + (history.IsLogarithmic ? "/decade" : "/hPa");
        return
        [
            new("history-slope-plot", "Slope, " + slope, slope, static entry => entry.Slope, history.SlopeWindow, "no window of the slope was entered, and there is no published one"),
            new("history-zero-plot", "Zero, " + (history.IsMeter ? "hPa" : signal), history.IsMeter ? "hPa" : signal, static entry => entry.Zero, history.ZeroWindow, "no window of the zero was entered, and there is no published one"),
            new("history-error-plot", "Error as found, " + history.ErrorUnit, history.ErrorUnit, static entry => entry.Error, history.ErrorWindow, "there is no published limit at its points"),
        ];
    }

    private static List<(double Day, HistoryValue Value)> Counted(ProbeHistory history, Quantity quantity, int membrane)
    {
        return [.. history.Entries.Where(entry => entry.Membrane == membrane && entry.LeftOut.Length == 0 && quantity.Value(entry) is not null)
            .Select(entry => (PlotTicks.Days(entry.AtUtc), quantity.Value(entry)!))];
    }

    private static IEnumerable<ReportSentence> Sentences(ProbeHistory history, Quantity quantity)
    {
        if (quantity.Window is HistoryWindow window)
        {
            yield return new ReportSentence("history-window", $"Window {ReportText.Few(window.Low)} to {ReportText.Few(window.High)} {quantity.Unit} ({window.Source}).");
        }

        for (int i = 0; i < history.Membranes.Count; i++)
        {
            yield return new ReportSentence("history-trend", $"{history.Membranes[i]}: {Trend(Counted(history, quantity, i), quantity)}.");
        }
    }

    private static string Trend(List<(double Day, HistoryValue Value)> points, Quantity quantity)
    {
        string count = Number.Print(points.Count) + (points.Count == 1 ? " value" : " values");
        if (HistoryTrend.Of(points) is not HistoryTrend trend)
        {
            return count + "; a trend takes three at different times";
        }

        const double Year = 365.25;
        string change = $"{count}; change a year {ReportText.Known(trend.PerDay * Year, trend.PerDayUncertainty * Year)} {quantity.Unit}, u {ReportText.Uncertainty(trend.PerDayUncertainty * Year)}, 95 % ±{ReportText.Uncertainty(trend.PerDayHalfWidth * Year)}";
        if (!trend.IsSignificant)
        {
            return change + ": not told from none; when it leaves the window cannot be said";
        }

        if (quantity.Window is null)
        {
            return $"{change}; {quantity.NoWindow}";
        }

        HistoryLeaving leaving = trend.Leaves(quantity.Window)!;
        string bound = $"{ReportText.Few(leaving.Bound)} {quantity.Unit}";
        return leaving.Expected == trend.LastDay
            ? $"{change}; it is beyond {bound} already"
            : $"{change}; it reaches {bound} {(double.IsFinite(leaving.Expected) ? "on " + Date(leaving.Expected) : "in more than 50 years")} (a new calibration first finds it outside between {Date(leaving.Earliest)} and {Date(leaving.Latest)}, 95 %)";
    }

    private static string Date(double day)
    {
        return double.IsFinite(day) ? DateTime.UnixEpoch.AddDays(day).ToString("yyyy-MM-dd", CultureInfo.InvariantCulture) : "more than 50 years from then";
    }

    private static ReportPlot Plot(ProbeHistory history, Quantity quantity)
    {
        List<PlotSeries> series = [];
        List<PlotLine> lines = [];
        for (int i = 0; i < history.Membranes.Count; i++)
        {
            List<(double Day, HistoryValue Value)> counted = Counted(history, quantity, i);
            if (counted.Count != 0)
            {
                series.Add(new PlotSeries(history.Membranes[i], _marks[i % _marks.Length], [.. counted.Select(static point => new PlotPoint(point.Day, point.Value.Value, point.Value.StandardUncertainty))]));
            }

            if (HistoryTrend.Of(counted) is HistoryTrend trend)
            {
                lines.Add(new PlotLine("trend", PlotStroke.Dashed, [new(trend.FirstDay, trend.At(trend.FirstDay), 0), new(trend.LastDay, trend.At(trend.LastDay), 0)]));
            }
        }

        PlotPoint[] outside = [.. history.Entries.Where(entry => entry.LeftOut.Length != 0 && quantity.Value(entry) is not null)
            .Select(entry => new PlotPoint(PlotTicks.Days(entry.AtUtc), quantity.Value(entry)!.Value, quantity.Value(entry)!.StandardUncertainty))];
        if (outside.Length != 0)
        {
            series.Add(new PlotSeries("not in trends", PlotMark.Cross, outside));
        }

        double first = PlotTicks.Days(history.Entries[0].AtUtc);
        double last = PlotTicks.Days(history.Entries[^1].AtUtc);
        if (quantity.Window is HistoryWindow window && series.Count != 0)
        {
            lines.Add(new PlotLine("window", PlotStroke.Dotted, [new(first, window.Low, 0), new(last, window.Low, 0)]));
            lines.Add(new PlotLine("window", PlotStroke.Dotted, [new(first, window.High, 0), new(last, window.High, 0)]));
        }

        string description = $"{Number.Print(history.Entries.Count(entry => quantity.Value(entry) is not null))} values from {Date(first)} to {Date(last)} on {Number.Print(history.Membranes.Count)} {(history.Membranes.Count == 1 ? "membrane" : "membranes")}. "
            + string.Join(" ", Sentences(history, quantity).Select(static sentence => sentence.Text)) + " Each value stands in the table.";
        return new ReportPlot(quantity.Id, $"{quantity.Title} of probe {history.Probe} over time", description, new PlotAxis("date", true), new PlotAxis(quantity.Title, false), series, lines);
    }

    private static IEnumerable<ReportSentence> Past(ProbeHistory history)
    {
        if (history.Past != 0)
        {
            yield return new ReportSentence("history-past", $"{Number.Print(history.Past)} {(history.Past == 1 ? "calibration" : "calibrations")} of this probe more {(history.Past == 1 ? "was" : "were")} imported from tables: judged elsewhere, and in no trend here. 'probecal calibrations list --all' shows them.");
        }
    }

    private static ReportTable Table(ProbeHistory history)
    {
        return ColumnChoice.Table(
            [.. _columns.Select(column => column.Id == "history-error" ? column with { Name = "as found " + history.ErrorUnit } : column)],
            history.Entries.Select(entry => new[]
        {
            ReportText.Time(entry.AtUtc), entry.Id, entry.Purpose, history.Membranes[entry.Membrane],
            ReportText.Few(entry.Slope?.Value), Uncertainty(entry.Slope), ReportText.Few(entry.Zero?.Value), Uncertainty(entry.Zero),
            ReportText.Signed(entry.Error?.Value, 3), Uncertainty(entry.Error), entry.LeftOut,
        }));

        static string? Uncertainty(HistoryValue? value)
        {
            return value is null ? null : ReportText.Uncertainty(value.StandardUncertainty);
        }
    }

    private static string Cell(string text)
    {
        return text.AsSpan().IndexOfAny(",\"\n\r") < 0 ? text : "\"" + text.Replace("\"", "\"\"", StringComparison.Ordinal) + "\"";
    }
}
