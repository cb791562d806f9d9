using System;
using System.Collections.Generic;
using System.CommandLine;
using System.IO;
using System.Linq;
using System.Text.Json;
using System.Text.Json.Serialization;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal calibrations list</c>.</summary>
internal static class CalibrationsList
{
    internal static Command Create(Terminal terminal)
    {
        Option<string> data = CalibrationsCommand.DataOption();
        Option<string> probe = new("--probe") { Description = "Only this probe.", HelpName = "ID" };
        Option<bool> all = new("--all") { Description = "Entries of every kind: equipment, service events and withdrawals too." };
        Option<string> which = new("--log") { Description = "An imported log by its id; the log of the folder when left out.", HelpName = "LOG" };
        Option<string> format = new("--format") { Description = "text (default) or json.", HelpName = "text|json" };
        Command command = new("list", "One line for each calibration and check, oldest first, and whether the chain of records is whole.") { data, probe, all, which, format };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format));
            using CalibrationLogStore log = CalibrationsCommand.Open(parsed.GetValue(data));
            string? only = parsed.GetValue(probe);
            List<StoredCalibration> wanted = [.. log.EntriesOf(parsed.GetValue(which) ?? log.LogId)
                .Where(stored => stored.Entry is CalibrationRecord record && (only == null || record.Probe.Id == only))
                .Select(static stored => new StoredCalibration((CalibrationRecord)stored.Entry, stored.Sha256))];
            if (json)
            {
                terminal.Output.WriteLine(JsonSerializer.Serialize(Json(log, wanted), CalibrationListContext.Default.CalibrationList));
            }
            else if (parsed.GetValue(all))
            {
                WriteAll(terminal.Output, log, only);
            }
            else
            {
                Write(terminal.Output, log, wanted);
            }

            return LogText.ReportChain(log, terminal, json);
        });
        return command;
    }

    private static void Write(TextWriter output, CalibrationLogStore log, List<StoredCalibration> records)
    {
        List<string[]> rows = [["id", "time (UTC)", "probe", "in", "slope", "zero", "as found", "as left", "result"]];
        foreach (StoredCalibration stored in records)
        {
            CalibrationRecord record = stored.Record;
            rows.Add(
            [
                record.Id,
                CalibrationText.Time(record.CompletedUtc),
                record.Probe.Id,
                Method(record.Method),
                Number.Significant(record.Result.Slope, CalibrationText.Digits) + Unit(record, ModelNames.IsLogarithmic(record.Probe.Model) ? "/decade" : "/hPa"),
                Number.Significant(record.Result.Zero, CalibrationText.Digits) + (record.Probe.MeterSettings == null ? Unit(record, "") : " hPa"),
                Error(record, "span"),
                Error(record, "as-left"),
                (record.Purpose == CalibrationRecord.CheckPurpose ? LogText.Kind(record) + ": " : "") + Decision.Of(record) + (record.Simulated ? " (simulated)" : "") + LogText.Standing(log, record),
            ]);
        }

        TextTable.Write(output, rows, "");
        output.WriteLine("as found, as left: error at 100 % before and after the adjustment, mg/L where no unit is named");
    }

    private static void WriteAll(TextWriter output, CalibrationLogStore log, string? only)
    {
        List<string[]> rows = [["id", "time (UTC)", "kind", "about", "what"]];
        foreach (LogEntry entry in log.Entries.Concat(log.ImportedLogs.SelectMany(static imported => imported.Entries)).Select(static stored => stored.Entry))
        {
            if (only == null || LogText.Subject(entry) == only)
            {
                rows.Add([entry.Id, CalibrationText.Time(LogText.At(entry)), LogText.Kind(entry), LogText.Subject(entry), LogText.What(entry) + LogText.Standing(log, entry)]);
            }
        }

        TextTable.Write(output, rows, "");
    }

    private static string Method(string method)
    {
        return method switch
        {
            "air-saturated-water" => "water",
            "water-saturated-air" => "air",
            _ => method,
        };
    }

    private static string Unit(CalibrationRecord record, string per)
    {
        bool none = record.Probe.MeterSettings != null || record.Probe.SignalUnit.Length == 0;
        return none ? "" : " " + record.Probe.SignalUnit + per;
    }

    private static string Error(CalibrationRecord record, string role)
    {
        return ErrorScale.Error(record, record.Points.FirstOrDefault(point => point.Role == role)) is double error
            ? CalibrationText.Signed(error, 3) + (ErrorScale.IsHectopascal(record) ? " hPa" : "")
            : "-";
    }

    private static CalibrationList Json(CalibrationLogStore log, List<StoredCalibration> records)
    {
        return new CalibrationList(
            "probecal-calibration-list",
            2,
            log.LogId,
            log.Chain.Count,
            log.Chain.HeadSha256,
            [.. log.Chain.Faults.Select(static fault => fault.Text)],
            [.. records.Select(stored => new CalibrationListItem(
                stored.Record.Id,
                stored.Record.Purpose,
                stored.Record.CheckKind,
                stored.Record.CompletedUtc,
                stored.Record.Probe.Id,
                stored.Record.Method,
                stored.Record.Result.Slope,
                stored.Record.Result.Zero,
                stored.Record.Points.FirstOrDefault(static point => point.Role == "span")?.ErrorMilligramsPerLitre,
                stored.Record.Points.FirstOrDefault(static point => point.Role == "as-left")?.ErrorMilligramsPerLitre,
                stored.Record.Result.Pass,
                stored.Record.Simulated,
                log.WithdrawalOf(stored.Record.Id)?.Id,
                log.ReplacementOf(stored.Record.Id)?.Id,
                stored.Sha256))],
            [.. log.ImportedLogs.Select(static imported => new ImportedLogItem(imported.LogId, imported.Origin, imported.ImportedUtc, imported.Chain.Count, imported.Chain.HeadSha256, [.. imported.Chain.Faults.Select(static fault => fault.Text)]))]);
    }
}

/// <summary>The list as JSON.</summary>
internal sealed record CalibrationList(
    string Format, int Version, string LogId, long Count, string HeadSha256, string[] ChainFaults, CalibrationListItem[] Calibrations, ImportedLogItem[] ImportedLogs);

/// <summary>One calibration of the list.</summary>
internal sealed record CalibrationListItem(
    string Id,
    string Purpose,
    string? CheckKind,
    DateTimeOffset CompletedUtc,
    string Probe,
    string Method,
    double Slope,
    double Zero,
    double? AsFoundErrorMilligramsPerLitre,
    double? AsLeftErrorMilligramsPerLitre,
    bool Pass,
    bool Simulated,
    string? WithdrawnBy,
    string? ReplacedBy,
    string Sha256);

/// <summary>One imported log of the list.</summary>
internal sealed record ImportedLogItem(string LogId, string Origin, DateTimeOffset ImportedUtc, long Count, string HeadSha256, string[] ChainFaults);

[JsonSerializable(typeof(CalibrationList))]
[JsonSourceGenerationOptions(PropertyNamingPolicy = JsonKnownNamingPolicy.CamelCase, WriteIndented = true)]
internal sealed partial class CalibrationListContext : JsonSerializerContext;
