using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Security.Cryptography;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary>Logs going out and coming in, past calibrations from tables, and brackets.</summary>
public sealed class LogExchangeTests : LogFolder
{
    private string Exported => Path.Combine(Folder, "out.jsonl");

    private string Other => Path.Combine(Folder, "other");

    /// <summary>The rule that the first line states, followed with nothing but a JSON reader and SHA-256.</summary>
    [Fact]
    public async Task Export_IsVerifiableAlone_ByTheRuleInItsFirstLine()
    {
        await Ok("register", "add", "CYL-4", "--kind", "cylinder", "--description", "Gemisch µ \"10 %\" \\ °C");
        await Ok("calibrations", "export", "--output", Exported);
        string[] lines = (await File.ReadAllTextAsync(Exported)).TrimEnd('\n').Split('\n');
        JsonNode head = JsonNode.Parse(lines[0])!;
        Assert.Equal("probecal-log-export", (string?)head["format"]);
        Assert.Equal(lines.Length - 1, (int)head["count"]!);
        string previous = new('0', 64);
        for (int i = 1; i < lines.Length; i++)
        {
            JsonNode line = JsonNode.Parse(lines[i])!;
            byte[] bytes = Encoding.UTF8.GetBytes((string)line["bytes"]!);
            Assert.Equal((string?)line["sha256"], Convert.ToHexStringLower(SHA256.HashData(bytes)));
            JsonNode entry = JsonNode.Parse(bytes)!;
            Assert.Equal((string?)head["logId"], (string?)entry["logId"]);
            Assert.Equal(i, (int)entry["index"]!);
            Assert.Equal(previous, (string?)entry["previousSha256"]);
            previous = (string)line["sha256"]!;
        }

        Assert.Equal(previous, (string?)head["headSha256"]);
        using JsonDocument parsed = JsonDocument.Parse(lines[0]);
        Assert.True(Schemas.Of("log-export").Evaluate(parsed.RootElement).IsValid);
        using JsonDocument second = JsonDocument.Parse(lines[1]);
        Assert.True(Schemas.Of("log-export").Evaluate(second.RootElement).IsValid);
    }

    [Fact]
    public async Task Import_KeepsIdAndChain_IsIdempotent_AndIsExtended()
    {
        await Ok("calibrations", "export", "--output", Exported);
        await At(Other, "register", "add", "B-1", "--kind", "barometer");
        Run first = await At(Other, "calibrations", "import", Exported);
        Assert.Contains("2 entries imported, 2 in all, chain whole, head " + Head, first.Output, StringComparison.Ordinal);
        Assert.Contains("nothing new; all of it was imported before", (await At(Other, "calibrations", "import", Exported)).Output, StringComparison.Ordinal);

        Run list = await At(Other, "calibrations", "list");
        Assert.Contains("imported from " + Exported + ": 2 records, chain whole", list.Output, StringComparison.Ordinal);
        Assert.Contains("imported from " + Exported, (await At(Other, "calibrations", "show", First)).Output, StringComparison.Ordinal);
        Assert.Contains(First, (await At(Other, "calibrations", "list", "--log", "8c6e44e20ee5")).Output, StringComparison.Ordinal);
        // The bytes that came in are those that went out.
        Assert.Equal((await Ok("calibrations", "show", First, "--format", "json")).Output, (await At(Other, "calibrations", "show", First, "--format", "json")).Output);
        await At(Other, "calibrations", "verify", "--log", "8c6e44e20ee5", "--head", Head);
        // And what goes out from there again is the same log.
        string again = Path.Combine(Folder, "again.jsonl");
        await At(Other, "calibrations", "export", "--log", "8c6e44e20ee5", "--output", again);
        Assert.Equal((await File.ReadAllLinesAsync(Exported)).Skip(1), (await File.ReadAllLinesAsync(again)).Skip(1));

        await Ok("register", "add", "CYL-4", "--kind", "cylinder");
        await Ok("calibrations", "export", "--output", Exported, "--force");
        Assert.Contains("1 entry imported, 3 in all", (await At(Other, "calibrations", "import", Exported)).Output, StringComparison.Ordinal);
        // A shorter one is a beginning of what is there.
        Assert.Contains("nothing new", (await At(Other, "calibrations", "import", again)).Output, StringComparison.Ordinal);
        // A local withdrawal counts for an imported record, and the imported record stays as it is.
        await At(Other, "calibrations", "withdraw", First, "--reason", "the cup was dry");
        Assert.Contains("WITHDRAWN", (await At(Other, "calibrations", "show", First)).Output, StringComparison.Ordinal);
        Assert.Contains("3 entries, chain whole", (await At(Other, "calibrations", "verify")).Output, StringComparison.Ordinal);
    }

