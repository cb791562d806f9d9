using System;
using System.Linq;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>What holds for every gas alike: defaults, one chain in both directions, oxygen to the bit, the edges.</summary>
public class GasEquilibriumTests(ITestOutputHelper output)
{
    [Fact]
    public void EveryGas_HasADefaultThatCoversItAndAnswers()
    {
        foreach (Gas gas in Enum.GetValues<Gas>())
        {
            SolubilityEquation equation = GasDefaults.Equation(gas);
            Assert.True(GasSolubility.Covers(gas, equation), gas.ToString());
            double fraction = DryAir.MoleFraction(gas);
            bool inAir = gas is not (Gas.HydrogenSulfide or Gas.Ozone or Gas.Ammonia or Gas.Ethane);
            Assert.Equal(inAir, !double.IsNaN(fraction));
            Assert.Equal(Status.Ok, GasEquilibrium.MilligramsPerLitre(
                gas, equation, 15.0, 0.0, 1013.25, inAir ? fraction : 1.0e-6, 100.0, RangeRule.Refuse, out double value));
            Assert.True(0.0 < value, gas.ToString());
        }

        // Glueckauf 1951 as seen second-hand: the seven gases that the equations are tied to leave no room beside them and 0.03 % of CO2.
        double sum = new[] { Gas.Oxygen, Gas.Nitrogen, Gas.Argon, Gas.Neon, Gas.Helium, Gas.Krypton, Gas.Xenon }.Sum(DryAir.MoleFraction);
        Assert.InRange(sum, 0.9996, 0.9998);
    }

    /// <summary>Oxygen in water-saturated air is the same number by either door.</summary>
    [Theory]
    [InlineData(SolubilityEquation.BensonKrause1984)]
    [InlineData(SolubilityEquation.GarciaGordon1992)]
    public void Oxygen_IsOxygenEquilibriumToTheBit(SolubilityEquation equation)
    {
        Random random = new(20261);
        for (int i = 0; i < 2000; i++)
        {
            double celsius = 40.0 * random.NextDouble();
            double salinity = 40.0 * random.NextDouble();
            double pressure = 506.625 + (607.95 * random.NextDouble());
            Assert.Equal(Status.Ok, OxygenEquilibrium.PartialPressure(celsius, pressure, RangeRule.Refuse, out double partial));
            Assert.Equal(Status.Ok, GasEquilibrium.PartialPressure(Gas.Oxygen, celsius, salinity, pressure, DryAir.OxygenMoleFraction, 100.0, RangeRule.Refuse, out double same));
            SameBits(partial, same);
            Assert.Equal(Status.Ok, OxygenEquilibrium.MilligramsPerLitre(equation, celsius, salinity, pressure, RangeRule.Refuse, out double milligrams));
            Assert.Equal(Status.Ok, GasEquilibrium.MilligramsPerLitre(
                Gas.Oxygen, equation, celsius, salinity, pressure, DryAir.OxygenMoleFraction, 100.0, RangeRule.Refuse, out same));
            SameBits(milligrams, same);
            partial = 1100.0 * random.NextDouble();
            OxygenEquilibrium.ConcentrationFromPartialPressure(equation, celsius, salinity, pressure, partial, RangeRule.Refuse, out milligrams);
            GasEquilibrium.ConcentrationFromPartialPressure(Gas.Oxygen, equation, celsius, salinity, pressure, partial, RangeRule.Refuse, out same);
            SameBits(milligrams, same);
            OxygenEquilibrium.PartialPressureFromConcentration(equation, celsius, salinity, pressure, milligrams, RangeRule.Refuse, out partial);
            GasEquilibrium.PartialPressureFromConcentration(Gas.Oxygen, equation, celsius, salinity, pressure, milligrams, RangeRule.Refuse, out same);
            SameBits(partial, same);

            // The derivatives go by another route (product rule over s and p): equal to rounding.
            OxygenEquilibrium.MilligramsPerLitreSensitivities(equation, celsius, salinity, pressure, RangeRule.Refuse, out double dT, out double dS, out double dP);
            GasEquilibrium.MilligramsPerLitreSensitivities(
                Gas.Oxygen, equation, celsius, salinity, pressure, DryAir.OxygenMoleFraction, 100.0, RangeRule.Refuse, out double gT, out double gS, out double gP, out _, out _);
            Assert.Equal(1.0, gT / dT, 1.0e-12);
            Assert.Equal(1.0, gS / dS, 1.0e-12);
            Assert.Equal(1.0, gP / dP, 1.0e-12);
        }
    }

