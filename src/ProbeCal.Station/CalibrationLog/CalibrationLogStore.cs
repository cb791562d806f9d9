using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using Microsoft.Data.Sqlite;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Storage;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>A calibration or check as the log keeps it.</summary>
/// <param name="Record">The record, read from the stored bytes.</param>
/// <param name="Sha256">SHA-256 over the stored bytes, lower-case hex.</param>
public sealed record StoredCalibration(CalibrationRecord Record, string Sha256);

/// <summary>
/// The append-only calibration log: each entry as the exact bytes of its JSON, chained by SHA-256. The whole log is read
/// and verified on opening, and every imported log with it. One program writes at a time (<see cref="DataDirectory"/>); not
/// for concurrent use.
/// </summary>
public sealed class CalibrationLogStore : IDisposable
{
    private readonly SqliteFile _file;
    private readonly TimeProvider? _time;
    private readonly List<StoredEntry> _entries;
    private readonly List<StoredCalibration> _records;
    private readonly List<ImportedLog> _imported;
    private Standing _standing;

    private CalibrationLogStore(SqliteFile file, TimeProvider? time)
    {
        _file = file;
        _time = time;
        LogReading reading = LogTables.ReadOwn(file);
        LogId = reading.LogId;
        Chain = reading.Chain;
        _entries = reading.Entries;
        _records = [.. CalibrationsOf(_entries)];
        _imported = LogTables.ReadImported(file);
        _standing = new Standing(_entries, _imported);
    }

    /// <summary>The log's own id: twelve hex digits, made once.</summary>
    public string LogId { get; }

    /// <summary>What the verification on opening found, kept up to date by appends.</summary>
    public ChainState Chain { get; private set; }

    /// <summary>The copy that was made before an older log was migrated, or null.</summary>
    public string? BackupPath => _file.BackupPath;

    /// <summary>Every entry that can be read, of any kind, oldest first. Where <see cref="Chain"/> has faults, trust none blindly.</summary>
    public IReadOnlyList<StoredEntry> Entries => _entries;

    /// <summary>The calibrations and checks among <see cref="Entries"/>, withdrawn and replaced ones too.</summary>
    public IReadOnlyList<StoredCalibration> Records => _records;

    /// <summary>Logs made elsewhere and imported, each with its own id and chain, in the order in which they came.</summary>
    public IReadOnlyList<ImportedLog> ImportedLogs => _imported;

    /// <summary>An imported log by its id.</summary>
    /// <exception cref="InputException">None of this id was imported.</exception>
    public ImportedLog Imported(string logId)
    {
        return _imported.Find(log => log.LogId == logId)
            ?? throw new InputException($"log {Wrong.Shown(logId)}: it was not imported here{NearestName.DidYouMean(logId, _imported.Select(static log => log.LogId))}; the log of this folder is {LogId}, imported are {(_imported.Count == 0 ? "none" : string.Join(", ", _imported.Select(static log => log.LogId)))}");
    }

    /// <summary>The entries of this log or of an imported one, oldest first.</summary>
    /// <exception cref="InputException">None of this id was imported.</exception>
    public IReadOnlyList<StoredEntry> EntriesOf(string logId)
    {
        return logId == LogId ? _entries : Imported(logId).Entries;
    }

    /// <summary>Opens the log for writing, making it when it is not there and migrating an older one after a backup copy.</summary>
    /// <param name="path">The file, <see cref="DataDirectory.CalibrationLogFile"/>.</param>
    /// <param name="time">Gives the time at which entries are written, and that in the names of backup copies.</param>
    /// <param name="newLogId">Source of the id of a new log.</param>
    /// <exception cref="InputException">The file is from a newer version or of another kind; it is untouched.</exception>
    /// <exception cref="WorkFailedException">The file is damaged, or the system refuses it; it is left as it is.</exception>
    public static CalibrationLogStore OpenForWriting(string path, TimeProvider time, Func<Guid> newLogId)
    {
        SqliteFile file = SqliteFile.OpenForWriting(path, CalibrationLogFormat.File, DamagePolicy.Refuse, time);
        return Open(file, time, () => LogTables.Begin(file, newLogId().ToString("N", CultureInfo.InvariantCulture)[..12]));
    }

