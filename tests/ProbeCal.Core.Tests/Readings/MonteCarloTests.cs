using System;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Readings;

/// <summary>
/// The analytic uncertainty against simulated calibrations and readings (the idea of JCGM 101): its size, and how often the truth lies within k = 2.
/// </summary>
public class MonteCarloTests
{
    private const int OrdinaryTrials = 2000;
    private const int FullTrials = 50000;

    private readonly ITestOutputHelper output;

    public MonteCarloTests(ITestOutputHelper output)
    {
        this.output = output;
    }

    public static TheoryData<string> Scenarios => new()
    {
        "water point, same thermometer",
        "water point, another thermometer",
        "air point",
        "zero assumed, low oxygen",
        "thermometer dominates",
        "meter in mg/L",
        "meter in % local",
        "meter set to a temperature",
        "sea water, Garcia and Gordon",
        "coefficient dominates",
    };

    [Theory]
    [MemberData(nameof(Scenarios))]
    public void AnalyticUncertainty_AgreesWithSimulation(string scenario)
    {
        SimulatedChain chain = Chain(scenario);
        var campaign = new Campaign(output, "reading-uncertainty " + scenario.Replace('/', ' '), OrdinaryTrials, FullTrials);
        int trials = campaign.Count;
        var reading = new Reading();
        // Another stretch of random numbers for each scenario.
        var random = new Random(unchecked((campaign.Seed * 397) ^ (scenario.Length + (257 * scenario[^1]))));
        double[] squares = new double[Reading.QuantityCount];
        int[] covered = new int[Reading.QuantityCount];
        for (int trial = 0; trial < trials; trial++)
        {
            double[] deviations = chain.Run(random, reading);
            for (int i = 0; i < deviations.Length; i++)
            {
                squares[i] += deviations[i] * deviations[i];
                if (Math.Abs(deviations[i]) <= 2.0 * reading.StandardUncertainty((ReadingQuantity)i)) { covered[i]++; }
            }
        }

        // Without errors the chain gives the truth, and its uncertainty is the analytic one.
        double[] none = chain.Run(null, reading);
        // Standard deviations from n trials are themselves uncertain by 1/√(2n): 1.6 % at 2,000; four of those, and 1 % for the
        // second order that the law of propagation leaves out.
        double tolerance = 0.01 + (4.0 / Math.Sqrt(2.0 * trials));
        for (int i = 0; i < Reading.QuantityCount; i++)
        {
            var quantity = (ReadingQuantity)i;
            double analytic = reading.StandardUncertainty(quantity);
            double simulated = Math.Sqrt(squares[i] / trials);
            double coverage = (double)covered[i] / trials;
            campaign.Say($"{quantity}: value {reading.Value(quantity):G6}, analytic u {analytic:G4}, simulated {simulated:G4}, coverage {100.0 * coverage:F1} %");
            Assert.Equal(0.0, none[i] / Math.Max(1.0, Math.Abs(reading.Value(quantity))), 10);
            Assert.InRange(simulated / analytic, 1.0 - tolerance, 1.0 + tolerance);
            Assert.InRange(coverage, 0.93, 0.99);
        }

        campaign.Close();
    }

    [Fact]
    public void NeglectedCovariance_WouldBeNoticed()
    {
        // The same thermometer, but a reading that believes it was another one: the claim is then far from the simulation.
        SimulatedChain same = Chain("thermometer dominates");
        var reading = new Reading();
        same.Run(null, reading);
        double right = reading.StandardUncertainty(ReadingQuantity.MilligramsPerLitre);
        new SimulatedChain { UOffset = 0.5, RelativeSignalNoise = 0.0005, UStirring = 0.0, SameThermometer = false }.Run(null, reading);
        double wrong = reading.StandardUncertainty(ReadingQuantity.MilligramsPerLitre);
        Assert.InRange(wrong / right, 1.5, 4.0);
    }

    private static SimulatedChain Chain(string scenario)
    {
        return scenario switch
        {
            "water point, same thermometer" => new SimulatedChain(),
            "water point, another thermometer" => new SimulatedChain { SameThermometer = false, UOffset = 0.2 },
            "air point" => new SimulatedChain { Method = CalibrationMethod.WaterSaturatedAir, Truth = 210.0 },
            "zero assumed, low oxygen" => new SimulatedChain { ZeroMeasured = false, Truth = 5.0 },
            "thermometer dominates" => new SimulatedChain { UOffset = 0.5, RelativeSignalNoise = 0.0005, UStirring = 0.0 },
            "meter in mg/L" => new SimulatedChain { Meter = MeterScale.MilligramsPerLitre, UOffset = 0.3 },
            "meter in % local" => new SimulatedChain { Meter = MeterScale.PercentLocal, UOffset = 0.3 },
            "meter set to a temperature" => new SimulatedChain { Meter = MeterScale.MilligramsPerLitre, TemperatureSet = 15.0, UOffset = 0.3, SameThermometer = false },
            "sea water, Garcia and Gordon" => new SimulatedChain { Equation = SolubilityEquation.GarciaGordon1992, Salinity = 34.0, USalinity = 0.5, Temperature = 3.0 },
            "coefficient dominates" => new SimulatedChain { UCoefficient = 0.002, CalibrationTemperature = 30.0, Temperature = 4.0 },
            _ => throw new ArgumentOutOfRangeException(nameof(scenario)),
        };
    }
}
