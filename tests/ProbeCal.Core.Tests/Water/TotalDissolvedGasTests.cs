using System;
using System.Linq;
using CsCheck;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Water;

/// <summary>Total dissolved gas: Colt's own constants, water in equilibrium with air, and the uncertainties against a brute-force propagation.</summary>
public class TotalDissolvedGasTests(ITestOutputHelper output)
{
    /// <summary>A = 760/(1000·K), mmHg·L/mg, as Colt 1984 and Standard Methods 2810 print it (from memory); half of the last digit and the gas densities' rounding.</summary>
    [Theory]
    [InlineData(Gas.Oxygen, 0.5318)]
    [InlineData(Gas.Nitrogen, 0.6078)]
    [InlineData(Gas.Argon, 0.4260)]
    [InlineData(Gas.CarbonDioxide, 0.3845)]
    public void Densities_GiveColtsFactors(Gas gas, double printed)
    {
        double factor = 760.0 / (1000.0 * GasUnits.MilligramsPerMillilitre(gas));
        output.WriteLine($"{gas}: {factor:F5} for {printed}");
        Assert.Equal(printed, factor, 6.0e-5);
    }

    /// <summary>73.42 mmHg for each metre of fresh water at 20 °C (Colt 1984, from memory).</summary>
    [Fact]
    public void Depth_FollowsColtsPressurePerMetre()
    {
        Assert.Equal(Status.Ok, DensityEos80.Density(20.0, 0.0, RangeRule.Refuse, out double density));
        Assert.Equal(Status.Ok, HydrostaticPressure.Hectopascal(1.0, density, RangeRule.Refuse, out double perMetre));
        Assert.Equal(73.42, PressureUnits.MillimetresOfMercuryFromHectopascal(perMetre), 0.01);
        Assert.Equal(Status.Ok, TotalDissolvedGas.CompensationDepth(perMetre * 1.7, density, out double depth));
        Assert.Equal(1.7, depth, 1.0e-12);
        Assert.Equal(Status.Ok, TotalDissolvedGas.UncompensatedDelta(perMetre * 1.7, 0.5, density, out double left));
        Assert.Equal(1.2 * perMetre, left, 1.0e-10);
    }

    /// <summary>pO2 = C/β·A with the Bunsen coefficient of Weiss 1970, as Colt computes it, against this library's oxygen.</summary>
    [Fact]
    public void OxygenPressure_AgreesWithColtsRoute()
    {
        double worst = 0.0;
        foreach (double celsius in new[] { 0.5, 5.0, 12.0, 20.0, 28.0, 36.0 })
        {
            foreach (double salinity in new[] { 0.0, 15.0, 35.0 })
            {
                double h = (celsius + 273.15) / 100.0;
                double bunsen = Math.Exp(-58.3877 + (85.8079 / h) + (23.8439 * Math.Log(h)) + (salinity * (-0.034892 + (0.015568 * h) - (0.0019387 * h * h))));
                double colt = 9.3 / bunsen * 0.5318;
                Assert.Equal(Status.Ok, OxygenEquilibrium.PartialPressureFromConcentration(
                    SolubilityEquation.BensonKrause1984, celsius, salinity, 1013.25, 9.3, RangeRule.Refuse, out double ours));
                worst = Math.Max(worst, Math.Abs((PressureUnits.MillimetresOfMercuryFromHectopascal(ours) / colt) - 1.0));
            }
        }

        output.WriteLine($"pO2 by Colt's route: {100.0 * worst:F2} % apart at most");
        // Weiss 1970 and Benson and Krause 1984 differ by up to 0.5 % themselves.
        Assert.InRange(worst, 0.0, 0.006);
    }

