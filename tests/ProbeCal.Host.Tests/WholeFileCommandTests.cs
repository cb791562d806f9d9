using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Host.Tests.House;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>probecal equilibrium --input --output</c> as others call it.</summary>
public sealed class WholeFileCommandTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("probecal-").FullName;

    public void Dispose()
    {
        Directory.Delete(_folder, recursive: true);
    }

    /// <summary>Every row agrees with the single command, bit for bit, in other units than the canonical ones, over gases, and both ways round.</summary>
    [Theory]
    [InlineData("--gas", "O2")]
    [InlineData("--gas", "O2", "--equation", "garcia-gordon-1992", "--temperature-uncertainty", "0.1K")]
    [InlineData("--gas", "N2")]
    [InlineData("--gas", "CO2", "--mole-fraction", "425ppm")]
    public async Task EveryRow_AgreesWithTheSingleCommand_BitForBit(params string[] options)
    {
        const int Seed = 20261201;
        Random random = new(Seed);
        List<string[]> rows = [];
        for (int i = 0; i < 40; i++)
        {
            rows.Add([Text(33 + (random.NextDouble() * 48)), Text(random.NextDouble() * 30), Text(600 + (random.NextDouble() * 200)), Text(1 + (random.NextDouble() * 12))]);
        }

        string input = Write("in.csv", "T,S,P,C\n" + string.Concat(rows.Select(static row => string.Join(',', row) + "\n")));
        Run run = await Run.OfAsync(
            ["equilibrium", "--input", input, "--output", Path.Combine(_folder, "out.jsonl"), "--column", "temperature=T [F]", "--column", "salinity=S", "--column", "pressure=P [mmHg]", "--column", "concentration=C [mg/L]", .. options]);
        Assert.Equal((0, ""), (run.ExitCode, run.Output));
        string[] lines = File.ReadAllLines(Path.Combine(_folder, "out.jsonl"));
        Assert.Equal(rows.Count, lines.Length);
        for (int i = 0; i < rows.Count; i++)
        {
            JsonNode row = JsonNode.Parse(lines[i])!;
            Run single = await Run.OfAsync(
                ["equilibrium", "--temperature", rows[i][0] + "F", "--salinity", rows[i][1], "--pressure", rows[i][2] + "mmHg", "--concentration", rows[i][3] + "mg/L", "--format", "json", .. options]);
            JsonNode value = JsonNode.Parse(single.Output)!;
            Assert.Equal((double)value["mgPerL"]!, (double)row["result"]!["mgPerL"]!);
            Assert.Equal((double)value["umolPerKg"]!, (double)row["result"]!["umolPerKg"]!);
            Assert.Equal((double)value["partialPressureHPa"]!, (double)row["result"]!["partialPressureHPa"]!);
            Assert.Equal((double)value["standardUncertainty"]!["mgPerL"]!, (double)row["result"]!["mgPerLUncertainty"]!);
        }
    }

    [Fact]
    public async Task Csv_HasTheSameFigures_AndEveryRowOfJsonKeepsToItsSchema()
    {
        string input = Write("in.csv", "id;Wassertemp;DO\n1;12,5;9,8\n2;;9,8\n3;-0,1;14\n4;44;7\n\"5;1\n6;1\n");
        string[] arguments = ["equilibrium", "--input", input, "--column", "temperature=Wassertemp", "--column", "concentration=DO [mg/L]", "--salinity", "0", "--altitude", "640m", "--decimal-comma"];
        Run csv = await Run.OfAsync([.. arguments, "--output", Path.Combine(_folder, "out.csv")]);
        Run json = await Run.OfAsync([.. arguments, "--output", Path.Combine(_folder, "out.jsonl")]);
        Assert.Equal((0, 0), (csv.ExitCode, json.ExitCode));
        string[] table = File.ReadAllLines(Path.Combine(_folder, "out.csv"));
        string[] names = table[0].Split(';');
        string[] lines = File.ReadAllLines(Path.Combine(_folder, "out.jsonl"));
        Assert.Equal(6, lines.Length);
        foreach (string line in lines)
        {
            using JsonDocument document = JsonDocument.Parse(line);
            Assert.True(Schemas.Of("equilibrium-row").Evaluate(document.RootElement).IsValid, line);
        }

        Assert.Equal(["id", "Wassertemp", "DO"], names[..3]);
        Assert.Equal("status", names[^1]);
        string[] first = table[1].Split(';');
        Assert.Equal((double)JsonNode.Parse(lines[0])!["result"]!["mgPerL"]!, double.Parse(first[Array.IndexOf(names, "O2 [mg/L]")].Replace(',', '.'), CultureInfo.InvariantCulture));
        Assert.Equal("ok", first[^1]);
        Assert.StartsWith("refused: temperature missing", table[2].Split(';')[^1], StringComparison.Ordinal);
        Assert.StartsWith("flagged: temperature-just-below-range; ", table[3].Split(';', names.Length)[^1].Trim('"'), StringComparison.Ordinal);
        Assert.Contains("refused: temperature not usable; --temperature 44 °C is outside", table[4], StringComparison.Ordinal);
        Assert.Contains("a quotation mark is opened and never closed", table[5], StringComparison.Ordinal);
        Assert.Contains("6 rows: 2 computed, 1 of them flagged, 4 refused", csv.Error, StringComparison.Ordinal);
        Assert.Contains("  refused: 1 row, temperature missing", csv.Error, StringComparison.Ordinal);
        Assert.Contains("pressure source altitude", csv.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task StandardInputAndOutput_AreStreams()
    {
        byte[] input = Encoding.UTF8.GetBytes("T,P\n20,1013.25\n");
        MemoryStream output = new();
        StringWriter error = new();
        Terminal terminal = new()
        {
            Input = TextReader.Null,
            Output = TextWriter.Null,
            Error = error,
            Time = TimeProvider.System,
            Stop = CancellationToken.None,
            InputBytes = () => new MemoryStream(input),
            OutputBytes = () => output,
        };
        int code = await Program.RunAsync(["equilibrium", "--input", "-", "--output", "-", "--column", "temperature=T", "--column", "pressure=P [hPa]", "--salinity", "0"], terminal);
        Assert.Equal(0, code);
        string[] lines = Encoding.UTF8.GetString(output.ToArray()).Split('\n');
        Assert.StartsWith("T,P,O2 [mg/L],O2 u [mg/L],", lines[0], StringComparison.Ordinal);
        Assert.StartsWith("20,1013.25,9.09", lines[1], StringComparison.Ordinal);
        Assert.StartsWith("standard input: 2 columns separated by comma", error.ToString(), StringComparison.Ordinal);
    }

    /// <summary>The input is the same file by way of a folder that is a link, and --force is there: it stays as it is.</summary>
    [Fact]
    public async Task TheInput_IsNeverOverwritten_ThroughALinkedFolder()
    {
        string real = Directory.CreateDirectory(Path.Combine(_folder, "real")).FullName;
        string linked = Directory.CreateSymbolicLink(Path.Combine(_folder, "linked"), real).FullName;
        string input = Write(Path.Combine("real", "june.csv"), "T\n20\n");
        Run run = await Run.OfAsync("equilibrium", "--input", input, "--output", Path.Combine(linked, "june.csv"), "--force", "--column", "temperature=T", "--salinity", "0", "--altitude", "640m");
        Assert.Equal((2, "T\n20\n"), (run.ExitCode, File.ReadAllText(input)));
        Assert.Contains("this is the input, which is never overwritten", run.ErrorLine, StringComparison.Ordinal);
        Assert.Equal([input], Directory.GetFiles(real));
    }

    /// <summary>Another program finishes the same output first, after it was seen to be free: its file stays, and nothing is left beside it.</summary>
    [Fact]
    public async Task AnOutputThatCameMeanwhile_IsNotReplaced()
    {
        string output = Path.Combine(_folder, "out.csv");
        StringWriter error = new();
        Terminal terminal = new()
        {
            Input = TextReader.Null,
            Output = TextWriter.Null,
            Error = error,
            Time = TimeProvider.System,
            Stop = CancellationToken.None,
            InputBytes = () => new EndingStream("T\n20\n"u8.ToArray(), () => File.WriteAllText(output, "the other's\n")),
        };
        int code = await Program.RunAsync(["equilibrium", "--input", "-", "--output", output, "--column", "temperature=T", "--salinity", "0", "--altitude", "640m"], terminal);
        Assert.Equal((2, "the other's\n"), (code, File.ReadAllText(output)));
        // The header was read and the output free when the work began.
        Assert.StartsWith("standard input: 1 columns", error.ToString(), StringComparison.Ordinal);
        Assert.Contains("this file exists already", error.ToString(), StringComparison.Ordinal);
        Assert.Equal([output], Directory.GetFiles(_folder));
    }

    /// <summary>Uncertainties that lead to no number are refused row by row, and counted as what they are.</summary>
    [Fact]
    public async Task UncertaintiesTooLarge_AreCountedAsSuch()
    {
        string input = Write("in.csv", "T\n20\n21\n"), output = Path.Combine(_folder, "out.csv");
        Run run = await Run.OfAsync("equilibrium", "--input", input, "--output", output, "--column", "temperature=T", "--salinity", "0", "--altitude", "640m", "--temperature-uncertainty", "1e300K");
        Assert.Equal(0, run.ExitCode);
        Assert.EndsWith("2 rows: 0 computed, 2 refused\n  refused: 2 rows, uncertainties not usable\n", run.Error, StringComparison.Ordinal);
        Assert.Contains("refused: uncertainties not usable; the stated uncertainties are too large", File.ReadAllLines(output)[2], StringComparison.Ordinal);
    }

    /// <summary>Tables that no person made: a bounded line, whatever their size.</summary>
    [Fact]
    public async Task AMessage_IsNoLongerThanAPersonReads()
    {
        string wide = Write("wide.csv", string.Join(',', Enumerable.Range(0, 100_000).Select(static i => "c" + Text(i))) + "\n");
        string remarks = Write("remarks.csv", string.Concat(Enumerable.Repeat("#" + new string('x', 100_000) + "\n", 12)) + "T\n20\n");
        string[] rest = ["--output", Path.Combine(_folder, "out.csv"), "--salinity", "0", "--altitude", "640m", "--column"];
        Run unknown = await Run.OfAsync(["equilibrium", "--input", wide, .. rest, "temperature=c100000"]);
        Assert.Equal(2, unknown.ExitCode);
        Assert.EndsWith("c38, c39 and 99960 more", unknown.ErrorLine, StringComparison.Ordinal);
        Assert.InRange(unknown.ErrorLine.Length, 1, 1000);
        Run before = await Run.OfAsync(["equilibrium", "--input", remarks, .. rest, "temperature=T"]);
        Assert.Equal(2, before.ExitCode);
        Assert.EndsWith("more than a megabyte stands before the header; take the remarks out", before.ErrorLine, StringComparison.Ordinal);
    }

    /// <summary>What the options lack or say twice is said once, before anything is written.</summary>
    [Theory]
    [InlineData("--output is missing", "--input", "IN", "--column", "temperature=T")]
    [InlineData("--input is missing", "--output", "OUT", "--column", "temperature=T")]
    [InlineData("--column belongs to --input", "--column", "temperature=T", "--temperature", "20", "--salinity", "0", "--altitude", "1m")]
    [InlineData("--decimal-comma belongs to --input", "--decimal-comma", "--temperature", "20", "--salinity", "0", "--altitude", "1m")]
    [InlineData("--column is missing: ", "--input", "IN", "--output", "OUT")]
    [InlineData("--format plays no part", "--input", "IN", "--output", "OUT", "--column", "temperature=T", "--format", "json")]
    [InlineData("--monte-carlo plays no part", "--input", "IN", "--output", "OUT", "--column", "temperature=T", "--monte-carlo", "1000")]
    [InlineData("--pressure is missing: ", "--input", "IN", "--output", "OUT", "--column", "temperature=T", "--salinity", "0")]
    [InlineData("--salinity is missing: ", "--input", "IN", "--output", "OUT", "--column", "temperature=T", "--altitude", "640m")]
    [InlineData("--temperature and --column temperature=… say the same thing; leave one out", "--input", "IN", "--output", "OUT", "--column", "temperature=T", "--temperature", "20", "--salinity", "0", "--altitude", "640m")]
    [InlineData("--pressure and --sea-level-pressure", "--input", "IN", "--output", "OUT", "--column", "temperature=T", "--column", "sea-level-pressure=P [hPa]", "--salinity", "0", "--altitude", "640m", "--pressure", "938hPa")]
    [InlineData("--gas", "--input", "IN", "--output", "OUT", "--column", "temperature=T", "--salinity", "0", "--altitude", "640m", "--gas", "X9")]
    public async Task WrongRequest_IsOneLine_AndWritesNothing(string says, params string[] arguments)
    {
        string input = Write("in.csv", "T,P\n20,1013\n");
        string output = Path.Combine(_folder, "out.csv");
        Run run = await Run.OfAsync(["equilibrium", .. arguments.Select(each => each == "IN" ? input : each == "OUT" ? output : each)]);
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.StartsWith("probecal: " + says, run.ErrorLine, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', run.ErrorLine);
        Assert.Equal([input], Directory.GetFiles(_folder));
    }

    [Fact]
    public async Task PressureAndAltitude_MayComeFromEitherSide()
    {
        string input = Write("in.csv", "T,P,Z\n20,938,640\n20,1013,640\n");
        string[] usual = ["equilibrium", "--input", input, "--column", "temperature=T", "--salinity", "0", "--force", "--output", Path.Combine(_folder, "out.csv")];
        foreach (string[] air in new[] { new[] { "--column", "pressure=P [hPa]", "--altitude", "640m" }, ["--column", "altitude=Z [m]", "--pressure", "938hPa"], ["--column", "altitude=Z [m]", "--column", "sea-level-pressure=#2 [hPa]"] })
        {
            Run run = await Run.OfAsync([.. usual, .. air]);
            Assert.Equal(0, run.ExitCode);
        }

        Run judged = await Run.OfAsync([.. usual, "--column", "pressure=P [hPa]", "--altitude", "640m"]);
        Assert.Contains("  refused: 1 row, pressure not usable", judged.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task SampleOfTheFormat_IsWhatIsWritten()
    {
        string sample = File.ReadAllText(Path.Combine(Repository.Root, "tests/Formats/equilibrium-row/version-1.jsonl"));
        foreach (string line in sample.Split('\n', StringSplitOptions.RemoveEmptyEntries))
        {
            using JsonDocument document = JsonDocument.Parse(line);
            Assert.True(Schemas.Of("equilibrium-row").Evaluate(document.RootElement).IsValid, line);
        }

        string input = Write("in.csv", "when,Wassertemp,DO\n2026-06-01T12:00Z,18.2,9.1\n2026-06-01T12:10Z,,9.1\n");
        string output = Path.Combine(_folder, "out.jsonl");
        Run run = await Run.OfAsync("equilibrium", "--input", input, "--output", output, "--column", "temperature=Wassertemp [C]", "--column", "concentration=DO [mg/L]", "--salinity", "0", "--pressure", "938hPa");
        Assert.Equal(0, run.ExitCode);
        JsonObject[] written = [.. File.ReadAllLines(output).Select(static line => JsonNode.Parse(line)!.AsObject())];
        JsonObject[] released = [.. sample.Split('\n', StringSplitOptions.RemoveEmptyEntries).Select(static line => JsonNode.Parse(line)!.AsObject())];
        for (int i = 0; i < released.Length; i++)
        {
            Assert.Equal(released[i].Select(static field => field.Key), written[i].Select(static field => field.Key));
        }
    }

    private string Write(string name, string text)
    {
        string path = Path.Combine(_folder, name);
        File.WriteAllText(path, text);
        return path;
    }

    /// <summary>Gives its bytes in one piece, and does something when it is asked for more.</summary>
    private sealed class EndingStream(byte[] bytes, Action atEnd) : MemoryStream(bytes)
    {
        public override int Read(Span<byte> buffer)
        {
            return Told(base.Read(buffer));
        }

        public override int Read(byte[] buffer, int offset, int count)
        {
            return Told(base.Read(buffer, offset, count));
        }

        private int Told(int read)
        {
            if (read == 0) { atEnd(); }
            return read;
        }
    }

    private static string Text(double value)
    {
        return value.ToString("R", CultureInfo.InvariantCulture);
    }
}
