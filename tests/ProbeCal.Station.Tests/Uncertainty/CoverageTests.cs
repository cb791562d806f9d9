using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Core.Tests;
using ProbeCal.Station.Uncertainty;
using Xunit;
using Xunit.Abstractions;
using static ProbeCal.Station.Uncertainty.Distribution;

namespace ProbeCal.Station.Tests.Uncertainty;

/// <summary>
/// How often the 95 % intervals hold the truth. Truths are drawn from the distributions that the budget states and sent through Core's full model; the Monte Carlo interval
/// must hold 93–97 % of them, the analytic one at least 93 %. The generator of the truths is another one than the product's.
/// </summary>
/// <remarks>
/// Statistical allowance: the share of n truths inside an interval that holds 95 % is uncertain by √(0.95·0.05/n): 0.34 % at 4,000, so that the limits of 93 and 97 % are six of those away
/// and no allowance is added to them.
/// </remarks>
public class CoverageTests(ITestOutputHelper output)
{
    private const int OrdinaryTruths = 4_000;
    private const int FullTruths = 200_000;

    private static readonly Dictionary<string, Scenario> Scenarios = new()
    {
        ["lake, oxygen"] = new(Gas.Oxygen, 15.0, 0.1, Normal, 0.0, 0.0, 1000.0, 1.0, Normal),
        ["sea at 2 °C, oxygen"] = new(Gas.Oxygen, 2.0, 0.05, Normal, 35.0, 0.5, 1015.0, 1.0, Normal) { Equation = SolubilityEquation.GarciaGordon1992 },
        ["hot, thermometer by its limits, oxygen"] = new(Gas.Oxygen, 37.0, 0.5, Rectangular, 0.0, 0.0, 1000.0, 1.0, Normal),
        ["altitude only, oxygen"] = new(Gas.Oxygen, 12.0, 0.05, Normal, 0.0, 0.0, 938.0, 10.0, Normal),
        ["just below 0 °C, oxygen"] = new(Gas.Oxygen, -0.15, 0.05, Normal, 0.0, 0.0, 980.0, 1.0, Normal),
        ["temperature known to 3 K only, oxygen"] = new(Gas.Oxygen, 12.0, 3.0, Normal, 0.0, 0.0, 1000.0, 1.0, Normal),
        ["two rectangles alike, oxygen"] = new(Gas.Oxygen, 15.0, 0.3, Rectangular, 0.0, 0.0, 1000.0, 6.5, Rectangular),
        ["half-dry air over warm water, partial pressure of oxygen"] =
            new(Gas.Oxygen, 35.0, 0.1, Normal, 0.0, 0.0, 1000.0, 1.0, Normal) { HumidityPercent = 50.0, UHumidity = 28.9, HumidityIs = Rectangular, PartialPressure = true },
        ["brackish, nitrogen"] = new(Gas.Nitrogen, 20.0, 0.2, Normal, 15.0, 1.0, 1000.0, 3.0, Normal),
        ["barometer of a weather service, argon"] = new(Gas.Argon, 5.0, 0.02, Normal, 33.0, 0.1, 1000.0, 2.89, Rectangular),
        ["warm sea, neon"] = new(Gas.Neon, 28.0, 0.5, Normal, 30.0, 1.0, 1010.0, 1.0, Normal),
        ["cold sea, helium"] = new(Gas.Helium, 1.0, 0.5, Normal, 35.0, 0.5, 1010.0, 1.0, Normal),
        ["air of unknown carbon dioxide"] = new(Gas.CarbonDioxide, 10.0, 0.1, Normal, 35.0, 0.2, 1013.0, 1.0, Normal) { MoleFraction = 4.25e-4, UMoleFraction = 2.9e-5, MoleFractionIs = Rectangular },
        ["partial pressure of carbon dioxide"] = new(Gas.CarbonDioxide, 30.0, 0.2, Normal, 0.0, 0.0, 950.0, 1.0, Normal) { MoleFraction = 4.25e-4, UMoleFraction = 5.0e-6, PartialPressure = true },
        ["stream, nitrous oxide"] = new(Gas.NitrousOxide, 18.0, 0.2, Normal, 0.5, 0.05, 990.0, 1.0, Normal) { MoleFraction = 3.38e-7, UMoleFraction = 2.0e-9 },
        ["pond, methane"] = new(Gas.Methane, 25.0, 0.3, Normal, 0.0, 0.0, 1000.0, 1.0, Normal) { MoleFraction = 2.0e-6, UMoleFraction = 1.0e-7 },
        ["equation dominates, sulfur hexafluoride"] = new(Gas.SulfurHexafluoride, 15.0, 0.1, Normal, 30.0, 0.2, 1000.0, 1.0, Normal) { MoleFraction = 1.1e-11, UMoleFraction = 1.0e-13 },
        ["two figures only, hydrogen sulfide"] = new(Gas.HydrogenSulfide, 20.0, 0.5, Normal, 0.0, 0.0, 1000.0, 1.0, Normal) { MoleFraction = 1.0e-3, UMoleFraction = 2.0e-5 },
    };

