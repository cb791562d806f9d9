using System;
using System.IO;
using System.Linq;
using System.Security.Cryptography;
using System.Text;
using Microsoft.Data.Sqlite;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.CalibrationLog;

public class CalibrationLogStoreTests
{
    private const string DropTriggers = "DROP TRIGGER records_no_update; DROP TRIGGER records_no_delete; DROP TRIGGER records_in_order; ";

    [Fact]
    public void Append_GivesIdIndexAndLink_AndReadsBackEqual()
    {
        using TemporaryLog log = new();
        StoredCalibration first;
        StoredCalibration second;
        using (CalibrationLogStore store = log.Write())
        {
            Assert.Equal("c3a41f09b2e7", store.LogId);
            first = store.Append(SampleRecords.Of("P-1", SampleRecords.Noon));
            second = store.Append(SampleRecords.Of("P-1", SampleRecords.Noon.AddDays(1)));
        }

        Assert.Equal("c3a41f09b2e7-0001", first.Record.Id);
        Assert.Equal(new string('0', 64), first.Record.PreviousSha256);
        Assert.Equal(first.Sha256, second.Record.PreviousSha256);
        using CalibrationLogStore again = log.Read();
        Assert.True(again.Chain.IsWhole, string.Join("; ", again.Chain.Faults));
        Assert.Equal(2, again.Chain.Count);
        Assert.Equal(second.Sha256, again.Chain.HeadSha256);
        Assert.Equal(RecordJson.ToBytes(second.Record), RecordJson.ToBytes(again.Records[1].Record));
    }

