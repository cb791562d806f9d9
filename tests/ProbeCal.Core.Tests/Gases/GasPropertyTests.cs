using System;
using System.Globalization;
using System.Linq;
using CsCheck;
using Xunit;

namespace ProbeCal.Core.Tests.Gases;

/// <summary>What must hold for every gas by every equation that covers it: order where physics has one, inverses, and no step at a seam. A failure prints its seed.</summary>
public class GasPropertyTests
{
    private static readonly long Samples = Environment.GetEnvironmentVariable("PROBECAL_FULL") == "1" ? 1_000_000 : 30_000;

    private static readonly (Gas Gas, SolubilityEquation Equation)[] Pairs =
        [.. Enum.GetValues<Gas>().SelectMany(static gas => Enum.GetValues<SolubilityEquation>().Where(equation => Covered(gas, equation)).Select(equation => (gas, equation)))];

    private static readonly Gen<(Gas Gas, SolubilityEquation Equation)> Pair = Gen.Int[0, Pairs.Length - 1].Select(static i => Pairs[i]);
    private static readonly Gen<double> Part = Gen.Double[0.0, 1.0];

    /// <summary>A gas, an equation, and water and pressure within their ranges; a tenth of the room at each end is left free for a step.</summary>
    private static readonly Gen<Point> Points = Gen.Select(Pair, Part, Part, Part, Gen.Double[1.0e-4, 0.9], Gen.Double[0.0, 100.0]).Select(static (pair, t, s, p, x, h) =>
    {
        double salinity = s * 0.999 * HighestSalinity(pair.Equation);
        double lowest = GasSolubility.LowestCelsius(pair.Gas, pair.Equation, salinity) + 0.02;
        double highest = GasSolubility.HighestCelsius(pair.Equation) - 0.02;
        return new Point(pair.Gas, pair.Equation, lowest + (t * (highest - lowest)), salinity, 507.0 + (p * (1114.0 - 507.0)), x, h);
    });

    [Fact]
    public void EveryGas_HasAnEquation_AndEveryEquationAGas()
    {
        Assert.Equal(Enum.GetValues<Gas>().Length, Pairs.Select(static p => p.Gas).Distinct().Count());
        Assert.Equal(Enum.GetValues<SolubilityEquation>().Length, Pairs.Select(static p => p.Equation).Distinct().Count());
        Assert.All(Enum.GetValues<Gas>(), static gas => Assert.True(Covered(gas, GasDefaults.Equation(gas))));
    }

    [Fact]
    public void AtItsPartialPressure_TheWaterHoldsTheEquilibriumValue()
    {
        Points.Sample(static at =>
        {
            Assert.Equal(Status.Ok, GasEquilibrium.PartialPressure(at.Gas, at.T, at.S, at.P, at.X, at.H, RangeRule.Refuse, out double partial));
            return Near(at, Concentration(at, partial), Milligrams(at), 1.0e-12);
        }, iter: Samples);
    }

    /// <summary>Also above 1.1 atm, where a gas has fugacity data.</summary>
    [Fact]
    public void PartialPressureAndConcentration_AreInverse()
    {
        Gen.Select(Points, Part, Part).Sample(static (point, high, share) =>
        {
            double highest = GasEquilibrium.HighestHectopascal(point.Gas);
            Point at = point with { P = 507.0 + (high * (highest - 507.0)) };
            double partial = share * at.P;
            double concentration = Concentration(at, partial);
            Assert.Equal(Status.Ok, GasEquilibrium.PartialPressureFromConcentration(
                at.Gas, at.Equation, at.T, at.S, at.P, concentration, RangeRule.Refuse, out double back));
            return Near(at, back, partial, 1.0e-12);
        }, iter: Samples);
    }

    /// <summary>More of the gas or more pressure dissolves more, more vapour less: no exception.</summary>
    [Fact]
    public void MoreGas_DissolvesMore()
    {
        Points.Sample(static at =>
        {
            double value = Milligrams(at);
            return 0.0 < value
                && value < Milligrams(at with { P = at.P + 0.01 })
                && value < Milligrams(at with { X = at.X + 1.0e-6 })
                && (at.H < 1.0 || value < Milligrams(at with { H = at.H - 0.01 }));
        }, iter: Samples);
    }

    /// <summary>Warmer water holds less. Helium is the exception, see below.</summary>
    [Fact]
    public void WarmerWater_HoldsLess_HeliumExcepted()
    {
        Points.Where(static at => at.Gas != Gas.Helium).Sample(
            static at => Solubility(at with { T = at.T + 0.01 }) < Solubility(at), iter: Samples);
    }

