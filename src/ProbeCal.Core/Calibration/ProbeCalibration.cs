namespace ProbeCal;

/// <summary>
/// Everything that a reading needs of a calibration: the probe, its slope and zero, the conditions of the point, their
/// uncertainties and the sensitivities at the point, from which the covariance of calibration and reading follows. Immutable,
/// made once when a calibration is loaded, safe to share between threads.
/// </summary>
public sealed class ProbeCalibration
{
    private ProbeCalibration(
        IProbeModel model,
        CalibrationPoint point,
        ZeroPoint zero,
        double thermometerOffsetUncertaintyKelvin,
        double temperatureCoefficientUncertainty)
    {
        Model = model;
        Point = point;
        Zero = zero;
        ThermometerOffsetUncertaintyKelvin = thermometerOffsetUncertaintyKelvin;
        TemperatureCoefficientUncertainty = temperatureCoefficientUncertainty;
    }

    /// <summary>The probe.</summary>
    public IProbeModel Model { get; }

    /// <summary>The 100 % point.</summary>
    public CalibrationPoint Point { get; }

    /// <summary>The zero, measured or assumed.</summary>
    public ZeroPoint Zero { get; }

    /// <summary>
    /// Standard uncertainty of the offset of the thermometer used at the point, K. When readings use the same thermometer, the
    /// offset is common to both and largely cancels.
    /// </summary>
    public double ThermometerOffsetUncertaintyKelvin { get; }

    /// <summary>Standard uncertainty of the temperature coefficient, in the coefficient's unit.</summary>
    public double TemperatureCoefficientUncertainty { get; }

    /// <summary>Response per hPa at gain 1, flow 1, in water.</summary>
    public double Slope { get; private set; }

    /// <summary>Response in oxygen-free water.</summary>
    public double ZeroResponse { get; private set; }

    /// <summary>Standard uncertainty of <see cref="ZeroResponse"/>.</summary>
    public double ZeroResponseUncertainty { get; private set; }

    /// <summary>pO2 of the reference at the point, hPa.</summary>
    public double ReferenceHectopascal { get; private set; }

    /// <summary>Response at the point less <see cref="ZeroResponse"/>; positive.</summary>
    public double ResponseSpan { get; private set; }

    /// <summary>Standard uncertainty of the response at the point.</summary>
    public double PointResponseUncertainty { get; private set; }

    /// <summary>d ln pO2(reading)/d T(point), 1/K: the membrane's gain and the vapour in the reference together.</summary>
    public double PerKelvinAtPoint { get; private set; }

    /// <summary>d ln pO2(reading)/d P(point), 1/hPa.</summary>
    public double PerHectopascalAtPoint { get; private set; }

    /// <summary>d ln gain/d temperature coefficient at the point.</summary>
    public double PerCoefficientAtPoint { get; private set; }

    /// <summary>
    /// Judges a point and a zero and makes the calibration. The same inputs give the same bits, so a stored record is
    /// brought back by this very call.
    /// </summary>
    /// <param name="model">The probe.</param>
    /// <param name="point">The 100 % point.</param>
    /// <param name="zero">The zero, measured or assumed.</param>
    /// <param name="thermometerOffsetUncertaintyKelvin">Standard uncertainty of the offset of the thermometer used, K.</param>
    /// <param name="temperatureCoefficientUncertainty">Standard uncertainty of the temperature coefficient, in its unit.</param>
    /// <param name="calibration">The calibration; null unless Ok.</param>
    /// <returns>The input at fault: nothing outside a fitted or published range makes a calibration.</returns>
    public static Status Create(
        IProbeModel model,
        CalibrationPoint point,
        ZeroPoint zero,
        double thermometerOffsetUncertaintyKelvin,
        double temperatureCoefficientUncertainty,
        out ProbeCalibration? calibration)
    {
        calibration = null;
        Status status = CheckUncertainties(point, zero, thermometerOffsetUncertaintyKelvin, temperatureCoefficientUncertainty);
        if (status != Status.Ok) { return status; }
        ProbeCalibration made = new ProbeCalibration(
            model, point, zero, thermometerOffsetUncertaintyKelvin, temperatureCoefficientUncertainty);
        status = made.Fit();
        if (status != Status.Ok) { return status; }
        calibration = made;
        return Status.Ok;
    }