    [Fact]
    public void Hash_IsSha256OverTheStoredBytes()
    {
        using TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        StoredCalibration stored = store.Append(SampleRecords.Of("P-1", SampleRecords.Noon));

        byte[] bytes = log.RawBytes(1);
        Assert.Equal(Convert.ToHexStringLower(SHA256.HashData(bytes)), stored.Sha256);
        Assert.Equal(bytes, store.BytesOf(stored));
        Assert.Contains("\"format\": \"probecal-calibration-record\"", Encoding.UTF8.GetString(bytes), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("UPDATE records SET probe_id = 'X'", "never changed")]
    [InlineData("UPDATE records SET bytes = x'00' WHERE idx = 1", "never changed")]
    [InlineData("DELETE FROM records", "never deleted")]
    [InlineData("DELETE FROM records WHERE idx = 2", "never deleted")]
    [InlineData("INSERT OR REPLACE INTO records SELECT idx, calibration_id, probe_id, completed_us, x'00', sha256, kind FROM records WHERE idx = 1", "only added at the end")]
    [InlineData("INSERT INTO records SELECT 9, 'x', probe_id, completed_us, bytes, sha256, kind FROM records WHERE idx = 1", "only added at the end")]
    [InlineData("UPDATE log SET log_id = 'x'", "keeps its id")]
    [InlineData("DELETE FROM log", "keeps its id")]
    [InlineData("INSERT OR REPLACE INTO log VALUES (1, 'x', 'y')", "keeps its id")]
    public void Triggers_RefuseEveryChange(string sql, string reason)
    {
        using TemporaryLog log = new();
        using (CalibrationLogStore store = log.Write())
        {
            store.Append(SampleRecords.Of("P-1", SampleRecords.Noon));
            store.Append(SampleRecords.Of("P-1", SampleRecords.Noon.AddDays(1)));
        }

        SqliteException refused = Assert.Throws<SqliteException>(() => log.Raw(sql));
        Assert.Contains(reason, refused.Message, StringComparison.Ordinal);
        using CalibrationLogStore again = log.Read();
        Assert.True(again.Chain.IsWhole);
        Assert.Equal(2, again.Chain.Count);
    }

    [Fact]
    public void EditedBytes_BreakTheChain_AndTheOthersStayReadable()
    {
        using TemporaryLog log = ThreeRecords();
        byte[] edited = Encoding.UTF8.GetBytes(Encoding.UTF8.GetString(log.RawBytes(2)).Replace("\"slope\": 0.62", "\"slope\": 0.65", StringComparison.Ordinal));
        log.Raw(DropTriggers + "UPDATE records SET bytes = $bytes WHERE idx = 2", ("$bytes", edited));

        using CalibrationLogStore store = log.Read();
        Assert.False(store.Chain.IsWhole);
        Assert.Contains(store.Chain.Faults, fault => fault.Text.StartsWith("record 2 was changed after it was stored", StringComparison.Ordinal));
        Assert.Equal(3, store.Records.Count);
        WorkFailedException refused = Assert.Throws<WorkFailedException>(store.RequireWhole);
        Assert.Contains("chain of calibration records is broken: record 2", refused.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void EditedBytesWithANewHash_AreFoundAtTheNextLink()
    {
        using TemporaryLog log = ThreeRecords();
        byte[] edited = Encoding.UTF8.GetBytes(Encoding.UTF8.GetString(log.RawBytes(2)).Replace("\"slope\": 0.62", "\"slope\": 0.65", StringComparison.Ordinal));
        log.Raw(
            DropTriggers + "UPDATE records SET bytes = $bytes, sha256 = $sha WHERE idx = 2",
            ("$bytes", edited),
            ("$sha", Convert.ToHexStringLower(SHA256.HashData(edited))));

        using CalibrationLogStore store = log.Read();
        Assert.Contains(store.Chain.Faults, fault => fault.Text.StartsWith("record 3 does not continue", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("DELETE FROM records WHERE idx = 2", "record 3 follows record 1")]
    [InlineData("UPDATE records SET idx = 12 WHERE idx = 1; UPDATE records SET idx = 1 WHERE idx = 2; UPDATE records SET idx = 2 WHERE idx = 12", "record 1 does not continue")]
    [InlineData("UPDATE records SET probe_id = 'P-9' WHERE idx = 3", "record 3 is filed under another")]
    [InlineData("UPDATE records SET bytes = x'7B' WHERE idx = 3", "record 3: not a readable calibration record")]
    public void DeletingReorderingRefilingAndGarbage_AreFound(string sql, string fault)
    {
        using TemporaryLog log = ThreeRecords();
        log.Raw(DropTriggers + sql);

        using CalibrationLogStore store = log.Read();
        Assert.Contains(store.Chain.Faults, found => found.Text.StartsWith(fault, StringComparison.Ordinal));
    }

    [Fact]
    public void Append_IsRefusedOnABrokenChain_AndAddsNothing()
    {
        using TemporaryLog log = ThreeRecords();
        log.Raw(DropTriggers + "DELETE FROM records WHERE idx = 2");

        using CalibrationLogStore store = log.Write();
        Assert.Throws<WorkFailedException>(() => store.Append(SampleRecords.Of("P-1", SampleRecords.Noon)));
        Assert.Equal(2, store.Records.Count);
    }

    [Fact]
    public void NewerDatabase_IsRefusedAndNotTouched()
    {
        using TemporaryLog log = ThreeRecords();
        log.Raw("PRAGMA user_version = 99; PRAGMA wal_checkpoint(TRUNCATE);");
        byte[] before = File.ReadAllBytes(log.Path);

        InputException writing = Assert.Throws<InputException>(() => log.Write());
        Assert.Throws<InputException>(() => log.Read());

        Assert.Contains("99", writing.Message, StringComparison.Ordinal);
        Assert.Equal(before, File.ReadAllBytes(log.Path));
    }

    [Fact]
    public void NewerRecord_IsRefused_NotCalledDamaged()
    {
        using TemporaryLog log = ThreeRecords();
        byte[] newer = Encoding.UTF8.GetBytes("{\"format\":\"probecal-calibration-record\",\"version\":7,\"somethingNew\":[]}");
        log.Raw(DropTriggers + "UPDATE records SET bytes = $bytes WHERE idx = 3", ("$bytes", newer));

        InputException refused = Assert.Throws<InputException>(() => log.Read());
        Assert.Contains("version 7 of the calibration record is newer", refused.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void LatestFor_IsTheLastThatPassed_ByThen_ForThatProbe()
    {
        using TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        DateTimeOffset noon = SampleRecords.Noon;
        store.Append(SampleRecords.Of("P-1", noon));
        store.Append(SampleRecords.Of("P-2", noon.AddDays(1)));
        store.Append(SampleRecords.Of("P-1", noon.AddDays(2)));
        store.Append(SampleRecords.Of("P-1", noon.AddDays(3), pass: false));

        Assert.Null(store.LatestFor("P-1", noon.AddSeconds(-1)));
        Assert.Equal(1, store.LatestFor("P-1", noon)?.Record.Index);
        Assert.Equal(1, store.LatestFor("P-1", noon.AddDays(1.5))?.Record.Index);
        Assert.Equal(3, store.LatestFor("P-1", noon.AddDays(9))?.Record.Index);
        Assert.Equal(2, store.LatestFor("P-2", noon.AddDays(9))?.Record.Index);
        Assert.Null(store.LatestFor("P-3", noon.AddDays(9)));
        Assert.Equal("P-2", store.Find("c3a41f09b2e7-0002")?.Record.Probe.Id);
        Assert.Null(store.Find("c3a41f09b2e7-9999"));
    }

    [Fact]
    public void TruncatedFile_IsRefusedAndLeftAsItIs()
    {
        using TemporaryLog log = ThreeRecords();
        log.Raw("PRAGMA wal_checkpoint(TRUNCATE)");
        byte[] whole = File.ReadAllBytes(log.Path);
        byte[] half = whole.Take(whole.Length / 2).ToArray();
        File.WriteAllBytes(log.Path, half);

        Assert.Throws<WorkFailedException>(() => log.Write());
        Assert.Equal(half, File.ReadAllBytes(log.Path));
    }

    private static TemporaryLog ThreeRecords()
    {
        TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        for (int day = 0; day < 3; day++)
        {
            store.Append(SampleRecords.Of("P-1", SampleRecords.Noon.AddDays(day)));
        }

        return log;
    }
}
