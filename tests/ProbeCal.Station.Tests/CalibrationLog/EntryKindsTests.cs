using System;
using System.IO;
using System.Linq;
using System.Text.Json;
using Json.Schema;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.CalibrationLog;

/// <summary>The other kinds of entries: their samples, their schemas, and what the log answers about them.</summary>
public class EntryKindsTests
{
    private static readonly DateTimeOffset Noon = SampleRecords.Noon;

    internal static EquipmentRecord Cylinder { get; } = new()
    {
        Equipment = "CYL-4",
        EquipmentKind = "cylinder",
        Description = "oxygen in nitrogen",
        Certificate = "K-1182",
        CertificateValue = new RecordedQuantity { Value = 0.1002, Unit = "1", StandardUncertainty = 0.0005, Source = "certificate" },
        CalibratedOn = new DateOnly(2026, 2, 3),
        DueOn = new DateOnly(2028, 2, 3),
        By = "tester",
        Software = "probecal 0.1.0",
    };

    internal static ServiceRecord NewMembrane { get; } = new()
    {
        Probe = "P-1",
        Event = ServiceRecord.MembraneChanged,
        At = Noon.AddHours(-3),
        Membrane = "M-17",
        Remarks = "the old one had a crease",
        Software = "probecal 0.1.0",
    };

    internal static AmendmentRecord Withdraw(string id)
    {
        return new AmendmentRecord { Of = id, Reason = "the barometer was read in the wrong unit", Software = "probecal 0.1.0" };
    }

    [Fact]
    public void EachKind_IsWrittenAsItsSample_AndKeepsToItsSchema()
    {
        using TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        LogEntry[] entries = [Cylinder, NewMembrane, Withdraw("c3a41f09b2e7-0002")];
        string[] names = ["equipment", "service", "amendment"];
        for (int i = 0; i < entries.Length; i++)
        {
            byte[] bytes = store.BytesOf(store.Append(entries[i]).Entry);
            string sample = Path.Combine(FormatSamplesTests.Root, "tests/Formats", names[i], "version-1.json");
            if (Environment.GetEnvironmentVariable("PROBECAL_UPDATE") == "1" && !File.Exists(sample))
            {
                File.WriteAllBytes(sample, bytes);
            }

            Assert.Equal(File.ReadAllText(sample), System.Text.Encoding.UTF8.GetString(bytes));
            AssertValid(bytes, names[i]);
        }
    }

    [Fact]
    public void KindsStandInOneChain_AndAreReadBackEqual()
    {
        using TemporaryLog log = new();
        using (CalibrationLogStore store = log.Write())
        {
            store.Append(Cylinder);
            store.Append(SampleRecords.Of("P-1", Noon));
            store.Append(NewMembrane);
            store.Append(Withdraw("c3a41f09b2e7-0002"));
        }

        using CalibrationLogStore again = log.Read();
        Assert.True(again.Chain.IsWhole, string.Join("; ", again.Chain.Faults));
        Assert.Equal(4, again.Chain.Count);
        Assert.Equal(["equipment", "calibration", "service", "amendment"], again.Entries.Select(stored => stored.Entry.Kind));
        Assert.Equal(2, Assert.Single(again.Records).Record.Index);
        Assert.Equal("0.1002", Number.Print(Assert.IsType<EquipmentRecord>(again.Entries[0].Entry).CertificateValue!.Value));
        Assert.Equal("M-17", Assert.Single(again.ServiceFor("P-1")).Membrane);
        Assert.Equal(Noon, again.Entries[3].Entry.WrittenUtc);
    }

    [Fact]
    public void Withdrawn_IsNotInForce_AndAWithdrawnWithdrawalGivesItBack()
    {
        using TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        string first = store.Append(SampleRecords.Of("P-1", Noon)).Record.Id;
        string second = store.Append(SampleRecords.Of("P-1", Noon.AddDays(1))).Record.Id;
        Assert.Equal(second, store.LatestFor("P-1", Noon.AddDays(2))?.Record.Id);

        string withdrawal = store.Append(Withdraw(second)).Entry.Id;
        Assert.True(store.IsWithdrawn(second));
        Assert.False(store.IsWithdrawn(first));
        Assert.Equal(first, store.LatestFor("P-1", Noon.AddDays(2))?.Record.Id);
        Assert.Equal(2, store.Records.Count);

        store.Append(Withdraw(withdrawal));
        Assert.False(store.IsWithdrawn(second));
        Assert.True(store.IsWithdrawn(withdrawal));
        Assert.Equal(second, store.LatestFor("P-1", Noon.AddDays(2))?.Record.Id);
    }

    [Fact]
    public void Replaced_IsNotInForce_ThoughTheNewOneFailed()
    {
        using TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        string first = store.Append(SampleRecords.Of("P-1", Noon)).Record.Id;
        StoredCalibration second = store.Append(SampleRecords.Of("P-1", Noon.AddHours(1), pass: false) with { Replaces = first, ReplacesReason = "wrong salinity" });

        Assert.Null(store.LatestFor("P-1", Noon.AddDays(2)));
        Assert.Equal(second.Record.Id, store.ReplacementOf(first)?.Id);
        store.Append(Withdraw(second.Record.Id));
        Assert.Equal(first, store.LatestFor("P-1", Noon.AddDays(2))?.Record.Id);
    }

