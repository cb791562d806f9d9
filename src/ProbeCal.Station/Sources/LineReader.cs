using System;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Sources;

/// <summary>Holds a line against a template. Works from left to right without going back, so its time grows with the line only.</summary>
internal static class LineReader
{
    internal static SourceEvent Read(LineTemplate template, string line, DateTimeOffset receivedUtc)
    {
        Fields fields = new();
        string? reason = Misfit(line) ?? Match(template, line, fields) ?? TakeTime(fields);
        if (reason is null && fields.Signal is null)
        {
            reason = "signal: the value is missing";
        }

        if (reason is not null)
        {
            return new RejectedLine(receivedUtc, line, reason);
        }

        return new RawSample(receivedUtc, line, fields.Signal!.Value)
        {
            TimeUtc = fields.TimeUtc ?? receivedUtc,
            TimeFromLine = fields.TimeUtc is not null,
            TemperatureCelsius = fields.Temperature,
            PressureHectopascal = fields.Pressure,
            Salinity = fields.Salinity,
        };
    }

    private sealed class Fields
    {
        internal string? Date { get; set; }
        internal string? Time { get; set; }
        internal LineField? TimeField { get; set; }
        internal DateTimeOffset? TimeUtc { get; set; }
        internal double? Signal { get; set; }
        internal double? Temperature { get; set; }
        internal double? Pressure { get; set; }
        internal double? Salinity { get; set; }
    }

    private static string? Misfit(string line)
    {
        if (LineTemplate.LongestLine < line.Length)
        {
            return "the line is longer than 1024 characters";
        }

        for (int i = 0; i < line.Length; i++)
        {
            if (char.IsControl(line[i]) && line[i] != '\t')
            {
                return $"character {i + 1} is no text ({Wrong.Shown(line[i].ToString())}): noise on the line, or a wrong baud rate";
            }
        }

        return null;
    }

    private static string? Match(LineTemplate template, string line, Fields fields)
    {
        int at = 0;
        for (int i = 0; i < template.Pieces.Count; i++)
        {
            LinePiece piece = template.Pieces[i];
            if (piece.Literal is string literal)
            {
                int end = MatchLiteral(line, at, literal);
                if (end < 0)
                {
                    return $"'{Wrong.Shown(literal)}' should stand at character {at + 1}";
                }

                at = end;
                continue;
            }

            string? next = i + 1 < template.Pieces.Count ? template.Pieces[i + 1].Literal : null;
            string? reason = TakeText(line, ref at, next, piece.Field!, out string text) ?? TakeValue(piece.Field!, text, fields);
            if (reason is not null)
            {
                return piece.Field!.Kind == LineFieldKind.Skip ? reason : piece.Field.Name + ": " + reason;
            }
        }

        return line.AsSpan(at).Trim(' ').IsEmpty ? null : $"the line goes on after the template's end at character {at + 1}; add {{}} to the template to skip the rest";
    }

    /// <summary>Where the literal ends in the line when it stands at <paramref name="at"/>; -1 when it does not.</summary>
    private static int MatchLiteral(string line, int at, string literal)
    {
        int i = 0;
        while (i < literal.Length)
        {
            if (literal[i] != ' ')
            {
                if (line.Length <= at || line[at] != literal[i])
                {
                    return -1;
                }

                at++;
                i++;
                continue;
            }

            while (i < literal.Length && literal[i] == ' ')
            {
                i++;
            }

            int start = at;
            while (at < line.Length && line[at] is ' ' or '\t')
            {
                at++;
            }

            if (start == at)
            {
                return -1;
            }
        }

        return at;
    }

    private static string? TakeText(string line, ref int at, string? next, LineField field, out string text)
    {
        text = "";
        while (at < line.Length && line[at] == ' ')
        {
            at++;
        }

        if (at < line.Length && line[at] == '"')
        {
            return TakeQuoted(line, ref at, out text);
        }

        int end = next is null ? line.Length : FindLiteral(line, at, next);
        if (end < 0)
        {
            return field.Kind == LineFieldKind.Skip
                ? $"the line ends too early: '{Wrong.Shown(next!)}' is missing after a skipped field"
                : $"the line ends too early: '{Wrong.Shown(next!)}' is missing after it";
        }

        text = line[at..end].Trim();
        at = end;
        return null;
    }

    private static string? TakeQuoted(string line, ref int at, out string text)
    {
        StringBuilder inside = new();
        int i = at + 1;
        while (i < line.Length)
        {
            if (line[i] != '"')
            {
                inside.Append(line[i++]);
            }
            else if (i + 1 < line.Length && line[i + 1] == '"')
            {
                inside.Append('"');
                i += 2;
            }
            else
            {
                // Blanks between the quote and a separator belong to neither.
                at = i + 1;
                text = inside.ToString().Trim();
                while (at + 1 < line.Length && line[at] == ' ' && line[at + 1] != ' ')
                {
                    at++;
                }

                return null;
            }
        }

        text = "";
        return "the quote is not closed";
    }

    private static int FindLiteral(string line, int from, string literal)
    {
        // A blank in the literal stands for a run of blanks or tabs, so the search goes by the first character.
        for (int at = from; at < line.Length; at++)
        {
            if (0 <= MatchLiteral(line, at, literal))
            {
                return at;
            }
        }

        return -1;
    }

    private static string? TakeValue(LineField field, string text, Fields fields)
    {
        if (field.Kind == LineFieldKind.Skip)
        {
            return null;
        }

        bool missing = field.IsMissing(text);
        if (field.Kind == LineFieldKind.Date)
        {
            fields.Date = missing ? null : text;
            return null;
        }

        if (field.Kind == LineFieldKind.Time)
        {
            fields.Time = missing ? null : text;
            fields.TimeField = field;
            return null;
        }

        if (missing)
        {
            return null;
        }

        string? reason = LineValue.Read(field, text, out double value);
        switch (field.Kind)
        {
            case LineFieldKind.Signal:
                fields.Signal = value;
                break;
            case LineFieldKind.Temperature:
                fields.Temperature = value;
                break;
            case LineFieldKind.Pressure:
                fields.Pressure = value;
                break;
            default:
                fields.Salinity = value;
                break;
        }

        return reason;
    }

    private static string? TakeTime(Fields fields)
    {
        if (fields.Time is not string time || fields.TimeField is not LineField field)
        {
            return null;
        }

        string text = fields.Date is string date ? date + "T" + time : time;
        if (!LineTime.TryParse(field, text, out DateTimeOffset utc, out string? problem))
        {
            return "time: " + Wrong.Shown(text) + " " + problem;
        }

        // A clock that was never set says nothing; the time of receipt is nearer to the truth, and TimeFromLine tells.
        fields.TimeUtc = utc < LineTime.EarliestTrusted ? null : utc;
        return null;
    }
}
