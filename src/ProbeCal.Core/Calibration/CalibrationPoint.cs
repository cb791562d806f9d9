namespace ProbeCal;

/// <summary>What the probe stood in at the 100 % point.</summary>
public enum CalibrationMethod
{
    /// <summary>Water in equilibrium with air.</summary>
    AirSaturatedWater = 1,
    /// <summary>Air saturated with water vapour, in a vented chamber.</summary>
    WaterSaturatedAir = 2,
}

/// <summary>
/// The 100 % point: what was read, and under which conditions. Immutable; values are judged by
/// <see cref="ProbeCalibration.Create"/>. Every uncertainty is a standard uncertainty (k = 1).
/// </summary>
public sealed class CalibrationPoint
{
    /// <summary>Describes a point.</summary>
    /// <param name="method">What the probe stood in.</param>
    /// <param name="signal">Mean raw signal over the accepted window.</param>
    /// <param name="signalUncertainty">Its standard uncertainty, in the signal's unit.</param>
    /// <param name="temperatureCelsius">Temperature of water or air at the probe, °C.</param>
    /// <param name="temperatureUncertaintyKelvin">Standard uncertainty without the thermometer's own offset, K.</param>
    /// <param name="pressureHectopascal">Absolute station pressure, hPa.</param>
    /// <param name="pressureUncertaintyHectopascal">Standard uncertainty, hPa.</param>
    /// <param name="stirring">How the water moved.</param>
    /// <param name="flowFactor">Flow factor at the point, 1 when stirred.</param>
    /// <param name="airToWaterRatio">Signal in air over signal in stirred water at the same pO2; 1 for a water point.</param>
    /// <param name="airToWaterRatioUncertainty">Its relative standard uncertainty; 0 for a water point.</param>
    /// <param name="referenceStateUncertainty">Relative standard uncertainty of how near the reference was to its ideal state.</param>
    public CalibrationPoint(
        CalibrationMethod method,
        double signal,
        double signalUncertainty,
        double temperatureCelsius,
        double temperatureUncertaintyKelvin,
        double pressureHectopascal,
        double pressureUncertaintyHectopascal,
        Stirring stirring,
        double flowFactor,
        double airToWaterRatio,
        double airToWaterRatioUncertainty,
        double referenceStateUncertainty)
    {
        Method = method;
        Signal = signal;
        SignalUncertainty = signalUncertainty;
        TemperatureCelsius = temperatureCelsius;
        TemperatureUncertaintyKelvin = temperatureUncertaintyKelvin;
        PressureHectopascal = pressureHectopascal;
        PressureUncertaintyHectopascal = pressureUncertaintyHectopascal;
        Stirring = stirring;
        FlowFactor = flowFactor;
        AirToWaterRatio = airToWaterRatio;
        AirToWaterRatioUncertainty = airToWaterRatioUncertainty;
        ReferenceStateUncertainty = referenceStateUncertainty;
    }

    /// <summary>What the probe stood in.</summary>
    public CalibrationMethod Method { get; }

    /// <summary>Mean raw signal.</summary>
    public double Signal { get; }

    /// <summary>Standard uncertainty of <see cref="Signal"/>.</summary>
    public double SignalUncertainty { get; }

    /// <summary>Temperature, °C.</summary>
    public double TemperatureCelsius { get; }

    /// <summary>Standard uncertainty of the temperature without the thermometer's own offset, K.</summary>
    public double TemperatureUncertaintyKelvin { get; }

    /// <summary>Absolute station pressure, hPa.</summary>
    public double PressureHectopascal { get; }

    /// <summary>Standard uncertainty of the pressure, hPa.</summary>
    public double PressureUncertaintyHectopascal { get; }

    /// <summary>How the water moved.</summary>
    public Stirring Stirring { get; }

    /// <summary>Flow factor, 1 when stirred.</summary>
    public double FlowFactor { get; }

    /// <summary>Signal in air over signal in stirred water at the same pO2.</summary>
    public double AirToWaterRatio { get; }

    /// <summary>Relative standard uncertainty of the ratio.</summary>
    public double AirToWaterRatioUncertainty { get; }

    /// <summary>Relative standard uncertainty of the state of the reference.</summary>
    public double ReferenceStateUncertainty { get; }
}

/// <summary>The zero point: the signal in oxygen-free water, measured or assumed. Immutable.</summary>
public sealed class ZeroPoint
{
    /// <summary>Describes a zero.</summary>
    /// <param name="isMeasured">True when it was read in oxygen-free water; false when it is assumed.</param>
    /// <param name="signal">Raw signal at zero.</param>
    /// <param name="signalUncertainty">
    /// Standard uncertainty, in the signal's unit, with the oxygen left in the solution in it. For an assumed zero:
    /// <see cref="UncertaintyDefaults.AssumedZeroRelative"/> of the span, unless something better is known.
    /// </param>
    /// <param name="temperatureCelsius">Temperature, °C; of use only to a meter's display, else that of the 100 % point.</param>
    /// <param name="pressureHectopascal">Absolute pressure, hPa; of use only to a meter's display.</param>
    public ZeroPoint(bool isMeasured, double signal, double signalUncertainty, double temperatureCelsius, double pressureHectopascal)
    {
        IsMeasured = isMeasured;
        Signal = signal;
        SignalUncertainty = signalUncertainty;
        TemperatureCelsius = temperatureCelsius;
        PressureHectopascal = pressureHectopascal;
    }

    /// <summary>
    /// The zero of a probe whose zero was not read: signal 0, with <see cref="UncertaintyDefaults.AssumedZeroRelative"/> of the
    /// signal at the 100 % point as its standard uncertainty.
    /// </summary>
    /// <param name="point">The 100 % point.</param>
    public static ZeroPoint Assume(CalibrationPoint point)
    {
        double span = point.Signal < 0.0 ? -point.Signal : point.Signal;
        return new ZeroPoint(
            false, 0.0, UncertaintyDefaults.AssumedZeroRelative * span, point.TemperatureCelsius, point.PressureHectopascal);
    }

    /// <summary>True when it was read in oxygen-free water.</summary>
    public bool IsMeasured { get; }

    /// <summary>Raw signal at zero.</summary>
    public double Signal { get; }

    /// <summary>Standard uncertainty of <see cref="Signal"/>.</summary>
    public double SignalUncertainty { get; }

    /// <summary>Temperature, °C.</summary>
    public double TemperatureCelsius { get; }

    /// <summary>Absolute pressure, hPa.</summary>
    public double PressureHectopascal { get; }
}
