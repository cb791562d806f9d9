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
