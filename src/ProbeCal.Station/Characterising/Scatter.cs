using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Uncertainty;

namespace ProbeCal.Station.Characterising;

/// <summary>Mean of a run of readings and how sure it is, neighbours that go together counted as fewer.</summary>
/// <param name="Mean">Mean.</param>
/// <param name="StandardUncertainty">Standard uncertainty of the mean.</param>
/// <param name="StandardDeviation">Standard deviation of one reading.</param>
/// <param name="DegreesOfFreedom">Degrees of freedom of the uncertainty.</param>
internal sealed record Scatter(double Mean, double StandardUncertainty, double StandardDeviation, int DegreesOfFreedom)
{
    /// <summary>Fewer readings than this show no correlation between neighbours.</summary>
    private const int FewForCorrelation = 20;

    internal double CoverageFactor => Quantiles.StudentHalfWidth(0.95, DegreesOfFreedom);

    internal static Scatter Of(IReadOnlyList<double> values)
    {
        double mean = values.Average();
        double deviation = Math.Sqrt(values.Sum(value => (value - mean) * (value - mean)) / (values.Count - 1));
        double enlarged = Enlargement([.. values.Select(value => value - mean)], out _);
        double effective = values.Count / enlarged;
        return new Scatter(mean, deviation / Math.Sqrt(effective), deviation, Math.Max(1, (int)(effective - 1)));
    }

    /// <summary>
    /// (1 + r)/(1 − r) for the lag-1 correlation r of the residuals, by which the variance of a mean or a parameter grows when neighbours go together; 1 where r is not above twice its own
    /// standard error.
    /// </summary>
    internal static double Enlargement(IReadOnlyList<double> residuals, out double correlation)
    {
        correlation = 0;
        if (residuals.Count < FewForCorrelation)
        {
            return 1;
        }

        double squares = residuals.Sum(static value => value * value);
        double products = 0;
        for (int i = 1; i < residuals.Count; i++)
        {
            products += residuals[i] * residuals[i - 1];
        }

        correlation = squares == 0 ? 0 : Math.Min(0.99, products / squares);
        return 2 / Math.Sqrt(residuals.Count) < correlation ? (1 + correlation) / (1 - correlation) : 1;
    }
}
