using System;
using System.Linq;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>probecal henry</c> as others call it.</summary>
public class HenryTests
{
    /// <summary>
    /// Sander 2023, printed Hcp at 25 °C in fresh water, against the default equations of the gases, which are by others. 5 %: two figures (0.4 to 4 % of rounding) of a compilation.
    /// </summary>
    [Theory]
    [InlineData("O2", 1.3e-5)]
    [InlineData("N2", 6.4e-6)]
    [InlineData("CH4", 1.4e-5)]
    [InlineData("H2", 7.8e-6)]
    [InlineData("Ar", 1.4e-5)]
    [InlineData("N2O", 2.4e-4)]
    [InlineData("CO", 9.7e-6)]
    public async Task Defaults_LieWhereTheCompilationPrintsThem(string gas, double printed)
    {
        JsonNode json = await JsonAsync("--gas", gas, "--temperature", "25", "--salinity", "0");
        Assert.Equal(1, Value(json, "Hcp") / printed, 0.05);
        Assert.NotEqual("sander-2023", (string?)json["equation"]);
    }

    /// <summary>
    /// Oxygen at 20 °C in fresh water: Bunsen coefficient about 0.0310 (from memory, three figures; 0.5 % for the rounding and for the ideal volume of the gas). Carbon dioxide at 25 °C
    /// and S 35: 2.839e-2 mol/(kg·atm) (Weiss 1974, table, from memory; half a unit of the last figure).
    /// </summary>
    [Fact]
    public async Task KnownConstants_AreMet()
    {
        JsonNode oxygen = await JsonAsync("--temperature", "20", "--salinity", "0");
        Assert.Equal("O2", (string?)oxygen["gas"]);
        Assert.Equal(1, Value(oxygen, "Bunsen") / 0.0310, 0.005);
        JsonNode carbonDioxide = await JsonAsync("--gas", "carbon dioxide", "--temperature", "25", "--salinity", "35");
        Assert.Equal(2.839e-2, Value(carbonDioxide, "Hbp") * 101325, 5e-6);
    }

    /// <summary>
    /// Sander's factors at 25 °C: Hcc/Hcp = 2478.957 J/mol (from memory), Hxp per atm 1.83089 (second-hand, with a density of its own, hence 0.0006), mol/(L·atm) 101.325 by the definition of
    /// the atmosphere.
    /// </summary>
    [Theory]
    [InlineData("Hcp=1.3e-5")]
    [InlineData("hcp = 1.3e-5")]
    [InlineData("mol/(L·atm)=1.317225e-3")]
    [InlineData("MOL/(l*ATM)=1.317225e-3")]
    public async Task Given_IsConvertedByThePublishedFactors(string given)
    {
        JsonNode json = await JsonAsync("--given", given, "--temperature", "25", "--salinity", "0");
        Assert.Null(json["gas"]);
        Assert.Equal(1, Value(json, "Hcp") / 1.3e-5, 1e-14);
        Assert.Equal(2478.957, Value(json, "Hcc") / 1.3e-5, 0.01);
        Assert.Equal(1.83089, Value(json, "Hxp") * 101325 / 1.3e-5, 0.0006);
        Assert.Equal(101.325, Value(json, "mol/(L·atm)") / 1.3e-5, 1e-10);
        Assert.Equal(Value(json, "Hcc"), Value(json, "Ostwald"));
        Assert.Equal(1, Value(json, "Kpc") * 1.3e-5, 1e-14);
        Assert.Equal(1, Value(json, "Kcc") * Value(json, "Hcc"), 1e-14);
        Assert.Equal(1, Value(json, "Kpx") * Value(json, "Hxp"), 1e-14);
        Assert.Equal(1, Value(json, "Hbp") / Value(json, "Hxp") * 0.018015268, 1e-14);
        Assert.Equal(298.15 / 273.15, Value(json, "Ostwald") / Value(json, "Bunsen"), 1e-14);
    }

    [Fact]
    public async Task EveryForm_GivenBack_MakesTheSameConstants()
    {
        JsonNode json = await JsonAsync("--gas", "CH4", "--temperature", "12.5", "--salinity", "35");
        JsonNode[] forms = [.. json["constants"]!.AsArray().Select(static each => each!)];
        Assert.Equal(10, forms.Length);
        foreach (JsonNode form in forms)
        {
            string given = (string)form["form"]! + "=" + form["value"]!.ToJsonString();
            JsonNode back = await JsonAsync("--given", given, "--temperature", "12.5", "--salinity", "35");
            Assert.All(forms, each => Assert.Equal(1, Value(back, (string)each["form"]!) / (double)each["value"]!, 1e-14));
        }
    }

