using System;
using System.Numerics;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests;

/// <summary>The promised error bounds, measured against <see cref="Oracle"/>. The results are cited in docs/accuracy.md.</summary>
public class AccuracyTests
{
    private readonly ITestOutputHelper _output;

    public AccuracyTests(ITestOutputHelper output)
    {
        _output = output;
    }

    private delegate double Draw(Random random);

    private delegate double Function(double x);

    private delegate BigFloat Exact(double x);

    [Fact]
    public void ExpWithinOneUlp()
    {
        Campaign campaign = new(_output, "exp-error", 25_000, 1_250_000);
        double worst = 0.0;
        worst = Math.Max(worst, Measure(campaign, "whole range -745.2..709.8", r => InputClasses.Uniform(r, -745.2, 709.8), Numerics.Exp, Math.Exp, ExactExp));
        worst = Math.Max(worst, Measure(campaign, "used by Core -40..40", r => InputClasses.Uniform(r, -40.0, 40.0), Numerics.Exp, Math.Exp, ExactExp));
        worst = Math.Max(worst, Measure(campaign, "-0.36..0.36", r => InputClasses.Uniform(r, -0.36, 0.36), Numerics.Exp, Math.Exp, ExactExp));
        worst = Math.Max(worst, Measure(campaign, "magnitudes 2^-60..2^9.4", r => InputClasses.Magnitude(r, -60.0, 9.4), Numerics.Exp, Math.Exp, ExactExp));
        worst = Math.Max(worst, Measure(campaign, "multiples of ln 2 / 2 and neighbours", InputClasses.NearHalfLn2, Numerics.Exp, Math.Exp, ExactExp));
        worst = Math.Max(worst, MeasureGrid(campaign, "grid -0.35..0.35", -0.35, 0.35, Numerics.Exp, ExactExp));
        campaign.Say($"exp: largest error {worst:0.0000} ulp, promised 1");
        campaign.Close();
        Assert.True(worst <= 1.0, FormattableString.Invariant($"{worst} ulp"));
    }

    [Fact]
    public void LnWithinOneUlp()
    {
        Campaign campaign = new(_output, "ln-error", 25_000, 1_250_000);
        double worst = 0.0;
        worst = Math.Max(worst, Measure(campaign, "all positive doubles", InputClasses.AnyPositive, Numerics.Ln, Math.Log, ExactLn));
        worst = Math.Max(worst, Measure(campaign, "used by Core 0.001..1000", r => Math.Abs(InputClasses.Magnitude(r, -10.0, 10.0)), Numerics.Ln, Math.Log, ExactLn));
        worst = Math.Max(worst, Measure(campaign, "0.5..2", r => InputClasses.Uniform(r, 0.5, 2.0), Numerics.Ln, Math.Log, ExactLn));
        worst = Math.Max(worst, Measure(campaign, "1 + t, t down to 2^-53", InputClasses.NearOne, Numerics.Ln, Math.Log, ExactLn));
        worst = Math.Max(worst, Measure(campaign, "root of 1/2 times 2^k and neighbours", InputClasses.NearRootHalf, Numerics.Ln, Math.Log, ExactLn));
        worst = Math.Max(worst, MeasureGrid(campaign, "grid 0.7..1.5", 0.7, 1.5, Numerics.Ln, ExactLn));
        campaign.Say($"ln: largest error {worst:0.0000} ulp, promised 1");
        campaign.Close();
        Assert.True(worst <= 1.0, FormattableString.Invariant($"{worst} ulp"));
    }

