using System;
using System.Linq;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>Both oxygen equations against values from outside; each row names its source and its tolerance.</summary>
public class OxygenCheckValueTests(ITestOutputHelper output)
{
    private const double SalinityPerChlorinity = 1.80655;

    [Theory]
    [InlineData("BensonKrause1984.MilligramsPerLitre", 26)]
    [InlineData("PressureFactorOverPressure", 1)]
    [InlineData("GarciaGordon1992.MicromolesPerKilogram", 44)]
    public void Equation_MeetsCheckValues(string function, int count)
    {
        CheckRow[] rows = CheckRow.Read("oxygen-equations.csv", 71).Where(r => r["function"] == function).ToArray();
        Assert.Equal(count, rows.Length);
        Deviations deviations = new(function, output);
        foreach (CheckRow row in rows)
        {
            deviations.Compare(Value(function, row), row.Number("expected"), row.Number("tolerance"), row);
        }

        deviations.Finish();
    }

    [Theory]
    [InlineData(SolubilityEquation.BensonKrause1984)]
    [InlineData(SolubilityEquation.GarciaGordon1992)]
    public void StandardTable_RecalledFromMemory(SolubilityEquation equation)
    {
        Deviations deviations = new("standard table, " + equation, output);
        foreach (CheckRow row in CheckRow.Read("oxygen-standard-table.csv", 346).Where(r => r["equation"] == equation.ToString()))
        {
            // The table is older than ITS-90. Benson and Krause take the temperature as given, as their public tables do.
            double celsius = equation == SolubilityEquation.GarciaGordon1992
                ? TemperatureScale.Its90FromIpts68(row.Number("celsius"))
                : row.Number("celsius");
            // 25 g/kg of chlorinity is a salinity of 45, beyond both equations: flagged, computed and compared all the same.
            Status status = OxygenEquilibrium.MilligramsPerLitre(
                equation, celsius, row.Number("chlorinity") * SalinityPerChlorinity, 1013.25, RangeRule.Extrapolate, out double value);
            Assert.Equal(row.Number("chlorinity") == 25.0 ? Status.SalinityAboveRange : Status.Ok, status);
            deviations.Compare(value, row.Number("expected"), row.Number("tolerance"), row);
        }

        deviations.Finish();
    }

    /// <summary>The erratum of 1993: with the misprinted A3·Ts² term the value at 10 °C, S 35 would be far from the printed check value.</summary>
    [Fact]
    public void GarciaGordon_IsWithoutTheMisprintedTerm()
    {
        double celsius = TemperatureScale.Its90FromIpts68(10.0);
        Assert.Equal(Status.Ok, GarciaGordon1992.MicromolesPerKilogram(celsius, 35.0, 1013.25, RangeRule.Refuse, out double value));
        double ts = Math.Log((298.15 - 10.0) / (273.15 + 10.0));
        double misprinted = value * Math.Exp(5.10006 * ts * ts);
        Assert.Equal(274.610, value, 0.0005);
        Assert.True(0.1 < misprinted - 274.610);
    }

    internal static double Value(string function, CheckRow row)
    {
        double celsius = row["scale"] == "ipts68" ? TemperatureScale.Its90FromIpts68(row.Number("celsius")) : row.Number("celsius");
        double atmospheres = row.Number("atmospheres");
        double pressure = PressureUnits.HectopascalFromAtmospheres(atmospheres);
        double value;
        Status status = function switch
        {
            "BensonKrause1984.MilligramsPerLitre" =>
                BensonKrause1984.MilligramsPerLitre(celsius, row.Number("salinity"), pressure, RangeRule.Refuse, out value),
            "PressureFactorOverPressure" => BensonKrause1984.PressureFactor(celsius, pressure, RangeRule.Refuse, out value),
            _ => GarciaGordon1992.MicromolesPerKilogram(celsius, row.Number("salinity"), pressure, RangeRule.Refuse, out value),
        };
        Assert.Equal(Status.Ok, status);
        return function == "PressureFactorOverPressure" ? value / atmospheres : value;
    }
}
