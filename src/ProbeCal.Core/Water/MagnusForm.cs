namespace ProbeCal;

/// <summary>The form of Magnus that several vapour formulas share: a·exp[b·t/(c + t)], without a range.</summary>
internal static class MagnusForm
{
    /// <summary>The value in the unit of a; NaN where c + t is not positive.</summary>
    internal static double Value(double celsius, double a, double b, double c)
    {
        double divisor = c + celsius;
        return divisor <= 0.0 ? double.NaN : a * Numerics.Exp(b * celsius / divisor);
    }
}
