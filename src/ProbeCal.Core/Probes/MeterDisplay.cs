namespace ProbeCal;

/// <summary>What a meter without a raw output shows.</summary>
public enum MeterScale
{
    /// <summary>Concentration in mg/L, computed by the meter with the salinity set in it.</summary>
    MilligramsPerLitre = 1,
    /// <summary>% saturation relative to the local pressure, computed by the meter with the pressure set in it or its own barometer.</summary>
    PercentLocal = 2,
    /// <summary>% saturation relative to 1 atm.</summary>
    PercentOneAtmosphere = 3,
}

/// <summary>
/// A meter that shows only mg/L or % saturation. The shown value is turned back into the partial pressure that the meter
/// derived it from, with the salinity, pressure and temperature that are set in the meter; what the meter corrected is thereby
/// taken out, and nothing is corrected twice. The response is that partial pressure, in hPa; slope 1 and zero 0 are a meter
/// that shows the truth.
/// </summary>
/// <remarks>
/// With its own thermometer the meter has compensated the membrane, so the gain is 1, and the temperature given with a reading
/// must be the one the meter shows. With a temperature set by hand the membrane is compensated at the wrong temperature: the
/// gain is f(T)/f(Tset), from the membrane's coefficient. The coefficient also tells how a thermometer error acts, in
/// both cases, since the same error went through the meter's compensation. The equation is assumed to be the one that the meter
/// uses; another one differs by up to 0.5 % (Weiss 1970 against Benson and Krause 1984, S 40).
/// </remarks>
public sealed class MeterDisplay : IProbeModel
{
    private readonly bool hasOwnThermometer;
    private readonly bool hasOwnBarometer;

    /// <summary>Describes a meter and what is set in it. Values are judged where they are used.</summary>
    /// <param name="scale">What the meter shows.</param>
    /// <param name="equation">The solubility equation the meter uses.</param>
    /// <param name="salinitySet">Salinity set in the meter; used only for mg/L.</param>
    /// <param name="pressureSetHectopascal">Pressure set in the meter, hPa; NaN for a meter with its own barometer, whose pressure then comes with each reading.</param>
    /// <param name="temperatureSetCelsius">Temperature set in the meter by hand, °C; NaN for a meter with its own thermometer.</param>
    /// <param name="form">Form of the membrane's temperature coefficient.</param>
    /// <param name="coefficient">Membrane's temperature coefficient: 1/K, or J/mol for the Arrhenius form.</param>
    /// <param name="referenceCelsius">Reference temperature of the coefficient, °C.</param>
    /// <param name="lowestCelsius">Lower end of the range in which the meter compensates, °C.</param>
    /// <param name="highestCelsius">Upper end of that range, °C.</param>
    public MeterDisplay(
        MeterScale scale,
        SolubilityEquation equation,
        double salinitySet,
        double pressureSetHectopascal,
        double temperatureSetCelsius,
        TemperatureCoefficientForm form,
        double coefficient,
        double referenceCelsius,
        double lowestCelsius,
        double highestCelsius)
    {
        Scale = scale;
        Equation = equation;
        SalinitySet = salinitySet;
        PressureSetHectopascal = pressureSetHectopascal;
        TemperatureSetCelsius = temperatureSetCelsius;
        Form = form;
        Coefficient = coefficient;
        ReferenceCelsius = referenceCelsius;
        LowestCelsius = lowestCelsius;
        HighestCelsius = highestCelsius;
        hasOwnThermometer = double.IsNaN(temperatureSetCelsius);
        hasOwnBarometer = double.IsNaN(pressureSetHectopascal);
    }

    /// <summary>What the meter shows.</summary>
    public MeterScale Scale { get; }

    /// <summary>The solubility equation the meter uses.</summary>
    public SolubilityEquation Equation { get; }

    /// <summary>Salinity set in the meter.</summary>
    public double SalinitySet { get; }

