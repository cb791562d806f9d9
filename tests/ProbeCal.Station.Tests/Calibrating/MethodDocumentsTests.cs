using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Reflection;
using System.Text.RegularExpressions;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>docs/uncertainty.md, docs/methods.md and docs/safety.md say of the methods what the code does.</summary>
public class MethodDocumentsTests
{
    /// <summary>Every default that is an uncertainty stands in the table with its figure.</summary>
    [Fact]
    public void DefaultsOfTheDocument_AreThoseOfTheCode()
    {
        string text = Text("uncertainty.md");
        Dictionary<string, double> listed = Regex.Matches(text[text.IndexOf("`MethodDefaults`", StringComparison.Ordinal)..], @"^\| `(\w+)` \| ([\d.]+) \|", RegexOptions.Multiline)
            .ToDictionary(static row => row.Groups[1].Value, static row => Number.Parse("figure", row.Groups[2].Value));
        Dictionary<string, double> coded = typeof(MethodDefaults).GetFields(BindingFlags.Static | BindingFlags.Public)
            .Where(static field => field.FieldType == typeof(double) && field.Name is not ("DisplacedMillilitres" or "HumidifiedPercent"))
            .ToDictionary(static field => field.Name, static field => (double)field.GetValue(null)!);
        Assert.Equal(coded.Keys.Order(), listed.Keys.Order());
        // Three digits are printed.
        Assert.All(coded, pair => Assert.Equal(pair.Value, listed[pair.Key], 0.005 * pair.Value));
    }

    /// <summary>The t of the few titres are those of JCGM 100, table G.2 (95 %, from memory): 12.71, 4.30, 3.18, 2.78, 2.57, 2.45, 2.36, 2.31, 2.26 for 1 to 9 degrees of freedom; beyond, never too small by more than 4 %.</summary>
    [Fact]
    public void FewTitres_AreEnlargedByStudentsT()
    {
        double[] t = [12.71, 4.30, 3.18, 2.78, 2.57, 2.45, 2.36, 2.31, 2.26];
        for (int i = 0; i < t.Length; i++)
        {
            Assert.Equal(t[i] / 1.96, MethodDefaults.FewTitres(i + 2), 12);
        }

        // Degrees of freedom 10, 15, 20, 30 and infinity of the same table: 2.23, 2.13, 2.09, 2.04, 1.96.
        (int Count, double T)[] more = [(11, 2.23), (16, 2.13), (21, 2.09), (31, 2.04), (1000, 1.96)];
        Assert.All(more, static row => Assert.InRange(MethodDefaults.FewTitres(row.Count), row.T / 1.96, 1.05 * row.T / 1.96));
    }

    [Fact]
    public void MethodsOfTheDocument_AreThoseOfTheCode()
    {
        string[] listed = [.. Regex.Matches(Text("methods.md"), @"^\| `([a-z-]+)` \|", RegexOptions.Multiline).Select(static row => row.Groups[1].Value).Where(static id => MethodIds.All.Contains(id))];
        Assert.Equal(MethodIds.All.Order(), listed.Order());
    }

    /// <summary>Every hazard that a procedure warns of has its paragraph.</summary>
    [Fact]
    public void EveryCaution_IsInTheDocument()
    {
        string text = Text("safety.md");
        Dictionary<string, string> words = new()
        {
            ["OpenWater"] = "lifejacket",
            ["Mains"] = "residual-current",
            ["Sulfite"] = "sulfite",
            ["Cobalt"] = "cobalt",
            ["Cylinder"] = "suffocate",
            ["Oxygen"] = "feeds fire",
            ["Flammable"] = "explode",
            ["Toxic"] = "poisonous",
            ["AlkalineIodide"] = "explosive salts",
            ["Acid"] = "acid burns",
        };
        string[] cautions = [.. typeof(Cautions).GetFields(BindingFlags.Static | BindingFlags.NonPublic).Where(static field => field.IsLiteral).Select(static field => field.Name)];
        Assert.Equal(words.Keys.Order(), cautions.Order());
        Assert.All(words.Values, word => Assert.Contains(word, text, StringComparison.OrdinalIgnoreCase));
    }

    private static string Text(string name)
    {
        return File.ReadAllText(Repository.File("docs", name)).ReplaceLineEndings("\n");
    }
}
