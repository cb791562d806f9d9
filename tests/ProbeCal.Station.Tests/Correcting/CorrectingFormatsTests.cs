using System;
using System.IO;
using System.Linq;
using System.Text.Json;
using Json.Schema;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Tests.CalibrationLog;
using Xunit;

namespace ProbeCal.Station.Tests.Correcting;

/// <summary>Visits and revisions fit their published schemas, and a kept sample of each is read for ever.</summary>
public class CorrectingFormatsTests
{
    [Fact]
    public void Visit_fits_its_schema_and_comes_back()
    {
        using Deployment deployment = new();
        VisitRecord visit = Full(deployment);
        byte[] bytes = RecordJson.ToBytes(visit);
        Fits("visit", bytes);
        Assert.Equal(bytes, RecordJson.ToBytes(RecordJson.ReadEntry(bytes, "visit")));
        VisitRecord kept = Assert.IsType<VisitRecord>(RecordJson.ReadEntry(Sample("visit/version-1.json", bytes), "sample"));
        Assert.Equal(("do-1", 2, 2, "FM-2"), (kept.Probe, kept.Cleaning.Length, kept.Standards.Length, kept.FieldMeter));
        Assert.Equal(new VisitStandard(8.97, 8.41, "air-saturated-water", 20.1, 0), kept.Standards[0]);
    }

    [Fact]
    public void Revision_fits_its_schema_and_comes_back()
    {
        using Deployment deployment = new();
        Full(deployment);
        deployment.Write("raw.csv", Deployment.Header, Deployment.Row(SampleRecords.Noon.AddDays(3), 80), Deployment.Row(SampleRecords.Noon.AddDays(-3), 80), "", Deployment.Row(SampleRecords.Noon.AddDays(40), 80));
        deployment.Correct("first.csv");
        deployment.Correct("june-r2.csv", static request => request with { Write = ["mg/L:2,u(mg/L):shortest,corrected,rating,time"] });
        byte[] bytes = File.ReadAllBytes(deployment.Path("june-r2.csv.revision.json"));
        Fits("revision", bytes);
        Assert.Equal(bytes, RevisionJson.ToBytes(RevisionJson.TryRead(bytes, out _)!));
        byte[] sample = Sample("revision/version-1.json", bytes);
        Fits("revision", sample);
        Revision kept = RevisionJson.TryRead(sample, out _)!;
        Assert.Equal((2, "do-1", "slope-and-zero", 0.3), (kept.Number, kept.Probe, kept.Service.DriftForm, kept.Service.Limits.ApplyAbove));
        Assert.Equal(2, kept.Service.Drift.Length);
    }

    [Fact]
    public void A_newer_revision_and_another_file_are_refused()
    {
        Assert.Null(RevisionJson.TryRead("""{ "format": "probecal-revision", "version": 2 }"""u8, out string newer));
        Assert.Contains("version 2 of the revision is newer than this program", newer, StringComparison.Ordinal);
        Assert.Null(RevisionJson.TryRead("""{ "format": "probecal-reading", "version": 1 }"""u8, out string other));
        Assert.Contains("this is no revision", other, StringComparison.Ordinal);
        Assert.Null(RevisionJson.TryRead("""{ "format": "probecal-revision", "version": 1 }"""u8, out string damaged));
        Assert.Contains("cannot be read", damaged, StringComparison.Ordinal);
    }

    private static VisitRecord Full(Deployment deployment)
    {
        return deployment.Visit(static entry => entry with
        {
            Site = "Invented Tarn",
            MonitorBefore = ["7.1mg/L", "2.25mg/L"],
            MonitorAfter = ["7.8mg/L", "2.5mg/L"],
            FieldBefore = ["8.2mg/L", "2.5mg/L"],
            FieldAfter = ["8.25mg/L", "2.5mg/L"],
            FieldMeter = "FM-2",
            Standards = ["8.97mg/L read 8.41mg/L from air-saturated-water at 20.1C salinity 0", "0mg/L read 0.125mg/L from zero-solution at 20.1C salinity 0"],
            StandardsAt = "2026-06-21T13:00Z",
            FoulingOnset = "2026-06-10T00:00Z",
            Remarks = "slime on the membrane since the warm week",
        });
    }

    /// <summary>The kept sample; made where there is none yet and PROBECAL_UPDATE says so.</summary>
    private static byte[] Sample(string name, byte[] now)
    {
        string path = Path.Combine(FormatSamplesTests.Root, "tests/Formats", name);
        if (!File.Exists(path) && Environment.GetEnvironmentVariable("PROBECAL_UPDATE") == "1")
        {
            Directory.CreateDirectory(Path.GetDirectoryName(path)!);
            File.WriteAllBytes(path, now);
        }

        return File.ReadAllBytes(path);
    }

    private static void Fits(string schema, byte[] bytes)
    {
        JsonSchema read = JsonSchema.FromText(File.ReadAllText(Path.Combine(FormatSamplesTests.Root, "docs/schemas", schema + ".schema.json")));
        EvaluationResults results = read.Evaluate(JsonDocument.Parse(bytes).RootElement, new EvaluationOptions { OutputFormat = OutputFormat.List, RequireFormatValidation = true });
        Assert.True(results.IsValid, string.Join("; ", (results.Details ?? []).Where(static each => each.Errors is { Count: not 0 }).Select(static each => each.InstanceLocation + " " + string.Join(", ", each.Errors!.Values))));
    }
}
