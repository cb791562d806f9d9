using Xunit;

namespace ProbeCal.Core.Tests.Water;

/// <summary>The twins that throw: the value of the function, or one line with the value, what is wrong and what would be right.</summary>
public class WaterOrThrowTests
{
    [Fact]
    public void Twins_ReturnTheValueOfTheFunction()
    {
        PracticalSalinity.FromConductivity(12.0, 17.0, 3.0, RangeRule.Refuse, out double salinity);
        Assert.Equal(salinity, WaterOrThrow.PracticalSalinityFromConductivity(12.0, 17.0, 3.0));
        DensityTanaka2001.Density(17.0, RangeRule.Refuse, out double density);
        Assert.Equal(density, WaterOrThrow.PureDensity(17.0));
        VapourPressure.Hectopascal(VapourEquation.Dickson2007, 17.0, 30.0, RangeRule.Refuse, out double vapour);
        Assert.Equal(vapour, WaterOrThrow.Vapour(VapourEquation.Dickson2007, 17.0, 30.0));
        SeaLevelReduction.StationPressure(1020.0, 640.0, 3.0, out double pressure);
        Assert.Equal(pressure, WaterOrThrow.StationPressure(1020.0, 640.0, 3.0));
    }

    [Fact]
    public void Refusals_NameValueFaultAndRange()
    {
        Line("Temperature 35.1 is just above the range; allowed: -2 to 35 °C", () => WaterOrThrow.PracticalSalinityFromConductivity(12.0, 35.1, 0.0));
        Line("Conductance -1 is below the range; allowed: 0 mS/cm to what gives salinity 42", () => WaterOrThrow.PracticalSalinityFromConductivity(-1.0, 20.0, 0.0));
        Line("Depth -0.5 is below the range; allowed: 0 to 10000 dbar", () => WaterOrThrow.PracticalSalinityFromConductivity(1.0, 20.0, -0.5));
        Line("Temperature -0.1 is just below the range; allowed: 0 to 40 °C", () => WaterOrThrow.PureDensity(-0.1));
        Line("Salinity 3 is above the range; allowed: the range of Buck1981; a form for pure water takes salinity 0 alone", () => WaterOrThrow.Vapour(VapourEquation.Buck1981, 20.0, 3.0));
        Line("Equation 12 is not known; allowed: 1 (WagnerPruss1993) to 11 (Antoine8111)", () => WaterOrThrow.Vapour((VapourEquation)12, 20.0, 0.0));
        Line("Temperature 61 is above the range; allowed: -80 to 60 °C", () => WaterOrThrow.StationPressure(1000.0, 100.0, 61.0));
        Line("Altitude 20000 is above the range; allowed: -610 to 11000 m, pressure above 0 hPa", () => WaterOrThrow.StationPressure(1000.0, 20000.0, 5.0));
    }

    private static void Line(string expected, System.Func<object> call)
    {
        Assert.Equal(expected, Assert.Throws<InputRefusedException>(call).Message);
    }
}
