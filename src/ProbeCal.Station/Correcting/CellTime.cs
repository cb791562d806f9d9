using System;
using System.Globalization;

namespace ProbeCal.Station.Correcting;

/// <summary>How a time in a cell came out.</summary>
internal enum CellTimeOutcome
{
    /// <summary>There is a time.</summary>
    Read,
    /// <summary>The cell is empty.</summary>
    Missing,
    /// <summary>It is no time in a form that is taken.</summary>
    Unreadable,
    /// <summary>It does not say its offset from UTC, and nobody stated one.</summary>
    NoOffset,
    /// <summary>It says another offset than was stated for the file.</summary>
    OtherOffset,
}

/// <summary>
/// Times of a file to UTC: year first (<c>2026-06-01 12:30</c>, <c>2026-06-01T12:30:05.25Z</c>), seconds since 1970, or a pattern that the person
/// states, for 03/04/2026 means two days. The offset stands in the text or is stated; it is never guessed.
/// </summary>
internal sealed class CellTime
{
    private const int LongestText = 40;
    private const long UnixTicks = 621_355_968_000_000_000;

    private readonly string? _pattern;
    private readonly double _epochPerSecond;

    /// <param name="offset">The stated offset; null when the times carry their own.</param>
    /// <param name="form">A .NET date pattern, <c>epoch</c>, <c>epoch-ms</c>, or null for year first.</param>
    internal CellTime(TimeSpan? offset, string? form)
    {
        Offset = offset;
        _epochPerSecond = form switch { "epoch" => 1, "epoch-ms" => 1000, _ => 0 };
        _pattern = _epochPerSecond == 0 ? form : null;
    }

    /// <summary>The stated offset.</summary>
    internal TimeSpan? Offset { get; }

    /// <summary>Reads a cell.</summary>
    /// <param name="cell">Its bytes.</param>
    /// <param name="utcTicks">Ticks of UTC.</param>
    /// <param name="offsetMinutes">The offset that the text itself says; <see cref="int.MinValue"/> where it says none.</param>
    internal CellTimeOutcome Read(ReadOnlySpan<byte> cell, out long utcTicks, out int offsetMinutes)
    {
        utcTicks = 0;
        offsetMinutes = int.MinValue;
        ReadOnlySpan<byte> text = CellNumber.Trim(cell);
        if (text.IsEmpty)
        {
            return CellTimeOutcome.Missing;
        }

        if (_epochPerSecond != 0)
        {
            return Epoch(text, out utcTicks, out offsetMinutes);
        }

        if (LongestText < text.Length || !TryOffset(ref text, out offsetMinutes))
        {
            return CellTimeOutcome.Unreadable;
        }

        bool isTime = _pattern is null ? YearFirst(text, out long local) : ByPattern(text, out local);
        if (!isTime)
        {
            return CellTimeOutcome.Unreadable;
        }

        if (offsetMinutes == int.MinValue && Offset is null)
        {
            return CellTimeOutcome.NoOffset;
        }

        long stated = Offset is TimeSpan given ? (long)given.TotalMinutes : offsetMinutes;
        if (offsetMinutes != int.MinValue && offsetMinutes != stated)
        {
            return CellTimeOutcome.OtherOffset;
        }

        utcTicks = local - (stated * TimeSpan.TicksPerMinute);
        return 0 < utcTicks && utcTicks <= DateTime.MaxValue.Ticks ? CellTimeOutcome.Read : CellTimeOutcome.Unreadable;
    }

    private CellTimeOutcome Epoch(ReadOnlySpan<byte> text, out long utcTicks, out int offsetMinutes)
    {
        // Seconds since 1970 are UTC by definition.
        (utcTicks, offsetMinutes) = (0, 0);
        if (!CellNumber.TryParse(text, (byte)'.', out double number))
        {
            return CellTimeOutcome.Unreadable;
        }

        double seconds = number / _epochPerSecond;
        if (seconds < -62_135_596_800.0 || 253_402_300_799.0 < seconds)
        {
            return CellTimeOutcome.Unreadable;
        }

        // Whole microseconds, as live: a double holds no more of today's date.
        utcTicks = UnixTicks + ((long)Math.Round(seconds * 1e6) * TimeSpan.TicksPerMicrosecond);
        return Offset is null || Offset == TimeSpan.Zero ? CellTimeOutcome.Read : CellTimeOutcome.OtherOffset;
    }

