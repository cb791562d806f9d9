using Microsoft.Extensions.Logging;

namespace ProbeCal.Station.Sources;

/// <summary>Event ids of the sources in the log: 2000 to 2099.</summary>
internal static class SourceEventIds
{
    internal static readonly EventId State = new(2001, "SourceState");
    internal static readonly EventId Lost = new(2002, "SourceLost");
    internal static readonly EventId CloseHangs = new(2003, "SourceCloseHangs");
    internal static readonly EventId LineSettings = new(2004, "SerialLineSettings");
    internal static readonly EventId Stopped = new(2005, "SourceStopped");
    internal static readonly EventId CloseFailed = new(2006, "SourceCloseFailed");
}
