namespace ProbeCal.Station.Uncertainty;

/// <summary>
/// How many standard uncertainties hold 95 % of a value, when one rectangular contribution of a given share of the variance meets a rest that is
/// normal. The sum of the two has a closed distribution, so that the factor is exact for that pair: 1.96 without a rectangular part, 0.95·√3 with nothing else.
/// </summary>
internal static class CoverageFactor
{
    /// <summary>Half-width that holds 95 % of a normal distribution, in standard uncertainties.</summary>
    internal const double Normal = 1.959963984540054;

    private const double Level = 0.95;
    private const double SqrtOfThree = 1.7320508075688772;

    /// <summary>The factor for 95 %.</summary>
    /// <param name="rectangularShare">Share of the rectangular contribution in the variance, 0–1.</param>
    internal static double Of(double rectangularShare)
    {
        double halfWidth = SqrtOfThree * Numerics.Sqrt(rectangularShare);
        double deviation = Numerics.Sqrt(1.0 - rectangularShare);
        if (halfWidth == 0.0)
        {
            return Normal;
        }

        if (deviation == 0.0)
        {
            return Level * SqrtOfThree;
        }

        // The probability grows with the factor; sixty halvings leave nothing of the interval.
        double low = 0.0;
        double high = 2.0 * Normal;
        for (int i = 0; i < 60; i++)
        {
            double middle = 0.5 * (low + high);
            if (Within(middle, halfWidth, deviation) < Level)
            {
                low = middle;
            }
            else
            {
                high = middle;
            }
        }

        return 0.5 * (low + high);
    }

    /// <summary>
    /// Probability that the sum of a rectangular ±halfWidth and a normal of that deviation lies within ±k: the normal distribution function,
    /// averaged over the rectangle. Its integral is z·Φ(z) + φ(z).
    /// </summary>
    private static double Within(double k, double halfWidth, double deviation)
    {
        double below = deviation * (Integral((k + halfWidth) / deviation) - Integral((k - halfWidth) / deviation)) / (2.0 * halfWidth);
        return (2.0 * below) - 1.0;
    }

    private static double Integral(double z)
    {
        return (z * Below(z)) + Density(z);
    }

    /// <summary>Φ(z) by its series ½ + φ(z)·(z + z³/3 + z⁵/(3·5) + …): all terms of one sign, so nothing cancels. Beyond ±9 nothing is left.</summary>
    private static double Below(double z)
    {
        if (z < -9.0)
        {
            return 0.0;
        }

        if (9.0 < z)
        {
            return 1.0;
        }

        double sum = 0.0;
        double term = z;
        for (int n = 1; sum + term != sum; n++)
        {
            sum += term;
            term *= z * z / ((2 * n) + 1);
        }

        return 0.5 + (Density(z) * sum);
    }

    private static double Density(double z)
    {
        return 0.3989422804014327 * Numerics.Exp(-0.5 * z * z);
    }
}
