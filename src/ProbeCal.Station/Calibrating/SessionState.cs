using System;
using System.Collections.Generic;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Calibrating;

/// <summary>What a calibration waits for next.</summary>
public enum CalibrationStep
{
    /// <summary>The 100 % point as found.</summary>
    Span,

    /// <summary>The look for droplets on membrane and thermometer, after a point in air.</summary>
    Droplets,

    /// <summary>The zero point.</summary>
    Zero,

    /// <summary>The 100 % point again, in a new window after the adjustment.</summary>
    AsLeft,

    /// <summary>Nothing: the record can be written.</summary>
    Finished,
}

/// <summary>A calibration under way, as it is saved after each step: the state machine's whole state.</summary>
public sealed record SessionState
{
    /// <summary>Name of the format.</summary>
    public const string FormatName = "probecal-calibration-session";

    /// <summary>The version this program writes.</summary>
    public const int CurrentVersion = 1;

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
    public IReadOnlyList<RecordedPoint> Points { get; init; } = [];

    /// <summary>What the guards saw so far.</summary>
    public IReadOnlyList<RecordedFinding> Findings { get; init; } = [];

    /// <summary>What the look for droplets gave; none before it was made.</summary>
    public string? DropletCheck { get; init; }

    /// <summary>
    /// What comes next. The 100 % point always precedes the zero point: residue of a zero solution would bias it (TM 9-A6.2).
    /// A zero that adjusts comes before the as-left point, one that only checks after it.
    /// </summary>
    [JsonIgnore]
    public CalibrationStep Next
    {
        get
        {
            bool adjusts = Setup.ZeroPlan == CalibrationIds.ZeroAdjust;
            bool checks = Setup.ZeroPlan == CalibrationIds.ZeroCheck;
            bool hasZero = Fitting.Point(Points, CalibrationIds.ZeroPoint) != null;
            if (Fitting.Point(Points, CalibrationIds.SpanPoint) == null)
            {
                return CalibrationStep.Span;
            }

            if (Setup.Method == CalibrationIds.WaterSaturatedAir && DropletCheck == null)
            {
                return CalibrationStep.Droplets;
            }

            if (adjusts && !hasZero)
            {
                return CalibrationStep.Zero;
            }

            if (Fitting.Point(Points, CalibrationIds.AsLeftPoint) == null)
            {
                return CalibrationStep.AsLeft;
            }

            return checks && !hasZero ? CalibrationStep.Zero : CalibrationStep.Finished;
        }
    }
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
