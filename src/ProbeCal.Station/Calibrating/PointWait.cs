using System;
using System.Collections.Generic;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>The wait for one point: samples in, a steady window out, or a plain reason why there is none.</summary>
internal sealed class PointWait
{
    private readonly CalibrationSession _session;
    private readonly CalibrationSetup _setup;
    private readonly ProcedureStep _step;
    private readonly string _role;
    private readonly ICalibrationDialogue _dialogue;
    private readonly TimeProvider _time;
    private readonly GuardDesk _desk;
    private readonly StabilityWatch _watch;
    private readonly SignalScale _scale;
    private readonly DateTimeOffset _notBefore;
    private DateTimeOffset? _firstSeen;
    private bool _conditionsSeen;
    private int _rejected;
    private string _lastRejection = "";
    private string _waitingFor = "no sample came";
    private PointReference? _truth;

    internal PointWait(CalibrationSession session, ProcedureStep step, ICalibrationDialogue dialogue, TimeProvider time, GuardDesk desk)
    {
        _session = session;
        _setup = session.Setup;
        _step = step;
        _role = step.Role ?? throw new InvalidOperationException($"Step '{step.Id}' takes no point.");
        _dialogue = dialogue;
        _time = time;
        _desk = desk;
        RecordedProbe probe = _setup.Probe;
        _watch = new StabilityWatch(_setup.Waiting, new ConverterLimits(
            probe.SignalResolution ?? double.NaN, probe.SignalLow ?? double.NaN, probe.SignalHigh ?? double.NaN));
        _scale = new SignalScale(_setup, _role, session.State.Points, session.Previous);
        _notBefore = session.State.Points.Count == 0 ? DateTimeOffset.MinValue : session.State.Points[^1].LastUtc;
    }

    internal async Task<TakenReading> RunAsync(SamplePump pump, CancellationToken cancellationToken)
    {
        using CancellationTokenSource waiting = CancellationTokenSource.CreateLinkedTokenSource(cancellationToken);
        Task deadline = Task.Delay(TimeSpan.FromSeconds(_setup.Waiting.GiveUpAfterSeconds), _time, waiting.Token);
        try
        {
            while (true)
            {
                SourceEvent? happened = await pump.NextAsync(deadline).ConfigureAwait(false);
                cancellationToken.ThrowIfCancellationRequested();
                if (happened == null)
                {
                    throw pump.HasEnded ? Failed("the source ended") : GaveUp();
                }

                if (await TakeAsync(happened, cancellationToken).ConfigureAwait(false))
                {
                    return PointMaker.FromWindow(_role, _setup, _watch);
                }

                // A stop ends the wait as well, and is told as a stop the next time round.
                if (deadline.IsCompletedSuccessfully)
                {
                    throw GaveUp();
                }
            }
        }
        finally
        {
            await waiting.CancelAsync().ConfigureAwait(false);
        }
    }

    private async ValueTask<bool> TakeAsync(SourceEvent happened, CancellationToken cancellationToken)
    {
        switch (happened)
        {
            case RawSample sample:
                return await TakeSampleAsync(sample, cancellationToken).ConfigureAwait(false);
            case RejectedLine line:
                _rejected++;
                _lastRejection = line.Reason;
                return false;
            case SourceStateChanged change:
                _dialogue.Say($"source {change.State.ToString().ToLowerInvariant()}: {change.Reason}");
                if (change.State is SourceState.Lost)
                {
                    _watch.Restart();
                }

                return false;
            default:
                return false;
        }
    }

    private async ValueTask<bool> TakeSampleAsync(RawSample sample, CancellationToken cancellationToken)
    {
        if (sample.TimeUtc <= _notBefore)
        {
            _waitingFor = Finding.Text($"sample times ({sample.TimeUtc:yyyy-MM-dd HH:mm:ss}Z) are not after the last point ({_notBefore:yyyy-MM-dd HH:mm:ss}Z): check the clock of the line");
            return false;
        }

        _firstSeen ??= sample.TimeUtc;
        if (_setup.Waiting.GiveUpAfterSeconds < (sample.TimeUtc - _firstSeen.Value).TotalSeconds)
        {
            throw GaveUp();
        }

        double? temperature = _setup.TypedTemperatureCelsius ?? sample.TemperatureCelsius;
        double? pressure = _setup.Pressure.At(sample.PressureHectopascal);
        if (temperature is not double celsius || pressure is not double hectopascal)
        {
            _waitingFor = temperature == null
                ? "the lines carry no temperature: name it in --line, or enter --temperature"
                : "the lines carry no pressure: name it in --line, or enter --pressure";
            return false;
        }

        if (!_conditionsSeen)
        {
            // Looked at on the first sample, so that a wrong entry does not cost a whole window of waiting.
            await LookAsync(celsius, sample.TemperatureCelsius, hectopascal, cancellationToken).ConfigureAwait(false);
            _truth = Truth(celsius, hectopascal);
            _conditionsSeen = true;
        }

        if (_scale.NotInPlace(sample.Signal, _watch.IsEmpty, _truth) is string elsewhere)
        {
            _waitingFor = elsewhere;
            _watch.Restart();
            Report(sample, null, [_waitingFor]);
            return false;
        }

        if (!_watch.Add(sample.TimeUtc, sample.Signal, celsius, hectopascal))
        {
            _dialogue.Say("the clock of the line went backwards; the window begins anew");
        }

        return Judge(sample, hectopascal) && await AcceptAsync(sample, cancellationToken).ConfigureAwait(false);
    }