    /// <summary>Pressure set in the meter, hPa; NaN for its own barometer.</summary>
    public double PressureSetHectopascal { get; }

    /// <summary>Temperature set in the meter, °C; NaN for its own thermometer.</summary>
    public double TemperatureSetCelsius { get; }

    /// <summary>Form of the membrane's temperature coefficient.</summary>
    public TemperatureCoefficientForm Form { get; }

    /// <summary>Membrane's temperature coefficient: 1/K, or J/mol for the Arrhenius form.</summary>
    public double Coefficient { get; }

    /// <summary>Reference temperature of the coefficient, °C.</summary>
    public double ReferenceCelsius { get; }

    /// <summary>Lower end of the range in which the meter compensates, °C.</summary>
    public double LowestCelsius { get; }

    /// <summary>Upper end of the range in which the meter compensates, °C.</summary>
    public double HighestCelsius { get; }

    /// <inheritdoc/>
    public bool CompensatesTemperature
    {
        get { return hasOwnThermometer; }
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

    /// <summary>
    /// The partial pressure that one shown unit stands for, hPa per mg/L or hPa per %: every scale is proportional to pO2.
    /// </summary>
    /// <param name="scale">What the meter shows.</param>
    /// <param name="equation">The solubility equation the meter uses.</param>
    /// <param name="temperatureCelsius">Temperature the meter computes with, °C.</param>
    /// <param name="salinity">Salinity the meter computes with.</param>
    /// <param name="pressureHectopascal">Pressure the meter computes with, hPa. For mg/L it enters by 0.03 % at most, and NaN means 1 atm.</param>
    /// <param name="rule">What to do outside the equation's range.</param>
    /// <param name="hectopascalPerUnit">hPa per shown unit; NaN unless the status allows a value.</param>
    /// <returns>The input at fault; <see cref="Status.CoefficientUnknown"/> for an unknown scale.</returns>
    public static Status PartialPressurePerUnit(
        MeterScale scale,
        SolubilityEquation equation,
        double temperatureCelsius,
        double salinity,
        double pressureHectopascal,
        RangeRule rule,
        out double hectopascalPerUnit)
    {
        Status status;
        switch (scale)
        {
            case MeterScale.MilligramsPerLitre:
                double total = double.IsNaN(pressureHectopascal) ? PressureUnits.HectopascalPerAtmosphere : pressureHectopascal;
                return OxygenEquilibrium.PartialPressureFromConcentration(
                    equation, temperatureCelsius, salinity, total, 1.0, rule, out hectopascalPerUnit);
            case MeterScale.PercentLocal:
                status = OxygenEquilibrium.PartialPressure(temperatureCelsius, pressureHectopascal, rule, out hectopascalPerUnit);
                hectopascalPerUnit *= 0.01;
                return status;
            case MeterScale.PercentOneAtmosphere:
                status = OxygenEquilibrium.PartialPressure(
                    temperatureCelsius, PressureUnits.HectopascalPerAtmosphere, rule, out hectopascalPerUnit);
                hectopascalPerUnit *= 0.01;
                return status;
            default:
                hectopascalPerUnit = double.NaN;
                return Status.CoefficientUnknown;
        }
    }

    /// <inheritdoc/>
    public Status Response(
        double signal, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double response)
    {
        response = double.NaN;
        if (InputCheck.NotFinite(signal)) { return Status.SignalNotFinite; }
        Status status = PerUnit(temperatureCelsius, pressureHectopascal, rule, out double scale);
        double value = signal * scale;
        if (double.IsInfinity(value)) { return Status.SignalAboveRange; }
        response = value;
        return status;
    }

    /// <summary>What the meter shows, with its own settings, for a response: the value to set in the meter when the response is the reference's.</summary>
    /// <param name="response">Partial pressure as the meter sees it, hPa.</param>
    /// <param name="temperatureCelsius">Temperature the meter measures, °C.</param>
    /// <param name="pressureHectopascal">Pressure its barometer measures, hPa; NaN where there is none.</param>
    /// <param name="hydrostaticDecibar">Pressure of the water above the probe, dbar; a meter takes no notice of it.</param>
    /// <param name="rule">What to do outside a stated range.</param>
    /// <param name="signal">The shown value, mg/L or %; NaN unless the status allows a value.</param>
    /// <returns>The input at fault, or Ok.</returns>
    public Status Signal(
        double response, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double signal)
    {
        signal = double.NaN;
        if (InputCheck.NotFinite(response)) { return Status.PartialPressureNotFinite; }
        Status status = PerUnit(temperatureCelsius, pressureHectopascal, rule, out double scale);
        if (double.IsNaN(scale)) { return status; }
        // No air left beside the vapour: only extrapolation reaches it.
        if (scale <= 0.0) { return Status.PressureBelowRange; }
        double value = response / scale;
        if (double.IsInfinity(value)) { return Status.PartialPressureAboveRange; }
        signal = value;
        return status;
    }

    /// <inheritdoc/>
    public Status ResponsePerSignal(
        double signal, double temperatureCelsius, double pressureHectopascal, double hydrostaticDecibar, RangeRule rule, out double responsePerSignal)
    {
        return PerUnit(temperatureCelsius, pressureHectopascal, rule, out responsePerSignal);
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
        if (hasOwnThermometer)
        {
            return ConstantGain.Inside(LowestCelsius, HighestCelsius, temperatureCelsius, rule, out gain);
        }

        Status status = TemperatureCoefficient.Factor(
            Form, Coefficient, ReferenceCelsius, LowestCelsius, HighestCelsius, temperatureCelsius, rule, out gain);
        Status atSet = TemperatureCoefficient.Factor(
            Form, Coefficient, ReferenceCelsius, LowestCelsius, HighestCelsius, TemperatureSetCelsius, rule, out double factorAtSet);
        status = InputCheck.Graver(status, atSet);
        if (double.IsNaN(gain) || double.IsNaN(factorAtSet))
        {
            gain = double.NaN;
            return status;
        }

        // Factor hands out nothing that is not positive, but the quotient of a tiny and a huge one may leave the numbers.
        double ratio = gain / factorAtSet;
        gain = double.NaN;
        if (double.IsInfinity(ratio)) { return Status.CoefficientAboveRange; }
        if (ratio <= 0.0) { return Status.CoefficientBelowRange; }
        gain = ratio;
        return status;
    }

    /// <inheritdoc/>
    public Status GainPerKelvin(double temperatureCelsius, out double perKelvin)
    {
        return TemperatureCoefficient.LogDerivative(Form, Coefficient, ReferenceCelsius, temperatureCelsius, out perKelvin);
    }

    /// <inheritdoc/>
    public Status GainPerCoefficient(double temperatureCelsius, out double perCoefficient)
    {
        Status status = TemperatureCoefficient.CoefficientDerivative(Form, Coefficient, ReferenceCelsius, temperatureCelsius, out perCoefficient);
        if (hasOwnThermometer || status != Status.Ok) { return status; }
        status = TemperatureCoefficient.CoefficientDerivative(Form, Coefficient, ReferenceCelsius, TemperatureSetCelsius, out double atSet);
        // The gain is f(T)/f(Tset): set to the water's own temperature, the coefficient says nothing.
        perCoefficient = status == Status.Ok ? perCoefficient - atSet : double.NaN;
        return status;
    }

    private Status PerUnit(double temperatureCelsius, double pressureHectopascal, RangeRule rule, out double responsePerSignal)
    {
        return PartialPressurePerUnit(
            Scale,
            Equation,
            hasOwnThermometer ? temperatureCelsius : TemperatureSetCelsius,
            SalinitySet,
            hasOwnBarometer ? pressureHectopascal : PressureSetHectopascal,
            rule,
            out responsePerSignal);
    }
}
