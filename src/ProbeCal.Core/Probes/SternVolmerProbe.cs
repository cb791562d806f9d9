namespace ProbeCal;

/// <summary>What a luminescence probe gives.</summary>
public enum LuminescenceSignal
{
    /// <summary>Phase between excitation and luminescence, degrees, between 0 and 90: tan φ = 2π·f·τ.</summary>
    PhaseDegrees = 1,
    /// <summary>Lifetime, in any unit of time.</summary>
    Lifetime = 2,
    /// <summary>Intensity, in any unit.</summary>
    Intensity = 3,
}

/// <summary>
/// A luminescence probe by the law of Stern and Volmer for one kind of site: τ0/τ = I0/I = 1 + Ksv·p. The response is cot φ, 1/τ or 1/I times τ0(t)/τ0(tref), which is linear in the
/// partial pressure; the gain is Ksv(t)/Ksv(tref). A zero and a 100 % point make a calibration: zero is 1/τ0, slope Ksv/τ0, both at the reference temperature.
/// </summary>
/// <remarks>
/// Stern, O., Volmer, M. (1919) Phys. Z. 20, 183–188 (from memory; a law, without coefficients). τ0(t)/τ0(tref) = 1 + a·d + b·d², d = t − tref; Ksv follows the forms of
/// <see cref="TemperatureCoefficient"/>. Sensors with more than one kind of site bend at high partial pressure: their calibration takes a curve through several points, or
/// <see cref="Bittig2018Probe"/>. k is the relative change of the response per 100 dbar of water above the probe at the same partial pressure at the probe.
/// </remarks>
public sealed class SternVolmerProbe : IProbeModel
{
    /// <summary>Describes a probe. Values are judged where they are used.</summary>
    /// <param name="kind">What the probe gives.</param>
    /// <param name="form">Form of the temperature coefficient of Ksv.</param>
    /// <param name="coefficient">Temperature coefficient of Ksv: 1/K, or J/mol for the Arrhenius form; c1 of a polynomial.</param>
    /// <param name="secondCoefficient">c2 of a polynomial, 1/K²; no other form looks at it.</param>
    /// <param name="thirdCoefficient">c3 of a polynomial, 1/K³; no other form looks at it.</param>
    /// <param name="lifetimePerKelvin">a, relative change of τ0 per kelvin, 1/K; negative.</param>
    /// <param name="lifetimePerSquareKelvin">b, 1/K²; 0 for a line.</param>
    /// <param name="pressureCoefficient">k, relative change of the response per 100 dbar; 0 for none.</param>
    /// <param name="referenceCelsius">Reference temperature, °C.</param>
    /// <param name="lowestCelsius">Lower end of the fitted range, °C.</param>
    /// <param name="highestCelsius">Upper end of the fitted range, °C.</param>
    public SternVolmerProbe(
        LuminescenceSignal kind,
        TemperatureCoefficientForm form,
        double coefficient,
        double secondCoefficient,
        double thirdCoefficient,
        double lifetimePerKelvin,
        double lifetimePerSquareKelvin,
        double pressureCoefficient,
        double referenceCelsius,
        double lowestCelsius,
        double highestCelsius)
    {
        Kind = kind;
        Quenching = new AmperometricProbe(
            form, coefficient, secondCoefficient, thirdCoefficient, referenceCelsius, lowestCelsius, highestCelsius, pressureCoefficient, 0.0, 0.0, 1.0);
        LifetimePerKelvin = lifetimePerKelvin;
        LifetimePerSquareKelvin = lifetimePerSquareKelvin;
    }

    /// <summary>What the probe gives.</summary>
    public LuminescenceSignal Kind { get; }

    /// <summary>Relative change of τ0 per kelvin, 1/K.</summary>
    public double LifetimePerKelvin { get; }

    /// <summary>Relative change of τ0 per squared kelvin, 1/K².</summary>
    public double LifetimePerSquareKelvin { get; }

    /// <summary>The temperature factor of Ksv and the pressure coefficient, which are of the same forms as those of a membrane.</summary>
    private AmperometricProbe Quenching { get; }

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

    /// <inheritdoc/>
    public Status Response(
        double signal, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double response)
    {
        response = double.NaN;
        Status status = Quotient(signal, out double quotient, out _);
        if (status != Status.Ok) { return status; }
        status = Lifetime(temperatureCelsius, out double lifetime, out _);
        if (status != Status.Ok) { return status; }
        return Quenching.Response(quotient * lifetime, temperatureCelsius, pressureHectopascal, hydrostaticDecibar, rule, out response);
    }

