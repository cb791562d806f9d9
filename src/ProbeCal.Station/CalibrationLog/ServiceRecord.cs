using System;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>Something done to a probe that bears on its readings: a new membrane, fresh electrolyte, cleaning, dry storage.</summary>
public sealed record ServiceRecord : LogEntry
{
    /// <summary>Name of the format.</summary>
    public const string FormatName = "probecal-service";

    /// <summary>The version this program writes.</summary>
    public const int CurrentVersion = 1;

    /// <summary>The membrane or cap was changed.</summary>
    public const string MembraneChanged = "membrane-changed";

    /// <summary>The electrolyte was changed.</summary>
    public const string ElectrolyteChanged = "electrolyte-changed";

    /// <summary>Growth and deposits were taken off.</summary>
    public const string Cleaned = "cleaned";

    /// <summary>It was put away dry.</summary>
    public const string StoredDry = "stored-dry";

    /// <summary>It was put into water again after dry storage.</summary>
    public const string Rewetted = "rewetted";

    /// <summary>Its polarisation voltage was switched on.</summary>
    public const string PolarisationStarted = "polarisation-started";

    /// <summary>The events there are, for <see cref="Event"/>.</summary>
    public static readonly string[] Events = [MembraneChanged, ElectrolyteChanged, Cleaned, StoredDry, Rewetted, PolarisationStarted];

    /// <summary>An empty entry of this kind.</summary>
    public ServiceRecord()
        : base(FormatName, CurrentVersion)
    {
    }

    /// <summary>Id of the probe.</summary>
    public required string Probe { get; init; }

    /// <summary>One of <see cref="Events"/>.</summary>
    public required string Event { get; init; }

    /// <summary>When it was done, UTC.</summary>
    public required DateTimeOffset At { get; init; }

    /// <summary>Id of the membrane that came on; none when not stated or of another event.</summary>
    public string? Membrane { get; init; }

    /// <summary>Remarks; none when there are none.</summary>
    public string? Remarks { get; init; }

    internal override string Kind => "service";

    internal override string Subject => Probe;

    internal override DateTimeOffset AtUtc => At;
}
