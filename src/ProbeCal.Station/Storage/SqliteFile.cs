using System;
using System.Globalization;
using System.IO;
using Microsoft.Data.Sqlite;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Storage;

/// <summary>
/// A SQLite file of this project, opened safely: write-ahead log, every commit flushed to the disk before it returns, a
/// newer version refused without a byte of it changed, an older one migrated after a backup copy. One connection, not for
/// concurrent use; readers open their own.
/// </summary>
internal sealed class SqliteFile : IDisposable
{
    // How long a command waits for another program's lock before it is a fault.
    private const int BusySeconds = 5;

    private SqliteFile(string path, SqliteConnection connection, int version)
    {
        Path = path;
        Connection = connection;
        Version = version;
    }

    /// <summary>The file, absolute.</summary>
    public string Path { get; }

    /// <summary>The open connection. Whoever uses it catches <see cref="SqliteException"/> and asks <see cref="SqliteFaults"/>.</summary>
    public SqliteConnection Connection { get; }

    /// <summary>The version that the file has now: the newest, or an older one that was opened for reading.</summary>
    public int Version { get; }

    /// <summary>The copy that was made before an older file was migrated, or null.</summary>
    public string? BackupPath { get; private init; }

    /// <summary>Where a damaged file was put, or null.</summary>
    public string? SetAsidePath { get; private init; }

    /// <summary>Opens the file for writing, making or migrating it as needed.</summary>
    /// <param name="path">The file.</param>
    /// <param name="format">Its kind.</param>
    /// <param name="whenDamaged">What to do when SQLite finds it damaged.</param>
    /// <param name="time">Gives the time in the names of copies.</param>
    /// <exception cref="InputException">The file is from a newer version, or belongs to something else. It is untouched.</exception>
    /// <exception cref="WorkFailedException">It is damaged and may not be set aside, or the system refuses it.</exception>
    public static SqliteFile OpenForWriting(string path, SqliteFormat format, DamagePolicy whenDamaged, TimeProvider time)
    {
        string full = System.IO.Path.GetFullPath(path);
        string? setAside = null;
        string? damage = FindDamage(full, format);
        if (damage != null)
        {
            if (whenDamaged == DamagePolicy.Refuse)
            {
                throw new WorkFailedException(full + ": " + format.Name + " is damaged (" + damage + "); it was left as it is: keep it, and put a good copy in its place");
            }

            setAside = SetAside(full, time);
        }

        try
        {
            return Open(full, format, setAside, time);
        }
        catch (SqliteException fault)
        {
            throw SqliteFaults.AsWorkFailed(fault, full);
        }
    }

    /// <summary>Opens an existing file for reading only, beside whoever writes.</summary>
    /// <exception cref="InputException">There is no such file, it is from another version, or belongs to something else.</exception>
    /// <exception cref="WorkFailedException">It is damaged, or the system refuses it.</exception>
    public static SqliteFile OpenForReading(string path, SqliteFormat format)
    {
        string full = System.IO.Path.GetFullPath(path);
        if (!File.Exists(full))
        {
            throw new InputException(full + ": " + format.Name + " is not there; nothing has been written to this folder yet");
        }

        SqliteConnection? connection = null;
        try
        {
            RefuseForeign(full, format);
            connection = ConnectForReading(full);
            int version = ReadVersion(connection, full, format);
            if (version < (format.OldestReadable ?? format.Version))
            {
                throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{full}: {format.Name} is version {version} and this program reads version {format.Version}; a command that writes there migrates it, after a backup copy"));
            }

            SqliteFile opened = new(full, connection, version);
            connection = null;
            return opened;
        }
        catch (SqliteException fault)
        {
            throw SqliteFaults.AsWorkFailed(fault, full);
        }
        finally
        {
            connection?.Dispose();
        }
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        Connection.Dispose();
    }

