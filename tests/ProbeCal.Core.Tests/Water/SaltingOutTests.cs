using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Core.Tests.Gases;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Water;

/// <summary>Salting-out by ions, held to the sea-water equations through the composition of sea water.</summary>
public class SaltingOutTests(ITestOutputHelper output)
{
    // mol per kg of sea water of S 35: Dickson, Sabine and Christian (2007), chapter 5, the reference composition (from memory).
    private static readonly (Ion Ion, double MolesPerKilogram, int Charge)[] _seaWater =
    [
        (Ion.Chloride, 0.54586, -1),
        (Ion.Sulfate, 0.02824, -2),
        (Ion.Bromide, 0.00084, -1),
        (Ion.Fluoride, 0.00007, -1),
        (Ion.Bicarbonate, 0.00186, -1),
        (Ion.Carbonate, 0.00019, -2),
        (Ion.Sodium, 0.46906, 1),
        (Ion.Magnesium, 0.05282, 2),
        (Ion.Calcium, 0.01028, 2),
        (Ion.Potassium, 0.01021, 1),
        (Ion.Strontium, 0.00009, 2),
    ];

    /// <summary>A slip in the recalled composition would show in its charge; borate, left out, carries the 0.0001 that is missing.</summary>
    [Fact]
    public void SeaWater_IsNeutral()
    {
        double charge = _seaWater.Sum(i => i.MolesPerKilogram * i.Charge);
        output.WriteLine($"charge {charge:E2} mol/kg");
        Assert.InRange(Math.Abs(charge), 0.0, 2.0e-4);
    }