    /// <summary>Concentration → partial pressure → concentration, and the two ways to a concentration, for every pair over its range.</summary>
    [Fact]
    public void BothDirections_AgreeForEveryPair()
    {
        Random random = new(20262);
        double worst = 0.0;
        foreach ((Gas gas, SolubilityEquation equation) in CoreFunctions.Pairs())
        {
            for (int i = 0; i < 40; i++)
            {
                double salinity = GasSolubility.HighestSalinity(equation) * random.NextDouble();
                double low = GasSolubility.LowestCelsius(gas, equation, salinity);
                double celsius = low + ((GasSolubility.HighestCelsius(equation) - low) * random.NextDouble());
                double pressure = GasEquilibrium.LowestHectopascal + ((GasEquilibrium.HighestHectopascal(gas) - GasEquilibrium.LowestHectopascal) * random.NextDouble());
                double fraction = random.NextDouble();
                double humidity = 100.0 * random.NextDouble();
                Assert.Equal(Status.Ok, GasEquilibrium.PartialPressure(gas, celsius, salinity, pressure, fraction, humidity, RangeRule.Refuse, out double partial));
                Assert.Equal(Status.Ok, GasEquilibrium.MilligramsPerLitre(gas, equation, celsius, salinity, pressure, fraction, humidity, RangeRule.Refuse, out double milligrams));
                Assert.Equal(Status.Ok, GasEquilibrium.ConcentrationFromPartialPressure(gas, equation, celsius, salinity, pressure, partial, RangeRule.Refuse, out double given));
                Assert.Equal(Status.Ok, GasEquilibrium.PartialPressureFromConcentration(gas, equation, celsius, salinity, pressure, given, RangeRule.Refuse, out double back));
                worst = Math.Max(worst, Math.Max(Math.Abs((given / milligrams) - 1.0), Math.Abs((back / partial) - 1.0)));

                // More gas than the total pressure carries: up to the highest partial pressure it comes back too.
                double more = pressure + ((GasEquilibrium.HighestHectopascal(gas) - pressure) * random.NextDouble());
                Assert.Equal(Status.Ok, GasEquilibrium.ConcentrationFromPartialPressure(gas, equation, celsius, salinity, pressure, more, RangeRule.Refuse, out given));
                Assert.Equal(Status.Ok, GasEquilibrium.PartialPressureFromConcentration(gas, equation, celsius, salinity, pressure, given, RangeRule.Refuse, out back));
                worst = Math.Max(worst, Math.Abs((back / more) - 1.0));
            }
        }

        output.WriteLine($"worst relative difference {worst:E2}, seed 20262");
        Assert.True(worst < 5.0e-15, $"{worst:E2}");
    }

    [Fact]
    public void NegativeAmounts_PassThrough()
    {
        foreach ((Gas gas, SolubilityEquation equation) in CoreFunctions.Pairs())
        {
            Assert.Equal(Status.Ok, GasEquilibrium.ConcentrationFromPartialPressure(gas, equation, 15.0, 0.0, 980.0, -2.5, RangeRule.Refuse, out double milligrams));
            Assert.True(milligrams < 0.0);
            Assert.Equal(Status.Ok, GasEquilibrium.PartialPressureFromConcentration(gas, equation, 15.0, 0.0, 980.0, milligrams, RangeRule.Refuse, out double back));
            Assert.Equal(-2.5, back, 1.0e-13);
        }
    }

    /// <summary>A thermometer that shows −0.1 °C in ice water: given when asked for, flagged, the uncertainty enlarged; refused otherwise.</summary>
    [Fact]
    public void NearEdge_IsGivenFlaggedAndLessCertain()
    {
        foreach ((Gas gas, SolubilityEquation equation) in CoreFunctions.Pairs())
        {
            double salinity = GasSolubility.HighestSalinity(equation) / 2.0;
            double lowest = GasSolubility.LowestCelsius(gas, equation, salinity);
            Assert.Equal(Status.TemperatureJustBelowRange, GasEquilibrium.MilligramsPerLitre(
                gas, equation, lowest - 0.15, salinity, 980.0, 0.2, 100.0, RangeRule.Refuse, out double none));
            Assert.True(double.IsNaN(none));
            Assert.Equal(Status.TemperatureJustBelowRange, GasEquilibrium.MilligramsPerLitre(
                gas, equation, lowest - 0.15, salinity, 980.0, 0.2, 100.0, RangeRule.NearEdge, out double outside));
            GasEquilibrium.MilligramsPerLitre(gas, equation, lowest, salinity, 980.0, 0.2, 100.0, RangeRule.Refuse, out double edge);
            GasEquilibrium.MilligramsPerLitre(gas, equation, lowest + 0.15, salinity, 980.0, 0.2, 100.0, RangeRule.Refuse, out double inside);
            GasEquilibrium.MilligramsPerLitre(gas, equation, lowest + 0.30, salinity, 980.0, 0.2, 100.0, RangeRule.Refuse, out double further);
            // Smooth across the edge: on the parabola through three values inside, to the third derivative, (0.15 K)³ times less than 1e-3/K³.
            Assert.Equal(1.0, outside / ((3.0 * edge) - (3.0 * inside) + further), 4.0e-6);

            Assert.Equal(Status.Ok, GasUncertainty.EquationRelative(gas, equation, lowest, salinity, 980.0, RangeRule.Refuse, out double stated));
            Assert.Equal(Status.TemperatureJustBelowRange, GasUncertainty.EquationRelative(gas, equation, lowest - 0.15, salinity, 980.0, RangeRule.NearEdge, out double enlarged));
            GasSolubility.Reference(gas, equation, lowest - 0.15, salinity, null, out double perKelvin, out _);
            Assert.Equal(Math.Sqrt((stated * stated) + (perKelvin * 0.15 * perKelvin * 0.15)), enlarged, 1.0e-12);
            Assert.True(stated < enlarged || perKelvin == 0.0);
        }
    }

