namespace ProbeCal;

/// <summary>
/// What is known about the circumstances of readings, and stays while a station runs: the standard uncertainties (k = 1) of
/// what is read, and how the water moves. Immutable, safe to share between threads.
/// </summary>
public sealed class ReadingConditions
{
    /// <summary>Describes the circumstances. Values are judged by <see cref="Check"/>.</summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="signalUncertainty">Standard uncertainty of one signal: scatter and resolution, in the signal's unit.</param>
    /// <param name="hasSameThermometer">True when the thermometer that was used at the calibration reads the temperature.</param>
    /// <param name="thermometerOffsetUncertaintyKelvin">Offset of the thermometer in use, K. Of use only when it is another one; the calibration knows its own.</param>
    /// <param name="temperatureUncertaintyKelvin">Temperature without the thermometer's offset, K.</param>
    /// <param name="pressureUncertaintyHectopascal">Pressure, hPa.</param>
    /// <param name="salinityUncertainty">Salinity.</param>
    /// <param name="stirring">How the water moves.</param>
    /// <param name="flowFactor">Flow factor, 1 when stirred.</param>
    /// <param name="stirringUncertainty">Relative standard uncertainty of the flow factor against the calibration's (<see cref="UncertaintyDefaults.StirringRelative"/>).</param>
    public ReadingConditions(
        SolubilityEquation equation,
        double signalUncertainty,
        bool hasSameThermometer,
        double thermometerOffsetUncertaintyKelvin,
        double temperatureUncertaintyKelvin,
        double pressureUncertaintyHectopascal,
        double salinityUncertainty,
        Stirring stirring,
        double flowFactor,
        double stirringUncertainty)
    {
        Equation = equation;
        SignalUncertainty = signalUncertainty;
        HasSameThermometer = hasSameThermometer;
        ThermometerOffsetUncertaintyKelvin = thermometerOffsetUncertaintyKelvin;
        TemperatureUncertaintyKelvin = temperatureUncertaintyKelvin;
        PressureUncertaintyHectopascal = pressureUncertaintyHectopascal;
        SalinityUncertainty = salinityUncertainty;
        Stirring = stirring;
        FlowFactor = flowFactor;
        StirringUncertainty = stirringUncertainty;
    }

    /// <summary>Solubility equation.</summary>
    public SolubilityEquation Equation { get; }

    /// <summary>Standard uncertainty of one signal.</summary>
    public double SignalUncertainty { get; }

    /// <summary>True when the thermometer of the calibration reads the temperature.</summary>
    public bool HasSameThermometer { get; }

    /// <summary>Standard uncertainty of the offset of another thermometer, K.</summary>
    public double ThermometerOffsetUncertaintyKelvin { get; }

    /// <summary>Standard uncertainty of the temperature without the offset, K.</summary>
    public double TemperatureUncertaintyKelvin { get; }

    /// <summary>Standard uncertainty of the pressure, hPa.</summary>
    public double PressureUncertaintyHectopascal { get; }

    /// <summary>Standard uncertainty of the salinity.</summary>
    public double SalinityUncertainty { get; }

    /// <summary>How the water moves.</summary>
    public Stirring Stirring { get; }

    /// <summary>Flow factor, 1 when stirred.</summary>
    public double FlowFactor { get; }

    /// <summary>Relative standard uncertainty of the flow factor against the calibration's.</summary>
    public double StirringUncertainty { get; }

    /// <summary>
    /// True when the probe is used in water that moves otherwise than at its calibration. A point in air stands for stirred
    /// water, by its air-to-water ratio.
    /// </summary>
    /// <param name="calibration">The calibration in force.</param>
    public bool IsStirringMismatch(ProbeCalibration calibration)
    {
        if (Stirring == Stirring.FlowInsensitive || calibration.Stirring == Stirring.FlowInsensitive) { return false; }
        Stirring calibrated = calibration.IsAirPoint ? Stirring.Stirred : calibration.Stirring;
        return calibrated != Stirring;
    }

    /// <summary>Judges the uncertainties and the flow factor.</summary>
    /// <returns>The input at fault, or Ok.</returns>
    public Status Check()
    {
        if (InputCheck.NotFinite(FlowFactor)) { return Status.CoefficientNotFinite; }
        if (FlowFactor <= 0.0) { return Status.CoefficientBelowRange; }
        Status status = InputCheck.Uncertainty(SignalUncertainty);
        if (status != Status.Ok) { return status; }
        status = InputCheck.Uncertainty(ThermometerOffsetUncertaintyKelvin);
        if (status != Status.Ok) { return status; }
        status = InputCheck.Uncertainty(TemperatureUncertaintyKelvin);
        if (status != Status.Ok) { return status; }
        status = InputCheck.Uncertainty(PressureUncertaintyHectopascal);
        if (status != Status.Ok) { return status; }
        status = InputCheck.Uncertainty(SalinityUncertainty);
        return status != Status.Ok ? status : InputCheck.Uncertainty(StirringUncertainty);
    }
}
