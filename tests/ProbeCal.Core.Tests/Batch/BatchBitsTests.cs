using System;
using System.Collections.Generic;
using System.Globalization;
using System.Runtime.Intrinsics;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests.Batch;

/// <summary>Every batch function gives the bits, the statuses and the count of the scalar call, in every width and under every rule.</summary>
public class BatchBitsTests(ITestOutputHelper output)
{
    private const int DefaultSeed = 41230;

    private static readonly int Seed =
        int.TryParse(Environment.GetEnvironmentVariable("PROBECAL_SEED"), NumberStyles.Integer, CultureInfo.InvariantCulture, out int seed) ? seed : DefaultSeed;

    // Widths that the machine lacks are computed in software, slowly and with the same bits: all four are run everywhere.
    private static readonly LaneWidth[] Widths = [LaneWidth.Scalar, LaneWidth.Bits128, LaneWidth.Bits256, LaneWidth.Bits512];
    private static readonly RangeRule[] Rules = [RangeRule.Refuse, RangeRule.NearEdge, RangeRule.Extrapolate];

    /// <summary>What tests inputs of every kind: the ends of all ranges, the near edge, the seams of ln and exp, and what is no number.</summary>
    private static readonly double[] Edges = MakeEdges();

    internal delegate int Call(double[] a, double[] b, double[] c, double[] d, RangeRule rule, double[] values, Status[] statuses, LaneWidth width);

    internal delegate Status Single(double a, double b, double c, double d, RangeRule rule, out double value);

    public static TheoryData<string> Functions()
    {
        TheoryData<string> names = [];
        foreach (string name in Table.Keys) { names.Add(name); }
        return names;
    }

    [Theory]
    [MemberData(nameof(Functions))]
    public void Random_water_in_range(string function)
    {
        Random random = new(Seed);
        Inputs inputs = new(4099);
        for (int i = 0; i < inputs.Length; i++)
        {
            inputs.Set(i, 0.0 + (40.0 * random.NextDouble()), 40.0 * random.NextDouble(), 510.0 + (600.0 * random.NextDouble()), 250.0 * random.NextDouble());
        }

        int ok = Compare(function, inputs);
        // Nearly all of it is Ok (a concentration of 250 mg/L is not), so that the lane formulas are what was tested.
        Assert.True(inputs.Length / 10 < ok, function);
    }

    [Theory]
    [MemberData(nameof(Functions))]
    public void Cold_and_salty_water_some_of_it_frozen(string function)
    {
        Random random = new(Seed);
        Inputs inputs = new(2051);
        for (int i = 0; i < inputs.Length; i++)
        {
            inputs.Set(i, -2.4 + (3.0 * random.NextDouble()), 44.0 * random.NextDouble(), 500.0 + (630.0 * random.NextDouble()), 40.0 * random.NextDouble());
        }

        Compare(function, inputs);
    }

    [Theory]
    [MemberData(nameof(Functions))]
    public void Edges_and_numbers_of_every_kind_among_good_water(string function)
    {
        Random random = new(Seed);
        Inputs inputs = new(8192 + 7);
        for (int i = 0; i < inputs.Length; i++)
        {
            double Pick(double low, double high)
            {
                int kind = random.Next(8);
                return kind == 0 ? Edges[random.Next(Edges.Length)]
                    : kind == 1 && random.Next(4) == 0 ? BitConverter.Int64BitsToDouble(random.NextInt64(long.MinValue, long.MaxValue))
                    : low + ((high - low) * random.NextDouble());
            }

            inputs.Set(i, Pick(0.0, 40.0), Pick(0.0, 40.0), Pick(510.0, 1110.0), Pick(0.0, 40.0));
        }

        Compare(function, inputs);
    }

    [Theory]
    [MemberData(nameof(Functions))]
    public void Every_edge_of_every_input(string function)
    {
        // Each edge in each place, the other inputs good: a lane of its own in every position of the vector.
        Inputs inputs = new(4 * Edges.Length);
        for (int i = 0; i < inputs.Length; i++)
        {
            double[] place = [12.5, 35.0, 1013.25, 9.0];
            place[i % 4] = Edges[i / 4];
            inputs.Set(i, place[0], place[1], place[2], place[3]);
        }

        Compare(function, inputs);
    }

    [Theory]
    [MemberData(nameof(Functions))]
    public void Every_length(string function)
    {
        foreach (int length in new[] { 0, 1, 2, 3, 4, 5, 7, 8, 9, 15, 16, 17, 31, 33, BatchLoop.BlockLength - 1, BatchLoop.BlockLength, BatchLoop.BlockLength + 1, (2 * BatchLoop.BlockLength) + 3 })
        {
            Inputs inputs = new(length);
            for (int i = 0; i < length; i++) { inputs.Set(i, i % 45, 35.0, 1000.0, 8.0); }
            Compare(function, inputs);
        }
    }

