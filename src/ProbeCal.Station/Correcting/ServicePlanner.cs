using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Correcting;

/// <summary>From visits and calibrations in the log to errors over time.</summary>
internal sealed class ServicePlanner
{
    private const double NotKnown = double.NaN;

    private readonly CalibrationLogStore _log;
    private readonly IReadOnlyList<CalibrationInUse> _calibrations;
    private readonly CorrectionRequest _request;
    private readonly List<StoredVisit> _visits;
    private readonly List<ServiceFinding> _findings = [];
    private readonly List<ErrorRamp> _drift = [];
    private readonly List<ErrorRamp> _fouling = [];

    private ServicePlanner(CalibrationLogStore log, IReadOnlyList<CalibrationInUse> calibrations, CorrectionRequest request)
    {
        (_log, _calibrations, _request) = (log, calibrations, request);
        string probe = calibrations[0].Record.Probe.Id;
        _visits = [.. log.Entries
            .Where(each => each.Entry is VisitRecord visit && visit.Probe == probe && !log.IsWithdrawn(visit.Id))
            .Select(static each => new StoredVisit((VisitRecord)each.Entry, each.Sha256))
            .OrderBy(static each => each.Record.BeforeUtc)];
    }

    /// <summary>What the log says about the deployment.</summary>
    /// <exception cref="InputException">A form is unknown, or a visit makes no error that can be taken back.</exception>
    internal static ServicePlan Plan(CalibrationLogStore log, IReadOnlyList<CalibrationInUse> calibrations, CorrectionRequest request)
    {
        string drift = OneOf("--drift", request.Drift, CorrectionForms.Forms);
        string fouling = OneOf("--fouling", request.Fouling, CorrectionForms.Forms);
        string from = OneOf("--drift-from", request.DriftFrom, CorrectionForms.DriftSources);
        ServicePlanner planner = new(log, calibrations, request);
        bool ofVisits = planner._visits.Count != 0 && (drift != CorrectionForms.None || fouling != CorrectionForms.None);
        if (ofVisits)
        {
            planner.LookAtVisits(withDrift: from == CorrectionForms.Visits && drift != CorrectionForms.None, withFouling: fouling != CorrectionForms.None);
        }

        if (from == CorrectionForms.Calibrations && drift != CorrectionForms.None)
        {
            planner.LookAtCalibrations();
        }

        VisitRecord? last = planner._visits.LastOrDefault(static each => each.Record.Cleaning.Length != 0)?.Record;
        return new ServicePlan
        {
            DriftForm = drift,
            FoulingForm = fouling,
            Drift = [.. planner._drift.OrderBy(static each => each.FromTicks)],
            Fouling = [.. planner._fouling.OrderBy(static each => each.FromTicks)],
            Limits = request.Limits,
            Findings = planner._findings,
            Brackets = Brackets.Of(log, calibrations[0].Record.Probe.Id),
            AtService = [.. planner._visits.Select(static each => (each.Record.BeforeUtc.UtcTicks, each.Record.AfterUtc.UtcTicks))],
            LastVisitTicks = fouling == CorrectionForms.None || last is null ? 0 : last.AfterUtc.UtcTicks,
        };
    }

    private void LookAtVisits(bool withDrift, bool withFouling)
    {
        RequireOxygenLimits();
        long cleanedAt = 0;
        // Where drift stands: each calibration begins it anew.
        Dictionary<CalibrationInUse, ErrorRamp> reached = [];
        foreach ((VisitRecord visit, string hash) in _visits)
        {
            CalibrationInUse? calibration = InForceAt(visit.BeforeUtc.UtcTicks);
            if (calibration is null)
            {
                continue;
            }

            ErrorState? fouled = withFouling && visit.Cleaning.Length != 0 ? FoulingOf(visit) : null;
            ErrorState? drifted = withDrift && visit.Standards.Length != 0 ? DriftOf(visit, calibration) : null;
            double total = Math.Abs(fouled?.MilligramsPerLitre ?? 0) + Math.Abs(drifted?.MilligramsPerLitre ?? 0);
            bool applied = ServiceErrors.IsApplied(total, _request.Limits);
            _findings.Add(new ServiceFinding(
                visit.Id, hash, visit.BeforeUtc.UtcTicks, fouled?.MilligramsPerLitre ?? NotKnown, fouled?.Percent ?? NotKnown, drifted?.MilligramsPerLitre ?? NotKnown,
                drifted?.Percent ?? NotKnown, total, applied));
            if (applied && fouled is not null)
            {
                long interval = Math.Max(cleanedAt, calibration.Record.CompletedUtc.UtcTicks);
                long onset = visit.FoulingOnsetUtc is DateTimeOffset began ? Math.Max(interval, began.UtcTicks) : interval;
                Add(_fouling, new ErrorRamp(interval, visit.BeforeUtc.UtcTicks + 1, onset, visit.BeforeUtc.UtcTicks, ErrorState.Nothing, fouled, visit.Id, Held: false));
            }

            if (applied && drifted is not null)
            {
                AddDrift(reached, calibration, visit, drifted);
            }

            cleanedAt = visit.Cleaning.Length == 0 ? cleanedAt : visit.AfterUtc.UtcTicks;
        }

        foreach ((CalibrationInUse calibration, ErrorRamp last) in reached)
        {
            // A probe that was found to drift and was not calibrated anew goes on with at least that drift.
            Add(_drift, new ErrorRamp(last.ToTicks, calibration.ToTicks, last.VisitTicks, last.VisitTicks, last.End, last.End, last.Found, Held: true));
        }
    }

