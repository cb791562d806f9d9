using System;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.Json;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Sources;
using ProbeCal.Station.Tests.Storage;
using Xunit;

namespace ProbeCal.Station.Tests.Configuration;

public class ConfigurationFileTests
{
    private const string Least = """
        {
          "format": "probecal-station-configuration",
          "version": 1,
          "station": "pier",
          "probe": "do-1",
          "source": "stdin",
          "pressure": { "source": "line" },
          "salinity": { "source": "tap water", "value": "0.2" },
          "stirring": "stirred"
        }
        """;

    [Fact]
    public void ReleasedVersion1_IsReadInFull()
    {
        StationConfiguration read = ConfigurationFile.Read(Repository.File("tests", "Formats", "station-configuration", "version-1.json"));

        Assert.Equal(("north-pier", "North pier, invented", 412.0, "do-1"), (read.Station, read.SiteName, read.AltitudeMetres, read.Probe));
        Assert.Equal(19200, Assert.IsType<SerialAddress>(read.Source).Baud);
        Assert.Equal("nA", read.Line.SignalUnit);
        Assert.False(read.Simulated);
        Assert.Equal(0.05, read.SignalUncertainty);
        Assert.Equal(new ThermometerConfiguration("T-3", 0.03, 0.1), read.Thermometer);
        Assert.Equal(new InputConfiguration(true, null, "line:B-12", 0.8), read.Pressure);
        Assert.Equal(new InputConfiguration(false, 0.2, "conductivity survey of May", 0.1), read.Salinity);
        Assert.Equal(Stirring.Stirred, read.Stirring);
        Assert.Equal(new CalibrationChoice(false, null), read.Calibration);
        Assert.Equal(SolubilityEquation.BensonKrause1984, read.Equation);
        Assert.Equal(
            new BrokerConfiguration
            {
                Host = "broker.example",
                Port = 8883,
                UseTls = true,
                User = "north-pier",
                PasswordFile = Repository.File("tests", "Formats", "station-configuration", "broker-password"),
                CheckRevocation = false,
            },
            read.Broker);
        Assert.Equal(TimeSpan.FromDays(400), read.KeepFor);
        Assert.Equal(10_000, read.RejectedLinesKept);
        Assert.Equal(TimeSpan.FromMinutes(5), read.GapAfter);
    }

    [Fact]
    public void LeastConfiguration_TakesTheDefaults()
    {
        StationConfiguration read = Parse(Least);
        Assert.Null(read.Broker);
        Assert.Equal(1883, read.EmbeddedBrokerPort);
        Assert.Equal(LineTemplate.UsualText, read.Line.Text);
        Assert.Equal(new ThermometerConfiguration(null, UncertaintyDefaults.TemperatureKelvin, UncertaintyDefaults.ThermometerOffsetKelvin), read.Thermometer);
        Assert.Equal(UncertaintyDefaults.BarometerHectopascal, read.Pressure.StandardUncertainty);
        Assert.Equal(UncertaintyDefaults.Salinity, read.Salinity.StandardUncertainty);
        Assert.Null(read.GapAfter);
    }

    [Fact]
    public void PressureFromTheAltitude_IsTheStandardAtmosphere_AndKnownToTenHectopascalAtBest()
    {
        StationConfiguration read = Parse(With("\"line\": \"{signal},{temperature}\", \"site\": { \"altitude\": \"1000 m\" }, \"pressure\": { \"source\": \"altitude\" }"));
        // 898.76 hPa at 1000 m geometric: U.S. Standard Atmosphere 1976, table I (from memory), to its printed digits.
        Assert.Equal(898.76, read.Pressure.Value!.Value, 5e-3);
        Assert.Equal(10, read.Pressure.StandardUncertainty);
    }

