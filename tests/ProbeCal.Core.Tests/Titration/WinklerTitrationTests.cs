using System;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Titration;

/// <summary>The titration against stoichiometry done apart, against the rules and worked figures of others, and its slopes against differences.</summary>
public class WinklerTitrationTests(ITestOutputHelper output)
{
    /// <summary>
    /// Stoichiometry without the formula: a flask of 300 mL holds 298 mL of water with 9 mg/L, that is 9·0.298 mg of oxygen; with 0.003 mg from the reagents and 31.9988 g/mol, four
    /// thiosulfate to one oxygen, that takes so many µmol and so many mL of 0.025 mol/L.
    /// </summary>
    [Fact]
    public void Stoichiometry_GoesThereAndBack()
    {
        double micromoles = ((9.0 * 0.298) + 0.003) / 31.9988 * 1000.0 * 4.0;
        double titre = (micromoles / 0.025 / 1000.0) + 0.02;
        Assert.Equal(Status.Ok, WinklerTitration.MilligramsPerLitre(titre, 0.02, 0.025, 300.0, double.NaN, 2.0, 0.003, out double milligrams));
        Assert.Equal(9.0, milligrams, 12);
        // 201 mL of the 300 mL hold 201/300 of the iodine.
        Assert.Equal(Status.Ok, WinklerTitration.MilligramsPerLitre(((titre - 0.02) * 201.0 / 300.0) + 0.02, 0.02, 0.025, 300.0, 201.0, 2.0, 0.003, out double aliquot));
        Assert.Equal(9.0, aliquot, 12);
    }

    /// <summary>
    /// Rules of standard methods. 0.025 mol/L: 1 mL is 1 mg/L when what stands for 200 mL of the sample is titrated, 201 mL for 2 mL of reagents in 300 mL (Standard Methods 4500-O C, as given in the
    /// reference data) and 203 mL for 4 mL (a BOD instruction, second-hand). 0.0375 mol/L: 1 mL is 1 mg/L for a whole bottle of 300 mL (EPA method 360.2, from memory).
    /// All leave the reagents' oxygen out. The rounding of 201 (from 201.34) and 203 (from 202.70) is 0.17 %, that of a whole bottle without displacement 0.7 %.
    /// </summary>
    [Theory]
    [InlineData(0.025, 201.0, 2.0, 0.002)]
    [InlineData(0.025, 203.0, 4.0, 0.002)]
    [InlineData(0.0375, double.NaN, 0.0, 0.0001)]
    public void OneMillilitre_IsOneMilligramPerLitre(double titrant, double aliquot, double displaced, double relative)
    {
        Assert.Equal(Status.Ok, WinklerTitration.MilligramsPerLitre(8.0, 0.0, titrant, 300.0, aliquot, displaced, 0.0, out double milligrams));
        Assert.InRange(milligrams, 8.0 * (1.0 - relative), 8.0 * (1.0 + relative));
    }

    /// <summary>
    /// A student's worked report (Chemistry 26.1, 2017, read on the web, second-hand): 0.15 g of KIO3 (214.0 g/mol, 99.4 %) in 100 mL, 10 mL of it against 37 mL of thiosulfate: 0.011298307 mol/L (cut off after nine decimals); 1.2 and 1.1 mL for a
    /// sample of 50 mL: 2.1693 and 1.9885 mg/L, with 32 g/mol for oxygen (31.9988 is 0.004 % less).
    /// </summary>
    [Fact]
    public void StandardisationAndSample_OfAWorkedReport()
    {
        double normality = 6.0 * 0.15 / 214.0 * 0.994 / 0.1;
        Assert.Equal(Status.Ok, WinklerTitration.Titrant(10.0, normality, 37.0, 0.0, out double titrant));
        Assert.InRange(titrant, 0.011298307, 0.011298308);
        Assert.Equal(Status.Ok, WinklerTitration.MilligramsPerLitre(1.2, 0.0, titrant, 50.0, double.NaN, 0.0, 0.0, out double first));
        Assert.Equal(Status.Ok, WinklerTitration.MilligramsPerLitre(1.1, 0.0, titrant, 50.0, double.NaN, 0.0, 0.0, out double second));
        Assert.Equal(2.1693, first * 32.0 / 31.9988, 0.00005);
        Assert.Equal(1.9885, second * 32.0 / 31.9988, 0.00005);
    }

