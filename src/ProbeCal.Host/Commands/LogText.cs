using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>Entries of the calibration log and the state of its chain as plain text for people.</summary>
internal static class LogText
{
    /// <summary>The kind of an entry in one word.</summary>
    internal static string Kind(LogEntry entry)
    {
        return entry switch
        {
            CalibrationRecord record => record.Purpose + (record.CheckKind is string kind ? " (" + kind + ")" : ""),
            EquipmentRecord => "equipment",
            ServiceRecord => "service",
            AmendmentRecord => "withdrawal",
            PastCalibrationRecord => "past calibration",
            VisitRecord => "visit",
            _ => entry.Format,
        };
    }

    /// <summary>What an entry is about.</summary>
    internal static string Subject(LogEntry entry)
    {
        return entry switch
        {
            CalibrationRecord record => record.Probe.Id,
            EquipmentRecord equipment => equipment.Equipment,
            ServiceRecord service => service.Probe,
            AmendmentRecord amendment => amendment.Of,
            PastCalibrationRecord past => past.Probe,
            VisitRecord visit => visit.Probe,
            _ => "",
        };
    }

    /// <summary>The time of an entry.</summary>
    internal static DateTimeOffset At(LogEntry entry)
    {
        return entry switch
        {
            CalibrationRecord record => record.CompletedUtc,
            ServiceRecord service => service.At,
            PastCalibrationRecord past => past.At,
            VisitRecord visit => visit.BeforeUtc,
            _ => entry.WrittenUtc ?? DateTimeOffset.UnixEpoch,
        };
    }

    /// <summary>An entry in a few words.</summary>
    internal static string What(LogEntry entry)
    {
        return entry switch
        {
            CalibrationRecord record => $"{record.Method}, {Decision.Of(record)}",
            EquipmentRecord equipment => equipment.EquipmentKind + (equipment.Description is string what ? ", " + what : ""),
            ServiceRecord service => service.Event + (service.Membrane is string membrane ? ", " + membrane : ""),
            AmendmentRecord amendment => amendment.Reason,
            PastCalibrationRecord past => $"{past.Method ?? "method not stated"}{(past.AsFoundErrorMilligramsPerLitre is double error ? $", as found {CalibrationText.Signed(error, 3)} mg/L" : "")}, from {past.File} line {Number.Print(past.Line)}",
            VisitRecord visit => VisitText.Errors(visit).TrimStart(':', ' '),
            _ => "",
        };
    }

    /// <summary>Whether an entry was withdrawn or replaced, to stand behind its result; empty when it holds.</summary>
    internal static string Standing(CalibrationLogStore log, LogEntry entry)
    {
        return (log.WithdrawalOf(entry.Id), log.ReplacementOf(entry.Id)) switch
        {
            (AmendmentRecord withdrawal, _) => $", WITHDRAWN ({withdrawal.Reason})",
            (null, CalibrationRecord replacement) => ", REPLACED by " + replacement.Id,
            _ => entry is CalibrationRecord { ImportedFrom: string from } ? ", imported from " + from : "",
        };
    }

    /// <summary>Writes one entry, whole.</summary>
    internal static void WriteEntry(TextWriter output, CalibrationLogStore log, StoredEntry stored)
    {
        LogEntry entry = stored.Entry;
        if (log.WithdrawalOf(entry.Id) is AmendmentRecord withdrawal)
        {
            TextTable.WriteWrapped(output, "WITHDRAWN ", "  ", $"by entry {withdrawal.Id} at {CalibrationText.Time(At(withdrawal))}{(withdrawal.By is string who ? ", " + who : "")}: {withdrawal.Reason}");
        }

        if (log.ReplacementOf(entry.Id) is CalibrationRecord replacement)
        {
            TextTable.WriteWrapped(output, "REPLACED ", "  ", $"by {replacement.Id}{(replacement.ReplacesReason is string why ? ": " + why : "")}");
        }

        if (entry is CalibrationRecord record)
        {
            CalibrationText.Write(output, record);
            WriteBracket(output, log, record);
        }
        else
        {
            WriteFields(output, entry);
        }

        output.WriteLine("record SHA-256 " + stored.Sha256);
        if (log.ImportedLogs.FirstOrDefault(each => each.LogId == entry.LogId) is ImportedLog imported)
        {
            output.WriteLine($"from log {imported.LogId}, imported from {imported.Origin} at {CalibrationText.Time(imported.ImportedUtc)}");
        }
    }

    /// <summary>Says how the chains stand, on standard error when one is broken.</summary>
    /// <returns>The exit code.</returns>
    internal static int ReportChain(CalibrationLogStore log, Terminal terminal, bool json)
    {
        int code = Report(log.LogId, null, log.Chain, terminal, json);
        foreach (ImportedLog imported in log.ImportedLogs)
        {
            code = Math.Max(code, Report(imported.LogId, imported.Origin, imported.Chain, terminal, json));
        }

        if (!json && code == ExitCode.Done)
        {
            terminal.Output.WriteLine("  Keep count and head elsewhere: records cut off at the end show only against them.");
        }

        return code;
    }

    private static int Report(string logId, string? origin, ChainState chain, Terminal terminal, bool json)
    {
        foreach (ChainFault fault in chain.Faults)
        {
            terminal.Error.WriteLine($"probecal: calibration log {logId}: CHAIN BROKEN: {fault}");
        }

        if (chain.IsWhole && !json)
        {
            terminal.Output.WriteLine($"log {logId}{(origin == null ? "" : " imported from " + origin)}: {Number.Print(chain.Count)} {(chain.Count == 1 ? "record" : "records")}, chain whole");
            terminal.Output.WriteLine("  head " + chain.Head);
        }

        return chain.IsWhole ? ExitCode.Done : ExitCode.WorkFailed;
    }

