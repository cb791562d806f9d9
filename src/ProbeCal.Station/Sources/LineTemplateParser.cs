using System;
using System.Collections.Generic;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Sources;

/// <summary>Text of a template to its pieces; every refusal is one line. The grammar is in <c>docs/protocols.md</c>.</summary>
internal static class LineTemplateParser
{
    private const int LongestTemplate = 400;

    private static readonly string[] FieldNames = ["time", "date", "signal", "temperature", "pressure", "salinity", "skip"];
    private static readonly string[] TimeForms = ["utc", "epoch", "epochms", "+02:00"];

    internal static List<LinePiece> Parse(string what, string text)
    {
        if (LongestTemplate < text.Length)
        {
            throw Wrong.Input(what, text, "the template is too long; 400 characters at most");
        }

        List<LinePiece> pieces = [];
        StringBuilder literal = new();
        int at = 0;
        while (at < text.Length)
        {
            char c = text[at];
            char next = at + 1 < text.Length ? text[at + 1] : '\0';
            if (c == '{' && next != '{')
            {
                int close = text.IndexOf('}', at);
                if (close < 0)
                {
                    throw Wrong.Input(what, text, $"the brace at character {at + 1} is not closed; write {{signal}}, or {{{{ for a brace in the line");
                }

                AddLiteral(pieces, literal);
                pieces.Add(new LinePiece(null, Field(what, text, text[(at + 1)..close])));
                at = close + 1;
            }
            else if (c == '}' && next != '}')
            {
                throw Wrong.Input(what, text, $"there is a closing brace at character {at + 1} and nothing that it closes; write }}}} for a brace in the line");
            }
            else if (c == '\\')
            {
                literal.Append(Escape(what, text, next));
                at += 2;
            }
            else
            {
                literal.Append(char.IsControl(c) && c != '\t' ? throw Wrong.Input(what, text, "a template is one line without control characters") : c);
                at += c is '{' or '}' ? 2 : 1;
            }
        }

        AddLiteral(pieces, literal);
        Check(what, text, pieces);
        return pieces;
    }

    private static void AddLiteral(List<LinePiece> pieces, StringBuilder literal)
    {
        if (literal.Length != 0)
        {
            pieces.Add(new LinePiece(literal.ToString(), null));
            literal.Clear();
        }
    }

    private static char Escape(string what, string text, char escaped)
    {
        return escaped switch
        {
            't' => '\t',
            '\\' => '\\',
            _ => throw Wrong.Input(what, text, "after a backslash only t (a tab) or another backslash may stand"),
        };
    }

    private static LineField Field(string what, string text, string inside)
    {
        string[] tokens = inside.Split('|');
        string head = tokens[0];
        string? scaleText = null;
        int star = head.LastIndexOf('*');
        if (0 <= star)
        {
            scaleText = head[(star + 1)..];
            head = head[..star];
        }

        int colon = head.IndexOf(':', StringComparison.Ordinal);
        string? unit = colon < 0 ? null : head[(colon + 1)..].Trim();
        string name = (colon < 0 ? head : head[..colon]).Trim();
        LineFieldKind kind = KindOf(what, text, name);
        bool hasValue = kind is not (LineFieldKind.Skip or LineFieldKind.Date or LineFieldKind.Time);
        if (scaleText is not null && !hasValue)
        {
            throw Wrong.Input(what, text, $"{{{inside}}}: only a number can be scaled");
        }

        if (unit is not null && (unit.Length == 0 || kind is LineFieldKind.Skip or LineFieldKind.Date))
        {
            throw Wrong.Input(what, text, $"{{{inside}}}: " + (unit.Length == 0 ? "there is nothing after the colon; leave it out or name the unit" : "this takes no unit"));
        }

        LineField field = new(kind, name)
        {
            Scale = scaleText is null ? 1 : Scale(what, text, scaleText),
            MissingTokens = Tokens(what, text, tokens),
            UnitText = unit,
        };
        return kind == LineFieldKind.Time ? WithTimeForm(what, text, field) : WithUnit(what, text, field);
    }

