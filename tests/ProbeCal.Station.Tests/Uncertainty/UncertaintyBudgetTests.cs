using System;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Uncertainty;
using Xunit;

namespace ProbeCal.Station.Tests.Uncertainty;

public class UncertaintyBudgetTests
{
    /// <summary>A budget by hand: parts 3, −4 and 12 make 13; the shares are 9, 16 and 144 of 169.</summary>
    [Fact]
    public void Parts_AddUpInSquares()
    {
        UncertaintyBudget budget = Budget(1.5, 2.0, Distribution.Normal, -8.0, 0.5, Distribution.Rectangular, 4.0, 3.0, Distribution.Normal);
        Assert.Equal(13.0, budget.StandardUncertainty, 12);
        Assert.Equal([3.0, -4.0, 12.0], budget.Contributions.Select(static c => c.Part));
        Assert.Equal([9.0 / 169.0, 16.0 / 169.0, 144.0 / 169.0], budget.Contributions.Select(static c => Math.Round(c.Share, 15)), static (a, b) => Math.Abs(a - b) < 1e-14);
        // The large one is normal: the ordinary factor.
        Assert.Null(budget.Dominant);
        Assert.Equal(1.96, budget.CoverageFactor, 0.0001);
        Assert.Equal(100.0 - (1.959964 * 13.0), budget.Low, 0.0001);
        Assert.Equal(100.0 + (1.959964 * 13.0), budget.High, 0.0001);
    }

    /// <summary>More inputs than Core's sum takes at once: eight of 1 make √8.</summary>
    [Fact]
    public void ManyInputs_AreAllCounted()
    {
        UncertaintyContribution[] many = [.. Enumerable.Range(0, 8).Select(static i => new UncertaintyContribution("x" + i, "", 0.0, 1.0, Distribution.Normal, 1.0))];
        UncertaintyBudget budget = UncertaintyBudget.Of(0.0, "", many);
        Assert.Equal(Math.Sqrt(8.0), budget.StandardUncertainty, 14);
        Assert.Equal(1.0, budget.Contributions.Sum(static c => c.Share), 14);
    }

    /// <summary>
    /// Known factors for 95 %: a normal alone 1.960, a rectangle alone 0.95·√3 = 1.645; between them by numerical integration of the convolution, written here
    /// another way than in the product.
    /// </summary>
    [Theory]
    [InlineData(0.0, 1.959963984540054)]
    [InlineData(1.0, 1.6454482671904334)]
    [InlineData(0.3, double.NaN)]
    [InlineData(0.71, double.NaN)]
    [InlineData(0.9, double.NaN)]
    [InlineData(0.9999, double.NaN)]
    public void CoverageFactor_IsThatOfRectangleAndNormal(double share, double known)
    {
        double factor = CoverageFactor.Of(share);
        if (!double.IsNaN(known))
        {
            Assert.Equal(known, factor, 1e-12);
            return;
        }

        Assert.InRange(factor, 1.64, 1.96);
        // Integrate the density of normal + rectangle from 0 to the factor: the mean of the normal density over the rectangle.
        double a = Math.Sqrt(3.0 * share);
        double b = Math.Sqrt(1.0 - share);
        const int Outer = 2_000;
        const int Inner = 4_000;
        double sum = 0.0;
        for (int i = 0; i < Outer; i++)
        {
            double x = factor * (i + 0.5) / Outer;
            double density = 0.0;
            for (int j = 0; j < Inner; j++)
            {
                double r = a * ((2.0 * (j + 0.5) / Inner) - 1.0);
                density += Math.Exp(-0.5 * (x - r) * (x - r) / (b * b)) / (b * Math.Sqrt(2.0 * Math.PI) * Inner);
            }

            sum += density * factor / Outer;
        }

        Assert.Equal(0.95, 2.0 * sum, 2e-6);
    }

    [Theory]
    [InlineData(0.69, false)]
    [InlineData(0.71, true)]
    public void DominantRectangle_IsNamedFromSeventyPercentOn(double share, bool named)
    {
        UncertaintyBudget budget = UncertaintyBudget.Of(10.0, "mg/L",
        [
            new("humidity", "%", 97.5, Math.Sqrt(share), Distribution.Rectangular, 1.0),
            new("temperature", "K", 15.0, Math.Sqrt(1.0 - share), Distribution.Normal, -1.0),
        ]);
        Assert.Equal(named, budget.Note is not null);
        Assert.Equal(named ? "humidity" : null, budget.Dominant?.Name);
        Assert.Equal(named, budget.CoverageFactor < 1.95);
        if (named)
        {
            Assert.StartsWith("humidity (rectangular) makes 71 % of the variance: the interval takes k = 1.8", budget.Note, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void Note_IsTheSameInEveryCulture()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = new CultureInfo("de-DE");
            UncertaintyBudget budget = UncertaintyBudget.Of(1.0, "", [new("x", "", 0.0, 1.0, Distribution.Rectangular, 1.0)]);
            Assert.Contains("k = 1.65 ", budget.Note, StringComparison.Ordinal);
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void NothingUncertain_IsAPoint()
    {
        UncertaintyBudget budget = UncertaintyBudget.Of(7.0, "hPa", [new("temperature", "K", 15.0, 0.0, Distribution.Rectangular, -2.0)]);
        Assert.Equal(0.0, budget.StandardUncertainty);
        Assert.Equal(0.0, budget.Contributions[0].Share);
        Assert.Equal(7.0, budget.Low);
        Assert.Equal(7.0, budget.High);
        Assert.Null(budget.Note);
    }

    [Theory]
    [InlineData(-0.1, 1.0, 1.0)]
    [InlineData(double.NaN, 1.0, 1.0)]
    [InlineData(0.1, double.NaN, 1.0)]
    [InlineData(0.1, 1.0, double.PositiveInfinity)]
    [InlineData(1e200, 1e200, 1.0)]
    public void ImpossibleInput_IsRefused(double u, double sensitivity, double estimate)
    {
        Assert.Throws<ArgumentException>(() => UncertaintyBudget.Of(1.0, "", [new("temperature", "K", estimate, u, Distribution.Normal, sensitivity)]));
        Assert.Throws<ArgumentException>(() => UncertaintyBudget.Of(1.0, "", []));
        Assert.Throws<ArgumentException>(() => UncertaintyBudget.Of(double.NaN, "", [new("temperature", "K", 1.0, 0.1, Distribution.Normal, 1.0)]));
    }

    private static UncertaintyBudget Budget(double c1, double u1, Distribution d1, double c2, double u2, Distribution d2, double c3, double u3, Distribution d3)
    {
        return UncertaintyBudget.Of(100.0, "", [new("a", "", 0.0, u1, d1, c1), new("b", "", 0.0, u2, d2, c2), new("c", "", 0.0, u3, d3, c3)]);
    }
}
