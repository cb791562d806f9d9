namespace ProbeCal;

/// <summary>
/// The uncertainty of a corrected reading by the law of propagation (JCGM 100, 5.1 and 5.2), analytic. Every input that enters
/// more than once (the thermometer's offset, the zero, the temperature coefficient) is carried as one input with the sum of
/// its sensitivities, which is the covariance.
/// </summary>
internal static class ReadingUncertainty
{
    // Where the pressure is not known, the concentrations stand at 1 atm; this wide a pressure (our choice) covers any
    // station below 2,000 m and weighs 0.01 %.
    private const double UnknownPressureHectopascal = 100.0;

    internal static Status Fill(
        ProbeCalibration calibration,
        ReadingConditions conditions,
        double temperatureCelsius,
        double pressureHectopascal,
        double salinity,
        double partialPressure,
        RangeRule rule,
        RangeRule concentrationRule,
        Reading reading)
    {
        Status status = conditions.Check();
        if (status != Status.Ok) { return status; }
        status = FillPartialPressure(calibration, conditions, temperatureCelsius, pressureHectopascal, partialPressure, rule, reading);
        if (status != Status.Ok) { return status; }

        double offset = conditions.HasSameThermometer ? calibration.ThermometerOffsetUncertaintyKelvin : 0.0;
        double temperature = IndependentTemperature(conditions);
        FillConcentrations(conditions, temperatureCelsius, pressureHectopascal, salinity, partialPressure, offset, temperature, concentrationRule, reading);

        Saturation.PercentLocalSensitivities(
            partialPressure, temperatureCelsius, pressureHectopascal, rule,
            out double perPartialPressure, out double perKelvin, out double perHectopascal);
        FillQuantity(
            reading, ReadingQuantity.PercentLocal, perPartialPressure, perKelvin * offset, perKelvin * temperature,
            perHectopascal * conditions.PressureUncertaintyHectopascal, 0.0, 0.0);
        Saturation.PercentOneAtmosphereSensitivities(
            partialPressure, temperatureCelsius, rule, out perPartialPressure, out perKelvin);
        FillQuantity(
            reading, ReadingQuantity.PercentOneAtmosphere, perPartialPressure, perKelvin * offset, perKelvin * temperature, 0.0, 0.0, 0.0);
        return Status.Ok;
    }

    /// <summary>
    /// The partial pressure's own row, from pO2 = (r − z)/(r₁ − z) · g(T₁)φ₁/(g(T)φ) · ratio · pO2ref(T₁, P₁), with 1 the point.
    /// </summary>
    private static Status FillPartialPressure(
        ProbeCalibration calibration,
        ReadingConditions conditions,
        double temperatureCelsius,
        double pressureHectopascal,
        double partialPressure,
        RangeRule rule,
        Reading reading)
    {
        IProbeModel model = calibration.Model;
        Status status = model.GainPerKelvin(temperatureCelsius, out double gainPerKelvin);
        if (status != Status.Ok) { return status; }
        status = model.GainPerCoefficient(temperatureCelsius, out double gainPerCoefficient);
        if (status != Status.Ok) { return status; }
        status = model.ResponsePerSignal(temperatureCelsius, pressureHectopascal, rule, out double responsePerSignal);
        if (double.IsNaN(responsePerSignal)) { return status; }
        status = model.Gain(temperatureCelsius, rule, out double gain);
        if (double.IsNaN(gain)) { return status; }
        double responsePerHectopascal = calibration.Slope * conditions.FlowFactor * gain;
        // The partial pressure was computed with this same product, so it is not zero; a created calibration has a positive span.
        if (responsePerHectopascal <= 0.0 || calibration.ResponseSpan <= 0.0) { return Status.SlopeBelowRange; }

        double perResponse = 1.0 / responsePerHectopascal;
        double perPoint = partialPressure / calibration.ResponseSpan;
        double perKelvinAtPoint = partialPressure * calibration.PerKelvinAtPoint;
        double perKelvinAtReading = -partialPressure * gainPerKelvin;
        CalibrationPoint point = calibration.Point;
        double offset = conditions.HasSameThermometer ? calibration.ThermometerOffsetUncertaintyKelvin : 0.0;
        double temperatureAtPoint = conditions.HasSameThermometer
            ? point.TemperatureUncertaintyKelvin
            : RootSumSquare(point.TemperatureUncertaintyKelvin, calibration.ThermometerOffsetUncertaintyKelvin);

        Put(reading, UncertaintySource.ThermometerOffset, (perKelvinAtPoint + perKelvinAtReading) * offset);
        Put(reading, UncertaintySource.TemperatureAtCalibration, perKelvinAtPoint * temperatureAtPoint);
        Put(reading, UncertaintySource.TemperatureAtReading, perKelvinAtReading * IndependentTemperature(conditions));
        Put(reading, UncertaintySource.PressureAtCalibration, partialPressure * calibration.PerHectopascalAtPoint * point.PressureUncertaintyHectopascal);
        Put(reading, UncertaintySource.PressureAtReading, 0.0);
        Put(reading, UncertaintySource.SalinityAtReading, 0.0);
        Put(reading, UncertaintySource.Equation, 0.0);
        Put(reading, UncertaintySource.SignalAtCalibration, -perPoint * calibration.PointResponseUncertainty);
        Put(reading, UncertaintySource.SignalAtReading, perResponse * responsePerSignal * conditions.SignalUncertainty);
        Put(reading, UncertaintySource.Zero, (perPoint - perResponse) * calibration.ZeroResponseUncertainty);
        Put(
            reading,
            UncertaintySource.TemperatureCoefficient,
            partialPressure * (calibration.PerCoefficientAtPoint - gainPerCoefficient) * calibration.TemperatureCoefficientUncertainty);
        Put(reading, UncertaintySource.AirToWaterRatio, partialPressure * point.AirToWaterRatioUncertainty);
        Put(reading, UncertaintySource.ReferenceState, partialPressure * point.ReferenceStateUncertainty);
        Put(reading, UncertaintySource.Stirring, -partialPressure * conditions.StirringUncertainty);
        reading.Combine(ReadingQuantity.PartialPressure);
        return double.IsNaN(reading.StandardUncertainty(ReadingQuantity.PartialPressure)) ? Status.UncertaintyAboveRange : Status.Ok;
    }

