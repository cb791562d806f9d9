using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Security.Cryptography;
using System.Threading.Tasks;
using Microsoft.Data.Sqlite;
using Microsoft.Extensions.Time.Testing;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Storage;
using Xunit;

namespace ProbeCal.Station.Tests.Storage;

public class SqliteFileTests
{
    private const string FirstMigration = "CREATE TABLE jar(id INTEGER PRIMARY KEY, label TEXT NOT NULL) STRICT;";
    private const string SecondMigration = "ALTER TABLE jar ADD COLUMN shelf TEXT NOT NULL DEFAULT 'low';";

    private static readonly SqliteFormat _one = new("the jar list", 0x50435431, [FirstMigration]);
    private static readonly SqliteFormat _two = new("the jar list", 0x50435431, [FirstMigration, SecondMigration]);

    private readonly FakeTimeProvider _time = new(new DateTimeOffset(2026, 12, 1, 8, 0, 0, TimeSpan.Zero));

    [Fact]
    public void NewFile_CarriesItsKindAndVersion_AndFlushesEveryCommit()
    {
        using TemporaryFolder folder = new();
        using SqliteFile file = Open(folder.File("a.db"), _two);

        Assert.Equal(0x50435431L, Scalar(file, "PRAGMA application_id"));
        Assert.Equal(2L, Scalar(file, "PRAGMA user_version"));
        Assert.Equal("wal", Scalar(file, "PRAGMA journal_mode"));
        Assert.Equal(2L, Scalar(file, "PRAGMA synchronous")); // 2 is FULL
        Assert.Null(file.BackupPath);
        Assert.Null(file.SetAsidePath);
    }

    [Fact]
    public void NewerFile_IsRefused_AndNoByteOfTheFolderChanges()
    {
        using TemporaryFolder folder = new();
        string path = folder.File("a.db");
        Open(path, _two).Dispose();
        Dictionary<string, string> before = Digests(folder.Path);

        InputException refused = Assert.Throws<InputException>(() => Open(path, _one));
        InputException refusedReading = Assert.Throws<InputException>(() => SqliteFile.OpenForReading(path, _one));

        Assert.Contains("version 2, this program knows up to version 1", refused.Message);
        Assert.Contains("version 2", refusedReading.Message);
        Assert.Equal(before, Digests(folder.Path));
    }

    [Fact]
    public void NewerVersionThatStandsOnlyInTheWriteAheadLog_IsRefused_AndNothingIsChanged()
    {
        using TemporaryFolder folder = new();
        string path = folder.File("a.db");
        using SqliteFile writer = Open(path, _one);
        Execute(writer, "PRAGMA user_version=2; INSERT INTO jar(label) VALUES ('late');");
        string crashed = folder.File("crashed.db");
        File.Copy(path, crashed);
        File.Copy(path + "-wal", crashed + "-wal");
        Dictionary<string, string> before = Digests(folder.Path, "crashed.db");

        Assert.Throws<InputException>(() => Open(crashed, _one));

        Assert.Equal(before, Digests(folder.Path, "crashed.db"));
    }

    [Fact]
    public void OlderFile_IsMigrated_AfterABackupThatStillHoldsTheOldVersion()
    {
        using TemporaryFolder folder = new();
        string path = folder.File("a.db");
        using (SqliteFile old = Open(path, _one))
        {
            Execute(old, "INSERT INTO jar(label) VALUES ('plum')");
        }

        using (SqliteFile migrated = Open(path, _two))
        {
            Assert.Equal("plum low", Scalar(migrated, "SELECT label || ' ' || shelf FROM jar"));
            Assert.Equal(path + ".version-1-20261201T080000Z", migrated.BackupPath);
        }

        using SqliteFile backup = SqliteFile.OpenForReading(path + ".version-1-20261201T080000Z", _one);
        Assert.Equal("plum", Scalar(backup, "SELECT label FROM jar"));
    }

    [Fact]
    public void MigrationThatFails_LeavesTheOldVersionWhole()
    {
        using TemporaryFolder folder = new();
        string path = folder.File("a.db");
        using (SqliteFile old = Open(path, _one))
        {
            Execute(old, "INSERT INTO jar(label) VALUES ('plum')");
        }

        SqliteFormat broken = _two with { Migrations = [FirstMigration, SecondMigration + " SELECT 1; INSERT INTO nowhere VALUES (1);"] };
        Assert.Throws<WorkFailedException>(() => Open(path, broken));

        using SqliteFile again = Open(path, _one);
        Assert.Equal("plum", Scalar(again, "SELECT label FROM jar"));
        Assert.Equal(2L, Scalar(again, "SELECT count(*) FROM pragma_table_info('jar')"));
    }

    [Fact]
    public void ForeignDatabase_IsRefused_AndUntouched_EvenWhereDamageIsSetAside()
    {
        using TemporaryFolder folder = new();
        string path = folder.File("a.db");
        using (SqliteConnection foreign = new(new SqliteConnectionStringBuilder { DataSource = path, Pooling = false }.ConnectionString))
        {
            foreign.Open();
            using SqliteCommand command = foreign.CreateCommand();
            command.CommandText = "CREATE TABLE cat(name TEXT)";
            command.ExecuteNonQuery();
        }

        Dictionary<string, string> before = Digests(folder.Path);
        InputException refused = Assert.Throws<InputException>(() => Open(path, _one, DamagePolicy.SetAside));

        Assert.Contains("another kind", refused.Message);
        Assert.Equal(before, Digests(folder.Path));
    }

