using System;
using CsCheck;
using Xunit;

namespace ProbeCal.Core.Tests.Gases;

public class OxygenUnitsTests
{
    /// <summary>
    /// The real molar volume gives 44.6596 µmol in a mL (Garcia and Gordon 1992, second-hand); with 31.9988 g/mol that is 1.42905 mg. The two
    /// published roundings agree to 4 parts in a million.
    /// </summary>
    [Fact]
    public void MilligramsPerMillilitre_FitsTheMolarVolume()
    {
        Assert.Equal(44.6596, OxygenUnits.MicromolesPerLitreFromMilligramsPerLitre(OxygenUnits.MilligramsPerMillilitre), 0.00015);
        Assert.Equal(1.42905, OxygenUnits.GramsPerMole / 22.3916, 0.000006);
    }

    [Fact]
    public void Conversions_OfOneValue()
    {
        // 31.9988 mg/L is 1000 µmol/L by definition of the molar mass.
        Assert.Equal(1000.0, OxygenUnits.MicromolesPerLitreFromMilligramsPerLitre(31.9988), 1.0e-9);
        Assert.Equal(31.9988, OxygenUnits.MilligramsPerLitreFromMicromolesPerLitre(1000.0), 1.0e-12);
        Assert.Equal(2.0, OxygenUnits.MillilitresPerLitreFromMilligramsPerLitre(2.8581), 1.0e-12);
        Assert.Equal(2.8581, OxygenUnits.MilligramsPerLitreFromMillilitresPerLitre(2.0), 1.0e-12);
        Assert.Equal(Status.Ok, OxygenUnits.MicromolesPerKilogramFromMilligramsPerLitre(31.9988, 1025.0, out double perKilogram));
        Assert.Equal(1000.0 / 1.025, perKilogram, 1.0e-9);
        Assert.Equal(Status.Ok, OxygenUnits.MilligramsPerKilogramFromMilligramsPerLitre(8.0, 1025.0, out double partsPerMillion));
        Assert.Equal(8.0 / 1.025, partsPerMillion, 1.0e-12);
    }

    [Fact]
    public void Conversions_AreInverse()
    {
        Gen.Select(Gen.Double[-1.0, 60.0], Gen.Double[950.0, 1050.0]).Sample((milligrams, density) =>
        {
            double molar = OxygenUnits.MilligramsPerLitreFromMicromolesPerLitre(OxygenUnits.MicromolesPerLitreFromMilligramsPerLitre(milligrams));
            double gas = OxygenUnits.MilligramsPerLitreFromMillilitresPerLitre(OxygenUnits.MillilitresPerLitreFromMilligramsPerLitre(milligrams));
            Assert.Equal(Status.Ok, OxygenUnits.MicromolesPerKilogramFromMilligramsPerLitre(milligrams, density, out double perKilogram));
            Assert.Equal(Status.Ok, OxygenUnits.MilligramsPerLitreFromMicromolesPerKilogram(perKilogram, density, out double mass));
            return Near(molar, milligrams) && Near(gas, milligrams) && Near(mass, milligrams);
        }, iter: 10_000);
    }

    /// <summary>Benson and Krause by way of EOS-80 density give the µmol/kg of Garcia and Gordon: 0.03 % at most between the two equations.</summary>
    [Fact]
    public void PerKilogram_JoinsTheTwoEquations()
    {
        Assert.Equal(Status.Ok, BensonKrause1984.MilligramsPerLitre(10.0, 35.0, 1013.25, RangeRule.Refuse, out double milligrams));
        Assert.Equal(Status.Ok, DensityEos80.Density(10.0, 35.0, RangeRule.Refuse, out double density));
        Assert.Equal(Status.Ok, OxygenUnits.MicromolesPerKilogramFromMilligramsPerLitre(milligrams, density, out double converted));
        Assert.Equal(Status.Ok, GarciaGordon1992.MicromolesPerKilogram(10.0, 35.0, 1013.25, RangeRule.Refuse, out double direct));
        Assert.Equal(1.0, converted / direct, 0.0003);
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity)]
    public void PlainProportions_CarryWhatIsNotFinite(double value)
    {
        Assert.Equal(value, OxygenUnits.MicromolesPerLitreFromMilligramsPerLitre(value));
        Assert.Equal(value, OxygenUnits.MilligramsPerLitreFromMicromolesPerLitre(value));
        Assert.Equal(value, OxygenUnits.MillilitresPerLitreFromMilligramsPerLitre(value));
        Assert.Equal(value, OxygenUnits.MilligramsPerLitreFromMillilitresPerLitre(value));
    }

    private static bool Near(double actual, double expected)
    {
        return Math.Abs(actual - expected) <= 4.0e-16 * Math.Max(1.0e-3, 4.0 * Math.Abs(expected));
    }
}
