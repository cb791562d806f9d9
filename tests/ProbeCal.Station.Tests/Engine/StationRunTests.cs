using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading;
using System.Threading.Tasks;
using Microsoft.Data.Sqlite;
using MQTTnet.Protocol;
using ProbeCal.Station.Bracketing;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Engine;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Journal;
using ProbeCal.Station.Publishing;
using ProbeCal.Station.Storage;
using ProbeCal.Station.Tests.CalibrationLog;
using ProbeCal.Station.Tests.Publishing;
using ProbeCal.Station.Tests.Storage;
using Xunit;

namespace ProbeCal.Station.Tests.Engine;

/// <summary>A whole station: a file of lines in, a real broker on loopback out.</summary>
public sealed class StationRunTests : IDisposable
{
    private const string Lines = """
        2026-06-02T12:00:00Z,101.5,18.25,941.5,0.3
        2026-06-02T12:00:01Z,101.6,18.26,941.5,0.3
        2026-06-02T12:00:02Z,101,6,18.26,941.5,0.3
        garbage
        2026-06-02T12:00:03Z,101.7,,941.5,0.3
        2026-06-02T12:00:04Z,101.8,18.28,,0.3

        """;

    private readonly TemporaryFolder _folder = new();
    private readonly WatchedTime _time = new();
    private readonly KeptLog _log = new();
    private readonly CancellationTokenSource _stop = new();

    public StationRunTests()
    {
        File.WriteAllText(_folder.File("lines.txt"), Lines);
        using CalibrationLogStore log = CalibrationLogStore.OpenForWriting(_folder.File("calibrations.db"), _time, static () => new Guid(1, 2, 3, [4, 5, 6, 7, 8, 9, 10, 11]));
        log.Append(SampleRecords.Of("do-1", SampleRecords.Noon));
    }

    public void Dispose()
    {
        _folder.Dispose();
        _stop.Dispose();
    }

    [Fact]
    public async Task EverySample_ArrivesOnce_InOrder_AsJournaled_AndWhatIsRetainedFitsItsSchema()
    {
        await using TestBroker broker = await TestBroker.StartAsync();
        await RunAsync(broker.Port);

        List<Arrival> arrived = broker.Arrived();
        Arrival[] readings = [.. arrived.Where(each => each.Topic == "probecal/v1/tarn/do-1/reading")];
        Assert.Equal([1L, 2, 3, 4], readings.Select(Sequence));
        Assert.All(readings, each => Assert.Equal(("application/json", 1, false), (each.ContentType, each.QualityOfService, each.Retained)));
        Assert.Equal("1:1|2:1|3:0|4:1", Journal("SELECT group_concat(sequence || ':' || (reading IS NOT NULL), '|') FROM sample"));
        Assert.Equal("garbage", Journal("SELECT raw_text FROM rejected_line ORDER BY id DESC LIMIT 1"));
        Assert.Equal("2", Journal("SELECT count(*) FROM rejected_line"));
        Assert.Equal("0", Journal("SELECT count(*) FROM outbox"));
        Assert.Equal(Encoding.UTF8.GetString(readings[0].Payload), Journal("SELECT reading FROM sample WHERE sequence = 1"));

        foreach (Arrival each in arrived)
        {
            string kind = each.Topic.Split('/')[^1];
            AssertFits(kind == "calibration" ? "calibration-in-use" : kind, each);
            Assert.Equal(kind is "status" or "calibration", each.Retained);
        }

        Assert.Equal("stopped", (string)JsonNode.Parse(arrived[^1].Payload)!["state"]!);
        Assert.Equal("started", (string)JsonNode.Parse(arrived.First(each => each.Topic.EndsWith("event", StringComparison.Ordinal)).Payload)!["kind"]!);
    }

