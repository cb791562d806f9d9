using System;
using System.Globalization;
using System.Text;

namespace ProbeCal.Station.Entry;

/// <summary>Puts a refusal into its one line: what was given for, what was given, what is wrong and what would be right.</summary>
public static class Wrong
{
    private const int LongestShown = 80;

    /// <summary><c>{what} {text}: {problem}</c>.</summary>
    public static InputException Input(string what, string text, string problem)
    {
        return new InputException(what + " " + Shown(text) + ": " + problem);
    }

    /// <summary>
    /// Foreign text fit for one line of a message: control characters written as <c>\x1B</c>, cut when long, and
    /// <c>''</c> when empty.
    /// </summary>
    public static string Shown(string text)
    {
        if (text.Length == 0)
        {
            return "''";
        }

        bool isLong = LongestShown < text.Length;
        string shown = OneLine(isLong ? text[..LongestShown] : text);
        return isLong ? shown + "..." : shown;
    }

    /// <summary>
    /// A whole text as one line that a terminal shows and does not obey: control characters, line ends and the marks that
    /// turn the direction of writing are written as <c>\x1B</c>.
    /// </summary>
    public static string OneLine(string text)
    {
        if (!Array.Exists(text.ToCharArray(), MovesTheScreen))
        {
            return text;
        }

        StringBuilder shown = new();
        foreach (char c in text)
        {
            if (MovesTheScreen(c))
            {
                shown.Append(CultureInfo.InvariantCulture, $"\\x{(int)c:X2}");
            }
            else
            {
                shown.Append(c);
            }
        }

        return shown.ToString();
    }

    private static bool MovesTheScreen(char c)
    {
        return char.IsControl(c) || c is '\u2028' or '\u2029' or (>= '\u202A' and <= '\u202E') or (>= '\u2066' and <= '\u2069');
    }
}
