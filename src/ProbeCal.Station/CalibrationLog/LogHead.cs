using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Text.RegularExpressions;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// The head of a log: how many entries it has and the hash of the last. Kept outside the log it shows what the chain alone
/// cannot: entries cut off at the end, and a log written anew from some entry on.
/// </summary>
/// <param name="Count">Number of entries.</param>
/// <param name="Sha256">Hash of the last of them, lower-case hex.</param>
public sealed partial record LogHead(long Count, string Sha256)
{
    private const string Form = "write COUNT:HASH as 'calibrations list' prints it: the number of entries, a colon, 64 hex digits";

    /// <summary>Reads one head as a person gives it.</summary>
    /// <exception cref="InputException">It is none.</exception>
    public static LogHead Parse(string text)
    {
        Match match = Pattern().Match(text.Trim());
        return match.Success && match.Length == text.Trim().Length ? Of(match) : throw Wrong.Input("--head", text, Form);
    }

    /// <summary>Every head that stands in a text: a certificate, a note, a published message.</summary>
    public static IReadOnlyList<LogHead> FindAll(string text)
    {
        return [.. Pattern().Matches(text).Select(Of).Distinct()];
    }

    /// <inheritdoc/>
    public override string ToString()
    {
        return string.Create(CultureInfo.InvariantCulture, $"{Count}:{Sha256}");
    }

    private static LogHead Of(Match match)
    {
        return new LogHead(long.Parse(match.Groups[1].ValueSpan, NumberStyles.None, CultureInfo.InvariantCulture), match.Groups[2].Value.ToLowerInvariant());
    }

    [GeneratedRegex("(?<![0-9A-Fa-f])([0-9]{1,15}):([0-9A-Fa-f]{64})(?![0-9A-Fa-f])", RegexOptions.CultureInvariant)]
    private static partial Regex Pattern();
}
