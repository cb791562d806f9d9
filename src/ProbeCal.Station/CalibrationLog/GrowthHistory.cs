using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// How fast this probe drifted and fouled so far, from the log: root of the summed squares of the relative changes over that of
/// the days between, so that changes over longer times count for more and signs do not cancel.
/// </summary>
internal static class GrowthHistory
{
    /// <summary>Fewer changes than this make no rate (our choice, no source).</summary>
    internal const int LeastChanges = 2;

    /// <summary>
    /// Drift of the slope between successive calibrations of one membrane, up to a calibration; null with fewer than three of
    /// them, or for a probe whose slope is per decade.
    /// </summary>
    /// <returns>Relative standard uncertainty per day, and what it rests on.</returns>
    internal static (double RelativePerDay, string Source)? Drift(CalibrationLogStore log, CalibrationRecord record)
    {
        if (ModelNames.IsLogarithmic(record.Probe.Model))
        {
            return null;
        }

        // A membrane without an id is told from the next by the service event alone.
        DateTimeOffset newMembrane = log.ServiceFor(record.Probe.Id)
            .Where(each => each.Event == ServiceRecord.MembraneChanged && each.At <= record.CompletedUtc)
            .Select(static each => each.At).DefaultIfEmpty(DateTimeOffset.MinValue).Max();
        CalibrationRecord[] same =
        [
            .. log.Records.Select(static stored => stored.Record)
                .Where(other => log.MayBeInForce(other) && other.Probe.Id == record.Probe.Id && newMembrane <= other.CompletedUtc && other.CompletedUtc <= record.CompletedUtc && IsComparable(other.Probe, record.Probe))
                .OrderBy(static other => other.CompletedUtc),
        ];
        List<(double Relative, double Days)> changes = [];
        for (int i = 1; i < same.Length; i++)
        {
            double ratio = same[i].Result.Slope / same[i - 1].Result.Slope;
            if (!(0 < ratio) || double.IsInfinity(ratio))
            {
                // A slope that turned its sign was no drift: the wires were changed, or the unit.
                return null;
            }

            changes.Add((Math.Log(ratio), (same[i].CompletedUtc - same[i - 1].CompletedUtc).TotalDays));
        }

        return Rate(changes) is double rate
            ? (rate, string.Create(CultureInfo.InvariantCulture, $"slopes of {same.Length} calibrations of this probe and membrane"))
            : null;
    }

    /// <summary>Fouling between cleanings, from the service visits before a time; null with fewer than two that compared before and after.</summary>
    /// <returns>Relative standard uncertainty per day, and what it rests on.</returns>
    internal static (double RelativePerDay, string Source)? Fouling(CalibrationLogStore log, CalibrationRecord record)
    {
        List<(double Relative, double Days)> changes = [];
        foreach (VisitRecord visit in Visits(log, record.Probe.Id).Where(visit => visit.BeforeUtc <= record.CompletedUtc))
        {
            DateTimeOffset? since = Cleanings(log, record.Probe.Id).Where(at => at < visit.BeforeUtc).Select(static at => (DateTimeOffset?)at).LastOrDefault();
            foreach (VisitCleaning cleaning in visit.Cleaning)
            {
                if (since is DateTimeOffset from && 0 < cleaning.MonitorBefore)
                {
                    double water = cleaning.FieldAfter - cleaning.FieldBefore ?? 0;
                    changes.Add(((cleaning.MonitorAfter - cleaning.MonitorBefore - water) / cleaning.MonitorBefore, (visit.BeforeUtc - from).TotalDays));
                }
            }
        }

        return Rate(changes) is double rate
            ? (rate, string.Create(CultureInfo.InvariantCulture, $"{changes.Count} comparisons before and after cleaning at service visits"))
            : null;
    }

    /// <summary>
    /// When a probe was last known to be clean, oldest first: cleaned, a new membrane, a visit that cleaned it, or a calibration, which is made
    /// with a clean probe.
    /// </summary>
    internal static IReadOnlyList<DateTimeOffset> Cleanings(CalibrationLogStore log, string probe)
    {
        return
        [
            .. log.ServiceFor(probe).Where(static each => each.Event is ServiceRecord.Cleaned or ServiceRecord.MembraneChanged).Select(static each => each.At)
                .Concat(Visits(log, probe).Where(static visit => visit.Cleaning.Length != 0).Select(static visit => visit.AfterUtc))
                .Concat(log.Records.Where(stored => stored.Record.Probe.Id == probe && log.MayBeInForce(stored.Record)).Select(static stored => stored.Record.CompletedUtc))
                .Order(),
        ];
    }

    private static IEnumerable<VisitRecord> Visits(CalibrationLogStore log, string probe)
    {
        return log.Entries.Select(static stored => stored.Entry).OfType<VisitRecord>().Where(visit => visit.Probe == probe && log.Holds(visit.Id)).OrderBy(static visit => visit.BeforeUtc);
    }

    private static bool IsComparable(RecordedProbe other, RecordedProbe now)
    {
        return other.Model == now.Model && other.SignalUnit == now.SignalUnit && other.Membrane?.Id == now.Membrane?.Id;
    }

    private static double? Rate(List<(double Relative, double Days)> changes)
    {
        double days = Math.Sqrt(changes.Sum(static change => change.Days * change.Days));
        return changes.Count < LeastChanges || days == 0 ? null : Math.Sqrt(changes.Sum(static change => change.Relative * change.Relative)) / days;
    }
}
