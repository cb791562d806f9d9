using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using Microsoft.Data.Sqlite;
using Microsoft.Extensions.Time.Testing;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Journal;
using ProbeCal.Station.Storage;
using ProbeCal.Station.Tests.Storage;
using Xunit;

namespace ProbeCal.Station.Tests.Journal;

public class StationJournalTests
{
    private static readonly DateTimeOffset _start = new(2026, 12, 1, 8, 0, 0, TimeSpan.Zero);

    private readonly FakeTimeProvider _time = new(_start);

    [Fact]
    public void Sample_IsKeptWithItsRawTextInputsAndReading_AndItsMessageWaits()
    {
        using TemporaryFolder folder = new();
        using StationJournal journal = Open(folder);

        journal.Commit(work => Sample(work, 41.25, "{\"a\":1}", null));

        using SqliteFile reader = Look(folder);
        Assert.Equal(
            "pier|do-1|1|1796112000000000|1|a line|41.25|18.5|line|1013.25|barometer b-1|cal-9|{\"a\":1}",
            Text(reader, "SELECT station, probe, sequence, time_us, time_from_line, raw_text, signal, temperature_celsius, temperature_source, pressure_hectopascal, pressure_source, calibration_id, reading FROM sample"));
        OutboxRow waiting = Assert.Single(journal.Pending(0, 10));
        Assert.Equal("t/1", waiting.Message.Topic);
        Assert.Equal("payload 1", Encoding.UTF8.GetString(waiting.Message.Payload.Span));
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void SignalThatIsNoNumber_IsKeptAsMissing_WithTheReason(double signal)
    {
        using TemporaryFolder folder = new();
        using StationJournal journal = Open(folder);

        journal.Commit(work => Sample(work, signal, null, "the signal is not a number"));

        using SqliteFile reader = Look(folder);
        Assert.Equal("||the signal is not a number", Text(reader, "SELECT signal, reading, no_reading_reason FROM sample"));
    }

    [Fact]
    public void RowWithNeitherReadingNorReason_IsRefused()
    {
        using TemporaryFolder folder = new();
        using StationJournal journal = Open(folder);
        Assert.Throws<JournalException>(() => journal.Commit(work => Sample(work, 1, null, null)));
        Assert.Equal(0, journal.CountPending());
    }

    [Fact]
    public void Sequence_GoesOnAfterRestarts_AndAfterEverySampleWasDeleted()
    {
        using TemporaryFolder folder = new();
        List<long> given = [];
        for (int run = 0; run < 3; run++)
        {
            using StationJournal journal = Open(folder);
            journal.Commit(work => given.Add(Sample(work, 1, "{}", null)));
            journal.Commit(work => given.Add(Sample(work, 1, "{}", null)));
            journal.Delivered(long.MaxValue);
            Assert.Equal(2, journal.Expire(_start.AddDays(1), 100));
        }

        Assert.Equal([1L, 2, 3, 4, 5, 6], given);
    }

    [Fact]
    public void Sequence_IsCountedPerProbe()
    {
        using TemporaryFolder folder = new();
        using StationJournal journal = Open(folder);
        List<long> given = [];
        journal.Commit(work =>
        {
            given.Add(work.NextSequence("pier", "do-1"));
            given.Add(work.NextSequence("pier", "do-2"));
            given.Add(work.NextSequence("pier", "do-1"));
            given.Add(work.NextSequence("weir", "do-1"));
        });
        Assert.Equal([1L, 1, 2, 1], given);
    }

    [Fact]
    public void FailedTransaction_LeavesNothing_AndTheNextOneTakesTheSameNumber()
    {
        using TemporaryFolder folder = new();
        using StationJournal journal = Open(folder);
        long failed = 0;
        Assert.Throws<InvalidOperationException>(() => journal.Commit(work =>
        {
            failed = Sample(work, 1, "{}", null);
            throw new InvalidOperationException("in the middle");
        }));

        long next = 0;
        journal.Commit(work => next = Sample(work, 1, "{}", null));

        Assert.Equal(failed, next);
        Assert.Single(journal.Pending(0, 10));
    }

    [Fact]
    public void FullDisk_LosesNothingJournaledBefore_AndGoesOnWhenThereIsRoom()
    {
        using TemporaryFolder folder = new();
        using StationJournal journal = Open(folder);
        journal.Commit(work => Sample(work, 1, "{}", null));
        string big = new('x', 200_000);
        journal.CapPages(20);

        JournalException fault = Assert.Throws<JournalException>(() => journal.Commit(work => Sample(work, 2, "{}", null, big)));
        Assert.True(fault.IsDiskFull);
        Assert.Contains("no room is left", fault.Message);
        using (SqliteFile reader = Look(folder))
        {
            Assert.Equal("1", Text(reader, "SELECT count(*) FROM sample"));
        }

        journal.CapPages(1_000_000);
        long next = 0;
        journal.Commit(work => next = Sample(work, 2, "{}", null, big));
        Assert.Equal(2, next);
        Assert.Equal(2, journal.CountPending());
    }

    [SkippableFact]
    public void FullDisk_OfARealFileSystem_IsToldAndNothingJournaledIsLost()
    {
        using SmallDisk disk = SmallDisk.TryMount();
        using StationJournal journal = StationJournal.Open(System.IO.Path.Combine(disk.Path, "journal.db"), _time);
        int written = 0;
        JournalException fault = Assert.Throws<JournalException>(() =>
        {
            while (written < 100_000)
            {
                journal.Commit(work => Sample(work, written, "{}", null, new string('x', 2_000)));
                written++;
            }
        });

        Assert.True(fault.IsDiskFull);
        Assert.Contains("no room is left", fault.Message);
        Assert.InRange(written, 10, 100_000);
        using SqliteFile reader = SqliteFile.OpenForReading(journal.Path, JournalFormat.Format);
        Assert.Equal(written.ToString(CultureInfo.InvariantCulture) + "|" + written.ToString(CultureInfo.InvariantCulture), Text(reader, "SELECT count(*), max(sequence) FROM sample"));
    }

    [Fact]
    public void Delivered_TakesOnlyTheMessages_AndKeepsTheSamples()
    {
        using TemporaryFolder folder = new();
        using StationJournal journal = Open(folder);
        journal.Commit(work =>
        {
            Sample(work, 1, "{}", null);
            Sample(work, 2, "{}", null);
            Sample(work, 3, "{}", null);
        });

        journal.Delivered(journal.Pending(0, 10)[1].Id);

        Assert.Equal("payload 3", Encoding.UTF8.GetString(Assert.Single(journal.Pending(0, 10)).Message.Payload.Span));
        using SqliteFile reader = Look(folder);
        Assert.Equal("3", Text(reader, "SELECT count(*) FROM sample"));
    }

    [Fact]
    public void Expire_TakesOldSamples_AndLeavesMessagesThatWait()
    {
        using TemporaryFolder folder = new();
        using StationJournal journal = Open(folder);
        journal.Commit(work => Sample(work, 1, "{}", null));
        _time.Advance(TimeSpan.FromDays(2));
        journal.Commit(work => Sample(work, 2, "{}", null));

        Assert.Equal(1, journal.Expire(_time.GetUtcNow().AddDays(-1), 100));

        using SqliteFile reader = Look(folder);
        Assert.Equal("2", Text(reader, "SELECT signal FROM sample"));
        Assert.Equal(2, journal.CountPending());
    }

    [Fact]
    public void Expire_TakesOldEventsToo_SamplesFirst_AndNeverMoreThanAsked()
    {
        using TemporaryFolder folder = new();
        using StationJournal journal = Open(folder);
        journal.Commit(work =>
        {
            Sample(work, 1, "{}", null);
            work.Add(new JournalEvent(_start, "gap", "old 1"));
            work.Add(new JournalEvent(_start, "gap", "old 2"));
            work.Add(new JournalEvent(_start.AddDays(2), "gap", "new"));
        });

        Assert.Equal(2, journal.Expire(_start.AddDays(1), 2));
        using SqliteFile reader = Look(folder);
        Assert.Equal("0", Text(reader, "SELECT count(*) FROM sample"));
        Assert.Equal("old 2,new", Text(reader, "SELECT group_concat(text) FROM event"));

        Assert.Equal(1, journal.Expire(_start.AddDays(1), 2));
        Assert.Equal("new", Text(reader, "SELECT group_concat(text) FROM event"));
        Assert.Equal(0, journal.Expire(_start.AddDays(1), 2));
    }

    [Fact]
    public void OutboxIds_AreNotGivenAgain_AfterTheOutboxWasEmptied()
    {
        using TemporaryFolder folder = new();
        using StationJournal journal = Open(folder);
        journal.Commit(work => Sample(work, 1, "{}", null));
        long first = journal.Pending(0, 1)[0].Id;
        journal.Delivered(first);
        journal.Commit(work => Sample(work, 2, "{}", null));
        Assert.True(first < journal.Pending(0, 1)[0].Id);
    }

    [Fact]
    public void RejectedLines_AreKeptWithTheirReason_TheNewestOnly_AndAllAreCounted()
    {
        using TemporaryFolder folder = new();
        using StationJournal journal = StationJournal.Open(folder.File("journal.db"), _time, rejectedLinesKept: 3);
        for (int i = 1; i <= 5; i++)
        {
            journal.Commit(work => work.Add(new RejectedLine(_start, "garbage " + i.ToString(CultureInfo.InvariantCulture), "too few fields")));
        }

        using SqliteFile reader = Look(folder);
        Assert.Equal("garbage 3,garbage 4,garbage 5|too few fields|5", Text(reader, "SELECT group_concat(raw_text), max(reason), max(id) FROM rejected_line"));
    }

    [Fact]
    public void LastSampleTime_IsThatOfTheHighestSequence_AcrossRestarts()
    {
        using TemporaryFolder folder = new();
        using (StationJournal journal = Open(folder))
        {
            Assert.Null(journal.LastSampleTime("pier", "do-1"));
            journal.Commit(work => Sample(work, 1, "{}", null));
            _time.Advance(TimeSpan.FromMinutes(3));
            journal.Commit(work => Sample(work, 2, "{}", null));
        }

        using StationJournal again = Open(folder);
        Assert.Equal(_start.AddMinutes(3), again.LastSampleTime("pier", "do-1"));
        Assert.Null(again.LastSampleTime("pier", "do-2"));
    }

    [Fact]
    public void Event_IsKept()
    {
        using TemporaryFolder folder = new();
        using StationJournal journal = Open(folder);
        journal.Commit(work => work.Add(new JournalEvent(_start, "source-lost", "the port was pulled out")));
        using SqliteFile reader = Look(folder);
        Assert.Equal("1796112000000000|source-lost|the port was pulled out", Text(reader, "SELECT time_us, kind, text FROM event"));
    }

    [Fact]
    public void DamagedJournal_IsKeptAside_AndTheNewOneGivesNoNumberTwice()
    {
        using TemporaryFolder folder = new();
        long last = 0;
        using (StationJournal first = Open(folder))
        {
            for (int i = 0; i < 50; i++)
            {
                first.Commit(work => last = Sample(work, i, "{}", null));
            }
        }

        File.WriteAllText(folder.File("journal.db"), "overwritten by something else, long enough to be no empty file");
        using (StationJournal second = Open(folder))
        {
            Assert.True(File.Exists(second.SetAsidePath));
        }

        // Stopped before its first sample and started again: the counter is still the one to be careful with.
        using StationJournal third = Open(folder);
        long next = 0;
        third.Commit(work => next = Sample(work, 1, "{}", null));
        Assert.True(last < next);
        Assert.Equal(_start.ToUnixTimeMilliseconds(), next);
    }

    [Fact]
    public void JournalOfANewerVersion_IsRefused_Untouched()
    {
        using TemporaryFolder folder = new();
        Open(folder).Dispose();
        using (SqliteFile file = SqliteFile.OpenForWriting(folder.File("journal.db"), JournalFormat.Format, DamagePolicy.Refuse, _time))
        {
            Text(file, "PRAGMA user_version=99");
        }

        byte[] before = File.ReadAllBytes(folder.File("journal.db"));
        InputException refused = Assert.Throws<InputException>(() => Open(folder));

        Assert.Contains("version 99", refused.Message);
        Assert.Equal(before, File.ReadAllBytes(folder.File("journal.db")));
        Assert.Equal(["journal.db"], Directory.GetFiles(folder.Path).Select(System.IO.Path.GetFileName));
    }

    [Fact]
    public void ReleasedVersion1_Opens_WithEverythingInIt_AndGoesOn()
    {
        // Written by a station with four samples, two rejected lines and a broker that refused the readings.
        using TemporaryFolder folder = new();
        File.Copy(Repository.File("tests", "Formats", "journal", "version-1.db"), folder.File("journal.db"));
        using StationJournal journal = Open(folder);

        using SqliteFile reader = Look(folder);
        Assert.Equal("4|3|2|2", Text(reader, "SELECT (SELECT count(*) FROM sample), (SELECT count(reading) FROM sample), (SELECT count(*) FROM rejected_line), (SELECT count(*) > 1 FROM event) + 1"));
        Assert.Contains(journal.Pending(0, 100), row => Encoding.UTF8.GetString(row.Message.Payload.Span).Contains("\"sequence\":1,", StringComparison.Ordinal));
        Assert.Equal(new DateTimeOffset(2026, 6, 2, 12, 0, 4, TimeSpan.Zero), journal.LastSampleTime("tarn", "do-1"));
        long next = 0;
        journal.Commit(work => next = work.NextSequence("tarn", "do-1"));
        Assert.Equal(5, next);
    }

    private StationJournal Open(TemporaryFolder folder)
    {
        return StationJournal.Open(folder.File("journal.db"), _time);
    }

    private long Sample(JournalTransaction work, double signal, string? reading, string? reason, string line = "a line")
    {
        long sequence = work.NextSequence("pier", "do-1");
        work.Add(new SampleRow
        {
            Station = "pier",
            Probe = "do-1",
            Sequence = sequence,
            Raw = new RawSample(_time.GetUtcNow(), line, signal) { TimeFromLine = true },
            TemperatureCelsius = new SourcedValue(18.5, "line"),
            PressureHectopascal = new SourcedValue(1013.25, "barometer b-1"),
            Salinity = new SourcedValue(null, "none"),
            CalibrationId = "cal-9",
            Reading = reading,
            NoReadingReason = reason,
        });
        string payload = "payload " + sequence.ToString(CultureInfo.InvariantCulture);
        work.Enqueue(new Message("t/" + sequence.ToString(CultureInfo.InvariantCulture), "application/json", Encoding.UTF8.GetBytes(payload)));
        return sequence;
    }

    private static SqliteFile Look(TemporaryFolder folder)
    {
        return SqliteFile.OpenForReading(folder.File("journal.db"), JournalFormat.Format);
    }

    private static string Text(SqliteFile file, string sql)
    {
        using SqliteCommand command = file.Connection.CreateCommand();
        command.CommandText = sql;
        using SqliteDataReader reader = command.ExecuteReader();
        return reader.Read()
            ? string.Join('|', Enumerable.Range(0, reader.FieldCount).Select(i => Convert.ToString(reader.GetValue(i), CultureInfo.InvariantCulture)))
            : "";
    }
}
