using System;
using System.Text.Json.Serialization;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// A piece of equipment in the register: a probe, a membrane, or reference equipment with its certificate. The newest entry
/// of an id holds from when it was written; the older ones stay, so that the register can be seen as it stood at a time.
/// </summary>
public sealed record EquipmentRecord : LogEntry
{
    /// <summary>Name of the format.</summary>
    public const string FormatName = "probecal-equipment";

    /// <summary>The version this program writes.</summary>
    public const int CurrentVersion = 1;

    /// <summary>The kinds there are, for <see cref="EquipmentKind"/>.</summary>
    public static readonly string[] Kinds = ["probe", "membrane", "barometer", "thermometer", "cylinder", "titrant", "zero-solution", "transfer-standard", "other"];

    /// <summary>An empty entry of this kind.</summary>
    public EquipmentRecord()
        : base(FormatName, CurrentVersion)
    {
    }

    /// <summary>Id of the equipment, as records name it.</summary>
    public required string Equipment { get; init; }

    /// <summary>One of <see cref="Kinds"/>.</summary>
    public required string EquipmentKind { get; init; }

    /// <summary>What it is, for people; none when not stated.</summary>
    public string? Description { get; init; }

    /// <summary>Number of its certificate; none when not stated.</summary>
    public string? Certificate { get; init; }

    /// <summary>The value that the certificate states, with its uncertainty: mole fraction of a cylinder, concentration of a titrant.</summary>
    public RecordedQuantity? CertificateValue { get; init; }

    /// <summary>What is added to what it shows, with its uncertainty; none when not stated.</summary>
    public RecordedQuantity? Correction { get; init; }

    /// <summary>Day of its calibration; none when not stated.</summary>
    public DateOnly? CalibratedOn { get; init; }

    /// <summary>Day on which it was made, opened or put into service; none when not stated.</summary>
    public DateOnly? MadeOn { get; init; }

    /// <summary>Last day of its certificate; none when not stated.</summary>
    public DateOnly? DueOn { get; init; }

    /// <summary>How many days it lasts from <see cref="MadeOn"/>; none when not stated.</summary>
    public double? LifeDays { get; init; }

    /// <summary>Id of the probe that it belongs to; none when to none.</summary>
    public string? BelongsTo { get; init; }

    /// <summary>Remarks; none when there are none.</summary>
    public string? Remarks { get; init; }

    /// <summary>
    /// The last day on which it may be used: <see cref="DueOn"/>, or the end of <see cref="LifeDays"/>, whichever comes first; null when
    /// neither was stated.
    /// </summary>
    [JsonIgnore]
    public DateOnly? LastDay
    {
        get
        {
            DateOnly? worn = MadeOn is DateOnly made && LifeDays is double days ? made.AddDays((int)Math.Floor(days)) : null;
            return DueOn is DateOnly due && !(worn < due) ? due : worn;
        }
    }

    internal override string Kind => "equipment";

    internal override string Subject => Equipment;

    internal override DateTimeOffset AtUtc => WrittenUtc ?? DateTimeOffset.UnixEpoch;
}
