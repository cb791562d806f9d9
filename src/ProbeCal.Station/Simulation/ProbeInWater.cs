using System;

namespace ProbeCal.Station.Simulation;

/// <summary>What is true at the moment of a simulated line, besides what the instruments say.</summary>
/// <param name="TimeUtc">Simulated time.</param>
/// <param name="Phase">Where the probe is.</param>
/// <param name="TemperatureCelsius">Temperature of the water (or air) at the probe, °C.</param>
/// <param name="PressureHectopascal">Absolute station pressure, hPa.</param>
/// <param name="Salinity">Practical salinity.</param>
/// <param name="PartialPressureHectopascal">Partial pressure of oxygen, hPa.</param>
/// <param name="MilligramsPerLitre">Dissolved oxygen by the default equation, mg/L; in air, what water in equilibrium with it would hold.</param>
/// <param name="PercentLocal">Saturation to local pressure, %.</param>
/// <param name="SettledSignalNanoampere">Signal that the probe would settle at, without lag and noise, nA.</param>
public sealed record SimulatedTruth(
    DateTimeOffset TimeUtc,
    SimulationPhase Phase,
    double TemperatureCelsius,
    double PressureHectopascal,
    double Salinity,
    double PartialPressureHectopascal,
    double MilligramsPerLitre,
    double PercentLocal,
    double SettledSignalNanoampere);

/// <summary>What the instruments say at the moment of a simulated line.</summary>
/// <param name="SignalNanoampere">Signal, nA, in steps of the converter.</param>
/// <param name="TemperatureCelsius">Thermometer, °C.</param>
/// <param name="PressureHectopascal">Barometer, hPa.</param>
internal sealed record SimulatedInstruments(double SignalNanoampere, double TemperatureCelsius, double PressureHectopascal);

/// <summary>
/// An amperometric membrane probe in water, as physics: a first-order membrane lag, a thermal lag, the membrane's
/// temperature dependence (Arrhenius law), stirring, air against water, drift, noise, and a lake with day and night. It knows
/// the truth, so that a corrected reading can be held against it.
/// </summary>
/// <remarks>
/// It has no clock: each <see cref="Step"/> takes it one interval on. The same settings and the same steps give the same
/// values. The steps of both lags are exact for a target that holds still within the interval. Not thread-safe.
/// </remarks>
internal sealed class ProbeInWater
{
    private const double DaySeconds = 86_400;
    private const double WeatherSeconds = 3.7 * DaySeconds;

    /// <summary>Hours of UTC at which the lake is warmest and at which it holds the most oxygen.</summary>
    private const double WarmestHour = 16, RichestHour = 17;

    /// <summary>Molar gas constant, J/(mol·K), and 0 °C in K (both exact by definition).</summary>
    private const double GasConstant = 8.31446261815324, ZeroCelsius = 273.15;

    private readonly SimulationSettings _settings;
    private readonly DateTimeOffset _start;
    private readonly Random _random;
    private int _step;
    private DateTimeOffset _stepEnd;
    private SimulationPhase? _entered;
    private double _laggedPressure;
    private double _laggedTemperature;
    private bool _running;

    /// <summary>Puts the probe into its first place, settled there.</summary>
    /// <param name="settings">Water, weather, pace and probe.</param>
    /// <param name="startUtc">Simulated time of the first line.</param>
    public ProbeInWater(SimulationSettings settings, DateTimeOffset startUtc)
    {
        _settings = settings;
        _start = startUtc;
        TimeUtc = startUtc;
        _random = new Random(settings.Seed);
        _stepEnd = EndOfStep(startUtc);
    }

    /// <summary>Simulated time of the next line.</summary>
    public DateTimeOffset TimeUtc { get; private set; }

    /// <summary>Where the probe is: the script's place, unless <see cref="Enter"/> has moved it.</summary>
    public SimulationPhase Phase => _entered ?? _settings.Script[_step].Phase;

    /// <summary>Moves the probe to a place and leaves it there, whatever the script says.</summary>
    public void Enter(SimulationPhase phase)
    {
        _entered = phase;
    }

