using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text.RegularExpressions;
using System.Threading.Tasks;
using System.Xml.Linq;
using ProbeCal.Peers.Tests.Parts;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Tests.Reports;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Peers.Tests;

/// <summary>Certificates on paper: the page printed by a browser, and the PDF read by another program.</summary>
public sealed class CertificatePrintTests(ITestOutputHelper output) : IDisposable
{
    private static readonly TimeSpan Deadline = TimeSpan.FromMinutes(3);

    private readonly TemporaryFolder _folder = new();

    public void Dispose()
    {
        _folder.Dispose();
    }

    [SkippableTheory]
    [InlineData("A4")]
    [InlineData("letter")]
    public async Task FullRecords_FitOnePage_AndNothingLeavesIt(string paper)
    {
        string? chromium = Programs.Find("chromium");
        Skip.If(chromium is null, "chromium is not installed");
        Skip.If(Programs.Find("pdftotext") is null, "pdftotext is not installed");
        foreach ((string id, int most) in Write(Usual(), Registered(), ReportSamples.OfVersion1(), ReportSamples.MeterCheck()).Select(static id => (id, 1)).Append((Write(ReportSamples.Hostile())[0], 2)))
        {
            string page = await CertificateAsync(id, "page.html");
            Assert.Contains("size: auto;", page, StringComparison.Ordinal);
            await PrintAsync(chromium, page.Replace("size: auto;", "size: " + paper + ";", StringComparison.Ordinal));
            int pages = await WithinAsync(_folder["printed.pdf"]);
            output.WriteLine($"{id} on {paper}: {pages} of the browser");
            Assert.True(pages <= most, $"{pages} pages; the last: {(await TextAsync(_folder["printed.pdf"])).Split('\f')[^2]}");
            await CertificateAsync(id, "own.pdf", "--paper", paper);
            Assert.InRange(await WithinAsync(_folder["own.pdf"]), 1, most);
        }
    }

    [SkippableFact]
    public async Task SixtyPoints_GoOnToNumberedPages_AndSaySo()
    {
        string? chromium = Programs.Find("chromium");
        Skip.If(chromium is null, "chromium is not installed");
        Skip.If(Programs.Find("pdftotext") is null, "pdftotext is not installed");
        string id = Write(Usual(), ReportSamples.Fitted(60))[1];
        await PrintAsync(chromium, (await CertificateAsync(id, "page.html")).Replace("size: auto;", "size: A4;", StringComparison.Ordinal));
        await CertificateAsync(id, "own.pdf");
        foreach (string file in new[] { "printed.pdf", "own.pdf" })
        {
            int pages = await WithinAsync(_folder[file]);
            Assert.InRange(pages, 2, 5);
            string text = await TextAsync(_folder[file]);
            Assert.Contains("it continues on further pages, which are numbered.", Regex.Replace(text, @"\s+", " "), StringComparison.Ordinal);
            Assert.Contains(string.Create(CultureInfo.InvariantCulture, $"page {pages} of {pages}"), text, StringComparison.Ordinal);
            Assert.Contains("level-60", text, StringComparison.Ordinal);
        }
    }

    [SkippableFact]
    public async Task RecordOfACalibration_FitsOnePage()
    {
        Skip.If(Programs.Find("pdftotext") is null, "pdftotext is not installed");
        using OutsideProcess calibrate = Programs.ProbeCal(CalibratedFolder.Calibrate(_folder["data"]));
        Assert.True(await calibrate.ExitCodeAsync(Deadline) == 0, calibrate.Tail());
        using (CalibrationLogStore log = CalibrationLogStore.OpenForReading(_folder["data/calibrations.db"]))
        {
            await CertificateAsync(log.Records[0].Record.Id, "own.pdf", "--paper", "Letter");
        }

        Assert.Equal(1, await WithinAsync(_folder["own.pdf"]));
    }

    [SkippableFact]
    public async Task Pdf_PageAndTerminal_SayTheSame()
    {
        Skip.If(Programs.Find("pdftotext") is null, "pdftotext is not installed");
        string id = Write(Usual())[0];
        string page = await CertificateAsync(id, "page.html", "--name", "R. Example", "--role", "field technician");
        await CertificateAsync(id, "own.pdf", "--name", "R. Example", "--role", "field technician");
        string[] pdf = Words(await TextAsync(_folder["own.pdf"]));
        string[] terminal = Words(await RunAsync("certificate", id, "--name", "R. Example", "--role", "field technician"));
        XNamespace none = "";
        XElement body = XDocument.Parse(page.Replace("<!DOCTYPE html>\n", "", StringComparison.Ordinal)).Root!.Element(none + "body")!;
        // The seconds at which each was made differ; everything else is the same.
        string[] values = [.. body.Descendants().Where(static element => element.Name.LocalName is "dd" or "td" or "h1" or "h2" or "p" && element.Attribute("id")?.Value != "signed-time").SelectMany(static element => Words(element.Value))];
        Assert.True(200 < values.Length);
        Assert.Equal([], values.Except(pdf));
        Assert.Equal([], values.Except(terminal));
        string[] all = Words(string.Join(' ', body.Descendants().SelectMany(static element => element.Nodes().OfType<XText>()).Select(static text => text.Value)));
        // The other way round: the PDF has only page numbers and the words of its foot beside.
        string[] time = Words(body.Descendants().Single(static element => element.Attribute("id")?.Value == "signed-time").Value);
        Assert.Equal([], pdf.Except(all).Except(["page", "of", "1", "·"]).Where(word => !Regex.IsMatch(word, "^[0-9]{2}:[0-9]{2}:[0-9]{2}$")).Except(time));
    }

