using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text.Json;
using System.Threading.Tasks;
using ProbeCal.Station.CalibrationLog;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>calibrate</c> and <c>calibrations</c> as a script and as a person call them.</summary>
public sealed class CalibrateTests : IDisposable
{
    private const string Water = "simulated?seed=3&faster=0&temperature=20C&pressure=940hPa&phase=air-saturated-water";
    private const string Coefficient = "arrhenius 22kJ/mol at 25C fitted 5..35C u 0.5kJ/mol";
    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-calibrate-").FullName;
    private readonly ManualClock _time = new();

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
    }

    [Fact]
    public async Task Unattended_PassesRecordsAndShows()
    {
        Ran ran = await RunAsync(Unattended());
        Assert.True(ran.Code == 0, ran.Error);
        Assert.Contains(": PASS   (SIMULATED: no real probe was calibrated)", ran.Output, StringComparison.Ordinal);
        Assert.Contains("USGS 2020, National Field Manual A6.2", ran.Output, StringComparison.Ordinal);
        Assert.Contains("100 % point: ", ran.Error, StringComparison.Ordinal);
        Assert.DoesNotContain("100 % point: ", ran.Output, StringComparison.Ordinal);

        Ran list = await RunAsync("calibrations", "list", "--data", _folder);
        Assert.Equal(0, list.Code);
        Assert.Contains("1 record, chain whole", list.Output, StringComparison.Ordinal);
        string id = list.Output.Split('\n')[1].Split(' ')[0];

        Ran show = await RunAsync("calibrations", "show", id, "--data", _folder);
        Assert.Equal(0, show.Code);
        Assert.Contains("Calibration " + id + ": PASS", show.Output, StringComparison.Ordinal);
        Assert.Contains("record SHA-256 ", show.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Json_IsTheRecordAsStored()
    {
        Ran ran = await RunAsync([.. Unattended(), "--format", "json"]);
        CalibrationRecord record = RecordJson.Read(System.Text.Encoding.UTF8.GetBytes(ran.Output), "output");
        Assert.Equal(1, record.Index);
        Assert.InRange(record.Result.Slope, 0.44, 0.46);

        Ran show = await RunAsync("calibrations", "show", record.Id, "--data", _folder, "--format", "json");
        Assert.Equal(ran.Output, show.Output);
        Ran list = await RunAsync("calibrations", "list", "--data", _folder, "--format", "json", "--probe", "P-1");
        using JsonDocument parsed = JsonDocument.Parse(list.Output);
        Assert.True(Schemas.Of("calibration-list").Evaluate(parsed.RootElement).IsValid, list.Output);
        Assert.Equal(record.Id, parsed.RootElement.GetProperty("calibrations")[0].GetProperty("id").GetString());
        Ran other = await RunAsync("calibrations", "list", "--data", _folder, "--format", "json", "--probe", "P-2");
        Assert.Equal(0, JsonDocument.Parse(other.Output).RootElement.GetProperty("calibrations").GetArrayLength());
    }

    [Fact]
    public async Task FailedLimit_IsRecorded_AndExitsWithOneAndTheReason()
    {
        Ran ran = await RunAsync([.. Unattended(), "--slope-window", "0.5..0.6"]);
        Assert.Equal(1, ran.Code);
        Assert.Contains(": FAIL", ran.Output, StringComparison.Ordinal);
        Assert.Contains("failed: slope 0.45", ran.Error, StringComparison.Ordinal);
        Assert.Contains("fail", (await RunAsync("calibrations", "list", "--data", _folder)).Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task NeverSteady_ExitsWithOne_AndSaysWhatMoved()
    {
        Ran ran = await RunAsync([.. Unattended(), "--stable-within", "0.000001mg/L", "--give-up-after", "5min"]);
        Assert.Equal(1, ran.Code);
        Assert.Contains("span point: not steady within 5 min; still moving: signal", ran.Error, StringComparison.Ordinal);
        Assert.Empty(ran.Output);
    }

    [Fact]
    public async Task StabilityLimit_IsAQuarterOfTheEnteredLimit()
    {
        Ran ran = await RunAsync([.. Unattended(), "--limit", "0.004mg/L", "--give-up-after", "5min"]);
        Assert.Equal(1, ran.Code);
        Assert.Contains("(limit 0.001 mg/L)", ran.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task TypedTemperatureBesideALine_IsNotTheProbesThermometer()
    {
        CalibrationRecord byLine = await RecordAsync();
        CalibrationRecord typed = await RecordAsync("--temperature", "20.0C", "--confirm", "steady=bath with a thermostat");
        CalibrationRecord named = await RecordAsync("--temperature", "20.0C", "--thermometer", "T-7", "--confirm", "steady=bath with a thermostat");
        Assert.Equal(["P-1", "not named", "T-7"], new[] { byLine, typed, named }.Select(record => record.Probe.Thermometer.Id));
        Assert.Equal(["line", "typed", "typed"], new[] { byLine, typed, named }.Select(record => record.Points[0].Temperature.Source));

        async Task<CalibrationRecord> RecordAsync(params string[] more)
        {
            Ran ran = await RunAsync([.. Unattended(), .. more, "--format", "json"]);
            Assert.True(ran.Code == 0, ran.Error);
            return RecordJson.Read(System.Text.Encoding.UTF8.GetBytes(ran.Output), "output");
        }
    }

    [Fact]
    public async Task ZeroAndAirFromOneSimulatedLine()
    {
        string script = "simulated?seed=3&faster=0&temperature=20C&pressure=940hPa&phase=air:5min,zero:20min,air";
        Ran ran = await RunAsync([.. Unattended(("--source", script), ("--method", "water-saturated-air")), "--zero", "adjust", "--air-to-water-ratio", "1.01", "--air-to-water-uncertainty", "0.3%", "--format", "json"]);
        Assert.True(ran.Code == 0, ran.Error);
        CalibrationRecord record = RecordJson.Read(System.Text.Encoding.UTF8.GetBytes(ran.Output), "output");
        Assert.Equal(["span", "zero", "as-left"], record.Points.Select(point => point.Role));
        Assert.Equal("not-checked", record.DropletCheck);
        Assert.InRange(record.Result.Zero, 0.3, 0.6);
        Assert.InRange(record.Result.Slope, 0.445, 0.455);
    }

    [Theory]
    [InlineData("--pressure", "742", "--pressure 742: a pressure carries its unit")]
    [InlineData("--pressure", "940,5hPa", "a comma is no decimal mark here")]
    [InlineData("--pressure", "1013hPa", "pressure-at-altitude: pressure 1013.0 hPa at 640 m")]
    [InlineData("--pressure-source", "barometer", "--pressure-source barometer: a barometer has an id")]
    [InlineData("--temperature", "68C", "write 68F (20.0 C)")]
    [InlineData("--temperature", "NaN", "NaN and infinity are no values here")]
    [InlineData("--temperature", "20,0", "--temperature 20,0: a comma is no decimal mark here; write 20.0")]
    [InlineData("--coefficient", "3%/K", "--coefficient 3%/K: a rate alone does not say its form")]
    [InlineData("--method", "air", "--method air: there is no such choice")]
    [InlineData("--method", "air-saturated-watr", "did you mean air-saturated-water?")]
    [InlineData("--stirring", "stired", "there is no such choice (did you mean stirred?); there are stirred, still, flow-insensitive")]
    [InlineData("--zero", "maybe", "there are keep, assume, check, adjust")]
    [InlineData("--salinity", "35ppt", "35ppt")]
    [InlineData("--give-up-after", "30", "carries its unit")]
    [InlineData("--window", "-3min", "--window -3min")]
    [InlineData("--window", "31min", "does not fit into --give-up-after 1800 s")]
    [InlineData("--give-up-after", "60d", "7d at most")]
    [InlineData("--source", "file:nothing-there.txt", "there is no such file")]
    [InlineData("--samples", "2", "a whole number from 3")]
    [InlineData("--limit", "0.2", "carries its unit")]
    [InlineData("--slope-window", "0.6..0.5", "runs from low to high")]
    [InlineData("--membrane-installed", "1.5.2026", "write the day as 2026-05-01")]
    [InlineData("--equation", "weiss", "--equation weiss: there is no such equation")]
    [InlineData("--source", "serail:/dev/x", "did you mean serial")]
    [InlineData("--line", "{signal", "--line")]
    [InlineData("--confirm", "nothing=because", "there is no guard 'nothing'")]
    [InlineData("--confirm", "slope", "the reason is missing")]
    [InlineData("--format", "xml", "there are text and json")]
    public async Task WrongInput_IsOneLineThatNamesIt_AndExitsWithTwo(string option, string value, string says)
    {
        Ran ran = await RunAsync(Unattended((option, value), ("--membrane", "M-1")));
        Assert.Equal(2, ran.Code);
        Assert.Contains(says, ran.Error, StringComparison.Ordinal);
        Assert.Single(ran.Error.Split('\n', StringSplitOptions.RemoveEmptyEntries), line => line.StartsWith("probecal: ", StringComparison.Ordinal));
        Assert.Empty(ran.Output);
    }

    [Theory]
    [InlineData("--probe")]
    [InlineData("--source")]
    [InlineData("--method")]
    [InlineData("--pressure-source")]
    [InlineData("--salinity")]
    [InlineData("--stirring")]
    [InlineData("--coefficient")]
    public async Task MissingOption_IsNamed(string option)
    {
        Ran ran = await RunAsync(Unattended((option, null)));
        Assert.Equal(2, ran.Code);
        Assert.Contains(option + " is missing", ran.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task LineWithoutTemperatureOrPressure_AsksForThem()
    {
        Ran ran = await RunAsync(Unattended(("--line", "{time},{signal}")));
        Assert.Equal(2, ran.Code);
        Assert.Contains("--temperature is missing: the lines carry no {temperature}", ran.Error, StringComparison.Ordinal);
        Ran pressure = await RunAsync(Unattended(("--line", "{time},{signal},{temperature}")));
        Assert.Equal(2, pressure.Code);
        Assert.Contains("--pressure is missing", pressure.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task StrongHigh_NeedsAReason_WhichTheRecordKeeps()
    {
        string high = "simulated?seed=3&faster=0&temperature=20C&pressure=965hPa&phase=air-saturated-water";
        Ran asked = await RunAsync(Unattended(("--source", high)));
        Assert.Equal(2, asked.Code);
        Assert.Contains("--confirm pressure-at-altitude=", asked.Error, StringComparison.Ordinal);

        Ran ran = await RunAsync([.. Unattended(("--source", high)), "--confirm-pressure", "second barometer agrees", "--format", "json"]);
        Assert.Equal(0, ran.Code);
        CalibrationRecord record = RecordJson.Read(System.Text.Encoding.UTF8.GetBytes(ran.Output), "output");
        Assert.Equal("second barometer agrees", record.Findings.Single(finding => finding.Guard == "pressure-at-altitude").Reason);
    }

    [Fact]
    public async Task AltitudeAlone_StandsIn_WithTenHectopascal()
    {
        Ran ran = await RunAsync([.. Unattended(("--pressure-source", "altitude"), ("--line", "{time},{signal},{temperature}")), "--format", "json"]);
        Assert.True(ran.Code == 0, ran.Error);
        CalibrationRecord record = RecordJson.Read(System.Text.Encoding.UTF8.GetBytes(ran.Output), "output");
        // ICAO standard atmosphere at 640 m.
        Assert.Equal(938.6, record.Points[0].Pressure.Value, 0.3);
        Assert.Equal(10, record.Points[0].Pressure.StandardUncertainty);
        Assert.Equal("altitude", record.Points[0].Pressure.Source);
    }

    [Fact]
    public async Task ManualWithoutTerminal_KeepsTheFirstReadingAndGoesOn()
    {
        string[] common = ["calibrate", "--unattended", "--manual", "--data", _folder, "--probe", "M-3", "--meter-shows", "mg/L", "--method", "air-saturated-water", "--salinity", "0", "--stirring", "stirred", "--temperature", "20C", "--pressure", "750mmHg", "--pressure-source", "barometer:B-12", "--altitude", "100m"];
        Ran first = await RunAsync([.. common, "--as-found", "8.61mg/L"]);
        Assert.Equal(1, first.Code);
        // USGS TM 9-A6.2, worked example: 20.0 °C, 750 mmHg gives 8.97 mg/L.
        Assert.Contains("Set the meter to 8.97 mg/L", first.Error, StringComparison.Ordinal);
        Assert.Contains("unfinished: the as-left reading", first.Error, StringComparison.Ordinal);
        Ran second = await RunAsync([.. common, "--as-left", "8.97"]);
        Assert.True(second.Code == 0, second.Error);
        Assert.Contains("-0.36", second.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Interactive_AsksForWhatIsMissing_AndAsksAgainAfterNonsense()
    {
        string[] arguments = [.. Unattended(("--salinity", null), ("--stirring", null)).Where(word => word != "--unattended")];
        Ran ran = await RunAsync(arguments, "none\n0,0\n0\nsure\nstirred\n" + Enter(4));
        Assert.True(ran.Code == 0, ran.Error);
        Assert.Contains("Practical salinity of the water (0 for fresh)?", ran.Error, StringComparison.Ordinal);
        Assert.Contains("--salinity none: ", ran.Error, StringComparison.Ordinal);
        Assert.Contains("--salinity 0,0: ", ran.Error, StringComparison.Ordinal);
        Assert.Contains("--stirring sure: there is no such choice; there are stirred, still, flow-insensitive", ran.Error, StringComparison.Ordinal);
        Assert.Contains("Press Enter when it is so.", ran.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Interactive_CautionsBeforeTheZeroSolution_AndLooksForDroplets()
    {
        string script = "simulated?seed=3&faster=0&temperature=20C&pressure=940hPa&phase=air:9min,zero";
        string[] arguments = [.. Unattended(("--source", script), ("--method", "water-saturated-air")).Where(word => word != "--unattended"), "--zero", "check"];
        Ran ran = await RunAsync(arguments, Enter(4) + "perhaps\nno\n" + Enter(2) + "lot 7, made today\n" + Enter(3));
        Assert.True(ran.Code == 0, ran.Error);
        Assert.Contains("'perhaps' is neither yes nor no", ran.Error, StringComparison.Ordinal);
        Assert.Contains("Caution: Sulfite irritates", ran.Error, StringComparison.Ordinal);
        Assert.Contains("looked for, none seen", ran.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Interactive_InputThatEnds_IsOneLine()
    {
        string[] arguments = [.. Unattended(("--salinity", null)).Where(word => word != "--unattended")];
        Ran ran = await RunAsync(arguments, "");
        Assert.Equal(2, ran.Code);
        Assert.Contains("\nprobecal: the input ended before the question was answered", ran.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Interactive_AsksAgainForAPressureThatCannotBeAtTheAltitude_AndShowsTheCommandWithoutQuestions()
    {
        string[] arguments =
        [
            .. Unattended(("--method", null), ("--pressure-source", null), ("--altitude", null), ("--stirring", null), ("--line", "{time},{signal},{temperature}")).Where(word => word != "--unattended"),
            "--simulated",
        ];
        Ran ran = await RunAsync(arguments, "1\nbarometer:B-12\n2100\n2100ft\n760mmHg\n705mmHg\n1\n" + Enter(4));
        Assert.True(ran.Code == 0, ran.Error);
        Assert.Contains("--altitude 2100: an altitude carries its unit", ran.Error, StringComparison.Ordinal);
        Assert.Contains("--pressure 760mmHg is not possible at 2100ft", ran.Error, StringComparison.Ordinal);
        string again = ran.Error.Split('\n').Single(line => line.StartsWith("probecal calibrate ", StringComparison.Ordinal));
        Assert.EndsWith("--simulated --method air-saturated-water --pressure-source barometer:B-12 --altitude 2100ft --pressure 705mmHg --stirring stirred", again.TrimEnd('\r'), StringComparison.Ordinal);
        Assert.Contains(OperatingSystem.IsWindows() ? "\"" + Coefficient + "\"" : "'" + Coefficient + "'", again, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Interactive_PressureFromTheAltitude_AsksForTheAltitudeUntilItIsThere()
    {
        string[] arguments = [.. Unattended(("--pressure-source", null), ("--altitude", null), ("--line", "{time},{signal},{temperature}")).Where(word => word != "--unattended")];
        Ran ran = await RunAsync(arguments, "altitude\n\n640m\n" + Enter(4));
        Assert.True(ran.Code == 0, ran.Error);
        Assert.DoesNotContain("Enter if not known", ran.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Text_FitsATerminal_AndSaysOfADefaultThatItIsOne()
    {
        Ran ran = await RunAsync(Unattended(("--coefficient", "arrhenius 22kJ/mol at 25C fitted 5..35C")));
        Ran list = await RunAsync("calibrations", "list", "--data", _folder);
        Assert.Contains("u 177.38 J/mol (default: 0.024 % per kelvin", ran.Output, StringComparison.Ordinal);
        // A word without blanks, such as the address of a source, is never broken.
        Assert.All((ran.Output + list.Output).Split('\n').Where(static line => line.Trim().Contains(' ', StringComparison.Ordinal)), static line => Assert.True(line.TrimEnd('\r').Length <= 110, line));
        Assert.Contains(" nA/hPa ", list.Output, StringComparison.Ordinal);
        Ran entered = await RunAsync([.. Unattended(), "--start-over"]);
        Assert.Contains("u 500 J/mol (entered)", entered.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task NoTerminalAndNotUnattended_IsRefused()
    {
        string[] arguments = [.. Unattended().Where(word => word != "--unattended")];
        Ran ran = await RunAsync(arguments);
        Assert.Equal(2, ran.Code);
        Assert.Contains("there is no terminal to answer at", ran.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task BrokenChain_IsToldByListAndShow()
    {
        await RunAsync(Unattended());
        using (Microsoft.Data.Sqlite.SqliteConnection raw = new($"Data Source={Path.Combine(_folder, "calibrations.db")};Pooling=False"))
        {
            raw.Open();
            using Microsoft.Data.Sqlite.SqliteCommand command = raw.CreateCommand();
            command.CommandText = "DROP TRIGGER records_no_update; UPDATE records SET bytes = CAST(replace(CAST(bytes AS TEXT), '\"pass\": true', '\"pass\":  true') AS BLOB)";
            command.ExecuteNonQuery();
        }

        Ran list = await RunAsync("calibrations", "list", "--data", _folder);
        Assert.Equal(1, list.Code);
        Assert.Contains("CHAIN BROKEN: record 1 was changed after it was stored", list.Error, StringComparison.Ordinal);
        Assert.DoesNotContain("chain whole", list.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task PortThatIsNotThere_IsOneLine_AndExitsWithOne()
    {
        Ran ran = await RunAsync(Unattended(("--source", "serial:/dev/probecal-no-such-port")));
        Assert.Equal(1, ran.Code);
        Assert.Contains("probecal-no-such-port", ran.Error, StringComparison.Ordinal);
        Assert.Single(ran.Error.Split('\n'), line => line.StartsWith("probecal: ", StringComparison.Ordinal));
    }

    [Fact]
    public async Task NewerLog_IsRefusedAndNotTouched()
    {
        await RunAsync(Unattended());
        string file = Path.Combine(_folder, "calibrations.db");
        using (Microsoft.Data.Sqlite.SqliteConnection raw = new($"Data Source={file};Pooling=False"))
        {
            raw.Open();
            using Microsoft.Data.Sqlite.SqliteCommand command = raw.CreateCommand();
            command.CommandText = "PRAGMA user_version = 99; PRAGMA wal_checkpoint(TRUNCATE);";
            command.ExecuteNonQuery();
        }

        byte[] before = await File.ReadAllBytesAsync(file);
        foreach (string[] arguments in new[] { Unattended(), ["calibrations", "list", "--data", _folder] })
        {
            Ran ran = await RunAsync(arguments);
            Assert.Equal(2, ran.Code);
            Assert.Contains("version 99", ran.Error, StringComparison.Ordinal);
        }

        Assert.Equal(before, await File.ReadAllBytesAsync(file));
    }

    [Fact]
    public async Task ShowOfAnUnknownId_AndAFolderWithoutALog_AreWrongInput()
    {
        Assert.Contains("there is no such folder", (await RunAsync("calibrations", "list", "--data", Path.Combine(_folder, "nothing"))).Error, StringComparison.Ordinal);
        Assert.Contains("the calibration log is not there", (await RunAsync("calibrations", "list", "--data", _folder)).Error, StringComparison.Ordinal);
        await RunAsync(Unattended());
        Ran ran = await RunAsync("calibrations", "show", "x-9", "--data", _folder);
        Assert.Equal(2, ran.Code);
        Assert.Contains("calibration x-9: not in this log", ran.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task OutputIsTheSameInACommaCulture()
    {
        Ran plain = await RunAsync([.. Unattended(), "--format", "json"]);
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = new CultureInfo("de-DE");
            Ran list = await RunAsync("calibrations", "list", "--data", _folder);
            Assert.Contains("0.45", list.Output, StringComparison.Ordinal);
            Ran show = await RunAsync("calibrations", "show", RecordJson.Read(System.Text.Encoding.UTF8.GetBytes(plain.Output), "output").Id, "--data", _folder);
            Assert.DoesNotMatch("[0-9],[0-9]", show.Output);
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    private string[] Unattended(params (string Option, string? Value)[] changes)
    {
        Dictionary<string, string?> options = new()
        {
            ["--data"] = _folder,
            ["--source"] = Water,
            ["--line"] = "{time},{signal:nA},{temperature},{pressure}",
            ["--probe"] = "P-1",
            ["--method"] = "air-saturated-water",
            ["--pressure-source"] = "barometer:B-12",
            ["--altitude"] = "640m",
            ["--salinity"] = "0",
            ["--stirring"] = "stirred",
            ["--coefficient"] = Coefficient,
        };
        foreach ((string option, string? value) in changes)
        {
            options[option] = value;
        }

        return ["calibrate", "--unattended", .. options.Where(pair => pair.Value != null).SelectMany(pair => new[] { pair.Key, pair.Value! })];
    }

    /// <summary>The Enter key, some times: once for each step that a person says is done.</summary>
    private static string Enter(int times)
    {
        return new string('\n', times);
    }

    private Task<Ran> RunAsync(params string[] arguments)
    {
        return RunAsync(arguments, null);
    }

    private async Task<Ran> RunAsync(string[] arguments, string? input)
    {
        StringWriter output = new();
        StringWriter error = new();
        Terminal terminal = new()
        {
            Input = new StringReader(input ?? ""),
            Output = output,
            Error = error,
            Time = _time,
            IsInteractive = input != null,
        };
        int code = await Program.RunAsync(arguments, terminal);
        // Each command is run a while after the one before.
        _time.Now += TimeSpan.FromMinutes(20);
        return new Ran(code, output.ToString(), error.ToString());
    }

    private sealed record Ran(int Code, string Output, string Error);

    /// <summary>A clock that stands still while a command runs; its timers never fire.</summary>
    private sealed class ManualClock : TimeProvider
    {
        internal DateTimeOffset Now { get; set; } = new(2026, 6, 1, 9, 0, 0, TimeSpan.Zero);

        public override DateTimeOffset GetUtcNow()
        {
            return Now;
        }
    }
}
