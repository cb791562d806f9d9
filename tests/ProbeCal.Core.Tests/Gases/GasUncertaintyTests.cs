using System;
using Xunit;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>What the equation, the edge of its range and pressure above 1.1 atm add to the uncertainty of any gas.</summary>
public class GasUncertaintyTests
{
    /// <summary>Stated accuracies as the papers' abstracts and tables give them second-hand (J19 and oxygen from memory), fractions; our choice is to take them as k = 1.</summary>
    [Theory]
    [InlineData(Gas.Nitrogen, SolubilityEquation.HammeEmerson2004, 0.0014)]
    [InlineData(Gas.Argon, SolubilityEquation.HammeEmerson2004, 0.0013)]
    [InlineData(Gas.Neon, SolubilityEquation.HammeEmerson2004, 0.0030)]
    [InlineData(Gas.Helium, SolubilityEquation.Weiss1971, 0.005)]
    [InlineData(Gas.Neon, SolubilityEquation.Weiss1971Bunsen, 0.005)]
    [InlineData(Gas.Krypton, SolubilityEquation.WeissKyser1978, 0.004)]
    [InlineData(Gas.Krypton, SolubilityEquation.WeissKyser1978Bunsen, 0.004)]
    [InlineData(Gas.Xenon, SolubilityEquation.WoodCaputi1966, 0.02)]
    [InlineData(Gas.Xenon, SolubilityEquation.Jenkins2019, 0.003)]
    [InlineData(Gas.CarbonDioxide, SolubilityEquation.Weiss1974, 0.002)]
    [InlineData(Gas.CarbonDioxide, SolubilityEquation.WeissPrice1980, 0.003)]
    [InlineData(Gas.NitrousOxide, SolubilityEquation.WeissPrice1980, 0.0014)]
    [InlineData(Gas.NitrousOxide, SolubilityEquation.WeissPrice1980MoistAir, 0.0014)]
    [InlineData(Gas.Methane, SolubilityEquation.WiesenburgGuinasso1979, 0.01)]
    [InlineData(Gas.CarbonMonoxide, SolubilityEquation.WiesenburgGuinasso1979Bunsen, 0.02)]
    [InlineData(Gas.SulfurHexafluoride, SolubilityEquation.Bullister2002, 0.02)]
    [InlineData(Gas.SulfurHexafluoride, SolubilityEquation.Bullister2002MoistAir, 0.02)]
    [InlineData(Gas.Cfc12, SolubilityEquation.WarnerWeiss1985, 0.015)]
    [InlineData(Gas.Ethane, SolubilityEquation.FernandezPrini2003, 0.02)]
    [InlineData(Gas.SulfurHexafluoride, SolubilityEquation.FernandezPrini2003, 0.10)]
    [InlineData(Gas.Ammonia, SolubilityEquation.Sander2023, 0.05)]
    public void StatedAccuracy_IsTaken(Gas gas, SolubilityEquation equation, double expected)
    {
        Assert.Equal(Status.Ok, GasUncertainty.EquationRelative(gas, equation, 15.0, 0.0, 1013.25, RangeRule.Refuse, out double relative));
        Assert.Equal(expected, relative, 1.0e-15);
    }

    /// <summary>The four equations of oxygen's Benson–Krause line share the figure of <see cref="OxygenUncertainty"/>, which rises with the salinity.</summary>
    [Theory]
    [InlineData(SolubilityEquation.BensonKrause1984)]
    [InlineData(SolubilityEquation.GarciaGordon1992)]
    [InlineData(SolubilityEquation.GarciaGordon1992Combined)]
    [InlineData(SolubilityEquation.BensonKrause1984PerKilogram)]
    public void Oxygen_RisesWithSalinity(SolubilityEquation equation)
    {
        foreach ((double salinity, double expected) in new[] { (0.0, 0.001), (20.0, 0.0015), (40.0, 0.002) })
        {
            Assert.Equal(Status.Ok, GasUncertainty.EquationRelative(Gas.Oxygen, equation, 15.0, salinity, 1013.25, RangeRule.Refuse, out double relative));
            Assert.Equal(expected, relative, 1.0e-15);
        }
    }

    /// <summary>Ten atmospheres: 5 cm³/mol · 8.9 atm/(R·T) beside the stated figure.</summary>
    [Fact]
    public void HighPressure_AddsToIt()
    {
        Assert.Equal(Status.Ok, GasUncertainty.EquationRelative(
            Gas.CarbonDioxide, SolubilityEquation.Weiss1974, 25.0, 0.0, 10132.5, RangeRule.Refuse, out double relative));
        double compressed = 5.0 * 8.9 / (82.05746 * 298.15);
        Assert.Equal(Math.Sqrt((0.002 * 0.002) + (compressed * compressed)), relative, 1.0e-12);
        // Continuous at 1.1 atm.
        GasUncertainty.EquationRelative(Gas.CarbonDioxide, SolubilityEquation.Weiss1974, 25.0, 0.0, 1114.575, RangeRule.Refuse, out double at);
        GasUncertainty.EquationRelative(Gas.CarbonDioxide, SolubilityEquation.Weiss1974, 25.0, 0.0, 1114.576, RangeRule.Refuse, out double above);
        Assert.Equal(at, above, 1.0e-9);
    }

    [Fact]
    public void Combined_IsTheRootOfTheSumOfSquares()
    {
        Assert.Equal(Status.Ok, GasUncertainty.Combined(1.0, -2.0, 3.0, 4.0, 5.0, 3.0, out double combined));
        Assert.Equal(8.0, combined);
        Assert.Equal(Status.UncertaintyNotFinite, GasUncertainty.Combined(1.0, double.NaN, 0.0, 0.0, 0.0, 0.0, out combined));
        Assert.True(double.IsNaN(combined));
        Assert.Equal(Status.UncertaintyAboveRange, GasUncertainty.Combined(1.0e200, 0.0, 0.0, 0.0, 0.0, 0.0, out combined));
        Assert.True(double.IsNaN(combined));
    }
}
