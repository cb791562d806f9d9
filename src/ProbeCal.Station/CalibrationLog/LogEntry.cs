using System;
using System.Text.Json.Serialization;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// What every entry of the calibration log has, whatever its kind. All kinds stand in one chain: a calibration, a piece of
/// equipment, a service event and a withdrawal each name the hash of the entry before.
/// </summary>
public abstract record LogEntry
{
    /// <summary>Begins an entry of a kind.</summary>
    /// <param name="format">Name of the format of the kind.</param>
    /// <param name="version">Version that this program writes.</param>
    private protected LogEntry(string format, int version)
    {
        Format = format;
        Version = version;
    }

    // What the JSON leaves out must have its default: the generated reader hands null to an init-only property that it does not
    // find, so those with a default put it back themselves, here and in the records.

    /// <summary>Name of the format, by which the kind is told.</summary>
    [JsonPropertyOrder(-9)]
    public string Format { get; init; }

    /// <summary>Version of the format.</summary>
    [JsonPropertyOrder(-8)]
    public int Version { get; init; }

    /// <summary>Id of the entry: log id and index. Empty until the log has taken it.</summary>
    [JsonPropertyOrder(-7)]
    public string Id { get; init => field = value ?? ""; } = "";

    /// <summary>Id of the log that took it. Empty until then.</summary>
    [JsonPropertyOrder(-6)]
    public string LogId { get; init => field = value ?? ""; } = "";

    /// <summary>Place in the log, from 1. 0 until the log has taken it.</summary>
    [JsonPropertyOrder(-5)]
    public long Index { get; init; }

    /// <summary>SHA-256 over the stored bytes of the entry before, in lower-case hex; 64 zeros for the first.</summary>
    [JsonPropertyOrder(-4)]
    public string PreviousSha256 { get; init => field = value ?? ""; } = "";

    /// <summary>When the log took it, UTC, by the clock of the computer; none in calibrations of version 1.</summary>
    [JsonPropertyOrder(-3)]
    public DateTimeOffset? WrittenUtc { get; init; }

    /// <summary>Who did it; none when not stated.</summary>
    public string? By { get; init; }

    /// <summary>Program and version that wrote it.</summary>
    public required string Software { get; init; }

    /// <summary>The kind in one word, as the column <c>kind</c> of the log and lists have it.</summary>
    internal abstract string Kind { get; }

    /// <summary>What it is about, as it is filed: a probe, a piece of equipment, or the entry that it amends.</summary>
    internal abstract string Subject { get; }

    /// <summary>The time it is filed under: when what it records was complete, happened, or was written.</summary>
    internal abstract DateTimeOffset AtUtc { get; }
}

/// <summary>An entry as the log keeps it.</summary>
/// <param name="Entry">The entry, read from the stored bytes.</param>
/// <param name="Sha256">SHA-256 over the stored bytes, lower-case hex.</param>
public sealed record StoredEntry(LogEntry Entry, string Sha256);
