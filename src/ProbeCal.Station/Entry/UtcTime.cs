using System;
using System.Globalization;
using System.Text.RegularExpressions;

namespace ProbeCal.Station.Entry;

/// <summary>A time as a person writes it, ISO 8601 with its offset. One without an offset is refused, for a guess would be an hour or a day out.</summary>
public static partial class UtcTime
{
    private static readonly string[] Forms =
    [
        "yyyy-MM-dd'T'HH:mm:ss.FFFFFFF", "yyyy-MM-dd'T'HH:mm", "yyyy-MM-dd HH:mm:ss.FFFFFFF", "yyyy-MM-dd HH:mm", "yyyy-MM-dd",
    ];

    /// <summary>Reads a time.</summary>
    /// <param name="what">The option or column that it was given for.</param>
    /// <param name="text">What was given: <c>2026-06-01T12:30Z</c>, <c>2026-06-01 14:30+02:00</c>.</param>
    /// <param name="offset">Offset of a time that states none; null refuses it.</param>
    /// <exception cref="InputException">It is no time, or does not say its offset.</exception>
    public static DateTimeOffset Parse(string what, string text, TimeSpan? offset)
    {
        string trimmed = text.Trim();
        Match zone = Zone().Match(trimmed);
        string local = zone.Success ? trimmed[..zone.Index].TrimEnd() : trimmed;
        if (!DateTime.TryParseExact(local, Forms, CultureInfo.InvariantCulture, DateTimeStyles.None, out DateTime stamp))
        {
            throw Wrong.Input(what, text, "this is no time; write it as 2026-06-01T12:30Z or 2026-06-01T14:30+02:00");
        }

        TimeSpan from = zone.Success ? OffsetOf(what, text, zone.Value) : offset ?? throw Wrong.Input(what, text, "it does not say its offset from UTC; end it with Z or for example +02:00");
        long ticks = stamp.Ticks - from.Ticks;
        return DateTime.MinValue.Ticks <= ticks && ticks <= DateTime.MaxValue.Ticks
            ? new DateTimeOffset(ticks, TimeSpan.Zero)
            : throw Wrong.Input(what, text, "this is out of the calendar");
    }

    /// <summary>Reads an offset from UTC: <c>Z</c>, <c>+02:00</c>, <c>-0330</c>, at most 14 hours.</summary>
    /// <exception cref="InputException">It is none.</exception>
    public static TimeSpan Offset(string what, string text)
    {
        Match zone = Zone().Match(text.Trim());
        return zone.Success && zone.Length == text.Trim().Length
            ? OffsetOf(what, text, zone.Value)
            : throw Wrong.Input(what, text, "write an offset from UTC as +02:00 or Z");
    }

    private static TimeSpan OffsetOf(string what, string text, string zone)
    {
        if (zone is "Z" or "z")
        {
            return TimeSpan.Zero;
        }

        string digits = zone[1..].Replace(":", "", StringComparison.Ordinal);
        int hours = int.Parse(digits.AsSpan(0, 2), NumberStyles.None, CultureInfo.InvariantCulture);
        int minutes = digits.Length == 2 ? 0 : int.Parse(digits.AsSpan(2, 2), NumberStyles.None, CultureInfo.InvariantCulture);
        TimeSpan offset = TimeSpan.FromMinutes((hours * 60) + minutes);
        return 59 < minutes || TimeSpan.FromHours(14) < offset
            ? throw Wrong.Input(what, text, "an offset from UTC is at most 14 hours")
            : zone[0] == '-' ? -offset : offset;
    }

    // A sign counts as an offset only behind a time of day, or the day's own hyphens would.
    [GeneratedRegex(@"(?<=^|[0-9]{2}:[0-9]{2}(:[0-9]{2}(\.[0-9]+)?)?\s?)(Z|z|[+-][0-9]{2}(:?[0-9]{2})?)$", RegexOptions.CultureInvariant)]
    private static partial Regex Zone();
}
