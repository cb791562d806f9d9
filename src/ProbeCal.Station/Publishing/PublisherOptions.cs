using System;
using ProbeCal.Station.Journal;

namespace ProbeCal.Station.Publishing;

/// <summary>How the publisher behaves in time. The numbers are our choice, no source.</summary>
internal sealed record PublisherOptions
{
    /// <summary>Waits between tries.</summary>
    public Backoff Backoff { get; init; } = Backoff.Default;

    /// <summary>
    /// How long an idle link goes unasked. A half-open connection looks sound until something is sent, and a message that
    /// waits for its acknowledgement is its own watch.
    /// </summary>
    public TimeSpan PingEvery { get; init; } = TimeSpan.FromSeconds(15);

    /// <summary>How long delivery may go on after the stop was asked for.</summary>
    public TimeSpan FarewellTime { get; init; } = TimeSpan.FromSeconds(5);

    /// <summary>Makes the last retained message of an orderly stop.</summary>
    public required Func<Message> Farewell { get; init; }
}
