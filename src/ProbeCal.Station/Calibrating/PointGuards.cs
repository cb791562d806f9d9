using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using static ProbeCal.Station.Calibrating.Finding;

namespace ProbeCal.Station.Calibrating;

/// <summary>The guards on a point that is about to be accepted.</summary>
internal static class BeforePointGuards
{
    /// <summary>All of them.</summary>
    public static IReadOnlyList<Guard> All { get; } = [.. PointGuards.All, .. BathGuards.All];
}

/// <summary>The guards on the reading of a point itself: steady, alive, in the unit that was stated.</summary>
internal static class PointGuards
{
    /// <summary>A titration of less oxygen than this is no reference, µmol/kg (OceanGliders oxygen SOP).</summary>
    public const double TitrationLowMicromolesPerKilogram = 20;

    /// <summary>How well a titration at sea is known, mg/L: 0.02 mL/L (observatory practice after Knapp et al. 1990).</summary>
    private const double TitrationMilligramsPerLitre = 0.02 * OxygenUnits.MilligramsPerMillilitre;

    /// <summary>How near a reading in the other unit comes to saturation to be called it, % (our choice, no source).</summary>
    private const double UnitLikenessPercent = 25;

    /// <summary>How near a percentage on the other scale comes to 100 to be called it, % (our choice, no source).</summary>
    private const double ScaleLikenessPercent = 1.5;

    /// <summary>How far the two scales lie apart before they can be told, % (our choice, no source).</summary>
    private const double ScaleDistancePercent = 3;

    /// <summary>Change of temperature that an unwatched thermometer could hide, K: the field limit of a steady reading (TM 9-A6.2).</summary>
    private const double UnwatchedKelvin = 0.2;

    /// <summary>All of them.</summary>
    public static IReadOnlyList<Guard> All { get; } =
    [
        new(GuardNames.DeadInput, "an input that does not move by a step of the converter", DeadInput)
        {
            Limit = "10 samples or more, all alike",
            Source = LimitSources.Nature,
            Severities = [FindingSeverity.Refuse],
        },
        new(GuardNames.SaturatedInput, "an input at the end of its range", SaturatedInput)
        {
            Limit = "the ends that were entered",
            Source = LimitSources.Entered,
            Severities = [FindingSeverity.Refuse],
        },
        new(GuardNames.Steady, "temperature and signal, both steady over the window", Steady)
        {
            Limit = "trend over the window and scatter within what may still move, of each; a temperature that nobody watched wants a reason",
            Source = "both steady: " + LimitSources.FieldManual + "; the figures " + LimitSources.OurChoice,
            Severities = [FindingSeverity.NeedsReason, FindingSeverity.Refuse],
        },
        new(GuardNames.DisplayUnit, "mg/L taken for %, or % for mg/L", DisplayUnit)
        {
            Limit = "within 25 % of saturation in the other unit alone",
            Source = LimitSources.OurChoice,
            Severities = [FindingSeverity.NeedsReason],
        },
        new(GuardNames.PercentScale, "% of local saturation taken for % at 1 atm, or the other way round", PercentScale)
        {
            Limit = "within 1.5 % of 100 on the other scale, and 3 % off on the stated one",
            Source = LimitSources.OurChoice,
            Severities = [FindingSeverity.Note],
        },
        new(GuardNames.TitrationLow, "a titration of too little oxygen", TitrationLow)
        {
            Limit = "20 µmol/kg",
            Source = LimitSources.OceanGliders,
            Severities = [FindingSeverity.NeedsReason],
        },
    ];

    private static Finding? DeadInput(Situation now)
    {
        bool dead = now.Point is { Typed: false } point && 10 <= point.Signal.Count && point.Signal.Minimum == point.Signal.Maximum;
        return !dead ? null : new Finding(GuardNames.DeadInput, FindingSeverity.Refuse, Text(
            $"the signal stays at {Number.Print(now.Point!.Signal.Mean)} {now.Setup.Probe.SignalUnit} without moving by a step of the converter; a dead input is perfectly steady"),
            PossibleError.Unknown("what it shows has nothing to do with the water"),
            "check plug, cable and power of the probe");
    }

