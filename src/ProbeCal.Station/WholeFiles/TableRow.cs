using System;
using System.Collections.Generic;
using System.Text;

namespace ProbeCal.Station.WholeFiles;

/// <summary>
/// One row of a table and where its cells are: RFC 4180, a quotation mark being one only where a cell begins. Written here
/// because every byte of a row is handed on, and because a mark that is never closed must cost its own row only, where a
/// reader of the usual kind takes the rest of the file for one cell.
/// </summary>
internal sealed class TableRow
{
    /// <summary>Most lines that a cell in quotation marks may run over; more, and the mark was a mistake.</summary>
    private const int MostLines = 50;

    private readonly List<(int Start, int Length, bool Quoted)> _cells = [];

    /// <summary>The row as it stands in the file, without its end.</summary>
    internal string Bytes { get; private set; } = "";

    /// <summary>Number of its first line, from 1.</summary>
    internal long Line { get; private set; }

    internal int Count => _cells.Count;

    internal bool IsBlank => string.IsNullOrWhiteSpace(Bytes);

    /// <summary>Why it cannot be taken apart; null when it can.</summary>
    internal string? Problem { get; private set; }

    /// <summary>The cell without its quotation marks, as a person reads it.</summary>
    internal string Cell(int index)
    {
        (int start, int length, bool quoted) = _cells[index];
        string bytes = Bytes.Substring(start, length);
        return TableText.Decode(quoted ? bytes.Replace("\"\"", "\"", StringComparison.Ordinal) : bytes);
    }

    /// <summary>Reads the next row; false at the end.</summary>
    internal bool Read(TableLines lines, char separator)
    {
        string? first = lines.Next(out string end);
        if (first is null)
        {
            return false;
        }

        Line = lines.Number;
        Bytes = first;
        if (!Split(separator))
        {
            ReadOn(lines, separator, first, end);
        }

        return true;
    }

    /// <summary>Takes a text apart; used for the header, whose separator is not known yet.</summary>
    internal bool Split(string bytes, char separator)
    {
        Bytes = bytes;
        return Split(separator);
    }

    private void ReadOn(TableLines lines, char separator, string first, string end)
    {
        List<(string Text, string End)> more = [];
        StringBuilder whole = new(first);
        while (more.Count < MostLines && lines.Next(out string nextEnd) is string next)
        {
            more.Add((next, nextEnd));
            whole.Append(end).Append(next);
            end = nextEnd;
            // Only a quotation mark can close the cell.
            if (next.Contains('"', StringComparison.Ordinal) && Split(whole.ToString(), separator))
            {
                return;
            }
        }

        for (int i = more.Count - 1; 0 <= i; i--)
        {
            lines.PutBack(more[i].Text, more[i].End);
        }

        Bytes = first;
        _cells.Clear();
        Problem = "a quotation mark is opened and never closed";
    }

    /// <summary>False when a quotation mark is still open at the end.</summary>
    private bool Split(char separator)
    {
        _cells.Clear();
        Problem = null;
        int at = 0;
        while (true)
        {
            bool quoted = at < Bytes.Length && Bytes[at] == '"';
            int start = quoted ? at + 1 : at;
            int end = quoted ? ClosingMark(start) : at;
            if (end < 0)
            {
                return false;
            }

            int next = Bytes.IndexOf(separator, quoted ? end + 1 : at);
            int stop = next < 0 ? Bytes.Length : next;
            if (!quoted)
            {
                end = stop;
            }
            else if (!Bytes.AsSpan(end + 1, stop - end - 1).IsWhiteSpace())
            {
                Problem ??= "there is text behind a closing quotation mark";
            }

            _cells.Add((start, end - start, quoted));
            if (next < 0)
            {
                return true;
            }

            at = next + 1;
        }
    }

    private int ClosingMark(int from)
    {
        for (int at = Bytes.IndexOf('"', from); 0 <= at; at = Bytes.IndexOf('"', at + 2))
        {
            if (at + 1 == Bytes.Length || Bytes[at + 1] != '"')
            {
                return at;
            }

            if (Bytes.Length <= at + 2)
            {
                break;
            }
        }

        return -1;
    }
}
