using System;
using System.Collections.Generic;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>How far the wait for a steady window has come.</summary>
/// <param name="Step">What is being waited for.</param>
/// <param name="SampleTimeUtc">Time of the newest sample.</param>
/// <param name="ElapsedSeconds">Time since the step's first sample, on sample times.</param>
/// <param name="Samples">Number of samples in the window.</param>
/// <param name="WindowSeconds">Time that the window spans so far.</param>
/// <param name="SecondsLeft">Estimate of the time left; null when it cannot be told.</param>
/// <param name="Moving">What still keeps the window from being accepted, for people; empty when it is steady.</param>
/// <param name="Signal">Newest signal.</param>
/// <param name="TemperatureCelsius">Newest temperature, °C.</param>
public sealed record WaitProgress(
    ProcedureStep Step,
    DateTimeOffset SampleTimeUtc,
    double ElapsedSeconds,
    int Samples,
    double WindowSeconds,
    double? SecondsLeft,
    IReadOnlyList<string> Moving,
    double Signal,
    double TemperatureCelsius);

/// <summary>
/// Collects samples of one step until a window of them is steady, judged by Core on sample times, so that a replay or a fast
/// simulation is judged as the real thing would be. Not thread-safe.
/// </summary>
internal sealed class StabilityWatch
{
    // A window of many samples is not judged anew for each of them.
    private const double JudgeEverySeconds = 1;

    private readonly WaitingRules _rules;
    private readonly StabilityCriterion _criterion;
    private readonly ConverterLimits _converter;
    private readonly WindowStatistics _signal = new();
    private readonly WindowStatistics _temperature = new();
    private readonly WindowStatistics _older = new();
    private readonly WindowStatistics _newer = new();
    private double[] _times = new double[512];
    private double[] _signals = new double[512];
    private double[] _temperatures = new double[512];
    private double[] _pressures = new double[512];
    private int _count;
    private int _start;
    private DateTimeOffset _originUtc;
    private double _judgedAt = double.NegativeInfinity;

    internal StabilityWatch(WaitingRules rules, ConverterLimits converter)
    {
        _rules = rules;
        _criterion = rules.ToCriterion();
        _converter = converter;
    }

    /// <summary>What Core said last.</summary>
    internal StabilityFinding Finding { get; private set; } = StabilityFinding.TooFewSamples | StabilityFinding.WindowTooShort;

    internal WindowStatistics Signal => _signal;

    internal WindowStatistics Temperature => _temperature;

    internal int WindowCount => _count - _start;

    internal bool IsEmpty => _count == 0;

    internal DateTimeOffset FirstUtc => _originUtc.AddSeconds(_times[_start]);

    internal DateTimeOffset LastUtc => _originUtc.AddSeconds(_times[_count - 1]);

    /// <summary>True when window and count are there, whatever moves in it.</summary>
    internal bool IsFull => (Finding & (StabilityFinding.TooFewSamples | StabilityFinding.WindowTooShort)) == 0;

    /// <summary>Mean pressure of the window, hPa.</summary>
    internal double MeanPressure
    {
        get
        {
            double sum = 0;
            for (int i = _start; i < _count; i++)
            {
                sum += _pressures[i];
            }

            return sum / WindowCount;
        }
    }

    /// <summary>Begins anew: what came before belongs to another state of things.</summary>
    internal void Restart()
    {
        _count = 0;
        _start = 0;
        _judgedAt = double.NegativeInfinity;
        Finding = StabilityFinding.TooFewSamples | StabilityFinding.WindowTooShort;
    }

    /// <summary>Takes a sample. False when its time is not after the last one's: the window then begins anew with it.</summary>
    internal bool Add(DateTimeOffset timeUtc, double signal, double temperatureCelsius, double pressureHectopascal)
    {
        bool inOrder = IsEmpty || LastUtc < timeUtc;
        if (!inOrder)
        {
            Restart();
        }

        if (IsEmpty)
        {
            _originUtc = timeUtc;
        }

        MakeRoom();
        _times[_count] = (timeUtc - _originUtc).TotalSeconds;
        _signals[_count] = signal;
        _temperatures[_count] = temperatureCelsius;
        _pressures[_count] = pressureHectopascal;
        _count++;
        return inOrder;
    }

