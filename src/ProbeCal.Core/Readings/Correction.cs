namespace ProbeCal;

/// <summary>
/// Raw sample and calibration in, corrected reading out. Live, replayed and re-corrected data all pass through
/// <see cref="Correct"/>, on the desktop and on the device, so that they agree bit for bit.
/// </summary>
/// <remarks>
/// What a bad input spoils follows from the physics: a membrane answers to partial pressure. Without a temperature nothing can
/// be said. At depth the partial pressure is that at the probe, and concentrations and saturations are those of the same water at the
/// surface, by <see cref="Enns1965"/>. Without a salinity only the concentrations are lost, without a pressure only the saturation at local
/// pressure; the concentrations then stand at 1 atm, which costs at most 0.05 %. A negative value (zero offset in anoxic
/// water) is handed out as it is. With <see cref="RangeRule.NearEdge"/> the concentrations are held to the range of the solubility equation: a temperature up to
/// 0.2 K outside is computed, named and has a larger uncertainty, what lies further is refused. Partial pressure and saturation, which rest on no such equation, are then
/// computed wherever the probe's fit can be continued, and named. A reading beyond the points of a fit through several is
/// named as a partial pressure below or above range. A total-gas probe has no concentrations; its percentage is that of the local pressure,
/// or of 1 atm, and depth is left as it is.
/// </remarks>
public static class Correction
{
    private const double HectopascalPerDecibar = 100.0;

    /// <summary>Corrects one raw sample.</summary>
    /// <param name="calibration">The calibration in force.</param>
    /// <param name="conditions">Circumstances of the readings: equation, uncertainties, stirring.</param>
    /// <param name="signal">Raw signal, in the unit of the calibration.</param>
    /// <param name="temperatureCelsius">Water temperature at the probe, °C.</param>
    /// <param name="pressureHectopascal">Absolute station pressure, hPa; NaN when there is none.</param>
    /// <param name="salinity">Practical salinity; NaN when it is not known.</param>
    /// <param name="hydrostaticDecibar">Pressure of the water above the probe, dbar; 0 at the surface.</param>
    /// <param name="rule">What to do outside a fitted or published range. Near edge holds the concentrations alone to theirs.</param>
    /// <param name="reading">Filled with values, statuses, uncertainties.</param>
    /// <returns>The status of the partial pressure, on which everything else rests.</returns>
    public static Status Correct(
        ProbeCalibration calibration,
        ReadingConditions conditions,
        double signal,
        double temperatureCelsius,
        double pressureHectopascal,
        double salinity,
        double hydrostaticDecibar,
        RangeRule rule,
        Reading reading)
    {
        reading.Clear();
        RangeRule probeRule = rule == RangeRule.NearEdge ? RangeRule.Extrapolate : rule;
        Status status = PartialPressure(
            calibration, conditions.FlowFactor, signal, temperatureCelsius, pressureHectopascal, hydrostaticDecibar, probeRule,
            out double partialPressure);
        reading.Set(ReadingQuantity.PartialPressure, status, partialPressure);
        if (double.IsNaN(partialPressure))
        {
            reading.RefuseAll(status);
            return status;
        }

        Status ofDepth = AtSurface(
            calibration, temperatureCelsius, hydrostaticDecibar, probeRule, partialPressure, out double surface, out double share, out double surfacePerKelvin);
        if (double.IsNaN(surface))
        {
            reading.RefuseAllBut(ReadingQuantity.PartialPressure, ofDepth);
            reading.UncertaintyStatus = ReadingUncertainty.FillPartialPressure(
                calibration, conditions, signal, temperatureCelsius, pressureHectopascal, hydrostaticDecibar, partialPressure, probeRule, reading);
            return status;
        }

        Status ofSurface = InputCheck.Graver(status, ofDepth);
        if (calibration.IsTotalPressure || calibration.Gas != Gas.Oxygen)
        {
            GasReading.Set(
                calibration, conditions.Equation, temperatureCelsius, pressureHectopascal, salinity, surface, ofSurface, probeRule, rule, reading);
        }
        else
        {
            double concentrationPressure = PressureForConcentration(pressureHectopascal);
            SetConcentrations(conditions.Equation, temperatureCelsius, concentrationPressure, salinity, surface, ofSurface, rule, reading);
            Status local = Saturation.PercentLocal(surface, temperatureCelsius, pressureHectopascal, probeRule, out double percentLocal);
            reading.Set(ReadingQuantity.PercentLocal, InputCheck.Graver(ofSurface, local), percentLocal);
            Status standard = Saturation.PercentOneAtmosphere(surface, temperatureCelsius, probeRule, out double percentStandard);
            reading.Set(ReadingQuantity.PercentOneAtmosphere, InputCheck.Graver(ofSurface, standard), percentStandard);
        }

        reading.UncertaintyStatus = ReadingUncertainty.Fill(
            calibration, conditions, signal, temperatureCelsius, pressureHectopascal, salinity, hydrostaticDecibar, partialPressure,
            surface, share, surfacePerKelvin, probeRule, rule, reading);
        return status;
    }

