using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using ProbeCal.Core.Tests.Gases;
using ProbeCal.Core.Tests.Water;
using Xunit;

namespace ProbeCal.Core.Tests.CatalogueOfCore;

/// <summary>
/// The tables of docs/methods.md are made from the catalogue and from deviations measured here. Run with PROBECAL_UPDATE=1 to write them anew.
/// </summary>
public class MethodsDocumentTests
{
    private const string Begin = "<!-- made by the tests: begin -->";
    private const string End = "<!-- made by the tests: end -->";
    private const int Steps = 20;

    [Fact]
    public void The_tables_say_what_the_code_does()
    {
        string path = Path.Combine(Root(), "docs", "methods.md");
        string document = File.ReadAllText(path).ReplaceLineEndings("\n");
        int begin = document.IndexOf(Begin, StringComparison.Ordinal);
        int end = document.IndexOf(End, StringComparison.Ordinal);
        Assert.True(0 <= begin && begin < end, "the markers are gone from docs/methods.md");
        string made = Begin + "\n" + Section();
        if (Environment.GetEnvironmentVariable("PROBECAL_UPDATE") == "1")
        {
            File.WriteAllText(path, document[..begin] + made + document[end..]);
            return;
        }

        Assert.Equal(made, document[begin..end]);
    }

    private static string Section()
    {
        StringBuilder text = new();
        text.Append("""

            Each table has the default of the gas first. *Check values*: how many values from outside there are in `tests/ProbeCal.Core.Tests/CheckValues` and how far the worst is off, by the confidence of
            the row. *From the default*: lowest and highest distance over the temperatures and salinities that both equations take, at 1 atm, in air. *Taken as*: the relative standard uncertainty that the library
            uses at 20 °C in fresh water.


            """.ReplaceLineEndings("\n"));
        foreach (GasEntry gas in Catalogue.Gases)
        {
            text.Append(CultureInfo.InvariantCulture, $"#### {gas.Symbol}, {gas.Name}\n\n");
            text.Append("| equation | gives | range | stated accuracy; taken as | evidence | check values | from the default | use |\n|---|---|---|---|---|---|---|---|\n");
            foreach (SolubilityEntry entry in Catalogue.SolubilitiesOf(gas.Gas))
            {
                text.Append(CultureInfo.InvariantCulture, $"| {entry.Source.Name} | {entry.Quantity}, {entry.Unit} | {entry.Range} | {entry.StatedAccuracy}; {Taken(entry)} | {entry.Evidence.Words} | {Checked(entry)} | {FromDefault(entry)} | {(entry.IsDefault ? "**default**: " : "")}{entry.Why} |\n");
            }

            text.Append('\n');
        }

        text.Append("#### Water, vapour, salt and pressure\n\n| relation | gives | range | stated accuracy | evidence | check values | found | use |\n|---|---|---|---|---|---|---|---|\n");
        foreach (WaterEntry entry in Catalogue.Relations)
        {
            string gives = entry.Quantity + (entry.Unit.Length == 0 ? "" : ", " + entry.Unit);
            text.Append(CultureInfo.InvariantCulture, $"| {entry.Name} | {gives} | {entry.Range} | {entry.StatedAccuracy} | {entry.Evidence.Words} | {Checked(entry)} | {Found(entry)} | {entry.Use} |\n");
        }

        text.Append("\n#### Sources\n\nDOIs were not resolved.\n\n");
        IEnumerable<string> equations = Catalogue.Equations.Select(static entry => $"- **{entry.Name}**: {entry.Citation}, doi:{entry.Doi}");
        IEnumerable<string> relations = Catalogue.Relations.Select(static entry => $"- **{entry.Name}**: {entry.Citation}{(entry.Doi.Length == 0 ? "" : ", doi:`" + entry.Doi + "`")}");
        text.AppendJoin('\n', equations.Concat(relations).Distinct()).Append("\n\n");
        return text.ToString();
    }

