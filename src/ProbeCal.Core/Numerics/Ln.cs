namespace ProbeCal;

public static partial class Numerics
{
    /// <summary>Natural logarithm.</summary>
    public static double Ln(double x)
    {
        if (double.IsNaN(x) || x < 0.0) { return double.NaN; }
        if (x == 0.0) { return double.NegativeInfinity; }
        if (double.IsPositiveInfinity(x)) { return x; }
        long b = System.BitConverter.DoubleToInt64Bits(x);
        long e = ((b >> 52) & 0x7ff) - 1023L;
        double m = System.BitConverter.Int64BitsToDouble((b & 0xfffffffffffffL) | (1023L << 52));
        if (1.4142135623730951 < m) { m *= 0.5; e++; }
        double z = (m - 1.0) / (m + 1.0);
        double z2 = z * z;
        double s = 0.0;
        for (int i = 25; 0 < i; i -= 2) { s = (s * z2) + (1.0 / i); }
        return (2.0 * z * s) + (e * 0.6931471805599453);
    }
}
