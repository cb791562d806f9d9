using System;
using Xunit;

namespace ProbeCal.Core.Tests.Probes;

/// <summary>Luminescence models against values from outside and against each other.</summary>
public class LuminescenceTests
{
    /// <summary>
    /// Part of the 20-point test vector of an ocean observatory's data product for the seven-coefficient form, second-hand: seen in a port of it, not in the publication.
    /// Coefficients 0.002848, 0.000114, 1.51e-6, 70.42301, -0.10302, -12.9462, 1.265377; calibrated phase, temperature, µmol/L.
    /// </summary>
    [Theory]
    [InlineData(32.0, 10.0, 367.038772)]
    [InlineData(32.0, 16.67, 289.131248)]
    [InlineData(32.0, 23.33, 232.13854)]
    [InlineData(32.0, 30.0, 189.376503)]
    [InlineData(39.825, 10.0, 206.105882)]
    [InlineData(47.65, 10.0, 112.481219)]
    [InlineData(47.65, 30.0, 55.3355979)]
    [InlineData(55.475, 30.0, 23.0890079)]
    [InlineData(63.3, 10.0, 8.06153583)]
    public void Uchida2008_meets_the_ported_vector(double phase, double temperature, double micromolesPerLitre)
    {
        Uchida2008Probe probe = ProbeModelTests.Uchida();
        Assert.Equal(Status.Ok, probe.Response(phase, temperature, double.NaN, 0, RangeRule.Refuse, out double hectopascal));
        // Back to the concentration in fresh water that the vector states, by the equation that the probe was given.
        Assert.Equal(Status.Ok, OxygenEquilibrium.ConcentrationFromPartialPressure(
            SolubilityEquation.GarciaGordon1992, temperature, 0, PressureUnits.HectopascalPerAtmosphere, hectopascal, RangeRule.Refuse, out double milligrams));
        // The vector's nine digits: half a unit in the last of the smallest value.
        Assert.Equal(micromolesPerLitre, OxygenUnits.MicromolesPerLitreFromMilligramsPerLitre(milligrams), 5e-7 * micromolesPerLitre);
    }

    [Fact]
    public void Bittig2018_is_the_form_of_Uchida2008_in_partial_pressure()
    {
        // The same coefficients: one gives hPa, the other µmol/L of fresh water, and both the same number.
        var bittig = new Bittig2018Probe(
            0.002848, 0.000114, 1.51e-6, 70.42301, -0.10302, -12.9462, 1.265377, 0, OptodePressureCorrection.Uchida2008, 0, 0, 40);
        for (double phase = 30; phase < 64; phase += 0.7)
        {
            for (double temperature = 0; temperature <= 40; temperature += 4)
            {
                Assert.Equal(Status.Ok, bittig.Response(phase, temperature, double.NaN, 0, RangeRule.Refuse, out double number));
                Assert.Equal(Status.Ok, ProbeModelTests.Uchida().Response(phase, temperature, double.NaN, 0, RangeRule.Refuse, out double hectopascal));
                Assert.Equal(Status.Ok, OxygenEquilibrium.ConcentrationFromPartialPressure(
                    SolubilityEquation.GarciaGordon1992, temperature, 0, PressureUnits.HectopascalPerAtmosphere, hectopascal, RangeRule.Refuse, out double milligrams));
                Assert.Equal(number, OxygenUnits.MicromolesPerLitreFromMilligramsPerLitre(milligrams), 1e-9 * Math.Abs(number) + 1e-11);
            }
        }
    }

    [Fact]
    public void Oxygen_falls_as_the_phase_rises()
    {
        foreach (IProbeModel model in new IProbeModel[] { ProbeModelTests.Uchida(), ProbeModelTests.Bittig(0), ProbeModelTests.Bittig(5e-4) })
        {
            for (double temperature = 0; temperature <= 40; temperature += 4)
            {
                double last = double.PositiveInfinity;
                for (double phase = 25; phase < 70; phase += 0.5)
                {
                    Assert.Equal(Status.Ok, model.Response(phase, temperature, double.NaN, 0, RangeRule.Refuse, out double response));
                    Assert.True(response < last);
                    last = response;
                }
            }
        }
    }

