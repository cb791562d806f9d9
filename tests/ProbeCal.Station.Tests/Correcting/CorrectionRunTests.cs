using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text.Json.Nodes;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Engine;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Tests.CalibrationLog;
using ProbeCal.Station.Tests.Engine;
using Xunit;

namespace ProbeCal.Station.Tests.Correcting;

public class CorrectionRunTests
{
    private const int Seed = 42;

    private static readonly (string Column, string Json, bool Uncertainty)[] _live =
    [
        ("p O2 [hPa]", "partialPressureHPa", false), ("O2 [mg/L]", "mgPerL", false), ("O2 [umol/L]", "umolPerL", false), ("O2 [umol/kg]", "umolPerKg", false),
        ("O2 [% local]", "percentLocal", false), ("O2 [% 1 atm]", "percentOneAtmosphere", false), ("u p O2 [hPa]", "partialPressureHPa", true),
        ("u O2 [mg/L]", "mgPerL", true), ("u O2 [% local]", "percentLocal", true), ("u O2 [% 1 atm]", "percentOneAtmosphere", true),
    ];

    private static DateTimeOffset At(int rows)
    {
        return SampleRecords.Noon.AddDays(1).AddMinutes(10 * rows);
    }

    [Fact]
    public void Recorded_and_live_readings_agree_bit_for_bit()
    {
        using Deployment deployment = new();
        Random random = new(Seed);
        List<RawSample> samples = [];
        for (int i = 0; i < 2000; i++)
        {
            // Some outside the fit and the equation, some without a pressure or a salinity.
            DateTimeOffset time = At(i);
            samples.Add(new RawSample(time, "", Math.Round((random.NextDouble() * 130) - 2, 3))
            {
                TimeUtc = time,
                TimeFromLine = true,
                TemperatureCelsius = Math.Round(random.NextDouble() * 42, 3),
                PressureHectopascal = i % 17 == 0 ? null : Math.Round(930 + (random.NextDouble() * 20), 2),
                Salinity = i % 13 == 0 ? null : Math.Round(random.NextDouble() * 41, 2),
            });
        }

        deployment.Write("raw.csv", [Deployment.Header, .. samples.Select(static each => string.Create(
            CultureInfo.InvariantCulture, $"{each.TimeUtc.UtcDateTime:yyyy-MM-dd HH:mm:ss};{each.Signal:R};{each.TemperatureCelsius:R};{each.PressureHectopascal:R};{each.Salinity:R};"))]);
        List<Dictionary<string, string>> rows = deployment.Correct(change: static request => request with
        {
            TimeOffset = "UTC",
            TemperatureUncertainty = "0.03K",
            PressureUncertainty = "0.8hPa",
            SalinityUncertainty = "0.1",
            Write = ["partial-pressure:shortest,mg/L:shortest,umol/L:shortest,umol/kg:shortest,percent-local:shortest,percent-1atm:shortest", "u(partial-pressure):shortest,u(mg/L):shortest,u(percent-local):shortest,u(percent-1atm):shortest"],
        });

        StoredCalibration stored = deployment.Log.Records[0];
        ReadingMaker live = new(StationParts.Configuration(("salinity", """{ "source": "line", "standardUncertainty": "0.1" }""")), new LoadedCalibration(stored.Record, stored.Sha256, deployment.Log.BytesOf(stored)), "probecal 9.9.9");
        int compared = 0;
        for (int i = 0; i < samples.Count; i++)
        {
            MadeReading made = live.Make(samples[i], i + 1);
            JsonNode? json = made.Row.Reading is null ? null : JsonNode.Parse(made.Row.Reading);
            foreach ((string column, string name, bool uncertainty) in _live)
            {
                JsonNode? expected = json?[name]?[uncertainty ? "standardUncertainty" : "value"];
                string found = rows[i][column];
                if (expected is null)
                {
                    Assert.Equal("", found);
                    continue;
                }

                compared++;
                Assert.Equal(BitConverter.DoubleToInt64Bits((double)expected), BitConverter.DoubleToInt64Bits(double.Parse(found, CultureInfo.InvariantCulture)));
            }
        }

        Assert.True(12_000 < compared, $"only {compared} values were there to compare");
    }

