using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>What a log shows of itself, and against heads that were kept elsewhere.</summary>
/// <param name="LogId">The log.</param>
/// <param name="Origin">Where an imported one came from; null for the log of the folder.</param>
/// <param name="Chain">What the walk over the stored bytes found.</param>
/// <param name="Heads">Each head that was compared.</param>
/// <param name="Notes">What is no fault and worth knowing.</param>
public sealed record LogVerification(string LogId, string? Origin, ChainState Chain, IReadOnlyList<HeadComparison> Heads, IReadOnlyList<string> Notes)
{
    /// <summary>What no chain can show by itself. Said wherever no head was compared.</summary>
    public const string NotExcluded = "the chain alone cannot show entries cut off at the end, all entries from one point on written anew, or the whole file replaced; "
        + "compare with a head kept elsewhere: --head COUNT:HASH";

    /// <summary>True when the chain is whole and every head agrees.</summary>
    public bool IsSound => Chain.IsWhole && Heads.All(static head => head.Agrees);

    /// <summary>Verifies the log of the folder, or one of those imported into it.</summary>
    /// <param name="log">The open log; its opening walked over every chain.</param>
    /// <param name="logId">An imported log; null for the log of the folder.</param>
    /// <param name="heads">Heads of that log that were kept elsewhere; empty when there are none.</param>
    /// <exception cref="InputException">There is no such log.</exception>
    public static LogVerification Of(CalibrationLogStore log, string? logId, IReadOnlyList<LogHead> heads)
    {
        (string id, string? origin, IReadOnlyList<StoredEntry> entries, ChainState chain) = (logId ?? log.LogId) == log.LogId
            ? (log.LogId, null, log.Entries, log.Chain)
            : Of(log.Imported(logId!));
        return new LogVerification(id, origin, chain, [.. heads.Select(head => Compare(head, chain))], [.. BackwardClocks(entries)]);
    }

    private static (string, string?, IReadOnlyList<StoredEntry>, ChainState) Of(ImportedLog imported)
    {
        return (imported.LogId, imported.Origin, imported.Entries, imported.Chain);
    }

    private static HeadComparison Compare(LogHead head, ChainState chain)
    {
        if (chain.Count < head.Count)
        {
            return new HeadComparison(head, false, "cut-off", string.Create(CultureInfo.InvariantCulture,
                $"the log had {head.Count} entries when this head was taken and has {chain.Count}: entries were cut off at the end, or this is another log"));
        }

        string? there = head.Count == 0 ? LogReading.NoHash : chain.Hashes.GetValueOrDefault(head.Count);
        return there == head.Sha256
            ? new HeadComparison(head, true, "agrees", string.Create(CultureInfo.InvariantCulture,
                $"the first {head.Count} entries are those of this head; {chain.Count - head.Count} were added since"))
            : new HeadComparison(head, false, "rewritten", string.Create(CultureInfo.InvariantCulture,
                $"entry {head.Count} is not the one of this head: the log was written anew from that entry or an earlier one, or this is another log"));
    }

    /// <summary>The computer's clock may be set wrong; nothing is refused for it, and a reader should know.</summary>
    private static IEnumerable<string> BackwardClocks(IReadOnlyList<StoredEntry> entries)
    {
        DateTimeOffset latest = DateTimeOffset.MinValue;
        foreach (LogEntry entry in entries.Select(static stored => stored.Entry))
        {
            if (entry.WrittenUtc is not DateTimeOffset written)
            {
                continue;
            }

            if (written < latest)
            {
                yield return string.Create(CultureInfo.InvariantCulture, $"entry {entry.Index} was written at {written:yyyy-MM-dd HH:mm}, before the one in front of it ({latest:yyyy-MM-dd HH:mm}): the clock of the computer was set back, or was wrong");
            }

            latest = written < latest ? latest : written;
        }
    }
}

/// <summary>A log against one head.</summary>
/// <param name="Head">The head.</param>
/// <param name="Agrees">True when the log still has what the head stood for.</param>
/// <param name="Kind"><c>agrees</c>, <c>cut-off</c> or <c>rewritten</c>.</param>
/// <param name="Text">One sentence.</param>
public sealed record HeadComparison(LogHead Head, bool Agrees, string Kind, string Text);