    /// <summary>Opens an existing log for reading, also one of an older version, which stays as it is.</summary>
    /// <exception cref="InputException">There is none, it is from a newer version, or of another kind.</exception>
    /// <exception cref="WorkFailedException">It is damaged, or the system refuses it.</exception>
    public static CalibrationLogStore OpenForReading(string path)
    {
        SqliteFile file = SqliteFile.OpenForReading(path, CalibrationLogFormat.File);
        return Open(file, null, static () => { });
    }

    /// <summary>Adds an entry at the end. It is on the disk when this returns.</summary>
    /// <returns>The entry with its id, index, time of writing and the hash of the one before.</returns>
    /// <exception cref="InputException">It amends or replaces an entry that is not there; nothing was added.</exception>
    /// <exception cref="WorkFailedException">The chain has a fault, or the entry could not be stored; nothing was added.</exception>
    public StoredEntry Append(LogEntry entry)
    {
        return AppendAll([entry])[0];
    }

    /// <summary>Adds entries at the end, all of them or none. They are on the disk when this returns.</summary>
    /// <exception cref="InputException">One amends or replaces an entry that is not there; nothing was added.</exception>
    /// <exception cref="WorkFailedException">The chain has a fault, or the entries could not be stored; nothing was added.</exception>
    public IReadOnlyList<StoredEntry> AppendAll(IReadOnlyList<LogEntry> entries)
    {
        RequireWhole();
        List<(LogEntry Entry, byte[] Bytes, string Hash)> placed = [];
        string previous = Chain.HeadSha256;
        foreach (LogEntry entry in entries)
        {
            RequireReferred(entry);
            long index = Chain.Count + placed.Count + 1;
            LogEntry next = entry with
            {
                LogId = LogId,
                Index = index,
                Id = string.Create(CultureInfo.InvariantCulture, $"{LogId}-{index:0000}"),
                PreviousSha256 = previous,
                WrittenUtc = _time!.GetUtcNow(),
            };
            byte[] bytes = RecordJson.ToBytes(next);
            previous = LogReading.Hash(bytes);
            placed.Add((next, bytes, previous));
        }

        Store(() => LogTables.Insert(_file, placed));
        StoredEntry[] stored = [.. placed.Select(static each => new StoredEntry(each.Entry, each.Hash))];
        _entries.AddRange(stored);
        _records.AddRange(CalibrationsOf(stored));
        _standing = new Standing(_entries, _imported);
        Dictionary<long, string> hashes = new(Chain.Hashes);
        foreach (StoredEntry each in stored)
        {
            hashes[each.Entry.Index] = each.Sha256;
        }

        Chain = Chain with { Count = Chain.Count + stored.Length, HeadSha256 = previous, Hashes = hashes };
        return stored;
    }

    /// <summary>Keeps a log made elsewhere beside this one, with its own id and chain, or lengthens the one that was imported before.</summary>
    /// <returns>Number of entries that were new.</returns>
    /// <exception cref="InputException">It is this log itself with entries that this one lacks, or it diverges from what is here; nothing was imported.</exception>
    /// <exception cref="WorkFailedException">A chain here has a fault, or the entries could not be stored; nothing was imported.</exception>
    public long Import(LogImport log)
    {
        RequireWhole();
        ImportedLog? known = _imported.Find(each => each.LogId == log.LogId);
        ChainState here = log.LogId == LogId ? Chain : known?.Chain ?? new ChainState(0, LogReading.NoHash, []);
        long common = Math.Min(here.Count, log.Chain.Count);
        for (long index = 1; index <= common; index++)
        {
            if (here.Hashes[index] != log.Chain.Hashes[index])
            {
                throw Wrong.Input("file", log.Origin, string.Create(CultureInfo.InvariantCulture,
                    $"entry {index} of log {log.LogId} is another here than in the file: one of the two was written anew; nothing was imported, compare both with a head kept elsewhere"));
            }
        }

        if (log.LogId == LogId && here.Count < log.Chain.Count)
        {
            throw Wrong.Input("file", log.Origin, string.Create(CultureInfo.InvariantCulture,
                $"this is the log of this folder itself, and it has {log.Chain.Count - here.Count} more {(log.Chain.Count - here.Count == 1 ? "entry" : "entries")} than the folder's: that one was cut off or is an older copy; nothing was imported, put the newer file back"));
        }

        List<(LogEntry Entry, byte[] Bytes, string Hash)> more = [];
        for (int i = (int)common; i < log.Entries.Count; i++)
        {
            more.Add((log.Entries[i].Entry, log.Bytes[i], log.Entries[i].Sha256));
        }

        if (more.Count != 0)
        {
            Store(() => LogTables.InsertImported(_file, log.LogId, log.Origin, _time!.GetUtcNow(), more));
            _imported.Clear();
            _imported.AddRange(LogTables.ReadImported(_file));
            _standing = new Standing(_entries, _imported);
        }

        return more.Count;
    }

