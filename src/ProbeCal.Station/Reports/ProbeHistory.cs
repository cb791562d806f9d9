using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Text.RegularExpressions;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>The values between which something may lie, and who says so.</summary>
/// <param name="Low">Lower end.</param>
/// <param name="High">Upper end.</param>
/// <param name="Source">Where it comes from.</param>
public sealed record HistoryWindow(double Low, double High, string Source);

/// <summary>One calibration or check in the history of a probe.</summary>
/// <param name="Id">Id of the record.</param>
/// <param name="AtUtc">When it was complete.</param>
/// <param name="Membrane">Which stretch of one membrane it belongs to, from 0.</param>
/// <param name="Purpose">Calibration or check.</param>
/// <param name="Slope">Slope; none for a check, which changes none.</param>
/// <param name="Zero">Zero signal; none for a check.</param>
/// <param name="Error">Error as found, in <see cref="ProbeHistory.ErrorUnit"/>; none when nothing was read by an earlier calibration.</param>
/// <param name="LeftOut">Why it does not count in trends; empty when it does.</param>
internal sealed record HistoryEntry(string Id, DateTimeOffset AtUtc, int Membrane, string Purpose, HistoryValue? Slope, HistoryValue? Zero, HistoryValue? Error, string LeftOut);

/// <summary>A value of a history and its standard uncertainty.</summary>
internal sealed record HistoryValue(double Value, double StandardUncertainty);

/// <summary>
/// Slope, zero and as-found error of a probe over time, one stretch for each membrane that was on it: a new membrane begins
/// anew, and a line through two of them would mean nothing.
/// </summary>
public sealed partial class ProbeHistory
{
    private ProbeHistory(CalibrationRecord newest)
    {
        Probe = newest.Probe.Id;
        SignalUnit = newest.Probe.SignalUnit;
        IsMeter = newest.Probe.MeterSettings != null;
        IsLogarithmic = ModelNames.IsLogarithmic(newest.Probe.Model);
        ErrorUnit = ErrorScale.Unit(newest);
    }

    internal string Probe { get; }

    internal string SignalUnit { get; }

    internal bool IsMeter { get; }

    internal bool IsLogarithmic { get; }

    /// <summary>mg/L or hPa.</summary>
    internal string ErrorUnit { get; }

    /// <summary>Names of the stretches, in the order in which the membranes were put on.</summary>
    internal List<string> Membranes { get; } = [];

    internal List<HistoryEntry> Entries { get; } = [];

    /// <summary>How many calibrations of it were taken over from tables; they were judged elsewhere and stand in no trend.</summary>
    internal int Past { get; private set; }

    internal HistoryWindow? SlopeWindow { get; private set; }

    internal HistoryWindow? ZeroWindow { get; private set; }

    internal HistoryWindow? ErrorWindow { get; private set; }

    /// <summary>Reads the history of a probe out of the log.</summary>
    /// <param name="log">The log, whose chain must be whole.</param>
    /// <param name="probe">Id of the probe.</param>
    /// <param name="slopeWindow">Window of the slope as entered; null takes the one that the newest calibration was judged by, if it was.</param>
    /// <param name="zeroWindow">Window of the zero as entered; there is no published one.</param>
    /// <exception cref="InputException">The log knows no such probe.</exception>
    /// <exception cref="WorkFailedException">The chain of the log has a fault.</exception>
    public static ProbeHistory Of(CalibrationLogStore log, string probe, HistoryWindow? slopeWindow, HistoryWindow? zeroWindow)
    {
        log.RequireWhole();
        CalibrationRecord[] records = [.. log.Records.Select(static stored => stored.Record).Where(record => record.Probe.Id == probe).OrderBy(static record => record.CompletedUtc)];
        if (records.Length == 0)
        {
            string[] known = [.. log.Records.Select(static stored => stored.Record.Probe.Id).Distinct().Order(StringComparer.Ordinal)];
            throw new InputException($"--probe {Wrong.Shown(probe)}: no calibration of it is in this log{NearestName.DidYouMean(probe, known)}; there {(known.Length == 0 ? "is none of any probe" : "are those of " + string.Join(", ", known))}");
        }

        CalibrationRecord newest = records[^1];
        ProbeHistory history = new(newest);
        DateTimeOffset[] changes = [.. log.ServiceFor(probe).Where(static service => service.Event == ServiceRecord.MembraneChanged).Select(static service => service.At).Order()];
        CalibrationRecord? before = null;
        foreach (CalibrationRecord record in records)
        {
            if (before is null || Changed(before, record, changes))
            {
                history.Membranes.Add(Name(record, history.Membranes.Count + 1));
            }

            history.Entries.Add(Entry(record, history.Membranes.Count - 1, log.IsWithdrawn(record.Id), newest.Simulated));
            before = record;
        }

        history.Past = log.Entries.Count(stored => stored.Entry is PastCalibrationRecord past && past.Probe == probe && !log.IsWithdrawn(past.Id));
        history.SlopeWindow = slopeWindow ?? WindowOfRecord(records);
        history.ZeroWindow = zeroWindow;
        history.ErrorWindow = ErrorScale.IsHectopascal(newest) ? null : PublishedError(records);
        return history;
    }