    private void AddDrift(Dictionary<CalibrationInUse, ErrorRamp> reached, CalibrationInUse calibration, VisitRecord visit, ErrorState drifted)
    {
        long found = Math.Min((visit.StandardsUtc ?? visit.AfterUtc).UtcTicks, calibration.ToTicks);
        ErrorRamp? before = reached.GetValueOrDefault(calibration);
        long start = before?.ToTicks ?? calibration.Record.CompletedUtc.UtcTicks;
        ErrorState state = before?.End ?? (visit.BadCalibration ? drifted : ErrorState.Nothing);
        long onset = visit.DriftOnsetUtc is DateTimeOffset began ? Math.Max(start, began.UtcTicks) : start;
        ErrorRamp ramp = new(start, found, onset, found, state, drifted, visit.Id, Held: false);
        Add(_drift, ramp);
        reached[calibration] = ramp;
    }

    private void LookAtCalibrations()
    {
        RequireOxygenLimits();
        for (int i = 0; i + 1 < _calibrations.Count; i++)
        {
            CalibrationInUse calibration = _calibrations[i];
            CalibrationInUse next = _calibrations[i + 1];
            if (!SameProbe(calibration.Record, next.Record))
            {
                continue;
            }

            ErrorState drifted = DriftBetween(calibration, next);
            double total = Math.Abs(drifted.MilligramsPerLitre);
            bool applied = ServiceErrors.IsApplied(total, _request.Limits);
            _findings.Add(new ServiceFinding(
                next.Record.Id, next.Stored.Sha256, next.FromTicks, NotKnown, NotKnown, drifted.MilligramsPerLitre, drifted.Percent, total, applied));
            if (applied)
            {
                long from = calibration.Record.CompletedUtc.UtcTicks;
                Add(_drift, new ErrorRamp(from, next.FromTicks, from, next.FromTicks, ErrorState.Nothing, drifted, next.Record.Id, Held: false));
            }
        }
    }

    /// <summary>Another membrane, model or temperature coefficient is another probe: a line between the two would mean nothing.</summary>
    private bool SameProbe(CalibrationRecord before, CalibrationRecord after)
    {
        bool changed = _log.ServiceFor(before.Probe.Id).Any(each => each.Event == ServiceRecord.MembraneChanged && before.CompletedUtc < each.At && each.At <= after.CompletedUtc);
        return !changed && before.Probe.Membrane?.Id == after.Probe.Membrane?.Id && before.Probe.Model == after.Probe.Model
            && before.Probe.TemperatureCoefficient with { Source = "" } == after.Probe.TemperatureCoefficient with { Source = "" };
    }

    private static ErrorState DriftBetween(CalibrationInUse before, CalibrationInUse after)
    {
        RequireLine(before);
        RequireLine(after);
        double slope = after.Core.Slope / before.Core.Slope;
        double zero = after.Core.ZeroResponse - before.Core.ZeroResponse;
        RecordedPoint? found = Array.Find(after.Record.Points, point => point.Role == "span") ?? Array.Find(after.Record.Points, point => point.Role == after.Record.SlopeFrom);
        double standard = found?.ReferenceMilligramsPerLitre ?? NotKnown;
        // What the earlier calibration makes of the later one's 100 % point; a probe that was adjusted itself keeps what it then read.
        double reading = found?.ReadingMilligramsPerLitre is double read && found.ReadBy == before.Record.Id ? read : standard * slope;
        double error = ServiceErrors.Drift(standard, reading);
        return double.IsFinite(slope) && 0 < slope && double.IsFinite(error)
            ? new ErrorState(slope, zero, error, ServiceErrors.DriftPercent(error, reading))
            : throw new InputException($"calibration {after.Record.Id}: no drift can be told from it, its slope is of another kind than that of {before.Record.Id}; use --drift-from visits or --drift none");
    }