    /// <summary>Adds a calibration or check at the end, as <see cref="Append(LogEntry)"/> does.</summary>
    public StoredCalibration Append(CalibrationRecord record)
    {
        StoredEntry stored = Append((LogEntry)record);
        return new StoredCalibration((CalibrationRecord)stored.Entry, stored.Sha256);
    }

    /// <summary>The calibration or check with this id, in this log or an imported one, or null.</summary>
    public StoredCalibration? Find(string calibrationId)
    {
        return FindEntry(calibrationId) is { Entry: CalibrationRecord record } stored ? new StoredCalibration(record, stored.Sha256) : null;
    }

    /// <summary>The entry with this id, in this log or an imported one, or null.</summary>
    public StoredEntry? FindEntry(string id)
    {
        return _entries.Concat(_imported.SelectMany(static log => log.Entries)).FirstOrDefault(stored => stored.Entry.Id == id);
    }

    /// <summary>
    /// The calibration in force for a probe at a time: the latest of this log that passed, was complete by then, and was neither
    /// withdrawn nor replaced; or null. A failed one, a check, and one of an imported log never take over.
    /// </summary>
    public StoredCalibration? LatestFor(string probeId, DateTimeOffset atUtc)
    {
        StoredCalibration? latest = null;
        foreach (StoredCalibration stored in _records)
        {
            CalibrationRecord record = stored.Record;
            bool inForce = record.Probe.Id == probeId && MayBeInForce(record) && record.CompletedUtc <= atUtc;
            if (inForce && (latest == null || latest.Record.CompletedUtc <= record.CompletedUtc))
            {
                latest = stored;
            }
        }

        return latest;
    }

    /// <summary>The checks of a probe that hold, oldest first by the time they were complete.</summary>
    public IReadOnlyList<StoredCalibration> ChecksFor(string probeId)
    {
        return [.. _records.Where(stored => stored.Record.Purpose == CalibrationRecord.CheckPurpose && stored.Record.Probe.Id == probeId && Holds(stored.Record.Id)).OrderBy(static stored => stored.Record.CompletedUtc)];
    }

    /// <summary>A piece of equipment as the register had it at a time, or null.</summary>
    public EquipmentRecord? EquipmentAt(string equipmentId, DateTimeOffset atUtc)
    {
        return AllEquipment(atUtc).FirstOrDefault(each => each.Equipment == equipmentId);
    }

    /// <summary>The register as it stood at a time: the newest entry of each id that holds, in order of their ids.</summary>
    public IReadOnlyList<EquipmentRecord> AllEquipment(DateTimeOffset atUtc)
    {
        SortedDictionary<string, EquipmentRecord> register = new(StringComparer.Ordinal);
        foreach (EquipmentRecord each in _entries.Select(static stored => stored.Entry).OfType<EquipmentRecord>())
        {
            if (each.AtUtc <= atUtc && Holds(each.Id))
            {
                register[each.Equipment] = each;
            }
        }

        return [.. register.Values];
    }

