namespace ProbeCal;

/// <summary>
/// A luminescence sensor with seven coefficients: [O2] = (P0/Pc − 1)/Ksv in µmol/L of fresh water, Ksv = c0 + c1·t + c2·t², P0 = c3 + c4·t,
/// Pc = c5 + c6·φ, φ the phase in degrees as the maker counts it, t in °C. The response is the partial pressure behind it, in hPa, so that a calibration trims it:
/// slope 1 and zero 0 are a sensor that shows the truth.
/// </summary>
/// <remarks>
/// Uchida, H., Kawano, T., Kaneko, I., Fukasawa, M. (2008) J. Atmos. Ocean. Technol. 25, 2271–2281, doi:10.1175/2008JTECHO549.1. The form was seen in three
/// second-hand places and a ported check vector is met; the publication itself was not read. The form gives the concentration that fresh water of the sensor's partial pressure would hold;
/// the solubility equation turns it into that partial pressure, at 1 atm and S = 0. The equation that the coefficients were made with is the right one; another differs
/// by up to 0.3 %. Depth: <see cref="OptodePressure"/>, then <see cref="Enns1965"/> to the partial pressure at the probe.
/// </remarks>
public sealed class Uchida2008Probe : IProbeModel
{
    private const double MilligramsPerMicromole = OxygenUnits.GramsPerMole / 1000.0;

    private readonly UchidaForm form;

    /// <summary>Describes a sensor by its maker's or characterised coefficients. Values are judged where they are used.</summary>
    /// <param name="c0">Ksv at 0 °C, 1/(µmol/L).</param>
    /// <param name="c1">change of Ksv, 1/((µmol/L)·K).</param>
    /// <param name="c2">curvature of Ksv, 1/((µmol/L)·K²).</param>
    /// <param name="c3">P0 at 0 °C.</param>
    /// <param name="c4">change of P0, 1/K.</param>
    /// <param name="c5">constant of Pc.</param>
    /// <param name="c6">Pc per degree of phase.</param>
    /// <param name="equation">Solubility equation that turns the concentration in fresh water into a partial pressure.</param>
    /// <param name="correction">Published correction for depth.</param>
    /// <param name="phasePerThousandDecibar">Degrees that the phase loses per 1000 dbar; 0 where none is stated.</param>
    /// <param name="lowestCelsius">Lower end of the range of temperatures that the coefficients hold for, °C.</param>
    /// <param name="highestCelsius">Upper end of that range, °C.</param>
    public Uchida2008Probe(
        double c0,
        double c1,
        double c2,
        double c3,
        double c4,
        double c5,
        double c6,
        SolubilityEquation equation,
        OptodePressureCorrection correction,
        double phasePerThousandDecibar,
        double lowestCelsius,
        double highestCelsius)
    {
        form = new UchidaForm(c0, c1, c2, c3, c4, c5, c6, 0.0, phasePerThousandDecibar);
        Equation = equation;
        Correction = correction;
        LowestCelsius = lowestCelsius;
        HighestCelsius = highestCelsius;
    }

    /// <summary>Solubility equation that turns the concentration in fresh water into a partial pressure.</summary>
    public SolubilityEquation Equation { get; }

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

    /// <summary>hPa at the probe for one µmol/L of the form, with its slope.</summary>
    private Status Scale(double temperatureCelsius, double hydrostaticDecibar, RangeRule rule, out double scale, out double perKelvin)
    {
        scale = double.NaN;
        perKelvin = double.NaN;
        Status status = OptodePressure.AtProbe(Correction, temperatureCelsius, hydrostaticDecibar, rule, out double factor, out double factorPerKelvin);
        if (double.IsNaN(factor)) { return status; }
        status = InputCheck.Graver(status, OxygenEquilibrium.PartialPressureFromConcentration(
            Equation, temperatureCelsius, 0.0, PressureUnits.HectopascalPerAtmosphere, MilligramsPerMicromole, rule, out double hectopascal));
        OxygenEquilibrium.ConcentrationSensitivities(
            Equation, temperatureCelsius, 0.0, PressureUnits.HectopascalPerAtmosphere, hectopascal, rule, out double milligramsPerKelvin, out _, out _, out _);
        if (double.IsNaN(hectopascal) || double.IsNaN(milligramsPerKelvin)) { return status; }
        scale = hectopascal * factor;
        perKelvin = (hectopascal * factorPerKelvin) - (scale * milligramsPerKelvin / MilligramsPerMicromole);
        return status;
    }
}
