using System;
using System.Linq;
using Xunit;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>The lag correction on simulated first-order probes, whose answers to a ramp and a step are known exactly.</summary>
public class LagCorrectionTests
{
    private const double Tau = 20;

    [Fact]
    public void A_settled_ramp_is_found_back_exactly()
    {
        // A first-order probe follows a ramp x = a + b·t by y = x − b·τ.
        foreach ((double before, double after) in new[] { (5.0, 5.0), (2.0, 11.0) })
        {
            double Y(double t)
            {
                return 100 + (0.3 * (t - Tau));
            }

            Assert.Equal(Status.Ok, LagCorrection.Central(Tau, before, after, Y(50 - before), Y(50), Y(50 + after), out double x, out _));
            Assert.Equal(100 + (0.3 * 50), x, 1e-11);
            Assert.Equal(Status.Ok, LagCorrection.Backward(Tau, before, Y(50 - before), Y(50), out x, out _));
            Assert.Equal(100 + (0.3 * 50), x, 1e-11);
        }
    }

    [Fact]
    public void A_step_is_found_back_to_the_error_of_the_difference()
    {
        // y = 1 − exp(−t/τ) after a step to 1; a central difference errs by y'''·Δt²/6, so x by exp(−t/τ)·(Δt/τ)²/6.
        const double Step = 1;
        for (double t = 2; t < 100; t += 1)
        {
            double Y(double at)
            {
                return 1 - Math.Exp(-at / Tau);
            }

            Assert.Equal(Status.Ok, LagCorrection.Central(Tau, Step, Step, Y(t - Step), Y(t), Y(t + Step), out double x, out _));
            double expected = Math.Exp(-t / Tau) * Step * Step / (6 * Tau * Tau);
            Assert.Equal(1 + expected, x, 0.01 * expected + 1e-13);
        }
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(1.0)]
    [InlineData(10.0)]
    public void Noise_grows_as_stated(double steps)
    {
        var random = new Random(20261201);
        double Noise()
        {
            return Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
        }

        double[] central = new double[20_000];
        double[] backward = new double[central.Length];
        double ofCentral = 0;
        double ofBackward = 0;
        for (int i = 0; i < central.Length; i++)
        {
            LagCorrection.Central(steps * 3, 3, 3, Noise(), Noise(), Noise(), out central[i], out ofCentral);
            LagCorrection.Backward(steps * 3, 3, Noise(), Noise(), out backward[i], out ofBackward);
        }

        Assert.Equal(Math.Sqrt(1 + (steps * steps / 2)), ofCentral, 1e-12);
        Assert.Equal(Math.Sqrt(1 + (2 * steps) + (2 * steps * steps)), ofBackward, 1e-12);
        // The standard deviation of 20,000 is known to 0.5 %: three times that.
        Assert.Equal(1, Math.Sqrt(central.Average(v => v * v)) / ofCentral, 0.015);
        Assert.Equal(1, Math.Sqrt(backward.Average(v => v * v)) / ofBackward, 0.015);
    }

    [Fact]
    public void Bad_inputs_are_refused()
    {
        Assert.Equal(Status.CoefficientBelowRange, LagCorrection.Central(-1, 1, 1, 1, 1, 1, out double x, out _));
        Assert.True(double.IsNaN(x));
        Assert.Equal(Status.CoefficientNotFinite, LagCorrection.Backward(double.NaN, 1, 1, 1, out _, out _));
        Assert.Equal(Status.PointsDegenerate, LagCorrection.Central(1, 0, 1, 1, 1, 1, out _, out _));
        Assert.Equal(Status.PointsDegenerate, LagCorrection.Central(1, 1, -1, 1, 1, 1, out _, out _));
        Assert.Equal(Status.PointsNotFinite, LagCorrection.Central(1, 1, 1, 1, double.NaN, 1, out _, out _));
        Assert.Equal(Status.PointsNotFinite, LagCorrection.Backward(1, 1, double.PositiveInfinity, 1, out _, out _));
    }
}
