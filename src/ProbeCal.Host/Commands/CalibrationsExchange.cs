using System;
using System.Collections.Generic;
using System.CommandLine;
using System.IO;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.PastCalibrations;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal calibrations export</c> and <c>import</c>.</summary>
internal static class CalibrationsExchange
{
    private static readonly string[] Forms = ["jsonl", "csv"];

    internal static Command Export(Terminal terminal)
    {
        Option<string> output = new("--output") { Description = "Where to; standard output when left out. CSV when the name ends in .csv.", HelpName = "FILE" };
        Option<string> form = new("--as") { Description = "jsonl (default): every entry byte for byte, verifiable alone. csv: one row a calibration, for a spreadsheet.", HelpName = "jsonl|csv" };
        Option<string> which = new("--log") { Description = "An imported log by its id; the log of the folder when left out.", HelpName = "LOG" };
        Option<bool> force = new("--force") { Description = "Replace an existing output." };
        Option<string> data = CalibrationsCommand.DataOption();
        Command command = new(
            "export",
            """
            Write the log out: as JSON Lines, which 'import' takes and anybody can verify alone by the rule in the first line, or as
            CSV with one row a calibration.

            Examples:
              probecal calibrations export --output north-pier.jsonl
              probecal calibrations export --as csv --output calibrations.csv
            """)
        {
            output, form, which, force, data,
        };
        command.SetAction(parsed =>
        {
            string? path = parsed.GetValue(output);
            string shape = parsed.GetValue(form) ?? (path?.EndsWith(".csv", StringComparison.OrdinalIgnoreCase) == true ? "csv" : "jsonl");
            if (Array.IndexOf(Forms, shape) < 0)
            {
                throw Wrong.Input("--as", shape, $"there is no such form{NearestName.DidYouMean(shape, Forms)}; there are {string.Join(", ", Forms)}");
            }

            using CalibrationLogStore log = CalibrationsCommand.Open(parsed.GetValue(data));
            using StringWriter text = new();
            long count = shape == "csv"
                ? CalibrationCsv.Write(log, parsed.GetValue(which), text)
                : LogExport.Write(log, parsed.GetValue(which), text, terminal.Time.GetUtcNow(), ProgramIdentity.Text);
            if (path == null)
            {
                terminal.Output.Write(text.ToString());
                return ExitCode.Done;
            }

            Save(path, text.ToString(), parsed.GetValue(force));
            terminal.Error.WriteLine($"probecal: {Number.Print(count)} {(shape == "csv" ? "calibrations" : "entries")} written to {path}");
            return ExitCode.Done;
        });
        return command;
    }

    internal static Command Import(Terminal terminal)
    {
        Argument<string> file = new("file") { Description = "A log as 'export' writes it, or a table of past calibrations.", HelpName = "FILE" };
        Option<string[]> columns = new("--column") { Description = "For a table: which quantity is which column, in which unit: date=Date, \"before=Before [mg/L]\". Once for each.", HelpName = "Q=COLUMN [UNIT]" };
        Option<string> probe = new("--probe") { Description = "For a table without a column for the probe: its id.", HelpName = "ID" };
        Option<string> signal = new("--signal-unit") { Description = "For a table: unit of the signal, as a label.", HelpName = "UNIT" };
        Option<string> offset = new("--time-offset") { Description = "For a table: offset from UTC of times that state none, as +02:00.", HelpName = "OFFSET" };
        Option<string> separator = new("--separator") { Description = "For a table: comma, semicolon or tab; told from the header when left out.", HelpName = "NAME" };
        Option<bool> comma = new("--decimal-comma") { Description = "For a table: commas are the decimal marks." };
        Option<string> data = CalibrationsCommand.DataOption();
        Command command = new(
            "import",
            """
            Take in a log made elsewhere, which keeps its own id and chain beside the local one, or past calibrations from a
            table. An imported calibration is not in force by itself; a past one from a table never is, and is not judged again.
            Columns: date (must be there), probe, method, membrane, temperature, pressure, salinity, signal, slope, zero,
            reference, before, after, verdict, by, remarks. One wrong line, and nothing is imported; the same file twice adds nothing.

            Examples:
              probecal calibrations import north-pier.jsonl
              probecal calibrations import old.csv --probe P-17 --column date=Date --column "temperature=T [C]" \
                --column "reference=Winkler [mg/L]" --column "before=Shown before [mg/L]" --column "after=Shown after [mg/L]"
            """)
        {
            file, columns, probe, signal, offset, separator, comma, data,
        };
        command.SetAction(parsed =>
        {
            string path = parsed.GetValue(file)!;
            string[] mapped = parsed.GetValue(columns) ?? [];
            if (!File.Exists(path))
            {
                throw Wrong.Input("file", path, "there is no such file");
            }

            bool isLog = mapped.Length == 0 && LogImport.IsLog(path);
            // Read before anything is opened for writing: a wrong file makes and migrates nothing.
            LogImport? exported = isLog ? LogImport.Read(path) : null;
            IReadOnlyList<PastCalibrationRecord> past = isLog ? [] : Table().Read(terminal.Time.GetUtcNow(), ProgramIdentity.Text);
            return CalibrationsCommand.Write(parsed.GetValue(data), terminal, log =>
            {
                if (exported != null)
                {
                    long added = log.Import(exported);
                    terminal.Output.WriteLine(added == 0
                        ? $"log {exported.LogId}: nothing new; {(exported.LogId == log.LogId ? "it is the log of this folder itself" : "all of it was imported before")}"
                        : $"log {exported.LogId}: {Number.Print(added)} {(added == 1 ? "entry" : "entries")} imported, {Number.Print(exported.Chain.Count)} in all, chain whole, head {exported.Chain.Head}");
                    return ExitCode.Done;
                }

                (long rows, long known) = PastTable.Add(log, past);
                terminal.Output.WriteLine($"{Number.Print(rows)} past {(rows == 1 ? "calibration" : "calibrations")} imported{(known == 0 ? "" : ", " + Number.Print(known) + " were there already")}; none is in force, and none was judged again");
                return ExitCode.Done;
            });

            PastTable Table()
            {
                return new PastTable
                {
                    Path = path,
                    Columns = mapped,
                    Probe = parsed.GetValue(probe),
                    SignalUnit = parsed.GetValue(signal),
                    UtcOffset = parsed.GetValue(offset),
                    Separator = parsed.GetValue(separator),
                    DecimalComma = parsed.GetValue(comma),
                };
            }
        });
        return command;
    }

    private static void Save(string path, string text, bool replace)
    {
        if (!replace && File.Exists(path))
        {
            throw Wrong.Input("--output", path, "this file exists; name another, or replace it with --force");
        }

        try
        {
            File.WriteAllText(path, text);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or ArgumentException)
        {
            throw new WorkFailedException($"--output {Wrong.Shown(path)}: {fault.Message}", fault);
        }
    }
}