    private static bool Changed(CalibrationRecord before, CalibrationRecord record, DateTimeOffset[] changes)
    {
        return before.Probe.Membrane?.Id != record.Probe.Membrane?.Id
            || before.Probe.Membrane?.InstalledOn != record.Probe.Membrane?.InstalledOn
            || changes.Any(at => before.CompletedUtc < at && at <= record.CompletedUtc);
    }

    private static string Name(CalibrationRecord record, int number)
    {
        string counted = "membrane " + Number.Print(number);
        return record.Probe.Membrane is RecordedMembrane membrane ? $"{counted} ({membrane.Id})" : counted;
    }

    private static HistoryEntry Entry(CalibrationRecord record, int membrane, bool withdrawn, bool simulatedProbe)
    {
        bool check = record.Purpose == CalibrationRecord.CheckPurpose;
        string leftOut = withdrawn ? "withdrawn" : !record.Result.Pass && !check ? Certificate.VerdictOf(record) == "FAIL" ? "failed" : "inconclusive" : record.Simulated != simulatedProbe ? "simulated and real" : "";
        return new HistoryEntry(
            record.Id,
            record.CompletedUtc,
            membrane,
            record.Purpose,
            check ? null : new HistoryValue(record.Result.Slope, record.Result.SlopeStandardUncertainty),
            check ? null : new HistoryValue(record.Result.Zero, record.Result.ZeroStandardUncertainty),
            AsFound(record),
            leftOut);
    }

    private static HistoryValue? AsFound(CalibrationRecord record)
    {
        RecordedPoint? span = Array.Find(record.Points, static point => point.Role == CalibrationIds.SpanPoint);
        if (ErrorScale.Error(record, span) is not double error)
        {
            return null;
        }

        RecordedLimit? judged = Array.Find(record.Limits, static limit => limit.Check == "as-found");
        if (judged is { ExpandedUncertainty: double expanded, CoverageFactor: double k } && 0 < k)
        {
            return new HistoryValue(error, expanded / k);
        }

        if (ErrorScale.IsHectopascal(record))
        {
            return new HistoryValue(error, span!.ReferencePartialPressureUncertaintyHectopascal);
        }

        // Records of version 1 keep no U with the error: reference and signal are what differs from one calibration to the next.
        double relative = span!.Signal.Mean == 0 ? 0 : span.SignalStandardUncertainty / span.Signal.Mean;
        return new HistoryValue(error, Math.Sqrt(Math.Pow(span.ReferenceUncertaintyMilligramsPerLitre, 2) + Math.Pow(relative * span.ReferenceMilligramsPerLitre, 2)));
    }

    private static HistoryWindow? WindowOfRecord(CalibrationRecord[] records)
    {
        foreach (CalibrationRecord record in records.Reverse())
        {
            // The record words it so since version 1: "0.4 to 0.6 nA/hPa".
            Match words = SlopeWords().Match(Array.Find(record.Limits, static limit => limit.Check == "slope")?.Limit ?? "");
            if (words.Success
                && Number.TryParse(words.Groups[1].ValueSpan, out double low, out _)
                && Number.TryParse(words.Groups[2].ValueSpan, out double high, out _))
            {
                return new HistoryWindow(low, high, "entered at " + record.Id);
            }
        }

        return null;
    }

    private static HistoryWindow? PublishedError(CalibrationRecord[] records)
    {
        RecordedPoint? span = records.Reverse().Select(static record => Array.Find(record.Points, static point => point.Role == CalibrationIds.SpanPoint)).FirstOrDefault(static point => point is not null);
        CalibrationLimits usual = new();
        return span is not null
            && AcceptanceLimit.AtSaturation(span.ReferenceMilligramsPerLitre, usual.SaturationMilligramsPerLitre, usual.SaturationPercent, out double limit, out _) == Status.Ok
            ? new HistoryWindow(-limit, limit, string.Create(CultureInfo.InvariantCulture, $"{usual.SaturationText}, at {Number.Fixed(span.ReferenceMilligramsPerLitre, 2)} mg/L; {usual.SaturationSource}"))
            : null;
    }

    [GeneratedRegex("^(-?[0-9][0-9.eE+-]*) to (-?[0-9][0-9.eE+-]*) ", RegexOptions.CultureInvariant)]
    private static partial Regex SlopeWords();
}
