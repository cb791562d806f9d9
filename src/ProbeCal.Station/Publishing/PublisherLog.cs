using Microsoft.Extensions.Logging;

namespace ProbeCal.Station.Publishing;

/// <summary>What the publisher says, each with its event id (2100 to 2199). No line can hold a secret: no argument ever is one.</summary>
internal static partial class PublisherLog
{
    [LoggerMessage(EventId = 2101, Level = LogLevel.Information, Message = "broker {Broker}: connected")]
    internal static partial void Connected(ILogger log, string broker);

    [LoggerMessage(EventId = 2102, Level = LogLevel.Warning, Message = "broker {Broker}: {Reason}; everything is kept, next try in {Seconds:F1} s")]
    internal static partial void Failed(ILogger log, string broker, string reason, double seconds);

    [LoggerMessage(EventId = 2103, Level = LogLevel.Warning, Message = "delivered messages could not be taken out of the outbox, after a restart some may be sent again: {Reason}")]
    internal static partial void RemovalFailed(ILogger log, string reason);

    [LoggerMessage(EventId = 2104, Level = LogLevel.Warning, Message = "broker {Broker}: not everything was delivered before the stop; it is kept for the next start")]
    internal static partial void FarewellCutShort(ILogger log, string broker);

    [LoggerMessage(EventId = 2105, Level = LogLevel.Warning, Message = "broker {Broker}: {Reason}; what was not delivered is kept for the next start")]
    internal static partial void NotDelivered(ILogger log, string broker, string reason);
}