    /// <summary>Dry air over water has no vapour in it; the mole fraction enters in proportion; the humidity only through the vapour.</summary>
    [Fact]
    public void GasPhase_FollowsDalton()
    {
        foreach (Gas gas in Enum.GetValues<Gas>())
        {
            Assert.Equal(Status.Ok, GasEquilibrium.PartialPressure(gas, 25.0, 20.0, 1000.0, 0.3, 0.0, RangeRule.Refuse, out double dry));
            Assert.Equal(300.0, dry, 1.0e-12);
            Assert.Equal(Status.Ok, GasEquilibrium.PartialPressure(gas, 25.0, 20.0, 1000.0, 0.3, 100.0, RangeRule.Refuse, out double moist));
            Assert.Equal(Status.Ok, GasEquilibrium.PartialPressure(gas, 25.0, 20.0, 1000.0, 0.3, 50.0, RangeRule.Refuse, out double half));
            Assert.Equal((dry + moist) / 2.0, half, 1.0e-12);
            // Wagner and Pruss 1993 at 25 °C: 31.70 hPa; the forms here lie 0.04 to 0.14 % lower, and salinity 20 takes 1.1 % off.
            double vapour = (dry - moist) / 0.3;
            Assert.InRange(vapour, 31.70 * (gas == Gas.Oxygen ? 0.9985 : 0.987), 31.70 * (gas == Gas.Oxygen ? 0.9999 : 0.989));
        }
    }

    /// <summary>
    /// K0 with virial and vapour, against the function F that the same authors fit to the two together at 1 atm: within the accuracy that the paper states for F.
    /// </summary>
    [Theory]
    [InlineData(Gas.NitrousOxide, SolubilityEquation.WeissPrice1980, SolubilityEquation.WeissPrice1980MoistAir, 0.0014)]
    [InlineData(Gas.CarbonDioxide, SolubilityEquation.Weiss1974, SolubilityEquation.WeissPrice1980, 0.003)]
    [InlineData(Gas.SulfurHexafluoride, SolubilityEquation.Bullister2002, SolubilityEquation.Bullister2002MoistAir, 0.02)]
    public void SolubilityAndMoistAirForm_Agree(Gas gas, SolubilityEquation solubility, SolubilityEquation moistAir, double stated)
    {
        double worst = 0.0;
        string place = string.Empty;
        for (double celsius = 0.0; celsius <= 40.0; celsius += 4.0)
        {
            for (double salinity = 0.0; salinity <= 40.0; salinity += 10.0)
            {
                GasEquilibrium.MilligramsPerLitre(gas, solubility, celsius, salinity, 1013.25, DryAir.MoleFraction(gas), 100.0, RangeRule.Refuse, out double one);
                GasEquilibrium.MilligramsPerLitre(gas, moistAir, celsius, salinity, 1013.25, DryAir.MoleFraction(gas), 100.0, RangeRule.Refuse, out double other);
                double off = (one / other) - 1.0;
                if (Math.Abs(off) <= Math.Abs(worst)) { continue; }
                worst = off;
                place = $"{celsius} °C, S {salinity}";
            }
        }

        output.WriteLine($"{gas}: {solubility} lies at most {100.0 * worst:F4} % from {moistAir} ({place})");
        Assert.True(Math.Abs(worst) < stated, $"{worst:E3}");
    }

    private static void SameBits(double expected, double actual)
    {
        Assert.Equal(BitConverter.DoubleToInt64Bits(expected), BitConverter.DoubleToInt64Bits(actual));
    }
}