    /// <summary>
    /// The form of Carpenter (1965) and WOCE (Culberson 1991), as given in the reference data: mL/L = [(R − Rblk)·V·N·5598/(Rstd − Rblk) − 1000·0.0017]/(Vb − Vreg). The constant 5598 is 22391.6/4 rounded to four
    /// figures, hence 0.01 %. Trap 20 of the notes: the reagents' oxygen is 0.020 mg/L in a flask of 125 mL.
    /// </summary>
    [Fact]
    public void MillilitreForm_GivesTheSame()
    {
        const double r = 0.7312;
        const double blank = 0.0021;
        const double standard = 0.6488;
        double millilitres = (((r - blank) * 10.0 * 0.0118 * 5598.0 / (standard - blank)) - (1000.0 * 0.0017)) / (125.4 - 2.0);
        Assert.Equal(Status.Ok, WinklerTitration.Titrant(10.0, 0.0118, standard, blank, out double titrant));
        Assert.Equal(Status.Ok, WinklerTitration.MilligramsPerLitre(r, blank, titrant, 125.4, double.NaN, 2.0, WinklerTitration.ReagentOxygenMilligrams, out double milligrams));
        Assert.Equal(Status.Ok, WinklerTitration.MilligramsPerLitre(r, blank, titrant, 125.4, double.NaN, 2.0, 0.0, out double withReagents));
        double expected = OxygenUnits.MilligramsPerLitreFromMillilitresPerLitre(millilitres);
        output.WriteLine(FormattableString.Invariant($"{millilitres:F4} mL/L, {expected:F4} mg/L against {milligrams:F4}; reagents {withReagents - milligrams:F4} mg/L"));
        Assert.InRange(milligrams, expected * 0.9999, expected * 1.0001);
        Assert.Equal(0.020, withReagents - milligrams, 0.0005);
    }

    [Theory]
    [InlineData(8.03, 0.01, 0.025, 300.2, double.NaN, 2.0, 0.0024)]
    [InlineData(8.03, 0.01, 0.025, 300.2, 201.0, 2.0, 0.0024)]
    [InlineData(0.7312, -0.002, 0.18, 125.4, double.NaN, 2.0, 0.0024)]
    public void Slopes_AreThoseOfTheFormula(double titre, double blank, double titrant, double flask, double aliquot, double displaced, double reagents)
    {
        double[] at = [titre, blank, titrant, flask, aliquot, displaced, reagents];
        Assert.Equal(Status.Ok, WinklerTitration.MilligramsPerLitreSensitivities(
            titre, blank, titrant, flask, aliquot, displaced, reagents,
            out double perTitre, out double perTitrant, out double perFlask, out double perAliquot, out double perDisplaced, out double perReagent));
        double[] slopes = [perTitre, -perTitre, perTitrant, perFlask, perAliquot, perDisplaced, perReagent];
        for (int i = 0; i < at.Length; i++)
        {
            if (double.IsNaN(at[i]))
            {
                Assert.Equal(0.0, slopes[i]);
                continue;
            }

            double step = 1e-5 * Math.Max(Math.Abs(at[i]), 0.01);
            double difference = (Value(at, i, step) - Value(at, i, -step)) / (2.0 * step);
            Assert.Equal(difference, slopes[i], 1e-6 * Math.Abs(difference));
        }
    }

    [Fact]
    public void SlopesOfTheTitrant_AreThoseOfTheFormula()
    {
        Assert.Equal(Status.Ok, WinklerTitration.TitrantSensitivities(10.0, 0.01, 9.98, 0.02, out double perVolume, out double perNormality, out double perTitre));
        Assert.Equal(Difference(static h => Titrant(10.0 + h, 0.01, 9.98), 1e-4), perVolume, 1e-10);
        Assert.Equal(Difference(static h => Titrant(10.0, 0.01 + h, 9.98), 1e-7), perNormality, 1e-7);
        Assert.Equal(Difference(static h => Titrant(10.0, 0.01, 9.98 + h), 1e-4), perTitre, 1e-10);
    }

