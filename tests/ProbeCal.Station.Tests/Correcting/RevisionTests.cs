using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Security.Cryptography;
using System.Threading;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Tests.CalibrationLog;
using Xunit;

namespace ProbeCal.Station.Tests.Correcting;

/// <summary>Revisions: what was done stands beside the output, the next one follows from a changed log, and every value can be computed again from its steps.</summary>
public class RevisionTests
{
    private static readonly DateTimeOffset Start = SampleRecords.Noon.AddDays(1);

    private static string[] Table(int rows)
    {
        return [Deployment.Header, .. Enumerable.Range(0, rows).Select(static i => Deployment.Row(Start.AddMinutes(10 * i), 80 + (i % 7), 17 + (0.01 * i)))];
    }

    [Fact]
    public void What_an_older_revision_does_not_say_is_what_was_usual()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(SampleRecords.Noon.AddDays(1), 80));
        deployment.Correct();
        System.Text.Json.Nodes.JsonObject json = System.Text.Json.Nodes.JsonNode.Parse(System.IO.File.ReadAllText(Revision.PathFor(deployment.Path("out.csv"))))!.AsObject();
        System.Text.Json.Nodes.JsonObject request = json["request"]!.AsObject();
        Assert.True(json.Remove("because") & request.Remove("write") & request.Remove("drift") & request.Remove("driftFrom") & request.Remove("fouling") & request.Remove("limits"));
        Revision revision = RevisionJson.TryRead(System.Text.Encoding.UTF8.GetBytes(json.ToJsonString()), out string problem)!;
        Assert.True(revision != null, problem);
        CorrectionRequest usual = Deployment.Asked;
        Assert.Empty(revision!.Because);
        Assert.Empty(revision.Request.Write);
        Assert.Equal((usual.Drift, usual.DriftFrom, usual.Fouling, usual.Limits), (revision.Request.Drift, revision.Request.DriftFrom, revision.Request.Fouling, revision.Request.Limits));
    }

    [Fact]
    public void Revision_says_what_was_done_and_to_which_bytes()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Table(20));
        deployment.Correct("june-r1.csv");
        Revision revision = deployment.RevisionOf("june-r1.csv");
        Assert.Equal((1, null, "probecal 9.9.9", deployment.Time.GetUtcNow()), (revision.Number, revision.Previous, revision.Software, revision.MadeUtc));
        Assert.Equal(("raw.csv", Hash(deployment.Path("raw.csv"))), (revision.Input.File, revision.Input.Sha256));
        Assert.Equal(("june-r1.csv", Hash(deployment.Path("june-r1.csv"))), (revision.Output.File, revision.Output.Sha256));
        Assert.Equal((deployment.Log.LogId, 1L, deployment.Log.Chain.HeadSha256), (revision.Log.LogId, revision.Log.Count, revision.Log.HeadSha256));
        Assert.Equal((20L, 20L, 0L), (revision.Counts.Rows, revision.Counts.Corrected, revision.Counts.Refused));
        Assert.Equal((Start, Start.AddMinutes(190)), (revision.FirstUtc, revision.LastUtc));
    }

    [Fact]
    public void A_second_run_is_the_second_revision_and_names_the_first()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Table(5));
        deployment.Correct("a.csv");
        deployment.Correct("b.csv");
        Revision second = deployment.RevisionOf("b.csv");
        Assert.Equal(2, second.Number);
        Assert.Equal(new RevisionFile("a.csv.revision.json", Hash(deployment.Path("a.csv.revision.json"))), second.Previous);
    }

    [Fact]
    public void A_replaced_calibration_is_corrected_again_in_a_revision_of_its_own()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Table(5));
        List<Dictionary<string, string>> first = deployment.Correct("june-r1.csv");
        byte[] kept = File.ReadAllBytes(deployment.Path("june-r1.csv"));
        Assert.Empty(Again(deployment, deployment.Path("june-r1.csv.revision.json")));

        string id = deployment.Log.Records[0].Record.Id;
        CalibrationRecord corrected = SampleRecords.Of(Deployment.Probe, SampleRecords.Noon);
        deployment.Log.Append(corrected with
        {
            Replaces = id,
            ReplacesReason = "the barometer read 9 hPa low",
            Points = [.. corrected.Points.Select(static point => point with { Pressure = point.Pressure with { Value = point.Pressure.Value + 9 } })],
        });
        string made = Assert.Single(Again(deployment, deployment.Path("")));
        Assert.Equal(deployment.Path("june-r2.csv.revision.json"), made);
        Revision revision = deployment.RevisionOf("june-r2.csv");
        Assert.Equal(2, revision.Number);
        Assert.Contains($"{id} was replaced by {deployment.Log.LogId}-0002: the barometer read 9 hPa low", revision.Because);
        Assert.Equal(deployment.Log.LogId + "-0002", revision.Calibrations.Single().Id);
        Assert.Equal(kept, File.ReadAllBytes(deployment.Path("june-r1.csv")));
        // 9 hPa more at the point is 1 % more oxygen in every reading.
        double ratio = Deployment.Value(deployment.Rows("june-r2.csv")[0], "O2 [mg/L]") / Deployment.Value(first[0], "O2 [mg/L]");
        Assert.Equal((939.3 + 9) / 939.3, ratio, 5e-4);

        InputException followed = Assert.Throws<InputException>(() => Again(deployment, deployment.Path("june-r1.csv.revision.json")));
        Assert.Contains("revision 2 has followed it already; name june-r2.csv.revision.json", followed.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_withdrawn_calibration_leaves_the_rows_to_the_one_that_holds()
    {
        using Deployment deployment = new();
        CalibrationRecord later = SampleRecords.Of(Deployment.Probe, SampleRecords.Noon.AddHours(3));
        deployment.Log.Append(later with { Points = [.. later.Points.Select(static point => point with { Signal = point.Signal with { Mean = 100 } })] });
        deployment.Write("raw.csv", Table(5));
        deployment.Correct("by-probe.csv");
        string id = deployment.Log.Records[1].Record.Id;
        deployment.Correct("by-id.csv", request => request with { Probe = null, Calibration = id });
        deployment.Log.Append(new AmendmentRecord { Of = id, Reason = "the bath was not saturated", Software = "probecal 9.9.9" });

        string made = Assert.Single(Again(deployment, deployment.Path("by-id.csv.revision.json")));
        Revision revision = RevisionJson.Read("", made);
        Assert.Contains($"{id} was withdrawn: the bath was not saturated", revision.Because);
        Assert.Equal(deployment.Log.Records[0].Record.Id, revision.Calibrations.Single().Id);
    }

    [Fact]
    public void A_visit_that_was_added_or_withdrawn_is_corrected_again()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Table(5));
        deployment.Correct("a-r1.csv");
        VisitRecord visit = deployment.Visit(static entry => entry with { Standards = ["9mg/L read 8mg/L from air-saturated-water"] });
        Revision second = RevisionJson.Read("", Assert.Single(Again(deployment, deployment.Path("a-r1.csv.revision.json"))));
        Assert.Contains($"visit {visit.Id} was added", second.Because);
        Assert.Single(second.Service.Findings);
        deployment.Log.Append(new AmendmentRecord { Of = visit.Id, Reason = "typed for another probe", Software = "probecal 9.9.9" });
        Revision third = RevisionJson.Read("", Assert.Single(Again(deployment, deployment.Path(""))));
        Assert.Equal((3, 0), (third.Number, third.Service.Findings.Length));
    }

    [Fact]
    public void An_input_that_was_changed_is_not_corrected_again()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Table(5));
        deployment.Correct("a.csv");
        deployment.Log.Append(new AmendmentRecord { Of = deployment.Log.Records[0].Record.Id, Reason = "wrong", Software = "probecal 9.9.9" });
        deployment.Write("raw.csv", Table(6));
        InputException wrong = Assert.Throws<InputException>(() => Again(deployment, deployment.Path("a.csv.revision.json")));
        Assert.Contains("its input raw.csv has other bytes now", wrong.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("slope-and-zero")]
    [InlineData("percent")]
    [InlineData("constant")]
    public void Every_step_of_an_explained_row_computes_again(string form)
    {
        using Deployment deployment = new();
        deployment.Visit(static entry => entry with
        {
            MonitorBefore = ["7.1mg/L"],
            MonitorAfter = ["7.8mg/L"],
            FieldBefore = ["8.2mg/L"],
            FieldAfter = ["8.25mg/L"],
            Standards = ["8.97mg/L read 8.41mg/L from air-saturated-water at 20.1C salinity 0", "0mg/L read 0.125mg/L from zero-solution at 20.1C salinity 0"],
        });
        deployment.Write("raw.csv", Table(40));
        List<Dictionary<string, string>> rows = deployment.Correct(change: request => request with
        {
            Drift = form,
            Fouling = form,
            Write = ["partial-pressure:shortest,mg/L:shortest,percent-local:shortest,drift:shortest,fouling:shortest,corrected:shortest,rating"],
        });
        ExplainedRow explained = ExplainedRow.Of(deployment.Path("out.csv.revision.json"), 31, deployment.Log);

        int computed = 0;
        foreach (CorrectionStep step in explained.Steps)
        {
            if (Again(step) is double again)
            {
                computed++;
                Assert.True(Math.Abs(again - step.Value) <= 4e-15 * Math.Max(1, Math.Abs(step.Value)) * 16, $"{step.Name}: {again:R} from its inputs and {step.Value:R} in the step");
            }
        }

        // Partial pressure, concentration, two shares, what came of drift and fouling, both corrections, their sum; slope-and-zero has four more.
        Assert.Equal(form == "slope-and-zero" ? 13 : 9, computed);
        // Each number that goes in is a number that came out before, so nothing comes from nowhere.
        Dictionary<string, double> known = [];
        foreach (CorrectionStep step in explained.Steps)
        {
            foreach ((string name, double value) in step.Inputs.Where(each => known.ContainsKey(each.Name)))
            {
                Assert.Equal(known[name], value);
            }

            known[step.Name] = step.Value;
        }

        Dictionary<string, string> row = rows[30];
        Assert.Equal(Deployment.Value(row, "p O2 [hPa]"), explained.ValueOf("partial pressure"));
        Assert.Equal(Deployment.Value(row, "O2 [mg/L]"), explained.ValueOf("concentration"));
        Assert.Equal(Deployment.Value(row, "O2 [% local]"), explained.ValueOf("% of local air"));
        Assert.Equal(Deployment.Value(row, "drift correction [mg/L]"), explained.ValueOf("drift correction"));
        Assert.Equal(Deployment.Value(row, "fouling correction [mg/L]"), explained.ValueOf("fouling correction"));
        Assert.Equal(Deployment.Value(row, "O2 corrected [mg/L]"), explained.ValueOf("corrected"));
        Assert.Equal(row["status"], explained.Status);
        Assert.Contains("rated " + row["rating"], explained.Steps[^1].From, StringComparison.Ordinal);
        Assert.NotEqual(0, explained.ValueOf("drift correction"));
        Assert.NotEqual(0, explained.ValueOf("fouling correction"));
    }

    [Fact]
    public void A_revision_explains_itself_also_after_its_calibration_was_withdrawn()
    {
        using Deployment deployment = new();
        deployment.Write("raw.csv", Table(3));
        Dictionary<string, string> row = deployment.Correct(change: static request => request with { Write = ["mg/L:shortest"] })[1];
        deployment.Log.Append(new AmendmentRecord { Of = deployment.Log.Records[0].Record.Id, Reason = "wrong", Software = "probecal 9.9.9" });
        Assert.Equal(Deployment.Value(row, "O2 [mg/L]"), ExplainedRow.Of(deployment.Path("out.csv.revision.json"), 2, deployment.Log).ValueOf("concentration"));
        InputException none = Assert.Throws<InputException>(() => ExplainedRow.Of(deployment.Path("out.csv.revision.json"), 4, deployment.Log));
        Assert.Contains("the table has 3 rows under its header", none.Message, StringComparison.Ordinal);
    }

    /// <summary>The formula of a step over its inputs, written out here; null for what was read.</summary>
    private static double? Again(CorrectionStep step)
    {
        double In(string name) => step.Inputs.First(each => each.Name == name).Value;
        return step.Formula switch
        {
            "(response - zero)/(slope * flow factor * gain)" => (In("response") - In("zero")) / (In("slope") * In("flow factor") * In("gain")),
            "partial pressure * mg/L per hPa" => In("partial pressure") * In("mg/L per hPa"),
            "seconds since onset/seconds from onset to visit, from 0 to 1" => Math.Clamp(In("seconds since onset") / In("seconds from onset to visit"), 0, 1),
            "start + share * (end - start)" => In("start") + (In("share") * (In("end") - In("start"))),
            "(partial pressure - zero moved/response per hPa)/slope moved * mg/L per hPa" =>
                (In("partial pressure") - (In("zero moved") / In("response per hPa"))) / In("slope moved") * In("mg/L per hPa"),
            "concentration + start + share * (end - start)" => In("concentration") + In("start") + (In("share") * (In("end") - In("start"))),
            "concentration * (1 + (start + share * (end - start))/100)" => In("concentration") * (1 + ((In("start") + (In("share") * (In("end") - In("start")))) / 100)),
            "after drift + start + share * (end - start)" => In("after drift") + In("start") + (In("share") * (In("end") - In("start"))),
            "after drift + concentration * (start + share * (end - start))/100" => In("after drift") + (In("concentration") * (In("start") + (In("share") * (In("end") - In("start")))) / 100),
            "(after drift - zero moved)/slope moved" => (In("after drift") - In("zero moved")) / In("slope moved"),
            "after drift - concentration" => In("after drift") - In("concentration"),
            "corrected - after drift" => In("corrected") - In("after drift"),
            "|drift correction| + |fouling correction|" => Math.Abs(In("drift correction")) + Math.Abs(In("fouling correction")),
            _ => null,
        };
    }

    private static IReadOnlyList<string> Again(Deployment deployment, string path)
    {
        return CorrectionAgain.Run(path, null, deployment.Log, deployment.Surroundings, CancellationToken.None);
    }

    private static string Hash(string path)
    {
        return Convert.ToHexStringLower(SHA256.HashData(File.ReadAllBytes(path)));
    }
}