    private static string Taken(SolubilityEntry entry)
    {
        Status status = GasUncertainty.EquationRelative(entry.Gas, entry.Equation, 20.0, 0.0, 1013.25, RangeRule.Refuse, out double relative);
        Assert.Equal(Status.Ok, status);
        return Percent(100.0 * relative) + " %";
    }

    private static string Checked(SolubilityEntry entry)
    {
        List<(string Confidence, double Percent)> found = [];
        foreach (CheckRow row in CheckRow.Read("gas-equations.csv", GasCheckValueTests.Rows))
        {
            if (GasCheckValueTests.Named(row["gas"]) == entry.Gas && row["equation"] == entry.Equation.ToString())
            {
                // A logarithm: its difference is the relative one of what it is the logarithm of.
                double expected = row.Number("expected");
                double difference = Math.Abs(GasCheckValueTests.Value(entry.Gas, entry.Equation, row) - expected);
                found.Add((row["confidence"], 100.0 * (row["unit"] == "ln(GPa)" ? difference : difference / Math.Abs(expected))));
            }
        }

        string function = entry.Equation switch
        {
            SolubilityEquation.BensonKrause1984 => "BensonKrause1984.MilligramsPerLitre",
            SolubilityEquation.GarciaGordon1992 => "GarciaGordon1992.MicromolesPerKilogram",
            _ => "none",
        };
        foreach (CheckRow row in CheckRow.Read("oxygen-equations.csv", 71).Where(row => row["function"] == function))
        {
            found.Add((row["confidence"], 100.0 * Math.Abs((OxygenCheckValueTests.Value(function, row) / row.Number("expected")) - 1.0)));
        }

        return Worst(found);
    }

    private static string Checked(WaterEntry entry)
    {
        switch (entry.Name)
        {
            case "lewis-1980":
                return Worst([.. Salinities().Where(static row => 2.0 <= row.Expected).Select(static row => (row.Confidence, row.Percent))]);
            case "hill-1986":
                return Worst([.. Salinities().Where(static row => row.Expected < 2.0).Select(static row => (row.Confidence, row.Percent))]);
            case "usgs-2020":
                return Worst([.. CheckRow.Read("field-manual-salinity-factor.csv", 1242).Select(static row => (row["confidence"], 100.0 * Math.Abs((Factor(row) / row.Number("factor")) - 1.0)))]);
            case "us-standard-atmosphere-1976":
                return Worst([.. CheckRow.Read("standard-atmosphere.csv", 9).Select(static row => (row["confidence"], 100.0 * Math.Abs((Standard(row) / row.Number("expected")) - 1.0)))]);
        }

        string function = entry.Name switch
        {
            "wagner-pruss-1993" => "VapourWagnerPruss1993",
            "benson-krause-1980" => "VapourBensonKrause1980",
            "hardy-1998" => "VapourHardy1998",
            "buck-1996" => "VapourBuck1996",
            "antoine-8111" => "VapourAntoine8111",
            "millero-poisson-1981" => "DensityEos80",
            "tanaka-2001" => "DensityTanaka2001",
            "kell-1975" => "DensityKell1975",
            _ => "",
        };
        return Worst([.. CheckRow.Read("water-properties.csv", 82).Where(row => row["function"] == function)
            .Select(row => (row["confidence"], 100.0 * Math.Abs((WaterCheckValueTests.Value(function, row) / row.Number("expected")) - 1.0)))]);
    }

    private static IEnumerable<(string Confidence, double Expected, double Percent)> Salinities()
    {
        foreach (CheckRow row in CheckRow.Read("practical-salinity.csv", 181))
        {
            double celsius = row["scale"] == "ipts68" ? TemperatureScale.Its90FromIpts68(row.Number("celsius")) : row.Number("celsius");
            PracticalSalinity.FromConductivity(
                row.Number("millisiemensPerCentimetre"), celsius, row.Number("decibar"), RangeRule.Extrapolate, out double salinity);
            double expected = row.Number("expected");
            yield return (row["confidence"], expected, expected == 0.0 ? Math.Abs(salinity) : 100.0 * Math.Abs((salinity / expected) - 1.0));
        }
    }

