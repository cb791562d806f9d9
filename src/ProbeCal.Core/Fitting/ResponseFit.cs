namespace ProbeCal;

/// <summary>The curve of a probe whose points were taken at different temperatures or flows. Desktop only: it works on arrays.</summary>
public static class ResponseFit
{
    private const int MostIterations = 200;

    /// <summary>
    /// Fits response = zero + gain·(slope·x + curvature·x² + …) to points uncertain in both, as <see cref="ErrorsInBoth.Polynomial"/> does for one gain: where it settles,
    /// the sum of the squared distances of the points, in units of their uncertainties, is least.
    /// </summary>
    /// <param name="x">Partial pressure of each point, or what stands for it.</param>
    /// <param name="xUncertainty">Standard uncertainty of each x, from 0.</param>
    /// <param name="gain">Gain times flow factor of each point, above 0.</param>
    /// <param name="response">The responses.</param>
    /// <param name="responseUncertainty">Standard uncertainty of each response, from 0; not 0 where that of x is.</param>
    /// <param name="degree">1 for a line, 2 for a quadratic.</param>
    /// <param name="fit">Zero, slope, curvature; a residual is the response less the curve at the observed x. Null unless Ok.</param>
    /// <returns>
    /// <see cref="Status.PointsDegenerate"/> for fewer different x than parameters or a fit that does not settle; <see cref="Status.CoefficientBelowRange"/> for a gain of 0 or
    /// less; otherwise the input at fault.
    /// </returns>
    public static Status Fit(
        double[] x, double[] xUncertainty, double[] gain, double[] response, double[] responseUncertainty, int degree, out FitResult? fit)
    {
        fit = null;
        if (degree < 1) { return Status.PointsBelowRange; }
        Status status = FitCheck.Both(x, xUncertainty, response, responseUncertainty, null, degree + 1);
        if (status != Status.Ok) { return status; }
        int count = x.Length;
        if (gain.Length != count) { return Status.PointsAboveRange; }
        for (int i = 0; i < count; i++)
        {
            if (InputCheck.NotFinite(gain[i])) { return Status.CoefficientNotFinite; }
            if (gain[i] <= 0.0) { return Status.CoefficientBelowRange; }
        }

        if (!FitCheck.HasDifferent(x, degree + 1)) { return Status.PointsDegenerate; }
        double[] adjusted = new double[count];
        double[] observed = new double[count];
        double[] uncertainty = new double[count];
        System.Array.Copy(x, adjusted, count);
        status = LeastSquares.Solve(Design(x, gain, degree), degree + 1, response, null, 1, out FitResult? before);
        if (status != Status.Ok) { return status; }
        for (int iteration = 1; iteration <= MostIterations; iteration++)
        {
            for (int i = 0; i < count; i++)
            {
                double slope = Slope(before!, adjusted[i], gain[i]);
                observed[i] = response[i] - (slope * (x[i] - adjusted[i]));
                uncertainty[i] = Numerics.Sqrt((responseUncertainty[i] * responseUncertainty[i]) + (slope * slope * xUncertainty[i] * xUncertainty[i]));
            }

            if (FitCheck.Observed(observed, uncertainty, degree + 1) != Status.Ok) { return Status.PointsDegenerate; }
            status = LeastSquares.Solve(Design(adjusted, gain, degree), degree + 1, observed, uncertainty, iteration, out FitResult? now);
            if (status != Status.Ok) { return status; }
            double moved = 0.0;
            for (int i = 0; i < count; i++)
            {
                double slope = Slope(before!, adjusted[i], gain[i]);
                double to = x[i] + (slope * xUncertainty[i] * xUncertainty[i] / (uncertainty[i] * uncertainty[i]) * now!.Residual(i));
                double change = FitCheck.Size((Value(now, to, gain[i]) - Value(before!, to, gain[i])) / uncertainty[i]);
                double along = FitCheck.Size(slope * (to - adjusted[i]) / uncertainty[i]);
                if (moved < change) { moved = change; }
                if (moved < along) { moved = along; }
                adjusted[i] = to;
            }

            if (InputCheck.NotFinite(moved)) { return Status.PointsDegenerate; }
            before = now;
            if (moved < 1e-10)
            {
                fit = Observed(now!, x, gain, response);
                return Status.Ok;
            }
        }

        return Status.PointsDegenerate;
    }

    private static double[] Design(double[] x, double[] gain, int degree)
    {
        double[] rows = new double[x.Length * (degree + 1)];
        for (int i = 0; i < x.Length; i++)
        {
            rows[i * (degree + 1)] = 1.0;
            double power = gain[i];
            for (int k = 1; k <= degree; k++)
            {
                power *= x[i];
                rows[(i * (degree + 1)) + k] = power;
            }
        }

        return rows;
    }

    private static double Value(FitResult fit, double x, double gain)
    {
        double sum = 0.0;
        for (int k = fit.ParameterCount - 1; 1 <= k; k--) { sum = (sum + fit.Parameter(k)) * x; }
        return fit.Parameter(0) + (gain * sum);
    }

    private static double Slope(FitResult fit, double x, double gain)
    {
        double sum = 0.0;
        for (int k = fit.ParameterCount - 1; 1 <= k; k--) { sum = (sum * x) + (k * fit.Parameter(k)); }
        return gain * sum;
    }

    private static FitResult Observed(FitResult fit, double[] x, double[] gain, double[] response)
    {
        int unknowns = fit.ParameterCount;
        double[] parameters = new double[unknowns];
        double[] covariance = new double[unknowns * unknowns];
        for (int i = 0; i < unknowns; i++)
        {
            parameters[i] = fit.Parameter(i);
            for (int j = 0; j < unknowns; j++) { covariance[(i * unknowns) + j] = fit.Covariance(i, j); }
        }

        double[] residuals = new double[x.Length];
        double[] standardised = new double[x.Length];
        for (int i = 0; i < x.Length; i++)
        {
            residuals[i] = response[i] - Value(fit, x[i], gain[i]);
            standardised[i] = fit.StandardisedResidual(i);
        }

        return new FitResult(parameters, covariance, residuals, standardised, fit.ChiSquared, true, fit.Iterations);
    }
}
