using System;
using System.IO;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading.Tasks;
using Microsoft.Data.Sqlite;
using ProbeCal.Host.Tests.House;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary>A data folder with the log that version 1 left behind: probes P-17 and M-3; and the commands run on it.</summary>
public abstract class LogFolder : IDisposable
{
    internal const string First = "8c6e44e20ee5-0001";
    internal const string Head = "2:42452343d8b8997287ec3c3e138ad7af24229e7d663950528d9511748961ba6d";
    private protected string Folder { get; } = Directory.CreateTempSubdirectory("probecal-log-").FullName;
    private protected Clock Time { get; } = new();

    private protected LogFolder()
    {
        File.Copy(Path.Combine(Repository.Root, "tests/Formats/calibration-log-v1.db"), LogFile);
    }

    private protected string LogFile => Path.Combine(Folder, "calibrations.db");

    public void Dispose()
    {
        Directory.Delete(Folder, recursive: true);
        GC.SuppressFinalize(this);
    }

    private protected void Raw(string sql, string? file = null)
    {
        using SqliteConnection raw = new($"Data Source={file ?? LogFile};Pooling=False");
        raw.Open();
        using SqliteCommand command = raw.CreateCommand();
        command.CommandText = sql;
        command.ExecuteNonQuery();
    }

    private protected async Task<Run> Ok(params string[] arguments)
    {
        Run run = await Run(arguments);
        Assert.True(run.ExitCode == 0, run.Error);
        return run;
    }

    private protected async Task<JsonNode> Json(string schema, params string[] arguments)
    {
        Run run = await Ok([.. arguments, "--format", "json"]);
        AssertValid(schema, run.Output);
        return JsonNode.Parse(run.Output)!;
    }

    private protected static void AssertValid(string schema, string output)
    {
        using JsonDocument parsed = JsonDocument.Parse(output);
        Assert.True(Schemas.Of(schema).Evaluate(parsed.RootElement).IsValid, output);
    }

    /// <summary>A sample of a new format is written once, on request; from then on it must fit the schema for ever.</summary>
    private protected static void Keep(JsonNode json, string kind, int version = 1)
    {
        string sample = Path.Combine(Repository.Root, "tests/Formats", kind, $"version-{version}.json");
        if (Environment.GetEnvironmentVariable("PROBECAL_UPDATE") == "1" && !File.Exists(sample))
        {
            Directory.CreateDirectory(Path.GetDirectoryName(sample)!);
            File.WriteAllText(sample, json.ToJsonString(new JsonSerializerOptions { WriteIndented = true }) + "\n");
        }

        AssertValid(kind, File.ReadAllText(sample));
    }

    private protected static string Unfolded(Run run)
    {
        return string.Join(' ', run.Output.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries));
    }

    private protected Task<Run> Run(params string[] arguments)
    {
        return RunAt(Folder, arguments);
    }

    private protected async Task<Run> RunAt(string folder, params string[] arguments)
    {
        StringWriter output = new();
        StringWriter error = new();
        Terminal terminal = new() { Input = TextReader.Null, Output = output, Error = error, Time = Time };
        int code = await Program.RunAsync([.. arguments, "--data", folder], terminal);
        return new Run(code, output.ToString(), error.ToString());
    }

    private protected sealed class Clock : TimeProvider
    {
        internal DateTimeOffset Now { get; set; } = new(2026, 12, 1, 12, 0, 0, TimeSpan.Zero);

        public override DateTimeOffset GetUtcNow()
        {
            return Now;
        }
    }
}
