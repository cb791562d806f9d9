namespace ProbeCal;

public static partial class Numerics
{
    /// <summary>x to the power y, x positive.</summary>
    public static double Pow(double x, double y)
    {
        return Exp(y * Ln(x));
    }
}
