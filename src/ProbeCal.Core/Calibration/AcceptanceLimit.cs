namespace ProbeCal;

/// <summary>Which of the two published limits of a 100 % check applied.</summary>
public enum AppliedLimit
{
    /// <summary>The limit in mg/L.</summary>
    Absolute = 1,
    /// <summary>The limit in percent of the reference.</summary>
    Relative = 2,
}

/// <summary>Published limits for the as-found and as-left error, and the judgement by simple acceptance.</summary>
/// <remarks>
/// "Within ±0.2 mg/L or 2 %" (USGS TM 9-A6.2) is read as: either is enough. The larger of the two then decides; they are
/// equal at 10 mg/L. On the limit is inside.
/// </remarks>
public static class AcceptanceLimit
{
    /// <summary>±0.2 mg/L at 100 % (USGS 2020, TM 9-A6.2).</summary>
    public const double SaturationMilligramsPerLitre = 0.2;
    /// <summary>±2 % of the computed value at 100 % (USGS 2020, TM 9-A6.2).</summary>
    public const double SaturationPercent = 2.0;
    /// <summary>A zero check reads at most 0.2 mg/L (USGS 2020, TM 9-A6.2).</summary>
    public const double ZeroMilligramsPerLitre = 0.2;

    /// <summary>The limit that applies at a reference value.</summary>
    /// <param name="referenceMilligramsPerLitre">Reference concentration, mg/L, positive.</param>
    /// <param name="absoluteMilligramsPerLitre">Limit in mg/L, not negative.</param>
    /// <param name="percent">Limit in % of the reference, not negative.</param>
    /// <param name="limitMilligramsPerLitre">The larger of the two, mg/L; NaN unless Ok.</param>
    /// <param name="applied">Which one it is; the absolute one when they are equal.</param>
    /// <returns><see cref="Status.ConcentrationNotFinite"/> and <see cref="Status.ConcentrationBelowRange"/> for the reference, <see cref="Status.CoefficientNotFinite"/> and <see cref="Status.CoefficientBelowRange"/> for a limit.</returns>
    public static Status AtSaturation(
        double referenceMilligramsPerLitre,
        double absoluteMilligramsPerLitre,
        double percent,
        out double limitMilligramsPerLitre,
        out AppliedLimit applied)
    {
        limitMilligramsPerLitre = double.NaN;
        applied = AppliedLimit.Absolute;
        if (InputCheck.NotFinite(referenceMilligramsPerLitre)) { return Status.ConcentrationNotFinite; }
        if (referenceMilligramsPerLitre <= 0.0) { return Status.ConcentrationBelowRange; }
        if (InputCheck.NotFinite(absoluteMilligramsPerLitre) || InputCheck.NotFinite(percent)) { return Status.CoefficientNotFinite; }
        if (absoluteMilligramsPerLitre < 0.0 || percent < 0.0) { return Status.CoefficientBelowRange; }
        double relative = referenceMilligramsPerLitre * percent / 100.0;
        if (double.IsInfinity(relative)) { return Status.ConcentrationAboveRange; }
        if (absoluteMilligramsPerLitre < relative)
        {
            limitMilligramsPerLitre = relative;
            applied = AppliedLimit.Relative;
            return Status.Ok;
        }

        limitMilligramsPerLitre = absoluteMilligramsPerLitre;
        return Status.Ok;
    }

    /// <summary>True when an error, either sign, does not exceed its limit. An error or limit that is NaN never passes.</summary>
    /// <param name="errorMilligramsPerLitre">Reading less reference, mg/L.</param>
    /// <param name="limitMilligramsPerLitre">Limit, mg/L.</param>
    public static bool Passes(double errorMilligramsPerLitre, double limitMilligramsPerLitre)
    {
        if (InputCheck.NotFinite(errorMilligramsPerLitre) || InputCheck.NotFinite(limitMilligramsPerLitre)) { return false; }
        double magnitude = errorMilligramsPerLitre < 0.0 ? -errorMilligramsPerLitre : errorMilligramsPerLitre;
        return magnitude <= limitMilligramsPerLitre;
    }
}
