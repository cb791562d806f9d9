using System;
using System.Text.Json.Serialization;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// A calibration made before the log, or by other means, as somebody's table has it. It keeps what the table says and nothing else:
/// it is not judged again, holds no uncertainty, and is never in force. The row stands in it as it was.
/// </summary>
public sealed record PastCalibrationRecord : LogEntry
{
    /// <summary>Name of the format.</summary>
    public const string FormatName = "probecal-past-calibration";

    /// <summary>The version this program writes.</summary>
    public const int CurrentVersion = 1;

    /// <summary>An empty entry of this kind.</summary>
    public PastCalibrationRecord()
        : base(FormatName, CurrentVersion)
    {
    }

    /// <summary>Id of the probe.</summary>
    public required string Probe { get; init; }

    /// <summary>When it was made, UTC; the beginning of the day when the table has the day alone.</summary>
    public required DateTimeOffset At { get; init; }

    /// <summary>True when the table has the day alone.</summary>
    public required bool DayOnly { get; init; }

    /// <summary>Name of the file that it comes from.</summary>
    public required string File { get; init; }

    /// <summary>SHA-256 of that file, lower-case hex.</summary>
    public required string FileSha256 { get; init; }

    /// <summary>Line of the file, from 1.</summary>
    public required long Line { get; init; }

    /// <summary>The row as it stands there.</summary>
    public required string Row { get; init; }

    /// <summary>The method in the words of the table; none when not stated.</summary>
    public string? Method { get; init; }

    /// <summary>The membrane; none when not stated.</summary>
    public string? Membrane { get; init; }

    /// <summary>Water or chamber temperature, °C; none when not stated.</summary>
    public double? TemperatureCelsius { get; init; }

    /// <summary>Pressure as the table has it, hPa; none when not stated.</summary>
    public double? PressureHectopascal { get; init; }

    /// <summary>Practical salinity; none when not stated.</summary>
    public double? Salinity { get; init; }

    /// <summary>Raw signal, in <see cref="SignalUnit"/>; none when not stated.</summary>
    public double? Signal { get; init; }

    /// <summary>Unit of <see cref="Signal"/> and <see cref="Zero"/>; none when not stated.</summary>
    public string? SignalUnit { get; init; }

    /// <summary>Slope in the table's own unit; none when not stated.</summary>
    public double? Slope { get; init; }

    /// <summary>Zero signal; none when not stated.</summary>
    public double? Zero { get; init; }

    /// <summary>Reference, mg/L; none when not stated.</summary>
    public double? ReferenceMilligramsPerLitre { get; init; }

    /// <summary>Reading before the adjustment, mg/L; none when not stated.</summary>
    public double? BeforeMilligramsPerLitre { get; init; }

    /// <summary>Reading after the adjustment, mg/L; none when not stated.</summary>
    public double? AfterMilligramsPerLitre { get; init; }

    /// <summary>The verdict in the words of the table, not judged again; none when not stated.</summary>
    public string? StatedVerdict { get; init; }

    /// <summary>Remarks of the table; none when there are none.</summary>
    public string? Remarks { get; init; }

    /// <summary>Reading less reference before the adjustment, mg/L; null where the table does not say both.</summary>
    [JsonIgnore]
    public double? AsFoundErrorMilligramsPerLitre => BeforeMilligramsPerLitre - ReferenceMilligramsPerLitre;

    internal override string Kind => "past-calibration";

    internal override string Subject => Probe;

    internal override DateTimeOffset AtUtc => At;
}