    private static SqliteFile Open(string full, SqliteFormat format, string? setAside, TimeProvider time)
    {
        SqliteConnection? connection = null;
        try
        {
            connection = Connect(full, SqliteOpenMode.ReadWriteCreate);
            Execute(connection, "PRAGMA journal_mode=WAL;");
            Execute(connection, "PRAGMA synchronous=FULL;");
            int version = ReadVersion(connection, full, format);
            string? backup = version != 0 && version < format.Version ? Backup(connection, full, version, time) : null;
            Migrate(connection, format, version);
            SqliteFile opened = new(full, connection, format.Version) { BackupPath = backup, SetAsidePath = setAside };
            connection = null;
            return opened;
        }
        finally
        {
            connection?.Dispose();
        }
    }

    /// <summary>Null when the file is sound or not there; otherwise what SQLite says about it.</summary>
    private static string? FindDamage(string full, SqliteFormat format)
    {
        try
        {
            SqliteHeader? header = RefuseForeign(full, format);
            if (header == null)
            {
                return null;
            }

            if (!header.IsSqlite)
            {
                return "it does not begin as a SQLite file does";
            }

            // A plain read-only connection would leave log files beside a file that is then refused.
            string source = SqliteHeader.HasLog(full) ? full : Immutable(full);
            using SqliteConnection connection = Connect(source, SqliteOpenMode.ReadOnly);
            ReadVersion(connection, full, format);
            string verdict = Convert.ToString(Scalar(connection, "PRAGMA quick_check(1);"), CultureInfo.InvariantCulture) ?? "";
            return verdict == "ok" ? null : verdict;
        }
        catch (SqliteException fault) when (SqliteFaults.KindOf(fault) == StorageFault.Damaged)
        {
            return fault.Message;
        }
        catch (SqliteException fault)
        {
            throw SqliteFaults.AsWorkFailed(fault, full);
        }
    }

    /// <summary>Judges the header alone. Null when there is nothing yet.</summary>
    private static SqliteHeader? RefuseForeign(string full, SqliteFormat format)
    {
        SqliteHeader? header;
        try
        {
            header = SqliteHeader.Read(full);
        }
        catch (UnauthorizedAccessException fault)
        {
            throw new WorkFailedException(full + ": no permission to read " + format.Name, fault);
        }
        catch (IOException fault)
        {
            throw new WorkFailedException(full + ": " + fault.Message, fault);
        }

        if (header is { IsSqlite: true })
        {
            Judge(header.ApplicationId, header.UserVersion, full, format);
        }

        return header;
    }

    private static int ReadVersion(SqliteConnection connection, string full, SqliteFormat format)
    {
        int applicationId = Convert.ToInt32(Scalar(connection, "PRAGMA application_id;"), CultureInfo.InvariantCulture);
        int version = Convert.ToInt32(Scalar(connection, "PRAGMA user_version;"), CultureInfo.InvariantCulture);
        Judge(applicationId, version, full, format);
        if (applicationId == 0 && Convert.ToInt64(Scalar(connection, "SELECT count(*) FROM sqlite_schema;"), CultureInfo.InvariantCulture) != 0)
        {
            throw NotOurs(full, format);
        }

        return version;
    }

