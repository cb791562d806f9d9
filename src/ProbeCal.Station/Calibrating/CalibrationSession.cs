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
    /// <exception cref="InputException">The saved state is from a newer version.</exception>
    /// <exception cref="WorkFailedException">The log's chain is broken, or a file could not be read or written.</exception>
    public static CalibrationSession Begin(CalibrationSetup setup, DataDirectory data, CalibrationLogStore log, TimeProvider time, bool startOver, Action<string> say)
    {
        log.RequireWhole();
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
            say($"taking up the calibration begun {Time(saved.StartedUtc)}, with {string.Join(" and ", saved.Points.Select(static point => point.Role))} taken");
        }

        SessionState state = saved == null
            ? new SessionState { Setup = setup, StartedUtc = now, SavedUtc = now }
            : saved with { Setup = setup };
        return new CalibrationSession(log, file, time, state);
    }

    /// <summary>The situation for the guards on the conditions.</summary>
    internal Situation Situation(double? temperature, double? probeTemperature, double? pressure)
    {
        return new Situation
        {
            Setup = Setup,
            NowUtc = _time.GetUtcNow(),
            Previous = _previous,
            LastHere = _lastHere,
            TemperatureCelsius = temperature,
            ProbeTemperatureCelsius = probeTemperature,
            PressureHectopascal = pressure,
        };
    }

    /// <summary>The situation for the guards on the fit.</summary>
    internal Situation FittedSituation()
    {
        RecordedPoint? span = Fitting.Point(State.Points, CalibrationIds.SpanPoint);
        Fit fit = CurrentFit();
        return Situation(span?.Temperature.Value, null, span?.Pressure.Value) with { Span = span, Fit = fit.Calibration, FitStatus = fit.Status };
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

    /// <summary>Takes a point and saves.</summary>
    internal RecordedPoint Take(RecordedPoint point)
    {
        RecordedPoint read = point.Role switch
        {
            CalibrationIds.SpanPoint => Fitting.ReadAsFound(Setup, point, _previous),
            CalibrationIds.AsLeftPoint => Fitting.ReadAsLeft(Setup, point, CurrentFit().Calibration ?? throw new InvalidOperationException("The as-left point needs a fit.")),
            _ => Fitting.ReadZero(Setup, point, Fitting.Point(State.Points, CalibrationIds.SpanPoint) ?? throw new InvalidOperationException("The zero point comes after the 100 % point."), _previous),
        };
        Save(State with { Points = [.. State.Points, read] });
        return read;
    }

    /// <summary>Notes the look for droplets; when some were seen, the point in air is taken again.</summary>
    internal void TakeDroplets(string check)
    {
        Save(check == Droplets.Seen
            ? State with { Points = [], DropletCheck = null }
            : State with { DropletCheck = check });
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

        if (LongestPause < now - saved.SavedUtc)
        {
            return "more than 4 hours ago";
        }

        if (now < saved.SavedUtc)
        {
            return "the clock stands before it";
        }

        // Reasons may be given on the way; everything else decides what the points mean.
        return Text(saved.Setup) == Text(setup) ? null : "it was set up otherwise";
    }

    private static string Text(CalibrationSetup setup)
    {
        return JsonSerializer.Serialize(setup with { Reasons = [] }, SessionJsonContext.Readable.CalibrationSetup);
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
