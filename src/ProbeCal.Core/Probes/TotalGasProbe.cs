namespace ProbeCal;

/// <summary>
/// A probe of the total pressure of all dissolved gases behind a membrane. The response is the indicated absolute pressure, in any unit; slope 1 and zero 0 are a probe that shows
/// hPa. What it answers to is the total pressure, so concentrations do not follow from it; <see cref="TotalDissolvedGas"/> does what does.
/// </summary>
/// <remarks>The equilibrium through the membrane takes minutes, and depth acts on each gas by its own volume: the pressure at the probe is reported as it is.</remarks>
public sealed class TotalGasProbe : IProbeModel
{
    /// <summary>Describes a probe.</summary>
    /// <param name="lowestCelsius">Lower end of the range of temperatures that the probe is meant for, °C.</param>
    /// <param name="highestCelsius">Upper end of that range, °C.</param>
    public TotalGasProbe(double lowestCelsius, double highestCelsius)
    {
        LowestCelsius = lowestCelsius;
        HighestCelsius = highestCelsius;
    }

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
        get { return true; }
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
        return ConstantGain.Inside(LowestCelsius, HighestCelsius, temperatureCelsius, rule, out gain);
    }

    /// <inheritdoc/>
    public Status GainPerKelvin(double temperatureCelsius, out double perKelvin)
    {
        perKelvin = 0.0;
        return Status.Ok;
    }

    /// <inheritdoc/>
    public Status GainPerCoefficient(double temperatureCelsius, out double perCoefficient)
    {
        perCoefficient = 0.0;
        return Status.Ok;
    }
}
