namespace ProbeCal;

/// <summary>
/// Everything that a reading needs of a calibration: the probe, its slope and zero, the conditions of the point, their
/// uncertainties and the sensitivities at the point, from which the covariance of calibration and reading follows. Immutable,
/// made once when a calibration is loaded, safe to share between threads.
/// </summary>
/// <remarks>
/// It rests either on a 100 % point and a zero (<see cref="Create"/>) or on a fit through any number of points
/// (<see cref="CreateFitted"/>). The first is of oxygen, or of the total pressure for a total-gas probe; the second is of any gas, may be
/// curved or logarithmic, and knows the range of its points.
/// </remarks>
public sealed class ProbeCalibration
{
    private ProbeCalibration(
        IProbeModel model,
        Gas gas,
        CalibrationPoint? point,
        ZeroPoint? zero,
        FittedResponse? fitted,
        Stirring stirring,
        double flowFactor,
        double thermometerOffsetUncertaintyKelvin,
        double temperatureCoefficientUncertainty)
    {
        Model = model;
        Gas = gas;
        Point = point;
        Zero = zero;
        Fitted = fitted;
        Stirring = stirring;
        FlowFactor = flowFactor;
        LowestHectopascal = fitted == null ? double.NaN : fitted.LowestHectopascal;
        HighestHectopascal = fitted == null ? double.NaN : fitted.HighestHectopascal;
        ThermometerOffsetUncertaintyKelvin = thermometerOffsetUncertaintyKelvin;
        TemperatureCoefficientUncertainty = temperatureCoefficientUncertainty;
    }

    /// <summary>The probe.</summary>
    public IProbeModel Model { get; }

    /// <summary>The gas whose partial pressure the probe gives; without meaning for a total-gas probe.</summary>
    public Gas Gas { get; }

    /// <summary>True when the readings are total pressures of all dissolved gases.</summary>
    public bool IsTotalPressure
    {
        get { return Model.IsTotalPressure; }
    }

    /// <summary>The 100 % point; null for a fit.</summary>
    public CalibrationPoint? Point { get; }

    /// <summary>The zero, measured or assumed; null for a fit.</summary>
    public ZeroPoint? Zero { get; }

    /// <summary>The fit; null for a 100 % point and a zero.</summary>
    public FittedResponse? Fitted { get; }

    /// <summary>How the water moved at the calibration.</summary>
    public Stirring Stirring { get; }

    /// <summary>Flow factor at the calibration, 1 when stirred.</summary>
    public double FlowFactor { get; }

    /// <summary>True when the 100 % point was in air, which stands for stirred water by its air-to-water ratio.</summary>
    public bool IsAirPoint
    {
        get { return Point != null && Point.Method == CalibrationMethod.WaterSaturatedAir; }
    }

    /// <summary>Lowest partial pressure of the points of a fit, hPa; NaN for a 100 % point and a zero, which have no such range.</summary>
    public double LowestHectopascal { get; }

    /// <summary>Highest partial pressure of the points of a fit, hPa: a reading beyond is flagged. NaN for a 100 % point and a zero.</summary>
    public double HighestHectopascal { get; }

    /// <summary>
    /// Standard uncertainty of the offset of the thermometer used at the point, K. When readings use the same thermometer, the
    /// offset is common to both and largely cancels.
    /// </summary>
    public double ThermometerOffsetUncertaintyKelvin { get; }

    /// <summary>Standard uncertainty of the temperature coefficient, in the coefficient's unit.</summary>
    public double TemperatureCoefficientUncertainty { get; }

    /// <summary>Response per hPa at gain 1, flow 1, in water; per decade for a logarithmic probe, and at zero for a curve.</summary>
    public double Slope { get; private set; }

    /// <summary>Response in oxygen-free water; that at 1 hPa for a logarithmic probe.</summary>
    public double ZeroResponse { get; private set; }

    /// <summary>Standard uncertainty of <see cref="ZeroResponse"/>.</summary>
    public double ZeroResponseUncertainty { get; private set; }

    /// <summary>pO2 (or total pressure) of the reference at the point, hPa; NaN for a fit, as the other figures of the point below.</summary>
    public double ReferenceHectopascal { get; private set; } = double.NaN;

    /// <summary>Response at the point less <see cref="ZeroResponse"/>; positive.</summary>
    public double ResponseSpan { get; private set; } = double.NaN;

    /// <summary>Standard uncertainty of the response at the point.</summary>
    public double PointResponseUncertainty { get; private set; } = double.NaN;

    /// <summary>d ln pO2(reading)/d T(point), 1/K: the membrane's gain and the vapour in the reference together.</summary>
    public double PerKelvinAtPoint { get; private set; } = double.NaN;

