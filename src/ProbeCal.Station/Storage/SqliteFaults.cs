using Microsoft.Data.Sqlite;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Storage;

/// <summary>The faults of a database file that a program can meet in use, told apart.</summary>
internal enum StorageFault
{
    /// <summary>No room is left on the disk, or the file has reached its own cap.</summary>
    DiskFull,

    /// <summary>Another program holds the file for longer than the wait allowed.</summary>
    Busy,

    /// <summary>The file or its folder cannot be written.</summary>
    ReadOnly,

    /// <summary>The file's content is not what SQLite wrote.</summary>
    Damaged,

    /// <summary>The operating system refused a read, a write or a flush.</summary>
    InputOutput,

    /// <summary>Anything else.</summary>
    Other,
}

/// <summary>Turns SQLite's result codes into states and into one line for people.</summary>
internal static class SqliteFaults
{
    // Primary result codes: https://www.sqlite.org/rescode.html
    private const int BusyCode = 5;
    private const int LockedCode = 6;
    private const int ReadOnlyCode = 8;
    private const int InputOutputCode = 10;
    private const int CorruptCode = 11;
    private const int FullCode = 13;
    private const int CannotOpenCode = 14;
    private const int NotADatabaseCode = 26;

    // Extended codes of files that could not grow: the shared-memory file of WAL, and a write the system cut short.
    private const int SharedMemorySizeCode = 4874;

    /// <summary>Which of the faults it is.</summary>
    public static StorageFault KindOf(SqliteException fault)
    {
        if (fault.SqliteExtendedErrorCode == SharedMemorySizeCode)
        {
            return StorageFault.DiskFull;
        }

        return fault.SqliteErrorCode switch
        {
            FullCode => StorageFault.DiskFull,
            BusyCode or LockedCode => StorageFault.Busy,
            ReadOnlyCode => StorageFault.ReadOnly,
            CorruptCode or NotADatabaseCode => StorageFault.Damaged,
            InputOutputCode or CannotOpenCode => StorageFault.InputOutput,
            _ => StorageFault.Other,
        };
    }

    /// <summary>One line: the file, what is wrong, what would help.</summary>
    public static string Describe(SqliteException fault, string path)
    {
        string reason = KindOf(fault) switch
        {
            StorageFault.DiskFull => "no room is left on the disk; free some, what was stored before is kept",
            StorageFault.Busy => "another program holds the file; stop it and try again",
            StorageFault.ReadOnly => "the file cannot be written; check its owner and permissions",
            StorageFault.Damaged => "the file is damaged (" + fault.Message + "); keep it and restore a copy",
            StorageFault.InputOutput => "the system refused to read or write it (" + fault.Message + "); check the disk and the permissions",
            _ => fault.Message,
        };
        return path + ": " + reason;
    }

    /// <summary>The exception that ends the work with that line.</summary>
    public static WorkFailedException AsWorkFailed(SqliteException fault, string path)
    {
        return new WorkFailedException(Describe(fault, path), fault);
    }
}
