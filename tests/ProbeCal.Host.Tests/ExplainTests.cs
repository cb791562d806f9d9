using System;
using System.Globalization;
using System.Linq;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>probecal explain</c> as others call it.</summary>
public class ExplainTests
{
    private static readonly string[] Usual = ["explain", "--temperature", "14.2", "--salinity", "0", "--pressure", "961hPa"];

    /// <summary>Each way of asking: the equilibrium, a given partial pressure, and a concentration in each of its units.</summary>
    public static TheoryData<string> Ways => new()
    {
        "--gas O2 --salinity 12",
        "--gas N2 --salinity 30 --equation weiss-1970",
        "--gas CO2 --salinity 35 --mole-fraction 420ppm",
        "--gas Ar --salinity 0 --partial-pressure 9hPa",
        "--gas O2 --salinity 0 --concentration 8.1mg/L",
        "--gas O2 --salinity 0 --concentration 250umol/kg",
        "--gas CH4 --salinity 0 --concentration 2umol/L --mole-fraction 1.9ppm",
        "--gas N2O --salinity 10 --concentration 12nmol/L --partial-pressure 1Pa",
        "--gas N2 --salinity 0 --concentration 12mL/L --mixture O2=5%,N2=95% --humidity 50%",
        "--gas SF6 --salinity 0 --partial-pressure 1hPa --equation fernandez-prini-2003",
    };

    [Theory]
    [MemberData(nameof(Ways))]
    public async Task Json_keeps_to_its_schema_and_ends_with_its_value(string way)
    {
        Run run = await Run.OfAsync(["explain", "--temperature", "14.2", "--pressure", "961hPa", "--format", "json", .. way.Split(' ')]);
        Assert.Equal((0, ""), (run.ExitCode, run.Error));
        using JsonDocument document = JsonDocument.Parse(run.Output);
        Assert.True(Schemas.Of("explanation").Evaluate(document.RootElement).IsValid, run.Output);
        JsonElement last = document.RootElement.GetProperty("steps").EnumerateArray().Last();
        Assert.Equal(document.RootElement.GetProperty("value").GetDouble(), last.GetProperty("value").GetDouble());
        Assert.Equal(document.RootElement.GetProperty("result").GetString(), last.GetProperty("symbol").GetString());
    }

    [Theory]
    [MemberData(nameof(Ways))]
    public async Task Text_has_every_step_fits_a_terminal_and_cites_each_source_once(string way)
    {
        string[] arguments = ["explain", "--temperature", "14.2", "--pressure", "961hPa", .. way.Split(' ')];
        Run text = await Run.OfAsync(arguments);
        Run json = await Run.OfAsync([.. arguments, "--format", "json"]);
        Assert.Equal((0, ""), (text.ExitCode, text.Error));
        string oneLine = string.Join(' ', text.Output.Split((char[])[' ', '\n', '\r'], StringSplitOptions.RemoveEmptyEntries));
        JsonNode node = JsonNode.Parse(json.Output)!;
        foreach (JsonNode? step in node["steps"]!.AsArray())
        {
            string value = ((double)step!["value"]!).ToString("R", CultureInfo.InvariantCulture);
            Assert.Contains(step["formula"] is JsonNode formula ? "= " + formula + " [" : step["symbol"] + " = " + value, oneLine, StringComparison.Ordinal);
            Assert.Contains("= " + value, oneLine, StringComparison.Ordinal);
        }

        foreach (JsonNode? source in node["sources"]!.AsArray())
        {
            Assert.Equal(2, oneLine.Split((string)source!["name"]! + ": " + (string)source["citation"]!).Length);
        }

        // A formula without blanks longer than the line cannot be broken; there is none such in these.
        Assert.All(text.Output.Split('\n'), static line => Assert.True(line.TrimEnd('\r').Length <= 110, line));
    }

    [Fact]
    public async Task Explains_the_number_that_equilibrium_prints()
    {
        Run explain = await Run.OfAsync([.. Usual, "--format", "json"]);
        Run equilibrium = await Run.OfAsync(["equilibrium", .. Usual[1..], "--format", "json"]);
        double explained = (double)JsonNode.Parse(explain.Output)!["value"]!;
        Assert.Equal(10.0, explained, 1.0);
        Assert.Contains(explained.ToString("R", CultureInfo.InvariantCulture), equilibrium.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Text_and_json_are_the_same_in_every_culture()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;
            Run text = await Run.OfAsync(Usual);
            Run json = await Run.OfAsync([.. Usual, "--format", "json"]);
            foreach (string culture in new[] { "de-DE", "fr-FR", "tr-TR", "ar-SA" })
            {
                CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
                Assert.Equal(text, await Run.OfAsync(Usual));
                Assert.Equal(json, await Run.OfAsync([.. Usual, "--format", "json"]));
            }
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public async Task Second_best_inputs_are_named()
    {
        Run altitude = await Run.OfAsync("explain", "--temperature", "14.2", "--salinity", "0", "--altitude", "640m");
        Assert.Contains("P from the altitude alone", altitude.Output, StringComparison.Ordinal);
        Run conductance = await Run.OfAsync("explain", "--temperature", "14.2", "--specific-conductance", "500uS/cm", "--pressure", "961hPa");
        Assert.Contains("S: salinity 0.2791 from specific conductance", conductance.Output, StringComparison.Ordinal);
        Run perKilogram = await Run.OfAsync([.. Usual, "--concentration", "250umol/kg"]);
        Assert.Contains("C from 250umol/kg, with molar mass and EOS-80 density", perKilogram.Output, StringComparison.Ordinal);
        Run edge = await Run.OfAsync("explain", "--temperature", "-0.1", "--salinity", "0", "--pressure", "961hPa");
        Assert.Contains("just outside the range", edge.Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--temperature", "-3", "0 to 40")]
    [InlineData("--salinity", "41", "0 to 40")]
    [InlineData("--pressure", "300hPa", "506.625")]
    [InlineData("--gas", "radon", "O2, N2, Ar")]
    [InlineData("--equation", "weiss-1974", "does not cover O2")]
    [InlineData("--format", "xml", "text and json")]
    [InlineData("--concentration", "8.1", "8.1mg/L")]
    public async Task Wrong_input_is_one_line_that_names_option_value_and_what_would_be_right(string option, string value, string right)
    {
        string[] arguments = [.. Usual];
        int at = Array.IndexOf(arguments, option);
        if (at < 0)
        {
            arguments = [.. Usual, option, value];
        }
        else
        {
            arguments[at + 1] = value;
        }

        Run run = await Run.OfAsync(arguments);

        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.DoesNotContain('\n', run.ErrorLine);
        Assert.Contains(right, run.ErrorLine, StringComparison.Ordinal);
        Assert.Contains(option.TrimStart('-'), run.ErrorLine, StringComparison.Ordinal);
    }
}
