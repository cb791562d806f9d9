using System;
using System.Linq;
using ProbeCal.Core.Tests.Gases;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Water;

/// <summary>Vapour pressure, density and the standard atmosphere against values from outside.</summary>
public class WaterCheckValueTests(ITestOutputHelper output)
{
    [Theory]
    [InlineData("VapourWagnerPruss1993", 9)]
    [InlineData("VapourBensonKrause1980", 7)]
    [InlineData("DensityEos80", 32)]
    public void Property_MeetsCheckValues(string function, int count)
    {
        CheckRow[] rows = CheckRow.Read("water-properties.csv", 48).Where(r => r["function"] == function).ToArray();
        Assert.Equal(count, rows.Length);
        foreach (IGrouping<string, CheckRow> group in rows.GroupBy(r => r["confidence"]))
        {
            Deviations deviations = new(function + ", " + group.Key, output);
            foreach (CheckRow row in group)
            {
                deviations.Compare(Value(function, row), row.Number("expected"), row.Number("tolerance"), row);
            }

            deviations.Finish();
        }
    }

    [Fact]
    public void StandardAtmosphere_MeetsTablesRecalledFromMemory()
    {
        Deviations deviations = new("standard atmosphere", output);
        foreach (CheckRow row in CheckRow.Read("standard-atmosphere.csv", 9))
        {
            double metres = row.Number("metres");
            // The inverse of H = r·z/(r + z), where the table counts in geopotential metres.
            double geometric = row["altitude"] == "geopotential" ? 6356766.0 * metres / (6356766.0 - metres) : metres;
            Assert.Equal(Status.Ok, StandardAtmosphere.Pressure(geometric, out double hectopascal));
            deviations.Compare(100.0 * hectopascal, row.Number("expected"), row.Number("tolerance"), row);
        }

        deviations.Finish();
    }

    /// <summary>The 1980 formula against the reference formula: at most 0.12 % below over its whole range.</summary>
    [Fact]
    public void VapourFormulas_StayWithinTheirDocumentedDistance()
    {
        double lowest = 1.0;
        double highest = -1.0;
        for (int i = 0; i <= 400; i++)
        {
            Assert.Equal(Status.Ok, VapourBensonKrause1980.Pressure(0.1 * i, RangeRule.Refuse, out double formula));
            Assert.Equal(Status.Ok, VapourWagnerPruss1993.Pressure(0.1 * i, RangeRule.Refuse, out double reference));
            lowest = Math.Min(lowest, (formula / reference) - 1.0);
            highest = Math.Max(highest, (formula / reference) - 1.0);
        }

        output.WriteLine($"Benson-Krause 1980 over Wagner-Pruss 1993, 0-40 °C: {100 * lowest:F4} % to {100 * highest:F4} %");
        Assert.InRange(lowest, -0.00125, -0.0011);
        Assert.InRange(highest, -0.00045, -0.0003);
    }

    private static double Value(string function, CheckRow row)
    {
        double celsius = row["scale"] == "ipts68" ? TemperatureScale.Its90FromIpts68(row.Number("celsius")) : row.Number("celsius");
        double value;
        Status status = function switch
        {
            "VapourWagnerPruss1993" => VapourWagnerPruss1993.Pressure(celsius, RangeRule.Refuse, out value),
            "VapourBensonKrause1980" => VapourBensonKrause1980.Pressure(celsius, RangeRule.Refuse, out value),
            _ => DensityEos80.Density(celsius, row.Number("salinity"), RangeRule.Refuse, out value),
        };
        Assert.Equal(Status.Ok, status);
        return row["unit"] switch
        {
            "Pa" => 100.0 * value,
            "mmHg" => PressureUnits.MillimetresOfMercuryFromHectopascal(value),
            _ => value,
        };
    }
}