    private static ErrorState FoulingOf(VisitRecord visit)
    {
        VisitCleaning main = visit.Cleaning.MaxBy(static each => each.MonitorBefore)!;
        double error = FoulingOf(main);
        (double slope, double zero) = ServiceErrors.Line([.. visit.Cleaning.Select(static each => (each.MonitorBefore + FoulingOf(each), each.MonitorBefore))]);
        return 0 < slope && double.IsFinite(slope)
            ? new ErrorState(slope, zero, error, ServiceErrors.FoulingPercent(error, main.MonitorBefore))
            : throw new InputException($"visit {visit.Id}: fouling cannot scale with the reading, for the probe read {Number.Print(main.MonitorBefore)} mg/L before cleaning and would have read {Number.Print(main.MonitorBefore + error)} mg/L clean; use --fouling constant");
    }

    private static double FoulingOf(VisitCleaning cleaning)
    {
        return ServiceErrors.Fouling(cleaning.MonitorBefore, cleaning.MonitorAfter, cleaning.FieldBefore ?? 0, cleaning.FieldAfter ?? 0);
    }

    private ErrorState DriftOf(VisitRecord visit, CalibrationInUse calibration)
    {
        VisitStandard main = visit.Standards.MaxBy(static each => each.Standard)!;
        double error = ServiceErrors.Drift(main.Standard, main.Reading);
        double percent = ServiceErrors.DriftPercent(error, main.Reading);
        // The limit is asked of the level that is furthest out.
        VisitStandard worst = visit.Standards.MaxBy(static each => Math.Abs(each.Standard - each.Reading))!;
        if (_request.Drift != CorrectionForms.SlopeAndZero)
        {
            return new ErrorState(1, 0, error, percent);
        }

        RequireLine(calibration);
        (double slope, double zero) = visit.Standards.Length == 1 && main.Standard != 0
            ? (main.Reading / main.Standard, 0)
            : ServiceErrors.Line([.. visit.Standards.Select(each => Responses(visit, each, calibration))]);
        return 0 < slope && double.IsFinite(slope) && double.IsFinite(zero)
            ? new ErrorState(slope, zero, ServiceErrors.Drift(worst.Standard, worst.Reading), percent)
            : throw new InputException($"visit {visit.Id}: its standards make no slope above zero; use --drift constant, or withdraw the visit");
    }

    /// <summary>What the standard should have given and what it gave, as responses of the probe above its zero.</summary>
    private static (double True, double Read) Responses(VisitRecord visit, VisitStandard standard, CalibrationInUse calibration)
    {
        if (standard.TemperatureCelsius is not double temperature || standard.Salinity is not double salinity)
        {
            throw new InputException($"visit {visit.Id}: a change of zero is told from standards with their temperature and salinity, which the standard of {Number.Print(standard.Standard)} mg/L does not state; use --drift constant, or withdraw the visit and add it with them");
        }

        Status ofWater = OxygenEquilibrium.ConcentrationFromPartialPressure(
            calibration.Conditions.Equation, temperature, salinity, PressureUnits.HectopascalPerAtmosphere, 1, RangeRule.NearEdge, out double perHectopascal);
        Status ofGain = calibration.Core.Model.Gain(temperature, RangeRule.Extrapolate, out double gain);
        if (double.IsNaN(perHectopascal) || double.IsNaN(gain))
        {
            throw new InputException($"visit {visit.Id}: the standard at {Number.Print(temperature)} degC and salinity {Number.Print(salinity)} is outside what can be computed ({(double.IsNaN(gain) ? ofGain : ofWater)})");
        }

        double response = calibration.Core.Slope * calibration.Conditions.FlowFactor * gain / perHectopascal;
        return (response * standard.Standard, response * standard.Reading);
    }

    private CalibrationInUse? InForceAt(long ticks)
    {
        return _calibrations.FirstOrDefault(each => each.FromTicks <= ticks && ticks < each.ToTicks);
    }

    private static void RequireLine(CalibrationInUse calibration)
    {
        if (calibration.Record.Fit is { Curvature: not 0 } || ModelNames.IsLogarithmic(calibration.Record.Probe.Model))
        {
            throw new InputException($"calibration {calibration.Record.Id}: its response is no straight line, so drift in slope and zero has no meaning; use --drift constant or percent");
        }
    }

    private void RequireOxygenLimits()
    {
        if (_calibrations[0].Record.Gas != "O2" && _request.Limits.Source == ServiceLimits.DefaultSource)
        {
            throw new InputException($"the limits of service visits are for oxygen, and this probe measures {_calibrations[0].Record.Gas}; say yours with --apply-above and --ratings, or go without with --drift none --fouling none");
        }
    }

    private static void Add(List<ErrorRamp> ramps, ErrorRamp ramp)
    {
        if (ramp.FromTicks < ramp.ToTicks)
        {
            ramps.Add(ramp);
        }
    }

    private static string OneOf(string option, string name, IReadOnlyList<string> known)
    {
        return known.Contains(name) ? name : throw Wrong.Input(option, name, $"there is no such choice{NearestName.DidYouMean(name, known)}; there are {string.Join(", ", known)}");
    }

    private sealed record StoredVisit(VisitRecord Record, string Sha256);
}
