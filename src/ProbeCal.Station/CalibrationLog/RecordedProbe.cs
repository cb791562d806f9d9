using System;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>The probe as it stood at the calibration.</summary>
public sealed record RecordedProbe
{
    /// <summary>The probe's own id, as the readings carry it.</summary>
    public required string Id { get; init; }

    /// <summary>
    /// Response model: <c>amperometric</c>, <c>meter-display</c>, <c>stern-volmer</c>, <c>uchida-2008</c>, <c>bittig-2018</c>,
    /// <c>severinghaus</c>, <c>total-gas</c>, <c>linear</c>, <c>quadratic</c>.
    /// </summary>
    public required string Model { get; init; }

    /// <summary>Coefficients of the model that a calibration does not change, by name (maker's or characterised); empty for models without.</summary>
    public RecordedCoefficient[] Coefficients { get; init => field = value ?? []; } = [];

    /// <summary>Unit of the raw signal, for people; empty when nobody stated one.</summary>
    public required string SignalUnit { get; init; }

    /// <summary>
    /// Temperature coefficient of the membrane. For a meter with its own thermometer it serves only the uncertainty, since the
    /// meter has compensated already.
    /// </summary>
    public required RecordedTemperatureCoefficient TemperatureCoefficient { get; init; }

    /// <summary>What is set in a meter that shows only mg/L or %; none for a raw signal.</summary>
    public RecordedMeterSettings? MeterSettings { get; init; }

    /// <summary>Smallest step of the signal (converter resolution) in <see cref="SignalUnit"/>; none when not stated.</summary>
    public double? SignalResolution { get; init; }

    /// <summary>Lowest signal the input can show; none when not stated.</summary>
    public double? SignalLow { get; init; }

    /// <summary>Highest signal the input can show; none when not stated.</summary>
    public double? SignalHigh { get; init; }

    /// <summary>The membrane on it; none when not stated.</summary>
    public RecordedMembrane? Membrane { get; init; }

    /// <summary>The thermometer that gave the temperature.</summary>
    public required RecordedThermometer Thermometer { get; init; }
}

/// <summary>How the signal follows temperature at one partial pressure.</summary>
public sealed record RecordedTemperatureCoefficient
{
    /// <summary>Form: <c>exponential</c>, <c>compound</c>, <c>linear</c>, <c>arrhenius</c>, <c>polynomial</c> (further terms in the probe's coefficients), or <c>none</c> for a model without one.</summary>
    public required string Form { get; init; }

    /// <summary>The coefficient in <see cref="Unit"/>.</summary>
    public required double Value { get; init; }

    /// <summary><c>1/K</c>, or <c>J/mol</c> for the Arrhenius form.</summary>
    public required string Unit { get; init; }

    /// <summary>Standard uncertainty of the coefficient in <see cref="Unit"/>.</summary>
    public required double StandardUncertainty { get; init; }

    /// <summary>Where that uncertainty came from, when it is a default and nobody entered it.</summary>
    public string? UncertaintySource { get; init; }

    /// <summary>Reference temperature at which the factor is 1, °C.</summary>
    public required double ReferenceCelsius { get; init; }

    /// <summary>Lower end of the fitted range, °C.</summary>
    public required double FittedLowCelsius { get; init; }

    /// <summary>Upper end of the fitted range, °C.</summary>
    public required double FittedHighCelsius { get; init; }

    /// <summary>Where it comes from: <c>entered</c>, or what stood in.</summary>
    public string Source { get; init; } = "entered";
}

/// <summary>What a meter computes with before it shows mg/L or %.</summary>
public sealed record RecordedMeterSettings
{
    /// <summary>What it shows: <c>mg/L</c>, <c>%local</c> or <c>%1atm</c>.</summary>
    public required string Shows { get; init; }

    /// <summary>The solubility equation that the meter is taken to use: <c>benson-krause-1984</c> or <c>garcia-gordon-1992</c>.</summary>
    public required string Equation { get; init; }

    /// <summary>Salinity set in the meter; enters only mg/L.</summary>
    public required double Salinity { get; init; }

    /// <summary>Pressure set in the meter, hPa; none for a meter with its own barometer.</summary>
    public double? PressureHectopascal { get; init; }

    /// <summary>Temperature set in the meter by hand, °C; none for a meter with its own thermometer.</summary>
    public double? TemperatureCelsius { get; init; }

    /// <summary>Last digit of the display, in the shown unit.</summary>
    public required double Resolution { get; init; }
}

/// <summary>The membrane or cap of the probe.</summary>
public sealed record RecordedMembrane
{
    /// <summary>Its id or lot.</summary>
    public required string Id { get; init; }

    /// <summary>Day it was put on; none when not stated.</summary>
    public DateOnly? InstalledOn { get; init; }
}

/// <summary>The thermometer at the probe. Its offset is common to calibration and reading as long as it stays the same one.</summary>
public sealed record RecordedThermometer
{
    /// <summary>Its id; the probe's own when nobody named another.</summary>
    public required string Id { get; init; }

    /// <summary>Standard uncertainty of its offset, °C: the part common to calibration and reading.</summary>
    public required double CommonStandardUncertaintyCelsius { get; init; }

    /// <summary>Where that uncertainty came from.</summary>
    public required string Source { get; init; }
}

/// <summary>A coefficient of a response model.</summary>
public sealed record RecordedCoefficient
{
    /// <summary>Its name in the model's published form: <c>c0</c>, <c>flow-factor</c>, <c>pressure-coefficient</c>.</summary>
    public required string Name { get; init; }

    /// <summary>Its value, in <see cref="Unit"/>.</summary>
    public required double Value { get; init; }

    /// <summary>Its unit.</summary>
    public required string Unit { get; init; }

    /// <summary>Its standard uncertainty, in <see cref="Unit"/>; none when not stated.</summary>
    public double? StandardUncertainty { get; init; }

    /// <summary>Where it comes from: <c>entered</c>, or the id of a characterisation.</summary>
    public required string Source { get; init; }
}
