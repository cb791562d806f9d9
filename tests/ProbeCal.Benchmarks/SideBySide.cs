using System;
using System.Diagnostics;
using System.Globalization;
using System.Linq;
using System.Runtime.InteropServices;

namespace ProbeCal.Benchmarks;

/// <summary>
/// The batch and the scalar calls beside gsw's compiled code, run by run in turn on the same numbers, so that a change of the machine's
/// speed meets all of them. The fastest run of each counts. The width is the widest that the runtime admits (side-by-side.sh takes wider ones away).
/// </summary>
internal static class SideBySide
{
    private static readonly TimeSpan WarmUp = TimeSpan.FromSeconds(2);

    /// <summary>What two implementations of one formula may differ by: rounding (the same figure as in the peers' tests).</summary>
    private const double LargestDifference = 1.0e-14;

    private sealed class Contender(string name, string key, Action call)
    {
        internal string Name => name;

        internal string Key => key;

        internal TimeSpan Best { get; private set; } = TimeSpan.MaxValue;

        internal void Measure()
        {
            long start = Stopwatch.GetTimestamp();
            call();
            TimeSpan time = Stopwatch.GetElapsedTime(start);
            if (time < Best) { Best = time; }
        }

        internal void Run()
        {
            call();
        }
    }

    internal static int Run(int runs, int count)
    {
        Water water = new(count);
        using GswPeer gsw = new(water);
        int width = (int)LaneWidths.Widest;
        Contender[] contenders =
        [
            new("Garcia-Gordon 1992, batch", "batch", () => Require(OxygenBatch.GarciaGordon1992MicromolesPerKilogramAtOneAtmosphere(
                water.Celsius, water.Salinity, RangeRule.Refuse, water.Values, water.Statuses))),
            new("Garcia-Gordon 1992, one call a value", "scalar", () => ScalarGarciaGordon(water)),
            new("Benson-Krause 1984 with pressure, batch", "pressure", () => Require(OxygenBatch.MilligramsPerLitre(
                SolubilityEquation.BensonKrause1984, water.Celsius, water.Salinity, water.PressureHectopascal, RangeRule.Refuse, water.Values,
                water.Statuses))),
            new("Benson-Krause 1984 with pressure, one call a value", "", () => ScalarBensonKrause(water)),
        ];

        // Both must compute the same before they are compared.
        gsw.Call();
        foreach (Contender contender in contenders.Take(2))
        {
            contender.Run();
            double difference = gsw.LargestDifference(water.Values);
            if (!(difference <= LargestDifference))
            {
                Console.Error.WriteLine(FormattableString.Invariant($"{contender.Name} differs from gsw by {difference}, allowed are {LargestDifference}"));
                return 1;
            }
        }

        // The runtime compiles anew what runs often.
        foreach (Contender contender in contenders)
        {
            long start = Stopwatch.GetTimestamp();
            do { contender.Run(); } while (runs > 1 && Stopwatch.GetElapsedTime(start) < WarmUp);
        }

        TimeSpan peer = TimeSpan.MaxValue;
        for (int run = 0; run < runs; run++)
        {
            TimeSpan time = gsw.Call();
            if (time < peer) { peer = time; }
            foreach (Contender contender in contenders) { contender.Measure(); }
        }

        string text = string.Create(CultureInfo.InvariantCulture, $"{RuntimeInformation.FrameworkDescription}, {RuntimeInformation.ProcessArchitecture}, width {width}: {count} values, fastest of {runs} runs in turn");
        Console.WriteLine(text);
        Line("gsw " + gsw.Version + " O2sol_SP_pt", peer, count, "");
        foreach (Contender contender in contenders)
        {
            string ratio = string.Create(CultureInfo.InvariantCulture, $"{peer / contender.Best,6:0.00} times the speed of gsw{Goal(contender.Key, width)}");
            Line(contender.Name, contender.Best, count, ratio);
        }

        return 0;
    }

    /// <summary>What the project asks for and hopes for, at this width.</summary>
    private static string Goal(string key, int width)
    {
        return (key, width) switch
        {
            ("batch", 512) => " (asked 5, hoped 8)",
            ("batch", 256) => " (asked 3.5, hoped 5.5)",
            ("batch", 128) => " (asked 1.7, hoped 2.5)",
            ("scalar", _) => " (asked 1, hoped 1.25)",
            ("pressure", 512) => " (asked 4)",
            ("pressure", 256) => " (asked 3)",
            ("pressure", 128) => " (asked 1.4)",
            _ => "",
        };
    }

    private static void Line(string name, TimeSpan time, int count, string ratio)
    {
        Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"  {name,-52} {time.TotalNanoseconds / count,7:0.00} ns a value  {ratio}").TrimEnd());
    }

    private static void ScalarGarciaGordon(Water water)
    {
        int notOk = 0;
        for (int i = 0; i < water.Celsius.Length; i++)
        {
            if (GarciaGordon1992.MicromolesPerKilogramAtOneAtmosphere(water.Celsius[i], water.Salinity[i], RangeRule.Refuse, out water.Values[i]) != Status.Ok)
            {
                notOk++;
            }
        }

        Require(notOk);
    }

    private static void ScalarBensonKrause(Water water)
    {
        int notOk = 0;
        for (int i = 0; i < water.Celsius.Length; i++)
        {
            if (BensonKrause1984.MilligramsPerLitre(
                water.Celsius[i], water.Salinity[i], water.PressureHectopascal[i], RangeRule.Refuse, out water.Values[i]) != Status.Ok)
            {
                notOk++;
            }
        }

        Require(notOk);
    }

    private static void Require(int notOk)
    {
        if (notOk != 0) { throw new InvalidOperationException(FormattableString.Invariant($"{notOk} values were not Ok")); }
    }
}
