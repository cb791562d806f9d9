using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.RegularExpressions;
using System.Xml.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Reports;
using ProbeCal.Station.Tests.CalibrationLog;
using Xunit;

namespace ProbeCal.Station.Tests.Reports;

/// <summary>The certificate of a record: what stands on it, that nothing foreign gets into it, and that it is the same every time.</summary>
public class CertificateTests
{
    private static readonly CertificateSignature _signature = new("R. Example", "field technician", ReportSamples.Noon.AddHours(3), "probecal 0.1.0");

    [Fact]
    public void Figures_AreThoseOfTheRecord()
    {
        Report report = Make(ReportSamples.Usual());
        Dictionary<string, string> fields = Fields(report);
        Assert.Equal("PASS", report.Verdict);
        Assert.Empty(report.Warnings);
        Assert.Equal("0.62 nA/hPa, u 0.0053 (0.85 %)", fields["slope"]);
        Assert.Equal("-0.212 mg/L: 8.193 at 8.405 mg/L", fields["as-found"]);
        Assert.Equal("+0.012 mg/L: 8.408 at 8.396 mg/L", fields["as-left"]);
        Assert.Equal("939.3 hPa, u 0.8 (barometer:B-12)", fields["pressure"]);
        Assert.Equal("R. Example", fields["signed-name"]);
        Assert.Equal("2026-06-01 15:00:00 by probecal 0.1.0", fields["signed-time"]);
        ReportTable limits = Table(report, "limit-check");
        Assert.Equal(["as-found", "-0.212 mg/L", "0.081 mg/L", "1.96", "0.2 mg/L or 2 %, the larger: 0.200 mg/L", "2.5", "pass (informs)", "[1]"], limits.Rows[0]);
        ReportTable budget = Table(report, "budget-input");
        Assert.Equal(["thermometer offset", "20.01", "0.1", "K", "normal", "3.1", "0.310", "44.2", "certificate and scatter over the window"], budget.Rows[0]);
        string[] finding = Assert.Single(Table(report, "finding-guard").Rows);
        Assert.Equal("a front went through; the weather service has the same fall", finding[^1]);
        Assert.Equal(["+0.22", "-0.22"], finding[2..4]);
    }

    [Fact]
    public void HashAndHead_AreThoseOfTheLog_AndTheStatementStandsOnIt()
    {
        using TemporaryLog folder = new();
        using CalibrationLogStore log = folder.Write();
        StoredCalibration stored = log.Append(ReportSamples.Usual());
        log.Append(ReportSamples.Usual("P-2"));
        Report report = Certificate.Of(log, stored, _signature);
        Assert.Equal(stored.Sha256, Fields(report)["record-sha256"]);
        Assert.Equal("2:" + log.Chain.HeadSha256, Fields(report)["log-head"]);
        Assert.Contains(Blocks(report).OfType<ReportSentence>(), static sentence => sentence.Id == "statement" && sentence.Text.StartsWith("This is a field calibration record and no accredited certificate.", StringComparison.Ordinal));
        Assert.Contains("no accredited certificate", report.Foot, StringComparison.Ordinal);
    }

    [Fact]
    public void WhatMustNotBeOverlooked_IsSaidFirst()
    {
        using TemporaryLog folder = new();
        using CalibrationLogStore log = folder.Write();
        StoredCalibration first = log.Append(ReportSamples.Usual());
        StoredCalibration second = log.Append(ReportSamples.Fitted(6) with { Replaces = first.Record.Id });
        log.Append(new AmendmentRecord { Of = first.Record.Id, Reason = "the barometer was wrong", By = "S. Example", Software = "probecal" });
        IReadOnlyList<string> warnings = Certificate.Of(log, first, _signature).Warnings;
        Assert.Equal(2, warnings.Count);
        Assert.StartsWith("WITHDRAWN on ", warnings[0], StringComparison.Ordinal);
        Assert.Contains("by S. Example", warnings[0], StringComparison.Ordinal);
        Assert.EndsWith(": the barometer was wrong. Nothing may rest on it.", warnings[0], StringComparison.Ordinal);
        Assert.StartsWith("REPLACED by record " + second.Record.Id, warnings[1], StringComparison.Ordinal);

        Report failed = Certificate.Of(log, second, _signature);
        Assert.Equal("FAIL", failed.Verdict);
        Assert.Equal(["IMPORTED from old-log.csv row 12: this program did not see it being done.", "FAILED: it never came into force."], failed.Warnings);
        Assert.Equal("residual of level-2 is 3.1 of its standard deviation", Fields(failed)["reasons"]);

        Report check = Make(ReportSamples.MeterCheck());
        Assert.StartsWith("Check record ", check.Title, StringComparison.Ordinal);
        Assert.Equal("SIMULATED: no real probe was calibrated.", Assert.Single(check.Warnings));
        foreach (string warning in failed.Warnings)
        {
            Assert.Contains(warning, ReportHtml.Write(failed), StringComparison.Ordinal);
        }
    }

