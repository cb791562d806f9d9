using System;
using System.Collections.Generic;
using System.Linq;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using Json.Schema;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Engine;
using ProbeCal.Station.Journal;
using Xunit;

namespace ProbeCal.Station.Tests.Engine;

public class ReadingMakerTests
{
    private static readonly Dictionary<string, ReadingQuantity> _quantities = new()
    {
        ["partialPressureHPa"] = ReadingQuantity.PartialPressure,
        ["mgPerL"] = ReadingQuantity.MilligramsPerLitre,
        ["umolPerL"] = ReadingQuantity.MicromolesPerLitre,
        ["umolPerKg"] = ReadingQuantity.MicromolesPerKilogram,
        ["percentLocal"] = ReadingQuantity.PercentLocal,
        ["percentOneAtmosphere"] = ReadingQuantity.PercentOneAtmosphere,
    };

    [Fact]
    public void Reading_CarriesWhatCoreComputed_BitForBit()
    {
        StationConfiguration configuration = StationParts.Configuration();
        LoadedCalibration calibration = StationParts.Calibration();
        JsonNode json = Make(StationParts.Sample, configuration, calibration);

        Reading expected = new();
        ReadingConditions conditions = new(SolubilityEquation.BensonKrause1984, 0.12, true, UncertaintyDefaults.ThermometerOffsetKelvin, 0.03, 0.8, 0.1, Stirring.Stirred, 1, UncertaintyDefaults.StirredRelative);
        Assert.Equal(Status.Ok, Correction.Correct(calibration.Core, conditions, 101.5, 18.25, 941.5, 0.3, 0.0, RangeRule.Refuse, expected));
        foreach ((string name, ReadingQuantity quantity) in _quantities)
        {
            Assert.Equal(expected.Value(quantity), (double)json[name]!["value"]!);
            Assert.Equal(expected.StandardUncertainty(quantity), (double)json[name]!["standardUncertainty"]!);
            Assert.Equal(1, (int)json[name]!["flag"]!);
        }
    }

    [Fact]
    public void Reading_SaysWhereEverythingCameFrom()
    {
        JsonNode json = Make(StationParts.Sample, StationParts.Configuration(), StationParts.Calibration());

        Assert.Equal(("probecal-reading", 1), ((string)json["format"]!, (int)json["version"]!));
        Assert.Equal(("tarn", "do-1", 7L), ((string)json["station"]!, (string)json["probe"]!, (long)json["sequence"]!));
        Assert.Equal(("2026-06-02T12:00:00.000000Z", "line", "2026-06-02T12:00:00.250000Z"), ((string)json["timeUtc"]!, (string)json["timeSource"]!, (string)json["receivedUtc"]!));
        Assert.Equal((StationParts.Sample.RawText, 101.5, "nA"), ((string)json["raw"]!["text"]!, (double)json["raw"]!["signal"]!, (string)json["raw"]!["signalUnit"]!));
        Assert.Equal((18.25, "line", 0.03), Input(json, "temperatureC"));
        Assert.Equal((941.5, "line:B-12", 0.8), Input(json, "pressureHPa"));
        Assert.Equal((0.3, "line", 0.1), Input(json, "salinity"));
        Assert.Equal(("cal-0001", "benson-krause-1984", "stirred", "probecal 9.9.9"), ((string)json["calibration"]!, (string)json["equation"]!, (string)json["stirring"]!, (string)json["software"]!));
        Assert.Equal(["drift", "fouling"], json["uncertaintyExcludes"]!.AsArray().Select(each => (string)each!));
        Assert.False((bool)json["simulated"]!);
        Assert.Null(json["noReadingReason"]);
    }

    [Fact]
    public void SameSampleAndNumber_GiveTheSameBytes()
    {
        ReadingMaker maker = new(StationParts.Configuration(), StationParts.Calibration(), "probecal 9.9.9");
        byte[] first = maker.Make(StationParts.Sample, 7).Message.Payload.ToArray();
        maker.Make(StationParts.Sample with { TemperatureCelsius = null }, 8);
        Assert.Equal(first, maker.Make(StationParts.Sample, 7).Message.Payload.ToArray());
    }

