using System;
using System.Linq;
using Xunit;

namespace ProbeCal.Core.Tests.Fitting;

/// <summary>The curve of a probe over points of several temperatures.</summary>
public class ResponseFitTests
{
    private static readonly double[] X = [0.0, 45.0, 90.0, 140.0, 200.0, 210.0];
    private static readonly double[] XUncertainty = [0.4, 0.3, 0.5, 0.6, 0.4, 0.4];
    private static readonly double[] Gain = [0.9, 0.7, 1.0, 0.8, 1.1, 0.65];
    private static readonly double[] Noise = [0.12, -0.2, 0.05, 0.3, -0.1, 0.21];
    private static readonly double[] Uncertainty = [0.1, 0.2, 0.1, 0.2, 0.1, 0.2];

    /// <summary>With one gain it is the polynomial; with gains of their own a line is York's line in gain times x.</summary>
    [Fact]
    public void ItsLimits_AreTheOtherFits()
    {
        double[] one = [1.0, 1.0, 1.0, 1.0, 1.0, 1.0];
        double[] response = [.. X.Zip(Noise, static (x, noise) => 0.4 + (0.3 * x) - (1e-4 * x * x) + noise)];
        Assert.Equal(Status.Ok, ResponseFit.Fit(X, XUncertainty, one, response, Uncertainty, 2, out FitResult? curve));
        Assert.Equal(Status.Ok, ErrorsInBoth.Polynomial(X, XUncertainty, response, Uncertainty, null, 2, out PolynomialFit? polynomial));
        double[] gained = [.. Enumerable.Range(0, 6).Select(i => 0.4 + (Gain[i] * 0.3 * X[i]) + Noise[i])];
        Assert.Equal(Status.Ok, ResponseFit.Fit(X, XUncertainty, Gain, gained, Uncertainty, 1, out FitResult? line));
        Assert.Equal(Status.Ok, ErrorsInBoth.Line([.. X.Zip(Gain, static (x, g) => x * g)], [.. XUncertainty.Zip(Gain, static (u, g) => u * g)], gained, Uncertainty, null, out PolynomialFit? york));
        foreach ((FitResult ours, FitResult other) in new[] { (curve!, polynomial!.Result), (line!, york!.Result) })
        {
            for (int i = 0; i < ours.ParameterCount; i++)
            {
                Assert.Equal(other.Parameter(i), ours.Parameter(i), 1e-7 * other.StandardUncertainty(i));
                Assert.Equal(other.StandardUncertainty(i), ours.StandardUncertainty(i), 1e-7 * other.StandardUncertainty(i));
            }

            Assert.Equal(other.ChiSquared, ours.ChiSquared, 1e-7 * other.ChiSquared);
            for (int i = 0; i < X.Length; i++)
            {
                Assert.Equal(other.Residual(i), ours.Residual(i), 1e-7);
            }
        }
    }

    [Fact]
    public void GainsOfTheirOwn_DoNotBendTheCurve()
    {
        double[] response = [.. Enumerable.Range(0, 6).Select(static i => 0.4 + (Gain[i] * ((0.3 * X[i]) - (1e-4 * X[i] * X[i]))))];
        Assert.Equal(Status.Ok, ResponseFit.Fit(X, XUncertainty, Gain, response, Uncertainty, 2, out FitResult? fit));
        Assert.Equal(0.4, fit!.Parameter(0), 1e-10);
        Assert.Equal(0.3, fit.Parameter(1), 1e-11);
        Assert.Equal(-1e-4, fit.Parameter(2), 1e-13);
    }

    [Fact]
    public void WhatCannotBeFitted_IsRefused()
    {
        double[] response = [0.0, 1.0, 2.0, 3.0, 4.0, 5.0];
        Assert.Equal(Status.CoefficientBelowRange, ResponseFit.Fit(X, XUncertainty, [1.0, 1.0, 0.0, 1.0, 1.0, 1.0], response, Uncertainty, 1, out FitResult? fit));
        Assert.Null(fit);
        Assert.Equal(Status.CoefficientNotFinite, ResponseFit.Fit(X, XUncertainty, [1.0, 1.0, double.NaN, 1.0, 1.0, 1.0], response, Uncertainty, 1, out _));
        Assert.Equal(Status.PointsAboveRange, ResponseFit.Fit(X, XUncertainty, [1.0], response, Uncertainty, 1, out _));
        Assert.Equal(Status.PointsBelowRange, ResponseFit.Fit([1.0, 2.0], [0.1, 0.1], [1.0, 1.0], [1.0, 2.0], [0.1, 0.1], 2, out _));
        Assert.Equal(Status.PointsDegenerate, ResponseFit.Fit([1.0, 1.0, 2.0], [0.1, 0.1, 0.1], [1.0, 1.0, 1.0], [1.0, 2.0, 3.0], [0.1, 0.1, 0.1], 2, out _));
        Assert.Equal(Status.UncertaintyBelowRange, ResponseFit.Fit([1.0, 2.0], [0.0, 0.1], [1.0, 1.0], [1.0, 2.0], [0.0, 0.1], 1, out _));
    }
}
