using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading.Tasks;
using Microsoft.Extensions.Time.Testing;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Simulation;
using ProbeCal.Station.Sources;
using ProbeCal.Station.Tests.Sources;
using Xunit;

namespace ProbeCal.Station.Tests.Simulation;

public class ProbeInWaterTests
{
    private static readonly DateTimeOffset Start = new(2026, 6, 1, 0, 0, 0, TimeSpan.Zero);

    private static readonly SimulatedProbe Quiet = new()
    {
        NoiseNanoampere = 0,
        ThermometerNoiseKelvin = 0,
        BarometerNoiseHectopascal = 0,
        ThermometerOffsetKelvin = 0,
        BarometerOffsetHectopascal = 0,
        SlopeDriftPerDay = 0,
        ResolutionNanoampere = 1e-9,
    };

    [Fact]
    public void SameSeed_GivesTheSameLinesAndAnotherOneOthers()
    {
        SimulationSettings settings = new() { Script = SimulationScript.Parse("p", "air-saturated-water:1min,zero:1min,lake") };
        Assert.Equal(Lines(settings, 300), Lines(settings, 300));
        Assert.NotEqual(Lines(settings, 300), Lines(settings with { Seed = 2 }, 300));
    }

    /// <summary>A first-order lag, by arithmetic: 1 − 1/e of a step after one time constant, 90 % after ln 10 of them.</summary>
    [Fact]
    public void Step_IsFollowedWithTheMembranesLag()
    {
        SimulationSettings settings = new()
        {
            Probe = Quiet with { LagSeconds = 20 },
            Interval = TimeSpan.FromSeconds(0.1),
            WeatherHectopascal = 0,
            Script = SimulationScript.Parse("p", "zero:10s,air-saturated-water"),
        };
        (SimulatedTruth Truth, SimulatedInstruments Instruments)[] run = Run(settings, 1000);
        double full = run[500].Truth.SettledSignalNanoampere - Quiet.ZeroNanoampere;
        double After(double seconds) => (run[99 + (int)Math.Round(seconds * 10)].Instruments.SignalNanoampere - Quiet.ZeroNanoampere) / full;
        Assert.Equal(0, After(0), 9);
        Assert.Equal(1 - Math.Exp(-1), After(20), 9);
        Assert.Equal(0.9, After(20 * Math.Log(10)), 3);
    }

    /// <summary>
    /// Settled in air-saturated water the signal tells the truth: turned back with the probe's true slope, zero and
    /// temperature law it gives the partial pressure of oxygen in water-saturated air.
    /// </summary>
    [Theory]
    [InlineData(5, 1013.25)]
    [InlineData(20, 1013.25)]
    [InlineData(20, 940)]
    [InlineData(30, 700)]
    public void AirSaturatedWater_TurnsBackToItsPartialPressure(double celsius, double hectopascal)
    {
        SimulationSettings settings = new()
        {
            Probe = Quiet,
            TemperatureCelsius = celsius,
            PressureHectopascal = hectopascal,
            WeatherHectopascal = 0,
            Script = SimulationScript.Parse("p", "air-saturated-water"),
        };
        (SimulatedTruth truth, SimulatedInstruments instruments) = Run(settings, 1)[0];
        Assert.Equal(Status.Ok, OxygenEquilibrium.PartialPressure(celsius, hectopascal, RangeRule.Refuse, out double saturated));
        Assert.Equal(saturated, truth.PartialPressureHectopascal, 9);
        Assert.Equal(Status.Ok, OxygenEquilibrium.MilligramsPerLitre(SolubilityEquation.BensonKrause1984, celsius, 0, hectopascal, RangeRule.Refuse, out double milligrams));
        Assert.Equal(milligrams, truth.MilligramsPerLitre, 9);

        // 22 kJ/mol over 8.314 J/(mol K) is 2646.0 K; the factor at 20 °C against 25 °C is exp(-2646.0 × 5/(293.15 × 298.15)) = 0.8595.
        double factor = Math.Exp(-22_000 / 8.31446261815324 * (25 - celsius) / ((celsius + 273.15) * 298.15));
        double partial = (instruments.SignalNanoampere - Quiet.ZeroNanoampere) / (Quiet.SlopeNanoamperePerHectopascal * factor);
        Assert.Equal(truth.PartialPressureHectopascal, partial, 6);
        Assert.Equal((celsius, hectopascal, 100.0), (instruments.TemperatureCelsius, instruments.PressureHectopascal, truth.PercentLocal));
    }

    [Fact]
    public void Places_DifferAsTheyShould()
    {
        double Settled(string phase)
        {
            SimulationSettings settings = new()
            {
                Probe = Quiet,
                DailySaturationPercent = 0,
                SaturationPercent = 100,
                DailyTemperatureKelvin = 0,
                Script = SimulationScript.Parse("p", phase),
            };
            return Run(settings, 1)[0].Truth.SettledSignalNanoampere - Quiet.ZeroNanoampere;
        }

        Assert.Equal(0, Settled("zero"), 12);
        Assert.Equal(1.01, Settled("air") / Settled("air-saturated-water"), 12);
        Assert.Equal(0.82, Settled("lake-still") / Settled("lake"), 12);
        Assert.Equal(1, Settled("lake") / Settled("air-saturated-water"), 12);
    }