    [Fact]
    public void Depth_multiplies_the_oxygen_of_a_sensor_by_the_published_factor_and_what_depth_does_to_the_water()
    {
        // Uchida et al. 2008: 3.2 % per 1000 dbar; the water's own by Enns et al. 1965, whose test stands with it.
        IProbeModel model = ProbeModelTests.Bittig(0);
        model.Response(40, 10, double.NaN, 0, RangeRule.Refuse, out double surface);
        model.Response(40, 10, double.NaN, 1000, RangeRule.Refuse, out double deep);
        Assert.Equal(Status.Ok, Enns1965.Factor(Gas.Oxygen, 10, 100_000, RangeRule.Refuse, out double water));
        Assert.Equal(1.032 * water, deep / surface, 1e-14);
        Assert.Equal(Status.Ok, OptodePressure.Factor(OptodePressureCorrection.Bittig2015, 10, 1000, RangeRule.Refuse, out double bittig));
        Assert.Equal(1.0441, bittig, 1e-14);
        Assert.Equal(Status.CoefficientUnknown, OptodePressure.Factor(0, 10, 1000, RangeRule.Refuse, out _));
        Assert.Equal(Status.DepthBelowRange, OptodePressure.Factor(OptodePressureCorrection.Bittig2015, 10, -1, RangeRule.Refuse, out _));
    }

    [Fact]
    public void SternVolmer_response_is_linear_in_the_partial_pressure()
    {
        // A foil made here: lifetime 60 µs at 20 °C without oxygen, Ksv 0.015/hPa, modulated at 4 kHz.
        const double Unquenched = 60e-6;
        const double Frequency = 4000;
        var probe = new SternVolmerProbe(LuminescenceSignal.PhaseDegrees, TemperatureCoefficientForm.Exponential, 0.01, 0, 0, -0.003, 0, 0, 20, 0, 40);
        foreach (double temperature in new[] { 5.0, 20.0, 35.0 })
        {
            double lifetime = Unquenched * (1 - (0.003 * (temperature - 20)));
            Assert.Equal(Status.Ok, probe.Gain(temperature, RangeRule.Refuse, out double gain));
            Assert.Equal(Math.Exp(0.01 * (temperature - 20)), gain, 1e-14);
            foreach (double hectopascal in new[] { 0.0, 50.0, 210.0, 400.0 })
            {
                double quenched = lifetime / (1 + (0.015 * gain * hectopascal));
                double phase = Math.Atan(2 * Math.PI * Frequency * quenched) * 180 / Math.PI;
                Assert.Equal(Status.Ok, probe.Response(phase, temperature, double.NaN, 0, RangeRule.Refuse, out double response));
                double zero = 1 / (2 * Math.PI * Frequency * Unquenched);
                Assert.Equal(zero * (1 + (0.015 * gain * hectopascal)), response, 1e-13 * response);
            }
        }
    }

    [Fact]
    public void Phase_functions_agree_with_those_of_the_machine()
    {
        double worst = 0;
        for (double degrees = 0.01; degrees < 90; degrees += 0.01)
        {
            double expected = degrees < 45 ? 1 / Math.Tan(degrees * Math.PI / 180) : Math.Tan((90 - degrees) * Math.PI / 180);
            double found = PhaseAngle.Cotangent(degrees);
            worst = Math.Max(worst, Math.Abs((found / expected) - 1));
            worst = Math.Max(worst, Math.Abs((PhaseAngle.FromCotangent(found) / degrees) - 1));
        }

        // Four units in the last place, as the class promises, and those of the machine's own function.
        Assert.True(worst < 2e-15, worst.ToString("E1"));
        Assert.All(new[] { double.NaN, 0, 90, -1, 91, double.PositiveInfinity }, bad => Assert.True(double.IsNaN(PhaseAngle.Cotangent(bad))));
        Assert.All(new[] { double.NaN, 0, -1, double.PositiveInfinity }, bad => Assert.True(double.IsNaN(PhaseAngle.FromCotangent(bad))));
    }

    [Fact]
    public void Impossible_phases_and_coefficients_are_refused()
    {
        Assert.Equal(Status.SignalBelowRange, ProbeModelTests.Uchida().Response(5, 10, double.NaN, 0, RangeRule.Refuse, out _));
        var noQuenching = new Bittig2018Probe(0, 0, 0, 70, -0.1, -13, 1.26, 0, OptodePressureCorrection.Uchida2008, 0, 0, 40);
        Assert.Equal(Status.CoefficientBelowRange, noQuenching.Response(40, 10, double.NaN, 0, RangeRule.Refuse, out _));
        var unknown = new SternVolmerProbe(0, TemperatureCoefficientForm.Exponential, 0.01, 0, 0, -0.003, 0, 0, 20, 0, 40);
        Assert.Equal(Status.CoefficientUnknown, unknown.Response(40, 10, double.NaN, 0, RangeRule.Refuse, out _));
        var dark = new SternVolmerProbe(LuminescenceSignal.Lifetime, TemperatureCoefficientForm.Exponential, 0.01, 0, 0, -0.1, 0, 0, 20, 0, 40);
        Assert.Equal(Status.CoefficientBelowRange, dark.Response(40, 35, double.NaN, 0, RangeRule.Refuse, out _));
    }
}
