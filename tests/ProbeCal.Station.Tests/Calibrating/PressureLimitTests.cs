using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>Gases other than oxygen, and total gas pressure: judged in hPa, against what a person entered and nothing else.</summary>
public class PressureLimitTests
{
    // 57 mV for ten times the CO2 and -110 mV at 1 hPa; 5 % and 0.5 % of 940 hPa are 47 and 4.7 hPa.
    private const double PerDecade = 57, AtOneHectopascal = -110, High = 47, Low = 4.7;

    [Fact]
    public async Task CarbonDioxide_ByTwoMixtures_PassesInHectopascal()
    {
        using Bench bench = new();
        CalibrationRecord record = await RunAsync(bench, CarbonDioxide(new PressureLimits { Hectopascal = 2 }));

        Assert.True(record.Result.Pass, string.Join("; ", record.Result.Reasons));
        Assert.Equal(PerDecade, record.Result.Slope, 2 * record.Result.SlopeStandardUncertainty);
        RecordedLimit left = Assert.Single(record.Limits, static limit => limit.Decides);
        Assert.Equal(("as-left", "2 hPa", "hPa", "entered for this calibration", "pass"), (left.Check, left.Limit, left.Unit, left.Source, left.Verdict));
        Assert.Equal(record.Points[^1].ErrorHectopascal, left.Found);
        // U comes from the mixture (0.02 % of 940 hPa) and the barometer (0.77 hPa of 940), k = 2; the signal adds next to nothing.
        Assert.Equal(2 * double.Hypot(0.0002 * 940, 0.05 * 0.77), left.ExpandedUncertainty!.Value, 0.01);
        Assert.Equal(2 / left.ExpandedUncertainty.Value, left.LimitToUncertainty!.Value, 9);
        // The band around 100 % is one of dissolved oxygen.
        Assert.All(record.Limits, static limit => Assert.Equal("hPa", limit.Unit));
    }

    [Theory]
    [InlineData(2.0, null, "fail", "as-found 4.0")]
    [InlineData(6.0, null, "pass", "")]
    [InlineData(null, 10.0, "pass", "")]
    [InlineData(null, 5.0, "fail", "as-found 4.0")]
    [InlineData(2.0, 10.0, "pass", "")]
    public async Task CarbonDioxide_CheckOfAProbeTwoMillivoltOff_IsJudgedByWhatWasEntered(double? hectopascal, double? percent, string verdict, string reason)
    {
        using Bench bench = new();
        await RunAsync(bench, CarbonDioxide(new PressureLimits { Hectopascal = 2 }));
        bench.Time.Advance(TimeSpan.FromHours(5));
        CalibrationSetup setup = CarbonDioxide(new PressureLimits { Hectopascal = hectopascal, Percent = percent });
        setup = setup with { Purpose = CalibrationRecord.CheckPurpose, Plan = [setup.Plan[0]] };
        CalibrationRecord check = await RunAsync(bench, setup, off: 2);

        // The slope at 20 °C is 57 mV times 293.15/298.15; 2 mV more are 10^(2/56.04) times the 47 hPa: 51.0 hPa.
        double expected = High * (Math.Pow(10, 2 / (PerDecade * 293.15 / 298.15)) - 1);
        Assert.Equal(expected, check.Points[0].ErrorHectopascal!.Value, 0.02);
        Assert.Equal(verdict, Decision.Of(check));
        Assert.Equal(verdict == "pass", check.Result.Pass);
        Assert.StartsWith(reason, string.Join("; ", check.Result.Reasons), StringComparison.Ordinal);
    }