    [Fact]
    public void BetweenGuardedLimitAndLimit_IsInconclusive()
    {
        CalibrationRecord usual = ReportSamples.Usual();
        CalibrationRecord between = usual with
        {
            Result = usual.Result with { Pass = false, Reasons = ["as-left lies between the guarded limit and the limit"] },
            Limits = [usual.Limits[1] with { Verdict = "inconclusive", GuardBand = 0.05 }],
        };
        Assert.Equal("INCONCLUSIVE", Make(between).Verdict);
        Assert.Equal("FAIL", Make(between with { Limits = [.. between.Limits, usual.Limits[2] with { Verdict = "fail" }] }).Verdict);
    }

    [Fact]
    public void RecordOfVersion1_LeavesOutWhatItNeverHad()
    {
        Report report = Make(ReportSamples.OfVersion1());
        Assert.DoesNotContain(Table(report, "limit-check").Columns, static column => column.Id is "limit-expanded" or "limit-coverage" or "limit-ratio");
        Assert.DoesNotContain(Table(report, "budget-input").Columns, static column => column.Id is "budget-value" or "budget-distribution" or "budget-sensitivity" or "budget-share");
        Assert.Equal("No reference equipment is named in the record.", Assert.Single(Blocks(report).OfType<ReportSentence>(), static sentence => sentence.Id == "no-equipment").Text);
        Assert.True(ReportPdf.FitsOnePage(report));
    }

