using System;
using System.Globalization;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>probecal total-gas</c> as others call it.</summary>
public class TotalGasTests
{
    private static readonly string[] Usual = ["--pressure", "745mmHg", "--temperature", "20", "--salinity", "0"];

    /// <summary>100·780/745 = 104.698 %; a water column of 1 m at 20 °C is 73.42 mmHg (Colt 1984, from memory), so that 35 mmHg are held at 0.4767 m.</summary>
    [Fact]
    public async Task Total_GivesExcessPercentAndCompensationDepth()
    {
        JsonNode json = await JsonAsync(["--total-pressure", "780mmHg", .. Usual]);
        Assert.Equal(35 * 1013.25 / 760, (double)json["deltaPHPa"]!, 1e-9);
        Assert.Equal(104.698, (double)json["totalGasPercent"]!, 0.0005);
        Assert.Equal(35 / 73.42, (double)json["compensationDepthM"]!, 0.0001);
        Assert.Null(json["oxygenHPa"]);
        Assert.Contains("gas bubble disease", (string?)json["caution"], StringComparison.Ordinal);
        Assert.Contains("common practice", (string?)json["caution"], StringComparison.Ordinal);
    }

    [Fact]
    public async Task Excess_SaysTheSameAsTheTotal()
    {
        JsonNode total = await JsonAsync(["--total-pressure", "780mmHg", .. Usual]);
        JsonNode delta = await JsonAsync(["--delta-p", "35mmHg", .. Usual]);
        foreach (string key in new[] { "totalPressureHPa", "deltaPHPa", "totalGasPercent", "compensationDepthM" })
        {
            Assert.Equal((double)total[key]!, (double)delta[key]!, 1e-9);
        }

        Assert.Equal(("total-pressure", "delta-p"), ((string?)total["measured"], (string?)delta["measured"]));
    }

    /// <summary>
    /// Water in equilibrium with air has no excess, 100 % of oxygen and, with the carbon dioxide and the rare gases counted in, 100.05 % of nitrogen and argon
    /// (1 − 0.20946 of dry air against 0.79018).
    /// </summary>
    [Theory]
    [InlineData("5", "0", "1013.25hPa")]
    [InlineData("18.5", "12", "938hPa")]
    [InlineData("30", "35", "990hPa")]
    public async Task WaterInEquilibrium_IsAllHundredPercent(string temperature, string salinity, string pressure)
    {
        Run equilibrium = await Run.OfAsync("equilibrium", "--temperature", temperature, "--salinity", salinity, "--pressure", pressure, "--format", "json");
        double milligrams = (double)JsonNode.Parse(equilibrium.Output)!["mgPerL"]!;
        JsonNode json = await JsonAsync(
            ["--delta-p", "0hPa", "--pressure", pressure, "--temperature", temperature, "--salinity", salinity, "--concentration", milligrams.ToString("R", CultureInfo.InvariantCulture) + "mg/L"]);
        Assert.Equal(100, (double)json["totalGasPercent"]!, 1e-9);
        Assert.Equal(100, (double)json["oxygenPercent"]!, 1e-6);
        // Within 0.02 %: vapour over salt water here, over fresh water in the oxygen's saturation.
        Assert.Equal(100 * (1 - 0.20946) / 0.79018, (double)json["nitrogenArgonPercent"]!, 0.05);
        Assert.Equal(0, (double)json["compensationDepthM"]!, 1e-9);
        Assert.Null(json["caution"]);
    }

    [Fact]
    public async Task Parts_AddUpToTheTotal()
    {
        string[] arguments = ["--total-pressure", "1058hPa", .. Usual, "--concentration", "11.2mg/L", "--depth", "1.5m"];
        JsonNode neglected = await JsonAsync(arguments);
        JsonNode given = await JsonAsync([.. arguments, "--carbon-dioxide", "5hPa"]);
        Assert.Equal(1058, Sum(neglected), 1e-9);
        Assert.Equal(1058, Sum(given) + 5, 1e-9);
        Assert.Equal((double)neglected["nitrogenArgonHPa"]! - 5, (double)given["nitrogenArgonHPa"]!, 1e-9);
        Assert.Null(neglected["carbonDioxideHPa"]);
        // 1.5 m of fresh water at 20 °C weigh 1.5·73.42 mmHg (Colt 1984, from memory).
        Assert.Equal((double)given["deltaPHPa"]! - (1.5 * 73.42 * 1013.25 / 760), (double)given["deltaPAtDepthHPa"]!, 0.02);
        Run text = await Run.OfAsync(["total-gas", .. arguments]);
        Assert.Contains("carbon dioxide     neglected", text.Output, StringComparison.Ordinal);
    }

    /// <summary>
    /// A total of 2 hPa and a barometer of 1 hPa make ΔP uncertain by √5 hPa where the total was measured; the 1 hPa alone does not touch a measured ΔP of 2 hPa.
    /// </summary>
    [Fact]
    public async Task Uncertainty_KnowsWhichOfTheTwoWasMeasured()
    {
        string[] sure = ["--total-pressure-uncertainty", "2hPa", "--pressure-uncertainty", "1hPa"];
        JsonNode total = (await JsonAsync(["--total-pressure", "780mmHg", .. Usual, .. sure]))["standardUncertainty"]!;
        JsonNode delta = (await JsonAsync(["--delta-p", "35mmHg", .. Usual, .. sure]))["standardUncertainty"]!;
        Assert.Equal(Math.Sqrt(5), (double)total["deltaPHPa"]!, 1e-12);
        Assert.Equal(2, (double)total["totalPressureHPa"]!, 1e-12);
        Assert.Equal(2, (double)delta["deltaPHPa"]!, 1e-12);
        Assert.Equal(Math.Sqrt(5), (double)delta["totalPressureHPa"]!, 1e-12);
        // % = 100·T/BP: 100/BP·√(2² + (T/BP)²).
        Assert.Equal(100 / (745 * 1013.25 / 760) * Math.Sqrt(4 + Math.Pow(780.0 / 745, 2)), (double)total["totalGasPercent"]!, 1e-9);
    }

