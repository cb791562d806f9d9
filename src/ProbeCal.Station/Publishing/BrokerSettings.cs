using System;
using ProbeCal.Station.Journal;

namespace ProbeCal.Station.Publishing;

/// <summary>Where the broker is and how this station enters. The password itself is fetched at every connection and kept nowhere.</summary>
internal sealed record BrokerSettings
{
    /// <summary>Host name or address.</summary>
    public required string Host { get; init; }

    /// <summary>TCP port.</summary>
    public required int Port { get; init; }

    /// <summary>True for TLS.</summary>
    public bool UseTls { get; init; }

    /// <summary>PEM file with the only authorities that are trusted; null for those of the machine.</summary>
    public string? AuthorityFile { get; init; }

    /// <summary>
    /// True to ask the authority whether the broker's certificate was withdrawn. A withdrawn one is refused; an authority of
    /// <see cref="AuthorityFile"/> that names no place to ask, or does not answer, is let pass. The asking costs time at each
    /// connection, so a station without a way to its authority sets this to false.
    /// </summary>
    public bool CheckRevocation { get; init; } = true;

    /// <summary>User name, or null for none.</summary>
    public string? User { get; init; }

    /// <summary>Where the password comes from, or null for none.</summary>
    public PasswordSource? Password { get; init; }

    /// <summary>Client id, the same at every start.</summary>
    public required string ClientId { get; init; }

    /// <summary>What the broker publishes, retained, when the station goes without saying goodbye.</summary>
    public required Message Will { get; init; }
}
