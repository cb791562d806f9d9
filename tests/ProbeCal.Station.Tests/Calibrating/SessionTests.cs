using System;
using System.IO;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Simulation;
using ProbeCal.Station.Sources;
using Xunit;

namespace ProbeCal.Station.Tests.Calibrating;

/// <summary>A calibration that is interrupted, and what becomes of its saved state.</summary>
public class SessionTests
{
    private static CalibrationSetup Setup { get; } = Bench.Setup with { ZeroPlan = CalibrationIds.ZeroAdjust };

    [Fact]
    public async Task KilledBetweenPoints_GoesOnWithThePointsTaken()
    {
        using Bench bench = new();
        await StopAfterAsync(bench, "zero");
        bench.Time.Advance(TimeSpan.FromMinutes(40));

        SimulatedSource source = bench.Source();
        ScriptedDialogue answers = new(source);
        CalibrationRecord record = await bench.CalibrateAsync(Setup, source, answers);

        Assert.Equal(["as-left"], answers.Points.Select(point => point.Role));
        Assert.Equal(["span", "zero", "as-left"], record.Points.Select(point => point.Role));
        Assert.Contains(answers.Said, line => line.StartsWith("taking up the calibration begun 2026-06-01 09:00Z, with span and zero taken", StringComparison.Ordinal));
        Assert.Empty(Directory.GetFiles(bench.Data.SessionsFolder));
    }

    [Fact]
    public async Task AnotherSetup_SetsTheSavedStateAside()
    {
        using Bench bench = new();
        await StopAfterAsync(bench, "span");
        ScriptedDialogue answers = await AgainAsync(bench, Setup with { Salinity = Setup.Salinity with { Value = 3 } });

        Assert.Contains(answers.Said, line => line.Contains("it was set up otherwise", StringComparison.Ordinal));
        Assert.Equal(["span", "zero", "as-left"], answers.Points.Select(point => point.Role));
        Assert.Single(Directory.GetFiles(bench.Data.SessionsFolder, "*.set-aside-*"));
    }

    [Fact]
    public async Task OldState_IsSetAside()
    {
        using Bench bench = new();
        await StopAfterAsync(bench, "span");
        bench.Time.Advance(CalibrationSession.LongestPause + TimeSpan.FromMinutes(1));
        ScriptedDialogue answers = await AgainAsync(bench, Setup);

        Assert.Contains(answers.Said, line => line.Contains("more than 4 hours ago", StringComparison.Ordinal));
    }

    [Fact]
    public async Task StartOver_SetsTheSavedStateAside()
    {
        using Bench bench = new();
        await StopAfterAsync(bench, "span");
        SimulatedSource source = bench.Source();
        ScriptedDialogue answers = new(source);
        await bench.CalibrateAsync(Setup, source, answers, startOver: true);

        Assert.Equal(3, answers.Points.Count);
        Assert.Contains(answers.Said, line => line.Contains("as asked", StringComparison.Ordinal));
    }

    [Fact]
    public async Task GivenReason_DoesNotMakeItAnotherSetup()
    {
        using Bench bench = new();
        await StopAfterAsync(bench, "span");
        CalibrationSetup withReason = Setup with { Reasons = new() { [GuardNames.Slope] = "new membrane" } };
        ScriptedDialogue answers = await AgainAsync(bench, withReason);

        Assert.Equal(["zero", "as-left"], answers.Points.Select(point => point.Role));
    }

    [Theory]
    [InlineData("{\"format\":\"probecal-calibration-session\",\"version\":1,\"setup\":{\"probe\"")]
    [InlineData("")]
    [InlineData("{\"format\":\"something-else\",\"version\":1}")]
    [InlineData("{\"format\":\"probecal-calibration-session\",\"version\":1}")]
    public async Task DamagedState_IsKeptAside_AndTold(string content)
    {
        using Bench bench = new();
        await StopAfterAsync(bench, "span");
        string file = Directory.GetFiles(bench.Data.SessionsFolder).Single();
        File.WriteAllText(file, content);
        ScriptedDialogue answers = await AgainAsync(bench, Setup);

        Assert.Contains(answers.Said, line => line.StartsWith("the saved state of the calibration is damaged", StringComparison.Ordinal));
        Assert.Equal(content, File.ReadAllText(Directory.GetFiles(bench.Data.SessionsFolder, "*.damaged-*").Single()));
        Assert.Equal(3, answers.Points.Count);
    }

    [Fact]
    public async Task NewerState_IsRefusedAndNotTouched()
    {
        using Bench bench = new();
        await StopAfterAsync(bench, "span");
        string file = Directory.GetFiles(bench.Data.SessionsFolder).Single();
        File.WriteAllText(file, "{\"format\":\"probecal-calibration-session\",\"version\":3,\"new\":true}");

        InputException refused = await Assert.ThrowsAsync<InputException>(() => AgainAsync(bench, Setup));
        Assert.Contains("version 3 of the saved state is newer", refused.Message, StringComparison.Ordinal);
        Assert.Equal("{\"format\":\"probecal-calibration-session\",\"version\":3,\"new\":true}", File.ReadAllText(file));
    }

