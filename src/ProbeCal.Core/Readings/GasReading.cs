namespace ProbeCal;

/// <summary>
/// What follows from the partial pressure of a gas other than oxygen, or from the total pressure of all dissolved gases. Oxygen has its own way in
/// <see cref="Correction"/>, which is older and keeps its bits.
/// </summary>
internal static class GasReading
{
    private const double PerCent = 100.0;

    internal static void Set(
        ProbeCalibration calibration,
        SolubilityEquation equation,
        double temperatureCelsius,
        double pressureHectopascal,
        double salinity,
        double surface,
        Status surfaceStatus,
        RangeRule rule,
        RangeRule concentrationRule,
        Reading reading)
    {
        Status local = Percent(calibration, temperatureCelsius, pressureHectopascal, rule, surface, out double percentLocal, out _, out _, out _);
        reading.Set(ReadingQuantity.PercentLocal, InputCheck.Graver(surfaceStatus, local), percentLocal);
        Status standard = Percent(
            calibration, temperatureCelsius, PressureUnits.HectopascalPerAtmosphere, rule, surface, out double percentStandard, out _, out _, out _);
        reading.Set(ReadingQuantity.PercentOneAtmosphere, InputCheck.Graver(surfaceStatus, standard), percentStandard);
        if (calibration.IsTotalPressure)
        {
            reading.Set(ReadingQuantity.MilligramsPerLitre, Status.GasUnknown, double.NaN);
            reading.Set(ReadingQuantity.MicromolesPerLitre, Status.GasUnknown, double.NaN);
            reading.Set(ReadingQuantity.MicromolesPerKilogram, Status.GasUnknown, double.NaN);
            return;
        }

        Status status = GasEquilibrium.ConcentrationFromPartialPressure(
            calibration.Gas, equation, temperatureCelsius, salinity, Correction.PressureForConcentration(pressureHectopascal), surface,
            concentrationRule, out double milligrams);
        status = InputCheck.Graver(surfaceStatus, status);
        reading.Set(ReadingQuantity.MilligramsPerLitre, status, milligrams);
        double micromoles = GasUnits.MicromolesPerLitreFromMilligramsPerLitre(calibration.Gas, milligrams);
        reading.Set(ReadingQuantity.MicromolesPerLitre, status, micromoles);
        Status ofDensity = DensityEos80.Density(temperatureCelsius, salinity, concentrationRule, out double density);
        reading.Set(
            ReadingQuantity.MicromolesPerKilogram, InputCheck.Graver(status, ofDensity), 0.0 < density ? micromoles * 1000.0 / density : double.NaN);
    }