    [SkippableFact]
    public async Task History_PrintsWithinThePage()
    {
        string? chromium = Programs.Find("chromium");
        Skip.If(chromium is null, "chromium is not installed");
        Skip.If(Programs.Find("pdftotext") is null, "pdftotext is not installed");
        Write([.. Enumerable.Range(0, 6).Select(static i => ReportSamples.Usual("P-17", ReportSamples.Noon.AddDays(-30 * i), 0.62 + (0.01 * i)))]);
        await RunAsync("history", "--probe", "P-17", "--output", _folder["history.html"]);
        await RunAsync("history", "--probe", "P-17", "--output", _folder["history.pdf"]);
        await PrintAsync(chromium, File.ReadAllText(_folder["history.html"]).Replace("size: auto;", "size: letter;", StringComparison.Ordinal));
        Assert.InRange(await WithinAsync(_folder["printed.pdf"]), 1, 2);
        Assert.Equal(1, await WithinAsync(_folder["history.pdf"]));
        Assert.Contains("membrane 1 (M-204): 6 values; change a year", Regex.Replace(await TextAsync(_folder["history.pdf"]), @"\s+", " "), StringComparison.Ordinal);
    }

    private static CalibrationRecord Usual()
    {
        return ReportSamples.Usual();
    }

    /// <summary>As full as a usual record gets: two guards overridden at length, a fourth point, long names.</summary>
    private static CalibrationRecord Registered()
    {
        CalibrationRecord usual = ReportSamples.Usual();
        RecordedFinding finding = usual.Findings[0];
        return usual with
        {
            Site = "A pond whose name is just as long as anybody would care to write it",
            By = "A person with a rather long name, and a second one",
            Findings = [finding, finding with { Guard = "stirring", Saw = "the water stood still for the whole window", Reason = "the probe was moved by hand" }],
        };
    }

    private string[] Write(params CalibrationRecord[] records)
    {
        Directory.CreateDirectory(_folder["data"]);
        using CalibrationLogStore log = CalibrationLogStore.OpenForWriting(_folder["data/calibrations.db"], TimeProvider.System, static () => new Guid("c3a41f09-b2e7-4d11-8000-000000000000"));
        return [.. records.Select(record => log.Append(record).Record.Id)];
    }

    private async Task<string> CertificateAsync(string id, string file, params string[] more)
    {
        await RunAsync(["certificate", id, "--output", _folder[file], .. more]);
        return File.ReadAllText(_folder[file]);
    }

    private async Task<string> RunAsync(params string[] arguments)
    {
        using OutsideProcess program = Programs.ProbeCal(["calibrations", .. arguments, "--data", _folder["data"]]);
        Assert.True(await program.ExitCodeAsync(Deadline) == 0, program.Tail());
        return string.Join('\n', program.Output());
    }

    private async Task PrintAsync(string chromium, string html)
    {
        File.WriteAllText(_folder["print.html"], html);
        File.Delete(_folder["printed.pdf"]);
        using OutsideProcess browser = OutsideProcess.Start(chromium,
        [
            "--headless", "--no-sandbox", "--disable-gpu", "--disable-dev-shm-usage", "--no-pdf-header-footer", "--user-data-dir=" + _folder["profile"],
            "--print-to-pdf=" + _folder["printed.pdf"], _folder["print.html"],
        ]);
        Assert.True(await browser.ExitCodeAsync(Deadline) == 0, browser.Tail());
    }

    private static async Task<string> TextAsync(string pdf)
    {
        using OutsideProcess reader = OutsideProcess.Start(Programs.Find("pdftotext")!, ["-layout", pdf, "-"]);
        Assert.True(await reader.ExitCodeAsync(Deadline) == 0, reader.Tail());
        return string.Join('\n', reader.Output());
    }

    /// <summary>Number of pages; every word must lie within its page, a printer's 5 mm away from the edge.</summary>
    private async Task<int> WithinAsync(string pdf)
    {
        string boxes = _folder["boxes.xml"];
        using OutsideProcess reader = OutsideProcess.Start(Programs.Find("pdftotext")!, ["-bbox", pdf, boxes]);
        Assert.True(await reader.ExitCodeAsync(Deadline) == 0, reader.Tail());
        const double Edge = 5 / 25.4 * 72;
        int pages = 0;
        int words = 0;
        double width = 0;
        double height = 0;
        foreach (Match match in Regex.Matches(File.ReadAllText(boxes), "<page width=\"([0-9.]+)\" height=\"([0-9.]+)\">|<word xMin=\"([-0-9.]+)\" yMin=\"([-0-9.]+)\" xMax=\"([-0-9.]+)\" yMax=\"([-0-9.]+)\">(.*)</word>"))
        {
            if (match.Groups[1].Success)
            {
                pages++;
                (width, height) = (Number(match, 1), Number(match, 2));
                continue;
            }

            words++;
            Assert.True(Edge <= Number(match, 3) && Number(match, 5) <= width - Edge && Edge <= Number(match, 4) && Number(match, 6) <= height - Edge, $"page {pages}: {match.Value}");
        }

        Assert.True(100 < words, "hardly a word was found");
        return pages;

        static double Number(Match match, int group)
        {
            return double.Parse(match.Groups[group].Value, CultureInfo.InvariantCulture);
        }
    }

    private static string[] Words(string text)
    {
        return [.. text.Split([' ', '\n', '\r', '\t', '\f', '\u00A0'], StringSplitOptions.RemoveEmptyEntries).Distinct()];
    }
}
