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
    internal const double UnknownPressureHectopascal = 100.0;

    internal static Status Fill(
        ProbeCalibration calibration,
        ReadingConditions conditions,
        double signal,
        double temperatureCelsius,
        double pressureHectopascal,
        double salinity,
        double hydrostaticDecibar,
        double partialPressure,
        double surface,
        double share,
        double surfacePerKelvin,
        RangeRule rule,
        RangeRule concentrationRule,
        Reading reading)
    {
        Status status = FillPartialPressure(
            calibration, conditions, signal, temperatureCelsius, pressureHectopascal, hydrostaticDecibar, partialPressure, rule, reading);
        if (status != Status.Ok) { return status; }
        if (calibration.IsTotalPressure || calibration.Gas != Gas.Oxygen)
        {
            GasReading.FillUncertainty(
                calibration, conditions, temperatureCelsius, pressureHectopascal, salinity, surface, share, surfacePerKelvin, rule, concentrationRule, reading);
            return Status.Ok;
        }

        double offset = conditions.HasSameThermometer ? calibration.ThermometerOffsetUncertaintyKelvin : 0.0;
        double temperature = IndependentTemperature(conditions);
        FillConcentrations(
            conditions, temperatureCelsius, pressureHectopascal, salinity, surface, share, surfacePerKelvin, offset, temperature, concentrationRule, reading);

        Saturation.PercentLocalSensitivities(
            surface, temperatureCelsius, pressureHectopascal, rule,
            out double perPartialPressure, out double perKelvin, out double perHectopascal);
        perKelvin = WithSurface(perKelvin, perPartialPressure, surfacePerKelvin);
        FillQuantity(
            reading, ReadingQuantity.PercentLocal, perPartialPressure * share, perKelvin * offset, perKelvin * temperature,
            perHectopascal * conditions.PressureUncertaintyHectopascal, 0.0, 0.0);
        Saturation.PercentOneAtmosphereSensitivities(
            surface, temperatureCelsius, rule, out perPartialPressure, out perKelvin);
        perKelvin = WithSurface(perKelvin, perPartialPressure, surfacePerKelvin);
        FillQuantity(
            reading, ReadingQuantity.PercentOneAtmosphere, perPartialPressure * share, perKelvin * offset, perKelvin * temperature, 0.0, 0.0, 0.0);
        return Status.Ok;
    }

    /// <summary>
    /// The partial pressure's own row, from pO2 = (r − z)/(r₁ − z) · g(T₁)φ₁/(g(T)φ) · ratio · pO2ref(T₁, P₁), with 1 the point. For a fit
    /// from r = z + gφ(s·x + c·x²), x = p or log10 p.
    /// </summary>
    internal static Status FillPartialPressure(
        ProbeCalibration calibration,
        ReadingConditions conditions,
        double signal,
        double temperatureCelsius,
        double pressureHectopascal,
        double hydrostaticDecibar,
        double partialPressure,
        RangeRule rule,
        Reading reading)
    {
        Status status = conditions.Check();
        if (status != Status.Ok) { return status; }
        IProbeModel model = calibration.Model;
        status = model.GainPerKelvin(temperatureCelsius, out double gainPerKelvin);
        if (status != Status.Ok) { return status; }
        status = model.GainPerCoefficient(temperatureCelsius, out double gainPerCoefficient);
        if (status != Status.Ok) { return status; }
        status = model.ResponsePerSignal(signal, temperatureCelsius, pressureHectopascal, hydrostaticDecibar, rule, out double responsePerSignal);
        if (double.IsNaN(responsePerSignal)) { return status; }
        status = model.Gain(temperatureCelsius, rule, out double gain);
        if (double.IsNaN(gain)) { return status; }
        status = model.ResponsePerKelvin(signal, temperatureCelsius, hydrostaticDecibar, out double responsePerKelvin);
        if (status != Status.Ok) { return status; }
        for (int i = 0; i < Reading.SourceCount; i++) { Put(reading, (UncertaintySource)i, 0.0); }
        FittedResponse? fit = calibration.Fitted;
        CalibrationPoint? point = calibration.Point;
        if (fit != null || point == null)
        {
            return fit == null
                ? Status.PointsBelowRange
                : FillOfFit(
                    calibration, fit, conditions, partialPressure, gain, gainPerKelvin, gainPerCoefficient, responsePerSignal, responsePerKelvin, reading);
        }

        double responsePerHectopascal = calibration.Slope * conditions.FlowFactor * gain;
        // The partial pressure was computed with this same product, so it is not zero; a created calibration has a positive span.
        if (responsePerHectopascal <= 0.0 || calibration.ResponseSpan <= 0.0) { return Status.SlopeBelowRange; }

        double perResponse = 1.0 / responsePerHectopascal;
        double perPoint = partialPressure / calibration.ResponseSpan;
        double perKelvinAtPoint = partialPressure * calibration.PerKelvinAtPoint;
        double perKelvinAtReading = -partialPressure * gainPerKelvin;
        double perKelvinOfZero = 0.0;
        // A membrane's responses do not know the temperature; kept apart so that its bits stay.
        if (responsePerKelvin != 0.0 || calibration.PointResponsePerKelvin != 0.0 || calibration.ZeroResponsePerKelvin != 0.0)
        {
            perKelvinAtReading += perResponse * responsePerKelvin;
            perKelvinAtPoint -= perPoint * calibration.PointResponsePerKelvin;
            perKelvinOfZero = (perPoint - perResponse) * calibration.ZeroResponsePerKelvin;
        }

        double offset = conditions.HasSameThermometer ? calibration.ThermometerOffsetUncertaintyKelvin : 0.0;
        double atPoint = perKelvinAtPoint * point.TemperatureUncertaintyKelvin;
        if (!conditions.HasSameThermometer)
        {
            // The offset of the calibration's thermometer was in point and zero alike.
            atPoint = perKelvinOfZero == 0.0
                ? perKelvinAtPoint * RootSumSquare(point.TemperatureUncertaintyKelvin, calibration.ThermometerOffsetUncertaintyKelvin)
                : RootSumSquare(atPoint, (perKelvinAtPoint + perKelvinOfZero) * calibration.ThermometerOffsetUncertaintyKelvin);
        }

        double perOffset = perKelvinAtPoint + perKelvinAtReading;
        if (perKelvinOfZero != 0.0) { perOffset += perKelvinOfZero; }
        Put(reading, UncertaintySource.ThermometerOffset, perOffset * offset);
        Put(reading, UncertaintySource.TemperatureAtCalibration, atPoint);
        Put(reading, UncertaintySource.TemperatureAtReading, perKelvinAtReading * IndependentTemperature(conditions));
        Put(reading, UncertaintySource.PressureAtCalibration, partialPressure * calibration.PerHectopascalAtPoint * point.PressureUncertaintyHectopascal);
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
        return CombinePartialPressure(reading);
    }

    private static Status FillOfFit(
        ProbeCalibration calibration,
        FittedResponse fit,
        ReadingConditions conditions,
        double partialPressure,
        double gain,
        double gainPerKelvin,
        double gainPerCoefficient,
        double responsePerSignal,
        double responsePerKelvin,
        Reading reading)
    {
        Status status = ResponseCurve.Abscissa(partialPressure, calibration.Model.IsLogarithmic, out double x, out double perUnit);
        if (status != Status.Ok) { return status; }
        double scale = gain * conditions.FlowFactor;
        double responsePerUnit = scale * (fit.Slope + (2.0 * fit.Curvature * x));
        // Only at the turn of a curve, which no reading reaches.
        if (responsePerUnit == 0.0) { return Status.SlopeBelowRange; }
        double perResponse = perUnit / responsePerUnit;
        double perLogGain = -perResponse * scale * x * (fit.Slope + (fit.Curvature * x));
        double square = scale * x * x;
        double perKelvinAtPoint = -perResponse * (fit.ZeroPerKelvin + (scale * x * fit.SlopePerKelvin) + (square * fit.CurvaturePerKelvin));
        double perKelvinAtReading = (perLogGain * gainPerKelvin) + (perResponse * responsePerKelvin);
        double perCoefficientAtPoint = -perResponse
            * (fit.ZeroPerCoefficient + (scale * x * fit.SlopePerCoefficient) + (square * fit.CurvaturePerCoefficient));
        if (conditions.HasSameThermometer)
        {
            Put(reading, UncertaintySource.ThermometerOffset, (perKelvinAtPoint + perKelvinAtReading) * calibration.ThermometerOffsetUncertaintyKelvin);
        }
        else
        {
            Put(reading, UncertaintySource.TemperatureAtCalibration, perKelvinAtPoint * calibration.ThermometerOffsetUncertaintyKelvin);
        }

        Put(reading, UncertaintySource.TemperatureAtReading, perKelvinAtReading * IndependentTemperature(conditions));
        Put(reading, UncertaintySource.SignalAtReading, perResponse * responsePerSignal * conditions.SignalUncertainty);
        Put(
            reading,
            UncertaintySource.TemperatureCoefficient,
            (perCoefficientAtPoint + (perLogGain * gainPerCoefficient)) * calibration.TemperatureCoefficientUncertainty);
        Put(reading, UncertaintySource.Stirring, perLogGain * conditions.StirringUncertainty);
        // Variance of the curve at x. What rounding leaves below zero of a perfectly correlated fit is zero.
        double variance = fit.VarianceZero + (scale * x * scale * x * fit.VarianceSlope) + (square * square * fit.VarianceCurvature)
            + (2.0 * ((scale * x * fit.CovarianceZeroSlope) + (square * fit.CovarianceZeroCurvature) + (scale * x * square * fit.CovarianceSlopeCurvature)));
        Put(reading, UncertaintySource.Fit, variance <= 0.0 ? 0.0 : perResponse * Numerics.Sqrt(variance));
        return CombinePartialPressure(reading);
    }

    private static Status CombinePartialPressure(Reading reading)
    {
        reading.Combine(ReadingQuantity.PartialPressure);
        return double.IsNaN(reading.StandardUncertainty(ReadingQuantity.PartialPressure)) ? Status.UncertaintyAboveRange : Status.Ok;
    }

    /// <summary>A sensitivity to temperature with what depth adds to it; at the surface to the bit as it was.</summary>
    internal static double WithSurface(double perKelvin, double perPartialPressure, double surfacePerKelvin)
    {
        return surfacePerKelvin == 0.0 ? perKelvin : perKelvin + (perPartialPressure * surfacePerKelvin);
    }

    private static void FillConcentrations(
        ReadingConditions conditions,
        double temperatureCelsius,
        double pressureHectopascal,
        double salinity,
        double surface,
        double share,
        double surfacePerKelvin,
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
            conditions.Equation, temperatureCelsius, salinity, concentrationPressure, surface, rule,
            out double perKelvin, out double perSalinity, out double perHectopascal, out double perPartialPressure);
        perKelvin = WithSurface(perKelvin, perPartialPressure, surfacePerKelvin);
        perPartialPressure *= share;
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
    internal static void FillQuantity(
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

    internal static double IndependentTemperature(ReadingConditions conditions)
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
