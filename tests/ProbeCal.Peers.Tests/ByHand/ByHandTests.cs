using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text.Json;
using System.Threading.Tasks;
using ProbeCal.Peers.Tests.Parts;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Peers.Tests.ByHand;

/// <summary>Every gas by every equation, worked out once more outside the library (by_hand.py, formulas and coefficients of its own).</summary>
public class ByHandTests(ITestOutputHelper output)
{
    private const int DefaultSeed = 20260412;
    private static readonly int CountPerPair = Environment.GetEnvironmentVariable("PROBECAL_FULL") == "1" ? 500 : 20;
    private static readonly int Seed =
        int.TryParse(Environment.GetEnvironmentVariable("PROBECAL_SEED"), NumberStyles.Integer, CultureInfo.InvariantCulture, out int seed) ? seed : DefaultSeed;

    /// <summary>
    /// Values agree to rounding, units too where the molar masses are printed alike; uncertainties to what a difference quotient is good for. Molar masses come from rounded atomic
    /// weights on either side and differ in the last printed digit: 2e-6.
    /// </summary>
    [SkippableFact]
    public void EveryGasByEveryEquation_ComesOutByHand()
    {
        ByHandScript.Require();
        Random random = new(Seed);
        List<(SolubilityEntry Pair, ByHandCase Case)> cases = [.. Catalogue.Solubilities.SelectMany(pair =>
            Enumerable.Range(0, CountPerPair).Select(i => (pair, Draw(pair, random))))];
        List<ByHandAnswer> answers = ByHandScript.Ask([.. cases.Select(static c => c.Case)]);
        Dictionary<string, double> worst = [];
        for (int i = 0; i < cases.Count; i++)
        {
            (SolubilityEntry pair, ByHandCase c) = cases[i];
            Assert.Equal(Status.Ok, GasEquilibrium.MilligramsPerLitre(
                pair.Gas, pair.Equation, c.Celsius, c.Salinity, c.Hectopascal, c.MoleFraction, c.HumidityPercent, RangeRule.Refuse, out double milligrams));
            Assert.Equal(Status.Ok, GasEquilibrium.PartialPressure(
                pair.Gas, c.Celsius, c.Salinity, c.Hectopascal, c.MoleFraction, c.HumidityPercent, RangeRule.Refuse, out double partial));
            GasEquilibrium.MilligramsPerLitreSensitivities(
                pair.Gas, pair.Equation, c.Celsius, c.Salinity, c.Hectopascal, c.MoleFraction, c.HumidityPercent, RangeRule.Refuse,
                out double t, out double s, out double p, out _, out _);
            GasUncertainty.Combined(t * c.UCelsius, s * c.USalinity, p * c.UHectopascal, 0.0, 0.0, milligrams * c.UEquation, out double u);
            GasEquilibrium.PartialPressureSensitivities(
                pair.Gas, c.Celsius, c.Salinity, c.Hectopascal, c.MoleFraction, c.HumidityPercent, RangeRule.Refuse,
                out double partialT, out double partialS, out double partialP, out _, out _);
            GasUncertainty.Combined(partialT * c.UCelsius, partialS * c.USalinity, partialP * c.UHectopascal, 0.0, 0.0, 0.0, out double uPartial);
            DensityEos80.Density(c.Celsius, c.Salinity, RangeRule.Extrapolate, out double density);
            double micromoles = GasUnits.MicromolesPerLitreFromMilligramsPerLitre(pair.Gas, milligrams);

            ByHandAnswer hand = answers[i];
            Compare(worst, "partial pressure", partial, hand.PartialHectopascal, 1.0e-12, c);
            Compare(worst, "mg/L", milligrams, hand.MilligramsPerLitre, 2.0e-6, c);
            Compare(worst, "µmol/L", micromoles, hand.MicromolesPerLitre, 1.0e-12 + (IsMass(pair) ? 2.0e-6 : 0.0), c);
            Compare(worst, "µmol/kg", micromoles * 1000.0 / density, hand.MicromolesPerKilogram, 1.0e-12 + (IsMass(pair) ? 2.0e-6 : 0.0), c);
            Compare(worst, "mL/L", GasUnits.MillilitresPerLitreFromMilligramsPerLitre(pair.Gas, milligrams), hand.MillilitresPerLitre, 2.0e-6, c);
            Compare(worst, "u of mg/L", u, hand.MilligramsUncertainty, 1.0e-4, c);
            Compare(worst, "u of partial pressure", uPartial, hand.PartialUncertainty, 1.0e-6, c);
        }

        output.WriteLine($"{cases.Count} conditions, {Catalogue.Solubilities.Count} pairs of gas and equation, seed {Seed}");
        foreach ((string quantity, double difference) in worst)
        {
            output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{quantity}: {difference:E1} at most, relative"));
        }
    }

