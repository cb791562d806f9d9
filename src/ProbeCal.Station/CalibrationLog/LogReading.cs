using System;
using System.Collections.Generic;
using System.Globalization;
using System.Security.Cryptography;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// The walk over a whole log, from its file or from an export: every hash computed again over the stored bytes, every link
/// and copy compared.
/// </summary>
internal sealed class LogReading
{
    /// <summary>Stands for the hash of the entry before the first.</summary>
    internal const string NoHash = "0000000000000000000000000000000000000000000000000000000000000000";

    private readonly List<ChainFault> _faults = [];
    private readonly Dictionary<long, string> _hashes = [];

    internal LogReading(string logId)
    {
        LogId = logId;
        Chain = new ChainState(0, NoHash, _faults) { Hashes = _hashes };
    }

    internal string LogId { get; }

    internal List<StoredEntry> Entries { get; } = [];

    internal ChainState Chain { get; private set; }

    internal static string Hash(byte[] bytes)
    {
        return Convert.ToHexStringLower(SHA256.HashData(bytes));
    }

    internal static long Microseconds(DateTimeOffset time)
    {
        return (time.UtcTicks - DateTimeOffset.UnixEpoch.UtcTicks) / TimeSpan.TicksPerMicrosecond;
    }

    /// <summary>Takes the next entry.</summary>
    /// <param name="index">The place that it stands at.</param>
    /// <param name="bytes">Its stored bytes.</param>
    /// <param name="kept">The hash kept beside them.</param>
    /// <param name="filed">How it is filed; null where nothing stands beside it.</param>
    /// <exception cref="InputException">It is of a newer version.</exception>
    internal void Take(long index, byte[] bytes, string kept, FiledAs? filed)
    {
        string actual = Hash(bytes);
        string name = string.Create(CultureInfo.InvariantCulture, $"record {index}");
        if (index != Chain.Count + 1)
        {
            Fault(index, "gap", string.Create(CultureInfo.InvariantCulture, $"{name} follows record {Chain.Count}: records between them are missing"));
        }

        if (actual != kept)
        {
            Fault(index, "edited", $"{name} was changed after it was stored (its bytes do not give the hash kept beside them)");
        }

        try
        {
            LogEntry entry = RecordJson.ReadEntry(bytes, name);
            Compare(entry, index, filed, name);
            Entries.Add(new StoredEntry(entry, actual));
        }
        catch (WorkFailedException unreadable)
        {
            Fault(index, "unreadable", unreadable.Message);
        }

        _hashes[index] = actual;
        Chain = Chain with { Count = index, HeadSha256 = actual };
    }

    private void Compare(LogEntry entry, long index, FiledAs? filed, string name)
    {
        if (entry.PreviousSha256 != Chain.HeadSha256)
        {
            Fault(index, "link", name + " does not continue the record before it (the hash it names is another)");
        }

        if (entry.LogId != LogId)
        {
            Fault(index, "foreign", $"{name} belongs to log {Wrong.Shown(entry.LogId)}, this is log {LogId}");
        }

        if (entry.Index != index)
        {
            Fault(index, "moved", string.Create(CultureInfo.InvariantCulture, $"{name} states that it is record {entry.Index}: records were taken out, inserted or reordered"));
        }

        if (filed is FiledAs columns && columns != FiledAs.Of(entry))
        {
            Fault(index, "filed", name + " is filed under another id, kind, subject or time than it states itself");
        }
    }

    private void Fault(long index, string kind, string text)
    {
        _faults.Add(new ChainFault(index, kind, text));
    }
}

/// <summary>The columns by which an entry is found. They stand beside its bytes and are compared with them.</summary>
internal readonly record struct FiledAs(string Id, string Kind, string Subject, long Microseconds)
{
    internal static FiledAs Of(LogEntry entry)
    {
        return new FiledAs(entry.Id, entry.Kind, entry.Subject, LogReading.Microseconds(entry.AtUtc));
    }
}