    [Fact]
    public void Lake_HasDayAndNight()
    {
        SimulationSettings settings = new() { Interval = TimeSpan.FromMinutes(10), TemperatureCelsius = 18, WeatherHectopascal = 0 };
        SimulatedTruth[] day = Run(settings, 144).Select(line => line.Truth).ToArray();
        Assert.Equal(19.5, day.Max(truth => truth.TemperatureCelsius), 6);
        Assert.Equal(16.5, day.Min(truth => truth.TemperatureCelsius), 6);
        Assert.Equal(106, day.Max(truth => truth.PercentLocal), 6);
        Assert.Equal(78, day.Min(truth => truth.PercentLocal), 6);
        Assert.Equal(17, day.MaxBy(truth => truth.PercentLocal)!.TimeUtc.Hour);
        Assert.Equal(16, day.MaxBy(truth => truth.TemperatureCelsius)!.TimeUtc.Hour);
    }

    [Fact]
    public void Drift_TakesTheStatedShareOfTheSlopeInADay()
    {
        SimulationSettings settings = new()
        {
            Probe = Quiet with { SlopeDriftPerDay = -0.01 },
            Interval = TimeSpan.FromHours(24),
            WeatherHectopascal = 0,
            Script = SimulationScript.Parse("p", "air-saturated-water"),
        };
        (SimulatedTruth Truth, SimulatedInstruments Instruments)[] run = Run(settings, 2);
        Assert.Equal(0.99, (run[1].Instruments.SignalNanoampere - Quiet.ZeroNanoampere) / (run[0].Instruments.SignalNanoampere - Quiet.ZeroNanoampere), 9);
    }

    /// <summary>10,000 lines: the mean within four standard errors, the spread within 4 % (four of its own standard errors are 2.8 %).</summary>
    [Fact]
    public void Noise_HasTheStatedSpreadAndNoBias()
    {
        SimulatedProbe probe = Quiet with { NoiseNanoampere = 0.03, ThermometerNoiseKelvin = 0.004, ThermometerOffsetKelvin = 0.03 };
        SimulationSettings settings = new() { Probe = probe, WeatherHectopascal = 0, Script = SimulationScript.Parse("p", "air-saturated-water") };
        (SimulatedTruth Truth, SimulatedInstruments Instruments)[] run = Run(settings, 10_000);
        double[] signal = run.Select(line => line.Instruments.SignalNanoampere - line.Truth.SettledSignalNanoampere).ToArray();
        double[] celsius = run.Select(line => line.Instruments.TemperatureCelsius - line.Truth.TemperatureCelsius).ToArray();
        Assert.InRange(signal.Average(), -0.0012, 0.0012);
        Assert.InRange(Spread(signal) / 0.03, 0.96, 1.04);
        Assert.InRange(celsius.Average(), 0.03 - 0.00016, 0.03 + 0.00016);
        Assert.InRange(Spread(celsius) / 0.004, 0.96, 1.04);
    }

    [Fact]
    public async Task Source_FollowsTheClockAndReadsItsOwnLines()
    {
        PacedTime time = new(Start);
        SimulationSettings settings = new() { Script = SimulationScript.Parse("p", "zero") };
        SimulatedSource source = new(settings, LineTemplate.Parse("l", LineTemplate.UsualText), time);
        List<SimulatedLine> made = [];
        source.LineMade += made.Add;
        await using SourceWatch watch = new(source, time);
        RawSample first = await watch.SampleAsync();
        source.Enter(SimulationPhase.AirSaturatedWater);
        RawSample second = await watch.SampleAsync();
        Assert.Equal(Start, first.TimeUtc);
        Assert.Equal(Start.AddSeconds(1), second.TimeUtc);
        Assert.Equal(1, (second.ReceivedUtc - first.ReceivedUtc).TotalSeconds, 0.3);
        Assert.True(first.TimeFromLine);
        Assert.Equal(made[0].Text, first.RawText);
        Assert.Equal([SimulationPhase.Zero, SimulationPhase.AirSaturatedWater], made.Take(2).Select(line => line.Truth.Phase));
        Assert.Equal(0.35, first.Signal, 0.15);
        Assert.True(second.Signal - first.Signal > 3, "one second of a 12 s lag brings a twelfth of the step");
        watch.Stop();
        await watch.ToEndAsync();
    }

    [Fact]
    public void Truth_IsWrittenSoThatItReadsBack()
    {
        SimulatedLine line = new SimulatedSource(new SimulationSettings(), LineTemplate.Parse("l", "{signal}"), new FakeTimeProvider(Start)).Next();
        string[] columns = SimulationRun.TruthRow(line).Split(',');
        Assert.Equal(SimulationRun.TruthHeader.Split(',').Length, columns.Length);
        Assert.Equal(["0", "2026-06-01T00:00:00Z", "lake"], columns[..3]);
        Assert.Equal(line.Truth.PartialPressureHectopascal, Number.Parse("truth", columns[6]));
        Assert.Equal(line.Truth.MilligramsPerLitre, Number.Parse("truth", columns[7]));
    }

    private static double Spread(double[] values)
    {
        double mean = values.Average();
        return Math.Sqrt(values.Sum(value => (value - mean) * (value - mean)) / (values.Length - 1));
    }

    private static (SimulatedTruth Truth, SimulatedInstruments Instruments)[] Run(SimulationSettings settings, int count)
    {
        ProbeInWater probe = new(settings, Start);
        return Enumerable.Range(0, count).Select(_ => (probe.Step(out SimulatedInstruments instruments), instruments)).ToArray();
    }

    private static string[] Lines(SimulationSettings settings, int count)
    {
        SimulatedSource source = new(settings, LineTemplate.Parse("l", LineTemplate.UsualText), new FakeTimeProvider(Start));
        return Enumerable.Range(0, count).Select(_ => source.Next().Text).ToArray();
    }
}
