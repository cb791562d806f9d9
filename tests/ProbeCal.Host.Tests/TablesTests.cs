using System;
using System.IO;
using System.Linq;
using System.Text.RegularExpressions;
using System.Threading;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>probecal tables</c> as others call it.</summary>
public sealed class TablesTests : IDisposable
{
    private static readonly string[] Usual =
        ["tables", "--temperature", "0..40C", "--pressure", "600..1100hPa", "--salinity", "0", "--error", "0.05mg/L", "--format", "csv", "--name", "fresh"];

    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-").FullName;

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
    }

    [Fact]
    public async Task The_table_is_the_output_and_the_summary_is_beside_it()
    {
        Run run = await Run.OfAsync(Usual);
        Assert.Equal(0, run.ExitCode);
        Assert.StartsWith("# format: probecal-table/1\n# table: fresh\n", run.Output, StringComparison.Ordinal);
        Assert.Contains("\n# made by: probecal 0.", run.Output, StringComparison.Ordinal);
        Assert.DoesNotContain('+', run.Output.Split("# made by:")[1].Split('\n')[0]);
        Assert.Matches("^[0-9]+ x [0-9]+ values, largest error found 0.0[0-9]+ mg/L at ", LastLine(run));
    }

    [Fact]
    public async Task A_folder_gets_the_file_and_keeps_what_differs_unless_forced()
    {
        string folder = Path.Combine(_folder, "new");
        string file = Path.Combine(folder, "fresh.csv");
        Run first = await Run.OfAsync([.. Usual, "--output", folder]);
        Assert.Equal((0, file), (first.ExitCode, first.Output.Trim()));
        string written = File.ReadAllText(file);
        Assert.Equal((await Run.OfAsync(Usual)).Output, written);

        Run again = await Run.OfAsync([.. Usual, "--output", folder]);
        Assert.Equal(0, again.ExitCode);
        Assert.Contains("the same to the byte", again.Output, StringComparison.Ordinal);

        File.WriteAllText(file, "mine");
        Run refused = await Run.OfAsync([.. Usual, "--output", folder]);
        Assert.Equal((2, "", "mine"), (refused.ExitCode, refused.Output, File.ReadAllText(file)));
        Assert.Matches("^probecal: --output .*--force", LastLine(refused));

        Assert.Equal(0, (await Run.OfAsync([.. Usual, "--output", folder, "--force"])).ExitCode);
        Assert.Equal(written, File.ReadAllText(file));
        Assert.Equal([file], Directory.GetFiles(folder));
    }

    [Fact]
    public async Task A_file_in_place_of_a_folder_is_refused()
    {
        string file = Path.Combine(_folder, "file");
        File.WriteAllText(file, "mine");
        Run run = await Run.OfAsync([.. Usual, "--output", file]);
        Assert.Equal((2, "mine"), (run.ExitCode, File.ReadAllText(file)));
        Assert.Contains("this is a file", run.ErrorLine, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Long_work_says_how_far_it_is_and_short_work_says_nothing()
    {
        StringWriter output = new();
        StringWriter error = new();
        Terminal slow = new() { Input = TextReader.Null, Output = output, Error = error, Time = new SteppingTime(), Stop = CancellationToken.None };
        Assert.Equal(0, await Program.RunAsync(Usual, slow));
        Assert.Contains("comparing table and equation: ", error.ToString(), StringComparison.Ordinal);
        Assert.DoesNotContain("comparing", output.ToString(), StringComparison.Ordinal);

        StringWriter quiet = new();
        Terminal fast = new() { Input = TextReader.Null, Output = output, Error = quiet, Time = new StandingTime(), Stop = CancellationToken.None };
        Assert.Equal(0, await Program.RunAsync(Usual, fast));
        Assert.DoesNotContain("comparing", quiet.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Stopped_work_leaves_no_file()
    {
        using CancellationTokenSource stop = new();
        stop.Cancel();
        StringWriter error = new();
        Terminal terminal = new() { Input = TextReader.Null, Output = new StringWriter(), Error = error, Time = TimeProvider.System, Stop = stop.Token };
        Assert.Equal(1, await Program.RunAsync([.. Usual, "--output", _folder], terminal));
        Assert.Contains("stopped before", error.ToString(), StringComparison.Ordinal);
        Assert.Empty(Directory.GetFiles(_folder));
    }

    [Theory]
    [InlineData("--temperature", "0..45C", "ends at 40")]
    [InlineData("--format", "pdf", "csv, json, c-float, c-double, csharp, card")]
    [InlineData("--error", "tiny", "tiny")]
    [InlineData("--gas", "oxigen", "did you mean oxygen?")]
    [InlineData("--temperature", "0...40C", "a range has two dots")]
    [InlineData("--temperature", "-1e9..1e9C", "lie within a million")]
    [InlineData("--temperature", "0..1e400C", "the number is too large")]
    [InlineData("--temperature", "\u22122..40C", "the minus sign is another character; write -2")]
    [InlineData("--temperature", "40..0C", "from low to high")]
    [InlineData("--temperature-step", "1e40K", "no whole number of such steps")]
    [InlineData("--temperature-step", "1e-12K", "more than 4000 of them")]
    [InlineData("--error", "1e-300mg/L", "cannot be reached")]
    [InlineData("--error", "0mg/L", "above zero")]
    [InlineData("--mole-fraction", "21", "a mole fraction lies above 0 and is at most 1")]
    [InlineData("--mole-fraction", "20xx", "xx is no unit of a mole fraction")]
    [InlineData("--output", "", "name the folder")]
    [InlineData("--name", "../x", "small letters, digits and single hyphens")]
    public async Task Wrong_input_is_one_line_with_exit_2(string option, string value, string right)
    {
        string[] arguments = [.. Usual];
        int at = Array.IndexOf(arguments, option);
        arguments = at < 0 ? [.. Usual, option, value] : [.. Usual[..(at + 1)], value, .. Usual[(at + 2)..]];
        Run run = await Run.OfAsync(arguments);
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.Contains(right, LastLine(run), StringComparison.Ordinal);
        Assert.StartsWith("probecal: ", LastLine(run), StringComparison.Ordinal);
    }

    /// <summary>A share is written as in the other commands, with a unit or as a bare number.</summary>
    [Fact]
    public async Task A_mole_fraction_has_the_units_of_the_other_commands()
    {
        string[] usual = ["tables", "--gas", "CO2", "--temperature", "0..30C", "--pressure", "1atm", "--salinity", "0", "--error", "1%", "--format", "csv"];
        Run bare = await Run.OfAsync([.. usual, "--mole-fraction", "0.00042"]);
        Assert.Equal(0, bare.ExitCode);
        Assert.Equal(bare.Output, (await Run.OfAsync([.. usual, "--mole-fraction", "420ppm"])).Output);
    }

    [Fact]
    public async Task Values_that_would_all_be_written_as_0_are_refused()
    {
        Run run = await Run.OfAsync("tables", "--mole-fraction", "1e-300", "--temperature", "0..30C", "--temperature-step", "1K", "--pressure", "1atm", "--salinity", "0", "--format", "csv");
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.Contains("too small to be written", LastLine(run), StringComparison.Ordinal);
        Run card = await Run.OfAsync("tables", "--mole-fraction", "1e-300", "--temperature", "0..30C", "--site-altitude", "640m", "--salinity", "0", "--format", "card");
        Assert.Equal((2, ""), (card.ExitCode, card.Output));
        Assert.Contains("too small to be printed", LastLine(card), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Every_example_of_the_help_works()
    {
        Run help = await Run.OfAsync("tables", "--help");
        // A backslash at the end of a line takes the next one into the command, as at the prompt.
        string[] examples = [.. Regex.Replace(help.Output, @"\\\r?\n\s*", "").Split('\n').Select(static line => line.Trim()).Where(static line => line.StartsWith("probecal tables --", StringComparison.Ordinal))];
        Assert.Equal(5, examples.Length);
        foreach (string example in examples)
        {
            string[] words = CommandWords.Of(example);
            int output = Array.IndexOf(words, "--output");
            if (0 <= output) { words[output + 1] = _folder; }
            Run run = await Run.OfAsync(words[1..]);
            Assert.True(run.ExitCode == 0, example + ": " + run.Error);
        }
    }

    /// <summary>The line after whatever progress a busy machine has told.</summary>
    private static string LastLine(Run run)
    {
        return run.ErrorLine.Split('\n')[^1];
    }

    /// <summary>A clock on which every look takes a second.</summary>
    private sealed class SteppingTime : TimeProvider
    {
        private long _now;

        public override long TimestampFrequency => 1;

        public override long GetTimestamp()
        {
            return ++_now;
        }
    }

    /// <summary>A clock that stands.</summary>
    private sealed class StandingTime : TimeProvider
    {
        public override long GetTimestamp()
        {
            return 0;
        }
    }
}

/// <summary>A command line as the shell takes it apart: blanks between words, double quotes around some.</summary>
internal static class CommandWords
{
    internal static string[] Of(string line)
    {
        return [.. System.Text.RegularExpressions.Regex.Matches(line, "\"([^\"]*)\"|[^ ]+").Select(static word => word.Groups[1].Success ? word.Groups[1].Value : word.Value)];
    }
}
