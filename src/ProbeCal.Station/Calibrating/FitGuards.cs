using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using static ProbeCal.Station.Calibrating.Finding;

namespace ProbeCal.Station.Calibrating;

/// <summary>The guards on slope and zero, once there is a fit and before the probe counts as adjusted.</summary>
internal static class FitGuards
{
    /// <summary>
    /// Change of the slope since the last calibration that wants a reason, %: of 56 calibrations of seven membrane sensors of a
    /// public observatory record, jumps of 10 to 25 % were the largest.
    /// </summary>
    public const double SlopeChangePercent = 25;

    /// <summary>Before adjustment a probe in saturated water reads within this many % of it (OceanGliders oxygen practice).</summary>
    public const double AsFoundPercent = 5;

    /// <summary>All of them.</summary>
    public static IReadOnlyList<Guard> All { get; } =
    [
        new(GuardNames.Zero, "a zero above the 100 % point", ZeroAboveSpan),
        new(GuardNames.Slope, "the slope against the last one of this probe", SlopeChange),
        new(GuardNames.AsFound, "the reading before adjustment", AsFound),
    ];

    private static Finding? ZeroAboveSpan(Situation now)
    {
        (string Saw, string Do)? wrong = now.FitStatus switch
        {
            Status.Ok => null,
            Status.ZeroAboveRange => ("the zero lies above the 100 % point", "look for points mixed up, an input wired backwards, or a zero solution full of air"),
            Status.PointsDegenerate => ("the zero and the 100 % point read the same", "look for an input that is not connected, or a probe that was not moved"),
            _ => ($"the points make no calibration ({now.FitStatus})", "take them again"),
        };
        return wrong == null ? null : new Finding(GuardNames.Zero, FindingSeverity.Refuse, wrong.Value.Saw, PossibleError.Unknown("no slope comes out of it, so no reading either"), wrong.Value.Do);
    }

    private static Finding? SlopeChange(Situation now)
    {
        bool comparable = now.Fit != null && now.Previous != null
            && now.Previous.Probe.Model == now.Setup.Probe.Model
            && now.Previous.Probe.SignalUnit == now.Setup.Probe.SignalUnit
            && now.Previous.Result.Slope != 0;
        if (!comparable)
        {
            return null;
        }

        double percent = 100 * ((now.Fit!.Slope / now.Previous!.Result.Slope) - 1);
        if (Math.Abs(percent) <= SlopeChangePercent)
        {
            return null;
        }

        return new Finding(GuardNames.Slope, FindingSeverity.NeedsReason, Text(
            $"the slope is {Number.Fixed(Math.Abs(percent), 0)} % {(percent < 0 ? "below" : "above")} that of {now.Previous.Id}, more than ageing explains; were the old one still right"),
            PossibleError.OfSignal(now.SaturationMilligramsPerLitre, 1 + (percent / 100)),
            "look for a new or torn membrane, a bubble, a wrong pressure, or another unit of the signal");
    }

    private static Finding? AsFound(Situation now)
    {
        if (now.Span is not { ErrorMilligramsPerLitre: double error } span)
        {
            return null;
        }

        double percent = 100 * error / span.ReferenceMilligramsPerLitre;
        return Math.Abs(percent) <= AsFoundPercent ? null : new Finding(GuardNames.AsFound, FindingSeverity.Note, Text(
            $"before adjustment the probe read {Number.Fixed(100 + percent, 1)} % in saturated {(now.Setup.Method == CalibrationIds.WaterSaturatedAir ? "air" : "water")}, outside 95 to 105 % (OceanGliders oxygen practice); were the probe right and the reference wrong"),
            PossibleError.Known(error, -error),
            "make sure of temperature, pressure and the state of the water first; if they are right, readings since the last calibration deserve a second look");
    }
}
