using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Xml.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Reports;
using ProbeCal.Station.Tests.CalibrationLog;
using Xunit;

namespace ProbeCal.Station.Tests.Reports;

/// <summary>The history of a probe: trends against sums worked out beside, and when they leave their window.</summary>
public class HistoryTests
{
    // Two-sided 95 % quantiles of Student's t, to the digits of the usual printed tables.
    private const double Student2 = 4.303;
    private const double Student3 = 3.182;

    [Fact]
    public void Trend_IsTheWeightedLine_ItsCovarianceWidenedByTheScatter()
    {
        double[] days = [0, 30, 61, 95, 120];
        double[] values = [0.620, 0.612, 0.609, 0.598, 0.596];
        double[] us = [0.002, 0.001, 0.002, 0.0015, 0.001];
        HistoryTrend trend = HistoryTrend.Of(Points(days, values, us))!;

        // The textbook's sums for a weighted line.
        double[] w = [.. us.Select(static u => 1 / (u * u))];
        double s = w.Sum();
        double sx = w.Zip(days, static (a, b) => a * b).Sum();
        double sy = w.Zip(values, static (a, b) => a * b).Sum();
        double sxx = Enumerable.Range(0, 5).Sum(i => w[i] * days[i] * days[i]);
        double sxy = Enumerable.Range(0, 5).Sum(i => w[i] * days[i] * values[i]);
        double determinant = (s * sxx) - (sx * sx);
        double slope = ((s * sxy) - (sx * sy)) / determinant;
        double intercept = ((sxx * sy) - (sx * sxy)) / determinant;
        double chi = Enumerable.Range(0, 5).Sum(i => w[i] * Math.Pow(values[i] - intercept - (slope * days[i]), 2));
        Assert.True(3 < chi, "the data are to scatter more than their uncertainties");
        double widened = Math.Sqrt(s / determinant * chi / 3);
        Close(slope, trend.PerDay, 1e-10);
        Close(widened, trend.PerDayUncertainty, 1e-9);
        // The printed quantile has four digits.
        Close(Student3 * widened, trend.PerDayHalfWidth, 2e-4);
        Assert.Equal(Student3 * widened < Math.Abs(slope), trend.IsSignificant);
    }

    [Fact]
    public void LeavingDate_ByHand()
    {
        // On the line 10 − 0.01·day exactly: no scatter, so the uncertainties stand as stated. It reaches 7 on day 300.
        double[] days = [0, 50, 100, 150];
        HistoryTrend trend = HistoryTrend.Of(Points(days, [10, 9.5, 9, 8.5], [0.1, 0.1, 0.1, 0.1]))!;
        Close(-0.01, trend.PerDay, 1e-9);
        // Var of the slope: 0.1²/Σ(x − 75)² = 0.01/12500; 4.303·0.000894 = 0.00385 < 0.01.
        Close(Math.Sqrt(0.01 / 12500), trend.PerDayUncertainty, 1e-9);
        HistoryLeaving leaving = trend.Leaves(new HistoryWindow(7, 12, "entered"))!;
        Assert.Equal(7, leaving.Bound);
        Close(300, leaving.Expected, 1e-6);

        // At the ends of the interval (10 − 0.01·x − 7)² = t²·0.01·(1/4 + (x − 75)²/12500 + 1), a quadratic in x.
        double t2 = Student2 * Student2 * 0.01;
        double a = 0.0001 - (t2 / 12500);
        double b = -0.06 + (150 * t2 / 12500);
        double c = 9 - (t2 * (1.25 + (5625.0 / 12500)));
        double root = Math.Sqrt((b * b) - (4 * a * c));
        // Four digits of the quantile move the ends by less than 0.1 %.
        Close((-b - root) / (2 * a), leaving.Earliest, 1e-3);
        Close((-b + root) / (2 * a), leaving.Latest, 1e-3);
        Assert.True(leaving.Earliest < 300 && 300 < leaving.Latest);
    }

    [Fact]
    public void WhatIsOutsideAlready_AndWhatIsFarOff()
    {
        HistoryTrend trend = HistoryTrend.Of(Points([0, 50, 100, 150], [10, 9.5, 9, 8.5], [0.01, 0.01, 0.01, 0.01]))!;
        Assert.Equal(150, trend.Leaves(new HistoryWindow(9, 12, "entered"))!.Expected);
        Assert.Equal(double.PositiveInfinity, trend.Leaves(new HistoryWindow(-1000, 12, "entered"))!.Expected);
    }

    [Fact]
    public void NoTrend_WithoutThreeTimes_AndNoDate_WithoutSignificance()
    {
        Assert.Null(HistoryTrend.Of(Points([0, 10], [1, 2], [0.1, 0.1])));
        Assert.Null(HistoryTrend.Of(Points([5, 5, 5], [1, 2, 3], [0.1, 0.1, 0.1])));
        HistoryTrend flat = HistoryTrend.Of(Points([0, 10, 20, 30], [1, 1.2, 0.9, 1.1], [0.1, 0.1, 0.1, 0.1]))!;
        Assert.False(flat.IsSignificant);
        Assert.Null(flat.Leaves(new HistoryWindow(0, 2, "entered")));
    }

