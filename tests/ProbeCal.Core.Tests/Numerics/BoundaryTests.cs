using System;
using Xunit;

namespace ProbeCal.Core.Tests;

/// <summary>The ends of every range, bit for bit where the value is defined, and by the oracle elsewhere.</summary>
public class BoundaryTests
{
    private const double Largest = double.MaxValue;
    private const double SmallestNormal = 2.2250738585072014e-308;
    private const double LargestSubnormal = 2.2250738585072009e-308;

    [Theory]
    [InlineData(double.NaN, double.NaN)]
    [InlineData(double.PositiveInfinity, double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity, 0.0)]
    [InlineData(0.0, 1.0)]
    [InlineData(double.Epsilon, 1.0)]
    [InlineData(-double.Epsilon, 1.0)]
    [InlineData(LargestSubnormal, 1.0)]
    [InlineData(SmallestNormal, 1.0)]
    [InlineData(Largest, double.PositiveInfinity)]
    [InlineData(-Largest, 0.0)]
    [InlineData(709.78271289338409, double.PositiveInfinity)] // the double after the last one with a finite result
    [InlineData(710.0, double.PositiveInfinity)]
    [InlineData(710.00000000000011, double.PositiveInfinity)]
    [InlineData(-745.13321910194111, double.Epsilon)] // well above 2^-1075, half the smallest subnormal
    [InlineData(-745.13321910194134, 0.0)] // below it; the one double between the two is a row of the next theory
    [InlineData(-746.0, 0.0)]
    [InlineData(-746.00000000000011, 0.0)]
    public void ExpIsExact(double x, double expected)
    {
        SameBits(expected, Numerics.Exp(x));
    }

    [Theory]
    [InlineData(709.78271289338397)]
    [InlineData(709.78271289338386)]
    [InlineData(709.0)]
    [InlineData(709.00000000000011)]
    [InlineData(708.99999999999989)]
    [InlineData(-708.0)]
    [InlineData(-707.99999999999989)]
    [InlineData(-708.00000000000011)]
    [InlineData(-708.39641853226408)]
    [InlineData(-708.39641853226420)]
    [InlineData(-709.0)]
    [InlineData(-744.44007192138122)]
    [InlineData(-745.0)]
    [InlineData(-745.13321910194122)] // above 2^-1075 by less than the error of exp
    [InlineData(1.0)]
    [InlineData(-1.0)]
    [InlineData(0.34657359027997264)]
    [InlineData(0.34657359027997270)]
    [InlineData(-0.34657359027997264)]
    [InlineData(-0.34657359027997270)]
    [InlineData(0.69314718055994529)]
    [InlineData(1.1102230246251565e-16)]
    [InlineData(1.1102230246251568e-16)]
    [InlineData(-5.5511151231257827e-17)]
    [InlineData(-5.5511151231257839e-17)]
    public void ExpWithinOneUlpAtSeams(double x)
    {
        Assert.InRange(Oracle.ErrorInUlp(Numerics.Exp(x), Oracle.Exp(Oracle.ToFixed(x))), -1.0, 1.0);
    }

    [Theory]
    [InlineData(double.NaN, double.NaN)]
    [InlineData(double.PositiveInfinity, double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity, double.NaN)]
    [InlineData(0.0, double.NegativeInfinity)]
    [InlineData(-double.Epsilon, double.NaN)]
    [InlineData(-1.0, double.NaN)]
    [InlineData(-Largest, double.NaN)]
    [InlineData(1.0, 0.0)]
    public void LnIsExact(double x, double expected)
    {
        SameBits(expected, Numerics.Ln(x));
    }

    [Theory]
    [InlineData(double.Epsilon)]
    [InlineData(LargestSubnormal)]
    [InlineData(SmallestNormal)]
    [InlineData(Largest)]
    [InlineData(1.0000000000000002)]
    [InlineData(0.99999999999999989)]
    [InlineData(0.70710678118654746)]
    [InlineData(0.70710678118654757)]
    [InlineData(1.4142135623730949)]
    [InlineData(1.4142135623730951)]
    [InlineData(2.0)]
    [InlineData(0.5)]
    [InlineData(10.0)]
    public void LnWithinOneUlpAtSeams(double x)
    {
        Assert.InRange(Oracle.ErrorInUlp(Numerics.Ln(x), new BigFloat(Oracle.Ln(x), -Oracle.Bits)), -1.0, 1.0);
    }

    [Theory]
    [InlineData(double.NaN, double.NaN)]
    [InlineData(double.PositiveInfinity, double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity, double.NaN)]
    [InlineData(0.0, 0.0)]
    [InlineData(-double.Epsilon, double.NaN)]
    [InlineData(-1.0, double.NaN)]
    [InlineData(1.0, 1.0)]
    [InlineData(4.0, 2.0)]
    [InlineData(152.2756, 12.34)]
    [InlineData(1.0000000000000002, 1.0)]
    [InlineData(3.9999999999999996, 1.9999999999999998)]
    public void SqrtIsExact(double x, double expected)
    {
        SameBits(expected, Numerics.Sqrt(x));
    }