    /// <summary>Gives the truth and the instruments' readings now, and takes the time one interval on.</summary>
    /// <param name="instruments">What the instruments say.</param>
    /// <returns>What is true.</returns>
    public SimulatedTruth Step(out SimulatedInstruments instruments)
    {
        FollowScript();
        SimulatedTruth truth = Truth();
        Settle(truth);
        SimulatedProbe probe = _settings.Probe;
        double signal = Signal(_laggedPressure, _laggedTemperature, truth.Phase) + (probe.NoiseNanoampere * Normal());
        instruments = new SimulatedInstruments(
            Math.Round(signal / probe.ResolutionNanoampere) * probe.ResolutionNanoampere,
            _laggedTemperature + probe.ThermometerOffsetKelvin + (probe.ThermometerNoiseKelvin * Normal()),
            truth.PressureHectopascal + probe.BarometerOffsetHectopascal + (probe.BarometerNoiseHectopascal * Normal()));
        TimeUtc += _settings.Interval;
        return truth;
    }

    private void FollowScript()
    {
        while (_stepEnd <= TimeUtc && _step < _settings.Script.Count - 1)
        {
            _step++;
            _stepEnd = EndOfStep(_stepEnd);
        }
    }

    private DateTimeOffset EndOfStep(DateTimeOffset start)
    {
        return _settings.Script[_step].Stay is TimeSpan stay ? start + stay : DateTimeOffset.MaxValue;
    }

    private SimulatedTruth Truth()
    {
        SimulationPhase phase = Phase;
        bool inLake = phase is SimulationPhase.Lake or SimulationPhase.LakeStill;
        double seconds = (TimeUtc - _start).TotalSeconds;
        double pressure = _settings.PressureHectopascal + (_settings.WeatherHectopascal * Math.Sin(2 * Math.PI * seconds / WeatherSeconds));
        double temperature = _settings.TemperatureCelsius + (inLake ? _settings.DailyTemperatureKelvin * Daily(WarmestHour) : 0);
        double percent = phase switch
        {
            SimulationPhase.Zero => 0,
            SimulationPhase.Air or SimulationPhase.AirSaturatedWater => 100,
            _ => _settings.SaturationPercent + (_settings.DailySaturationPercent * Daily(RichestHour)),
        };
        double salinity = _settings.Salinity;
        OxygenEquilibrium.PartialPressure(temperature, pressure, RangeRule.Refuse, out double saturated);
        double partial = saturated * percent / 100;
        OxygenEquilibrium.ConcentrationFromPartialPressure(
            SolubilityEquation.BensonKrause1984, temperature, salinity, pressure, partial, RangeRule.Refuse, out double milligrams);
        return new SimulatedTruth(
            TimeUtc, phase, temperature, pressure, salinity, partial, milligrams, percent, Signal(partial, temperature, phase));
    }

    /// <summary>Moves what membrane and thermometer feel towards what is there; the first line finds them settled.</summary>
    private void Settle(SimulatedTruth truth)
    {
        double seconds = _settings.Interval.TotalSeconds;
        double membrane = _running ? 1 - Math.Exp(-seconds / _settings.Probe.LagSeconds) : 1;
        double thermal = _running ? 1 - Math.Exp(-seconds / _settings.Probe.ThermalLagSeconds) : 1;
        _laggedPressure += membrane * (truth.PartialPressureHectopascal - _laggedPressure);
        _laggedTemperature += thermal * (truth.TemperatureCelsius - _laggedTemperature);
        _running = true;
    }

    private double Signal(double partialPressure, double temperature, SimulationPhase phase)
    {
        SimulatedProbe probe = _settings.Probe;
        double permeability = Math.Exp(
            probe.ActivationEnergyJoulePerMole / GasConstant
            * ((1 / (probe.ReferenceCelsius + ZeroCelsius)) - (1 / (temperature + ZeroCelsius))));
        double flow = phase switch
        {
            SimulationPhase.LakeStill => probe.StillFactor,
            SimulationPhase.Air => probe.AirToWaterRatio,
            _ => 1,
        };
        double drift = 1 + (probe.SlopeDriftPerDay * (TimeUtc - _start).TotalDays);
        return probe.ZeroNanoampere + (probe.SlopeNanoamperePerHectopascal * drift * permeability * flow * partialPressure);
    }

    /// <summary>Between −1 and 1, highest at the given hour of UTC.</summary>
    private double Daily(double highestHour)
    {
        return Math.Cos(2 * Math.PI * (TimeUtc.UtcDateTime.TimeOfDay.TotalHours - highestHour) / 24);
    }

    /// <summary>A standard normal deviate (Box and Muller 1958).</summary>
    private double Normal()
    {
        return Math.Sqrt(-2 * Math.Log(1 - _random.NextDouble())) * Math.Cos(2 * Math.PI * _random.NextDouble());
    }
}
