using System;
using ProbeCal.Core.Tests.Readings;
using Xunit;

namespace ProbeCal.Core.Tests.Calibration;

/// <summary>Limits, plausible pressures and the size of usual slips.</summary>
public class JudgementTests
{
    private const SolubilityEquation Equation = SolubilityEquation.BensonKrause1984;

    [Theory]
    [InlineData(8.0, 0.2, AppliedLimit.Absolute)]
    [InlineData(10.0, 0.2, AppliedLimit.Absolute)]
    [InlineData(14.0, 0.28, AppliedLimit.Relative)]
    public void Limit_AtSaturation_IsTheLargerOfTheTwo(double reference, double expected, AppliedLimit which)
    {
        Assert.Equal(Status.Ok, AcceptanceLimit.AtSaturation(
            reference, AcceptanceLimit.SaturationMilligramsPerLitre, AcceptanceLimit.SaturationPercent, out double limit, out AppliedLimit applied));
        Assert.Equal(expected, limit, 14);
        Assert.Equal(which, applied);
    }

    [Theory]
    [InlineData(0.0, 0.2, 2.0, Status.ConcentrationBelowRange)]
    [InlineData(8.0, -0.2, 2.0, Status.CoefficientBelowRange)]
    [InlineData(8.0, 0.2, -2.0, Status.CoefficientBelowRange)]
    [InlineData(1e308, 0.2, 200.0, Status.ConcentrationAboveRange)]
    public void Limit_ThatCannotBe_IsRefused(double reference, double absolute, double percent, Status expected)
    {
        Assert.Equal(expected, AcceptanceLimit.AtSaturation(reference, absolute, percent, out double limit, out _));
        Assert.True(double.IsNaN(limit));
    }

    [Fact]
    public void Passes_OnTheLimit_AndNeverWithNaN()
    {
        Assert.True(AcceptanceLimit.Passes(0.2, 0.2));
        Assert.True(AcceptanceLimit.Passes(-0.2, 0.2));
        Assert.False(AcceptanceLimit.Passes(Math.BitIncrement(0.2), 0.2));
        Assert.False(AcceptanceLimit.Passes(-0.21, 0.2));
        Assert.False(AcceptanceLimit.Passes(double.NaN, 0.2));
        Assert.False(AcceptanceLimit.Passes(0.1, double.NaN));
        Assert.False(AcceptanceLimit.Passes(double.NegativeInfinity, double.PositiveInfinity));
    }

    // At sea level the pressure is its own reduced value, so the bands stand as they are.
    [Theory]
    [InlineData(1050.1, PressureVerdict.RefusedHigh)]
    [InlineData(1049.9, PressureVerdict.ConfirmHigh)]
    [InlineData(1035.1, PressureVerdict.ConfirmHigh)]
    [InlineData(1034.9, PressureVerdict.Plausible)]
    [InlineData(950.1, PressureVerdict.Plausible)]
    [InlineData(949.9, PressureVerdict.ConfirmLow)]
    [InlineData(870.1, PressureVerdict.ConfirmLow)]
    [InlineData(869.9, PressureVerdict.RefusedLow)]
    public void Pressure_AtSeaLevel_FallsIntoItsBand(double pressure, PressureVerdict expected)
    {
        Assert.Equal(Status.Ok, PressurePlausibility.Judge(pressure, 0.0, out PressureVerdict verdict, out double seaLevel));
        Assert.Equal(expected, verdict);
        Assert.Equal(pressure, seaLevel, 9);
    }

    [Fact]
    public void Pressure_SeaLevelValueInTheMountains_IsRefused_AndTheStationsOwnIsNot()
    {
        // Standard pressure at 1,000 m is 898.7 hPa, at 2,000 m 795.0 hPa (US Standard Atmosphere 1976, from memory).
        foreach ((double altitude, double station) in new[] { (1000.0, 898.7), (2000.0, 795.0) })
        {
            PressurePlausibility.Judge(1013.25, altitude, out PressureVerdict verdict, out _);
            Assert.Equal(PressureVerdict.RefusedHigh, verdict);
            PressurePlausibility.Judge(station, altitude, out verdict, out double seaLevel);
            Assert.Equal(PressureVerdict.Plausible, verdict);
            Assert.Equal(1013.25, seaLevel, 0.15);
        }

        // 760 typed without its unit, taken for hPa at sea level.
        PressurePlausibility.Judge(760.0, 0.0, out PressureVerdict millimetres, out _);
        Assert.Equal(PressureVerdict.RefusedLow, millimetres);
    }

    // True station pressure is 974–1034 hPa at 50 m and 946–1004 hPa at 300 m for sea-level pressures of 980–1040 (computed by
    // the standard atmosphere, no outside source): there the value alone cannot tell.
    [Theory]
    [InlineData(1013.25, 50.0, true)]
    [InlineData(1000.0, 300.0, true)]
    [InlineData(1013.25, 1000.0, false)]
    [InlineData(900.0, 1000.0, false)]
    [InlineData(700.0, 50.0, false)]
    // Below sea level (about 1,062 hPa at -400 m) a usual pressure is higher than sea level ever sees.
    [InlineData(1060.0, -400.0, false)]
    public void Pressure_ThatMayBeASeaLevelValue_IsSaidToBe(double pressure, double altitude, bool expected)
    {
        Assert.Equal(expected, PressurePlausibility.MayBeSeaLevelValue(pressure, altitude));
    }

