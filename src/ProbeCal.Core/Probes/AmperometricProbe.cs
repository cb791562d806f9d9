namespace ProbeCal;

/// <summary>
/// An amperometric membrane probe, galvanic or polarographic: signal = zero + slope · flow · f(T) · pO2. The response is the
/// signal itself, in whatever unit the converter gives; the gain is the membrane's temperature factor.
/// </summary>
/// <remarks>
/// The current is that of the oxygen which diffuses through the membrane, driven by its partial pressure: salinity does not
/// enter. A slightly negative pO2 (zero offset in anoxic water) passes both ways and is never clipped.
/// </remarks>
public sealed class AmperometricProbe : IProbeModel
{
    /// <summary>Describes a probe. Values are judged where they are used, so that a bad one gives a status, not an exception.</summary>
    /// <param name="form">Form of the temperature coefficient.</param>
    /// <param name="coefficient">Temperature coefficient: 1/K, or J/mol for the Arrhenius form.</param>
    /// <param name="referenceCelsius">Temperature at which the factor is 1, °C.</param>
    /// <param name="lowestCelsius">Lower end of the fitted range, °C.</param>
    /// <param name="highestCelsius">Upper end of the fitted range, °C.</param>
    public AmperometricProbe(
        TemperatureCoefficientForm form,
        double coefficient,
        double referenceCelsius,
        double lowestCelsius,
        double highestCelsius)
    {
        Form = form;
        Coefficient = coefficient;
        ReferenceCelsius = referenceCelsius;
        LowestCelsius = lowestCelsius;
        HighestCelsius = highestCelsius;
    }

    /// <summary>Form of the temperature coefficient.</summary>
    public TemperatureCoefficientForm Form { get; }

    /// <summary>Temperature coefficient: 1/K, or J/mol for the Arrhenius form.</summary>
    public double Coefficient { get; }

    /// <summary>Temperature at which the factor is 1, °C.</summary>
    public double ReferenceCelsius { get; }

    /// <summary>Lower end of the fitted range, °C.</summary>
    public double LowestCelsius { get; }

    /// <summary>Upper end of the fitted range, °C.</summary>
    public double HighestCelsius { get; }

    /// <inheritdoc/>
    public bool CompensatesTemperature
    {
        get { return false; }
    }

    /// <summary>Partial pressure from a response: (response − zero)/(slope · flow · gain), hPa. The static path, without an object.</summary>
    /// <param name="response">Signal, in its unit.</param>
    /// <param name="zero">Response in oxygen-free water, same unit.</param>
    /// <param name="slope">Response per hPa at gain 1 and flow 1, positive.</param>
    /// <param name="flow">Flow factor, positive; 1 in stirred water.</param>
    /// <param name="gain">Temperature factor, positive.</param>
    /// <param name="partialPressureHectopascal">pO2, hPa, negative where the signal is beyond the zero; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status PartialPressure(
        double response,
        double zero,
        double slope,
        double flow,
        double gain,
        out double partialPressureHectopascal)
    {
        partialPressureHectopascal = double.NaN;
        if (InputCheck.NotFinite(response)) { return Status.SignalNotFinite; }
        Status status = CheckCoefficients(zero, slope, flow, gain);
        if (status != Status.Ok) { return status; }
        double perHectopascal = slope * flow * gain;
        if (perHectopascal == 0.0) { return Status.SlopeBelowRange; }
        if (double.IsInfinity(perHectopascal)) { return Status.SlopeAboveRange; }
        double value = (response - zero) / perHectopascal;
        if (InputCheck.NotFinite(value)) { return Status.SignalAboveRange; }
        partialPressureHectopascal = value;
        return Status.Ok;
    }

    /// <summary>The response to a partial pressure: zero + slope · flow · gain · pO2.</summary>
    /// <param name="partialPressureHectopascal">pO2, hPa; may be negative.</param>
    /// <param name="zero">Response in oxygen-free water.</param>
    /// <param name="slope">Response per hPa at gain 1 and flow 1, positive.</param>
    /// <param name="flow">Flow factor, positive.</param>
    /// <param name="gain">Temperature factor, positive.</param>
    /// <param name="response">The response; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status ResponseTo(
        double partialPressureHectopascal,
        double zero,
        double slope,
        double flow,
        double gain,
        out double response)
    {
        response = double.NaN;
        if (InputCheck.NotFinite(partialPressureHectopascal)) { return Status.PartialPressureNotFinite; }
        Status status = CheckCoefficients(zero, slope, flow, gain);
        if (status != Status.Ok) { return status; }
        double value = zero + (slope * flow * gain * partialPressureHectopascal);
        if (InputCheck.NotFinite(value)) { return Status.PartialPressureAboveRange; }
        response = value;
        return Status.Ok;
    }

    /// <inheritdoc/>
    public Status Response(double signal, double temperatureCelsius, double pressureHectopascal, RangeRule rule, out double response)
    {
        response = double.NaN;
        if (InputCheck.NotFinite(signal)) { return Status.SignalNotFinite; }
        response = signal;
        return Status.Ok;
    }

    /// <inheritdoc/>
    public Status Signal(double response, double temperatureCelsius, double pressureHectopascal, RangeRule rule, out double signal)
    {
        return Response(response, temperatureCelsius, pressureHectopascal, rule, out signal);
    }

    /// <inheritdoc/>
    public Status ResponsePerSignal(double temperatureCelsius, double pressureHectopascal, RangeRule rule, out double responsePerSignal)
    {
        responsePerSignal = 1.0;
        return Status.Ok;
    }

    /// <inheritdoc/>
    public Status Gain(double temperatureCelsius, RangeRule rule, out double gain)
    {
        return TemperatureCoefficient.Factor(
            Form, Coefficient, ReferenceCelsius, LowestCelsius, HighestCelsius, temperatureCelsius, rule, out gain);
    }

    /// <inheritdoc/>
    public Status GainPerKelvin(double temperatureCelsius, out double perKelvin)
    {
        return TemperatureCoefficient.LogDerivative(Form, Coefficient, ReferenceCelsius, temperatureCelsius, out perKelvin);
    }

    /// <inheritdoc/>
    public Status GainPerCoefficient(double temperatureCelsius, out double perCoefficient)
    {
        return TemperatureCoefficient.CoefficientDerivative(Form, Coefficient, ReferenceCelsius, temperatureCelsius, out perCoefficient);
    }

    private static Status CheckCoefficients(double zero, double slope, double flow, double gain)
    {
        if (InputCheck.NotFinite(zero)) { return Status.ZeroNotFinite; }
        if (InputCheck.NotFinite(slope)) { return Status.SlopeNotFinite; }
        if (slope <= 0.0) { return Status.SlopeBelowRange; }
        if (InputCheck.NotFinite(flow)) { return Status.CoefficientNotFinite; }
        if (InputCheck.NotFinite(gain)) { return Status.CoefficientNotFinite; }
        if (flow <= 0.0 || gain <= 0.0) { return Status.CoefficientBelowRange; }
        return Status.Ok;
    }
}