    /// <summary>The partial pressure alone, without uncertainty.</summary>
    /// <param name="calibration">The calibration in force.</param>
    /// <param name="flowFactor">Flow factor at the reading, 1 when stirred.</param>
    /// <param name="signal">Raw signal, in the unit of the calibration.</param>
    /// <param name="temperatureCelsius">Water temperature at the probe, °C.</param>
    /// <param name="pressureHectopascal">Absolute station pressure, hPa; only a meter's display with its own barometer needs it.</param>
    /// <param name="hydrostaticDecibar">Pressure of the water above the probe, dbar; 0 at the surface.</param>
    /// <param name="rule">What to do outside a fitted or published range, or beyond the points of a fit.</param>
    /// <param name="partialPressureHectopascal">Partial pressure at the probe, hPa; NaN unless the status allows a value.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status PartialPressure(
        ProbeCalibration calibration,
        double flowFactor,
        double signal,
        double temperatureCelsius,
        double pressureHectopascal,
        double hydrostaticDecibar,
        RangeRule rule,
        out double partialPressureHectopascal)
    {
        partialPressureHectopascal = double.NaN;
        Status ofResponse = calibration.Model.Response(
            signal, temperatureCelsius, pressureHectopascal, hydrostaticDecibar, rule, out double response);
        Status ofGain = calibration.Model.Gain(temperatureCelsius, rule, out double gain);
        Status status = InputCheck.Graver(ofResponse, ofGain);
        if (double.IsNaN(response) || double.IsNaN(gain)) { return status; }
        FittedResponse? fit = calibration.Fitted;
        if (fit != null)
        {
            Status ofCurve = ResponseCurve.PartialPressure(
                response, fit.Zero, fit.Slope, fit.Curvature, flowFactor, gain, calibration.Model.IsLogarithmic, out double onCurve);
            if (ofCurve != Status.Ok) { return ofCurve; }
            status = InputCheck.Graver(status, BeyondPoints(fit, onCurve));
            if (!InputCheck.Refuses(status, rule)) { partialPressureHectopascal = onCurve; }
            return status;
        }

        Status ofDivision = AmperometricProbe.PartialPressure(
            response, calibration.ZeroResponse, calibration.Slope, flowFactor, gain, out partialPressureHectopascal);
        return ofDivision == Status.Ok ? status : ofDivision;
    }

    private static Status BeyondPoints(FittedResponse fit, double partialPressure)
    {
        if (partialPressure < fit.LowestHectopascal) { return Status.PartialPressureBelowRange; }
        return fit.HighestHectopascal < partialPressure ? Status.PartialPressureAboveRange : Status.Ok;
    }

    /// <summary>
    /// The partial pressure that the same water has at the surface, its share of that at the probe, and its change per kelvin at constant
    /// partial pressure at the probe. At the surface itself everything is left to the bit.
    /// </summary>
    private static Status AtSurface(
        ProbeCalibration calibration, double temperatureCelsius, double hydrostaticDecibar, RangeRule rule, double partialPressure,
        out double surface, out double share, out double surfacePerKelvin)
    {
        surface = partialPressure;
        share = 1.0;
        surfacePerKelvin = 0.0;
        if (hydrostaticDecibar == 0.0 || calibration.IsTotalPressure) { return Status.Ok; }
        double hydrostaticHectopascal = hydrostaticDecibar * HectopascalPerDecibar;
        Status status = Enns1965.Factor(calibration.Gas, temperatureCelsius, hydrostaticHectopascal, rule, out double factor);
        Enns1965.Sensitivities(calibration.Gas, temperatureCelsius, hydrostaticHectopascal, rule, out double perKelvin, out _);
        surface = double.NaN;
        // An exponential is positive; the test also keeps NaN out.
        if (!(0.0 < factor)) { return status; }
        share = 1.0 / factor;
        surface = partialPressure * share;
        surfacePerKelvin = -surface * perKelvin * share;
        return status;
    }

    /// <summary>The pressure that the concentrations use: the station's, or 1 atm where it is missing or impossible.</summary>
    internal static double PressureForConcentration(double pressureHectopascal)
    {
        Status status = InputCheck.Pressure(pressureHectopascal, BensonKrause1984.LowestHectopascal, BensonKrause1984.HighestHectopascal);
        return status == Status.Ok ? pressureHectopascal : PressureUnits.HectopascalPerAtmosphere;
    }

    private static void SetConcentrations(
        SolubilityEquation equation,
        double temperatureCelsius,
        double pressureHectopascal,
        double salinity,
        double partialPressure,
        Status partialPressureStatus,
        RangeRule rule,
        Reading reading)
    {
        Status status = OxygenEquilibrium.ConcentrationFromPartialPressure(
            equation, temperatureCelsius, salinity, pressureHectopascal, partialPressure, rule, out double milligrams);
        status = InputCheck.Graver(partialPressureStatus, status);
        reading.Set(ReadingQuantity.MilligramsPerLitre, status, milligrams);
        reading.Set(
            ReadingQuantity.MicromolesPerLitre, status, OxygenUnits.MicromolesPerLitreFromMilligramsPerLitre(milligrams));
        Status ofDensity = DensityEos80.Density(temperatureCelsius, salinity, rule, out double density);
        double micromolesPerKilogram = double.NaN;
        if (!double.IsNaN(milligrams) && !double.IsNaN(density))
        {
            OxygenUnits.MicromolesPerKilogramFromMilligramsPerLitre(milligrams, density, out micromolesPerKilogram);
        }

        reading.Set(ReadingQuantity.MicromolesPerKilogram, InputCheck.Graver(status, ofDensity), micromolesPerKilogram);
    }
}
