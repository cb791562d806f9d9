using System;
using System.Collections.Generic;
using System.Threading;

namespace ProbeCal.Station;

/// <summary>What a source tells the engine: a sample, a line it could not use, or a change of its own state.</summary>
public abstract record SourceEvent(DateTimeOffset ReceivedUtc);

/// <summary>
/// One raw sample as it came, before any correction. What the line did not carry is null: the engine fills it from the
/// configuration and says so, or leaves out what cannot be computed.
/// </summary>
public sealed record RawSample(DateTimeOffset ReceivedUtc, string RawText, double Signal) : SourceEvent(ReceivedUtc)
{
    /// <summary>Time of acquisition, UTC: the line's own, or else the time of receipt.</summary>
    public DateTimeOffset TimeUtc { get; init; } = ReceivedUtc;

    /// <summary>True when <see cref="TimeUtc"/> came with the line.</summary>
    public bool TimeFromLine { get; init; }

    /// <summary>Water temperature at the probe, °C (ITS-90).</summary>
    public double? TemperatureCelsius { get; init; }

    /// <summary>Absolute station pressure, hPa.</summary>
    public double? PressureHectopascal { get; init; }

    /// <summary>Practical salinity.</summary>
    public double? Salinity { get; init; }
}

/// <summary>A line that gave no sample, kept with its reason. The stream goes on.</summary>
public sealed record RejectedLine(DateTimeOffset ReceivedUtc, string RawText, string Reason) : SourceEvent(ReceivedUtc);

/// <summary>What a source is doing now.</summary>
public enum SourceState
{
    /// <summary>Not opened yet.</summary>
    Closed,
    /// <summary>Trying to open.</summary>
    Opening,
    /// <summary>Open and delivering.</summary>
    Open,
    /// <summary>Open, but silent for longer than it should be.</summary>
    Suspect,
    /// <summary>Gone: the port was pulled out or the peer hung up. It is tried again.</summary>
    Lost,
    /// <summary>At its end: a file was read, standard input closed.</summary>
    Ended,
}

/// <summary>A change of a source's state with its reason, for people.</summary>
public sealed record SourceStateChanged(DateTimeOffset ReceivedUtc, SourceState State, string Reason) : SourceEvent(ReceivedUtc);

/// <summary>Anything that delivers samples: serial port, TCP, file, standard input, simulation.</summary>
public interface ISampleSource : IAsyncDisposable
{
    /// <summary>What it is, for people: <c>serial /dev/ttyUSB0 9600</c>.</summary>
    string Description { get; }

    /// <summary>Reads until the source ends or <paramref name="cancellationToken"/> is cancelled. I/O faults are events, not exceptions.</summary>
    IAsyncEnumerable<SourceEvent> ReadAsync(CancellationToken cancellationToken);
}