    private static void WriteBracket(TextWriter output, CalibrationLogStore log, CalibrationRecord record)
    {
        foreach (string line in BracketReport.Around(log, record))
        {
            TextTable.WriteWrapped(output, "  ", "    ", line);
        }
    }

    private static void WriteFields(TextWriter output, LogEntry entry)
    {
        output.WriteLine($"{char.ToUpperInvariant(Kind(entry)[0])}{Kind(entry)[1..]} {entry.Id}: {Subject(entry)}");
        List<string[]> rows = [];
        switch (entry)
        {
            case EquipmentRecord equipment:
                Add("kind", equipment.EquipmentKind);
                Add("description", equipment.Description);
                Add("certificate", equipment.Certificate);
                Add("certificate value", Quantity(equipment.CertificateValue, equipment.EquipmentKind));
                Add("correction", Quantity(equipment.Correction, equipment.EquipmentKind));
                Add("calibrated on", Day(equipment.CalibratedOn));
                Add("made or opened on", Day(equipment.MadeOn));
                Add("due on", Day(equipment.DueOn));
                Add("life", equipment.LifeDays is double days ? Number.Print(days) + " d" : null);
                Add("belongs to", equipment.BelongsTo);
                Add("remarks", equipment.Remarks);
                break;
            case ServiceRecord service:
                Add("event", service.Event);
                Add("at (UTC)", CalibrationText.Time(service.At));
                Add("membrane", service.Membrane);
                Add("remarks", service.Remarks);
                break;
            case PastCalibrationRecord past:
                WritePast(past, Add);
                break;
            case VisitRecord visit:
                (string fouling, string drift) = VisitText.Columns(visit);
                Add("from (UTC)", CalibrationText.Time(visit.BeforeUtc));
                Add("to (UTC)", CalibrationText.Time(visit.AfterUtc));
                Add("site", visit.Site);
                Add("fouling error mg/L", fouling == "-" ? null : fouling);
                Add("drift error mg/L", drift == "-" ? null : drift);
                Add("field meter", visit.FieldMeter);
                Add("remarks", visit.Remarks);
                break;
            case AmendmentRecord amendment:
                Add("withdraws", amendment.Of);
                Add("reason", amendment.Reason);
                break;
        }

        Add("written (UTC)", entry.WrittenUtc is DateTimeOffset written ? CalibrationText.Time(written) : null);
        Add("by", entry.By);
        Add("software", entry.Software);
        TextTable.Write(output, rows, "  ");

        void Add(string name, string? value)
        {
            if (value != null)
            {
                rows.Add([name, value]);
            }
        }
    }

    private static void WritePast(PastCalibrationRecord past, Action<string, string?> add)
    {
        add("standing", "imported from a table: not judged again, never in force");
        add("made (UTC)", past.DayOnly ? past.At.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture) : CalibrationText.Time(past.At));
        add("from", $"{past.File}, line {Number.Print(past.Line)}, file SHA-256 {past.FileSha256}");
        add("row", Wrong.OneLine(past.Row));
        add("method", past.Method);
        add("membrane", past.Membrane);
        Amount("temperature", past.TemperatureCelsius, " °C");
        Amount("pressure", past.PressureHectopascal, " hPa");
        Amount("salinity", past.Salinity, "");
        Amount("signal", past.Signal, past.SignalUnit is string unit ? " " + unit : "");
        Amount("slope", past.Slope, "");
        Amount("zero", past.Zero, "");
        Amount("reference", past.ReferenceMilligramsPerLitre, " mg/L");
        Amount("before", past.BeforeMilligramsPerLitre, " mg/L");
        Amount("after", past.AfterMilligramsPerLitre, " mg/L");
        add("verdict as stated", past.StatedVerdict);
        add("remarks", past.Remarks);

        void Amount(string name, double? value, string unit)
        {
            add(name, value is double number ? Number.Print(number) + unit : null);
        }
    }

    /// <summary>A value of a certificate with its uncertainty; null for none.</summary>
    internal static string? Quantity(RecordedQuantity? quantity)
    {
        return quantity == null ? null : $"{Number.Print(quantity.Value)}{Unit(quantity)}, u {Number.Print(quantity.StandardUncertainty)}{Unit(quantity)}";
    }

    /// <summary>The same as a person wrote it on the bottle: what a cylinder holds, in %.</summary>
    internal static string? Quantity(RecordedQuantity? quantity, string equipmentKind)
    {
        return quantity == null || equipmentKind != "cylinder" || quantity.Unit != "1" ? Quantity(quantity) : $"{Percent(quantity.Value)}, u {Percent(quantity.StandardUncertainty)}";
    }

    private static string Percent(double fraction)
    {
        // Twelve digits: what was entered in % comes back without the rounding of the division by 100.
        return Number.Significant(100 * fraction, 12) + " %";
    }

    /// <summary>A day; null for none.</summary>
    internal static string? Day(DateOnly? day)
    {
        return day?.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);
    }

    private static string Unit(RecordedQuantity quantity)
    {
        return quantity.Unit is "1" or "" ? "" : " " + quantity.Unit;
    }
}
