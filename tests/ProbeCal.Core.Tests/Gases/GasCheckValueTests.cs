using System;
using System.Linq;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>
/// Every gas and equation against values from outside, each in its own unit, through the public functions that a caller uses; each row names its source and
/// its tolerance. The two oxygen equations have more in <see cref="OxygenCheckValueTests"/>.
/// </summary>
public class GasCheckValueTests(ITestOutputHelper output)
{
    internal const int Rows = 234;
    private const double OneAtmosphere = 1013.25;
    private const double Vanishing = 1.0e-3;
    private const double MolesOfWaterPerKilogram = 1.0 / 0.018015268;

    [Theory]
    [InlineData(SolubilityEquation.BensonKrause1984PerKilogram, 1)]
    [InlineData(SolubilityEquation.GarciaGordon1992Combined, 1)]
    [InlineData(SolubilityEquation.Weiss1970, 18)]
    [InlineData(SolubilityEquation.HammeEmerson2004, 11)]
    [InlineData(SolubilityEquation.Jenkins2019, 3)]
    [InlineData(SolubilityEquation.WeissKyser1978, 5)]
    [InlineData(SolubilityEquation.Weiss1974, 157)]
    [InlineData(SolubilityEquation.WeissPrice1980, 1)]
    [InlineData(SolubilityEquation.WeissPrice1980MoistAir, 1)]
    [InlineData(SolubilityEquation.WiesenburgGuinasso1979, 3)]
    [InlineData(SolubilityEquation.Bullister2002, 1)]
    [InlineData(SolubilityEquation.FernandezPrini2003, 20)]
    [InlineData(SolubilityEquation.Sander2023, 12)]
    public void Equation_MeetsCheckValues(SolubilityEquation equation, int count)
    {
        CheckRow[] rows = CheckRow.Read("gas-equations.csv", Rows).Where(r => r["equation"] == equation.ToString()).ToArray();
        Assert.Equal(count, rows.Length);
        foreach (IGrouping<string, CheckRow> group in rows.GroupBy(r => r["gas"] + ", " + r["confidence"]))
        {
            Deviations deviations = new(equation + ", " + group.Key, output);
            foreach (CheckRow row in group)
            {
                deviations.Compare(Value(Named(row["gas"]), equation, row), row.Number("expected"), row.Number("tolerance"), row);
            }

            deviations.Finish();
        }
    }

    [Fact]
    public void EveryRow_IsReadByTheTestAbove()
    {
        int asked = typeof(GasCheckValueTests).GetMethod(nameof(Equation_MeetsCheckValues))!.GetCustomAttributes(typeof(InlineDataAttribute), false)
            .Cast<InlineDataAttribute>().Sum(static d => (int)d.GetData(null!).Single()[1]);
        Assert.Equal(Rows, asked);
        Assert.DoesNotContain(CheckRow.Read("gas-equations.csv", Rows), static r => r["confidence"] is not ("paper" or "ported" or "gsw" or "memory"));
    }

    internal static Gas Named(string symbol)
    {
        return Catalogue.Gases.Single(gas => gas.Symbol == symbol).Gas;
    }

    internal static double Value(Gas gas, SolubilityEquation equation, CheckRow row)
    {
        double celsius = row["scale"] == "ipts68" ? TemperatureScale.Its90FromIpts68(row.Number("celsius")) : row.Number("celsius");
        double salinity = row.Number("salinity");
        // EOS-80 is what the library turns litres into kilograms with: the same density takes it out again.
        DensityEos80.Density(celsius, salinity, RangeRule.Extrapolate, out double density);
        double milligrams;
        Status status;
        double fraction = double.NaN;
        if (row["quantity"] == "air")
        {
            fraction = row["moleFraction"].Length == 0 ? DryAir.MoleFraction(gas) : row.Number("moleFraction");
            status = GasEquilibrium.MilligramsPerLitre(
                gas, equation, celsius, salinity, OneAtmosphere, fraction, 100.0, RangeRule.Extrapolate, out milligrams);
        }
        else
        {
            // The pure gas at a vanishing pressure, where it is ideal: the constant itself.
            status = GasEquilibrium.ConcentrationFromPartialPressure(
                gas, equation, celsius, salinity, Vanishing, Vanishing, RangeRule.Extrapolate, out milligrams);
            milligrams *= OneAtmosphere / Vanishing;
        }

        // Some examples lie outside the range that the paper states (S 34.7 where it ends at 34.5, 400 K): computed, and flagged as such.
        Assert.True(status == Status.Ok || StatusParts.Reason(status) is RefusalReason.BelowRange or RefusalReason.AboveRange or RefusalReason.JustAboveRange, status + " for " + row);
        double moles = milligrams / GasUnits.GramsPerMole(gas) / 1000.0;
        double perKilogram = moles / (density / 1000.0);
        return row["unit"] switch
        {
            "mol/kg" => perKilogram,
            "umol/kg" => 1.0e6 * perKilogram,
            "nmol/kg" => 1.0e9 * perKilogram,
            "mL/L" => GasUnits.MillilitresPerLitreFromMilligramsPerLitre(gas, milligrams),
            "umol/kg at 22.3511 L/mol" => GasUnits.MillilitresPerLitreFromMilligramsPerLitre(gas, milligrams) / (density / 1000.0) * 1000.0 / 22.3511,
            "mol/(kg atm)" => double.IsNaN(fraction) ? perKilogram : perKilogram / fraction,
            "mol/(L atm)" => double.IsNaN(fraction) ? moles : moles / fraction,
            "mol/(m3 Pa)" => 1000.0 * moles / 101325.0,
            "ln(GPa)" => Math.Log(101325.0e-9 * MolesOfWaterPerKilogram * (density / 1000.0) / moles),
            _ => throw new ArgumentOutOfRangeException(nameof(row), row["unit"]),
        };
    }
}
