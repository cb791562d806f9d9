using System;
using System.Collections.Generic;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Simulation;

/// <summary>The water, the weather and the pace of a simulation. All of it is invented; the defaults are our choice.</summary>
public sealed record SimulationSettings
{
    /// <summary>Seed of everything that is random: the same seed gives the same lines.</summary>
    public int Seed { get; init; } = 1;

    /// <summary>Simulated time between two lines.</summary>
    /// <value>The default is 1 s.</value>
    public TimeSpan Interval { get; init; } = TimeSpan.FromSeconds(1);

    /// <summary>How many simulated seconds pass in a real one; 0 waits for nothing.</summary>
    /// <value>The default is 1.</value>
    public double Faster { get; init; } = 1;

    /// <summary>Mean temperature of the lake, and that of bath, air and zero solution, °C.</summary>
    public double TemperatureCelsius { get; init; } = 18;

    /// <summary>Half the difference between the warmest and the coldest lake of a day, K.</summary>
    public double DailyTemperatureKelvin { get; init; } = 1.5;

    /// <summary>Practical salinity of the lake and of the bath.</summary>
    public double Salinity { get; init; }

    /// <summary>Absolute station pressure at the start, hPa.</summary>
    public double PressureHectopascal { get; init; } = 1013.25;

    /// <summary>How far the weather moves the pressure to either side in about four days, hPa.</summary>
    public double WeatherHectopascal { get; init; } = 4;

    /// <summary>Mean oxygen saturation of the lake to local pressure, %.</summary>
    public double SaturationPercent { get; init; } = 92;

    /// <summary>Half the difference between the afternoon's and the dawn's saturation, %.</summary>
    public double DailySaturationPercent { get; init; } = 14;

    /// <summary>Where the probe goes.</summary>
    public IReadOnlyList<SimulationStep> Script { get; init; } = [new SimulationStep(SimulationPhase.Lake, null)];

    /// <summary>The probe.</summary>
    public SimulatedProbe Probe { get; init; } = new();

    /// <summary>Time between two lines at a rate, in whole microseconds.</summary>
    /// <exception cref="InputException">The rate is out of what can be simulated.</exception>
    public static TimeSpan IntervalOf(string what, double hertz)
    {
        TimeSpan interval = TimeSpan.FromTicks((long)Math.Round(1e6 / hertz) * TimeSpan.TicksPerMicrosecond);
        return interval < TimeSpan.FromMilliseconds(1) || TimeSpan.FromDays(1) < interval
            ? throw Wrong.Input(what, Number.Print(hertz) + "Hz", "a simulation writes from one line a day to 1000 a second")
            : interval;
    }

    /// <summary>The settings when the model can honour them.</summary>
    /// <param name="what">The option or key that they were given for.</param>
    /// <exception cref="InputException">The model has no water like that.</exception>
    public SimulationSettings Checked(string what)
    {
        if (!(1 <= TemperatureCelsius && TemperatureCelsius <= 38))
        {
            throw Wrong.Input(what + " temperature", Number.Print(TemperatureCelsius) + " C", "simulated water is from 1 to 38 C, so that day and night stay within the equations");
        }

        if (!(0 <= Salinity && Salinity <= 40))
        {
            throw Wrong.Input(what + " salinity", Number.Print(Salinity), "simulated water has a salinity from 0 to 40");
        }

        if (!(550 <= PressureHectopascal && PressureHectopascal <= 1080))
        {
            throw Wrong.Input(what + " pressure", Number.Print(PressureHectopascal) + " hPa", "simulated air has from 550 to 1080 hPa");
        }

        if (Faster != 0 && Faster < 0.001)
        {
            throw Wrong.Input(what + " faster", Number.Print(Faster), "slower than a thousandth of real time is not waited for; write 1 for real time, or 0 to wait for nothing");
        }

        if (Faster != 0 && Interval / Faster < TimeSpan.FromMilliseconds(1))
        {
            throw Wrong.Input(what + " faster", Number.Print(Faster), "that would be more than 1000 lines a second; go slower, or write 0 to wait for nothing");
        }

        return this;
    }
}

/// <summary>
/// What the simulated probe really is: what a calibration tries to find out. The figures are our choice, of the size that
/// such probes have; none is of a product.
/// </summary>
public sealed record SimulatedProbe
{
    /// <summary>Signal per partial pressure at the reference temperature in stirred water, nA/hPa.</summary>
    public double SlopeNanoamperePerHectopascal { get; init; } = 0.45;

    /// <summary>Signal without oxygen, nA.</summary>
    public double ZeroNanoampere { get; init; } = 0.35;

    /// <summary>Activation energy of the membrane, J/mol: about 3 %/K at 25 °C.</summary>
    public double ActivationEnergyJoulePerMole { get; init; } = 22_000;

    /// <summary>Temperature at which the slope holds, °C.</summary>
    public double ReferenceCelsius { get; init; } = 25;

    /// <summary>Time constant of the membrane, s; 90 % of a step are there after 2.3 of them.</summary>
    public double LagSeconds { get; init; } = 12;

    /// <summary>Time constant of the thermometer and of the membrane's temperature, s.</summary>
    public double ThermalLagSeconds { get; init; } = 6;

    /// <summary>Share of the stirred signal that is left in still water.</summary>
    public double StillFactor { get; init; } = 0.82;

    /// <summary>Signal in air over signal in stirred water at the same partial pressure.</summary>
    public double AirToWaterRatio { get; init; } = 1.01;

    /// <summary>Relative change of the slope in a day.</summary>
    public double SlopeDriftPerDay { get; init; } = -0.002;

    /// <summary>Standard deviation of the noise of the signal, nA.</summary>
    public double NoiseNanoampere { get; init; } = 0.03;

    /// <summary>Smallest step of the converter, nA.</summary>
    public double ResolutionNanoampere { get; init; } = 0.001;

    /// <summary>How much the thermometer reads too high, K.</summary>
    public double ThermometerOffsetKelvin { get; init; } = 0.03;

    /// <summary>Standard deviation of the thermometer's noise, K.</summary>
    public double ThermometerNoiseKelvin { get; init; } = 0.004;

    /// <summary>How much the barometer reads too high, hPa.</summary>
    public double BarometerOffsetHectopascal { get; init; } = 0.3;

    /// <summary>Standard deviation of the barometer's noise, hPa.</summary>
    public double BarometerNoiseHectopascal { get; init; } = 0.05;
}
