using MathNet.Numerics.Distributions;

namespace ProbeCal.Station.Uncertainty;

/// <summary>Quantiles and tail probabilities of the distributions that judge a fit, from MathNet.Numerics.</summary>
internal static class Quantiles
{
    /// <summary>Half-width that holds so much of Student's t, in standard uncertainties: the coverage factor for few degrees of freedom.</summary>
    /// <param name="level">What it holds, between 0 and 1: 0.95.</param>
    /// <param name="degreesOfFreedom">Degrees of freedom, above 0; infinity for the normal distribution.</param>
    internal static double StudentHalfWidth(double level, double degreesOfFreedom)
    {
        double below = 0.5 * (1.0 + level);
        // At a million degrees of freedom t and the normal distribution agree to six digits; the iteration of the inverse ends there.
        return degreesOfFreedom < 1e6 ? StudentT.InvCDF(0.0, 1.0, degreesOfFreedom, below) : Normal.InvCDF(0.0, 1.0, below);
    }

    /// <summary>Probability of a chi-squared so large or larger.</summary>
    /// <param name="chiSquared">The sum of squares, from 0.</param>
    /// <param name="degreesOfFreedom">Degrees of freedom, from 1.</param>
    internal static double ChiSquaredAbove(double chiSquared, int degreesOfFreedom)
    {
        return 1.0 - ChiSquared.CDF(degreesOfFreedom, chiSquared);
    }

    /// <summary>Probability of an F so large or larger.</summary>
    /// <param name="f">Ratio of mean squares, from 0.</param>
    /// <param name="above">Degrees of freedom of the numerator.</param>
    /// <param name="below">Degrees of freedom of the denominator.</param>
    internal static double FisherAbove(double f, int above, int below)
    {
        return 1.0 - FisherSnedecor.CDF(above, below, f);
    }
}
