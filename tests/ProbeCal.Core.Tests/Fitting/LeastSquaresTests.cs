using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Core.Tests.Gases;
using Xunit;

namespace ProbeCal.Core.Tests.Fitting;

/// <summary>What a fit refuses, and the figures beside its parameters.</summary>
public class LeastSquaresTests
{
    private static readonly double[] Four = [1.0, 2.0, 3.0, 4.0];

    [Fact]
    public void TheThermometerOfTheGuide_HasItsPublishedLine()
    {
        List<CheckRow> rows = CheckRow.Read("jcgm-100-h3.csv", 21);
        CheckRow[] readings = [.. rows.Where(static row => row["kind"] == "reading")];
        double[] x = [.. readings.Select(static row => row.Number("value") - 20.0)];
        double[] y = [.. readings.Select(static row => row.Number("expected"))];
        Assert.Equal(Status.Ok, LeastSquares.Polynomial(x, y, null, 1, out PolynomialFit? line));
        FitResult fit = line!.Result;
        Assert.Equal(9, fit.DegreesOfFreedom);
        foreach (CheckRow row in rows.Where(static row => row["kind"] == "result"))
        {
            double found = row["quantity"] switch
            {
                "y1" => fit.Parameter(0),
                "y2" => fit.Parameter(1),
                "u(y1)" => fit.StandardUncertainty(0),
                "u(y2)" => fit.StandardUncertainty(1),
                "r(y1 y2)" => fit.Covariance(0, 1) / (fit.StandardUncertainty(0) * fit.StandardUncertainty(1)),
                "s" => fit.ResidualStandardDeviation,
                "b(30)" => line.Value(10.0),
                "u(b(30))" => Math.Sqrt(line.Variance(10.0)),
                string other => throw new InvalidOperationException(other),
            };
            Assert.True(Math.Abs(found - row.Number("expected")) <= row.Number("tolerance"), $"{row}: {found:R}");
        }
    }