    /// <summary>By definition: of a given Hcp only what holds R·T changes with the temperature, by 1/298.15 per K, and what holds the density, by its expansion, 2.57e-4 per K at 25 °C (tables of water, from memory).</summary>
    [Fact]
    public async Task UncertaintyOfAGivenConstant_IsTheTemperaturesAlone()
    {
        JsonNode json = await JsonAsync("--given", "Hcp=1.3e-5", "--temperature", "25", "--salinity", "0", "--temperature-uncertainty", "0.5K");
        Assert.All(new[] { "Hcp", "mol/(L·atm)", "Kpc", "Bunsen" }, form => Assert.Equal(0, Relative(json, form)));
        Assert.All(new[] { "Hcc", "Kcc", "Ostwald" }, form => Assert.Equal(0.5 / 298.15, Relative(json, form), 1e-8));
        Assert.All(new[] { "Hbp", "Hxp", "Kpx" }, form => Assert.Equal(0.5 * 2.57e-4, Relative(json, form), 0.5 * 1e-6));
    }

    /// <summary>Oxygen, 25 °C: d(ln Hcp)/d(1/T) is 1500 K in Sander's compilation (from memory, two figures), 0.0169 per K; the equation alone where the temperature is exact.</summary>
    [Fact]
    public async Task UncertaintyOfAGas_IsTheEquationsAndTheTemperatures()
    {
        JsonNode exact = await JsonAsync("--temperature", "25", "--salinity", "0");
        double equation = (double)exact["standardUncertainty"]!["equationPercent"]! / 100;
        Assert.InRange(equation, 0.0005, 0.005);
        Assert.All(exact["constants"]!.AsArray(), each => Assert.Equal(equation, (double)each!["standardUncertainty"]! / (double)each["value"]!, 1e-12));
        JsonNode both = await JsonAsync("--temperature", "25", "--salinity", "0", "--temperature-uncertainty", "1K");
        double slope = Math.Sqrt(Math.Pow(Relative(both, "Hcp"), 2) - (equation * equation));
        Assert.Equal(1500 / (298.15 * 298.15), slope, 0.001);
        // The slope between whole values a kelvin apart, by the command itself; 1e-5 for the curvature.
        double low = Value(await JsonAsync("--temperature", "24.5", "--salinity", "0"), "Hcp");
        double high = Value(await JsonAsync("--temperature", "25.5", "--salinity", "0"), "Hcp");
        Assert.Equal(Math.Log(low / high), slope, 1e-5);
    }

    [Fact]
    public async Task EveryGas_KeepsToTheSchema_AndTheTextToItsWidth()
    {
        foreach (GasEntry gas in Catalogue.Gases)
        {
            await FitsAsync("--gas", gas.Symbol, "--temperature", "20", "--salinity", "0", "--temperature-uncertainty", "0.1K");
        }
    }

    [Theory]
    [InlineData("--gas", "SF6", "--temperature", "25", "--salinity", "35")]
    [InlineData("--gas", "CO2", "--temperature", "-1.1", "--salinity", "35")]
    [InlineData("--given", "mol/(L·atm)=1.2345678901234567e-3", "--temperature", "68.123456789F", "--salinity", "35.123456789", "--temperature-uncertainty", "0.1K")]
    [InlineData("--given", "Kpx=1e-250", "--temperature", "40.1", "--salinity", "0")]
    public async Task Json_KeepsToItsSchema_AndTextToItsWidth(params string[] arguments)
    {
        await FitsAsync(arguments);
    }

    [Fact]
    public async Task NearTheEdge_IsTold()
    {
        JsonNode json = await JsonAsync("--gas", "CO2", "--temperature", "-1.1", "--salinity", "35");
        Assert.Equal("the temperature is just outside the range of weiss-1974, which its uncertainty counts", (string?)Assert.Single(json["notes"]!.AsArray()));
        JsonNode within = await JsonAsync("--gas", "CO2", "--temperature", "-0.9", "--salinity", "35");
        Assert.Empty(within["notes"]!.AsArray());
        Assert.True(Relative(within, "Hcp") < Relative(json, "Hcp"));
    }

