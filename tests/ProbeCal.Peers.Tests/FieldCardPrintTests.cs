using System;
using System.IO;
using System.Text;
using System.Text.RegularExpressions;
using System.Threading.Tasks;
using ProbeCal.Peers.Tests.Parts;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Peers.Tests;

/// <summary>The field card printed by a browser: one page, on A4 and on Letter.</summary>
public class FieldCardPrintTests(ITestOutputHelper output)
{
    private static readonly TimeSpan Deadline = TimeSpan.FromMinutes(3);

    // The fullest card there can be: 42 rows, a long name and the longest citation of an equation of oxygen.
    private static readonly string[] Fullest =
    [
        "tables", "--format", "card", "--temperature=-1..40C", "--salinity", "35", "--equation", "garcia-gordon-1992", "--site-altitude", "640m",
        "--site", "A pond whose name is just as long as a card allows it, of 60", "--pressure-unit", "mmHg",
    ];

    [SkippableTheory]
    [InlineData("A4", "594.9")]
    [InlineData("letter", "612 ")]
    public async Task The_fullest_card_fits_one_page(string paper, string widthInPoints)
    {
        string? chromium = Programs.Find("chromium");
        Skip.If(chromium is null, "chromium is not installed");
        using TemporaryFolder folder = new();
        using OutsideProcess program = Programs.ProbeCal([.. Fullest, "--output", folder.Path, "--name", "card"]);
        Assert.True(await program.ExitCodeAsync(Deadline) == 0, program.Tail());
        string card = File.ReadAllText(folder["card.html"]);
        Assert.Contains("size: auto;", card, StringComparison.Ordinal);
        string onPaper = card.Replace("size: auto;", "size: " + paper + ";", StringComparison.Ordinal);
        (int pages, string size) = await PrintAsync(chromium, folder, onPaper);
        output.WriteLine($"{paper}: {pages} page of {size} points");
        Assert.Equal(1, pages);
        Assert.StartsWith(widthInPoints, size, StringComparison.Ordinal);

        // The count sees a second page where there is one.
        Assert.Equal(2, (await PrintAsync(chromium, folder, onPaper.Replace("</body>", "<p style=\"break-before: page\">more</p></body>", StringComparison.Ordinal))).Pages);
    }

    private static async Task<(int Pages, string Size)> PrintAsync(string chromium, TemporaryFolder folder, string html)
    {
        File.WriteAllText(folder["print.html"], html);
        using OutsideProcess browser = OutsideProcess.Start(chromium,
        [
            "--headless", "--no-sandbox", "--disable-gpu", "--disable-dev-shm-usage", "--no-pdf-header-footer", "--user-data-dir=" + folder["profile"],
            "--print-to-pdf=" + folder["card.pdf"], folder["print.html"],
        ]);
        Assert.True(await browser.ExitCodeAsync(Deadline) == 0, browser.Tail());
        string pdf = Encoding.Latin1.GetString(File.ReadAllBytes(folder["card.pdf"]));
        File.Delete(folder["card.pdf"]);
        return (Regex.Count(pdf, @"/Type\s*/Page\b(?!s)"), Regex.Match(pdf, @"/MediaBox\s*\[0 0 ([0-9.]+ [0-9.]+)\]").Groups[1].Value);
    }
}
