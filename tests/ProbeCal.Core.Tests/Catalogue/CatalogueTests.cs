using System;
using System.Linq;
using System.Text.RegularExpressions;
using Xunit;

namespace ProbeCal.Core.Tests.CatalogueOfCore;

/// <summary>The catalogue names what Core has, and nothing else.</summary>
public class CatalogueTests
{
    [Fact]
    public void Every_gas_and_every_equation_of_Core_has_one_entry()
    {
        Assert.Equal(Enum.GetValues<Gas>(), Catalogue.Gases.Select(static entry => entry.Gas));
        Assert.Equal(Enum.GetValues<SolubilityEquation>(), Catalogue.Equations.Select(static entry => entry.Equation));
        Assert.Equal(Enum.GetValues<SolubilityEquation>().ToHashSet(), Catalogue.Solubilities.Select(static entry => entry.Equation).ToHashSet());
    }

    [Fact]
    public void The_default_of_a_gas_stands_first_among_its_equations_and_only_once()
    {
        foreach (GasEntry gas in Catalogue.Gases)
        {
            SolubilityEntry[] entries = [.. Catalogue.SolubilitiesOf(gas.Gas)];
            Assert.True(entries[0].IsDefault, gas.Symbol);
            Assert.Single(entries, static entry => entry.IsDefault);
            Assert.Equal(entries.Length, entries.Select(static entry => entry.Equation).Distinct().Count());
        }
    }

    [Fact]
    public void Pairs_and_ranges_are_those_that_the_functions_hold_to()
    {
        foreach (GasEntry gas in Catalogue.Gases)
        {
            foreach (EquationEntry equation in Catalogue.Equations)
            {
                SolubilityEntry? entry = Catalogue.Solubility(gas.Gas, equation.Equation);
                Assert.Equal(entry is null, StatusAt(gas.Gas, equation.Equation, 20.0, 0.0, 1013.25) == Status.EquationUnknown);
                if (entry is null)
                {
                    continue;
                }

                foreach (double salinity in new[] { 0.0, entry.HighestSalinity })
                {
                    double lowest = entry.LowestCelsius(salinity);
                    Assert.Equal(Status.Ok, StatusAt(entry, lowest, salinity, 1013.25));
                    Assert.Equal(Status.Ok, StatusAt(entry, entry.HighestCelsius, salinity, entry.HighestHectopascal));
                    Assert.Equal(Status.TemperatureJustBelowRange, StatusAt(entry, Math.BitDecrement(lowest), salinity, 1013.25));
                    Assert.Equal(Status.TemperatureJustAboveRange, StatusAt(entry, Math.BitIncrement(entry.HighestCelsius), salinity, 1013.25));
                    Assert.Equal(Status.PressureAboveRange, StatusAt(entry, 20.0, salinity, Math.BitIncrement(entry.HighestHectopascal)));
                }

                Assert.Equal(Status.SalinityAboveRange, StatusAt(entry, 20.0, Math.BitIncrement(entry.HighestSalinity), 1013.25));
            }
        }
    }

    private static Status StatusAt(SolubilityEntry entry, double celsius, double salinity, double hectopascal)
    {
        return StatusAt(entry.Gas, entry.Equation, celsius, salinity, hectopascal);
    }

    private static Status StatusAt(Gas gas, SolubilityEquation equation, double celsius, double salinity, double hectopascal)
    {
        return GasEquilibrium.MilligramsPerLitre(gas, equation, celsius, salinity, hectopascal, 1e-4, 100.0, RangeRule.Refuse, out _);
    }

    [Fact]
    public void Names_are_author_and_year_and_citations_name_the_same_year()
    {
        foreach (EquationEntry entry in Catalogue.Equations)
        {
            Match name = Regex.Match(entry.Name, "^[a-z]+(-[a-z]+)*-((19|20)\\d\\d)(-[a-z]+)*$");
            Assert.True(name.Success, entry.Name);
            Assert.Contains("(" + name.Groups[2].Value + ")", entry.Citation, StringComparison.Ordinal);
            Assert.Matches("^10\\.\\d{4,}/", entry.Doi);
        }
    }

    [Fact]
    public void Evidence_says_in_words_what_the_grade_is()
    {
        Assert.All(Catalogue.Solubilities, static entry =>
        {
            Assert.Equal(entry.Evidence.Grade == EvidenceGrade.SecondHand, 2 <= entry.Evidence.Places);
            Assert.StartsWith(
                entry.Evidence.Grade switch
                {
                    EvidenceGrade.Read => "read",
                    EvidenceGrade.Memory => "from memory",
                    _ => "second-hand, ",
                },
                entry.Evidence.Words, StringComparison.Ordinal);
        });
    }
}
