using System;
using System.Linq;
using System.Text.Json;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Host.Tests;

/// <summary><c>probecal equations</c> as others call it.</summary>
public class EquationsTests
{
    [Fact]
    public async Task Json_keeps_to_its_schema_and_has_every_pair()
    {
        Run run = await Run.OfAsync("equations", "--format", "json");
        Assert.Equal((0, ""), (run.ExitCode, run.Error));
        using JsonDocument document = JsonDocument.Parse(run.Output);
        Assert.True(Schemas.Of("equations").Evaluate(document.RootElement).IsValid, run.Output);
        string[] pairs = [.. document.RootElement.GetProperty("gases").EnumerateArray().SelectMany(static gas =>
            gas.GetProperty("equations").EnumerateArray().Select(equation => gas.GetProperty("gas").GetString() + " " + equation.GetProperty("equation").GetString()))];
        Assert.Equal(Catalogue.Solubilities.Select(static entry => Catalogue.Gas(entry.Gas).Symbol + " " + entry.Source.Name), pairs);
    }

    [Theory]
    [InlineData("text")]
    [InlineData("markdown")]
    public async Task Lists_name_every_equation_of_the_gas_and_no_other(string format)
    {
        Run run = await Run.OfAsync("equations", "--gas", "nitrous oxide", "--format", format);
        Assert.Equal((0, ""), (run.ExitCode, run.Error));
        Assert.Contains("weiss-price-1980-moist-air", run.Output, StringComparison.Ordinal);
        Assert.Contains("-1 to 40 °C, S 0 to 40", run.Output, StringComparison.Ordinal);
        Assert.DoesNotContain("hamme-emerson-2004", run.Output, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Text_fits_a_terminal_and_stars_one_default_a_gas()
    {
        Run all = await Run.OfAsync("equations");
        Run one = await Run.OfAsync("equations", "--gas", "O2");
        Assert.All((all.Output + one.Output).Split('\n'), static line => Assert.True(line.TrimEnd('\r').Length <= 110, line));
        Assert.Equal(Catalogue.Gases.Count, all.Output.Split('\n').Count(static line => line.StartsWith("  *  ", StringComparison.Ordinal)));
        Assert.Contains("doi:10.4319/lo.1984.29.3.0620", one.Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--gas", "neone", "did you mean neon?")]
    [InlineData("--format", "csv", "text, markdown and json")]
    public async Task Wrong_input_is_one_line(string option, string value, string right)
    {
        Run run = await Run.OfAsync("equations", option, value);
        Assert.Equal((2, ""), (run.ExitCode, run.Output));
        Assert.DoesNotContain('\n', run.ErrorLine);
        Assert.Contains(right, run.ErrorLine, StringComparison.Ordinal);
    }
}
