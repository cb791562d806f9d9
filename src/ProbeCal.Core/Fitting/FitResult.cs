namespace ProbeCal;

/// <summary>Parameters of a fit, their covariance, and how far the observations lie from it. Immutable.</summary>
/// <remarks>
/// With stated uncertainties of the observations the covariance rests on them alone. Without any it rests on the scatter of the residuals,
/// and is NaN where there is no degree of freedom to judge that by.
/// </remarks>
public sealed class FitResult
{
    private readonly double[] _parameters;
    private readonly double[] _covariance;
    private readonly double[] _residuals;
    private readonly double[] _standardised;

    internal FitResult(double[] parameters, double[] covariance, double[] residuals, double[] standardised, double chiSquared, bool isWeighted, int iterations)
    {
        _parameters = parameters;
        _covariance = covariance;
        _residuals = residuals;
        _standardised = standardised;
        ChiSquared = chiSquared;
        IsWeighted = isWeighted;
        Iterations = iterations;
    }

    /// <summary>Number of parameters.</summary>
    public int ParameterCount
    {
        get { return _parameters.Length; }
    }

    /// <summary>Number of observations.</summary>
    public int PointCount
    {
        get { return _residuals.Length; }
    }

    /// <summary>Observations less parameters.</summary>
    public int DegreesOfFreedom
    {
        get { return _residuals.Length - _parameters.Length; }
    }

    /// <summary>Sum of the squared residuals, each in units of the stated uncertainty where there is one.</summary>
    public double ChiSquared { get; }

    /// <summary>True when the observations came with uncertainties.</summary>
    public bool IsWeighted { get; }

    /// <summary>How many steps the fit took; 1 for one that needs none.</summary>
    public int Iterations { get; }

    /// <summary>
    /// Root of chi-squared over its degrees of freedom: the standard deviation of the residuals, or with stated uncertainties how many times too
    /// small those were. NaN without a degree of freedom.
    /// </summary>
    public double ResidualStandardDeviation
    {
        get { return DegreesOfFreedom == 0 ? double.NaN : Numerics.Sqrt(ChiSquared / DegreesOfFreedom); }
    }

    /// <summary>A parameter, in the order of the model.</summary>
    /// <param name="index">Which, from 0.</param>
    public double Parameter(int index)
    {
        return _parameters[index];
    }

    /// <summary>Covariance of two parameters.</summary>
    /// <param name="first">One, from 0.</param>
    /// <param name="second">The other, from 0.</param>
    public double Covariance(int first, int second)
    {
        return _covariance[(first * _parameters.Length) + second];
    }

    /// <summary>Standard uncertainty of a parameter.</summary>
    /// <param name="index">Which, from 0.</param>
    public double StandardUncertainty(int index)
    {
        return Numerics.Sqrt(Covariance(index, index));
    }

    /// <summary>Observation less fit, in the observation's unit.</summary>
    /// <param name="index">Which point, from 0.</param>
    public double Residual(int index)
    {
        return _residuals[index];
    }

    /// <summary>
    /// The residual over its own standard deviation, which is smaller than that of the observation because the fit follows its points. NaN for a
    /// point that decides its place in the fit alone, and without a degree of freedom.
    /// </summary>
    /// <param name="index">Which point, from 0.</param>
    public double StandardisedResidual(int index)
    {
        return _standardised[index];
    }

    /// <summary>Builds the result from a solution of the weighted problem.</summary>
    /// <param name="parameters">The parameters.</param>
    /// <param name="root">K with K·Kᵀ the covariance at unit variance.</param>
    /// <param name="rows">The weighted design, row by row.</param>
    /// <param name="residuals">Observation less fit.</param>
    /// <param name="standardUncertainty">Of the observations; null when nobody stated any.</param>
    /// <param name="iterations">Steps taken.</param>
    internal static FitResult Of(double[] parameters, double[] root, double[] rows, double[] residuals, double[]? standardUncertainty, int iterations)
    {
        int count = residuals.Length;
        int unknowns = parameters.Length;
        double chiSquared = 0.0;
        for (int i = 0; i < count; i++)
        {
            double weighted = standardUncertainty == null ? residuals[i] : residuals[i] / standardUncertainty[i];
            chiSquared += weighted * weighted;
        }

        bool isWeighted = standardUncertainty != null;
        double variance = isWeighted ? 1.0 : (count == unknowns ? double.NaN : chiSquared / (count - unknowns));
        double[] covariance = new double[unknowns * unknowns];
        for (int i = 0; i < unknowns; i++)
        {
            for (int j = 0; j < unknowns; j++)
            {
                double sum = 0.0;
                for (int k = 0; k < unknowns; k++) { sum += root[(i * unknowns) + k] * root[(j * unknowns) + k]; }
                covariance[(i * unknowns) + j] = variance * sum;
            }
        }

        double[] standardised = new double[count];
        double deviation = Numerics.Sqrt(variance);
        for (int i = 0; i < count; i++)
        {
            double leverage = 0.0;
            for (int k = 0; k < unknowns; k++)
            {
                double sum = 0.0;
                for (int j = 0; j < unknowns; j++) { sum += rows[(i * unknowns) + j] * root[(j * unknowns) + k]; }
                leverage += sum * sum;
            }

            double free = 1.0 - leverage;
            double own = standardUncertainty == null ? deviation : standardUncertainty[i];
            standardised[i] = count != unknowns && NothingLeft < free && 0.0 < own ? residuals[i] / (own * Numerics.Sqrt(free)) : double.NaN;
        }

        return new FitResult(parameters, covariance, residuals, standardised, chiSquared, isWeighted, iterations);
    }

    /// <summary>Less of a residual's freedom than this is rounding.</summary>
    private const double NothingLeft = 1e-10;
}
