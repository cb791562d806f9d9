namespace ProbeCal;

/// <summary>Fits to points whose x is uncertain too. Desktop only: it works on arrays.</summary>
public static class ErrorsInBoth
{
    private const int MostIterations = 200;
    private const double Settled = 1e-14;

    /// <summary>
    /// The straight line by the unified equations of D. York, N. M. Evensen, M. López Martínez and J. De Basabe Delgado, Am. J. Phys. 72 (2004)
    /// 367–375 (doi:10.1119/1.1632486): each point with its own uncertainties and the correlation of its two errors. Written with variances
    /// in place of their inverses, so that an x or a y without error is allowed.
    /// </summary>
    /// <param name="x">The abscissae.</param>
    /// <param name="xUncertainty">Standard uncertainty of each x, from 0.</param>
    /// <param name="y">The ordinates.</param>
    /// <param name="yUncertainty">Standard uncertainty of each y, from 0; not 0 where that of x is.</param>
    /// <param name="correlation">Correlation of the errors of x and y at each point, between −1 and 1; null for none.</param>
    /// <param name="fit">The line: the covariance is that of the adjusted points; a residual is y less the line at the observed x. Null unless Ok.</param>
    /// <returns>
    /// <see cref="Status.PointsDegenerate"/> for a single x, a vertical line or one that does not settle; otherwise the input at fault.
    /// </returns>
    public static Status Line(double[] x, double[] xUncertainty, double[] y, double[] yUncertainty, double[]? correlation, out PolynomialFit? fit)
    {
        fit = null;
        Status status = FitCheck.Both(x, xUncertainty, y, yUncertainty, correlation, 2);
        if (status != Status.Ok) { return status; }
        if (!FitCheck.HasDifferent(x, 2)) { return Status.PointsDegenerate; }
        status = LeastSquares.Polynomial(x, y, null, 1, out PolynomialFit? start);
        if (status != Status.Ok) { return status; }

        int count = x.Length;
        double[] weights = new double[count];
        double[] beta = new double[count];
        double slope = start!.Result.Parameter(1);
        double xMean = 0.0;
        double yMean = 0.0;
        int iteration = 0;
        for (bool settled = false; !settled; iteration++)
        {
            if (iteration == MostIterations) { return Status.PointsDegenerate; }
            double sum = 0.0;
            xMean = 0.0;
            yMean = 0.0;
            for (int i = 0; i < count; i++)
            {
                weights[i] = 1.0 / Variance(i, slope, xUncertainty, yUncertainty, correlation);
                sum += weights[i];
                xMean += weights[i] * x[i];
                yMean += weights[i] * y[i];
            }

            xMean /= sum;
            yMean /= sum;
            double above = 0.0;
            double below = 0.0;
            for (int i = 0; i < count; i++)
            {
                double u = x[i] - xMean;
                double v = y[i] - yMean;
                double common = Common(i, xUncertainty, yUncertainty, correlation);
                beta[i] = weights[i] * ((u * yUncertainty[i] * yUncertainty[i]) + (slope * v * xUncertainty[i] * xUncertainty[i]) - (((slope * u) + v) * common));
                above += weights[i] * beta[i] * v;
                below += weights[i] * beta[i] * u;
            }

            if (below == 0.0) { return Status.PointsDegenerate; }
            double next = above / below;
            if (InputCheck.NotFinite(next)) { return Status.PointsDegenerate; }
            settled = FitCheck.Size(next - slope) <= Settled * FitCheck.Size(next) || (next == 0.0 && slope == 0.0);
            // Rounding may keep the last bits going for ever; after fifty steps a few of them are as good.
            settled = settled || (50 <= iteration && FitCheck.Size(next - slope) <= 1e-11 * FitCheck.Size(next));
            slope = next;
        }

        return Adjusted(x, xUncertainty, y, yUncertainty, correlation, slope, yMean - (slope * xMean), weights, beta, xMean, iteration, out fit);
    }

