namespace ProbeCal;

/// <summary>
/// Raw sample and calibration in, corrected reading out. Live, replayed and re-corrected data all pass through
/// <see cref="Correct"/>, on the desktop and on the device, so that they agree bit for bit.
/// </summary>
/// <remarks>
/// What a bad input spoils follows from the physics: a membrane answers to partial pressure. Without a temperature nothing can
/// be said. Without a salinity only the concentrations are lost, without a pressure only the saturation at local
/// pressure; the concentrations then stand at 1 atm, which costs at most 0.05 %. A negative value (zero offset in anoxic
/// water) is handed out as it is. With <see cref="RangeRule.NearEdge"/> the concentrations are held to the range of the solubility equation: a temperature up to
/// 0.2 K outside is computed, named and has a larger uncertainty, what lies further is refused. Partial pressure and saturation, which rest on no such equation, are then
/// computed wherever the probe's fit can be continued, and named.
/// </remarks>
public static class Correction
{
    /// <summary>Corrects one raw sample.</summary>
    /// <param name="calibration">The calibration in force.</param>
    /// <param name="conditions">Circumstances of the readings: equation, uncertainties, stirring.</param>
    /// <param name="signal">Raw signal, in the unit of the calibration.</param>
    /// <param name="temperatureCelsius">Water temperature at the probe, °C.</param>
    /// <param name="pressureHectopascal">Absolute station pressure, hPa; NaN when there is none.</param>
    /// <param name="salinity">Practical salinity; NaN when it is not known.</param>
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
        RangeRule rule,
        Reading reading)
    {
        reading.Clear();
        RangeRule probeRule = rule == RangeRule.NearEdge ? RangeRule.Extrapolate : rule;
        Status status = PartialPressure(
            calibration, conditions.FlowFactor, signal, temperatureCelsius, pressureHectopascal, probeRule, out double partialPressure);
        reading.Set(ReadingQuantity.PartialPressure, status, partialPressure);
        if (double.IsNaN(partialPressure))
        {
            reading.RefuseAll(status);
            return status;
        }

        double concentrationPressure = PressureForConcentration(pressureHectopascal);
        SetConcentrations(conditions.Equation, temperatureCelsius, concentrationPressure, salinity, partialPressure, status, rule, reading);
        Status local = Saturation.PercentLocal(partialPressure, temperatureCelsius, pressureHectopascal, probeRule, out double percentLocal);
        reading.Set(ReadingQuantity.PercentLocal, InputCheck.Graver(status, local), percentLocal);
        Status standard = Saturation.PercentOneAtmosphere(partialPressure, temperatureCelsius, probeRule, out double percentStandard);
        reading.Set(ReadingQuantity.PercentOneAtmosphere, InputCheck.Graver(status, standard), percentStandard);

        reading.UncertaintyStatus = ReadingUncertainty.Fill(
            calibration, conditions, temperatureCelsius, pressureHectopascal, salinity, partialPressure, probeRule, rule, reading);
        return status;
    }

    /// <summary>The partial pressure alone, without uncertainty.</summary>
    /// <param name="calibration">The calibration in force.</param>
    /// <param name="flowFactor">Flow factor at the reading, 1 when stirred.</param>
    /// <param name="signal">Raw signal, in the unit of the calibration.</param>
    /// <param name="temperatureCelsius">Water temperature at the probe, °C.</param>
    /// <param name="pressureHectopascal">Absolute station pressure, hPa; only a meter's display with its own barometer needs it.</param>
    /// <param name="rule">What to do outside a fitted or published range.</param>
    /// <param name="partialPressureHectopascal">pO2, hPa; NaN unless the status allows a value.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status PartialPressure(
        ProbeCalibration calibration,
        double flowFactor,
        double signal,
        double temperatureCelsius,
        double pressureHectopascal,
        RangeRule rule,
        out double partialPressureHectopascal)
    {
        partialPressureHectopascal = double.NaN;
        Status ofResponse = calibration.Model.Response(signal, temperatureCelsius, pressureHectopascal, rule, out double response);
        Status ofGain = calibration.Model.Gain(temperatureCelsius, rule, out double gain);
        Status status = InputCheck.Graver(ofResponse, ofGain);
        if (double.IsNaN(response) || double.IsNaN(gain)) { return status; }
        Status ofDivision = AmperometricProbe.PartialPressure(
            response, calibration.ZeroResponse, calibration.Slope, flowFactor, gain, out partialPressureHectopascal);
        return ofDivision == Status.Ok ? status : ofDivision;
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