    // Error in the O2 value at 20 °C from a sea-level value: +1.2 % at 100 m, +6.3 at 500, +13 at 1000, +20 at 1500 (computed
    // from the equations of USGS TM 9-A6.2).
    [Theory]
    [InlineData(100.0, 1.2)]
    [InlineData(500.0, 6.3)]
    [InlineData(1000.0, 13.1)]
    [InlineData(1500.0, 20.4)]
    public void SeaLevelValue_CausesTheKnownError(double altitude, double percent)
    {
        Assert.Equal(Status.Ok, PressurePlausibility.SeaLevelValueError(Equation, 20.0, 0.0, 1013.25, altitude, out double error));
        StandardAtmosphere.FromSeaLevel(1013.25, altitude, out double station);
        OxygenEquilibrium.MilligramsPerLitre(Equation, 20.0, 0.0, station, RangeRule.Refuse, out double right);
        Assert.Equal(percent, 100.0 * error / right, 0.06);
    }

    // Dry instead of water-saturated air reads high by 1.2 % (10 °C), 2.4 (20), 3.2 (25), 4.4 (30), half that at 50 % humidity
    // (computed from the equations); a dry towel 102 where a wet one is 100 (OceanGliders oxygen practice).
    [Theory]
    [InlineData(10.0, 0.0, 1.2)]
    [InlineData(20.0, 0.0, 2.4)]
    [InlineData(25.0, 0.0, 3.2)]
    [InlineData(30.0, 0.0, 4.4)]
    [InlineData(25.0, 50.0, 1.6)]
    [InlineData(25.0, 100.0, 0.0)]
    public void DryChamber_ReadsHigh(double temperature, double humidity, double percent)
    {
        Assert.Equal(Status.Ok, ExpectedEffect.DryChamber(temperature, 1013.25, humidity, out double excess));
        Assert.Equal(percent, excess, 0.06);
    }

    [Fact]
    public void ReferenceError_OfHalfAKelvin_IsAboutOnePercent()
    {
        // 0.5 K is 1.1 % of the reference near 15 °C (computed, no outside source).
        Assert.Equal(Status.Ok, ExpectedEffect.ReferenceError(Equation, 0.0, 15.0, 1013.25, 14.5, 1013.25, out double error));
        OxygenEquilibrium.MilligramsPerLitre(Equation, 15.0, 0.0, 1013.25, RangeRule.Refuse, out double right);
        Assert.Equal(1.1, 100.0 * error / right, 0.05);
    }

    [Theory]
    [InlineData(MeterScale.MilligramsPerLitre, 0.0, 8.97)]
    [InlineData(MeterScale.MilligramsPerLitre, 4.5867, 8.73)]
    public void ValueToSet_IsTheFieldManuals(MeterScale scale, double salinity, double expected)
    {
        // 20.0 °C and 750 mmHg: 8.97 mg/L, and 8.73 mg/L at 8,000 µS/cm, which is S 4.5867 by its conversion (USGS 2020, TM 9-A6.2).
        var meter = new MeterDisplay(
            scale, Equation, salinity, double.NaN, double.NaN, TemperatureCoefficientForm.Exponential, 0.03, 25.0, 0.0, 40.0);
        CalibrationPoint point = Bench.WaterPoint(0.0, 20.0, PressureUnits.HectopascalFromMillimetresOfMercury(750.0));
        Assert.Equal(Status.Ok, MeterSetting.ValueToSet(meter, point, 0.0, out double shown, out _));
        Assert.Equal(expected, shown, 0.005);
    }

    [Theory]
    [InlineData(MeterScale.MilligramsPerLitre, double.NaN, double.NaN)]
    [InlineData(MeterScale.MilligramsPerLitre, 15.0, double.NaN)]
    [InlineData(MeterScale.PercentLocal, double.NaN, double.NaN)]
    [InlineData(MeterScale.PercentLocal, double.NaN, 1000.0)]
    [InlineData(MeterScale.PercentLocal, 15.0, 1000.0)]
    [InlineData(MeterScale.PercentOneAtmosphere, double.NaN, double.NaN)]
    [InlineData(MeterScale.PercentOneAtmosphere, 15.0, double.NaN)]
    public void ValueToSet_UncertaintyIsTheDerivatives(MeterScale scale, double temperatureSet, double pressureSet)
    {
        var meter = new MeterDisplay(
            scale, Equation, 10.0, pressureSet, temperatureSet, TemperatureCoefficientForm.Exponential, 0.03, 25.0, 0.0, 40.0);
        double Shown(double temperature, double pressure, double uTemperature = 0.0, double uPressure = 0.0, double uState = 0.0, double uOffset = 0.0)
        {
            Assert.Equal(Status.Ok, MeterSetting.ValueToSet(
                meter, Bench.WaterPoint(0.0, temperature, pressure, 0.0, uTemperature, uPressure, uState), uOffset, out double shown, out last));
            return shown;
        }

        double perKelvin = (Shown(20.01, 950.0) - Shown(19.99, 950.0)) / 0.02;
        double perHectopascal = (Shown(20.0, 951.0) - Shown(20.0, 949.0)) / 2.0;
        double value = Shown(20.0, 950.0, 0.3, 4.0, 0.0075, 0.4);
        double equation = scale == MeterScale.MilligramsPerLitre ? 0.00125 : 0.0;
        double expected = Math.Sqrt(
            (perKelvin * perKelvin * 0.25) + (perHectopascal * perHectopascal * 16.0) + (value * value * ((0.0075 * 0.0075) + (equation * equation))));
        Assert.Equal(1.0, last / expected, 5);
    }

    private double last;
}
