using System;
using System.Buffers;

namespace ProbeCal.Station.Entry;

/// <summary>
/// The rules for names and remarks that people give. They are printed, logged and sent on, and one of them may be the
/// answer to a question in which an arrow key was pressed: what would move a cursor or recolour a screen is refused here.
/// </summary>
public static class PlainText
{
    private const int LongestId = 64;

    private static readonly SearchValues<char> IdCharacters =
        SearchValues.Create("ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-_.");

    /// <summary>Reads the id of a station or a probe: it becomes part of a topic, so both ends of the work hold it to one rule.</summary>
    /// <param name="what">The option or key that it was given for.</param>
    /// <param name="text">The id.</param>
    /// <exception cref="InputException">It has other characters, is empty or too long.</exception>
    public static string Id(string what, string text)
    {
        bool fits = text.Length is > 0 and <= LongestId && text.AsSpan().IndexOfAnyExcept(IdCharacters) < 0;
        return fits ? text : throw Wrong.Input(what, text, "an id has letters a to z, digits, - _ and . only, at most 64 of them: it becomes part of a topic");
    }

    /// <summary>Reads any text of one line.</summary>
    /// <param name="what">The option or key that it was given for.</param>
    /// <param name="text">The text.</param>
    /// <exception cref="InputException">It has line ends or other control characters.</exception>
    public static string OneLine(string what, string text)
    {
        return Wrong.OneLine(text) == text ? text : throw Wrong.Input(what, text, "this is one line without control characters");
    }
}
