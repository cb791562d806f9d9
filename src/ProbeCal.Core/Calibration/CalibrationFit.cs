namespace ProbeCal;

/// <summary>The arithmetic of a one- or two-point calibration: reference, slope, as-found error.</summary>
public static class CalibrationFit
{
    /// <summary>Slope from the 100 % point and a zero, measured (two-point) or assumed (one-point).</summary>
    /// <param name="response">Response at the 100 % point.</param>
    /// <param name="zeroResponse">Response at zero.</param>
    /// <param name="gain">Gain at the temperature of the 100 % point, positive.</param>
    /// <param name="flowFactor">Flow factor at the 100 % point, positive.</param>
    /// <param name="airToWaterRatio">Signal in air over signal in stirred water, positive; 1 for a water point.</param>
    /// <param name="referenceHectopascal">Reference pO2 at the 100 % point, hPa, positive.</param>
    /// <param name="slope">Response per hPa at gain 1, flow 1, in water; NaN unless Ok.</param>
    /// <returns>
    /// <see cref="Status.PointsDegenerate"/> when both points read the same; <see cref="Status.ZeroAboveRange"/> when the zero
    /// lies above the 100 % point; otherwise the input at fault.
    /// </returns>
    public static Status Slope(
        double response,
        double zeroResponse,
        double gain,
        double flowFactor,
        double airToWaterRatio,
        double referenceHectopascal,
        out double slope)
    {
        slope = double.NaN;
        if (InputCheck.NotFinite(response)) { return Status.SignalNotFinite; }
        if (InputCheck.NotFinite(zeroResponse)) { return Status.ZeroNotFinite; }
        if (InputCheck.NotFinite(gain) || InputCheck.NotFinite(flowFactor) || InputCheck.NotFinite(airToWaterRatio)) { return Status.CoefficientNotFinite; }
        if (InputCheck.NotFinite(referenceHectopascal)) { return Status.PartialPressureNotFinite; }
        if (gain <= 0.0 || flowFactor <= 0.0 || airToWaterRatio <= 0.0) { return Status.CoefficientBelowRange; }
        if (referenceHectopascal <= 0.0) { return Status.PartialPressureBelowRange; }
        if (response == zeroResponse) { return Status.PointsDegenerate; }
        if (response < zeroResponse) { return Status.ZeroAboveRange; }
        double perSlope = gain * flowFactor * airToWaterRatio * referenceHectopascal;
        if (perSlope == 0.0) { return Status.CoefficientBelowRange; }
        if (double.IsInfinity(perSlope)) { return Status.CoefficientAboveRange; }
        double value = (response - zeroResponse) / perSlope;
        if (double.IsInfinity(value)) { return Status.SlopeAboveRange; }
        if (value == 0.0) { return Status.SlopeBelowRange; }
        slope = value;
        return Status.Ok;
    }

