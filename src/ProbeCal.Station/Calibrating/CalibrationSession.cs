using System;
using System.Collections.Generic;
using System.Linq;
using System.Text.Json;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// One calibration from its set-up to its record: it knows what comes next, saves its state after every step, and writes the
/// record at the end. It reads no source and asks no questions; <see cref="CalibrationRun"/> does. Not thread-safe.
/// </summary>
public sealed class CalibrationSession
{
    /// <summary>A saved state older than this is set aside instead of taken up again: water and weather have moved on (our choice, no source).</summary>
    public static readonly TimeSpan LongestPause = TimeSpan.FromHours(4);

    /// <summary>The same for a reading that waits for its titration: fixed samples are titrated 2 to 12 h after they were drawn, and the next morning is the latest (our choice, no source).</summary>
    public static readonly TimeSpan LongestWaitForReference = TimeSpan.FromHours(24);

    private readonly CalibrationLogStore _log;
    private readonly SessionFile _file;
    private readonly TimeProvider _time;
    private readonly CalibrationRecord? _previous;
    private readonly CalibrationRecord? _lastHere;

    private CalibrationSession(CalibrationLogStore log, SessionFile file, TimeProvider time, SessionState state)
    {
        _log = log;
        _file = file;
        _time = time;
        State = state;
        _previous = log.LatestFor(state.Setup.Probe.Id, DateTimeOffset.MaxValue)?.Record;
        _lastHere = log.Records.LastOrDefault(stored => state.Setup.Site != null && stored.Record.Site == state.Setup.Site)?.Record;
    }

    /// <summary>The state as last saved.</summary>
    public SessionState State { get; private set; }

    /// <summary>The set-up.</summary>
    public CalibrationSetup Setup => State.Setup;

    /// <summary>The calibration of this probe in force so far; null when there is none.</summary>
    public CalibrationRecord? Previous => _previous;

    /// <summary>Begins a calibration, or takes up the one that was saved for this probe with the same set-up.</summary>
    /// <param name="setup">The set-up.</param>
    /// <param name="data">The data folder, open for writing.</param>
    /// <param name="log">The log that takes the record; its chain must be whole.</param>
    /// <param name="time">The clock.</param>
    /// <param name="startOver">True to set a saved state aside, whatever it is.</param>
    /// <param name="say">Takes what a person should know about a saved state, one line at a time.</param>
    /// <exception cref="InputException">The planned points make no calibration, a check has nothing to check, or the saved state is from a newer version.</exception>
    /// <exception cref="WorkFailedException">The log's chain is broken, or a file could not be read or written.</exception>
    public static CalibrationSession Begin(CalibrationSetup setup, DataDirectory data, CalibrationLogStore log, TimeProvider time, bool startOver, Action<string> say)
    {
        log.RequireWhole();
        PlanCheck.Require(setup, log.LatestFor(setup.Probe.Id, DateTimeOffset.MaxValue)?.Record);
        SessionFile file = new(data.SessionsFolder, setup.Probe.Id, time);
        SessionState? saved = file.Load(say);
        DateTimeOffset now = time.GetUtcNow();
        if (saved != null && log.Records.Any(stored => stored.Record.Probe.Id == saved.Setup.Probe.Id && stored.Record.StartedUtc == saved.StartedUtc))
        {
            // Killed between the log's commit and the removal of the state: the work was done.
            file.Delete();
            saved = null;
        }

        if (saved != null && Unfit(saved, setup, now, startOver) is string reason)
        {
            string kept = file.SetAside("set-aside");
            say($"a calibration begun {Time(saved.StartedUtc)} was not finished; it is not taken up ({reason}) and kept as {kept}");
            saved = null;
        }

        if (saved != null)
        {
            say($"taking up the {setup.Purpose} begun {Time(saved.StartedUtc)}, with {Taken(saved)}");
        }

        SessionState state = saved == null
            ? new SessionState { Setup = setup, StartedUtc = now, SavedUtc = now }
            : saved with { Setup = setup };
        return new CalibrationSession(log, file, time, state);
    }

    /// <summary>The situation for the guards on the conditions.</summary>
    internal Situation Situation(double? temperature, double? probeTemperature, double? pressure)
    {
        Situation now = new()
        {
            Setup = Setup,
            NowUtc = _time.GetUtcNow(),
            Previous = _previous,
            LastHere = _lastHere,
            TemperatureCelsius = temperature,
            ProbeTemperatureCelsius = probeTemperature,
            PressureHectopascal = pressure,
        };
        return now.WithLog(_log);
    }

    /// <summary>The situation for the guards on the fit.</summary>
    internal Situation FittedSituation()
    {
        RecordedPoint? span = Fitting.Point(State.Points, CalibrationIds.SpanPoint);
        Fit fit = CurrentFit();
        if (fit.Why != null)
        {
            throw new WorkFailedException(fit.Why + "; what was taken so far is kept");
        }

        return Situation(span?.Temperature.Value, null, span?.Pressure.Value) with { Span = span, Fit = fit.Calibration, FitStatus = fit.Status };
    }

