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

        StringBuilder shown = new();
        foreach (char c in text)
        {
            if (LongestShown <= shown.Length)
            {
                return shown.Append("...").ToString();
            }

            if (char.IsControl(c) || c is '\u2028' or '\u2029')
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
}