    /// <summary>d ln pO2(reading)/d P(point), 1/hPa.</summary>
    public double PerHectopascalAtPoint { get; private set; } = double.NaN;

    /// <summary>d ln gain/d temperature coefficient at the point.</summary>
    public double PerCoefficientAtPoint { get; private set; } = double.NaN;

    /// <summary>d response/d T of the signal at the point, at constant signal; 0 for a membrane.</summary>
    internal double PointResponsePerKelvin { get; private set; }

    /// <summary>d response/d T of the signal at zero, at constant signal; 0 for a membrane.</summary>
    internal double ZeroResponsePerKelvin { get; private set; }

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
    /// <returns>
    /// The input at fault: nothing outside a fitted or published range makes a calibration. <see cref="Status.PointsBelowRange"/> for a
    /// logarithmic probe, which has no zero and takes a fit.
    /// </returns>
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
        if (model.IsLogarithmic) { return Status.PointsBelowRange; }
        ProbeCalibration made = new ProbeCalibration(
            model, Gas.Oxygen, point, zero, null, point.Stirring, point.FlowFactor, thermometerOffsetUncertaintyKelvin, temperatureCoefficientUncertainty);
        status = made.Fit(point, zero);
        if (status != Status.Ok) { return status; }
        calibration = made;
        return Status.Ok;
    }

    /// <summary>
    /// Judges a fit and makes the calibration. The same inputs give the same bits.
    /// </summary>
    /// <param name="model">The probe.</param>
    /// <param name="gas">The gas; without meaning for a total-gas probe.</param>
    /// <param name="fit">The fit through the points.</param>
    /// <param name="stirring">How the water moved at the points.</param>
    /// <param name="flowFactor">Flow factor at the points, 1 when stirred.</param>
    /// <param name="thermometerOffsetUncertaintyKelvin">Standard uncertainty of the offset of the thermometer used, K.</param>
    /// <param name="temperatureCoefficientUncertainty">Standard uncertainty of the temperature coefficient, in its unit.</param>
    /// <param name="calibration">The calibration; null unless Ok.</param>
    /// <returns>
    /// The input at fault; <see cref="Status.PointsDegenerate"/> for a range that is none or over which the curve turns round,
    /// <see cref="Status.PartialPressureBelowRange"/> for a logarithmic range that begins at zero or below,
    /// <see cref="Status.UncertaintyAboveRange"/> for covariances that their variances do not allow.
    /// </returns>
    public static Status CreateFitted(
        IProbeModel model,
        Gas gas,
        FittedResponse fit,
        Stirring stirring,
        double flowFactor,
        double thermometerOffsetUncertaintyKelvin,
        double temperatureCoefficientUncertainty,
        out ProbeCalibration? calibration)
    {
        calibration = null;
        if (!model.IsTotalPressure && !GasSolubility.Known(gas)) { return Status.GasUnknown; }
        Status status = InputCheck.Uncertainty(thermometerOffsetUncertaintyKelvin);
        if (status != Status.Ok) { return status; }
        status = InputCheck.Uncertainty(temperatureCoefficientUncertainty);
        if (status != Status.Ok) { return status; }
        if (InputCheck.NotFinite(flowFactor)) { return Status.CoefficientNotFinite; }
        if (flowFactor <= 0.0) { return Status.CoefficientBelowRange; }
        status = fit.Check(model.IsLogarithmic);
        if (status != Status.Ok) { return status; }
        ProbeCalibration made = new ProbeCalibration(
            model, gas, null, null, fit, stirring, flowFactor, thermometerOffsetUncertaintyKelvin, temperatureCoefficientUncertainty);
        made.Slope = fit.Slope;
        made.ZeroResponse = fit.Zero;
        made.ZeroResponseUncertainty = RootSumSquare(
            Numerics.Sqrt(fit.VarianceZero), fit.ZeroPerKelvin * thermometerOffsetUncertaintyKelvin, fit.ZeroPerCoefficient * temperatureCoefficientUncertainty);
        if (InputCheck.NotFinite(made.ZeroResponseUncertainty)) { return Status.UncertaintyAboveRange; }
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
        if (Point == null) { return SlopeContributionOfFit(source); }
        double perKelvin = -PerKelvinAtPoint;
        double perOffset = perKelvin;
        // A membrane's responses do not know the temperature; kept apart so that its bits stay. Create has found the span positive.
        if ((PointResponsePerKelvin != 0.0 || ZeroResponsePerKelvin != 0.0) && 0.0 < ResponseSpan)
        {
            perKelvin += PointResponsePerKelvin / ResponseSpan;
            perOffset += (PointResponsePerKelvin - ZeroResponsePerKelvin) / ResponseSpan;
        }

        switch (source)
        {
            case UncertaintySource.ThermometerOffset: return perOffset * ThermometerOffsetUncertaintyKelvin;
            case UncertaintySource.TemperatureAtCalibration: return perKelvin * Point.TemperatureUncertaintyKelvin;
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

    private double SlopeContributionOfFit(UncertaintySource source)
    {
        if (Fitted == null || Fitted.Slope == 0.0) { return 0.0; }
        switch (source)
        {
            case UncertaintySource.ThermometerOffset: return Fitted.SlopePerKelvin * ThermometerOffsetUncertaintyKelvin / Fitted.Slope;
            case UncertaintySource.TemperatureCoefficient: return Fitted.SlopePerCoefficient * TemperatureCoefficientUncertainty / Fitted.Slope;
            case UncertaintySource.Fit: return Numerics.Sqrt(Fitted.VarianceSlope) / Fitted.Slope;
            default: return 0.0;
        }
    }

    private Status Fit(CalibrationPoint point, ZeroPoint zero)
    {
        double temperature = point.TemperatureCelsius;
        double pressure = point.PressureHectopascal;
        Status status = Reference(temperature, pressure, out double reference, out double referencePerKelvin, out double referencePerHectopascal);
        if (status != Status.Ok) { return status; }
        status = Model.Response(point.Signal, temperature, pressure, 0.0, RangeRule.Refuse, out double response);
        if (status != Status.Ok) { return status; }
        status = Model.Response(zero.Signal, zero.TemperatureCelsius, zero.PressureHectopascal, 0.0, RangeRule.Refuse, out double zeroResponse);
        // A zero that is not finite is the zero's fault, not the point's.
        if (status == Status.SignalNotFinite) { return Status.ZeroNotFinite; }
        if (status != Status.Ok) { return status; }
        status = Model.Gain(temperature, RangeRule.Refuse, out double gain);
        if (status != Status.Ok) { return status; }
        status = CalibrationFit.Slope(response, zeroResponse, gain, point.FlowFactor, point.AirToWaterRatio, reference, out double slope);
        if (status != Status.Ok) { return status; }

        status = Model.ResponsePerSignal(point.Signal, temperature, pressure, 0.0, RangeRule.Refuse, out double pointScale);
        if (status != Status.Ok) { return status; }
        status = Model.ResponsePerSignal(zero.Signal, zero.TemperatureCelsius, zero.PressureHectopascal, 0.0, RangeRule.Refuse, out double zeroScale);
        if (status != Status.Ok) { return status; }
        status = Model.GainPerKelvin(temperature, out double gainPerKelvin);
        if (status != Status.Ok) { return status; }
        status = Model.GainPerCoefficient(temperature, out double gainPerCoefficient);
        if (status != Status.Ok) { return status; }
        status = Model.ResponsePerKelvin(point.Signal, temperature, 0.0, out double pointPerKelvin);
        if (status != Status.Ok) { return status; }
        status = Model.ResponsePerKelvin(zero.Signal, zero.TemperatureCelsius, 0.0, out double zeroPerKelvin);
        if (status != Status.Ok) { return status; }

        Slope = slope;
        ZeroResponse = zeroResponse;
        ZeroResponseUncertainty = Magnitude(zero.SignalUncertainty * zeroScale);
        ReferenceHectopascal = reference;
        ResponseSpan = response - zeroResponse;
        PointResponseUncertainty = Magnitude(point.SignalUncertainty * pointScale);
        // Slope has shown that the reference is positive.
        PerKelvinAtPoint = gainPerKelvin + (referencePerKelvin / reference);
        PerHectopascalAtPoint = referencePerHectopascal / reference;
        PerCoefficientAtPoint = gainPerCoefficient;
        PointResponsePerKelvin = pointPerKelvin;
        ZeroResponsePerKelvin = zeroPerKelvin;
        return Status.Ok;
    }

    /// <summary>What the probe answers to at the point: oxygen of saturated air, or the whole pressure.</summary>
    private Status Reference(double temperature, double pressure, out double hectopascal, out double perKelvin, out double perHectopascal)
    {
        if (Model.IsTotalPressure)
        {
            perKelvin = 0.0;
            perHectopascal = 1.0;
            hectopascal = pressure;
            return InputCheck.Pressure(pressure, BensonKrause1984.LowestHectopascal, BensonKrause1984.HighestHectopascal);
        }

        perKelvin = double.NaN;
        perHectopascal = double.NaN;
        Status status = OxygenEquilibrium.PartialPressure(temperature, pressure, RangeRule.Refuse, out hectopascal);
        return status != Status.Ok
            ? status
            : OxygenEquilibrium.PartialPressureSensitivities(temperature, pressure, RangeRule.Refuse, out perKelvin, out perHectopascal);
    }

    private static double RootSumSquare(double first, double second, double third)
    {
        return Numerics.Sqrt((first * first) + (second * second) + (third * third));
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