    /// <summary>What the manual tabulates: fresh-water solubility times this is that of water of the specific conductance.</summary>
    private static double Factor(CheckRow row)
    {
        Assert.Equal(Status.Ok, SpecificConductance.Salinity(row.Number("microsiemensPerCentimetre"), RangeRule.Refuse, out double salinity));
        Assert.Equal(Status.Ok, BensonKrause1984.MilligramsPerLitre(row.Number("celsius"), salinity, 1013.25, RangeRule.Refuse, out double salty));
        Assert.Equal(Status.Ok, BensonKrause1984.MilligramsPerLitre(row.Number("celsius"), 0.0, 1013.25, RangeRule.Refuse, out double fresh));
        return salty / fresh;
    }

    private static double Standard(CheckRow row)
    {
        const double EarthRadiusMetres = 6356766.0;
        double metres = row.Number("metres");
        double geometric = row["altitude"] == "geopotential" ? EarthRadiusMetres * metres / (EarthRadiusMetres - metres) : metres;
        Assert.Equal(Status.Ok, StandardAtmosphere.Pressure(geometric, out double hectopascal));
        return 100.0 * hectopascal;
    }

    private static string Worst(List<(string Confidence, double Percent)> found)
    {
        return found.Count == 0 ? "none" : string.Join("; ", found.GroupBy(static row => row.Confidence).Select(static group => string.Create(
            CultureInfo.InvariantCulture, $"{group.Count()} {Words(group.Key)}: ≤ {AtMost(group.Max(static row => row.Percent))} %")));
    }

    private static string Words(string confidence)
    {
        return confidence switch
        {
            "paper" => "read",
            "ported" => "second-hand",
            "memory" => "from memory",
            _ => confidence,
        };
    }

    private static string FromDefault(SolubilityEntry entry)
    {
        if (entry.IsDefault)
        {
            return "—";
        }

        SolubilityEntry standard = Catalogue.SolubilitiesOf(entry.Gas)[0];
        double usual = Catalogue.Gas(entry.Gas).DryAirMoleFraction;
        double fraction = double.IsNaN(usual) ? 1.0e-6 : usual;
        double highestSalinity = Math.Min(entry.HighestSalinity, standard.HighestSalinity);
        double lowest = double.PositiveInfinity;
        double highest = double.NegativeInfinity;
        foreach (double salinity in highestSalinity == 0.0 ? new[] { 0.0 } : [0.0, 0.5 * highestSalinity, highestSalinity])
        {
            double from = Math.Max(entry.LowestCelsius(salinity), standard.LowestCelsius(salinity));
            double to = Math.Min(entry.HighestCelsius, standard.HighestCelsius);
            for (int i = 0; i <= Steps; i++)
            {
                double celsius = i == Steps ? to : from + (i * (to - from) / Steps);
                Assert.Equal(Status.Ok, GasEquilibrium.MilligramsPerLitre(entry.Gas, entry.Equation, celsius, salinity, 1013.25, fraction, 100.0, RangeRule.Refuse, out double value));
                Assert.Equal(Status.Ok, GasEquilibrium.MilligramsPerLitre(standard.Gas, standard.Equation, celsius, salinity, 1013.25, fraction, 100.0, RangeRule.Refuse, out double reference));
                double percent = 100.0 * ((value / reference) - 1.0);
                lowest = Math.Min(lowest, percent);
                highest = Math.Max(highest, percent);
            }
        }

        return Between(lowest, highest);
    }

