using System;
using System.Collections.Generic;
using System.Runtime.CompilerServices;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Sources;

namespace ProbeCal.Station.Simulation;

/// <summary>A line of the simulation with the truth behind it.</summary>
public sealed record SimulatedLine(long Sequence, string Text, SimulatedTruth Truth);

/// <summary>
/// The simulated probe as a source: it writes lines by a template and reads them back by the same, so that what follows is
/// what a real line would give. Lines come at the pace of the injected clock.
/// </summary>
public sealed class SimulatedSource : ISampleSource
{
    /// <summary>Decimals of the lines that the simulation writes.</summary>
    private const int Decimals = 3;

    private readonly SimulationSettings _settings;
    private readonly LineTemplate _template;
    private readonly TimeProvider _time;
    private readonly ProbeInWater _probe;
    private readonly Lock _moving = new();
    private long _sequence;

    /// <summary>Makes the source; simulated time starts at the clock's.</summary>
    /// <param name="settings">Water, weather, pace and probe.</param>
    /// <param name="template">Form of the lines.</param>
    /// <param name="time">The clock.</param>
    public SimulatedSource(SimulationSettings settings, LineTemplate template, TimeProvider time)
    {
        _settings = settings;
        _template = template;
        _time = time;
        _probe = new ProbeInWater(settings, WholeMilliseconds(time.GetUtcNow()));
    }

    /// <summary>Raised with each line before it is delivered: how tests and <c>simulate</c> learn the truth.</summary>
    public event Action<SimulatedLine>? LineMade;

    /// <inheritdoc/>
    public string Description => "simulated probe (nothing here is measured)";

    /// <summary>Moves the probe to a place and leaves it there, whatever the script says. May be called while lines are read.</summary>
    public void Enter(SimulationPhase phase)
    {
        lock (_moving)
        {
            _probe.Enter(phase);
        }
    }

    /// <summary>Makes the next line at once, without waiting.</summary>
    public SimulatedLine Next()
    {
        SimulatedTruth truth;
        SimulatedInstruments instruments;
        lock (_moving)
        {
            truth = _probe.Step(out instruments);
        }

        RawSample sample = new(truth.TimeUtc, "", instruments.SignalNanoampere)
        {
            TemperatureCelsius = instruments.TemperatureCelsius,
            PressureHectopascal = instruments.PressureHectopascal,
            Salinity = truth.Salinity,
        };
        SimulatedLine line = new(_sequence++, _template.Write(sample, Decimals), truth);
        LineMade?.Invoke(line);
        return line;
    }

    /// <summary>The lines at the pace of the clock, until cancelled.</summary>
    public async IAsyncEnumerable<SimulatedLine> LinesAsync([EnumeratorCancellation] CancellationToken cancellationToken)
    {
        if (_settings.Faster == 0)
        {
            while (!cancellationToken.IsCancellationRequested)
            {
                yield return Next();
            }

            yield break;
        }

        using PeriodicTimer timer = new(RealInterval(), _time);
        bool goesOn = !cancellationToken.IsCancellationRequested;
        while (goesOn)
        {
            yield return Next();
            goesOn = await Ticked(timer, cancellationToken).ConfigureAwait(false);
        }
    }

    /// <inheritdoc/>
    public async IAsyncEnumerable<SourceEvent> ReadAsync([EnumeratorCancellation] CancellationToken cancellationToken)
    {
        yield return new SourceStateChanged(_time.GetUtcNow(), SourceState.Open, Description);
        await foreach (SimulatedLine line in LinesAsync(cancellationToken).ConfigureAwait(false))
        {
            yield return _template.Read(line.Text, _time.GetUtcNow());
        }
    }

    /// <inheritdoc/>
    public ValueTask DisposeAsync()
    {
        return ValueTask.CompletedTask;
    }

    private static DateTimeOffset WholeMilliseconds(DateTimeOffset time)
    {
        return new DateTimeOffset(time.UtcTicks - (time.UtcTicks % TimeSpan.TicksPerMillisecond), TimeSpan.Zero);
    }

    private static async ValueTask<bool> Ticked(PeriodicTimer timer, CancellationToken cancellationToken)
    {
        try
        {
            return await timer.WaitForNextTickAsync(cancellationToken).ConfigureAwait(false);
        }
        catch (OperationCanceledException)
        {
            // A stopped stream has simply ended: the consumer asked for it.
            return false;
        }
    }

    private TimeSpan RealInterval()
    {
        return TimeSpan.FromTicks((long)(_settings.Interval.Ticks / _settings.Faster));
    }
}
