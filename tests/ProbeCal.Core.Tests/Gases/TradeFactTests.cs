using System;
using System.Globalization;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>
/// Facts of the trade (common practice, no source): rounded arithmetic with a rounded Henry constant. They are not
/// equilibrium values and nothing is tuned to them.
/// </summary>
public class TradeFactTests(ITestOutputHelper output)
{
    private const double RoundedOxygenConstant = 1.26e-3;
    private const double PrintedGramsPerLitre = 0.0404;

    [Fact]
    public void RoundedArithmetic_ReproducedToThePrintedDigits()
    {
        foreach (CheckRow row in CheckRow.Read("trade-facts.csv", 5))
        {
            double value = Value(row);
            string digits = "E" + (int.Parse(row["digits"], CultureInfo.InvariantCulture) - 1).ToString(CultureInfo.InvariantCulture);
            output.WriteLine(row + " gives " + value.ToString("R", CultureInfo.InvariantCulture));
            Assert.Equal(row.Number("printed").ToString(digits, CultureInfo.InvariantCulture), value.ToString(digits, CultureInfo.InvariantCulture));
        }
    }

    /// <summary>
    /// "1.26·10⁻³ mol/(L·atm) gives 0.0404 g of O2 in a litre at 25 °C under 1 atm" (common practice, no source). The constant as printed gives
    /// 0.0403 with the molar mass 31.9988 and with 32.0 alike; 0.0404 needs a constant between 1.2610 and 1.2641·10⁻³, all of which are printed as
    /// 1.26·10⁻³. So the pair is consistent as rounded figures, but the second is not the product of the first.
    /// </summary>
    [Fact]
    public void OxygenUnderOneAtmosphere_PrintedFigureComesFromAnUnroundedConstant()
    {
        Assert.Equal("0.0403", GramsPerLitre(RoundedOxygenConstant, 31.9988).ToString("F4", CultureInfo.InvariantCulture));
        Assert.Equal("0.0403", GramsPerLitre(RoundedOxygenConstant, 32.0).ToString("F4", CultureInfo.InvariantCulture));

        double fromPrinted = PrintedGramsPerLitre / OxygenUnits.GramsPerMole;
        output.WriteLine("constant behind 0.0404 g/L: " + fromPrinted.ToString("E4", CultureInfo.InvariantCulture));
        Assert.Equal("1.26E-003", fromPrinted.ToString("E2", CultureInfo.InvariantCulture));
        Assert.Equal("0.0404", GramsPerLitre(fromPrinted, OxygenUnits.GramsPerMole).ToString("F4", CultureInfo.InvariantCulture));
        Assert.Equal("0.0403", GramsPerLitre(1.2609e-3, OxygenUnits.GramsPerMole).ToString("F4", CultureInfo.InvariantCulture));
        Assert.Equal("0.0404", GramsPerLitre(1.2610e-3, OxygenUnits.GramsPerMole).ToString("F4", CultureInfo.InvariantCulture));
        Assert.Equal("0.0404", GramsPerLitre(1.2641e-3, OxygenUnits.GramsPerMole).ToString("F4", CultureInfo.InvariantCulture));
        Assert.Equal("0.0405", GramsPerLitre(1.2642e-3, OxygenUnits.GramsPerMole).ToString("F4", CultureInfo.InvariantCulture));
    }

    /// <summary>What the default equation says of the same water: +0.8 % against the printed 0.0404 g/L, +1.0 % against the rounded product.</summary>
    [Fact]
    public void OxygenUnderOneAtmosphere_DeviationOfTheDefaultEquation()
    {
        Assert.Equal(Status.Ok, OxygenEquilibrium.ConcentrationFromPartialPressure(
            SolubilityEquation.BensonKrause1984, 25.0, 0.0, 1013.25, 1013.25, RangeRule.Refuse, out double milligramsPerLitre));
        double ratio = milligramsPerLitre / 1000.0 / PrintedGramsPerLitre;
        double overProduct = milligramsPerLitre / 1000.0 / GramsPerLitre(RoundedOxygenConstant, OxygenUnits.GramsPerMole);
        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{milligramsPerLitre:F3} mg/L, {100.0 * (ratio - 1.0):F2} % and {100.0 * (overProduct - 1.0):F2} %"));
        Assert.Equal(0.8, Math.Round(100.0 * (ratio - 1.0), 1));
        Assert.Equal(1.0, Math.Round(100.0 * (overProduct - 1.0), 1));
    }

    private static double Value(CheckRow row)
    {
        double value;
        switch (row["form"])
        {
            case "grams":
                Assert.Equal(Status.Ok, HenryLaw.GramsPerLitre(
                    row.Number("constant"), Hectopascal(row), OxygenUnits.GramsPerMole, out value));
                return value;
            case "moles":
                Assert.Equal(Status.Ok, HenryLaw.MolesPerLitre(row.Number("constant"), Hectopascal(row), out value));
                return value;
            case "atmospheres":
                return PressureUnits.AtmospheresFromHectopascal(Hectopascal(row));
            case "partsPerMillion":
                Assert.Equal(Status.Ok, DensityEos80.Density(20.0, 0.0, RangeRule.Refuse, out double density));
                Assert.Equal(Status.Ok, OxygenUnits.MilligramsPerKilogramFromMilligramsPerLitre(row.Number("amount"), density, out value));
                return value;
            default:
                throw new InvalidOperationException(row["form"]);
        }
    }

    private static double Hectopascal(CheckRow row)
    {
        return row["unitOfAmount"] == "mmHg"
            ? PressureUnits.HectopascalFromMillimetresOfMercury(row.Number("amount"))
            : PressureUnits.HectopascalFromAtmospheres(row.Number("amount"));
    }

    private static double GramsPerLitre(double constant, double gramsPerMole)
    {
        Assert.Equal(Status.Ok, HenryLaw.GramsPerLitre(constant, 1013.25, gramsPerMole, out double value));
        return value;
    }
}
