namespace ProbeCal;

/// <summary>
/// The part of a probe's response that a calibration does not change. Every model brings its raw signal onto a scale on which
/// <c>response = zero + slope · flow · gain(T) · x</c>; zero, slope and flow belong to the calibration. x is the partial pressure at the
/// probe in hPa, for a logarithmic probe its decadic logarithm, for a total-gas probe the total pressure.
/// </summary>
/// <remarks>
/// Implementations are sealed and immutable, made once when a calibration is loaded, and safe to share between threads. None
/// of the members allocates. The sensitivities speak of a value already judged, so most take no range rule. The pressure of the
/// water above the probe is given in dbar, 0 at the surface, and belongs to the probe's response alone: what depth does to the
/// partial pressure itself is <see cref="Enns1965"/>.
/// </remarks>
public interface IProbeModel
{
    /// <summary>
    /// True when the signal comes already compensated for the membrane's temperature, by the thermometer whose temperature is
    /// given with it. The gain is then 1.
    /// </summary>
    bool CompensatesTemperature { get; }

    /// <summary>True when the response is linear in log10 of the partial pressure in hPa and not in the partial pressure itself.</summary>
    bool IsLogarithmic { get; }

    /// <summary>True when the probe answers to the total pressure of all dissolved gases. A concentration does not follow from it.</summary>
    bool IsTotalPressure { get; }

    /// <summary>The response that a raw signal stands for, in the response's unit.</summary>
    /// <param name="signal">Raw signal, in the probe's unit.</param>
    /// <param name="temperatureCelsius">Temperature given with the signal, °C.</param>
    /// <param name="pressureHectopascal">Absolute pressure given with the signal, hPa; NaN where there is none.</param>
    /// <param name="hydrostaticDecibar">Pressure of the water above the probe, dbar; 0 at the surface.</param>
    /// <param name="rule">What to do outside a stated range.</param>
    /// <param name="response">The response; NaN unless the status allows a value.</param>
    /// <returns>The input at fault, or Ok.</returns>
    Status Response(
        double signal, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double response);

    /// <summary>The raw signal that stands for a response: the inverse of <see cref="Response"/>.</summary>
    /// <param name="response">The response.</param>
    /// <param name="temperatureCelsius">Temperature, °C.</param>
    /// <param name="pressureHectopascal">Absolute pressure, hPa; NaN where there is none.</param>
    /// <param name="hydrostaticDecibar">Pressure of the water above the probe, dbar; 0 at the surface.</param>
    /// <param name="rule">What to do outside a stated range.</param>
    /// <param name="signal">The raw signal; NaN unless the status allows a value.</param>
    /// <returns>The input at fault, or Ok.</returns>
    Status Signal(
        double response, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double signal);

    /// <summary>d response/d signal at the given signal and conditions.</summary>
    /// <param name="signal">Raw signal, in the probe's unit.</param>
    /// <param name="temperatureCelsius">Temperature, °C.</param>
    /// <param name="pressureHectopascal">Absolute pressure, hPa; NaN where there is none.</param>
    /// <param name="hydrostaticDecibar">Pressure of the water above the probe, dbar; 0 at the surface.</param>
    /// <param name="rule">What to do outside a stated range.</param>
    /// <param name="responsePerSignal">Response per unit of signal; NaN unless the status allows a value.</param>
    /// <returns>The input at fault, or Ok.</returns>
    Status ResponsePerSignal(
        double signal, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double responsePerSignal);

    /// <summary>
    /// d response/d T at constant signal: what a thermometer error of one kelvin does to the response itself. 0 where temperature
    /// enters the gain alone, as with a membrane. For a meter too, whose compensation <see cref="GainPerKelvin"/> holds.
    /// </summary>
    /// <param name="signal">Raw signal, in the probe's unit.</param>
    /// <param name="temperatureCelsius">Temperature, °C.</param>
    /// <param name="hydrostaticDecibar">Pressure of the water above the probe, dbar; 0 at the surface.</param>
    /// <param name="perKelvin">Response per kelvin; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    Status ResponsePerKelvin(double signal, double temperatureCelsius, double hydrostaticDecibar, out double perKelvin);

    /// <summary>gain(T): how much more response one hPa gives at T than at the reference temperature.</summary>
    /// <param name="temperatureCelsius">Temperature, °C.</param>
    /// <param name="rule">What to do outside the fitted range.</param>
    /// <param name="gain">The gain, positive; NaN unless the status allows a value.</param>
    /// <returns>The input at fault, or Ok.</returns>
    Status Gain(double temperatureCelsius, RangeRule rule, out double gain);

    /// <summary>
    /// Relative change, per kelvin of thermometer error, of the gain that stands between the membrane's current and the
    /// computed partial pressure, 1/K. For a meter it is the compensation inside the meter, which the same thermometer feeds.
    /// </summary>
    /// <param name="temperatureCelsius">Temperature, °C.</param>
    /// <param name="perKelvin">1/K; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    Status GainPerKelvin(double temperatureCelsius, out double perKelvin);

    /// <summary>
    /// d ln gain/d temperature coefficient, in the inverse of the coefficient's unit. For a meter with its own thermometer it is
    /// that of the compensation inside the meter, of which only the difference between two temperatures means something.
    /// </summary>
    /// <param name="temperatureCelsius">Temperature, °C.</param>
    /// <param name="perCoefficient">The sensitivity; NaN unless Ok.</param>
    /// <returns>The input at fault, or Ok.</returns>
    Status GainPerCoefficient(double temperatureCelsius, out double perCoefficient);
}
