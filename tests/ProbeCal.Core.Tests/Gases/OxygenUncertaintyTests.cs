using System;
using System.Globalization;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

public class OxygenUncertaintyTests(ITestOutputHelper output)
{
    private const int Seed = 20260101;

    /// <summary>The combined uncertainty against a Monte Carlo simulation of the values themselves (JCGM 101), which knows nothing of derivatives.</summary>
    [Theory]
    [InlineData(SolubilityEquation.BensonKrause1984, 15.0, 0.0, 1000.0, 0.1, 0.0, 1.0)]
    [InlineData(SolubilityEquation.BensonKrause1984, 25.0, 30.0, 850.0, 0.3, 0.5, 10.0)]
    [InlineData(SolubilityEquation.GarciaGordon1992, 5.0, 35.0, 1013.25, 0.2, 0.2, 3.0)]
    public void Combined_AgreesWithMonteCarlo(
        SolubilityEquation equation, double celsius, double salinity, double pressure, double uT, double uS, double uP)
    {
        Assert.Equal(Status.Ok, OxygenUncertainty.MilligramsPerLitre(
            equation, celsius, salinity, pressure, uT, uS, uP, RangeRule.Refuse, out double combined));
        Assert.Equal(Status.Ok, OxygenUncertainty.EquationRelative(equation, salinity, RangeRule.Refuse, out double relative));

        int seed = int.TryParse(Environment.GetEnvironmentVariable("PROBECAL_SEED"), NumberStyles.Integer, CultureInfo.InvariantCulture, out int given) ? given : Seed;
        int count = Environment.GetEnvironmentVariable("PROBECAL_FULL") == "1" ? 4_000_000 : 200_000;
        Random random = new(seed);
        double sum = 0.0;
        double squares = 0.0;
        for (int i = 0; i < count; i++)
        {
            OxygenEquilibrium.MilligramsPerLitre(
                equation, celsius + (uT * Normal(random)), salinity + (uS * Normal(random)), pressure + (uP * Normal(random)),
                RangeRule.Extrapolate, out double value);
            value *= 1.0 + (relative * Normal(random));
            sum += value;
            squares += value * value;
        }

        double spread = Math.Sqrt((squares - (sum * sum / count)) / (count - 1));
        output.WriteLine($"seed {seed}, {count} draws: {spread:F5} against {combined:F5} mg/L");
        // The spread of count draws is known to 1/sqrt(2·count); five of those, and 0.2 % for the curvature that a first-order sum leaves out.
        Assert.Equal(1.0, spread / combined, (5.0 / Math.Sqrt(2.0 * count)) + 0.002);
    }

    /// <summary>One input at a time in a lake at 15 °C: the equation alone 0.1 %, 0.1 K adds 0.22 %, 1 hPa 0.10 % (the budget of the practice notes, computed there).</summary>
    [Theory]
    [InlineData(0.0, 0.0, 0.10)]
    [InlineData(0.1, 0.0, 0.24)]
    [InlineData(0.0, 1.0, 0.14)]
    [InlineData(0.1, 1.0, 0.26)]
    public void LakeBudget_InPercent(double uT, double uP, double percent)
    {
        OxygenEquilibrium.MilligramsPerLitre(SolubilityEquation.BensonKrause1984, 15.0, 0.0, 1013.25, RangeRule.Refuse, out double value);
        Assert.Equal(Status.Ok, OxygenUncertainty.MilligramsPerLitre(
            SolubilityEquation.BensonKrause1984, 15.0, 0.0, 1013.25, uT, 0.0, uP, RangeRule.Refuse, out double combined));
        Assert.Equal(percent, Math.Round(100.0 * combined / value, 2));
    }

    [Fact]
    public void PartialPressure_CombinesItsTwoInputs()
    {
        OxygenEquilibrium.PartialPressureSensitivities(20.0, 1000.0, RangeRule.Refuse, out double dT, out double dP);
        Assert.Equal(Status.Ok, OxygenUncertainty.PartialPressure(20.0, 1000.0, 0.2, 3.0, RangeRule.Refuse, out double combined));
        Assert.Equal(Math.Sqrt((dT * dT * 0.04) + (dP * dP * 9.0)), combined, 1.0e-12);
        Assert.Equal(Status.Ok, OxygenUncertainty.PartialPressure(20.0, 1000.0, 0.0, 0.0, RangeRule.Refuse, out double none));
        Assert.Equal(0.0, none);
    }

    [Theory]
    [InlineData(0.0, 0.001)]
    [InlineData(20.0, 0.0015)]
    [InlineData(40.0, 0.002)]
    public void Equation_GoesFromFreshToSaline(double salinity, double relative)
    {
        foreach (SolubilityEquation equation in new[] { SolubilityEquation.BensonKrause1984, SolubilityEquation.GarciaGordon1992 })
        {
            Assert.Equal(Status.Ok, OxygenUncertainty.EquationRelative(equation, salinity, RangeRule.Refuse, out double value));
            Assert.Equal(relative, value, 1.0e-15);
        }
    }

    [Fact]
    public void NegativeUncertainty_IsRefusedEvenWhenExtrapolating()
    {
        Assert.Equal(Status.UncertaintyBelowRange, OxygenUncertainty.MilligramsPerLitre(
            SolubilityEquation.BensonKrause1984, 15.0, 0.0, 1000.0, 0.1, -0.1, 1.0, RangeRule.Extrapolate, out double value));
        Assert.True(double.IsNaN(value));
        Assert.Equal(Status.UncertaintyNotFinite, OxygenUncertainty.PartialPressure(
            15.0, 1000.0, 0.1, double.NaN, RangeRule.Extrapolate, out value));
        Assert.True(double.IsNaN(value));
    }

    private static double Normal(Random random)
    {
        return Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
    }
}