    [Fact]
    public void FileBegunAndNeverFilled_IsTakenAsNew()
    {
        using TemporaryFolder folder = new();
        string path = folder.File("a.db");
        File.WriteAllBytes(path, []);

        using SqliteFile file = Open(path, _one);

        Assert.Equal(1L, Scalar(file, "PRAGMA user_version"));
    }

    [Theory]
    [InlineData("garbage")]
    [InlineData("page")]
    public void DamagedFile_IsRefusedUntouched_OrSetAsideAndBegunAnew(string damage)
    {
        using TemporaryFolder folder = new();
        string path = folder.File("a.db");
        Damage(path, damage);
        Dictionary<string, string> before = Digests(folder.Path);

        WorkFailedException refused = Assert.Throws<WorkFailedException>(() => Open(path, _one));
        Assert.Contains("is damaged", refused.Message);
        Assert.Equal(before, Digests(folder.Path));

        using SqliteFile anew = Open(path, _one, DamagePolicy.SetAside);
        Assert.Equal(path + ".damaged-20261201T080000Z", anew.SetAsidePath);
        Assert.Equal(before["a.db"], Digest(anew.SetAsidePath!));
        Assert.Equal(0L, Scalar(anew, "SELECT count(*) FROM jar"));
    }

    [Fact]
    public void LockedFile_IsAStateWithItsOwnLine()
    {
        using TemporaryFolder folder = new();
        using SqliteFile first = Open(folder.File("a.db"), _one);
        using SqliteFile second = Open(folder.File("a.db"), _one);
        second.Connection.DefaultTimeout = 1;
        using SqliteTransaction held = first.Connection.BeginTransaction();

        SqliteException fault = Assert.Throws<SqliteException>(() => Execute(second, "INSERT INTO jar(label) VALUES ('x')"));

        Assert.Equal(StorageFault.Busy, SqliteFaults.KindOf(fault));
        Assert.Contains("another program", SqliteFaults.Describe(fault, first.Path));
    }

    [Fact]
    public void FullDisk_IsAStateWithItsOwnLine_AndWhatWasCommittedStays()
    {
        using TemporaryFolder folder = new();
        string path = folder.File("a.db");
        using (SqliteFile file = Open(path, _one))
        {
            Execute(file, "INSERT INTO jar(label) VALUES ('kept')");
            Execute(file, "PRAGMA max_page_count=3");
            SqliteException fault = Assert.Throws<SqliteException>(() => Execute(file, "INSERT INTO jar(label) VALUES (hex(randomblob(100000)))"));
            Assert.Equal(StorageFault.DiskFull, SqliteFaults.KindOf(fault));
            Assert.Contains("no room is left", SqliteFaults.AsWorkFailed(fault, path).Message);
        }

        using SqliteFile again = SqliteFile.OpenForReading(path, _one);
        Assert.Equal("kept", Scalar(again, "SELECT group_concat(label) FROM jar"));
    }

    [Fact]
    public void ReadingWhatIsNotThere_SaysSo()
    {
        using TemporaryFolder folder = new();
        InputException refused = Assert.Throws<InputException>(() => SqliteFile.OpenForReading(folder.File("a.db"), _one));
        Assert.Contains("is not there", refused.Message);
        Assert.Empty(Directory.GetFiles(folder.Path));
    }

    [Fact]
    public async Task Reader_SeesWhatTheWriterCommitted_WhileTheWriterIsOpen()
    {
        using TemporaryFolder folder = new();
        using SqliteFile writer = Open(folder.File("a.db"), _one);
        using SqliteFile reader = SqliteFile.OpenForReading(folder.File("a.db"), _one);
        await Task.Run(() => Execute(writer, "INSERT INTO jar(label) VALUES ('seen')"));
        Assert.Equal("seen", Scalar(reader, "SELECT label FROM jar"));
    }

    private SqliteFile Open(string path, SqliteFormat format, DamagePolicy policy = DamagePolicy.Refuse)
    {
        return SqliteFile.OpenForWriting(path, format, policy, _time);
    }

    private void Damage(string path, string damage)
    {
        if (damage == "garbage")
        {
            File.WriteAllText(path, "no database at all, only words that someone saved under this name");
            return;
        }

        using (SqliteFile file = Open(path, _one))
        {
            Execute(file, "WITH RECURSIVE n(i) AS (SELECT 1 UNION ALL SELECT i + 1 FROM n WHERE i < 500) INSERT INTO jar(label) SELECT 'label ' || i FROM n");
        }

        using FileStream stream = new(path, FileMode.Open);
        stream.Position = 4096; // the second page: the root of the table
        stream.Write(new byte[1024]);
    }

    private static object? Scalar(SqliteFile file, string sql)
    {
        using SqliteCommand command = file.Connection.CreateCommand();
        command.CommandText = sql;
        return command.ExecuteScalar();
    }

    private static void Execute(SqliteFile file, string sql)
    {
        using SqliteCommand command = file.Connection.CreateCommand();
        command.CommandText = sql;
        command.CommandTimeout = file.Connection.DefaultTimeout;
        command.ExecuteNonQuery();
    }

    private static Dictionary<string, string> Digests(string folder, string prefix = "")
    {
        return Directory.GetFiles(folder)
            .Where(file => Path.GetFileName(file).StartsWith(prefix, StringComparison.Ordinal))
            .ToDictionary(file => Path.GetFileName(file), Digest);
    }

    private static string Digest(string path)
    {
        using FileStream stream = new(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite);
        return Convert.ToHexString(SHA256.HashData(stream));
    }
}