    [Fact]
    public void Raw_rows_stay_as_they_are()
    {
        using Deployment deployment = new();
        string[] lines =
        [
            "# logger 7", "", Deployment.Header,
            Deployment.Row(At(0), 101.5, remark: "\"calm; clear\""), "", Deployment.Row(At(1), 102, remark: "\u00e9t\u00e9"), "not a row", Deployment.Row(At(2), 103, remark: "\"open"),
        ];
        deployment.Write("raw.csv", lines);
        byte[] before = File.ReadAllBytes(deployment.Path("raw.csv"));
        deployment.Correct(change: static request => request with { HeaderLine = "3" });

        Assert.Equal(before, File.ReadAllBytes(deployment.Path("raw.csv")));
        string[] output = File.ReadAllLines(deployment.Path("out.csv"));
        Assert.Equal(lines.Length, output.Length);
        Assert.Equal(["# logger 7", ""], output[..2]);
        for (int i = 2; i < lines.Length - 2; i++)
        {
            Assert.StartsWith(lines[i], output[i], StringComparison.Ordinal);
        }

        Assert.Equal("not a row;;;;;;;;;;refused: other number of cells than the header", output[6]);
        // An open quotation mark would swallow what follows, so its row stands quoted as a whole.
        Assert.StartsWith("\"" + lines[7].Replace("\"", "\"\"", StringComparison.Ordinal) + "\";;;;;;;;;;refused: a quotation mark is opened", output[7], StringComparison.Ordinal);
    }

    [Fact]
    public void Each_row_has_the_calibration_in_force_then()
    {
        using Deployment deployment = new();
        CalibrationRecord later = SampleRecords.Of(Deployment.Probe, SampleRecords.Noon.AddDays(10));
        later = later with { Points = [.. later.Points.Select(static point => point with { Signal = point.Signal with { Mean = 100 } })] };
        deployment.Log.Append(later);
        deployment.Log.Append(SampleRecords.Of(Deployment.Probe, SampleRecords.Noon.AddDays(11), pass: false));
        deployment.Write(
            "raw.csv", Deployment.Header, Deployment.Row(SampleRecords.Noon.AddDays(-1), 90), Deployment.Row(SampleRecords.Noon.AddDays(1), 90), Deployment.Row(SampleRecords.Noon.AddDays(12), 90));
        List<Dictionary<string, string>> rows = deployment.Correct(change: static request => request with { Write = ["mg/L:4", "calibration", "time"] });

        string log = deployment.Log.LogId;
        Assert.Equal(["", log + "-0001", log + "-0002"], rows.Select(static row => row["calibration"]));
        Assert.Equal("refused: no calibration was in force then", rows[0]["status"]);
        Assert.Equal("2026-06-13T12:00:00Z", rows[2]["time [UTC]"]);
        // The same signal on a probe that gives less for the same oxygen: (90 - 0.4)/(100 - 0.4) against (90 - 0.4)/(113.25 - 0.4).
        Assert.Equal((113.25 - 0.4) / (100 - 0.4), Deployment.Value(rows[2], "O2 [mg/L]") / Deployment.Value(rows[1], "O2 [mg/L]"), 1e-4);
        Revision revision = deployment.RevisionOf();
        Assert.Equal([(log + "-0001", 1L), (log + "-0002", 1L)], revision.Calibrations.Select(static each => (each.Id, each.Rows)));
    }