    /// <summary>
    /// A polynomial to points uncertain in both, by steps of weighted least squares with effective variances at the adjusted points (H. I. Britt and
    /// R. H. Luecke, Technometrics 15 (1973) 233–247): where it settles, the sum of the squared distances of the points, in units of their
    /// uncertainties, is least.
    /// </summary>
    /// <param name="x">The abscissae.</param>
    /// <param name="xUncertainty">Standard uncertainty of each x, from 0.</param>
    /// <param name="y">The ordinates.</param>
    /// <param name="yUncertainty">Standard uncertainty of each y, from 0; not 0 where that of x is.</param>
    /// <param name="correlation">Correlation of the errors of x and y at each point, between −1 and 1; null for none.</param>
    /// <param name="degree">Degree, from 1; 2 for a quadratic.</param>
    /// <param name="fit">The fit; a residual is y less the polynomial at the observed x. Null unless Ok.</param>
    /// <returns>
    /// <see cref="Status.PointsDegenerate"/> for fewer different x than parameters or a fit that does not settle; otherwise the input at fault.
    /// </returns>
    public static Status Polynomial(
        double[] x, double[] xUncertainty, double[] y, double[] yUncertainty, double[]? correlation, int degree, out PolynomialFit? fit)
    {
        fit = null;
        if (degree < 1) { return Status.PointsBelowRange; }
        Status status = FitCheck.Both(x, xUncertainty, y, yUncertainty, correlation, degree + 1);
        if (status != Status.Ok) { return status; }
        status = LeastSquares.Polynomial(x, y, null, degree, out PolynomialFit? before);
        if (status != Status.Ok) { return status; }
        status = CentredAxis.Of(x, out CentredAxis axis);
        if (status != Status.Ok) { return status; }

        int count = x.Length;
        double[] adjusted = new double[count];
        double[] observed = new double[count];
        double[] uncertainty = new double[count];
        System.Array.Copy(x, adjusted, count);
        for (int iteration = 1; iteration <= MostIterations; iteration++)
        {
            for (int i = 0; i < count; i++)
            {
                double slope = before!.SlopeAt(adjusted[i]);
                observed[i] = y[i] - (slope * (x[i] - adjusted[i]));
                uncertainty[i] = Numerics.Sqrt(Variance(i, slope, xUncertainty, yUncertainty, correlation));
            }

            status = FitCheck.Observed(observed, uncertainty, degree + 1);
            if (status != Status.Ok) { return Status.PointsDegenerate; }
            status = LeastSquares.Solve(axis.Powers(adjusted, degree), degree + 1, observed, uncertainty, iteration, out FitResult? centred);
            if (status == Status.Ok) { status = PolynomialFit.Of(axis, centred!, out fit); }
            if (status != Status.Ok) { return status; }

            double moved = 0.0;
            for (int i = 0; i < count; i++)
            {
                double slope = before!.SlopeAt(adjusted[i]);
                double common = Common(i, xUncertainty, yUncertainty, correlation);
                double rest = centred!.Residual(i);
                double share = (common - (slope * xUncertainty[i] * xUncertainty[i])) / (uncertainty[i] * uncertainty[i]);
                double to = x[i] - (share * rest);
                double change = FitCheck.Size((fit!.Value(to) - before.Value(to)) / uncertainty[i]);
                double along = FitCheck.Size(slope * (to - adjusted[i]) / uncertainty[i]);
                if (moved < change) { moved = change; }
                if (moved < along) { moved = along; }
                adjusted[i] = to;
            }

            if (InputCheck.NotFinite(moved)) { return Status.PointsDegenerate; }
            before = fit;
            // In units of a point's uncertainty: far below anything that could be told.
            if (moved < 1e-10) { return Observed(x, y, uncertainty, axis, centred!, out fit); }
        }

        fit = null;
        return Status.PointsDegenerate;
    }

    private static double Common(int i, double[] xUncertainty, double[] yUncertainty, double[]? correlation)
    {
        return correlation == null ? 0.0 : correlation[i] * xUncertainty[i] * yUncertainty[i];
    }