    /// <summary>
    /// The same with the real program: what it prints as JSON for each gas by its default, for each equation and above 1.1 atm, field by field, its standard uncertainties too.
    /// </summary>
    [SkippableFact]
    public async Task WhatTheProgramPrints_ComesOutByHand()
    {
        ByHandScript.Require();
        HashSet<SolubilityEquation> seen = [];
        List<(SolubilityEntry Pair, ByHandCase Case)> cases = [];
        Random random = new(Seed);
        foreach (SolubilityEntry pair in Catalogue.Solubilities.OrderByDescending(static pair => pair.IsDefault))
        {
            if (pair.IsDefault | seen.Add(pair.Equation)) { cases.Add((pair, Rounded(Draw(pair, random)))); }
        }

        foreach (SolubilityEntry pair in Catalogue.Solubilities.Where(static pair => pair.IsDefault && 2000.0 < pair.HighestHectopascal))
        {
            cases.Add((pair, Rounded(Draw(pair, random)) with { Hectopascal = 3300.0 }));
        }

        List<JsonElement> printed = [];
        foreach ((SolubilityEntry _, ByHandCase c) in cases) { printed.Add(await PrintedAsync(c)); }

        // What the program takes the equation to be good for goes into the script: it is a statement, not a computation.
        List<ByHandAnswer> answers = ByHandScript.Ask(
            [.. cases.Zip(printed, static (c, json) => c.Case with { UEquation = json.GetProperty("standardUncertainty").GetProperty("equationRelative").GetDouble() })]);
        Dictionary<string, double> worst = [];
        for (int i = 0; i < cases.Count; i++)
        {
            (SolubilityEntry pair, ByHandCase c) = cases[i];
            JsonElement json = printed[i];
            ByHandAnswer hand = answers[i];
            JsonElement u = json.GetProperty("standardUncertainty");
            double mass = IsMass(pair) ? 2.0e-6 : 0.0;
            Compare(worst, "vapourPressureHPa", json.GetProperty("vapourPressureHPa").GetDouble(), hand.VapourHectopascal, 1.0e-11, c);
            Compare(worst, "partialPressureHPa", json.GetProperty("partialPressureHPa").GetDouble(), hand.PartialHectopascal, 1.0e-12, c);
            Compare(worst, "mgPerL", json.GetProperty("mgPerL").GetDouble(), hand.MilligramsPerLitre, 2.0e-6, c);
            Compare(worst, "umolPerL", json.GetProperty("umolPerL").GetDouble(), hand.MicromolesPerLitre, 1.0e-12 + mass, c);
            Compare(worst, "umolPerKg", json.GetProperty("umolPerKg").GetDouble(), hand.MicromolesPerKilogram, 1.0e-12 + mass, c);
            Compare(worst, "mLPerL", json.GetProperty("mLPerL").GetDouble(), hand.MillilitresPerLitre, 2.0e-6, c);
            Compare(worst, "u of mgPerL", u.GetProperty("mgPerL").GetDouble(), hand.MilligramsUncertainty, 1.0e-4, c);
            // The vapour formula's own 0.14 %, which the documents state, is added here.
            double formula = 0.0014 * c.MoleFraction * c.HumidityPercent / 100.0 * hand.VapourHectopascal;
            Compare(worst, "u of partialPressureHPa", u.GetProperty("partialPressureHPa").GetDouble(), double.Hypot(hand.PartialUncertainty, formula), 1.0e-6, c);
        }

        output.WriteLine($"{cases.Count} runs of the program, seed {Seed}");
        foreach ((string quantity, double difference) in worst)
        {
            output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{quantity}: {difference:E1} at most, relative"));
        }
    }

    /// <summary>The catalogue tells people the unit of the equation; the coefficient file of the script names the one that it computes with.</summary>
    [Fact]
    public void TheCatalogue_NamesTheUnitOfTheCoefficients()
    {
        Dictionary<string, string> unit = File.ReadLines(Path.Combine(AppContext.BaseDirectory, "ByHand", "coefficients.csv"))
            .Where(static line => line[0] != '#').Skip(1).Select(static line => line.Split(','))
            .ToDictionary(static f => f[0] + " " + f[1], static f => f[4]);
        Assert.Equal(Catalogue.Solubilities.Count, unit.Count);
        foreach (SolubilityEntry pair in Catalogue.Solubilities)
        {
            string plain = pair.Unit.Replace('µ', 'u').Replace('·', ' ').Replace("m³", "m3", StringComparison.Ordinal);
            string expected = unit[Catalogue.Gas(pair.Gas).Symbol + " " + pair.Source.Name] switch { "bunsen" => "L/(L atm)", "Pa" => "1/Pa", string other => other };
            Assert.True(plain == expected, $"{pair.Gas}, {pair.Source.Name}: the catalogue says {pair.Unit}, the coefficients are for {expected}");
        }
    }

