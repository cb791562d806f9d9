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
    [InlineData("VapourHardy1998", 7)]
    [InlineData("VapourBuck1996", 7)]
    [InlineData("VapourAntoine8111", 7)]
    [InlineData("DensityTanaka2001", 8)]
    [InlineData("DensityKell1975", 5)]
    public void Property_MeetsCheckValues(string function, int count)
    {
        CheckRow[] rows = CheckRow.Read("water-properties.csv", 82).Where(r => r["function"] == function).ToArray();
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

    /// <summary>
    /// Every form against the reference form over 0–40 °C, in %: a wrong digit in a coefficient moves one by more. The distances are those of the expert notes and of the forms' own
    /// accuracy; Weiss–Price, Green–Carritt, Buck 1981, Sonntag and Murray have no check value of their own in hand.
    /// </summary>
    [Theory]
    [InlineData(VapourEquation.BensonKrause1980, -0.125, -0.03)]
    [InlineData(VapourEquation.Hardy1998, -0.001, 0.006)]
    [InlineData(VapourEquation.Buck1996, -0.045, 0.02)]
    [InlineData(VapourEquation.Buck1981, -0.10, 0.02)]
    [InlineData(VapourEquation.Antoine8111, -0.39, -0.08)]
    [InlineData(VapourEquation.WeissPrice1980, -0.125, -0.08)]
    [InlineData(VapourEquation.GreenCarritt1967, -0.16, -0.13)]
    [InlineData(VapourEquation.Sonntag1990, -0.32, 0.05)]
    [InlineData(VapourEquation.Murray1967, -0.20, -0.05)]
    [InlineData(VapourEquation.Dickson2007, 0.0, 0.0)]
    public void VapourFormulas_StayWithinTheirDocumentedDistance(VapourEquation equation, double least, double most)
    {
        double lowest = 1.0;
        double highest = -1.0;
        for (int i = 0; i <= 400; i++)
        {
            Assert.Equal(Status.Ok, VapourPressure.Hectopascal(equation, 0.1 * i, 0.0, RangeRule.Refuse, out double formula));
            Assert.Equal(Status.Ok, VapourWagnerPruss1993.Pressure(0.1 * i, RangeRule.Refuse, out double reference));
            lowest = Math.Min(lowest, (formula / reference) - 1.0);
            highest = Math.Max(highest, (formula / reference) - 1.0);
        }

        output.WriteLine($"{equation} over Wagner-Pruss 1993, 0-40 °C: {100 * lowest:F4} % to {100 * highest:F4} %");
        Assert.InRange(100.0 * lowest, least, most);
        Assert.InRange(100.0 * highest, least, most);
    }

    /// <summary>Sea salt of S 35 lowers the vapour by 1.87 % (Dickson) and 1.89 % (Weiss–Price); Green–Carritt's factor is 1.88 %.</summary>
    [Theory]
    [InlineData(VapourEquation.Dickson2007, 1.87)]
    [InlineData(VapourEquation.WeissPrice1980, 1.89)]
    [InlineData(VapourEquation.GreenCarritt1967, 1.88)]
    public void SeaSalt_LowersTheVapour(VapourEquation equation, double percent)
    {
        foreach (double celsius in new[] { 0.0, 10.0, 25.0, 40.0 })
        {
            VapourPressure.Hectopascal(equation, celsius, 0.0, RangeRule.Refuse, out double fresh);
            VapourPressure.Hectopascal(equation, celsius, 35.0, RangeRule.Refuse, out double sea);
            Assert.Equal(percent, 100.0 * (1.0 - (sea / fresh)), 0.006);
        }
    }

    [Fact]
    public void Vapour_RefusesSaltWhereTheFormHasNone()
    {
        foreach (VapourEquation equation in Enum.GetValues<VapourEquation>())
        {
            bool sea = equation is VapourEquation.Dickson2007 or VapourEquation.WeissPrice1980 or VapourEquation.GreenCarritt1967;
            foreach (RangeRule rule in Enum.GetValues<RangeRule>())
            {
                Status status = VapourPressure.Hectopascal(equation, 20.0, 12.0, rule, out double value);
                Assert.Equal(sea ? Status.Ok : Status.SalinityAboveRange, status);
                Assert.Equal(!sea, double.IsNaN(value));
            }
        }

        Assert.Equal(Status.EquationUnknown, VapourPressure.Hectopascal(0, 20.0, 0.0, RangeRule.Extrapolate, out _));
        Assert.Equal(Status.EquationUnknown, VapourPressure.Hectopascal((VapourEquation)12, 20.0, 5.0, RangeRule.Extrapolate, out _));
    }

    /// <summary>Three densities of pure water: EOS-80 and Kell 1975 against Tanaka 2001, 0–40 °C.</summary>
    [Fact]
    public void Densities_AgreeInFreshWater()
    {
        double nearest = double.MaxValue;
        double furthest = 0.0;
        double eos = 0.0;
        for (int i = 0; i <= 400; i++)
        {
            Assert.Equal(Status.Ok, DensityTanaka2001.Density(0.1 * i, RangeRule.Refuse, out double tanaka));
            Assert.Equal(Status.Ok, DensityKell1975.Density(0.1 * i, RangeRule.Refuse, out double other));
            nearest = Math.Min(nearest, tanaka - other);
            furthest = Math.Max(furthest, tanaka - other);
            Assert.Equal(Status.Ok, DensityEos80.Density(0.1 * i, 0.0, RangeRule.Refuse, out other));
            eos = Math.Max(eos, Math.Abs(other - tanaka));
        }

        output.WriteLine($"Kell {nearest:F4} to {furthest:F4} below Tanaka, EOS-80 {eos:F4} kg/m3 from it at most");
        // Kell's greatest density is 999.972, Tanaka's 999.975: the distance is that everywhere, within 0.001.
        Assert.InRange(nearest, 0.0025, 0.0035);
        Assert.InRange(furthest, 0.0025, 0.004);
        Assert.InRange(eos, 0.0, 0.0025);
    }

    internal static double Value(string function, CheckRow row)
    {
        double celsius = row["scale"] == "ipts68" ? TemperatureScale.Its90FromIpts68(row.Number("celsius")) : row.Number("celsius");
        double value;
        Status status = function switch
        {
            "VapourWagnerPruss1993" => VapourWagnerPruss1993.Pressure(celsius, RangeRule.Refuse, out value),
            "VapourBensonKrause1980" => VapourBensonKrause1980.Pressure(celsius, RangeRule.Refuse, out value),
            "VapourHardy1998" => VapourHardy1998.Pressure(celsius, RangeRule.Refuse, out value),
            "VapourBuck1996" => VapourBuck1996.Pressure(celsius, RangeRule.Refuse, out value),
            "VapourAntoine8111" => VapourAntoine8111.Pressure(celsius, RangeRule.Refuse, out value),
            "DensityTanaka2001" => DensityTanaka2001.Density(celsius, RangeRule.Refuse, out value),
            "DensityKell1975" => DensityKell1975.Density(celsius, RangeRule.Refuse, out value),
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
