using System;
using System.Collections.Generic;
using System.Linq;
using System.Text;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Correcting;

/// <summary>A service visit as a person types it; <see cref="Read"/> judges it.</summary>
public sealed record VisitEntry
{
    /// <summary>A sign that slipped, and not a zero that is off: more than twice the published 0.2 mg/L below nothing (our choice, no source).</summary>
    private const double LeastReading = -0.5;

    private static readonly string[] NeverStandards = ["field meter", "field-meter", "fieldmeter", "meter"];

    /// <summary>Id of the probe.</summary>
    public required string Probe { get; init; }

    /// <summary>The site.</summary>
    public string? Site { get; init; }

    /// <summary>When the probe was read before cleaning, with its offset.</summary>
    public required string Before { get; init; }

    /// <summary>When it was back, cleaned.</summary>
    public required string After { get; init; }

    /// <summary>Probe before cleaning, one for each level.</summary>
    public IReadOnlyList<string> MonitorBefore { get; init; } = [];

    /// <summary>Probe after cleaning.</summary>
    public IReadOnlyList<string> MonitorAfter { get; init; } = [];

    /// <summary>Field meter at the first.</summary>
    public IReadOnlyList<string> FieldBefore { get; init; } = [];

    /// <summary>Field meter at the second.</summary>
    public IReadOnlyList<string> FieldAfter { get; init; } = [];

    /// <summary>Id of the field meter.</summary>
    public string? FieldMeter { get; init; }

    /// <summary>True when compared in a bucket of site water.</summary>
    public bool InBucket { get; init; }

    /// <summary>Standards: <c>8.97mg/L read 8.61mg/L from air-saturated-water at 20.1C salinity 0</c>.</summary>
    public IReadOnlyList<string> Standards { get; init; } = [];

    /// <summary>When the standards were read.</summary>
    public string? StandardsAt { get; init; }

    /// <summary>When fouling began.</summary>
    public string? FoulingOnset { get; init; }

    /// <summary>When the drift began.</summary>
    public string? DriftOnset { get; init; }

    /// <summary>True for an error that was there from the last calibration on.</summary>
    public bool BadCalibration { get; init; }

    /// <summary>Who was there.</summary>
    public string? By { get; init; }

    /// <summary>Remarks.</summary>
    public string? Remarks { get; init; }

    /// <summary>Program and version.</summary>
    public required string Software { get; init; }

    /// <summary>The visit as the log takes it.</summary>
    /// <param name="now">The time; a visit lies before it.</param>
    /// <exception cref="InputException">Something is wrong, missing, in the future, or uses the field meter as a standard.</exception>
    public VisitRecord Read(DateTimeOffset now)
    {
        DateTimeOffset before = Time("--before", Before);
        DateTimeOffset after = Time("--after", After);
        if (after < before)
        {
            throw Wrong.Input("--after", After, "this is before --before " + Wrong.Shown(Before));
        }

        if (now < after)
        {
            throw Wrong.Input("--after", After, "this lies in the future of this computer's clock; enter a visit once it is over");
        }

        VisitCleaning[] cleaning = Cleaning();
        VisitStandard[] standards = [.. Standards.Select(Standard)];
        if (cleaning.Length == 0 && standards.Length == 0)
        {
            throw new InputException("a visit says something about the probe: give --monitor-before and --monitor-after with the field meter's readings, or a --standard, or both");
        }

        if (BadCalibration && standards.Length == 0)
        {
            throw new InputException("--bad-calibration wants a --standard that shows by how much");
        }

        DateTimeOffset? standardsAt = StandardsAt is null ? null : Time("--standards-at", StandardsAt);
        if (standardsAt < before)
        {
            throw Wrong.Input("--standards-at", StandardsAt!, "this is before the visit began");
        }

        return new VisitRecord
        {
            Probe = PlainText.Id("--probe", Probe.Trim()),
            Site = Site is null ? null : PlainText.OneLine("--site", Site),
            BeforeUtc = before,
            AfterUtc = after,
            Cleaning = cleaning,
            FieldMeter = FieldMeter is null ? null : PlainText.OneLine("--field-meter", FieldMeter.Trim()),
            InBucket = InBucket,
            Standards = standards,
            StandardsUtc = standardsAt,
            FoulingOnsetUtc = Onset("--fouling-onset", FoulingOnset, before),
            DriftOnsetUtc = Onset("--drift-onset", DriftOnset, standardsAt ?? after),
            BadCalibration = BadCalibration,
            By = By is null ? null : PlainText.OneLine("--by", By),
            Remarks = Remarks is null ? null : PlainText.OneLine("--remarks", Remarks),
            Software = Software,
        };
    }