    private static async Task<JsonElement> PrintedAsync(ByHandCase c)
    {
        static string Text(double value, string unit = "") => value.ToString("F9", CultureInfo.InvariantCulture).TrimEnd('0').TrimEnd('.') + unit;

        string[] arguments =
        [
            "equilibrium", "--gas", c.Gas, "--equation", c.Equation, "--temperature", Text(c.Celsius), "--salinity", Text(c.Salinity), "--pressure", Text(c.Hectopascal, "hPa"),
            "--mole-fraction", Text(c.MoleFraction), "--humidity", Text(c.HumidityPercent, "%"), "--temperature-uncertainty", Text(c.UCelsius, "K"),
            "--salinity-uncertainty", Text(c.USalinity), "--pressure-uncertainty", Text(c.UHectopascal, "hPa"), "--format", "json",
        ];
        using OutsideProcess program = Programs.ProbeCal(arguments);
        Assert.True(await program.ExitCodeAsync(TimeSpan.FromMinutes(2)) == 0, string.Join(' ', arguments) + "\n" + program.Tail());
        using JsonDocument document = JsonDocument.Parse(string.Join('\n', program.Output()));
        return document.RootElement.Clone();
    }

    /// <summary>Numbers as a person types them, moved inwards so that none leaves its range.</summary>
    private static ByHandCase Rounded(ByHandCase c)
    {
        return c with
        {
            Celsius = Math.Sign(c.Celsius) * Math.Floor(Math.Abs(c.Celsius) * 100.0) / 100.0,
            Salinity = Math.Floor(c.Salinity * 100.0) / 100.0,
            Hectopascal = Math.Min(1114.0, Math.Ceiling(c.Hectopascal * 10.0) / 10.0),
            MoleFraction = Math.Ceiling(c.MoleFraction * 1.0e6) / 1.0e6,
            HumidityPercent = Math.Floor(c.HumidityPercent * 10.0) / 10.0,
        };
    }

    /// <summary>Where the equation counts moles, moles agree to rounding; where it counts mass or gas volume the molar mass is in between.</summary>
    private static bool IsMass(SolubilityEntry pair)
    {
        return !pair.Unit.Contains("mol", StringComparison.Ordinal);
    }

    private static ByHandCase Draw(SolubilityEntry pair, Random random)
    {
        double salinity = random.NextDouble() < 0.3 ? 0.0 : pair.HighestSalinity * random.NextDouble();
        double lowest = Math.Max(pair.LowestCelsius(salinity), GasEquilibrium.LowestCelsius);
        double celsius = lowest + ((pair.HighestCelsius - lowest) * random.NextDouble());
        // Half of the gases with fugacity data above 1.1 atm.
        double highest = random.NextDouble() < 0.5 ? pair.HighestHectopascal : 1114.0;
        double pressure = GasEquilibrium.LowestHectopascal + ((highest - GasEquilibrium.LowestHectopascal) * random.NextDouble());
        double fraction = random.NextDouble() < 0.5 && !double.IsNaN(DryAir.MoleFraction(pair.Gas)) ? DryAir.MoleFraction(pair.Gas) : random.NextDouble();
        return new ByHandCase(
            Catalogue.Gas(pair.Gas).Symbol, pair.Source.Name, celsius, salinity, pressure, fraction, 100.0 * random.NextDouble(),
            0.1, salinity == 0.0 ? 0.0 : 0.2, 1.5, 0.002);
    }

    private static void Compare(Dictionary<string, double> worst, string quantity, double actual, double expected, double relative, ByHandCase at)
    {
        double difference = expected == 0.0 ? Math.Abs(actual) : Math.Abs((actual / expected) - 1.0);
        Assert.True(difference <= relative, string.Create(CultureInfo.InvariantCulture, $"{quantity}: {actual:R}, by hand {expected:R} ({difference:E2}) at {at.Line()}"));
        worst[quantity] = Math.Max(difference, worst.GetValueOrDefault(quantity));
    }
}
