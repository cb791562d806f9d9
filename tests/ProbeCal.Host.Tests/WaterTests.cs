using System;
using System.Linq;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>probecal water</c> as others call it.</summary>
public class WaterTests
{
    /// <summary>
    /// 1024.763 kg/m³ at S 35 and 20 °C: the international equation of state 1980 as oceanographic tables print it (from memory); −1.922 °C the freezing point of S 35 (UNESCO
    /// Technical Papers in Marine Science 44, from memory); 23.393 hPa over pure water at 20 °C (steam tables, 2.3393 kPa, from memory).
    /// </summary>
    [Fact]
    public async Task SeaWater_IsWhatTheTablesSay()
    {
        JsonNode json = await JsonAsync("--temperature", "20", "--salinity", "35");
        Assert.Equal(1024.763, (double)json["densityKgPerM3"]!, 0.002);
        Assert.Equal(-1.922, (double)json["freezingPointC"]!, 0.0005);
        Assert.Equal(23.393, Form(json, "wagner-pruss-1993")["freshHPa"]!.GetValue<double>(), 0.003);
        Assert.Equal("dickson-2007", (string?)json["vapourEquation"]);
        // Sea salt of S 35 takes 1.87 % off the vapour (Dickson 2007) or 1.89 % (Weiss and Price 1980); both second-hand.
        Assert.Equal(1.87, Lowered(json, "dickson-2007"), 0.005);
        Assert.Equal(1.89, Lowered(json, "weiss-price-1980"), 0.005);
    }

    /// <summary>By its definition sea water of S 35 has 42.914 mS/cm at 15 °C (IPTS-68), which is 14.9964 °C (ITS-90); 35/1.80655 g/kg is its chlorinity.</summary>
    [Fact]
    public async Task Conductivity_GivesTheSalinityThatDefinesTheScale()
    {
        JsonNode json = await JsonAsync("--temperature", "14.9964", "--conductivity", "42.914mS/cm");
        Assert.Equal(35, (double)json["salinity"]!, 0.0002);
        Assert.Equal("conductivity", (string?)json["salinitySource"]);
        Assert.Equal(19.374, (double)json["chlorinityGPerKg"]!, 0.001);
        JsonNode back = await JsonAsync("--temperature", "14.9964", "--chlorinity", "19.374");
        Assert.Equal(35, (double)back["salinity"]!, 0.001);
    }

    /// <summary>Linear: 310/(1 + 0.0191·(15 − 25)) = 383.19; natural water by the factor 1.256 of ISO 7888 at 15 °C (from memory) 389.4.</summary>
    [Fact]
    public async Task RawConductivity_IsCompensatedBothWays()
    {
        JsonNode json = await JsonAsync("--temperature", "15", "--conductivity", "310uS/cm");
        Assert.Equal(383.19, (double)json["specificConductanceUSPerCm"]!, 0.01);
        Assert.Equal(389.4, (double)json["specificConductanceNaturalWaterUSPerCm"]!, 0.2);
        JsonNode sea = await JsonAsync("--temperature", "15", "--conductivity", "42mS/cm");
        Assert.Null(sea["specificConductanceNaturalWaterUSPerCm"]);
    }

    [Fact]
    public async Task Deviations_AreThoseOfTheValuesBesideThem()
    {
        JsonNode json = await JsonAsync("--temperature", "12.5", "--salinity", "0");
        double reference = (double)Form(json, "wagner-pruss-1993")["freshHPa"]!;
        JsonNode[] forms = [.. json["vapourForms"]!.AsArray().Select(static each => each!)];
        Assert.Equal(11, forms.Length);
        Assert.All(forms, form => Assert.Equal((((double)form["freshHPa"]! / reference) - 1) * 100, (double)form["deviationPercent"]!, 1e-9));
        // No published form lies further off between 0 and 40 °C than the Magnus and the Antoine form do, 0.4 % (measured in docs/methods.md).
        Assert.All(forms, static form => Assert.InRange(Math.Abs((double)form["deviationPercent"]!), 0, 0.4));
        Assert.All(forms, static form => Assert.Null(form["thisWaterHPa"]));
        Assert.True(8 < forms.Select(static form => (double)form["freshHPa"]!).Distinct().Count());
    }

