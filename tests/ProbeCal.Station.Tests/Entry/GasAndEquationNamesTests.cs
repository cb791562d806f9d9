using System.Linq;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Entry;

/// <summary>Gases and equations as people write them, and what they are told when there is no such thing.</summary>
public class GasAndEquationNamesTests
{
    [Fact]
    public void Every_gas_and_equation_reads_back_by_its_printed_name()
    {
        foreach (GasEntry gas in Catalogue.Gases)
        {
            Assert.Equal(gas.Gas, GasNames.Parse("--gas", GasNames.NameOf(gas.Gas)));
            Assert.Equal(gas.Gas, GasNames.Parse("--gas", gas.Name.ToUpperInvariant()));
            Assert.All(gas.Aliases, alias => Assert.Equal(gas.Gas, GasNames.Parse("--gas", alias)));
        }

        foreach (SolubilityEntry entry in Catalogue.Solubilities)
        {
            Assert.Equal(entry.Equation, EquationNames.Parse("--equation", EquationNames.NameOf(entry.Equation), entry.Gas));
        }

        Assert.Equal(SolubilityEquation.FernandezPrini2003, EquationNames.Parse("--equation", "IAPWS-G7-04", Gas.Methane));
    }

    [Fact]
    public void No_name_means_two_things()
    {
        string[] gases = [.. Catalogue.Gases.SelectMany(static gas => new[] { gas.Symbol, gas.Name, gas.Formula }.Concat(gas.Aliases).Select(static name => name.ToLowerInvariant()).Distinct())];
        Assert.Equal(gases.Length, gases.Distinct().Count());
        string[] equations = [.. Catalogue.Equations.SelectMany(static entry => entry.Aliases.Append(entry.Name))];
        Assert.Equal(equations.Length, equations.Distinct().Count());
    }

    [Theory]
    [InlineData("nitrogn", "did you mean nitrogen?")]
    [InlineData("Radon", "there are O2, N2, Ar,")]
    [InlineData("SF5", "did you mean SF6?")]
    [InlineData("", "there are O2, N2, Ar,")]
    public void Unknown_gas_is_one_line_with_what_there_is(string text, string right)
    {
        InputException wrong = Assert.Throws<InputException>(() => GasNames.Parse("--gas", text));
        Assert.Contains(right, wrong.Message, System.StringComparison.Ordinal);
        Assert.Contains("--gas", wrong.Message, System.StringComparison.Ordinal);
        Assert.DoesNotContain('\n', wrong.Message);
    }

    [Theory]
    [InlineData("hame-emerson-2004", Gas.Nitrogen, "did you mean hamme-emerson-2004?")]
    [InlineData("jenkins-2019", Gas.Nitrogen, "jenkins-2019 does not cover N2; for N2 there are hamme-emerson-2004, weiss-1970,")]
    [InlineData("weiss", Gas.Cfc11, "for CFC-11 there is warner-weiss-1985")]
    [InlineData("bad\u001Bname", Gas.Oxygen, "bad\\x1Bname")]
    public void Unknown_equation_is_one_line_with_what_covers_the_gas(string text, Gas gas, string right)
    {
        InputException wrong = Assert.Throws<InputException>(() => EquationNames.Parse("--equation", text, gas));
        Assert.Contains(right, wrong.Message, System.StringComparison.Ordinal);
        Assert.DoesNotContain('\n', wrong.Message);
        Assert.DoesNotContain('\u001B', wrong.Message);
    }

    [Fact]
    public void Equation_of_a_probe_is_one_that_gives_readings()
    {
        foreach (SolubilityEntry entry in Catalogue.SolubilitiesOf(Gas.Oxygen))
        {
            Status status = OxygenEquilibrium.MilligramsPerLitre(entry.Equation, 10.0, 0.0, 1000.0, RangeRule.Refuse, out _);
            if (status == Status.EquationUnknown)
            {
                Assert.Throws<InputException>(() => EquationNames.Parse("equation", entry.Source.Name));
            }
            else
            {
                Assert.Equal(entry.Equation, EquationNames.Parse("equation", entry.Source.Name));
            }
        }

        Assert.Throws<InputException>(() => EquationNames.Parse("equation", "weiss-1974"));
        Assert.Equal(SolubilityEquation.HammeEmerson2004, EquationNames.ParseOrDefault("--equation", null, Gas.Nitrogen));
    }
}
