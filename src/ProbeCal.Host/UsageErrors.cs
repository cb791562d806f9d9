using System;
using System.Collections.Generic;
using System.CommandLine;
using System.CommandLine.Parsing;
using System.IO;
using System.Linq;
using ProbeCal.Host.Commands;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host;

/// <summary>A command line that could not be read, in one line: what is wrong, and the nearest that would be right.</summary>
internal static class UsageErrors
{
    /// <summary>The line, without the program's name before it.</summary>
    internal static string Line(ParseResult parsed)
    {
        Command command = parsed.CommandResult.Command;
        return What(parsed, command) + " ('" + Path(parsed) + " --help' lists what it takes)";
    }

    /// <summary>One line a command: what a bare <c>probecal</c> shows, and its <c>--help</c>.</summary>
    internal static void Overview(RootCommand root, TextWriter output)
    {
        TextTable.WriteWrapped(output, "", "", root.Description!);
        output.WriteLine();
        TextTable.Write(output, [.. root.Subcommands.Select(static command => new[] { "probecal " + command.Name, Shortest(command.Description ?? "") })], "  ");
        output.WriteLine();
        TextTable.WriteWrapped(output, "", "", "'probecal demo' shows the whole job without hardware. 'probecal equilibrium --help' and the like show options and examples; 'probecal --version' the version.");
    }

    /// <summary>What a command is for, without the list behind the colon and the sentences that follow: one line in the overview.</summary>
    private static string Shortest(string description)
    {
        string first = description.Split('\n')[0].TrimEnd();
        int end = first.AsSpan().IndexOfAny(':', '.');
        return end < 0 ? first : first[..end] + ".";
    }

    private static string What(ParseResult parsed, Command command)
    {
        string[] commands = [.. command.Subcommands.Select(static known => known.Name)];
        if (parsed.UnmatchedTokens.Count == 0)
        {
            return commands.Length == 0 ? OfOption(parsed, command) : "name a command: " + string.Join(", ", commands);
        }

        string given = parsed.UnmatchedTokens[0];
        string shown = Wrong.Shown(given);
        if (given.StartsWith("--", StringComparison.Ordinal))
        {
            return $"there is no option {shown}{NearestName.DidYouMean(given, command.Options.Select(static known => known.Name))}";
        }

        return commands.Length == 0
            ? $"'{shown}' is not understood there; a value with blanks in it wants quotes"
            : $"there is no command '{shown}'{NearestName.DidYouMean(given, commands)}; there are {string.Join(", ", commands)}";
    }

    /// <summary>An option that is missing, has no value or is given twice.</summary>
    private static string OfOption(ParseResult parsed, Command command)
    {
        if (parsed.Errors[0].SymbolResult is OptionResult { Option: Option given, IdentifierTokenCount: int times } && 0 < times)
        {
            return times == 1
                ? $"{given.Name} wants a value: {given.Description}"
                : $"{given.Name} is given {times} times; give it once";
        }

        return command.Options.FirstOrDefault(option => option.Required && parsed.GetResult(option) is null or { Implicit: true }) is Option missing
            ? $"{missing.Name} is missing: {missing.Description}"
            : parsed.Errors[0].Message;
    }

    private static string Path(ParseResult parsed)
    {
        List<string> names = [];
        for (System.CommandLine.Parsing.SymbolResult? at = parsed.CommandResult; at != null; at = at.Parent)
        {
            if (at is System.CommandLine.Parsing.CommandResult { Command: not RootCommand } result)
            {
                names.Insert(0, result.Command.Name);
            }
        }

        return string.Join(' ', names.Prepend("probecal"));
    }
}