    internal static void FillUncertainty(
        ProbeCalibration calibration,
        ReadingConditions conditions,
        double temperatureCelsius,
        double pressureHectopascal,
        double salinity,
        double surface,
        double share,
        double surfacePerKelvin,
        RangeRule rule,
        RangeRule concentrationRule,
        Reading reading)
    {
        double offset = conditions.HasSameThermometer ? calibration.ThermometerOffsetUncertaintyKelvin : 0.0;
        double temperature = ReadingUncertainty.IndependentTemperature(conditions);
        Percent(
            calibration, temperatureCelsius, pressureHectopascal, rule, surface, out _, out double perUnit, out double perKelvin, out double perHectopascal);
        perKelvin = ReadingUncertainty.WithSurface(perKelvin, perUnit, surfacePerKelvin);
        ReadingUncertainty.FillQuantity(
            reading, ReadingQuantity.PercentLocal, perUnit * share, perKelvin * offset, perKelvin * temperature,
            perHectopascal * conditions.PressureUncertaintyHectopascal, 0.0, 0.0);
        Percent(
            calibration, temperatureCelsius, PressureUnits.HectopascalPerAtmosphere, rule, surface, out _, out perUnit, out perKelvin, out _);
        perKelvin = ReadingUncertainty.WithSurface(perKelvin, perUnit, surfacePerKelvin);
        ReadingUncertainty.FillQuantity(
            reading, ReadingQuantity.PercentOneAtmosphere, perUnit * share, perKelvin * offset, perKelvin * temperature, 0.0, 0.0, 0.0);
        if (calibration.IsTotalPressure) { return; }

        double total = Correction.PressureForConcentration(pressureHectopascal);
        double pressure = total == pressureHectopascal ? conditions.PressureUncertaintyHectopascal : ReadingUncertainty.UnknownPressureHectopascal;
        GasEquilibrium.ConcentrationSensitivities(
            calibration.Gas, conditions.Equation, temperatureCelsius, salinity, total, surface, concentrationRule,
            out perKelvin, out double perSalinity, out perHectopascal, out perUnit);
        GasUncertainty.EquationRelative(calibration.Gas, conditions.Equation, temperatureCelsius, salinity, total, concentrationRule, out double equation);
        perKelvin = ReadingUncertainty.WithSurface(perKelvin, perUnit, surfacePerKelvin);
        perUnit *= share;
        double milligrams = reading.Value(ReadingQuantity.MilligramsPerLitre);
        ReadingUncertainty.FillQuantity(
            reading, ReadingQuantity.MilligramsPerLitre, perUnit, perKelvin * offset, perKelvin * temperature,
            perHectopascal * pressure, perSalinity * conditions.SalinityUncertainty, milligrams * equation);

        double molar = GasUnits.MicromolesPerLitreFromMilligramsPerLitre(calibration.Gas, 1.0);
        ReadingUncertainty.FillQuantity(
            reading, ReadingQuantity.MicromolesPerLitre, perUnit * molar, perKelvin * offset * molar, perKelvin * temperature * molar,
            perHectopascal * pressure * molar, perSalinity * conditions.SalinityUncertainty * molar, milligrams * equation * molar);

        DensityEos80.Density(temperatureCelsius, salinity, concentrationRule, out double density);
        DensityEos80.Sensitivities(temperatureCelsius, salinity, concentrationRule, out double densityPerKelvin, out double densityPerSalinity);
        if (!(0.0 < density)) { return; }
        double perKilogram = molar * 1000.0 / density;
        double byDensity = milligrams / density;
        ReadingUncertainty.FillQuantity(
            reading, ReadingQuantity.MicromolesPerKilogram, perUnit * perKilogram,
            (perKelvin - (byDensity * densityPerKelvin)) * offset * perKilogram,
            (perKelvin - (byDensity * densityPerKelvin)) * temperature * perKilogram,
            perHectopascal * pressure * perKilogram,
            (perSalinity - (byDensity * densityPerSalinity)) * conditions.SalinityUncertainty * perKilogram,
            milligrams * equation * perKilogram);
    }

    /// <summary>
    /// Percentage of what air over the water holds: of the gas with its usual mole fraction, over fresh water as for oxygen, or of the whole pressure for a
    /// total-gas probe. With its slopes.
    /// </summary>
    private static Status Percent(
        ProbeCalibration calibration, double temperatureCelsius, double pressureHectopascal, RangeRule rule, double surface,
        out double percent, out double perUnit, out double perKelvin, out double perHectopascal)
    {
        percent = double.NaN;
        perUnit = double.NaN;
        perKelvin = double.NaN;
        perHectopascal = double.NaN;
        double air = pressureHectopascal;
        double airPerKelvin = 0.0;
        double airPerHectopascal = 1.0;
        Status status;
        if (calibration.IsTotalPressure)
        {
            status = InputCheck.Pressure(pressureHectopascal, GasEquilibrium.LowestHectopascal, BensonKrause1984.HighestHectopascal);
            if (InputCheck.Refuses(status, rule)) { return status; }
        }
        else
        {
            double fraction = DryAir.MoleFraction(calibration.Gas);
            status = GasEquilibrium.PartialPressure(calibration.Gas, temperatureCelsius, 0.0, pressureHectopascal, fraction, PerCent, rule, out air);
            GasEquilibrium.PartialPressureSensitivities(
                calibration.Gas, temperatureCelsius, 0.0, pressureHectopascal, fraction, PerCent, rule,
                out airPerKelvin, out _, out airPerHectopascal, out _, out _);
        }

        if (!(0.0 < air)) { return status; }
        double value = PerCent * surface / air;
        status = InputCheck.Deliver(value, status, Status.PartialPressureAboveRange, out percent);
        perUnit = InputCheck.FiniteOrNaN(PerCent / air);
        perKelvin = InputCheck.FiniteOrNaN(-value * airPerKelvin / air);
        perHectopascal = InputCheck.FiniteOrNaN(-value * airPerHectopascal / air);
        return status;
    }
}