    [Fact]
    public void WithoutUncertainties_TheScatterStandsForThem()
    {
        double[] days = [0, 10, 20, 30, 40];
        double[] values = [1.02, 1.18, 1.43, 1.57, 1.80];
        HistoryTrend trend = HistoryTrend.Of(Points(days, values, [0, 0.1, 0.1, 0.1, 0.1]))!;
        // Ordinary least squares by its sums: Σ(x − 20)² = 1000, Σ(x − 20)(y − mean) = 19.5.
        Close(0.0195, trend.PerDay, 1e-9);
        double mean = values.Average();
        double residual = Math.Sqrt(Enumerable.Range(0, 5).Sum(i => Math.Pow(values[i] - mean - (0.0195 * (days[i] - 20)), 2)) / 3);
        Close(residual / Math.Sqrt(1000), trend.PerDayUncertainty, 1e-9);
    }

    [Fact]
    public void EachMembrane_IsAStretchOfItsOwn_AndWhatDoesNotCountIsSaid()
    {
        using TemporaryLog folder = new();
        using CalibrationLogStore log = folder.Write();
        for (int i = 0; i < 4; i++)
        {
            log.Append(On("M-1", i * 30, 0.62 - (0.01 * i)));
        }

        log.Append(Failing(On("M-1", 110, 0.3)));
        StoredCalibration withdrawn = log.Append(On("M-1", 112, 0.9));
        log.Append(new AmendmentRecord { Of = withdrawn.Record.Id, Reason = "wrong probe", Software = "probecal" });
        log.Append(On("M-2", 130, 0.66));
        log.Append(Check(On("M-2", 140, 0.66)));
        log.Append(new ServiceRecord { Probe = "P-17", Event = ServiceRecord.MembraneChanged, At = ReportSamples.Noon.AddDays(150), Software = "probecal" });
        log.Append(On("M-2", 160, 0.65));

        ProbeHistory history = ProbeHistory.Of(log, "P-17", null, null);
        Assert.Equal(["membrane 1 (M-1)", "membrane 2 (M-2)", "membrane 3 (M-2)"], history.Membranes);
        Assert.Equal([0, 0, 0, 0, 0, 0, 1, 1, 2], history.Entries.Select(static entry => entry.Membrane));
        Assert.Equal(["", "", "", "", "failed", "withdrawn", "", "", ""], history.Entries.Select(static entry => entry.LeftOut));
        // A check changes no coefficients, yet it found an error.
        Assert.Null(history.Entries[7].Slope);
        Assert.Equal(-0.212, history.Entries[7].Error!.Value);
        Close(0.081 / 1.96, history.Entries[7].Error!.StandardUncertainty, 1e-12);

        Report report = HistoryReport.Of(history, ReportSamples.Noon, "probecal");
        string[] trends = [.. report.Sections[0].Blocks.OfType<ReportSentence>().Select(static sentence => sentence.Text)];
        Assert.Equal("Window 0.4 to 0.8 nA/hPa (entered at " + history.Entries[^1].Id + ").", trends[0]);
        // 0.01 in 30 days is 0.12175 in a year of 365.25 days; 0.62 − 0.4 is reached after 660 days, on 2028-03-22.
        Assert.StartsWith("membrane 1 (M-1): 4 values; change a year -0.122 nA/hPa, u 0.029", trends[1], StringComparison.Ordinal);
        Assert.Equal("membrane 2 (M-2): 1 value; a trend takes three at different times.", trends[2]);
        ReportPlot plot = report.Sections[0].Blocks.OfType<ReportPlot>().Single();
        Assert.Equal([PlotMark.Ring, PlotMark.Disc, PlotMark.Square, PlotMark.Cross], plot.Series.Select(static series => series.Mark));
        Assert.Equal(2, plot.Series[^1].Points.Count);
    }

    [Fact]
    public void LeavingDate_StandsInTheReport_AndTheEnteredWindowWins()
    {
        using TemporaryLog folder = new();
        using CalibrationLogStore log = folder.Write();
        for (int i = 0; i < 6; i++)
        {
            CalibrationRecord record = On("M-1", i * 30, 0.62 - (0.01 * i));
            log.Append(record with { Result = record.Result with { SlopeStandardUncertainty = 0.001 } });
        }

        // From 2026-06-01 at noon 0.01 in 30 days: 0.62 − 0.5 takes 360 days, until 2027-05-27.
        Report report = HistoryReport.Of(ProbeHistory.Of(log, "P-17", new HistoryWindow(0.5, 0.7, "entered"), null), ReportSamples.Noon, "probecal");
        string trend = report.Sections[0].Blocks.OfType<ReportSentence>().Last().Text;
        Assert.Contains("it reaches 0.5 nA/hPa on 2027-05-27 (a new calibration first finds it outside between 2027-0", trend, StringComparison.Ordinal);
        string zero = report.Sections[1].Blocks.OfType<ReportSentence>().Last().Text;
        Assert.EndsWith("not told from none; when it leaves the window cannot be said.", zero, StringComparison.Ordinal);
        string error = report.Sections[2].Blocks.OfType<ReportSentence>().First().Text;
        Assert.Equal("Window -0.2 to 0.2 mg/L (0.2 mg/L or 2 %, the larger, at 8.41 mg/L; USGS 2020, National Field Manual A6.2 (TM 9-A6.2)).", error);
    }

