using System;
using System.Collections.Generic;
using System.Linq;
using CsCheck;
using ProbeCal.Core.Tests.Gases;
using Xunit;

namespace ProbeCal.Core.Tests.Fitting;

/// <summary>Lines and quadratics through points that are uncertain in both directions.</summary>
public class ErrorsInBothTests
{
    [Theory]
    [InlineData("Pearson-York")]
    [InlineData("correlated")]
    public void TheLine_IsThePublishedOne(string set)
    {
        Points points = Read(set);
        Assert.Equal(Status.Ok, ErrorsInBoth.Line(points.X, points.XUncertainty, points.Y, points.YUncertainty, points.Correlation, out PolynomialFit? line));
        FitResult fit = line!.Result;
        double scale = fit.ResidualStandardDeviation;
        CheckRow[] rows = [.. CheckRow.Read("errors-in-both-results.csv", 13).Where(row => row["set"] == set)];
        Assert.True(4 < rows.Length);
        foreach (CheckRow row in rows)
        {
            double found = row["quantity"] switch
            {
                "intercept" => fit.Parameter(0),
                "slope" => fit.Parameter(1),
                "meanSquare" => scale * scale,
                "rootMeanSquare" => scale,
                "scaledIntercept" => scale * fit.StandardUncertainty(0),
                "scaledSlope" => scale * fit.StandardUncertainty(1),
                string other => throw new InvalidOperationException(other),
            };
            double off = Math.Abs(found - row.Number("expected"));
            Assert.True(off <= row.Number("tolerance"), $"{row}: {found:R} is off by {off:E1}");
        }
    }

    /// <summary>Two ways that share nothing but the data: York's equations, and steps of weighted least squares at the adjusted points.</summary>
    [Theory]
    [InlineData("Pearson-York")]
    [InlineData("correlated")]
    public void BothWays_ComeToOneLine(string set)
    {
        Points points = Read(set);
        Assert.Equal(Status.Ok, ErrorsInBoth.Line(points.X, points.XUncertainty, points.Y, points.YUncertainty, points.Correlation, out PolynomialFit? york));
        Assert.Equal(Status.Ok, ErrorsInBoth.Polynomial(points.X, points.XUncertainty, points.Y, points.YUncertainty, points.Correlation, 1, out PolynomialFit? steps));
        for (int i = 0; i < 2; i++)
        {
            Assert.InRange(steps!.Result.Parameter(i) / york!.Result.Parameter(i), 1.0 - 1e-9, 1.0 + 1e-9);
            Assert.InRange(steps.Result.StandardUncertainty(i) / york.Result.StandardUncertainty(i), 1.0 - 1e-8, 1.0 + 1e-8);
        }

        Assert.InRange(steps!.Result.ChiSquared / york!.Result.ChiSquared, 1.0 - 1e-9, 1.0 + 1e-9);
        for (int i = 0; i < points.X.Length; i++)
        {
            Assert.Equal(york.Result.Residual(i), steps.Result.Residual(i), 1e-8);
            Assert.Equal(york.Result.StandardisedResidual(i), steps.Result.StandardisedResidual(i), 1e-7);
        }
    }

    /// <summary>Without errors in x it is the ordinary weighted line; with x and y exchanged it is the same line seen from the side.</summary>
    [Fact]
    public void TheLine_HasItsTwoLimits()
    {
        Points points = Read("Pearson-York");
        double[] none = new double[points.X.Length];
        Assert.Equal(Status.Ok, ErrorsInBoth.Line(points.X, none, points.Y, points.YUncertainty, null, out PolynomialFit? without));
        Assert.Equal(Status.Ok, LeastSquares.Polynomial(points.X, points.Y, points.YUncertainty, 1, out PolynomialFit? weighted));
        Assert.Equal(Status.Ok, ErrorsInBoth.Line(points.X, points.XUncertainty, points.Y, points.YUncertainty, null, out PolynomialFit? up));
        Assert.Equal(Status.Ok, ErrorsInBoth.Line(points.Y, points.YUncertainty, points.X, points.XUncertainty, null, out PolynomialFit? aside));
        for (int i = 0; i < 2; i++)
        {
            Assert.Equal(weighted!.Result.Parameter(i), without!.Result.Parameter(i), 1e-12);
            Assert.Equal(weighted.Result.StandardUncertainty(i), without.Result.StandardUncertainty(i), 1e-12);
        }

        Assert.Equal(1.0 / up!.Result.Parameter(1), aside!.Result.Parameter(1), 1e-10);
        Assert.Equal(-up.Result.Parameter(0) / up.Result.Parameter(1), aside.Result.Parameter(0), 1e-9);
    }

    /// <summary>A parabola without noise is found again, whatever the uncertainties say.</summary>
    [Fact]
    public void AQuadratic_WithoutNoiseIsFoundAgain()
    {
        Gen.Select(Gen.Double[-5, 5], Gen.Double[0.5, 3], Gen.Double[-0.02, 0.02], Gen.Double[0.001, 0.5], Gen.Double[0.001, 0.5], Gen.Double[-0.9, 0.9])
            .Sample((a, b, c, ux, uy, r) =>
            {
                double[] x = [.. Enumerable.Range(0, 7).Select(static i => 10.0 + (5.0 * i))];
                double[] y = [.. x.Select(t => a + (b * t) + (c * t * t))];
                Assert.Equal(Status.Ok, ErrorsInBoth.Polynomial(x, Fill(ux), y, Fill(uy), Fill(r), 2, out PolynomialFit? fit));
                Assert.Equal(a, fit!.Result.Parameter(0), 1e-9);
                Assert.Equal(b, fit.Result.Parameter(1), 1e-10);
                Assert.Equal(c, fit.Result.Parameter(2), 1e-11);
            }, iter: 200, seed: "0N0XIzNsQ0O2");

        static double[] Fill(double value) => [.. Enumerable.Repeat(value, 7)];
    }

    private sealed record Points(double[] X, double[] XUncertainty, double[] Y, double[] YUncertainty, double[] Correlation);

    private static Points Read(string set)
    {
        List<CheckRow> rows = [.. CheckRow.Read("errors-in-both-data.csv", 37).Where(row => row["set"] == set)];
        return new Points(
            [.. rows.Select(static row => row.Number("x"))],
            [.. rows.Select(static row => Math.Sqrt(row.Number("xVariance")))],
            [.. rows.Select(static row => row.Number("y"))],
            [.. rows.Select(static row => Math.Sqrt(row.Number("yVariance")))],
            [.. rows.Select(static row => row.Number("covariance") / Math.Sqrt(row.Number("xVariance") * row.Number("yVariance")))]);
    }
}
