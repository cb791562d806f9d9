using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Configuration;

namespace ProbeCal.Station.Engine;

/// <summary>
/// What time adds to the uncertainty of readings under one calibration: an entered rate, or one from the probe's own history.
/// With neither, readings say that it is left out.
/// </summary>
internal sealed class UncertaintyGrowth
{
    /// <summary>Neither rate is known.</summary>
    internal static readonly UncertaintyGrowth Unknown = new(null, null, DateTimeOffset.MinValue, []);

    private readonly DateTimeOffset _calibratedUtc;
    private readonly IReadOnlyList<DateTimeOffset> _cleanings;

    private UncertaintyGrowth(
        (double RelativePerDay, string Source)? drift, (double RelativePerDay, string Source)? fouling, DateTimeOffset calibratedUtc, IReadOnlyList<DateTimeOffset> cleanings)
    {
        Drift = drift;
        Fouling = fouling;
        _calibratedUtc = calibratedUtc;
        _cleanings = cleanings;
    }

    /// <summary>Relative standard uncertainty of drift per day and where it comes from; null when it is not known.</summary>
    internal (double RelativePerDay, string Source)? Drift { get; }

    /// <summary>The same of fouling.</summary>
    internal (double RelativePerDay, string Source)? Fouling { get; }

    /// <summary>Entered rates first, then the probe's history.</summary>
    internal static UncertaintyGrowth Of(CalibrationLogStore log, CalibrationRecord record, RateConfiguration? drift, RateConfiguration? fouling)
    {
        return new UncertaintyGrowth(
            drift is null ? GrowthHistory.Drift(log, record) : (drift.RelativePerDay, drift.Source),
            fouling is null ? GrowthHistory.Fouling(log, record) : (fouling.RelativePerDay, fouling.Source),
            record.CompletedUtc,
            GrowthHistory.Cleanings(log, record.Probe.Id));
    }

    /// <summary>Days of drift at a time; null where it is not known: no rate, or a time before the calibration.</summary>
    internal double? DriftDays(DateTimeOffset at)
    {
        return Drift != null && _calibratedUtc <= at ? (at - _calibratedUtc).TotalDays : null;
    }

    /// <summary>Days of fouling at a time; null where it is not known: no rate, or no cleaning before.</summary>
    internal double? FoulingDays(DateTimeOffset at)
    {
        if (Fouling == null)
        {
            return null;
        }

        for (int i = _cleanings.Count - 1; 0 <= i; i--)
        {
            if (_cleanings[i] <= at)
            {
                return (at - _cleanings[i]).TotalDays;
            }
        }

        return null;
    }

    /// <summary>Adds what is known to a corrected reading.</summary>
    /// <param name="at">Time of the reading.</param>
    /// <param name="driftIsCorrected">True where drift is taken back otherwise, so that it does not count twice.</param>
    /// <param name="foulingIsCorrected">The same of fouling.</param>
    /// <param name="reading">The reading.</param>
    internal void Add(DateTimeOffset at, bool driftIsCorrected, bool foulingIsCorrected, Reading reading)
    {
        if (!driftIsCorrected && Drift is { } drift && DriftDays(at) is double days)
        {
            ReadingGrowth.AddDrift(drift.RelativePerDay, days, reading);
        }

        if (!foulingIsCorrected && Fouling is { } fouling && FoulingDays(at) is double since)
        {
            ReadingGrowth.AddFouling(fouling.RelativePerDay, since, reading);
        }
    }
}
