using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading.Tasks;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Simulation;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Station.Tests.Calibrating;

public class CalibrationRunTests(ITestOutputHelper output)
{
    [Fact]
    public async Task Slope_IsRecoveredWithinItsStatedUncertainty_WithAMeasuredZero()
    {
        int seeds = Environment.GetEnvironmentVariable("PROBECAL_FULL") == "1" ? 200 : 20;
        double worst = 0;
        for (int seed = 1; seed <= seeds; seed++)
        {
            using Bench bench = new();
            SimulatedSource source = bench.Source(Bench.Water with { Seed = seed, TemperatureCelsius = 8 + (seed % 20) });
            CalibrationRecord record = await bench.CalibrateAsync(Bench.Setup with { ZeroPlan = CalibrationIds.ZeroAdjust }, source);

            double off = record.Result.Slope - Bench.Probe.SlopeNanoamperePerHectopascal;
            worst = Math.Max(worst, Math.Abs(off) / record.Result.SlopeStandardUncertainty);
            Assert.True(Math.Abs(off) < 2 * record.Result.SlopeStandardUncertainty, $"seed {seed}: slope {record.Result.Slope} u {record.Result.SlopeStandardUncertainty}");
            Assert.InRange(record.Result.SlopeStandardUncertainty / record.Result.Slope, 0.002, 0.02);
            Assert.InRange(Math.Abs(record.Result.Zero - Bench.Probe.ZeroNanoampere), 0, 2 * record.Result.ZeroStandardUncertainty);
            Assert.True(record.Result.Pass, string.Join("; ", record.Result.Reasons));
        }

        output.WriteLine($"{seeds} seeds; largest |slope - truth| / u = {worst:F2}");
    }

    [Fact]
    public async Task AirPoint_DividesByTheAirToWaterRatio()
    {
        using Bench bench = new();
        SimulatedSource source = bench.Source(Bench.Water with { Probe = Bench.Probe with { AirToWaterRatio = 1.04 } });
        CalibrationSetup setup = Bench.Setup with
        {
            Method = CalibrationIds.WaterSaturatedAir,
            ZeroPlan = CalibrationIds.ZeroAdjust,
            ReferenceStateRelative = UncertaintyDefaults.WaterSaturatedAirRelative,
            AirToWaterRatio = new RecordedQuantity { Value = 1.04, Unit = "1", StandardUncertainty = 0.002, Source = "entered" },
        };

        CalibrationRecord record = await bench.CalibrateAsync(setup, source, new ScriptedDialogue(source) { SpanPhase = SimulationPhase.Air });

        Assert.Equal(Bench.Probe.SlopeNanoamperePerHectopascal, record.Result.Slope, 0.45 * 0.01);
        Assert.Equal("none-seen", record.DropletCheck);
        Assert.Contains(record.Budget, line => line.Input == "air-to-water ratio" && Math.Abs(line.SlopePercent - (0.2 / 1.04)) < 1e-9);
    }

    [Fact]
    public async Task Order_IsSpanThenZeroThenAsLeft_WhenTheZeroAdjusts()
    {
        using Bench bench = new();
        SimulatedSource source = bench.Source();
        CalibrationRecord record = await bench.CalibrateAsync(Bench.Setup with { ZeroPlan = CalibrationIds.ZeroAdjust }, source);

        Assert.Equal(["span", "zero", "as-left"], record.Points.Select(point => point.Role));
        Assert.True(record.Zero.IsMeasured);
        Assert.Equal("measured", record.Zero.Source);
    }

    [Fact]
    public async Task ZeroCheck_ComesLast_IsJudged_AndChangesNothing()
    {
        using Bench bench = new();
        SimulatedSource source = bench.Source();
        CalibrationRecord record = await bench.CalibrateAsync(Bench.Setup with { ZeroPlan = CalibrationIds.ZeroCheck }, source);

        Assert.Equal(["span", "as-left", "zero"], record.Points.Select(point => point.Role));
        Assert.Equal("assumed", record.Zero.Source);
        Assert.Equal(0, record.Result.Zero);
        RecordedLimit zero = Assert.Single(record.Limits, limit => limit.Check == "zero");
        // 0.35 nA of about 69 nA at 8.4 mg/L.
        Assert.InRange(zero.Found!.Value, 0.03, 0.06);
        Assert.Equal("pass", zero.Verdict);
        Assert.True(zero.Decides);
    }

