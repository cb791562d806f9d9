namespace ProbeCal;

/// <summary>
/// An amperometric membrane probe, galvanic or polarographic: signal = residual · h(T) + (1 + k·P/100 dbar) · (zero + slope · flow · f(T) · p).
/// The response is the signal, in whatever unit the converter gives, less the characterised residual and brought to the surface;
/// the gain is the membrane's temperature factor f.
/// </summary>
/// <remarks>
/// The current is that of the oxygen which diffuses through the membrane, driven by its partial pressure: salinity does not
/// enter. A slightly negative pO2 (zero offset in anoxic water) passes both ways and is never clipped. The residual current is what
/// flows without oxygen; most calibrations leave it to their zero, and only a characterised probe has one here, with its own
/// temperature factor h = exp(b·(T − Tref)). k is the relative change of the signal per 100 dbar of water above the probe at the same
/// partial pressure at the probe; what depth does to the partial pressure itself is <see cref="Enns1965"/>.
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
        : this(form, coefficient, 0.0, 0.0, referenceCelsius, lowestCelsius, highestCelsius, 0.0, 0.0, 0.0, 1.0)
    {
    }

    /// <summary>Describes a characterised probe.</summary>
    /// <param name="form">Form of the temperature coefficient.</param>
    /// <param name="coefficient">Temperature coefficient: 1/K, or J/mol for the Arrhenius form; c1 of a polynomial.</param>
    /// <param name="secondCoefficient">c2 of a polynomial, 1/K²; no other form looks at it.</param>
    /// <param name="thirdCoefficient">c3 of a polynomial, 1/K³; no other form looks at it.</param>
    /// <param name="referenceCelsius">Temperature at which both factors are 1, °C.</param>
    /// <param name="lowestCelsius">Lower end of the fitted range, °C.</param>
    /// <param name="highestCelsius">Upper end of the fitted range, °C.</param>
    /// <param name="pressureCoefficient">Relative change of the signal per 100 dbar of water above the probe; 0 for none.</param>
    /// <param name="residualSignal">Signal without oxygen at the reference temperature, in the signal's unit; 0 leaves it to the zero of the calibration.</param>
    /// <param name="residualPerKelvin">Temperature coefficient of the residual signal (exponential form), 1/K; 0 for a constant one.</param>
    /// <param name="stillFactor">Signal in still water over signal in stirred water; 1 when not known.</param>
    public AmperometricProbe(
        TemperatureCoefficientForm form,
        double coefficient,
        double secondCoefficient,
        double thirdCoefficient,
        double referenceCelsius,
        double lowestCelsius,
        double highestCelsius,
        double pressureCoefficient,
        double residualSignal,
        double residualPerKelvin,
        double stillFactor)
    {
        Form = form;
        Coefficient = coefficient;
        SecondCoefficient = secondCoefficient;
        ThirdCoefficient = thirdCoefficient;
        ReferenceCelsius = referenceCelsius;
        LowestCelsius = lowestCelsius;
        HighestCelsius = highestCelsius;
        PressureCoefficient = pressureCoefficient;
        ResidualSignal = residualSignal;
        ResidualPerKelvin = residualPerKelvin;
        StillFactor = stillFactor;
    }

    /// <summary>Form of the temperature coefficient.</summary>
    public TemperatureCoefficientForm Form { get; }

    /// <summary>Temperature coefficient: 1/K, or J/mol for the Arrhenius form.</summary>
    public double Coefficient { get; }

    /// <summary>c2 of a polynomial, 1/K².</summary>
    public double SecondCoefficient { get; }

    /// <summary>c3 of a polynomial, 1/K³.</summary>
    public double ThirdCoefficient { get; }

    /// <summary>Temperature at which the factor is 1, °C.</summary>
    public double ReferenceCelsius { get; }

    /// <summary>Lower end of the fitted range, °C.</summary>
    public double LowestCelsius { get; }

    /// <summary>Upper end of the fitted range, °C.</summary>
    public double HighestCelsius { get; }

    /// <summary>Relative change of the signal per 100 dbar.</summary>
    public double PressureCoefficient { get; }

    /// <summary>Signal without oxygen at the reference temperature.</summary>
    public double ResidualSignal { get; }

    /// <summary>Temperature coefficient of <see cref="ResidualSignal"/>, 1/K.</summary>
    public double ResidualPerKelvin { get; }

    /// <summary>Signal in still water over signal in stirred water, for the flow factor of readings in still water.</summary>
    public double StillFactor { get; }

    /// <inheritdoc/>
    public bool CompensatesTemperature
    {
        get { return false; }
    }

    /// <inheritdoc/>
    public bool IsLogarithmic
    {
        get { return false; }
    }

    /// <inheritdoc/>
    public bool IsTotalPressure
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
    public Status Response(
        double signal, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double response)
    {
        response = double.NaN;
        if (InputCheck.NotFinite(signal)) { return Status.SignalNotFinite; }
        Status status = PressureFactor(hydrostaticDecibar, rule, out double factor);
        if (double.IsNaN(factor)) { return status; }
        Status ofResidual = Residual(temperatureCelsius, out double residual);
        if (ofResidual != Status.Ok) { return ofResidual; }
        return InputCheck.Deliver((signal - residual) / factor, status, Status.SignalAboveRange, out response);
    }

    /// <inheritdoc/>
    public Status Signal(
        double response, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double signal)
    {
        signal = double.NaN;
        if (InputCheck.NotFinite(response)) { return Status.SignalNotFinite; }
        Status status = PressureFactor(hydrostaticDecibar, rule, out double factor);
        if (double.IsNaN(factor)) { return status; }
        Status ofResidual = Residual(temperatureCelsius, out double residual);
        if (ofResidual != Status.Ok) { return ofResidual; }
        return InputCheck.Deliver((response * factor) + residual, status, Status.SignalAboveRange, out signal);
    }

    /// <inheritdoc/>
    public Status ResponsePerSignal(
        double signal, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double responsePerSignal)
    {
        Status status = PressureFactor(hydrostaticDecibar, rule, out double factor);
        responsePerSignal = double.NaN;
        if (double.IsNaN(factor)) { return status; }
        responsePerSignal = 1.0 / factor;
        return status;
    }

    /// <inheritdoc/>
    public Status ResponsePerKelvin(double signal, double temperatureCelsius, double hydrostaticDecibar, out double perKelvin)
    {
        perKelvin = double.NaN;
        Status status = PressureFactor(hydrostaticDecibar, RangeRule.Extrapolate, out double factor);
        if (double.IsNaN(factor)) { return status; }
        Status ofResidual = Residual(temperatureCelsius, out double residual);
        if (ofResidual != Status.Ok) { return ofResidual; }
        // Without a residual a plain zero, not a negative one.
        double slope = residual == 0.0 ? 0.0 : -residual * ResidualPerKelvin / factor;
        return InputCheck.Deliver(slope, Status.Ok, Status.CoefficientAboveRange, out perKelvin);
    }

    /// <inheritdoc/>
    public Status Gain(double temperatureCelsius, RangeRule rule, out double gain)
    {
        return Form == TemperatureCoefficientForm.Polynomial
            ? TemperatureCoefficient.PolynomialFactor(
                Coefficient, SecondCoefficient, ThirdCoefficient, ReferenceCelsius, LowestCelsius, HighestCelsius, temperatureCelsius, rule, out gain)
            : TemperatureCoefficient.Factor(
                Form, Coefficient, ReferenceCelsius, LowestCelsius, HighestCelsius, temperatureCelsius, rule, out gain);
    }

    /// <inheritdoc/>
    public Status GainPerKelvin(double temperatureCelsius, out double perKelvin)
    {
        return Form == TemperatureCoefficientForm.Polynomial
            ? TemperatureCoefficient.PolynomialLogDerivative(
                Coefficient, SecondCoefficient, ThirdCoefficient, ReferenceCelsius, temperatureCelsius, out perKelvin)
            : TemperatureCoefficient.LogDerivative(Form, Coefficient, ReferenceCelsius, temperatureCelsius, out perKelvin);
    }

    /// <summary>d ln gain/d temperature coefficient, of a polynomial with respect to c1.</summary>
    /// <param name="temperatureCelsius">Temperature, °C.</param>
    /// <param name="perCoefficient">The sensitivity; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public Status GainPerCoefficient(double temperatureCelsius, out double perCoefficient)
    {
        return TemperatureCoefficient.CoefficientDerivative(Form, Coefficient, ReferenceCelsius, temperatureCelsius, out perCoefficient);
    }

    private Status PressureFactor(double hydrostaticDecibar, RangeRule rule, out double factor)
    {
        factor = double.NaN;
        Status status = InputCheck.Hydrostatic(hydrostaticDecibar);
        if (InputCheck.Refuses(status, rule)) { return status; }
        if (InputCheck.NotFinite(PressureCoefficient)) { return Status.CoefficientNotFinite; }
        double value = 1.0 + (PressureCoefficient * hydrostaticDecibar / 100.0);
        if (InputCheck.NotFinite(value)) { return Status.CoefficientAboveRange; }
        if (value <= 0.0) { return Status.CoefficientBelowRange; }
        factor = value;
        return status;
    }

    private Status Residual(double temperatureCelsius, out double residual)
    {
        residual = ResidualSignal;
        if (ResidualSignal == 0.0 || ResidualPerKelvin == 0.0) { return Status.Ok; }
        residual = double.NaN;
        if (InputCheck.NotFinite(temperatureCelsius)) { return Status.TemperatureNotFinite; }
        double value = ResidualSignal * Numerics.Exp(ResidualPerKelvin * (temperatureCelsius - ReferenceCelsius));
        return InputCheck.Deliver(value, Status.Ok, Status.CoefficientNotFinite, out residual);
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