    /// <summary>The situation for the guards that look at a point before it is accepted.</summary>
    internal Situation PointSituation(RecordedPoint point, PlannedPoint planned)
    {
        return Situation(point.Temperature.Value, point.TemperatureStatistics?.Mean, point.Pressure.Value) with
        {
            Point = Fitting.Read(Setup, point, State.Points, _previous),
            Planned = planned,
        };
    }

    internal Fit CurrentFit()
    {
        return Fitting.Of(Setup, State.Points, _previous);
    }

    /// <summary>Keeps what the guards saw; a guard that speaks again replaces what it said before.</summary>
    internal void Keep(Finding finding, string? reason)
    {
        List<RecordedFinding> findings = [.. State.Findings.Where(kept => kept.Guard != finding.Guard), finding.ToRecord(reason)];
        State = State with { Findings = findings };
    }

    /// <summary>Notes that a step was done and saves.</summary>
    internal void Done(ProcedureStep step, string? note)
    {
        Save(State with { Steps = [.. State.Steps, new RecordedStep(step.Id, _time.GetUtcNow(), note)] });
    }

    /// <summary>Keeps a reading that waits for its reference, and saves.</summary>
    internal void Hold(TakenReading reading)
    {
        Save(State with { Waiting = reading });
    }

    /// <summary>Takes a point, read by the calibration in force or by the new one, and saves.</summary>
    internal RecordedPoint Take(ProcedureStep step, RecordedPoint point)
    {
        RecordedPoint read = Fitting.Read(Setup, point, State.Points, _previous);
        Save(State with
        {
            Points = [.. State.Points, read],
            Steps = [.. State.Steps, new RecordedStep(step.Id, _time.GetUtcNow(), null)],
            Waiting = null,
        });
        return read;
    }

    /// <summary>Notes the look for droplets; when some were seen, the point in air before it is taken again.</summary>
    internal void TakeDroplets(ProcedureStep step, string check)
    {
        if (check != Droplets.Seen)
        {
            Save(State with { DropletCheck = check, Steps = [.. State.Steps, new RecordedStep(step.Id, _time.GetUtcNow(), check)] });
            return;
        }

        IReadOnlyList<ProcedureStep> plan = Procedures.For(Setup);
        int point = 0;
        for (int i = 0; i < plan.Count && plan[i].Id != step.Id; i++)
        {
            point = plan[i].Kind == StepKind.Point ? i : point;
        }

        HashSet<string> again = [.. plan.Skip(point).Select(static later => later.Id)];
        HashSet<string?> roles = [.. plan.Skip(point).Select(static later => later.Role)];
        Save(State with
        {
            Points = [.. State.Points.Where(taken => !roles.Contains(taken.Role))],
            Steps = [.. State.Steps.Where(done => !again.Contains(done.Step))],
            DropletCheck = null,
        });
    }

    /// <summary>Writes the record into the log and removes the saved state.</summary>
    internal StoredCalibration Finish(string software)
    {
        StoredCalibration stored = _log.Append(RecordBuilder.Build(State, CurrentFit(), _previous, _time.GetUtcNow(), software));
        _file.Delete();
        return stored;
    }

    private static string? Unfit(SessionState saved, CalibrationSetup setup, DateTimeOffset now, bool startOver)
    {
        if (startOver)
        {
            return "as asked";
        }

        TimeSpan longest = saved.Waiting == null ? LongestPause : LongestWaitForReference;
        if (longest < now - saved.SavedUtc)
        {
            return $"more than {longest.TotalHours.ToString(System.Globalization.CultureInfo.InvariantCulture)} hours ago";
        }

        if (now < saved.SavedUtc)
        {
            return "the clock stands before it";
        }

        // Reasons, and a titration that was still missing, may be given on the way; everything else decides what the points mean.
        return Text(saved.Setup, saved.Setup) == Text(setup, saved.Setup) ? null : "it was set up otherwise";
    }

    private static string Text(CalibrationSetup setup, CalibrationSetup saved)
    {
        List<PlannedPoint> plan = [];
        for (int i = 0; i < setup.Plan.Count; i++)
        {
            PlannedPoint? before = i < saved.Plan.Count ? saved.Plan[i] : null;
            plan.Add(setup.Plan[i] with
            {
                Titration = before?.Titration == null ? null : setup.Plan[i].Titration,
                Transfer = before?.Transfer == null ? null : setup.Plan[i].Transfer,
            });
        }

        return JsonSerializer.Serialize(setup with { Reasons = [], Plan = plan }, SessionJsonContext.Readable.CalibrationSetup);
    }

    private static string Taken(SessionState saved)
    {
        string waiting = saved.Waiting == null ? "" : $"; the {saved.Waiting.Role} reading waits for its reference";
        return saved.Points.Count != 0
            ? string.Join(" and ", saved.Points.Select(static point => point.Role)) + " taken" + waiting
            : $"{saved.Steps.Count.ToString(System.Globalization.CultureInfo.InvariantCulture)} {(saved.Steps.Count == 1 ? "step" : "steps")} done and no point taken yet" + waiting;
    }

    private static string Time(DateTimeOffset time)
    {
        return time.ToString("yyyy-MM-dd HH:mm'Z'", System.Globalization.CultureInfo.InvariantCulture);
    }

    private void Save(SessionState state)
    {
        State = state with { SavedUtc = _time.GetUtcNow() };
        _file.Save(State);
    }
}
