using System;
using System.Globalization;
using System.Threading;
using Xunit;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>The throwing twins: the same bits where the primitive says Ok, one clear line where it refuses.</summary>
public class ThrowingTests
{
    [Fact]
    public void Twins_ReturnTheValueOfTheFunction()
    {
        foreach (SolubilityEquation equation in Enum.GetValues<SolubilityEquation>())
        {
            OxygenEquilibrium.MilligramsPerLitre(equation, 12.0, 5.0, 950.0, RangeRule.Refuse, out double value);
            Assert.Equal(value, OxygenOrThrow.MilligramsPerLitre(equation, 12.0, 5.0, 950.0));
            OxygenEquilibrium.ConcentrationFromPartialPressure(equation, 12.0, 5.0, 950.0, 180.0, RangeRule.Refuse, out value);
            Assert.Equal(value, OxygenOrThrow.ConcentrationFromPartialPressure(equation, 12.0, 5.0, 950.0, 180.0));
            OxygenEquilibrium.PartialPressureFromConcentration(equation, 12.0, 5.0, 950.0, 9.0, RangeRule.Refuse, out value);
            Assert.Equal(value, OxygenOrThrow.PartialPressureFromConcentration(equation, 12.0, 5.0, 950.0, 9.0));
        }

        GarciaGordon1992.MicromolesPerKilogram(12.0, 5.0, 950.0, RangeRule.Refuse, out double expected);
        Assert.Equal(expected, OxygenOrThrow.MicromolesPerKilogram(12.0, 5.0, 950.0));
        OxygenEquilibrium.PartialPressure(12.0, 950.0, RangeRule.Refuse, out expected);
        Assert.Equal(expected, OxygenOrThrow.PartialPressure(12.0, 950.0));
        Saturation.PercentLocal(150.0, 12.0, 950.0, RangeRule.Refuse, out expected);
        Assert.Equal(expected, OxygenOrThrow.PercentLocal(150.0, 12.0, 950.0));
        Saturation.PercentOneAtmosphere(150.0, 12.0, RangeRule.Refuse, out expected);
        Assert.Equal(expected, OxygenOrThrow.PercentOneAtmosphere(150.0, 12.0));
        HenryLaw.MolesPerLitre(3.4e-2, 400.0, out expected);
        Assert.Equal(expected, OxygenOrThrow.HenryMolesPerLitre(3.4e-2, 400.0));
        VapourBensonKrause1980.Pressure(12.0, RangeRule.Refuse, out expected);
        Assert.Equal(expected, WaterOrThrow.VapourPressureBensonKrause1980(12.0));
        VapourWagnerPruss1993.Pressure(12.0, RangeRule.Refuse, out expected);
        Assert.Equal(expected, WaterOrThrow.VapourPressureWagnerPruss1993(12.0));
        DensityEos80.Density(12.0, 5.0, RangeRule.Refuse, out expected);
        Assert.Equal(expected, WaterOrThrow.Density(12.0, 5.0));
        FreezingPoint.Celsius(30.0, RangeRule.Refuse, out expected);
        Assert.Equal(expected, WaterOrThrow.FreezingCelsius(30.0));
        SpecificConductance.Salinity(700.0, RangeRule.Refuse, out expected);
        Assert.Equal(expected, WaterOrThrow.SalinityFromSpecificConductance(700.0));
        StandardAtmosphere.Pressure(640.0, out expected);
        Assert.Equal(expected, WaterOrThrow.StandardPressure(640.0));
        StandardAtmosphere.ReduceToSeaLevel(940.0, 640.0, out expected);
        Assert.Equal(expected, WaterOrThrow.SeaLevelPressure(940.0, 640.0));
        StandardAtmosphere.FromSeaLevel(1013.25, 640.0, out expected);
        Assert.Equal(expected, WaterOrThrow.StationPressure(1013.25, 640.0));
    }