    /// <summary>
    /// Sea water of S 35 from its ions against the sea-water equation of each gas, in %. Oxygen: the distance that practice notes give, 1.3 at 5 °C, 0.3 at 15 °C and −0.4 at 25 °C, within 0.15. For a salt of
    /// 0.56 mol/L the stated 0.026 L/mol is 3.4 %, one standard uncertainty: all gases must lie within two, and all but helium (3.8 %) lie within one.
    /// </summary>
    [Theory]
    [InlineData(Gas.Oxygen, SolubilityEquation.BensonKrause1984, 5.0, 1.3)]
    [InlineData(Gas.Oxygen, SolubilityEquation.BensonKrause1984, 15.0, 0.3)]
    [InlineData(Gas.Oxygen, SolubilityEquation.BensonKrause1984, 25.0, -0.4)]
    [InlineData(Gas.Nitrogen, SolubilityEquation.Weiss1970, 5.0, double.NaN)]
    [InlineData(Gas.Nitrogen, SolubilityEquation.Weiss1970, 25.0, double.NaN)]
    [InlineData(Gas.Argon, SolubilityEquation.Weiss1970, 5.0, double.NaN)]
    [InlineData(Gas.Argon, SolubilityEquation.Weiss1970, 25.0, double.NaN)]
    [InlineData(Gas.Methane, SolubilityEquation.WiesenburgGuinasso1979, 25.0, double.NaN)]
    [InlineData(Gas.CarbonDioxide, SolubilityEquation.Weiss1974, 25.0, double.NaN)]
    [InlineData(Gas.Helium, SolubilityEquation.Jenkins2019, 25.0, double.NaN)]
    public void SeaWaterFromItsIons_MeetsTheSeaWaterEquation(Gas gas, SolubilityEquation equation, double celsius, double percent)
    {
        Assert.Equal(Status.Ok, DensityEos80.Density(celsius, 35.0, RangeRule.Refuse, out double density));
        double sum = 0.0;
        foreach ((Ion ion, double molesPerKilogram, _) in _seaWater)
        {
            Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Term(ion, gas, celsius, molesPerKilogram * density / 1000.0, RangeRule.Refuse, out double term));
            sum += term;
        }

        Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Factor(sum, out double factor));
        double fresh = Concentration(gas, equation, celsius, 0.0);
        double sea = Concentration(gas, equation, celsius, 35.0);
        double off = 100.0 * ((fresh * factor / sea) - 1.0);
        output.WriteLine($"{gas} at {celsius} °C: {off:F2} % from the sea-water equation");
        Assert.InRange(off, -6.8, 6.8);
        if (gas != Gas.Helium) { Assert.InRange(off, -3.4, 3.4); }
        if (!double.IsNaN(percent)) { Assert.Equal(percent, off, 0.15); }
    }

    /// <summary>Every constant against a second transcription. One mole of H⁺, whose constant is zero, shows a gas alone; oxygen, whose constant is zero, shows an ion alone.</summary>
    [Fact]
    public void Constants_MeetTheSecondTranscription()
    {
        List<CheckRow> rows = CheckRow.Read("salting-out.csv", 65);
        foreach (CheckRow row in rows)
        {
            bool isIon = row["kind"] == "ion";
            Ion ion = isIon ? Enum.Parse<Ion>(row["name"]) : Ion.Hydrogen;
            Gas gas = isIon ? Gas.Oxygen : Enum.Parse<Gas>(row["name"]);
            Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Term(ion, gas, 25.0, 1.0, RangeRule.Refuse, out double constant));
            Assert.True(Math.Abs(constant - row.Number("h")) < row.Number("hTolerance"), $"{row}: {constant}");
            if (isIon) { continue; }
            Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Sensitivity(ion, gas, 25.0, 1.0, RangeRule.Refuse, out double slope));
            if (row["slope"].Length == 0) { Assert.Equal(0.0, slope); }
            else { Assert.True(Math.Abs(slope - row.Number("slope")) < row.Number("slopeTolerance"), $"{row}: {slope}"); }
        }

        Assert.Equal(Enum.GetValues<Ion>().Length, rows.Count(row => row["kind"] == "ion"));
        Assert.Equal(65, rows.Select(row => row["kind"] + row["name"]).Distinct().Count());
    }

    /// <summary>NaCl and oxygen at 25 °C: 0.1461 L/mol is the sum of the two ions' constants, by hand.</summary>
    [Fact]
    public void Terms_AddUp()
    {
        Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Term(Ion.Sodium, Gas.Oxygen, 25.0, 1.0, RangeRule.Refuse, out double sodium));
        Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Term(Ion.Chloride, Gas.Oxygen, 25.0, 1.0, RangeRule.Refuse, out double chloride));
        Assert.Equal(0.1461, sodium + chloride, 1.0e-12);
        Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Factor(sodium + chloride, out double factor));
        Assert.Equal(Math.Pow(10.0, -0.1461), factor, 1.0e-12);
        Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Factor(0.0, out factor));
        Assert.Equal(1.0, factor);
    }

    [Fact]
    public void EveryIon_HasAConstantAndEveryOtherNumberNone()
    {
        foreach (Ion ion in Enum.GetValues<Ion>())
        {
            Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Term(ion, Gas.Oxygen, 25.0, 0.5, RangeRule.Refuse, out double term));
            Assert.InRange(term, 0.0, 0.18);
        }

        Assert.Equal(50, Enum.GetValues<Ion>().Length);
        foreach (Ion none in new[] { (Ion)0, (Ion)51, (Ion)(-1) })
        {
            Assert.Equal(Status.IonUnknown, SaltingOutWeisenbergerSchumpe1996.Term(none, Gas.Oxygen, 25.0, 0.5, RangeRule.Extrapolate, out double term));
            Assert.True(double.IsNaN(term));
        }
    }

    [Fact]
    public void Gases_WithoutConstantsAreRefused()
    {
        foreach (Gas gas in new[] { Gas.CarbonMonoxide, Gas.Cfc11, Gas.Cfc12, Gas.Ozone, (Gas)0 })
        {
            Assert.Equal(Status.GasUnknown, SaltingOutWeisenbergerSchumpe1996.Term(Ion.Sodium, gas, 25.0, 0.5, RangeRule.Extrapolate, out double none));
            Assert.True(double.IsNaN(none));
        }

        // No temperature constant: 25 °C alone, or with the constant of 25 °C and a flag.
        foreach (Gas gas in new[] { Gas.Krypton, Gas.Ammonia, Gas.HydrogenSulfide, Gas.SulfurHexafluoride })
        {
            Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Term(Ion.Sodium, gas, 25.0, 0.5, RangeRule.Refuse, out double at25));
            Assert.Equal(Status.TemperatureBelowRange, SaltingOutWeisenbergerSchumpe1996.Term(Ion.Sodium, gas, 15.0, 0.5, RangeRule.Refuse, out double none));
            Assert.True(double.IsNaN(none));
            Assert.Equal(Status.TemperatureBelowRange, SaltingOutWeisenbergerSchumpe1996.Term(Ion.Sodium, gas, 15.0, 0.5, RangeRule.Extrapolate, out double flagged));
            Assert.Equal(at25, flagged);
        }
    }

    [Fact]
    public void Sensitivity_IsTheSlope()
    {
        Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Sensitivity(Ion.Magnesium, Gas.Neon, 40.0, 0.7, RangeRule.Refuse, out double slope));
        Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Term(Ion.Magnesium, Gas.Neon, 50.0, 0.7, RangeRule.Refuse, out double high));
        Assert.Equal(Status.Ok, SaltingOutWeisenbergerSchumpe1996.Term(Ion.Magnesium, Gas.Neon, 30.0, 0.7, RangeRule.Refuse, out double low));
        Assert.Equal((high - low) / 20.0, slope, 1.0e-12);
        Assert.NotEqual(0.0, slope);
    }

    private static double Concentration(Gas gas, SolubilityEquation equation, double celsius, double salinity)
    {
        // At one partial pressure, so that the vapour over salt water does not enter.
        Assert.Equal(Status.Ok, GasEquilibrium.ConcentrationFromPartialPressure(gas, equation, celsius, salinity, 1013.25, 100.0, RangeRule.Refuse, out double milligrams));
        return milligrams;
    }
}
