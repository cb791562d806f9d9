using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Security.Cryptography;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Text.RegularExpressions;
using System.Threading.Tasks;
using ProbeCal.Host.Tests.House;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary>
/// Everything in calibration-tables is made by the command that stands beside it in the manifest: made again, it is the same to the byte. With
/// PROBECAL_UPDATE=1 files and manifest are written anew from the commands.
/// </summary>
public sealed class CalibrationTablesTests : IDisposable
{
    private const string Folder = "calibration-tables";
    private const string Into = " --output " + Folder;
    private static readonly string Tables = Path.Combine(Repository.Root, Folder);
    private static readonly string Manifest = Path.Combine(Tables, "manifest.json");
    private static readonly JsonSerializerOptions Readable = new() { WriteIndented = true, Encoder = System.Text.Encodings.Web.JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    private readonly string _made = Directory.CreateTempSubdirectory("probecal-").FullName;

    public void Dispose()
    {
        Directory.Delete(_made, recursive: true);
    }

    [Fact]
    public async Task Every_table_made_again_is_the_one_that_is_here()
    {
        JsonNode manifest = JsonNode.Parse(File.ReadAllText(Manifest))!;
        Assert.Equal("probecal-table-manifest", (string?)manifest["format"]);
        bool update = Environment.GetEnvironmentVariable("PROBECAL_UPDATE") == "1";
        JsonArray made = [];
        foreach (JsonNode? entry in manifest["tables"]!.AsArray())
        {
            string command = (string)entry!["command"]!;
            Assert.StartsWith("probecal tables ", command, StringComparison.Ordinal);
            Assert.EndsWith(Into, command, StringComparison.Ordinal);
            string folder = Path.Combine(_made, made.Count.ToString(System.Globalization.CultureInfo.InvariantCulture));
            string[] words = CommandWords.Of(command[..^Into.Length]);
            Run run = await Run.OfAsync([.. words[1..], "--output", folder]);
            Assert.True(run.ExitCode == 0, command + ": " + run.Error);
            string file = Assert.Single(Directory.GetFiles(folder));
            made.Add(Entry(Path.GetFileName(file), command, words, File.ReadAllBytes(file)));
            if (update)
            {
                File.Copy(file, Path.Combine(Tables, Path.GetFileName(file)), overwrite: true);
            }
        }

        JsonObject whole = new() { ["format"] = "probecal-table-manifest", ["version"] = 1, ["tables"] = made };
        string text = whole.ToJsonString(Readable).ReplaceLineEndings("\n") + "\n";
        if (update)
        {
            File.WriteAllText(Manifest, text);
        }

        Assert.True(text == File.ReadAllText(Manifest), "calibration-tables/manifest.json is behind the program; run this test once with PROBECAL_UPDATE=1 and look at what changes");
        foreach (JsonNode? entry in made)
        {
            string name = (string)entry!["file"]!;
            string hash = Convert.ToHexStringLower(SHA256.HashData(File.ReadAllBytes(Path.Combine(Tables, name))));
            Assert.True(hash == (string)entry["sha256"]!, "calibration-tables/" + name + " is not what its command makes; run this test once with PROBECAL_UPDATE=1");
        }
    }

    [Fact]
    public void The_folder_holds_what_the_manifest_lists_and_the_readme_names()
    {
        string[] listed = [.. JsonNode.Parse(File.ReadAllText(Manifest))!["tables"]!.AsArray().Select(static entry => (string)entry!["file"]!)];
        Assert.Equal(listed.Append("README.md").Append("manifest.json").Order(), Directory.GetFiles(Tables).Select(static file => Path.GetFileName(file)).Order());
        string readme = File.ReadAllText(Path.Combine(Tables, "README.md"));
        Assert.All(listed, file => Assert.Contains(file, readme, StringComparison.Ordinal));
    }

    private static JsonObject Entry(string file, string command, string[] words, byte[] content)
    {
        string text = Encoding.UTF8.GetString(content);
        int allowed = Array.IndexOf(words, "--error");
        return new JsonObject
        {
            ["file"] = file,
            ["command"] = command,
            ["equation"] = Said(text, "(?:[Ee]quation:? |\"equation\": \")([a-z0-9-]*[0-9]{4})"),
            ["program"] = Said(text, "(?:made by:? |\"program\": \")(probecal [0-9.]*[0-9])"),
            ["tableVersion"] = int.Parse(Said(text, "(?:probecal-table/|\"version\": )([0-9]+)"), System.Globalization.CultureInfo.InvariantCulture),
            ["sha256"] = Convert.ToHexStringLower(SHA256.HashData(content)),
            ["errorAllowed"] = allowed < 0 ? null : words[allowed + 1],
            ["largestErrorFound"] = Said(text, "[Ll]argest error found: ([0-9.E-]+ ?(?:mg/L|hPa|%)?)|\"largestFound\": \\{ \"value\": ([0-9.E-]+)").Trim(),
        };
    }

    private static string Said(string text, string pattern)
    {
        Match match = Regex.Match(text, pattern);
        Assert.True(match.Success, "no " + pattern);
        return match.Groups.Values.Skip(1).First(static group => group.Success).Value;
    }
}
