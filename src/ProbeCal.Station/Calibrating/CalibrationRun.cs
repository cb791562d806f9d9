using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// Takes a session from where it stands to its record: asks, waits, takes points, lets the guards look. Readings come from a
/// source, or from a person who reads a meter. One run at a time on a session.
/// </summary>
public sealed class CalibrationRun
{
    private readonly CalibrationSession _session;
    private readonly ICalibrationDialogue _dialogue;
    private readonly TimeProvider _time;
    private readonly GuardDesk _desk;

    /// <summary>Makes a run.</summary>
    /// <param name="session">The session.</param>
    /// <param name="dialogue">Who answers.</param>
    /// <param name="time">The clock.</param>
    public CalibrationRun(CalibrationSession session, ICalibrationDialogue dialogue, TimeProvider time)
    {
        _session = session;
        _dialogue = dialogue;
        _time = time;
        _desk = new GuardDesk(session, dialogue);
    }

    /// <summary>Runs on a live source.</summary>
    /// <param name="source">The source; the caller disposes of it.</param>
    /// <param name="readOnWhileAsking">True for a source that goes on by itself: what it sends while a question is open is dropped.</param>
    /// <param name="software">Program and version for the record.</param>
    /// <param name="cancellationToken">Stops; what was taken stays saved.</param>
    /// <returns>The record as stored; it may say that the calibration failed.</returns>
    /// <exception cref="InputException">What was entered cannot be, or wants a reason.</exception>
    /// <exception cref="WorkFailedException">Never steady, dead or saturated, source gone, no fit. What was taken stays saved.</exception>
    public async Task<StoredCalibration> RunAsync(ISampleSource source, bool readOnWhileAsking, string software, CancellationToken cancellationToken)
    {
        await LookAtEntriesAsync(cancellationToken).ConfigureAwait(false);
        await using SamplePump pump = new(source, cancellationToken);
        return await RunAsync(new Reader(Wait, AskAsync), software, cancellationToken).ConfigureAwait(false);

        Task<TakenReading> Wait(ProcedureStep step)
        {
            return new PointWait(_session, step, _dialogue, _time, _desk).RunAsync(pump, cancellationToken);
        }

        async Task AskAsync(Task answer)
        {
            if (readOnWhileAsking)
            {
                await pump.DropUntilAsync(answer).ConfigureAwait(false);
            }

            await answer.ConfigureAwait(false);
        }
    }

    /// <summary>Runs on what a person reads off a meter.</summary>
    /// <param name="software">Program and version for the record.</param>
    /// <param name="cancellationToken">Stops; what was taken stays saved.</param>
    /// <returns>The record as stored; it may say that the calibration failed.</returns>
    /// <exception cref="InputException">What was entered cannot be, or wants a reason.</exception>
    /// <exception cref="WorkFailedException">A reading is missing, or the points make no calibration. What was taken stays saved.</exception>
    public async Task<StoredCalibration> RunTypedAsync(string software, CancellationToken cancellationToken)
    {
        CalibrationSetup setup = _session.Setup;
        Conditions conditions = new(
            setup.TypedTemperatureCelsius ?? throw new InputException("--temperature: a typed calibration needs the temperature of the water, for example 20.1C"),
            "typed",
            setup.Pressure.At(null) ?? throw new InputException("--pressure: a typed calibration needs the absolute station pressure, for example 742mmHg"));
        await LookAtEntriesAsync(cancellationToken).ConfigureAwait(false);
        string unit = setup.Probe.MeterSettings?.Shows ?? setup.Probe.SignalUnit;
        return await RunAsync(new Reader(ReadAsync, static answer => answer), software, cancellationToken).ConfigureAwait(false);

        async Task<TakenReading> ReadAsync(ProcedureStep step)
        {
            ProcedureStep shown = step.Role == CalibrationIds.AsLeftPoint && setup.Probe.MeterSettings != null
                ? step with { Do = [MeterText.Set(setup, Fitting.Point(_session.State.Points, CalibrationIds.SpanPoint)!)] }
                : step;
            double reading = await _dialogue.ReadingAsync(shown, unit, cancellationToken).ConfigureAwait(false)
                ?? throw new WorkFailedException($"unfinished: the {step.Role} reading of the meter is missing; what was entered so far is kept and the same command goes on with it");
            return PointMaker.FromTyped(step.Role!, setup, conditions, reading, _time.GetUtcNow());
        }
    }