    /// <summary>
    /// Water in equilibrium with air at BP: ΔP 0, total gas 100 %, oxygen 100 %. Nitrogen and argon are what is left, 1 − 0.20946 = 0.79054 of dry air, over their 0.79018: 100.0456 %.
    /// The rest of 0.00036 is carbon dioxide (0.000425 in the air of today) and neon and helium, less 0.00007 by which today's oxygen is below its fraction here.
    /// </summary>
    [Theory]
    [InlineData(4.0, 0.0, 1013.25)]
    [InlineData(18.0, 0.0, 870.0)]
    [InlineData(25.0, 35.0, 1021.0)]
    public void Equilibrium_IsAHundredPercent(double celsius, double salinity, double barometric)
    {
        Assert.Equal(Status.Ok, TotalDissolvedGas.Percent(0.0, barometric, out double total));
        Assert.Equal(100.0, total);
        Assert.Equal(Status.Ok, OxygenEquilibrium.MilligramsPerLitre(
            SolubilityEquation.BensonKrause1984, celsius, salinity, barometric, RangeRule.Refuse, out double milligrams));
        Assert.Equal(Status.Ok, OxygenEquilibrium.PartialPressureFromConcentration(
            SolubilityEquation.BensonKrause1984, celsius, salinity, barometric, milligrams, RangeRule.Refuse, out double oxygen));
        Assert.Equal(Status.Ok, Saturation.PercentLocal(oxygen, celsius, barometric, RangeRule.Refuse, out double oxygenPercent));
        Assert.Equal(100.0, oxygenPercent, 1.0e-9);
        Assert.Equal(Status.Ok, TotalDissolvedGas.NitrogenArgon(
            0.0, barometric, celsius, salinity, oxygen, 0.0, RangeRule.Refuse, out double rest, out double percent));
        Assert.Equal(Status.Ok, VapourWeissPrice1980.Pressure(celsius, salinity, RangeRule.Refuse, out double vapour));
        output.WriteLine($"{celsius} °C S {salinity}: N2 and Ar {rest:F2} hPa, {percent:F4} %");
        Assert.Equal(barometric, rest + oxygen + vapour, 1.0e-9);
        // The oxygen stands on the fresh-water vapour: 0.45 hPa between the two at S 35, 25 °C are 0.013 % of nitrogen and argon.
        Assert.Equal(100.0 * (1.0 - 0.20946) / (0.78084 + 0.00934), percent, salinity == 0.0 ? 1.0e-3 : 0.02);

        // With the carbon dioxide of today given, the trace gases and the drift of oxygen remain.
        Assert.Equal(Status.Ok, TotalDissolvedGas.NitrogenArgon(
            0.0, barometric, celsius, salinity, oxygen, 4.25e-4 * (barometric - vapour), RangeRule.Refuse, out _, out percent));
        Assert.Equal(99.992, percent, salinity == 0.0 ? 1.0e-3 : 0.02);
    }

    [Fact]
    public void NitrogenArgonFraction_IsThatOfDryAir()
    {
        Assert.Equal(TotalDissolvedGas.NitrogenArgonMoleFraction, DryAir.MoleFraction(Gas.Nitrogen) + DryAir.MoleFraction(Gas.Argon));
        Assert.Equal(0.7902, TotalDissolvedGas.NitrogenArgonMoleFraction, 5.0e-5);
    }

    [Fact]
    public void Sensitivities_AgreeWithCentralDifferences()
    {
        const double step = 1.0e-3;
        foreach (double celsius in new[] { 1.0, 15.0, 33.0 })
        {
            foreach (double salinity in new[] { 0.5, 30.0 })
            {
                foreach (double delta in new[] { -60.0, 0.0, 140.0 })
                {
                    double[] at = [delta, 940.0, celsius, salinity];
                    Assert.Equal(Status.Ok, TotalDissolvedGas.NitrogenArgonSensitivities(
                        delta, 940.0, celsius, salinity, 215.0, 1.3, RangeRule.Refuse,
                        out double perKelvin, out double perSalinity, out double a, out double b, out double c, out double d));
                    double[] slopes = [a, b, c, d];
                    for (int i = 0; i < 4; i++)
                    {
                        (double[] up, double[] down) = ((double[])at.Clone(), (double[])at.Clone());
                        up[i] += step;
                        down[i] -= step;
                        (double Hectopascal, double Percent) high = Value(up);
                        (double Hectopascal, double Percent) low = Value(down);
                        Assert.Equal((high.Percent - low.Percent) / (2.0 * step), slopes[i], 1.0e-8);
                        double rest = (high.Hectopascal - low.Hectopascal) / (2.0 * step);
                        Assert.Equal(rest, i switch { 2 => perKelvin, 3 => perSalinity, _ => 1.0 }, 1.0e-7);
                    }
                }
            }
        }

        static (double Hectopascal, double Percent) Value(double[] x)
        {
            Assert.Equal(Status.Ok, TotalDissolvedGas.NitrogenArgon(x[0], x[1], x[2], x[3], 215.0, 1.3, RangeRule.Refuse, out double rest, out double percent));
            return (rest, percent);
        }
    }