    /// <summary>Vapour against Wagner and Pruss in fresh water, density of pure water against Tanaka, both at 0–40 °C.</summary>
    private static string Found(WaterEntry entry)
    {
        VapourEquation? vapour = entry.Name switch
        {
            "benson-krause-1980" => VapourEquation.BensonKrause1980,
            "weiss-price-1980" => VapourEquation.WeissPrice1980,
            "dickson-2007" => VapourEquation.Dickson2007,
            "green-carritt-1967" => VapourEquation.GreenCarritt1967,
            "hardy-1998" => VapourEquation.Hardy1998,
            "buck-1981" => VapourEquation.Buck1981,
            "buck-1996" => VapourEquation.Buck1996,
            "sonntag-1990" => VapourEquation.Sonntag1990,
            "murray-1967" => VapourEquation.Murray1967,
            "antoine-8111" => VapourEquation.Antoine8111,
            _ => null,
        };
        if (vapour is VapourEquation equation)
        {
            return Over(celsius => 100.0 * ((Vapour(equation, celsius) / Vapour(VapourEquation.WagnerPruss1993, celsius)) - 1.0)) + " from wagner-pruss-1993 in fresh water";
        }

        return entry.Name switch
        {
            "millero-poisson-1981" => Over(static celsius => 100.0 * ((Density(celsius) / Tanaka(celsius)) - 1.0)) + " from tanaka-2001 in pure water",
            "kell-1975" => Over(static celsius => 100.0 * ((Kell(celsius) / Tanaka(celsius)) - 1.0)) + " from tanaka-2001",
            _ => "",
        };
    }

    private static string Over(Func<double, double> percent)
    {
        double[] found = [.. Enumerable.Range(0, 41).Select(celsius => percent(celsius))];
        return Between(found.Min(), found.Max());
    }

    private static double Vapour(VapourEquation equation, double celsius)
    {
        Assert.Equal(Status.Ok, VapourPressure.Hectopascal(equation, celsius, 0.0, RangeRule.Refuse, out double hectopascal));
        return hectopascal;
    }

    private static double Density(double celsius)
    {
        Assert.Equal(Status.Ok, DensityEos80.Density(celsius, 0.0, RangeRule.Refuse, out double density));
        return density;
    }

    private static double Tanaka(double celsius)
    {
        Assert.Equal(Status.Ok, DensityTanaka2001.Density(celsius, RangeRule.Refuse, out double density));
        return density;
    }

    private static double Kell(double celsius)
    {
        Assert.Equal(Status.Ok, DensityKell1975.Density(celsius, RangeRule.Refuse, out double density));
        return density;
    }

    private static string Between(double lowest, double highest)
    {
        return Signed(lowest) + " to " + Signed(highest) + " %";
    }

    private static string Signed(double percent)
    {
        string size = Percent(Math.Abs(percent));
        return size == "0" ? "0" : (percent < 0.0 ? "−" : "+") + size;
    }

    /// <summary>Two figures, in plain decimals to a ten-thousandth of a per cent: what is smaller is nothing here.</summary>
    private static string Percent(double percent)
    {
        if (percent < 0.0001)
        {
            return percent < 0.00005 ? "0" : "0.0001";
        }

        int decimals = Math.Clamp(1 - (int)Math.Floor(Math.Log10(percent)), 0, 4);
        return percent.ToString("0." + new string('#', decimals), CultureInfo.InvariantCulture);
    }

    /// <summary>The same, rounded up, so that nothing is larger than what is printed.</summary>
    private static string AtMost(double percent)
    {
        int decimals = percent < 0.001 ? 4 : Math.Clamp(1 - (int)Math.Floor(Math.Log10(percent)), 0, 4);
        double scale = Math.Pow(10.0, decimals);
        return Math.Max(1.0e-4, Math.Ceiling(percent * scale) / scale).ToString("0." + new string('#', decimals), CultureInfo.InvariantCulture);
    }

    private static string Root()
    {
        string? folder = AppContext.BaseDirectory;
        while (folder is not null && !File.Exists(Path.Combine(folder, "ProbeCal.sln")))
        {
            folder = Path.GetDirectoryName(folder);
        }

        return folder ?? throw new InvalidOperationException("the repository is not above the tests");
    }
}