    /// <summary>A file with neither number is one that was begun and never filled: whether it is empty is looked at later.</summary>
    private static void Judge(int applicationId, int version, string full, SqliteFormat format)
    {
        if (applicationId != format.ApplicationId && (applicationId != 0 || version != 0))
        {
            throw NotOurs(full, format);
        }

        if (format.Version < version)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{full}: {format.Name} is version {version}, this program knows up to version {format.Version}; use the newer program, nothing was changed"));
        }
    }

    private static InputException NotOurs(string full, SqliteFormat format)
    {
        return new InputException(full + ": a database of another kind lies where " + format.Name + " belongs; move it or choose another folder, nothing was changed");
    }

    private static void Migrate(SqliteConnection connection, SqliteFormat format, int from)
    {
        if (from == format.Version)
        {
            return;
        }

        using SqliteTransaction transaction = connection.BeginTransaction();
        for (int version = from; version < format.Version; version++)
        {
            Execute(connection, format.Migrations[version], transaction);
        }

        Execute(connection, string.Create(CultureInfo.InvariantCulture, $"PRAGMA application_id={format.ApplicationId}; PRAGMA user_version={format.Version};"), transaction);
        transaction.Commit();
    }

    private static string Backup(SqliteConnection connection, string full, int version, TimeProvider time)
    {
        string target = FreeName(string.Create(CultureInfo.InvariantCulture, $"{full}.version-{version}-{Stamp(time)}"));
        using SqliteConnection copy = Connect(target, SqliteOpenMode.ReadWriteCreate);
        connection.BackupDatabase(copy);
        return target;
    }

    private static string SetAside(string full, TimeProvider time)
    {
        string target = FreeName(full + ".damaged-" + Stamp(time));
        try
        {
            // The write-ahead log goes along under the matching name: a repair needs both.
            foreach (string suffix in new[] { "", "-wal", "-shm" })
            {
                if (File.Exists(full + suffix))
                {
                    File.Move(full + suffix, target + suffix);
                }
            }
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            throw new WorkFailedException(full + ": it is damaged and could not be renamed: " + fault.Message, fault);
        }

        return target;
    }

    private static string Stamp(TimeProvider time)
    {
        return time.GetUtcNow().ToString("yyyyMMdd'T'HHmmss'Z'", CultureInfo.InvariantCulture);
    }

    private static string FreeName(string wanted)
    {
        string name = wanted;
        for (int n = 2; File.Exists(name); n++)
        {
            name = string.Create(CultureInfo.InvariantCulture, $"{wanted}-{n}");
        }

        return name;
    }

    private static SqliteConnection Connect(string source, SqliteOpenMode mode)
    {
        // Without pooling, closing closes: a pooled connection would keep the file and its log open.
        SqliteConnectionStringBuilder options = new() { DataSource = source, Mode = mode, Pooling = false, DefaultTimeout = BusySeconds };
        SqliteConnection connection = new(options.ConnectionString);
        try
        {
            connection.Open();
            return connection;
        }
        catch
        {
            connection.Dispose();
            throw;
        }
    }

    /// <summary>
    /// Opens for reading, also where nothing may be written: a file with a write-ahead log wants its shared memory beside it,
    /// which a copy on a disk for reading only, or a folder of somebody else, does not let be made.
    /// </summary>
    private static SqliteConnection ConnectForReading(string full)
    {
        SqliteConnection connection = Connect(full, SqliteOpenMode.ReadOnly);
        try
        {
            Scalar(connection, "PRAGMA user_version;");
            return connection;
        }
        catch (SqliteException fault) when (SqliteFaults.KindOf(fault) is StorageFault.InputOutput or StorageFault.ReadOnly && !SqliteHeader.HasLog(full))
        {
            // Without a log there is no writer, and the file alone is the whole of it.
            connection.Dispose();
            return Connect(Immutable(full), SqliteOpenMode.ReadOnly);
        }
        catch
        {
            connection.Dispose();
            throw;
        }
    }

    private static string Immutable(string full)
    {
        return new Uri(full).AbsoluteUri + "?immutable=1";
    }

    private static object? Scalar(SqliteConnection connection, string sql)
    {
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        return command.ExecuteScalar();
    }

    private static void Execute(SqliteConnection connection, string sql, SqliteTransaction? transaction = null)
    {
        using SqliteCommand command = connection.CreateCommand();
        command.CommandText = sql;
        command.Transaction = transaction;

        // Not ExecuteNonQuery: once a statement of a script has returned a row, it drops the faults of those behind it.
        using SqliteDataReader reader = command.ExecuteReader();
        do
        {
            while (reader.Read())
            {
            }
        }
        while (reader.NextResult());
    }
}