    [Fact]
    public void Csv_HasEveryFigureInFull()
    {
        using TemporaryLog folder = new();
        using CalibrationLogStore log = folder.Write();
        string id = log.Append(On("M,1", 0, 0.6212345678901)).Record.Id;
        string[] lines = HistoryReport.Csv(ProbeHistory.Of(log, "P-17", null, null)).Split('\n');
        Assert.Equal("time_utc,record,purpose,membrane,slope,slope_u,zero,zero_u,as_found_error_mg_per_L,as_found_error_u_mg_per_L,left_out", lines[0]);
        Assert.StartsWith("2026-06-01T12:00:00Z," + id + ",calibration,\"membrane 1 (M,1)\",0.6212345678901,0.0053,0.4,0.2,-0.212,0.0413", lines[1], StringComparison.Ordinal);
    }

    [Fact]
    public void Svg_IsOnePictureWithTitleAndDescriptionForEachPlot()
    {
        using TemporaryLog folder = new();
        using CalibrationLogStore log = folder.Write();
        log.Append(On("M<1>&\u0007", 0, 0.62));
        log.Append(On("M-2", 40, 0.61));
        XElement svg = XDocument.Parse(HistoryReport.Svg(ProbeHistory.Of(log, "P-17", null, null))).Root!;
        XElement[] plots = [.. svg.Descendants().Where(static element => element.Name.LocalName == "svg")];
        Assert.Equal(3, plots.Length);
        string[] whole = svg.Attribute("viewBox")!.Value.Split(' ');
        foreach (XElement plot in plots)
        {
            // In units of the whole picture, so that the three lie one below the other and none runs over the next.
            Assert.Equal(whole[2], plot.Attribute("width")!.Value.Split('.')[0]);
            Assert.Equal(int.Parse(whole[3], CultureInfo.InvariantCulture), 3 * double.Parse(plot.Attribute("height")!.Value, NumberStyles.Float, CultureInfo.InvariantCulture));
            Assert.Equal("img", plot.Attribute("role")!.Value);
            foreach (string id in plot.Attribute("aria-labelledby")!.Value.Split(' '))
            {
                Assert.Single(svg.Descendants(), element => element.Attribute("id")?.Value == id && element.Value.Length != 0);
            }

            // Two membranes: a ring in the legend and the plot, and a disc in each.
            Assert.Equal(["#fff", "#000", "#fff", "#000"], plot.Descendants().Where(static element => element.Name.LocalName == "circle").Select(static circle => circle.Attribute("fill")!.Value));
            Assert.Contains(plot.Descendants(), static element => element.Name.LocalName == "text" && element.Value == "membrane 1 (M<1>&[U+0007])");
        }
    }

    [Fact]
    public void UnknownProbe_IsToldWithTheNearest()
    {
        using TemporaryLog folder = new();
        using CalibrationLogStore log = folder.Write();
        log.Append(ReportSamples.Usual("P-17"));
        InputException refused = Assert.Throws<InputException>(() => ProbeHistory.Of(log, "P-71", null, null));
        Assert.Contains("P-71", refused.Message, StringComparison.Ordinal);
        Assert.Contains("P-17", refused.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(0, 1, false, "0.0 0.2 0.4 0.6 0.8 1.0")]
    [InlineData(-0.25, 0.26, false, "-0.2 0.0 0.2")]
    [InlineData(20604, 20970, true, "2026-07 2026-10 2027-01 2027-04")]
    public void AxisMarks_AreRound(double low, double high, bool isTime, string marks)
    {
        Assert.Equal(marks, string.Join(' ', PlotTicks.Of(low, high, isTime, 5).Select(static mark => mark.Text)));
    }

    private static CalibrationRecord On(string membrane, double day, double slope)
    {
        CalibrationRecord usual = ReportSamples.Usual("P-17", ReportSamples.Noon.AddDays(day), slope);
        return usual with { Probe = usual.Probe with { Membrane = new RecordedMembrane { Id = membrane } } };
    }

    private static CalibrationRecord Failing(CalibrationRecord record)
    {
        return record with { Result = record.Result with { Pass = false, Reasons = ["slope"] }, Limits = [record.Limits[^1] with { Verdict = "fail" }] };
    }

    private static CalibrationRecord Check(CalibrationRecord record)
    {
        return record with { Purpose = CalibrationRecord.CheckPurpose };
    }

    private static List<(double Day, HistoryValue Value)> Points(double[] days, double[] values, double[] uncertainties)
    {
        return [.. days.Select((day, i) => (day, new HistoryValue(values[i], uncertainties[i])))];
    }

    private static void Close(double expected, double actual, double relative)
    {
        Assert.True(Math.Abs(actual - expected) <= relative * Math.Abs(expected), FormattableString.Invariant($"{actual} is not {expected} within {relative}"));
    }
}
