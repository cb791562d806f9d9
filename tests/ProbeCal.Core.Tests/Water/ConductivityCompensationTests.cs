using System;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Water;

public class ConductivityCompensationTests(ITestOutputHelper output)
{
    /// <summary>The factors of ISO 7888 as remembered; half of their last digit is allowed.</summary>
    [Theory]
    [InlineData(0.0, 1.918)]
    [InlineData(5.0, 1.643)]
    [InlineData(10.0, 1.428)]
    [InlineData(15.0, 1.256)]
    [InlineData(20.0, 1.116)]
    [InlineData(25.0, 1.000)]
    [InlineData(30.0, 0.903)]
    [InlineData(35.0, 0.822)]
    public void NaturalWater_MeetsTheRememberedFactors(double celsius, double factor)
    {
        Assert.Equal(Status.Ok, ConductivityCompensation.NaturalWater(500.0, celsius, RangeRule.Refuse, out double at25));
        output.WriteLine($"{celsius} °C: {at25 / 500.0:F5} for {factor}");
        Assert.Equal(factor, at25 / 500.0, 5.0e-4);
    }

    [Fact]
    public void Compensations_AreExactAt25AndOrderedByTemperature()
    {
        Assert.Equal(Status.Ok, ConductivityCompensation.NaturalWater(412.0, 25.0, RangeRule.Refuse, out double natural));
        Assert.Equal(412.0, natural);
        Assert.Equal(Status.Ok, ConductivityCompensation.Linear(412.0, 25.0, RangeRule.Refuse, out double linear));
        Assert.Equal(412.0, linear);
        double last = double.MaxValue;
        double furthest = 0.0;
        for (double celsius = 0.0; celsius <= 35.0; celsius += 0.1)
        {
            Assert.Equal(Status.Ok, ConductivityCompensation.NaturalWater(100.0, celsius, RangeRule.Refuse, out natural));
            Assert.Equal(Status.Ok, ConductivityCompensation.Linear(100.0, celsius, RangeRule.Refuse, out linear));
            Assert.True(natural < last, "the factor rises at " + celsius);
            last = natural;
            if (celsius is >= 10.0 and <= 35.0) { furthest = Math.Max(furthest, Math.Abs((linear / natural) - 1.0)); }
        }

        output.WriteLine($"linear over natural water, 10-35 °C: {100.0 * furthest:F2} % apart at most");
        Assert.InRange(furthest, 0.0, 0.025);
    }

    /// <summary>By hand from the remembered factor: 1/(1 − 0.191) is 1.2361, and 1.256 over it is 1.6 % more.</summary>
    [Fact]
    public void Linear_LiesBelowTheFactorOfNaturalWaterAt15()
    {
        Assert.Equal(Status.Ok, ConductivityCompensation.Linear(100.0, 15.0, RangeRule.Refuse, out double linear));
        Assert.Equal(Status.Ok, ConductivityCompensation.NaturalWater(100.0, 15.0, RangeRule.Refuse, out double natural));
        Assert.Equal(123.61, linear, 0.005);
        Assert.Equal(1.6, 100.0 * ((natural / linear) - 1.0), 0.05);
    }
}
