namespace ProbeCal;

/// <summary>
/// Does the scatter about the line exceed that of repeated points? The comparison of ISO 11095:1996: the residual sum of squares is split into that within
/// repeats (pure error) and the rest (lack of fit), and the mean squares are compared by F. Desktop only.
/// </summary>
public static class LackOfFit
{
    /// <summary>Splits the residuals of a fit.</summary>
    /// <param name="fit">The fit.</param>
    /// <param name="level">For each point the number of its level: points of one level are repeats of each other.</param>
    /// <param name="standardUncertainty">Standard uncertainty of each observation as the fit took it; null for a fit without.</param>
    /// <param name="f">Mean square of lack of fit over that of pure error, dimensionless and relative to it; NaN unless Ok.</param>
    /// <param name="lackDegreesOfFreedom">Levels less parameters.</param>
    /// <param name="pureDegreesOfFreedom">Points less levels.</param>
    /// <returns>
    /// <see cref="Status.PointsBelowRange"/> where nothing is left to compare: no repeats, or no more levels than parameters;
    /// <see cref="Status.PointsDegenerate"/> when all repeats agree to the last digit.
    /// </returns>
    public static Status Test(
        FitResult fit, int[] level, double[]? standardUncertainty, out double f, out int lackDegreesOfFreedom, out int pureDegreesOfFreedom)
    {
        f = double.NaN;
        lackDegreesOfFreedom = 0;
        pureDegreesOfFreedom = 0;
        int count = fit.PointCount;
        if (level.Length != count || (standardUncertainty != null && standardUncertainty.Length != count)) { return Status.PointsAboveRange; }
        double pure = 0.0;
        double lack = 0.0;
        int levels = 0;
        for (int i = 0; i < count; i++)
        {
            bool first = true;
            for (int j = 0; j < i && first; j++) { first = level[j] != level[i]; }
            if (!first) { continue; }
            levels++;
            double weights = 0.0;
            double mean = 0.0;
            for (int j = i; j < count; j++)
            {
                if (level[j] != level[i]) { continue; }
                double weight = Weight(standardUncertainty, j);
                weights += weight;
                mean += weight * fit.Residual(j);
            }

            mean /= weights;
            for (int j = i; j < count; j++)
            {
                if (level[j] != level[i]) { continue; }
                double off = fit.Residual(j) - mean;
                pure += Weight(standardUncertainty, j) * off * off;
            }

            lack += weights * mean * mean;
        }

        lackDegreesOfFreedom = levels - fit.ParameterCount;
        pureDegreesOfFreedom = count - levels;
        if (lackDegreesOfFreedom < 1 || pureDegreesOfFreedom < 1) { return Status.PointsBelowRange; }
        if (pure == 0.0) { return Status.PointsDegenerate; }
        f = lack / lackDegreesOfFreedom / (pure / pureDegreesOfFreedom);
        return InputCheck.NotFinite(f) ? Status.PointsAboveRange : Status.Ok;
    }

    private static double Weight(double[]? standardUncertainty, int i)
    {
        return standardUncertainty == null ? 1.0 : 1.0 / (standardUncertainty[i] * standardUncertainty[i]);
    }
}
