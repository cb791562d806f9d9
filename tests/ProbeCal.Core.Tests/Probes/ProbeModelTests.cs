using System;
using System.Collections.Generic;
using Xunit;

namespace ProbeCal.Core.Tests.Probes;

/// <summary>What every probe model must do, whatever its law: inverse, slopes, refusals, no allocation.</summary>
public class ProbeModelTests
{
    // Coefficients of an invented foil of the size of the published example, and invented probes.
    private static readonly Dictionary<string, IProbeModel> Models = new()
    {
        ["amperometric"] = new AmperometricProbe(TemperatureCoefficientForm.Exponential, 0.03, 25, 0, 40),
        ["amperometric polynomial, residual, pressure"] = new AmperometricProbe(TemperatureCoefficientForm.Polynomial, 0.03, -2e-4, 1e-6, 25, 0, 40, -0.003, 0.4, 0.05, 0.9),
        ["stern-volmer phase"] = new SternVolmerProbe(LuminescenceSignal.PhaseDegrees, TemperatureCoefficientForm.Exponential, 0.01, 0, 0, -0.003, 1e-5, 0.002, 20, 0, 40),
        ["stern-volmer lifetime"] = new SternVolmerProbe(LuminescenceSignal.Lifetime, TemperatureCoefficientForm.Arrhenius, 9000, 0, 0, -0.003, 0, 0, 20, 0, 40),
        ["stern-volmer intensity"] = new SternVolmerProbe(LuminescenceSignal.Intensity, TemperatureCoefficientForm.Linear, 0.01, 0, 0, -0.003, 0, 0, 20, 0, 40),
        ["uchida"] = Uchida(),
        ["bittig 7"] = Bittig(0),
        ["bittig 8"] = Bittig(5e-4),
        ["severinghaus"] = new SeveringhausProbe(-0.2, 25, 0, 40),
        ["total gas"] = new TotalGasProbe(0, 40),
        ["generic"] = new GenericProbe(0.004, 25, 0, 40),
    };

    public static TheoryData<string> Names => new(Models.Keys);

    internal static Uchida2008Probe Uchida(double phasePerThousandDecibar = 0.1)
    {
        return new Uchida2008Probe(
            0.002848, 0.000114, 1.51e-6, 70.42301, -0.10302, -12.9462, 1.265377, SolubilityEquation.GarciaGordon1992,
            OptodePressureCorrection.Bittig2015, phasePerThousandDecibar, 0, 40);
    }

