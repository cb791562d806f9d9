using Microsoft.Extensions.Logging;

namespace ProbeCal.Station.Engine;

/// <summary>What the engine says, each with its event id (2200 to 2299).</summary>
internal static partial class EngineLog
{
    [LoggerMessage(EventId = 2201, Level = LogLevel.Information, Message = "station {Station}, probe {Probe}: {Source}; calibration {Calibration}; journal {Journal}")]
    internal static partial void Started(ILogger log, string station, string probe, string source, string calibration, string journal);

    [LoggerMessage(EventId = 2202, Level = LogLevel.Information, Message = "stopped: {Samples} samples and {Rejected} rejected lines journaled, {Waiting} messages wait for the broker")]
    internal static partial void Stopped(ILogger log, long samples, long rejected, long waiting);

    [LoggerMessage(EventId = 2203, Level = LogLevel.Warning, Message = "rejected line {Count}: {Reason}")]
    internal static partial void Rejected(ILogger log, long count, string reason);

    [LoggerMessage(EventId = 2204, Level = LogLevel.Error, Message = "nothing can be journaled: {Reason}; new samples wait and are tried again every {Seconds} s")]
    internal static partial void JournalStopped(ILogger log, string reason, double seconds);

    [LoggerMessage(EventId = 2205, Level = LogLevel.Information, Message = "{Event}: {Text}")]
    internal static partial void Happened(ILogger log, string @event, string text);

    [LoggerMessage(EventId = 2206, Level = LogLevel.Information, Message = "{Count} samples and events older than {Days:F0} d deleted from the journal")]
    internal static partial void Expired(ILogger log, long count, double days);

    [LoggerMessage(EventId = 2207, Level = LogLevel.Warning, Message = "old samples and events could not be deleted: {Reason}")]
    internal static partial void ExpiryFailed(ILogger log, string reason);

    [LoggerMessage(EventId = 2208, Level = LogLevel.Warning, Message = "user and password go to {Host} unencrypted, and so does every reading; write broker.address with mqtts://")]
    internal static partial void Unencrypted(ILogger log, string host);
}
