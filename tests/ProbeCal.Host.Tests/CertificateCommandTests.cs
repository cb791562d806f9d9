using System;
using System.IO;
using System.Linq;
using System.Threading.Tasks;
using ProbeCal.Host.Commands;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Reports;
using ProbeCal.Station.Tests.Reports;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>calibrations certificate</c> and <c>calibrations history</c> as a person calls them.</summary>
public sealed class CertificateCommandTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-certificate-").FullName;
    private readonly string _first;
    private readonly string _last;

    public CertificateCommandTests()
    {
        using CalibrationLogStore log = CalibrationLogStore.OpenForWriting(Path.Combine(_folder, "calibrations.db"), TimeProvider.System, static () => new Guid("c3a41f09-b2e7-4d11-8000-000000000000"));
        _first = log.Append(ReportSamples.Usual()).Record.Id;
        for (int i = 1; i < 5; i++)
        {
            log.Append(ReportSamples.Usual(completed: ReportSamples.Noon.AddDays(30 * i), slope: 0.62 - (0.01 * i)));
        }

        _last = log.Append(ReportSamples.Fitted(6)).Record.Id;
    }

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
    }

    [Fact]
    public async Task Text_HasEveryFieldAndCellOfTheReport()
    {
        foreach (string id in new[] { _first, _last })
        {
            Run run = await RunAsync("certificate", id, "--name", "R. Example", "--role", "field technician");
            Assert.Equal((0, ""), (run.ExitCode, run.Error));
            string shown = Joined(run.Output);
            using CalibrationLogStore log = CalibrationLogStore.OpenForReading(Path.Combine(_folder, "calibrations.db"));
            Report report = Certificate.Of(log, log.Find(id)!, new CertificateSignature("R. Example", "field technician", ReportSamples.Noon, "probecal"));
            ReportBlock[] blocks = [.. report.Sections.SelectMany(static section => section.Blocks)];
            string[] said =
            [
                report.Title, .. report.Warnings,
                .. blocks.OfType<ReportFields>().SelectMany(static fields => fields.Fields).Where(static field => field.Id != "signed-time").Select(static field => field.Value),
                .. blocks.OfType<ReportTable>().SelectMany(static table => table.Rows).SelectMany(static row => row),
                .. blocks.OfType<ReportSentence>().Select(static sentence => sentence.Text),
                .. blocks.OfType<ReportInk>().Select(static ink => ink.Name),
            ];
            Assert.True(60 < said.Length);
            Assert.Equal([], said.Where(text => !shown.Contains(Joined(text), StringComparison.Ordinal)).ToArray());
        }
    }

    [Fact]
    public async Task Plot_HasItsMarksInCharacters()
    {
        Run run = await RunAsync("certificate", _first);
        Assert.Contains("o as found  * as left  + zero", run.Output, StringComparison.Ordinal);
        Assert.Contains(" |+", run.Output, StringComparison.Ordinal);
        Run history = await RunAsync("history", "--probe", "P-17", "--slope-window", "0.4..0.8");
        Assert.Equal((0, ""), (history.ExitCode, history.Error));
        Assert.Contains("o membrane 1 (M-204)", history.Output, StringComparison.Ordinal);
        Assert.Contains("Window 0.4 to 0.8 nA/hPa (entered).", history.Output, StringComparison.Ordinal);
        Assert.Contains("2026-06-01 12:00:00", history.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Files_AreWrittenAndReplaced_AndSayWhatTheyAre()
    {
        string page = Path.Combine(_folder, "c.html");
        File.WriteAllText(page, "old");
        Run run = await RunAsync("certificate", _first, "--output", page);
        Assert.Equal((0, "", page + ": certificate of " + _first), (run.ExitCode, run.Output, run.ErrorLine));
        Assert.StartsWith("<!DOCTYPE html>", File.ReadAllText(page), StringComparison.Ordinal);
        Assert.Contains(">not stated</dd>", File.ReadAllText(page), StringComparison.Ordinal);
        string pdf = Path.Combine(_folder, "C.PDF");
        Assert.Equal(0, (await RunAsync("certificate", _first, "--output", pdf, "--paper", "letter")).ExitCode);
        Assert.Equal("%PDF-1.7"u8.ToArray(), File.ReadAllBytes(pdf)[..8]);
        foreach ((string ending, string begins) in new[] { ("html", "<!DOCTYPE html>"), ("svg", "<svg "), ("csv", "time_utc,record,"), ("pdf", "%PDF-1.7") })
        {
            string file = Path.Combine(_folder, "h." + ending);
            Assert.Equal(0, (await RunAsync("history", "--probe", "P-17", "--output", file)).ExitCode);
            Assert.StartsWith(begins, File.ReadAllText(file), StringComparison.Ordinal);
        }

        Assert.Empty(Directory.GetFiles(_folder, "*.partial"));
    }

    [Theory]
    [InlineData("certificate c3a41f09b2e7-0009", "c3a41f09b2e7-0009: not in this log")]
    [InlineData("certificate c3a41f09b2e7-0001 --output c.docx", "there are .html, .pdf")]
    [InlineData("certificate c3a41f09b2e7-0001 --paper A5", "there is no such paper (did you mean A4?); there are A4 and Letter")]
    [InlineData("certificate c3a41f09b2e7-0001 --name a\u001Bb", "this is one line without control characters")]
    [InlineData("history --probe P-71", "did you mean P-17")]
    [InlineData("history --probe P-17 --slope-window 0.4", "write LOW..HIGH, for example 0.4..0.6")]
    [InlineData("history --probe P-17 --slope-window 0.8..0.4", "the lower end comes first")]
    [InlineData("history --probe P-17 --zero-window 0,1..2", "a comma is no decimal mark here")]
    [InlineData("history --probe P-17 --output h.png", "there are .html, .pdf, .svg, .csv")]
    [InlineData("history", "--probe")]
    public async Task WrongInput_IsOneLine_AndWritesNothing(string line, string says)
    {
        Run run = await RunAsync(line.Split(' '));
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.DoesNotContain('\n', run.ErrorLine);
        Assert.Contains(says, run.ErrorLine, StringComparison.Ordinal);
        Assert.DoesNotContain(Directory.GetFiles(_folder), static file => !Path.GetFileName(file).StartsWith("calibrations.db", StringComparison.Ordinal));
    }

    [Fact]
    public async Task FolderThatIsNotThere_IsOneLine()
    {
        Run run = await RunAsync("certificate", _first, "--output", Path.Combine(_folder, "none", "c.html"));
        Assert.Equal((1, ""), (run.ExitCode, run.Output));
        Assert.Contains("cannot be written", run.ErrorLine, StringComparison.Ordinal);
    }

    [Fact]
    public void FlatPlot_AndEmptyOne_AreDrawn()
    {
        StringWriter output = new();
        PlotAxis axis = new("x", false);
        CharacterPlot.Write(output, new ReportPlot("p", "nothing", "", axis, axis, [], []), "");
        CharacterPlot.Write(output, new ReportPlot("p", "flat", "", axis, axis, [new PlotSeries("one", PlotMark.Triangle, [new PlotPoint(2, 5, 0)])], []), "");
        Assert.Contains("nothing: nothing to show", output.ToString(), StringComparison.Ordinal);
        Assert.Single(output.ToString().Split('\n'), static line => line.Contains('^', StringComparison.Ordinal) && line.Contains('|', StringComparison.Ordinal));
    }

    private Task<Run> RunAsync(params string[] arguments)
    {
        return Run.OfAsync(["calibrations", .. arguments, "--data", _folder]);
    }

    /// <summary>Without any blank: lines are folded where the terminal ends.</summary>
    private static string Joined(string text)
    {
        return string.Concat(text.Where(static c => !char.IsWhiteSpace(c)));
    }
}