    [Fact]
    public async Task ZeroAboveItsLimit_FailsTheCheck_WithTheLimitAndItsSource()
    {
        using Bench bench = new();
        SimulatedSource source = bench.Source(Bench.Water with { Probe = Bench.Probe with { ZeroNanoampere = 2.5 } });
        CalibrationRecord record = await bench.CalibrateAsync(Bench.Setup with { ZeroPlan = CalibrationIds.ZeroCheck }, source);

        Assert.False(record.Result.Pass);
        string reason = Assert.Single(record.Result.Reasons);
        Assert.Contains("zero", reason, StringComparison.Ordinal);
        Assert.Contains("0.2 mg/L (USGS 2020", reason, StringComparison.Ordinal);
    }

    [Fact]
    public async Task AsFound_IsTheErrorOfThePreviousCalibration_AndAsLeftIsSmall()
    {
        using Bench bench = new();
        await bench.CalibrateAsync(Bench.Setup with { ZeroPlan = CalibrationIds.ZeroAdjust }, bench.Source());
        bench.Time.Advance(TimeSpan.FromDays(30));
        // The membrane has lost 5 %: the old calibration reads 5 % low.
        SimulatedSource aged = bench.Source(Bench.Water with { Seed = 2, Probe = Bench.Probe with { SlopeNanoamperePerHectopascal = 0.45 * 0.95 } });
        CalibrationRecord record = await bench.CalibrateAsync(Bench.Setup, aged);

        RecordedPoint span = record.Points[0];
        Assert.Equal("c3a41f09b2e7-0001", record.PreviousCalibration);
        Assert.Equal(record.PreviousCalibration, span.ReadBy);
        Assert.Equal(-0.05 * span.ReferenceMilligramsPerLitre, span.ErrorMilligramsPerLitre!.Value, 0.02);
        Assert.InRange(Math.Abs(record.Points[1].ErrorMilligramsPerLitre!.Value), 0, 0.02);
        Assert.Equal("fail", record.Limits.Single(limit => limit.Check == "as-found").Verdict);
        Assert.True(record.Result.Pass);
        // The measured zero of the same membrane goes on.
        Assert.Equal("previous:c3a41f09b2e7-0001", record.Zero.Source);
    }

    [Fact]
    public async Task NewMembrane_GetsNoZeroFromTheOldOne()
    {
        using Bench bench = new();
        await bench.CalibrateAsync(Bench.Setup with { ZeroPlan = CalibrationIds.ZeroAdjust }, bench.Source());
        bench.Time.Advance(TimeSpan.FromDays(1));
        CalibrationSetup renewed = Bench.Setup with { Probe = Bench.Setup.Probe with { Membrane = new RecordedMembrane { Id = "M-2", InstalledOn = new DateOnly(2026, 6, 2) } } };
        CalibrationRecord record = await bench.CalibrateAsync(renewed, bench.Source());

        Assert.Equal("assumed", record.Zero.Source);
    }

    [Fact]
    public async Task FirstCalibration_HasNoAsFoundError()
    {
        using Bench bench = new();
        CalibrationRecord record = await bench.CalibrateAsync(Bench.Setup, bench.Source());

        Assert.Null(record.Points[0].ErrorMilligramsPerLitre);
        Assert.Equal("not-judged", record.Limits.Single(limit => limit.Check == "as-found").Verdict);
        Assert.Null(record.PreviousCalibration);
    }

    [Fact]
    public async Task AsLeft_IsANewWindow_AfterTheOneThatAdjusted()
    {
        using Bench bench = new();
        CalibrationRecord record = await bench.CalibrateAsync(Bench.Setup, bench.Source());

        Assert.True(record.Points[0].LastUtc < record.Points[1].FirstUtc);
        foreach (RecordedPoint point in record.Points)
        {
            Assert.True(180 <= point.Signal.WindowSeconds);
            Assert.True(30 <= point.Signal.Count);
        }
    }

    [Fact]
    public async Task DropletsSeen_TakesThePointAgain()
    {
        using Bench bench = new();
        SimulatedSource source = bench.Source();
        ScriptedDialogue answers = new(source) { SpanPhase = SimulationPhase.Air };
        answers.DropletAnswers.Enqueue(Droplets.Seen);
        CalibrationSetup setup = Bench.Setup with
        {
            Method = CalibrationIds.WaterSaturatedAir,
            AirToWaterRatio = new RecordedQuantity { Value = 1, Unit = "1", StandardUncertainty = 0.015, Source = "default" },
        };
        CalibrationRecord record = await bench.CalibrateAsync(setup, source, answers);

        Assert.Equal(["span", "span", "as-left"], answers.Points.Select(point => point.Role));
        Assert.Equal(["span", "as-left"], record.Points.Select(point => point.Role));
        Assert.Equal(answers.Points[1].FirstUtc, record.Points[0].FirstUtc);
    }