    private static Finding? SaturatedInput(Situation now)
    {
        bool atEnd = now.Point is { Typed: false } point
            && (point.Signal.Minimum <= now.Setup.Probe.SignalLow || now.Setup.Probe.SignalHigh <= point.Signal.Maximum);
        return !atEnd ? null : new Finding(GuardNames.SaturatedInput, FindingSeverity.Refuse, Text(
            $"the signal touches the end of its range ({Number.Print(now.Point!.Signal.Minimum)} to {Number.Print(now.Point.Signal.Maximum)} {now.Setup.Probe.SignalUnit} in the window)"),
            PossibleError.Unknown("what lies beyond the end is not seen"),
            "choose another range of the converter or check the probe");
    }

    private static Finding? Steady(Situation now)
    {
        if (now.Point is not { Typed: false } point)
        {
            return null;
        }

        double? saturation = now.SaturationAt(point.Temperature.Value, point.Pressure.Value);
        if (point.TemperatureStatistics is not RecordedStatistics temperature)
        {
            return new Finding(GuardNames.Steady, FindingSeverity.NeedsReason, Text(
                $"only the signal was watched: temperature was typed, and nothing says that it was steady; had it changed by {Number.Print(UnwatchedKelvin)} K"),
                PossibleError.OfReference(saturation, now.SaturationAt(point.Temperature.Value + UnwatchedKelvin, point.Pressure.Value)),
                "let the lines carry the temperature, or say how you saw that it was steady");
        }

        WaitingRules rules = now.Setup.Waiting;
        double moved = Moved(temperature);
        if (rules.Kelvin < moved)
        {
            return new Finding(GuardNames.Steady, FindingSeverity.Refuse, Text(
                $"temperature moved by {Number.Fixed(moved, 3)} K in the window (limit {Number.Print(rules.Kelvin)} K)"),
                PossibleError.OfReference(saturation, now.SaturationAt(point.Temperature.Value + moved, point.Pressure.Value)),
                "wait until temperature and signal are both steady");
        }

        // One unit of signal in mg/L: at the zero point from the 100 % point, otherwise from the point itself.
        double spread = point.Role == CalibrationIds.ZeroPoint && now.Span is RecordedPoint span
            ? span.ReferenceMilligramsPerLitre / (span.Signal.Mean - point.Signal.Mean)
            : point.ReferenceMilligramsPerLitre / (point.Signal.Mean - (now.Previous?.Zero.Signal ?? 0));
        double milligrams = Math.Abs(Moved(point.Signal) * spread);
        return rules.MilligramsPerLitre < milligrams && double.IsFinite(milligrams)
            ? new Finding(GuardNames.Steady, FindingSeverity.Refuse, Text(
                $"the signal moved by {Number.Fixed(milligrams, 3)} mg/L in the window (limit {Number.Print(rules.MilligramsPerLitre)} mg/L)"),
                PossibleError.Known(Math.Sign(point.Signal.SlopePerMinute) * -milligrams, Math.Sign(point.Signal.SlopePerMinute) * milligrams),
                "wait until temperature and signal are both steady")
            : null;
    }

    private static double Moved(RecordedStatistics window)
    {
        return Math.Max(window.StandardDeviation, Math.Abs(window.SlopePerMinute) * window.WindowSeconds / 60);
    }

