namespace ProbeCal.Station.CalibrationLog;

/// <summary>From a recorded fit to what Core corrects readings with.</summary>
internal static class FitConversion
{
    /// <summary>The calibration that a fit makes. The same fit gives the same bits.</summary>
    /// <param name="probe">The probe.</param>
    /// <param name="gas">The gas; without meaning for a probe of total gas pressure.</param>
    /// <param name="fit">The fit.</param>
    /// <param name="stirring">How the water moved at the points.</param>
    /// <param name="flowFactor">Flow factor at the points.</param>
    /// <param name="calibration">The calibration; null unless Ok.</param>
    /// <returns>What Core says of it.</returns>
    internal static Status Create(RecordedProbe probe, Gas gas, RecordedFit fit, Stirring stirring, double flowFactor, out ProbeCalibration? calibration)
    {
        return ProbeCalibration.CreateFitted(
            RecordConversion.Model(probe),
            gas,
            Response(fit),
            stirring,
            flowFactor,
            probe.Thermometer.CommonStandardUncertaintyCelsius,
            probe.TemperatureCoefficient.StandardUncertainty,
            out calibration);
    }

    private static FittedResponse Response(RecordedFit fit)
    {
        double[] v = fit.Covariance;
        bool quadratic = 3 < v.Length;
        return new FittedResponse(
            fit.Zero,
            fit.Slope,
            fit.Curvature,
            v[0],
            v[1],
            v[2],
            quadratic ? v[3] : 0,
            quadratic ? v[4] : 0,
            quadratic ? v[5] : 0,
            fit.PerThermometerKelvin[0],
            fit.PerThermometerKelvin[1],
            At(fit.PerThermometerKelvin, 2),
            fit.PerTemperatureCoefficient[0],
            fit.PerTemperatureCoefficient[1],
            At(fit.PerTemperatureCoefficient, 2),
            fit.LowestHectopascal,
            fit.HighestHectopascal);
    }

    private static double At(double[] values, int index)
    {
        return index < values.Length ? values[index] : 0;
    }
}
