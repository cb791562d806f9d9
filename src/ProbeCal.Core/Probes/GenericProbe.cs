namespace ProbeCal;

/// <summary>
/// A probe that is described by its calibration alone, as a gas cell behind a membrane: the response is the signal, and a line or a quadratic through points leads from it to the partial
/// pressure. The signal may fall with the partial pressure when the calibration is a fit.
/// </summary>
/// <remarks>The slope may follow temperature linearly: gain = 1 + a·(T − Tref).</remarks>
public sealed class GenericProbe : IProbeModel
{
    /// <summary>Describes a probe.</summary>
    /// <param name="perKelvin">a, relative change of the slope per kelvin, 1/K; 0 for none.</param>
    /// <param name="referenceCelsius">Temperature at which the gain is 1, °C.</param>
    /// <param name="lowestCelsius">Lower end of the range of temperatures that the probe is meant for, °C.</param>
    /// <param name="highestCelsius">Upper end of that range, °C.</param>
    public GenericProbe(double perKelvin, double referenceCelsius, double lowestCelsius, double highestCelsius)
    {
        PerKelvin = perKelvin;
        ReferenceCelsius = referenceCelsius;
        LowestCelsius = lowestCelsius;
        HighestCelsius = highestCelsius;
    }

    /// <summary>Relative change of the slope per kelvin, 1/K.</summary>
    public double PerKelvin { get; }

    /// <summary>Temperature at which the gain is 1, °C.</summary>
    public double ReferenceCelsius { get; }

    /// <summary>Lower end of the range of temperatures that the coefficients hold for, °C.</summary>
    public double LowestCelsius { get; }

    /// <summary>Upper end of that range, °C.</summary>
    public double HighestCelsius { get; }

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
        if (InputCheck.NotFinite(signal)) { return Status.SignalNotFinite; }
        response = signal;
        return Status.Ok;
    }

    /// <inheritdoc/>
    public Status Signal(
        double response, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double signal)
    {
        return Response(response, temperatureCelsius, pressureHectopascal, hydrostaticDecibar, rule, out signal);
    }

    /// <inheritdoc/>
    public Status ResponsePerSignal(
        double signal, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double responsePerSignal)
    {
        responsePerSignal = 1.0;
        return Status.Ok;
    }

    /// <inheritdoc/>
    public Status ResponsePerKelvin(double signal, double temperatureCelsius, double hydrostaticDecibar, out double perKelvin)
    {
        perKelvin = 0.0;
        return Status.Ok;
    }

    /// <inheritdoc/>
    public Status Gain(double temperatureCelsius, RangeRule rule, out double gain)
    {
        return TemperatureCoefficient.Factor(
            TemperatureCoefficientForm.Linear, PerKelvin, ReferenceCelsius, LowestCelsius, HighestCelsius, temperatureCelsius, rule, out gain);
    }

    /// <inheritdoc/>
    public Status GainPerKelvin(double temperatureCelsius, out double perKelvin)
    {
        return TemperatureCoefficient.LogDerivative(TemperatureCoefficientForm.Linear, PerKelvin, ReferenceCelsius, temperatureCelsius, out perKelvin);
    }

    /// <inheritdoc/>
    public Status GainPerCoefficient(double temperatureCelsius, out double perCoefficient)
    {
        return TemperatureCoefficient.CoefficientDerivative(
            TemperatureCoefficientForm.Linear, PerKelvin, ReferenceCelsius, temperatureCelsius, out perCoefficient);
    }
}
