using System;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>The forms of Henry's law, and the constants behind the equations.</summary>
public class HenryConversionTests(ITestOutputHelper output)
{
    // Density of water at 25 °C, kg/m³ (Tanaka 2001 and EOS-80 agree on these digits).
    private const double Rho = 997.047;

    /// <summary>
    /// Factors on Hcp at 25 °C. Hxp per atm: a public note that quotes Sander's conversion page (second-hand), printed 1.83089 with a density of its own, hence 0.0006. The others from
    /// memory of the same page: Hcc/Hcp = 2478.957 J/mol, mol/(L·atm) per mol/(m³·Pa) = 101.325.
    /// </summary>
    [Theory]
    [InlineData(HenryForm.Hcc, 1.0, 2478.957, 0.01)]
    [InlineData(HenryForm.Ostwald, 1.0, 2478.957, 0.01)]
    [InlineData(HenryForm.Hxp, 101325.0, 1.83089, 0.0006)]
    public void Factors_MeetThePublishedOnes(HenryForm to, double scale, double expected, double tolerance)
    {
        Assert.Equal(Status.Ok, HenryConversion.Convert(HenryForm.Hcp, to, 1.0, 25.0, Rho, out double factor));
        Assert.Equal(expected, factor * scale, tolerance);
    }

    /// <summary>What each form means, written out by hand for one gas: 1.3e-5 mol/(m³·Pa), so 1 Pa over water of 25 °C.</summary>
    [Fact]
    public void EveryForm_SaysTheSameAboutOneGas()
    {
        const double Hcp = 1.3e-5;
        double gas = 1.0 / (8.314462618 * 298.15);
        Is(HenryForm.Hcp, Hcp);
        Is(HenryForm.Hcc, Hcp / gas);
        Is(HenryForm.Kcc, gas / Hcp);
        Is(HenryForm.Ostwald, Hcp / gas);
        Is(HenryForm.Kpc, 1.0 / Hcp);
        Is(HenryForm.Hbp, Hcp / Rho);
        Is(HenryForm.Hxp, Hcp / (Rho / 0.018015268));
        Is(HenryForm.Kpx, Rho / 0.018015268 / Hcp);
        // mL of gas at 0 °C and 1 atm per mL of water under 1 atm.
        Is(HenryForm.Bunsen, Hcp * 101325.0 * (8.314462618 * 273.15 / 101325.0));

        static void Is(HenryForm form, double expected)
        {
            Assert.Equal(Status.Ok, HenryConversion.Convert(HenryForm.Hcp, form, Hcp, 25.0, Rho, out double value));
            Assert.Equal(1.0, value / expected, 1.0e-14);
        }
    }

    [Fact]
    public void EveryPairOfForms_GoesThereAndBack()
    {
        Random random = new(20263);
        double worst = 0.0;
        foreach (HenryForm from in Enum.GetValues<HenryForm>())
        {
            foreach (HenryForm to in Enum.GetValues<HenryForm>())
            {
                for (int i = 0; i < 50; i++)
                {
                    double constant = Math.Exp((20.0 * random.NextDouble()) - 10.0);
                    double celsius = 100.0 * random.NextDouble();
                    double density = 950.0 + (100.0 * random.NextDouble());
                    Assert.Equal(Status.Ok, HenryConversion.Convert(from, to, constant, celsius, density, out double there));
                    Assert.Equal(Status.Ok, HenryConversion.Convert(to, from, there, celsius, density, out double back));
                    worst = Math.Max(worst, Math.Abs((back / constant) - 1.0));
                }
            }
        }

        output.WriteLine($"worst {worst:E2}, seed 20263");
        Assert.True(worst < 2.0e-15, $"{worst:E2}");
    }

    [Fact]
    public void BadInput_IsRefused()
    {
        Assert.Equal(Status.CoefficientUnknown, HenryConversion.Convert(0, HenryForm.Hcc, 1.0, 25.0, Rho, out _));
        Assert.Equal(Status.CoefficientUnknown, HenryConversion.Convert(HenryForm.Hcc, (HenryForm)10, 1.0, 25.0, Rho, out _));
        Assert.Equal(Status.CoefficientBelowRange, HenryConversion.Convert(HenryForm.Hcp, HenryForm.Hcc, 0.0, 25.0, Rho, out double none));
        Assert.True(double.IsNaN(none));
        Assert.Equal(Status.TemperatureBelowRange, HenryConversion.Convert(HenryForm.Hcp, HenryForm.Hcc, 1.0, -273.15, Rho, out _));
        Assert.Equal(Status.DensityBelowRange, HenryConversion.Convert(HenryForm.Hcp, HenryForm.Hcc, 1.0, 25.0, 0.0, out _));
        Assert.Equal(Status.CoefficientAboveRange, HenryConversion.Convert(HenryForm.Hcp, HenryForm.Hcc, 1.0e308, 25.0, Rho, out none));
        Assert.True(double.IsNaN(none));
        Assert.Equal(Status.CoefficientBelowRange, HenryConversion.Convert(HenryForm.Hbp, HenryForm.Kpx, 5.0e-324, 25.0, 1.0e-9, out none));
        Assert.True(double.IsNaN(none));
    }

