using System;
using System.Globalization;
using System.Numerics;
using System.Reflection;
using Xunit;

namespace ProbeCal.Core.Tests;

/// <summary>
/// The polynomials alone, in exact arithmetic with the very coefficients of the code: the approximation errors that the remarks
/// state and the derived bounds start from.
/// </summary>
public class ApproximationTests
{
    private const int Steps = 4000;

    [Fact]
    public void ExpPolynomialWithinItsStatedError()
    {
        BigInteger[] coefficients = Coefficients("E", 2, 12);
        double largest = 0.0;
        for (int i = 0; i <= Steps; i++)
        {
            BigInteger r = (Oracle.Ln2 * (i - (Steps / 2))) / Steps;
            BigInteger value = Oracle.One + r + Multiply(Multiply(r, r), Evaluate(coefficients, r));
            BigFloat exact = Oracle.Exp(r);
            BigInteger want = Oracle.Shift(exact.Significand, exact.Exponent + Oracle.Bits);
            largest = Math.Max(largest, Ratio(value - want, want));
        }

        Assert.InRange(largest, 0.0, Math.Pow(2.0, -60.2));
    }

    [Fact]
    public void LnPolynomialWithinItsStatedError()
    {
        BigInteger[] coefficients = Coefficients("L", 1, 7);
        double largest = LargestOfSeries((z, rest) => Ratio(Multiply(z, Evaluate(coefficients, z)) - rest, 2 * Oracle.One));
        Assert.InRange(largest, 0.0, Math.Pow(2.0, -58.9));
    }

    [Fact]
    public void PowPolynomialWithinItsStatedError()
    {
        BigInteger[] coefficients = Coefficients("P", 0, 6);
        BigInteger third = Constant("Third") + Constant("ThirdRest");
        double largest = LargestOfSeries((z, rest) => Ratio((2 * Multiply(z, third + Multiply(z, Evaluate(coefficients, z)))) - rest, 2 * Oracle.One));
        Assert.InRange(largest, 0.0, Math.Pow(2.0, -65.9));
    }

    [Fact]
    public void StartOfTheRootWithinItsStatedError()
    {
        BigInteger[] coefficients = Coefficients("G", 0, 4);
        double largest = 0.0;
        for (int i = 0; i <= Steps; i++)
        {
            BigInteger m = Oracle.One + (3 * Oracle.One * i / Steps);
            BigInteger root = Oracle.SqrtFloor(m << Oracle.Bits);
            largest = Math.Max(largest, Ratio(Multiply(Evaluate(coefficients, m), root) - Oracle.One, Oracle.One));
        }

        Assert.InRange(largest, 0.0, 0.00212);
    }

    [Fact]
    public void PartsOfLn2AddUp()
    {
        BigInteger high = Constant("Ln2High");
        Assert.True(BigInteger.Abs(high + Constant("Ln2Low") - Oracle.Ln2) < Oracle.One >> 98);
        Assert.True((high & ((Oracle.One >> 42) - 1)).IsZero, "the high part has more than 42 bits");
        Assert.True(BigInteger.Abs(Constant("Third") + Constant("ThirdRest") - (Oracle.One / 3)) < Oracle.One >> 107);
    }

    // Over 0 < z <= zMax: ln((1 + s)/(1 − s)) = 2s + s·rest, with its series to 2^-250.
    private static double LargestOfSeries(Func<BigInteger, BigInteger, double> error)
    {
        BigInteger root = Oracle.SqrtFloor(2 * Oracle.One << Oracle.Bits);
        BigInteger sMax = ((root - Oracle.One) << Oracle.Bits) / (root + Oracle.One);
        BigInteger zMax = Multiply(sMax, sMax);
        double largest = 0.0;
        for (int i = 1; i <= Steps; i++)
        {
            BigInteger z = zMax * i / Steps;
            BigInteger power = 2 * z;
            BigInteger rest = BigInteger.Zero;
            for (int n = 3; power.Sign > 0; n += 2)
            {
                rest += power / n;
                power = Multiply(power, z);
            }

            largest = Math.Max(largest, error(z, rest));
        }

        return largest;
    }

    private static BigInteger Evaluate(BigInteger[] coefficients, BigInteger x)
    {
        BigInteger sum = BigInteger.Zero;
        for (int i = coefficients.Length - 1; i >= 0; i--)
        {
            sum = Multiply(sum, x) + coefficients[i];
        }

        return sum;
    }

    private static BigInteger Multiply(BigInteger a, BigInteger b)
    {
        return (a * b) >> Oracle.Bits;
    }

    private static double Ratio(BigInteger difference, BigInteger whole)
    {
        return Math.Abs((double)difference / (double)whole);
    }

    private static BigInteger[] Coefficients(string name, int first, int last)
    {
        BigInteger[] all = new BigInteger[last - first + 1];
        for (int i = first; i <= last; i++)
        {
            all[i - first] = Constant(name + i.ToString(CultureInfo.InvariantCulture));
        }

        return all;
    }

    private static BigInteger Constant(string name)
    {
        FieldInfo? field = typeof(global::ProbeCal.Numerics).GetField(name, BindingFlags.NonPublic | BindingFlags.Static);
        Assert.NotNull(field);
        return Oracle.ToFixed((double)field.GetRawConstantValue()!);
    }
}
