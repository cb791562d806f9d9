using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// The ordered plan of a calibration or a check, as data, made of its set-up alone. The order is the same for every combination: preparation; the 100 % point and its look for droplets; further
/// levels; a zero that adjusts; rinsing; the 100 % point as left; a zero that only checks; rinsing and a last look at 100 %. Nothing comes after an opened zero solution without a rinse, and what the
/// instrument has of other sensors is calibrated before it is opened (TM 9-A6.2).
/// </summary>
internal static class Procedures
{
    /// <summary>The steps in their order. Their ids are unique within a plan.</summary>
    internal static IReadOnlyList<ProcedureStep> For(CalibrationSetup setup)
    {
        bool check = setup.Purpose == CalibrationRecord.CheckPurpose;
        List<PlannedPoint> levels = [.. setup.Plan.Where(static point => !MethodIds.IsZero(point.Method))];
        List<PlannedPoint> zeros = [.. setup.Plan.Where(static point => MethodIds.IsZero(point.Method))];
        bool zeroIsPlanned = setup.ZeroPlan is CalibrationIds.ZeroAdjust or CalibrationIds.ZeroCheck;
        if (zeroIsPlanned && zeros.Count == 0)
        {
            zeros.Add(setup.PlannedFor(CalibrationIds.ZeroPoint));
        }

        PlannedPoint? span = levels.FirstOrDefault(static point => point.Role == CalibrationIds.SpanPoint) ?? levels.FirstOrDefault();
        bool zeroLast = check || setup.ZeroPlan == CalibrationIds.ZeroCheck;
        List<ProcedureStep> steps = [ProcedureSteps.Prepare(setup)];
        if (zeros.Exists(static zero => zero.Method == MethodIds.ZeroSolution))
        {
            steps.Add(ProcedureSteps.OtherSensors);
        }

        HashSet<string> prepared = [];
        if (span != null)
        {
            AddLevel(span);
            foreach (PlannedPoint level in levels)
            {
                if (level != span)
                {
                    AddLevel(level);
                }
            }
        }

        if (!zeroLast)
        {
            AddZeros();
        }

        if (!check && span != null)
        {
            steps.Add(ProcedureSteps.AsLeft(setup, span, moved: 1 < levels.Count || (!zeroLast && zeros.Count != 0)));
        }

        if (zeroLast && zeros.Count != 0)
        {
            AddZeros();
            if (span != null)
            {
                steps.Add(ProcedureSteps.LastLook(span));
            }
        }

        return steps;

        void AddLevel(PlannedPoint point)
        {
            // Each cylinder is connected anew.
            if (prepared.Add(point.Method + " " + (point.Method == MethodIds.GasMixture ? point.Mixture?.Cylinder : "")))
            {
                steps.AddRange(ProcedureSteps.Before(setup, point));
            }

            steps.Add(ProcedureSteps.Point(setup, point));
            bool looked = steps.Exists(static step => step.Kind == StepKind.Droplets);
            if (point.Method == MethodIds.WaterSaturatedAir && !looked && !ModelNames.IsTotalPressure(setup.Probe.Model))
            {
                steps.Add(ProcedureSteps.LookForDroplets);
            }
        }

        void AddZeros()
        {
            foreach (PlannedPoint zero in zeros)
            {
                steps.AddRange(ProcedureSteps.Before(setup, zero));
                steps.Add(ProcedureSteps.Point(setup, zero));
            }

            if (zeros.Exists(static zero => zero.Method == MethodIds.ZeroSolution))
            {
                steps.Add(ProcedureSteps.Rinse);
            }
        }
    }
}
