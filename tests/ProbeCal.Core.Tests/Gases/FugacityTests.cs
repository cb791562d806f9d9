using System;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>The non-ideal gas phase, and what pressure above 1.1 atm does.</summary>
public class FugacityTests(ITestOutputHelper output)
{
    private const double Seam = 1114.575;

    /// <summary>Weiss 1974, second-hand: 0.9968 to 0.997 at 25 °C and 1 atm; NOTES of the trade: 0.32 % at 25 °C, 0.44 % at 0 °C below one.</summary>
    [Theory]
    [InlineData(25.0, 0.9968, 0.00005)]
    [InlineData(0.0, 0.9956, 0.00005)]
    public void CarbonDioxide_InAir(double celsius, double expected, double tolerance)
    {
        double phi = FugacityCoefficient.Value(Gas.CarbonDioxide, celsius, 1.0, 4.25e-4, null, out _, out _, out _);
        output.WriteLine($"{celsius} °C: {phi:F6}");
        Assert.Equal(expected, phi, tolerance);
    }

    /// <summary>
    /// The Pitzer–Abbott correlation stands in for N2, Ar and He above 1.1 atm. Its only check here is oxygen, whose θ (Benson and Krause 1980) is −B/(R·T) measured:
    /// critical constants 154.58 K, 49.77 atm, ω 0.022 (from memory). Abbott's correlation is good to some cm³/mol for simple gases (from memory); the documents state what was found,
    /// 0.55 cm³/mol and 2.7 %, and are held to it.
    /// </summary>
    [Theory]
    [InlineData(0.0)]
    [InlineData(10.0)]
    [InlineData(20.0)]
    [InlineData(30.0)]
    [InlineData(40.0)]
    public void AbbottCorrelation_MeetsThetaOfOxygen(double celsius)
    {
        double kelvin = celsius + 273.15;
        double virial = FugacityCoefficient.Abbott(kelvin, 154.58, 49.77, 0.022, out _);
        double measured = -OxygenPressureFactor.Theta(celsius) * 82.05746 * kelvin;
        output.WriteLine($"{celsius} °C: {virial:F2} cm³/mol for {measured:F2}");
        Assert.Equal(measured, virial, 0.55);
        Assert.Equal(1.0, virial / measured, 0.027);
    }

    /// <summary>
    /// The published second virial coefficients of the two gases that are not ideal, read back from φ of the pure gas at 1 atm, against the same correlation with their critical constants (from
    /// memory): a check from outside that sees a wrong digit. Allowed are the "some cm³/mol" of the correlation: 2 for N2O, and 4 for CO2, where it was found 3.8 too low at 0 °C.
    /// </summary>
    [Theory]
    [InlineData(Gas.NitrousOxide, 309.57, 71.5, 0.165, 2.0)]
    [InlineData(Gas.CarbonDioxide, 304.13, 72.8, 0.225, 4.0)]
    public void PublishedVirial_AgreesWithTheCorrelation(Gas gas, double criticalKelvin, double criticalAtmospheres, double acentricFactor, double allowed)
    {
        for (double celsius = 0.0; celsius <= 40.0; celsius += 5.0)
        {
            double kelvin = celsius + 273.15;
            double phi = FugacityCoefficient.Value(gas, celsius, 1.0, 1.0, null, out _, out _, out _);
            double published = Math.Log(phi) * 82.05746 * kelvin;
            double correlated = FugacityCoefficient.Abbott(kelvin, criticalKelvin, criticalAtmospheres, acentricFactor, out _);
            output.WriteLine($"{gas} at {celsius} °C: {published:F1} cm³/mol, correlation {correlated:F1}");
            Assert.Equal(published, correlated, allowed);
        }
    }

    /// <summary>At 1.1 atm nothing jumps, and the slopes on the two sides differ only by what the extra terms say.</summary>
    [Fact]
    public void Seam_IsContinuous()
    {
        int extended = 0;
        foreach ((Gas gas, SolubilityEquation equation) in CoreFunctions.Pairs())
        {
            double highest = GasEquilibrium.HighestHectopascal(gas);
            Assert.True(highest == Seam || highest == 10132.5);
            if (highest == Seam)
            {
                Assert.Equal(Status.PressureAboveRange, GasEquilibrium.MilligramsPerLitre(
                    gas, equation, 15.0, 0.0, Math.BitIncrement(Seam), 0.2, 100.0, RangeRule.NearEdge, out double refused));
                Assert.True(double.IsNaN(refused));
                continue;
            }

            extended++;
            foreach (double celsius in new[] { 10.0, 20.0, 30.0 })
            {
                double step = 1.0e-6;
                double below = Value(gas, equation, celsius, Seam - step);
                double at = Value(gas, equation, celsius, Seam);
                double above = Value(gas, equation, celsius, Seam + step);
                Assert.Equal(1.0, below / at, 2.0 * step / Seam);
                Assert.Equal(1.0, above / at, 2.0 * step / Seam);
                // Slope above over slope below: 1 − (V − B)/(R·T) per atm. V is about 32, B between −170 (CO2, there on both sides) and +12 cm³/mol.
                GasEquilibrium.MilligramsPerLitreSensitivities(gas, equation, celsius, 0.0, Seam, 0.2, 100.0, RangeRule.Refuse, out _, out _, out double left, out _, out _);
                GasEquilibrium.MilligramsPerLitreSensitivities(gas, equation, celsius, 0.0, Seam + step, 0.2, 100.0, RangeRule.Refuse, out _, out _, out double right, out _, out _);
                Assert.InRange(right / left, 1.0 - (70.0 * 1.1 / 22414.0), 1.0 + (5.0 * 1.1 / 22414.0));
            }
        }

        Assert.Equal(28, extended);
    }

    /// <summary>
    /// What the two terms amount to at 10 atm, against the textbook formula with the constants of their sources: exp[B·8.9 atm/(R·T)]·exp[−V·8.9 atm/(R·T)].
    /// </summary>
    [Theory]
    [InlineData(Gas.Oxygen, 31.7, -16.1, 1.0)]
    [InlineData(Gas.Nitrogen, 33.1, -4.4, 2.0)]
    [InlineData(Gas.Argon, 31.7, -15.5, 2.0)]
    [InlineData(Gas.Helium, 29.7, 11.8, 2.0)]
    public void TenAtmospheres_FollowVirialAndPoynting(Gas gas, double volume, double virial, double virialTolerance)
    {
        // Second virial coefficients near 298 K from memory (N2 −4.4, Ar −15.5, He +11.8 cm³/mol); oxygen from θ at 25 °C.
        SolubilityEquation equation = GasDefaults.Equation(gas);
        GasEquilibrium.ConcentrationFromPartialPressure(gas, equation, 25.0, 0.0, Seam, 100.0, RangeRule.Refuse, out double low);
        GasEquilibrium.ConcentrationFromPartialPressure(gas, equation, 25.0, 0.0, 10132.5, 100.0, RangeRule.Refuse, out double high);
        double perVolume = 8.9 / (82.05746 * 298.15);
        double found = (Math.Log(high / low) / perVolume) + volume;
        output.WriteLine($"{gas}: B = {found:F2} cm³/mol; C at constant partial pressure {100.0 * ((high / low) - 1.0):F3} % lower at 10 atm");
        Assert.Equal(virial, found, virialTolerance);
    }

    private static double Value(Gas gas, SolubilityEquation equation, double celsius, double pressure)
    {
        Assert.Equal(Status.Ok, GasEquilibrium.MilligramsPerLitre(gas, equation, celsius, 0.0, pressure, 0.2, 100.0, RangeRule.Refuse, out double value));
        return value;
    }
}
