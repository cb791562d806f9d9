using System.Numerics;
using Xunit;

namespace ProbeCal.Core.Tests;

/// <summary>
/// The oracle against digits that others published. The constants are those of the On-Line Encyclopedia of Integer Sequences:
/// e A001113, ln 2 A002162, ln 10 A002392, √2 A002193. They were typed from memory and agree with mpmath 1.3.0.
/// </summary>
public class OracleTests
{
    private const string E = "2.718281828459045235360287471352662497757247093699959574966967";
    private const string LnTwo = "0.693147180559945309417232121458176568075500134360255254120680";
    private const string LnTen = "2.302585092994045684017991454684364207601101488628772976033327";
    private const string RootOfTwo = "1.414213562373095048801688724209698078569671875376948073176679";
    private const int Decimals = 60;

    [Fact]
    public void ExpOfOneIsE()
    {
        Assert.Equal(E, Oracle.Digits(Oracle.Exp(Oracle.One), Decimals));
    }

    [Fact]
    public void LogarithmsOfTwoAndTen()
    {
        Assert.Equal(LnTwo, Oracle.Digits(new BigFloat(Oracle.Ln2, -Oracle.Bits), Decimals));
        Assert.Equal(LnTwo, Oracle.Digits(new BigFloat(Oracle.Ln(2.0), -Oracle.Bits), Decimals));
        Assert.Equal(LnTen, Oracle.Digits(new BigFloat(Oracle.Ln(10.0), -Oracle.Bits), Decimals));
    }

    [Fact]
    public void RootOfTwoByNewtonAndByPower()
    {
        BigInteger root = Oracle.SqrtFloor(BigInteger.One << ((2 * Oracle.Bits) + 1));
        Assert.Equal(RootOfTwo, Oracle.Digits(new BigFloat(root, -Oracle.Bits), Decimals));
        Assert.Equal(RootOfTwo, Oracle.Digits(Oracle.Pow(2.0, 0.5), Decimals));
    }

    /// <summary>What is exact by definition comes out to more than 200 bits, far from the table's own points too.</summary>
    [Theory]
    [InlineData(3.0, 4.0, 81.0)]
    [InlineData(0.5, 1000.0, 9.3326361850321888e-302)]
    [InlineData(1.5, 2.0, 2.25)]
    [InlineData(9.3326361850321888e-302, -0.5, 3.2733906078961419e150)]
    public void PowersThatAreKnown(double x, double y, double result)
    {
        BigFloat power = Oracle.Pow(x, y);
        Oracle.Take(result, out long significand, out int exponent);
        BigInteger want = Oracle.Shift(significand, exponent - power.Exponent);
        Assert.True(BigInteger.Abs(want - power.Significand) < want >> 200);
    }

    /// <summary>Exp(Ln(x)) comes back to x within 2^-200 for x from the smallest to the largest double.</summary>
    [Theory]
    [InlineData(double.Epsilon)]
    [InlineData(1e-310)]
    [InlineData(0.70710678118654746)]
    [InlineData(0.99999999999999989)]
    [InlineData(1.0000000000000002)]
    [InlineData(2.2250738585072014e-308)]
    [InlineData(12345.678)]
    [InlineData(double.MaxValue)]
    public void ExpUndoesLn(double x)
    {
        BigFloat back = Oracle.Exp(Oracle.Ln(x));
        Oracle.Take(x, out long significand, out int exponent);
        BigInteger want = Oracle.Shift(significand, exponent - back.Exponent);
        Assert.True(BigInteger.Abs(want - back.Significand) < want >> 200);
    }

    /// <summary>The error measure itself: half and whole units, at a normal number, a subnormal and the largest.</summary>
    [Fact]
    public void ErrorIsCountedInUnitsOfTheLastPlace()
    {
        Assert.Equal(0.0, Oracle.ErrorInUlp(1.5, new BigFloat(3, -1)));
        Assert.Equal(1.0, Oracle.ErrorInUlp(1.0000000000000002, new BigFloat(1, 0)));
        Assert.Equal(-0.5, Oracle.ErrorInUlp(1.0, new BigFloat((BigInteger.One << 53) + 1, -53)));
        Assert.Equal(2.25, Oracle.ErrorInUlp(4 * double.Epsilon, new BigFloat(7, -1076)));
        Assert.Equal(1.0, Oracle.ErrorInUlp(double.PositiveInfinity, new BigFloat((BigInteger.One << 53) - 1, 971)));
    }

    /// <summary>The nearest root is told from its neighbours.</summary>
    [Theory]
    [InlineData(2.0, 1.4142135623730951)]
    [InlineData(double.Epsilon, 2.2227587494850775e-162)]
    [InlineData(4.0, 2.0)]
    public void OnlyTheNearestRootPasses(double x, double root)
    {
        Assert.True(Oracle.IsNearestRoot(root, x));
        Assert.False(Oracle.IsNearestRoot(System.Math.BitIncrement(root), x));
        Assert.False(Oracle.IsNearestRoot(System.Math.BitDecrement(root), x));
    }
}