    [Fact]
    public async Task Record_GivesTheSameCalibrationBitForBit_AfterTheLog()
    {
        using Bench bench = new();
        CalibrationRecord record = await bench.CalibrateAsync(Bench.Setup with { ZeroPlan = CalibrationIds.ZeroAdjust }, bench.Source());
        using CalibrationLogStore log = bench.Log();
        ProbeCalibration loaded = log.LatestFor("P-1", DateTimeOffset.MaxValue)!.Record.ToProbeCalibration();

        Assert.Equal(BitConverter.DoubleToInt64Bits(record.Result.Slope), BitConverter.DoubleToInt64Bits(loaded.Slope));
        Assert.Equal(BitConverter.DoubleToInt64Bits(record.Result.Zero), BitConverter.DoubleToInt64Bits(loaded.ZeroResponse));
        Assert.Equal(BitConverter.DoubleToInt64Bits(record.Result.ZeroStandardUncertainty), BitConverter.DoubleToInt64Bits(loaded.ZeroResponseUncertainty));
        Assert.Equal(0.1, loaded.ThermometerOffsetUncertaintyKelvin);
    }

    [Fact]
    public async Task Progress_SaysWhatMovesAndHowLong()
    {
        using Bench bench = new();
        // From the lake into the bath: the membrane follows with its lag, so the window is not steady at first.
        SimulatedSource source = bench.Source(Bench.Water with
        {
            Script = [new SimulationStep(SimulationPhase.Lake, TimeSpan.FromMinutes(2)), new SimulationStep(SimulationPhase.AirSaturatedWater, null)],
            SaturationPercent = 60,
        });
        ScriptedDialogue silent = new();
        CalibrationRecord record = await bench.CalibrateAsync(Bench.Setup, source, silent);

        Assert.Contains(silent.Waits, wait => wait.Moving.Any(text => text.StartsWith("signal drifts", StringComparison.Ordinal) && text.Contains("limit 0.05 mg/L", StringComparison.Ordinal)));
        Assert.Contains(silent.Waits, wait => wait.WindowSeconds < 100 && wait.SecondsLeft > 80);
        Assert.True(TimeSpan.FromMinutes(2) < record.Points[0].FirstUtc - bench.Time.GetUtcNow());
    }

    [Fact]
    public async Task NeverSteady_GivesUp_AndSaysWhatMoved()
    {
        using Bench bench = new();
        SimulatedSource source = bench.Source(Bench.Water with { Probe = Bench.Probe with { NoiseNanoampere = 3 } });
        CalibrationSetup setup = Bench.Setup with { Waiting = new WaitingRules { GiveUpAfterSeconds = 600 } };

        WorkFailedException failed = await Assert.ThrowsAsync<WorkFailedException>(() => bench.CalibrateAsync(setup, source));

        Assert.Contains("span point: not steady within 10 min; still moving: signal scatters", failed.Message, StringComparison.Ordinal);
        using CalibrationLogStore log = bench.Log();
        Assert.Empty(log.Records);
    }

    [Fact]
    public async Task SilentSource_GivesUpByTheClock()
    {
        using Bench bench = new();
        // Real pace on a clock that only the test moves: one line, then silence.
        SimulatedSource source = bench.Source(Bench.Water with { Faster = 1, Interval = TimeSpan.FromHours(2) });
        Task<CalibrationRecord> run = bench.CalibrateAsync(Bench.Setup, source);
        bench.Time.Advance(TimeSpan.FromMinutes(31));

        WorkFailedException failed = await Assert.ThrowsAsync<WorkFailedException>(() => run.WaitAsync(TimeSpan.FromSeconds(30)));
        Assert.Contains("not steady within 30 min", failed.Message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task SourceThatEnds_SaysSo()
    {
        using Bench bench = new();
        List<SourceEvent> events = [new RejectedLine(bench.Time.GetUtcNow(), "x", "field 2 'x' is no number")];
        using CalibrationLogStore log = bench.Log();
        CalibrationSession session = CalibrationSession.Begin(Bench.Setup, bench.Data, log, bench.Time, false, _ => { });
        CalibrationRun run = new(session, new ScriptedDialogue(), bench.Time);

        WorkFailedException failed = await Assert.ThrowsAsync<WorkFailedException>(() => run.RunAsync(new PlayedSource(events), false, Bench.Version, default));
        Assert.Contains("the source ended; no sample came; 1 lines were not understood, the last one because field 2", failed.Message, StringComparison.Ordinal);
    }
}
