using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Threading;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.WholeFiles;

/// <summary>What is asked of a whole file, as texts of options.</summary>
public sealed record WholeFileRequest
{
    /// <summary>The file with the conditions, or <c>-</c> for standard input.</summary>
    public required string Input { get; init; }

    /// <summary>Where the rows with their results go, or <c>-</c> for standard output; JSON lines when it ends in <c>.jsonl</c>.</summary>
    public required string Output { get; init; }

    /// <summary>Which quantity is which column: <c>temperature=Water temp [C]</c>.</summary>
    public required IReadOnlyList<string> Columns { get; init; }

    /// <summary><c>comma</c>, <c>semicolon</c> or <c>tab</c>; null to tell it from the header.</summary>
    public string? Separator { get; init; }

    /// <summary>Number of the header's line; null for the first that is neither blank nor a comment.</summary>
    public string? HeaderLine { get; init; }

    /// <summary>True when commas are the decimal marks of the file.</summary>
    public bool DecimalComma { get; init; }

    /// <summary>True to replace an existing output.</summary>
    public bool Force { get; init; }
}

/// <summary>The streams and the clock that a whole file is worked through with.</summary>
/// <param name="StandardInput">What <c>-</c> is as an input.</param>
/// <param name="StandardOutput">What <c>-</c> is as an output.</param>
/// <param name="Say">Takes lines for a person: what was understood, progress, counts.</param>
/// <param name="Time">The clock, for progress.</param>
public sealed record WholeFileSurroundings(Func<Stream> StandardInput, Func<Stream> StandardOutput, Action<string> Say, TimeProvider Time);

/// <summary>
/// Works through a table row by row: reads, computes, writes the row as it came with the results behind it. Memory does
/// not grow with the file, and a row that cannot be computed stops nothing.
/// </summary>
public static class WholeFile
{
    private static readonly TimeSpan FirstProgress = TimeSpan.FromSeconds(2);
    private static readonly TimeSpan FurtherProgress = TimeSpan.FromSeconds(10);

    /// <summary>Works through the file and tells the counts.</summary>
    /// <exception cref="InputException">Something in the request or the header is wrong; nothing has been written.</exception>
    /// <exception cref="WorkFailedException">A file cannot be opened.</exception>
    /// <exception cref="OperationCanceledException">It was stopped; the output is as it was before.</exception>
    public static void Run(WholeFileRequest request, IRowFormula formula, WholeFileSurroundings surroundings, CancellationToken stop)
    {
        ColumnMapping[] mappings = ColumnMapping.ParseAll(request.Columns, formula.Quantities);
        long? headerLine = request.HeaderLine is string text ? Number.ParseWhole("--header-line", text, 1, 1000) : null;
        using Stream input = OpenInput(request.Input, surroundings);
        string name = request.Input == "-" ? "standard input" : Wrong.Shown(request.Input);
        using TableLines lines = new(input, name);
        TableHeader header = TableHeader.Read(lines, name, request.Separator, headerLine, mappings);
        foreach (ColumnMapping mapping in mappings)
        {
            mapping.Resolve(header.Names);
        }

        formula.Begin([.. mappings.Select(static each => each.Quantity.Name)], [.. mappings.Select(static each => each.UnitName)]);
        using ResultFile output = ResultFile.Open(request.Output, request.Input, request.Force, surroundings.StandardOutput);
        surroundings.Say($"{name}: {header.Explanation}");
        surroundings.Say("  " + string.Join("; ", mappings.Select(static each => each.Explanation)));
        if (formula.About.Count != 0)
        {
            surroundings.Say("  " + string.Join("; ", formula.About.Select(static each => Words(each.Key) + " " + each.Value)));
        }

        RowCounts counts = new();
        try
        {
            using (IRowWriter writer = Writer(request, formula, header, output.Stream))
            {
                writer.Header(header);
                WriteRows(request, formula, lines, header, mappings, writer, counts, surroundings, stop);
            }

            output.Keep();
        }
        catch (ArgumentOutOfRangeException fault) when (fault.ParamName == "value")
        {
            // What the runtime makes of a file that has grown larger than its file system takes, 4 GB on many a memory card.
            throw new WorkFailedException($"--output {Wrong.Shown(request.Output)}: cannot be written (the file would be larger than its file system takes)", fault);
        }

        counts.Tell(surroundings.Say);
    }