    [Fact]
    public async Task CalibrationInUse_CarriesTheRecordByteForByte()
    {
        await using TestBroker broker = await TestBroker.StartAsync();
        await RunAsync(broker.Port);
        Arrival calibration = broker.Arrived().First(each => each.Topic.EndsWith("calibration", StringComparison.Ordinal));

        using CalibrationLogStore log = CalibrationLogStore.OpenForReading(_folder.File("calibrations.db"));
        string record = Encoding.UTF8.GetString(log.BytesOf(log.Records[0]));
        Assert.Contains("\"record\":" + record, calibration.Text);
        Assert.Contains(log.Records[0].Sha256, calibration.Text);
        // The head kept retained outside the log: whoever has the message can compare.
        Assert.Contains("\"logHead\":\"1:" + log.Chain.HeadSha256 + "\"", calibration.Text);
        Assert.True(LogVerification.Of(log, null, LogHead.FindAll(calibration.Text)).IsSound);
        Assert.Single(LogHead.FindAll(calibration.Text));
    }

    [Fact]
    public async Task JournaledReadings_AreHeldAgainstTheChecks()
    {
        await RunAsync(TestBroker.FreePort());
        using CalibrationLogStore log = CalibrationLogStore.OpenForReading(_folder.File("calibrations.db"));
        BracketList found = BracketList.OfJournal(log, "do-1", _folder.File("journal.db"));
        string values = Journal("SELECT count(*) FROM sample WHERE json_extract(reading, '$.mgPerL.value') IS NOT NULL");
        Assert.NotEqual("0", values);
        Assert.Equal(values, found.Readings.ToString(System.Globalization.CultureInfo.InvariantCulture));
        Assert.Equal("no check after it", Assert.Single(found.Spans).Reason);
        Assert.Equal(found.Readings, found.Spans[0].Count);
    }

    [Theory]
    [InlineData("check", "it is a check, which changes no coefficients")]
    [InlineData("withdrawn", "it was withdrawn by entry")]
    [InlineData("replaced", "it was replaced by")]
    public async Task NamedCalibration_ThatDoesNotHold_IsRefused_AndTheLatestIsAnother(string what, string message)
    {
        string id;
        using (CalibrationLogStore log = CalibrationLogStore.OpenForWriting(_folder.File("calibrations.db"), _time, Guid.NewGuid))
        {
            CalibrationRecord record = SampleRecords.Of("do-1", SampleRecords.Noon.AddHours(1));
            id = log.Append(record with { Purpose = what == "check" ? CalibrationRecord.CheckPurpose : CalibrationRecord.CalibrationPurpose }).Record.Id;
            if (what == "withdrawn")
            {
                log.Append(new AmendmentRecord { Of = id, Reason = "dry cup", Software = "probecal 9.9.9" });
            }
            else if (what == "replaced")
            {
                log.Append(SampleRecords.Of("do-1", SampleRecords.Noon.AddHours(2), pass: false) with { Replaces = id });
            }

            Assert.Equal(1, log.LatestFor("do-1", SampleRecords.Noon.AddDays(1))?.Record.Index);
        }

        InputException refused = await Assert.ThrowsAsync<InputException>(() => RunAsync(Configuration(("calibration", JsonSerializer.Serialize(id)))));
        Assert.Contains("calibration " + id + ": " + message, refused.Message);
    }

    [Fact]
    public async Task BrokerAway_LosesNothing_AndTheNextRunDeliversInOrder_WithNumbersGoingOn()
    {
        int port = TestBroker.FreePort();
        await RunAsync(port);
        Assert.Equal("4", Journal("SELECT count(*) FROM outbox WHERE topic LIKE '%reading'"));
        string before = Journal("SELECT group_concat(hex(payload)) FROM outbox WHERE topic LIKE '%reading'");

        await using TestBroker broker = await TestBroker.StartAsync(port);
        await RunAsync(port);

        Arrival[] readings = [.. broker.Arrived().Where(each => each.Topic.EndsWith("reading", StringComparison.Ordinal))];
        Assert.Equal([1L, 2, 3, 4, 5, 6, 7, 8], readings.Select(Sequence));
        Assert.Equal(before, string.Join(',', readings[..4].Select(each => Convert.ToHexString(each.Payload))));
    }