    [Theory]
    [InlineData("\"salinty\": {}", "line 10 column 23", "there is no key salinty (did you mean salinity?)")]
    [InlineData("\"salinity\": { \"source\": \"x\", \"vlaue\": \"1\" }", "salinity.vlaue", "did you mean value?")]
    [InlineData("\"probe\": \"do/1\"", "probe do/1", "it becomes part of a topic")]
    [InlineData("\"probe\": 7", "probe 7", "a text in double quotes")]
    [InlineData("\"station\": \"  \"", "station", "the text is empty")]
    [InlineData("\"stirring\": \"stired\"", "stirring stired", "did you mean stirred?")]
    [InlineData("\"source\": \"serial\"", "source serial", "the port is missing")]
    [InlineData("\"line\": \"{signal\"", "line", "{signal")]
    [InlineData("\"equation\": \"henry\"", "equation", "benson-krause-1984")]
    [InlineData("\"salinity\": { \"source\": \"x\", \"value\": \"3,5\" }", "salinity.value 3,5", "a comma is no decimal mark")]
    [InlineData("\"salinity\": { \"source\": \"x\", \"value\": \"NaN\" }", "salinity.value NaN", "finite")]
    [InlineData("\"salinity\": { \"source\": \"x\", \"value\": \"-1\" }", "salinity.value -1", "between 0 and 42")]
    [InlineData("\"salinity\": { \"source\": \"x\" }", "salinity.value is missing", "write for example")]
    [InlineData("\"salinity\": { \"source\": \"none\", \"value\": \"1\" }", "salinity.value", "no value belongs here")]
    [InlineData("\"salinity\": { \"source\": \"line\" }", "salinity.source", "the line template has no {salinity}")]
    [InlineData("\"salinity\": { \"source\": \"x\", \"value\": \"1\", \"standardUncertainty\": \"-0.1\" }", "standardUncertainty", "not negative")]
    [InlineData("\"pressure\": { \"source\": \"barometer:B-1\", \"value\": \"1000 hPa\" }", "pressure.source", "the line carries {pressure} too")]
    [InlineData("\"line\": \"{signal},{temperature}\", \"pressure\": { \"source\": \"barometer:B-1\", \"value\": 1000 }", "pressure.value 1000", "carries its unit")]
    [InlineData("\"line\": \"{signal},{temperature}\", \"pressure\": { \"source\": \"barometer:B-1\", \"value\": \"1000 hPas\" }", "pressure.value", "did you mean hPa?")]
    [InlineData("\"line\": \"{signal},{temperature}\", \"pressure\": { \"source\": \"barometer\", \"value\": \"1000 hPa\" }", "pressure.source", "a barometer has an id")]
    [InlineData("\"line\": \"{signal},{temperature}\", \"pressure\": { \"source\": \"guess\", \"value\": \"1000 hPa\" }", "pressure.source guess", "no such source")]
    [InlineData("\"line\": \"{signal},{temperature}\", \"site\": { \"altitude\": \"1500 m\" }, \"pressure\": { \"source\": \"weather-service:X\", \"value\": \"1013 hPa\" }", "pressure.value 1013 hPa", "impossible at 1500 m")]
    [InlineData("\"line\": \"{signal},{temperature}\", \"pressure\": { \"source\": \"barometer:B-1\", \"value\": \"1013 kPa\" }", "pressure.value 1013 kPa", "check the unit")]
    [InlineData("\"line\": \"{signal},{temperature}\", \"pressure\": { \"source\": \"altitude\" }", "pressure.source", "site.altitude is missing")]
    [InlineData("\"line\": \"{signal},{temperature}\", \"site\": { \"altitude\": \"9 m\" }, \"pressure\": { \"source\": \"altitude\", \"standardUncertainty\": \"2 hPa\" }", "standardUncertainty 2 hPa", "10 hPa")]
    [InlineData("\"site\": { \"altitude\": \"412\" }", "site.altitude 412", "carries its unit")]
    [InlineData("\"broker\": { \"address\": \"broker.example\" }", "broker.address", "mqtt://HOST:1883")]
    [InlineData("\"broker\": { \"address\": \"mqtt://b\", \"user\": \"u\", \"passwordFile\": \"f\", \"passwordEnvironment\": \"E\" }", "broker.passwordFile", "another place already")]
    [InlineData("\"broker\": { \"address\": \"mqtt://b\", \"passwordFile\": \"f\" }", "broker.passwordFile", "needs a user")]
    [InlineData("\"broker\": { \"address\": \"mqtt://b\", \"caFile\": \"f\" }", "broker.caFile", "mqtts://")]
    [InlineData("\"broker\": { \"address\": \"mqtts://b\", \"caFile\": \"absent.pem\" }", "broker.caFile absent.pem", "no such file")]
    [InlineData("\"broker\": { \"address\": \"mqtt://b\" }, \"embeddedBroker\": {}", "embeddedBroker", "leave one of the two out")]
    [InlineData("\"embeddedBroker\": { \"port\": 70000 }", "embeddedBroker.port 70000", "from 1 to 65535")]
    [InlineData("\"embeddedBroker\": { \"port\": \"1883\" }", "embeddedBroker.port", "without quotes")]
    [InlineData("\"embeddedBroker\": 1883", "embeddedBroker", "an object { }")]
    [InlineData("\"journal\": { \"keep\": \"400\" }", "journal.keep 400", "carries its unit")]
    [InlineData("\"simulated\": \"yes\"", "simulated yes", "true or false")]
    [InlineData("\"thermometer\": { \"standardUncertainty\": \"0.03\" }", "thermometer.standardUncertainty", "carries its unit")]
    [InlineData("\"version\": 2", "version 2", "use the newer program")]
    [InlineData("\"format\": \"something-else\"", "format something-else", "this is no station configuration")]
    [InlineData("\"gapAfter\": []", "gapAfter", "no list")]
    public void WrongValue_IsRefusedInOneLine_WithPlaceAndRemedy(string members, string named, string remedy)
    {
        string message = Refusal(With(members));
        Assert.StartsWith("station.json line ", message);
        Assert.Contains(named, message);
        Assert.Contains(remedy, message);
        Assert.DoesNotContain('\n', message);
    }

