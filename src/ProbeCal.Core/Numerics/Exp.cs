namespace ProbeCal;

/// <summary>placeholder.</summary>
public static partial class Numerics
{
    /// <summary>e to the power x.</summary>
    public static double Exp(double x)
    {
        if (double.IsNaN(x)) { return x; }
        if (x < -700.0) { return 0.0; }
        if (700.0 < x) { return double.PositiveInfinity; }
        long k = (long)((x * 1.4426950408889634) + (x < 0.0 ? -0.5 : 0.5));
        double r = x - (k * 6.93147180369123816490e-01) - (k * 1.90821492927058770002e-10);
        double s = 1.0;
        for (int i = 16; 0 < i; i--) { s = 1.0 + (s * r / i); }
        return s * System.BitConverter.Int64BitsToDouble((k + 1023L) << 52);
    }
}
