using System;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>Each response model through a whole calibration and a check, on a probe of which everything is known.</summary>
public class ModelRunTests
{
    // Coefficients of a luminescent film of ordinary size, invented; the last is c6.
    private const string Foil = "c0=2.7e-3 c1=1.2e-4 c2=2.5e-6 c3=230 c4=-0.4 c5=-60 c6=4.5";
    private const string Range = " lowest-celsius=0 highest-celsius=40";

    public static TheoryData<string, Gas, double, double, double, double, string> Models => new()
    {
        // Model, gas, true zero and slope of the response, main and second mixture (mole fraction), form.
        { "linear" + Range, Gas.Methane, 12, 0.8, 0.5, 0.1, "line" },
        { "quadratic" + Range, Gas.Methane, 12, 0.8, 0.5, 0.1, "quadratic" },
        { "stern-volmer signal-kind=lifetime lifetime-per-kelvin=-0.003", Gas.Oxygen, 0.02, 0.0003, 0.2095, 0.02, "line" },
        { "uchida-2008 " + Foil + Range, Gas.Oxygen, 0.5, 1.02, 0.2095, 0.02, "line" },
        { "severinghaus" + Range, Gas.CarbonDioxide, -110, 57, 0.05, 0.001, "line" },
    };

    [Theory]
    [MemberData(nameof(Models))]
    public async Task EachModel_FindsItsZeroAndSlope_AndItsCheckPasses(string model, Gas gas, double zero, double slope, double main, double second, string form)
    {
        using Bench bench = new();
        CalibrationSetup setup = Setup(model, gas, main, second, form);
        CalibrationRecord record = await RunAsync(bench, setup, zero, slope);

        Assert.Equal(("fit", GasNames.NameOf(gas), setup.Probe.Model), (record.SlopeFrom, record.Gas, record.Probe.Model));
        Assert.InRange(Math.Abs(record.Result.Slope - slope), 0, 2.5 * record.Result.SlopeStandardUncertainty);
        Assert.InRange(Math.Abs(record.Result.Zero - zero), 0, 2.5 * record.Result.ZeroStandardUncertainty);
        Assert.InRange(record.Result.SlopeStandardUncertainty / slope, 0, 0.05);
        Assert.True(record.Result.Pass, string.Join("; ", record.Result.Reasons));

        bench.Time.Advance(TimeSpan.FromHours(1));
        CalibrationRecord check = await RunAsync(bench, setup with { Purpose = CalibrationRecord.CheckPurpose }, zero, slope);
        Assert.True(check.Result.Pass, string.Join("; ", check.Result.Reasons));
        Assert.All(check.Points, point => Assert.Equal(record.Id, point.ReadBy));
        Assert.All(check.Points, point => Assert.InRange(Math.Abs(point.ErrorHectopascal!.Value), 0, 0.02 * point.ReferencePartialPressureHectopascal));
    }

    [Theory]
    [InlineData(1.001, true)]
    [InlineData(1.02, false)]
    public async Task TotalGasProbe_AgainstTheBarometerAndAGauge_IsJudgedInHectopascal(double slopeAtTheCheck, bool passes)
    {
        using Bench bench = new();
        CalibrationSetup setup = Setup("total-gas" + Range, Gas.Oxygen, 0.2, 0.1, "line");
        setup = setup with
        {
            Method = MethodIds.WaterSaturatedAir,
            Limits = new CalibrationLimits { Pressure = new PressureLimits { Percent = 1 } },
            Plan =
            [
                new PlannedPoint { Role = "span", Method = MethodIds.WaterSaturatedAir },
                new PlannedPoint { Role = "level-1", Method = MethodIds.TransferStandard, Transfer = TransferText.Parse("--transfer", "GAUGE-2 1240hPa u 0.5hPa") },
            ],
        };
        CalibrationRecord record = await RunAsync(bench, setup, 2, 1.001);
        Assert.Equal(("total", "fit"), (record.Gas, record.SlopeFrom));
        Assert.True(record.Result.Pass, string.Join("; ", record.Result.Reasons));
        Assert.InRange(Math.Abs(record.Result.Slope - 1.001), 0, 2.5 * record.Result.SlopeStandardUncertainty);
        Assert.All(record.Limits.Where(limit => limit.Decides), limit => Assert.Equal("hPa", limit.Unit));

        bench.Time.Advance(TimeSpan.FromHours(1));
        CalibrationRecord check = await RunAsync(bench, setup with { Purpose = CalibrationRecord.CheckPurpose }, 2, slopeAtTheCheck);
        Assert.Equal(passes, check.Result.Pass);
    }

    [Fact]
    public async Task LogarithmicProbe_HasNoZero_WhichIsToldBeforeAnybodyWaits()
    {
        using Bench bench = new();
        CalibrationSetup setup = Setup("severinghaus" + Range, Gas.CarbonDioxide, 0.05, 0.001, "line");
        setup = setup with { ZeroPlan = CalibrationIds.ZeroAdjust, Plan = [.. setup.Plan, MethodBench.Planned(CalibrationIds.ZeroPoint, MethodIds.ZeroGas, 0)] };
        InputException refused = await Assert.ThrowsAsync<InputException>(() => RunAsync(bench, setup, -110, 57));
        Assert.StartsWith("zero by zero-gas: the signal of this probe follows the logarithm", refused.Message, StringComparison.Ordinal);
    }

    private static CalibrationSetup Setup(string model, Gas gas, double main, double second, string form)
    {
        PlannedPoint[] plan = [Mixture("span", main, gas), Mixture("level-1", second, gas)];
        if (form == "quadratic")
        {
            plan = [.. plan, Mixture("level-2", (main + second) / 2, gas), Mixture("level-3", (main + (3 * second)) / 4, gas)];
        }

        RecordedProbe probe = Bench.Setup.Probe with { SignalUnit = "", SignalResolution = null, SignalLow = null, SignalHigh = null };
        return Bench.Setup with
        {
            Method = MethodIds.GasMixture,
            Gas = gas,
            Limits = new CalibrationLimits { Pressure = new PressureLimits { Percent = 2 } },
            Plan = plan,
            FitForm = form,
            Probe = PlanText.WithModel("--model", model, probe),
        };
    }

    private static PlannedPoint Mixture(string role, double fraction, Gas gas)
    {
        string text = FormattableString.Invariant($"CYL-{role} {100 * fraction}% u {0.1 * fraction}% dry");
        return new PlannedPoint { Role = role, Method = MethodIds.GasMixture, Mixture = MixtureText.Parse("--mixture", text, gas) };
    }

    private static async Task<CalibrationRecord> RunAsync(Bench bench, CalibrationSetup setup, double zero, double slope)
    {
        KnownProbe probe = new(bench.Time.GetUtcNow(), setup.Probe) { ZeroNow = zero, SlopeNow = slope, Noise = 1e-3 };
        ScriptedDialogue person = new();
        bool total = setup.Probe.Model == "total-gas";
        person.OnStep = step => probe.Hectopascal = step.Role switch
        {
            null => probe.Hectopascal,
            "level-1" when total => 1240,
            string when total => KnownProbe.Pressure,
            string => MethodBench.Truth(setup, step),
        };
        using CalibrationLogStore log = bench.Log();
        CalibrationSession session = CalibrationSession.Begin(setup, bench.Data, log, bench.Time, false, person.Say);
        CalibrationRecord record = (await new CalibrationRun(session, person, bench.Time).RunAsync(probe, false, Bench.Version, CancellationToken.None)).Record;
        bench.Time.SetUtcNow(record.Points.Max(point => point.LastUtc).AddMinutes(1));
        return record;
    }
}