    private static void FillConcentrations(
        ReadingConditions conditions,
        double temperatureCelsius,
        double pressureHectopascal,
        double salinity,
        double partialPressure,
        double offset,
        double temperature,
        RangeRule rule,
        Reading reading)
    {
        double concentrationPressure = Correction.PressureForConcentration(pressureHectopascal);
        double pressure = concentrationPressure == pressureHectopascal
            ? conditions.PressureUncertaintyHectopascal
            : UnknownPressureHectopascal;
        OxygenEquilibrium.ConcentrationSensitivities(
            conditions.Equation, temperatureCelsius, salinity, concentrationPressure, partialPressure, rule,
            out double perKelvin, out double perSalinity, out double perHectopascal, out double perPartialPressure);
        // Near the edge of the equation's range this grows with the distance outside.
        GasUncertainty.EquationRelative(
            Gas.Oxygen, conditions.Equation, temperatureCelsius, salinity, concentrationPressure, rule, out double equation);
        double milligrams = reading.Value(ReadingQuantity.MilligramsPerLitre);
        FillQuantity(
            reading, ReadingQuantity.MilligramsPerLitre, perPartialPressure, perKelvin * offset, perKelvin * temperature,
            perHectopascal * pressure, perSalinity * conditions.SalinityUncertainty, milligrams * equation);

        double micromoles = OxygenUnits.MicromolesPerLitreFromMilligramsPerLitre(1.0);
        FillQuantity(
            reading, ReadingQuantity.MicromolesPerLitre, perPartialPressure * micromoles, perKelvin * offset * micromoles,
            perKelvin * temperature * micromoles, perHectopascal * pressure * micromoles,
            perSalinity * conditions.SalinityUncertainty * micromoles, milligrams * equation * micromoles);

        DensityEos80.Density(temperatureCelsius, salinity, rule, out double density);
        DensityEos80.Sensitivities(temperatureCelsius, salinity, rule, out double densityPerKelvin, out double densityPerSalinity);
        OxygenUnits.MicromolesPerKilogramFromMilligramsPerLitre(1.0, density, out double perKilogram);
        // A density that refuses gave NaN above; the quantity then has no value and no uncertainty.
        double byDensity = double.IsNaN(perKilogram) ? double.NaN : milligrams / density;
        FillQuantity(
            reading, ReadingQuantity.MicromolesPerKilogram, perPartialPressure * perKilogram,
            (perKelvin - (byDensity * densityPerKelvin)) * offset * perKilogram,
            (perKelvin - (byDensity * densityPerKelvin)) * temperature * perKilogram,
            perHectopascal * pressure * perKilogram,
            (perSalinity - (byDensity * densityPerSalinity)) * conditions.SalinityUncertainty * perKilogram,
            milligrams * equation * perKilogram);
    }

    /// <summary>
    /// A quantity that follows from pO2: each contribution to pO2 times the quantity's share, plus what T, P, S and the equation
    /// add directly (already multiplied by their standard uncertainties).
    /// </summary>
    private static void FillQuantity(
        Reading reading,
        ReadingQuantity quantity,
        double perPartialPressure,
        double directOffset,
        double directTemperature,
        double directPressure,
        double directSalinity,
        double directEquation)
    {
        if (double.IsNaN(reading.Value(quantity))) { return; }
        for (int i = 0; i < Reading.SourceCount; i++)
        {
            double value = perPartialPressure * reading.Contribution((UncertaintySource)i, ReadingQuantity.PartialPressure);
            switch ((UncertaintySource)i)
            {
                case UncertaintySource.ThermometerOffset: value += directOffset; break;
                case UncertaintySource.TemperatureAtReading: value += directTemperature; break;
                case UncertaintySource.PressureAtReading: value += directPressure; break;
                case UncertaintySource.SalinityAtReading: value += directSalinity; break;
                case UncertaintySource.Equation: value += directEquation; break;
                default: break;
            }

            reading.SetContribution((UncertaintySource)i, quantity, value);
        }

        reading.Combine(quantity);
    }

    private static double IndependentTemperature(ReadingConditions conditions)
    {
        return conditions.HasSameThermometer
            ? conditions.TemperatureUncertaintyKelvin
            : RootSumSquare(conditions.TemperatureUncertaintyKelvin, conditions.ThermometerOffsetUncertaintyKelvin);
    }

    private static double RootSumSquare(double first, double second)
    {
        return Numerics.Sqrt((first * first) + (second * second));
    }

    private static void Put(Reading reading, UncertaintySource source, double value)
    {
        reading.SetContribution(source, ReadingQuantity.PartialPressure, value);
    }
}
