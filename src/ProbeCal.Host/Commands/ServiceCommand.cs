using System;
using System.Collections.Generic;
using System.CommandLine;
using System.Linq;
using System.Text;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal service</c>: what was done to a probe.</summary>
internal static class ServiceCommand
{
    internal static Command Create(Terminal terminal)
    {
        return new Command("service", "What was done to a probe: membrane, electrolyte, cleaning, dry storage, polarisation: add, list.")
        {
            Add(terminal),
            List(terminal),
        };
    }

    private static Command Add(Terminal terminal)
    {
        Argument<string> probe = new("probe") { Description = "Id of the probe.", HelpName = "PROBE" };
        Argument<string> what = new("event") { Description = "What was done: " + string.Join(", ", ServiceRecord.Events) + ".", HelpName = "EVENT" };
        Option<string> at = Of("--at", "TIME", "When, as 2026-06-01T12:00Z; now when left out.");
        Option<string> membrane = Of("--membrane", "ID", "Id of the membrane that came on.");
        Option<string> remarks = Of("--remarks", "TEXT", "Remarks.");
        Option<string> by = Of("--by", "NAME", "Who did it.");
        Option<string> data = CalibrationsCommand.DataOption();
        Option<string> format = Of("--format", "text|json", "text (default), or json: the entry as it is stored.");
        Command command = new(
            "add",
            """
            Write down something that was done to a probe. A mistake is taken back with 'calibrations withdraw' by the entry's id.

            Examples:
              probecal service add P-17 membrane-changed --membrane M-17 --at 2026-06-01T09:20+02:00
              probecal service add P-17 cleaned --remarks "algae on the cap" --by "field crew"
            """)
        {
            probe, what, at, membrane, remarks, by, data, format,
        };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format));
            ServiceRecord record = new ServiceEntry
            {
                Probe = parsed.GetValue(probe)!,
                Event = parsed.GetValue(what)!,
                At = parsed.GetValue(at),
                Membrane = parsed.GetValue(membrane),
                Remarks = parsed.GetValue(remarks),
                By = parsed.GetValue(by),
            }.Read(terminal.Time.GetUtcNow(), ProgramIdentity.Text);
            return CalibrationsCommand.Write(parsed.GetValue(data), terminal, log =>
            {
                StoredEntry stored = log.Append(record);
                if (json)
                {
                    terminal.Output.WriteLine(Encoding.UTF8.GetString(log.BytesOf(stored.Entry)));
                }
                else
                {
                    LogText.WriteEntry(terminal.Output, log, stored);
                }

                return ExitCode.Done;
            });
        });
        return command;
    }

    private static Command List(Terminal terminal)
    {
        Option<string> probe = Of("--probe", "ID", "Only this probe.");
        Option<string> data = CalibrationsCommand.DataOption();
        Option<string> format = Of("--format", "text|json", "text (default) or json.");
        Command command = new(
            "list",
            """
            What was done, oldest first; withdrawn entries are left out.

            Examples:
              probecal service list --probe P-17
            """)
        {
            probe, data, format,
        };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format));
            string? only = parsed.GetValue(probe);
            using CalibrationLogStore log = CalibrationsCommand.Open(parsed.GetValue(data));
            string[] probes = [.. log.Entries.Select(static stored => stored.Entry).OfType<ServiceRecord>().Select(static each => each.Probe).Where(each => only == null || each == only).Distinct()];
            ServiceRecord[] wanted = [.. probes.SelectMany(log.ServiceFor).OrderBy(static each => each.At)];
            if (json)
            {
                terminal.Output.WriteLine(LogJson.Of("probecal-service-list", writer =>
                {
                    writer.WriteString("logId", log.LogId);
                    writer.WriteStartArray("service");
                    foreach (ServiceRecord each in wanted)
                    {
                        writer.WriteRawValue(log.BytesOf(each));
                    }

                    writer.WriteEndArray();
                }));
            }
            else
            {
                List<string[]> rows = [["time (UTC)", "probe", "event", "membrane", "id", "remarks"]];
                rows.AddRange(wanted.Select(static each => new[] { CalibrationText.Time(each.At), each.Probe, each.Event, each.Membrane ?? "-", each.Id, each.Remarks ?? "" }));
                TextTable.Write(terminal.Output, rows, "");
            }

            return LogText.ReportChain(log, terminal, json: true);
        });
        return command;
    }

    private static Option<string> Of(string name, string shown, string description)
    {
        return new Option<string>(name) { Description = description, HelpName = shown };
    }
}