    /// <summary>What was done to a probe, oldest first; withdrawn entries left out.</summary>
    public IReadOnlyList<ServiceRecord> ServiceFor(string probeId)
    {
        return [.. _entries.Select(static stored => stored.Entry).OfType<ServiceRecord>().Where(each => each.Probe == probeId && Holds(each.Id)).OrderBy(static each => each.At)];
    }

    /// <summary>True when an entry was withdrawn and the withdrawal holds.</summary>
    public bool IsWithdrawn(string id)
    {
        return _standing.WithdrawalOf(id) != null;
    }

    /// <summary>The withdrawal of an entry, or null.</summary>
    public AmendmentRecord? WithdrawalOf(string id)
    {
        return _standing.WithdrawalOf(id);
    }

    /// <summary>The record that replaces another, or null.</summary>
    public CalibrationRecord? ReplacementOf(string id)
    {
        return _standing.ReplacementOf(id);
    }

    /// <summary>True when a calibration passed, was not withdrawn and not replaced, so that readings may be corrected with it.</summary>
    public bool MayBeInForce(CalibrationRecord record)
    {
        return record.Purpose == CalibrationRecord.CalibrationPurpose && record.Result.Pass && Holds(record.Id);
    }

    /// <summary>The exact bytes of a calibration or check as they are stored.</summary>
    public byte[] BytesOf(StoredCalibration stored)
    {
        return BytesOf(stored.Record);
    }

    /// <summary>The exact bytes of an entry as they are stored.</summary>
    public byte[] BytesOf(LogEntry entry)
    {
        try
        {
            return LogTables.Bytes(_file, LogId, entry) ?? throw new WorkFailedException($"{_file.Path}: record {entry.Id} is no longer there");
        }
        catch (SqliteException fault)
        {
            throw SqliteFaults.AsWorkFailed(fault, _file.Path);
        }
    }

    /// <summary>Stops the work when a chain has a fault: nothing may rest on a log that was tampered with.</summary>
    /// <exception cref="WorkFailedException">The chain of the log, or of an imported one, has a fault.</exception>
    public void RequireWhole()
    {
        ChainFault? fault = Chain.Faults.Concat(_imported.SelectMany(static log => log.Chain.Faults)).FirstOrDefault();
        if (fault != null)
        {
            throw new WorkFailedException($"{_file.Path}: the chain of calibration records is broken: {fault}; keep the file as evidence and put a sound copy in its place, or go on in another --data folder");
        }
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        _file.Dispose();
    }

    private static CalibrationLogStore Open(SqliteFile file, TimeProvider? time, Action prepare)
    {
        try
        {
            prepare();
            return new CalibrationLogStore(file, time);
        }
        catch (SqliteException fault)
        {
            file.Dispose();
            throw SqliteFaults.AsWorkFailed(fault, file.Path);
        }
        catch
        {
            file.Dispose();
            throw;
        }
    }

    private void Store(Action insert)
    {
        try
        {
            insert();
        }
        catch (SqliteException fault)
        {
            throw SqliteFaults.AsWorkFailed(fault, _file.Path);
        }
    }

    private static IEnumerable<StoredCalibration> CalibrationsOf(IEnumerable<StoredEntry> entries)
    {
        return entries.Where(static stored => stored.Entry is CalibrationRecord).Select(static stored => new StoredCalibration((CalibrationRecord)stored.Entry, stored.Sha256));
    }

    /// <summary>True when an entry was neither withdrawn nor replaced.</summary>
    public bool Holds(string id)
    {
        return _standing.WithdrawalOf(id) == null && _standing.ReplacementOf(id) == null;
    }

    private void RequireReferred(LogEntry entry)
    {
        string? referred = entry switch
        {
            AmendmentRecord amendment => amendment.Of,
            CalibrationRecord record => record.Replaces,
            _ => null,
        };
        if (referred != null && FindEntry(referred) == null)
        {
            throw new InputException($"record {Wrong.Shown(referred)}: not in this log{NearestName.DidYouMean(referred, _entries.Select(static known => known.Entry.Id))}; 'probecal calibrations list' shows the ids");
        }
    }
}