    /// <summary>What leaves the numbers on the way is refused, and never comes out as a zero with Ok.</summary>
    [Theory]
    [InlineData(HenryForm.Hcc, HenryForm.Hcp, 1.0, 1.0e308, 997.0, Status.TemperatureAboveRange)]
    [InlineData(HenryForm.Hcp, HenryForm.Kcc, 1.0, 1.0e308, 997.0, Status.TemperatureAboveRange)]
    [InlineData(HenryForm.Hbp, HenryForm.Hcp, 1.0, 25.0, 1.0e-310, Status.DensityBelowRange)]
    [InlineData(HenryForm.Hcp, HenryForm.Hxp, 1.0, 25.0, 1.0e-311, Status.DensityBelowRange)]
    [InlineData(HenryForm.Hcc, HenryForm.Hcp, 5.0e-324, 25.0, 997.0, Status.CoefficientBelowRange)]
    [InlineData(HenryForm.Kcc, HenryForm.Hcp, 1.0e308, 25.0, 997.0, Status.CoefficientAboveRange)]
    public void Extremes_AreRefused(HenryForm from, HenryForm to, double constant, double celsius, double density, Status expected)
    {
        Assert.Equal(expected, HenryConversion.Convert(from, to, constant, celsius, density, out double converted));
        Assert.True(double.IsNaN(converted));
    }

    /// <summary>The guideline's fits begin at the lowest data: whole degrees as seen second-hand.</summary>
    [Theory]
    [InlineData(Gas.Oxygen, 1.0)]
    [InlineData(Gas.Nitrogen, 5.0)]
    [InlineData(Gas.CarbonDioxide, 1.0)]
    [InlineData(Gas.Methane, 2.0)]
    public void Guideline_BeginsAtItsLowestData(Gas gas, double celsius)
    {
        Assert.Equal(celsius, FernandezPrini2003.LowestCelsius(gas), 0.5);
    }

    /// <summary>kH as the international guideline prints it at 300 K (second-hand, to 0.00005 in the logarithm), by way of Hcp and the conversion.</summary>
    [Theory]
    [InlineData(Gas.Helium, 2.6576)]
    [InlineData(Gas.Neon, 2.5134)]
    [InlineData(Gas.Argon, 1.4061)]
    [InlineData(Gas.Krypton, 0.8210)]
    [InlineData(Gas.Hydrogen, 1.9702)]
    [InlineData(Gas.Nitrogen, 2.1716)]
    [InlineData(Gas.Oxygen, 1.5024)]
    [InlineData(Gas.CarbonDioxide, -1.7508)]
    [InlineData(Gas.HydrogenSulfide, -2.8784)]
    [InlineData(Gas.Methane, 1.4034)]
    [InlineData(Gas.SulfurHexafluoride, 3.1445)]
    public void Guideline_At300Kelvin(Gas gas, double logarithmOfGigapascal)
    {
        Assert.Equal(Status.Ok, HenryLaw.Constant(gas, SolubilityEquation.FernandezPrini2003, 26.85, 0.0, RangeRule.Refuse, out double hcp));
        DensityEos80.Density(26.85, 0.0, RangeRule.Refuse, out double density);
        Assert.Equal(Status.Ok, HenryConversion.Convert(HenryForm.Hcp, HenryForm.Kpx, hcp, 26.85, density, out double pascal));
        Assert.Equal(logarithmOfGigapascal, Math.Log(pascal / 1.0e9), 6.0e-5);
    }

    /// <summary>A Bunsen coefficient comes back from Hcp as itself, but for the real gas: the conversion counts ideal volumes, 22.414 L/mol.</summary>
    [Theory]
    [InlineData(Gas.Oxygen, SolubilityEquation.Weiss1970Bunsen, 22.3916)]
    [InlineData(Gas.Nitrogen, SolubilityEquation.Weiss1970Bunsen, 22.403)]
    [InlineData(Gas.Krypton, SolubilityEquation.WeissKyser1978Bunsen, 22.3511)]
    [InlineData(Gas.Methane, SolubilityEquation.WiesenburgGuinasso1979Bunsen, 22.414)]
    public void Bunsen_ComesBack(Gas gas, SolubilityEquation equation, double litresPerMole)
    {
        Assert.Equal(Status.Ok, HenryLaw.Constant(gas, equation, 20.0, 10.0, RangeRule.Refuse, out double hcp));
        Assert.Equal(Status.Ok, HenryConversion.Convert(HenryForm.Hcp, HenryForm.Bunsen, hcp, 20.0, 1005.0, out double bunsen));
        double printed = GasSolubility.EquationValue(gas, equation, 20.0, 10.0, null, out _, out _);
        // 1e-5: the printed 1.42905 mg/mL of oxygen, and 22.414 for 22.41397.
        Assert.Equal(22.414 / litresPerMole, bunsen / printed, 1.0e-5);
    }

    /// <summary>Two significant figures against the default equation at 25 °C in fresh water: within the 5 % that the compilation is taken for.</summary>
    [Fact]
    public void Sander_LiesWithinItsUncertaintyOfTheDefaults()
    {
        foreach (Gas gas in Enum.GetValues<Gas>())
        {
            SolubilityEquation equation = GasDefaults.Equation(gas);
            if (equation is SolubilityEquation.Sander2023 || !GasSolubility.Covers(gas, SolubilityEquation.Sander2023)) { continue; }
            HenryLaw.Constant(gas, equation, 25.0, 0.0, RangeRule.Refuse, out double hcp);
            HenryLaw.Constant(gas, SolubilityEquation.Sander2023, 25.0, 0.0, RangeRule.Refuse, out double compiled);
            output.WriteLine($"{gas}: {100.0 * ((compiled / hcp) - 1.0):F2} %");
            Assert.Equal(1.0, compiled / hcp, 0.05);
        }
    }
}