    /// <summary>The export as it was first released must be taken for ever.</summary>
    [Fact]
    public async Task ExportOfVersion1_IsTaken()
    {
        await At(Other, "register", "add", "B-1", "--kind", "barometer");
        Run run = await At(Other, "calibrations", "import", Path.Combine(House.Repository.Root, "tests/Formats/log-export/version-1.jsonl"));
        Assert.Contains("2 entries imported, 2 in all, chain whole, head " + Head, run.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task ADivergingLog_IsRefused_AndSoIsALongerOneOfTheFolderItself()
    {
        string copy = Path.Combine(Folder, "copy");
        Directory.CreateDirectory(copy);
        File.Copy(LogFile, Path.Combine(copy, "calibrations.db"));
        await Ok("register", "add", "CYL-4", "--kind", "cylinder");
        await Ok("calibrations", "export", "--output", Exported);
        await At(Other, "register", "add", "B-1", "--kind", "barometer");
        await At(Other, "calibrations", "import", Exported);
        Assert.Contains("it is the log of this folder itself", (await Ok("calibrations", "import", Exported)).Output, StringComparison.Ordinal);
        Run longer = await RunAt(copy, "calibrations", "import", Exported);
        Assert.Equal(2, longer.ExitCode);
        Assert.Contains("it has 1 more entry than the folder's", longer.Error, StringComparison.Ordinal);

        await At(copy, "register", "add", "CYL-5", "--kind", "cylinder");
        await At(copy, "calibrations", "export", "--output", Exported, "--force");
        Run diverging = await RunAt(Other, "calibrations", "import", Exported);
        Assert.Equal(2, diverging.ExitCode);
        Assert.Contains("entry 3 of log 8c6e44e20ee5 is another here than in the file", diverging.Error, StringComparison.Ordinal);
        Assert.Contains("8c6e44e20ee5 imported from " + Exported + ": 3 entries, chain whole", Unfolded(await At(Other, "calibrations", "verify")), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("cut", "line 2: the file ends after entry 1 of the 2 that line 1 counts")]
    [InlineData("half line", "line 3: not a readable line")]
    [InlineData("edit", "line 2: record 1 was changed after it was stored")]
    [InlineData("edit and hash", "line 3: record 2 does not continue")]
    [InlineData("swap", "line 2: record 2 follows record 0")]
    [InlineData("twice", "line 4: there is an entry beyond the 2")]
    [InlineData("newer export", "line 1: version 7 of the export is newer")]
    [InlineData("newer record", "line 3: record 2: version 9 of the calibration record is newer")]
    [InlineData("head", "line 3: the last entry is not the head")]
    [InlineData("other format", "line 1: this is no exported log")]
    [InlineData("no count", "line 1: the file ends")]
    public async Task ADamagedExport_IsRefusedWithItsLine_AndNothingComesIn(string damage, string says)
    {
        await Ok("calibrations", "export", "--output", Exported);
        List<string> lines = [.. (await File.ReadAllTextAsync(Exported)).TrimEnd('\n').Split('\n')];
        switch (damage)
        {
            case "cut":
                lines.RemoveAt(2);
                break;
            case "half line":
                lines[2] = lines[2][..(lines[2].Length / 2)];
                break;
            case "edit":
                lines[1] = lines[1].Replace("P-17", "P-71", StringComparison.Ordinal);
                break;
            case "edit and hash":
                JsonNode node = JsonNode.Parse(lines[1])!;
                string edited = ((string)node["bytes"]!).Replace("P-17", "P-71", StringComparison.Ordinal);
                node["bytes"] = edited;
                node["sha256"] = Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(edited)));
                lines[1] = node.ToJsonString();
                break;
            case "swap":
                (lines[1], lines[2]) = (lines[2], lines[1]);
                break;
            case "twice":
                lines.Add(lines[2]);
                break;
            case "newer export":
                lines[0] = lines[0].Replace("\"version\":1", "\"version\":7", StringComparison.Ordinal);
                break;
            case "newer record":
                lines[2] = Reversion(lines[2]);
                break;
            case "head":
                lines[0] = lines[0].Replace("42452343", "52452343", StringComparison.Ordinal);
                break;
            case "other format":
                lines[0] = lines[0].Replace("probecal-log-export", "somebody-elses", StringComparison.Ordinal);
                break;
            case "no count":
                lines[0] = lines[0].Replace("\"count\":2", "\"count\":0", StringComparison.Ordinal);
                lines.RemoveRange(1, 2);
                lines[0] = lines[0].Replace("\"count\":0", "\"count\":4", StringComparison.Ordinal);
                break;
        }

        await File.WriteAllTextAsync(Exported, string.Join('\n', lines) + "\n");
        await At(Other, "register", "add", "B-1", "--kind", "barometer");
        Run run = await RunAt(Other, "calibrations", "import", Exported);
        Assert.True(run.ExitCode == 2, run.Error);
        Assert.Contains(says, run.ErrorLine, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', run.ErrorLine);
        Assert.DoesNotContain("imported", (await At(Other, "calibrations", "verify")).Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task AnImportedLogThatWasEdited_IsFoundOnOpening()
    {
        await Ok("calibrations", "export", "--output", Exported);
        await At(Other, "calibrations", "import", Exported);
        Raw("DROP TRIGGER imported_records_no_update; UPDATE imported_records SET bytes = CAST(replace(CAST(bytes AS TEXT), 'P-17', 'P-71') AS BLOB) WHERE idx = 1", Path.Combine(Other, "calibrations.db"));
        Run verify = await RunAt(Other, "calibrations", "verify");
        Assert.Equal(1, verify.ExitCode);
        Assert.Contains("calibration log 8c6e44e20ee5: CHAIN BROKEN: record 1 was changed", verify.Error, StringComparison.Ordinal);
        Assert.Equal(1, (await RunAt(Other, "register", "add", "B-1", "--kind", "barometer")).ExitCode);
    }

    [Fact]
    public async Task Csv_HasOneRowACalibration_AndNumbersThatReadBack()
    {
        Run run = await Ok("calibrations", "export", "--as", "csv");
        string[] lines = run.Output.TrimEnd().Split("\r\n");
        string[] names = lines[0].Split(',');
        Assert.Equal(3, lines.Length);
        Dictionary<string, string> row = names.Zip(lines[1].Split(',')).ToDictionary(static each => each.First, static each => each.Second);
        JsonNode record = JsonNode.Parse((await Ok("calibrations", "show", First, "--format", "json")).Output)!;
        Assert.Equal(First, row["id"]);
        Assert.Equal((double)record["result"]!["slope"]!, double.Parse(row["slope_per_hPa"], CultureInfo.InvariantCulture));
        Assert.Equal("pass", row["result"]);
        string documented = await File.ReadAllTextAsync(Path.Combine(House.Repository.Root, "docs/protocols.md"));
        Assert.All(names, name => Assert.Contains("`" + name + "`", documented, StringComparison.Ordinal));
    }

    [Fact]
    public async Task PastCalibrations_ComeInAsTheyStand_AndAreNeverInForce()
    {
        string table = Path.Combine(Folder, "old.csv");
        await File.WriteAllTextAsync(table, """
            # kept by hand
            Datum;Sonde;T (°C);Winkler;vorher;nachher;ok?
            2025-05-01;P-17;14,2;9,87;9,61;9,88;ja
            2025-06-01T08:30Z;P-17;18,0;;8,90;;nein
            2025-07-01 08:30;P-9;18,0;;-;;

            """);
        string[] import = ["calibrations", "import", table, "--decimal-comma", "--time-offset", "+01:00", "--column", "date=Datum", "--column", "probe=Sonde", "--column", "temperature=#3 [C]",
            "--column", "reference=Winkler [mg/L]", "--column", "before=vorher [mg/L]", "--column", "after=nachher [mg/L]", "--column", "verdict=ok?"];
        Assert.Contains("3 past calibrations imported; none is in force", (await Ok(import)).Output, StringComparison.Ordinal);
        Assert.Contains("0 past calibrations imported, 3 were there already", (await Ok(import)).Output, StringComparison.Ordinal);
        JsonNode past = JsonNode.Parse((await Ok("calibrations", "show", "8c6e44e20ee5-0003", "--format", "json")).Output)!;
        AssertValid("past-calibration", past.ToJsonString());
        Keep(past, "past-calibration");
        Assert.Equal(9.87, (double)past["referenceMilligramsPerLitre"]!);
        Assert.Equal("2025-05-01;P-17;14,2;9,87;9,61;9,88;ja", (string?)past["row"]);
        Assert.Equal(3, (int)past["line"]!);
        Assert.True((bool)past["dayOnly"]!);
        JsonNode third = JsonNode.Parse((await Ok("calibrations", "show", "8c6e44e20ee5-0005", "--format", "json")).Output)!;
        Assert.Equal("2025-07-01T07:30:00+00:00", (string?)third["at"]);
        Assert.Null(third["beforeMilligramsPerLitre"]);
        Run shown = await Ok("calibrations", "show", "8c6e44e20ee5-0003");
        Assert.Contains("never in force", shown.Output, StringComparison.Ordinal);
        Assert.Contains("as found -0.260 mg/L, from old.csv line 3", Unfolded(await Ok("calibrations", "list", "--all")), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("2025-05-01,9.8\n01.06.2025,9.9", "old.csv, line 3: date 01.06.2025: this is no time")]
    [InlineData("2025-05-01,9.8\n2025-06-01 08:00,9.9", "line 3: date 2025-06-01 08:00: it does not say its offset")]
    [InlineData("2025-05-01,9.8\n2025-06-01,\"9,9\"", "line 3: before 9,9:")]
    [InlineData("2025-05-01,9.8\n2027-06-01,9.9", "lies in the future")]
    [InlineData("2025-05-01,9.8\n,9.9", "line 3: the date is missing")]
    [InlineData("", "there is no row below the header")]
    public async Task OneWrongRow_RefusesTheTable(string rows, string says)
    {
        string table = Path.Combine(Folder, "old.csv");
        await File.WriteAllTextAsync(table, "date,before\n" + rows + "\n");
        Run run = await Run("calibrations", "import", table, "--probe", "P-17", "--column", "date=date", "--column", "before=before [mg/L]");
        Assert.Equal(2, run.ExitCode);
        Assert.Contains(says, run.ErrorLine, StringComparison.Ordinal);
        Assert.Contains("2 entries, chain whole", (await Ok("calibrations", "verify")).Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("did you mean before", "--probe", "P-1", "--column", "date=date", "--column", "befor=before [mg/L]")]
    [InlineData("there is no column", "--probe", "P-1", "--column", "date=Date")]
    [InlineData("the unit is missing", "--probe", "P-1", "--column", "date=date", "--column", "before=before")]
    [InlineData("--probe is missing", "--column", "date=date")]
    [InlineData("the date of a calibration", "--probe", "P-1", "--column", "before=before [mg/L]")]
    [InlineData("--column is missing", "--probe", "P-1")]
    public async Task AWrongMapping_IsOneLine(string says, params string[] options)
    {
        string table = Path.Combine(Folder, "old.csv");
        await File.WriteAllTextAsync(table, "date,before\n2025-05-01,9.8\n");
        Run run = await Run(["calibrations", "import", table, .. options]);
        Assert.Equal(2, run.ExitCode);
        Assert.Contains(says, run.ErrorLine, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Brackets_ListSpansWithCountAndReason()
    {
        JsonNode record = JsonNode.Parse((await Ok("calibrations", "show", First, "--format", "json")).Output)!;
        DateTimeOffset made = (DateTimeOffset)record["completedUtc"]!;
        string table = Path.Combine(Folder, "readings.csv");
        string T(double hours)
        {
            return made.AddHours(hours).UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture);
        }

        await File.WriteAllTextAsync(table, $"Time,DO\n{T(-30)},8\n{T(-29)},8\n{T(-28)},\n{T(1)},8\n");
        JsonNode json = await Json("brackets", "calibrations", "brackets", "--probe", "P-17", "--input", table, "--column", "time=Time", "--column", "concentration=DO [mg/L]");
        Assert.Equal(3, (int)json["readings"]!);
        Assert.Equal(0, (int)json["bracketed"]!);
        Assert.Equal(["no check before it", "no check after it"], json["notBracketed"]!.AsArray().Select(static each => (string?)each!["reason"]));
        Assert.Equal([2, 1], json["notBracketed"]!.AsArray().Select(static each => (int)each!["count"]!));
        Assert.Equal(T(-29), (string?)json["notBracketed"]![0]!["lastUtc"]);
        Keep(json, "brackets");
        Run text = await Ok("calibrations", "brackets", "--probe", "P-17", "--input", table, "--column", "time=Time", "--column", "concentration=DO [mg/L]");
        Assert.Contains("3 readings, 0 bracketed, 3 not", text.Output, StringComparison.Ordinal);
        Assert.Contains("did you mean P-17", (await Run("calibrations", "brackets", "--probe", "P-71")).Error, StringComparison.Ordinal);
        Assert.Contains("the journal is not there", (await Run("calibrations", "brackets", "--probe", "P-17")).Error, StringComparison.Ordinal);
    }

    private static string Reversion(string line)
    {
        JsonNode node = JsonNode.Parse(line)!;
        string edited = ((string)node["bytes"]!).Replace("\"version\": 1", "\"version\": 9", StringComparison.Ordinal);
        node["bytes"] = edited;
        node["sha256"] = Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(edited)));
        return node.ToJsonString();
    }

    private async Task<Run> At(string folder, params string[] arguments)
    {
        Run run = await RunAt(folder, arguments);
        Assert.True(run.ExitCode == 0, run.Error);
        return run;
    }
}
