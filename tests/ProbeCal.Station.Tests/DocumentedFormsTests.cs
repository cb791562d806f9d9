using System;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.Json;
using System.Text.RegularExpressions;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Engine;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Sources;
using ProbeCal.Station.Tests.Engine;
using ProbeCal.Station.Tests.Storage;
using Xunit;

namespace ProbeCal.Station.Tests;

/// <summary>What docs/protocols.md promises is what the parsers take and the encoders write.</summary>
public class DocumentedFormsTests
{
    private static readonly string _text = File.ReadAllText(Repository.File("docs", "protocols.md")).ReplaceLineEndings("\n");

    [Fact]
    public void EveryTemplateOfTheDocument_IsTaken()
    {
        string[] templates = [.. Section("Line templates").Split('\n').Where(static line => line.StartsWith("    ", StringComparison.Ordinal) && line.Contains("{signal", StringComparison.Ordinal)).Select(static line => line.Trim())];
        Assert.Equal(3, templates.Length);
        foreach (string template in templates)
        {
            Assert.Equal(template, LineTemplate.Parse("--line", template).Text);
        }
    }

    [Fact]
    public void NamesOfTheGrammar_AreThoseOfTheParser()
    {
        string rule = Regex.Match(Section("Line templates"), "name +=(.*)").Groups[1].Value;
        string[] names = [.. Regex.Matches(rule, "\"([a-z]+)\"").Select(static match => match.Groups[1].Value)];
        InputException refused = Assert.Throws<InputException>(() => LineTemplate.Parse("--line", "{nothing}"));
        string said = Regex.Match(refused.Message, "the fields are (.*), and").Groups[1].Value;
        Assert.Equal(said.Split(", ").Order(), names.Order());
    }

    [Theory]
    [InlineData("{signal}{temperature}", "nothing stands between")]
    [InlineData("{temperature}", "{signal} is missing")]
    [InlineData("{signal},{signal}", "stands twice")]
    [InlineData("{signal*0}", "scale")]
    [InlineData("{signal},{pressure:furlong}", "the units are")]
    public void WhatTheGrammarForbids_IsRefused(string template, string says)
    {
        InputException refused = Assert.Throws<InputException>(() => LineTemplate.Parse("--line", template));
        Assert.Contains(says, refused.Message, StringComparison.OrdinalIgnoreCase);
    }

    [Fact]
    public void MissingValueTokens_AreThoseOfTheDocument()
    {
        string sentence = Regex.Match(Section("Line templates"), @"An empty field, and (.*?) in any case").Groups[1].Value;
        Assert.Equal(LineField.UsualMissingTokens, Regex.Matches(sentence, "`([^`]+)`").Select(static match => match.Groups[1].Value));
    }

    [Fact]
    public void UnitsOfTheTable_AreThoseOfTheParser()
    {
        (string Row, QuantityKind Kind)[] rows =
        [
            ("temperature", QuantityKind.Temperature), ("temperature difference", QuantityKind.TemperatureDifference),
            ("pressure, absolute", QuantityKind.Pressure), ("altitude", QuantityKind.Altitude), ("depth", QuantityKind.Depth), ("mass concentration", QuantityKind.MassConcentration),
            ("amount concentration", QuantityKind.AmountConcentration), ("share", QuantityKind.Percent), ("duration", QuantityKind.Duration),
            ("rate", QuantityKind.Frequency),
        ];
        foreach ((string row, QuantityKind kind) in rows)
        {
            string[] cells = [.. Section("Quantities").Split('\n').Single(line => line.StartsWith("| " + row + " |", StringComparison.Ordinal)).Split('|').Select(static cell => cell.Trim())];
            string units = Regex.Replace(cells[3], @" \(.*\)", "");
            Assert.Equal(kind.Units.Select(static unit => unit.Name), units.Split(", "));
            Assert.Equal(kind.BareUnit == null, cells[4].StartsWith("refused", StringComparison.Ordinal));
        }
    }

    [Fact]
    public void ConfigurationOfTheDocument_IsTaken()
    {
        using TemporaryFolder folder = new();
        File.WriteAllText(folder.File("ca.pem"), "");
        StationConfiguration configuration = ConfigurationFile.Parse("station.json", Encoding.UTF8.GetBytes(Example("Station configuration")), folder.Path);
        Assert.Equal(("north-pier", "do-1", 412.0), (configuration.Station, configuration.Probe, configuration.AltitudeMetres));
        Assert.Equal("broker.example", configuration.Broker?.Host);
    }

    [Fact]
    public void EveryKeyOfTheConfiguration_IsInTheDocument()
    {
        string section = Section("Station configuration");
        foreach (string key in ConfigurationKeys.Root.Concat(ConfigurationKeys.Sections.Values.SelectMany(static keys => keys)))
        {
            Assert.True(section.Contains("`" + key + "`", StringComparison.Ordinal) || section.Contains("\"" + key + "\"", StringComparison.Ordinal), key);
        }
    }

    [Fact]
    public void ReadingOfTheDocument_FitsItsSchema()
    {
        string example = Example("Topics and payloads").Replace("{ … }", """{ "value": 9.1, "standardUncertainty": 0.1, "flag": 1 }""", StringComparison.Ordinal);
        using JsonDocument reading = JsonDocument.Parse(example);
        Assert.True(Schemas.Of("reading").Evaluate(reading.RootElement).IsValid);
    }

    [Fact]
    public void TopicsOfTheDocument_AreThoseThatAreSent()
    {
        Topics topics = new("{station}", "{probe}");
        string section = Section("Topics and payloads");
        foreach ((string topic, string retained) in new[] { (topics.Reading, "no"), (topics.Event, "no"), (topics.Status, "yes"), (topics.Calibration, "yes") })
        {
            Assert.Contains("| `" + topic + "` | " + retained + " |", section, StringComparison.Ordinal);
        }
    }

    /// <summary>A section of the document, from its heading to the next.</summary>
    private static string Section(string heading)
    {
        int start = _text.IndexOf("\n## " + heading + "\n", StringComparison.Ordinal);
        Assert.True(0 <= start, heading);
        int end = _text.IndexOf("\n## ", start + 1, StringComparison.Ordinal);
        return end < 0 ? _text[start..] : _text[start..end];
    }

    /// <summary>The first JSON of a section.</summary>
    private static string Example(string heading)
    {
        return Regex.Match(Section(heading), "```json\n(.*?)```", RegexOptions.Singleline).Groups[1].Value;
    }
}
