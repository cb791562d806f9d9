using System;
using System.IO;
using System.Linq;
using System.Text;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.CalibrationLog;

/// <summary>Random logs out and in again: the same bytes, or a refusal that names a line.</summary>
public class ExchangeTests
{
    [Fact]
    public void RandomLogs_ComeInWithTheVeryBytesThatWentOut()
    {
        const int Seed = 42;
        Random random = new(Seed);
        for (int round = 0; round < 15; round++)
        {
            using TemporaryLog log = TamperingTests.RandomLog(random, out int count);
            string file = Export(log);
            using TemporaryLog other = new();
            using CalibrationLogStore store = CalibrationLogStore.OpenForWriting(other.Path, other.Time, static () => new Guid("0badc0de-0000-4d11-8000-000000000000"));
            Assert.Equal(count, store.Import(LogImport.Read(file)));
            Assert.Equal(0, store.Import(LogImport.Read(file)));

            using CalibrationLogStore source = log.Read();
            ImportedLog imported = Assert.Single(store.ImportedLogs);
            Assert.Equal(source.Chain.Head, imported.Chain.Head);
            foreach ((StoredEntry ours, StoredEntry theirs) in source.Entries.Zip(imported.Entries))
            {
                Assert.Equal(source.BytesOf(ours.Entry), store.BytesOf(theirs.Entry));
                Assert.Equal(source.IsWithdrawn(ours.Entry.Id), store.IsWithdrawn(theirs.Entry.Id));
            }
        }
    }

    /// <summary>An export cut at any byte, or with any one byte changed, is refused with its line or is still the whole log.</summary>
    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void AnExportCutOrChangedAnywhere_IsRefused_OrWhole(bool cut)
    {
        const int Seed = 77;
        Random random = new(Seed);
        using TemporaryLog log = TamperingTests.RandomLog(random, out _);
        string file = Export(log);
        byte[] whole = File.ReadAllBytes(file);
        string head = LogImport.Read(file).Chain.Head;
        int refused = 0;
        for (int round = 0; round < 150; round++)
        {
            byte[] damaged = cut ? whole[..random.Next(whole.Length)] : [.. whole];
            if (!cut)
            {
                damaged[random.Next(damaged.Length)] ^= (byte)(1 << random.Next(8));
            }

            File.WriteAllBytes(file, damaged);
            try
            {
                // A change outside of what is hashed (the time of the export, a name of an unknown property) alters nothing of the log.
                Assert.Equal(head, LogImport.Read(file).Chain.Head);
            }
            catch (InputException wrong)
            {
                refused++;
                Assert.Contains(", line ", wrong.Message, StringComparison.Ordinal);
            }
        }

        Assert.InRange(refused, 100, 150);
    }

    [Fact]
    public void ABrokenLog_IsNotExported()
    {
        using TemporaryLog log = new();
        using (CalibrationLogStore store = log.Write())
        {
            store.Append(SampleRecords.Of("P-1", SampleRecords.Noon));
        }

        log.Raw("DROP TRIGGER records_no_update; UPDATE records SET probe_id = 'P-9'");
        using CalibrationLogStore broken = log.Read();
        StringWriter nothing = new();
        WorkFailedException refused = Assert.Throws<WorkFailedException>(() => LogExport.Write(broken, null, nothing, SampleRecords.Noon, "probecal 0.1.0"));
        Assert.Contains("its chain is broken", refused.Message, StringComparison.Ordinal);
        Assert.Equal("", nothing.ToString());
    }

    private static string Export(TemporaryLog log)
    {
        using CalibrationLogStore source = log.Read();
        string file = Path.ChangeExtension(log.Path, ".jsonl");
        using StreamWriter writer = new(file, append: false, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false));
        LogExport.Write(source, null, writer, SampleRecords.Noon, "probecal 0.1.0");
        return file;
    }
}
