using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Text;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.CalibrationLog;

/// <summary>
/// Each way to tamper with a log, done to the file by somebody who knows how it is made and has dropped its triggers: what the
/// chain shows by itself, and what only a head kept elsewhere shows.
/// </summary>
public class TamperingTests
{
    private const string DropTriggers = "DROP TRIGGER records_no_update; DROP TRIGGER records_no_delete; DROP TRIGGER records_in_order; DROP TRIGGER log_once; DROP TRIGGER log_no_update; DROP TRIGGER log_no_delete; ";

    public static TheoryData<string, string?, string?> Attacks => new()
    {
        // What is done, the fault that the chain shows by itself, what the head shows.
        { "nothing", null, "agrees" },
        { "edit bytes", "edited", "agrees" },
        { "edit bytes and hash", "link", "agrees" },
        { "edit hash", "edited", "agrees" },
        { "edit column", "filed", "agrees" },
        { "edit kind", "filed", "agrees" },
        { "delete first", "gap", "agrees" },
        { "delete middle", "gap", "agrees" },
        { "delete middle and renumber", "moved", "cut-off" },
        { "swap", "moved", "agrees" },
        { "insert", "moved", "rewritten" },
        { "insert with new hashes of its own", "moved", "rewritten" },
        { "garbage", "unreadable", "rewritten" },
        { "another log's id", "foreign", "agrees" },
        // What the chain cannot show: it is whole, and only the head tells.
        { "delete last", null, "cut-off" },
        { "delete all", null, "cut-off" },
        { "rewrite from the middle", null, "rewritten" },
        { "rewrite all", null, "rewritten" },
        { "replace the whole log", null, "rewritten" },
        // Somebody else's entry at the end looks as any other; the count since the head was taken tells that there is one.
        { "append", null, "agrees" },
    };

    [Theory]
    [MemberData(nameof(Attacks))]
    public void Attack_ShowsInTheChain_OrAgainstTheHead(string attack, string? fault, string? head)
    {
        using TemporaryLog log = Filled(out LogHead kept);
        Do(log, attack);

        using CalibrationLogStore store = log.Read();
        LogVerification found = LogVerification.Of(store, null, [kept]);
        if (fault == null)
        {
            Assert.True(found.Chain.IsWhole, string.Join("; ", found.Chain.Faults));
        }
        else
        {
            Assert.Contains(fault, found.Chain.Faults.Select(static each => each.Kind));
        }

        HeadComparison compared = Assert.Single(found.Heads);
        Assert.Equal(head, compared.Kind);
        Assert.Equal(attack is "nothing" or "append", found.IsSound);
        Assert.Contains(attack == "append" ? "1 were added since" : "", compared.Text, StringComparison.Ordinal);
    }

    /// <summary>Any one byte of any entry, or of a hash beside it, changed to any other: always found, without a head.</summary>
    [Fact]
    public void AnySingleByte_IsFound()
    {
        const int Seed = 4711;
        Random random = new(Seed);
        for (int round = 0; round < 40; round++)
        {
            using TemporaryLog log = RandomLog(random, out int count);
            int index = random.Next(1, count + 1);
            byte[] bytes = log.RawBytes(index);
            int at = random.Next(bytes.Length);
            bytes[at] ^= (byte)(1 << random.Next(8));
            log.Raw(DropTriggers + "UPDATE records SET bytes = $bytes WHERE idx = $idx", ("$bytes", bytes), ("$idx", index));
            string where = $"seed {Seed}, round {round}: entry {index} of {count}, byte {at}";
            try
            {
                using CalibrationLogStore store = log.Read();
                Assert.True(store.Chain.Faults.Any(fault => fault.Index == index), where);
            }
            catch (InputException newer)
            {
                // The changed byte may have been in the version or in the name of the format: then nothing is read at all.
                Assert.Contains("newer", newer.Message, StringComparison.Ordinal);
            }
        }
    }

    /// <summary>Random logs of every kind are whole, read back, and agree with every head they ever had.</summary>
    [Fact]
    public void RandomLogs_AgreeWithEachOfTheirHeads()
    {
        const int Seed = 1999;
        Random random = new(Seed);
        for (int round = 0; round < 20; round++)
        {
            using TemporaryLog log = RandomLog(random, out int count);
            using CalibrationLogStore store = log.Read();
            LogHead[] heads = [new LogHead(0, LogReading.NoHash), .. store.Entries.Select(static (stored, i) => new LogHead(i + 1, stored.Sha256))];
            Assert.Equal(count + 1, heads.Length);
            LogVerification found = LogVerification.Of(store, null, heads);
            Assert.True(found.IsSound, $"seed {Seed}, round {round}");
            Assert.Equal(heads[^1].ToString(), store.Chain.Head);
        }
    }

