namespace ProbeCal;

/// <summary>
/// What time adds to the uncertainty of a reading: the drift of the probe since its calibration and what grew on it since its
/// cleaning. Nothing is corrected: a standard uncertainty that grows with the days covers what is not known.
/// </summary>
/// <remarks>
/// Both act on the slope, so that they scale with the reading: contribution = rate · days · value, the same share of every
/// quantity, for each is proportional to the partial pressure. A drift of the zero is not in it.
/// </remarks>
public static class ReadingGrowth
{
    /// <summary>Adds the drift since the calibration to a corrected reading. The last call counts.</summary>
    /// <param name="ratePerDay">Standard uncertainty per day, relative (0.001 is 0.1 % a day), not negative.</param>
    /// <param name="days">Days since the calibration, not negative.</param>
    /// <param name="reading">The reading as <see cref="Correction.Correct"/> filled it.</param>
    /// <returns>
    /// Ok; a status of the coefficient for the rate, of the uncertainty for the days or where the product is too large; the reading's own
    /// where it has no uncertainty. Unless Ok the reading is left as it was.
    /// </returns>
    public static Status AddDrift(double ratePerDay, double days, Reading reading)
    {
        return Add(UncertaintySource.Drift, ratePerDay, days, reading);
    }

    /// <summary>Adds the fouling since the last cleaning to a corrected reading. The last call counts.</summary>
    /// <param name="ratePerDay">Standard uncertainty per day, relative (0.001 is 0.1 % a day), not negative.</param>
    /// <param name="days">Days since the cleaning, not negative.</param>
    /// <param name="reading">The reading as <see cref="Correction.Correct"/> filled it.</param>
    /// <returns>As <see cref="AddDrift"/>.</returns>
    public static Status AddFouling(double ratePerDay, double days, Reading reading)
    {
        return Add(UncertaintySource.Fouling, ratePerDay, days, reading);
    }

    private static Status Add(UncertaintySource source, double ratePerDay, double days, Reading reading)
    {
        if (InputCheck.NotFinite(ratePerDay)) { return Status.CoefficientNotFinite; }
        if (ratePerDay < 0.0) { return Status.CoefficientBelowRange; }
        Status status = InputCheck.Uncertainty(days);
        if (status != Status.Ok) { return status; }
        double share = ratePerDay * days;
        if (InputCheck.NotFinite(share)) { return Status.UncertaintyAboveRange; }
        if (reading.UncertaintyStatus != Status.Ok) { return reading.UncertaintyStatus; }
        for (int i = 0; i < Reading.QuantityCount; i++)
        {
            ReadingQuantity quantity = (ReadingQuantity)i;
            double value = reading.Value(quantity);
            // A quantity without a value, or without an uncertainty so far, gets none by this.
            if (double.IsNaN(value) || double.IsNaN(reading.StandardUncertainty(quantity))) { continue; }
            reading.SetContribution(source, quantity, share * value);
            reading.Combine(quantity);
        }

        return Status.Ok;
    }
}
