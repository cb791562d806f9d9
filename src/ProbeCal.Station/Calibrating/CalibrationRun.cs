using System;
using System.Collections.Generic;
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
        while (_session.State.Next is CalibrationStep step && step != CalibrationStep.Finished)
        {
            IReadOnlyList<string> instructions = Instructions.For(_session.State, step);
            if (step == CalibrationStep.Droplets)
            {
                _session.TakeDroplets(await AskAsync(_dialogue.DropletsAsync(instructions, cancellationToken)).ConfigureAwait(false));
                continue;
            }

            if (step == CalibrationStep.AsLeft)
            {
                await AskAsync(LookAtFitAsync(cancellationToken)).ConfigureAwait(false);
            }

            await AskAsync(ReadyAsync(step, instructions, cancellationToken)).ConfigureAwait(false);
            PointWait wait = new(_session, step, _dialogue, _time, _desk);
            Take(await wait.RunAsync(pump, cancellationToken).ConfigureAwait(false));
        }

        return _session.Finish(software);

        async Task<T> AskAsync<T>(Task<T> answer)
        {
            if (readOnWhileAsking)
            {
                await pump.DropUntilAsync(answer).ConfigureAwait(false);
            }

            return await answer.ConfigureAwait(false);
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
            setup.Pressure.Hectopascal ?? throw new InputException("--pressure: a typed calibration needs the absolute station pressure, for example 742mmHg"));
        await LookAtEntriesAsync(cancellationToken).ConfigureAwait(false);
        string unit = setup.Probe.MeterSettings?.Shows ?? setup.Probe.SignalUnit;
        while (_session.State.Next is CalibrationStep step && step != CalibrationStep.Finished)
        {
            List<string> instructions = [.. Instructions.For(_session.State, step)];
            if (step == CalibrationStep.Droplets)
            {
                _session.TakeDroplets(await _dialogue.DropletsAsync(instructions, cancellationToken).ConfigureAwait(false));
                continue;
            }

            if (step == CalibrationStep.AsLeft)
            {
                await LookAtFitAsync(cancellationToken).ConfigureAwait(false);
                instructions = [Instructions.SetMeter(setup, Fitting.Point(_session.State.Points, CalibrationIds.SpanPoint)!)];
            }

            double shown = await _dialogue.ReadingAsync(step, unit, instructions, cancellationToken).ConfigureAwait(false)
                ?? throw new WorkFailedException($"unfinished: the {RoleOf(step)} reading of the meter is missing; what was entered so far is kept and the same command goes on with it");
            Take(PointMaker.FromTyped(RoleOf(step), setup, conditions, shown, _time.GetUtcNow()));
        }

        return _session.Finish(software);
    }

    /// <summary>The role of the point that a step takes.</summary>
    internal static string RoleOf(CalibrationStep step)
    {
        return step switch
        {
            CalibrationStep.Zero => CalibrationIds.ZeroPoint,
            CalibrationStep.AsLeft => CalibrationIds.AsLeftPoint,
            _ => CalibrationIds.SpanPoint,
        };
    }

    private void Take(RecordedPoint point)
    {
        _dialogue.Taken(_session.Take(point));
    }

    private Task LookAtEntriesAsync(CancellationToken cancellationToken)
    {
        CalibrationSetup setup = _session.Setup;
        return _desk.PassAsync(ConditionGuards.All, _session.Situation(setup.TypedTemperatureCelsius, null, setup.Pressure.Hectopascal), aboutEntries: true, cancellationToken);
    }

    private async Task<bool> LookAtFitAsync(CancellationToken cancellationToken)
    {
        await _desk.PassAsync(FitGuards.All, _session.FittedSituation(), aboutEntries: false, cancellationToken).ConfigureAwait(false);
        return true;
    }

    private async Task<bool> ReadyAsync(CalibrationStep step, IReadOnlyList<string> instructions, CancellationToken cancellationToken)
    {
        await _dialogue.ReadyAsync(step, instructions, cancellationToken).ConfigureAwait(false);
        return true;
    }
}