    [Theory]
    // What a bad input spoils: without T nothing, without S no concentration, without P no local saturation.
    // Flags in the order T P S | pO2 mg/L µmol/L µmol/kg %local %1atm.
    [InlineData("temperature missing", "911|999999", "temperature is missing")]
    [InlineData("pressure missing", "191|111191", null)]
    [InlineData("salinity missing", "119|199911", null)]
    [InlineData("everything missing", "999|999999", "temperature is missing")]
    [InlineData("temperature above range", "311|344433", null)]
    [InlineData("salinity above range", "113|144411", null)]
    [InlineData("pressure impossible at the altitude", "141|111141", null)]
    [InlineData("pressure unusual at the altitude", "131|111131", null)]
    [InlineData("signal not a number", "111|444444", "signal is not a number")]
    [InlineData("negative", "111|111111", null)]
    [InlineData("still", "111|333333", null)]
    [InlineData("before its calibration", "111|333333", null)]
    public void BadInput_FlagsWhatItSpoils_AndNothingElse(string which, string flags, string? noReading)
    {
        RawSample good = StationParts.Sample;
        RawSample sample = which switch
        {
            "temperature missing" => good with { TemperatureCelsius = null },
            "pressure missing" => good with { PressureHectopascal = null },
            "salinity missing" => good with { Salinity = null },
            "everything missing" => good with { TemperatureCelsius = null, PressureHectopascal = null, Salinity = null },
            "temperature above range" => good with { TemperatureCelsius = 44 },
            "salinity above range" => good with { Salinity = 41 },
            "pressure impossible at the altitude" => good with { PressureHectopascal = 1013.25 },
            "pressure unusual at the altitude" => good with { PressureHectopascal = 961 },
            "signal not a number" => new RawSample(good.ReceivedUtc, good.RawText, double.NaN) { TimeUtc = good.TimeUtc, TemperatureCelsius = 18, PressureHectopascal = 940, Salinity = 0 },
            "negative" => new RawSample(good.ReceivedUtc, good.RawText, 0.1) { TimeUtc = good.TimeUtc, TemperatureCelsius = 18, PressureHectopascal = 940, Salinity = 0 },
            "before its calibration" => good with { TimeUtc = good.TimeUtc.AddDays(-2) },
            _ => good,
        };
        StationConfiguration configuration = which == "still" ? StationParts.Configuration(("stirring", "\"still\"")) : StationParts.Configuration();

        JsonNode json = Make(sample, configuration, StationParts.Calibration());

        string[] inputs = ["temperatureC", "pressureHPa", "salinity"];
        Assert.Equal(flags, string.Concat(inputs.Select(name => Flag(json, name))) + "|" + string.Concat(_quantities.Keys.Select(name => Flag(json, name))));
        Assert.Equal(noReading, (string?)json["noReadingReason"]);
        Assert.Equal(good.RawText, (string)json["raw"]!["text"]!);
        Assert.All(_quantities.Keys, name => Assert.Equal(json[name]!["value"] == null, json[name]!["standardUncertainty"] == null));
        if (which == "temperature above range")
        {
            Assert.Equal("temperature is above its range", (string)json["mgPerL"]!["reason"]!);
            Assert.True((double)json["partialPressureHPa"]!["value"]! > 0);
        }

        if (which == "negative")
        {
            Assert.True((double)json["mgPerL"]!["value"]! < 0);
        }
    }

    /// <summary>A thermistor in ice water: the probe's fit goes on below 0 °C, the solubility equation ends there.</summary>
    [Theory]
    [InlineData(-0.1, "111|133311", "temperature is just below its range, extrapolated")]
    [InlineData(-0.2, "111|133311", "temperature is just below its range, extrapolated")]
    [InlineData(-0.3, "111|144411", "temperature is below its range")]
    public void IceWater_IsComputedNearTheEdgeAndNoFurther(double celsius, string flags, string reason)
    {
        LoadedCalibration calibration = StationParts.Calibration(record => record with
        {
            Probe = record.Probe with
            {
                TemperatureCoefficient = record.Probe.TemperatureCoefficient! with { FittedLowCelsius = -5 },
            },
        });

        JsonNode json = Make(StationParts.Sample with { TemperatureCelsius = celsius }, StationParts.Configuration(), calibration);

        string[] inputs = ["temperatureC", "pressureHPa", "salinity"];
        Assert.Equal(flags, string.Concat(inputs.Select(name => Flag(json, name))) + "|" + string.Concat(_quantities.Keys.Select(name => Flag(json, name))));
        Assert.Equal(reason, (string)json["mgPerL"]!["reason"]!);
        Assert.Equal(celsius < -0.2, json["mgPerL"]!["value"] == null);
        Assert.True((double)json["partialPressureHPa"]!["value"]! > 0);
        Assert.Equal(101.5, (double)json["raw"]!["signal"]!);
        Assert.Null(json["noReadingReason"]);
    }

