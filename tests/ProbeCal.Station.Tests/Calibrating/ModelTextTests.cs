using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Simulation;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>Response models as one line of text, as a record, and as Core computes with them.</summary>
public class ModelTextTests
{
    private const string Foil = "c0=0.002848 c1=0.000114 c2=1.51e-6 c3=70.42301 c4=-0.10302 c5=-12.9462 c6=1.265377";

    /// <summary>Text, a true zero and slope, and a range of partial pressures.</summary>
    public static TheoryData<string, double, double, double, double> Models => new()
    {
        { "amperometric", 0.4, 0.31, 0, 250 },
        { "amperometric second-coefficient=-1e-4 third-coefficient=1e-6 pressure-coefficient=-0.003 residual-signal=0.3 residual-per-kelvin=0.05 flow-factor=0.9", 0.4, 0.31, 0, 250 },
        { "stern-volmer signal-kind=phase lifetime-per-kelvin=-0.003", 0.6, 0.009, 0, 250 },
        { "stern-volmer signal-kind=lifetime lifetime-per-kelvin=-0.003 lifetime-per-square-kelvin=1e-5", 0.02, 0.0003, 0, 250 },
        { "uchida-2008 " + Foil + " lowest-celsius=0 highest-celsius=40", 0.5, 1.02, 1, 250 },
        { "bittig-2018 " + Foil + " c7=2e-4 depth-correction=uchida-2008 lowest-celsius=0 highest-celsius=40", 0.5, 1.02, 1, 250 },
        { "severinghaus zero-per-kelvin=-0.2 lowest-celsius=0 highest-celsius=40", -110, 57, 0.5, 50 },
        { "total-gas lowest-celsius=0 highest-celsius=40", 1, 1.001, 700, 1100 },
        { "linear lowest-celsius=0 highest-celsius=40", 5, 0.8, 0, 50 },
        { "quadratic per-kelvin=0.004 lowest-celsius=0 highest-celsius=40", 5, 0.8, 0, 50 },
    };

    [Theory]
    [MemberData(nameof(Models))]
    public void A_text_is_read_printed_and_simulated(string text, double zero, double slope, double low, double high)
    {
        RecordedProbe bare = Bench.Setup.Probe with { TemperatureCoefficient = CoefficientText.Parse("--temperature-coefficient", "exponential 0.03/K at 25C fitted 0..40C") };
        RecordedProbe probe = ModelText.Apply("--model", text, bare);
        Assert.Equal(text.Split(' ').Length - 1, probe.Coefficients.Length);
        Assert.Equal(probe.Coefficients, ModelText.Apply("--model", ModelText.Print(probe), bare).Coefficients);
        IProbeModel model = RecordConversion.Model(probe);
        var water = new ModelInWater(model, zero, slope, 0);
        var fit = new FittedResponse(zero, slope, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, low, high);
        Assert.Equal(Status.Ok, ProbeCalibration.CreateFitted(model, Gas.Oxygen, fit, Stirring.Stirred, 1, 0, 0, out ProbeCalibration? calibration));
        for (int i = 0; i <= 10; i++)
        {
            double truth = low + ((high - low) * i / 10);
            double signal = water.Signal(truth, 15, 1000, 1, 5);
            Correction.PartialPressure(calibration!, 1, signal, 15, 1000, 5, RangeRule.Extrapolate, out double found);
            Assert.Equal(truth, found, 1e-9 * Math.Max(1, truth));
        }
    }

    [Theory]
    [InlineData("", "the model is missing")]
    [InlineData("uchida-2009 c0=1", "did you mean")]
    [InlineData("uchida-2008 c0=0.0028", "lacks c1 (")]
    [InlineData("uchida-2008 c0=0.0028 c0=0.0028", "c0 is given twice")]
    [InlineData("uchida-2008 " + Foil + " c7=1", "has no coefficient 'c7'")]
    [InlineData("severinghaus lowest-celsius", "has no value")]
    [InlineData("severinghaus lowest-celsius=0 highest-celsius=abc", "abc")]
    [InlineData("severinghaus lowest-celsius=40 highest-celsius=0", "runs from low to high")]
    [InlineData("stern-volmer signal-kind=phas lifetime-per-kelvin=0", "phase, lifetime, intensity")]
    [InlineData("bittig-2018 c0=0 c1=0 c2=0 c3=70 c4=-0.1 c5=-13 c6=1.26 lowest-celsius=0 highest-celsius=40", "make no response")]
    public void Bad_texts_are_refused_in_one_line(string text, string expected)
    {
        InputException refused = Assert.Throws<InputException>(() => ModelText.Apply("--model", text, Bench.Setup.Probe));
        Assert.Contains(expected, refused.Message, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', refused.Message);
    }

    [Fact]
    public void Missing_coefficients_are_all_named()
    {
        InputException refused = Assert.Throws<InputException>(() => ModelText.Apply("--model", "uchida-2008 c3=70", Bench.Setup.Probe));
        Assert.All(new[] { "c0", "c1", "c2", "c4", "c5", "c6", "lowest-celsius", "highest-celsius" }, name => Assert.Contains(name + " (", refused.Message, StringComparison.Ordinal));
        Assert.DoesNotContain("c3 (", refused.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Every_model_that_is_offered_has_its_coefficients()
    {
        Assert.Equal(ModelNames.All.Order(StringComparer.Ordinal), ModelCoefficients.Described.Order(StringComparer.Ordinal));
        Assert.Throws<InputException>(() => RecordConversion.Model(Bench.Setup.Probe with { Model = "unheard-of" }));
    }
}