    [Theory]
    [InlineData("--temperature", "20", "--salinity", "35", "--temperature-uncertainty", "0.1K", "--salinity-uncertainty", "0.05")]
    [InlineData("--temperature", "-1.9", "--salinity", "35")]
    [InlineData("--temperature", "55", "--salinity", "0")]
    [InlineData("--temperature", "12.4", "--conductivity", "310uS/cm", "--conductivity-uncertainty", "3uS/cm")]
    [InlineData("--temperature", "12.4", "--specific-conductance", "48mS/cm")]
    [InlineData("--temperature", "68F", "--chlorinity", "19.4")]
    public async Task Json_KeepsToItsSchema_AndTextFitsATerminal(params string[] arguments)
    {
        Run json = await Run.OfAsync(["water", .. arguments, "--format", "json"]);
        Assert.Equal((0, ""), (json.ExitCode, json.Error));
        using JsonDocument document = JsonDocument.Parse(json.Output);
        Assert.True(Schemas.Of("water").Evaluate(document.RootElement).IsValid, json.Output);
        Run text = await Run.OfAsync(["water", .. arguments]);
        Assert.Equal((0, ""), (text.ExitCode, text.Error));
        Assert.All(text.Output.Split('\n'), static line => Assert.True(line.Length <= 110, line));
        Assert.DoesNotContain("NaN", text.Output + json.Output, StringComparison.Ordinal);
    }

    /// <summary>0.1 K is worth 0.1 K times the slopes: of the density 0.257 kg/m³ per K at S 35, 20 °C (table differences, from memory), of the vapour 6.2 % per K.</summary>
    [Fact]
    public async Task Uncertainties_FollowTheInputs()
    {
        JsonNode u = (await JsonAsync("--temperature", "20", "--salinity", "35", "--temperature-uncertainty", "0.1K"))["standardUncertainty"]!;
        Assert.Equal(0.0257, (double)u["densityKgPerM3"]!, 0.001);
        Assert.Equal(0.0062 * 22.95, (double)u["vapourPressureHPa"]!, 0.003);
        JsonNode salty = (await JsonAsync("--temperature", "20", "--salinity", "35", "--salinity-uncertainty", "1"))["standardUncertainty"]!;
        // 0.76 kg/m³ and −0.0575… K per unit of salinity (slopes between tabulated values, from memory).
        Assert.Equal(0.76, (double)salty["densityKgPerM3"]!, 0.01);
        Assert.Equal(0.0574, (double)salty["freezingPointK"]!, 0.002);
    }

    /// <summary>A water has one salinity and one uncertainty of it, whichever command reads it.</summary>
    [Theory]
    [InlineData("--conductivity", "42mS/cm", "--conductivity-uncertainty", "0.1mS/cm", "--conductivity-temperature", "18", "--conductivity-temperature-uncertainty", "0.1K")]
    [InlineData("--specific-conductance", "1000uS/cm")]
    [InlineData("--specific-conductance", "53mS/cm", "--conductivity-uncertainty", "500uS/cm")]
    [InlineData("--chlorinity", "19.374", "--chlorinity-uncertainty", "0.01")]
    [InlineData("--salinity", "35", "--salinity-uncertainty", "0.05")]
    public async Task Salinity_IsThatOfEquilibrium_WithTheSameUncertainty(params string[] salt)
    {
        JsonNode water = await JsonAsync(["--temperature", "20", .. salt]);
        Run run = await Run.OfAsync(["equilibrium", "--temperature", "20", "--pressure", "1atm", "--format", "json", .. salt]);
        JsonNode equilibrium = JsonNode.Parse(run.Output)!;
        Assert.Equal((double)equilibrium["salinity"]!, (double)water["salinity"]!);
        Assert.Equal((double)equilibrium["standardUncertainty"]!["salinity"]!, (double)water["standardUncertainty"]!["salinity"]!);
    }

