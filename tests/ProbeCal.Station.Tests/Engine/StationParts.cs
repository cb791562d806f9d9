using System;
using System.Text;
using System.Text.Json.Nodes;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Engine;
using ProbeCal.Station.Tests.CalibrationLog;

namespace ProbeCal.Station.Tests.Engine;

/// <summary>A station at an invented place, for tests of the engine.</summary>
internal static class StationParts
{
    internal const string Line = "{time},{signal:nA},{temperature},{pressure},{salinity}";

    /// <summary>A day after the calibration of <see cref="SampleRecords"/>.</summary>
    internal static readonly DateTimeOffset Time = SampleRecords.Noon.AddDays(1);

    internal static readonly RawSample Sample = new(Time.AddSeconds(0.25), "2026-06-02T12:00:00Z,101.5,18.25,941.5,0.3", 101.5)
    {
        TimeUtc = Time,
        TimeFromLine = true,
        TemperatureCelsius = 18.25,
        PressureHectopascal = 941.5,
        Salinity = 0.3,
    };

    /// <summary>The configuration with some members set to other JSON.</summary>
    internal static StationConfiguration Configuration(params (string Key, string Json)[] changes)
    {
        JsonObject root = JsonNode.Parse("""
            {
              "format": "probecal-station-configuration",
              "version": 1,
              "station": "tarn",
              "site": { "name": "Invented Tarn", "altitude": "640 m" },
              "probe": "do-1",
              "source": "stdin",
              "thermometer": { "standardUncertainty": "0.03 K" },
              "pressure": { "source": "line:B-12", "standardUncertainty": "0.8 hPa" },
              "salinity": { "source": "line", "standardUncertainty": "0.1" },
              "stirring": "stirred"
            }
            """)!.AsObject();
        root["line"] = Line;
        foreach ((string key, string json) in changes)
        {
            root[key] = JsonNode.Parse(json);
        }

        return ConfigurationFile.Parse("station.json", Encoding.UTF8.GetBytes(root.ToJsonString()), ".");
    }

    internal static LoadedCalibration Calibration(Func<CalibrationRecord, CalibrationRecord>? change = null)
    {
        CalibrationRecord record = SampleRecords.Of("do-1", SampleRecords.Noon) with { Id = "cal-0001", Simulated = false };
        record = change == null ? record : change(record);
        return new LoadedCalibration(record, new string('a', 64), RecordJson.ToBytes(record));
    }
}
