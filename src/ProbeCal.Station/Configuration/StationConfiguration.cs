using System;
using System.Net;
using ProbeCal.Station.Sources;

namespace ProbeCal.Station.Configuration;

/// <summary>
/// Everything a station is told, read from one JSON file and judged. What is written there and what it means is in
/// <c>docs/protocols.md</c>, section "Station configuration".
/// </summary>
public sealed record StationConfiguration
{
    /// <summary>Station id: first part of a reading's identity and of its topic.</summary>
    public required string Station { get; init; }

    /// <summary>Name of the site, for people.</summary>
    public required string SiteName { get; init; }

    /// <summary>Altitude of the site, m; null when not stated.</summary>
    public double? AltitudeMetres { get; init; }

    /// <summary>Probe id: second part of the identity, and the key of its calibrations.</summary>
    public required string Probe { get; init; }

    /// <summary>Where the lines come from.</summary>
    public required SourceAddress Source { get; init; }

    /// <summary>How a line reads.</summary>
    public required LineTemplate Line { get; init; }

    /// <summary>True when the file says that what comes is simulated.</summary>
    public bool Simulated { get; init; }

    /// <summary>Standard uncertainty of one signal, in its unit; null takes it from the calibration.</summary>
    public double? SignalUncertainty { get; init; }

    /// <summary>The thermometer at the probe.</summary>
    public required ThermometerConfiguration Thermometer { get; init; }

    /// <summary>Absolute station pressure, hPa.</summary>
    public required InputConfiguration Pressure { get; init; }

    /// <summary>Practical salinity.</summary>
    public required InputConfiguration Salinity { get; init; }

    /// <summary>How the water moves past the probe.</summary>
    public required Stirring Stirring { get; init; }

    /// <summary>Drift since the calibration, as entered; null takes it from the probe's history, where there is one.</summary>
    public RateConfiguration? Drift { get; init; }

    /// <summary>Fouling since the last cleaning, as entered; null takes it from the probe's history, where there is one.</summary>
    public RateConfiguration? Fouling { get; init; }

    /// <summary>Which calibration.</summary>
    public required CalibrationChoice Calibration { get; init; }

    /// <summary>Solubility equation.</summary>
    public required SolubilityEquation Equation { get; init; }

    /// <summary>The broker, or null for the embedded one.</summary>
    public BrokerConfiguration? Broker { get; init; }

    /// <summary>Port of the embedded broker on loopback.</summary>
    public int EmbeddedBrokerPort { get; init; }

    /// <summary>How long samples are kept in the journal after their receipt.</summary>
    public TimeSpan KeepFor { get; init; }

    /// <summary>How many rejected lines are kept.</summary>
    public int RejectedLinesKept { get; init; }

    /// <summary>A longer time between two samples is told as a gap; null tells none.</summary>
    public TimeSpan? GapAfter { get; init; }
}

/// <summary>The thermometer at the probe.</summary>
/// <param name="Id">Its id; null for the one of the calibration.</param>
/// <param name="StandardUncertaintyKelvin">One temperature without the thermometer's own offset, K.</param>
/// <param name="OffsetStandardUncertaintyKelvin">Its offset, K; of use only when it is not the calibration's.</param>
public sealed record ThermometerConfiguration(string? Id, double StandardUncertaintyKelvin, double OffsetStandardUncertaintyKelvin);

/// <summary>How fast a reading becomes less sure.</summary>
/// <param name="RelativePerDay">Relative standard uncertainty per day.</param>
/// <param name="Source">Where the figure comes from, in the words of the configuration.</param>
public sealed record RateConfiguration(double RelativePerDay, string Source);

/// <summary>Where pressure or salinity comes from.</summary>
/// <param name="FromLine">True when every line carries it.</param>
/// <param name="Value">The fixed value, in the canonical unit; null when it comes with the line or there is none.</param>
/// <param name="Source">Where it comes from, as readings tell it: <c>line</c>, <c>barometer:B-12</c>, <c>none</c>.</param>
/// <param name="StandardUncertainty">In the canonical unit.</param>
public sealed record InputConfiguration(bool FromLine, double? Value, string Source, double StandardUncertainty);

/// <summary>Which calibration corrects the readings.</summary>
/// <param name="UseNone">True for a station that only keeps raw samples.</param>
/// <param name="Id">The record's id; null for the latest of the probe that passed.</param>
public sealed record CalibrationChoice(bool UseNone, string? Id);

/// <summary>A broker and how to enter. The password is not in it, only where it lies.</summary>
public sealed record BrokerConfiguration
{
    /// <summary>Host name or address.</summary>
    public required string Host { get; init; }

    /// <summary>TCP port.</summary>
    public required int Port { get; init; }

    /// <summary>True for TLS.</summary>
    public required bool UseTls { get; init; }

    /// <summary>True when a user's password leaves this machine without encryption.</summary>
    internal bool ExposesPassword => User != null && !UseTls && !IsLoopback(Host);

    /// <summary>User name, or null.</summary>
    public string? User { get; init; }

    /// <summary>Variable of the environment that holds the password, or null.</summary>
    public string? PasswordVariable { get; init; }

    /// <summary>File whose first line is the password, or null.</summary>
    public string? PasswordFile { get; init; }

    /// <summary>PEM file with the only trusted authorities, or null for the machine's.</summary>
    public string? AuthorityFile { get; init; }

    /// <summary>True to ask whether the broker's certificate was withdrawn.</summary>
    public bool CheckRevocation { get; init; }

    private static bool IsLoopback(string host)
    {
        return host == "localhost" || (IPAddress.TryParse(host, out IPAddress? address) && IPAddress.IsLoopback(address));
    }
}
