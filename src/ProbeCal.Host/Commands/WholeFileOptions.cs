using System;
using System.CommandLine;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;
using ProbeCal.Station.WholeFiles;

namespace ProbeCal.Host.Commands;

/// <summary>The options of <c>equilibrium</c> that say which file is worked through, and what its columns hold.</summary>
internal sealed class WholeFileOptions
{
    private readonly Option<string> _input = new("--input") { Description = "A whole file: a table with conditions in its columns; - for standard input.", HelpName = "FILE" };
    private readonly Option<string> _output = new("--output") { Description = "Where its rows go with the results behind them; JSON lines when it ends in .jsonl; - for standard output.", HelpName = "FILE" };
    private readonly Option<string[]> _columns = new("--column") { Description = "Which quantity is which column, in which unit: \"temperature=Water temp [C]\". Once for each.", HelpName = "Q=COLUMN [UNIT]" };
    private readonly Option<string> _separator = new("--separator") { Description = "comma, semicolon or tab; told from the header when left out.", HelpName = "NAME" };
    private readonly Option<string> _headerLine = new("--header-line") { Description = "Line that names the columns; the first that is neither blank nor a comment (#) when left out.", HelpName = "N" };
    private readonly Option<bool> _decimalComma = new("--decimal-comma") { Description = "Commas are the decimal marks of the file." };
    private readonly Option<bool> _force = new("--force") { Description = "Replace an existing output." };

    /// <summary>Gives the options to a command.</summary>
    internal void AddTo(Command command)
    {
        foreach (Option option in new Option[] { _input, _output, _columns, _separator, _headerLine, _decimalComma, _force })
        {
            command.Options.Add(option);
        }
    }

    /// <summary>True when a whole file is asked for.</summary>
    /// <param name="parsed">The command line.</param>
    /// <param name="onlySingle">Options that make sense for a single value only.</param>
    /// <exception cref="InputException">The options of a file and of a single value are mixed, or one of the two files is missing.</exception>
    internal bool IsAsked(ParseResult parsed, params Option[] onlySingle)
    {
        bool input = parsed.GetValue(_input) is not null;
        if (!input && parsed.GetValue(_output) is null)
        {
            Option? alone = new Option[] { _columns, _separator, _headerLine, _decimalComma, _force }.FirstOrDefault(each => IsGiven(parsed, each));
            return alone is null ? false : throw new InputException($"{alone.Name} belongs to --input, which is not given");
        }

        if (!input)
        {
            throw new InputException("--input is missing: the table with the conditions, or - for standard input");
        }

        if (parsed.GetValue(_output) is null)
        {
            throw new InputException("--output is missing: where the rows go with their results, for example --output result.csv, or - for standard output");
        }

        return Array.Find(onlySingle, each => IsGiven(parsed, each)) is Option single
            ? throw new InputException($"{single.Name} plays no part beside --input; a whole file comes out as CSV, or as JSON lines when --output ends in .jsonl")
            : true;
    }

    /// <summary>Works through the file.</summary>
    internal int Run(ParseResult parsed, EquilibriumEntry entry, Terminal terminal)
    {
        WholeFileRequest request = new()
        {
            Input = parsed.GetValue(_input)!,
            Output = parsed.GetValue(_output)!,
            Columns = parsed.GetValue(_columns) ?? [],
            Separator = parsed.GetValue(_separator),
            HeaderLine = parsed.GetValue(_headerLine),
            DecimalComma = parsed.GetValue(_decimalComma),
            Force = parsed.GetValue(_force),
        };
        WholeFile.Run(
            request, new EquilibriumRows(entry),
            new WholeFileSurroundings(terminal.InputBytes, terminal.OutputBytes, terminal.Error.WriteLine, terminal.Time), terminal.Stop);
        return ExitCode.Done;
    }

    private static bool IsGiven(ParseResult parsed, Option option)
    {
        return parsed.GetResult(option) is { Implicit: false };
    }
}