    [Fact]
    public async Task BrokerThatHangsUpInTheMiddle_GetsTheRestAfterwards_WithIdenticalRepeats()
    {
        await using TestBroker broker = await TestBroker.StartAsync();
        int hungUp = 0;
        broker.HangUpOn = arrival => arrival.Topic.EndsWith("reading", StringComparison.Ordinal) && Sequence(arrival) == 3 && Interlocked.Increment(ref hungUp) == 1;
        await RunAsync(broker.Port);
        await RunAsync(broker.Port);

        Arrival[] readings = [.. broker.Arrived().Where(each => each.Topic.EndsWith("reading", StringComparison.Ordinal))];
        Assert.Equal([1L, 2, 3, 3, 4, 5, 6, 7, 8], readings.Select(Sequence));
        Assert.Equal(readings[2].Payload, readings[3].Payload);
    }

    [Fact]
    public async Task DeniedReadings_StayInTheOutbox()
    {
        await using TestBroker broker = await TestBroker.StartAsync();
        broker.Judge = arrival => arrival.Topic.EndsWith("reading", StringComparison.Ordinal) ? MqttPubAckReasonCode.NotAuthorized : MqttPubAckReasonCode.Success;
        await RunAsync(broker.Port);
        Assert.Equal("4", Journal("SELECT count(*) FROM outbox WHERE topic LIKE '%reading'"));
        Assert.Contains(_log.Lines, line => line.Contains("NotAuthorized"));
    }

    [Fact]
    public async Task WrongPassword_IsToldWithoutTheSecret_AndEverythingIsJournaled()
    {
        await using TestBroker broker = await TestBroker.StartAsync();
        broker.Account = ("tarn", "the right one");
        await RunAsync(broker.Port, ", \"user\": \"tarn\", \"passwordEnvironment\": \"PASSWORD\"");
        Assert.Equal("4", Journal("SELECT count(*) FROM sample"));
        Assert.Contains(_log.Lines, line => line.Contains("as user tarn") && line.Contains("password is wrong"));
        Assert.DoesNotContain(_log.Lines, line => line.Contains("not this one"));
    }

    [Theory]
    [InlineData("mqtt://broker.example", true)]
    [InlineData("mqtt://192.0.2.7:1883", true)]
    [InlineData("mqtts://broker.example", false)]
    [InlineData("mqtt://127.0.0.1:1883", false)]
    [InlineData("mqtt://localhost", false)]
    [InlineData("mqtt://[::1]", false)]
    public void PasswordIsExposed_OnlyUnencryptedToAnotherMachine(string address, bool exposed)
    {
        StationConfiguration withUser = Configuration(("broker", $$"""{ "address": "{{address}}", "user": "tarn", "passwordEnvironment": "PASSWORD" }"""));
        StationConfiguration without = Configuration(("broker", $$"""{ "address": "{{address}}" }"""));
        Assert.Equal(exposed, withUser.Broker!.ExposesPassword);
        Assert.False(without.Broker!.ExposesPassword);
    }

    [Fact]
    public async Task ExposedPassword_IsWarnedOf()
    {
        // This machine by an address that is not a loopback one; nobody listens.
        Task run = RunAsync(Configuration(("broker", """{ "address": "mqtt://0.0.0.0:1", "user": "tarn", "passwordEnvironment": "PASSWORD" }""")));
        await _log.SeenAsync("user and password go to 0.0.0.0 unencrypted");
        await _stop.CancelAsync();
        await run.WaitAsync(Deadline.Generous);
    }

