namespace ProbeCal;

/// <summary>
/// A response as a fit through any number of points gave it: zero, slope, curvature, their covariance, and how they move with
/// the inputs that points and readings share. Immutable; values are judged by <see cref="ProbeCalibration"/>.
/// </summary>
/// <remarks>
/// response = zero + g·(slope·p + curvature·p²), with g the gain times the flow factor and p the partial pressure in hPa; for a
/// logarithmic probe log10(p / 1 hPa) stands for p. The covariance holds everything but the two shared inputs.
/// </remarks>
public sealed class FittedResponse
{
    /// <summary>Describes a fitted response.</summary>
    /// <param name="zero">Response at zero partial pressure.</param>
    /// <param name="slope">Response per hPa at gain 1 (per decade for a logarithmic probe).</param>
    /// <param name="curvature">Response per hPa²; 0 for a line.</param>
    /// <param name="varianceZero">Variance of zero.</param>
    /// <param name="covarianceZeroSlope">Covariance of zero and slope.</param>
    /// <param name="varianceSlope">Variance of slope.</param>
    /// <param name="covarianceZeroCurvature">Covariance of zero and curvature.</param>
    /// <param name="covarianceSlopeCurvature">Covariance of slope and curvature.</param>
    /// <param name="varianceCurvature">Variance of curvature.</param>
    /// <param name="zeroPerKelvin">Change of zero per kelvin of the offset of the thermometer that read at the points.</param>
    /// <param name="slopePerKelvin">Change of slope per kelvin of that offset.</param>
    /// <param name="curvaturePerKelvin">Change of curvature per kelvin of that offset.</param>
    /// <param name="zeroPerCoefficient">Change of zero per unit of the temperature coefficient.</param>
    /// <param name="slopePerCoefficient">Change of slope per unit of it.</param>
    /// <param name="curvaturePerCoefficient">Change of curvature per unit of it.</param>
    /// <param name="lowestHectopascal">Lowest partial pressure of the points, hPa.</param>
    /// <param name="highestHectopascal">Highest partial pressure of the points, hPa.</param>
    public FittedResponse(
        double zero,
        double slope,
        double curvature,
        double varianceZero,
        double covarianceZeroSlope,
        double varianceSlope,
        double covarianceZeroCurvature,
        double covarianceSlopeCurvature,
        double varianceCurvature,
        double zeroPerKelvin,
        double slopePerKelvin,
        double curvaturePerKelvin,
        double zeroPerCoefficient,
        double slopePerCoefficient,
        double curvaturePerCoefficient,
        double lowestHectopascal,
        double highestHectopascal)
    {
        Zero = zero;
        Slope = slope;
        Curvature = curvature;
        VarianceZero = varianceZero;
        CovarianceZeroSlope = covarianceZeroSlope;
        VarianceSlope = varianceSlope;
        CovarianceZeroCurvature = covarianceZeroCurvature;
        CovarianceSlopeCurvature = covarianceSlopeCurvature;
        VarianceCurvature = varianceCurvature;
        ZeroPerKelvin = zeroPerKelvin;
        SlopePerKelvin = slopePerKelvin;
        CurvaturePerKelvin = curvaturePerKelvin;
        ZeroPerCoefficient = zeroPerCoefficient;
        SlopePerCoefficient = slopePerCoefficient;
        CurvaturePerCoefficient = curvaturePerCoefficient;
        LowestHectopascal = lowestHectopascal;
        HighestHectopascal = highestHectopascal;
    }

    /// <summary>Response at zero partial pressure.</summary>
    public double Zero { get; }

    /// <summary>Response per hPa at gain 1.</summary>
    public double Slope { get; }

    /// <summary>Response per hPa².</summary>
    public double Curvature { get; }

    /// <summary>Variance of <see cref="Zero"/>.</summary>
    public double VarianceZero { get; }

    /// <summary>Covariance of <see cref="Zero"/> and <see cref="Slope"/>.</summary>
    public double CovarianceZeroSlope { get; }

    /// <summary>Variance of <see cref="Slope"/>.</summary>
    public double VarianceSlope { get; }

    /// <summary>Covariance of <see cref="Zero"/> and <see cref="Curvature"/>.</summary>
    public double CovarianceZeroCurvature { get; }