    [Fact]
    public void PowWithinTwoUlp()
    {
        Campaign campaign = new(_output, "pow-error", 25_000, 1_250_000);
        double worst = 0.0;
        worst = Math.Max(worst, MeasurePow(campaign, "used by Core: x 0.2..5, y -10..10", r => InputClasses.Uniform(r, 0.2, 5.0), (r, x) => InputClasses.Uniform(r, -10.0, 10.0)));
        worst = Math.Max(worst, MeasurePow(campaign, "any x, any finite result", InputClasses.AnyPositive, (r, x) => InputClasses.Uniform(r, -745.2, 709.8) / Math.Log(x)));
        worst = Math.Max(worst, MeasurePow(campaign, "x 0.5..2, result near the ends of the range", r => InputClasses.Uniform(r, 0.5, 2.0), (r, x) => InputClasses.Uniform(r, 690.0, 709.7) * (r.Next(2) == 0 ? 1.0 : -1.0) / Math.Log(x)));
        worst = Math.Max(worst, MeasurePow(campaign, "x = 1 + t, large y", InputClasses.NearOne, (r, x) => x == 1.0 ? 1e9 : InputClasses.Uniform(r, -709.0, 709.0) / Math.Log(x)));
        campaign.Say($"pow: largest error {worst:0.0000} ulp, promised 2");
        campaign.Close();
        Assert.True(worst <= 2.0, FormattableString.Invariant($"{worst} ulp"));
    }

    [Fact]
    public void SqrtCorrectlyRounded()
    {
        Campaign campaign = new(_output, "sqrt-error", 100_000, 10_000_000);
        Draw[] classes =
        {
            InputClasses.AnyPositive,
            r => InputClasses.Uniform(r, 1.0, 4.0),
            InputClasses.HardRoot,
            r => BitConverter.Int64BitsToDouble(r.NextInt64(1L, 0x0010000000000000L)),
        };
        string[] names = { "all positive doubles", "1..4", "next to squares and middles", "subnormals" };
        long wrong = 0;
        long unlikeMachine = 0;
        for (int c = 0; c < classes.Length; c++)
        {
            long wrongHere = 0;
            for (int i = 0; i < campaign.Count; i++)
            {
                double x = classes[c](campaign.Random);
                double root = Numerics.Sqrt(x);
                wrongHere += Oracle.IsNearestRoot(root, x) ? 0 : 1;
                unlikeMachine += root == Math.Sqrt(x) ? 0 : 1;
            }

            campaign.Say($"  {names[c]}: {wrongHere} of {campaign.Count} not correctly rounded");
            wrong += wrongHere;
        }

        campaign.Say($"sqrt: {wrong} not correctly rounded, promised 0; {unlikeMachine} unlike the machine's instruction (for information)");
        campaign.Close();
        Assert.Equal(0, wrong);
    }

    private static BigFloat ExactExp(double x)
    {
        return Oracle.Exp(Oracle.ToFixed(x));
    }

    private static BigFloat ExactLn(double x)
    {
        return new BigFloat(Oracle.Ln(x), -Oracle.Bits);
    }

    private static double Measure(Campaign campaign, string name, Draw draw, Function ours, Function machine, Exact exact)
    {
        WorstCase worst = new();
        WorstCase machineWorst = new();
        for (int i = 0; i < campaign.Count; i++)
        {
            double x = draw(campaign.Random);
            BigFloat want = exact(x);
            worst.Add(Oracle.ErrorInUlp(ours(x), want), x);
            machineWorst.Add(Oracle.ErrorInUlp(machine(x), want), x);
        }

        campaign.Say($"  {name}: {worst.Text()}; this machine's library, for information: {machineWorst.Error:0.0000}");
        return worst.Error;
    }

    private static double MeasureGrid(Campaign campaign, string name, double from, double to, Function ours, Exact exact)
    {
        WorstCase worst = new();
        for (int i = 0; i <= campaign.Count; i++)
        {
            double x = from + ((to - from) * i / campaign.Count);
            worst.Add(Oracle.ErrorInUlp(ours(x), exact(x)), x);
        }

        campaign.Say($"  {name}: {worst.Text()}");
        return worst.Error;
    }

    private static double MeasurePow(Campaign campaign, string name, Draw drawX, Func<Random, double, double> drawY)
    {
        WorstCase worst = new();
        WorstCase machineWorst = new();
        for (int i = 0; i < campaign.Count; i++)
        {
            double x = drawX(campaign.Random);
            double y = drawY(campaign.Random, x);
            BigFloat want = Oracle.Pow(x, y);
            worst.Add(Oracle.ErrorInUlp(Numerics.Pow(x, y), want), x, y);
            machineWorst.Add(Oracle.ErrorInUlp(Math.Pow(x, y), want), x, y);
        }

        campaign.Say($"  {name}: {worst.Text()}; this machine's library, for information: {machineWorst.Error:0.0000}");
        return worst.Error;
    }
}
