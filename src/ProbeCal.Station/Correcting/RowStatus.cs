using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Text;

namespace ProbeCal.Station.Correcting;

/// <summary>
/// The status of a row while it is made, its text, and how often each reason was met. Reasons are words without separators or quotation marks, so that
/// a status needs no quotes in any file.
/// </summary>
internal sealed class RowStatus
{
    private readonly List<Reason> _reasons = [];
    private readonly Dictionary<string, int> _numbers = new(StringComparer.Ordinal);
    private readonly int[] _now = new int[16];
    private int _count;
    private bool _refused;

    internal long Rows { get; private set; }

    internal long Refused { get; private set; }

    internal long FlaggedRows { get; private set; }

    internal long Blank { get; set; }

    /// <summary>The first refused row in words: its line, the reason and the cell.</summary>
    internal string FirstRefusal { get; private set; } = "";

    /// <summary>Reasons of flagged and refused rows with how many rows had each, in order of their words.</summary>
    internal IEnumerable<(string Word, string Text, long Rows, long FirstLine)> Reasons =>
        _reasons.OrderBy(static each => each.Text, StringComparer.Ordinal).SelectMany(static each => each.Both());

    internal bool IsRefused => _refused;

    /// <summary>True when the first refused cell holds a number with a comma.</summary>
    internal bool HasCommaNumber { get; private set; }

    internal bool IsPlain => _count == 0;

    internal void Begin()
    {
        (_count, _refused) = (0, false);
    }

    /// <summary>Refuses the row.</summary>
    internal void Refuse(string reason)
    {
        Begin();
        _refused = true;
        Flag(reason);
    }

    /// <summary>Something to know about the row.</summary>
    internal void Flag(string reason)
    {
        if (!_numbers.TryGetValue(reason, out int number))
        {
            number = _reasons.Count;
            _reasons.Add(new Reason(reason));
            _numbers.Add(reason, number);
        }

        if (_count < _now.Length && Array.IndexOf(_now, number, 0, _count) < 0)
        {
            _now[_count++] = number;
        }
    }

    /// <summary>Writes the status and counts it.</summary>
    /// <param name="output">Where to.</param>
    /// <param name="line">Number of the row's line.</param>
    /// <param name="cell">The cell at fault, for the first refusal.</param>
    internal void End(ByteOutput output, long line, ReadOnlySpan<byte> cell)
    {
        Rows++;
        if (_count == 0)
        {
            output.Write("ok"u8);
            return;
        }

        output.Write(_refused ? "refused: "u8 : "flagged: "u8);
        for (int i = 0; i < _count; i++)
        {
            if (i != 0)
            {
                output.Write(" + "u8);
            }

            Reason reason = _reasons[_now[i]];
            output.Write(reason.Bytes);
            reason.Count(_refused, line);
        }

        FlaggedRows += _refused ? 0 : 1;
        if (_refused && Refused++ == 0)
        {
            HasCommaNumber = CellNumber.TryParse(cell, (byte)',', out _) && cell.Contains((byte)',');
            string shown = cell.IsEmpty ? "" : " '" + Entry.Wrong.Shown(Encoding.UTF8.GetString(cell)) + "'";
            FirstRefusal = string.Create(CultureInfo.InvariantCulture, $"line {line}: {_reasons[_now[0]].Text}{shown}");
        }
    }

    /// <summary>Tells the counts, the reasons one a line.</summary>
    internal void Tell(Action<string> say)
    {
        say(string.Create(CultureInfo.InvariantCulture, $"{Rows} rows: {Rows - Refused} corrected{(FlaggedRows == 0 ? "" : $", {FlaggedRows} of them flagged")}, {Refused} refused{(Blank == 0 ? "" : $"; {Blank} blank lines")}"));
        foreach ((string word, string text, long rows, long first) in Reasons.OrderBy(static each => each.Word, StringComparer.Ordinal))
        {
            say(string.Create(CultureInfo.InvariantCulture, $"  {word}: {rows} {(rows == 1 ? "row" : "rows")}, {text} (first in line {first})"));
        }
    }

    private sealed class Reason(string text)
    {
        private long _flagged;
        private long _refused;
        private long _firstFlagged;
        private long _firstRefused;

        internal string Text => text;

        internal byte[] Bytes { get; } = Encoding.UTF8.GetBytes(text);

        internal void Count(bool refused, long line)
        {
            if (refused)
            {
                _firstRefused = _refused++ == 0 ? line : _firstRefused;
            }
            else
            {
                _firstFlagged = _flagged++ == 0 ? line : _firstFlagged;
            }
        }

        internal IEnumerable<(string Word, string Text, long Rows, long FirstLine)> Both()
        {
            if (_flagged != 0)
            {
                yield return ("flagged", text, _flagged, _firstFlagged);
            }

            if (_refused != 0)
            {
                yield return ("refused", text, _refused, _firstRefused);
            }
        }
    }
}
