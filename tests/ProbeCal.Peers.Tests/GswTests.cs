using System;
using System.Globalization;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Peers.Tests;

/// <summary>
/// Oxygen, density, practical salinity and freezing point against the Gibbs-SeaWater toolbox over random water. The toolbox's Python package has no other gas; its
/// worked examples for N2, Ar and Kr stand among the check values of Core.
/// </summary>
public class GswTests(ITestOutputHelper output)
{
    private const int DefaultSeed = 19920637;

    private static readonly int Count = Environment.GetEnvironmentVariable("PROBECAL_FULL") == "1" ? 200_000 : 10_000;
    private static readonly int Seed =
        int.TryParse(Environment.GetEnvironmentVariable("PROBECAL_SEED"), NumberStyles.Integer, CultureInfo.InvariantCulture, out int seed) ? seed : DefaultSeed;

    /// <summary>The same fit on the same scale: agreement to rounding of two implementations.</summary>
    [SkippableFact]
    public void GarciaGordon_IsTheSameFunction()
    {
        GswPeer.Require();
        Draw(42.0, out double[] salinity, out double[] celsius);
        double[] peer = GswPeer.Evaluate("gsw.O2sol_SP_pt(a, b)", salinity, celsius);
        double worst = 0.0;
        for (int i = 0; i < Count; i++)
        {
            Assert.Equal(Status.Ok, GarciaGordon1992.MicromolesPerKilogram(celsius[i], salinity[i], 1013.25, RangeRule.Refuse, out double value));
            worst = Math.Max(worst, Math.Abs((value / peer[i]) - 1.0));
        }

        Report("Garcia-Gordon 1992 over gsw.O2sol_SP_pt", worst, "relative");
        Assert.InRange(worst, 0.0, 1.0e-14);
    }

    /// <summary>The default equation, by way of EOS-80, against the peer's umol/kg: two fits of one data set.</summary>
    [SkippableFact]
    public void BensonKrause_StaysBesideThePeer()
    {
        GswPeer.Require();
        Draw(40.0, out double[] salinity, out double[] celsius);
        double[] peer = GswPeer.Evaluate("gsw.O2sol_SP_pt(a, b)", salinity, celsius);
        double worst = 0.0;
        int compared = 0;
        for (int i = 0; i < Count; i++)
        {
            if (celsius[i] < 0.0) { continue; }
            Assert.Equal(Status.Ok, BensonKrause1984.MilligramsPerLitre(celsius[i], salinity[i], 1013.25, RangeRule.Refuse, out double milligrams));
            Assert.Equal(Status.Ok, DensityEos80.Density(celsius[i], salinity[i], RangeRule.Refuse, out double density));
            Assert.Equal(Status.Ok, OxygenUnits.MicromolesPerKilogramFromMilligramsPerLitre(milligrams, density, out double value));
            worst = Math.Max(worst, Math.Abs((value / peer[i]) - 1.0));
            compared++;
        }

        Report("Benson-Krause 1984 (EOS-80) over gsw.O2sol_SP_pt", worst, "relative");
        Assert.True(Count / 2 < compared);
        Assert.InRange(worst, 0.0, 3.1e-4);
    }

    /// <summary>EOS-80 against TEOS-10, another equation of state: the distance that the documents state.</summary>
    [SkippableTheory]
    [InlineData(35.0, 0.0085)]
    [InlineData(42.0, 0.0115)]
    public void Density_StaysBesideTeos10(double highestSalinity, double allowed)
    {
        GswPeer.Require();
        Draw(highestSalinity, out double[] salinity, out double[] celsius);
        double[] peer = GswPeer.Evaluate("gsw.rho_t_exact(gsw.SR_from_SP(a), b, 0)", salinity, celsius);
        double worst = 0.0;
        for (int i = 0; i < Count; i++)
        {
            Assert.Equal(Status.Ok, DensityEos80.Density(celsius[i], salinity[i], RangeRule.Refuse, out double value));
            worst = Math.Max(worst, Math.Abs(value - peer[i]));
        }

        Report("EOS-80 against gsw.rho_t_exact, S up to " + highestSalinity.ToString(CultureInfo.InvariantCulture), worst, "kg/m3");
        Assert.InRange(worst, 0.0, allowed);
    }