    [Fact]
    public void TooFewOrUselessPoints_AreRefused()
    {
        Assert.Equal(Status.PointsBelowRange, LeastSquares.Polynomial([1.0], [2.0], null, 1, out PolynomialFit? fit));
        Assert.Null(fit);
        Assert.Equal(Status.PointsBelowRange, LeastSquares.Polynomial([], [], null, 0, out _));
        Assert.Equal(Status.PointsDegenerate, LeastSquares.Polynomial([3.0, 3.0, 3.0], [1.0, 2.0, 3.0], null, 1, out _));
        Assert.Equal(Status.PointsDegenerate, LeastSquares.Polynomial([3.0, 3.0, 4.0, 4.0], Four, null, 2, out _));
        Assert.Equal(Status.PointsAboveRange, LeastSquares.Polynomial([1.0, 2.0, 3.0], Four, null, 1, out _));
        Assert.Equal(Status.PointsDegenerate, LeastSquares.Linear([1.0, 2.0, 2.0, 4.0, 3.0, 6.0, 4.0, 8.0], 2, Four, null, out _));
        Assert.Equal(Status.PointsDegenerate, LeastSquares.Linear([0.0, 0.0, 0.0, 0.0], 1, Four, null, out _));
        Assert.Equal(Status.PointsDegenerate, ErrorsInBoth.Line([2.0, 2.0, 2.0], [0.1, 0.1, 0.1], [1.0, 2.0, 3.0], [0.1, 0.1, 0.1], null, out _));
        Assert.Equal(Status.PointsBelowRange, ErrorsInBoth.Polynomial([1.0, 2.0], [0.1, 0.1], [1.0, 2.0], [0.1, 0.1], null, 2, out _));
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity)]
    public void WhatIsNoNumber_IsRefused(double bad)
    {
        double[] fine = [0.1, 0.1, 0.1, 0.1];
        double[] with = [1.0, 2.0, bad, 4.0];
        Assert.Equal(Status.PointsNotFinite, LeastSquares.Polynomial(with, Four, null, 1, out _));
        Assert.Equal(Status.PointsNotFinite, LeastSquares.Polynomial(Four, with, null, 1, out _));
        Assert.Equal(Status.UncertaintyNotFinite, LeastSquares.Polynomial(Four, Four, with, 1, out _));
        Assert.Equal(Status.PointsNotFinite, ErrorsInBoth.Line(with, fine, Four, fine, null, out _));
        Assert.Equal(Status.UncertaintyNotFinite, ErrorsInBoth.Line(Four, with, Four, fine, null, out _));
        Assert.Equal(Status.UncertaintyNotFinite, ErrorsInBoth.Line(Four, fine, Four, fine, [0.0, 0.0, bad, 0.0], out _));
        Assert.Equal(Status.PointsNotFinite, LevenbergMarquardt.Fit(Straight, with, null, [1.0, 1.0], out _));
        Assert.Equal(Status.CoefficientNotFinite, LevenbergMarquardt.Fit(Straight, Four, null, [1.0, bad], out _));
    }

    [Fact]
    public void UncertaintiesThatWeighNothing_AreRefused()
    {
        double[] fine = [0.1, 0.1, 0.1, 0.1];
        Assert.Equal(Status.UncertaintyBelowRange, LeastSquares.Polynomial(Four, Four, [0.1, 0.0, 0.1, 0.1], 1, out _));
        Assert.Equal(Status.UncertaintyBelowRange, LeastSquares.Polynomial(Four, Four, [0.1, -0.1, 0.1, 0.1], 1, out _));
        Assert.Equal(Status.UncertaintyBelowRange, ErrorsInBoth.Line(Four, [0.0, 0.1, 0.1, 0.1], Four, [0.0, 0.1, 0.1, 0.1], null, out _));
        Assert.Equal(Status.UncertaintyAboveRange, ErrorsInBoth.Line(Four, fine, Four, fine, [0.0, 1.0, 0.0, 0.0], out _));
        Assert.Equal(Status.UncertaintyBelowRange, LevenbergMarquardt.Fit(Straight, Four, [0.1, 0.1, 0.0, 0.1], [1.0, 1.0], out _));
    }

    [Fact]
    public void ACurveThatItsPointsDoNotTell_IsRefused()
    {
        // Two parameters that only stand as a sum.
        FitModel twins = static (b, values, rows) =>
        {
            for (int i = 0; i < 4; i++) { (values[i], rows[2 * i], rows[(2 * i) + 1]) = (b[0] + b[1], 1.0, 1.0); }
            return true;
        };
        Assert.Equal(Status.PointsDegenerate, LevenbergMarquardt.Fit(twins, Four, null, [1.0, 0.0], out FitResult? fit));
        Assert.Null(fit);
        Assert.Equal(Status.PointsBelowRange, LevenbergMarquardt.Fit(Straight, [1.0], null, [1.0, 1.0], out _));
        Assert.Equal(Status.CoefficientNotFinite, LevenbergMarquardt.Fit(static (_, _, _) => false, Four, null, [1.0], out _));
    }

    /// <summary>As many points as parameters: the line is exact, and without stated uncertainties nobody knows how well.</summary>
    [Fact]
    public void WithoutAFreedom_OnlyStatedUncertaintiesGiveACovariance()
    {
        Assert.Equal(Status.Ok, LeastSquares.Polynomial([0.0, 10.0], [1.0, 21.0], null, 1, out PolynomialFit? bare));
        Assert.Equal(2.0, bare!.Result.Parameter(1), 1e-14);
        Assert.True(double.IsNaN(bare.Result.StandardUncertainty(1)) && double.IsNaN(bare.Result.ResidualStandardDeviation) && double.IsNaN(bare.Result.StandardisedResidual(0)));
        Assert.Equal(Status.Ok, LeastSquares.Polynomial([0.0, 10.0], [1.0, 21.0], [0.3, 0.4], 1, out PolynomialFit? stated));
        // Two points: u(slope)² = (0.3² + 0.4²)/10².
        Assert.Equal(0.05, stated!.Result.StandardUncertainty(1), 1e-14);
        Assert.Equal(0.3, Math.Sqrt(stated.Variance(0.0)), 1e-14);
        Assert.Equal(0.4, Math.Sqrt(stated.Variance(10.0)), 1e-14);
    }

    /// <summary>The unit in which x or y is written changes nothing but the unit of the result.</summary>
    [Theory]
    [InlineData(1e-9, 1e12)]
    [InlineData(1e7, 1e-8)]
    public void Units_DoNotMatter(double xScale, double yScale)
    {
        double[] x = [0.1, 0.9, 2.1, 2.9, 4.2, 5.0];
        double[] y = [1.02, 1.71, 3.4, 3.9, 6.0, 7.1];
        Assert.Equal(Status.Ok, LeastSquares.Polynomial(x, y, null, 2, out PolynomialFit? plain));
        Assert.Equal(Status.Ok, LeastSquares.Polynomial([.. x.Select(v => v * xScale)], [.. y.Select(v => v * yScale)], null, 2, out PolynomialFit? scaled));
        for (int i = 0; i < 3; i++)
        {
            double unit = yScale / Math.Pow(xScale, i);
            Assert.InRange(scaled!.Result.Parameter(i) / (plain!.Result.Parameter(i) * unit), 1.0 - 1e-12, 1.0 + 1e-12);
            Assert.InRange(scaled.Result.StandardUncertainty(i) / (plain.Result.StandardUncertainty(i) * unit), 1.0 - 1e-12, 1.0 + 1e-12);
        }
    }

    /// <summary>Split by hand: levels 1, 2, 3 with two repeats each; residual means and differences on paper.</summary>
    [Fact]
    public void LackOfFit_IsTheSplitByHand()
    {
        double[] x = [1.0, 1.0, 2.0, 2.0, 3.0, 3.0];
        double[] y = [1.0, 1.2, 2.9, 3.1, 3.0, 3.2];
        Assert.Equal(Status.Ok, LeastSquares.Polynomial(x, y, null, 1, out PolynomialFit? line));
        Assert.Equal(Status.Ok, LackOfFit.Test(line!.Result, [1, 1, 2, 2, 3, 3], null, out double f, out int lack, out int pure));
        // Pure: 6 × 0.1² = 0.06 with 3 degrees. Level means 1.1, 3.0, 3.1: line through them 2.4 + 1.0 (x − 2), off by −0.3, 0.6, −0.3: 2·0.54 = 1.08 with 1.
        Assert.Equal((1, 3), (lack, pure));
        Assert.Equal(1.08 / (0.06 / 3.0), f, 1e-9);
        Assert.Equal(Status.PointsBelowRange, LackOfFit.Test(line.Result, [1, 2, 3, 4, 5, 6], null, out _, out _, out _));
        Assert.Equal(Status.PointsBelowRange, LackOfFit.Test(line.Result, [1, 1, 1, 2, 2, 2], null, out _, out _, out _));
        Assert.Equal(Status.PointsAboveRange, LackOfFit.Test(line.Result, [1, 2], null, out _, out _, out _));
    }

    /// <summary>Standardised residuals of a straight line, by the formula of the textbook: r/(s·√(1 − 1/n − (x − x̄)²/S)).</summary>
    [Fact]
    public void StandardisedResiduals_AreThoseOfTheTextbook()
    {
        double[] x = [1.0, 2.0, 4.0, 7.0, 11.0];
        double[] y = [2.2, 3.7, 8.4, 14.1, 21.7];
        Assert.Equal(Status.Ok, LeastSquares.Polynomial(x, y, null, 1, out PolynomialFit? line));
        double mean = x.Average();
        double spread = x.Sum(v => (v - mean) * (v - mean));
        for (int i = 0; i < x.Length; i++)
        {
            double free = 1.0 - (1.0 / 5.0) - ((x[i] - mean) * (x[i] - mean) / spread);
            Assert.Equal(line!.Result.Residual(i) / (line.Result.ResidualStandardDeviation * Math.Sqrt(free)), line.Result.StandardisedResidual(i), 1e-10);
        }
    }

    private static bool Straight(double[] b, double[] values, double[] rows)
    {
        for (int i = 0; i < values.Length; i++)
        {
            (values[i], rows[2 * i], rows[(2 * i) + 1]) = (b[0] + (b[1] * i), 1.0, i);
        }

        return true;
    }
}
