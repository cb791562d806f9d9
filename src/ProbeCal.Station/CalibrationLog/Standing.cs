using System.Collections.Generic;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// Which entries still hold: withdrawals and replacements counted. An amendment counts for its own log, and one of the local
/// log for every imported one; what somebody elsewhere withdrew takes nothing out of force here.
/// </summary>
internal sealed class Standing
{
    private readonly Dictionary<string, AmendmentRecord> _withdrawn = [];
    private readonly Dictionary<string, CalibrationRecord> _replaced = [];

    internal Standing(IReadOnlyList<StoredEntry> own, IReadOnlyList<ImportedLog> imported)
    {
        // The local log first: its withdrawal of an imported withdrawal counts.
        Take(own, anyLog: true);
        foreach (ImportedLog log in imported)
        {
            Take(log.Entries, anyLog: false);
        }
    }

    /// <summary>The withdrawal of an entry, or null.</summary>
    internal AmendmentRecord? WithdrawalOf(string id)
    {
        return _withdrawn.GetValueOrDefault(id);
    }

    /// <summary>The record that replaces another, or null.</summary>
    internal CalibrationRecord? ReplacementOf(string id)
    {
        return _replaced.GetValueOrDefault(id);
    }

    /// <summary>From the last to the first: an entry can only be taken back by a later one, so what holds is known on arrival.</summary>
    private void Take(IReadOnlyList<StoredEntry> entries, bool anyLog)
    {
        for (int i = entries.Count - 1; 0 <= i; i--)
        {
            LogEntry entry = entries[i].Entry;
            if (_withdrawn.ContainsKey(entry.Id))
            {
                continue;
            }

            if (entry is AmendmentRecord { Action: AmendmentRecord.Withdrawn } amendment && Counts(amendment.Of, entry.LogId, anyLog))
            {
                _withdrawn[amendment.Of] = amendment;
            }
            else if (entry is CalibrationRecord { Replaces: { } old } record && Counts(old, entry.LogId, anyLog))
            {
                _replaced.TryAdd(old, record);
            }
        }
    }

    private static bool Counts(string of, string logId, bool anyLog)
    {
        return anyLog || of.StartsWith(logId + "-", System.StringComparison.Ordinal);
    }
}