    public static TheoryData<string> Names => [.. Scenarios.Keys];

    [Theory]
    [MemberData(nameof(Names))]
    public void Intervals_HoldTheTruthAsOftenAsTheySay(string name)
    {
        Scenario scenario = Scenarios[name];
        UncertaintyBudget budget = scenario.Budget();
        Campaign campaign = new(output, "coverage " + name, OrdinaryTruths, FullTruths);
        MonteCarloResult result = MonteCarlo.Run(budget, scenario.Model, campaign.Count == FullTruths ? MonteCarlo.UsualTrials : 25 * OrdinaryTruths, new Random(campaign.Seed + 1));

        int inMonteCarlo = 0;
        int inAnalytic = 0;
        double[] truth = new double[budget.Contributions.Count];
        for (int i = 0; i < campaign.Count; i++)
        {
            for (int j = 0; j < truth.Length; j++)
            {
                UncertaintyContribution c = budget.Contributions[j];
                truth[j] = c.Estimate + (c.StandardUncertainty * Deviate(campaign.Random, c.Distribution));
            }

            double value = scenario.Model(truth);
            Assert.True(double.IsFinite(value));
            inMonteCarlo += result.Low <= value && value <= result.High ? 1 : 0;
            inAnalytic += budget.Low <= value && value <= budget.High ? 1 : 0;
        }

        double monteCarlo = (double)inMonteCarlo / campaign.Count;
        double analytic = (double)inAnalytic / campaign.Count;
        UncertaintyContribution largest = budget.Contributions.MaxBy(static c => c.Share)!;
        campaign.Say($"{budget.Value:G6} {budget.Unit}, u {budget.StandardUncertainty:G4} (trials {result.StandardDeviation:G4}), k {budget.CoverageFactor:F3}, most from {largest.Name} ({100.0 * largest.Share:F0} %, {largest.Distribution}); Monte Carlo [{result.Low:G6}, {result.High:G6}] holds {100.0 * monteCarlo:F2} %, analytic [{budget.Low:G6}, {budget.High:G6}] holds {100.0 * analytic:F2} %");
        campaign.Close();
        Assert.InRange(monteCarlo, 0.93, 0.97);
        Assert.InRange(analytic, 0.93, 1.0);
        Assert.Equal(0, result.Refused);
    }

    /// <summary>The other way round, as in practice: what was measured lies about a truth, and the budget is made from what was measured alone.</summary>
    [Theory]
    [MemberData(nameof(Names))]
    public void AnalyticInterval_MadeFromWhatWasMeasured_HoldsTheTruth(string name)
    {
        Scenario truth = Scenarios[name];
        UncertaintyBudget stated = truth.Budget();
        double[] inputs = [.. stated.Contributions.Select(static c => c.Estimate)];
        Campaign campaign = new(output, "coverage from measured values " + name, OrdinaryTruths, FullTruths);
        int inside = 0;
        for (int i = 0; i < campaign.Count; i++)
        {
            double[] measured = [.. stated.Contributions.Select(c => c.Estimate + (c.StandardUncertainty * Deviate(campaign.Random, c.Distribution)))];
            UncertaintyBudget budget = (truth with
            {
                Celsius = measured[0],
                Salinity = Math.Max(0.0, measured[1]),
                Hectopascal = measured[2],
                MoleFraction = measured[3],
                HumidityPercent = Math.Clamp(measured[4], 0.0, 100.0),
            }).Budget();
            // The equation's error belongs to the truth, and is as large as the budget believes: near the edge of a range that depends on what was measured.
            double value = truth.Value * (1.0 + (budget.Contributions[^1].StandardUncertainty * Deviate(campaign.Random, Normal)));
            inside += budget.Low <= value && value <= budget.High ? 1 : 0;
        }

        double coverage = (double)inside / campaign.Count;
        campaign.Say($"analytic interval holds {100.0 * coverage:F2} %");
        campaign.Close();
        Assert.InRange(coverage, 0.93, 1.0);
    }