    /// <inheritdoc/>
    public Status Signal(
        double response, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double signal)
    {
        signal = double.NaN;
        Status status = Lifetime(temperatureCelsius, out double lifetime, out _);
        if (status != Status.Ok) { return status; }
        status = Quenching.Signal(response, temperatureCelsius, pressureHectopascal, hydrostaticDecibar, rule, out double product);
        if (double.IsNaN(product)) { return status; }
        double quotient = product / lifetime;
        // No luminescence dies at once or never.
        if (quotient <= 0.0) { return Status.PartialPressureBelowRange; }
        switch (Kind)
        {
            case LuminescenceSignal.PhaseDegrees:
                return InputCheck.Deliver(PhaseAngle.FromCotangent(quotient), status, Status.PartialPressureAboveRange, out signal);
            case LuminescenceSignal.Lifetime:
            case LuminescenceSignal.Intensity:
                return InputCheck.Deliver(1.0 / quotient, status, Status.PartialPressureAboveRange, out signal);
            default:
                return Status.CoefficientUnknown;
        }
    }

    /// <inheritdoc/>
    public Status ResponsePerSignal(
        double signal, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double responsePerSignal)
    {
        responsePerSignal = double.NaN;
        Status status = Quotient(signal, out _, out double perSignal);
        if (status != Status.Ok) { return status; }
        status = Lifetime(temperatureCelsius, out double lifetime, out _);
        if (status != Status.Ok) { return status; }
        status = Quenching.ResponsePerSignal(signal, temperatureCelsius, pressureHectopascal, hydrostaticDecibar, rule, out double perProduct);
        return double.IsNaN(perProduct)
            ? status
            : InputCheck.Deliver(perSignal * lifetime * perProduct, status, Status.SignalAboveRange, out responsePerSignal);
    }

    /// <inheritdoc/>
    public Status ResponsePerKelvin(double signal, double temperatureCelsius, double hydrostaticDecibar, out double perKelvin)
    {
        perKelvin = double.NaN;
        Status status = Quotient(signal, out double quotient, out _);
        if (status != Status.Ok) { return status; }
        status = Lifetime(temperatureCelsius, out _, out double lifetimePerKelvin);
        if (status != Status.Ok) { return status; }
        status = Quenching.ResponsePerSignal(signal, temperatureCelsius, double.NaN, hydrostaticDecibar, RangeRule.Extrapolate, out double perProduct);
        return double.IsNaN(perProduct)
            ? status
            : InputCheck.Deliver(quotient * lifetimePerKelvin * perProduct, Status.Ok, Status.SignalAboveRange, out perKelvin);
    }

    /// <inheritdoc/>
    public Status Gain(double temperatureCelsius, RangeRule rule, out double gain)
    {
        return Quenching.Gain(temperatureCelsius, rule, out gain);
    }

    /// <inheritdoc/>
    public Status GainPerKelvin(double temperatureCelsius, out double perKelvin)
    {
        return Quenching.GainPerKelvin(temperatureCelsius, out perKelvin);
    }

    /// <inheritdoc/>
    public Status GainPerCoefficient(double temperatureCelsius, out double perCoefficient)
    {
        return Quenching.GainPerCoefficient(temperatureCelsius, out perCoefficient);
    }

    /// <summary>cot φ, 1/τ or 1/I, which rises with the partial pressure, and its slope.</summary>
    private Status Quotient(double signal, out double quotient, out double perSignal)
    {
        quotient = double.NaN;
        perSignal = double.NaN;
        if (InputCheck.NotFinite(signal)) { return Status.SignalNotFinite; }
        if (signal <= 0.0) { return Status.SignalBelowRange; }
        switch (Kind)
        {
            case LuminescenceSignal.PhaseDegrees:
                double cotangent = PhaseAngle.Cotangent(signal);
                if (double.IsNaN(cotangent)) { return Status.SignalAboveRange; }
                perSignal = InputCheck.FiniteOrNaN(-(1.0 + (cotangent * cotangent)) * PhaseAngle.Radian);
                quotient = cotangent;
                return double.IsNaN(perSignal) ? Status.SignalBelowRange : Status.Ok;
            case LuminescenceSignal.Lifetime:
            case LuminescenceSignal.Intensity:
                double inverse = 1.0 / signal;
                perSignal = InputCheck.FiniteOrNaN(-inverse * inverse);
                quotient = inverse;
                return double.IsNaN(perSignal) ? Status.SignalBelowRange : Status.Ok;
            default:
                return Status.CoefficientUnknown;
        }
    }

    /// <summary>τ0(t)/τ0(tref), positive, and its slope.</summary>
    private Status Lifetime(double temperatureCelsius, out double lifetime, out double perKelvin)
    {
        lifetime = double.NaN;
        perKelvin = double.NaN;
        if (InputCheck.NotFinite(temperatureCelsius)) { return Status.TemperatureNotFinite; }
        double difference = temperatureCelsius - Quenching.ReferenceCelsius;
        double value = 1.0 + (difference * (LifetimePerKelvin + (difference * LifetimePerSquareKelvin)));
        double slope = LifetimePerKelvin + (2.0 * difference * LifetimePerSquareKelvin);
        if (InputCheck.NotFinite(value) || InputCheck.NotFinite(slope)) { return Status.CoefficientNotFinite; }
        if (value <= 0.0) { return Status.CoefficientBelowRange; }
        lifetime = value;
        perKelvin = slope;
        return Status.Ok;
    }
}
