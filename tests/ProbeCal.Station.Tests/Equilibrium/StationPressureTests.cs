using System;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;
using Xunit;

namespace ProbeCal.Station.Tests.Equilibrium;

/// <summary>The three ways to a station pressure: a barometer, a sea-level pressure with the altitude, the altitude alone.</summary>
public class StationPressureTests
{
    /// <summary>
    /// By hand: H = 639.936 m; 1021·[1 − 0.0065·H/(285.15 + 0.0065·H)]^5.25588 = 946.17 hPa (form of WMO-No. 8, from memory). Its uncertainty: 0.927·2.887 hPa of the service's
    /// value, 0.112 hPa/m·5.77 m of the altitude and 0.251 hPa/K·5 K of the temperature make 3.02 hPa.
    /// </summary>
    [Fact]
    public void SeaLevelPressure_BecomesTheStations_WithItsOwnUncertainty()
    {
        StationPressure pressure = StationPressure.Parse(null, "640m", null, "1021hPa", "12C");
        Assert.Equal("sea-level", pressure.Source);
        Assert.Equal(946.17, pressure.Hectopascal, 0.01);
        Assert.Equal(3.02, pressure.UncertaintyHectopascal, 0.01);
        Assert.Null(pressure.Note);
    }

    [Fact]
    public void AtSeaLevel_NothingChanges()
    {
        Assert.Equal(1021, StationPressure.Parse(null, "0m", null, "1021hPa").Hectopascal);
    }

    /// <summary>Without an air temperature the standard atmosphere's stands in, and the uncertainty says so.</summary>
    [Fact]
    public void WithoutAirTemperature_TheStandardAtmosphereStandsIn_AndIsLessSure()
    {
        StationPressure assumed = StationPressure.Parse(null, "640m", null, "1013.25hPa");
        Assert.Equal(StationPressure.Parse(null, "640m", null).Hectopascal, assumed.Hectopascal, 0.01);
        StationPressure read = StationPressure.Parse(null, "640m", null, "1013.25hPa", "10.84C");
        Assert.Equal(read.Hectopascal, assumed.Hectopascal, 0.01);
        Assert.InRange(assumed.UncertaintyHectopascal / read.UncertaintyHectopascal, 1.1, 1.5);
    }

    [Fact]
    public void StatedUncertainty_IsTheServices_AndNeverTheWhole()
    {
        double exact = StationPressure.Parse(null, "640m", "0hPa", "1021hPa", "12C").UncertaintyHectopascal;
        Assert.InRange(exact, 1.3, 1.5);
        // 0.927·3 hPa of the service's value beside the rest; and never less than what was stated.
        Assert.Equal(Math.Sqrt((exact * exact) + Math.Pow(0.92670 * 3, 2)), StationPressure.Parse(null, "640m", "3hPa", "1021hPa", "12C").UncertaintyHectopascal, 0.01);
        Assert.Equal(20, StationPressure.Parse(null, "640m", "20hPa", "1021hPa", "12C").UncertaintyHectopascal);
    }

    /// <summary>The same pressure in every unit, by the definitions of the units (1 mmHg = 1 Torr = 1013.25/760 hPa, 1 inHg = 25.4 mmHg, psi of NIST SP 811).</summary>
    [Theory]
    [InlineData("938hPa")]
    [InlineData("93.8kPa")]
    [InlineData("93800Pa")]
    [InlineData("0.938bar")]
    [InlineData("938mbar")]
    [InlineData("0.92573402417962003454atm")]
    [InlineData("703.5578583765112mmHg")]
    [InlineData("703.5578583765112Torr")]
    [InlineData("27.699128282539815inHg")]
    [InlineData("13.604539799094338psi")]
    public void EveryUnit_SaysTheSame(string text)
    {
        Assert.Equal(938, StationPressure.Parse(text, null, null).Hectopascal, 1e-6);
    }

    [Theory]
    [InlineData(null, null, null, null, "--pressure is missing: ")]
    [InlineData("938hPa", "640m", "1016hPa", null, "--pressure and --sea-level-pressure: the one is at the station")]
    [InlineData(null, null, "1016hPa", null, "--sea-level-pressure needs the altitude of the station beside it")]
    [InlineData("938hPa", null, null, "12C", "--air-temperature belongs to --sea-level-pressure, which is not given")]
    [InlineData(null, "640m", null, "12C", "--air-temperature belongs to --sea-level-pressure, which is not given")]
    [InlineData(null, "640m", "938hPa", "99C", "--air-temperature 99C: this is the air at the station, -80 to 60 °C")]
    [InlineData(null, "640m", "706mmHg", null, null)]
    [InlineData(null, "640m", "850hPa", null, "--sea-level-pressure 850hPa: sea level sees 870 to 1050 hPa (is it a station pressure, which is --pressure, or another unit?)")]
    [InlineData(null, "640m", "1060hPa", null, "--sea-level-pressure 1060hPa: sea level sees 870 to 1050 hPa")]
    [InlineData(null, "20km", "1016hPa", null, "--altitude 20km is outside the standard atmosphere used here, -610 to 11000 m")]
    [InlineData(null, "640", "1016hPa", null, "--altitude 640: an altitude carries its unit")]
    [InlineData(null, "640m", "1016", null, "--sea-level-pressure 1016: a pressure carries its unit")]
    [InlineData("938", null, null, null, "--pressure 938: a pressure carries its unit")]
    public void Combinations_ThatSayNothingOrTwoThings_AreOneLine(string? pressure, string? altitude, string? seaLevel, string? air, string? says)
    {
        if (says is null)
        {
            Assert.Contains("is rare", StationPressure.Parse(pressure, altitude, null, seaLevel, air).Note, StringComparison.Ordinal);
            return;
        }

        string message = Assert.Throws<InputException>(() => StationPressure.Parse(pressure, altitude, null, seaLevel, air)).Message;
        Assert.StartsWith(says, message, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', message);
    }
}
