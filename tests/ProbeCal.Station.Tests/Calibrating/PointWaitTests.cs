using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading.Tasks;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Simulation;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>What a wait refuses, and what it takes in its stride.</summary>
public class PointWaitTests
{
    [Fact]
    public async Task DeadInput_IsRefused_ThoughPerfectlyStable()
    {
        WorkFailedException failed = await FailsAsync(Samples(400, i => 75.123));
        Assert.StartsWith("dead-input: the signal stays at 75.123 nA", failed.Message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task NoiseBelowOneStepOfTheConverter_IsADeadInput()
    {
        WorkFailedException failed = await FailsAsync(Samples(400, i => 75 + (i % 2 * 0.0003)));
        Assert.StartsWith("dead-input", failed.Message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task SaturatedInput_IsRefused()
    {
        WorkFailedException failed = await FailsAsync(Samples(400, i => Math.Min(500, 499.95 + (i % 7 * 0.02))));
        Assert.StartsWith("saturated-input: the signal touches the end of its range", failed.Message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task LivingInput_IsAccepted()
    {
        CalibrationRecord record = await RunAsync(Samples(400, Alive));
        Assert.True(record.Result.Pass);
    }

    [Fact]
    public async Task SlowSampling_WaitsForThirtySamples()
    {
        CalibrationRecord record = await RunAsync(Samples(80, Alive, seconds: 20));
        Assert.Equal(30, record.Points[0].Signal.Count);
        Assert.Equal(580, record.Points[0].Signal.WindowSeconds);
    }

    [Fact]
    public async Task LineWithoutTemperature_SaysWhatToDo()
    {
        WorkFailedException failed = await FailsAsync(Samples(400, Alive).Select(happened => (SourceEvent)((RawSample)happened with { TemperatureCelsius = null })));
        Assert.Contains("the lines carry no temperature: name it in --line, or enter --temperature", failed.Message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task TypedTemperatureAndPressure_StandInForTheLine()
    {
        CalibrationSetup setup = Bench.Setup with
        {
            TypedTemperatureCelsius = 20,
            Reasons = new() { [GuardNames.Steady] = "bath with a thermostat" },
            Pressure = Bench.Setup.Pressure with { Hectopascal = 940 },
        };
        CalibrationRecord record = await RunAsync(Samples(400, Alive).Select(happened => (SourceEvent)((RawSample)happened with { TemperatureCelsius = null, PressureHectopascal = null })), setup);
        Assert.Equal("typed", record.Points[0].Temperature.Source);
        Assert.Null(record.Points[0].TemperatureStatistics);
        Assert.Equal(940, record.Points[0].Pressure.Value);
    }

    [Fact]
    public async Task ImpossiblePressureInTheLine_IsRefusedOnTheFirstSample()
    {
        InputException refused = await Assert.ThrowsAsync<InputException>(() => RunAsync(Samples(1, Alive).Select(happened => (SourceEvent)((RawSample)happened with { PressureHectopascal = 1013 }))));
        Assert.StartsWith("pressure-at-altitude: pressure 1013.0 hPa at 640 m", refused.Message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task PortPulledOutAndBack_BeginsTheWindowAnew()
    {
        List<SourceEvent> events = [.. Samples(500, Alive)];
        events.Insert(100, new SourceStateChanged(events[100].ReceivedUtc, SourceState.Lost, "the port is gone"));
        CalibrationRecord record = await RunAsync(events);
        Assert.Equal(Start.AddSeconds(100), record.Points[0].FirstUtc);
    }

    [Fact]
    public async Task ClockOfTheLineRunningBackwards_BeginsTheWindowAnew_AndIsTold()
    {
        List<SourceEvent> events = [.. Samples(100, Alive), .. Samples(500, Alive)];
        ScriptedDialogue answers = new();
        CalibrationRecord record = await RunAsync(events, answers: answers);
        Assert.Contains("the clock of the line went backwards; the window begins anew", answers.Said);
        Assert.Equal(Start, record.Points[0].FirstUtc);
    }

    [Fact]
    public async Task ZeroThatIsNeverEntered_SaysWhereTheSignalIs()
    {
        WorkFailedException failed = await FailsAsync(Samples(4000, Alive), Bench.Setup with { ZeroPlan = CalibrationIds.ZeroCheck });
        Assert.Contains("zero point: not steady within 30 min; not in the zero solution yet: its signal is still 100 % of the 100 % point", failed.Message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task QuestionOnALiveSource_DropsWhatComesMeanwhile()
    {
        using Bench bench = new();
        using CalibrationLogStore log = bench.Log();
        TaskCompletionSource<bool> looked = new();
        WaitingDialogue answers = new(looked.Task);
        int read = 0;
        // Without an end: how many samples pass before the answer is noticed is up to the machine.
        IEnumerable<SourceEvent> events = Samples(int.MaxValue, Alive).Select(happened =>
        {
            if (++read == 600)
            {
                looked.SetResult(true);
            }

            return happened;
        });
        CalibrationSession session = CalibrationSession.Begin(Bench.Setup, bench.Data, log, bench.Time, false, _ => { });
        CalibrationRecord record = (await new CalibrationRun(session, answers, bench.Time).RunAsync(new PlayedSource(events), readOnWhileAsking: true, Bench.Version, default)).Record;

        // The person answered the question before the as-left window while sample 600 came in.
        Assert.True(Start.AddSeconds(598) <= record.Points[1].FirstUtc, record.Points[1].FirstUtc.ToString("O"));
    }

    private static readonly DateTimeOffset Start = new(2026, 6, 1, 8, 0, 0, TimeSpan.Zero);

    private static double Alive(int i)
    {
        return 74.6 + (0.03 * Math.Sin(i * 2.4));
    }

    private static IEnumerable<SourceEvent> Samples(int count, Func<int, double> signal, double seconds = 1)
    {
        for (int i = 0; i < count; i++)
        {
            DateTimeOffset time = Start.AddSeconds(i * seconds);
            yield return new RawSample(time, "", signal(i)) { TimeUtc = time, TemperatureCelsius = 20 + (0.002 * Math.Sin(i * 1.7)), PressureHectopascal = 940 };
        }
    }

    private static async Task<CalibrationRecord> RunAsync(IEnumerable<SourceEvent> events, CalibrationSetup? setup = null, ScriptedDialogue? answers = null)
    {
        using Bench bench = new();
        using CalibrationLogStore log = bench.Log();
        CalibrationSession session = CalibrationSession.Begin(setup ?? Bench.Setup, bench.Data, log, bench.Time, false, _ => { });
        return (await new CalibrationRun(session, answers ?? new ScriptedDialogue(), bench.Time).RunAsync(new PlayedSource(events), false, Bench.Version, default)).Record;
    }

    private static Task<WorkFailedException> FailsAsync(IEnumerable<SourceEvent> events, CalibrationSetup? setup = null)
    {
        return Assert.ThrowsAsync<WorkFailedException>(() => RunAsync(events, setup));
    }

    /// <summary>A person who takes a while before the as-left window.</summary>
    private sealed class WaitingDialogue(Task looked) : ICalibrationDialogue
    {
        public void Say(string line) { }

        public void Report(WaitProgress progress) { }

        public void Taken(RecordedPoint point) { }

        public async Task<string?> DoAsync(ProcedureStep step, System.Threading.CancellationToken cancellationToken)
        {
            await (step.Role == CalibrationIds.AsLeftPoint ? looked : Task.CompletedTask);
            return null;
        }

        public Task<string> DropletsAsync(ProcedureStep step, System.Threading.CancellationToken cancellationToken)
        {
            return Task.FromResult(Droplets.NoneSeen);
        }

        public Task<string?> ReasonAsync(Finding finding, System.Threading.CancellationToken cancellationToken)
        {
            return Task.FromResult<string?>(null);
        }

        public Task<double?> ReadingAsync(ProcedureStep step, string unit, System.Threading.CancellationToken cancellationToken)
        {
            return Task.FromResult<double?>(null);
        }

        public Task<PlannedPoint?> ReferenceAsync(ProcedureStep step, PlannedPoint planned, System.Threading.CancellationToken cancellationToken)
        {
            return Task.FromResult<PlannedPoint?>(null);
        }
    }
}
