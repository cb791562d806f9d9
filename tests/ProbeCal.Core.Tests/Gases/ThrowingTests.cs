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
        foreach (SolubilityEquation equation in new[] { SolubilityEquation.BensonKrause1984, SolubilityEquation.GarciaGordon1992 })
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
    public void GasTwins_ReturnTheValueOfTheFunction()
    {
        foreach ((Gas gas, SolubilityEquation equation) in CoreFunctions.Pairs())
        {
            GasEquilibrium.PartialPressure(gas, 12.0, 0.0, 950.0, 0.2, 80.0, RangeRule.Refuse, out double value);
            Assert.Equal(value, GasOrThrow.PartialPressure(gas, 12.0, 0.0, 950.0, 0.2, 80.0));
            GasEquilibrium.MilligramsPerLitre(gas, equation, 12.0, 0.0, 950.0, 0.2, 80.0, RangeRule.Refuse, out value);
            Assert.Equal(value, GasOrThrow.MilligramsPerLitre(gas, equation, 12.0, 0.0, 950.0, 0.2, 80.0));
            GasEquilibrium.PartialPressureFromConcentration(gas, equation, 12.0, 0.0, 950.0, value, RangeRule.Refuse, out double partial);
            Assert.Equal(partial, GasOrThrow.PartialPressureFromConcentration(gas, equation, 12.0, 0.0, 950.0, value));
            GasEquilibrium.ConcentrationFromPartialPressure(gas, equation, 12.0, 0.0, 950.0, 90.0, RangeRule.Refuse, out value);
            Assert.Equal(value, GasOrThrow.ConcentrationFromPartialPressure(gas, equation, 12.0, 0.0, 950.0, 90.0));
            Assert.Equal(GasUnits.MicromolesPerLitreFromMilligramsPerLitre(gas, 7.0), GasOrThrow.MicromolesPerLitreFromMilligramsPerLitre(gas, 7.0));
            Assert.Equal(GasUnits.MilligramsPerLitreFromMicromolesPerLitre(gas, 7.0), GasOrThrow.MilligramsPerLitreFromMicromolesPerLitre(gas, 7.0));
            Assert.Equal(GasUnits.MillilitresPerLitreFromMilligramsPerLitre(gas, 7.0), GasOrThrow.MillilitresPerLitreFromMilligramsPerLitre(gas, 7.0));
            Assert.Equal(GasUnits.MilligramsPerLitreFromMillilitresPerLitre(gas, 7.0), GasOrThrow.MilligramsPerLitreFromMillilitresPerLitre(gas, 7.0));
        }
    }

    [Fact]
    public void GasTwins_Refuse()
    {
        Refused(Status.TemperatureAboveRange, "Temperature 31 is above the range; allowed: 0 to 30 °C, salinity 0 to 34.5, total pressure 506.625 to 10132.5 hPa, mole fraction 0 to 1, humidity 0 to 100 %",
            () => GasOrThrow.MilligramsPerLitre(Gas.Nitrogen, SolubilityEquation.HammeEmerson2004, 31.0, 0.0, 1000.0, 0.78, 100.0));
        Refused(Status.TemperatureJustBelowRange, "Temperature -0.1 is just below the range; allowed: 0 to 30 °C, salinity 0 to 34.5, total pressure 506.625 to 10132.5 hPa, the gas at most 10132.5 hPa",
            () => GasOrThrow.ConcentrationFromPartialPressure(Gas.Nitrogen, SolubilityEquation.HammeEmerson2004, -0.1, 0.0, 1000.0, 780.0));
        Refused(Status.EquationUnknown, "Equation 12 is not known; allowed: 7 (Weiss1971), 8 (Weiss1971Bunsen), 13 (Jenkins2019), 22 (FernandezPrini2003), 23 (Sander2023)",
            () => GasOrThrow.PartialPressureFromConcentration(Gas.Helium, SolubilityEquation.HammeEmerson2004, 10.0, 0.0, 1000.0, 1.0e-6));
        Refused(Status.GasUnknown, "Gas 20 is not known; allowed: 1 (Oxygen) to 19 (Ethane)",
            () => GasOrThrow.MillilitresPerLitreFromMilligramsPerLitre((Gas)20, 1.0));
        Refused(Status.HumidityAboveRange, null, () => GasOrThrow.PartialPressure(Gas.Argon, 10.0, 0.0, 1000.0, 0.01, 101.0));
        Refused(Status.MoleFractionBelowRange, null, () => GasOrThrow.PartialPressure(Gas.Argon, 10.0, 0.0, 1000.0, -0.01, 100.0));
        Refused(Status.ConcentrationNotFinite, null, () => GasOrThrow.MilligramsPerLitreFromMicromolesPerLitre(Gas.Argon, double.NaN));
        Refused(Status.ConcentrationNotFinite, null, () => GasOrThrow.MilligramsPerLitreFromMillilitresPerLitre(Gas.Argon, double.PositiveInfinity));
        Refused(Status.GasUnknown, null, () => GasOrThrow.MicromolesPerLitreFromMilligramsPerLitre(0, 1.0));
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
        Refused(Status.TemperatureJustAboveRange, "Temperature 40.1 is just above the range; allowed: 0 to 40 °C, salinity 0 to 40, total pressure 506.625 to 1114.575 hPa, oxygen at most 1114.575 hPa",
            () => OxygenOrThrow.MilligramsPerLitre(SolubilityEquation.BensonKrause1984, 40.1, 0.0, 1000.0));
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
