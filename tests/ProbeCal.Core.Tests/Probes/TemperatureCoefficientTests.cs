using System;
using Xunit;

namespace ProbeCal.Core.Tests.Probes;

public class TemperatureCoefficientTests
{
    public static TheoryData<TemperatureCoefficientForm, double> Forms => new()
    {
        { TemperatureCoefficientForm.Exponential, 0.03 },
        { TemperatureCoefficientForm.Compound, 0.03 },
        { TemperatureCoefficientForm.Linear, 0.03 },
        { TemperatureCoefficientForm.Arrhenius, 22000.0 },
        { TemperatureCoefficientForm.Exponential, -0.02 },
        { TemperatureCoefficientForm.Compound, -0.02 },
        { TemperatureCoefficientForm.Linear, -0.02 },
    };

    [Theory]
    [InlineData(TemperatureCoefficientForm.Exponential, 0.03, 10.0)]
    [InlineData(TemperatureCoefficientForm.Compound, 0.03, 10.0)]
    [InlineData(TemperatureCoefficientForm.Linear, 0.03, 10.0)]
    [InlineData(TemperatureCoefficientForm.Arrhenius, 22000.0, 10.0)]
    [InlineData(TemperatureCoefficientForm.Arrhenius, 35000.0, 39.5)]
    [InlineData(TemperatureCoefficientForm.Compound, 0.05, 0.0)]
    public void Factor_IsTheFormAsSystemMathComputesIt(TemperatureCoefficientForm form, double coefficient, double temperature)
    {
        double difference = temperature - 25.0;
        double expected = form switch
        {
            TemperatureCoefficientForm.Exponential => Math.Exp(coefficient * difference),
            TemperatureCoefficientForm.Compound => Math.Pow(1.0 + coefficient, difference),
            TemperatureCoefficientForm.Linear => 1.0 + (coefficient * difference),
            _ => Math.Exp(-coefficient / 8.31446261815324 * ((1.0 / (temperature + 273.15)) - (1.0 / 298.15))),
        };

        Assert.Equal(Status.Ok, Factor(form, coefficient, temperature, out double factor));
        Assert.Equal(1.0, factor / expected, 13);
    }

    [Theory]
    [MemberData(nameof(Forms))]
    public void Factor_IsOneAtTheReference(TemperatureCoefficientForm form, double coefficient)
    {
        Assert.Equal(Status.Ok, Factor(form, coefficient, 25.0, out double factor));
        Assert.Equal(1.0, factor);
    }

    [Theory]
    [MemberData(nameof(Forms))]
    public void Derivatives_AgreeWithDifferences(TemperatureCoefficientForm form, double coefficient)
    {
        foreach (double temperature in new[] { 2.0, 15.0, 25.0, 38.0 })
        {
            Assert.Equal(Status.Ok, TemperatureCoefficient.LogDerivative(form, coefficient, 25.0, temperature, out double perKelvin));
            double numeric = (LogFactor(form, coefficient, temperature + 1e-3) - LogFactor(form, coefficient, temperature - 1e-3)) / 2e-3;
            Assert.Equal(1.0, perKelvin / numeric, 6);

            Assert.Equal(Status.Ok, TemperatureCoefficient.CoefficientDerivative(form, coefficient, 25.0, temperature, out double perCoefficient));
            double step = Math.Abs(coefficient) * 1e-4;
            numeric = (LogFactor(form, coefficient + step, temperature) - LogFactor(form, coefficient - step, temperature)) / (2.0 * step);
            Assert.Equal(numeric, perCoefficient, Math.Max(1e-12, Math.Abs(numeric) * 1e-6));
        }
    }

    // Activation energies and their rates at 25 °C: %/K = 100·E/(R·T²), 8.6 kJ/mol is 1.2, 22 is 3.0, 35 is 4.7, 43 is 5.8 (from memory, printed to one decimal).
    [Theory]
    [InlineData(8600.0, 1.2)]
    [InlineData(22000.0, 3.0)]
    [InlineData(35000.0, 4.7)]
    [InlineData(43000.0, 5.8)]
    public void Arrhenius_GivesTheTradesRates(double joulesPerMole, double percentPerKelvin)
    {
        TemperatureCoefficient.LogDerivative(TemperatureCoefficientForm.Arrhenius, joulesPerMole, 25.0, 25.0, out double perKelvin);
        Assert.Equal(percentPerKelvin, 100.0 * perKelvin, 0.05);
        TemperatureCoefficient.FromRate(TemperatureCoefficientForm.Arrhenius, perKelvin, 25.0, out double back);
        Assert.Equal(1.0, back / joulesPerMole, 14);
    }

