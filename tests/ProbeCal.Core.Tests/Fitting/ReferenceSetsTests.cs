using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Core.Tests.Gases;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Fitting;

/// <summary>The certified results of the Statistical Reference Datasets of NIST: CheckValues/reference-data-sets.csv and reference-results.csv.</summary>
public class ReferenceSetsTests(ITestOutputHelper output)
{
    private static readonly List<CheckRow> Data = CheckRow.Read("reference-data-sets.csv", 306);
    private static readonly List<CheckRow> Results = CheckRow.Read("reference-results.csv", 87);

    [Theory]
    [InlineData("Norris", 1)]
    [InlineData("Pontius", 2)]
    [InlineData("Filip", 10)]
    [InlineData("Wampler5", 5)]
    public void Polynomials_HaveTheirCertifiedCoefficients(string set, int degree)
    {
        (double[] x, double[] y) = Points(set);
        Assert.Equal(Status.Ok, LeastSquares.Polynomial(x, y, null, degree, out PolynomialFit? fit));
        Compare(set, fit!.Result);
    }

    [Fact]
    public void ALineThroughTheOrigin_HasItsCertifiedSlope()
    {
        (double[] x, double[] y) = Points("NoInt1");
        Assert.Equal(Status.Ok, LeastSquares.Linear(x, 1, y, null, out FitResult? fit));
        Compare("NoInt1", fit!);
    }

    [Theory]
    [InlineData("Misra1a", new[] { 500.0, 0.0001 })]
    [InlineData("Misra1a", new[] { 250.0, 0.0005 })]
    [InlineData("Chwirut2", new[] { 0.1, 0.01, 0.02 })]
    [InlineData("Chwirut2", new[] { 0.15, 0.008, 0.010 })]
    [InlineData("Thurber", new[] { 1000.0, 1000.0, 400.0, 40.0, 0.7, 0.3, 0.03 })]
    [InlineData("Thurber", new[] { 1300.0, 1500.0, 500.0, 75.0, 1.0, 0.4, 0.05 })]
    [InlineData("MGH09", new[] { 25.0, 39.0, 41.5, 39.0 })]
    [InlineData("MGH09", new[] { 0.25, 0.39, 0.415, 0.39 })]
    public void Curves_HaveTheirCertifiedParameters_FromBothStarts(string set, double[] start)
    {
        (double[] x, double[] y) = Points(set);
        FitModel model = set switch
        {
            "Misra1a" => (b, values, rows) => Each(x, values, rows, 2, (t, g) =>
            {
                double e = Math.Exp(-b[1] * t);
                (g[0], g[1]) = (1.0 - e, b[0] * t * e);
                return b[0] * (1.0 - e);
            }),
            "Chwirut2" => (b, values, rows) => Each(x, values, rows, 3, (t, g) =>
            {
                double below = b[1] + (b[2] * t);
                double value = Math.Exp(-b[0] * t) / below;
                (g[0], g[1], g[2]) = (-t * value, -value / below, -t * value / below);
                return value;
            }),
            "Thurber" => (b, values, rows) => Each(x, values, rows, 7, (t, g) =>
            {
                double above = b[0] + (t * (b[1] + (t * (b[2] + (t * b[3])))));
                double below = 1.0 + (t * (b[4] + (t * (b[5] + (t * b[6])))));
                double value = above / below;
                (g[0], g[1], g[2], g[3]) = (1.0 / below, t / below, t * t / below, t * t * t / below);
                (g[4], g[5], g[6]) = (-value * t / below, -value * t * t / below, -value * t * t * t / below);
                return value;
            }),
            _ => (b, values, rows) => Each(x, values, rows, 4, (t, g) =>
            {
                double above = (t * t) + (t * b[1]);
                double below = (t * t) + (t * b[2]) + b[3];
                double value = b[0] * above / below;
                (g[0], g[1], g[2], g[3]) = (above / below, b[0] * t / below, -value * t / below, -value / below);
                return value;
            }),
        };
        Assert.Equal(Status.Ok, LevenbergMarquardt.Fit(model, y, null, start, out FitResult? fit));
        Compare(set, fit!);
    }

    private static bool Each(double[] x, double[] values, double[] rows, int unknowns, Func<double, double[], double> one)
    {
        double[] slopes = new double[unknowns];
        for (int i = 0; i < x.Length; i++)
        {
            values[i] = one(x[i], slopes);
            slopes.CopyTo(rows, i * unknowns);
        }

        return true;
    }

    private void Compare(string set, FitResult fit)
    {
        double worst = 0.0;
        CheckRow[] rows = [.. Results.Where(row => row["set"] == set)];
        Assert.Equal((2 * fit.ParameterCount) + 1, rows.Length);
        foreach (CheckRow row in rows)
        {
            int index = (int)row.Number("index");
            double found = row["quantity"] switch
            {
                "estimate" => fit.Parameter(index),
                "deviation" => fit.StandardUncertainty(index),
                _ => fit.ResidualStandardDeviation,
            };
            double off = Math.Abs((found / row.Number("expected")) - 1.0);
            Assert.True(off <= row.Number("tolerance"), $"{row}: {found:R} is off by {off:E1}");
            worst = Math.Max(worst, off);
        }

        output.WriteLine($"{set}: worst {worst:E1} of the certified value, {fit.Iterations} steps");
    }

    private static (double[] X, double[] Y) Points(string set)
    {
        CheckRow[] rows = [.. Data.Where(row => row["set"] == set)];
        return ([.. rows.Select(static row => row.Number("x"))], [.. rows.Select(static row => row.Number("y"))]);
    }
}
