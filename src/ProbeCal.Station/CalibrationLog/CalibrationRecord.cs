using System;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// One calibration, whole: when, where, which probe, how, against what, with which result and how sure. The log keeps the
/// UTF-8 bytes of its JSON; nothing in it is computed again on reading.
/// </summary>
public sealed record CalibrationRecord
{
    /// <summary>Name of the format.</summary>
    public const string FormatName = "probecal-calibration-record";

    /// <summary>The version this program writes.</summary>
    public const int CurrentVersion = 1;

    /// <summary><see cref="FormatName"/>.</summary>
    public string Format { get; init; } = FormatName;

    /// <summary>Version of the format, <see cref="CurrentVersion"/>.</summary>
    public int Version { get; init; } = CurrentVersion;

    /// <summary>Id of the calibration: log id and index. Empty until the log has taken it.</summary>
    public string Id { get; init; } = "";

    /// <summary>Id of the log that took it. Empty until then.</summary>
    public string LogId { get; init; } = "";

    /// <summary>Place in the log, from 1. 0 until the log has taken it.</summary>
    public long Index { get; init; }

    /// <summary>SHA-256 over the stored bytes of the record before, in lower-case hex; 64 zeros for the first.</summary>
    public string PreviousSha256 { get; init; } = "";

    /// <summary>True when the signal came from a simulation: no real probe was calibrated.</summary>
    public required bool Simulated { get; init; }

    /// <summary>When the calibration was begun, UTC, by the clock of the program.</summary>
    public required DateTimeOffset StartedUtc { get; init; }

    /// <summary>
    /// When its last point was taken, UTC; the calibration is valid from here on. It is the time of the line, which for a replay
    /// lies before <see cref="StartedUtc"/>, and never after the clock of the program.
    /// </summary>
    public required DateTimeOffset CompletedUtc { get; init; }

    /// <summary>Who did it; none when not stated.</summary>
    public string? By { get; init; }

    /// <summary>Site, or the room where it was done; none when not stated.</summary>
    public string? Site { get; init; }

    /// <summary>Altitude of the place; none when not stated.</summary>
    public RecordedQuantity? Altitude { get; init; }

    /// <summary>The gas: <c>O2</c>.</summary>
    public required string Gas { get; init; }

    /// <summary>The probe, its membrane and its thermometer.</summary>
    public required RecordedProbe Probe { get; init; }

    /// <summary><c>air-saturated-water</c> or <c>water-saturated-air</c>.</summary>
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

    /// <summary>Role of the point that gave the slope: <c>span</c>, or <c>as-left</c> for a meter that was adjusted itself.</summary>
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

    /// <summary>Program and version that wrote it.</summary>
    public required string Software { get; init; }

    /// <summary>Remarks by the person; none when there are none.</summary>
    public string? Remarks { get; init; }
}
