using System;
using System.Collections.Generic;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>The default equation against the printed tables of the US national field manual, digit for digit.</summary>
public class FieldManualTableTests(ITestOutputHelper output)
{
    [Fact]
    public void Solubility_EveryCellToItsPrintedDigit()
    {
        List<CheckRow> rows = CheckRow.Read("field-manual-oxygen-solubility.csv", 1944);
        List<string> misses = [];
        foreach (CheckRow row in rows)
        {
            double pressure = PressureUnits.HectopascalFromMillimetresOfMercury(row.Number("millimetresOfMercury"));
            Status status = BensonKrause1984.MilligramsPerLitre(row.Number("celsius"), 0.0, pressure, RangeRule.Refuse, out double value);
            Assert.Equal(Status.Ok, status);
            if (Rounded(value, 2) != row.Exact("milligramsPerLitre")) { misses.Add(row + " gives " + value); }
        }

        output.WriteLine(rows.Count + " cells compared to the printed 0.01 mg/L, " + misses.Count + " miss");
        Assert.Empty(misses);
    }

    /// <summary>Why the temperature enters the default equation as given: converting the scale first loses printed cells.</summary>
    [Fact]
    public void Solubility_ConvertingTheTemperatureScaleFirstWouldMissCells()
    {
        int misses = 0;
        foreach (CheckRow row in CheckRow.Read("field-manual-oxygen-solubility.csv", 1944))
        {
            double pressure = PressureUnits.HectopascalFromMillimetresOfMercury(row.Number("millimetresOfMercury"));
            double ipts68 = TemperatureScale.Ipts68FromIts90(row.Number("celsius"));
            BensonKrause1984.MilligramsPerLitre(ipts68, 0.0, pressure, RangeRule.Extrapolate, out double value);
            if (Rounded(value, 2) != row.Exact("milligramsPerLitre")) { misses++; }
        }

        output.WriteLine(misses + " of 1944 cells miss when t68 = 1.00024 t90 is applied first");
        Assert.Equal(128, misses);
    }

    [Fact]
    public void SalinityFactor_EveryCellToItsPrintedDigit()
    {
        List<CheckRow> rows = CheckRow.Read("field-manual-salinity-factor.csv", 1242);
        List<string> misses = [];
        foreach (CheckRow row in rows)
        {
            double celsius = row.Number("celsius");
            Assert.Equal(Status.Ok, SpecificConductance.Salinity(
                row.Number("microsiemensPerCentimetre"), RangeRule.Refuse, out double salinity));
            double factor = Equilibrium(celsius, salinity, 1013.25) / Equilibrium(celsius, 0.0, 1013.25);
            if (Rounded(factor, 4) != row.Exact("factor")) { misses.Add(row + " gives " + factor); }
        }

        output.WriteLine(rows.Count + " cells compared to the printed 0.0001, " + misses.Count + " miss");
        Assert.Empty(misses);
    }

    /// <summary>Worked example of USGS Techniques and Methods 9-A6.2: 20.0 °C, 750 mmHg gives 8.97 mg/L.</summary>
    [Fact]
    public void WorkedExample_FreshWaterAt750MillimetresOfMercury()
    {
        double value = Equilibrium(20.0, 0.0, PressureUnits.HectopascalFromMillimetresOfMercury(750.0));
        Assert.Equal(8.97m, Rounded(value, 2));
    }

    /// <summary>
    /// Worked example of USGS Techniques and Methods 9-A6.2: specific conductance 8000 µS/cm has the factor 0.9733, so that 8.97
    /// becomes 8.73 mg/L, an uncompensated 7.50 becomes 7.30 mg/L, and that is 83.6 % of saturation.
    /// </summary>
    [Fact]
    public void WorkedExample_ConductiveWater()
    {
        double pressure = PressureUnits.HectopascalFromMillimetresOfMercury(750.0);
        Assert.Equal(Status.Ok, SpecificConductance.Salinity(8000.0, RangeRule.Refuse, out double salinity));
        double fresh = Equilibrium(20.0, 0.0, pressure);
        double saline = Equilibrium(20.0, salinity, pressure);
        Assert.Equal(0.9733m, Rounded(saline / fresh, 4));
        Assert.Equal(8.73m, Rounded(saline, 2));
        double compensated = 7.50 * saline / fresh;
        Assert.Equal(7.30m, Rounded(compensated, 2));

        Assert.Equal(Status.Ok, OxygenEquilibrium.PartialPressureFromConcentration(
            SolubilityEquation.BensonKrause1984, 20.0, salinity, pressure, compensated, RangeRule.Refuse, out double partialPressure));
        Assert.Equal(Status.Ok, Saturation.PercentLocal(partialPressure, 20.0, pressure, RangeRule.Refuse, out double percent));
        Assert.Equal(83.6m, Rounded(percent, 1));
    }

    private static double Equilibrium(double celsius, double salinity, double pressure)
    {
        Assert.Equal(Status.Ok, BensonKrause1984.MilligramsPerLitre(celsius, salinity, pressure, RangeRule.Refuse, out double value));
        return value;
    }

    private static decimal Rounded(double value, int digits)
    {
        return Math.Round((decimal)value, digits, MidpointRounding.AwayFromZero);
    }
}