    /// <summary>Judges the window that ends now, when it is time to. True when there is a new judgement.</summary>
    /// <param name="milligramsPerLitrePerSignal">Gives the size of one unit of signal at the reference for a mean signal, mg/L.</param>
    internal bool Judge(Func<WindowStatistics, double> milligramsPerLitrePerSignal)
    {
        double now = _times[_count - 1];
        if (now - _judgedAt < JudgeEverySeconds && _judgedAt <= now)
        {
            return false;
        }

        _judgedAt = now;
        int byTime = Stability.WindowStart(_times, _count, _rules.WindowSeconds);
        _start = Math.Max(0, Math.Min(byTime, _count - _rules.LeastCount));
        Stability.Evaluate(_times, _signals, _start, WindowCount, _signal);
        Stability.Evaluate(_times, _temperatures, _start, WindowCount, _temperature);
        Finding = Stability.Judge(_signal, _temperature, milligramsPerLitrePerSignal(_signal), _converter, _criterion);
        return true;
    }

    /// <summary>An estimate of the time until the window is accepted, s; null when nothing can be said.</summary>
    internal double? SecondsLeft(double milligramsPerLitrePerSignal)
    {
        if (!IsFull)
        {
            double missing = _rules.WindowSeconds - (_times[_count - 1] - _times[_start]);
            double pace = 1 < WindowCount ? (_times[_count - 1] - _times[_start]) / (WindowCount - 1) : 0;
            return Math.Max(missing, (_rules.LeastCount - WindowCount) * pace);
        }

        int half = WindowCount / 2;
        double size = Math.Abs(milligramsPerLitrePerSignal);
        bool known = 0 < size && double.IsFinite(size)
            && Stability.Evaluate(_times, _signals, _start, half, _older) == Status.Ok
            && Stability.Evaluate(_times, _signals, _start + half, WindowCount - half, _newer) == Status.Ok;
        if (!known)
        {
            return null;
        }

        double limit = _rules.MilligramsPerLitre / size / _rules.WindowSeconds;
        Status status = Stability.SecondsToTrend(_older, _newer, limit, out double seconds);
        // The trend must be below its limit over the whole window, which is centred half a window back.
        return status == Status.Ok && 0 < seconds ? seconds + (_rules.WindowSeconds / 4) : null;
    }

    /// <summary>What moves, for people.</summary>
    internal IReadOnlyList<string> Moving(double milligramsPerLitrePerSignal)
    {
        List<string> moving = [];
        double size = Math.Abs(milligramsPerLitrePerSignal);
        string limit = Number.Print(_rules.MilligramsPerLitre) + " mg/L";
        string kelvin = Number.Print(_rules.Kelvin) + " K";
        Say(StabilityFinding.SignalDrifts, $"signal drifts {Number.Fixed(_signal.SlopePerSecond * _rules.WindowSeconds * size, 3)} mg/L a window (limit {limit})");
        Say(StabilityFinding.SignalScatters, $"signal scatters {Number.Fixed(_signal.ResidualDeviation * size, 3)} mg/L (limit {limit})");
        Say(StabilityFinding.SignalTrendUncertain, $"signal too noisy to tell its drift (limit {limit})");
        Say(StabilityFinding.TemperatureDrifts, $"temperature drifts {Number.Fixed(_temperature.SlopePerSecond * _rules.WindowSeconds, 3)} K a window (limit {kelvin})");
        Say(StabilityFinding.TemperatureScatters, $"temperature scatters {Number.Fixed(_temperature.ResidualDeviation, 3)} K (limit {kelvin})");
        Say(StabilityFinding.TemperatureTrendUncertain, $"temperature too noisy to tell its drift (limit {kelvin})");
        return moving;

        void Say(StabilityFinding flag, string text)
        {
            if ((Finding & flag) != 0 && IsFull)
            {
                moving.Add(text);
            }
        }
    }

    private void MakeRoom()
    {
        if (_count < _times.Length)
        {
            return;
        }

        // Samples before the window are never needed again; a window as long as the array doubles it.
        if (_times.Length / 2 <= _start)
        {
            Shift(_times);
            Shift(_signals);
            Shift(_temperatures);
            Shift(_pressures);
            _count -= _start;
            _start = 0;
            return;
        }

        Array.Resize(ref _times, _times.Length * 2);
        Array.Resize(ref _signals, _signals.Length * 2);
        Array.Resize(ref _temperatures, _temperatures.Length * 2);
        Array.Resize(ref _pressures, _pressures.Length * 2);
    }

    private void Shift(double[] values)
    {
        Array.Copy(values, _start, values, 0, _count - _start);
    }
}
