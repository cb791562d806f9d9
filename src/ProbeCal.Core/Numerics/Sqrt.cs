namespace ProbeCal;

public static partial class Numerics
{
    /// <summary>Square root.</summary>
    public static double Sqrt(double x)
    {
        if (double.IsNaN(x) || x < 0.0) { return double.NaN; }
        if (x == 0.0 || double.IsPositiveInfinity(x)) { return x; }
        double y = Exp(0.5 * Ln(x));
        y = 0.5 * (y + (x / y));
        return 0.5 * (y + (x / y));
    }
}
