using System;
using System.Collections.Generic;
using System.Linq;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Engine;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Tests.CalibrationLog;
using Xunit;

namespace ProbeCal.Station.Tests.Engine;

/// <summary>Where the rate of growth comes from, and what a reading says about it. All figures are made up.</summary>
public class UncertaintyGrowthTests
{
    private const string Program = "probecal 9.9.9";
    private const string Entered = """{ "perDay": "0.05 %", "source": "checks of last season" }""";

    [Fact]
    public void Neither_SaysSo()
    {
        using TemporaryLog log = new();
        JsonNode json = Read(log, StationParts.Configuration(), SampleRecords.Noon.AddDays(10), [0.62]);
        Assert.Equal(["drift", "fouling"], Excluded(json));
        Assert.Null(json["drift"]);
        Assert.Null(json["fouling"]);
    }

    [Fact]
    public void EnteredRates_GrowWithDaysSinceCalibrationAndCleaning()
    {
        using TemporaryLog log = new();
        using (CalibrationLogStore store = log.Write())
        {
            store.Append(SampleRecords.Of("do-1", SampleRecords.Noon));
            log.Time.SetUtcNow(SampleRecords.Noon.AddDays(10));
            store.Append(new ServiceRecord { Probe = "do-1", Event = ServiceRecord.Cleaned, At = SampleRecords.Noon.AddDays(8), Software = Program });
        }

        DateTimeOffset at = SampleRecords.Noon.AddDays(20);
        JsonNode without = Read(log, StationParts.Configuration(), at, []);
        JsonNode with = Read(log, StationParts.Configuration(("drift", Entered), ("fouling", """{ "perDay": "0.2 %", "source": "two summers" }""")), at, []);
        Assert.Empty(Excluded(with));
        Assert.Equal((20.0, "checks of last season"), ((double)with["drift"]!["days"]!, (string)with["drift"]!["source"]!));
        Assert.Equal(0.05, (double)with["drift"]!["percentPerDay"]!, 12);
        Assert.Equal(12.0, (double)with["fouling"]!["days"]!);
        foreach (string name in new[] { "partialPressureHPa", "mgPerL", "umolPerKg", "percentLocal" })
        {
            double value = (double)with[name]!["value"]!;
            Assert.Equal((double)without[name]!["value"]!, value);
            double before = (double)without[name]!["standardUncertainty"]!;
            double expected = Math.Sqrt((before * before) + Math.Pow(0.0005 * 20 * value, 2) + Math.Pow(0.002 * 12 * value, 2));
            Assert.Equal(1, (double)with[name]!["standardUncertainty"]! / expected, 12);
        }
    }

    [Fact]
    public void EnteredZero_AtDayZero_AddsNothing()
    {
        using TemporaryLog log = new();
        JsonNode with = Read(log, StationParts.Configuration(("drift", Entered)), SampleRecords.Noon, [0.62]);
        JsonNode without = Read(log, StationParts.Configuration(), SampleRecords.Noon, []);
        Assert.Equal(0.0, (double)with["drift"]!["days"]!);
        Assert.Equal((double)without["mgPerL"]!["standardUncertainty"]!, (double)with["mgPerL"]!["standardUncertainty"]!);
        Assert.Equal(["fouling"], Excluded(with));
    }

    /// <summary>Before its calibration a reading has no days of drift: it is in doubt already, and says that drift is left out.</summary>
    [Fact]
    public void BeforeItsCalibration_NothingIsAddedAndSaidSo()
    {
        using TemporaryLog log = new();
        JsonNode json = Read(log, StationParts.Configuration(("drift", Entered), ("fouling", Entered)), SampleRecords.Noon.AddHours(-1), [0.62]);
        Assert.Equal(["drift", "fouling"], Excluded(json));
        Assert.Equal(3, (int)json["mgPerL"]!["flag"]!);
    }

    /// <summary>Three calibrations 30 days apart whose slope fell by 1 % and rose by 2 %: √(ln²0.99 + ln²1.02)/√(30² + 30²), by hand.</summary>
    [Fact]
    public void HistoryOfThreeCalibrations_GivesTheRate()
    {
        using TemporaryLog log = new();
        JsonNode json = Read(log, StationParts.Configuration(), SampleRecords.Noon.AddDays(70), [0.62, 0.62 * 0.99, 0.62 * 0.99 * 1.02]);
        double expected = Math.Sqrt((0.010050335853501 * 0.010050335853501) + (0.019802627296180 * 0.019802627296180)) / 42.426406871192853 * 100;
        Assert.Equal(expected, (double)json["drift"]!["percentPerDay"]!, 12);
        Assert.Equal(10.0, (double)json["drift"]!["days"]!);
        Assert.Equal("slopes of 3 calibrations of this probe and membrane", (string)json["drift"]!["source"]!);
        Assert.Equal(["fouling"], Excluded(json));
    }

