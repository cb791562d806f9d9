using System;
using CsCheck;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Water;

/// <summary>Station pressure from a sea-level pressure, and what depth adds.</summary>
public class PressureAtStationAndDepthTests(ITestOutputHelper output)
{
    [Fact]
    public void StationPressure_IsTheSeaLevelPressureAtZeroMetres()
    {
        Gen.Select(Gen.Double[850.0, 1090.0], Gen.Double[-79.0, 59.0]).Sample((pressure, celsius) =>
        {
            Assert.Equal(Status.Ok, SeaLevelReduction.StationPressure(pressure, 0.0, celsius, out double station));
            return station == pressure;
        }, iter: 2_000);
    }

    /// <summary>With the standard temperature it is the standard atmosphere's own reduction; rounding only.</summary>
    [Fact]
    public void StationPressure_WithStandardTemperatureIsTheStandardAtmospheres()
    {
        double worst = 0.0;
        Gen.Select(Gen.Double[-610.0, 11000.0], Gen.Double[900.0, 1060.0]).Sample((altitude, pressure) =>
        {
            Assert.Equal(Status.Ok, SeaLevelReduction.StandardCelsius(altitude, out double celsius));
            Assert.Equal(Status.Ok, SeaLevelReduction.StationPressure(pressure, altitude, celsius, out double station));
            Assert.Equal(Status.Ok, StandardAtmosphere.FromSeaLevel(pressure, altitude, out double standard));
            Assert.Equal(Status.Ok, SeaLevelReduction.StationPressure(1013.25, altitude, celsius, out double mean));
            Assert.Equal(Status.Ok, StandardAtmosphere.Pressure(altitude, out double table));
            worst = Math.Max(worst, Math.Max(Math.Abs((station / standard) - 1.0), Math.Abs((mean / table) - 1.0)));
            return worst < 1.0e-12;
        }, iter: 2_000, threads: 1);
        output.WriteLine($"{worst:E2} apart at most");
    }

    /// <summary>
    /// A day colder than standard has denser air below the station: 15 K at 1000 m are 0.7 % (<see cref="StandardAtmosphere.ReduceToSeaLevel"/> says so); ±5 K are 0.2 % at 1000 m and 0.4 % at 2000 m.
    /// </summary>
    [Theory]
    [InlineData(1000.0, -15.0, -0.7, 0.05)]
    [InlineData(1000.0, 5.0, 0.2, 0.02)]
    [InlineData(2000.0, 5.0, 0.4, 0.03)]
    public void Temperature_ChangesTheStationPressure(double altitude, double kelvin, double percent, double tolerance)
    {
        Assert.Equal(Status.Ok, SeaLevelReduction.StandardCelsius(altitude, out double standard));
        Assert.Equal(Status.Ok, SeaLevelReduction.StationPressure(1013.25, altitude, standard, out double mean));
        Assert.Equal(Status.Ok, SeaLevelReduction.StationPressure(1013.25, altitude, standard + kelvin, out double day));
        output.WriteLine($"{100.0 * ((day / mean) - 1.0):F3} %");
        Assert.Equal(percent, 100.0 * ((day / mean) - 1.0), tolerance);
    }

    [Fact]
    public void StationPressure_SensitivitiesAndUncertainty()
    {
        Gen.Select(Gen.Double[940.0, 1050.0], Gen.Double[-500.0, 5000.0], Gen.Double[-40.0, 40.0]).Sample((pressure, altitude, celsius) =>
        {
            Assert.Equal(Status.Ok, SeaLevelReduction.Sensitivities(pressure, altitude, celsius, out double perPressure, out double perMetre, out double perKelvin));
            double a = (Value(pressure + 0.01, altitude, celsius) - Value(pressure - 0.01, altitude, celsius)) / 0.02;
            double b = (Value(pressure, altitude + 0.1, celsius) - Value(pressure, altitude - 0.1, celsius)) / 0.2;
            double c = (Value(pressure, altitude, celsius + 0.01) - Value(pressure, altitude, celsius - 0.01)) / 0.02;
            Assert.Equal(Status.Ok, SeaLevelReduction.StandardUncertainty(pressure, altitude, celsius, 1.5, 10.0, 5.0, out double u));
            double combined = Math.Sqrt(Math.Pow(1.5 * a, 2) + Math.Pow(10.0 * b, 2) + Math.Pow(5.0 * c, 2));
            return Math.Abs(perPressure - a) < 1.0e-8 && Math.Abs(perMetre - b) < 1.0e-8 && Math.Abs(perKelvin - c) < 1.0e-7 && Math.Abs(u - combined) < 1.0e-6;
        }, iter: 1_000);
    }

