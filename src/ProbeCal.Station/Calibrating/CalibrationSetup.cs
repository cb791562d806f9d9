using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Calibrating;

/// <summary>The ids that set-ups and records use; they never change.</summary>
public static class CalibrationIds
{
    /// <summary>The probe stands in water in equilibrium with air.</summary>
    public const string AirSaturatedWater = "air-saturated-water";

    /// <summary>The probe hangs in a vented chamber of air saturated with water vapour.</summary>
    public const string WaterSaturatedAir = "water-saturated-air";

    /// <summary>Readings come from a source.</summary>
    public const string Live = "live";

    /// <summary>Readings are typed from a meter.</summary>
    public const string Typed = "typed";

    /// <summary>The last measured zero of this membrane, or an assumed one when there is none.</summary>
    public const string ZeroKeep = "keep";

    /// <summary>An assumed zero, whatever the log says.</summary>
    public const string ZeroAssume = "assume";

    /// <summary>A zero point that is read and judged and changes nothing.</summary>
    public const string ZeroCheck = "check";

    /// <summary>A zero point that becomes the zero.</summary>
    public const string ZeroAdjust = "adjust";

    /// <summary>Role of the 100 % point.</summary>
    public const string SpanPoint = "span";

    /// <summary>Role of the zero point.</summary>
    public const string ZeroPoint = "zero";

    /// <summary>Role of the point after the adjustment.</summary>
    public const string AsLeftPoint = "as-left";

    /// <summary>Roles of further points of a fit begin so: <c>level-1</c>, <c>level-2</c> ….</summary>
    public const string LevelPrefix = "level-";

    /// <summary>A check before the day's first reading.</summary>
    public const string Initial = "initial";

    /// <summary>A check between readings.</summary>
    public const string Continuing = "continuing";

    /// <summary>A check after the day's last reading.</summary>
    public const string EndOfDay = "end-of-day";
}

/// <summary>The pressure as it was entered.</summary>
public sealed record EnteredPressure
{
    /// <summary>Absolute station pressure, hPa; none when it comes with each line.</summary>
    public double? Hectopascal { get; init; }

    /// <summary>What is added to it, or to that of each line: the correction of the barometer by the register, hPa.</summary>
    public double CorrectionHectopascal { get; init; }

    /// <summary>Where it comes from, see <see cref="Entry.PressureSource"/>.</summary>
    public required string Source { get; init; }

    /// <summary>Standard uncertainty, hPa.</summary>
    public required double StandardUncertaintyHectopascal { get; init; }

    /// <summary>Where that uncertainty comes from; none when it was entered.</summary>
    public string? UncertaintySource { get; init; }

    /// <summary>The same with the correction of its barometer, whose uncertainty adds to that of reading it.</summary>
    public EnteredPressure Corrected(RecordedQuantity correction)
    {
        return this with
        {
            CorrectionHectopascal = correction.Value,
            StandardUncertaintyHectopascal = PointMaker.Combine(StandardUncertaintyHectopascal, correction.StandardUncertainty),
            UncertaintySource = (UncertaintySource ?? "entered") + "; correction of " + correction.Source,
        };
    }

    /// <summary>The absolute pressure, corrected: as entered, or of the line; null where neither is there.</summary>
    internal double? At(double? ofLine)
    {
        return (Hectopascal ?? ofLine) + CorrectionHectopascal;
    }
}

/// <summary>
/// Everything that is decided before the first sample: probe, method, conditions, limits, waiting. It is kept in the saved
/// state, so that a calibration that is taken up again is the same one.
/// </summary>
/// <remarks>What a state saved by an older program does not have is null there, so later members stand in for it themselves.</remarks>
public sealed record CalibrationSetup
{
    /// <summary>The probe, its membrane, its thermometer.</summary>
    public required RecordedProbe Probe { get; init; }

    /// <summary><see cref="CalibrationRecord.CalibrationPurpose"/>, or <see cref="CalibrationRecord.CheckPurpose"/>: the same points and guards, and no change of coefficients.</summary>
    public string Purpose { get => field ?? CalibrationRecord.CalibrationPurpose; init; }

    /// <summary>For a check: <see cref="CalibrationIds.Initial"/>, <see cref="CalibrationIds.Continuing"/> or <see cref="CalibrationIds.EndOfDay"/>; none when not stated.</summary>
    public string? CheckKind { get; init; }

    /// <summary>The gas whose partial pressure the probe answers to; of no meaning for a probe of total gas pressure.</summary>
    public Gas Gas { get => field == default ? Gas.Oxygen : field; init; }

    /// <summary>The method of the main point, one of <see cref="MethodIds"/>.</summary>
    public required string Method { get; init; }

    /// <summary>
    /// The points that are planned, each with its method and what its truth rests on. Where none is named: the 100 % point by
    /// <see cref="Method"/>, and a zero in zero solution when <see cref="ZeroPlan"/> asks for one.
    /// </summary>
    public IReadOnlyList<PlannedPoint> Plan { get => field is null or { Count: 0 } ? UsualPlan() : field; init; }

    /// <summary>Form of a fit over several points: <c>line</c> or <c>quadratic</c>.</summary>
    public string FitForm { get => field ?? "line"; init; }

    /// <summary>Reference equipment by the ids of the register: barometer, thermometer, cylinder, titrant, zero solution.</summary>
    public string[] Equipment { get => field ?? []; init; }

    /// <summary><see cref="CalibrationIds.Live"/> or <see cref="CalibrationIds.Typed"/>.</summary>
    public required string Readings { get; init; }

