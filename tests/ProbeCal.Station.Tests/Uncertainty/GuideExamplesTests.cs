using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Core.Tests.Gases;
using ProbeCal.Station.Uncertainty;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Station.Tests.Uncertainty;

/// <summary>The worked examples of JCGM 100 and 101 by the project's own budget and Monte Carlo: CheckValues/jcgm-examples.csv.</summary>
public class GuideExamplesTests(ITestOutputHelper output)
{
    private const int Seed = 20081;

    private static readonly List<CheckRow> Rows = CheckRow.Read("jcgm-examples.csv", 17);

    /// <summary>l = ls + d − ls·(δα·θ + αs·δθ), lengths in nm.</summary>
    [Fact]
    public void EndGauge_HasItsPublishedBudget()
    {
        UncertaintyBudget budget = EndGauge();
        Check("H.1", "value", budget.Value);
        Check("H.1", "u", budget.StandardUncertainty);
        Check("H.1", "part ls", budget.Contributions[0].Part);
        Check("H.1", "part dtheta", -budget.Contributions[5].Part);
        Check("H.1", "part dalpha", budget.Contributions[4].Part);
        Check("H.1", "effective", budget.EffectiveDegreesOfFreedom);
        Check("H.1", "k99", budget.FactorFor(0.99));
        Check("H.1", "U99", budget.FactorFor(0.99) * budget.StandardUncertainty);
    }

    /// <summary>The guide adds the second-order terms by hand; the full model has them of itself.</summary>
    [Fact]
    public void EndGauge_OfTheFullModelHasTheSecondOrder()
    {
        MonteCarloResult full = MonteCarlo.Run(EndGauge(), static x => x[0] + x[1] - (x[0] * ((x[4] * x[3]) + (x[2] * x[5]))), MonteCarlo.UsualTrials, new Random(Seed));
        output.WriteLine($"seed {Seed}: u {full.StandardDeviation:F2} nm");
        Check("H.1", "second", full.StandardDeviation);
    }

    [Theory]
    [InlineData("9.2.2", false, 1.0)]
    [InlineData("9.2.3", true, 1.0)]
    [InlineData("9.2.4", true, 10.0)]
    public void TheAdditiveModel_HasItsPublishedInterval(string example, bool rectangular, double last)
    {
        Distribution distribution = rectangular ? Distribution.Rectangular : Distribution.Normal;
        UncertaintyContribution[] inputs =
            [.. Enumerable.Range(1, 4).Select(i => new UncertaintyContribution("X" + i, "", 0.0, i == 4 ? last : 1.0, distribution, 1.0))];
        MonteCarloResult result = MonteCarlo.Run(UncertaintyBudget.Of(0.0, "", inputs), static x => x[0] + x[1] + x[2] + x[3], MonteCarlo.UsualTrials, new Random(Seed));
        output.WriteLine($"{example}, seed {Seed}: u {result.StandardDeviation:F4}, [{result.Low:F3}, {result.High:F3}]");
        Check(example, "u", result.StandardDeviation);
        Check(example, "end", result.High);
        Check(example, "end", -result.Low);
    }

    /// <summary>δm = (mR + δR)·[1 + (ρa − 1.2)(1/ρW − 1/ρR)] − 100 g: a product of three that are rectangular, which no first-order budget sees.</summary>
    [Fact]
    public void TheWeight_HasItsPublishedUncertainty()
    {
        double third = 1.0 / Math.Sqrt(3.0);
        UncertaintyContribution[] inputs =
        [
            new("mR", "mg", 100_000.0, 0.050, Distribution.Normal, 1.0),
            new("dR", "mg", 1.234, 0.020, Distribution.Normal, 1.0),
            new("air", "kg/m3", 1.20, 0.10 * third, Distribution.Rectangular, 0.0),
            new("weight", "kg/m3", 8000.0, 1000.0 * third, Distribution.Rectangular, 0.0),
            new("reference", "kg/m3", 8000.0, 50.0 * third, Distribution.Rectangular, 0.0),
        ];
        MonteCarloResult result = MonteCarlo.Run(
            UncertaintyBudget.Of(1.234, "mg", inputs),
            static x => ((x[0] + x[1]) * (1.0 + ((x[2] - 1.2) * ((1.0 / x[3]) - (1.0 / x[4]))))) - 100_000.0,
            MonteCarlo.UsualTrials, new Random(Seed));
        output.WriteLine($"seed {Seed}: {result.Mean:F4}, u {result.StandardDeviation:F4}, [{result.Low:F4}, {result.High:F4}]");
        Check("9.3", "value", result.Mean);
        Check("9.3", "u", result.StandardDeviation);
    }

