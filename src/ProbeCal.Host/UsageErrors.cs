using System;
using System.Collections.Generic;
using System.CommandLine;
using System.IO;
using System.Linq;
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

    /// <summary>One line a command: what a bare <c>probecal</c> shows.</summary>
    internal static void Overview(RootCommand root, TextWriter error)
    {
        error.WriteLine(root.Description);
        error.WriteLine();
        foreach (Command command in root.Subcommands)
        {
            error.WriteLine($"  probecal {command.Name,-13} {(command.Description ?? "").Split('\n')[0].TrimEnd()}");
        }

        error.WriteLine();
        error.WriteLine("'probecal demo' shows the whole job without hardware; 'probecal calibrate --help' and the like show options and examples.");
    }

    private static string What(ParseResult parsed, Command command)
    {
        string[] commands = [.. command.Subcommands.Select(static known => known.Name)];
        if (parsed.UnmatchedTokens.Count == 0)
        {
            return commands.Length == 0 ? parsed.Errors[0].Message : "name a command: " + string.Join(", ", commands);
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