    [Fact]
    public void BrokerSettings_AreThoseOfTheConfiguration_AndTheWillSaysLost()
    {
        StationConfiguration configuration = Configuration(("broker", """{ "address": "mqtts://broker.example", "user": "tarn", "passwordEnvironment": "PASSWORD", "checkRevocation": false }"""));
        StationMessages messages = new(configuration, StationParts.Calibration(), "probecal 9.9.9", "scripted");
        BrokerSettings settings = StationRun.Settings(configuration, messages, Surroundings());

        Assert.Equal(("broker.example", 8883, true, false), (settings.Host, settings.Port, settings.UseTls, settings.CheckRevocation));
        Assert.Equal(("probecal-tarn-do-1", "tarn", "not this one"), (settings.ClientId, settings.User, settings.Password?.Fetch()));
        Assert.Equal("probecal/v1/tarn/do-1/status", settings.Will.Topic);
        using JsonDocument will = JsonDocument.Parse(settings.Will.Payload);
        Assert.Equal("lost", will.RootElement.GetProperty("state").GetString());
        Assert.True(Schemas.Of("status").Evaluate(will.RootElement).IsValid);
    }

    [Fact]
    public async Task EmbeddedBroker_IsUsed_WhenNoneIsNamed()
    {
        StationConfiguration configuration = Configuration(("embeddedBroker", "{ \"port\": " + TestBroker.FreePort().ToString(System.Globalization.CultureInfo.InvariantCulture) + " }"));
        await RunAsync(configuration);
        Assert.Equal("4|0", Journal("SELECT (SELECT count(*) FROM sample) || '|' || (SELECT count(*) FROM outbox)"));
    }

    [Fact]
    public async Task PortPulledOut_OrNeverThere_IsAnEvent_AndTheStationGoesOn()
    {
        int nobody = TestBroker.FreePort();
        StationConfiguration configuration = Configuration(("source", "\"tcp:127.0.0.1:" + nobody.ToString(System.Globalization.CultureInfo.InvariantCulture) + "\""), ("broker", "{ \"address\": \"mqtt://127.0.0.1:1\" }"));
        Task run = RunAsync(configuration);
        await _log.SeenAsync(": Lost: ");
        await _stop.CancelAsync();
        await run.WaitAsync(Deadline.Generous);
        Assert.Equal("1", Journal("SELECT count(*) > 0 FROM event WHERE kind = 'source-lost'"));
    }

    [Theory]
    [InlineData("probe", "\"do-2\"", "probe do-2: no calibration of it that passed")]
    [InlineData("calibration", "\"cal-77\"", "calibration cal-77: there is no such record")]
    [InlineData("line", "\"{signal:mV},{temperature},{pressure},{salinity}\"", "they must be the same")]
    public async Task CalibrationThatDoesNotFit_IsRefused_BeforeAnythingIsWritten(string key, string json, string message)
    {
        StationConfiguration configuration = Configuration((key, json));
        InputException refused = await Assert.ThrowsAsync<InputException>(() => RunAsync(configuration));
        Assert.Contains(message, refused.Message);
        Assert.False(File.Exists(_folder.File("journal.db")));
    }

    [Theory]
    [InlineData("do-2", true, "it is of probe do-2, and this station has do-1")]
    [InlineData("do-1", false, "it did not pass")]
    public async Task NamedCalibration_OfAnotherProbe_OrThatFailed_IsRefused(string probe, bool pass, string message)
    {
        string id;
        using (CalibrationLogStore log = CalibrationLogStore.OpenForWriting(_folder.File("calibrations.db"), _time, Guid.NewGuid))
        {
            CalibrationRecord record = SampleRecords.Of(probe, SampleRecords.Noon);
            id = log.Append(record with { Result = record.Result with { Pass = pass } }).Record.Id;
        }

        InputException refused = await Assert.ThrowsAsync<InputException>(() => RunAsync(Configuration(("calibration", JsonSerializer.Serialize(id)))));
        Assert.Contains("calibration " + id + ": " + message, refused.Message);
    }

