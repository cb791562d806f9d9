using System;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;

namespace ProbeCal.Station.Entry;

/// <summary>
/// Text to number and back, the same in every culture: a point as decimal mark, no grouping, an exponent where wanted,
/// and never NaN or infinity. Everything a person or a file types goes through here.
/// </summary>
public static class Number
{
    /// <summary>Longest text that is looked at: far more digits than a double can hold.</summary>
    private const int LongestText = 64;

    /// <summary>Reads the whole of <paramref name="text"/> as one finite number; blanks around it do not count.</summary>
    /// <param name="text">What was typed.</param>
    /// <param name="value">The number, or NaN when there is none.</param>
    /// <param name="problem">What is wrong and what would be right, for the end of a sentence that names the text.</param>
    public static bool TryParse(ReadOnlySpan<char> text, out double value, [NotNullWhen(false)] out string? problem)
    {
        ReadOnlySpan<char> trimmed = text.Trim();
        int length = LeadingLength(trimmed);
        if (length == trimmed.Length && length != 0)
        {
            return TryConvert(trimmed, out value, out problem);
        }

        value = double.NaN;
        problem = Misfit(trimmed);
        return false;
    }

    /// <summary>Reads a finite number or refuses it in one line.</summary>
    /// <param name="what">The option, key or column that it was given for.</param>
    /// <param name="text">What was given.</param>
    /// <exception cref="InputException">It is no finite number.</exception>
    public static double Parse(string what, string text)
    {
        return TryParse(text, out double value, out string? problem) ? value : throw Wrong.Input(what, text, problem);
    }

    /// <summary>Reads a whole number from <paramref name="least"/> to <paramref name="most"/> or refuses it in one line.</summary>
    /// <exception cref="InputException">It is no whole number or lies outside.</exception>
    public static long ParseWhole(string what, string text, long least, long most)
    {
        if (!long.TryParse(text.AsSpan().Trim(), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out long value)
            || value < least || most < value)
        {
            throw Wrong.Input(what, text, string.Create(CultureInfo.InvariantCulture, $"this takes a whole number from {least} to {most}"));
        }

        return value;
    }

    /// <summary>The shortest text that reads back as the same double: <c>0.1</c>, <c>1013.25</c>, <c>1E-09</c>.</summary>
    public static string Print(double value)
    {
        return value.ToString("R", CultureInfo.InvariantCulture);
    }

    /// <summary>The shortest text of the value rounded to so many significant digits: <c>0.44871</c>, <c>123460</c>.</summary>
    public static string Significant(double value, int digits)
    {
        string rounded = value.ToString("G" + digits.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return Print(double.Parse(rounded, CultureInfo.InvariantCulture));
    }

    /// <summary>The value with a fixed number of decimals; a value that rounds to zero carries no minus sign.</summary>
    public static string Fixed(double value, int decimals)
    {
        string text = value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return text.StartsWith('-') && text.AsSpan(1).IndexOfAnyExcept('0', '.') < 0 ? text[1..] : text;
    }

    /// <summary>How many characters at the start of <paramref name="text"/> form a number; 0 when none do.</summary>
    public static int LeadingLength(ReadOnlySpan<char> text)
    {
        int at = text.Length != 0 && text[0] is '+' or '-' ? 1 : 0;
        int digits = 0;
        while (at < text.Length && char.IsAsciiDigit(text[at]))
        {
            at++;
            digits++;
        }

        if (at < text.Length && text[at] == '.')
        {
            at++;
            while (at < text.Length && char.IsAsciiDigit(text[at]))
            {
                at++;
                digits++;
            }
        }

        return digits == 0 ? 0 : at + ExponentLength(text[at..]);
    }

    /// <summary>Converts text that <see cref="LeadingLength"/> has measured.</summary>
    internal static bool TryConvert(ReadOnlySpan<char> number, out double value, [NotNullWhen(false)] out string? problem)
    {
        value = double.NaN;
        if (LongestText < number.Length)
        {
            problem = "the number is too long; 17 digits say all there is to say";
            return false;
        }

        double converted = double.Parse(number, NumberStyles.Float, CultureInfo.InvariantCulture);
        if (double.IsInfinity(converted))
        {
            problem = "the number is too large";
            return false;
        }

        if (converted == 0 && MantissaIsNotZero(number))
        {
            problem = "the number is too small to be told from 0; write 0 if that is meant";
            return false;
        }

        value = converted;
        problem = null;
        return true;
    }

    /// <summary>Why a text is no number, with what would be right where that can be told.</summary>
    internal static string Misfit(ReadOnlySpan<char> text)
    {
        if (text.IsEmpty)
        {
            return "there is nothing there; write a number, for example 8.3";
        }

        string given = text.ToString();
        if (CommaAdvice(given) is string advice)
        {
            return advice;
        }

        string bare = given.TrimStart('+', '-');
        if (bare.StartsWith("nan", StringComparison.OrdinalIgnoreCase) || bare.StartsWith("inf", StringComparison.OrdinalIgnoreCase)
            || bare.StartsWith('∞'))
        {
            return "NaN and infinity are no values here; write a finite number, for example 8.3";
        }

        if (given[0] is '\u2212' or '\u2013')
        {
            return "the minus sign is another character; write -" + Wrong.Shown(given[1..]);
        }

        return "this is no number; write one with a point as decimal mark, for example 8.3";
    }

    /// <summary>What to write instead of a number with a comma; null when no comma stands between digits.</summary>
    internal static string? CommaAdvice(string given)
    {
        int comma = given.IndexOf(',', StringComparison.Ordinal);
        bool betweenDigits = 0 < comma && comma + 1 < given.Length && char.IsAsciiDigit(given[comma - 1]) && char.IsAsciiDigit(given[comma + 1]);
        if (!betweenDigits)
        {
            return null;
        }

        string without = Wrong.Shown(given.Replace(",", "", StringComparison.Ordinal));
        if (given.Contains('.', StringComparison.Ordinal) || comma != given.LastIndexOf(','))
        {
            return "digits are not grouped here; write " + without;
        }

        string point = Wrong.Shown(given.Replace(',', '.'));
        return CouldBeGrouped(given, comma)
            ? "a comma is no decimal mark here and groups no digits; write " + point + " or " + without
            : "a comma is no decimal mark here; write " + point;
    }

    private static bool CouldBeGrouped(string given, int comma)
    {
        int after = 0;
        while (comma + 1 + after < given.Length && char.IsAsciiDigit(given[comma + 1 + after]))
        {
            after++;
        }

        return after == 3 && given[comma - 1] != '0';
    }

    private static int ExponentLength(ReadOnlySpan<char> text)
    {
        if (text.IsEmpty || text[0] is not ('e' or 'E'))
        {
            return 0;
        }

        int at = 1 < text.Length && text[1] is '+' or '-' ? 2 : 1;
        int start = at;
        while (at < text.Length && char.IsAsciiDigit(text[at]))
        {
            at++;
        }

        return at == start ? 0 : at;
    }

    private static bool MantissaIsNotZero(ReadOnlySpan<char> number)
    {
        int exponent = number.IndexOfAny('e', 'E');
        return (exponent < 0 ? number : number[..exponent]).IndexOfAnyInRange('1', '9') >= 0;
    }
}