    [Fact]
    public void PasswordInTheAddress_IsRefused_AndNotRepeated()
    {
        string message = Refusal(With("\"broker\": { \"address\": \"mqtt://u:hunter2@b:1883\" }"));
        Assert.Contains("do not belong in the address", message);
        Assert.DoesNotContain("hunter2", message);
    }

    [Theory]
    [InlineData("", "column 1", "no JSON")]
    [InlineData("[]", "line 1 column 1", "it begins with {")]
    [InlineData("{\n  \"format\": }", "line 2 column 13", "no JSON")]
    [InlineData("{ \"format\": \"a\", \"format\": \"b\" }", "line 1 column 18", "for the second time")]
    [InlineData("{ \"format\": \"a\" } {}", "line 1", "JSON")]
    [InlineData("{ \"format\": \"probecal-station-configuration\" ", "line 1", "no JSON")]
    [InlineData("{}", "line 1 column 1", "format is missing")]
    [InlineData("{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{\"a\":{}}}}}}}}}}", "line 1", "no JSON")]
    public void DamagedFile_IsRefusedInOneLine_WithItsPlace(string text, string place, string problem)
    {
        string message = Refusal(text);
        Assert.Contains(place, message);
        Assert.Contains(problem, message);
        Assert.DoesNotContain('\n', message);
    }

    [Fact]
    public void TextThatIsNotUtf8_IsRefused()
    {
        byte[] bytes = Encoding.Latin1.GetBytes(Least.Replace("tap water", "sj\u00f8vann", StringComparison.Ordinal));
        InputException refused = Assert.Throws<InputException>(() => ConfigurationFile.Parse("station.json", bytes, "."));
        Assert.Contains("UTF-8", refused.Message);
    }

    [Fact]
    public void ByteOrderMark_Comments_AndTrailingCommas_AreTaken()
    {
        string text = Least.Replace("\"version\": 1,", "\"version\": 1, // the first\n /* and only */", StringComparison.Ordinal)
            .Replace("\"stirred\"", "\"stirred\",", StringComparison.Ordinal);
        byte[] bytes = [.. Encoding.UTF8.Preamble, .. Encoding.UTF8.GetBytes(text)];
        Assert.Equal("pier", ConfigurationFile.Parse("station.json", bytes, ".").Station);
    }

    [Fact]
    public void FileThatIsNotThere_IsRefused()
    {
        using TemporaryFolder folder = new();
        InputException refused = Assert.Throws<InputException>(() => ConfigurationFile.Read(folder.File("absent.json")));
        Assert.Contains("absent.json", refused.Message);
    }

    [Fact]
    public void FileThatIsFarTooLong_IsRefusedUnread()
    {
        using TemporaryFolder folder = new();
        File.WriteAllText(folder.File("long.json"), new string(' ', 1_000_001));
        InputException refused = Assert.Throws<InputException>(() => ConfigurationFile.Read(folder.File("long.json")));
        Assert.Contains("too long", refused.Message);
    }

    /// <summary>The least configuration with members put in its place (their line left empty) or added, on line 10.</summary>
    private static string With(string members)
    {
        using JsonDocument given = JsonDocument.Parse("{" + members + "}");
        StringBuilder text = new();
        foreach (string line in Least.Split('\n')[..^1])
        {
            bool replaced = given.RootElement.EnumerateObject().Any(member => line.StartsWith("  \"" + member.Name + "\":", StringComparison.Ordinal));
            text.Append(replaced ? "" : line.EndsWith("\"stirred\"", StringComparison.Ordinal) ? line + "," : line).Append('\n');
        }

        return text.Append("           ").Append(members).Append("\n}\n").ToString();
    }

    private static StationConfiguration Parse(string text)
    {
        return ConfigurationFile.Parse("station.json", Encoding.UTF8.GetBytes(text), ".");
    }

    private static string Refusal(string text)
    {
        return Assert.Throws<InputException>(() => Parse(text)).Message;
    }
}