    private async Task<StoredCalibration> RunAsync(Reader reader, string software, CancellationToken cancellationToken)
    {
        while (_session.State.Next is ProcedureStep step)
        {
            switch (step.Kind)
            {
                case StepKind.Point:
                    await TakePointAsync(step, reader, cancellationToken).ConfigureAwait(false);
                    break;
                case StepKind.Droplets:
                    Task<string> looked = _dialogue.DropletsAsync(step, cancellationToken);
                    await reader.AskAsync(looked).ConfigureAwait(false);
                    _session.TakeDroplets(step, await looked.ConfigureAwait(false));
                    break;
                default:
                    Task<string?> done = _dialogue.DoAsync(step, cancellationToken);
                    await reader.AskAsync(done).ConfigureAwait(false);
                    _session.Done(step, await done.ConfigureAwait(false));
                    break;
            }
        }

        if (!_session.State.Points.Any(static point => point.Role == CalibrationIds.AsLeftPoint))
        {
            // Nothing was read again after the adjustment, so nobody has looked at slope and zero yet.
            await reader.AskAsync(LookAtFitAsync(cancellationToken)).ConfigureAwait(false);
        }

        return _session.Finish(software);
    }

    private async Task TakePointAsync(ProcedureStep step, Reader reader, CancellationToken cancellationToken)
    {
        if (step.Role == CalibrationIds.AsLeftPoint)
        {
            await reader.AskAsync(LookAtFitAsync(cancellationToken)).ConfigureAwait(false);
        }

        TakenReading reading;
        if (_session.State.Waiting is TakenReading waiting && waiting.Role == step.Role)
        {
            reading = waiting;
        }
        else
        {
            if (_session.Setup.Readings == CalibrationIds.Live)
            {
                await reader.AskAsync(_dialogue.DoAsync(step, cancellationToken)).ConfigureAwait(false);
            }

            reading = await reader.ReadAsync(step).ConfigureAwait(false);
        }

        Task<PlannedPoint> planning = PlannedAsync(step, reading, cancellationToken);
        await reader.AskAsync(planning).ConfigureAwait(false);
        PlannedPoint planned = await planning.ConfigureAwait(false);
        RecordedPoint point = PointMaker.Make(reading, planned, _session.Setup);
        await reader.AskAsync(_desk.PassAsync(BeforePointGuards.All, _session.PointSituation(point, planned), aboutEntries: true, cancellationToken)).ConfigureAwait(false);
        _dialogue.Taken(_session.Take(step, point));
    }

    /// <summary>The planned point with what its truth rests on; a reading whose truth nobody can say yet is kept until then.</summary>
    private async Task<PlannedPoint> PlannedAsync(ProcedureStep step, TakenReading reading, CancellationToken cancellationToken)
    {
        PlannedPoint planned = _session.Setup.PlannedFor(step.Role!);
        if (!PlanCheck.IsMissingItsReference(planned))
        {
            return planned;
        }

        _session.Hold(reading);
        PlannedPoint? answered = await _dialogue.ReferenceAsync(step, planned, cancellationToken).ConfigureAwait(false);
        return answered != null && !PlanCheck.IsMissingItsReference(answered)
            ? answered
            : throw new WorkFailedException($"unfinished: the {step.Role} reading is kept and waits for its {planned.Method}; the same command with {(planned.Method == MethodIds.Titration ? "--titration" : "--transfer")} goes on with it, within {CalibrationSession.LongestWaitForReference.TotalHours.ToString(System.Globalization.CultureInfo.InvariantCulture)} h");
    }

    private Task LookAtEntriesAsync(CancellationToken cancellationToken)
    {
        CalibrationSetup setup = _session.Setup;
        return _desk.PassAsync(ConditionGuards.All, _session.Situation(setup.TypedTemperatureCelsius, null, setup.Pressure.At(null)), aboutEntries: true, cancellationToken);
    }

    private Task LookAtFitAsync(CancellationToken cancellationToken)
    {
        return _desk.PassAsync(FitGuards.All, _session.FittedSituation(), aboutEntries: false, cancellationToken);
    }

    /// <summary>Where readings come from, and how a question is asked meanwhile.</summary>
    private sealed record Reader(Func<ProcedureStep, Task<TakenReading>> ReadAsync, Func<Task, Task> AskAsync);
}
