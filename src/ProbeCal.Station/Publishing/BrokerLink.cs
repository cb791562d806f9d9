using System;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Journal;

namespace ProbeCal.Station.Publishing;

/// <summary>How a step with the broker ended.</summary>
internal enum LinkOutcome
{
    /// <summary>The broker said yes.</summary>
    Done,

    /// <summary>The broker answered and said no. The connection may still stand.</summary>
    Refused,

    /// <summary>There was no answer, or the connection is gone.</summary>
    Broken,
}

/// <summary>How a step with the broker ended, and why: a phrase for people that holds no secret.</summary>
internal readonly record struct LinkResult(LinkOutcome Outcome, string Reason)
{
    /// <summary>The broker said yes.</summary>
    public static LinkResult Done => new(LinkOutcome.Done, "");
}

/// <summary>
/// One connection to a broker at a time. Faults of the broker or the network are results, never exceptions; only a
/// cancelled token throws. Calls must not overlap, except that <see cref="Lost"/> may be awaited at any time.
/// </summary>
internal interface IBrokerLink : IAsyncDisposable
{
    /// <summary>Which broker, for people: <c>broker.example:8883 (TLS)</c>.</summary>
    string Description { get; }

    /// <summary>Completes when the connection of the last successful <see cref="ConnectAsync"/> is gone.</summary>
    Task Lost { get; }

    /// <summary>Drops what connection there was and makes a new one.</summary>
    Task<LinkResult> ConnectAsync(CancellationToken cancellationToken);

    /// <summary>Sends one message at QoS 1; done means that the broker has acknowledged it as taken.</summary>
    Task<LinkResult> PublishAsync(Message message, bool retain, CancellationToken cancellationToken);

    /// <summary>Asks the broker for a sign of life.</summary>
    Task<LinkResult> PingAsync(CancellationToken cancellationToken);

    /// <summary>Says goodbye, so that the broker does not publish the will.</summary>
    Task DisconnectAsync(CancellationToken cancellationToken);
}
