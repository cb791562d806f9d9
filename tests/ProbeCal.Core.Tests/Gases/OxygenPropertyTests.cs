using System;
using System.Globalization;
using CsCheck;
using Xunit;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>What must hold for every input in range: order, inverses, consistency and continuity. A failure prints its seed.</summary>
public class OxygenPropertyTests
{
    private static readonly long Samples = Environment.GetEnvironmentVariable("PROBECAL_FULL") == "1" ? 1_000_000 : 20_000;

    private static readonly Gen<SolubilityEquation> Equation = Gen.Bool.Select(b => b ? SolubilityEquation.BensonKrause1984 : SolubilityEquation.GarciaGordon1992);
    private static readonly Gen<double> Celsius = Gen.Double[0.0, 40.0];
    private static readonly Gen<double> Salinity = Gen.Double[0.0, 40.0];
    private static readonly Gen<double> Pressure = Gen.Double[506.625, 1114.575];
    private static readonly Gen<double> PartialPressure = Gen.Double[-50.0, 1000.0];
    private static readonly Gen<(SolubilityEquation E, double T, double S, double P)> Water = Gen.Select(Equation, Celsius, Salinity, Pressure);

    [Fact]
    public void AtTheEquilibriumPartialPressure_ConcentrationIsTheEquilibriumValue()
    {
        Water.Sample(w =>
        {
            double equilibrium = Equilibrium(w.E, w.T, w.S, w.P);
            Assert.Equal(Status.Ok, OxygenEquilibrium.PartialPressure(w.T, w.P, RangeRule.Refuse, out double air));
            return Within(Concentration(w.E, w.T, w.S, w.P, air), equilibrium, 16);
        }, iter: Samples);
    }

    [Fact]
    public void PartialPressureAndConcentration_AreInverse()
    {
        Gen.Select(Water, PartialPressure).Sample((w, partial) =>
        {
            double concentration = Concentration(w.E, w.T, w.S, w.P, partial);
            Assert.Equal(Status.Ok, OxygenEquilibrium.PartialPressureFromConcentration(
                w.E, w.T, w.S, w.P, concentration, RangeRule.Refuse, out double back));
            return Within(back, partial, 4) && Math.Sign(concentration) == Math.Sign(partial);
        }, iter: Samples);
    }

    [Fact]
    public void PartialPressureAndPercent_AreInverse()
    {
        Gen.Select(Celsius, Pressure, PartialPressure).Sample((t, p, partial) =>
        {
            Assert.Equal(Status.Ok, Saturation.PercentLocal(partial, t, p, RangeRule.Refuse, out double local));
            Assert.Equal(Status.Ok, Saturation.PercentOneAtmosphere(partial, t, RangeRule.Refuse, out double oneAtmosphere));
            Assert.Equal(Status.Ok, Saturation.PartialPressureFromPercentLocal(local, t, p, RangeRule.Refuse, out double fromLocal));
            Assert.Equal(Status.Ok, Saturation.PartialPressureFromPercentOneAtmosphere(oneAtmosphere, t, RangeRule.Refuse, out double fromOne));
            return Within(fromLocal, partial, 8) && Within(fromOne, partial, 8);
        }, iter: Samples);
    }

    /// <summary>Air is 100 % of itself, and the percentage at local pressure is also the ratio of the concentrations.</summary>
    [Fact]
    public void LocalPercentage_IsTheRatioOfConcentrationsToo()
    {
        Gen.Select(Water, PartialPressure).Sample((w, partial) =>
        {
            OxygenEquilibrium.PartialPressure(w.T, w.P, RangeRule.Refuse, out double air);
            Saturation.PercentLocal(air, w.T, w.P, RangeRule.Refuse, out double hundred);
            Saturation.PercentLocal(partial, w.T, w.P, RangeRule.Refuse, out double percent);
            double ratio = 100.0 * Concentration(w.E, w.T, w.S, w.P, partial) / Equilibrium(w.E, w.T, w.S, w.P);
            return Within(hundred, 100.0, 2) && Within(percent, ratio, 32);
        }, iter: Samples);
    }

    [Fact]
    public void WarmerSaltierHigherUp_HoldLess()
    {
        Gen.Select(Equation, Gen.Double[0.0, 39.9], Gen.Double[0.0, 39.9], Gen.Double[507.0, 1114.5]).Sample((e, t, s, p) =>
        {
            double value = Equilibrium(e, t, s, p);
            return Equilibrium(e, t + 0.01, s, p) < value
                && Equilibrium(e, t, s + 0.01, p) < value
                && Equilibrium(e, t, s, p - 0.01) < value
                && 0.0 < value;
        }, iter: Samples);
    }

