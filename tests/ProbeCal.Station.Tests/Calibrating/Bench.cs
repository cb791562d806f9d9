using System;
using System.Collections.Generic;
using System.IO;
using System.Threading;
using System.Threading.Tasks;
using Microsoft.Extensions.Time.Testing;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Simulation;
using ProbeCal.Station.Sources;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>A data folder, a clock and a simulated probe of which everything is known: where calibrations are tried.</summary>
internal sealed class Bench : IDisposable
{
    internal const string Version = "probecal test";

    internal Bench()
    {
        Folder = Directory.CreateTempSubdirectory("probecal-bench-").FullName;
        Data = DataDirectory.OpenForWriting(Folder);
    }

    internal string Folder { get; }

    internal DataDirectory Data { get; }

    internal FakeTimeProvider Time { get; } = new(new DateTimeOffset(2026, 6, 1, 9, 0, 0, TimeSpan.Zero));

    /// <summary>The truth that a calibration should find: 0.45 nA/hPa at 25 °C, 0.35 nA zero, 22 kJ/mol, no drift.</summary>
    internal static SimulatedProbe Probe { get; } = new() { SlopeDriftPerDay = 0 };

    internal static SimulationSettings Water { get; } = new()
    {
        Faster = 0,
        TemperatureCelsius = 20,
        PressureHectopascal = 940,
        WeatherHectopascal = 0,
        Script = [new SimulationStep(SimulationPhase.AirSaturatedWater, null)],
        Probe = Probe,
    };

    internal static CalibrationSetup Setup { get; } = new()
    {
        Probe = new RecordedProbe
        {
            Id = "P-1",
            Model = "amperometric",
            SignalUnit = "nA",
            SignalResolution = 0.001,
            SignalLow = 0,
            SignalHigh = 500,
            TemperatureCoefficient = CoefficientText.Parse("--coefficient", "arrhenius 22kJ/mol at 25C fitted 2..38C u 0.5kJ/mol"),
            Thermometer = new RecordedThermometer { Id = "P-1", CommonStandardUncertaintyCelsius = 0.1, Source = "entered" },
        },
        Method = CalibrationIds.AirSaturatedWater,
        Readings = CalibrationIds.Live,
        Source = "simulated",
        Simulated = true,
        Equation = SolubilityEquation.BensonKrause1984,
        Pressure = new EnteredPressure { Source = "barometer:B-12", StandardUncertaintyHectopascal = 0.77 },
        Salinity = new RecordedQuantity { Value = 0, Unit = "1", StandardUncertainty = 0.1, Source = "typed" },
        Altitude = new RecordedQuantity { Value = 640, Unit = "m", StandardUncertainty = 5, Source = "typed" },
        Stirring = Stirring.Stirred,
        ReferenceStateRelative = UncertaintyDefaults.AirSaturatedWaterRelative,
        Site = "Invented Tarn",
    };

    internal CalibrationLogStore Log()
    {
        return CalibrationLogStore.OpenForWriting(Data.CalibrationLogFile, Time, () => new Guid("c3a41f09-b2e7-4d11-8000-000000000000"));
    }

    internal SimulatedSource Source(SimulationSettings? settings = null)
    {
        return new SimulatedSource(settings ?? Water, LineTemplate.Parse("--line", "{time},{signal:nA},{temperature},{pressure}"), Time);
    }

    /// <summary>A whole calibration; simulated time passes with the samples, the clock only when told.</summary>
    internal async Task<CalibrationRecord> CalibrateAsync(CalibrationSetup setup, SimulatedSource source, ScriptedDialogue? dialogue = null, bool startOver = false)
    {
        ScriptedDialogue answers = dialogue ?? new ScriptedDialogue(source);
        using CalibrationLogStore log = Log();
        CalibrationSession session = CalibrationSession.Begin(setup, Data, log, Time, startOver, answers.Say);
        CalibrationRun run = new(session, answers, Time);
        return (await run.RunAsync(source, readOnWhileAsking: false, Version, CancellationToken.None)).Record;
    }

    internal async Task<CalibrationRecord> TypedAsync(CalibrationSetup setup, ScriptedDialogue answers)
    {
        using CalibrationLogStore log = Log();
        CalibrationSession session = CalibrationSession.Begin(setup, Data, log, Time, startOver: false, answers.Say);
        return (await new CalibrationRun(session, answers, Time).RunTypedAsync(Version, CancellationToken.None)).Record;
    }