    private static double Deviate(Random random, Distribution distribution)
    {
        // 1 − NextDouble keeps the logarithm away from zero.
        return distribution == Normal
            ? Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble())
            : Math.Sqrt(3.0) * ((2.0 * random.NextDouble()) - 1.0);
    }

    /// <summary>One water under one gas phase, with how well each is known.</summary>
    private sealed record Scenario(
        Gas Gas, double Celsius, double UCelsius, Distribution CelsiusIs, double Salinity, double USalinity, double Hectopascal, double UHectopascal, Distribution HectopascalIs)
    {
        internal SolubilityEquation Equation { get; init; } = GasDefaults.Equation(Gas);

        internal double MoleFraction { get; init; } = DryAir.MoleFraction(Gas);

        internal double UMoleFraction { get; init; }

        internal Distribution MoleFractionIs { get; init; }

        internal double HumidityPercent { get; init; } = 100.0;

        internal double UHumidity { get; init; }

        internal Distribution HumidityIs { get; init; }

        /// <summary>True for the partial pressure in hPa; else mg/L.</summary>
        internal bool PartialPressure { get; init; }

        internal double Value => Model([Celsius, Salinity, Hectopascal, MoleFraction, HumidityPercent, 1.0]);

        internal UncertaintyBudget Budget()
        {
            double t;
            double s;
            double p;
            double x;
            double h;
            double equation = 0.0;
            // Where what was measured lies outside a range, the budget is made all the same.
            const RangeRule Rule = RangeRule.Extrapolate;
            Status status = PartialPressure
                ? GasEquilibrium.PartialPressureSensitivities(Gas, Celsius, Salinity, Hectopascal, MoleFraction, HumidityPercent, Rule, out t, out s, out p, out x, out h)
                : GasEquilibrium.MilligramsPerLitreSensitivities(Gas, Equation, Celsius, Salinity, Hectopascal, MoleFraction, HumidityPercent, Rule, out t, out s, out p, out x, out h);
            Assert.True(double.IsFinite(t), status.ToString());
            if (!PartialPressure)
            {
                GasUncertainty.EquationRelative(Gas, Equation, Celsius, Salinity, Hectopascal, Rule, out equation);
            }

            double value = Value;
            return UncertaintyBudget.Of(value, PartialPressure ? "hPa" : "mg/L",
            [
                new("temperature", "K", Celsius, UCelsius, CelsiusIs, t),
                new("salinity", "", Salinity, USalinity, Normal, s),
                new("pressure", "hPa", Hectopascal, UHectopascal, HectopascalIs, p),
                new("mole fraction", "", MoleFraction, UMoleFraction, MoleFractionIs, x),
                new("humidity", "%", HumidityPercent, UHumidity, HumidityIs, h),
                new("equation", "", 1.0, equation, Normal, value),
            ]);
        }

        internal double Model(ReadOnlySpan<double> inputs)
        {
            double value;
            if (PartialPressure)
            {
                GasEquilibrium.PartialPressure(Gas, inputs[0], inputs[1], inputs[2], inputs[3], inputs[4], RangeRule.Extrapolate, out value);
            }
            else
            {
                GasEquilibrium.MilligramsPerLitre(Gas, Equation, inputs[0], inputs[1], inputs[2], inputs[3], inputs[4], RangeRule.Extrapolate, out value);
            }

            return value * inputs[5];
        }
    }
}
