namespace ProbeCal;

/// <summary>
/// A potentiometric CO2 probe: E = E0 + e·(T − Tref) + S·(T/Tref)·log10(p/1 hPa), T in kelvin in the quotient. The response is the potential less e·(T − Tref), in mV; the zero of the
/// calibration is E0, the potential at 1 hPa, and its slope S is in mV per decade at the reference temperature.
/// </summary>
/// <remarks>
/// Severinghaus, J.W., Bradley, A.F. (1958) J. Appl. Physiol. 13, 515–520, doi:10.1152/jappl.1958.13.3.515; the slope follows from Nernst's law, R·T·ln 10/F = 59.16 mV per decade at
/// 25 °C, with the exact constants of the SI of 2019. 95 to 100 % of it is common practice for a healthy electrode (no source). 1 mV is about 4 % of the partial pressure.
/// The slope may have either sign, as the electrode is connected. It takes a fit: a logarithm has no zero point.
/// </remarks>
public sealed class SeveringhausProbe : IProbeModel
{
    /// <summary>Faraday constant, C/mol: the product of e and N_A, exact by the 2019 definition of the SI.</summary>
    public const double FaradayConstant = 96485.3321233100184;

    private const double LnTen = 2.302585092994046;
    private const double MillivoltPerVolt = 1000.0;

    /// <summary>Describes a probe.</summary>
    /// <param name="zeroPerKelvin">e, change of E0 per kelvin, mV/K; 0 where it is not known.</param>
    /// <param name="referenceCelsius">Reference temperature of E0 and slope, °C.</param>
    /// <param name="lowestCelsius">Lower end of the range of temperatures that the probe is meant for, °C.</param>
    /// <param name="highestCelsius">Upper end of that range, °C.</param>
    public SeveringhausProbe(double zeroPerKelvin, double referenceCelsius, double lowestCelsius, double highestCelsius)
    {
        ZeroPerKelvin = zeroPerKelvin;
        ReferenceCelsius = referenceCelsius;
        LowestCelsius = lowestCelsius;
        HighestCelsius = highestCelsius;
    }

    /// <summary>Change of E0 per kelvin, mV/K.</summary>
    public double ZeroPerKelvin { get; }

    /// <summary>Reference temperature of E0 and slope, °C.</summary>
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
        get { return true; }
    }

    /// <inheritdoc/>
    public bool IsTotalPressure
    {
        get { return false; }
    }

    /// <summary>The slope of Nernst's law: 1000·R·T·ln 10/F, mV per decade.</summary>
    /// <param name="temperatureCelsius">Temperature, °C.</param>
    /// <param name="millivoltPerDecade">mV per decade; NaN unless Ok.</param>
    /// <returns>The temperature when it is at fault, or Ok.</returns>
    public static Status IdealSlope(double temperatureCelsius, out double millivoltPerDecade)
    {
        millivoltPerDecade = double.NaN;
        if (InputCheck.NotFinite(temperatureCelsius)) { return Status.TemperatureNotFinite; }
        double kelvin = temperatureCelsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return Status.TemperatureBelowRange; }
        return InputCheck.Deliver(
            MillivoltPerVolt * TemperatureCoefficient.GasConstant * kelvin * LnTen / FaradayConstant, Status.Ok, Status.TemperatureAboveRange, out millivoltPerDecade);
    }

    /// <summary>A slope in % of that of Nernst's law, whatever its sign.</summary>
    /// <param name="slope">Slope, mV per decade, at the temperature.</param>
    /// <param name="temperatureCelsius">Temperature of the slope, °C.</param>
    /// <param name="percent">% of the ideal slope; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status PercentOfIdeal(double slope, double temperatureCelsius, out double percent)
    {
        percent = double.NaN;
        if (InputCheck.NotFinite(slope)) { return Status.SlopeNotFinite; }
        Status status = IdealSlope(temperatureCelsius, out double ideal);
        if (status != Status.Ok) { return status; }
        // Positive above absolute zero; the test keeps an underflow out.
        if (ideal <= 0.0) { return Status.TemperatureBelowRange; }
        double magnitude = slope < 0.0 ? -slope : slope;
        return InputCheck.Deliver(100.0 * magnitude / ideal, Status.Ok, Status.SlopeAboveRange, out percent);
    }

    /// <inheritdoc/>
    public Status Response(
        double signal, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double response)
    {
        response = double.NaN;
        if (InputCheck.NotFinite(signal)) { return Status.SignalNotFinite; }
        Status status = ZeroShift(temperatureCelsius, out double shift);
        return status != Status.Ok ? status : InputCheck.Deliver(signal - shift, Status.Ok, Status.SignalAboveRange, out response);
    }

    /// <inheritdoc/>
    public Status Signal(
        double response, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double signal)
    {
        signal = double.NaN;
        if (InputCheck.NotFinite(response)) { return Status.SignalNotFinite; }
        Status status = ZeroShift(temperatureCelsius, out double shift);
        return status != Status.Ok ? status : InputCheck.Deliver(response + shift, Status.Ok, Status.SignalAboveRange, out signal);
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
        perKelvin = double.NaN;
        if (InputCheck.NotFinite(ZeroPerKelvin)) { return Status.CoefficientNotFinite; }
        perKelvin = ZeroPerKelvin == 0.0 ? 0.0 : -ZeroPerKelvin;
        return Status.Ok;
    }

    /// <inheritdoc/>
    public Status Gain(double temperatureCelsius, RangeRule rule, out double gain)
    {
        Status status = ConstantGain.Inside(LowestCelsius, HighestCelsius, temperatureCelsius, rule, out double inside);
        gain = double.NaN;
        if (double.IsNaN(inside)) { return status; }
        if (InputCheck.NotFinite(ReferenceCelsius)) { return Status.CoefficientNotFinite; }
        double reference = ReferenceCelsius + TemperatureScale.KelvinAtZeroCelsius;
        double kelvin = temperatureCelsius + TemperatureScale.KelvinAtZeroCelsius;
        if (reference <= 0.0) { return Status.CoefficientBelowRange; }
        if (kelvin <= 0.0) { return Status.TemperatureBelowRange; }
        double value = kelvin / reference;
        if (value <= 0.0) { return Status.CoefficientAboveRange; }
        return InputCheck.Deliver(value, status, Status.TemperatureAboveRange, out gain);
    }

    /// <inheritdoc/>
    public Status GainPerKelvin(double temperatureCelsius, out double perKelvin)
    {
        perKelvin = double.NaN;
        if (InputCheck.NotFinite(temperatureCelsius)) { return Status.TemperatureNotFinite; }
        double kelvin = temperatureCelsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return Status.TemperatureBelowRange; }
        perKelvin = 1.0 / kelvin;
        return Status.Ok;
    }

    /// <inheritdoc/>
    public Status GainPerCoefficient(double temperatureCelsius, out double perCoefficient)
    {
        perCoefficient = 0.0;
        return Status.Ok;
    }

    private Status ZeroShift(double temperatureCelsius, out double shift)
    {
        shift = double.NaN;
        if (InputCheck.NotFinite(temperatureCelsius)) { return Status.TemperatureNotFinite; }
        if (InputCheck.NotFinite(ReferenceCelsius)) { return Status.CoefficientNotFinite; }
        return InputCheck.Deliver(ZeroPerKelvin * (temperatureCelsius - ReferenceCelsius), Status.Ok, Status.CoefficientNotFinite, out shift);
    }
}