    public void Dispose()
    {
        Data.Dispose();
        Directory.Delete(Folder, recursive: true);
    }
}

/// <summary>A person who always does as told: puts the simulated probe where the step wants it and answers from a list.</summary>
internal sealed class ScriptedDialogue : ICalibrationDialogue
{
    private readonly SimulatedSource? _source;

    internal ScriptedDialogue(SimulatedSource? source = null)
    {
        _source = source;
    }

    internal List<string> Said { get; } = [];

    internal List<WaitProgress> Waits { get; } = [];

    internal List<RecordedPoint> Points { get; } = [];

    internal List<string> Shown { get; } = [];

    internal Queue<string> DropletAnswers { get; } = new();

    internal Dictionary<string, string> Reasons { get; } = [];

    internal Queue<double?> Readings { get; } = new();

    /// <summary>The steps shown, in their order.</summary>
    internal List<ProcedureStep> Steps { get; } = [];

    /// <summary>What is written down where a step asks for it.</summary>
    internal string Note { get; set; } = "written";

    /// <summary>Called when a step is shown, before it is done.</summary>
    internal Action<ProcedureStep>? OnStep { get; set; }

    /// <summary>Gives the titration of samples that wait for it; null where nobody has titrated them.</summary>
    internal Func<PlannedPoint, PlannedPoint?>? Reference { get; set; }

    /// <summary>Called when a point was taken: where a test pulls the plug.</summary>
    internal Action<RecordedPoint>? OnTaken { get; set; }

    internal SimulationPhase SpanPhase { get; set; } = SimulationPhase.AirSaturatedWater;

    public void Say(string line)
    {
        Said.Add(line);
    }

    public void Report(WaitProgress progress)
    {
        Waits.Add(progress);
    }

    public void Taken(RecordedPoint point)
    {
        Points.Add(point);
        OnTaken?.Invoke(point);
    }

    public Task<string?> DoAsync(ProcedureStep step, CancellationToken cancellationToken)
    {
        Steps.Add(step);
        Shown.AddRange(step.Do);
        OnStep?.Invoke(step);
        if (step.Role != null)
        {
            Place(step);
        }

        return Task.FromResult(step.WriteDown == null ? null : Note);
    }

    public Task<string> DropletsAsync(ProcedureStep step, CancellationToken cancellationToken)
    {
        Steps.Add(step);
        OnStep?.Invoke(step);
        return Task.FromResult(DropletAnswers.TryDequeue(out string? answer) ? answer : Droplets.NoneSeen);
    }

    public Task<string?> ReasonAsync(Finding finding, CancellationToken cancellationToken)
    {
        return Task.FromResult(Reasons.GetValueOrDefault(finding.Guard));
    }

    public Task<double?> ReadingAsync(ProcedureStep step, string unit, CancellationToken cancellationToken)
    {
        Steps.Add(step);
        Shown.AddRange(step.Do);
        OnStep?.Invoke(step);
        return Task.FromResult(Readings.TryDequeue(out double? reading) ? reading : null);
    }

    public Task<PlannedPoint?> ReferenceAsync(ProcedureStep step, PlannedPoint planned, CancellationToken cancellationToken)
    {
        return Task.FromResult(Reference?.Invoke(planned));
    }

    private void Place(ProcedureStep step)
    {
        _source?.Enter(step.Role == CalibrationIds.ZeroPoint ? SimulationPhase.Zero : SpanPhase);
    }
}

/// <summary>A source that plays given events, for lines that a simulation would not write.</summary>
internal sealed class PlayedSource(IEnumerable<SourceEvent> events) : ISampleSource
{
    public string Description => "played";

    public async IAsyncEnumerable<SourceEvent> ReadAsync([System.Runtime.CompilerServices.EnumeratorCancellation] CancellationToken cancellationToken)
    {
        foreach (SourceEvent happened in events)
        {
            cancellationToken.ThrowIfCancellationRequested();
            yield return happened;
        }

        await Task.CompletedTask;
    }

    public ValueTask DisposeAsync()
    {
        return ValueTask.CompletedTask;
    }
}