    [Fact]
    public async Task KilledAfterTheLogTookTheRecord_DoesNotRecordItTwice()
    {
        using Bench bench = new();
        string? saved = null;
        string file = "";
        SimulatedSource source = bench.Source();
        ScriptedDialogue answers = new(source)
        {
            OnTaken = point =>
            {
                if (point.Role == "as-left")
                {
                    file = Directory.GetFiles(bench.Data.SessionsFolder).Single();
                    saved = File.ReadAllText(file);
                }
            },
        };
        await bench.CalibrateAsync(Setup, source, answers);
        // As if the process had died before it removed the state.
        File.WriteAllText(file, saved);

        bench.Time.Advance(TimeSpan.FromMinutes(5));
        ScriptedDialogue again = await AgainAsync(bench, Setup);
        Assert.Equal(["span", "zero", "as-left"], again.Points.Select(point => point.Role));
        using CalibrationLogStore log = bench.Log();
        Assert.Equal(2, log.Records.Count);
        Assert.NotEqual(log.Records[0].Record.StartedUtc, log.Records[1].Record.StartedUtc);
    }

    [Fact]
    public async Task GuardThatStopsTheFit_KeepsThePoints_AndAReasonGoesOn()
    {
        using Bench bench = new();
        await bench.CalibrateAsync(Setup, bench.Source());
        bench.Time.Advance(TimeSpan.FromHours(1));
        SimulationSettings torn = Bench.Water with { Probe = Bench.Probe with { SlopeNanoamperePerHectopascal = 0.9 } };
        WorkFailedException stopped = await Assert.ThrowsAsync<WorkFailedException>(() => bench.CalibrateAsync(Setup, bench.Source(torn)));
        Assert.Contains("--confirm slope=\"REASON\"", stopped.Message, StringComparison.Ordinal);

        bench.Time.Advance(TimeSpan.FromMinutes(10));
        SimulatedSource source = bench.Source(torn);
        ScriptedDialogue answers = new(source);
        CalibrationSetup withReason = Setup with { Reasons = new() { [GuardNames.Slope] = "new membrane" } };
        CalibrationRecord record = await bench.CalibrateAsync(withReason, source, answers);

        Assert.Equal(["as-left"], answers.Points.Select(point => point.Role));
        RecordedFinding finding = record.Findings.Single(kept => kept.Guard == GuardNames.Slope);
        Assert.Equal("overridden", finding.Severity);
        Assert.Equal("new membrane", finding.Reason);
    }

    [Theory]
    [InlineData("P-1", "P-1.calibration.json")]
    [InlineData("../../etc", null)]
    [InlineData("a/b\\c:d", null)]
    public async Task AnyProbeId_StaysInTheSessionsFolder(string probe, string? name)
    {
        using Bench bench = new();
        CalibrationSetup setup = Setup with { Probe = Setup.Probe with { Id = probe } };
        await StopAfterAsync(bench, "span", setup);
        string file = Path.GetFileName(Directory.GetFiles(bench.Data.SessionsFolder).Single());
        Assert.EndsWith(".calibration.json", file, StringComparison.Ordinal);
        if (name != null)
        {
            Assert.Equal(name, file);
        }
    }

    [Fact]
    public async Task BrokenChain_StopsBeforeAnythingIsMeasured()
    {
        using Bench bench = new();
        await bench.CalibrateAsync(Setup, bench.Source());
        using (Microsoft.Data.Sqlite.SqliteConnection raw = new($"Data Source={bench.Data.CalibrationLogFile};Pooling=False"))
        {
            raw.Open();
            using Microsoft.Data.Sqlite.SqliteCommand command = raw.CreateCommand();
            command.CommandText = "DROP TRIGGER records_no_update; UPDATE records SET bytes = x'7B7D'";
            command.ExecuteNonQuery();
        }

        ScriptedDialogue answers = new();
        WorkFailedException refused = await Assert.ThrowsAsync<WorkFailedException>(() => bench.CalibrateAsync(Setup, bench.Source(), answers));
        Assert.Contains("chain of calibration records is broken", refused.Message, StringComparison.Ordinal);
        Assert.Empty(answers.Points);
    }

    /// <summary>Runs until a point is taken and stops there, as a kill would; the state on the disk is what is left.</summary>
    private static async Task StopAfterAsync(Bench bench, string role, CalibrationSetup? setup = null)
    {
        using CancellationTokenSource kill = new();
        SimulatedSource source = bench.Source();
        ScriptedDialogue answers = new(source)
        {
            OnTaken = point =>
            {
                if (point.Role == role)
                {
                    kill.Cancel();
                }
            },
        };
        using CalibrationLogStore log = bench.Log();
        CalibrationSession session = CalibrationSession.Begin(setup ?? Setup, bench.Data, log, bench.Time, false, answers.Say);
        CalibrationRun run = new(session, answers, bench.Time);
        await Assert.ThrowsAnyAsync<OperationCanceledException>(() => run.RunAsync(source, false, Bench.Version, kill.Token));
    }

    private static async Task<ScriptedDialogue> AgainAsync(Bench bench, CalibrationSetup setup)
    {
        SimulatedSource source = bench.Source();
        ScriptedDialogue answers = new(source);
        await bench.CalibrateAsync(setup, source, answers);
        return answers;
    }
}
