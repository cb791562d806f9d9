using System;
using System.Collections.Generic;
using System.CommandLine;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal register</c>: probes, membranes and reference equipment.</summary>
internal static class RegisterCommand
{
    internal static Command Create(Terminal terminal)
    {
        return new Command("register", "Probes, membranes and reference equipment with their certificates: add, list, show.")
        {
            Add(terminal),
            List(terminal),
            Show(terminal),
        };
    }

    private static Command Add(Terminal terminal)
    {
        Argument<string> id = new("id") { Description = "Id of the equipment, as calibrations name it.", HelpName = "ID" };
        Option<string> kind = Of("--kind", "KIND", "What it is: " + string.Join(", ", EquipmentRecord.Kinds) + ".");
        Option<string> description = Of("--description", "TEXT", "What it is, for people.");
        Option<string> certificate = Of("--certificate", "NUMBER", "Number of its certificate.");
        Option<string> value = Of("--value", "VALUE", "What the certificate states, with its uncertainty: \"10.02% u 0.05%\" (standard) or \"10.02% U 0.10% k 2\" (expanded).");
        Option<string> correction = Of("--correction", "VALUE", "What is added to what it shows, with its uncertainty: \"-0.4hPa u 0.3hPa\".");
        Option<string> calibrated = Of("--calibrated", "DAY", "Day it was calibrated or checked against a reference (of a probe: its thermometer), as 2026-05-01.");
        Option<string> made = Of("--made", "DAY", "Day it was made, opened or put into service.");
        Option<string> due = Of("--due", "DAY", "Last day of its certificate.");
        Option<string> life = Of("--life", "TIME", "How long it lasts from --made: 180d.");
        Option<string> belongs = Of("--belongs-to", "PROBE", "The probe that a membrane or thermometer belongs to.");
        Option<string> remarks = Of("--remarks", "TEXT", "Remarks.");
        Option<string> by = Of("--by", "NAME", "Who enters it.");
        Option<string> data = CalibrationsCommand.DataOption();
        Option<string> format = Of("--format", "text|json", "text (default), or json: the entry as it is stored.");
        Command command = new(
            "add",
            """
            Enter a piece of equipment, or enter it anew: the newest entry of an id holds, older ones stay in the log. Give
            everything that holds from now on; what is left out is no longer stated.

            Examples:
              probecal register add B-12 --kind barometer --correction "-0.4hPa u 0.3hPa" \
                --calibrated 2026-11-02
              probecal register add P-17 --kind probe --calibrated 2026-11-02 \
                --remarks "its thermometer, at 5 and 25 C"
              probecal register add CYL-4 --kind cylinder --value "10.02% U 0.10% k 2" --due 2028-02-03
              probecal register add M-17 --kind membrane --belongs-to P-17 --made 2026-05-01 --life 180d
            """)
        {
            id, kind, description, certificate, value, correction, calibrated, made, due, life, belongs, remarks, by, data, format,
        };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format));
            EquipmentEntry entry = new()
            {
                Id = parsed.GetValue(id)!,
                Kind = parsed.GetValue(kind),
                Description = parsed.GetValue(description),
                Certificate = parsed.GetValue(certificate),
                Value = parsed.GetValue(value),
                Correction = parsed.GetValue(correction),
                CalibratedOn = parsed.GetValue(calibrated),
                MadeOn = parsed.GetValue(made),
                DueOn = parsed.GetValue(due),
                Life = parsed.GetValue(life),
                BelongsTo = parsed.GetValue(belongs),
                Remarks = parsed.GetValue(remarks),
                By = parsed.GetValue(by),
            };
            // Read first: wrong input makes no folder and migrates no log.
            CalibrationsCommand.Look(parsed.GetValue(data), log => entry.Read(log, ProgramIdentity.Text));
            return CalibrationsCommand.Write(parsed.GetValue(data), terminal, log =>
            {
                EquipmentRecord record = entry.Read(log, ProgramIdentity.Text);
                EquipmentRecord? older = log.EquipmentAt(record.Equipment, DateTimeOffset.MaxValue);
                StoredEntry stored = log.Append(record);
                if (json)
                {
                    terminal.Output.WriteLine(Encoding.UTF8.GetString(log.BytesOf(stored.Entry)));
                    return ExitCode.Done;
                }

                LogText.WriteEntry(terminal.Output, log, stored);
                if (older != null)
                {
                    terminal.Output.WriteLine($"It takes the place of entry {older.Id}, which stays in the log.");
                }

                return ExitCode.Done;
            });
        });
        return command;
    }

    private static Command List(Terminal terminal)
    {
        Option<string> at = Of("--at", "TIME", "The register as it stood then, as 2026-06-01T12:00Z; now when left out.");
        Option<string> kind = Of("--kind", "KIND", "Only this kind.");
        Option<string> data = CalibrationsCommand.DataOption();
        Option<string> format = Of("--format", "text|json", "text (default) or json.");
        Command command = new(
            "list",
            """
            What is in the register, and what of it is overdue.

            Examples:
              probecal register list
              probecal register list --kind cylinder --at 2026-06-01T12:00Z --format json
            """)
        {
            at, kind, data, format,
        };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format));
            DateTimeOffset now = terminal.Time.GetUtcNow();
            DateTimeOffset then = parsed.GetValue(at) is string given ? UtcTime.Parse("--at", given, offset: null) : now;
            string? only = parsed.GetValue(kind);
            if (only != null && !EquipmentRecord.Kinds.Contains(only))
            {
                throw Wrong.Input("--kind", only, $"there is no such kind{NearestName.DidYouMean(only, EquipmentRecord.Kinds)}; there are {string.Join(", ", EquipmentRecord.Kinds)}");
            }

            using CalibrationLogStore log = CalibrationsCommand.Open(parsed.GetValue(data));
            EquipmentRecord[] wanted = [.. log.AllEquipment(then).Where(each => only == null || each.EquipmentKind == only)];
            if (json)
            {
                terminal.Output.WriteLine(LogJson.Of("probecal-register", writer =>
                {
                    writer.WriteString("logId", log.LogId);
                    writer.WriteString("atUtc", then.UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture));
                    writer.WriteStartArray("equipment");
                    foreach (EquipmentRecord each in wanted)
                    {
                        writer.WriteRawValue(log.BytesOf(each));
                    }

                    writer.WriteEndArray();
                }));
            }
            else
            {
                Write(terminal.Output, wanted, DateOnly.FromDateTime(then.UtcDateTime));
            }

            return LogText.ReportChain(log, terminal, json: true);
        });
        return command;
    }

    private static Command Show(Terminal terminal)
    {
        Argument<string> id = new("id") { Description = "Id of the equipment.", HelpName = "ID" };
        Option<string> data = CalibrationsCommand.DataOption();
        Option<string> format = Of("--format", "text|json", "text (default), or json: the entry that holds, as it is stored.");
        Command command = new(
            "show",
            """
            One piece of equipment: the entry that holds, and those before it.

            Examples:
              probecal register show B-12
            """)
        {
            id, data, format,
        };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format));
            string wanted = parsed.GetValue(id)!;
            using CalibrationLogStore log = CalibrationsCommand.Open(parsed.GetValue(data));
            IReadOnlyList<EquipmentRecord> all = log.AllEquipment(DateTimeOffset.MaxValue);
            EquipmentRecord held = all.FirstOrDefault(each => each.Equipment == wanted)
                ?? throw Wrong.Input("id", wanted, $"it is not in the register{NearestName.DidYouMean(wanted, all.Select(static each => each.Equipment))}; there {(all.Count == 0 ? "is nothing yet" : "are " + string.Join(", ", all.Select(static each => each.Equipment)))}");
            if (json)
            {
                terminal.Output.WriteLine(Encoding.UTF8.GetString(log.BytesOf(held)));
            }
            else
            {
                LogText.WriteEntry(terminal.Output, log, log.FindEntry(held.Id)!);
                foreach (LogEntry older in log.Entries.Select(static stored => stored.Entry).Where(each => each is EquipmentRecord record && record.Equipment == wanted && each.Id != held.Id))
                {
                    terminal.Output.WriteLine($"before: entry {older.Id} of {CalibrationText.Time(LogText.At(older))}{LogText.Standing(log, older)}");
                }
            }

            return LogText.ReportChain(log, terminal, json: true);
        });
        return command;
    }

    private static void Write(TextWriter output, EquipmentRecord[] register, DateOnly today)
    {
        if (register.Length == 0)
        {
            output.WriteLine("Nothing is in the register; 'probecal register add --help' shows how to enter it.");
            return;
        }

        List<string[]> rows = [["id", "kind", "certificate", "value", "correction", "good until", "description"]];
        foreach (EquipmentRecord each in register)
        {
            rows.Add(
            [
                each.Equipment,
                each.EquipmentKind,
                each.Certificate ?? "-",
                LogText.Quantity(each.CertificateValue, each.EquipmentKind) ?? "-",
                LogText.Quantity(each.Correction, each.EquipmentKind) ?? "-",
                each.LastDay is DateOnly last ? LogText.Day(last) + (last < today ? " OVERDUE" : "") : "-",
                each.Description ?? "",
            ]);
        }

        TextTable.Write(output, rows, "");
    }

    private static Option<string> Of(string name, string shown, string description)
    {
        return new Option<string>(name) { Description = description, HelpName = shown };
    }
}
