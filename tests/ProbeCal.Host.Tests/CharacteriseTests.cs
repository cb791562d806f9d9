using System;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.Json;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>probecal characterise</c> as others call it, on a made-up probe without noise but for the last digit.</summary>
public sealed class CharacteriseTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-").FullName;

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
    }

    [Fact]
    public async Task AWholeRun_IsReportedAndWritten()
    {
        string json = Path.Combine(_folder, "p17.json");
        string header = Path.Combine(_folder, "p17.h");
        Run run = await Run.OfAsync(
        [
            "characterise", "--probe", "P-17", "--input", "zero=" + ZeroFile(), "--input", "temperature=" + TemperatureFile(), "--input", "step-down=" + StepFile(),
            .. Columns, "--output", json, "--firmware", header,
        ]);
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("temperature-coefficient  0.0300", run.Output, StringComparison.Ordinal);
        Assert.Contains("for calibrate: --coefficient \"exponential 0.03", run.Output, StringComparison.Ordinal);
        Assert.Contains("tau-down", run.Output, StringComparison.Ordinal);
        Assert.Contains("t90-down", run.Output, StringComparison.Ordinal);
        Assert.All(run.Output.Split('\n'), static line => Assert.InRange(line.Length, 0, 160));
        using JsonDocument written = JsonDocument.Parse(File.ReadAllText(json));
        Assert.True(Schemas.Of("characterisation").Evaluate(written.RootElement).IsValid);
        Assert.Equal(["zero", "temperature", "step-down"], written.RootElement.GetProperty("parts").EnumerateArray().Select(static part => part.GetProperty("part").GetString()));
        JsonElement coefficient = written.RootElement.GetProperty("parts")[1].GetProperty("parameters")[1];
        Assert.Equal(0.03, coefficient.GetProperty("value").GetDouble(), 1e-4);
        Assert.Contains("#define PROBECAL_TEMPERATURE_FORM \"exponential\"", File.ReadAllText(header), StringComparison.Ordinal);

        Run again = await Run.OfAsync(["characterise", "--input", "zero=" + ZeroFile(), .. Columns, "--output", json]);
        Assert.Equal((2, ""), (again.ExitCode, again.Output));
        Assert.Contains("this file exists already; give another name, or --force to replace it", again.ErrorLine, StringComparison.Ordinal);
        Run forced = await Run.OfAsync(["characterise", "--input", "zero=" + ZeroFile(), .. Columns, "--output", json, "--force"]);
        Assert.Equal(0, forced.ExitCode);
    }

    [Fact]
    public async Task TooFewTemperatures_AreOneLine()
    {
        string two = Write("two.csv", "I [nA],T [C],Baro [hPa]\n45,15,1000\n60,25,1000\n46,15.2,1000\n");
        Run run = await Run.OfAsync(["characterise", "--input", "temperature=" + two, "--zero", "0.4", .. Columns]);
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.DoesNotContain('\n', run.ErrorLine);
        Assert.Contains("needs at least 3 temperatures more than 1 K apart, and there are 2", run.ErrorLine, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--output")]
    [InlineData("--firmware")]
    public async Task AFileOfTheRun_IsNeverOverwritten(string option)
    {
        string temperatures = TemperatureFile();
        string before = File.ReadAllText(temperatures);
        Run run = await Run.OfAsync(["characterise", "--input", "temperature=" + temperatures, "--zero", "0.42", .. Columns, option, temperatures, "--force"]);
        Assert.Equal(2, run.ExitCode);
        Assert.Contains("this is a file of the run itself, which is never overwritten", run.Error, StringComparison.Ordinal);
        Assert.Equal(before, File.ReadAllText(temperatures));
    }

    [Fact]
    public async Task Help_ShowsHow()
    {
        Run run = await Run.OfAsync("characterise", "--help");
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("probecal characterise --input zero=zero.csv --input temperature=temps.csv", run.Output, StringComparison.Ordinal);
    }

    private static readonly string[] Columns = ["--column", "signal=I [nA]", "--column", "temperature=T [C]", "--column", "pressure=Baro [hPa]", "--column", "time=t [s]"];

    private string ZeroFile()
    {
        return Write("zero.csv", "I [nA]\n0.41\n0.42\n0.43\n0.42\n");
    }

    private string TemperatureFile()
    {
        StringBuilder text = new("I [nA],T [C],Baro [hPa]\n");
        foreach (double celsius in new[] { 5.0, 12.0, 20.0, 28.0, 35.0 })
        {
            Assert.Equal(Status.Ok, OxygenEquilibrium.PartialPressure(celsius, 1001.0, RangeRule.Refuse, out double p));
            text.Append(CultureInfo.InvariantCulture, $"{0.42 + (0.31 * Math.Exp(0.03 * (celsius - 25.0)) * p):F2},{celsius},1001\n");
        }

        return Write("temps.csv", text.ToString());
    }

    private string StepFile()
    {
        StringBuilder text = new("I [nA],t [s]\n");
        for (int i = 0; i < 100; i++)
        {
            text.Append(CultureInfo.InvariantCulture, $"{0.42 + (60.0 * Math.Exp(-i / 15.0)):F2},{i}\n");
        }

        return Write("step.csv", text.ToString());
    }

    private string Write(string name, string text)
    {
        string path = Path.Combine(_folder, name);
        File.WriteAllText(path, text);
        return path;
    }
}