    /// <summary>Helium has a minimum of solubility, which Weiss 1971 and Jenkins et al. 2019 put between 25 °C in sea water and 33 °C in fresh water.</summary>
    [Theory]
    [InlineData(SolubilityEquation.Weiss1971, 0.0, 31.0)]
    [InlineData(SolubilityEquation.Weiss1971, 35.0, 25.0)]
    [InlineData(SolubilityEquation.Jenkins2019, 0.0, 33.0)]
    [InlineData(SolubilityEquation.Jenkins2019, 35.0, 27.0)]
    public void Helium_HasAMinimum(SolubilityEquation equation, double salinity, double celsius)
    {
        Point at = new(Gas.Helium, equation, celsius, salinity, 1000.0, 0.1, 100.0);
        Assert.True(Solubility(at) < Solubility(at with { T = celsius - 2.0 }));
        Assert.True(Solubility(at) < Solubility(at with { T = celsius + 2.0 }));
    }

    /// <summary>Salt water holds less: no exception.</summary>
    [Fact]
    public void SaltierWater_HoldsLess()
    {
        Points.Where(static at => HighestSalinity(at.Equation) != 0.0).Sample(
            static at => Solubility(at with { S = at.S + 0.01 }) < Solubility(at), iter: Samples);
    }

    /// <summary>The seam at 1.1 atm, where fugacity and Poynting terms set in: neither step nor more than a per mille of slope.</summary>
    [Fact]
    public void OnePointOneAtmospheres_IsNoStep()
    {
        Points.Where(static at => 1200.0 < GasEquilibrium.HighestHectopascal(at.Gas)).Sample(static point =>
        {
            const double Seam = 1.1 * 1013.25;
            double below = Milligrams(point with { P = Seam - 1.0e-6 });
            double above = Milligrams(point with { P = Seam + 1.0e-6 });
            // 2e-6 hPa of 1115 are 1.8e-9 of the value.
            return Near(point, above, below, 4.0e-9) && below <= above;
        }, iter: Samples);
    }

    /// <summary>0.2 K outside the range a value is the continuation: the change from the edge is the slope there, and the uncertainty has grown.</summary>
    [Fact]
    public void NearTheEdge_TheValueGoesOnSmoothly()
    {
        Gen.Select(Points, Gen.Double[1.0e-6, 0.199], Gen.Bool).Sample(static (point, outside, cold) =>
        {
            double edge = cold ? GasSolubility.LowestCelsius(point.Gas, point.Equation, point.S) : GasSolubility.HighestCelsius(point.Equation);
            Point inside = point with { T = edge };
            double beyond = cold ? edge - outside : edge + outside;
            Status status = GasEquilibrium.MilligramsPerLitre(
                point.Gas, point.Equation, beyond, point.S, point.P, point.X, point.H, RangeRule.NearEdge, out double value);
            // 7 % per kelvin is more than any gas has: the steepest, CFC-11 in cold water, has 6.
            bool smooth = status == (cold ? Status.TemperatureJustBelowRange : Status.TemperatureJustAboveRange)
                && Near(point, value, Milligrams(inside), 0.07 * outside);
            GasUncertainty.EquationRelative(point.Gas, point.Equation, edge, point.S, point.P, RangeRule.Refuse, out double there);
            GasUncertainty.EquationRelative(point.Gas, point.Equation, beyond, point.S, point.P, RangeRule.NearEdge, out double wider);
            return smooth && there <= wider;
        }, iter: Samples);
    }

    [Fact]
    public void EveryUnit_GoesThereAndBack()
    {
        Gen.Select(Gen.Int[1, Enum.GetValues<Gas>().Length].Select(static i => (Gas)i), Gen.Double[1.0e-9, 1.0e4]).Sample((gas, value) =>
        {
            double perLitre = GasUnits.MicromolesPerLitreFromMilligramsPerLitre(gas, value);
            double volume = GasUnits.MillilitresPerLitreFromMilligramsPerLitre(gas, value);
            return Within(GasUnits.MilligramsPerLitreFromMicromolesPerLitre(gas, perLitre), value, 2)
                && Within(GasUnits.MilligramsPerLitreFromMillilitresPerLitre(gas, volume), value, 2)
                // Amount times molar volume, whichever way.
                && (gas == Gas.Oxygen || Within(volume, perLitre * GasUnits.LitresPerMole(gas) / 1000.0, 8));
        }, iter: Samples);
    }

    /// <summary>Without height there is nothing to reduce: the pressure of the station is that of the sea level, to the bit, at any temperature.</summary>
    [Fact]
    public void AtSeaLevel_StationPressureIsSeaLevelPressure()
    {
        Gen.Select(Gen.Double[850.0, 1100.0], Gen.Double[-80.0, 60.0]).Sample(static (pressure, celsius) =>
        {
            Assert.Equal(Status.Ok, SeaLevelReduction.StationPressure(pressure, 0.0, celsius, out double station));
            Assert.Equal(Status.Ok, StandardAtmosphere.FromSeaLevel(pressure, 0.0, out double standard));
            Assert.Equal(Status.Ok, StandardAtmosphere.ReduceToSeaLevel(pressure, 0.0, out double reduced));
            return station == pressure && standard == pressure && reduced == pressure;
        }, iter: Samples);
        Assert.Equal(Status.Ok, StandardAtmosphere.Pressure(0.0, out double mean));
        Assert.Equal(1013.25, mean);
    }

