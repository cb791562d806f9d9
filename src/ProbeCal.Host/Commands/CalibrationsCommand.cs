using System;
using System.Collections.Generic;
using System.CommandLine;
using System.IO;
using System.Linq;
using System.Text;
using System.Text.Json;
using System.Text.Json.Serialization;
using ProbeCal.Station;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal calibrations</c>: what the calibration log holds.</summary>
internal static class CalibrationsCommand
{
    internal static Command Create(Terminal terminal)
    {
        return new Command("calibrations", "What the calibration log holds: list, show.")
        {
            List(terminal),
            Show(terminal),
        };
    }

    private static Command List(Terminal terminal)
    {
        Option<string> data = new("--data") { Description = "Folder of the calibration log (default probecal-data).", HelpName = "DIR" };
        Option<string> probe = new("--probe") { Description = "Only this probe.", HelpName = "ID" };
        Option<string> format = new("--format") { Description = "text (default) or json.", HelpName = "text|json" };
        Command command = new("list", "One line for each calibration, oldest first, and whether the chain of records is whole.") { data, probe, format };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format));
            using CalibrationLogStore log = Open(parsed.GetValue(data));
            string? only = parsed.GetValue(probe);
            List<StoredCalibration> wanted = [.. log.Records.Where(stored => only == null || stored.Record.Probe.Id == only)];
            if (json)
            {
                terminal.Output.WriteLine(JsonSerializer.Serialize(Json(log, wanted), CalibrationListContext.Default.CalibrationList));
            }
            else
            {
                WriteList(terminal.Output, wanted);
            }

            return ReportChain(log, terminal, json);
        });
        return command;
    }

    private static Command Show(Terminal terminal)
    {
        Argument<string> id = new("id") { Description = "Id of the calibration, as list shows it.", HelpName = "ID" };
        Option<string> data = new("--data") { Description = "Folder of the calibration log (default probecal-data).", HelpName = "DIR" };
        Option<string> format = new("--format") { Description = "text (default), or json: the record as it is stored.", HelpName = "text|json" };
        Command command = new("show", "One record, whole.") { id, data, format };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format));
            using CalibrationLogStore log = Open(parsed.GetValue(data));
            string wanted = parsed.GetValue(id)!;
            StoredCalibration stored = log.Find(wanted)
                ?? throw new InputException($"calibration {Wrong.Shown(wanted)}: not in this log{NearestName.DidYouMean(wanted, log.Records.Select(static known => known.Record.Id))}; 'probecal calibrations list' shows the ids");
            if (json)
            {
                terminal.Output.WriteLine(Encoding.UTF8.GetString(log.BytesOf(stored)));
            }
            else
            {
                CalibrationText.Write(terminal.Output, stored.Record);
                terminal.Output.WriteLine("record SHA-256 " + stored.Sha256);
            }

            return ReportChain(log, terminal, json);
        });
        return command;
    }

    private static CalibrationLogStore Open(string? folder)
    {
        using DataDirectory data = DataDirectory.OpenForReading(folder ?? CalibrateCommand.UsualData);
        return CalibrationLogStore.OpenForReading(data.CalibrationLogFile);
    }

    private static void WriteList(TextWriter output, List<StoredCalibration> records)
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
                record.Method == CalibrationIds.AirSaturatedWater ? "water" : "air",
                Number.Significant(record.Result.Slope, CalibrationText.Digits) + Unit(record, "/hPa"),
                Number.Significant(record.Result.Zero, CalibrationText.Digits) + (record.Probe.MeterSettings == null ? Unit(record, "") : " hPa"),
                Error(record, "span"),
                Error(record, "as-left"),
                (record.Result.Pass ? "pass" : "fail") + (record.Simulated ? " (simulated)" : ""),
            ]);
        }

        TextTable.Write(output, rows, "");
        output.WriteLine("as found, as left: error at 100 % before and after the adjustment, mg/L");
    }

    private static string Unit(CalibrationRecord record, string per)
    {
        bool none = record.Probe.MeterSettings != null || record.Probe.SignalUnit.Length == 0;
        return none ? "" : " " + record.Probe.SignalUnit + per;
    }

    private static string Error(CalibrationRecord record, string role)
    {
        return record.Points.FirstOrDefault(point => point.Role == role)?.ErrorMilligramsPerLitre is double error ? CalibrationText.Signed(error, 3) : "-";
    }

    private static int ReportChain(CalibrationLogStore log, Terminal terminal, bool json)
    {
        ChainState chain = log.Chain;
        if (chain.IsWhole)
        {
            if (!json)
            {
                terminal.Output.WriteLine($"log {log.LogId}: {Number.Print(chain.Count)} {(chain.Count == 1 ? "record" : "records")}, chain whole, head {chain.HeadSha256}");
                terminal.Output.WriteLine("  Keep count and head elsewhere: records cut off at the end show only against them.");
            }

            return ExitCode.Done;
        }

        foreach (ChainFault fault in chain.Faults)
        {
            terminal.Error.WriteLine($"probecal: calibration log {log.LogId}: CHAIN BROKEN: {fault}");
        }

        return ExitCode.WorkFailed;
    }

    private static CalibrationList Json(CalibrationLogStore log, List<StoredCalibration> records)
    {
        return new CalibrationList(
            "probecal-calibration-list",
            1,
            log.LogId,
            log.Chain.Count,
            log.Chain.HeadSha256,
            [.. log.Chain.Faults.Select(static fault => fault.Text)],
            [.. records.Select(static stored => new CalibrationListItem(
                stored.Record.Id,
                stored.Record.CompletedUtc,
                stored.Record.Probe.Id,
                stored.Record.Method,
                stored.Record.Result.Slope,
                stored.Record.Result.Zero,
                stored.Record.Points.FirstOrDefault(static point => point.Role == "span")?.ErrorMilligramsPerLitre,
                stored.Record.Points.FirstOrDefault(static point => point.Role == "as-left")?.ErrorMilligramsPerLitre,
                stored.Record.Result.Pass,
                stored.Record.Simulated,
                stored.Sha256))]);
    }
}

/// <summary>The list as JSON.</summary>
internal sealed record CalibrationList(string Format, int Version, string LogId, long Count, string HeadSha256, string[] ChainFaults, CalibrationListItem[] Calibrations);

/// <summary>One calibration of the list.</summary>
internal sealed record CalibrationListItem(
    string Id,
    DateTimeOffset CompletedUtc,
    string Probe,
    string Method,
    double Slope,
    double Zero,
    double? AsFoundErrorMilligramsPerLitre,
    double? AsLeftErrorMilligramsPerLitre,
    bool Pass,
    bool Simulated,
    string Sha256);

[JsonSerializable(typeof(CalibrationList))]
[JsonSourceGenerationOptions(PropertyNamingPolicy = JsonKnownNamingPolicy.CamelCase, WriteIndented = true)]
internal sealed partial class CalibrationListContext : JsonSerializerContext;