    [Fact]
    public void MissingTemperature_LeavesTheReasonInTheJournal_AndStillSendsAMessage()
    {
        MadeReading made = new ReadingMaker(StationParts.Configuration(), StationParts.Calibration(), "s")
            .Make(StationParts.Sample with { TemperatureCelsius = null }, 3);
        Assert.Null(made.Row.Reading);
        Assert.Equal("temperature is missing", made.Row.NoReadingReason);
        Assert.Equal("probecal/v1/tarn/do-1/reading", made.Message.Topic);
    }

    [Fact]
    public void GoodReading_StandsInTheJournalAsItIsSent()
    {
        MadeReading made = new ReadingMaker(StationParts.Configuration(), StationParts.Calibration(), "s").Make(StationParts.Sample, 3);
        Assert.Equal(Encoding.UTF8.GetString(made.Message.Payload.Span), made.Row.Reading);
        Assert.Null(made.Row.NoReadingReason);
    }

    [Fact]
    public void WithoutACalibration_TheRawSampleIsSent_WithoutValues()
    {
        JsonNode json = Make(StationParts.Sample, StationParts.Configuration(("calibration", "\"none\"")), null);
        Assert.Equal("no calibration is configured", (string)json["noReadingReason"]!);
        Assert.Equal(101.5, (double)json["raw"]!["signal"]!);
        Assert.Equal((2, 9), ((int)json["temperatureC"]!["flag"]!, (int)json["mgPerL"]!["flag"]!));
        Assert.Null(json["mgPerL"]!["value"]);
    }

    [Fact]
    public void TextThatIsNoUnicode_IsSentWithReplacementCharacters()
    {
        RawSample sample = new(StationParts.Time, "half a pair: \ud83d.", 100) { TemperatureCelsius = 18, PressureHectopascal = 940, Salinity = 0 };
        Assert.Equal("half a pair: \ufffd.", (string)Make(sample, StationParts.Configuration(), StationParts.Calibration())["raw"]!["text"]!);
    }

    [Theory]
    [InlineData("simulated", "true")]
    [InlineData("source", "\"simulated\"")]
    public void WhatIsSimulated_SaysSo(string key, string json)
    {
        Assert.True((bool)Make(StationParts.Sample, StationParts.Configuration((key, json)), StationParts.Calibration())["simulated"]!);
    }

    [Theory]
    [InlineData("simulated", "true", true)]
    [InlineData("simulated", "false", false)]
    [InlineData("source", "\"simulated\"", true)]
    public void StatusAndWill_SayWhetherItIsSimulated(string key, string json, bool simulated)
    {
        StationMessages messages = new(StationParts.Configuration((key, json)), StationParts.Calibration(), "probecal 9.9.9", "scripted");
        SourceStateChanged open = new(StationParts.Time, SourceState.Open, "opened");
        foreach (Message message in new[] { messages.Running(open), messages.Stopped(StationParts.Time), messages.Lost() })
        {
            Assert.Equal(simulated, (bool)JsonNode.Parse(message.Payload.Span)!["simulated"]!);
        }
    }

    [Fact]
    public void Times_AreSentInUtc_WhateverTheirOffset()
    {
        TimeSpan offset = TimeSpan.FromHours(2);
        RawSample abroad = StationParts.Sample with { TimeUtc = StationParts.Time.ToOffset(offset), ReceivedUtc = StationParts.Time.ToOffset(offset) };
        JsonNode reading = Make(abroad, StationParts.Configuration(), StationParts.Calibration());
        Assert.Equal("2026-06-02T12:00:00.000000Z", (string)reading["timeUtc"]!);
        Assert.Equal("2026-06-02T12:00:00.000000Z", (string)reading["receivedUtc"]!);
    }

    [Fact]
    public void SimulatedCalibration_MarksTheReading()
    {
        Assert.True((bool)Make(StationParts.Sample, StationParts.Configuration(), StationParts.Calibration(record => record with { Simulated = true }))["simulated"]!);
    }

    [Fact]
    public void AnotherThermometer_MakesTheReadingLessSure()
    {
        double same = Uncertainty(StationParts.Configuration());
        double named = Uncertainty(StationParts.Configuration(("thermometer", "{ \"id\": \"do-1\", \"standardUncertainty\": \"0.03 K\" }")));
        double other = Uncertainty(StationParts.Configuration(("thermometer", "{ \"id\": \"T-9\", \"standardUncertainty\": \"0.03 K\", \"offsetStandardUncertainty\": \"0.5 K\" }")));
        Assert.Equal(same, named);
        Assert.True(same < other);
    }

