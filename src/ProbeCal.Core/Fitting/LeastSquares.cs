namespace ProbeCal;

/// <summary>
/// Fits of models that are linear in their parameters, by Householder reflections: nothing is squared on the way, so that half the digits
/// are not lost as in normal equations. Desktop only: it works on arrays.
/// </summary>
public static class LeastSquares
{
    /// <summary>Fits observed = design · parameters.</summary>
    /// <param name="design">One row for each observation, row by row; one column for each parameter.</param>
    /// <param name="parameters">Number of parameters, from 1.</param>
    /// <param name="observed">The observations.</param>
    /// <param name="standardUncertainty">Standard uncertainty of each observation, above 0; null to judge them by their scatter.</param>
    /// <param name="fit">The fit; null unless Ok.</param>
    /// <returns>
    /// <see cref="Status.PointsBelowRange"/> for fewer observations than parameters; <see cref="Status.PointsDegenerate"/> when a parameter
    /// cannot be told from the others; <see cref="Status.PointsAboveRange"/> when the arrays do not belong together; otherwise the input at fault.
    /// </returns>
    public static Status Linear(double[] design, int parameters, double[] observed, double[]? standardUncertainty, out FitResult? fit)
    {
        fit = null;
        if (parameters < 1) { return Status.PointsBelowRange; }
        Status status = FitCheck.Observed(observed, standardUncertainty, parameters);
        if (status == Status.Ok) { status = FitCheck.Finite(design); }
        if (status != Status.Ok) { return status; }
        if (design.Length != observed.Length * parameters) { return Status.PointsAboveRange; }
        return Solve(design, parameters, observed, standardUncertainty, 1, out fit);
    }

    /// <summary>
    /// Fits a polynomial y = p0 + p1·x + p2·x² + …. It is fitted in x centred and scaled to ±1, where powers stay apart, and evaluated there.
    /// </summary>
    /// <param name="x">Where the points are, without error.</param>
    /// <param name="y">The observations.</param>
    /// <param name="yUncertainty">Standard uncertainty of each observation, above 0; null to judge them by their scatter.</param>
    /// <param name="degree">Degree, from 0; 1 for a straight line.</param>
    /// <param name="fit">The fit; null unless Ok.</param>
    /// <returns><see cref="Status.PointsDegenerate"/> for fewer different x than parameters; otherwise as <see cref="Linear"/>.</returns>
    public static Status Polynomial(double[] x, double[] y, double[]? yUncertainty, int degree, out PolynomialFit? fit)
    {
        fit = null;
        if (degree < 0) { return Status.PointsBelowRange; }
        Status status = FitCheck.Finite(x);
        if (status == Status.Ok) { status = FitCheck.Observed(y, yUncertainty, degree + 1); }
        if (status != Status.Ok) { return status; }
        if (x.Length != y.Length) { return Status.PointsAboveRange; }
        if (!FitCheck.HasDifferent(x, degree + 1)) { return Status.PointsDegenerate; }
        status = CentredAxis.Of(x, out CentredAxis axis);
        if (status != Status.Ok) { return status; }
        status = Solve(axis.Powers(x, degree), degree + 1, y, yUncertainty, 1, out FitResult? centred);
        return status == Status.Ok ? PolynomialFit.Of(axis, centred!, out fit) : status;
    }

    /// <summary>Solves a problem whose arrays have been judged.</summary>
    internal static Status Solve(double[] design, int parameters, double[] observed, double[]? standardUncertainty, int iterations, out FitResult? fit)
    {
        fit = null;
        int count = observed.Length;
        double[] rows = new double[design.Length];
        double[] right = new double[count];
        for (int i = 0; i < count; i++)
        {
            double u = standardUncertainty == null ? 1.0 : standardUncertainty[i];
            right[i] = observed[i] / u;
            for (int j = 0; j < parameters; j++) { rows[(i * parameters) + j] = design[(i * parameters) + j] / u; }
        }

        double[] work = new double[rows.Length];
        System.Array.Copy(rows, work, rows.Length);
        if (FitCheck.Finite(rows) != Status.Ok || FitCheck.Finite(right) != Status.Ok) { return Status.UncertaintyBelowRange; }
        if (!Householder.Solve(work, parameters, right, out double[] solution, out double[] root)) { return Status.PointsDegenerate; }
        double[] residuals = new double[count];
        for (int i = 0; i < count; i++)
        {
            double sum = observed[i];
            for (int j = 0; j < parameters; j++) { sum -= design[(i * parameters) + j] * solution[j]; }
            residuals[i] = sum;
        }

        FitResult result = FitResult.Of(solution, root, rows, residuals, standardUncertainty, iterations);
        if (InputCheck.NotFinite(result.ChiSquared)) { return Status.PointsAboveRange; }
        fit = result;
        return Status.Ok;
    }
}