    private static LineFieldKind KindOf(string what, string text, string name)
    {
        return name switch
        {
            "" or "skip" => LineFieldKind.Skip,
            "time" => LineFieldKind.Time,
            "date" => LineFieldKind.Date,
            "signal" => LineFieldKind.Signal,
            "temperature" => LineFieldKind.Temperature,
            "pressure" => LineFieldKind.Pressure,
            "salinity" => LineFieldKind.Salinity,
            _ => throw Wrong.Input(what, text, $"there is no field {{{Wrong.Shown(name)}}}{NearestName.DidYouMean(name, FieldNames)}; the fields are {string.Join(", ", FieldNames)}, and {{}} skips one"),
        };
    }

    private static double Scale(string what, string text, string scaleText)
    {
        double scale = Number.Parse(what + " " + Wrong.Shown(text) + ": scale", scaleText);
        return scale == 0 ? throw Wrong.Input(what, text, "a scale of 0 would lose the value") : scale;
    }

    private static List<string> Tokens(string what, string text, string[] tokens)
    {
        List<string> found = [];
        for (int i = 1; i < tokens.Length; i++)
        {
            string token = tokens[i].Trim();
            found.Add(token.Length != 0 ? token : throw Wrong.Input(what, text, "there is nothing after the bar; name what stands for a missing value, for example {temperature|-9999}"));
        }

        return found;
    }

    private static LineField WithUnit(string what, string text, LineField field)
    {
        if (field.Quantity is not QuantityKind kind)
        {
            return field;
        }

        if (field.UnitText is not string given)
        {
            return field with { Unit = kind.CanonicalUnit };
        }

        QuantityUnit unit = kind.Unit(given) ?? throw Wrong.Input(
            what, text, $"{Wrong.Shown(given)} is no unit of {field.Name}{NearestName.DidYouMean(given, kind.Spellings())}; the units are {kind.UnitList()}");
        return field with { Unit = unit };
    }

    private static LineField WithTimeForm(string what, string text, LineField field)
    {
        switch (field.UnitText)
        {
            case null:
                return field with { TimeForm = TimeForm.WithOffset };
            case "utc" or "UTC" or "Z":
                return field with { TimeForm = TimeForm.OffsetFromTemplate };
            case "epoch":
                return field with { TimeForm = TimeForm.EpochSeconds };
            case "epochms":
                return field with { TimeForm = TimeForm.EpochMilliseconds };
            default:
                return LineTime.TryOffset(field.UnitText, out TimeSpan offset)
                    ? field with { TimeForm = TimeForm.OffsetFromTemplate, Offset = offset }
                    : throw Wrong.Input(what, text, $"{Wrong.Shown(field.UnitText)} is no form of time{NearestName.DidYouMean(field.UnitText, TimeForms)}; write {{time}} where the line says its offset, {{time:utc}}, {{time:+02:00}}, {{time:epoch}} or {{time:epochms}}");
        }
    }

    private static void Check(string what, string text, List<LinePiece> pieces)
    {
        HashSet<LineFieldKind> seen = [];
        bool afterField = false;
        foreach (LinePiece piece in pieces)
        {
            if (piece.Field is LineField field)
            {
                if (afterField)
                {
                    throw Wrong.Input(what, text, $"nothing stands between {{{field.Name}}} and the field before it; put what separates them in the line there, for example a comma");
                }

                if (field.Kind != LineFieldKind.Skip && !seen.Add(field.Kind))
                {
                    throw Wrong.Input(what, text, $"{{{field.Name}}} stands twice; skip one with {{}}");
                }
            }

            afterField = piece.Field is not null;
        }

        if (!seen.Contains(LineFieldKind.Signal))
        {
            throw Wrong.Input(what, text, "{signal} is missing; a line without the probe's signal says nothing");
        }

        if (seen.Contains(LineFieldKind.Date) && !seen.Contains(LineFieldKind.Time))
        {
            throw Wrong.Input(what, text, "{date} needs a {time}, for example {date},{time:utc},{signal}");
        }
    }
}
