namespace ProbeCal;

/// <summary>
/// Takes the first-order lag of a probe out of its readings: x = y + τ·dy/dt, where τ·dy/dt = x − y is how a membrane follows. Off unless asked for: it costs noise.
/// </summary>
/// <remarks>
/// The derivative is taken from three readings, as the slope at the middle one of the parabola through them; for equal steps Δt that is (y₊ − y₋)/(2Δt). Reading noise u that is independent from
/// reading to reading becomes u·√(1 + (τ/Δt)²/2) then: for τ = Δt 1.2 times, for τ = 10·Δt 7 times. The backward difference of the last two readings,
/// for use as they come, costs u·√(1 + 2·(τ/Δt) + 2·(τ/Δt)²). The first order is an idealisation: a membrane under a film of water has more than one time constant. Averaging before
/// correcting, or a τ no larger than known, keeps the noise down.
/// </remarks>
public static class LagCorrection
{
    /// <summary>The value at the middle of three readings, without lag.</summary>
    /// <param name="timeConstantSeconds">τ, s, not negative: 63 % of a step are reached after it, 90 % after 2.303 τ.</param>
    /// <param name="secondsBefore">Time from the reading before to the middle one, s, positive.</param>
    /// <param name="secondsAfter">Time from the middle reading to the one after, s, positive.</param>
    /// <param name="before">The reading before, in any unit.</param>
    /// <param name="middle">The middle reading, in the same unit.</param>
    /// <param name="after">The reading after, in the same unit.</param>
    /// <param name="corrected">The value without lag, in the unit of the readings; NaN unless Ok.</param>
    /// <param name="noiseGain">
    /// Standard uncertainty of the value over that of one reading (a ratio without unit), readings independent; at least 1 for equal steps, while a much shorter step after than before
    /// averages two readings and may bring it below. NaN unless Ok.
    /// </param>
    /// <returns><see cref="Status.CoefficientNotFinite"/> and <see cref="Status.CoefficientBelowRange"/> speak of τ, those of points of the times and readings.</returns>
    public static Status Central(
        double timeConstantSeconds, double secondsBefore, double secondsAfter, double before, double middle, double after,
        out double corrected, out double noiseGain)
    {
        corrected = double.NaN;
        noiseGain = double.NaN;
        Status status = Check(timeConstantSeconds, secondsBefore, before, middle);
        if (status != Status.Ok) { return status; }
        if (InputCheck.NotFinite(secondsAfter) || InputCheck.NotFinite(after)) { return Status.PointsNotFinite; }
        if (secondsAfter <= 0.0) { return Status.PointsDegenerate; }
        double span = secondsBefore + secondsAfter;
        double ofBefore = -timeConstantSeconds * (secondsAfter / secondsBefore) / span;
        double ofAfter = timeConstantSeconds * (secondsBefore / secondsAfter) / span;
        double ofMiddle = 1.0 - (ofBefore + ofAfter);
        return Finish(
            middle + (ofBefore * (before - middle)) + (ofAfter * (after - middle)),
            (ofBefore * ofBefore) + (ofMiddle * ofMiddle) + (ofAfter * ofAfter), out corrected, out noiseGain);
    }

    /// <summary>The value at the last of two readings, without lag: for use as they come. It sees the change half a step late.</summary>
    /// <param name="timeConstantSeconds">τ, s, not negative.</param>
    /// <param name="secondsBetween">Time between the two readings, s, positive.</param>
    /// <param name="before">The reading before, in any unit.</param>
    /// <param name="last">The last reading, in the same unit.</param>
    /// <param name="corrected">The value without lag, in the unit of the readings; NaN unless Ok.</param>
    /// <param name="noiseGain">Standard uncertainty of the value over that of one reading (a ratio without unit), readings independent; at least 1. NaN unless Ok.</param>
    /// <returns>As <see cref="Central"/>.</returns>
    public static Status Backward(
        double timeConstantSeconds, double secondsBetween, double before, double last, out double corrected, out double noiseGain)
    {
        corrected = double.NaN;
        noiseGain = double.NaN;
        Status status = Check(timeConstantSeconds, secondsBetween, before, last);
        if (status != Status.Ok) { return status; }
        double steps = timeConstantSeconds / secondsBetween;
        double ofLast = 1.0 + steps;
        return Finish(last + (steps * (last - before)), (ofLast * ofLast) + (steps * steps), out corrected, out noiseGain);
    }

    private static Status Check(double timeConstantSeconds, double seconds, double before, double after)
    {
        if (InputCheck.NotFinite(timeConstantSeconds)) { return Status.CoefficientNotFinite; }
        if (timeConstantSeconds < 0.0) { return Status.CoefficientBelowRange; }
        if (InputCheck.NotFinite(seconds) || InputCheck.NotFinite(before) || InputCheck.NotFinite(after)) { return Status.PointsNotFinite; }
        return seconds <= 0.0 ? Status.PointsDegenerate : Status.Ok;
    }

    private static Status Finish(double value, double squares, out double corrected, out double noiseGain)
    {
        corrected = double.NaN;
        noiseGain = double.NaN;
        double gain = Numerics.Sqrt(squares);
        if (InputCheck.NotFinite(value) || InputCheck.NotFinite(gain)) { return Status.CoefficientAboveRange; }
        corrected = value;
        noiseGain = gain;
        return Status.Ok;
    }
}
