namespace ProbeCal;

/// <summary>A model that is not linear in its parameters.</summary>
/// <param name="parameters">The parameters.</param>
/// <param name="values">Filled with the model's value at each point.</param>
/// <param name="jacobian">Filled with d value/d parameter, one row for each point, row by row.</param>
/// <returns>False where the model has no value for these parameters; the step that led there is then shortened.</returns>
public delegate bool FitModel(double[] parameters, double[] values, double[] jacobian);

/// <summary>
/// Least squares for models that are not linear in their parameters: K. Levenberg, Q. Appl. Math. 2 (1944) 164–168, and D. W. Marquardt,
/// J. Soc. Ind. Appl. Math. 11 (1963) 431–441, each step solved by Householder reflections. Desktop only: it works on arrays.
/// </summary>
public static class LevenbergMarquardt
{
    private const int MostSteps = 2000;
    private const int MostPolishing = 60;
    /// <summary>A step that moves every parameter by less than this of itself ends the search.</summary>
    private const double Settled = 1e-13;
    /// <summary>Share of the squared residuals that a step may still remove where the search ends and the polishing begins.</summary>
    private const double Offset = 1e-9;
    /// <summary>A last step larger than this is no end: the search has not settled.</summary>
    private const double GoodEnough = 1e-6;
    private const double LargestDamping = 1e18;

    /// <summary>Fits from a starting point. The analytic derivatives make the result good to the rounding of the model.</summary>
    /// <param name="model">The model.</param>
    /// <param name="observed">The observations.</param>
    /// <param name="standardUncertainty">Standard uncertainty of each, above 0; null to judge them by their scatter.</param>
    /// <param name="start">Where the search begins.</param>
    /// <param name="fit">The fit; null unless Ok.</param>
    /// <returns>
    /// <see cref="Status.CoefficientNotFinite"/> when the start, or the model there, is no number; <see cref="Status.PointsDegenerate"/> when a parameter cannot
    /// be told from the others or the search does not settle; <see cref="Status.PointsBelowRange"/> for fewer points than parameters; otherwise the input at fault.
    /// </returns>
    public static Status Fit(FitModel model, double[] observed, double[]? standardUncertainty, double[] start, out FitResult? fit)
    {
        fit = null;
        int unknowns = start.Length;
        if (unknowns == 0) { return Status.PointsBelowRange; }
        Status status = FitCheck.Observed(observed, standardUncertainty, unknowns);
        if (status != Status.Ok) { return status; }
        Trial now = new(observed.Length, unknowns);
        Trial next = new(observed.Length, unknowns);
        System.Array.Copy(start, now.Parameters, unknowns);
        if (FitCheck.Finite(start) != Status.Ok || !now.Evaluate(model, observed, standardUncertainty)) { return Status.CoefficientNotFinite; }

        double[] scale = new double[unknowns];
        double damping = 1e-3;
        double growth = 2.0;
        for (int step = 1; step <= MostSteps; step++)
        {
            if (IsNear(now, scale)) { return Polish(model, now, next, observed, standardUncertainty, scale, step, out fit); }
            if (!Step(now, scale, damping, out double[] change)) { return Status.PointsDegenerate; }
            for (int j = 0; j < unknowns; j++) { next.Parameters[j] = now.Parameters[j] + change[j]; }
            if (next.Evaluate(model, observed, standardUncertainty) && next.Sum <= now.Sum)
            {
                (now, next) = (next, now);
                damping = damping < 1e-15 ? damping : damping / 9.0;
                growth = 2.0;
                continue;
            }

            damping *= growth;
            growth *= 2.0;
            if (LargestDamping < damping) { return Status.PointsDegenerate; }
        }

        return Status.PointsDegenerate;
    }

    /// <summary>
    /// True where next to nothing of the residuals can be removed by moving the parameters (the relative offset of D. M. Bates and D. G. Watts,
    /// Technometrics 23 (1981) 179–183), or the parameters would not move.
    /// </summary>
    private static bool IsNear(Trial now, double[] scale)
    {
        if (!Step(now, scale, 0.0, out double[] change)) { return false; }
        int unknowns = change.Length;
        double removable = 0.0;
        for (int i = 0; i < now.Rest.Length; i++)
        {
            double sum = 0.0;
            for (int j = 0; j < unknowns; j++) { sum += now.Rows[(i * unknowns) + j] * change[j]; }
            removable += sum * sum;
        }

        return removable <= Offset * now.Sum || Moved(now, change) <= Settled;
    }