    /// <summary>The source of the readings, for people.</summary>
    public required string Source { get; init; }

    /// <summary>True when the source is a simulation.</summary>
    public required bool Simulated { get; init; }

    /// <summary>The solubility equation.</summary>
    public required SolubilityEquation Equation { get; init; }

    /// <summary>Pressure and its source.</summary>
    public required EnteredPressure Pressure { get; init; }

    /// <summary>Temperature that was typed, °C; none when it comes with each line.</summary>
    public double? TypedTemperatureCelsius { get; init; }

    /// <summary>Standard uncertainty of one temperature without the thermometer's own offset, K.</summary>
    public double TemperatureStandardUncertaintyKelvin { get; init; } = UncertaintyDefaults.TemperatureKelvin;

    /// <summary>Practical salinity of the water, with its uncertainty and source.</summary>
    public required RecordedQuantity Salinity { get; init; }

    /// <summary>Altitude of the place; none when not stated.</summary>
    public RecordedQuantity? Altitude { get; init; }

    /// <summary>How the water moves at the 100 % point.</summary>
    public required Stirring Stirring { get; init; }

    /// <summary>Signal in air over signal in water at one partial pressure; none for a point in water.</summary>
    public RecordedQuantity? AirToWaterRatio { get; init; }

    /// <summary>Relative standard uncertainty of how near the reference was to its ideal state.</summary>
    public required double ReferenceStateRelative { get; init; }

    /// <summary>What is done about the zero: <see cref="CalibrationIds.ZeroKeep"/> … <see cref="CalibrationIds.ZeroAdjust"/>.</summary>
    public string ZeroPlan { get; init => field = value ?? CalibrationIds.ZeroKeep; } = CalibrationIds.ZeroKeep;

    /// <summary>What else is known about the bath or the chamber, for the guards; none when nothing was stated.</summary>
    public Surroundings? Surroundings { get; init; }

    /// <summary>Limits that decide.</summary>
    public CalibrationLimits Limits { get; init => field = value ?? new(); } = new();

    /// <summary>When a window counts as steady, and how long it is waited for.</summary>
    public WaitingRules Waiting { get; init => field = value ?? new(); } = new();

    /// <summary>Reasons given for going on past a guard, by the guard's name.</summary>
    public Dictionary<string, string> Reasons { get; init => field = value ?? []; } = [];

    /// <summary>Who calibrates; none when not stated.</summary>
    public string? By { get; init; }

    /// <summary>Site; none when not stated.</summary>
    public string? Site { get; init; }

    /// <summary>Remarks; none when there are none.</summary>
    public string? Remarks { get; init; }

    /// <summary>The plan for the point of a role; the point as left is planned as the 100 % point is.</summary>
    internal PlannedPoint PlannedFor(string role)
    {
        string planned = role == CalibrationIds.AsLeftPoint ? CalibrationIds.SpanPoint : role;
        foreach (PlannedPoint point in Plan)
        {
            if (point.Role == planned)
            {
                return point with { Role = role };
            }
        }

        return new PlannedPoint { Role = role, Method = role == CalibrationIds.ZeroPoint ? MethodIds.ZeroSolution : Method };
    }

    private PlannedPoint[] UsualPlan()
    {
        PlannedPoint main = new() { Role = CalibrationIds.SpanPoint, Method = Method };
        return ZeroPlan is CalibrationIds.ZeroCheck or CalibrationIds.ZeroAdjust
            ? [main, new PlannedPoint { Role = CalibrationIds.ZeroPoint, Method = MethodIds.ZeroSolution }]
            : [main];
    }
}

/// <summary>What bears on how near a bath or a chamber is to equilibrium. What is not stated is not judged.</summary>
public sealed record Surroundings
{
    /// <summary>Depth of the stone or pump that releases the bubbles, m below the surface.</summary>
    public double? StoneDepthMetres { get; init; }

    /// <summary>Temperature at which the water was last in equilibrium with air, °C: of the tap or of the end of aeration.</summary>
    public double? EquilibratedCelsius { get; init; }

    /// <summary>Temperature of the air in the chamber, or around it, °C.</summary>
    public double? AirCelsius { get; init; }
}

/// <summary>When a window counts as steady, and how long a step may take. The defaults are our choice, no source.</summary>
public sealed record WaitingRules
{
    /// <summary>Length of the window on sample times, s.</summary>
    public double WindowSeconds { get; init; } = StabilityCriterion.DefaultWindowSeconds;

    /// <summary>Least number of samples in it.</summary>
    public int LeastCount { get; init; } = StabilityCriterion.DefaultLeastCount;

    /// <summary>Limit on trend, scatter and the trend's error of the signal, mg/L at the reference.</summary>
    public double MilligramsPerLitre { get; init; } = StabilityCriterion.DefaultMilligramsPerLitre;

    /// <summary>The same for temperature, K.</summary>
    public double Kelvin { get; init; } = StabilityCriterion.DefaultKelvin;

    /// <summary>How long one step may wait for a steady window, s, on sample times and on the clock alike.</summary>
    public double GiveUpAfterSeconds { get; init; } = 1800;

    /// <summary>The probe counts as being in the zero solution when its signal is below this share of the 100 % signal.</summary>
    public double ZeroEntryShare { get; init; } = 0.10;

    /// <summary>The probe counts as being back at 100 % when its signal is above this share of the 100 % signal.</summary>
    public double SpanReturnShare { get; init; } = 0.50;

    internal StabilityCriterion ToCriterion()
    {
        return new StabilityCriterion(WindowSeconds, LeastCount, MilligramsPerLitre, Kelvin);
    }
}
