using System;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// Takes an earlier entry back. The entry stays where it is and is shown as withdrawn. A withdrawal made in error is itself
/// withdrawn, whereupon the first entry holds again.
/// </summary>
public sealed record AmendmentRecord : LogEntry
{
    /// <summary>Name of the format.</summary>
    public const string FormatName = "probecal-amendment";

    /// <summary>The version this program writes.</summary>
    public const int CurrentVersion = 1;

    /// <summary>The one <see cref="Action"/> there is.</summary>
    public const string Withdrawn = "withdrawn";

    /// <summary>An empty entry of this kind.</summary>
    public AmendmentRecord()
        : base(FormatName, CurrentVersion)
    {
    }

    /// <summary>Id of the entry that is taken back.</summary>
    public required string Of { get; init; }

    /// <summary><see cref="Withdrawn"/>.</summary>
    public string Action { get; init => field = value ?? Withdrawn; } = Withdrawn;

    /// <summary>Why.</summary>
    public required string Reason { get; init; }

    internal override string Kind => "amendment";

    internal override string Subject => Of;

    internal override DateTimeOffset AtUtc => WrittenUtc ?? DateTimeOffset.UnixEpoch;
}