    /// <summary>Covariance of <see cref="Slope"/> and <see cref="Curvature"/>.</summary>
    public double CovarianceSlopeCurvature { get; }

    /// <summary>Variance of <see cref="Curvature"/>.</summary>
    public double VarianceCurvature { get; }

    /// <summary>Change of <see cref="Zero"/> per kelvin of the offset of the thermometer that read at the points.</summary>
    public double ZeroPerKelvin { get; }

    /// <summary>Change of <see cref="Slope"/> per kelvin of that offset.</summary>
    public double SlopePerKelvin { get; }

    /// <summary>Change of <see cref="Curvature"/> per kelvin of that offset.</summary>
    public double CurvaturePerKelvin { get; }

    /// <summary>Change of <see cref="Zero"/> per unit of the temperature coefficient.</summary>
    public double ZeroPerCoefficient { get; }

    /// <summary>Change of <see cref="Slope"/> per unit of the temperature coefficient.</summary>
    public double SlopePerCoefficient { get; }

    /// <summary>Change of <see cref="Curvature"/> per unit of the temperature coefficient.</summary>
    public double CurvaturePerCoefficient { get; }

    /// <summary>Lowest partial pressure of the points, hPa.</summary>
    public double LowestHectopascal { get; }

    /// <summary>Highest partial pressure of the points, hPa: beyond it a reading is an extrapolation.</summary>
    public double HighestHectopascal { get; }

    /// <summary>Judges the figures: finite, a slope, a range over which the curve does not turn round, covariances that their variances allow.</summary>
    internal Status Check(bool isLogarithmic)
    {
        if (InputCheck.NotFinite(Zero)) { return Status.ZeroNotFinite; }
        if (InputCheck.NotFinite(Slope)) { return Status.SlopeNotFinite; }
        if (Slope == 0.0) { return Status.SlopeBelowRange; }
        if (InputCheck.NotFinite(Curvature)) { return Status.CoefficientNotFinite; }
        Status status = CheckRange(isLogarithmic);
        if (status != Status.Ok) { return status; }
        status = CheckPair(VarianceZero, VarianceSlope, CovarianceZeroSlope);
        if (status != Status.Ok) { return status; }
        status = CheckPair(VarianceZero, VarianceCurvature, CovarianceZeroCurvature);
        if (status != Status.Ok) { return status; }
        status = CheckPair(VarianceSlope, VarianceCurvature, CovarianceSlopeCurvature);
        if (status != Status.Ok) { return status; }
        if (InputCheck.NotFinite(ZeroPerKelvin) || InputCheck.NotFinite(SlopePerKelvin) || InputCheck.NotFinite(CurvaturePerKelvin)
            || InputCheck.NotFinite(ZeroPerCoefficient) || InputCheck.NotFinite(SlopePerCoefficient) || InputCheck.NotFinite(CurvaturePerCoefficient))
        {
            return Status.CoefficientNotFinite;
        }

        return Status.Ok;
    }

    private Status CheckRange(bool isLogarithmic)
    {
        Status status = ResponseCurve.Abscissa(LowestHectopascal, isLogarithmic, out double lowest, out _);
        if (status != Status.Ok) { return status; }
        status = ResponseCurve.Abscissa(HighestHectopascal, isLogarithmic, out double highest, out _);
        if (status != Status.Ok) { return status; }
        if (highest <= lowest) { return Status.PointsDegenerate; }
        // The slope of the curve over that at zero: positive along the whole branch that the inverse takes.
        double relative = 2.0 * (Curvature / Slope);
        return 1.0 + (relative * lowest) <= 0.0 || 1.0 + (relative * highest) <= 0.0 ? Status.PointsDegenerate : Status.Ok;
    }

    private static Status CheckPair(double first, double second, double covariance)
    {
        Status status = InputCheck.Uncertainty(first);
        if (status != Status.Ok) { return status; }
        status = InputCheck.Uncertainty(second);
        if (status != Status.Ok) { return status; }
        if (InputCheck.NotFinite(covariance)) { return Status.UncertaintyNotFinite; }
        // A correlation of exactly one is allowed, and its rounding.
        double most = Numerics.Sqrt(first) * Numerics.Sqrt(second) * 1.000000001;
        return most < covariance || covariance < -most ? Status.UncertaintyAboveRange : Status.Ok;
    }
}