    [Fact]
    public void AClockSetBack_IsNoted_AndNoFault()
    {
        using TemporaryLog log = new();
        using (CalibrationLogStore store = log.Write())
        {
            log.Time.Advance(TimeSpan.FromDays(2));
            store.Append(EntryKindsTests.Cylinder);
        }

        // The clock of the test itself cannot go backwards; another one, two days behind, stands for it.
        using (CalibrationLogStore store = CalibrationLogStore.OpenForWriting(log.Path, new Microsoft.Extensions.Time.Testing.FakeTimeProvider(SampleRecords.Noon), () => TemporaryLog.Id))
        {
            store.Append(EntryKindsTests.Cylinder);
        }

        using CalibrationLogStore read = log.Read();
        LogVerification found = LogVerification.Of(read, null, []);
        Assert.True(found.IsSound);
        Assert.Contains("entry 2 was written at 2026-06-01 12:00, before the one in front of it (2026-06-03 12:00)", Assert.Single(found.Notes), StringComparison.Ordinal);
    }

    /// <summary>
    /// A process that dies while it appends leaves the write-ahead log cut anywhere. Whatever is left, the log opens whole, with every
    /// entry whose append had returned before the cut.
    /// </summary>
    [Fact]
    public void AppendCutAnywhere_LeavesAWholeLog()
    {
        const int Seed = 815;
        Random random = new(Seed);
        using TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        List<(long Length, long Count)> committed = [];
        for (int i = 0; i < 6; i++)
        {
            store.Append(SampleRecords.Of("P-1", SampleRecords.Noon.AddHours(i)));
            committed.Add((new FileInfo(log.Path + "-wal").Length, store.Chain.Count));
        }

        byte[] main = Copy(log.Path);
        byte[] wal = Copy(log.Path + "-wal");
        for (int round = 0; round < 60; round++)
        {
            int cut = random.Next(wal.Length + 1);
            using TemporaryLog crashed = new();
            File.WriteAllBytes(crashed.Path, main);
            File.WriteAllBytes(crashed.Path + "-wal", wal[..cut]);
            long expected = committed.Where(each => each.Length <= cut).Select(static each => each.Count).DefaultIfEmpty(0).Max();
            if (expected == 0)
            {
                continue;
            }

            using CalibrationLogStore opened = crashed.Write();
            Assert.True(opened.Chain.IsWhole, $"seed {Seed}, cut {cut}");
            Assert.True(expected <= opened.Chain.Count, $"seed {Seed}, cut {cut}: {opened.Chain.Count} of {expected}");
            Assert.Equal(opened.Chain.Count + 1, opened.Append(SampleRecords.Of("P-1", SampleRecords.Noon)).Record.Index);
        }
    }

    private static byte[] Copy(string path)
    {
        using FileStream file = new(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite | FileShare.Delete);
        using MemoryStream copy = new();
        file.CopyTo(copy);
        return copy.ToArray();
    }

    private static TemporaryLog Filled(out LogHead head)
    {
        TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        store.Append(EntryKindsTests.Cylinder);
        for (int day = 0; day < 4; day++)
        {
            store.Append(SampleRecords.Of("P-1", SampleRecords.Noon.AddDays(day)));
        }

        head = new LogHead(store.Chain.Count, store.Chain.HeadSha256);
        return log;
    }

    internal static TemporaryLog RandomLog(Random random, out int count)
    {
        TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        count = random.Next(1, 12);
        for (int i = 0; i < count; i++)
        {
            log.Time.Advance(TimeSpan.FromMinutes(random.Next(1, 10_000)));
            DateTimeOffset now = log.Time.GetUtcNow();
            string probe = "P-" + (char)('1' + random.Next(3));
            LogEntry entry = random.Next(5) switch
            {
                0 => EntryKindsTests.Cylinder with { Equipment = "E-" + random.Next(4), LifeDays = 1 + (random.NextDouble() * 100), MadeOn = new DateOnly(2026, 1, 1) },
                1 => EntryKindsTests.NewMembrane with { Probe = probe, At = now, Remarks = "ä µ °C \" \\ \u2028 " + random.Next() },
                2 when i != 0 => EntryKindsTests.Withdraw($"{store.LogId}-{random.Next(1, i + 1):0000}"),
                3 => SampleRecords.Of(probe, now, random.Next(2) == 0, random.NextDouble()) with { Purpose = "check", CheckKind = "continuing" },
                _ => SampleRecords.Of(probe, now, random.Next(2) == 0, random.NextDouble()),
            };
            store.Append(entry);
        }

        return log;
    }

    /// <summary>Entries from one on, written anew as somebody would who knows the form: changed, then every index, id, link, hash and column set right.</summary>
    private static void Rewrite(TemporaryLog log, int from, Func<CalibrationRecord, CalibrationRecord> change)
    {
        string previous = from == 1 ? LogReading.NoHash : LogReading.Hash(log.RawBytes(from - 1));
        for (int index = from; index <= 5; index++)
        {
            LogEntry entry = RecordJson.ReadEntry(log.RawBytes(index), "entry") with { PreviousSha256 = previous };
            byte[] bytes = RecordJson.ToBytes(entry is CalibrationRecord record ? change(record) : entry);
            previous = LogReading.Hash(bytes);
            log.Raw("UPDATE records SET bytes = $bytes, sha256 = $sha WHERE idx = $idx", ("$bytes", bytes), ("$sha", previous), ("$idx", index));
        }
    }