    [Fact]
    public void TemperatureTypedFromAnotherThermometer_DoesNotCancel()
    {
        CalibrationRecord Typed(CalibrationRecord record, string thermometer) => record with
        {
            Points = [.. record.Points.Select(point => point with { Temperature = point.Temperature with { Source = "typed" } })],
            Probe = record.Probe with { Thermometer = record.Probe.Thermometer with { Id = thermometer } },
        };
        double Of(string thermometer, params (string, string)[] changes) => (double)Make(
            StationParts.Sample, StationParts.Configuration(changes), StationParts.Calibration(record => Typed(record, thermometer)))["mgPerL"]!["standardUncertainty"]!;
        double same = Uncertainty(StationParts.Configuration());
        double other = Uncertainty(StationParts.Configuration(("thermometer", "{ \"id\": \"T-9\", \"standardUncertainty\": \"0.03 K\" }")));

        // Typed from the display of the probe itself: the line says the same later.
        Assert.Equal(same, Of("do-1"));
        // Typed from a thermometer that does not read the line: nothing is common, unless the configuration says so.
        Assert.Equal(other, Of("T-1"));
        Assert.Equal(same, Of("T-1", ("thermometer", "{ \"id\": \"T-1\", \"standardUncertainty\": \"0.03 K\" }")));
    }

    [Fact]
    public void SignalUncertainty_ComesFromTheCalibration_UnlessEntered()
    {
        LoadedCalibration calibration = StationParts.Calibration(record => record with { Probe = record.Probe with { SignalResolution = 0.6 } });
        // Scatter 0.12 at the point, last digit 0.6 rectangular: sqrt(0.12² + 0.6²/12).
        Assert.Equal(0.2107, calibration.SignalUncertainty, 4);
        Assert.True(Uncertainty(StationParts.Configuration()) < Uncertainty(StationParts.Configuration(("signalStandardUncertainty", "\"5\""))));
    }

    [Fact]
    public void FixedPressureAndSalinity_AreUsed_AndNamed()
    {
        StationConfiguration configuration = StationParts.Configuration(
            ("line", "\"{signal},{temperature}\""),
            ("pressure", "{ \"source\": \"barometer:B-12\", \"value\": \"706.2 mmHg\" }"),
            ("salinity", "{ \"source\": \"survey\", \"value\": \"0.2\" }"));
        JsonNode json = Make(StationParts.Sample with { PressureHectopascal = null, Salinity = null }, configuration, StationParts.Calibration());
        Assert.Equal((706.2 * 1013.25 / 760, "barometer:B-12", 10.0), Input(json, "pressureHPa"));
        Assert.Equal((0.2, "survey", 0.25), Input(json, "salinity"));
        Assert.Equal("1", Flag(json, "percentLocal"));
    }

    private static double Uncertainty(StationConfiguration configuration)
    {
        return (double)Make(StationParts.Sample, configuration, StationParts.Calibration())["mgPerL"]!["standardUncertainty"]!;
    }

    /// <summary>Makes the reading and holds it to the published schema.</summary>
    private static JsonNode Make(RawSample sample, StationConfiguration configuration, LoadedCalibration? calibration)
    {
        byte[] payload = new ReadingMaker(configuration, calibration, "probecal 9.9.9").Make(sample, 7).Message.Payload.ToArray();
        using JsonDocument document = JsonDocument.Parse(payload);
        EvaluationResults result = Schemas.Of("reading").Evaluate(document.RootElement, new EvaluationOptions { OutputFormat = OutputFormat.List });
        Assert.True(result.IsValid, string.Join("; ", (result.Details ?? []).Where(each => each.Errors != null).Select(each => each.InstanceLocation + " " + string.Join(",", each.Errors!.Values))));
        return JsonNode.Parse(payload)!;
    }

    private static (double, string, double) Input(JsonNode json, string name)
    {
        return ((double)json[name]!["value"]!, (string)json[name]!["source"]!, (double)json[name]!["standardUncertainty"]!);
    }

    private static string Flag(JsonNode json, string name)
    {
        return ((int)json[name]!["flag"]!).ToString(System.Globalization.CultureInfo.InvariantCulture);
    }
}