    [Fact]
    public void Decimals_are_those_declared()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(At(0), 101.5));
        Dictionary<string, string> row = deployment.Correct(change: static request => request with { Write = ["mg/L:1", "percent-local:0", "partial-pressure:shortest", "u(mg/L):6"] })[0];
        Assert.Matches(@"^\d+\.\d$", row["O2 [mg/L]"]);
        Assert.Matches(@"^\d+$", row["O2 [% local]"]);
        Assert.Matches(@"^\d+\.\d{10,}$", row["p O2 [hPa]"]);
        Assert.Matches(@"^0\.\d{6}$", row["u O2 [mg/L]"]);
        Assert.Equal(["1", "0", null, "6", null], deployment.RevisionOf().Columns.Select(static each => each.Decimals?.ToString(CultureInfo.InvariantCulture)));
    }

    [Fact]
    public void Times_that_repeat_or_go_back_are_told_and_kept()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(At(1), 90), Deployment.Row(At(1), 91), Deployment.Row(At(0), 92), Deployment.Row(At(2), 93));
        List<Dictionary<string, string>> rows = deployment.Correct();
        Assert.All(rows, static row => Assert.NotEqual("", row["O2 [mg/L]"]));
        Assert.DoesNotContain("time", rows[0]["status"], StringComparison.Ordinal);
        Assert.Contains("time repeats", rows[1]["status"], StringComparison.Ordinal);
        Assert.Contains("time goes back", rows[2]["status"], StringComparison.Ordinal);
        Assert.DoesNotContain("time", rows[3]["status"], StringComparison.Ordinal);
        Assert.Contains(deployment.Said, static line => line.Contains("1 row, time goes back (first in line 4)", StringComparison.Ordinal));
    }

    [Fact]
    public void Mixed_offsets_are_each_taken_as_written_and_told()
    {
        using Deployment deployment = new();
        string rest = ";90;18;941;0.3;";
        deployment.Write("raw.csv", Deployment.Header, "2026-06-03T14:00+02:00" + rest, "2026-06-03T13:10+01:00" + rest, "2026-06-03T14:20" + rest);
        List<Dictionary<string, string>> rows = deployment.Correct(change: static request => request with { Write = ["time"] });
        Assert.Equal(["2026-06-03T12:00:00Z", "2026-06-03T12:10:00Z", ""], rows.Select(static row => row["time [UTC]"]));
        Assert.Equal("refused: time does not say its offset from UTC", rows[2]["status"]);
        Assert.Contains(deployment.Said, static line => line.Contains("+01:00 in 1 rows, +02:00 in 1 rows", StringComparison.Ordinal));
    }

    [Theory]
    // What is given, and what the one line must say.
    [InlineData("no offset", "does not say its offset from UTC; say how the clock was set, for example --time-offset +02:00")]
    [InlineData("column", "there is no column Raw signal; there are Time, Raw [nA], Water temp, Baro, Salt, Remark")]
    [InlineData("near column", "there is no column Water tmep (did you mean Water temp?)")]
    [InlineData("comma decimals", "line 2: signal unreadable '101,5' (a comma is no decimal mark unless --decimal-comma says so)")]
    [InlineData("empty", "this file is empty")]
    [InlineData("header only", "there is no row under the header")]
    [InlineData("too early", "none of its 1 rows lies in the time of a calibration; the first, c3a41f09b2e7-0001, holds from 2026-06-01T12:00:00Z on")]
    [InlineData("no header line", "there is no line 9 for the header")]
    [InlineData("unknown probe", "no calibration of it is in this log (did you mean do-1?); there is do-1")]
    [InlineData("other unit", "the column is said to be in mV, and calibration c3a41f09b2e7-0001 was made in nA")]
    [InlineData("pressure missing", "the pressure is missing: map its column, or say one for all rows, for example --pressure 742mmHg (--pressure none goes without)")]
    [InlineData("pressure twice", "a column holds the pressure too; leave one out")]
    [InlineData("column of output", "there is no column mgL (did you mean mg/L?)")]
    [InlineData("decimals", "write the decimals as a number from 0 to 12, or shortest")]
    [InlineData("output exists", "this is there already, and a revision is never overwritten")]
    [InlineData("output is input", "this is there already, and a revision is never overwritten")]
    [InlineData("missing file", "there is no such file")]
    [InlineData("time form", "write a pattern with year, month, day, hour and minute")]
    [InlineData("service without visits", "no service visit and no later calibration says anything about this deployment")]
    [InlineData("both", "say either --probe ID")]
    public void Bad_input_is_refused_in_one_line_and_nothing_is_left(string what, string expected)
    {
        using Deployment deployment = new();
        string row = Deployment.Row(At(0), 101.5);
        deployment.Write("raw.csv", what switch
        {
            "no offset" => [Deployment.Header, row.Replace("Z;", ";", StringComparison.Ordinal)],
            "comma decimals" => [Deployment.Header, row.Replace("101.5", "101,5", StringComparison.Ordinal)],
            "empty" => [],
            "header only" => [Deployment.Header],
            "too early" => [Deployment.Header, Deployment.Row(SampleRecords.Noon.AddDays(-30), 101.5)],
            _ => [Deployment.Header, row],
        });
        if (what == "output exists")
        {
            deployment.Write("out.csv", "kept");
        }

        CorrectionRequest Change(CorrectionRequest request)
        {
            string[] columns = [.. request.Columns];
            return what switch
            {
                "column" => request with { Columns = ["signal=Raw signal", .. columns.Where(static each => !each.StartsWith("signal", StringComparison.Ordinal))] },
                "near column" => request with { Columns = ["temperature=Water tmep [C]", .. columns.Where(static each => !each.StartsWith("temp", StringComparison.Ordinal))] },
                "no header line" => request with { HeaderLine = "9" },
                "unknown probe" => request with { Probe = "do-2" },
                "other unit" => request with { Columns = ["signal=#2 [mV]", .. columns.Where(static each => !each.StartsWith("signal", StringComparison.Ordinal))] },
                "pressure missing" => request with { Columns = [.. columns.Where(static each => !each.StartsWith("pressure", StringComparison.Ordinal))] },
                "pressure twice" => request with { Pressure = "742mmHg" },
                "column of output" => request with { Write = ["mgL"] },
                "decimals" => request with { Write = ["mg/L:many"] },
                "output is input" => request with { Output = request.Input },
                "missing file" => request with { Input = deployment.Path("june.csv") },
                "time form" => request with { TimeForm = "HH:mm" },
                "service without visits" => request with { Write = ["drift"] },
                "both" => request with { Calibration = "c3a41f09b2e7-0001" },
                _ => request,
            };
        }

        string[] files = Directory.GetFiles(deployment.Path(""));
        InputException wrong = Assert.Throws<InputException>(() => deployment.Correct(change: Change));
        Assert.Contains(expected, wrong.Message, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', wrong.Message);
        Assert.Equal(files.Order(), Directory.GetFiles(deployment.Path("")).Order());
    }

    [Fact]
    public void A_last_line_that_is_cut_off_is_refused_and_the_rest_corrected()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(At(0), 101.5));
        File.AppendAllText(deployment.Path("raw.csv"), "2026-06-02T12:10:00Z;102");
        List<Dictionary<string, string>> rows = deployment.Correct();
        Assert.NotEqual("", rows[0]["O2 [mg/L]"]);
        Assert.Equal("refused: the last line is cut off", rows[1]["status"]);
        Assert.EndsWith("\n", File.ReadAllText(deployment.Path("out.csv")), StringComparison.Ordinal);
    }

    [Fact]
    public void Decimal_commas_in_and_out()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(At(0), 101.5).Replace('.', ','));
        List<Dictionary<string, string>> commas = deployment.Correct("commas.csv", static request => request with { DecimalComma = true });
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(At(0), 101.5));
        List<Dictionary<string, string>> points = deployment.Correct("points.csv");
        Assert.Equal(points[0]["O2 [mg/L]"].Replace('.', ','), commas[0]["O2 [mg/L]"]);
        Assert.Contains(',', commas[0]["O2 [mg/L]"]);
    }

    [Fact]
    public void Values_stated_for_all_rows_are_those_of_a_column()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(At(0), 101.5, temperature: 18.25, pressure: 760 * 1013.25 / 760, salinity: 0));
        string[] write = ["mg/L:shortest", "percent-local:shortest"];
        Dictionary<string, string> columns = deployment.Correct("columns.csv", request => request with { Write = write })[0];
        Dictionary<string, string> stated = deployment.Correct("stated.csv", request => request with
        {
            Columns = ["time=Time", "signal=Raw [nA]"],
            Temperature = "18.25C",
            Pressure = "760mmHg",
            Salinity = "0",
            Write = write,
        })[0];
        Assert.Equal((columns["O2 [mg/L]"], columns["O2 [% local]"]), (stated["O2 [mg/L]"], stated["O2 [% local]"]));
    }

    [Fact]
    public void Pressure_that_cannot_be_true_at_the_altitude_is_not_used_as_live()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(At(0), 101.5, pressure: 1019), Deployment.Row(At(1), 101.5));
        List<Dictionary<string, string>> rows = deployment.Correct(change: static request => request with { Altitude = "640m" });
        Assert.Contains("pressure impossible at this altitude", rows[0]["status"], StringComparison.Ordinal);
        Assert.Equal("", rows[0]["O2 [% local]"]);
        Assert.NotEqual("", rows[0]["O2 [mg/L]"]);
        Assert.NotEqual("", rows[1]["O2 [% local]"]);
    }

    [Fact]
    public void Nothing_is_allocated_for_a_row()
    {
        using Deployment deployment = new();
        Allocated(deployment, 500);
        long few = Allocated(deployment, 1000);
        long many = Allocated(deployment, 9000);
        // A string or an array a row would be 24 bytes or more; buffers are the same for both.
        Assert.True(many - few < 8000 * 8, $"8000 more rows took {many - few} more bytes");
    }

    private static long Allocated(Deployment deployment, int rows)
    {
        File.WriteAllText(deployment.Path("raw.csv"), Deployment.Header + "\n" + string.Concat(Enumerable.Range(0, rows).Select(static i => Deployment.Row(At(i), 60 + (i % 50)) + "\n")));
        CorrectionRequest request = Deployment.Asked with { Input = deployment.Path("raw.csv"), Output = deployment.Path(string.Create(CultureInfo.InvariantCulture, $"out{rows}.csv")) };
        CorrectionSurroundings surroundings = deployment.Surroundings;
        long before = GC.GetAllocatedBytesForCurrentThread();
        CorrectionRun.Run(request, deployment.Log, surroundings, System.Threading.CancellationToken.None);
        return GC.GetAllocatedBytesForCurrentThread() - before;
    }
}
