using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.WholeFiles;

/// <summary>The beginning of a file: its byte order mark, the lines before the header, the header and its separator.</summary>
internal sealed class TableHeader
{
    private const string Utf8Mark = "\u00EF\u00BB\u00BF";

    /// <summary>Most that is kept of what stands before the header: a megabyte of remarks is no remark.</summary>
    private const long MostBytesBefore = 1 << 20;

    private static readonly (string Name, char Character)[] Separators = [("comma", ','), ("semicolon", ';'), ("tab", '\t')];

    private TableHeader() { }

    /// <summary>The byte order mark or nothing.</summary>
    internal required string Mark { get; init; }

    /// <summary>Lines before the header, as they stand.</summary>
    internal required IReadOnlyList<string> Before { get; init; }

    /// <summary>The header as it stands.</summary>
    internal required string Bytes { get; init; }

    /// <summary>The names of the columns as a person reads them.</summary>
    internal required IReadOnlyList<string> Names { get; init; }

    internal required char Separator { get; init; }

    /// <summary>How lines end: as the header does.</summary>
    internal required string LineEnd { get; init; }

    /// <summary>What was found out about the file, for a person to look at.</summary>
    internal required string Explanation { get; init; }

    internal bool IsUtf8 => TableText.IsUtf8(Bytes) && Before.All(TableText.IsUtf8);

    /// <summary>Reads up to the header.</summary>
    /// <param name="lines">The file from its start.</param>
    /// <param name="name">What it is called in a message.</param>
    /// <param name="separator">Name of the separator; null to tell it from the header.</param>
    /// <param name="line">Number of the header's line; null for the first that is neither blank nor a comment.</param>
    /// <param name="mappings">What must be among the columns.</param>
    /// <exception cref="InputException">There is no header, or its separator cannot be told.</exception>
    internal static TableHeader Read(TableLines lines, string name, string? separator, long? line, IReadOnlyList<ColumnMapping> mappings)
    {
        char? stated = separator is null ? null : SeparatorOf(separator);
        List<string> before = [];
        long bytes = 0;
        string mark = "";
        while (lines.Next(out string end) is string text)
        {
            if (lines.Number == 1)
            {
                RefuseOtherEncodings(text, name);
                mark = text.StartsWith(Utf8Mark, StringComparison.Ordinal) ? Utf8Mark : "";
                text = text[mark.Length..];
            }

            bool isHeader = line is long wanted ? lines.Number == wanted : text.AsSpan().Trim() is { IsEmpty: false } shown && shown[0] != '#';
            if (!isHeader)
            {
                before.Add(text);
                bytes += text.Length;
                if (1000 < before.Count || MostBytesBefore < bytes)
                {
                    break;
                }

                continue;
            }

            char character = stated ?? Tell(text, name, mappings);
            string[] names = Split(text, character) ?? throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{name}, line {lines.Number}: a quotation mark in the header is never closed"));
            return new TableHeader
            {
                Mark = mark,
                Before = before,
                Bytes = text,
                Names = names,
                Separator = character,
                LineEnd = end.Length == 0 ? "\n" : end,
                Explanation = string.Create(CultureInfo.InvariantCulture, $"{names.Length} columns separated by {NameOf(character)}{(stated is null ? " (told from the header)" : "")}, header in line {lines.Number}"),
            };
        }

        throw new InputException(MostBytesBefore < bytes
            ? $"{name}: more than a megabyte stands before the header; take the remarks out"
            : line is long asked
            ? string.Create(CultureInfo.InvariantCulture, $"{name}: there is no line {asked} for the header")
            : $"{name}: there is no header; the first line that is neither blank nor a comment (#) names the columns");
    }

    private static char SeparatorOf(string name)
    {
        foreach ((string known, char character) in Separators)
        {
            if (name == known || (name.Length == 1 && name[0] == character))
            {
                return character;
            }
        }

        string[] names = [.. Separators.Select(static each => each.Name)];
        throw Wrong.Input("--separator", name, $"no such separator{NearestName.DidYouMean(name, names)}; there are {string.Join(", ", names)}");
    }

    private static string NameOf(char separator)
    {
        return Separators.First(each => each.Character == separator).Name;
    }

    /// <summary>The one separator that the header has and with which every mapped column is found.</summary>
    private static char Tell(string header, string name, IReadOnlyList<ColumnMapping> mappings)
    {
        (char Character, string[] Names)[] present = [.. Separators
            .Select(each => (each.Character, Names: Split(header, each.Character) ?? []))
            .Where(static each => 1 < each.Names.Length)];
        (char Character, string[] Names)[] fitting = [.. present.Where(each => mappings.All(mapping => mapping.IsIn(each.Names)))];
        return (present.Length, fitting.Length) switch
        {
            (0, _) => ',',
            (1, _) => present[0].Character,
            (_, 1) => fitting[0].Character,
            (_, 0) => present.MaxBy(static each => each.Names.Length).Character,
            _ => throw new InputException($"{name}: the header {Wrong.Shown(TableText.Decode(header))} could be separated by {string.Join(" or ", fitting.Select(each => NameOf(each.Character)))}; say which with --separator"),
        };
    }

    private static string[]? Split(string header, char separator)
    {
        TableRow row = new();
        return row.Split(header, separator) ? [.. Enumerable.Range(0, row.Count).Select(i => row.Cell(i).Trim())] : null;
    }

    private static void RefuseOtherEncodings(string first, string name)
    {
        if (first.StartsWith("\u00FF\u00FE", StringComparison.Ordinal) || first.StartsWith("\u00FE\u00FF", StringComparison.Ordinal) || first.Contains('\0', StringComparison.Ordinal))
        {
            throw new InputException($"{name}: this is UTF-16 or no text at all; save it as CSV in UTF-8");
        }
    }
}
