using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>Limits against what was found.</summary>
internal static class Judgement
{
    internal const string DecisionRule = "simple acceptance: an error within its limit passes, whatever its uncertainty U (k = 2), which is printed beside it with limit/U";

    /// <summary>Every limit that applies, judged. In a calibration the errors as left and a checked zero decide, in a check those of the calibration in force.</summary>
    /// <param name="setup">The set-up.</param>
    /// <param name="points">The points taken.</param>
    /// <param name="calibration">The new calibration; for a check the one in force.</param>
    internal static List<RecordedLimit> Limits(CalibrationSetup setup, IReadOnlyList<RecordedPoint> points, ProbeCalibration calibration)
    {
        bool check = setup.Purpose == CalibrationRecord.CheckPurpose;
        List<RecordedLimit> limits = [];
        foreach (RecordedPoint point in points)
        {
            switch (point.Role)
            {
                case CalibrationIds.SpanPoint:
                    limits.Add(Error("as-found", setup, point, calibration, decides: check));
                    // The band is one of dissolved oxygen.
                    if (PlanCheck.IsOxygen(setup) && point.ErrorMilligramsPerLitre != null && point.ReferenceMilligramsPerLitre != 0)
                    {
                        limits.Add(AsFoundBand(point));
                    }

                    break;
                case CalibrationIds.AsLeftPoint:
                    limits.Add(Error(CalibrationIds.AsLeftPoint, setup, point, calibration, decides: true));
                    break;
                case CalibrationIds.ZeroPoint:
                    // A zero that is adjusted was out of its limit for a reason, so that it does not decide; a check that fails fails the calibration.
                    limits.Add(Error(CalibrationIds.ZeroPoint, setup, point, calibration, decides: check || setup.ZeroPlan == CalibrationIds.ZeroCheck));
                    break;
                default:
                    limits.Add(Error(point.Role, setup, point, calibration, decides: check));
                    break;
            }
        }

        if (!check && setup.Limits.SlopeLow is double low && setup.Limits.SlopeHigh is double high)
        {
            limits.Add(Slope(low, high, calibration, setup));
        }

        return [.. limits.OrderBy(static limit => limit.Decides ? 0 : 1)];
    }

    internal static string[] Reasons(IEnumerable<RecordedLimit> limits)
    {
        return [.. limits.Where(static limit => limit.Decides && limit.Verdict != Decision.Pass).Select(Sentence)];
    }

    internal static string ReferenceStateSource(CalibrationSetup setup)
    {
        return setup.Method == CalibrationIds.WaterSaturatedAir
            ? "humidity of 95 to 100 % in a wet chamber, rectangular (computed)"
            : "aerated baths are typically within 0.5 to 1 % of saturation (from memory)";
    }

    private static string Sentence(RecordedLimit limit)
    {
        if (limit.Found is not double found)
        {
            return $"{limit.Check}: could not be judged against {limit.Limit}";
        }

        string what = $"{limit.Check} {Number.Fixed(found, 3)} {limit.Unit} is";
        return limit.Verdict == Decision.Inconclusive
            ? $"{what} within its limit, {limit.Limit} ({limit.Source}), but inconclusive: {(limit.GuardBand is double band ? $"not by the guard band of {Number.Fixed(band, 3)} {limit.Unit}" : limit.Applied)}"
            : $"{what} outside its limit, {limit.Limit} ({limit.Source})";
    }

    private static RecordedLimit Error(string check, CalibrationSetup setup, RecordedPoint point, ProbeCalibration calibration, bool decides)
    {
        ErrorLimit at = ErrorLimit.Of(setup, point, calibration);
        RecordedLimit limit = new()
        {
            Check = check,
            Limit = at.Text,
            Applied = at.Applied,
            Source = at.Source,
            Found = at.Found,
            Unit = at.Unit,
            Verdict = Decision.NotJudged,
            Decides = decides,
        };
        return Decision.Judged(limit, at.Width, at.StandardUncertainty, setup.Limits.GuardBand);
    }

    private static RecordedLimit AsFoundBand(RecordedPoint span)
    {
        double? percent = 100 + (100 * span.ErrorMilligramsPerLitre / span.ReferenceMilligramsPerLitre);
        return new RecordedLimit
        {
            Check = "as-found saturation",
            Limit = "95 to 105 %",
            Source = CalibrationLimits.OceanPractice,
            Found = percent,
            Unit = "%",
            Verdict = percent is not double read ? Decision.NotJudged : Math.Abs(read - 100) <= FitGuards.AsFoundPercent ? Decision.Pass : Decision.Fail,
            Decides = false,
        };
    }

    private static RecordedLimit Slope(double low, double high, ProbeCalibration calibration, CalibrationSetup setup)
    {
        string unit = (setup.Probe.SignalUnit.Length == 0 ? "signal" : setup.Probe.SignalUnit) + "/hPa";
        double slope = calibration.Slope;
        double expanded = Decision.CoverageFactor * Math.Abs(slope) * calibration.SlopeRelativeUncertainty();
        // A window has two ends; it is judged by simple acceptance, with U beside it.
        return new RecordedLimit
        {
            Check = "slope",
            Limit = $"{Number.Print(low)} to {Number.Print(high)} {unit}",
            Source = CalibrationLimits.Entered,
            Found = slope,
            Unit = unit,
            ExpandedUncertainty = double.IsFinite(expanded) ? expanded : null,
            CoverageFactor = double.IsFinite(expanded) ? Decision.CoverageFactor : null,
            LimitToUncertainty = double.IsFinite(expanded) && 0 < expanded ? (high - low) / 2 / expanded : null,
            Verdict = low <= slope && slope <= high ? Decision.Pass : Decision.Fail,
            Decides = true,
        };
    }
}