    [Theory]
    [InlineData("--temperature is missing: ", "--salinity", "0")]
    [InlineData("--salinity is missing: ", "--temperature", "20")]
    [InlineData("--gas O9: no such gas is known here", "--gas", "O9", "--temperature", "20", "--salinity", "0")]
    [InlineData("--equation weiss-1974: weiss-1974 does not cover O2; for O2 there are ", "--equation", "weiss-1974", "--temperature", "20", "--salinity", "0")]
    [InlineData("--given and --gas each say which constant it is; give one of them", "--gas", "O2", "--given", "Hcp=1", "--temperature", "20", "--salinity", "0")]
    [InlineData("--given and --equation each say which constant it is; give one of them", "--equation", "weiss-1970", "--given", "Hcp=1", "--temperature", "20", "--salinity", "0")]
    [InlineData("--given 0.0283: write the form and the constant, for example Bunsen=0.0283", "--given", "0.0283", "--temperature", "20", "--salinity", "0")]
    [InlineData("--given Bunsn=0.0283: no such form of Henry's law is known here (did you mean Bunsen?); there are Hcp, mol/(L·atm), Hcc, Hbp, Hxp, Kpc, Kpx, Kcc, Bunsen, Ostwald", "--given", "Bunsn=0.0283", "--temperature", "20", "--salinity", "0")]
    [InlineData("--given Hcp=: there is nothing there", "--given", "Hcp=", "--temperature", "20", "--salinity", "0")]
    [InlineData("--given Hcp=1,3: a comma is no decimal mark here; write 1.3", "--given", "Hcp=1,3", "--temperature", "20", "--salinity", "0")]
    [InlineData("--given Hcp=0: a Henry's-law constant is above zero", "--given", "Hcp=0", "--temperature", "20", "--salinity", "0")]
    [InlineData("--given Hcp=1e308: the constant is too large or too small", "--given", "Hcp=1e308", "--temperature", "20", "--salinity", "0")]
    [InlineData("--temperature 45 °C: the forms are converted with the density of the water by EOS-80, which holds from -2 to 40 °C", "--temperature", "45", "--salinity", "0")]
    [InlineData("--salinity 45: the forms are converted with the density of the water by EOS-80, which holds from 0 to 42", "--temperature", "20", "--salinity", "45")]
    [InlineData("--temperature -1 °C is outside benson-krause-1984, which holds for O2 from 0 to 40 °C; --equation weiss-1970 or weiss-1970-bunsen takes it", "--temperature", "-1", "--salinity", "0")]
    [InlineData("--salinity 5 is outside fernandez-prini-2003, which holds for C2H6 in fresh water alone, --salinity 0", "--gas", "ethane", "--temperature", "20", "--salinity", "5")]
    [InlineData("--salinity 41 is outside jenkins-2019, which holds for Xe from 0 to 40", "--gas", "Xe", "--temperature", "20", "--salinity", "41")]
    [InlineData("--temperature-uncertainty -1K: a standard uncertainty is zero or above", "--temperature", "20", "--salinity", "5", "--temperature-uncertainty", "-1K")]
    [InlineData("the stated uncertainties are too large to be worked with", "--temperature", "20", "--salinity", "5", "--temperature-uncertainty", "1e300K")]
    [InlineData("--format xml: there is no such form; there are text and json", "--temperature", "20", "--salinity", "5", "--format", "xml")]
    public async Task WrongInput_IsOneLine(string says, params string[] arguments)
    {
        Run run = await Run.OfAsync(["henry", .. arguments]);
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.StartsWith("probecal: " + says, run.ErrorLine, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', run.ErrorLine);
    }

    private static async Task FitsAsync(params string[] arguments)
    {
        Run json = await Run.OfAsync(["henry", .. arguments, "--format", "json"]);
        Assert.Equal((0, ""), (json.ExitCode, json.Error));
        using JsonDocument document = JsonDocument.Parse(json.Output);
        Assert.True(Schemas.Of("henry").Evaluate(document.RootElement).IsValid, json.Output);
        Run text = await Run.OfAsync(["henry", .. arguments]);
        Assert.Equal((0, ""), (text.ExitCode, text.Error));
        Assert.All(text.Output.Split('\n'), static line => Assert.True(line.Length <= 100, line));
        Assert.DoesNotContain("NaN", text.Output + json.Output, StringComparison.Ordinal);
    }

    private static double Value(JsonNode json, string form)
    {
        return (double)Constant(json, form)["value"]!;
    }

    private static double Relative(JsonNode json, string form)
    {
        return (double)Constant(json, form)["standardUncertainty"]! / Value(json, form);
    }

    private static JsonNode Constant(JsonNode json, string form)
    {
        return json["constants"]!.AsArray().Single(each => (string?)each!["form"] == form)!;
    }

    private static async Task<JsonNode> JsonAsync(params string[] arguments)
    {
        Run run = await Run.OfAsync(["henry", .. arguments, "--format", "json"]);
        Assert.Equal((0, ""), (run.ExitCode, run.Error));
        return JsonNode.Parse(run.Output)!;
    }
}