    [Theory]
    [InlineData(-0.1, 0.0, 0.025, 300.0, double.NaN, 2.0, 0.0, Status.VolumeBelowRange)]
    [InlineData(0.1, 0.2, 0.025, 300.0, double.NaN, 2.0, 0.0, Status.ZeroAboveRange)]
    [InlineData(8.0, 0.0, 0.025, 0.0, double.NaN, 0.0, 0.0, Status.VolumeBelowRange)]
    [InlineData(8.0, 0.0, 0.025, 2.0, double.NaN, 2.0, 0.0, Status.VolumeBelowRange)]
    [InlineData(8.0, 0.0, 0.025, 300.0, 0.0, 2.0, 0.0, Status.VolumeBelowRange)]
    [InlineData(8.0, 0.0, 0.025, 300.0, 300.1, 2.0, 0.0, Status.VolumeAboveRange)]
    [InlineData(8.0, 0.0, 0.025, 300.0, double.NaN, -1.0, 0.0, Status.VolumeBelowRange)]
    [InlineData(8.0, 0.0, 0.0, 300.0, double.NaN, 2.0, 0.0, Status.CoefficientBelowRange)]
    [InlineData(8.0, 0.0, 0.025, 300.0, double.NaN, 2.0, -0.1, Status.ConcentrationBelowRange)]
    [InlineData(0.001, 0.0, 0.025, 300.0, double.NaN, 2.0, 0.0024, Status.ConcentrationBelowRange)]
    [InlineData(double.NaN, 0.0, 0.025, 300.0, double.NaN, 2.0, 0.0, Status.VolumeNotFinite)]
    [InlineData(8.0, double.PositiveInfinity, 0.025, 300.0, double.NaN, 2.0, 0.0, Status.ZeroNotFinite)]
    [InlineData(8.0, 0.0, double.NaN, 300.0, double.NaN, 2.0, 0.0, Status.CoefficientNotFinite)]
    [InlineData(8.0, 0.0, 0.025, double.NaN, double.NaN, 2.0, 0.0, Status.VolumeNotFinite)]
    [InlineData(8.0, 0.0, 0.025, 300.0, double.NegativeInfinity, 2.0, 0.0, Status.VolumeNotFinite)]
    [InlineData(8.0, 0.0, 0.025, 300.0, double.NaN, 2.0, double.NaN, Status.ConcentrationNotFinite)]
    public void WhatCannotBe_IsRefused(
        double titre, double blank, double titrant, double flask, double aliquot, double displaced, double reagents, Status expected)
    {
        Assert.Equal(expected, WinklerTitration.MilligramsPerLitre(titre, blank, titrant, flask, aliquot, displaced, reagents, out double milligrams));
        Assert.True(double.IsNaN(milligrams));
        Assert.Equal(expected, WinklerTitration.MilligramsPerLitreSensitivities(
            titre, blank, titrant, flask, aliquot, displaced, reagents, out double slope, out _, out _, out _, out _, out _));
        Assert.True(double.IsNaN(slope));
    }

    [Theory]
    [InlineData(10.0, 0.01, -1.0, 0.0, Status.VolumeBelowRange)]
    [InlineData(10.0, 0.01, 0.02, 0.02, Status.ZeroAboveRange)]
    [InlineData(0.0, 0.01, 9.98, 0.0, Status.VolumeBelowRange)]
    [InlineData(10.0, 0.0, 9.98, 0.0, Status.CoefficientBelowRange)]
    [InlineData(double.NaN, 0.01, 9.98, 0.0, Status.VolumeNotFinite)]
    [InlineData(10.0, 0.01, 1e-320, 0.0, Status.CoefficientAboveRange)]
    public void StandardisationThatCannotBe_IsRefused(double volume, double normality, double titre, double blank, Status expected)
    {
        Assert.Equal(expected, WinklerTitration.Titrant(volume, normality, titre, blank, out double titrant));
        Assert.True(double.IsNaN(titrant));
    }

    private static double Value(double[] at, int changed, double step)
    {
        double[] x = [.. at];
        x[changed] += step;
        Assert.Equal(Status.Ok, WinklerTitration.MilligramsPerLitre(x[0], x[1], x[2], x[3], x[4], x[5], x[6], out double value));
        return value;
    }

    private static double Titrant(double volume, double normality, double titre)
    {
        Assert.Equal(Status.Ok, WinklerTitration.Titrant(volume, normality, titre, 0.02, out double value));
        return value;
    }

    private static double Difference(Func<double, double> of, double step)
    {
        return (of(step) - of(-step)) / (2.0 * step);
    }
}