    /// <summary>Variance of y − slope·x, above 0 as long as not both are exact and the correlation is not ±1.</summary>
    private static double Variance(int i, double slope, double[] xUncertainty, double[] yUncertainty, double[]? correlation)
    {
        double along = slope * xUncertainty[i];
        double across = yUncertainty[i];
        double r = correlation == null ? 0.0 : correlation[i];
        // A flat line through points without error in y lies where they lie: its weight is limited so that the next step can leave it.
        double variance = (along * along) + (across * across) - (2.0 * r * along * across);
        return variance < 1e-300 ? 1e-300 : variance;
    }

    /// <summary>Residuals at the observed x with the effective variance of each, the parameters and covariance of the adjusted points.</summary>
    private static Status Observed(double[] x, double[] y, double[] uncertainty, CentredAxis axis, FitResult centred, out PolynomialFit? fit)
    {
        int count = x.Length;
        int unknowns = centred.ParameterCount;
        double[] parameters = new double[unknowns];
        double[] covariance = new double[unknowns * unknowns];
        for (int i = 0; i < unknowns; i++)
        {
            parameters[i] = centred.Parameter(i);
            for (int j = 0; j < unknowns; j++) { covariance[(i * unknowns) + j] = centred.Covariance(i, j); }
        }

        double[] residuals = new double[count];
        double[] standardised = new double[count];
        for (int i = 0; i < count; i++)
        {
            double z = axis.At(x[i]);
            double sum = 0.0;
            for (int k = unknowns - 1; 0 <= k; k--) { sum = (sum * z) + parameters[k]; }
            residuals[i] = y[i] - sum;
            standardised[i] = centred.StandardisedResidual(i);
        }

        return PolynomialFit.Of(axis, new FitResult(parameters, covariance, residuals, standardised, centred.ChiSquared, true, centred.Iterations), out fit);
    }

    /// <summary>The line as a polynomial on the centred axis, with York's variances from the adjusted points.</summary>
    private static Status Adjusted(
        double[] x, double[] xUncertainty, double[] y, double[] yUncertainty, double[]? correlation,
        double slope, double zero, double[] weights, double[] beta, double xMean, int iterations, out PolynomialFit? fit)
    {
        fit = null;
        int count = x.Length;
        double sum = 0.0;
        double mean = 0.0;
        for (int i = 0; i < count; i++)
        {
            sum += weights[i];
            mean += weights[i] * (xMean + beta[i]);
        }

        mean /= sum;
        double spread = 0.0;
        double chiSquared = 0.0;
        double[] residuals = new double[count];
        for (int i = 0; i < count; i++)
        {
            double u = xMean + beta[i] - mean;
            spread += weights[i] * u * u;
            residuals[i] = y[i] - (slope * x[i]) - zero;
            chiSquared += weights[i] * residuals[i] * residuals[i];
        }

        if (!(0.0 < spread) || InputCheck.NotFinite(chiSquared)) { return Status.PointsDegenerate; }
        double[] standardised = new double[count];
        for (int i = 0; i < count; i++)
        {
            double u = xMean + beta[i] - mean;
            double free = 1.0 - (weights[i] / sum) - (weights[i] * u * u / spread);
            standardised[i] = 2 < count && 1e-10 < free ? residuals[i] * Numerics.Sqrt(weights[i] / free) : double.NaN;
        }

        Status status = CentredAxis.Of(x, out CentredAxis axis);
        if (status != Status.Ok) { return status; }
        // At the centre c the line stands at zero + slope·c; with x̄ the weighted mean of the adjusted points its variance is 1/ΣW + (c − x̄)²·var(slope).
        double slopeVariance = 1.0 / spread;
        double off = axis.Centre - mean;
        double h = axis.Half;
        FitResult centred = new(
            [zero + (slope * axis.Centre), slope * h],
            [(1.0 / sum) + (off * off * slopeVariance), off * h * slopeVariance, off * h * slopeVariance, h * h * slopeVariance],
            residuals, standardised, chiSquared, true, iterations);
        return PolynomialFit.Of(axis, centred, out fit);
    }
}
