using System;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// One calibration, whole: when, where, which probe, how, against what, with which result and how sure. The log keeps the
/// UTF-8 bytes of its JSON; nothing in it is computed again on reading.
/// </summary>
public sealed record CalibrationRecord : LogEntry
{
    /// <summary>Name of the format.</summary>
    public const string FormatName = "probecal-calibration-record";

    /// <summary><see cref="Purpose"/> of a calibration.</summary>
    public const string CalibrationPurpose = "calibration";

    /// <summary><see cref="Purpose"/> of a check.</summary>
    public const string CheckPurpose = "check";

    /// <summary>The version this program writes. Version 2 added checks, several points, references, and the decision with its uncertainty.</summary>
    public const int CurrentVersion = 2;

    /// <summary>An empty record; the version is the one this program writes.</summary>
    public CalibrationRecord()
        : base(FormatName, CurrentVersion)
    {
    }

    /// <summary>True when the signal came from a simulation: no real probe was calibrated.</summary>
    public required bool Simulated { get; init; }

    /// <summary>When the calibration was begun, UTC, by the clock of the program.</summary>
    public required DateTimeOffset StartedUtc { get; init; }

    /// <summary>
    /// When its last point was taken, UTC; the calibration is valid from here on. It is the time of the line, which for a replay
    /// lies before <see cref="StartedUtc"/>, and never after the clock of the program.
    /// </summary>
    public required DateTimeOffset CompletedUtc { get; init; }

    /// <summary>Site, or the room where it was done; none when not stated.</summary>
    public string? Site { get; init; }

    /// <summary>Altitude of the place; none when not stated.</summary>
    public RecordedQuantity? Altitude { get; init; }

    /// <summary><c>calibration</c>, or <c>check</c>: the same points and guards, and no change of coefficients.</summary>
    public string Purpose { get; init => field = value ?? CalibrationPurpose; } = CalibrationPurpose;

    /// <summary>For a check: <c>initial</c>, <c>continuing</c> or <c>end-of-day</c>; none when not stated.</summary>
    public string? CheckKind { get; init; }

    /// <summary>Id of the record that this one replaces; none for a new one. The old one stays.</summary>
    public string? Replaces { get; init; }

    /// <summary>Why it replaces it.</summary>
    public string? ReplacesReason { get; init; }

    /// <summary>Where an imported record comes from: file and row; none for one made here.</summary>
    public string? ImportedFrom { get; init; }

    /// <summary>Reference equipment used, by the ids of the register: barometer, thermometer, cylinder, titrant, zero solution.</summary>
    public string[] Equipment { get; init => field = value ?? []; } = [];

    /// <summary>The steps of the procedure as they were done; empty in records of version 1.</summary>
    public RecordedStep[] Steps { get; init => field = value ?? []; } = [];

    /// <summary>The fit over several points; none where one point and a zero give the slope.</summary>
    public RecordedFit? Fit { get; init; }

    /// <summary>The gas as a formula: <c>O2</c>; <c>total</c> for a total gas pressure.</summary>
    public required string Gas { get; init; }

    /// <summary>The probe, its membrane and its thermometer.</summary>
    public required RecordedProbe Probe { get; init; }

    /// <summary>The method of the main point: <c>air-saturated-water</c>, <c>water-saturated-air</c>, <c>titration</c>, <c>gas-mixture</c>, <c>transfer-standard</c>, <c>zero-solution</c>, <c>zero-gas</c>.</summary>
    public required string Method { get; init; }

    /// <summary><c>live</c> from a source, or <c>typed</c> from a meter.</summary>
    public required string Readings { get; init; }

    /// <summary>The source of the readings, for people.</summary>
    public required string Source { get; init; }

    /// <summary>Signal in water-saturated air over signal in air-saturated water, at one partial pressure; none for a point in water.</summary>
    public RecordedQuantity? AirToWaterRatio { get; init; }

    /// <summary>How near the reference was to its ideal state: 1 with the uncertainty of the bath's saturation or the chamber's humidity.</summary>
    public required RecordedQuantity ReferenceState { get; init; }

    /// <summary>The solubility equation: <c>benson-krause-1984</c> or <c>garcia-gordon-1992</c>.</summary>
    public required string Equation { get; init; }

    /// <summary>What else was computed by which published formula, with citations.</summary>
    public required string[] Formulas { get; init; }

    /// <summary>The points in the order in which they were taken.</summary>
    public required RecordedPoint[] Points { get; init; }

    /// <summary>Role of the point that gave the slope: <c>span</c>, <c>as-left</c> for a meter that was adjusted itself, <c>fit</c> for <see cref="Fit"/>, or <c>previous</c> for a check, which changes nothing.</summary>
    public required string SlopeFrom { get; init; }

    /// <summary>The zero that the slope rests on.</summary>
    public required RecordedZero Zero { get; init; }

    /// <summary>The calibration in force before, by its id; none when there was none.</summary>
    public string? PreviousCalibration { get; init; }

    /// <summary>Droplets on the membrane: <c>none-seen</c>, <c>not-checked</c>, or <c>not-needed</c> for a point in water.</summary>
    public required string DropletCheck { get; init; }

    /// <summary>Slope, zero and verdict.</summary>
    public required RecordedResult Result { get; init; }

    /// <summary>Every limit that was applied, with its source.</summary>
    public required RecordedLimit[] Limits { get; init; }

    /// <summary>What the guards saw, and the reasons given for going on.</summary>
    public required RecordedFinding[] Findings { get; init; }

    /// <summary>Uncertainty budget of the slope.</summary>
    public required RecordedContribution[] Budget { get; init; }

    /// <summary>Remarks by the person; none when there are none.</summary>
    public string? Remarks { get; init; }

    internal override string Kind => Purpose == CheckPurpose ? CheckPurpose : CalibrationPurpose;

    internal override string Subject => Probe.Id;

    internal override DateTimeOffset AtUtc => CompletedUtc;
}

/// <summary>One step of the procedure as it was done.</summary>
/// <param name="Step">Id of the step.</param>
/// <param name="DoneUtc">When it was done, UTC.</param>
/// <param name="Note">What was written down at it; none when nothing was asked.</param>
public sealed record RecordedStep(string Step, DateTimeOffset DoneUtc, string? Note);
