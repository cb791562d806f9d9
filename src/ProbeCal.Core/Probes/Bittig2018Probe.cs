namespace ProbeCal;

/// <summary>
/// A luminescence sensor with seven or eight coefficients in partial pressure: pO2 = (P0/Pc − 1)/Ksv in hPa, Ksv = c0 + c1·t + c2·t², P0 = c3 + c4·t,
/// Pc = c5 + c6·φ + c7·φ², φ the phase in degrees as the maker counts it, t in °C. The response is that partial pressure, so that a calibration trims it: slope 1 and
/// zero 0 are a sensor that shows the truth.
/// </summary>
/// <remarks>
/// Bittig, H.C. et al. (2018) Front. Mar. Sci. 4, 429, doi:10.3389/fmars.2017.00429. The form is from memory: no check value was at hand, and which coefficients a maker
/// gives must be compared with this form before they are entered. It is tested by its equivalence with <see cref="Uchida2008Probe"/>, by its inverse and by differences.
/// Depth: <see cref="OptodePressure"/>, then <see cref="Enns1965"/> to the partial pressure at the probe.
/// </remarks>
public sealed class Bittig2018Probe : IProbeModel
{
    private readonly UchidaForm form;

    /// <summary>Describes a sensor by its maker's or characterised coefficients. Values are judged where they are used.</summary>
    /// <param name="c0">Ksv at 0 °C, 1/hPa.</param>
    /// <param name="c1">change of Ksv, 1/(hPa·K).</param>
    /// <param name="c2">curvature of Ksv, 1/(hPa·K²).</param>
    /// <param name="c3">P0 at 0 °C.</param>
    /// <param name="c4">change of P0, 1/K.</param>
    /// <param name="c5">constant of Pc.</param>
    /// <param name="c6">Pc per degree of phase.</param>
    /// <param name="c7">curvature of Pc, per squared degree; 0 for seven coefficients.</param>
    /// <param name="correction">Published correction for depth.</param>
    /// <param name="phasePerThousandDecibar">Degrees that the phase loses per 1000 dbar; 0 where none is stated.</param>
    /// <param name="lowestCelsius">Lower end of the range of temperatures that the coefficients hold for, °C.</param>
    /// <param name="highestCelsius">Upper end of that range, °C.</param>
    public Bittig2018Probe(
        double c0,
        double c1,
        double c2,
        double c3,
        double c4,
        double c5,
        double c6,
        double c7,
        OptodePressureCorrection correction,
        double phasePerThousandDecibar,
        double lowestCelsius,
        double highestCelsius)
    {
        form = new UchidaForm(c0, c1, c2, c3, c4, c5, c6, c7, phasePerThousandDecibar);
        Correction = correction;
        LowestCelsius = lowestCelsius;
        HighestCelsius = highestCelsius;
    }

    /// <summary>Published correction for depth.</summary>
    public OptodePressureCorrection Correction { get; }

    /// <summary>Degrees that the phase loses per 1000 dbar.</summary>
    public double PhasePerThousandDecibar
    {
        get { return form.PhasePerThousandDecibar; }
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
        get { return false; }
    }

    /// <inheritdoc/>
    public Status Response(
        double signal, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double response)
    {
        Status status = Scale(temperatureCelsius, hydrostaticDecibar, rule, out double scale, out _);
        return form.Response(signal, temperatureCelsius, hydrostaticDecibar, status, scale, out response);
    }

    /// <inheritdoc/>
    public Status Signal(
        double response, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double signal)
    {
        Status status = Scale(temperatureCelsius, hydrostaticDecibar, rule, out double scale, out _);
        return form.Signal(response, temperatureCelsius, hydrostaticDecibar, status, scale, out signal);
    }

    /// <inheritdoc/>
    public Status ResponsePerSignal(
        double signal, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double responsePerSignal)
    {
        Status status = Scale(temperatureCelsius, hydrostaticDecibar, rule, out double scale, out _);
        return form.ResponsePerSignal(signal, temperatureCelsius, hydrostaticDecibar, status, scale, out responsePerSignal);
    }

    /// <inheritdoc/>
    public Status ResponsePerKelvin(double signal, double temperatureCelsius, double hydrostaticDecibar, out double perKelvin)
    {
        Status status = Scale(temperatureCelsius, hydrostaticDecibar, RangeRule.Extrapolate, out double scale, out double scalePerKelvin);
        return form.ResponsePerKelvin(signal, temperatureCelsius, hydrostaticDecibar, status, scale, scalePerKelvin, out perKelvin);
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

    private Status Scale(double temperatureCelsius, double hydrostaticDecibar, RangeRule rule, out double scale, out double perKelvin)
    {
        return OptodePressure.AtProbe(Correction, temperatureCelsius, hydrostaticDecibar, rule, out scale, out perKelvin);
    }
}
