namespace ProbeCal;

/// <summary>What a meter should show at a calibration point, for a person who sets it by hand.</summary>
public static class MeterSetting
{
    /// <summary>The value to set in the meter, and how sure it is.</summary>
    /// <remarks>
    /// What the meter showed does not enter; neither does the membrane, except where a temperature is set by hand, so that the
    /// meter compensates at another temperature than the water's. A meter with its own thermometer computes with
    /// the same wrong temperature as the reference: the error of the value is then that of the concentration, about 2 %/K.
    /// </remarks>
    /// <param name="meter">The meter and its settings.</param>
    /// <param name="point">The point; its signal is not used.</param>
    /// <param name="thermometerOffsetUncertaintyKelvin">Standard uncertainty of the thermometer's offset, K.</param>
    /// <param name="shown">The value the meter should show, mg/L or %; NaN unless Ok.</param>
    /// <param name="standardUncertainty">Its standard uncertainty (k = 1), same unit; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status ValueToSet(
        MeterDisplay meter,
        CalibrationPoint point,
        double thermometerOffsetUncertaintyKelvin,
        out double shown,
        out double standardUncertainty)
    {
        shown = double.NaN;
        standardUncertainty = double.NaN;
        double temperature = point.TemperatureCelsius;
        double pressure = point.PressureHectopascal;
        Status status = CheckPoint(point, thermometerOffsetUncertaintyKelvin);
        if (status != Status.Ok) { return status; }
        status = OxygenEquilibrium.PartialPressure(temperature, pressure, RangeRule.Refuse, out double reference);
        if (status != Status.Ok) { return status; }
        if (reference <= 0.0) { return Status.PressureBelowRange; }
        status = OxygenEquilibrium.PartialPressureSensitivities(
            temperature, pressure, RangeRule.Refuse, out double referencePerKelvin, out double referencePerHectopascal);
        if (status != Status.Ok) { return status; }
        status = meter.Gain(temperature, RangeRule.Refuse, out double gain);
        if (status != Status.Ok) { return status; }
        status = LogScaleSensitivities(meter, temperature, pressure, out double scalePerKelvin, out double scalePerHectopascal);
        if (status != Status.Ok) { return status; }
        // In air the probe gives the air-to-water ratio times what it gives in water of the same partial pressure.
        double response = reference * gain * point.FlowFactor * point.AirToWaterRatio;
        status = meter.Signal(response, temperature, pressure, 0.0, RangeRule.Refuse, out double value);
        if (status != Status.Ok) { return status; }
        double equation = 0.0;
        if (meter.Scale == MeterScale.MilligramsPerLitre)
        {
            status = OxygenUncertainty.EquationRelative(meter.Equation, meter.SalinitySet, RangeRule.Refuse, out equation);
            if (status != Status.Ok) { return status; }
        }

        double perKelvin = (referencePerKelvin / reference) - scalePerKelvin;
        double squares = Square(perKelvin * thermometerOffsetUncertaintyKelvin)
            + Square(perKelvin * point.TemperatureUncertaintyKelvin)
            + Square(((referencePerHectopascal / reference) - scalePerHectopascal) * point.PressureUncertaintyHectopascal)
            + Square(point.ReferenceStateUncertainty)
            + Square(point.AirToWaterRatioUncertainty)
            + Square(equation);
        double uncertainty = value * Numerics.Sqrt(squares);
        if (InputCheck.NotFinite(uncertainty)) { return Status.UncertaintyAboveRange; }
        shown = value;
        standardUncertainty = uncertainty;
        return Status.Ok;
    }

    /// <summary>d ln(hPa per shown unit) by the temperature and pressure of the water; with the membrane's own where the meter has no thermometer.</summary>
    private static Status LogScaleSensitivities(
        MeterDisplay meter,
        double temperatureCelsius,
        double pressureHectopascal,
        out double perKelvin,
        out double perHectopascal)
    {
        perKelvin = 0.0;
        perHectopascal = 0.0;
        bool ownThermometer = double.IsNaN(meter.TemperatureSetCelsius);
        bool ownBarometer = double.IsNaN(meter.PressureSetHectopascal);
        if (!ownThermometer)
        {
            Status ofGain = meter.GainPerKelvin(temperatureCelsius, out double gainPerKelvin);
            if (ofGain != Status.Ok) { return ofGain; }
            perKelvin = -gainPerKelvin;
        }

        double temperature = ownThermometer ? temperatureCelsius : meter.TemperatureSetCelsius;
        double pressure = ownBarometer ? pressureHectopascal : meter.PressureSetHectopascal;
        Status status;
        double scale;
        double scalePerKelvin;
        double scalePerHectopascal = 0.0;
        switch (meter.Scale)
        {
            case MeterScale.MilligramsPerLitre:
                status = OxygenEquilibrium.PartialPressureFromConcentration(
                    meter.Equation, temperature, meter.SalinitySet, pressure, 1.0, RangeRule.Refuse, out scale);
                if (status != Status.Ok) { return status; }
                status = OxygenEquilibrium.PartialPressureFromConcentrationSensitivities(
                    meter.Equation, temperature, meter.SalinitySet, pressure, 1.0, RangeRule.Refuse,
                    out scalePerKelvin, out double _, out scalePerHectopascal, out double _);
                break;
            case MeterScale.PercentLocal:
                status = OxygenEquilibrium.PartialPressure(temperature, pressure, RangeRule.Refuse, out scale);
                if (status != Status.Ok) { return status; }
                status = OxygenEquilibrium.PartialPressureSensitivities(
                    temperature, pressure, RangeRule.Refuse, out scalePerKelvin, out scalePerHectopascal);
                break;
            case MeterScale.PercentOneAtmosphere:
                status = OxygenEquilibrium.PartialPressure(temperature, PressureUnits.HectopascalPerAtmosphere, RangeRule.Refuse, out scale);
                if (status != Status.Ok) { return status; }
                status = OxygenEquilibrium.PartialPressureSensitivities(
                    temperature, PressureUnits.HectopascalPerAtmosphere, RangeRule.Refuse, out scalePerKelvin, out double _);
                break;
            default:
                return Status.CoefficientUnknown;
        }

        if (status != Status.Ok) { return status; }
        if (scale <= 0.0) { return Status.PressureBelowRange; }
        if (ownThermometer) { perKelvin = scalePerKelvin / scale; }
        if (ownBarometer) { perHectopascal = scalePerHectopascal / scale; }
        return Status.Ok;
    }

    private static Status CheckPoint(CalibrationPoint point, double thermometerOffset)
    {
        if (InputCheck.NotFinite(point.FlowFactor) || InputCheck.NotFinite(point.AirToWaterRatio)) { return Status.CoefficientNotFinite; }
        if (point.FlowFactor <= 0.0 || point.AirToWaterRatio <= 0.0) { return Status.CoefficientBelowRange; }
        Status status = InputCheck.Graver(InputCheck.Uncertainty(thermometerOffset), InputCheck.Uncertainty(point.TemperatureUncertaintyKelvin));
        status = InputCheck.Graver(status, InputCheck.Uncertainty(point.PressureUncertaintyHectopascal));
        status = InputCheck.Graver(status, InputCheck.Uncertainty(point.ReferenceStateUncertainty));
        return InputCheck.Graver(status, InputCheck.Uncertainty(point.AirToWaterRatioUncertainty));
    }

    private static double Square(double value)
    {
        return value * value;
    }
}
