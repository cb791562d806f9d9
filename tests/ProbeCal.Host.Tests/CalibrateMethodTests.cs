using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Threading.Tasks;
using ProbeCal.Station.CalibrationLog;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary>
/// One calibration and one check for each method, by the program itself, on the simulated probe: its truth is 0.45 nA/hPa at 25 °C
/// and 0.35 nA at zero, in water in equilibrium with air at 20 °C and 940 hPa.
/// </summary>
public sealed class CalibrateMethodTests : IDisposable
{
    // 9.09 mg/L at 20 °C and 1013.25 hPa (TM 9-A6.2, its table), by (P - vapour pressure): 23.4 hPa at 20 °C.
    private const double Saturation = 9.09 * (940 - 23.4) / (1013.25 - 23.4);
    private const string Water = "simulated?seed=3&faster=0&temperature=20C&pressure=940hPa&phase=";

    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-method-").FullName;
    private readonly ManualClock _time = new();

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
    }

    public static TheoryData<string, string, string[]> Methods => new()
    {
        { "air-saturated-water", "air-saturated-water:9min,zero:20min,air-saturated-water", ["--zero", "adjust"] },
        { "water-saturated-air", "air:9min,zero:20min,air", ["--zero", "adjust", "--zero-method", "zero-gas", "--air-to-water-ratio", "1.01", "--air-to-water-uncertainty", "0.3%"] },
        { "transfer-standard", "air-saturated-water:9min,zero:20min,air-saturated-water", ["--zero", "adjust", "--transfer", FormattableString.Invariant($"STD-3 {Saturation:F3}mg/L u 0.03mg/L")] },
        { "titration", "air-saturated-water:9min,zero:20min,air-saturated-water", ["--zero", "adjust", "--titration", Titration] },
        { "gas-mixture", "air-saturated-water:9min,zero:20min,air-saturated-water", ["--zero", "adjust", "--mixture", "CYL-21 20.946% u 0.02% humid 100% u 1%"] },
    };

    /// <summary>
    /// By the definition of the method 1 mL of 0.025 mol/L thiosulfate takes up 0.2 mg of oxygen; 298 mL of sample after 2 mL of reagents, and
    /// 0.0034 mL of gas that these bring (0.00486 mg at 1.429 mg/mL).
    /// </summary>
    private static string Titration
    {
        get
        {
            double titre = ((Saturation * 0.298) + 0.00486) / 0.2;
            return FormattableString.Invariant($"{titre - 0.01:F3}mL,{titre:F3}mL,{titre + 0.01:F3}mL flask 300mL u 0.1mL titrant 0.025mol/L u 0.00002mol/L drawn 20C blank 0mL u 0.01mL");
        }
    }

    [Theory]
    [MemberData(nameof(Methods))]
    public async Task EachMethod_FindsTheTruthOfTheSimulatedProbe(string method, string phases, string[] more)
    {
        CalibrationRecord record = await RecordAsync(0, ["calibrate", .. Common(method, phases), .. more, "--equipment", "KIT-1"]);
        Assert.InRange(Math.Abs(record.Result.Slope - 0.45), 0, 2 * record.Result.SlopeStandardUncertainty);
        Assert.InRange(Math.Abs(record.Result.Zero - 0.35), 0, 2 * record.Result.ZeroStandardUncertainty);
        Assert.Equal(["span", "zero", "as-left"], record.Points.Select(point => point.Role));
        Assert.Equal(method, record.Points[0].Method);
        Assert.Contains("KIT-1", record.Equipment);
        Assert.Contains(record.Steps, step => step.Step == "prepare" && step.Note == "unattended: no person confirmed it");
        Assert.NotEmpty(record.Budget);
    }

    [Theory]
    [MemberData(nameof(Methods))]
    public async Task EachMethod_Checks_WithoutChangingAnything(string method, string phases, string[] more)
    {
        CalibrationRecord calibration = await RecordAsync(0, ["calibrate", .. Common("air-saturated-water", "air-saturated-water:9min,zero:20min,air-saturated-water"), "--zero", "adjust"]);
        CalibrationRecord check = await RecordAsync(0, ["check", .. Common(method, phases), .. more.Select(word => word == "adjust" ? "check" : word), "--as", "continuing"]);
        Assert.Equal(("check", "continuing", calibration.Id), (check.Purpose, check.CheckKind, check.PreviousCalibration));
        Assert.Equal(calibration.Result.Slope, check.Result.Slope);
        Assert.Equal(["span", "zero"], check.Points.Select(point => point.Role));
    }

    [Fact]
    public async Task CheckThatFails_ExitsWithOne_AndSaysBy()
    {
        await RecordAsync(0, ["calibrate", .. Common("air-saturated-water", "air-saturated-water")]);
        // A standard that says 10 mg/L where the water holds 8.4.
        Ran ran = await RunAsync(["check", .. Common("transfer-standard", "air-saturated-water"), "--transfer", "STD-3 10mg/L u 0.03mg/L"]);
        Assert.Equal(1, ran.Code);
        Assert.Contains("probecal: check: failed: as-found -1.", ran.Error, StringComparison.Ordinal);
        Ran again = await RunAsync(["check", .. Common("air-saturated-water", "air-saturated-water"), "--as", "end-of-day"]);
        Assert.True(again.Code == 0, again.Error);
    }

    [Fact]
    public async Task CheckOfAProbeNobodyCalibrated_IsOneLine()
    {
        Ran ran = await RunAsync(["check", .. Common("air-saturated-water", "air-saturated-water")]);
        Assert.Equal(2, ran.Code);
        Assert.Contains("probecal: probe P-1 has no calibration to check; calibrate it first", ran.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task TitrationOfTheNextMorning_GoesOnWithTheReadingBesideTheSamples()
    {
        string[] command = ["calibrate", .. Common("titration", "air-saturated-water")];
        Ran first = await RunAsync(command);
        Assert.Equal(1, first.Code);
        Assert.Contains("unfinished: the span reading is kept and waits for its titration", first.Error, StringComparison.Ordinal);
        _time.Now += TimeSpan.FromHours(11);
        CalibrationRecord record = await RecordAsync(0, [.. command, "--titration", Titration]);
        Assert.True(TimeSpan.FromHours(10) < record.Points[1].FirstUtc - record.Points[0].LastUtc);
    }

    [Theory]
    [InlineData("air-saturated-water", "Aerate the water")]
    [InlineData("water-saturated-air", "Look for droplets")]
    [InlineData("titration", "Flasks and reagents")]
    [InlineData("gas-mixture", "Cylinder and gas line")]
    [InlineData("transfer-standard", "The standard beside the probe")]
    [InlineData("zero-solution", "Zero solution for a check")]
    [InlineData("zero-gas", "Zero gas")]
    public async Task Steps_PrintsTheProcedure_AndDoesNothing(string method, string says)
    {
        Ran ran = await RunAsync(["calibrate", "--method", method, "--steps"]);
        Assert.Equal(0, ran.Code);
        Assert.Contains(says, ran.Output, StringComparison.Ordinal);
        Assert.Contains("Sources: ", ran.Output, StringComparison.Ordinal);
        Assert.All(ran.Output.Split('\n'), static line => Assert.True(line.TrimEnd('\r').Length <= 110, line));
    }

    [Theory]
    [InlineData("calibrate")]
    [InlineData("check")]
    public async Task Help_IsAPage_WithAnExampleForEachMethod(string command)
    {
        Ran ran = await RunAsync([command, "--help"]);
        Assert.Equal(0, ran.Code);
        Assert.InRange(ran.Output.Split('\n').Length, 20, 55);
        foreach (string method in new[] { "air-saturated-water", "water-saturated-air", "titration", "gas-mixture", "transfer-standard", "zero-" })
        {
            Assert.Contains("--method " + (method == "zero-" ? "" : method), ran.Output, StringComparison.Ordinal);
        }

        Ran all = await RunAsync([command, "--options"]);
        Assert.Contains("Limits and waiting", all.Output, StringComparison.Ordinal);
        Assert.Contains("--stable-within", all.Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--level", "gas-mixtur: CYL-22 5% u 0.02% dry", "there is no method 'gas-mixtur' (did you mean gas-mixture?)")]
    [InlineData("--level", "zero-gas", "a zero is asked for by --zero check or --zero adjust")]
    [InlineData("--form", "cubic", "--form cubic: there is no such choice; there are line, quadratic")]
    [InlineData("--titration", "8.02mL,8.03mL flask 300mL titrant 0.025mol/L drawn 20C", "the method air-saturated-water has no use for it")]
    [InlineData("--zero-method", "sulfite", "--zero-method sulfite: there is no such choice")]
    [InlineData("--gas", "O3x", "--gas O3x: no such gas is known here")]
    [InlineData("--reading", "level-1", "unused")]
    public async Task WrongInput_IsOneLine(string option, string value, string says)
    {
        Ran ran = await RunAsync(["calibrate", .. Common("air-saturated-water", "air-saturated-water"), option, value]);
        if (says == "unused")
        {
            // Readings of levels are read only from a meter; a live source does not look at them.
            Assert.Equal(0, ran.Code);
            return;
        }

        Assert.Equal(2, ran.Code);
        Assert.Contains(says, ran.Error, StringComparison.Ordinal);
        Assert.Single(ran.Error.Split('\n', StringSplitOptions.RemoveEmptyEntries), line => line.StartsWith("probecal: ", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("titration", "--titration", "-8.02mL,8.05mL flask 300mL titrant 0.025mol/L drawn 20C")]
    [InlineData("gas-mixture", "--mixture", "CYL-21 120% u 1% dry")]
    [InlineData("transfer-standard", "--transfer", "STD-3 8.41% u 0.1%")]
    public async Task ValuesThatCannotBe_AreOneLine(string method, string option, string value)
    {
        Ran ran = await RunAsync(["calibrate", .. Common(method, "air-saturated-water"), option, value]);
        Assert.Equal(2, ran.Code);
        string line = Assert.Single(ran.Error.Split('\n', StringSplitOptions.RemoveEmptyEntries), line => line.StartsWith("probecal: ", StringComparison.Ordinal));
        Assert.Contains(option, line, StringComparison.Ordinal);
    }

    [Fact]
    public async Task MeterByTransferStandard_IsSetToTheStandard()
    {
        string[] command =
        [
            "calibrate", "--unattended", "--manual", "--data", _folder, "--probe", "M-3", "--meter-shows", "mg/L", "--method", "transfer-standard", "--salinity", "0", "--stirring", "stirred",
            "--temperature", "20C", "--pressure", "750mmHg", "--pressure-source", "barometer:B-12", "--altitude", "100m", "--transfer", "STD-3 8.50mg/L u 0.05mg/L", "--confirm", "steady=watched for 5 min",
        ];
        Ran first = await RunAsync([.. command, "--as-found", "8.10mg/L"]);
        Assert.Equal(1, first.Code);
        Assert.Contains("Set the meter to 8.50 mg/L", first.Error, StringComparison.Ordinal);
        CalibrationRecord record = await RecordAsync(0, [.. command, "--as-left", "8.50"]);
        Assert.Equal(-0.4, record.Points[0].ErrorMilligramsPerLitre!.Value, 0.01);
        Assert.Equal(1, record.Result.Slope, 0.002);
    }

    /// <summary>A CO2 electrode of 57 mV a decade and -110 mV at 1 hPa in 5 %, 0.5 % and 5 % of 940 hPa; 2 mV off, it reads 51.0 instead of 47 hPa.</summary>
    [Theory]
    [InlineData(2, "fail", "--limit", "2hPa")]
    [InlineData(2, "pass", "--limit", "5hPa")]
    [InlineData(2, "pass", "--limit-percent", "10%")]
    [InlineData(0, "pass", "--limit", "2hPa")]
    public async Task CarbonDioxide_IsJudgedInHectopascal_ByWhatWasEntered(double off, string verdict, string option, string limit)
    {
        CalibrationRecord calibration = await RecordAsync(0, ["calibrate", .. CarbonDioxide(Lines(0, 47, 4.7, 47)), "--level", "gas-mixture: CYL-6 0.5% u 0.005% dry", "--limit", "2hPa"]);
        Assert.Equal(57, calibration.Result.Slope, 2 * calibration.Result.SlopeStandardUncertainty);
        Ran check = await RunAsync(["check", .. CarbonDioxide(Lines(off, 47)), option, limit]);
        Assert.Equal(verdict == "pass" ? 0 : 1, check.Code);
        Assert.Contains(verdict == "pass" ? "PASS" : "FAIL", check.Output, StringComparison.Ordinal);
        Assert.Contains("reference hPa CO2  47.00", check.Output, StringComparison.Ordinal);
        Assert.Contains(off == 0 ? "reading hPa        47.00" : "error hPa          +4.0", check.Output, StringComparison.Ordinal);
        Assert.DoesNotContain("reading mg/L", check.Output, StringComparison.Ordinal);
        Assert.Contains("mV/decade", check.Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("calibrate", "", "", "there is no published limit for CO2, and none was entered: say how far a reading may be off, with --limit in hPa")]
    [InlineData("check", "", "", "there is no published limit for CO2")]
    [InlineData("calibrate", "--limit", "0.2mg/L", "--limit 0.2mg/L: errors of this gas are judged as a pressure; write for example 5hPa")]
    public async Task CarbonDioxideWithoutALimitInHectopascal_IsOneLine_AndNothingIsMeasured(string command, string option, string value, string says)
    {
        string[] more = option.Length == 0 ? [] : [option, value];
        Ran ran = await RunAsync([command, .. CarbonDioxide(Lines(0, 47, 4.7, 47)), "--level", "gas-mixture: CYL-6 0.5% u 0.005% dry", .. more]);
        Assert.Equal(2, ran.Code);
        Assert.Contains("probecal: " + says, ran.Error, StringComparison.Ordinal);
        Assert.DoesNotContain("point", ran.Error.Replace("decimal point", "", StringComparison.Ordinal), StringComparison.Ordinal);
    }

    private string[] CarbonDioxide(string source)
    {
        return
        [
            "--unattended", "--data", _folder, "--source", "file:" + source, "--line", "{time},{signal:mV},{temperature},{pressure}", "--probe", "P-C", "--gas", "CO2",
            "--model", "severinghaus zero-per-kelvin=0 lowest-celsius=0 highest-celsius=40", "--method", "gas-mixture", "--mixture", "CYL-5 5% u 0.02% dry", "--pressure-source", "barometer:B-12",
        ];
    }

    /// <summary>Lines of the electrode at 20 °C in each gas for 400 s, with a little noise that is the same each time.</summary>
    private string Lines(double off, params double[] hectopascal)
    {
        string path = Path.Combine(_folder, $"lines-{Directory.GetFiles(_folder).Length}.csv");
        System.Text.StringBuilder text = new();
        DateTimeOffset time = _time.Now;
        foreach (double p in hectopascal)
        {
            for (int i = 0; i < 400; i++)
            {
                time = time.AddSeconds(1);
                double millivolts = -110 + (57 * (293.15 / 298.15) * Math.Log10(p)) + off + (0.005 * ((i % 7) - 3));
                text.Append(System.Globalization.CultureInfo.InvariantCulture, $"{time.UtcDateTime:yyyy-MM-dd'T'HH:mm:ss}Z,{millivolts:F4},{20 + (0.001 * (i % 3))},940\n");
            }
        }

        File.WriteAllText(path, text.ToString());
        return path;
    }

    private string[] Common(string method, string phases)
    {
        return
        [
            "--unattended", "--data", _folder, "--source", Water + phases, "--line", "{time},{signal:nA},{temperature},{pressure}", "--probe", "P-1", "--method", method,
            "--pressure-source", "barometer:B-12", "--altitude", "640m", "--salinity", "0", "--stirring", "stirred", "--coefficient", "arrhenius 22kJ/mol at 25C fitted 5..35C u 0.5kJ/mol",
        ];
    }

    private async Task<CalibrationRecord> RecordAsync(int code, string[] arguments)
    {
        Ran ran = await RunAsync([.. arguments, "--format", "json"]);
        Assert.True(ran.Code == code, ran.Error);
        return RecordJson.Read(System.Text.Encoding.UTF8.GetBytes(ran.Output), "output");
    }

    private async Task<Ran> RunAsync(string[] arguments)
    {
        StringWriter output = new();
        StringWriter error = new();
        int code = await Program.RunAsync(arguments, new Terminal { Input = new StringReader(""), Output = output, Error = error, Time = _time });
        // Simulated time runs ahead of the clock within a command; the next one comes later than its last line.
        _time.Now += TimeSpan.FromHours(1);
        return new Ran(code, output.ToString(), error.ToString());
    }

    private sealed record Ran(int Code, string Output, string Error);

    private sealed class ManualClock : TimeProvider
    {
        internal DateTimeOffset Now { get; set; } = new(2026, 6, 1, 9, 0, 0, TimeSpan.Zero);

        public override DateTimeOffset GetUtcNow()
        {
            return Now;
        }
    }
}