    /// <summary>About 14 % for 100 atm at 25 °C (Enns and others 1965, from memory) and 1.3 % for 100 m (practice notes).</summary>
    [Fact]
    public void Depth_RaisesThePartialPressure()
    {
        Assert.Equal(Status.Ok, Enns1965.Factor(Gas.Oxygen, 25.0, 101325.0, RangeRule.Refuse, out double hundredAtmospheres));
        output.WriteLine($"100 atm: {hundredAtmospheres:F4}");
        Assert.Equal(1.14, hundredAtmospheres, 0.005);
        Assert.Equal(Status.Ok, HydrostaticPressure.Hectopascal(100.0, 1000.0, RangeRule.Refuse, out double water));
        Assert.Equal(9806.65, water, 1.0e-9);
        Assert.Equal(Status.Ok, Enns1965.Factor(Gas.Oxygen, 15.0, water, RangeRule.Refuse, out double hundredMetres));
        Assert.Equal(1.3, 100.0 * (hundredMetres - 1.0), 0.05);
        Assert.Equal(Status.Ok, Enns1965.Factor(Gas.Oxygen, 15.0, 0.2 * water, RangeRule.Refuse, out double twentyMetres));
        Assert.InRange(100.0 * (twentyMetres - 1.0), 0.2, 0.3);
        Assert.Equal(Status.Ok, Enns1965.Factor(Gas.Helium, 15.0, 0.0, RangeRule.Refuse, out double surface));
        Assert.Equal(1.0, surface);
    }

    /// <summary>
    /// The float community's form for oxygen, exp(0.317·P/(8.314·T)) with P in dbar (SCOR working group 142, Bittig and others 2016, seen second-hand): the same within the rounding of its constants.
    /// </summary>
    [Fact]
    public void Depth_AgreesWithTheFloatCommunity()
    {
        foreach (double decibar in new[] { 10.0, 200.0, 1000.0 })
        {
            Assert.Equal(Status.Ok, Enns1965.Factor(Gas.Oxygen, 4.0, 100.0 * decibar, RangeRule.Refuse, out double factor));
            Assert.Equal(Math.Exp(0.317 * decibar / (8.314 * 277.15)), factor, 1.0e-5);
        }
    }

    /// <summary>The volumes read back from the factor, cm³/mol: oxygen second-hand in two places, the others from memory, so for them a check of digits alone. Half of the last digit.</summary>
    [Theory]
    [InlineData(Gas.Oxygen, 31.7)]
    [InlineData(Gas.Nitrogen, 33.1)]
    [InlineData(Gas.Argon, 31.7)]
    [InlineData(Gas.Helium, 29.7)]
    [InlineData(Gas.CarbonDioxide, 31.2)]
    public void Depth_FollowsTheVolumeOfTheGas(Gas gas, double cubicCentimetresPerMole)
    {
        double volume = Math.Log(Factor(gas, 25.0, 101325.0)) * 82.05746 * 298.15 / 100.0;
        Assert.Equal(cubicCentimetresPerMole, volume, 0.05);
    }

    [Fact]
    public void Depth_SensitivitiesAndRefusals()
    {
        foreach (Gas gas in new[] { Gas.Oxygen, Gas.Nitrogen, Gas.Argon, Gas.Helium, Gas.CarbonDioxide })
        {
            Assert.Equal(Status.Ok, Enns1965.Sensitivities(gas, 12.0, 30000.0, RangeRule.Refuse, out double perKelvin, out double perHectopascal));
            Assert.Equal((Factor(gas, 12.01, 30000.0) - Factor(gas, 11.99, 30000.0)) / 0.02, perKelvin, 1.0e-10);
            Assert.Equal((Factor(gas, 12.0, 30001.0) - Factor(gas, 12.0, 29999.0)) / 2.0, perHectopascal, 1.0e-12);
        }

        Assert.Equal(Status.GasUnknown, Enns1965.Factor(Gas.Neon, 12.0, 100.0, RangeRule.Extrapolate, out double none));
        Assert.True(double.IsNaN(none));
    }

    private static double Factor(Gas gas, double celsius, double hectopascal)
    {
        Assert.Equal(Status.Ok, Enns1965.Factor(gas, celsius, hectopascal, RangeRule.Refuse, out double factor));
        return factor;
    }

    private static double Value(double pressure, double altitude, double celsius)
    {
        Assert.Equal(Status.Ok, SeaLevelReduction.StationPressure(pressure, altitude, celsius, out double station));
        return station;
    }
}
