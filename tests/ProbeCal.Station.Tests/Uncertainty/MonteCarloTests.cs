using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using ProbeCal.Core.Tests;
using ProbeCal.Station.Uncertainty;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Station.Tests.Uncertainty;

/// <summary>The propagation of distributions against the worked examples of JCGM 101:2008 and JCGM 100:2008, recalled from memory.</summary>
public class MonteCarloTests(ITestOutputHelper output)
{
    private const int Ordinary = 200_000;
    private const int Full = 4_000_000;

    /// <summary>
    /// JCGM 101:2008, 9.2 (from memory): four inputs of mean 0 added up. Their standard uncertainties, whether they are normal, and the printed u and
    /// half-width of the 95 % interval; the tolerances are half the last printed digit.
    /// </summary>
    [Theory]
    [InlineData("9.2.2, normal", true, 1.0, 2.00, 0.005, 3.92, 0.005)]
    [InlineData("9.2.3, rectangular", false, 1.0, 2.00, 0.005, 3.88, 0.005)]
    [InlineData("9.2.4, rectangular, one of them 10", false, 10.0, 10.1, 0.05, 17.0, 0.05)]
    public void Jcgm101_AdditiveModel(string example, bool normal, double last, double u, double uTolerance, double half, double halfTolerance)
    {
        Distribution distribution = normal ? Distribution.Normal : Distribution.Rectangular;
        UncertaintyBudget budget = UncertaintyBudget.Of(0.0, "", [.. new[] { 1.0, 1.0, 1.0, last }.Select((s, i) => Input("x" + i, 0.0, s, distribution, 1.0))]);
        Campaign campaign = new(output, "jcgm101 " + example, Ordinary, Full);
        MonteCarloResult result = MonteCarlo.Run(budget, static x => x[0] + x[1] + x[2] + x[3], campaign.Count, campaign.Random);
        campaign.Say($"analytic {budget.StandardUncertainty:F4} [{budget.Low:F4}, {budget.High:F4}] k {budget.CoverageFactor:F4}; Monte Carlo {result.StandardDeviation:F4} [{result.Low:F4}, {result.High:F4}]");
        campaign.Close();

        // Standard errors: of a deviation u/√(2n); of a 2.5 % quantile √(0.025·0.975/n) over a density that is 0.058/u or more there.
        double noise = 5.0 * result.StandardDeviation / Math.Sqrt(campaign.Count);
        Assert.Equal(0, result.Refused);
        Assert.InRange(result.Mean, -noise, noise);
        Assert.Equal(u, budget.StandardUncertainty, uTolerance);
        Assert.Equal(u, result.StandardDeviation, uTolerance + noise);
        Assert.Equal(half, result.High, halfTolerance + (2.7 * noise));
        Assert.Equal(-half, result.Low, halfTolerance + (2.7 * noise));
        if (last == 10.0)
        {
            // The analytic interval takes its k from the dominant rectangle; with 1.96 it would reach 19.9.
            Assert.Equal(half, budget.High, halfTolerance);
            Assert.Equal("x3 (rectangular) makes 97 % of the variance: the interval takes k = 1.67 from its distribution; with the usual k = 1.96 it would be too wide", budget.Note);
        }
        else
        {
            Assert.Equal(3.92, budget.High, 0.005);
            Assert.Null(budget.Note);
        }
    }