    [Fact]
    public async Task SeaLevelPressure_IsMarkedAsSecondBest()
    {
        string[] arguments = ["--total-pressure", "960hPa", "--sea-level-pressure", "1021hPa", "--altitude", "640m", "--air-temperature", "12C", "--temperature", "9", "--salinity", "0"];
        JsonNode json = await JsonAsync(arguments);
        Assert.Equal("sea-level", (string?)json["pressureSource"]);
        Assert.Equal(3.02, (double)json["standardUncertainty"]!["deltaPHPa"]!, 0.01);
        Assert.Contains("recovered from one reduced to sea level: second best", (await Run.OfAsync(["total-gas", .. arguments])).Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--total-pressure", "1058hPa", "--concentration", "11.2mg/L", "--concentration-uncertainty", "0.1mg/L", "--depth", "2m", "--carbon-dioxide", "4hPa")]
    [InlineData("--total-pressure", "1058hPa")]
    [InlineData("--delta-p", "-20hPa", "--concentration", "200umol/kg")]
    public async Task Json_KeepsToItsSchema_AndTextFitsATerminal(params string[] arguments)
    {
        Run json = await Run.OfAsync(["total-gas", .. arguments, .. Usual, "--format", "json"]);
        Assert.Equal((0, ""), (json.ExitCode, json.Error));
        using JsonDocument document = JsonDocument.Parse(json.Output);
        Assert.True(Schemas.Of("total-gas").Evaluate(document.RootElement).IsValid, json.Output);
        Run text = await Run.OfAsync(["total-gas", .. arguments, .. Usual]);
        Assert.Equal((0, ""), (text.ExitCode, text.Error));
        Assert.All(text.Output.Split('\n'), static line => Assert.True(line.Length <= 110, line));
        Assert.DoesNotContain("NaN", text.Output + json.Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--total-pressure is missing: ", "--pressure", "745mmHg", "--temperature", "20", "--salinity", "0")]
    [InlineData("--total-pressure and --delta-p say the same thing in two ways; give one of them", "--total-pressure", "780mmHg", "--delta-p", "35mmHg", "--pressure", "745mmHg", "--temperature", "20", "--salinity", "0")]
    [InlineData("--temperature is missing: ", "--delta-p", "35mmHg", "--pressure", "745mmHg", "--salinity", "0")]
    [InlineData("--salinity is missing: ", "--delta-p", "35mmHg", "--pressure", "745mmHg", "--temperature", "20")]
    [InlineData("--pressure is missing: ", "--delta-p", "35mmHg", "--temperature", "20", "--salinity", "0")]
    [InlineData("--delta-p 35: a pressure carries its unit", "--delta-p", "35", "--pressure", "745mmHg", "--temperature", "20", "--salinity", "0")]
    [InlineData("a total pressure of 15.0 hPa is no more than the vapour's 23.4 hPa", "--total-pressure", "15hPa", "--pressure", "745mmHg", "--temperature", "20", "--salinity", "0")]
    [InlineData("--concentration 45mg/L is a partial pressure of", "--delta-p", "0hPa", "--pressure", "745mmHg", "--temperature", "20", "--salinity", "0", "--concentration", "45mg/L")]
    [InlineData("--carbon-dioxide plays its part where the total is split", "--delta-p", "0hPa", "--pressure", "745mmHg", "--temperature", "20", "--salinity", "0", "--carbon-dioxide", "5hPa")]
    [InlineData("--temperature 45 °C: total gas is computed from 0 to 40 °C", "--delta-p", "0hPa", "--pressure", "745mmHg", "--temperature", "45", "--salinity", "0")]
    [InlineData("--salinity 45: total gas is computed from 0 to 40", "--delta-p", "0hPa", "--pressure", "745mmHg", "--temperature", "20", "--salinity", "45")]
    [InlineData("the pressure of the air of 300 hPa is outside what is computed", "--delta-p", "0hPa", "--pressure", "300hPa", "--temperature", "20", "--salinity", "0", "--concentration", "3mg/L")]
    [InlineData("--depth 2000m: the pressure of the water is computed from 0 to 1000 m", "--delta-p", "0hPa", "--pressure", "745mmHg", "--temperature", "20", "--salinity", "0", "--depth", "2000m")]
    [InlineData("the stated uncertainties are too large to be worked with", "--delta-p", "0hPa", "--pressure", "745mmHg", "--temperature", "20", "--salinity", "0", "--total-pressure-uncertainty", "1e300hPa")]
    [InlineData("--depth 2: a depth carries its unit", "--delta-p", "0hPa", "--pressure", "745mmHg", "--temperature", "20", "--salinity", "0", "--depth", "2")]
    public async Task WrongInput_IsOneLine(string says, params string[] arguments)
    {
        Run run = await Run.OfAsync(["total-gas", .. arguments]);
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.StartsWith("probecal: " + says, run.ErrorLine, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', run.ErrorLine);
    }

    private static double Sum(JsonNode json)
    {
        return (double)json["oxygenHPa"]! + (double)json["nitrogenArgonHPa"]! + (double)json["vapourPressureHPa"]!;
    }

    private static async Task<JsonNode> JsonAsync(string[] arguments)
    {
        Run run = await Run.OfAsync(["total-gas", .. arguments, "--format", "json"]);
        Assert.Equal((0, ""), (run.ExitCode, run.Error));
        return JsonNode.Parse(run.Output)!;
    }
}