    [Theory]
    [MemberData(nameof(Functions))]
    public void Output_over_an_input(string function)
    {
        (Single single, Call call) = Table[function];
        foreach (LaneWidth width in Widths)
        {
            Inputs inputs = new(1003);
            for (int i = 0; i < inputs.Length; i++) { inputs.Set(i, -1.0 + (i % 43), i % 41, 600.0 + (i % 499), i % 30); }
            double[] first = (double[])inputs.A.Clone();
            Status[] statuses = new Status[inputs.Length];
            call(inputs.A, inputs.B, inputs.C, inputs.D, RangeRule.NearEdge, inputs.A, statuses, width);
            for (int i = 0; i < inputs.Length; i++)
            {
                Assert.Equal(single(first[i], inputs.B[i], inputs.C[i], inputs.D[i], RangeRule.NearEdge, out double value), statuses[i]);
                AssertSameBits(value, inputs.A[i], function, i, width);
            }
        }
    }

    [Fact]
    public void What_the_machine_has()
    {
        output.WriteLine($"campaign: batch in every width, seed {Seed}; this machine's is {(int)LaneWidths.Widest}");
        Assert.Equal(Vector512.IsHardwareAccelerated, LaneWidths.Widest == LaneWidth.Bits512);
    }

    private static int Compare(string function, Inputs inputs)
    {
        (Single single, Call call) = Table[function];
        int length = inputs.Length, ok = 0;
        foreach (RangeRule rule in Rules)
        {
            double[] expected = new double[length];
            Status[] expectedStatuses = new Status[length];
            int notOk = 0;
            for (int i = 0; i < length; i++)
            {
                expectedStatuses[i] = single(inputs.A[i], inputs.B[i], inputs.C[i], inputs.D[i], rule, out expected[i]);
                if (expectedStatuses[i] != Status.Ok) { notOk++; }
            }

            ok = length - notOk;
            foreach (LaneWidth width in Widths)
            {
                double[] values = new double[length];
                Status[] statuses = new Status[length];
                Array.Fill(values, 77.0);
                Array.Fill(statuses, Status.IonUnknown);
                int count = call(inputs.A, inputs.B, inputs.C, inputs.D, rule, values, statuses, width);
                for (int i = 0; i < length; i++)
                {
                    if (expectedStatuses[i] != statuses[i])
                    {
                        Assert.Fail($"{function} {rule} {width} [{i}] ({inputs.A[i]:R}, {inputs.B[i]:R}, {inputs.C[i]:R}, {inputs.D[i]:R}): {statuses[i]} where the scalar says {expectedStatuses[i]}");
                    }

                    AssertSameBits(expected[i], values[i], function, i, width);
                }

                Assert.Equal(notOk, count);
            }
        }

        return ok;
    }

    private static void AssertSameBits(double expected, double actual, string function, int index, LaneWidth width)
    {
        // No processor promises which NaN an operation gives.
        if (double.IsNaN(expected) && double.IsNaN(actual)) { return; }
        if (BitConverter.DoubleToInt64Bits(expected) != BitConverter.DoubleToInt64Bits(actual))
        {
            Assert.Fail(FormattableString.Invariant($"{function} {width} [{index}]: {actual:R} where the scalar gives {expected:R}"));
        }
    }

    private static double[] MakeEdges()
    {
        double[] ends =
        [
            -2.0, -1.9, -0.2, 0.0, 40.0, 40.2, 42.0, 25.0, 273.15, -273.15, 298.15, 100.0,
            BensonKrause1984.LowestHectopascal, BensonKrause1984.HighestHectopascal, 1013.25,
        ];
        List<double> edges = [];
        foreach (double end in ends)
        {
            edges.AddRange([Math.BitDecrement(end), end, Math.BitIncrement(end), end - 0.2, end + 0.2, Math.BitDecrement(end - 0.2), Math.BitIncrement(end + 0.2)]);
        }

        edges.AddRange([
            -0.0, double.Epsilon, -double.Epsilon, 1.0e-310, -1.0e-310, 2.2250738585072014E-308, double.MaxValue, double.MinValue, double.NaN,
            double.PositiveInfinity, double.NegativeInfinity, -1.0e300, 1.0e300, -5.0, 1.0e-9,
        ]);
        return [.. edges];
    }

    private sealed class Inputs(int length)
    {
        internal int Length => length;

        internal double[] A { get; } = new double[length];

        internal double[] B { get; } = new double[length];

        internal double[] C { get; } = new double[length];