    /// <summary>
    /// Size of one unit of signal at the reference, in mg/L: what a stability limit in mg/L is compared with. For a first
    /// calibration the slope is that of the window under judgement.
    /// </summary>
    /// <param name="model">The probe.</param>
    /// <param name="slope">Response per hPa, positive.</param>
    /// <param name="signal">Raw signal at the reference; only a probe whose response bends with the signal looks at it.</param>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="temperatureCelsius">Temperature of the reference, °C.</param>
    /// <param name="pressureHectopascal">Absolute station pressure, hPa.</param>
    /// <param name="salinity">Practical salinity; 0 in air.</param>
    /// <param name="milligramsPerLitrePerSignal">mg/L per unit of signal; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status SignalSize(
        IProbeModel model,
        double slope,
        double signal,
        SolubilityEquation equation,
        double temperatureCelsius,
        double pressureHectopascal,
        double salinity,
        out double milligramsPerLitrePerSignal)
    {
        milligramsPerLitrePerSignal = double.NaN;
        Status status = model.ResponsePerSignal(signal, temperatureCelsius, pressureHectopascal, 0.0, RangeRule.Refuse, out double responsePerSignal);
        if (status != Status.Ok) { return status; }
        status = model.Gain(temperatureCelsius, RangeRule.Refuse, out double gain);
        if (status != Status.Ok) { return status; }
        status = AmperometricProbe.PartialPressure(responsePerSignal, 0.0, slope, 1.0, gain, out double hectopascal);
        if (status != Status.Ok) { return status; }
        status = OxygenEquilibrium.ConcentrationSensitivities(
            equation, temperatureCelsius, salinity, pressureHectopascal, 1.0, RangeRule.Refuse,
            out double _, out double _, out double _, out double milligramsPerHectopascal);
        if (status != Status.Ok) { return status; }
        double size = hectopascal * milligramsPerHectopascal;
        if (double.IsInfinity(size)) { return Status.SlopeBelowRange; }
        // A luminescence falls where oxygen rises; the size has no sign.
        milligramsPerLitrePerSignal = size < 0.0 ? -size : size;
        return Status.Ok;
    }

    /// <summary>The error of a probe as found at the 100 % point, with the slope and zero it came with.</summary>
    /// <param name="model">The probe.</param>
    /// <param name="slope">Slope of the calibration in use, response per hPa; 1 for a meter's display.</param>
    /// <param name="zeroResponse">Zero of the calibration in use, as a response; 0 for a meter's display.</param>
    /// <param name="point">The point just read.</param>
    /// <param name="equation">Equation for the error in mg/L.</param>
    /// <param name="salinity">Salinity of the water at the point; 0 in air.</param>
    /// <param name="milligramsPerLitre">Reading less reference at the reference, mg/L; NaN unless Ok.</param>
    /// <param name="percent">Reading less reference in % of the reference; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status AsFound(
        IProbeModel model,
        double slope,
        double zeroResponse,
        CalibrationPoint point,
        SolubilityEquation equation,
        double salinity,
        out double milligramsPerLitre,
        out double percent)
    {
        milligramsPerLitre = double.NaN;
        percent = double.NaN;
        double temperature = point.TemperatureCelsius;
        double pressure = point.PressureHectopascal;
        Status status = OxygenEquilibrium.PartialPressure(temperature, pressure, RangeRule.Refuse, out double reference);
        if (status != Status.Ok) { return status; }
        if (reference <= 0.0) { return Status.PressureBelowRange; }
        status = OxygenEquilibrium.MilligramsPerLitre(equation, temperature, salinity, pressure, RangeRule.Refuse, out double concentration);
        if (status != Status.Ok) { return status; }
        status = model.Response(point.Signal, temperature, pressure, 0.0, RangeRule.Refuse, out double response);
        if (status != Status.Ok) { return status; }
        status = model.Gain(temperature, RangeRule.Refuse, out double gain);
        if (status != Status.Ok) { return status; }
        if (InputCheck.NotFinite(point.AirToWaterRatio)) { return Status.CoefficientNotFinite; }
        if (point.AirToWaterRatio <= 0.0) { return Status.CoefficientBelowRange; }
        status = AmperometricProbe.PartialPressure(
            response, zeroResponse, slope, point.FlowFactor * point.AirToWaterRatio, gain, out double found);
        if (status != Status.Ok) { return status; }
        double relative = (found - reference) / reference;
        if (double.IsInfinity(relative * concentration) || double.IsInfinity(100.0 * relative)) { return Status.SignalAboveRange; }
        milligramsPerLitre = relative * concentration;
        percent = 100.0 * relative;
        return Status.Ok;
    }

    /// <summary>What a zero solution reads as found, which is its error.</summary>
    /// <param name="model">The probe.</param>
    /// <param name="slope">Slope of the calibration in use, response per hPa; 1 for a meter's display.</param>
    /// <param name="zeroResponse">Zero of the calibration in use, as a response; 0 for a meter's display.</param>
    /// <param name="zero">The zero just read.</param>
    /// <param name="equation">Equation for the value in mg/L.</param>
    /// <param name="milligramsPerLitre">Reading in fresh water, mg/L; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status AsFoundZero(
        IProbeModel model,
        double slope,
        double zeroResponse,
        ZeroPoint zero,
        SolubilityEquation equation,
        out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        double temperature = zero.TemperatureCelsius;
        Status status = model.Response(zero.Signal, temperature, zero.PressureHectopascal, 0.0, RangeRule.Refuse, out double response);
        if (status != Status.Ok) { return status; }
        status = model.Gain(temperature, RangeRule.Refuse, out double gain);
        if (status != Status.Ok) { return status; }
        status = AmperometricProbe.PartialPressure(response, zeroResponse, slope, 1.0, gain, out double found);
        if (status != Status.Ok) { return status; }
        return OxygenEquilibrium.ConcentrationFromPartialPressure(
            equation, temperature, 0.0, PressureUnits.HectopascalPerAtmosphere, found, RangeRule.Refuse, out milligramsPerLitre);
    }
}