    /// <summary>The same scale and the same low-salinity extension: agreement to rounding, under pressure too, from fresh water to S 42.</summary>
    [SkippableFact]
    public void PracticalSalinity_IsTheSameFunction()
    {
        GswPeer.Require();
        Random random = new(Seed);
        double[] conductivity = new double[Count];
        double[] celsius = new double[Count];
        double[] decibar = new double[Count];
        for (int i = 0; i < Count; i++)
        {
            // Half of them in the low-salinity extension (below about 4 mS/cm), half of them at the surface.
            conductivity[i] = (random.NextDouble() < 0.5 ? 4.0 : 65.0) * random.NextDouble();
            celsius[i] = -2.0 + (37.0 * random.NextDouble());
            decibar[i] = random.NextDouble() < 0.5 ? 0.0 : 10_000.0 * random.NextDouble();
        }

        double[] peer = GswPeer.Evaluate("gsw.SP_from_C(a, b, c)", conductivity, celsius, decibar);
        double worstLow = 0.0;
        double worst = 0.0;
        int low = 0;
        int compared = 0;
        for (int i = 0; i < Count; i++)
        {
            Status status = PracticalSalinity.FromConductivity(conductivity[i], celsius[i], decibar[i], RangeRule.Refuse, out double value);
            if (double.IsNaN(peer[i]))
            {
                // Here and there the toolbox has no value for water purer than distilled.
                Assert.True(conductivity[i] < 0.003 && status == Status.Ok && 0.0 <= value);
                continue;
            }

            // The scale ends at 42; beyond it the toolbox goes on and Core refuses.
            Assert.Equal(peer[i] <= 42.0 ? Status.Ok : Status.ConductanceAboveRange, status);
            if (status != Status.Ok) { continue; }
            double difference = Math.Abs(value - peer[i]);
            compared++;
            if (peer[i] < 2.0)
            {
                low++;
                worstLow = Math.Max(worstLow, difference);
            }
            else
            {
                worst = Math.Max(worst, difference);
            }
        }

        Report($"PSS-78 over gsw.SP_from_C, {compared - low} values from S 2 to 42", worst, "(S)");
        Report($"low-salinity extension over gsw.SP_from_C, {low} values below S 2", worstLow, "(S)");
        Assert.True(Count / 4 < low && Count / 4 < compared - low);
        Assert.InRange(worst, 0.0, 1.0e-12);
        Assert.InRange(worstLow, 0.0, 1.0e-12);
    }

    /// <summary>The freezing point against the peer's for air-saturated water; the old formula is stated to 0.004 K.</summary>
    [SkippableFact]
    public void FreezingPoint_StaysBesideThePeer()
    {
        GswPeer.Require();
        Draw(40.0, out double[] salinity, out _);
        double[] peer = GswPeer.Evaluate("gsw.t_freezing(gsw.SR_from_SP(a), 0, 1)", salinity, salinity);
        double worst = 0.0;
        for (int i = 0; i < Count; i++)
        {
            Assert.Equal(Status.Ok, FreezingPoint.Celsius(salinity[i], RangeRule.Refuse, out double value));
            worst = Math.Max(worst, Math.Abs(value - peer[i]));
        }

        Report("freezing point against gsw.t_freezing", worst, "K");
        Assert.InRange(worst, 0.0, 0.004);
    }

    private static void Draw(double highestSalinity, out double[] salinity, out double[] celsius)
    {
        Random random = new(Seed);
        salinity = new double[Count];
        celsius = new double[Count];
        for (int i = 0; i < Count; i++)
        {
            salinity[i] = highestSalinity * random.NextDouble();
            FreezingPoint.Celsius(salinity[i], RangeRule.Refuse, out double freezing);
            double lowest = Math.Max(freezing, GarciaGordon1992.LowestCelsius);
            celsius[i] = lowest + ((40.0 - lowest) * random.NextDouble());
        }
    }

    private void Report(string what, double worst, string unit)
    {
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture, $"{what}: worst {worst:E3} {unit} of {Count} (gsw {GswPeer.Version()}, seed {Seed})"));
    }
}
