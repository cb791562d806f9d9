using System;
using System.Collections.Generic;
using System.CommandLine;
using System.Globalization;
using System.IO;
using System.Linq;
using ProbeCal.Station;
using ProbeCal.Station.Bracketing;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal calibrations brackets</c>: readings outside two passing checks.</summary>
internal static class CalibrationsBrackets
{
    internal static Command Create(Terminal terminal)
    {
        Option<string> probe = new("--probe") { Description = "Id of the probe.", HelpName = "ID", Required = true };
        Option<string> input = new("--input") { Description = "A table of readings; the station's journal in the data folder when left out.", HelpName = "FILE" };
        Option<string[]> columns = new("--column") { Description = "For a table: time=Column and \"concentration=Column [mg/L]\".", HelpName = "Q=COLUMN [UNIT]" };
        Option<string> offset = new("--time-offset") { Description = "For a table: offset from UTC of times that state none, as +02:00.", HelpName = "OFFSET" };
        Option<string> data = CalibrationsCommand.DataOption();
        Option<string> format = new("--format") { Description = "text (default) or json.", HelpName = "text|json" };
        Command command = new(
            "brackets",
            """
            Which readings of a probe do not lie between two passing checks, in time and in range, and why.

            Examples:
              probecal calibrations brackets --probe P-17 --data north-pier
              probecal calibrations brackets --probe P-17 --input readings.csv --column time=Time \
                --column "concentration=DO [mg/L]"
            """)
        {
            probe, input, columns, offset, data, format,
        };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format));
            string wanted = PlainText.Id("--probe", parsed.GetValue(probe)!);
            string[] mapped = parsed.GetValue(columns) ?? [];
            using DataDirectory folder = DataDirectory.OpenForReading(parsed.GetValue(data) ?? CalibrateCommand.UsualData);
            using CalibrationLogStore log = CalibrationLogStore.OpenForReading(folder.CalibrationLogFile);
            log.RequireWhole();
            string[] probes = [.. log.Records.Select(static stored => stored.Record.Probe.Id).Distinct()];
            if (Array.IndexOf(probes, wanted) < 0)
            {
                throw Wrong.Input("--probe", wanted, $"no calibration or check of it is in the log{NearestName.DidYouMean(wanted, probes)}; there are {string.Join(", ", probes)}");
            }

            if (parsed.GetValue(input) == null && (mapped.Length != 0 || parsed.GetValue(offset) != null))
            {
                throw new InputException("--input is missing: --column and --time-offset describe a table, and none is named");
            }

            BracketList found = parsed.GetValue(input) is string path
                ? BracketList.OfTable(log, wanted, path, mapped, parsed.GetValue(offset))
                : BracketList.OfJournal(log, wanted, folder.JournalFile);
            if (json)
            {
                terminal.Output.WriteLine(Json(wanted, found));
            }
            else
            {
                Write(terminal.Output, wanted, found);
            }

            return ExitCode.Done;
        });
        return command;
    }

    private static void Write(TextWriter output, string probe, BracketList found)
    {
        output.WriteLine($"{probe}: {Number.Print(found.Readings)} readings, {Number.Print(found.Bracketed)} bracketed, {Number.Print(found.Readings - found.Bracketed)} not");
        if (found.Spans.Count != 0)
        {
            List<string[]> rows = [["first (UTC)", "last (UTC)", "readings", "why not"]];
            rows.AddRange(found.Spans.Select(static span => new[] { Time(span.First), Time(span.Last), Number.Print(span.Count), span.Reason }));
            TextTable.Write(output, rows, "  ");
        }

        TextTable.WriteWrapped(output, "Rule: ", "  ", BracketList.Rule);
    }

    private static string Json(string probe, BracketList found)
    {
        return LogJson.Of("probecal-brackets", writer =>
        {
            writer.WriteString("probe", probe);
            writer.WriteString("rule", BracketList.Rule);
            writer.WriteNumber("readings", found.Readings);
            writer.WriteNumber("bracketed", found.Bracketed);
            writer.WriteStartArray("notBracketed");
            foreach (UnbracketedSpan span in found.Spans)
            {
                writer.WriteStartObject();
                writer.WriteString("firstUtc", Iso(span.First));
                writer.WriteString("lastUtc", Iso(span.Last));
                writer.WriteNumber("count", span.Count);
                writer.WriteString("outside", span.InTime ? "range" : "time");
                writer.WriteString("before", span.Before);
                writer.WriteString("after", span.After);
                writer.WriteString("reason", span.Reason);
                writer.WriteEndObject();
            }

            writer.WriteEndArray();
        });
    }

    private static string Time(DateTimeOffset time)
    {
        return time.UtcDateTime.ToString("yyyy-MM-dd HH:mm:ss", CultureInfo.InvariantCulture);
    }

    private static string Iso(DateTimeOffset time)
    {
        return time.UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss.FFFFFF'Z'", CultureInfo.InvariantCulture);
    }
}
