using System;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Calibrating;

/// <summary>What the guards look at. What is not known yet is null, and a guard that needs it keeps quiet.</summary>
internal sealed record Situation
{
    /// <summary>The set-up.</summary>
    public required CalibrationSetup Setup { get; init; }

    /// <summary>Time now, UTC.</summary>
    public required DateTimeOffset NowUtc { get; init; }

    /// <summary>The calibration in force of this probe; null when there is none.</summary>
    public CalibrationRecord? Previous { get; init; }

    /// <summary>The last record made at this site; null when there is none.</summary>
    public CalibrationRecord? LastHere { get; init; }

    /// <summary>Temperature that the calibration goes by, °C.</summary>
    public double? TemperatureCelsius { get; init; }

    /// <summary>What the probe's own thermometer says, °C.</summary>
    public double? ProbeTemperatureCelsius { get; init; }

    /// <summary>Absolute station pressure, hPa.</summary>
    public double? PressureHectopascal { get; init; }

    /// <summary>The calibration as fitted.</summary>
    public ProbeCalibration? Fit { get; init; }

    /// <summary>Why there is no fit, when there should be one.</summary>
    public Status FitStatus { get; init; } = Status.Ok;

    /// <summary>The point before the adjustment.</summary>
    public RecordedPoint? Span { get; init; }

    /// <summary>Concentration at 100 % there, mg/L; null while temperature or pressure is not known or out of range.</summary>
    public double? SaturationMilligramsPerLitre => SaturationAt(TemperatureCelsius, PressureHectopascal);

    /// <summary>Concentration at 100 %, mg/L, at some temperature and pressure; null where one is not known or out of range.</summary>
    public double? SaturationAt(double? temperatureCelsius, double? pressureHectopascal)
    {
        if (temperatureCelsius is not double celsius || pressureHectopascal is not double hectopascal)
        {
            return null;
        }

        Status status = OxygenEquilibrium.MilligramsPerLitre(Setup.Equation, celsius, Setup.Salinity.Value, hectopascal, RangeRule.Refuse, out double value);
        return status == Status.Ok ? value : null;
    }
}

/// <summary>One guard: what it watches, and how it looks at a situation.</summary>
/// <param name="Name">One of <see cref="GuardNames"/>.</param>
/// <param name="Watches">What it watches, for people.</param>
/// <param name="Look">Gives a finding, or null when there is nothing to say or not enough known.</param>
internal sealed record Guard(string Name, string Watches, Func<Situation, Finding?> Look);