    [Fact]
    public async Task GuardBand_IsThatOfTheUncertaintyInHectopascal()
    {
        using Bench bench = new();
        CalibrationSetup setup = CarbonDioxide(new PressureLimits { Hectopascal = 0.1 });
        WorkFailedException refused = await Assert.ThrowsAsync<WorkFailedException>(() => RunAsync(bench, setup with { Limits = setup.Limits with { GuardBand = true } }));
        Assert.Contains("hPa (k = 2) is not below the limit 0.100 hPa", refused.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(2.0, false)]
    [InlineData(5.0, true)]
    public async Task TotalGas_CheckOfAProbeThreeHectopascalOff_IsJudgedByWhatWasEntered(double limit, bool passes)
    {
        using Bench bench = new();
        CalibrationRecord calibration = await RunAsync(bench, TotalGas(new PressureLimits { Hectopascal = limit }));
        Assert.True(calibration.Result.Pass, string.Join("; ", calibration.Result.Reasons));
        Assert.Equal("total", calibration.Gas);
        bench.Time.Advance(TimeSpan.FromHours(5));
        CalibrationSetup setup = TotalGas(new PressureLimits { Hectopascal = limit });
        CalibrationRecord check = await RunAsync(bench, setup with { Purpose = CalibrationRecord.CheckPurpose, Plan = [setup.Plan[0]] }, off: 3);

        // In water in equilibrium with the air ΔP is 0, so that the whole of it is error.
        RecordedLimit found = Assert.Single(check.Limits);
        Assert.Equal(3, found.Found!.Value, 0.02);
        // The reference is the barometer, and how near to equilibrium an aerated bath is (0.75 %).
        Assert.Equal(2 * double.Hypot(0.77, 0.0075 * 940), found.ExpandedUncertainty!.Value, 0.01);
        Assert.Equal(passes, check.Result.Pass);
        Assert.All(check.Findings, static finding => Assert.Null(finding.ErrorAsFoundMilligramsPerLitre));
    }

    [Theory]
    [InlineData(true, "there is no published limit for CO2, and none was entered: say how far a reading may be off, with --limit in hPa")]
    [InlineData(false, "there is no published limit for total gas pressure, and none was entered")]
    public async Task WithoutALimit_NothingIsMeasured(bool carbonDioxide, string says)
    {
        using Bench bench = new();
        CalibrationSetup setup = carbonDioxide ? CarbonDioxide(null) : TotalGas(new PressureLimits { ZeroHectopascal = 1 });
        foreach (string purpose in new[] { CalibrationRecord.CalibrationPurpose, CalibrationRecord.CheckPurpose })
        {
            InputException refused = await Assert.ThrowsAsync<InputException>(() => RunAsync(bench, setup with { Purpose = purpose }));
            Assert.StartsWith(says, refused.Message, StringComparison.Ordinal);
            Assert.DoesNotContain('\n', refused.Message);
        }

        using CalibrationLogStore log = bench.Log();
        Assert.Empty(log.Records);
        Assert.False(System.IO.Directory.Exists(bench.Data.SessionsFolder) && System.IO.Directory.EnumerateFiles(bench.Data.SessionsFolder).Any());
    }

    [Fact]
    public void Zero_WantsAPressure_ForAShareOfNothingIsNothing()
    {
        CalibrationSetup setup = CarbonDioxide(new PressureLimits { Percent = 3 });
        setup = setup with
        {
            Probe = PlanText.WithModel("--model", "linear lowest-celsius=0 highest-celsius=40", Bench.Setup.Probe),
            ZeroPlan = CalibrationIds.ZeroCheck,
            Plan = [.. setup.Plan, new PlannedPoint { Role = CalibrationIds.ZeroPoint, Method = MethodIds.ZeroGas }],
        };
        InputException refused = Assert.Throws<InputException>(() => PlanCheck.Require(setup, null));
        Assert.Contains("--zero-limit 1hPa", refused.Message, StringComparison.Ordinal);
        PlanCheck.Require(setup with { Limits = new CalibrationLimits { Pressure = new PressureLimits { Percent = 3, ZeroHectopascal = 1 } } }, null);
        PlanCheck.Require(setup with { Limits = new CalibrationLimits { Pressure = new PressureLimits { Hectopascal = 1 } } }, null);
    }

    private static CalibrationSetup CarbonDioxide(PressureLimits? limits)
    {
        return Bench.Setup with
        {
            Gas = Gas.CarbonDioxide,
            Probe = PlanText.WithModel("--model", "severinghaus zero-per-kelvin=0 lowest-celsius=0 highest-celsius=40", Bench.Setup.Probe with { SignalUnit = "mV", SignalLow = -500 }),
            Method = MethodIds.GasMixture,
            Plan = [Mixture(CalibrationIds.SpanPoint, "CYL-5 5% u 0.02% dry"), Mixture("level-1", "CYL-6 0.5% u 0.005% dry")],
            Limits = new CalibrationLimits { Pressure = limits },
        };

        static PlannedPoint Mixture(string role, string text)
        {
            return new PlannedPoint { Role = role, Method = MethodIds.GasMixture, Mixture = MixtureText.Parse("--mixture", text, Gas.CarbonDioxide) };
        }
    }

    private static CalibrationSetup TotalGas(PressureLimits limits)
    {
        return Bench.Setup with
        {
            Probe = PlanText.WithModel("--model", "total-gas lowest-celsius=0 highest-celsius=40", Bench.Setup.Probe with { SignalUnit = "hPa", SignalHigh = 2000 }),
            Method = MethodIds.AirSaturatedWater,
            Plan =
            [
                new PlannedPoint { Role = CalibrationIds.SpanPoint, Method = MethodIds.AirSaturatedWater },
                new PlannedPoint { Role = "level-1", Method = MethodIds.TransferStandard, Transfer = TransferText.Parse("--transfer", "STD-1 1000hPa u 0.3hPa") },
            ],
            Limits = new CalibrationLimits { Pressure = limits },
        };
    }

    private static async Task<CalibrationRecord> RunAsync(Bench bench, CalibrationSetup setup, double off = 0)
    {
        bool total = setup.Probe.Model == "total-gas";
        KnownProbe probe = new(bench.Time.GetUtcNow(), setup.Probe)
        {
            SlopeNow = total ? 1.001 : PerDecade,
            ZeroNow = (total ? 1 : AtOneHectopascal) + off,
        };
        Dictionary<string, double> there = total
            ? new() { ["span"] = 940, ["as-left"] = 940, ["level-1"] = 1000 }
            : new() { ["span"] = High, ["as-left"] = High, ["level-1"] = Low };
        ScriptedDialogue person = new();
        person.OnStep = step => probe.Hectopascal = step.Role == null ? probe.Hectopascal : there[step.Role];
        using CalibrationLogStore log = bench.Log();
        CalibrationSession session = CalibrationSession.Begin(setup, bench.Data, log, bench.Time, false, person.Say);
        CalibrationRecord record = (await new CalibrationRun(session, person, bench.Time).RunAsync(probe, false, Bench.Version, CancellationToken.None)).Record;
        bench.Time.SetUtcNow(record.Points.Max(point => point.LastUtc).AddMinutes(1));
        return record;
    }
}