    private VisitCleaning[] Cleaning()
    {
        if (MonitorBefore.Count != MonitorAfter.Count)
        {
            throw new InputException($"--monitor-before is given {Number.Print(MonitorBefore.Count)} times and --monitor-after {Number.Print(MonitorAfter.Count)}; each level has both");
        }

        if (FieldBefore.Count != FieldAfter.Count || (FieldBefore.Count != 0 && FieldBefore.Count != MonitorBefore.Count))
        {
            throw new InputException("--field-before and --field-after are given once for each --monitor-before, in the same order");
        }

        if (MonitorBefore.Count != 0 && FieldBefore.Count == 0 && !InBucket)
        {
            throw new InputException("--field-before and --field-after are missing: without them cleaning cannot be told from a change of the water; compare in a bucket of site water and say --in-bucket, or read a field meter both times");
        }

        return [.. Enumerable.Range(0, MonitorBefore.Count).Select(i => new VisitCleaning(
            Concentration("--monitor-before", MonitorBefore[i]), Concentration("--monitor-after", MonitorAfter[i]),
            FieldBefore.Count == 0 ? null : Concentration("--field-before", FieldBefore[i]), FieldAfter.Count == 0 ? null : Concentration("--field-after", FieldAfter[i])))];
    }

    private VisitStandard Standard(string text)
    {
        const string Form = "write for example \"8.97mg/L read 8.61mg/L from air-saturated-water at 20.1C salinity 0\"";
        Dictionary<string, string> parts = new(StringComparer.Ordinal);
        string key = "";
        foreach (string word in text.Split(' ', StringSplitOptions.RemoveEmptyEntries))
        {
            if (word is "read" or "from" or "at" or "salinity")
            {
                key = parts.ContainsKey(word) ? throw Wrong.Input("--standard", text, word + " stands there twice; " + Form) : word;
                parts[key] = "";
            }
            else
            {
                parts[key] = parts.TryGetValue(key, out string? begun) && begun.Length != 0 ? begun + " " + word : word;
            }
        }

        if (!parts.TryGetValue("", out string? value) || !parts.TryGetValue("read", out string? reading) || !parts.TryGetValue("from", out string? from) || from.Length == 0)
        {
            throw Wrong.Input("--standard", text, Form);
        }

        bool isMeter = Array.Exists(NeverStandards, name => string.Equals(name, from, StringComparison.OrdinalIgnoreCase))
            || (FieldMeter is string meter && string.Equals(meter.Trim(), from, StringComparison.OrdinalIgnoreCase));
        if (isMeter)
        {
            throw Wrong.Input("--standard", text, "the field meter is never the standard: it shows how the water changed, not what is true (USGS TM 1-D3); name a method or a reference of the register");
        }

        double standard = Concentration("--standard", value);
        return new VisitStandard(
            0 <= standard ? standard : throw Wrong.Input("--standard", text, "a standard holds nothing or more; write the reading behind read"),
            Concentration("--standard", reading),
            PlainText.OneLine("--standard", from),
            parts.TryGetValue("at", out string? temperature) ? Quantity.TemperatureCelsius("--standard", temperature) : null,
            parts.TryGetValue("salinity", out string? salinity) ? Quantity.Salinity("--standard", salinity) : null);
    }

    private static DateTimeOffset? Onset(string option, string? text, DateTimeOffset end)
    {
        if (text is null)
        {
            return null;
        }

        DateTimeOffset onset = Time(option, text);
        return onset < end ? onset : throw Wrong.Input(option, text, "an error begins before the visit that finds it");
    }

    private static double Concentration(string option, string text)
    {
        double concentration = Quantity.Parse(QuantityKind.MassConcentration, option, text);
        return LeastReading <= concentration
            ? concentration
            : throw Wrong.Input(option, text, $"no probe reads so far below nothing; a zero that is off shows down to {Number.Print(LeastReading)} mg/L here");
    }

    private static DateTimeOffset Time(string option, string text)
    {
        CellTimeOutcome outcome = new CellTime(null, null).Read(Encoding.UTF8.GetBytes(text), out long ticks, out _);
        return outcome == CellTimeOutcome.Read
            ? new DateTimeOffset(ticks, TimeSpan.Zero)
            : throw Wrong.Input(option, text, outcome == CellTimeOutcome.NoOffset
                ? "this does not say its offset from UTC; end it with Z or +02:00"
                : "write a time as 2026-06-20T09:10+02:00 or 2026-06-20T07:10Z");
    }
}