    private static void WriteRows(
        WholeFileRequest request, IRowFormula formula, TableLines lines, TableHeader header, ColumnMapping[] mappings, IRowWriter writer,
        RowCounts counts, WholeFileSurroundings surroundings, CancellationToken stop)
    {
        string[] values = new string[mappings.Length];
        double[] results = new double[formula.Results.Count];
        TableRow row = new();
        long started = surroundings.Time.GetTimestamp();
        TimeSpan next = FirstProgress;
        while (row.Read(lines, header.Separator))
        {
            stop.ThrowIfCancellationRequested();
            if (row.IsBlank)
            {
                counts.Blank++;
                writer.Blank(row);
                continue;
            }

            Array.Fill(results, double.NaN);
            RowOutcome outcome = Outcome(formula, header, mappings, row, request.DecimalComma, values, results);
            counts.Add(outcome);
            writer.Row(row, results, outcome);
            if ((counts.Rows & 0xFF) == 0 && next <= surroundings.Time.GetElapsedTime(started))
            {
                surroundings.Say(string.Create(CultureInfo.InvariantCulture, $"  {counts.Rows} rows so far"));
                next = surroundings.Time.GetElapsedTime(started) + FurtherProgress;
            }
        }
    }

    private static RowOutcome Outcome(
        IRowFormula formula, TableHeader header, ColumnMapping[] mappings, TableRow row, bool decimalComma, string[] values, double[] results)
    {
        if (row.Problem is string problem)
        {
            return RowOutcome.Refused(problem, "");
        }

        if (row.Count != header.Names.Count)
        {
            return RowOutcome.Refused("other number of cells than the header", string.Create(CultureInfo.InvariantCulture, $"{row.Count} where the header has {header.Names.Count}"));
        }

        for (int i = 0; i < mappings.Length; i++)
        {
            if (!mappings[i].TryRead(row.Cell(mappings[i].Index), decimalComma, out values[i], out RowOutcome unreadable))
            {
                return unreadable;
            }
        }

        return formula.Compute(values, results);
    }

    /// <summary>A key of the JSON, pressureSource, as words.</summary>
    private static string Words(string key)
    {
        return string.Concat(key.Select(static c => char.IsAsciiLetterUpper(c) ? " " + char.ToLowerInvariant(c) : c.ToString()));
    }

    private static IRowWriter Writer(WholeFileRequest request, IRowFormula formula, TableHeader header, Stream output)
    {
        if (request.Output.EndsWith(".jsonl", StringComparison.OrdinalIgnoreCase))
        {
            return new JsonRowWriter(output, formula.Results, formula.About);
        }

        // An output may be an input again: its columns keep their names, the new ones are numbered.
        List<string> names = [];
        foreach (string wanted in formula.Results.Select(static each => each.Name).Append("status"))
        {
            string name = wanted;
            for (int number = 2; header.Names.Contains(name); number++)
            {
                name = string.Create(CultureInfo.InvariantCulture, $"{wanted} #{number}");
            }

            names.Add(name);
        }

        return new CsvRowWriter(output, names, request.DecimalComma);
    }

    private static Stream OpenInput(string path, WholeFileSurroundings surroundings)
    {
        if (path == "-")
        {
            return surroundings.StandardInput();
        }

        if (string.IsNullOrWhiteSpace(path))
        {
            throw Wrong.Input("--input", path, "name the file with the conditions, or - for standard input");
        }

        if (Directory.Exists(path))
        {
            throw Wrong.Input("--input", path, "this is a folder; name a file with columns");
        }

        try
        {
            return new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite, 1 << 16, FileOptions.SequentialScan);
        }
        catch (Exception fault) when (fault is FileNotFoundException or DirectoryNotFoundException)
        {
            throw Wrong.Input("--input", path, "there is no such file");
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or ArgumentException)
        {
            throw new WorkFailedException($"--input {Wrong.Shown(path)}: cannot be read ({fault.Message})", fault);
        }
    }
}
