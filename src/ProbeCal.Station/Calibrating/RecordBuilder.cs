using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>From the finished state to the record.</summary>
internal static class RecordBuilder
{
    private const string OxygenInAir = "oxygen in water-saturated air: 0.20946 (P - vapour pressure), vapour pressure by Benson and Krause 1980";

    private static readonly string[] Formulas =
    [
        "station pressure against sea level: ICAO standard atmosphere",
        "mean, trend and scatter by least squares; uncertainty by JCGM 100:2008",
    ];

    internal static CalibrationRecord Build(SessionState state, Fit fit, CalibrationRecord? previous, DateTimeOffset nowUtc, string software)
    {
        CalibrationSetup setup = state.Setup;
        ProbeCalibration calibration = fit.Calibration ?? throw new InvalidOperationException("A record needs a fit.");
        bool check = setup.Purpose == CalibrationRecord.CheckPurpose;
        RecordedPoint slopePoint = state.Points.FirstOrDefault(point => point.Role == fit.SlopeFrom)
            ?? Fitting.Point(state.Points, CalibrationIds.SpanPoint)
            ?? state.Points[0];
        DateTimeOffset last = state.Points.Max(static point => point.LastUtc);
        List<RecordedLimit> limits = Judgement.Limits(setup, state.Points, calibration);
        string[] reasons = Judgement.Reasons(limits);
        CheckedBudget budget = CheckedBudget.Of(setup, slopePoint, fit, calibration, previous);
        return new CalibrationRecord
        {
            Simulated = setup.Simulated,
            StartedUtc = state.StartedUtc,
            CompletedUtc = last < nowUtc ? last : nowUtc,
            By = setup.By,
            Site = setup.Site,
            Altitude = setup.Altitude,
            Purpose = setup.Purpose,
            CheckKind = setup.CheckKind,
            Equipment = Equipment(setup, state.Points),
            Steps = [.. state.Steps],
            Fit = fit.Several,
            Gas = ModelNames.IsTotalPressure(setup.Probe.Model) ? "total" : GasNames.NameOf(setup.Gas),
            Probe = setup.Probe,
            Method = setup.Method,
            Readings = setup.Readings,
            Source = setup.Source,
            AirToWaterRatio = setup.AirToWaterRatio,
            ReferenceState = new RecordedQuantity
            {
                Value = 1,
                Unit = "1",
                StandardUncertainty = setup.ReferenceStateRelative,
                Source = "equilibrium taken as reached",
                UncertaintySource = Judgement.ReferenceStateSource(setup),
            },
            Equation = EquationNames.NameOf(setup.Equation),
            Formulas = [.. PlanCheck.IsOxygen(setup) ? [OxygenInAir] : Array.Empty<string>(), .. Formulas, .. budget.Text is string trials ? [trials] : Array.Empty<string>()],
            Points = [.. state.Points],
            SlopeFrom = fit.SlopeFrom,
            Zero = fit.Zero,
            PreviousCalibration = previous?.Id,
            DropletCheck = setup.Plan.Any(static point => point.Method == MethodIds.WaterSaturatedAir) ? state.DropletCheck ?? Droplets.NotChecked : Droplets.NotNeeded,
            Result = new RecordedResult
            {
                Slope = calibration.Slope,
                SlopeStandardUncertainty = check ? previous!.Result.SlopeStandardUncertainty : Math.Abs(calibration.Slope) * calibration.SlopeRelativeUncertainty(),
                Zero = calibration.ZeroResponse,
                ZeroStandardUncertainty = calibration.ZeroResponseUncertainty,
                Pass = reasons.Length == 0,
                Reasons = reasons,
                DecisionRule = Decision.RuleOf(setup.Limits),
            },
            Limits = [.. limits],
            Findings = budget.Disagreement == null ? [.. state.Findings] : [.. state.Findings, budget.Disagreement.ToRecord(null)],
            Budget = budget.Table,
            Software = software,
            Remarks = setup.Remarks,
        };
    }

    /// <summary>What was named for the whole work, and what a point's reference names of its own.</summary>
    private static string[] Equipment(CalibrationSetup setup, IEnumerable<RecordedPoint> points)
    {
        return [.. setup.Equipment.Concat(points.SelectMany(static point => point.Reference?.Equipment ?? [])).Distinct()];
    }
}
