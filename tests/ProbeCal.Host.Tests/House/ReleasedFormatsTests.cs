using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Text.RegularExpressions;
using Xunit;

namespace ProbeCal.Host.Tests.House;

/// <summary>Whatever carries a format has a sample that is kept for ever, a place in the documents and, where it is JSON, a schema.</summary>
public class ReleasedFormatsTests
{
    /// <summary>Each format that the sources name: its sample in tests/Formats and its schema in docs/schemas.</summary>
    private static readonly Dictionary<string, (string Sample, string? Schema)> _formats = new()
    {
        ["probecal-reading"] = ("reading/version-1.json", "reading"),
        ["probecal-event"] = ("event/version-1.json", "event"),
        ["probecal-status"] = ("status/version-1.json", "status"),
        ["probecal-calibration-in-use"] = ("calibration-in-use/version-1.json", "calibration-in-use"),
        ["probecal-calibration-record"] = ("calibration-record-v1.json", "calibration-record"),
        ["probecal-past-calibration"] = ("past-calibration/version-1.json", "past-calibration"),
        ["probecal-log-export"] = ("log-export/version-1.jsonl", "log-export"),
        ["probecal-brackets"] = ("brackets/version-1.json", "brackets"),
        ["probecal-register"] = ("register/version-1.json", "register"),
        ["probecal-service-list"] = ("service-list/version-1.json", "service-list"),
        ["probecal-log-verification"] = ("log-verification/version-1.json", "log-verification"),
        ["probecal-equipment"] = ("equipment/version-1.json", "equipment"),
        ["probecal-service"] = ("service/version-1.json", "service"),
        ["probecal-visit"] = ("visit/version-1.json", "visit"),
        ["probecal-revision"] = ("revision/version-1.json", "revision"),
        ["probecal-amendment"] = ("amendment/version-1.json", "amendment"),
        ["probecal-calibration-log"] = ("calibration-log-v1.db", null),
        ["probecal-calibration-list"] = ("calibration-list/version-2.json", "calibration-list"),
        // Written and read by this program alone: no schema is published.
        ["probecal-calibration-session"] = ("calibration-session-v1.json", null),
        ["probecal-station-configuration"] = ("station-configuration/version-1.json", "station-configuration"),
        ["probecal-equilibrium"] = ("equilibrium/version-2.json", "equilibrium"),
        ["probecal-table"] = ("table/version-1.json", "table"),
        ["probecal-explanation"] = ("explanation/version-1.json", "explanation"),
        ["probecal-equations"] = ("equations/version-1.json", "equations"),
        ["probecal-equilibrium-row"] = ("equilibrium-row/version-1.jsonl", "equilibrium-row"),
        ["probecal-water"] = ("water/version-1.json", "water"),
        ["probecal-total-gas"] = ("total-gas/version-1.json", "total-gas"),
        ["probecal-henry"] = ("henry/version-1.json", "henry"),
        ["probecal-characterisation"] = ("characterisation/version-1.json", "characterisation"),
        ["probecal-truth"] = ("truth/version-1.csv", null),
    };

    // Names of folders, which are no formats.
    private static readonly string[] _folders = ["probecal-data", "probecal-demo-"];

    [Fact]
    public void Every_format_has_its_sample_its_schema_and_its_place_in_the_documents()
    {
        string protocols = File.ReadAllText(Path.Combine(Repository.Root, "docs/protocols.md"));
        foreach ((string format, (string sample, string? schema)) in _formats)
        {
            Assert.True(File.Exists(Path.Combine(Repository.Root, "tests/Formats", sample)), format + ": no sample");
            if (schema is not null)
            {
                string text = File.ReadAllText(Path.Combine(Repository.Root, "docs/schemas", schema + ".schema.json"));
                Assert.Contains("\"const\": \"" + format + "\"", text, StringComparison.Ordinal);
                Assert.Contains(schema + ".schema.json", protocols, StringComparison.Ordinal);
            }
        }
    }

    [Fact]
    public void Every_format_in_the_sources_is_in_the_table()
    {
        HashSet<string> named = [];
        foreach (string path in Repository.SourceFiles("src"))
        {
            foreach (Match match in Regex.Matches(File.ReadAllText(path), "\"(?:# format: )?(probecal-[a-z-]+)(?:/1)?\""))
            {
                named.Add(match.Groups[1].Value);
            }
        }

        Assert.Equal(_formats.Keys.Order(), named.Except(_folders).Order());
    }
}
