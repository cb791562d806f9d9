using System;
using System.Collections.Generic;
using System.Linq;
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

    /// <summary>Fewest earlier calibrations on a membrane that say what is usual for it (our choice, no source).</summary>
    public const int LeastHistory = 4;

    /// <summary>How many spreads from the median are out of line (our choice, no source).</summary>
    public const double SpreadsOutOfLine = 3;

    /// <summary>From the median of the distances to the standard deviation of a normal distribution.</summary>
    private const double DeviationPerMedianDistance = 1.4826;

    /// <summary>A probe whose slope repeats better than this is not blamed for less, % (our choice, no source).</summary>
    private const double LeastSpreadPercent = 0.5;

    /// <summary>All of them.</summary>
    public static IReadOnlyList<Guard> All { get; } =
    [
        new(GuardNames.Zero, "a zero above the 100 % point", ZeroAboveSpan)
        {
            Limit = "the 100 % point",
            Source = LimitSources.Nature,
            Severities = [FindingSeverity.Refuse],
        },
        new(GuardNames.MakerWindow, "slope and zero against the window of the probe's maker, if one was entered", OutsideMakerWindow)
        {
            Limit = "the window that was entered; none otherwise (the slope's window decides as a limit as well)",
            Source = LimitSources.Entered,
            Severities = [FindingSeverity.Note],
        },
        new(GuardNames.Slope, "the slope against the last one of this probe", SlopeChange)
        {
            Limit = "25 %",
            Source = "largest jumps in 56 calibrations of a public observatory record, computed from the Ocean Observatories Initiative's calibration files",
            Severities = [FindingSeverity.NeedsReason],
        },
        new(GuardNames.SlopeHistory, "the slope against the earlier ones of this probe on this membrane", SlopeOutOfLine)
        {
            Limit = "3 spreads (of 0.5 % at least) from the median of 4 calibrations or more",
            Source = LimitSources.OurChoice,
            Severities = [FindingSeverity.NeedsReason],
        },
        new(GuardNames.ZeroHistory, "a measured zero against the earlier ones of this probe on this membrane", ZeroOutOfLine)
        {
            Limit = "3 spreads (of 0.02 mg/L at least) from the median of 4 measured zeros or more",
            Source = LimitSources.OurChoice,
            Severities = [FindingSeverity.NeedsReason],
        },
        new(GuardNames.GuardBand, "a guard band, if one was asked for, against the uncertainty of what it judges", GuardBand)
        {
            Limit = "U (k = 2) of the error at the 100 % point below its limit",
            Source = LimitSources.Nature,
            Severities = [FindingSeverity.Refuse],
        },
        new(GuardNames.AsFound, "the reading before adjustment", AsFound)
        {
            Limit = "95 to 105 %",
            Source = LimitSources.OceanGliders,
            Severities = [FindingSeverity.Note],
        },
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

    private static Finding? OutsideMakerWindow(Situation now)
    {
        if (now.Fit is not ProbeCalibration fit)
        {
            return null;
        }

        CalibrationLimits limits = now.Setup.Limits;
        string unit = now.Setup.Probe.SignalUnit;
        if (fit.Slope < limits.SlopeLow || limits.SlopeHigh < fit.Slope)
        {
            double nearest = fit.Slope < limits.SlopeLow ? limits.SlopeLow.Value : limits.SlopeHigh!.Value;
            return new Finding(GuardNames.MakerWindow, FindingSeverity.Note, Text(
                $"slope {Number.Significant(fit.Slope, 4)} {unit}/hPa is outside the maker's window ({Number.Print(limits.SlopeLow ?? double.NaN)} to {Number.Print(limits.SlopeHigh ?? double.NaN)}, {LimitSources.Entered}); were its nearest end right"),
                PossibleError.OfSignal(now.SaturationMilligramsPerLitre, fit.Slope / nearest),
                "look at membrane, electrolyte and reference before going on; the calibration fails by this limit");
        }

        if (fit.Zero is not ZeroPoint zeroPoint)
        {
            return null;
        }

        double zero = zeroPoint.Signal;
        bool outside = zeroPoint.IsMeasured && (zero < limits.ZeroSignalLow || limits.ZeroSignalHigh < zero);
        return !outside ? null : new Finding(GuardNames.MakerWindow, FindingSeverity.Note, Text(
            $"zero {Number.Significant(zero, 4)} {unit} is outside the maker's window ({Number.Print(limits.ZeroSignalLow ?? double.NaN)} to {Number.Print(limits.ZeroSignalHigh ?? double.NaN)}, {LimitSources.Entered}); were its nearest end right"),
            ZeroError(now, zero - (zero < limits.ZeroSignalLow ? limits.ZeroSignalLow.Value : limits.ZeroSignalHigh!.Value)),
            "use fresh zero solution; if it stays so, service membrane and electrolyte");
    }

    private static Finding? SlopeOutOfLine(Situation now)
    {
        if (now.Fit is not ProbeCalibration fit)
        {
            return null;
        }

        double[] earlier = [.. Comparable(now).Select(static record => record.Result.Slope)];
        if (earlier.Length < LeastHistory)
        {
            return null;
        }

        (double median, double spread) = MedianAndSpread(earlier);
        double floor = Math.Abs(median) * LeastSpreadPercent / 100;
        double width = Math.Max(spread, floor);
        double spreads = Math.Abs(fit.Slope - median) / width;
        return spreads <= SpreadsOutOfLine ? null : new Finding(GuardNames.SlopeHistory, FindingSeverity.NeedsReason, Text(
            $"the slope {Number.Significant(fit.Slope, 4)} is {Number.Fixed(spreads, 1)} spreads from the median {Number.Significant(median, 4)} of {earlier.Length} calibrations {OnMembrane(now)} (spread {Number.Significant(width, 2)}); were the median still right"),
            PossibleError.OfSignal(now.SaturationMilligramsPerLitre, fit.Slope / median),
            "make sure of temperature, pressure, stirring and the state of the reference, look for a bubble or a tear, and take the point again");
    }

    private static Finding? ZeroOutOfLine(Situation now)
    {
        if (now.Fit is not { Zero.IsMeasured: true, ResponseSpan: > 0 } fit || now.Span is not RecordedPoint span)
        {
            return null;
        }

        double[] earlier = [.. Comparable(now).Where(static record => record.Zero.Source == "measured").Select(static record => record.Zero.Signal)];
        if (earlier.Length < LeastHistory)
        {
            return null;
        }

        (double median, double spread) = MedianAndSpread(earlier);
        double floor = PointMaker.ZeroSolutionMilligramsPerLitre * fit.ResponseSpan / span.ReferenceMilligramsPerLitre;
        double width = Math.Max(spread, floor);
        double spreads = Math.Abs(fit.Zero.Signal - median) / width;
        return spreads <= SpreadsOutOfLine ? null : new Finding(GuardNames.ZeroHistory, FindingSeverity.NeedsReason, Text(
            $"the zero {Number.Significant(fit.Zero.Signal, 4)} is {Number.Fixed(spreads, 1)} spreads from the median {Number.Significant(median, 4)} of {earlier.Length} measured zeros {OnMembrane(now)} (spread {Number.Significant(width, 2)}); were the median still right"),
            ZeroError(now, fit.Zero.Signal - median),
            "use fresh zero solution and keep air out; if it stays so, service membrane and electrolyte");
    }

    /// <summary>What a zero that is too high by some signal does: the zero solution looks high, and once adjusted all readings near zero are low.</summary>
    private static PossibleError ZeroError(Situation now, double tooHigh)
    {
        double milligrams = tooHigh / now.Fit!.ResponseSpan * (now.Span?.ReferenceMilligramsPerLitre ?? double.NaN);
        return PossibleError.Known(milligrams, -milligrams);
    }

    /// <summary>Earlier calibrations whose figures mean the same: this model and unit, this coefficient, this membrane.</summary>
    private static IEnumerable<CalibrationRecord> Comparable(Situation now)
    {
        RecordedProbe probe = now.Setup.Probe;
        return now.History.Where(record => record.Fit == null && record.Probe.Model == probe.Model && record.Probe.SignalUnit == probe.SignalUnit
            && record.Probe.TemperatureCoefficient.ReferenceCelsius == probe.TemperatureCoefficient.ReferenceCelsius
            && record.Probe.Membrane?.Id == probe.Membrane?.Id);
    }

    private static string OnMembrane(Situation now)
    {
        return now.Setup.Probe.Membrane is RecordedMembrane membrane ? "on membrane " + membrane.Id : "of this probe";
    }

    private static (double Median, double Spread) MedianAndSpread(double[] values)
    {
        double median = Median(values);
        return (median, DeviationPerMedianDistance * Median([.. values.Select(value => Math.Abs(value - median))]));
    }

    private static double Median(double[] values)
    {
        double[] sorted = [.. values.Order()];
        int half = sorted.Length / 2;
        return sorted.Length % 2 == 1 ? sorted[half] : (sorted[half - 1] + sorted[half]) / 2;
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

    private static Finding? GuardBand(Situation now)
    {
        if (!now.Setup.Limits.GuardBand || now.Fit is not ProbeCalibration fit || now.Span is not RecordedPoint span)
        {
            return null;
        }

        ErrorLimit limit = ErrorLimit.Of(now.Setup, span, fit);
        double? expanded = Decision.CoverageFactor * limit.StandardUncertainty;
        return double.IsNaN(limit.Width) || expanded < limit.Width ? null : new Finding(GuardNames.GuardBand, FindingSeverity.Refuse,
            Decision.NoBand(limit.Width, expanded, limit.Unit),
            PossibleError.Unknown("no reading is wrong by this"),
            "go on without a guard band (simple acceptance, with U printed beside the limit), or know the reference better");
    }

    private static Finding? AsFound(Situation now)
    {
        // The band of 95 to 105 % is one of dissolved oxygen.
        if (!PlanCheck.IsOxygen(now.Setup) || now.Span is not { ErrorMilligramsPerLitre: double error } span)
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