    private static void Insert(TemporaryLog log, int index, string previous, long statedIndex)
    {
        CalibrationRecord forged = SampleRecords.Of("P-1", SampleRecords.Noon.AddHours(1), slope: 0.7) with
        {
            LogId = "c3a41f09b2e7",
            Index = statedIndex,
            Id = $"c3a41f09b2e7-{statedIndex:0000}",
            PreviousSha256 = previous,
            WrittenUtc = SampleRecords.Noon,
        };
        byte[] bytes = RecordJson.ToBytes(forged);
        log.Raw(
            "INSERT INTO records (idx, calibration_id, kind, probe_id, completed_us, bytes, sha256) VALUES ($idx, $id, 'calibration', 'P-1', $at, $bytes, $sha)",
            ("$idx", index), ("$id", forged.Id + (index == statedIndex ? "" : "x")), ("$at", LogReading.Microseconds(forged.CompletedUtc)), ("$bytes", bytes), ("$sha", LogReading.Hash(bytes)));
    }

    private static void Do(TemporaryLog log, string attack)
    {
        if (attack == "replace the whole log")
        {
            File.Delete(log.Path);
            using CalibrationLogStore other = CalibrationLogStore.OpenForWriting(log.Path, log.Time, static () => new Guid("0badc0de-0000-4d11-8000-000000000000"));
            for (int day = 0; day < 5; day++)
            {
                other.Append(SampleRecords.Of("P-1", SampleRecords.Noon.AddDays(day)));
            }

            return;
        }

        log.Raw(DropTriggers);
        byte[] third = log.RawBytes(3);
        byte[] edited = Encoding.UTF8.GetBytes(Encoding.UTF8.GetString(third).Replace("\"slope\": 0.62", "\"slope\": 0.65", StringComparison.Ordinal));
        Assert.NotEqual(third, edited);
        switch (attack)
        {
            case "nothing":
                break;
            case "edit bytes":
                log.Raw("UPDATE records SET bytes = $bytes WHERE idx = 3", ("$bytes", edited));
                break;
            case "edit bytes and hash":
                log.Raw("UPDATE records SET bytes = $bytes, sha256 = $sha WHERE idx = 3", ("$bytes", edited), ("$sha", LogReading.Hash(edited)));
                break;
            case "edit hash":
                log.Raw("UPDATE records SET sha256 = replace(sha256, substr(sha256, 1, 1), 'z') WHERE idx = 3");
                break;
            case "edit column":
                log.Raw("UPDATE records SET probe_id = 'P-9' WHERE idx = 3");
                break;
            case "edit kind":
                log.Raw("UPDATE records SET kind = 'check' WHERE idx = 3");
                break;
            case "delete first":
                log.Raw("DELETE FROM records WHERE idx = 1");
                break;
            case "delete middle":
                log.Raw("DELETE FROM records WHERE idx = 3");
                break;
            case "delete middle and renumber":
                log.Raw("DELETE FROM records WHERE idx = 3; UPDATE records SET idx = 3 WHERE idx = 4; UPDATE records SET idx = 4 WHERE idx = 5");
                break;
            case "swap":
                log.Raw("UPDATE records SET idx = 12 WHERE idx = 3; UPDATE records SET idx = 3 WHERE idx = 4; UPDATE records SET idx = 4 WHERE idx = 12");
                break;
            case "insert":
                log.Raw("UPDATE records SET idx = 6 WHERE idx = 5; UPDATE records SET idx = 5 WHERE idx = 4; UPDATE records SET idx = 4 WHERE idx = 3");
                Insert(log, 3, LogReading.Hash(log.RawBytes(2)), 3 + 90);
                break;
            case "insert with new hashes of its own":
                log.Raw("UPDATE records SET idx = 6, calibration_id = 'a' WHERE idx = 5; UPDATE records SET idx = 5, calibration_id = 'b' WHERE idx = 4; UPDATE records SET idx = 4, calibration_id = 'c' WHERE idx = 3");
                Insert(log, 3, LogReading.Hash(log.RawBytes(2)), 3);
                break;
            case "garbage":
                log.Raw("UPDATE records SET bytes = x'7B', sha256 = $sha WHERE idx = 5", ("$sha", LogReading.Hash([0x7B])));
                break;
            case "another log's id":
                log.Raw("UPDATE log SET log_id = '0badc0de0000'");
                break;
            case "delete last":
                log.Raw("DELETE FROM records WHERE idx = 5");
                break;
            case "delete all":
                log.Raw("DELETE FROM records");
                break;
            case "rewrite from the middle":
                Rewrite(log, 3, static record => record with { Result = record.Result with { Slope = 0.65 } });
                break;
            case "rewrite all":
                Rewrite(log, 1, static record => record with { Result = record.Result with { Slope = 0.65 } });
                break;
            case "append":
                Insert(log, 6, LogReading.Hash(log.RawBytes(5)), 6);
                break;
            default:
                throw new ArgumentException(attack, nameof(attack));
        }
    }
}
