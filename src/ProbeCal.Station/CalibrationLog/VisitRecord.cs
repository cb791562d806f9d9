using System;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// A service visit to a deployed probe: what it read before and after cleaning, what a field meter beside it read at the same two moments, and what it read
/// in standards. Readings are mg/L by the calibration then in force.
/// </summary>
public sealed record VisitRecord : LogEntry
{
    /// <summary>Name of the format.</summary>
    public const string FormatName = "probecal-visit";

    /// <summary>The version this program writes.</summary>
    public const int CurrentVersion = 1;

    /// <summary>An empty entry of this kind.</summary>
    public VisitRecord()
        : base(FormatName, CurrentVersion)
    {
    }

    /// <summary>Id of the probe.</summary>
    public required string Probe { get; init; }

    /// <summary>The site; none when not stated.</summary>
    public string? Site { get; init; }

    /// <summary>When it was read before cleaning, UTC: the readings up to here are those of the fouled probe.</summary>
    public required DateTimeOffset BeforeUtc { get; init; }

    /// <summary>When it was back in the water, cleaned, UTC.</summary>
    public required DateTimeOffset AfterUtc { get; init; }

    /// <summary>Readings around the cleaning, one for each level at which it was compared; empty when it was not cleaned.</summary>
    public VisitCleaning[] Cleaning { get; init => field = value ?? []; } = [];

    /// <summary>
    /// Id of the field meter; none when none was there. It tells how the water changed between two readings, and never what the probe should have read.
    /// </summary>
    public string? FieldMeter { get; init; }

    /// <summary>True when the cleaning was compared in a bucket of site water, which does not change meanwhile.</summary>
    public bool InBucket { get; init; }

    /// <summary>What the cleaned probe read in standards, one for each level; empty when it was not checked.</summary>
    public VisitStandard[] Standards { get; init => field = value ?? []; } = [];

    /// <summary>When the standards were read, UTC; none where it was at <see cref="AfterUtc"/>.</summary>
    public DateTimeOffset? StandardsUtc { get; init; }

    /// <summary>When fouling began, where an event was identified; none for the last visit or calibration.</summary>
    public DateTimeOffset? FoulingOnsetUtc { get; init; }

    /// <summary>When the drift began, where an event was identified; none for the last calibration.</summary>
    public DateTimeOffset? DriftOnsetUtc { get; init; }

    /// <summary>True when the error was there from the last calibration on: a bad calibration, a constant shift over the whole interval.</summary>
    public bool BadCalibration { get; init; }

    /// <summary>Remarks, among them what the onset was told from; none when there are none.</summary>
    public string? Remarks { get; init; }

    internal override string Kind => "visit";

    internal override string Subject => Probe;

    internal override DateTimeOffset AtUtc => BeforeUtc;
}

/// <summary>The probe before and after cleaning, and the field meter at the same two moments.</summary>
/// <param name="MonitorBefore">Probe before cleaning, mg/L (Mb).</param>
/// <param name="MonitorAfter">Probe after cleaning, mg/L (Ma).</param>
/// <param name="FieldBefore">Field meter at the first, mg/L (Fs); none in a bucket.</param>
/// <param name="FieldAfter">Field meter at the second, mg/L (Fe); none in a bucket.</param>
public sealed record VisitCleaning(double MonitorBefore, double MonitorAfter, double? FieldBefore, double? FieldAfter);

/// <summary>The cleaned probe in a standard.</summary>
/// <param name="Standard">Value of the standard, mg/L (Vs).</param>
/// <param name="Reading">What the probe read, mg/L (Vc).</param>
/// <param name="From">What the value of the standard rests on: a method, or an id of the register. Never the field meter.</param>
/// <param name="TemperatureCelsius">Temperature in the standard, °C; none when not stated, which one level does without.</param>
/// <param name="Salinity">Practical salinity of the standard; none when not stated.</param>
public sealed record VisitStandard(double Standard, double Reading, string From, double? TemperatureCelsius, double? Salinity);