        internal double[] D { get; } = new double[length];

        internal void Set(int index, double a, double b, double c, double d)
        {
            (A[index], B[index], C[index], D[index]) = (a, b, c, d);
        }
    }

    // The scalar side is written out here and not taken from the batch's own table of functions, so that a mix-up there shows.
    private static readonly Dictionary<string, (Single, Call)> Table = new()
    {
        ["Garcia-Gordon at 1 atm"] = (
            static (double t, double s, double _, double _, RangeRule rule, out double value) => GarciaGordon1992.MicromolesPerKilogramAtOneAtmosphere(t, s, rule, out value),
            static (a, b, c, d, rule, values, statuses, width) => BatchLoop.Run(default(OxygenFunctions.GarciaGordonAtOneAtmosphere), a, b, c, d, rule, values, statuses, width)),
        ["Garcia-Gordon"] = (
            static (double t, double s, double p, double _, RangeRule rule, out double value) => GarciaGordon1992.MicromolesPerKilogram(t, s, p, rule, out value),
            static (a, b, c, d, rule, values, statuses, width) => BatchLoop.Run(default(OxygenFunctions.GarciaGordon), a, b, c, d, rule, values, statuses, width)),
        ["mg/L Benson-Krause"] = (
            static (double t, double s, double p, double _, RangeRule rule, out double value) => OxygenEquilibrium.MilligramsPerLitre(SolubilityEquation.BensonKrause1984, t, s, p, rule, out value),
            static (a, b, c, d, rule, values, statuses, width) => BatchLoop.Run(
                default(OxygenFunctions.MilligramsPerLitre<OxygenSolubility.BensonKrause1984Lanes>), a, b, c, d, rule, values, statuses, width)),
        ["mg/L Garcia-Gordon"] = (
            static (double t, double s, double p, double _, RangeRule rule, out double value) => OxygenEquilibrium.MilligramsPerLitre(SolubilityEquation.GarciaGordon1992, t, s, p, rule, out value),
            static (a, b, c, d, rule, values, statuses, width) => BatchLoop.Run(
                default(OxygenFunctions.MilligramsPerLitre<OxygenSolubility.GarciaGordon1992Lanes>), a, b, c, d, rule, values, statuses, width)),
        ["partial pressure"] = (
            static (double t, double _, double p, double _, RangeRule rule, out double value) => OxygenEquilibrium.PartialPressure(t, p, rule, out value),
            static (a, _, c, d, rule, values, statuses, width) => BatchLoop.Run(default(OxygenFunctions.PartialPressure), a, c, d, d, rule, values, statuses, width)),
        ["concentration Benson-Krause"] = (
            static (double t, double s, double p, double x, RangeRule rule, out double value) => OxygenEquilibrium.ConcentrationFromPartialPressure(SolubilityEquation.BensonKrause1984, t, s, p, x, rule, out value),
            static (a, b, c, d, rule, values, statuses, width) => BatchLoop.Run(
                default(OxygenFunctions.ConcentrationFromPartialPressure<OxygenSolubility.BensonKrause1984Lanes>), a, b, c, d, rule, values, statuses, width)),
        ["concentration Garcia-Gordon"] = (
            static (double t, double s, double p, double x, RangeRule rule, out double value) => OxygenEquilibrium.ConcentrationFromPartialPressure(SolubilityEquation.GarciaGordon1992, t, s, p, x, rule, out value),
            static (a, b, c, d, rule, values, statuses, width) => BatchLoop.Run(
                default(OxygenFunctions.ConcentrationFromPartialPressure<OxygenSolubility.GarciaGordon1992Lanes>), a, b, c, d, rule, values, statuses, width)),
        ["inverse Benson-Krause"] = (
            static (double t, double s, double p, double x, RangeRule rule, out double value) => OxygenEquilibrium.PartialPressureFromConcentration(SolubilityEquation.BensonKrause1984, t, s, p, x, rule, out value),
            static (a, b, c, d, rule, values, statuses, width) => BatchLoop.Run(
                default(OxygenFunctions.PartialPressureFromConcentration<OxygenSolubility.BensonKrause1984Lanes>), a, b, c, d, rule, values, statuses, width)),
        ["inverse Garcia-Gordon"] = (
            static (double t, double s, double p, double x, RangeRule rule, out double value) => OxygenEquilibrium.PartialPressureFromConcentration(SolubilityEquation.GarciaGordon1992, t, s, p, x, rule, out value),
            static (a, b, c, d, rule, values, statuses, width) => BatchLoop.Run(
                default(OxygenFunctions.PartialPressureFromConcentration<OxygenSolubility.GarciaGordon1992Lanes>), a, b, c, d, rule, values, statuses, width)),
    };
}