    /// <summary>A simulated random drift of known size: the rate found is the rate put in, within the scatter of 60 changes (9 %, k = 1).</summary>
    [Fact]
    public void HistoryOfAKnownDrift_FindsIt()
    {
        const double PerDay = 0.001;
        Random random = new(20261201);
        double slope = 0.62;
        double[] slopes = new double[61];
        for (int i = 0; i < slopes.Length; i++)
        {
            slopes[i] = slope;
            slope *= Math.Exp(PerDay * 30 * Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble()));
        }

        using TemporaryLog log = new();
        JsonNode json = Read(log, StationParts.Configuration(), SampleRecords.Noon.AddDays((30 * 60) + 1), slopes);
        Assert.InRange((double)json["drift"]!["percentPerDay"]! / (PerDay * 100), 0.73, 1.27);
    }

    [Fact]
    public void TwoCalibrations_AnotherMembrane_WithdrawnOnes_GiveNone()
    {
        using TemporaryLog two = new();
        Assert.Contains("drift", Excluded(Read(two, StationParts.Configuration(), SampleRecords.Noon.AddDays(40), [0.62, 0.61])));

        using TemporaryLog withdrawn = new();
        using (CalibrationLogStore store = withdrawn.Write())
        {
            StoredCalibration first = store.Append(SampleRecords.Of("do-1", SampleRecords.Noon));
            withdrawn.Time.SetUtcNow(SampleRecords.Noon.AddDays(90));
            store.Append(SampleRecords.Of("do-1", SampleRecords.Noon.AddDays(30)));
            store.Append(SampleRecords.Of("do-1", SampleRecords.Noon.AddDays(60), slope: 0.6));
            store.Append(new AmendmentRecord { Of = first.Record.Id, Action = "withdrawn", Reason = "wrong probe", Software = Program });
        }

        Assert.Contains("drift", Excluded(Read(withdrawn, StationParts.Configuration(), SampleRecords.Noon.AddDays(91), [])));

        using TemporaryLog membrane = new();
        using (CalibrationLogStore store = membrane.Write())
        {
            membrane.Time.SetUtcNow(SampleRecords.Noon.AddDays(90));
            for (int i = 0; i < 3; i++)
            {
                CalibrationRecord record = SampleRecords.Of("do-1", SampleRecords.Noon.AddDays(30 * i));
                store.Append(record with { Probe = record.Probe with { Membrane = new RecordedMembrane { Id = "M-" + i } } });
            }
        }

        Assert.Contains("drift", Excluded(Read(membrane, StationParts.Configuration(), SampleRecords.Noon.AddDays(91), [])));
    }

    /// <summary>Membranes without ids: the service event between the calibrations tells them apart; one before all of them does not matter.</summary>
    [Theory]
    [InlineData(15, true)]
    [InlineData(-15, false)]
    public void NewMembraneBetween_BeginsTheHistoryAnew(int day, bool excluded)
    {
        using TemporaryLog log = new();
        using (CalibrationLogStore store = log.Write())
        {
            log.Time.SetUtcNow(SampleRecords.Noon.AddDays(90));
            store.Append(new ServiceRecord { Probe = "do-1", Event = ServiceRecord.MembraneChanged, At = SampleRecords.Noon.AddDays(day), Software = Program });
            for (int i = 0; i < 3; i++)
            {
                store.Append(SampleRecords.Of("do-1", SampleRecords.Noon.AddDays(30 * i), slope: 0.62 - (0.01 * i)));
            }
        }

        Assert.Equal(excluded, Excluded(Read(log, StationParts.Configuration(), SampleRecords.Noon.AddDays(91), [])).Contains("drift"));
    }

    [Fact]
    public void SlopeThatTurnedItsSign_IsNoDrift()
    {
        using TemporaryLog log = new();
        using CalibrationLogStore store = log.Write();
        log.Time.SetUtcNow(SampleRecords.Noon.AddDays(90));
        CalibrationRecord last = SampleRecords.Of("do-1", SampleRecords.Noon);
        foreach (double slope in new[] { -0.62, 0.62, 0.61 })
        {
            last = store.Append(SampleRecords.Of("do-1", SampleRecords.Noon.AddDays(10 * store.Records.Count), slope: slope)).Record;
        }

        Assert.Null(GrowthHistory.Drift(store, last));
    }

    /// <summary>A recorded reading takes the same uncertainty as a live one, unless drift and fouling are taken back there.</summary>
    [Fact]
    public void RecordedReading_IsAsSureAsTheLiveOne()
    {
        using TemporaryLog log = new();
        DateTimeOffset at = SampleRecords.Noon.AddDays(70);
        StationConfiguration configuration = StationParts.Configuration();
        JsonNode live = Read(log, configuration, at, [0.62, 0.61, 0.63]);
        using CalibrationLogStore store = log.Read();
        CorrectionRequest request = new()
        {
            Input = "raw.csv",
            Output = "out.csv",
            Columns = [],
            Probe = "do-1",
            TemperatureUncertainty = "0.03 K",
            PressureUncertainty = "0.8 hPa",
            SalinityUncertainty = "0.1",
        };
        IReadOnlyList<CalibrationInUse> calibrations = CalibrationInUse.Find(store, request);
        RowCorrector corrector = new(calibrations, ServicePlanner.Plan(store, calibrations, request));
        Assert.True(corrector.Find(at.UtcTicks));
        RawSample sample = StationParts.Sample;
        corrector.Correct(at.UtcTicks, sample.Signal, sample.TemperatureCelsius!.Value, sample.PressureHectopascal!.Value, sample.Salinity!.Value, 0);
        Assert.NotEqual(0, corrector.Reading.Contribution(UncertaintySource.Drift, ReadingQuantity.MilligramsPerLitre));
        Assert.Equal((double)live["mgPerL"]!["value"]!, corrector.Reading.Value(ReadingQuantity.MilligramsPerLitre));
        Assert.Equal((double)live["mgPerL"]!["standardUncertainty"]!, corrector.Reading.StandardUncertainty(ReadingQuantity.MilligramsPerLitre));
    }

    /// <summary>Two visits, 20 and 10 days after a cleaning; fouling of −5 % and +2 % of the reading, the water's own change taken off.</summary>
    [Fact]
    public void VisitsBeforeTheCalibration_GiveTheRateOfFouling()
    {
        using TemporaryLog log = new();
        using (CalibrationLogStore store = log.Write())
        {
            log.Time.SetUtcNow(SampleRecords.Noon.AddDays(60));
            store.Append(SampleRecords.Of("do-1", SampleRecords.Noon));
            store.Append(Visit(SampleRecords.Noon.AddDays(20), new VisitCleaning(8.0, 8.5, 8.6, 8.7)));
            store.Append(Visit(SampleRecords.Noon.AddDays(30), new VisitCleaning(10.0, 9.8, null, null)));
            store.Append(SampleRecords.Of("do-1", SampleRecords.Noon.AddDays(40)));
        }

        JsonNode json = Read(log, StationParts.Configuration(), SampleRecords.Noon.AddDays(47), []);
        // The second visit comes a minute less than ten days after the first was done.
        double second = 10 - (1.0 / 1440);
        double expected = Math.Sqrt((0.05 * 0.05) + (0.02 * 0.02)) / Math.Sqrt((20 * 20) + (second * second)) * 100;
        Assert.Equal(expected, (double)json["fouling"]!["percentPerDay"]!, 10);
        Assert.Equal(7.0, (double)json["fouling"]!["days"]!);
    }

    [Theory]
    [InlineData("""{ "perDay": "0.05 %" }""", "source")]
    [InlineData("""{ "source": "x" }""", "perDay")]
    [InlineData("""{ "perDay": "-1 %", "source": "x" }""", "between 0 % and 100 %")]
    [InlineData("""{ "perDay": "101 %", "source": "x" }""", "between 0 % and 100 %")]
    [InlineData("""{ "perDay": "0.05 hPa", "source": "x" }""", "perDay")]
    [InlineData("""{ "perDay": "0.05 %", "source": "x", "per": "day" }""", "per")]
    public void WrongSection_IsToldInOneLine(string json, string expected)
    {
        InputException wrong = Assert.Throws<InputException>(() => StationParts.Configuration(("drift", json)));
        Assert.Contains(expected, wrong.Message, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', wrong.Message);
    }

    private static VisitRecord Visit(DateTimeOffset at, VisitCleaning cleaning)
    {
        return new VisitRecord { Probe = "do-1", BeforeUtc = at, AfterUtc = at.AddMinutes(1), Cleaning = [cleaning], Software = Program };
    }

    private static string[] Excluded(JsonNode json)
    {
        return [.. json["uncertaintyExcludes"]!.AsArray().Select(static each => (string)each!)];
    }

    /// <summary>A reading at a time, as the station makes it after calibrations 30 days apart with these slopes.</summary>
    private static JsonNode Read(TemporaryLog log, StationConfiguration configuration, DateTimeOffset at, double[] slopes)
    {
        if (slopes.Length != 0)
        {
            using CalibrationLogStore store = log.Write();
            for (int i = 0; i < slopes.Length; i++)
            {
                log.Time.SetUtcNow(SampleRecords.Noon.AddDays(30 * i));
                store.Append(SampleRecords.Of("do-1", SampleRecords.Noon.AddDays(30 * i), slope: slopes[i]));
            }
        }

        LoadedCalibration calibration = LoadedCalibration.Find(log.Path, configuration, DateTimeOffset.MaxValue)!;
        RawSample sample = StationParts.Sample with { TimeUtc = at };
        byte[] bytes = new ReadingMaker(configuration, calibration, Program).Make(sample, 7).Message.Payload.ToArray();
        Assert.Equal(bytes, new ReadingMaker(configuration, calibration, Program).Make(sample, 7).Message.Payload.ToArray());
        JsonNode json = JsonNode.Parse(Encoding.UTF8.GetString(bytes))!;
        Assert.True(Schemas.Of("reading").Evaluate(JsonSerializer.Deserialize<JsonElement>(bytes)).IsValid, Encoding.UTF8.GetString(bytes));
        return json;
    }
}
