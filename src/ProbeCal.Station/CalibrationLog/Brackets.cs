using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// Which readings of a probe lie between two passing checks, in time and in range: the bracketing rule of a state's
/// instrument-calibration procedure (Florida DEP, FT 1000/1500). Its reading here:
/// <list type="bullet">
/// <item>Checks are check records, what a calibration found before the adjustment (its as-found point, when it could be judged),
/// and what it left (its as-left points, when it passed).</item>
/// <item>In time: the last check before the reading and the first after it both passed.</item>
/// <item>In range: the reading lies between the lowest and the highest concentration at which those two checks were made, each
/// widened by the limit of a check there (0.2 mg/L or 2 %), within which a passing check tells nothing apart.</item>
/// </list>
/// A withdrawn or replaced record is evidence of nothing. Made once for a probe; <see cref="At"/> is a look-up that allocates nothing.
/// </summary>
internal sealed class Brackets
{
    private readonly Check[] _checks;
    private readonly Gap[] _gaps;

    private Brackets(Check[] checks)
    {
        _checks = checks;
        _gaps = new Gap[checks.Length + 1];
        for (int i = 0; i <= checks.Length; i++)
        {
            _gaps[i] = new Gap(i == 0 ? null : checks[i - 1], i == checks.Length ? null : checks[i]);
        }
    }

    /// <summary>How the rule is read, for people.</summary>
    internal const string Rule = "in time: the last check before the reading and the first after it both passed; in range: the reading lies between the lowest and highest level of the two, "
        + "each widened by 0.2 mg/L or 2 % (bracketing as in Florida DEP SOP FT 1000 and FT 1500, our reading)";

    /// <summary>The brackets of a probe from the records of a log that hold.</summary>
    internal static Brackets Of(CalibrationLogStore log, string probe)
    {
        return Of([.. log.Records.Where(stored => log.Holds(stored.Record.Id))], probe);
    }

    /// <summary>The brackets of a probe.</summary>
    /// <param name="records">Calibrations and checks that hold, in any order; those of other probes are passed over.</param>
    /// <param name="probe">Id of the probe.</param>
    internal static Brackets Of(IReadOnlyList<StoredCalibration> records, string probe)
    {
        List<Check> checks = [];
        foreach (StoredCalibration stored in records)
        {
            if (stored.Record.Probe.Id == probe)
            {
                Add(checks, stored.Record);
            }
        }

        return new Brackets([.. checks.OrderBy(static check => check.Time).ThenBy(static check => check.Order)]);
    }

    /// <summary>Whether a reading is bracketed.</summary>
    /// <param name="time">Its time.</param>
    /// <param name="milligramsPerLitre">Its concentration, mg/L; NaN is not in range.</param>
    internal BracketVerdict At(DateTimeOffset time, double milligramsPerLitre)
    {
        int low = 0;
        int high = _checks.Length;
        while (low < high)
        {
            int middle = (low + high) / 2;
            if (_checks[middle].Time <= time)
            {
                low = middle + 1;
            }
            else
            {
                high = middle;
            }
        }

        return _gaps[low].At(milligramsPerLitre);
    }

    /// <summary>The time before a record's first check and after its last, a line each.</summary>
    internal IEnumerable<string> Around(CalibrationRecord record)
    {
        int first = Array.FindIndex(_checks, check => check.Id == record.Id);
        int last = Array.FindLastIndex(_checks, check => check.Id == record.Id);
        if (0 <= first)
        {
            yield return "readings before it" + _gaps[first].Words(first == 0 ? null : _checks[first - 1].Id, "since ");
            yield return "readings after it" + _gaps[last + 1].Words(last + 1 == _checks.Length ? null : _checks[last + 1].Id, "until ");
        }
    }