    /// <summary>Takes <c>Z</c>, <c>+02:00</c>, <c>-0330</c> or <c>+02</c> off the end. False when what stands there is no offset.</summary>
    private static bool TryOffset(ref ReadOnlySpan<byte> text, out int minutes)
    {
        minutes = int.MinValue;
        if (text[^1] is (byte)'Z' or (byte)'z')
        {
            text = text[..^1];
            minutes = 0;
            return true;
        }

        int colon = text.IndexOf((byte)':');
        int sign = colon < 0 ? -1 : text[colon..].LastIndexOfAny((byte)'+', (byte)'-');
        if (sign < 0)
        {
            return true;
        }

        ReadOnlySpan<byte> offset = text[(colon + sign)..];
        text = CellNumber.Trim(text[..(colon + sign)]);
        bool hasColon = offset.Length == 6 && offset[3] == (byte)':';
        bool fits = offset.Length is 3 or 5 || hasColon;
        int hours = 0, rest = 0;
        fits = fits && TryDigits(offset.Slice(1, 2), out hours) && (offset.Length == 3 || TryDigits(offset[^2..], out rest));
        if (!fits || 59 < rest || 14 * 60 < (hours * 60) + rest)
        {
            return false;
        }

        minutes = (offset[0] == (byte)'-' ? -1 : 1) * ((hours * 60) + rest);
        return true;
    }

    private static bool YearFirst(ReadOnlySpan<byte> text, out long ticks)
    {
        ticks = 0;
        bool fits = 16 <= text.Length && text[4] is (byte)'-' or (byte)'/' && text[7] == text[4] && text[10] is (byte)'T' or (byte)'t' or (byte)' ' && text[13] == (byte)':';
        if (!fits || !TryDigits(text[..4], out int year) || !TryDigits(text.Slice(5, 2), out int month) || !TryDigits(text.Slice(8, 2), out int day)
            || !TryDigits(text.Slice(11, 2), out int hour) || !TryDigits(text.Slice(14, 2), out int minute))
        {
            return false;
        }

        int second = 0;
        long fraction = 0;
        if (16 < text.Length && !(19 <= text.Length && text[16] == (byte)':' && TryDigits(text.Slice(17, 2), out second) && TryFraction(text[19..], out fraction)))
        {
            return false;
        }

        if (year < 1 || month is < 1 or > 12 || day < 1 || DateTime.DaysInMonth(year, month) < day || 23 < hour || 59 < minute || 59 < second)
        {
            return false;
        }

        ticks = new DateTime(year, month, day, hour, minute, second, DateTimeKind.Unspecified).Ticks + fraction;
        return true;
    }

    private static bool TryFraction(ReadOnlySpan<byte> text, out long ticks)
    {
        ticks = 0;
        if (text.IsEmpty)
        {
            return true;
        }

        if (text[0] is not ((byte)'.' or (byte)',') || text.Length is < 2 or > 8)
        {
            return false;
        }

        if (!TryDigits(text[1..], out int digits))
        {
            return false;
        }

        ticks = digits;
        for (int i = text.Length; i < 8; i++)
        {
            ticks *= 10;
        }

        return true;
    }

    private bool ByPattern(ReadOnlySpan<byte> text, out long ticks)
    {
        Span<char> characters = stackalloc char[LongestText];
        for (int i = 0; i < text.Length; i++)
        {
            characters[i] = (char)text[i];
        }

        bool isTime = DateTime.TryParseExact(characters[..text.Length], _pattern, CultureInfo.InvariantCulture, DateTimeStyles.None, out DateTime local);
        ticks = local.Ticks;
        return isTime;
    }

    private static bool TryDigits(ReadOnlySpan<byte> text, out int value)
    {
        value = 0;
        foreach (byte c in text)
        {
            uint digit = (uint)(c - '0');
            if (9 < digit)
            {
                return false;
            }

            value = (value * 10) + (int)digit;
        }

        return true;
    }
}
