using System;
using Xunit;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>Molar masses and gas volumes.</summary>
public class GasUnitsTests
{
    /// <summary>
    /// Molar masses composed from IUPAC atomic weights (2007, from memory): H 1.00794, C 12.0107, N 14.0067, O 15.9994, F 18.9984032, S 32.065, Cl 35.453. The library prints four
    /// decimals, hence half a unit of the last.
    /// </summary>
    [Theory]
    [InlineData(Gas.Oxygen, 0, 0, 0, 2, 0, 0, 0)]
    [InlineData(Gas.Nitrogen, 0, 0, 2, 0, 0, 0, 0)]
    [InlineData(Gas.CarbonDioxide, 0, 1, 0, 2, 0, 0, 0)]
    [InlineData(Gas.NitrousOxide, 0, 0, 2, 1, 0, 0, 0)]
    [InlineData(Gas.Methane, 4, 1, 0, 0, 0, 0, 0)]
    [InlineData(Gas.CarbonMonoxide, 0, 1, 0, 1, 0, 0, 0)]
    [InlineData(Gas.Hydrogen, 2, 0, 0, 0, 0, 0, 0)]
    [InlineData(Gas.SulfurHexafluoride, 0, 0, 0, 0, 6, 1, 0)]
    [InlineData(Gas.Cfc11, 0, 1, 0, 0, 1, 0, 3)]
    [InlineData(Gas.Cfc12, 0, 1, 0, 0, 2, 0, 2)]
    [InlineData(Gas.HydrogenSulfide, 2, 0, 0, 0, 0, 1, 0)]
    [InlineData(Gas.Ozone, 0, 0, 0, 3, 0, 0, 0)]
    [InlineData(Gas.Ammonia, 3, 0, 1, 0, 0, 0, 0)]
    [InlineData(Gas.Ethane, 6, 2, 0, 0, 0, 0, 0)]
    public void MolarMass_IsThatOfTheAtoms(Gas gas, int h, int c, int n, int o, int f, int s, int cl)
    {
        double sum = (h * 1.00794) + (c * 12.0107) + (n * 14.0067) + (o * 15.9994) + (f * 18.9984032) + (s * 32.065) + (cl * 35.453);
        Assert.Equal(sum, GasUnits.GramsPerMole(gas), 5.1e-5);
    }

    /// <summary>Gas densities at 0 °C and 1 atm as handbooks of dissolved-gas work print them, g/L (from memory).</summary>
    [Theory]
    [InlineData(Gas.Oxygen, 1.42903, 0.00003)]
    [InlineData(Gas.Nitrogen, 1.25043, 0.00002)]
    [InlineData(Gas.Argon, 1.78419, 0.00003)]
    [InlineData(Gas.CarbonDioxide, 1.97681, 0.00006)]
    public void Density_IsThatOfTheRealGas(Gas gas, double gramsPerLitre, double tolerance)
    {
        Assert.Equal(gramsPerLitre, GasUnits.MilligramsPerMillilitre(gas), tolerance);
    }

    [Fact]
    public void Units_GoThereAndBack_AndUnknownIsNaN()
    {
        foreach (Gas gas in Enum.GetValues<Gas>())
        {
            Assert.Equal(8.0, GasUnits.MilligramsPerLitreFromMicromolesPerLitre(gas, GasUnits.MicromolesPerLitreFromMilligramsPerLitre(gas, 8.0)), 1.0e-14);
            Assert.Equal(8.0, GasUnits.MilligramsPerLitreFromMillilitresPerLitre(gas, GasUnits.MillilitresPerLitreFromMilligramsPerLitre(gas, 8.0)), 1.0e-14);
            // A mole of gas fills 22.35 to 22.43 L at 0 °C and 1 atm in every gas that has a value of its own or the ideal one, CO2 22.26.
            Assert.InRange(GasUnits.LitresPerMole(gas), 22.26, 22.43);
        }

        Assert.True(double.IsNaN(GasUnits.GramsPerMole(0)));
        Assert.True(double.IsNaN(GasUnits.LitresPerMole((Gas)20)));
        Assert.True(double.IsNaN(GasUnits.MilligramsPerMillilitre((Gas)20)));
        Assert.True(double.IsNaN(GasUnits.MicromolesPerLitreFromMilligramsPerLitre(0, 1.0)));
        Assert.True(double.IsNaN(GasUnits.MillilitresPerLitreFromMilligramsPerLitre(0, 1.0)));
    }
}