    [Fact]
    public void Refusals_NameInputValueFaultAndRange()
    {
        CultureInfo before = Thread.CurrentThread.CurrentCulture;
        try
        {
            Thread.CurrentThread.CurrentCulture = CultureInfo.GetCultureInfo("de-DE");
            Refused(Status.TemperatureAboveRange, "Temperature 40.5 is above the range; allowed: 0 to 40 °C, salinity 0 to 40, total pressure 506.625 to 1114.575 hPa, oxygen at most 1114.575 hPa",
                () => OxygenOrThrow.MilligramsPerLitre(SolubilityEquation.BensonKrause1984, 40.5, 0.0, 1000.0));
            Refused(Status.SalinityBelowRange, "Salinity -1 is below the range; allowed: freezing point or -2 to 40 °C, salinity 0 to 42, total pressure 506.625 to 1114.575 hPa, oxygen at most 1114.575 hPa",
                () => OxygenOrThrow.MicromolesPerKilogram(10.0, -1.0, 1000.0));
            Refused(Status.PressureNotFinite, "Pressure NaN is not a finite number; allowed: -2 to 40 °C, total pressure 506.625 to 1114.575 hPa, oxygen at most 1114.575 hPa",
                () => OxygenOrThrow.PartialPressure(10.0, double.NaN));
            Refused(Status.EquationUnknown, "Equation 7 is not known; allowed: 1 (BensonKrause1984) or 2 (GarciaGordon1992)",
                () => OxygenOrThrow.MilligramsPerLitre((SolubilityEquation)7, 10.0, 0.0, 1000.0));
            Refused(Status.AltitudeAboveRange, "Altitude 20000 is above the range; allowed: -610 to 11000 m, pressure above 0 hPa",
                () => WaterOrThrow.StandardPressure(20000.0));
            Refused(Status.ConductanceBelowRange, "Conductance -0.5 is below the range; allowed: 0 to 59000 µS/cm",
                () => WaterOrThrow.SalinityFromSpecificConductance(-0.5));
        }
        finally
        {
            Thread.CurrentThread.CurrentCulture = before;
        }
    }

    [Fact]
    public void EveryTwin_Refuses()
    {
        Refused(Status.PartialPressureAboveRange, null, () => OxygenOrThrow.ConcentrationFromPartialPressure(SolubilityEquation.BensonKrause1984, 10.0, 0.0, 1000.0, 2000.0));
        Refused(Status.ConcentrationNotFinite, null, () => OxygenOrThrow.PartialPressureFromConcentration(SolubilityEquation.BensonKrause1984, 10.0, 0.0, 1000.0, double.NaN));
        Refused(Status.PressureBelowRange, null, () => OxygenOrThrow.PercentLocal(150.0, 10.0, 1.0));
        Refused(Status.PartialPressureNotFinite, null, () => OxygenOrThrow.PercentOneAtmosphere(double.NaN, 10.0));
        Refused(Status.CoefficientBelowRange, null, () => OxygenOrThrow.HenryMolesPerLitre(0.0, 100.0));
        Refused(Status.TemperatureBelowRange, null, () => WaterOrThrow.VapourPressureBensonKrause1980(-1.0));
        Refused(Status.TemperatureAboveRange, null, () => WaterOrThrow.VapourPressureWagnerPruss1993(400.0));
        Refused(Status.SalinityAboveRange, null, () => WaterOrThrow.Density(10.0, 50.0));
        Refused(Status.SalinityAboveRange, null, () => WaterOrThrow.FreezingCelsius(50.0));
        Refused(Status.PressureBelowRange, null, () => WaterOrThrow.SeaLevelPressure(0.0, 100.0));
        Refused(Status.AltitudeNotFinite, null, () => WaterOrThrow.StationPressure(1000.0, double.NaN));
    }

    private static void Refused(Status status, string? message, Func<double> call)
    {
        InputRefusedException exception = Assert.Throws<InputRefusedException>(() => call());
        Assert.Equal(status, exception.Status);
        if (message is not null) { Assert.Equal(message, exception.Message); }
    }
}
