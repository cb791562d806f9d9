using System;
using System.Collections.Generic;
using System.Linq;
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

    /// <summary>
    /// The point that is about to be taken, read by the calibration in force where there is one; only while
    /// <see cref="BeforePointGuards"/> look.
    /// </summary>
    public RecordedPoint? Point { get; init; }

    /// <summary>How the truth of <see cref="Point"/> is known; null when there is no point.</summary>
    public PlannedPoint? Planned { get; init; }

    /// <summary>Earlier calibrations of this probe that passed and were not withdrawn, oldest first.</summary>
    public IReadOnlyList<CalibrationRecord> History { get; init; } = [];

    /// <summary>The register as it stands now; null where there is none to look at.</summary>
    public IReadOnlyList<EquipmentRecord>? Register { get; init; }

    /// <summary>What was done to this probe, oldest first.</summary>
    public IReadOnlyList<ServiceRecord> Service { get; init; } = [];

    /// <summary>The day of <see cref="NowUtc"/>.</summary>
    public DateOnly Today => DateOnly.FromDateTime(NowUtc.UtcDateTime);

    /// <summary>The same with what the log knows: the register, what was done to the probe, its earlier calibrations.</summary>
    public Situation WithLog(CalibrationLogStore log)
    {
        return this with
        {
            Register = log.AllEquipment(NowUtc),
            Service = log.ServiceFor(Setup.Probe.Id),
            History =
            [
                .. log.Records.Select(static stored => stored.Record)
                    .Where(record => record.Probe.Id == Setup.Probe.Id && log.MayBeInForce(record))
                    .OrderBy(static record => record.CompletedUtc),
            ],
        };
    }

    /// <summary>The method by which the truth of <see cref="Point"/> is known, one of <see cref="MethodIds"/>; null when there is no point.</summary>
    public string? PointMethod => Point == null ? null : Planned?.Method ?? Point.Method ?? Setup.PlannedFor(Point.Role).Method;

    /// <summary>Concentration at 100 % there, mg/L; null while temperature or pressure is not known or out of range.</summary>
    public double? SaturationMilligramsPerLitre => SaturationAt(TemperatureCelsius, PressureHectopascal);

    /// <summary>Concentration at 100 %, mg/L, at some temperature and pressure; null where one is not known or out of range.</summary>
    public double? SaturationAt(double? temperatureCelsius, double? pressureHectopascal)
    {
        return SaturationAt(temperatureCelsius, pressureHectopascal, Setup.Salinity.Value);
    }

    /// <summary>The same at some salinity.</summary>
    public double? SaturationAt(double? temperatureCelsius, double? pressureHectopascal, double salinity)
    {
        // Errors in mg/L are those of oxygen; other gases have findings without a size.
        if (!PlanCheck.IsOxygen(Setup) || temperatureCelsius is not double celsius || pressureHectopascal is not double hectopascal)
        {
            return null;
        }

        Status status = OxygenEquilibrium.MilligramsPerLitre(Setup.Equation, celsius, salinity, hectopascal, RangeRule.Refuse, out double value);
        return status == Status.Ok ? value : null;
    }
}
