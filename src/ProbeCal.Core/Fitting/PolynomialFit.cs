namespace ProbeCal;

/// <summary>A fitted polynomial. Its value is taken on the centred axis on which it was fitted, where nothing cancels. Immutable.</summary>
public sealed class PolynomialFit
{
    private readonly CentredAxis _axis;
    private readonly FitResult _centred;

    private PolynomialFit(CentredAxis axis, FitResult centred, FitResult result)
    {
        _axis = axis;
        _centred = centred;
        Result = result;
    }

    /// <summary>The coefficients of 1, x, x² …, with their covariance, residuals and all.</summary>
    public FitResult Result { get; }

    /// <summary>Degree: 1 for a straight line.</summary>
    public int Degree
    {
        get { return Result.ParameterCount - 1; }
    }

    /// <summary>The polynomial at x, in the unit of y.</summary>
    /// <param name="x">Where, in the unit of the points' x.</param>
    public double Value(double x)
    {
        double z = _axis.At(x);
        double sum = 0.0;
        for (int k = Degree; 0 <= k; k--) { sum = (sum * z) + _centred.Parameter(k); }
        return sum;
    }

    /// <summary>Its slope at x, in the unit of y per unit of x.</summary>
    /// <param name="x">Where, in the unit of the points' x.</param>
    public double SlopeAt(double x)
    {
        double z = _axis.At(x);
        double sum = 0.0;
        for (int k = Degree; 1 <= k; k--) { sum = (sum * z) + (k * _centred.Parameter(k)); }
        return sum / _axis.Half;
    }

    /// <summary>
    /// Variance of <see cref="Value"/>, from the covariance of the parameters. A prediction interval for a new observation adds the variance of
    /// that observation.
    /// </summary>
    /// <param name="x">Where, in the unit of the points' x.</param>
    public double Variance(double x)
    {
        double z = _axis.At(x);
        double sum = 0.0;
        double row = 1.0;
        for (int i = 0; i <= Degree; i++)
        {
            double column = 1.0;
            for (int j = 0; j <= Degree; j++)
            {
                sum += row * column * _centred.Covariance(i, j);
                column *= z;
            }

            row *= z;
        }

        return sum < 0.0 ? 0.0 : sum;
    }

    /// <summary>Takes a fit on the centred axis to the coefficients of x.</summary>
    internal static Status Of(CentredAxis axis, FitResult centred, out PolynomialFit? fit)
    {
        fit = null;
        int unknowns = centred.ParameterCount;
        double[] to = Expansion(axis, unknowns);
        double[] parameters = new double[unknowns];
        double[] covariance = new double[unknowns * unknowns];
        for (int i = 0; i < unknowns; i++)
        {
            for (int k = i; k < unknowns; k++) { parameters[i] += to[(i * unknowns) + k] * centred.Parameter(k); }
            if (InputCheck.NotFinite(parameters[i])) { return Status.PointsAboveRange; }
            for (int j = 0; j < unknowns; j++)
            {
                double sum = 0.0;
                for (int k = i; k < unknowns; k++)
                {
                    for (int l = j; l < unknowns; l++) { sum += to[(i * unknowns) + k] * centred.Covariance(k, l) * to[(j * unknowns) + l]; }
                }

                covariance[(i * unknowns) + j] = sum;
            }
        }

        double[] residuals = new double[centred.PointCount];
        double[] standardised = new double[centred.PointCount];
        for (int i = 0; i < residuals.Length; i++)
        {
            residuals[i] = centred.Residual(i);
            standardised[i] = centred.StandardisedResidual(i);
        }

        fit = new PolynomialFit(
            axis, centred, new FitResult(parameters, covariance, residuals, standardised, centred.ChiSquared, centred.IsWeighted, centred.Iterations));
        return Status.Ok;
    }

    /// <summary>Coefficients of x^i in ((x − centre)/half)^k, by the binomial theorem.</summary>
    private static double[] Expansion(CentredAxis axis, int unknowns)
    {
        double[] to = new double[unknowns * unknowns];
        double scale = 1.0;
        for (int k = 0; k < unknowns; k++)
        {
            double term = scale;
            for (int i = k; 0 <= i; i--)
            {
                to[(i * unknowns) + k] = term;
                term = term * i / (k - i + 1) * -axis.Centre;
            }

            scale /= axis.Half;
        }

        return to;
    }
}
