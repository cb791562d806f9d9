using System.IO;
using System.Text.Json;
using Xunit;

namespace ProbeCal.Station.Tests.Engine;

/// <summary>Payloads as they were once released: whoever reads by the published schema must be able to read them for ever.</summary>
public class ReleasedPayloadTests
{
    [Theory]
    [InlineData("reading")]
    [InlineData("event")]
    [InlineData("status")]
    [InlineData("calibration-in-use")]
    public void Version1_FitsThePublishedSchema(string kind)
    {
        using JsonDocument released = JsonDocument.Parse(File.ReadAllText(Repository.File("tests", "Formats", kind, "version-1.json")));
        Assert.Equal("probecal-" + kind, released.RootElement.GetProperty("format").GetString());
        Assert.Equal(1, released.RootElement.GetProperty("version").GetInt32());
        Assert.True(Schemas.Of(kind).Evaluate(released.RootElement).IsValid);
    }
}