    /// <summary>
    /// JCGM 101:2008, 9.3 (from memory): calibration of a mass, deviation from 100 g in mg. The first-order budget misses the term in which two inputs of
    /// sensitivity zero meet (0.0539); the trials do not: 1.2341, u 0.0754, [1.0834, 1.3825].
    /// </summary>
    [Fact]
    public void Jcgm101_MassCalibration()
    {
        const double Root3 = 1.7320508075688772;
        UncertaintyBudget budget = UncertaintyBudget.Of(1.234, "mg",
        [
            Input("reference mass", 100_000.0, 0.050, Distribution.Normal, 1.0),
            Input("added mass", 1.234, 0.020, Distribution.Normal, 1.0),
            Input("density of air", 1.20, 0.10 / Root3, Distribution.Rectangular, 0.0),
            Input("density of the weight", 8000.0, 1000.0 / Root3, Distribution.Rectangular, 0.0),
            Input("density of the reference", 8000.0, 50.0 / Root3, Distribution.Rectangular, 0.0),
        ]);
        Campaign campaign = new(output, "jcgm101 9.3", Ordinary, Full);
        MonteCarloResult result = MonteCarlo.Run(
            budget, static x => ((x[0] + x[1]) * (1.0 + ((x[2] - 1.2) * ((1.0 / x[3]) - (1.0 / x[4]))))) - 100_000.0, campaign.Count, campaign.Random);
        campaign.Say($"analytic {budget.StandardUncertainty:F4}; Monte Carlo {result.Mean:F4}, {result.StandardDeviation:F4} [{result.Low:F4}, {result.High:F4}]");
        campaign.Close();

        double noise = 5.0 * result.StandardDeviation / Math.Sqrt(campaign.Count);
        Assert.Equal(0.0539, budget.StandardUncertainty, 0.00005);
        Assert.Equal(1.2341, result.Mean, 0.0001 + noise);
        Assert.Equal(0.0754, result.StandardDeviation, 0.00005 + noise);
        // The printed interval is the shortest one, ours the symmetric one: apart by 0.0006 at most, since the distribution is nearly symmetric.
        Assert.Equal(1.0834, result.Low, 0.0006 + (2.7 * noise));
        Assert.Equal(1.3825, result.High, 0.0006 + (2.7 * noise));
    }

    /// <summary>
    /// JCGM 100:2008, H.2 (from memory): resistance, reactance and impedance from five sets of voltage, current and phase that were observed together. The
    /// correlation enters by way of independent normal numbers. Printed: R 127.732 u 0.071, X 219.847 u 0.295, Z 254.260 u 0.236 ohm. Tolerances are half the last
    /// printed digit; u(X) has the whole digit, because the five observations give 0.29558: the recalled figure is cut there, not rounded.
    /// </summary>
    [Theory]
    [InlineData("R", 127.732, 0.071, 0.0005)]
    [InlineData("X", 219.847, 0.295, 0.001)]
    [InlineData("Z", 254.260, 0.236, 0.0005)]
    public void Jcgm100_ResistanceAndReactance(string quantity, double value, double u, double uTolerance)
    {
        double[][] observed =
        [
            [5.007, 4.994, 5.005, 4.990, 4.999],
            [19.663e-3, 19.639e-3, 19.640e-3, 19.685e-3, 19.678e-3],
            [1.0456, 1.0438, 1.0468, 1.0428, 1.0433],
        ];
        double[] mean = [.. observed.Select(static o => o.Average())];
        double[,] root = CholeskyOfMeans(observed, mean);
        double Model(ReadOnlySpan<double> z)
        {
            double voltage = mean[0] + (root[0, 0] * z[0]);
            double current = mean[1] + (root[1, 0] * z[0]) + (root[1, 1] * z[1]);
            double phase = mean[2] + (root[2, 0] * z[0]) + (root[2, 1] * z[1]) + (root[2, 2] * z[2]);
            double impedance = voltage / current;
            return quantity switch { "R" => impedance * Math.Cos(phase), "X" => impedance * Math.Sin(phase), _ => impedance };
        }

        // Sensitivities to the independent numbers by central differences.
        double Slope(int i)
        {
            double[] up = [0.0, 0.0, 0.0];
            double[] down = [0.0, 0.0, 0.0];
            up[i] = 0.01;
            down[i] = -0.01;
            return (Model(up) - Model(down)) / 0.02;
        }

        UncertaintyBudget budget = UncertaintyBudget.Of(
            Model([0.0, 0.0, 0.0]), "ohm", [.. Enumerable.Range(0, 3).Select(i => Input("z" + i, 0.0, 1.0, Distribution.Normal, Slope(i)))]);
        Campaign campaign = new(output, "jcgm100 H.2 " + quantity, Ordinary, Full);
        MonteCarloResult result = MonteCarlo.Run(budget, Model, campaign.Count, campaign.Random);
        campaign.Say($"analytic {budget.Value:F4} u {budget.StandardUncertainty:F4} [{budget.Low:F4}, {budget.High:F4}]; Monte Carlo {result.Mean:F4} u {result.StandardDeviation:F4} [{result.Low:F4}, {result.High:F4}]");
        campaign.Close();

        double noise = 5.0 * result.StandardDeviation / Math.Sqrt(campaign.Count);
        Assert.Equal(value, budget.Value, 0.0005);
        Assert.Equal(u, budget.StandardUncertainty, uTolerance);
        Assert.Equal(value, result.Mean, 0.0005 + noise);
        Assert.Equal(u, result.StandardDeviation, uTolerance + noise);
    }