    [Fact]
    public void Check_NeverTakesOver()
    {
        using TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        string first = store.Append(SampleRecords.Of("P-1", Noon)).Record.Id;
        store.Append(SampleRecords.Of("P-1", Noon.AddDays(1)) with { Purpose = CalibrationRecord.CheckPurpose, CheckKind = "continuing" });

        Assert.Equal(first, store.LatestFor("P-1", Noon.AddDays(2))?.Record.Id);
        Assert.Equal(2, Assert.Single(store.ChecksFor("P-1")).Record.Index);
        Assert.Empty(store.ChecksFor("P-2"));
    }

    [Fact]
    public void Register_HasTheNewestEntryOfAnId_AsItStoodThen()
    {
        using TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        store.Append(Cylinder);
        log.Time.Advance(TimeSpan.FromDays(3));
        string renewed = store.Append(Cylinder with { DueOn = new DateOnly(2030, 1, 1) }).Entry.Id;
        store.Append(Cylinder with { Equipment = "BARO-1", EquipmentKind = "barometer" });

        Assert.Null(store.EquipmentAt("CYL-4", Noon.AddDays(-1)));
        Assert.Equal(2028, store.EquipmentAt("CYL-4", Noon.AddDays(2))?.DueOn?.Year);
        Assert.Equal(2030, store.EquipmentAt("CYL-4", Noon.AddDays(3))?.DueOn?.Year);
        Assert.Equal(["BARO-1", "CYL-4"], store.AllEquipment(Noon.AddDays(4)).Select(each => each.Equipment));
        store.Append(Withdraw(renewed));
        Assert.Equal(2028, store.EquipmentAt("CYL-4", Noon.AddDays(4))?.DueOn?.Year);
    }

    [Theory]
    [InlineData("2026-01-10", null, null, "2026-01-10")]
    [InlineData(null, "2026-01-01", 90.0, "2026-04-01")]
    [InlineData("2026-05-01", "2026-01-01", 90.0, "2026-04-01")]
    [InlineData("2026-03-01", "2026-01-01", 90.0, "2026-03-01")]
    [InlineData(null, "2026-01-01", null, null)]
    public void LastDay_IsTheFirstOfDueAndEndOfLife(string? due, string? made, double? life, string? last)
    {
        EquipmentRecord record = Cylinder with { DueOn = Day(due), MadeOn = Day(made), LifeDays = life };
        Assert.Equal(Day(last), record.LastDay);

        static DateOnly? Day(string? text)
        {
            return text == null ? null : DateOnly.ParseExact(text, "yyyy-MM-dd", System.Globalization.CultureInfo.InvariantCulture);
        }
    }

    [Theory]
    [InlineData("120% u 1%", null, null, "--value 120% u 1%: a gas holds from 0 to 100 % of another")]
    [InlineData("-1% u 1%", null, null, "--value -1% u 1%: a gas holds from 0 to 100 % of another")]
    [InlineData("10% u 1%", "2027-01-01", "2026-01-01", "--due 2026-01-01: it lies before --made 2027-01-01")]
    public void EquipmentThatCannotBe_IsOneLine(string value, string? made, string? due, string says)
    {
        EquipmentEntry entry = new() { Id = "CYL-1", Kind = "cylinder", Value = value, MadeOn = made, DueOn = due };
        Assert.Equal(says, Assert.Throws<ProbeCal.Station.Entry.InputException>(() => entry.Read(null, "x")).Message);
    }

    [Fact]
    public void AmendmentOfNothing_IsRefused_AndAddsNothing()
    {
        using TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        store.Append(SampleRecords.Of("P-1", Noon));
        InputException refused = Assert.Throws<InputException>(() => store.Append(Withdraw("c3a41f09b2e7-0007")));
        Assert.Contains("c3a41f09b2e7-0007", refused.Message, StringComparison.Ordinal);
        Assert.Equal(1, store.Chain.Count);
    }

    [Fact]
    public void AKindThatThisProgramDoesNotKnow_IsOfANewerOne()
    {
        using TemporaryLog log = new();
        using (CalibrationLogStore store = log.Write())
        {
            store.Append(Cylinder);
        }

        byte[] newer = "{\"format\":\"probecal-something-else\",\"version\":1}"u8.ToArray();
        log.Raw("DROP TRIGGER records_no_update; UPDATE records SET bytes = $bytes", ("$bytes", newer));
        InputException refused = Assert.Throws<InputException>(() => log.Read());
        Assert.Contains("probecal-something-else", refused.Message, StringComparison.Ordinal);
        Assert.Contains("newer probecal", refused.Message, StringComparison.Ordinal);
    }

    internal static void AssertValid(ReadOnlyMemory<byte> bytes, string schema)
    {
        JsonSchema against = JsonSchema.FromText(File.ReadAllText(Path.Combine(FormatSamplesTests.Root, "docs/schemas", schema + ".schema.json")));
        using JsonDocument document = JsonDocument.Parse(bytes);
        EvaluationResults results = against.Evaluate(document.RootElement, new EvaluationOptions { OutputFormat = OutputFormat.List });
        Assert.True(results.IsValid, JsonSerializer.Serialize(results));
    }
}
