namespace ProbeCal;

/// <summary>
/// Cotangent of a phase angle between 0 and 90 degrees and its inverse, in plain double arithmetic, so that every machine gives the same bits.
/// </summary>
/// <remarks>
/// tan x = x/(1 − x²/(3 − x²/(5 − …))) (Lambert's continued fraction), cut off at 21; the first part left out is below 1e-17 of the value for
/// x ≤ π/4. Angles above 45° go by tan(90° − φ). The inverse is Newton's method on the tangent. Error below 4 units in the last place.
/// </remarks>
internal static class PhaseAngle
{
    private const double RadianPerDegree = 0.017453292519943295;
    private const double QuarterTurnHalf = 45.0;
    private const double QuarterTurn = 90.0;
    private const int NewtonPasses = 4;

    /// <summary>Radian per degree, for the derivative of an angle in degrees.</summary>
    internal static double Radian
    {
        get { return RadianPerDegree; }
    }

    /// <summary>cot φ for 0 &lt; φ &lt; 90 degrees; NaN elsewhere.</summary>
    internal static double Cotangent(double degrees)
    {
        if (!(0.0 < degrees && degrees < QuarterTurn)) { return double.NaN; }
        if (QuarterTurnHalf < degrees) { return Tangent((QuarterTurn - degrees) * RadianPerDegree); }
        double tangent = Tangent(degrees * RadianPerDegree);
        return tangent <= 0.0 ? double.NaN : InputCheck.FiniteOrNaN(1.0 / tangent);
    }

    /// <summary>The angle between 0 and 90 degrees of a positive cotangent; NaN for any other.</summary>
    internal static double FromCotangent(double cotangent)
    {
        if (!(0.0 < cotangent) || double.IsInfinity(cotangent)) { return double.NaN; }
        return cotangent < 1.0 ? QuarterTurn - ArcTangent(cotangent) : ArcTangent(1.0 / cotangent);
    }

    /// <summary>Angle in degrees of a tangent from 0 to 1.</summary>
    private static double ArcTangent(double tangent)
    {
        // Within 0.004 rad of the answer; each pass squares that.
        double x = tangent * (1.0584 - (0.273 * tangent));
        for (int pass = 0; pass < NewtonPasses; pass++)
        {
            double t = Tangent(x);
            x -= (t - tangent) / (1.0 + (t * t));
        }

        return x / RadianPerDegree;
    }

    /// <summary>tan x for 0 ≤ x ≤ 0.79: every denominator is above its own odd number less 1.</summary>
    private static double Tangent(double x)
    {
        double square = x * x;
        double denominator = 21.0;
        for (double odd = 19.0; 0.0 < odd; odd -= 2.0)
        {
            denominator = odd - (square / denominator);
        }

        return x / denominator;
    }
}