    [Fact]
    public async Task BrokenChainOfCalibrations_IsRefused_BeforeAnythingIsWritten()
    {
        using (SqliteConnection log = new(new SqliteConnectionStringBuilder { DataSource = _folder.File("calibrations.db"), Pooling = false }.ConnectionString))
        {
            log.Open();
            using SqliteCommand forge = log.CreateCommand();
            forge.CommandText = "DROP TRIGGER records_no_update; UPDATE records SET bytes = CAST(replace(CAST(bytes AS TEXT), '\"stirred\"', '\"still\"') AS BLOB)";
            forge.ExecuteNonQuery();
        }

        WorkFailedException refused = await Assert.ThrowsAsync<WorkFailedException>(() => RunAsync(1));
        Assert.Contains("the chain of calibration records is broken", refused.Message);
        Assert.False(File.Exists(_folder.File("journal.db")));
    }

    [Fact]
    public async Task JournalOfANewerVersion_IsRefused_Untouched()
    {
        StationJournal.Open(_folder.File("journal.db"), _time).Dispose();
        using (SqliteFile file = SqliteFile.OpenForWriting(_folder.File("journal.db"), JournalFormat.Format, DamagePolicy.Refuse, _time))
        {
            using Microsoft.Data.Sqlite.SqliteCommand command = file.Connection.CreateCommand();
            command.CommandText = "PRAGMA user_version=2";
            command.ExecuteNonQuery();
        }

        byte[] before = File.ReadAllBytes(_folder.File("journal.db"));
        await Assert.ThrowsAsync<InputException>(() => RunAsync(1));
        Assert.Equal(before, File.ReadAllBytes(_folder.File("journal.db")));
    }

    [Fact]
    public async Task DamagedJournal_IsPutAside_AndTold()
    {
        File.WriteAllText(_folder.File("journal.db"), "this was a journal once, before something wrote words over it");
        await RunAsync(1);
        Assert.Equal("journal-set-aside", Journal("SELECT kind FROM event ORDER BY id LIMIT 1"));
        Assert.Single(Directory.GetFiles(_folder.Path, "journal.db.damaged-*"));
        Assert.Equal("4", Journal("SELECT count(*) FROM sample"));
    }

    private static long Sequence(Arrival arrival)
    {
        return (long)JsonNode.Parse(arrival.Payload)!["sequence"]!;
    }

    private static void AssertFits(string schema, Arrival arrival)
    {
        using JsonDocument document = JsonDocument.Parse(arrival.Payload);
        Assert.True(Schemas.Of(schema).Evaluate(document.RootElement).IsValid, schema + ": " + arrival.Text);
    }

    private StationConfiguration Configuration(params (string Key, string Json)[] changes)
    {
        return StationParts.Configuration([("source", JsonSerializer.Serialize("file:" + _folder.File("lines.txt"))), .. changes]);
    }

    private Task RunAsync(int port, string more = "")
    {
        string address = "{ \"address\": \"mqtt://127.0.0.1:" + port.ToString(System.Globalization.CultureInfo.InvariantCulture) + "\"" + more + " }";
        return RunAsync(Configuration(("broker", address)));
    }

    private async Task RunAsync(StationConfiguration configuration)
    {
        using DataDirectory data = DataDirectory.OpenForWriting(_folder.Path);
        await StationRun.RunAsync(configuration, data, Surroundings(), duration: null, _stop.Token).WaitAsync(Deadline.Generous);
    }

    private StationSurroundings Surroundings()
    {
        return new StationSurroundings
        {
            Time = _time,
            Random = new Random(1),
            Logs = _log,
            Software = "probecal 9.9.9",
            Environment = static _ => "not this one",
        };
    }

    private string Journal(string sql)
    {
        using SqliteFile file = SqliteFile.OpenForReading(_folder.File("journal.db"), JournalFormat.Format);
        using Microsoft.Data.Sqlite.SqliteCommand command = file.Connection.CreateCommand();
        command.CommandText = sql;
        return Convert.ToString(command.ExecuteScalar(), System.Globalization.CultureInfo.InvariantCulture)!;
    }
}