    /// <summary>
    /// The relation of the field manual gives 0.559 where sea salt has 0.492 (1000 µS/cm) and 35.26 where it has 35: one standard uncertainty holds either difference,
    /// and dilute water is not said to be uncertain by more than it holds.
    /// </summary>
    [Theory]
    [InlineData("1000uS/cm", 0.067, 0.085)]
    [InlineData("53065uS/cm", 0.26, 0.31)]
    [InlineData("50uS/cm", 0.001, 0.006)]
    public async Task FieldRelation_IsAsUncertainAsItIsFarOff(string conductance, double least, double most)
    {
        JsonNode water = await JsonAsync("--temperature", "20", "--specific-conductance", conductance);
        Assert.InRange((double)water["standardUncertainty"]!["salinity"]!, least, most);
    }

    [Theory]
    [InlineData("--temperature is missing: ", "--salinity", "0")]
    [InlineData("--salinity is missing: 0 for fresh water, or in its place --conductivity", "--temperature", "20")]
    [InlineData("--salinity and --chlorinity each say how salty the water is; give one of them", "--temperature", "20", "--salinity", "1", "--chlorinity", "2")]
    [InlineData("--temperature 120: water is described here from -2.2 to 100 °C", "--temperature", "120", "--salinity", "0")]
    [InlineData("--salinity 50: water is described here for practical salinities of 0 to 42", "--temperature", "20", "--salinity", "50")]
    [InlineData("--conductivity 310: a conductivity carries its unit", "--temperature", "20", "--conductivity", "310")]
    [InlineData("--conductivity 310mS/cm: at 20 °C this is outside the practical salinity scale", "--temperature", "20", "--conductivity", "310mS/cm")]
    [InlineData("--temperature 40 °C is outside the practical salinity scale (PSS-78), which holds from -2 to 35 °C", "--temperature", "40", "--conductivity", "42mS/cm")]
    [InlineData("--specific-conductance 60mS/cm: the relation of the field manual", "--temperature", "20", "--specific-conductance", "60mS/cm")]
    [InlineData("--chlorinity 30: the chlorinity of sea water is from 0 to 23.25 g/kg", "--temperature", "20", "--chlorinity", "30")]
    [InlineData("--salinity-uncertainty belongs to --salinity, which is not given", "--temperature", "20", "--chlorinity", "19", "--salinity-uncertainty", "1")]
    [InlineData("--conductivity-uncertainty belongs to --conductivity or --specific-conductance, which is not given", "--temperature", "20", "--salinity", "5", "--conductivity-uncertainty", "1uS/cm")]
    [InlineData("--temperature-uncertainty -1K: a standard uncertainty is zero or above", "--temperature", "20", "--salinity", "5", "--temperature-uncertainty", "-1K")]
    [InlineData("the stated uncertainties are too large to be worked with", "--temperature", "20", "--salinity", "5", "--temperature-uncertainty", "1e300K", "--format", "json")]
    [InlineData("the stated uncertainties are too large to be worked with", "--temperature", "20", "--salinity", "5", "--salinity-uncertainty", "1e308")]
    [InlineData("the stated uncertainties are too large to be worked with", "--temperature", "20", "--conductivity", "5mS/cm", "--conductivity-uncertainty", "1e308uS/cm")]
    [InlineData("the stated uncertainties are too large to be worked with", "--temperature", "20", "--chlorinity", "5", "--chlorinity-uncertainty", "1e308", "--format", "json")]
    [InlineData("--format xml: there is no such form; there are text and json", "--temperature", "20", "--salinity", "5", "--format", "xml")]
    public async Task WrongInput_IsOneLine(string says, params string[] arguments)
    {
        Run run = await Run.OfAsync(["water", .. arguments]);
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.StartsWith("probecal: " + says, run.ErrorLine, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', run.ErrorLine);
    }

    private static JsonNode Form(JsonNode json, string name)
    {
        return json["vapourForms"]!.AsArray().First(each => (string?)each!["equation"] == name)!;
    }

    private static double Lowered(JsonNode json, string name)
    {
        JsonNode form = Form(json, name);
        return 100 * (1 - ((double)form["thisWaterHPa"]! / (double)form["freshHPa"]!));
    }

    private static async Task<JsonNode> JsonAsync(params string[] arguments)
    {
        Run run = await Run.OfAsync(["water", .. arguments, "--format", "json"]);
        Assert.Equal((0, ""), (run.ExitCode, run.Error));
        return JsonNode.Parse(run.Output)!;
    }
}