    internal static Bittig2018Probe Bittig(double c7)
    {
        return new Bittig2018Probe(
            0.0036, 0.00012, 1e-6, 70.42301, -0.10302, -12.9462, 1.265377, c7, OptodePressureCorrection.Uchida2008, 0, 0, 40);
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Signal_is_the_inverse_of_Response(string name)
    {
        IProbeModel model = Models[name];
        double worst = 0;
        int tried = 0;
        foreach ((double signal, double temperature, double depth) in Grid(name))
        {
            Assert.Equal(Status.Ok, model.Response(signal, temperature, 1000, depth, RangeRule.Refuse, out double response));
            Assert.Equal(Status.Ok, model.Signal(response, temperature, 1000, depth, RangeRule.Refuse, out double back));
            worst = Math.Max(worst, Math.Abs((back / signal) - 1));
            tried++;
        }

        // A few units in the last place for each rounding step; (P0/Pc - 1) cancels near no oxygen and keeps 1e-13 of the phase.
        Assert.True(worst < 2e-13, $"{name}: {worst:E1} over {tried}");
        Assert.True(tried >= 200);
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Slopes_are_those_of_differences(string name)
    {
        IProbeModel model = Models[name];
        double worstSignal = 0;
        double worstKelvin = 0;
        double worstGain = 0;
        foreach ((double signal, double temperature, double depth) in Grid(name))
        {
            if (temperature is 0 or 40) { continue; }
            double step = 1e-4 * signal;
            model.Response(signal + step, temperature, 1000, depth, RangeRule.Refuse, out double above);
            model.Response(signal - step, temperature, 1000, depth, RangeRule.Refuse, out double below);
            Assert.Equal(Status.Ok, model.ResponsePerSignal(signal, temperature, 1000, depth, RangeRule.Refuse, out double perSignal));
            double difference = (above - below) / (2 * step);
            worstSignal = Math.Max(worstSignal, Math.Abs((difference / perSignal) - 1));

            const double Kelvin = 0.005;
            model.Response(signal, temperature + Kelvin, 1000, depth, RangeRule.Refuse, out above);
            model.Response(signal, temperature - Kelvin, 1000, depth, RangeRule.Refuse, out below);
            Assert.Equal(Status.Ok, model.ResponsePerKelvin(signal, temperature, depth, out double perKelvin));
            // As a share of what one degree of phase (or 1 % of signal) does, so that a zero slope counts too.
            worstKelvin = Math.Max(worstKelvin, Math.Abs(((above - below) / (2 * Kelvin)) - perKelvin) / Math.Abs(perSignal * signal));

            model.Gain(temperature + Kelvin, RangeRule.Refuse, out above);
            model.Gain(temperature - Kelvin, RangeRule.Refuse, out below);
            Assert.Equal(Status.Ok, model.GainPerKelvin(temperature, out double gainPerKelvin));
            worstGain = Math.Max(worstGain, Math.Abs((Math.Log(above / below) / (2 * Kelvin)) - gainPerKelvin));
        }

        // Central differences: the third derivative times the step squared, and rounding over the step.
        Assert.True(worstSignal < 1e-6, $"{name}: {worstSignal:E1}");
        Assert.True(worstKelvin < 1e-8, $"{name}: {worstKelvin:E1}");
        Assert.True(worstGain < 1e-8, $"{name}: {worstGain:E1}");
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void What_is_not_finite_is_refused(string name)
    {
        IProbeModel model = Models[name];
        foreach (double bad in new[] { double.NaN, double.PositiveInfinity, double.NegativeInfinity })
        {
            foreach (RangeRule rule in Enum.GetValues<RangeRule>())
            {
                Assert.NotEqual(Status.Ok, model.Response(bad, 15, 1000, 0, rule, out double value));
                Assert.True(double.IsNaN(value));
                Assert.NotEqual(Status.Ok, model.Signal(bad, 15, 1000, 0, rule, out value));
                Assert.True(double.IsNaN(value));
                Assert.NotEqual(Status.Ok, model.Gain(bad, rule, out value));
                Assert.True(double.IsNaN(value));
            }
        }
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Gain_ends_where_the_coefficients_end(string name)
    {
        IProbeModel model = Models[name];
        Assert.Equal(Status.Ok, model.Gain(0, RangeRule.Refuse, out _));
        Assert.Equal(Status.Ok, model.Gain(40, RangeRule.Refuse, out _));
        Assert.Equal(Status.TemperatureJustBelowRange, model.Gain(-0.1, RangeRule.Refuse, out double value));
        Assert.True(double.IsNaN(value));
        Assert.Equal(Status.TemperatureAboveRange, model.Gain(45, RangeRule.Refuse, out _));
        Assert.Equal(Status.TemperatureAboveRange, model.Gain(45, RangeRule.Extrapolate, out value));
        Assert.True(value > 0);
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void No_call_allocates(string name)
    {
        IProbeModel model = Models[name];
        double signal = 0;
        foreach ((double first, _, _) in Grid(name)) { signal = first; break; }
        double sum = 0;
        for (int pass = 0; pass < 2; pass++)
        {
            long before = GC.GetAllocatedBytesForCurrentThread();
            for (int i = 0; i < 200; i++)
            {
                model.Response(signal, 15, 1000, 10, RangeRule.Refuse, out double response);
                model.Signal(response, 15, 1000, 10, RangeRule.Refuse, out double back);
                model.ResponsePerSignal(signal, 15, 1000, 10, RangeRule.Refuse, out double slope);
                model.Gain(15, RangeRule.Refuse, out double gain);
                sum += back + slope + gain;
            }

            if (pass == 1) { Assert.Equal(0L, GC.GetAllocatedBytesForCurrentThread() - before); }
        }

        Assert.True(double.IsFinite(sum));
    }

    /// <summary>Signals as they occur with the model, 0 to 40 °C, to 1000 dbar.</summary>
    private static IEnumerable<(double Signal, double Temperature, double Depth)> Grid(string name)
    {
        (double low, double high) = name switch
        {
            _ when name.StartsWith("uchida", StringComparison.Ordinal) || name.StartsWith("bittig", StringComparison.Ordinal) => (30.0, 60.0),
            "stern-volmer phase" => (5.0, 85.0),
            "stern-volmer lifetime" => (10.0, 60.0),
            "severinghaus" => (-80.0, -20.0),
            _ => (1.0, 300.0),
        };
        for (int i = 0; i <= 8; i++)
        {
            for (double temperature = 0; temperature <= 40; temperature += 5)
            {
                foreach (double depth in new[] { 0.0, 50.0, 1000.0 })
                {
                    yield return (low + ((high - low) * i / 8), temperature, depth);
                }
            }
        }
    }
}