    private bool Judge(RawSample sample, double hectopascal)
    {
        if (!_watch.Judge(signal => _scale.MilligramsPerSignal(signal.Mean, MeanCelsius, hectopascal, _truth)))
        {
            return false;
        }

        double size = _scale.MilligramsPerSignal(_watch.Signal.Mean, MeanCelsius, hectopascal, _truth);
        Report(sample, _watch.SecondsLeft(size), _watch.Moving(size));
        RefuseDeadOrSaturated();
        _waitingFor = _watch.IsFull ? "still moving: " + string.Join("; ", _watch.Moving(size)) : "the window was not full yet";
        return _watch.Finding == StabilityFinding.Stable;
    }

    private void Report(RawSample sample, double? secondsLeft, IReadOnlyList<string> moving)
    {
        _dialogue.Report(new WaitProgress(
            _step,
            sample.TimeUtc,
            (sample.TimeUtc - _firstSeen!.Value).TotalSeconds,
            _watch.WindowCount,
            _watch.Signal.Count == 0 ? 0 : _watch.Signal.SpanSeconds,
            secondsLeft,
            moving,
            sample.Signal,
            _setup.TypedTemperatureCelsius ?? sample.TemperatureCelsius ?? double.NaN));
    }

    private async ValueTask<bool> AcceptAsync(RawSample sample, CancellationToken cancellationToken)
    {
        double celsius = _setup.TypedTemperatureCelsius ?? _watch.Temperature.Mean;
        await LookAsync(celsius, sample.TemperatureCelsius, _setup.Pressure.Hectopascal is null ? _watch.MeanPressure : _setup.Pressure.At(null)!.Value, cancellationToken).ConfigureAwait(false);
        return true;
    }

    private Task LookAsync(double celsius, double? probeCelsius, double hectopascal, CancellationToken cancellationToken)
    {
        return _desk.PassAsync(ConditionGuards.All, _session.Situation(celsius, probeCelsius, hectopascal), aboutEntries: true, cancellationToken);
    }

    private double MeanCelsius => _setup.TypedTemperatureCelsius ?? _watch.Temperature.Mean;

    /// <summary>What will be true at the point, as far as it is known before the window; a wrong entry is told here and not after the wait.</summary>
    private PointReference? Truth(double celsius, double hectopascal)
    {
        PlannedPoint planned = _setup.PlannedFor(_role);
        return PlanCheck.IsMissingItsReference(planned)
            ? null
            : References.Of(planned, _setup, new Conditions(celsius, RecordNames.FromLine, hectopascal), _setup.TemperatureStandardUncertaintyKelvin);
    }

    private void RefuseDeadOrSaturated()
    {
        if (!_watch.IsFull)
        {
            return;
        }

        string unit = _setup.Probe.SignalUnit.Length == 0 ? "" : " " + _setup.Probe.SignalUnit;
        if ((_watch.Finding & StabilityFinding.SignalDead) != 0)
        {
            throw new WorkFailedException($"{GuardNames.DeadInput}: the signal stays at {Number.Print(_watch.Signal.Mean)}{unit} without moving by a step of the converter; a dead input is perfectly stable: check plug, cable and power of the probe. {Kept}");
        }

        if ((_watch.Finding & StabilityFinding.SignalSaturated) != 0)
        {
            throw new WorkFailedException($"{GuardNames.SaturatedInput}: the signal touches the end of its range ({Number.Print(_watch.Signal.Minimum)} to {Number.Print(_watch.Signal.Maximum)}{unit} in the window): choose another range of the converter or check the probe. {Kept}");
        }
    }

    private const string Kept = "What was taken so far is kept, and the same command goes on with it";

    private WorkFailedException GaveUp()
    {
        return Failed(Finding.Text($"not steady within {Number.Print(_setup.Waiting.GiveUpAfterSeconds / 60)} min"));
    }

    private WorkFailedException Failed(string what)
    {
        string rejected = _rejected == 0 ? "" : Finding.Text($"; {_rejected} lines were not understood, the last one because {_lastRejection}");
        return new WorkFailedException($"{_role} point: {what}; {_waitingFor}{rejected}. {Kept}");
    }
}
