using System;
using System.IO;
using System.Text.Json;
using ProbeCal.Host.Commands;
using ProbeCal.Host.Tests.House;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary>Outputs of commands as they were once released: whoever reads by the published form must be able to read them for ever.</summary>
public class ReleasedOutputTests
{
    [Theory]
    [InlineData("equilibrium")]
    [InlineData("calibration-list")]
    [InlineData("table")]
    [InlineData("explanation")]
    [InlineData("equations")]
    [InlineData("water")]
    [InlineData("total-gas")]
    [InlineData("henry")]
    [InlineData("characterisation")]
    public void Version1_fits_the_published_schema(string kind)
    {
        using JsonDocument released = JsonDocument.Parse(File.ReadAllText(Sample(kind, "version-1.json")));
        Assert.Equal("probecal-" + kind, released.RootElement.GetProperty("format").GetString());
        Assert.True(Schemas.Of(kind).Evaluate(released.RootElement).IsValid);
    }

    [Theory]
    [InlineData("version-2.json")]
    [InlineData("version-2-mixture.json")]
    public void Version2_of_equilibrium_fits_the_published_schema_and_nothing_may_be_added(string sample)
    {
        string text = File.ReadAllText(Sample("equilibrium", sample));
        using JsonDocument released = JsonDocument.Parse(text);
        Assert.Equal(2, released.RootElement.GetProperty("version").GetInt32());
        Assert.True(Schemas.Of("equilibrium").Evaluate(released.RootElement).IsValid);
        foreach ((string good, string bad) in new[]
        {
            ("{\"format\"", "{\"more\":1,\"format\""),
            ("\"perKelvin\"", "\"perCelsius\""),
            ("\"version\":2", "\"version\":1"),
            ("\"doi\":", "\"link\":"),
        })
        {
            Assert.Contains(good, text, StringComparison.Ordinal);
            using JsonDocument changed = JsonDocument.Parse(text.Replace(good, bad, StringComparison.Ordinal));
            Assert.False(Schemas.Of("equilibrium").Evaluate(changed.RootElement).IsValid, bad);
        }
    }

    [Theory]
    [InlineData("equilibrium", "\"version\":1", "\"version\":2")]
    [InlineData("table", "\"bilinear\"", "\"cubic\"")]
    [InlineData("explanation", "\"result\":\"sat\"", "\"result\":\"z\"")]
    [InlineData("explanation", "\"kind\":\"iterated\"", "\"kind\":\"input\"")]
    [InlineData("equations", "\"grade\":\"one place\"", "\"grade\":\"good\"")]
    [InlineData("calibration-list", "\"count\": 2", "\"count\": \"two\"")]
    [InlineData("water", "\"salinitySource\":\"conductivity\"", "\"salinitySource\":\"taste\"")]
    [InlineData("total-gas", "\"version\":1", "\"version\":2")]
    [InlineData("characterisation", "\"part\": \"zero\"", "\"part\": \"nothing\"")]
    [InlineData("characterisation", "\"standardUncertainty\":", "\"uncertainty\":")]
    [InlineData("henry", "\"form\":\"Kcc\"", "\"form\":\"Kxc\"")]
    [InlineData("henry", "\"given\":null", "\"given\":{\"form\":\"Hcp\",\"value\":1}")]
    public void Schema_refuses_what_is_something_else(string kind, string good, string bad)
    {
        string text = File.ReadAllText(Sample(kind, "version-1.json"));
        Assert.Contains(good, text, StringComparison.Ordinal);
        using JsonDocument changed = JsonDocument.Parse(text.Replace(good, bad, StringComparison.Ordinal));
        Assert.False(Schemas.Of(kind).Evaluate(changed.RootElement).IsValid);
    }

    [Fact]
    public void Truth_of_version_1_is_read()
    {
        using DemoTruth truth = new(Sample("truth", "version-1.csv"));
        Assert.Equal(9.467001982035889, truth.At(new DateTimeOffset(2026, 12, 1, 10, 9, 39, 9, TimeSpan.Zero)));
        Assert.Null(truth.At(new DateTimeOffset(2026, 12, 1, 11, 0, 0, TimeSpan.Zero)));
    }

    [Fact]
    public void Truth_of_another_version_is_refused()
    {
        string file = Path.GetTempFileName();
        try
        {
            File.WriteAllText(file, "# format: probecal-truth/2\nwhatever\n");
            using DemoTruth truth = new(file);
            WorkFailedException refused = Assert.Throws<WorkFailedException>(() => truth.At(DateTimeOffset.UnixEpoch));
            Assert.Contains("probecal-truth/2", refused.Message, StringComparison.Ordinal);
        }
        finally
        {
            File.Delete(file);
        }
    }

    private static string Sample(string kind, string name)
    {
        return Path.Combine(Repository.Root, "tests/Formats", kind, name);
    }
}
