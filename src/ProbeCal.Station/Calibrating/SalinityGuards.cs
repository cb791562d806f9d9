using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using static ProbeCal.Station.Calibrating.Finding;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// The guards on salinity. It enters mg/L only: a partial pressure or a percentage knows none. Grams per kilogram of sea salt are
/// 1.00472 times the practical salinity (TEOS-10), which is 0.02 mg/L at most and cannot be told by the value; a conductivity can.
/// </summary>
internal static class SalinityGuards
{
    /// <summary>How near the salinity behind a conductivity comes to the last one here to be called it, % of it (our choice, no source).</summary>
    private const double LikePercent = 3;

    /// <summary>How far the entered figure is from the last one here before the other is looked for, % of it (our choice, no source).</summary>
    private const double UnlikePercent = 10;

    /// <summary>All of them.</summary>
    public static IReadOnlyList<Guard> All { get; } =
    [
        new(GuardNames.SalinityUnit, "a conductivity in mS/cm typed as salinity", SalinityUnit)
        {
            Limit = "refused above 42; reason where it is 10 % off the last salinity here, and taken as mS/cm within 3 % of it",
            Source = "42: range of the practical salinity scale (PSS-78); 10 and 3 % " + LimitSources.OurChoice,
            Severities = [FindingSeverity.NeedsReason, FindingSeverity.Refuse],
        },
        new(GuardNames.SalinityTwice, "salinity set in the meter and entered as well", SalinityTwice)
        {
            Limit = "both not 0, in a meter that shows mg/L",
            Source = "keep the meter at 0: " + LimitSources.OceanGliders,
            Severities = [FindingSeverity.NeedsReason],
        },
        new(GuardNames.SalinityLeftOver, "salinity left in the meter or in the entries from the last place", SalinityLeftOver)
        {
            Limit = "set in a meter that shows mg/L while the water is fresh; or the very figure of this probe's last record, at another site",
            Source = "symptom: " + LimitSources.OceanGliders,
            Severities = [FindingSeverity.NeedsReason],
        },
    ];

    private static Finding? SalinityUnit(Situation now)
    {
        double salinity = now.Setup.Salinity.Value;
        if (now.TemperatureCelsius is not double celsius)
        {
            return null;
        }

        Status status = PracticalSalinity.FromConductivity(salinity, celsius, 0, RangeRule.Extrapolate, out double behind);
        string conductivity = double.IsNaN(behind) ? "" : Text($"; {Number.Print(salinity)} mS/cm at this temperature would be a salinity of {Number.Fixed(behind, 1)}");
        if (PracticalSalinity.HighestSalinity < salinity)
        {
            return new Finding(GuardNames.SalinityUnit, FindingSeverity.Refuse, Text(
                $"salinity {Number.Print(salinity)} is above 42, where the practical salinity scale ends{conductivity}"),
                PossibleError.Unknown("no reference can be computed there"),
                "enter the practical salinity of the water, not its conductivity");
        }

        bool comparable = status == Status.Ok && now.LastHere is { Points.Length: > 0 } && 0 < now.LastHere.Points[0].Salinity.Value;
        if (!comparable)
        {
            return null;
        }

        double last = now.LastHere!.Points[0].Salinity.Value;
        bool slip = UnlikePercent < 100 * Math.Abs((salinity / last) - 1) && 100 * Math.Abs((behind / last) - 1) < LikePercent;
        return !slip ? null : new Finding(GuardNames.SalinityUnit, FindingSeverity.NeedsReason, Text(
            $"salinity {Number.Print(salinity)} is far from the last one here ({Number.Print(last)}){conductivity}"),
            PossibleError.OfReference(now.SaturationMilligramsPerLitre, now.SaturationAt(celsius, now.PressureHectopascal, behind)),
            "look at what the instrument shows, and enter the practical salinity");
    }

    private static Finding? SalinityTwice(Situation now)
    {
        bool both = ShownConcentration(now) is { Salinity: > 0 } && 0 < now.Setup.Salinity.Value;
        if (!both)
        {
            return null;
        }

        double set = now.Setup.Probe.MeterSettings!.Salinity;
        return new Finding(GuardNames.SalinityTwice, FindingSeverity.NeedsReason, Text(
            $"salinity {Number.Print(set)} is set in the meter and {Number.Print(now.Setup.Salinity.Value)} is entered as well; were it counted twice"),
            PossibleError.OfSignal(now.SaturationMilligramsPerLitre, Share(now, set)),
            "set the meter to salinity 0 and enter the water's alone; where it must stay, make sure that the meter shows what was stated");
    }

    private static Finding? SalinityLeftOver(Situation now)
    {
        double entered = now.Setup.Salinity.Value;
        if (ShownConcentration(now) is { Salinity: > 0 } meter && entered == 0)
        {
            return new Finding(GuardNames.SalinityLeftOver, FindingSeverity.NeedsReason, Text(
                $"salinity {Number.Print(meter.Salinity)} is set in the meter and the water is entered as fresh"),
                PossibleError.OfSignal(now.SaturationMilligramsPerLitre, Share(now, meter.Salinity)),
                "set the meter to salinity 0");
        }

        bool moved = now.Previous is { Points.Length: > 0, Site: not null } previous
            && now.Setup.Site != null && now.Setup.Site != previous.Site
            && now.Setup.Method != CalibrationIds.WaterSaturatedAir
            && 0 < entered && previous.Points[0].Salinity.Value == entered;
        return !moved ? null : new Finding(GuardNames.SalinityLeftOver, FindingSeverity.NeedsReason, Text(
            $"salinity {Number.Print(entered)} is the very figure of the last calibration of this probe, at {now.Previous!.Site}; were the water here fresh"),
            PossibleError.OfReference(now.SaturationMilligramsPerLitre, now.SaturationAt(now.TemperatureCelsius, now.PressureHectopascal, 0)),
            "measure the salinity here and enter it");
    }

    private static RecordedMeterSettings? ShownConcentration(Situation now)
    {
        return now.Setup.Probe.MeterSettings is { Shows: "mg/L" } meter ? meter : null;
    }

    /// <summary>What a salinity leaves of the mg/L in fresh water.</summary>
    private static double Share(Situation now, double salinity)
    {
        double? ratio = now.SaturationAt(now.TemperatureCelsius, now.PressureHectopascal, salinity) / now.SaturationAt(now.TemperatureCelsius, now.PressureHectopascal, 0);
        return ratio ?? double.NaN;
    }
}