    private static Finding? DisplayUnit(Situation now)
    {
        if (Saturated(now) is not (RecordedPoint point, RecordedMeterSettings meter, double milligrams))
        {
            return null;
        }

        bool concentration = meter.Shows == "mg/L";
        double shown = point.Signal.Mean;
        double here = concentration ? milligrams : 100;
        double other = concentration ? 100 : milligrams;
        bool slip = UnitLikenessPercent < 100 * Math.Abs((shown / here) - 1) && 100 * Math.Abs((shown / other) - 1) < UnitLikenessPercent;
        return !slip ? null : new Finding(GuardNames.DisplayUnit, FindingSeverity.NeedsReason, Text(
            $"the meter shows {Number.Print(shown)} and is stated to show {meter.Shows}, where saturation is {Number.Fixed(here, concentration ? 2 : 0)}; as {(concentration ? "%" : "mg/L")} it would be near saturation"),
            PossibleError.OfSignal(milligrams, other / here),
            "look at the unit on the display and state it with --meter-shows");
    }

    private static Finding? PercentScale(Situation now)
    {
        if (Saturated(now) is not (RecordedPoint point, RecordedMeterSettings meter, double milligrams) || meter.Shows == "mg/L")
        {
            return null;
        }

        bool computed = OxygenEquilibrium.PartialPressure(point.Temperature.Value, point.Pressure.Value, RangeRule.Refuse, out double here) == Status.Ok
            & Saturation.PercentOneAtmosphere(here, point.Temperature.Value, RangeRule.Refuse, out double oneAtmosphere) == Status.Ok;
        // What a right meter shows in saturated water: 100 on the local scale, this on that of 1 atm.
        bool local = meter.Shows == "%local";
        double stated = local ? 100 : oneAtmosphere;
        double other = local ? oneAtmosphere : 100;
        double shown = point.Signal.Mean;
        bool slip = computed
            && ScaleDistancePercent < 100 * Math.Abs((shown / stated) - 1)
            && 100 * Math.Abs((shown / other) - 1) < ScaleLikenessPercent;
        return !slip ? null : new Finding(GuardNames.PercentScale, FindingSeverity.Note, Text(
            $"the meter shows {Number.Print(shown)} % and is stated to show {meter.Shows}, on which saturated water is {Number.Fixed(stated, 1)} here; on the other scale it would be {Number.Fixed(other, 1)}"),
            PossibleError.OfSignal(milligrams, other / stated),
            "look in the meter's menu whether 100 % is saturation at the local pressure or at 1 atm, and state it with --meter-shows");
    }

    /// <summary>The point, its meter and the concentration at saturation, for a meter's reading in saturated water or air.</summary>
    private static (RecordedPoint Point, RecordedMeterSettings Meter, double MilligramsPerLitre)? Saturated(Situation now)
    {
        return now.PointMethod is MethodIds.AirSaturatedWater or MethodIds.WaterSaturatedAir
            && now.Setup.Probe.MeterSettings is RecordedMeterSettings meter
            && now.SaturationAt(now.Point!.Temperature.Value, now.Point.Pressure.Value, meter.Salinity) is double milligrams
            ? (now.Point, meter, milligrams)
            : null;
    }

    private static Finding? TitrationLow(Situation now)
    {
        if (now.PointMethod != MethodIds.Titration || now.Point is not RecordedPoint point)
        {
            return null;
        }

        bool computed = DensityEos80.Density(point.Temperature.Value, point.Salinity.Value, RangeRule.Refuse, out double density) == Status.Ok
            & OxygenUnits.MicromolesPerKilogramFromMilligramsPerLitre(point.ReferenceMilligramsPerLitre, density, out double micromoles) == Status.Ok;
        bool low = computed && micromoles < TitrationLowMicromolesPerKilogram;
        return !low ? null : new Finding(GuardNames.TitrationLow, FindingSeverity.NeedsReason, Text(
            $"the titration found {Number.Fixed(micromoles, 1)} µmol/kg, below 20 µmol/kg, where air that got in counts as much as the sample; were it {Number.Fixed(TitrationMilligramsPerLitre, 3)} mg/L too high, as titrations at sea are uncertain by"),
            PossibleError.OfReference(point.ReferenceMilligramsPerLitre, point.ReferenceMilligramsPerLitre - TitrationMilligramsPerLitre),
            "use a zero solution or a gas without oxygen for low points");
    }
}