    /// <summary>Table G.2 of JCGM 100, t for 95 %, from memory: 12.71, 4.30, 2.23, 2.09, 1.96; upper 5 % points of chi-squared and F from any table.</summary>
    [Fact]
    public void Quantiles_AreThoseOfTheTables()
    {
        Assert.Equal([12.71, 4.30, 2.23, 2.09, 1.96], new[] { 1.0, 2.0, 10.0, 20.0, double.PositiveInfinity }.Select(static dof => Math.Round(Quantiles.StudentHalfWidth(0.95, dof), 2)));
        Assert.Equal(0.05, Quantiles.ChiSquaredAbove(3.841, 1), 5e-5);
        Assert.Equal(0.05, Quantiles.ChiSquaredAbove(18.307, 10), 5e-5);
        Assert.Equal(0.05, Quantiles.FisherAbove(4.96, 1, 10), 5e-4);
        Assert.Equal(0.05, Quantiles.FisherAbove(3.33, 5, 10), 5e-4);
    }

    /// <summary>Welch and Satterthwaite by hand: parts 3 and 4 with 9 and 4 degrees of freedom: 5⁴/(3⁴/9 + 4⁴/4) = 625/73.</summary>
    [Fact]
    public void EffectiveDegreesOfFreedom_ByHand()
    {
        UncertaintyBudget budget = UncertaintyBudget.Of(0.0, "",
            [new("a", "", 0.0, 3.0, Distribution.Normal, 1.0) { DegreesOfFreedom = 9 }, new("b", "", 0.0, 4.0, Distribution.Normal, 1.0) { DegreesOfFreedom = 4 }]);
        Assert.Equal(625.0 / 73.0, budget.EffectiveDegreesOfFreedom, 1e-12);
        // t for 8 degrees of freedom, 95 %: 2.306.
        Assert.Equal(2.306, budget.CoverageFactor, 5e-4);
        Assert.Throws<ArgumentException>(static () => UncertaintyBudget.Of(0.0, "", [new("a", "", 0.0, 3.0, Distribution.Normal, 1.0) { DegreesOfFreedom = 0 }]));
    }

    private static UncertaintyBudget EndGauge()
    {
        const double Standard = 50_000_623.0;
        UncertaintyContribution[] inputs =
        [
            new("ls", "nm", Standard, 25.0, Distribution.Normal, 1.0) { DegreesOfFreedom = 18 },
            new("d", "nm", 215.0, 9.7, Distribution.Normal, 1.0) { DegreesOfFreedom = 25.6 },
            new("alphas", "1/K", 11.5e-6, 1.2e-6, Distribution.Rectangular, 0.0),
            new("theta", "K", -0.1, 0.41, Distribution.Normal, 0.0),
            new("dalpha", "1/K", 0.0, 0.58e-6, Distribution.Rectangular, Standard * 0.1) { DegreesOfFreedom = 50 },
            new("dtheta", "K", 0.0, 0.029, Distribution.Rectangular, -Standard * 11.5e-6) { DegreesOfFreedom = 2 },
        ];
        return UncertaintyBudget.Of(Standard + 215.0, "nm", inputs);
    }

    private static void Check(string example, string quantity, double found)
    {
        CheckRow row = Assert.Single(Rows, row => row["example"] == example && row["quantity"] == quantity);
        Assert.True(Math.Abs(found - row.Number("expected")) <= row.Number("tolerance"), $"{row}: {found:R}");
    }
}