    [Fact]
    public void SameSeed_GivesTheSameBits_AndProgressIsTold()
    {
        UncertaintyBudget budget = UncertaintyBudget.Of(5.0, "", [Input("a", 2.0, 0.1, Distribution.Normal, 1.0), Input("b", 3.0, 0.1, Distribution.Rectangular, 1.0)]);
        List<int> told = [];
        MonteCarloResult first = MonteCarlo.Run(budget, static x => x[0] + x[1], 50_000, new Random(7), told.Add);
        MonteCarloResult again = MonteCarlo.Run(budget, static x => x[0] + x[1], 50_000, new Random(7));
        MonteCarloResult other = MonteCarlo.Run(budget, static x => x[0] + x[1], 50_000, new Random(8));
        Assert.Equal(first, again);
        Assert.NotEqual(first, other);
        Assert.Equal([10_000, 20_000, 30_000, 40_000, 50_000], told);
    }

    [Fact]
    public void TrialsWithoutAValue_AreCountedAndNotHidden()
    {
        UncertaintyBudget budget = UncertaintyBudget.Of(1.0, "", [Input("a", 0.0, 1.0, Distribution.Normal, 1.0)]);
        MonteCarloResult result = MonteCarlo.Run(budget, static x => x[0] < -1.0 ? double.NaN : x[0], 100_000, new Random(3));
        // A normal number lies below −1 with probability 0.15866; five standard errors of a count.
        Assert.InRange(result.Refused, 15_866 - 580, 15_866 + 580);
        Assert.True(-1.0 <= result.Low);
        Assert.Throws<InvalidOperationException>(() => MonteCarlo.Run(budget, static _ => double.NaN, 1_000, new Random(3)));
    }

    [Fact]
    public void CancelledRun_Stops()
    {
        UncertaintyBudget budget = UncertaintyBudget.Of(1.0, "", [Input("a", 0.0, 1.0, Distribution.Normal, 1.0)]);
        using CancellationTokenSource source = new();
        Assert.Throws<OperationCanceledException>(() => MonteCarlo.Run(
            budget, static x => x[0], 1_000_000, new Random(3), done => source.Cancel(), source.Token));
        Assert.Throws<ArgumentOutOfRangeException>(() => MonteCarlo.Run(budget, static x => x[0], 999, new Random(3)));
    }

    private static UncertaintyContribution Input(string name, double estimate, double u, Distribution distribution, double sensitivity)
    {
        return new UncertaintyContribution(name, "", estimate, u, distribution, sensitivity);
    }

    /// <summary>Root of the covariance of the means (Type A, JCGM 100 eq. 17: sums of products over n(n − 1)).</summary>
    private static double[,] CholeskyOfMeans(double[][] observed, double[] mean)
    {
        int n = observed[0].Length;
        double Covariance(int i, int j) => Enumerable.Range(0, n).Sum(k => (observed[i][k] - mean[i]) * (observed[j][k] - mean[j])) / (n * (n - 1));

        double[,] root = new double[3, 3];
        for (int i = 0; i < 3; i++)
        {
            for (int j = 0; j <= i; j++)
            {
                double rest = Covariance(i, j) - Enumerable.Range(0, j).Sum(k => root[i, k] * root[j, k]);
                root[i, j] = i == j ? Math.Sqrt(rest) : rest / root[j, j];
            }
        }

        return root;
    }
}
