using System;
using System.CommandLine;
using System.IO;
using System.Linq;
using System.Text;
using ProbeCal.Station;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal calibrations</c>: what the calibration log holds.</summary>
internal static class CalibrationsCommand
{
    internal static Command Create(Terminal terminal)
    {
        return new Command("calibrations", "What the calibration log holds: list, show, certificate, history, verify, export, import, brackets, withdraw.")
        {
            CalibrationsList.Create(terminal),
            Show(terminal),
            CertificateCommand.Create(terminal),
            HistoryCommand.Create(terminal),
            CalibrationsVerify.Create(terminal),
            CalibrationsExchange.Export(terminal),
            CalibrationsExchange.Import(terminal),
            CalibrationsBrackets.Create(terminal),
            Withdraw(terminal),
        };
    }

    /// <summary>The option that every command on the log has.</summary>
    internal static Option<string> DataOption()
    {
        return new Option<string>("--data") { Description = "Folder of the calibration log (default probecal-data).", HelpName = "DIR" };
    }

    /// <summary>The log for reading, beside whoever writes.</summary>
    internal static CalibrationLogStore Open(string? folder)
    {
        using DataDirectory data = DataDirectory.OpenForReading(folder ?? CalibrateCommand.UsualData);
        return CalibrationLogStore.OpenForReading(data.CalibrationLogFile);
    }

    /// <summary>Shows the log, or null where there is none yet, to what must look at it before anything is written.</summary>
    internal static void Look(string? folder, Action<CalibrationLogStore?> work)
    {
        string path = folder ?? CalibrateCommand.UsualData;
        using DataDirectory? data = Directory.Exists(path) ? DataDirectory.OpenForReading(path) : null;
        using CalibrationLogStore? log = data != null && File.Exists(data.CalibrationLogFile) ? CalibrationLogStore.OpenForReading(data.CalibrationLogFile) : null;
        work(log);
    }

    /// <summary>Opens the log for writing, does the work and closes both.</summary>
    internal static int Write(string? folder, Terminal terminal, Func<CalibrationLogStore, int> work)
    {
        using DataDirectory data = DataDirectory.OpenForWriting(folder ?? CalibrateCommand.UsualData);
        using CalibrationLogStore log = CalibrationLogStore.OpenForWriting(data.CalibrationLogFile, terminal.Time, Guid.NewGuid);
        if (log.BackupPath is string backup)
        {
            terminal.Error.WriteLine("probecal: the calibration log was of an older version and is migrated; the copy before is " + backup);
        }

        log.RequireWhole();
        return work(log);
    }

    /// <summary>The entry with an id.</summary>
    /// <exception cref="InputException">There is none.</exception>
    internal static StoredEntry Find(CalibrationLogStore log, string wanted)
    {
        return log.FindEntry(wanted)
            ?? throw new InputException($"calibration {Wrong.Shown(wanted)}: not in this log{NearestName.DidYouMean(wanted, log.Entries.Select(static known => known.Entry.Id))}; 'probecal calibrations list --all' shows the ids");
    }

    private static Command Show(Terminal terminal)
    {
        Argument<string> id = new("id") { Description = "Id of the calibration, or of another entry of the log, as list shows it.", HelpName = "ID" };
        Option<string> data = DataOption();
        Option<string> format = new("--format") { Description = "text (default), or json: the record as it is stored.", HelpName = "text|json" };
        Command command = new("show", "One record, whole: a calibration, a check, or another entry of the log.") { id, data, format };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format));
            using CalibrationLogStore log = Open(parsed.GetValue(data));
            StoredEntry stored = Find(log, parsed.GetValue(id)!);
            if (json)
            {
                terminal.Output.WriteLine(Encoding.UTF8.GetString(log.BytesOf(stored.Entry)));
            }
            else
            {
                LogText.WriteEntry(terminal.Output, log, stored);
            }

            return LogText.ReportChain(log, terminal, json);
        });
        return command;
    }

    private static Command Withdraw(Terminal terminal)
    {
        Argument<string> id = new("id") { Description = "Id of the calibration, check or other entry, as list shows it.", HelpName = "ID" };
        Option<string> reason = new("--reason") { Description = "Why; it stands in the log for ever.", HelpName = "TEXT", Required = true };
        Option<string> by = new("--by") { Description = "Who withdraws it.", HelpName = "NAME" };
        Option<string> data = DataOption();
        Option<string> format = new("--format") { Description = "text (default), or json: the entry as it is stored.", HelpName = "text|json" };
        Command command = new(
            "withdraw",
            """
            Take an entry back: it stays in the log, is shown as withdrawn everywhere and is never in force again.
            A withdrawal made in error is itself withdrawn by its own id.

            Examples:
              probecal calibrations withdraw c3a41f09b2e7-0004 \
                --reason "barometer read in inHg taken for kPa"
            """)
        {
            id, reason, by, data, format,
        };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format));
            string why = PlainText.OneLine("--reason", parsed.GetValue(reason)!.Trim());
            if (why.Length == 0)
            {
                throw new InputException("--reason is empty: say why; it stands in the log for ever");
            }

            string? who = parsed.GetValue(by) is string given ? PlainText.OneLine("--by", given) : null;
            // Looked at first: nothing is made or migrated for a folder or an id that is wrong.
            using (CalibrationLogStore looked = Open(parsed.GetValue(data)))
            {
                RefuseWithdrawn(looked, Find(looked, parsed.GetValue(id)!));
            }

            return Write(parsed.GetValue(data), terminal, log =>
            {
                StoredEntry of = Find(log, parsed.GetValue(id)!);
                RefuseWithdrawn(log, of);
                StoredEntry stored = log.Append(new AmendmentRecord { Of = of.Entry.Id, Reason = why, By = who, Software = ProgramIdentity.Text });
                if (json)
                {
                    terminal.Output.WriteLine(Encoding.UTF8.GetString(log.BytesOf(stored.Entry)));
                    return ExitCode.Done;
                }

                terminal.Output.WriteLine($"{of.Entry.Id} is withdrawn by entry {stored.Entry.Id}.");
                if (of.Entry is CalibrationRecord record)
                {
                    StoredCalibration? inForce = log.LatestFor(record.Probe.Id, terminal.Time.GetUtcNow());
                    terminal.Output.WriteLine(inForce == null
                        ? $"No calibration of {record.Probe.Id} is in force now."
                        : $"In force for {record.Probe.Id} now: {inForce.Record.Id} of {CalibrationText.Time(inForce.Record.CompletedUtc)}. A running station takes it up when it is started anew.");
                }

                return ExitCode.Done;
            });
        });
        return command;
    }

    private static void RefuseWithdrawn(CalibrationLogStore log, StoredEntry stored)
    {
        if (log.WithdrawalOf(stored.Entry.Id) is AmendmentRecord already)
        {
            throw new InputException($"calibration {stored.Entry.Id}: it was withdrawn already by entry {already.Id} ({already.Reason})");
        }
    }
}
