using System;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Sources;

/// <summary>Text of a time in a line to UTC. A time that does not say its offset is refused, for a guess would be an hour or a day out.</summary>
internal static class LineTime
{
    /// <summary>A clock that shows less has never been set (boards without a battery start in 1970 or 2000).</summary>
    internal static readonly DateTimeOffset EarliestTrusted = new(2001, 1, 1, 0, 0, 0, TimeSpan.Zero);

    private static readonly string[] LocalForms =
    [
        "yyyy-MM-ddTHH:mm:ss.FFFFFFF", "yyyy-MM-ddTHH:mm", "yyyy-MM-dd HH:mm:ss.FFFFFFF", "yyyy-MM-dd HH:mm",
        "yyyy/MM/ddTHH:mm:ss.FFFFFFF", "yyyy/MM/dd HH:mm:ss.FFFFFFF", "yyyyMMddTHHmmss.FFFFFFF",
    ];

    internal static bool TryParse(LineField field, string text, out DateTimeOffset utc, [NotNullWhen(false)] out string? problem)
    {
        utc = default;
        return field.TimeForm is TimeForm.EpochSeconds or TimeForm.EpochMilliseconds
            ? TryEpoch(text, field.TimeForm == TimeForm.EpochSeconds ? 1 : 1000, out utc, out problem)
            : TryIso(field, text, out utc, out problem);
    }

    /// <summary>An offset such as <c>+02:00</c> or <c>-0330</c>, at most 14 hours.</summary>
    internal static bool TryOffset(ReadOnlySpan<char> text, out TimeSpan offset)
    {
        offset = default;
        if (text.Length is not (3 or 5 or 6) || text[0] is not ('+' or '-') || (text.Length == 6 && text[3] != ':'))
        {
            return false;
        }

        ReadOnlySpan<char> minutes = text.Length == 3 ? "00" : text[^2..];
        if (!TryTwoDigits(text.Slice(1, 2), out int h) || !TryTwoDigits(minutes, out int m) || 14 * 60 < (h * 60) + m || 59 < m)
        {
            return false;
        }

        offset = TimeSpan.FromMinutes((text[0] == '-' ? -1 : 1) * ((h * 60) + m));
        return true;
    }

    private static bool TryIso(LineField field, string text, out DateTimeOffset utc, [NotNullWhen(false)] out string? problem)
    {
        utc = default;
        ReadOnlySpan<char> local = text;
        TimeSpan offset = field.Offset;
        bool hasOffset = false;
        if (text.EndsWith('Z') || text.EndsWith('z'))
        {
            local = local[..^1];
            offset = TimeSpan.Zero;
            hasOffset = true;
        }
        else
        {
            // The date's own hyphens stand before the time, so a sign is looked for behind the separator only.
            int separator = local.IndexOfAny('T', ' ');
            int sign = separator < 0 ? -1 : local[separator..].LastIndexOfAny('+', '-');
            if (0 <= sign)
            {
                hasOffset = TryOffset(local[(separator + sign)..], out offset);
                local = local[..(separator + sign)];
            }
        }

        if (!DateTime.TryParseExact(local.TrimEnd(), LocalForms, CultureInfo.InvariantCulture, DateTimeStyles.None, out DateTime stamp))
        {
            problem = "is no time; write 2026-06-01T12:30:00Z, or {time:epoch} in the template for seconds since 1970";
            return false;
        }

        if (!hasOffset && field.TimeForm == TimeForm.WithOffset)
        {
            problem = "does not say its offset from UTC; end it with Z or +02:00, or write {time:utc} in the template";
            return false;
        }

        return TryUtc(stamp, offset, out utc, out problem);
    }

    private static bool TryUtc(DateTime stamp, TimeSpan offset, out DateTimeOffset utc, [NotNullWhen(false)] out string? problem)
    {
        long ticks = stamp.Ticks - offset.Ticks;
        bool possible = DateTime.MinValue.Ticks <= ticks && ticks <= DateTime.MaxValue.Ticks;
        utc = possible ? new DateTimeOffset(ticks, TimeSpan.Zero) : default;
        problem = possible ? null : "is out of the calendar";
        return possible;
    }

    private static bool TryEpoch(string text, double perSecond, out DateTimeOffset utc, [NotNullWhen(false)] out string? problem)
    {
        utc = default;
        if (!Number.TryParse(text, out double number, out problem))
        {
            problem = "is no number of seconds: " + problem;
            return false;
        }

        double seconds = number / perSecond;
        if (seconds < -62_135_596_800.0 || 253_402_300_799.0 < seconds)
        {
            problem = "is out of the calendar";
            return false;
        }

        // Whole microseconds: a double holds no more of today's date.
        utc = DateTimeOffset.UnixEpoch.AddTicks((long)Math.Round(seconds * 1e6) * TimeSpan.TicksPerMicrosecond);
        return true;
    }

    private static bool TryTwoDigits(ReadOnlySpan<char> text, out int value)
    {
        return int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out value);
    }
}
