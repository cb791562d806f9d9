namespace ProbeCal.Station.CalibrationLog;

/// <summary>A line or a quadratic fitted through any number of points: parameters, covariance, and how well it fits.</summary>
public sealed record RecordedFit
{
    /// <summary><c>line</c>: response = zero + slope · g · p; <c>quadratic</c>: with + curvature · g · p². g is the gain times the flow factor.</summary>
    public required string Form { get; init; }

    /// <summary><c>weighted-least-squares</c>, or <c>errors-in-both</c> where the reference's own uncertainty counts (York et al. 2004).</summary>
    public required string Method { get; init; }

    /// <summary>Response at zero partial pressure.</summary>
    public required double Zero { get; init; }

    /// <summary>Response per hPa at gain 1 (per decade for a logarithmic probe).</summary>
    public required double Slope { get; init; }

    /// <summary>Response per hPa²; 0 for a line.</summary>
    public required double Curvature { get; init; }

    /// <summary>Covariance: zero·zero, zero·slope, slope·slope, then for a quadratic zero·curvature, slope·curvature, curvature·curvature.</summary>
    public required double[] Covariance { get; init; }

    /// <summary>Change of zero, slope, curvature per kelvin of the thermometer's offset, which is common to points and readings.</summary>
    public required double[] PerThermometerKelvin { get; init; }

    /// <summary>Change of zero, slope, curvature per unit of the temperature coefficient.</summary>
    public required double[] PerTemperatureCoefficient { get; init; }

    /// <summary>Number of points less number of parameters.</summary>
    public required int DegreesOfFreedom { get; init; }

    /// <summary>Weighted sum of squared residuals.</summary>
    public required double ChiSquared { get; init; }

    /// <summary>Standard deviation of the residuals, in the response's unit; none without a degree of freedom.</summary>
    public double? ResidualStandardDeviation { get; init; }

    /// <summary>Probability of a chi-squared this large or larger if the stated uncertainties hold; none without a degree of freedom.</summary>
    public double? ChiSquaredProbability { get; init; }

    /// <summary>F test of lack of fit against the scatter of repeated points; none without repeats.</summary>
    public RecordedLackOfFit? LackOfFit { get; init; }

    /// <summary>Lowest reference in the fit, hPa.</summary>
    public required double LowestHectopascal { get; init; }

    /// <summary>Highest reference in the fit, hPa; readings beyond are flagged.</summary>
    public required double HighestHectopascal { get; init; }

    /// <summary>One for each point, in their order.</summary>
    public required RecordedResidual[] Residuals { get; init; }
}

/// <summary>F test of lack of fit (ISO 11095).</summary>
/// <param name="F">Mean square of lack of fit over that of pure error.</param>
/// <param name="DegreesOfFreedomLack">Levels less parameters.</param>
/// <param name="DegreesOfFreedomPure">Points less levels.</param>
/// <param name="Probability">Probability of an F this large or larger if the line is right.</param>
public sealed record RecordedLackOfFit(double F, int DegreesOfFreedomLack, int DegreesOfFreedomPure, double Probability);

/// <summary>How far one point lies from the fit.</summary>
/// <param name="Role">Role of the point.</param>
/// <param name="ReferenceHectopascal">Reference of the point, hPa.</param>
/// <param name="Response">Its response at gain 1.</param>
/// <param name="ResidualHectopascal">What the fit makes of the response less the reference, hPa.</param>
/// <param name="ResidualMilligramsPerLitre">The same, mg/L; none where there is no solubility for it.</param>
/// <param name="Standardised">The residual in units of its standard deviation.</param>
public sealed record RecordedResidual(string Role, double ReferenceHectopascal, double Response, double ResidualHectopascal, double? ResidualMilligramsPerLitre, double Standardised);
