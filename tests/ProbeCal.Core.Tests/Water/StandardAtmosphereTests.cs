using System;
using CsCheck;
using Xunit;

namespace ProbeCal.Core.Tests.Water;

public class StandardAtmosphereTests
{
    [Fact]
    public void Reduction_IsInverseAndFallsWithHeight()
    {
        Gen.Select(Gen.Double[-610.0, 10999.0], Gen.Double[200.0, 1100.0]).Sample((altitude, pressure) =>
        {
            Assert.Equal(Status.Ok, StandardAtmosphere.FromSeaLevel(pressure, altitude, out double station));
            Assert.Equal(Status.Ok, StandardAtmosphere.ReduceToSeaLevel(station, altitude, out double back));
            Assert.Equal(Status.Ok, StandardAtmosphere.Pressure(altitude, out double here));
            Assert.Equal(Status.Ok, StandardAtmosphere.Pressure(altitude + 1.0, out double above));
            return Math.Abs(back - pressure) <= 1.0e-12 * pressure && above < here && here - above < 0.14;
        }, iter: 10_000);
    }

    [Fact]
    public void SeaLevel_IsExact()
    {
        Assert.Equal(Status.Ok, StandardAtmosphere.Pressure(0.0, out double hectopascal));
        Assert.Equal(1013.25, hectopascal);
        Assert.Equal(Status.Ok, StandardAtmosphere.ReduceToSeaLevel(987.6, 0.0, out hectopascal));
        Assert.Equal(987.6, hectopascal);
    }

    /// <summary>A sea-level pressure taken for the station's, fresh water at 20 °C: the errors that practice notes print (computed there).</summary>
    [Theory]
    [InlineData(50.0, 0.6)]
    [InlineData(100.0, 1.2)]
    [InlineData(300.0, 3.7)]
    [InlineData(500.0, 6.3)]
    [InlineData(1000.0, 13.1)]
    [InlineData(2000.0, 28.3)]
    public void SeaLevelPressureByMistake_CostsThis(double altitude, double percent)
    {
        Assert.Equal(Status.Ok, StandardAtmosphere.Pressure(altitude, out double station));
        Assert.Equal(Status.Ok, BensonKrause1984.PressureFactor(20.0, station, RangeRule.Refuse, out double factor));
        Assert.Equal(percent, Math.Round(100.0 * ((1.0 / factor) - 1.0), 1));
    }
}
