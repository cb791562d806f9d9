using System;
using System.IO;
using System.Linq;
using System.Threading.Tasks;
using ProbeCal.Host.Tests.House;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>correct</c> and <c>visit</c> on a log that version 1 left behind, as a person calls them.</summary>
public sealed class CorrectTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-correct-").FullName;

    public CorrectTests()
    {
        File.Copy(Path.Combine(Repository.Root, "tests/Formats/calibration-log-v1.db"), At("calibrations.db"));
        File.WriteAllText(At("raw.csv"), "Time,Raw,T\n" + string.Concat(Enumerable.Range(10, 20).Select(static day => $"2027-01-{day} 12:00,60,12.5\n")));
    }

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
    }

    [Fact]
    public async Task Table_IsCorrected_Explained_AndDoneAgain()
    {
        Run run = await Correct("out-r1.csv");
        Assert.Equal((0, ""), (run.ExitCode, run.Output));
        Assert.Contains("20 rows: 20 corrected", run.Error, StringComparison.Ordinal);
        string[] lines = File.ReadAllLines(At("out-r1.csv"));
        Assert.Equal("Time,Raw,T,p O2 [hPa],O2 [mg/L],O2 [% local],O2 [% 1 atm],status", lines[0]);
        Assert.Equal(21, lines.Length);

        Run explained = await Run.OfAsync("correct", "explain", "--revision", At("out-r1.csv.revision.json"), "--row", "7", "--data", _folder);
        Assert.Equal(0, explained.ExitCode);
        Assert.Contains("partial pressure = ", explained.Output, StringComparison.Ordinal);
        Assert.Contains("with response 60", explained.Output, StringComparison.Ordinal);
        Assert.Contains("status: flagged: not between two passing checks", explained.Output, StringComparison.Ordinal);

        // The visit ends the record, in January 2027.
        Run visit = await Run.AtAsync(
            new Later(), null, "visit", "add", "--probe", "P-17", "--before", "2027-01-30T10:00+02:00", "--after", "2027-01-30T10:30+02:00", "--monitor-before", "7.90mg/L", "--monitor-after", "8.25mg/L",
            "--field-before", "8.31mg/L", "--field-after", "8.35mg/L", "--field-meter", "FM-2", "--standard", "8.97mg/L read 8.61mg/L from air-saturated-water", "--data", _folder);
        Assert.Contains("recorded as 8c6e44e20ee5-0003: fouling error 0.310 mg/L, drift error 0.360 mg/L", visit.Output, StringComparison.Ordinal);
        Run list = await Run.OfAsync("visit", "list", "--data", _folder);
        Assert.Contains("8c6e44e20ee5-0003", list.Output, StringComparison.Ordinal);

        Run again = await Run.OfAsync("correct", "--again", _folder, "--data", _folder);
        Assert.Equal(0, again.ExitCode);
        Assert.Contains("visit 8c6e44e20ee5-0003 was added", again.Error, StringComparison.Ordinal);
        Assert.StartsWith("Time,Raw,T,p O2 [hPa],O2 [mg/L],O2 [% local],O2 [% 1 atm],drift correction [mg/L],fouling correction [mg/L],O2 corrected [mg/L],rating,status", File.ReadAllText(At("out-r2.csv")), StringComparison.Ordinal);
        Assert.Contains("nothing that it rests on has changed", (await Run.OfAsync("correct", "--again", _folder, "--data", _folder)).Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Report_TellsOfTheTable()
    {
        Run run = await Run.OfAsync("correct", "report", "--input", At("raw.csv"), "--column", "time=Time", "--time-offset", "UTC");
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("20 rows from 2027-01-10T12:00:00Z to 2027-01-29T12:00:00Z, usually 1440 min apart", run.Output, StringComparison.Ordinal);
        Assert.Contains("gaps longer than 1.5 intervals: 0", run.Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--input is missing", "correct")]
    [InlineData("plays no part beside --again", "correct", "--again", "x", "--salinity", "0")]
    [InlineData("write three rising numbers", "correct", "--input", "raw.csv", "--output", "o.csv", "--ratings", "0.3,0.2,0.8")]
    [InlineData("the field meter is never the standard", "visit", "add", "--probe", "P-17", "--before", "2026-06-01T10:00Z", "--after", "2026-06-01T11:00Z", "--field-meter", "FM-2", "--standard", "8mg/L read 7mg/L from FM-2")]
    [InlineData("did you mean P-17?", "visit", "add", "--probe", "P-71", "--before", "2026-06-01T10:00Z", "--after", "2026-06-01T11:00Z", "--standard", "8mg/L read 7mg/L from titration")]
    [InlineData("this takes a whole number", "correct", "explain", "--revision", "x", "--row", "0")]
    public async Task WrongInput_IsToldInOneLine(string expected, params string[] arguments)
    {
        Run run = await Run.OfAsync([.. arguments, "--data", _folder]);
        Assert.Equal(2, run.ExitCode);
        Assert.Contains(expected, run.ErrorLine, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', run.ErrorLine);
    }

    private Task<Run> Correct(string output)
    {
        return Run.OfAsync(
            "correct", "--input", At("raw.csv"), "--output", At(output), "--probe", "P-17", "--time-offset", "+02:00", "--column", "time=Time", "--column", "signal=Raw", "--column", "temperature=T [C]",
            "--pressure", "742mmHg", "--salinity", "0", "--data", _folder);
    }

    private string At(string name)
    {
        return Path.Combine(_folder, name);
    }

    private sealed class Later : TimeProvider
    {
        public override DateTimeOffset GetUtcNow()
        {
            return new DateTimeOffset(2027, 2, 1, 12, 0, 0, TimeSpan.Zero);
        }
    }
}
