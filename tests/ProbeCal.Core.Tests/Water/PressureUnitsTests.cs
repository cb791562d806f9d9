using System;
using CsCheck;
using Xunit;

namespace ProbeCal.Core.Tests.Water;

public class PressureUnitsTests
{
    [Fact]
    public void OneAtmosphere_InEveryUnit()
    {
        Assert.Equal(1013.25, PressureUnits.HectopascalFromAtmospheres(1.0));
        Assert.Equal(1013.25, PressureUnits.HectopascalFromMillimetresOfMercury(760.0));
        Assert.Equal(1.0, PressureUnits.AtmospheresFromHectopascal(1013.25));
        Assert.Equal(760.0, PressureUnits.MillimetresOfMercuryFromHectopascal(1013.25));
        Assert.Equal(101.325, PressureUnits.KilopascalFromHectopascal(1013.25));
        Assert.Equal(1.01325, PressureUnits.BarFromHectopascal(1013.25));
        // 29.92 inHg and 14.70 psi are the rounded figures that everyone knows (common practice, no source).
        Assert.Equal(29.92, Math.Round(PressureUnits.InchesOfMercuryFromHectopascal(1013.25), 2));
        Assert.Equal(14.70, Math.Round(PressureUnits.PsiFromHectopascal(1013.25), 2));
    }

    /// <summary>
    /// The conventional values (NIST SP 811, from memory): 133.322387415 Pa and 3386.388640341 Pa. The 1/760 atm used here is smaller by
    /// 1.4·10⁻⁷, a ten-thousandth of a hectopascal in an atmosphere.
    /// </summary>
    [Fact]
    public void Mercury_DiffersFromTheConventionalUnitByOnePartInSevenMillion()
    {
        Assert.Equal(-1.43e-7, (100.0 * PressureUnits.HectopascalPerMillimetreOfMercury / 133.322387415) - 1.0, 0.01e-7);
        Assert.Equal(-1.43e-7, (100.0 * PressureUnits.HectopascalPerInchOfMercury / 3386.388640341) - 1.0, 0.01e-7);
    }

    [Fact]
    public void ThereAndBack()
    {
        Gen.Double[-10.0, 2000.0].Sample(p =>
            Near(PressureUnits.HectopascalFromAtmospheres(PressureUnits.AtmospheresFromHectopascal(p)), p)
            && Near(PressureUnits.HectopascalFromKilopascal(PressureUnits.KilopascalFromHectopascal(p)), p)
            && Near(PressureUnits.HectopascalFromBar(PressureUnits.BarFromHectopascal(p)), p)
            && Near(PressureUnits.HectopascalFromMillimetresOfMercury(PressureUnits.MillimetresOfMercuryFromHectopascal(p)), p)
            && Near(PressureUnits.HectopascalFromInchesOfMercury(PressureUnits.InchesOfMercuryFromHectopascal(p)), p)
            && Near(PressureUnits.HectopascalFromPsi(PressureUnits.PsiFromHectopascal(p)), p), iter: 10_000);
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity)]
    public void WhatIsNotFinite_StaysSo(double value)
    {
        foreach (Func<double, double> convert in new Func<double, double>[]
        {
            PressureUnits.HectopascalFromAtmospheres, PressureUnits.AtmospheresFromHectopascal, PressureUnits.HectopascalFromKilopascal,
            PressureUnits.KilopascalFromHectopascal, PressureUnits.HectopascalFromBar, PressureUnits.BarFromHectopascal,
            PressureUnits.HectopascalFromMillimetresOfMercury, PressureUnits.MillimetresOfMercuryFromHectopascal,
            PressureUnits.HectopascalFromInchesOfMercury, PressureUnits.InchesOfMercuryFromHectopascal,
            PressureUnits.HectopascalFromPsi, PressureUnits.PsiFromHectopascal,
            TemperatureScale.Ipts68FromIts90, TemperatureScale.Its90FromIpts68,
        })
        {
            Assert.Equal(value, convert(value));
        }
    }

    [Fact]
    public void TemperatureScales_AreInverse()
    {
        Assert.Equal(10.0024, TemperatureScale.Ipts68FromIts90(10.0), 1.0e-12);
        Gen.Double[-2.0, 40.0].Sample(t => Near(TemperatureScale.Its90FromIpts68(TemperatureScale.Ipts68FromIts90(t)), t), iter: 10_000);
    }

    private static bool Near(double actual, double expected)
    {
        return Math.Abs(actual - expected) <= 8.0e-16 * Math.Max(Math.Abs(expected), 1.0e-3);
    }
}
