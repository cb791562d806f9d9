namespace ProbeCal;

/// <summary>How large the error of a usual slip would be, so that a guard can say it in figures.</summary>
/// <remarks>
/// A reference computed too high makes the probe seem to read low as found; once the probe is adjusted to it, later readings
/// are high in the same proportion. A point whose oxygen is higher than the reference says acts the other way round.
/// </remarks>
public static class ExpectedEffect
{
    /// <summary>Error of the reference when it is computed with a wrong temperature or pressure.</summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="salinity">Practical salinity.</param>
    /// <param name="rightCelsius">True temperature, °C.</param>
    /// <param name="rightHectopascal">True absolute pressure, hPa.</param>
    /// <param name="takenCelsius">Temperature used, °C.</param>
    /// <param name="takenHectopascal">Pressure used, hPa.</param>
    /// <param name="milligramsPerLitre">Reference used less true reference, mg/L; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status ReferenceError(
        SolubilityEquation equation,
        double salinity,
        double rightCelsius,
        double rightHectopascal,
        double takenCelsius,
        double takenHectopascal,
        out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        Status status = OxygenEquilibrium.MilligramsPerLitre(
            equation, takenCelsius, salinity, takenHectopascal, RangeRule.Refuse, out double taken);
        if (status != Status.Ok) { return status; }
        status = OxygenEquilibrium.MilligramsPerLitre(equation, rightCelsius, salinity, rightHectopascal, RangeRule.Refuse, out double right);
        if (status != Status.Ok) { return status; }
        milligramsPerLitre = taken - right;
        return Status.Ok;
    }

    /// <summary>
    /// How far air that is not saturated with vapour holds more oxygen than the reference says: as found the probe reads high
    /// by it, and later readings are low by it after adjusting.
    /// </summary>
    /// <param name="temperatureCelsius">Temperature of the chamber, °C.</param>
    /// <param name="pressureHectopascal">Absolute pressure, hPa.</param>
    /// <param name="relativeHumidityPercent">Relative humidity in the chamber, 0–100 %.</param>
    /// <param name="percent">Excess of pO2, % of the reference; NaN unless Ok.</param>
    /// <returns>A status of temperature or pressure, or of the humidity as <see cref="Status.CoefficientNotFinite"/>, <see cref="Status.CoefficientBelowRange"/>, <see cref="Status.CoefficientAboveRange"/>.</returns>
    public static Status DryChamber(
        double temperatureCelsius,
        double pressureHectopascal,
        double relativeHumidityPercent,
        out double percent)
    {
        percent = double.NaN;
        if (InputCheck.NotFinite(relativeHumidityPercent)) { return Status.CoefficientNotFinite; }
        if (relativeHumidityPercent < 0.0) { return Status.CoefficientBelowRange; }
        if (100.0 < relativeHumidityPercent) { return Status.CoefficientAboveRange; }
        Status status = OxygenEquilibrium.PartialPressure(temperatureCelsius, pressureHectopascal, RangeRule.Refuse, out double reference);
        if (status != Status.Ok) { return status; }
        status = VapourBensonKrause1980.Pressure(temperatureCelsius, RangeRule.Extrapolate, out double vapour);
        if (double.IsNaN(vapour)) { return status; }
        if (reference <= 0.0) { return Status.PressureBelowRange; }
        double missing = vapour * (1.0 - (relativeHumidityPercent / 100.0));
        percent = 100.0 * DryAir.OxygenMoleFraction * missing / reference;
        return Status.Ok;
    }
}
