using System;
using System.Globalization;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>probecal equilibrium</c> as others call it.</summary>
public class EquilibriumTests
{
    private static readonly string[] Usual = ["equilibrium", "--gas", "O2", "--temperature", "20", "--salinity", "0", "--pressure", "760mmHg", "--format", "json"];

    [Fact]
    public async Task Json_gives_the_value_in_every_unit()
    {
        Run run = await Run.OfAsync(Usual);

        Assert.Equal((0, ""), (run.ExitCode, run.Error));
        JsonNode json = JsonNode.Parse(run.Output)!;
        Assert.Equal("O2", (string?)json["gas"]);
        Assert.Equal("benson-krause-1984", (string?)json["equation"]);
        Assert.Equal(1013.25, (double?)json["pressureHPa"]);
        // 9.09 mg/L: field-manual table (USGS TM 9-A6.2, Table 6.2-2), 20 °C, 760 mmHg, to its printed digits.
        Assert.Equal(9.09, Math.Round((double)json["mgPerL"]!, 2));
        Assert.Contains("\"pressureHPa\":1013.25,", run.Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("benson-krause-1984")]
    [InlineData("garcia-gordon-1992")]
    public async Task Json_keeps_to_its_schema(string equation)
    {
        foreach (string[] air in new[] { new[] { "--pressure", "938hPa", "--pressure-uncertainty", "1hPa" }, ["--altitude", "640m"] })
        {
            Run run = await Run.OfAsync(["equilibrium", "--temperature", "8.4C", "--salinity", "12", "--equation", equation, "--format", "json", .. air]);
            Assert.Equal(0, run.ExitCode);
            using JsonDocument document = JsonDocument.Parse(run.Output);
            Assert.True(Schemas.Of("equilibrium").Evaluate(document.RootElement).IsValid, run.Output);
        }
    }

    [Fact]
    public async Task Altitude_stands_in_for_a_barometer_and_says_so()
    {
        Run json = await Run.OfAsync("equilibrium", "--temperature", "20", "--salinity", "0", "--altitude", "640m", "--format", "json");
        JsonNode node = JsonNode.Parse(json.Output)!;
        Assert.Equal("altitude", (string?)node["pressureSource"]);
        Assert.True((double)node["standardUncertainty"]!["pressureHPa"]! >= 10);
        Run text = await Run.OfAsync("equilibrium", "--temperature", "20", "--salinity", "0", "--altitude", "640m");
        Assert.Contains("from the altitude alone", text.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Text_and_json_are_the_same_in_every_culture()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;
            Run json = await Run.OfAsync(Usual);
            Run text = await Run.OfAsync(Usual[..9]);
            foreach (string culture in new[] { "de-DE", "fr-FR", "tr-TR", "ar-SA" })
            {
                CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo(culture);
                Assert.Equal(json, await Run.OfAsync(Usual));
                Assert.Equal(text, await Run.OfAsync(Usual[..9]));
            }
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Theory]
    [InlineData("--pressure", "760", "unit")]
    [InlineData("--pressure", "760 furlong", "mmHg")]
    [InlineData("--pressure", "1,013hPa", "comma")]
    [InlineData("--pressure", "300hPa", "506.625")]
    [InlineData("--pressure", "NaN hPa", "NaN")]
    [InlineData("--temperature", "8,3", "8.3")]
    [InlineData("--temperature", "68", "68F")]
    [InlineData("--temperature", "NaN", "NaN")]
    [InlineData("--temperature", "-3", "0 to 40")]
    [InlineData("--temperature", "warm", "warm")]
    [InlineData("--salinity", "-1", "0 to 40")]
    [InlineData("--salinity", "41", "0 to 40")]
    [InlineData("--gas", "O3", "O2")]
    [InlineData("--equation", "weiss", "benson-krause-1984")]
    [InlineData("--format", "xml", "json")]
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

    [Fact]
    public async Task Text_fits_a_terminal_and_claims_no_uncertainty_of_zero()
    {
        Run exact = await Run.OfAsync("equilibrium", "--temperature", "8.4", "--salinity", "0", "--pressure", "706mmHg");
        Run stated = await Run.OfAsync("equilibrium", "--temperature", "8.4", "--salinity", "35", "--pressure", "706mmHg", "--pressure-uncertainty", "1mmHg");
        Assert.DoesNotContain("± 0.00 hPa", exact.Output, StringComparison.Ordinal);
        Assert.Contains("temperature, pressure, salinity taken as exact", exact.Output, StringComparison.Ordinal);
        Assert.Contains("pressure ± 1.33 hPa", stated.Output, StringComparison.Ordinal);
        Assert.Contains("(706.0 mmHg)", exact.Output, StringComparison.Ordinal);
        Assert.All((exact.Output + stated.Output).Split('\n'), static line => Assert.True(line.TrimEnd('\r').Length <= 110, line));
    }

    [Fact]
    public async Task A_pressure_that_is_rare_at_the_altitude_is_computed_with_a_note()
    {
        Run run = await Run.OfAsync("equilibrium", "--temperature", "20", "--salinity", "0", "--pressure", "1013hPa", "--altitude", "230m");
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("note: --pressure 1013hPa at 230m is 1041 hPa reduced to sea level, which is rare", run.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_pressure_that_cannot_be_at_the_altitude_is_refused()
    {
        Run run = await Run.OfAsync("equilibrium", "--temperature", "20", "--salinity", "0", "--pressure", "1013hPa", "--altitude", "640m");
        Assert.Equal(2, run.ExitCode);
        Assert.Contains("640m", run.ErrorLine, StringComparison.Ordinal);
        Assert.Contains("sea-level", run.ErrorLine, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', run.ErrorLine);
    }

    [Fact]
    public async Task Without_pressure_or_altitude_it_says_what_is_missing()
    {
        Run run = await Run.OfAsync("equilibrium", "--temperature", "20", "--salinity", "0");
        Assert.Equal(2, run.ExitCode);
        Assert.Contains("--pressure", run.ErrorLine, StringComparison.Ordinal);
        Assert.Contains("--altitude", run.ErrorLine, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Unknown_option_is_one_line_with_exit_2()
    {
        Run run = await Run.OfAsync("equilibrium", "--temprature", "20");
        Assert.Equal(2, run.ExitCode);
        Assert.DoesNotContain('\n', run.ErrorLine);
    }
}
