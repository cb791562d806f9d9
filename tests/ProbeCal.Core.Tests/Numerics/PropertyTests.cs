using System;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Core.Tests;

/// <summary>What must hold between results, whatever the oracle says.</summary>
public class PropertyTests
{
    private const int Reach = 100;
    private readonly ITestOutputHelper _output;

    public PropertyTests(ITestOutputHelper output)
    {
        _output = output;
    }

    private delegate double Function(double x);

    [Fact]
    public void ExpNeverFallsAcrossASeam()
    {
        for (int half = -2149; half <= 2047; half++)
        {
            NeverFalls(Numerics.Exp, half * 0.34657359027997264);
        }

        NeverFalls(Numerics.Exp, -708.0);
        NeverFalls(Numerics.Exp, 709.0);
        NeverFalls(Numerics.Exp, -746.0);
        NeverFalls(Numerics.Exp, 709.78271289338397);
    }

    [Fact]
    public void LnNeverFallsAcrossASeam()
    {
        for (int k = -1020; k <= 1020; k++)
        {
            NeverFalls(Numerics.Ln, 0.70710678118654757 * Math.Pow(2.0, k));
            NeverFalls(Numerics.Ln, Math.Pow(2.0, k));
        }

        NeverFalls(Numerics.Ln, 2.2250738585072014e-308);
    }

    [Fact]
    public void SqrtNeverFalls()
    {
        for (int k = -1020; k <= 1020; k++)
        {
            NeverFalls(Numerics.Sqrt, Math.Pow(2.0, k));
        }

        NeverFalls(Numerics.Sqrt, 2.2250738585072014e-308);
    }

    /// <summary>A correctly rounded root of an exact square is exact.</summary>
    [Fact]
    public void RootOfASquareIsTheNumber()
    {
        Campaign campaign = new(_output, "sqrt-of-square", 100_000, 1_000_000);
        for (int i = 0; i < campaign.Count; i++)
        {
            double root = campaign.Random.Next(1, 1 << 26);
            Assert.Equal(root, Numerics.Sqrt(root * root));
        }
    }

    /// <summary>
    /// An error of one ulp in y = ln x moves e^y by |y|·2^-52 relatively; with one ulp of exp itself and the
    /// exact value between two doubles, the way back is within (|y| + 1.5)·2^-52.
    /// </summary>
    [Fact]
    public void ExpUndoesLn()
    {
        Campaign campaign = new(_output, "exp-of-ln", 50_000, 1_000_000);
        for (int i = 0; i < campaign.Count; i++)
        {
            double x = InputClasses.Uniform(campaign.Random, 1.0, 1.9999) * Math.Pow(2.0, campaign.Random.Next(-1000, 1000));
            double y = Numerics.Ln(x);
            double back = Numerics.Exp(y);
            if (!(Math.Abs(back - x) <= (Math.Abs(y) + 1.5) * Math.Pow(2.0, -52.0) * x))
            {
                Assert.Fail(FormattableString.Invariant($"{x:R} comes back as {back:R}"));
            }
        }
    }

    /// <summary>e^x · e^-x is 1 but for the errors of both and the rounding of the product.</summary>
    [Fact]
    public void ExpOfOppositesMultiplyToOne()
    {
        Campaign campaign = new(_output, "exp-of-opposites", 50_000, 1_000_000);
        for (int i = 0; i < campaign.Count; i++)
        {
            double x = InputClasses.Uniform(campaign.Random, -700.0, 700.0);
            Assert.InRange(Numerics.Exp(x) * Numerics.Exp(-x), 1.0 - Math.Pow(2.0, -50.5), 1.0 + Math.Pow(2.0, -50.5));
        }
    }

    [Fact]
    public void PowAgreesWithRootSquareAndIdentity()
    {
        Campaign campaign = new(_output, "pow-identities", 50_000, 1_000_000);
        for (int i = 0; i < campaign.Count; i++)
        {
            double x = InputClasses.Uniform(campaign.Random, 1.0, 2.0) * Math.Pow(2.0, campaign.Random.Next(-500, 500));
            WithinUlps(x, Numerics.Pow(x, 1.0), 2);
            WithinUlps(Numerics.Sqrt(x), Numerics.Pow(x, 0.5), 3);
            WithinUlps(x * x, Numerics.Pow(x, 2.0), 3);
        }
    }

    [Fact]
    public void PowersOfTwoComeFromExpExactlyEnough()
    {
        for (int k = -1074; k <= 1023; k++)
        {
            WithinUlps(Math.ScaleB(1.0, k), Numerics.Pow(2.0, k), 1);
        }
    }

    [Fact]
    public void SelfCheckHoldsHere()
    {
        Assert.Equal(Numerics.PublishedChecksum, Numerics.Checksum());
        Assert.True(Numerics.SelfCheck());
    }

    private static void NeverFalls(Function function, double centre)
    {
        double x = centre;
        for (int i = 0; i < Reach; i++)
        {
            x = Math.BitDecrement(x);
        }

        double before = function(x);
        for (int i = 0; i < 2 * Reach; i++)
        {
            x = Math.BitIncrement(x);
            double after = function(x);
            if (!(before <= after))
            {
                Assert.Fail(FormattableString.Invariant($"falls from {before:R} to {after:R} at {x:R}"));
            }

            before = after;
        }
    }

    private static void WithinUlps(double expected, double actual, long ulps)
    {
        long distance = Math.Abs(BitConverter.DoubleToInt64Bits(expected) - BitConverter.DoubleToInt64Bits(actual));
        if (distance > ulps)
        {
            Assert.Fail(FormattableString.Invariant($"{actual:R} is {distance} doubles from {expected:R}"));
        }
    }
}