    /// <summary>
    /// One contribution to the relative uncertainty of <see cref="Slope"/>: relative sensitivity times standard uncertainty,
    /// signed. The squares of all add up to that of <see cref="SlopeRelativeUncertainty"/>. The slope of a meter with its own
    /// thermometer is that at the temperature of the point, so its temperature coefficient adds nothing.
    /// </summary>
    /// <param name="source">Which contribution; 0 for those that belong to a reading.</param>
    public double SlopeContribution(UncertaintySource source)
    {
        switch (source)
        {
            case UncertaintySource.ThermometerOffset: return -PerKelvinAtPoint * ThermometerOffsetUncertaintyKelvin;
            case UncertaintySource.TemperatureAtCalibration: return -PerKelvinAtPoint * Point.TemperatureUncertaintyKelvin;
            case UncertaintySource.PressureAtCalibration: return -PerHectopascalAtPoint * Point.PressureUncertaintyHectopascal;
            case UncertaintySource.SignalAtCalibration: return PointResponseUncertainty / ResponseSpan;
            case UncertaintySource.Zero: return -ZeroResponseUncertainty / ResponseSpan;
            case UncertaintySource.TemperatureCoefficient: return Model.CompensatesTemperature ? 0.0 : -PerCoefficientAtPoint * TemperatureCoefficientUncertainty;
            case UncertaintySource.AirToWaterRatio: return -Point.AirToWaterRatioUncertainty;
            case UncertaintySource.ReferenceState: return -Point.ReferenceStateUncertainty;
            default: return 0.0;
        }
    }

    /// <summary>Combined standard uncertainty of <see cref="Slope"/>, relative.</summary>
    public double SlopeRelativeUncertainty()
    {
        double squares = 0.0;
        for (int i = 0; i < Reading.SourceCount; i++)
        {
            double contribution = SlopeContribution((UncertaintySource)i);
            squares += contribution * contribution;
        }

        return Numerics.Sqrt(squares);
    }

    private Status Fit()
    {
        double temperature = Point.TemperatureCelsius;
        double pressure = Point.PressureHectopascal;
        Status status = OxygenEquilibrium.PartialPressure(temperature, pressure, RangeRule.Refuse, out double reference);
        if (status != Status.Ok) { return status; }
        status = Model.Response(Point.Signal, temperature, pressure, RangeRule.Refuse, out double response);
        if (status != Status.Ok) { return status; }
        status = Model.Response(Zero.Signal, Zero.TemperatureCelsius, Zero.PressureHectopascal, RangeRule.Refuse, out double zeroResponse);
        // A zero that is not finite is the zero's fault, not the point's.
        if (status == Status.SignalNotFinite) { return Status.ZeroNotFinite; }
        if (status != Status.Ok) { return status; }
        status = Model.Gain(temperature, RangeRule.Refuse, out double gain);
        if (status != Status.Ok) { return status; }
        status = CalibrationFit.Slope(response, zeroResponse, gain, Point.FlowFactor, Point.AirToWaterRatio, reference, out double slope);
        if (status != Status.Ok) { return status; }

        status = Model.ResponsePerSignal(temperature, pressure, RangeRule.Refuse, out double pointScale);
        if (status != Status.Ok) { return status; }
        status = Model.ResponsePerSignal(Zero.TemperatureCelsius, Zero.PressureHectopascal, RangeRule.Refuse, out double zeroScale);
        if (status != Status.Ok) { return status; }
        status = Model.GainPerKelvin(temperature, out double gainPerKelvin);
        if (status != Status.Ok) { return status; }
        status = Model.GainPerCoefficient(temperature, out double gainPerCoefficient);
        if (status != Status.Ok) { return status; }
        status = OxygenEquilibrium.PartialPressureSensitivities(
            temperature, pressure, RangeRule.Refuse, out double referencePerKelvin, out double referencePerHectopascal);
        if (status != Status.Ok) { return status; }

        Slope = slope;
        ZeroResponse = zeroResponse;
        ZeroResponseUncertainty = Magnitude(Zero.SignalUncertainty * zeroScale);
        ReferenceHectopascal = reference;
        ResponseSpan = response - zeroResponse;
        PointResponseUncertainty = Magnitude(Point.SignalUncertainty * pointScale);
        // Slope has shown that the reference is positive.
        PerKelvinAtPoint = gainPerKelvin + (referencePerKelvin / reference);
        PerHectopascalAtPoint = referencePerHectopascal / reference;
        PerCoefficientAtPoint = gainPerCoefficient;
        return Status.Ok;
    }

    private static Status CheckUncertainties(CalibrationPoint point, ZeroPoint zero, double thermometerOffset, double coefficient)
    {
        Status status = InputCheck.Uncertainty(point.SignalUncertainty);
        if (status != Status.Ok) { return status; }
        status = InputCheck.Uncertainty(point.TemperatureUncertaintyKelvin);
        if (status != Status.Ok) { return status; }
        status = InputCheck.Uncertainty(point.PressureUncertaintyHectopascal);
        if (status != Status.Ok) { return status; }
        status = InputCheck.Uncertainty(point.AirToWaterRatioUncertainty);
        if (status != Status.Ok) { return status; }
        status = InputCheck.Uncertainty(point.ReferenceStateUncertainty);
        if (status != Status.Ok) { return status; }
        status = InputCheck.Uncertainty(zero.SignalUncertainty);
        if (status != Status.Ok) { return status; }
        status = InputCheck.Uncertainty(thermometerOffset);
        return status != Status.Ok ? status : InputCheck.Uncertainty(coefficient);
    }

    private static double Magnitude(double value)
    {
        return value < 0.0 ? -value : value;
    }
}