    [Fact]
    public void ReleasedLogOfVersion1_HasCertificates()
    {
        string folder = Directory.CreateTempSubdirectory("probecal-certificate-").FullName;
        try
        {
            string copy = Path.Combine(folder, "calibrations.db");
            File.Copy(Path.Combine(Repository.Root, "tests/Formats/calibration-log-v1.db"), copy);
            using CalibrationLogStore log = CalibrationLogStore.OpenForReading(copy);
            foreach (StoredCalibration stored in log.Records)
            {
                Report report = Certificate.Of(log, stored, _signature);
                // The head as it was printed when the sample was made.
                Assert.Equal("2:42452343d8b8997287ec3c3e138ad7af24229e7d663950528d9511748961ba6d", Fields(report)["log-head"]);
                Assert.True(ReportPdf.FitsOnePage(report));
            }
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    [Fact]
    public void BrokenChain_HasNoCertificate()
    {
        using TemporaryLog folder = new();
        using (CalibrationLogStore log = folder.Write())
        {
            log.Append(ReportSamples.Usual());
        }

        folder.Raw("DROP TRIGGER records_no_update");
        folder.Raw("UPDATE records SET sha256 = 'x'");
        using CalibrationLogStore broken = folder.Read();
        Assert.Throws<WorkFailedException>(() => Certificate.Of(broken, broken.Records[0], _signature));
    }

    [Fact]
    public void EveryField_HasItsRowInTheDocuments_AndItsOwnPath()
    {
        string[][] rows = [.. File.ReadLines(Path.Combine(Repository.Root, "docs/certificate.md")).Select(static line => Regex.Match(line, @"^\| `([a-z0-9-]+)` \| ([^|]+) \| `([^|`]+)` \|")).Where(static match => match.Success)
            .Select(static match => new[] { match.Groups[1].Value, match.Groups[2].Value.Trim(), match.Groups[3].Value })];
        Assert.Equal(CertificateNames.All.Keys.Order(StringComparer.Ordinal), rows.Select(static row => row[0]).Order(StringComparer.Ordinal));
        Assert.Empty(rows.GroupBy(static row => row[2]).Where(static group => 1 < group.Count()).Select(static group => group.Key));
        // What a person sees is what the table says.
        Assert.Empty(rows.Where(static row => CertificateNames.All[row[0]].Length != 0 && CertificateNames.All[row[0]] != row[1]).Select(static row => row[0]));
    }

    [Fact]
    public void EveryFieldOfTheList_IsPrintedBySomeRecord_AndNoOther()
    {
        HashSet<string> printed = ["warning"];
        using TemporaryLog folder = new();
        using CalibrationLogStore log = folder.Write();
        log.Append(new EquipmentRecord
        {
            Equipment = "B-12",
            EquipmentKind = "barometer",
            Description = "aneroid",
            Certificate = "BC-77",
            CertificateValue = Quantity(1000.2),
            Correction = Quantity(0.2),
            DueOn = new DateOnly(2026, 12, 1),
            Software = "probecal",
        });
        DateTimeOffset later = ReportSamples.Noon.AddDays(1);
        CalibrationRecord other = ReportSamples.Usual(completed: later);
        other = other with { Gas = "CO2", Points = [.. other.Points.Select(static point => point with { ReadingHectopascal = 47.1, ErrorHectopascal = 0.1 })] };
        foreach (CalibrationRecord record in new[] { ReportSamples.Usual(completed: later), ReportSamples.Fitted(6), ReportSamples.MeterCheck(), other })
        {
            Report report = Certificate.Of(log, log.Append(record), _signature);
            printed.UnionWith(Ids(report));
        }

        Assert.Equal(CertificateNames.All.Keys.Order(StringComparer.Ordinal), printed.Order(StringComparer.Ordinal));
    }

    [Fact]
    public void EveryColumnThatNoPointFills_IsLeftOut_AndResidualsStandAtTheirPoints()
    {
        ReportTable usual = Table(Make(ReportSamples.Usual()), "point-role");
        Assert.DoesNotContain(usual.Columns, static column => column.Id is "point-residual" or "point-method");
        ReportTable fitted = Table(Make(ReportSamples.Fitted(6)), "point-role");
        int residual = fitted.Columns.ToList().FindIndex(static column => column.Id == "point-residual");
        Assert.Equal(["-0.100", "-0.050", "+0.000", "+0.050", "+0.100", "-0.100"], fitted.Rows.Select(row => row[residual]));
    }

    [Theory]
    [InlineData("de-DE")]
    [InlineData("fa-IR")]
    [InlineData("th-TH")]
    public void SameRecord_SameBytes_InEveryCulture(string culture)
    {
        (byte[] pdf, string html) = Both();
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
            (byte[] again, string page) = Both();
            Assert.Equal(html, page);
            Assert.Equal(pdf, again);
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }

        static (byte[] Pdf, string Html) Both()
        {
            Report report = Make(ReportSamples.Fitted(6));
            return (ReportPdf.Write(report, PaperSize.A4, "probecal 0.1.0", ReportSamples.Noon), ReportHtml.Write(report));
        }
    }

    [Fact]
    public void Page_FetchesNothing_RunsNothing_AndIsBlackOnWhite()
    {
        foreach (CalibrationRecord record in new[] { ReportSamples.Usual(), ReportSamples.Fitted(60), ReportSamples.Hostile() })
        {
            XElement page = Parsed(ReportHtml.Write(Make(record)));
            string[] known = ["html", "head", "meta", "title", "style", "body", "header", "h1", "p", "main", "section", "h2", "dl", "dt", "dd", "div", "table", "colgroup", "col", "thead", "tbody", "tr", "th", "td", "footer", "span", "svg", "desc", "g", "polyline", "text", "circle", "path"];
            Assert.Empty(page.DescendantsAndSelf().Select(static element => element.Name.LocalName).Distinct().Except(known));
            string[] attributes = ["lang", "charset", "name", "content", "class", "id", "dir", "style", "scope", "role", "aria-labelledby", "viewBox", "width", "height", "fill", "stroke", "font-family", "stroke-width", "stroke-dasharray", "points", "font-size", "text-anchor", "x", "y", "transform", "cx", "cy", "r", "d", "xmlns"];
            Assert.Empty(page.DescendantsAndSelf().Attributes().Select(static attribute => attribute.Name.LocalName).Distinct().Except(attributes));
            string style = page.Descendants("style").Single().Value;
            Assert.DoesNotContain("url(", style, StringComparison.Ordinal);
            Assert.DoesNotContain("@import", style, StringComparison.Ordinal);
            // Black on white is 21:1, the most there is; no other colour is named.
            IEnumerable<string> colours = Regex.Matches(style, "#[0-9a-fA-F]{3,6}").Select(static match => match.Value)
                .Concat(page.Descendants().Attributes().Where(static attribute => attribute.Name.LocalName is "fill" or "stroke").Select(static attribute => attribute.Value));
            Assert.Empty(colours.Distinct().Except(["#000", "#fff", "none"]));
        }
    }

    [Fact]
    public void HostileText_IsTextAndNothingElse()
    {
        Report report = Make(ReportSamples.Hostile());
        XElement page = Parsed(ReportHtml.Write(report));
        string Shown(string id)
        {
            return page.Descendants().Single(element => element.Attribute("id")?.Value == id).Value;
        }

        Assert.Equal("<script>alert(1)</script>", Shown("by"));
        Assert.StartsWith("A & B \"Quarry\" [U+202E]tluser eht si SSAP[U+202C] \u05D0\u05D2\u05DD WWW", Shown("site"), StringComparison.Ordinal);
        Assert.Equal("first line second line [U+0000][U+001B][31mred[U+001B][0m \U0001F4A7 </dd></dl><img src=x onerror=alert(2)> \uFFFD half", Shown("remarks"));
        // The typeface has neither Hebrew nor emoji: their codes stand for them, so that nothing is lost.
        Assert.Equal("[U+05D0] [U+1F4A7] \u00E9\u03A9\u0416\u1E9E", FontFile.Regular.Showable("\u05D0 \U0001F4A7 \u00E9\u03A9\u0416\u1E9E"));
        Assert.NotEmpty(ReportPdf.Write(report, PaperSize.Letter, "probecal", ReportSamples.Noon));
    }

    [Fact]
    public void MorePointsThanAPageHolds_GoOnToNumberedPages_AndTheReportSaysSo()
    {
        Report few = Make(ReportSamples.Usual());
        Assert.True(ReportPdf.FitsOnePage(few));
        Assert.DoesNotContain(ReportPdf.Continues, ReportHtml.Write(few), StringComparison.Ordinal);
        Report many = Make(ReportSamples.Fitted(60));
        Assert.False(ReportPdf.FitsOnePage(many));
        Assert.Contains(ReportPdf.Continues, ReportHtml.Write(many), StringComparison.Ordinal);
        string pdf = Encoding.Latin1.GetString(ReportPdf.Write(many, PaperSize.A4, "probecal", ReportSamples.Noon));
        Assert.InRange(Regex.Count(pdf, @"/Type /Page\b(?!s)"), 2, 4);
        // The smallest type on any page stays readable.
        Assert.True(7 <= Math.Min(PageSizes.Body, PageSizes.Table));
    }

    [Fact]
    public void Pdf_IsWellFormed_EachObjectWhereTheTableSaysItIs()
    {
        byte[] bytes = ReportPdf.Write(Make(ReportSamples.Usual()), PaperSize.A4, "probecal 0.1.0", ReportSamples.Noon);
        string pdf = Encoding.Latin1.GetString(bytes);
        int table = int.Parse(Regex.Match(pdf, @"startxref\n([0-9]+)\n%%EOF\n$").Groups[1].Value, CultureInfo.InvariantCulture);
        Assert.Equal("xref\n", pdf.Substring(table, 5));
        string[] entries = [.. Regex.Matches(pdf[table..], "([0-9]{10}) 00000 n ").Select(static match => match.Groups[1].Value)];
        Assert.True(10 < entries.Length);
        for (int i = 0; i < entries.Length; i++)
        {
            string begins = string.Create(CultureInfo.InvariantCulture, $"{i + 1} 0 obj\n");
            Assert.Equal(begins, pdf.Substring(int.Parse(entries[i], CultureInfo.InvariantCulture), begins.Length));
        }

        Assert.Contains("/CreationDate (D:20260601120000Z)", pdf, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("a.txt")]
    [InlineData("certificate")]
    [InlineData("a.svg")]
    public void OtherEndings_AreRefused(string file)
    {
        InputException refused = Assert.Throws<InputException>(() => ReportFile.Write(file, Make(ReportSamples.Usual()), PaperSize.A4, "probecal", ReportSamples.Noon));
        Assert.Contains("there are .html, .pdf", refused.Message, StringComparison.Ordinal);
    }

    private static Report Make(CalibrationRecord record)
    {
        using TemporaryLog folder = new();
        using CalibrationLogStore log = folder.Write();
        if (record.Replaces is not null)
        {
            // The log takes a replacement only for what it holds.
            log.Append(ReportSamples.Usual());
        }

        return Certificate.Of(log, log.Append(record), _signature);
    }

    private static XElement Parsed(string html)
    {
        XElement page = XDocument.Parse(html.Replace("<!DOCTYPE html>\n", "", StringComparison.Ordinal)).Root!;
        foreach (XElement element in page.DescendantsAndSelf())
        {
            element.Name = element.Name.LocalName;
        }

        return page;
    }

    private static IEnumerable<ReportBlock> Blocks(Report report)
    {
        return report.Sections.SelectMany(static section => section.Blocks);
    }

    private static Dictionary<string, string> Fields(Report report)
    {
        return Blocks(report).OfType<ReportFields>().SelectMany(static fields => fields.Fields).ToDictionary(static field => field.Id, static field => field.Value);
    }

    private static ReportTable Table(Report report, string column)
    {
        return Blocks(report).OfType<ReportTable>().Single(table => table.Columns[0].Id == column);
    }

    private static IEnumerable<string> Ids(Report report)
    {
        return Blocks(report).SelectMany(static block => block switch
        {
            ReportFields fields => fields.Fields.Select(static field => field.Id),
            ReportTable table => table.Columns.Select(static column => column.Id),
            ReportSentence sentence => [sentence.Id],
            ReportPlot plot => [plot.Id],
            ReportInk ink => [ink.Id],
            _ => [],
        });
    }

    private static RecordedQuantity Quantity(double value)
    {
        return new RecordedQuantity { Value = value, Unit = "hPa", StandardUncertainty = 0.1, Source = "certificate" };
    }
}