    /// <summary>The analytic uncertainties against the propagation by differences of the whole chain: one input moved by its uncertainty at a time.</summary>
    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void Uncertainties_AgreeWithMovedInputs(bool isTotalMeasured)
    {
        Gen.Select(Gen.Double[-80.0, 200.0], Gen.Double[700.0, 1050.0], Gen.Double[1.0, 35.0], Gen.Double[0.2, 39.0], Gen.Double[4.0, 14.0]).Sample((delta, barometric, celsius, salinity, milligrams) =>
        {
            double[] at = [isTotalMeasured ? barometric + delta : delta, barometric, celsius, salinity, milligrams];
            double[] u = [1.5, 0.8, 0.1, 0.05, 0.08];
            double[] squares = new double[5];
            for (int i = 0; i < at.Length; i++)
            {
                // A tenth of the uncertainty each way keeps the difference linear.
                (double[] up, double[] down) = ((double[])at.Clone(), (double[])at.Clone());
                up[i] += 0.1 * u[i];
                down[i] -= 0.1 * u[i];
                double[] high = Chain(up, isTotalMeasured);
                double[] low = Chain(down, isTotalMeasured);
                for (int j = 0; j < squares.Length; j++) { squares[j] += Math.Pow((high[j] - low[j]) / 0.2, 2); }
            }

            double[] chain = Chain(at, isTotalMeasured);
            OxygenUncertainty.EquationRelative(SolubilityEquation.BensonKrause1984, salinity, RangeRule.Refuse, out double relative);
            double equation = chain[1] * relative;
            Saturation.PercentLocal(1.0, celsius, barometric, RangeRule.Refuse, out double perOxygen);
            squares[1] += equation * equation;
            squares[2] += equation * equation * perOxygen * perOxygen;
            squares[3] += equation * equation;
            squares[4] += Math.Pow(equation * chain[4] / chain[3], 2);
            Assert.Equal(Status.Ok, TotalDissolvedGasUncertainty.Percent(delta, barometric, isTotalMeasured, u[0], u[1], out double total));
            Assert.Equal(Status.Ok, TotalDissolvedGasUncertainty.Components(
                SolubilityEquation.BensonKrause1984, delta, barometric, celsius, salinity, milligrams, 0.0, isTotalMeasured,
                u[0], u[1], u[2], u[3], u[4], RangeRule.Refuse, out double oxygen, out double oxygenPercent, out double rest, out double percent));
            double[] analytic = [total, oxygen, oxygenPercent, rest, percent];
            return analytic.Zip(squares).All(p => Math.Abs(p.First - Math.Sqrt(p.Second)) <= 1.0e-5 * p.First);
        }, iter: 300);
    }

    [Fact]
    public void Refusals_NameTheInput()
    {
        Assert.Equal(Status.PressureBelowRange, TotalDissolvedGas.Percent(-1000.0, 990.0, out double none));
        Assert.True(double.IsNaN(none));
        Assert.Equal(Status.PartialPressureAboveRange, TotalDissolvedGas.NitrogenArgon(
            -400.0, 980.0, 20.0, 0.0, 600.0, 0.0, RangeRule.Refuse, out none, out _));
        Assert.True(double.IsNaN(none));
        Assert.Equal(Status.TemperatureJustBelowRange, TotalDissolvedGas.NitrogenArgon(
            12.0, 980.0, -0.1, 0.0, 200.0, 0.0, RangeRule.NearEdge, out double near, out _));
        Assert.InRange(near, 780.0, 790.0);
        Assert.Equal(Status.EquationUnknown, TotalDissolvedGasUncertainty.Components(
            0, 10.0, 980.0, 20.0, 0.0, 9.0, 0.0, false, 1.0, 1.0, 0.1, 0.1, 0.1, RangeRule.Extrapolate, out none, out _, out _, out _));
        Assert.True(double.IsNaN(none));
        Assert.Equal(Status.Ok, TotalDissolvedGas.CompensationDepth(-20.0, 998.0, out double depth));
        Assert.True(depth < 0.0);
    }

    /// <summary>Total %, pO2, O2 %, N2 and Ar, their %; the first input is the total pressure or ΔP.</summary>
    private static double[] Chain(double[] x, bool isTotalMeasured)
    {
        double delta = isTotalMeasured ? x[0] - x[1] : x[0];
        Assert.Equal(Status.Ok, TotalDissolvedGas.Percent(delta, x[1], out double total));
        Assert.Equal(Status.Ok, OxygenEquilibrium.PartialPressureFromConcentration(
            SolubilityEquation.BensonKrause1984, x[2], x[3], x[1], x[4], RangeRule.Refuse, out double oxygen));
        Assert.Equal(Status.Ok, Saturation.PercentLocal(oxygen, x[2], x[1], RangeRule.Refuse, out double oxygenPercent));
        Assert.Equal(Status.Ok, TotalDissolvedGas.NitrogenArgon(delta, x[1], x[2], x[3], oxygen, 0.0, RangeRule.Refuse, out double rest, out double percent));
        return [total, oxygen, oxygenPercent, rest, percent];
    }

    /// <summary>An uncertainty whose square leaves the numbers spoils all four answers, not only those that it enters.</summary>
    [Fact]
    public void Components_ThatOverflow_AreAllRefused()
    {
        Assert.Equal(Status.UncertaintyAboveRange, TotalDissolvedGasUncertainty.Components(
            SolubilityEquation.GarciaGordon1992, -50.0, 870.0, 36.5, 34.5, 5.9, 0.13, false, double.MaxValue, 0.25, 0.1, 0.4, 0.2, RangeRule.Refuse,
            out double oxygen, out double oxygenPercent, out double nitrogen, out double nitrogenPercent));
        Assert.All(new[] { oxygen, oxygenPercent, nitrogen, nitrogenPercent }, static value => Assert.True(double.IsNaN(value)));
    }
}
