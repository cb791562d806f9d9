using System;
using System.IO;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary>Command lines that cannot be read: one line that says what would be right.</summary>
public sealed class UsageTests
{
    [Theory]
    [InlineData("equilibirum --temperature 20", "there is no command 'equilibirum' (did you mean equilibrium?)", "'probecal --help'")]
    [InlineData("equilibrium --temperature 20 --salinity 0 --presure 760mmHg", "there is no option --presure (did you mean --pressure?)", "'probecal equilibrium --help'")]
    [InlineData("equilibrium --temperature 20 --salinity 0 --pressure 760 mmHg", "'mmHg' is not understood there; a value with blanks in it wants quotes", "'probecal equilibrium --help'")]
    [InlineData("calibrations", "name a command: list, show", "'probecal calibrations --help'")]
    [InlineData("calibrations shwo", "(did you mean show?)", "'probecal calibrations --help'")]
    [InlineData("calibrations show", "ID", "'probecal calibrations show --help'")]
    [InlineData("tables", "--format is missing: csv, json", "'probecal tables --help'")]
    [InlineData("equilibrium --temperature", "--temperature wants a value: Water temperature: 20, 20C, 68F", "'probecal equilibrium --help'")]
    [InlineData("water --temperature 20 --temperature 21 --salinity 0", "--temperature is given 2 times; give it once", "'probecal water --help'")]
    public async Task WrongCommandLine_IsOneLineWithTheNearestName(string line, string says, string help)
    {
        Run run = await Run.OfAsync(line.Split(' '));
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.StartsWith("probecal: ", run.ErrorLine, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', run.ErrorLine);
        Assert.Contains(says, run.ErrorLine, StringComparison.Ordinal);
        Assert.Contains(help, run.ErrorLine, StringComparison.Ordinal);
    }

    [Fact]
    public async Task NothingGiven_ShowsTheCommands()
    {
        Run run = await Run.OfAsync();
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.Contains("equilibrium", run.Error, StringComparison.Ordinal);
        Assert.Contains("probecal calibrate ", run.Error, StringComparison.Ordinal);
        Assert.DoesNotContain("Examples", run.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Help_IsOneLineACommand()
    {
        Run run = await Run.OfAsync("--help");
        Assert.Equal((0, ""), (run.ExitCode, run.Error));
        Assert.Contains("probecal total-gas ", run.Output, StringComparison.Ordinal);
        Assert.InRange(run.Output.Split('\n').Length, 10, 25);
        Assert.All(run.Output.Split('\n'), static line => Assert.True(line.TrimEnd('\r').Length <= 100, line));
    }

    [Theory]
    [InlineData("equilibrium --temperature 20 --salinity 0 --pressure 1atm --equation benson", "(did you mean benson-krause-1984?)")]
    [InlineData("equilibrium --temperature 20K --salinity 0 --pressure 1atm", "--temperature -253.15 °C is outside")]
    [InlineData("equilibrium --temperature 20 --salinity 0 --pressure 1atm --format xml", "--format xml: there is no such form; there are text and json")]
    public async Task WrongValue_IsShownAsAPersonWouldWriteIt(string line, string says)
    {
        Run run = await Run.OfAsync(line.Split(' '));
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.Contains(says, run.ErrorLine, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Screens_HaveTheMainNumberFirstAndNoDigitsOfAConversion()
    {
        // 780 and 745 mmHg lie 35 mmHg apart; 780/745 is 1.04698.
        Run gas = await Run.OfAsync("total-gas", "--total-pressure", "780mmHg", "--pressure", "745mmHg", "--temperature", "57.7F", "--salinity", "0");
        Assert.StartsWith("ΔP 46.663 hPa (35.0 mmHg): total dissolved gas is 104.70 % of the air's pressure", gas.Output, StringComparison.Ordinal);
        Assert.Contains("water at 14.2778 °C, salinity 0, under air of 993.25 hPa (745.0 mmHg), absolute", gas.Output, StringComparison.Ordinal);

        Run given = await Run.OfAsync("equilibrium", "--gas", "H2S", "--partial-pressure", "1hPa", "--temperature", "12", "--salinity", "0", "--pressure", "1atm");
        Assert.Contains("one more         °C: -", given.Output, StringComparison.Ordinal);
        Assert.DoesNotContain("hPa: 0 ", given.Output, StringComparison.Ordinal);

        Run measured = await Run.OfAsync("equilibrium", "--concentration", "8.1mg/L", "--temperature", "20", "--salinity", "0", "--pressure", "1atm");
        Assert.Contains("at the local pressure, measured 8.1 mg/L", measured.Output.Split('\n')[0], StringComparison.Ordinal);
    }

    [Fact]
    public void NarrowWindow_FoldsAQuestionWhenItIsShown_AndLeavesACommandWhole()
    {
        using StringWriter screen = new() { NewLine = "\n" };
        using FoldingWriter folding = new(screen, 30) { NewLine = "\n" };
        folding.Write("The water at the probe: 1 stirred, 2 still? ");
        Assert.Equal("", screen.ToString());
        folding.Flush();
        Assert.Equal("The water at the probe: 1\n  stirred, 2 still? ", screen.ToString());
        folding.WriteLine("probecal calibrate --probe P-17 --method titration");
        folding.Write("\r[#####.....] 50 %, 1000 rows, 500 rows/s");
        folding.Flush();
        Assert.EndsWith("still? probecal calibrate --probe P-17 --method titration\n\r[#####.....] 50 %, 1000 rows, 500 rows/s", screen.ToString(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("calibrate")]
    [InlineData("check")]
    public async Task HelpOfCalibrating_FitsAHundredColumns(string command)
    {
        Run run = await Run.OfAsync(command, "--help");
        Assert.All(run.Output.Split('\n'), static line => Assert.True(line.TrimEnd('\r').Length <= 100, line));
    }

    [Fact]
    public async Task Steps_WriteACautionOutOnce()
    {
        Run run = await Run.OfAsync("calibrate", "--method", "zero-solution", "--steps");
        Assert.Equal(2, run.Output.Split("Sulfite irritates").Length);
        Assert.Contains("Caution: as in step 2", run.Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("equilibrium --temperature 8.4 --salinity 0 --pressure 706mmHg")]
    [InlineData("water --temperature 12.4 --conductivity 310uS/cm")]
    [InlineData("total-gas --total-pressure 745mmHg --pressure 706mmHg --temperature 12 --salinity 0")]
    [InlineData("equations --gas N2")]
    [InlineData("explain --temperature 20 --salinity 0 --pressure 760mmHg")]
    public async Task NarrowWindow_FoldsBetweenWordsAndLosesNone(string line)
    {
        const int width = 40;
        Run wide = await Run.OfAsync(line.Split(' '));
        Run narrow = await Run.InWindowAsync(width, line.Split(' '));
        Assert.Equal(Words(wide.Output), Words(narrow.Output));
        Assert.All(narrow.Output.Split('\n'), static row => Assert.True(row.Length <= width || !row.Trim().Contains(' ', StringComparison.Ordinal), row));

        static string[] Words(string text)
        {
            return text.Split([' ', '\n', '\r'], StringSplitOptions.RemoveEmptyEntries);
        }
    }
}