    [Fact]
    public void BareRate_MeansTensOfPercentFifteenKelvinAway()
    {
        double lowest = double.MaxValue;
        double highest = 0.0;
        foreach (TemperatureCoefficientForm form in Enum.GetValues<TemperatureCoefficientForm>())
        {
            Assert.Equal(Status.Ok, TemperatureCoefficient.FromRate(form, 0.04, 25.0, out double coefficient));
            Assert.Equal(Status.Ok, Factor(form, coefficient, 10.0, out double factor));
            lowest = Math.Min(lowest, factor);
            highest = Math.Max(highest, factor);
        }

        Assert.InRange((highest / lowest) - 1.0, 0.2, 0.5);
    }

    [Fact]
    public void OutsideTheFittedRange_IsRefusedOrFlagged()
    {
        Assert.Equal(Status.TemperatureJustBelowRange, Factor(TemperatureCoefficientForm.Exponential, 0.03, -0.001, out double factor));
        Assert.True(double.IsNaN(factor));
        Assert.Equal(Status.TemperatureBelowRange, Factor(TemperatureCoefficientForm.Exponential, 0.03, -0.201, out factor));
        Assert.True(double.IsNaN(factor));
        Assert.Equal(Status.TemperatureJustAboveRange, Factor(TemperatureCoefficientForm.Exponential, 0.03, 40.001, out factor));
        Assert.True(double.IsNaN(factor));
        Assert.Equal(Status.TemperatureAboveRange, Factor(TemperatureCoefficientForm.Exponential, 0.03, 40.201, out factor));
        Assert.True(double.IsNaN(factor));
        Assert.Equal(Status.Ok, Factor(TemperatureCoefficientForm.Exponential, 0.03, 40.0, out _));
        Assert.Equal(Status.TemperatureAboveRange, TemperatureCoefficient.Factor(
            TemperatureCoefficientForm.Exponential, 0.03, 25.0, 0.0, 40.0, 45.0, RangeRule.Extrapolate, out factor));
        Assert.Equal(Math.Exp(0.6), factor, 12);
    }

    [Fact]
    public void FactorThatIsNotPositive_IsRefusedEvenExtrapolated()
    {
        Assert.Equal(Status.CoefficientBelowRange, TemperatureCoefficient.Factor(
            TemperatureCoefficientForm.Linear, 0.05, 25.0, 0.0, 40.0, 5.0, RangeRule.Extrapolate, out double factor));
        Assert.True(double.IsNaN(factor));
        Assert.Equal(Status.CoefficientBelowRange, Factor(TemperatureCoefficientForm.Compound, -1.0, 10.0, out _));
        Assert.Equal(Status.CoefficientAboveRange, Factor(TemperatureCoefficientForm.Exponential, 1e6, 30.0, out _));
        Assert.Equal(Status.CoefficientUnknown, Factor((TemperatureCoefficientForm)0, 0.03, 10.0, out _));
        Assert.Equal(Status.CoefficientUnknown, Factor((TemperatureCoefficientForm)6, 0.03, 10.0, out _));
        Assert.Equal(Status.TemperatureBelowRange, TemperatureCoefficient.Factor(
            TemperatureCoefficientForm.Arrhenius, 22000.0, 25.0, 0.0, 40.0, -273.15, RangeRule.Extrapolate, out _));
    }

    private static Status Factor(TemperatureCoefficientForm form, double coefficient, double temperature, out double factor)
    {
        return TemperatureCoefficient.Factor(form, coefficient, 25.0, 0.0, 40.0, temperature, RangeRule.Refuse, out factor);
    }

    private static double LogFactor(TemperatureCoefficientForm form, double coefficient, double temperature)
    {
        Assert.Equal(Status.Ok, Factor(form, coefficient, temperature, out double factor));
        return Math.Log(factor);
    }
}
