using System;
using System.IO;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Threading.Tasks;
using Json.Schema;
using Microsoft.Extensions.Time.Testing;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Tests.Calibrating;
using Xunit;

namespace ProbeCal.Station.Tests.CalibrationLog;

/// <summary>One sample of each released format opens for ever, and what is written today keeps to the published schema.</summary>
public class FormatSamplesTests
{
    internal static readonly string Root = FindRoot();
    private static readonly Lazy<JsonSchema> Schema = new(() => JsonSchema.FromText(File.ReadAllText(Path.Combine(Root, "docs/schemas/calibration-record.schema.json"))));

    [Fact]
    public void LogOfVersion1_OpensVerifiesAndTakesAnother()
    {
        string folder = Directory.CreateTempSubdirectory("probecal-sample-").FullName;
        try
        {
            string copy = Path.Combine(folder, "calibrations.db");
            File.Copy(Sample("calibration-log-v1.db"), copy);
            using (CalibrationLogStore log = CalibrationLogStore.OpenForReading(copy))
            {
                Assert.True(log.Chain.IsWhole, string.Join("; ", log.Chain.Faults));
                Assert.Equal("8c6e44e20ee5", log.LogId);
                Assert.Equal(2, log.Chain.Count);
                // The head as it was printed when the sample was made.
                Assert.Equal("42452343d8b8997287ec3c3e138ad7af24229e7d663950528d9511748961ba6d", log.Chain.HeadSha256);
                Assert.Equal(File.ReadAllBytes(Sample("calibration-record-v1.json")), log.BytesOf(log.Records[0]));
                foreach (StoredCalibration stored in log.Records)
                {
                    // What version 1 did not say has its meaning of then, and is nothing that a reader must check for.
                    Assert.Equal(CalibrationRecord.CalibrationPurpose, stored.Record.Purpose);
                    Assert.Empty(stored.Record.Steps);
                    Assert.Empty(stored.Record.Equipment);
                    Assert.Empty(stored.Record.Probe.Coefficients);
                    ProbeCalibration loaded = stored.Record.ToProbeCalibration();
                    Assert.Equal(stored.Record.Result.Slope, loaded.Slope);
                    Assert.Equal(stored.Record.Result.Zero, loaded.ZeroResponse);
                }
            }

            byte[] before = File.ReadAllBytes(copy);
            Assert.Equal(File.ReadAllBytes(Sample("calibration-log-v1.db")), before);
            using CalibrationLogStore writing = CalibrationLogStore.OpenForWriting(copy, new FakeTimeProvider(SampleRecords.Noon), Guid.NewGuid);
            Assert.Equal(copy + ".version-1-20260601T120000Z", writing.BackupPath);
            Assert.Equal("42452343d8b8997287ec3c3e138ad7af24229e7d663950528d9511748961ba6d", writing.Chain.HeadSha256);
            Assert.Equal(File.ReadAllBytes(Sample("calibration-record-v1.json")), writing.BytesOf(writing.Records[0]));
            StoredCalibration third = writing.Append(SampleRecords.Of("P-1", SampleRecords.Noon));
            Assert.Equal("8c6e44e20ee5-0003", third.Record.Id);
            Assert.Equal("42452343d8b8997287ec3c3e138ad7af24229e7d663950528d9511748961ba6d", third.Record.PreviousSha256);
            using CalibrationLogStore again = CalibrationLogStore.OpenForReading(copy);
            Assert.True(again.Chain.IsWhole, string.Join("; ", again.Chain.Faults));
            using CalibrationLogStore backup = CalibrationLogStore.OpenForReading(writing.BackupPath!);
            Assert.Equal(2, backup.Chain.Count);
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    [Fact]
    public void SessionOfVersion1_Loads()
    {
        string folder = Directory.CreateTempSubdirectory("probecal-sample-").FullName;
        try
        {
            File.Copy(Sample("calibration-session-v1.json"), Path.Combine(folder, "M-5.calibration.json"));
            SessionState? state = new SessionFile(folder, "M-5", new FakeTimeProvider()).Load(line => Assert.Fail(line));
            Assert.NotNull(state);
            Assert.Equal(CalibrationIds.AsLeftPoint, state.Next?.Role);
            Assert.Equal(SessionState.CurrentVersion, state.Version);
            Assert.Equal(98.2, Assert.Single(state.Points).Signal.Mean);
            Assert.Equal("%local", state.Setup.Probe.MeterSettings?.Shows);
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    [Fact]
    public async Task RecordsKeepToTheSchema()
    {
        AssertValid(File.ReadAllBytes(Sample("calibration-record-v1.json")));
        using Bench bench = new();
        await bench.CalibrateAsync(Bench.Setup with { ZeroPlan = CalibrationIds.ZeroCheck, By = "tester", Remarks = "°C and µ" }, bench.Source());
        bench.Time.Advance(TimeSpan.FromHours(1));
        CalibrationSetup air = Bench.Setup with
        {
            Method = CalibrationIds.WaterSaturatedAir,
            Site = null,
            Altitude = null,
            TypedTemperatureCelsius = 20.5,
            Reasons = new() { [GuardNames.TemperatureTwice] = "the other thermometer was certified last week", [GuardNames.Steady] = "bath with a thermostat" },
            AirToWaterRatio = new RecordedQuantity { Value = 1.01, Unit = "1", StandardUncertainty = 0.005, Source = "entered" },
            Limits = new CalibrationLimits { SlopeLow = 0.3, SlopeHigh = 0.6 },
        };
        await bench.CalibrateAsync(air, bench.Source());
        using CalibrationLogStore log = bench.Log();
        Assert.Equal(2, log.Records.Count);
        Assert.NotEmpty(log.Records[1].Record.Findings);
        foreach (StoredCalibration stored in log.Records)
        {
            AssertValid(log.BytesOf(stored));
        }
    }

    [Theory]
    [InlineData("surplus", "1")]
    [InlineData("version", "2")]
    [InlineData("points", "[]")]
    [InlineData("previousSha256", "\"abc\"")]
    public void SchemaRefusesWhatIsNoRecord(string property, string value)
    {
        JsonNode node = JsonNode.Parse(File.ReadAllBytes(Sample("calibration-record-v1.json")))!;
        node[property] = JsonNode.Parse(value);
        using JsonDocument document = JsonDocument.Parse(node.ToJsonString());
        Assert.False(Schema.Value.Evaluate(document.RootElement).IsValid);
    }

    private static void AssertValid(byte[] bytes)
    {
        using JsonDocument document = JsonDocument.Parse(bytes);
        EvaluationResults results = Schema.Value.Evaluate(document.RootElement, new EvaluationOptions { OutputFormat = OutputFormat.List });
        Assert.True(results.IsValid, JsonSerializer.Serialize(results));
    }

    private static string Sample(string name)
    {
        return Path.Combine(Root, "tests/Formats", name);
    }

    private static string FindRoot()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "ProbeCal.sln")))
        {
            folder = folder.Parent;
        }

        return folder?.FullName ?? throw new InvalidOperationException("no ProbeCal.sln above " + AppContext.BaseDirectory);
    }
}