    /// <summary>
    /// Newton's own steps for as long as they shrink. The sum of squares is flat here and cannot judge them: half the digits would be lost.
    /// </summary>
    private static Status Polish(
        FitModel model, Trial now, Trial next, double[] observed, double[]? standardUncertainty, double[] scale, int steps, out FitResult? fit)
    {
        double last = double.PositiveInfinity;
        for (int more = 0; more < MostPolishing; more++)
        {
            if (!Step(now, scale, 0.0, out double[] change)) { break; }
            double moved = Moved(now, change);
            if (!(moved < last)) { break; }
            last = moved;
            for (int j = 0; j < change.Length; j++) { next.Parameters[j] = now.Parameters[j] + change[j]; }
            if (!next.Evaluate(model, observed, standardUncertainty)) { break; }
            (now, next) = (next, now);
            steps++;
        }

        fit = null;
        return last <= GoodEnough ? Finish(now, observed, standardUncertainty, steps, out fit) : Status.PointsDegenerate;
    }

    /// <summary>The largest change of a parameter, in units of the parameter.</summary>
    private static double Moved(Trial now, double[] change)
    {
        double largest = 0.0;
        for (int j = 0; j < change.Length; j++)
        {
            double size = FitCheck.Size(change[j]) / (FitCheck.Size(now.Parameters[j]) + 1e-290);
            if (largest < size) { largest = size; }
        }

        return largest;
    }

    /// <summary>The damped step: the Jacobian with a row for each parameter below it that holds the parameter back.</summary>
    private static bool Step(Trial now, double[] scale, double damping, out double[] change)
    {
        int unknowns = scale.Length;
        int count = now.Rest.Length;
        double[] matrix = new double[(count + unknowns) * unknowns];
        double[] right = new double[count + unknowns];
        System.Array.Copy(now.Rows, matrix, now.Rows.Length);
        System.Array.Copy(now.Rest, right, count);
        double root = Numerics.Sqrt(damping);
        for (int j = 0; j < unknowns; j++)
        {
            double squares = 0.0;
            for (int i = 0; i < count; i++) { squares += now.Rows[(i * unknowns) + j] * now.Rows[(i * unknowns) + j]; }
            double length = Numerics.Sqrt(squares);
            if (scale[j] < length) { scale[j] = length; }
            matrix[((count + j) * unknowns) + j] = root * scale[j];
        }

        return Householder.Solve(matrix, unknowns, right, out change, out _);
    }

    private static Status Finish(Trial now, double[] observed, double[]? standardUncertainty, int steps, out FitResult? fit)
    {
        fit = null;
        double[] work = new double[now.Rows.Length];
        double[] right = new double[observed.Length];
        System.Array.Copy(now.Rows, work, work.Length);
        if (!Householder.Solve(work, now.Parameters.Length, right, out _, out double[] root)) { return Status.PointsDegenerate; }
        double[] residuals = new double[observed.Length];
        for (int i = 0; i < residuals.Length; i++) { residuals[i] = observed[i] - now.Values[i]; }
        fit = FitResult.Of(now.Parameters, root, now.Rows, residuals, standardUncertainty, steps);
        return Status.Ok;
    }

    /// <summary>One set of parameters and what the model makes of it.</summary>
    private sealed class Trial
    {
        internal Trial(int count, int unknowns)
        {
            Parameters = new double[unknowns];
            Values = new double[count];
            Rows = new double[count * unknowns];
            Rest = new double[count];
        }

        internal double[] Parameters { get; }

        internal double[] Values { get; }

        /// <summary>The Jacobian in units of the observations' uncertainties.</summary>
        internal double[] Rows { get; }

        /// <summary>The residuals in the same units.</summary>
        internal double[] Rest { get; }

        internal double Sum { get; private set; }

        internal bool Evaluate(FitModel model, double[] observed, double[]? standardUncertainty)
        {
            if (!model(Parameters, Values, Rows)) { return false; }
            Sum = 0.0;
            int unknowns = Parameters.Length;
            for (int i = 0; i < observed.Length; i++)
            {
                double u = standardUncertainty == null ? 1.0 : standardUncertainty[i];
                Rest[i] = (observed[i] - Values[i]) / u;
                Sum += Rest[i] * Rest[i];
                for (int j = 0; j < unknowns; j++)
                {
                    Rows[(i * unknowns) + j] /= u;
                    if (InputCheck.NotFinite(Rows[(i * unknowns) + j])) { return false; }
                }
            }

            return !InputCheck.NotFinite(Sum);
        }
    }
}
