using System;
using System.Collections.Generic;
using System.Linq;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Calibrating;

/// <summary>A calibration under way, as it is saved after each step: the state machine's whole state.</summary>
public sealed record SessionState
{
    /// <summary>Name of the format.</summary>
    public const string FormatName = "probecal-calibration-session";

    /// <summary>The version this program writes. Version 2 added the steps done, planned points and readings that wait for their reference.</summary>
    public const int CurrentVersion = 2;

    /// <summary><see cref="FormatName"/>.</summary>
    public string Format { get; init; } = FormatName;

    /// <summary>Version of the format.</summary>
    public int Version { get; init; } = CurrentVersion;

    /// <summary>The set-up it was begun with.</summary>
    public required CalibrationSetup Setup { get; init; }

    /// <summary>When it was begun, UTC.</summary>
    public required DateTimeOffset StartedUtc { get; init; }

    /// <summary>When it was saved, UTC.</summary>
    public required DateTimeOffset SavedUtc { get; init; }

    /// <summary>The points taken so far, in their order.</summary>
    public IReadOnlyList<RecordedPoint> Points { get; init => field = value ?? []; } = [];

    /// <summary>The steps done so far, in their order, points among them.</summary>
    public IReadOnlyList<RecordedStep> Steps { get => field ?? []; init; }

    /// <summary>A reading whose reference is not known yet: samples that wait to be titrated. None otherwise.</summary>
    public TakenReading? Waiting { get; init; }

    /// <summary>What the guards saw so far.</summary>
    public IReadOnlyList<RecordedFinding> Findings { get; init => field = value ?? []; } = [];

    /// <summary>What the look for droplets gave; none before it was made.</summary>
    public string? DropletCheck { get; init; }

    /// <summary>
    /// What comes next: the first step of the procedure that is not done, null when the record can be written. It follows from
    /// set-up, points and steps done alone, so that a state taken up again goes on where it stopped.
    /// </summary>
    [JsonIgnore]
    public ProcedureStep? Next => Procedures.For(Setup).FirstOrDefault(step => !IsDone(step));

    /// <summary>Whether a step is done. A point is done when it is there, whatever the list of steps says.</summary>
    internal bool IsDone(ProcedureStep step)
    {
        return step.Kind switch
        {
            StepKind.Point => Fitting.Point(Points, step.Role!) != null,
            StepKind.Droplets => DropletCheck != null,
            _ => Steps.Any(done => done.Step == step.Id),
        };
    }

    /// <summary>
    /// A state of version 1 knew points and the look for droplets only: what the procedure asks for before the last of them
    /// counts as done.
    /// </summary>
    internal SessionState WithStepsOfVersion1()
    {
        IReadOnlyList<ProcedureStep> plan = Procedures.For(Setup);
        int done = 0;
        for (int i = 0; i < plan.Count; i++)
        {
            bool known = plan[i].Kind is StepKind.Point or StepKind.Droplets;
            if (known && IsDone(plan[i]))
            {
                done = i + 1;
            }
        }

        CalibrationSetup setup = Setup with { Probe = Setup.Probe with { Coefficients = Setup.Probe.Coefficients ?? [] } };
        return this with { Version = CurrentVersion, Setup = setup, Steps = [.. plan.Take(done).Select(step => new RecordedStep(step.Id, SavedUtc, null))] };
    }
}

/// <summary>What the probe gave at a point, before the truth there is known.</summary>
public sealed record TakenReading
{
    /// <summary>Role of the point.</summary>
    public required string Role { get; init; }

    /// <summary>Time of the first sample, UTC.</summary>
    public required DateTimeOffset FirstUtc { get; init; }

    /// <summary>Time of the last sample, UTC.</summary>
    public required DateTimeOffset LastUtc { get; init; }

    /// <summary>True when a person typed it.</summary>
    public required bool Typed { get; init; }

    /// <summary>The raw signal over the window.</summary>
    public required RecordedStatistics Signal { get; init; }

    /// <summary>Standard uncertainty of its mean, with resolution and drift.</summary>
    public required double SignalStandardUncertainty { get; init; }

    /// <summary>The temperature over the window; none when it was typed.</summary>
    public RecordedStatistics? TemperatureStatistics { get; init; }

    /// <summary>Temperature the point goes by, °C.</summary>
    public required double TemperatureCelsius { get; init; }

    /// <summary>Where it comes from.</summary>
    public required string TemperatureSource { get; init; }

    /// <summary>Its standard uncertainty without the thermometer's own offset, K.</summary>
    public required double TemperatureStandardUncertaintyKelvin { get; init; }

    /// <summary>Absolute station pressure, hPa.</summary>
    public required double PressureHectopascal { get; init; }
}

[JsonSerializable(typeof(SessionState))]
[JsonSerializable(typeof(CalibrationSetup))]
[JsonSerializable(typeof(RecordHead))]
internal sealed partial class SessionJsonContext : JsonSerializerContext
{
    internal static SessionJsonContext Readable { get; } = new(new JsonSerializerOptions
    {
        PropertyNamingPolicy = JsonNamingPolicy.CamelCase,
        DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull,
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
        WriteIndented = true,
        NewLine = "\n",
    });
}