    [Theory]
    [InlineData(double.Epsilon)]
    [InlineData(2 * double.Epsilon)]
    [InlineData(3 * double.Epsilon)]
    [InlineData(LargestSubnormal)]
    [InlineData(SmallestNormal)]
    [InlineData(Largest)]
    [InlineData(0.99999999999999989)]
    [InlineData(0.24999999999999997)]
    [InlineData(1.9999999999999998)]
    [InlineData(2.0)]
    [InlineData(3.9999999999999991)]
    public void SqrtIsNearestAtSeams(double x)
    {
        Assert.True(Oracle.IsNearestRoot(Numerics.Sqrt(x), x));
    }

    /// <summary>The special cases of powr, IEEE 754-2019, 9.2.1.</summary>
    [Theory]
    [InlineData(double.NaN, 1.0, double.NaN)]
    [InlineData(double.NaN, 0.0, double.NaN)]
    [InlineData(1.0, double.NaN, double.NaN)]
    [InlineData(-2.0, 2.0, double.NaN)]
    [InlineData(-double.Epsilon, 1.0, double.NaN)]
    [InlineData(double.NegativeInfinity, 1.0, double.NaN)]
    [InlineData(0.0, 0.0, double.NaN)]
    [InlineData(double.PositiveInfinity, 0.0, double.NaN)]
    [InlineData(1.0, double.PositiveInfinity, double.NaN)]
    [InlineData(1.0, double.NegativeInfinity, double.NaN)]
    [InlineData(0.0, 2.0, 0.0)]
    [InlineData(0.0, double.PositiveInfinity, 0.0)]
    [InlineData(0.0, -2.0, double.PositiveInfinity)]
    [InlineData(0.0, double.NegativeInfinity, double.PositiveInfinity)]
    [InlineData(double.PositiveInfinity, 2.0, double.PositiveInfinity)]
    [InlineData(double.PositiveInfinity, -2.0, 0.0)]
    [InlineData(double.PositiveInfinity, double.PositiveInfinity, double.PositiveInfinity)]
    [InlineData(double.PositiveInfinity, double.NegativeInfinity, 0.0)]
    [InlineData(0.99999999999999989, double.PositiveInfinity, 0.0)]
    [InlineData(0.99999999999999989, double.NegativeInfinity, double.PositiveInfinity)]
    [InlineData(1.0000000000000002, double.PositiveInfinity, double.PositiveInfinity)]
    [InlineData(1.0000000000000002, double.NegativeInfinity, 0.0)]
    [InlineData(1.0, Largest, 1.0)]
    [InlineData(1.0, -Largest, 1.0)]
    [InlineData(2.0, 0.0, 1.0)]
    [InlineData(double.Epsilon, -0.0, 1.0)]
    [InlineData(Largest, Largest, double.PositiveInfinity)]
    [InlineData(Largest, -Largest, 0.0)]
    [InlineData(double.Epsilon, Largest, 0.0)]
    [InlineData(double.Epsilon, -Largest, double.PositiveInfinity)]
    [InlineData(1.0000000000000002, Largest, double.PositiveInfinity)]
    [InlineData(3.0, double.Epsilon, 1.0)]
    [InlineData(2.0, 1024.0, double.PositiveInfinity)]
    [InlineData(2.0, -1075.0000000000002, 0.0)]
    public void PowIsExact(double x, double y, double expected)
    {
        SameBits(expected, Numerics.Pow(x, y));
    }

    [Theory]
    [InlineData(2.0, 1023.9999999999999)]
    [InlineData(Largest, 1.0)]
    [InlineData(SmallestNormal, -1.0)]
    [InlineData(SmallestNormal, 1.0)]
    [InlineData(LargestSubnormal, 1.0)]
    [InlineData(double.Epsilon, 0.5)]
    [InlineData(2.0, -1074.0)]
    [InlineData(2.0, -1022.0)]
    [InlineData(1.0000000000000002, 3.1965771613006643E+18)]
    [InlineData(0.99999999999999989, 6.3931543226013279E+18)]
    [InlineData(0.99999999999999989, -6.3931543226013279E+18)]
    [InlineData(1.4142135623730951, 2.0)]
    [InlineData(10.0, 308.0)]
    public void PowWithinTwoUlpAtSeams(double x, double y)
    {
        Assert.InRange(Oracle.ErrorInUlp(Numerics.Pow(x, y), Oracle.Pow(x, y)), -2.0, 2.0);
    }

    /// <summary>Apart from the theories, where the test analyzer takes −0 and 0 for the same row.</summary>
    [Fact]
    public void NegativeZero()
    {
        SameBits(1.0, Numerics.Exp(-0.0));
        SameBits(double.NegativeInfinity, Numerics.Ln(-0.0));
        SameBits(-0.0, Numerics.Sqrt(-0.0));
        SameBits(double.NaN, Numerics.Pow(-0.0, -0.0));
        SameBits(0.0, Numerics.Pow(-0.0, 3.0));
        SameBits(double.PositiveInfinity, Numerics.Pow(-0.0, -3.0));
        SameBits(1.0, Numerics.Pow(5.0, -0.0));
    }

    [Fact]
    public void PowOfALargestDoubleIsNotLostToOverflow()
    {
        // The rounded y·ln x lies above the threshold of overflow, the exact one below it.
        Assert.True(double.IsFinite(Numerics.Pow(Largest, 1.0)));
    }

    private static void SameBits(double expected, double actual)
    {
        Assert.Equal(BitConverter.DoubleToInt64Bits(expected), BitConverter.DoubleToInt64Bits(actual));
    }
}