    private static void Add(List<Check> checks, CalibrationRecord record)
    {
        if (record.Purpose == CalibrationRecord.CheckPurpose)
        {
            checks.Add(new Check(record.CompletedUtc, 1, record.Id, record.Result.Pass ? null : $"the check {record.Id} did not pass", Levels(record.Points)));
            return;
        }

        // What was found before the adjustment speaks for the readings before it, what was left for those after it.
        RecordedPoint? found = Array.Find(record.Points, static point => point.Role == "span");
        string? verdict = Array.Find(record.Limits, static limit => limit.Check == "as-found")?.Verdict;
        checks.Add(new Check(
            found?.LastUtc ?? record.Points.Select(static point => point.LastUtc).DefaultIfEmpty(record.CompletedUtc).Min(),
            0,
            record.Id,
            verdict switch
            {
                "pass" => null,
                "fail" or "inconclusive" => $"calibration {record.Id} found the probe outside its limit before the adjustment",
                _ => $"calibration {record.Id} adjusted the probe and did not check it before",
            },
            found == null ? [] : Levels([found])));
        checks.Add(new Check(
            record.CompletedUtc,
            1,
            record.Id,
            record.Result.Pass ? null : $"calibration {record.Id} did not pass",
            Levels(record.Points.Where(static point => point.Role != "span"))));
    }

    private static double[] Levels(IEnumerable<RecordedPoint> points)
    {
        return [.. points.Select(static point => point.ReferenceMilligramsPerLitre).Where(double.IsFinite)];
    }

    /// <summary>One check: when, of which record, why it does not count, and at which concentrations it was made.</summary>
    private sealed record Check(DateTimeOffset Time, int Order, string Id, string? Fault, double[] Levels);

    /// <summary>The time between two checks, or before the first and after the last.</summary>
    private sealed class Gap
    {
        private readonly bool _inTime;
        private readonly double _lowest = double.NaN;
        private readonly double _highest = double.NaN;
        private readonly BracketVerdict _inside;
        private readonly BracketVerdict _below;
        private readonly BracketVerdict _above;

        internal Gap(Check? before, Check? after)
        {
            string? reason = (before, after) switch
            {
                (null, null) => "the probe was never checked",
                (null, _) => "no check before it",
                (_, null) => "no check after it",
                _ when before.Order == 0 && before.Id == after.Id => $"taken while calibration {before.Id} was made",
                _ => before.Fault ?? after.Fault,
            };
            _inTime = reason == null;
            double[] levels = [.. (before?.Levels ?? []).Concat(after?.Levels ?? [])];
            if (levels.Length == 0)
            {
                _inside = _below = _above = new BracketVerdict(_inTime, false, before?.Id, after?.Id, reason ?? "the checks have no level in mg/L");
                return;
            }

            double lowest = levels.Min();
            double highest = levels.Max();
            _lowest = lowest - Width(lowest);
            _highest = highest + Width(highest);
            _inside = new BracketVerdict(_inTime, true, before?.Id, after?.Id, reason);
            _below = new BracketVerdict(_inTime, false, before?.Id, after?.Id, reason ?? $"below the lowest level checked, {Number.Fixed(lowest, 2)} mg/L less {Number.Fixed(Width(lowest), 2)}");
            _above = new BracketVerdict(_inTime, false, before?.Id, after?.Id, reason ?? $"above the highest level checked, {Number.Fixed(highest, 2)} mg/L and {Number.Fixed(Width(highest), 2)}");
        }

        internal BracketVerdict At(double milligramsPerLitre)
        {
            if (milligramsPerLitre <= _highest)
            {
                return _lowest <= milligramsPerLitre ? _inside : _below;
            }

            return _above;
        }

        internal string Words(string? other, string preposition)
        {
            string span = other == null ? "" : ", " + preposition + other + ",";
            return _inTime
                ? $"{span} are bracketed between {Number.Fixed(_lowest, 2)} and {Number.Fixed(_highest, 2)} mg/L"
                : $"{span} are not bracketed: {_inside.Reason}";
        }

        private static double Width(double level)
        {
            return AcceptanceLimit.AtSaturation(level, AcceptanceLimit.SaturationMilligramsPerLitre, AcceptanceLimit.SaturationPercent, out double limit, out _) == Status.Ok
                ? limit
                : AcceptanceLimit.ZeroMilligramsPerLitre;
        }
    }
}

/// <summary>Whether a reading is bracketed by two passing checks.</summary>
/// <param name="InTime">True when the check before it and the one after it passed.</param>
/// <param name="InRange">True when it lies between the levels of those two.</param>
/// <param name="Before">Record of the check before it; null when there is none.</param>
/// <param name="After">Record of the check after it; null when there is none.</param>
/// <param name="Reason">Why it is not bracketed, time first; null when it is.</param>
internal sealed record BracketVerdict(bool InTime, bool InRange, string? Before, string? After, string? Reason)
{
    /// <summary>True when it is bracketed in time and range.</summary>
    public bool IsBracketed => InTime && InRange;
}