    [Fact]
    public void Concentration_IsProportionalToPartialPressure()
    {
        Gen.Select(Water, Gen.Double[0.1, 500.0]).Sample((w, partial) =>
            Concentration(w.E, w.T, w.S, w.P, 2.0 * partial) == 2.0 * Concentration(w.E, w.T, w.S, w.P, partial)
            && Concentration(w.E, w.T, w.S, w.P, -partial) == -Concentration(w.E, w.T, w.S, w.P, partial)
            && Concentration(w.E, w.T, w.S, w.P, 0.0) == 0.0, iter: Samples);
    }

    /// <summary>A millikelvin, a thousandth of salinity or 0.01 hPa never moves a value by more than the steepest slope allows, range ends and extrapolation included.</summary>
    [Fact]
    public void Values_AreContinuousAcrossTheRangeEnds()
    {
        Gen.Select(Equation, Gen.Double[-2.5, 41.0], Gen.Double[0.0, 43.0], Gen.Double[480.0, 1140.0]).Sample((e, t, s, p) =>
        {
            double value = Extrapolated(e, t, s, p);
            double most = 0.04 * value * 1.0e-3;
            return Math.Abs(Extrapolated(e, t + 1.0e-3, s, p) - value) < most
                && Math.Abs(Extrapolated(e, t, s + 1.0e-3, p) - value) < most
                && Math.Abs(Extrapolated(e, t, s, p + 1.0e-2) - value) < most;
        }, iter: Samples);
    }

    /// <summary>Inside the range the rule changes nothing: no bit of the value and not the status.</summary>
    [Fact]
    public void InRange_ExtrapolationChangesNothing()
    {
        Water.Sample(w =>
        {
            Status refuse = OxygenEquilibrium.MilligramsPerLitre(w.E, w.T, w.S, w.P, RangeRule.Refuse, out double a);
            Status extrapolate = OxygenEquilibrium.MilligramsPerLitre(w.E, w.T, w.S, w.P, RangeRule.Extrapolate, out double b);
            return refuse == Status.Ok && extrapolate == Status.Ok && a.Equals(b);
        }, iter: Samples);
    }

    /// <summary>The two equations rest on one data set: 0.030 % apart at most over the whole common range, of which up to 0.015 % is the temperature scale.</summary>
    [Fact]
    public void TheTwoEquations_StayTogether()
    {
        Gen.Select(Celsius, Salinity, Pressure).Sample((t, s, p) =>
        {
            double ratio = Equilibrium(SolubilityEquation.GarciaGordon1992, t, s, p) / Equilibrium(SolubilityEquation.BensonKrause1984, t, s, p);
            return Math.Abs(ratio - 1.0) < 0.00031;
        }, iter: Samples);
    }

    private static double Equilibrium(SolubilityEquation equation, double celsius, double salinity, double pressure)
    {
        Assert.Equal(Status.Ok, OxygenEquilibrium.MilligramsPerLitre(equation, celsius, salinity, pressure, RangeRule.Refuse, out double value));
        return value;
    }

    private static double Extrapolated(SolubilityEquation equation, double celsius, double salinity, double pressure)
    {
        OxygenEquilibrium.MilligramsPerLitre(equation, celsius, salinity, pressure, RangeRule.Extrapolate, out double value);
        Assert.True(double.IsFinite(value));
        return value;
    }

    private static double Concentration(SolubilityEquation equation, double celsius, double salinity, double pressure, double partial)
    {
        Assert.Equal(Status.Ok, OxygenEquilibrium.ConcentrationFromPartialPressure(
            equation, celsius, salinity, pressure, partial, RangeRule.Refuse, out double value));
        return value;
    }

    private static bool Within(double actual, double expected, int unitsInTheLastPlace)
    {
        double unit = Math.Abs(Math.BitIncrement(expected) - expected);
        return Math.Abs(actual - expected) <= unitsInTheLastPlace * unit
            ? true
            : throw new InvalidOperationException(string.Create(CultureInfo.InvariantCulture, $"{actual:R} for {expected:R}, {Math.Abs(actual - expected) / unit:F0} ulp"));
    }
}
