using System;
using System.Collections.Generic;
using System.CommandLine;
using System.IO;
using System.Linq;
using System.Text.Json;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal calibrations verify</c>: the chain, and heads kept elsewhere.</summary>
internal static class CalibrationsVerify
{
    /// <summary>Largest file that is searched for heads; a certificate or a note has no more.</summary>
    private const long LargestFile = 64 << 20;

    internal static Command Create(Terminal terminal)
    {
        Option<string[]> head = new("--head")
        {
            Description = "A head kept elsewhere, COUNT:HASH, or a text file that holds one: a certificate as HTML, a published message, a note. May be given several times.",
            HelpName = "COUNT:HASH|FILE",
        };
        Option<string> which = new("--log") { Description = "An imported log by its id; the log of the folder when left out.", HelpName = "LOG" };
        Option<string> data = CalibrationsCommand.DataOption();
        Option<string> format = new("--format") { Description = "text (default) or json.", HelpName = "text|json" };
        Command command = new(
            "verify",
            """
            Walk over every stored byte: finds edits, insertions, reordering and gaps. Against a head kept elsewhere it also
            finds entries cut off at the end and a log written anew. Exit code 1 when something was found.

            Examples:
              probecal calibrations verify
              probecal calibrations verify --head 12:4245...61ba6d
              probecal calibrations verify --head certificate-0007.html --data north-pier
            """)
        {
            head, which, data, format,
        };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format));
            LogHead[] heads = [.. (parsed.GetValue(head) ?? []).SelectMany(Heads).Distinct()];
            using CalibrationLogStore log = CalibrationsCommand.Open(parsed.GetValue(data));
            List<LogVerification> found = [LogVerification.Of(log, parsed.GetValue(which), heads)];
            if (parsed.GetValue(which) == null)
            {
                found.AddRange(log.ImportedLogs.Select(imported => LogVerification.Of(log, imported.LogId, [])));
            }

            if (json)
            {
                terminal.Output.WriteLine(Json(found));
            }
            else
            {
                found.ForEach(each => Write(terminal.Output, each));
            }

            foreach (string wrong in found.SelectMany(Wrongs))
            {
                terminal.Error.WriteLine("probecal: " + wrong);
            }

            return found.TrueForAll(static each => each.IsSound) ? ExitCode.Done : ExitCode.WorkFailed;
        });
        return command;
    }

    private static IReadOnlyList<LogHead> Heads(string given)
    {
        FileInfo file = new(given.Length == 0 ? " " : given);
        if (!file.Exists)
        {
            return [LogHead.Parse(given)];
        }

        if (LargestFile < file.Length)
        {
            throw Wrong.Input("--head", given, "this file is larger than any certificate; name the text file that holds the head");
        }

        IReadOnlyList<LogHead> heads = LogHead.FindAll(File.ReadAllText(file.FullName));
        return heads.Count != 0 ? heads : throw Wrong.Input("--head", given, "no head stands in this file as text; write it as COUNT:HASH, as the certificate prints it");
    }

    private static IEnumerable<string> Wrongs(LogVerification found)
    {
        return found.Chain.Faults.Select(fault => $"calibration log {found.LogId}: CHAIN BROKEN: {fault}")
            .Concat(found.Heads.Where(static head => !head.Agrees).Select(head => $"calibration log {found.LogId}: HEAD DISAGREES: {head.Text}"));
    }

    private static void Write(TextWriter output, LogVerification found)
    {
        output.WriteLine($"log {found.LogId}{(found.Origin == null ? "" : " imported from " + found.Origin)}: {Number.Print(found.Chain.Count)} {(found.Chain.Count == 1 ? "entry" : "entries")}, {(found.Chain.IsWhole ? "chain whole" : "CHAIN BROKEN")}");
        output.WriteLine("  head " + found.Chain.Head);
        foreach (ChainFault fault in found.Chain.Faults)
        {
            TextTable.WriteWrapped(output, "  " + fault.Kind + ": ", "    ", fault.Text);
        }

        foreach (HeadComparison head in found.Heads)
        {
            TextTable.WriteWrapped(output, head.Agrees ? "  agrees: " : "  DISAGREES: ", "    ", head.Text);
        }

        foreach (string note in found.Notes)
        {
            TextTable.WriteWrapped(output, "  note: ", "    ", note);
        }

        if (found.Heads.Count == 0)
        {
            TextTable.WriteWrapped(output, "  not excluded: ", "    ", LogVerification.NotExcluded);
        }
    }

    private static string Json(List<LogVerification> found)
    {
        return LogJson.Of("probecal-log-verification", writer =>
        {
            writer.WriteBoolean("sound", found.TrueForAll(static each => each.IsSound));
            writer.WriteStartArray("logs");
            foreach (LogVerification each in found)
            {
                Write(writer, each);
            }

            writer.WriteEndArray();
        });
    }

    private static void Write(Utf8JsonWriter writer, LogVerification found)
    {
        writer.WriteStartObject();
        writer.WriteString("logId", found.LogId);
        writer.WriteString("origin", found.Origin);
        writer.WriteNumber("count", found.Chain.Count);
        writer.WriteString("headSha256", found.Chain.HeadSha256);
        writer.WriteString("head", found.Chain.Head);
        writer.WriteBoolean("chainWhole", found.Chain.IsWhole);
        writer.WriteStartArray("faults");
        foreach (ChainFault fault in found.Chain.Faults)
        {
            writer.WriteStartObject();
            writer.WriteNumber("index", fault.Index);
            writer.WriteString("kind", fault.Kind);
            writer.WriteString("text", fault.Text);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("heads");
        foreach (HeadComparison head in found.Heads)
        {
            writer.WriteStartObject();
            writer.WriteString("head", head.Head.ToString());
            writer.WriteBoolean("agrees", head.Agrees);
            writer.WriteString("kind", head.Kind);
            writer.WriteString("text", head.Text);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("notes");
        foreach (string note in found.Notes)
        {
            writer.WriteStringValue(note);
        }

        writer.WriteEndArray();
        writer.WriteString("notExcluded", found.Heads.Count == 0 ? LogVerification.NotExcluded : null);
        writer.WriteEndObject();
    }
}
