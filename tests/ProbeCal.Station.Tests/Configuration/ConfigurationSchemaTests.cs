using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using Json.Schema;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Configuration;

/// <summary>The published schema and the reader say the same.</summary>
public class ConfigurationSchemaTests
{
    private static readonly string _schemaFile = Repository.File("docs", "schemas", "station-configuration.schema.json");
    private static readonly JsonSchema _schema = JsonSchema.FromFile(_schemaFile);
    private static readonly JsonDocumentOptions _lenient = new() { CommentHandling = JsonCommentHandling.Skip };

    public static TheoryData<string> WrongOnes()
    {
        return
        [
            "/station=", "/station=\"a b\"", "/probe=", "/source=", "/pressure=", "/salinity=", "/stirring=", "/stirring=\"often\"",
            "/version=2", "/format=\"other\"", "/equation=\"henry\"", "/embeddedBroker={}", "/unknown=1", "/site/unknown=1", "/pressure/source=",
            "/broker/address=", "/broker/address=\"broker.example\"", "/broker/address=\"mqtt://u:p@b\"", "/broker/passwordEnvironment=\"E\"", "/broker/user=",
            "/journal/rejectedLines=-1", "/simulated=\"no\"", "/site=\"here\"", "/thermometer/standardUncertainty=0.03", "/gapAfter=\" \"",
        ];
    }

    [Fact]
    public void Keys_AreTheSameInBoth()
    {
        JsonNode properties = JsonNode.Parse(File.ReadAllText(_schemaFile))!["properties"]!;
        Assert.Equal(ConfigurationKeys.Root.Order(), Names(properties));
        foreach ((string section, string[] keys) in ConfigurationKeys.Sections)
        {
            Assert.Equal(keys.Order(), Names(properties[section]!["properties"]!));
        }
    }

    [Fact]
    public void ReleasedVersion1_FitsTheSchema()
    {
        Assert.True(Fits(Released()));
    }

    [Theory]
    [MemberData(nameof(WrongOnes))]
    public void WrongConfiguration_IsRefusedByBoth(string change)
    {
        JsonNode changed = Changed(Released(), change);
        Assert.False(Fits(changed));
        Assert.Throws<InputException>(() => ConfigurationFile.Parse("c", Encoding.UTF8.GetBytes(changed.ToJsonString()), "."));
    }

    private static IEnumerable<string> Names(JsonNode properties)
    {
        return properties.AsObject().Select(property => property.Key).Order();
    }

    private static bool Fits(JsonNode configuration)
    {
        return _schema.Evaluate(JsonSerializer.SerializeToElement(configuration)).IsValid;
    }

    private static JsonNode Released()
    {
        return JsonNode.Parse(File.ReadAllText(Repository.File("tests", "Formats", "station-configuration", "version-1.json")), documentOptions: _lenient)!;
    }

    /// <summary>Sets the member at a path to a value, or takes it out when there is none.</summary>
    private static JsonNode Changed(JsonNode root, string change)
    {
        int equals = change.IndexOf('=', StringComparison.Ordinal);
        string[] path = change[1..equals].Split('/');
        JsonObject parent = path[..^1].Aggregate(root, (node, name) => node[name]!).AsObject();
        if (equals + 1 == change.Length)
        {
            Assert.True(parent.Remove(path[^1]));
        }
        else
        {
            parent[path[^1]] = JsonNode.Parse(change[(equals + 1)..]);
        }

        return root;
    }
}
