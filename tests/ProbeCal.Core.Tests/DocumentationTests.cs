using System;
using System.IO;
using System.Linq;
using System.Reflection;
using System.Text.RegularExpressions;
using System.Xml.Linq;
using Xunit;

namespace ProbeCal.Core.Tests;

/// <summary>What every reader of the API needs beside a number: its unit, range, source and accuracy.</summary>
public class DocumentationTests
{
    private static readonly XElement[] Members =
        [.. XDocument.Load(Path.ChangeExtension(typeof(Status).Assembly.Location, ".xml")).Descendants("member")];

    [Theory]
    [InlineData(typeof(BensonKrause1984))]
    [InlineData(typeof(GarciaGordon1992))]
    [InlineData(typeof(OxygenEquilibrium))]
    [InlineData(typeof(HenryLaw))]
    [InlineData(typeof(HenryConversion))]
    [InlineData(typeof(VapourWeissPrice1980))]
    [InlineData(typeof(DensityEos80))]
    [InlineData(typeof(FreezingPoint))]
    [InlineData(typeof(SpecificConductance))]
    [InlineData(typeof(StandardAtmosphere))]
    [InlineData(typeof(TemperatureScale))]
    [InlineData(typeof(VapourBensonKrause1980))]
    [InlineData(typeof(VapourWagnerPruss1993))]
    [InlineData(typeof(VapourHardy1998))]
    [InlineData(typeof(VapourBuck1981))]
    [InlineData(typeof(VapourBuck1996))]
    [InlineData(typeof(VapourSonntag1990))]
    [InlineData(typeof(VapourMurray1967))]
    [InlineData(typeof(VapourAntoine8111))]
    [InlineData(typeof(VapourDickson2007))]
    [InlineData(typeof(VapourGreenCarritt1967))]
    [InlineData(typeof(VapourPressure))]
    [InlineData(typeof(DensityTanaka2001))]
    [InlineData(typeof(DensityKell1975))]
    [InlineData(typeof(PracticalSalinity))]
    [InlineData(typeof(Chlorinity))]
    [InlineData(typeof(ConductivityCompensation))]
    [InlineData(typeof(SeaLevelReduction))]
    [InlineData(typeof(HydrostaticPressure))]
    [InlineData(typeof(Enns1965))]
    [InlineData(typeof(TotalDissolvedGas))]
    [InlineData(typeof(TotalDissolvedGasUncertainty))]
    [InlineData(typeof(SaltingOutWeisenbergerSchumpe1996))]
    [InlineData(typeof(WinklerTitration))]
    public void Equation_StatesSourceAndAccuracy(Type type)
    {
        string text = Members.Single(member => (string?)member.Attribute("name") == "T:" + type.FullName).Value;
        Assert.Matches("\\b(1[89]|20)\\d\\d\\b", text);
        Assert.Matches("(?i)accuracy|uncertainty|standard error|as good as|lies .* below|it gives|departs|moves", text);
    }

    // A double is named by its unit, or its text names it; salinity and ratios have none.
    [Fact]
    public void EveryDouble_CarriesItsUnit()
    {
        const string InName = "(?i)celsius|hectopascal|kilopascal|atmospheres?$|bar$|mercury|psi$|kelvin|metres?$|seconds|^days|percent|milli(litres|grams)$|per(litre|kilogram|millilitre|mole)|siemens|kilograms?percubicmetre|relative|factor|ratio|salinity|^[xy]$|its90|ipts68";
        const string InText = "°C|\\bK\\b|hPa|mg/L|%|mol|kg|unit|1/K|[rR]esponse|[sS]ignal|[rR]elative|percent|fraction|times|same|positive";
        string[] nameless = [.. from type in typeof(Status).Assembly.GetExportedTypes()
                                where type.IsAbstract && type.IsSealed
                                from method in type.GetMethods(BindingFlags.Public | BindingFlags.Static | BindingFlags.DeclaredOnly)
                                from parameter in method.GetParameters()
                                where parameter.ParameterType == typeof(double) || parameter.ParameterType == typeof(double).MakeByRefType()
                                where !Regex.IsMatch(parameter.Name!, InName) && !Regex.IsMatch(TextOf(method, parameter), InText)
                                select $"{type.Name}.{method.Name}: {parameter.Name}"];
        Assert.True(nameless.Length == 0, string.Join("; ", nameless));
    }

    private static string TextOf(MethodInfo method, ParameterInfo parameter)
    {
        string start = $"M:{method.DeclaringType!.FullName}.{method.Name}(";
        return string.Join(' ', Members
            .Where(member => ((string?)member.Attribute("name"))!.StartsWith(start, StringComparison.Ordinal))
            .SelectMany(member => member.Elements("param"))
            .Where(each => (string?)each.Attribute("name") == parameter.Name)
            .Select(each => each.Value));
    }
}
