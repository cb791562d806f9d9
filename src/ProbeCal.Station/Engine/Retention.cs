using System;
using Microsoft.Extensions.Logging;
using ProbeCal.Station.Journal;

namespace ProbeCal.Station.Engine;

/// <summary>Deletes samples and events that were kept long enough, a few at a time, so that it never holds up the stream for long.</summary>
internal sealed class Retention
{
    private const int AtOnce = 500;
    private static readonly TimeSpan _every = TimeSpan.FromHours(1);

    private readonly StationJournal _journal;
    private readonly TimeSpan _keepFor;
    private readonly TimeProvider _time;
    private readonly ILogger _log;
    private DateTimeOffset _next;

    internal Retention(StationJournal journal, TimeSpan keepFor, TimeProvider time, ILogger log)
    {
        _journal = journal;
        _keepFor = keepFor;
        _time = time;
        _log = log;
        _next = time.GetUtcNow();
    }

    /// <summary>Does a part of the work if it is due: called between batches.</summary>
    internal void Work()
    {
        DateTimeOffset now = _time.GetUtcNow();
        if (now < _next)
        {
            return;
        }

        try
        {
            int deleted = _journal.Expire(now - _keepFor, AtOnce);
            if (deleted != 0)
            {
                EngineLog.Expired(_log, deleted, _keepFor.TotalDays);
            }

            // As long as there is more, the next batch of samples brings the next part.
            _next = deleted == AtOnce ? now : now + _every;
        }
        catch (JournalException fault)
        {
            EngineLog.ExpiryFailed(_log, fault.Message);
            _next = now + _every;
        }
    }
}
