using System;

namespace ProbeCal.Station.Journal;

/// <summary>A value that a reading was made with, and where it came from: <c>line</c>, <c>barometer baro-7</c>, <c>none</c>.</summary>
/// <param name="Value">In the unit the field is named for; null when there is none.</param>
/// <param name="Source">Where it came from, for people.</param>
internal readonly record struct SourcedValue(double? Value, string Source);

/// <summary>One sample as the journal keeps it: always the raw line, and the reading or the reason there is none.</summary>
internal sealed record SampleRow
{
    /// <summary>Station id: first part of the identity.</summary>
    public required string Station { get; init; }

    /// <summary>Probe id: second part of the identity.</summary>
    public required string Probe { get; init; }

    /// <summary>From <see cref="JournalTransaction.NextSequence"/> of the same transaction: third part of the identity.</summary>
    public required long Sequence { get; init; }

    /// <summary>The sample as it came.</summary>
    public required RawSample Raw { get; init; }

    /// <summary>Water temperature, °C, as used.</summary>
    public required SourcedValue TemperatureCelsius { get; init; }

    /// <summary>Absolute station pressure, hPa, as used.</summary>
    public required SourcedValue PressureHectopascal { get; init; }

    /// <summary>Practical salinity as used.</summary>
    public required SourcedValue Salinity { get; init; }

    /// <summary>The calibration record it was corrected with, or null.</summary>
    public string? CalibrationId { get; init; }

    /// <summary>The reading as JSON, or null with <see cref="NoReadingReason"/> saying why.</summary>
    public string? Reading { get; init; }

    /// <summary>Why there is no reading, or null.</summary>
    public string? NoReadingReason { get; init; }
}

/// <summary>Something that happened to the stream itself: a source lost, a gap, a journal that could not be written.</summary>
/// <param name="TimeUtc">When.</param>
/// <param name="Kind">A word for machines: <c>source-lost</c>, <c>gap</c>.</param>
/// <param name="Text">A sentence for people.</param>
internal sealed record JournalEvent(DateTimeOffset TimeUtc, string Kind, string Text);

/// <summary>A message to be sent, as the bytes it will have however often it is sent.</summary>
/// <param name="Topic">Where to.</param>
/// <param name="ContentType">Media type of the payload.</param>
/// <param name="Payload">The bytes.</param>
internal sealed record Message(string Topic, string ContentType, ReadOnlyMemory<byte> Payload);

/// <summary>A message that waits in the outbox. Ids rise in the order in which messages were written.</summary>
internal sealed record OutboxRow(long Id, Message Message);