    /// <summary>The low-salinity extension joins the scale at S 2, at any temperature and depth; and more conductivity is more salt, there and elsewhere.</summary>
    [Fact]
    public void Salinity_GrowsWithConductivity_AlsoAcrossTwo()
    {
        Gen.Select(Gen.Double[-2.0, 35.0], Gen.Double[0.0, 10_000.0], Gen.Double[0.01, 35.0]).Sample(static (celsius, decibar, conductivity) =>
        {
            double low = 0.5;
            double high = 10.0;
            for (int i = 0; i < 60; i++)
            {
                double middle = 0.5 * (low + high);
                if (Salinity(middle, celsius, decibar) < 2.0) { low = middle; } else { high = middle; }
            }

            double step = Salinity(high, celsius, decibar) - Salinity(low, celsius, decibar);
            return step < 1.0e-12 && Math.Abs(Salinity(high, celsius, decibar) - 2.0) < 1.0e-9
                && Salinity(conductivity, celsius, decibar) < Salinity(conductivity + 1.0e-4, celsius, decibar);
        }, iter: Samples / 10);
    }

    /// <summary>Zero is only a number: nothing steps there, be it the temperature or the salinity.</summary>
    [Fact]
    public void ZeroDegreesAndZeroSalinity_AreNoStep()
    {
        Points.Where(static at => GasSolubility.LowestCelsius(at.Gas, at.Equation, at.S) < -0.1).Sample(
            static at => Near(at, Milligrams(at with { T = 1.0e-9 }), Milligrams(at with { T = -1.0e-9 }), 1.0e-9), iter: Samples);
        Points.Where(static at => HighestSalinity(at.Equation) != 0.0 && 0.0 < GasSolubility.LowestCelsius(at.Gas, at.Equation, 0.0) + at.T).Sample(
            static at => Near(at, Milligrams(at with { S = 1.0e-9 }), Milligrams(at with { S = 0.0 }), 1.0e-9), iter: Samples);
    }

    private static bool Covered(Gas gas, SolubilityEquation equation)
    {
        Status status = GasEquilibrium.MilligramsPerLitre(gas, equation, 15.0, 0.0, 1000.0, 0.01, 100.0, RangeRule.Refuse, out _);
        return status != Status.EquationUnknown && status != Status.GasUnknown;
    }

    private static double HighestSalinity(SolubilityEquation equation)
    {
        return GasSolubility.HighestSalinity(equation);
    }

    private static double Milligrams(Point at)
    {
        Status status = GasEquilibrium.MilligramsPerLitre(
            at.Gas, at.Equation, at.T, at.S, at.P, at.X, at.H, RangeRule.Refuse, out double value);
        return status == Status.Ok ? value : throw new InvalidOperationException($"{status} for {at}");
    }

    /// <summary>mg/L for a fixed partial pressure: what the gas itself does, without the vapour.</summary>
    private static double Solubility(Point at)
    {
        return Concentration(at, at.X * at.P);
    }

    private static double Concentration(Point at, double partial)
    {
        Status status = GasEquilibrium.ConcentrationFromPartialPressure(
            at.Gas, at.Equation, at.T, at.S, at.P, partial, RangeRule.Refuse, out double value);
        return status == Status.Ok ? value : throw new InvalidOperationException($"{status} for {at}, {partial:R} hPa");
    }

    private static double Salinity(double conductivity, double celsius, double decibar)
    {
        Status status = PracticalSalinity.FromConductivity(conductivity, celsius, decibar, RangeRule.Extrapolate, out double value);
        return double.IsFinite(value) ? value : throw new InvalidOperationException($"{status} for {conductivity:R} mS/cm, {celsius:R} °C, {decibar:R} dbar");
    }

    private static bool Near(Point at, double actual, double expected, double relative)
    {
        return Math.Abs(actual - expected) <= relative * Math.Abs(expected)
            ? true
            : throw new InvalidOperationException(string.Create(CultureInfo.InvariantCulture, $"{actual:R} for {expected:R}, {(actual / expected) - 1.0:E2} at {at}"));
    }

    private static bool Within(double actual, double expected, int unitsInTheLastPlace)
    {
        double unit = Math.Abs(Math.BitIncrement(expected) - expected);
        return Math.Abs(actual - expected) <= unitsInTheLastPlace * unit
            ? true
            : throw new InvalidOperationException(string.Create(CultureInfo.InvariantCulture, $"{actual:R} for {expected:R}, {Math.Abs(actual - expected) / unit:F0} ulp"));
    }

    private sealed record Point(Gas Gas, SolubilityEquation Equation, double T, double S, double P, double X, double H);
}
