using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;

namespace ProbeCal.Station.Correcting;

/// <summary>Ratings by day: a day takes the lowest of its values.</summary>
internal sealed class Days
{
    private readonly SortedDictionary<long, Day> _days = [];
    private readonly long _offsetTicks;
    private Day? _now;
    private long _nowNumber = -1;

    /// <param name="offset">Offset of the clock that days go by.</param>
    internal Days(TimeSpan offset)
    {
        _offsetTicks = offset.Ticks;
    }

    internal void Add(long utcTicks, Rating rating, double sum)
    {
        long number = (utcTicks + _offsetTicks) / TimeSpan.TicksPerDay;
        if (number != _nowNumber || _now is null)
        {
            _nowNumber = number;
            if (!_days.TryGetValue(number, out _now))
            {
                _now = new Day();
                _days.Add(number, _now);
            }
        }

        _now.Rows++;
        _now.Rating = _now.Rating < rating ? rating : _now.Rating;
        _now.Largest = Math.Max(_now.Largest, sum);
    }

    internal RevisionDay[] ToRevision()
    {
        return [.. _days.Select(static each => new RevisionDay(
            DateOnly.FromDayNumber((int)each.Key), ServiceLimits.RatingNames[(int)each.Value.Rating], each.Value.Rows, each.Value.Largest))];
    }

    internal static ReadOnlySpan<byte> Bytes(Rating rating)
    {
        return rating switch
        {
            Rating.Excellent => "excellent"u8,
            Rating.Good => "good"u8,
            Rating.Fair => "fair"u8,
            Rating.Poor => "poor"u8,
            _ => "consider deletion"u8,
        };
    }

    private sealed class Day
    {
        internal long Rows { get; set; }

        internal Rating Rating { get; set; }

        internal double Largest { get; set; }
    }
}

/// <summary>The time that rows cover, and the offsets that their times carry themselves.</summary>
internal sealed class Times
{
    private readonly SortedDictionary<int, long> _rows = [];

    private int _minutes = int.MinValue;
    private long _count;

    internal long FirstTicks { get; private set; } = DateTime.MaxValue.Ticks;

    internal long LastTicks { get; private set; }

    internal void Count(long utcTicks, int minutes, bool corrected)
    {
        if (corrected)
        {
            FirstTicks = Math.Min(FirstTicks, utcTicks);
            LastTicks = Math.Max(LastTicks, utcTicks);
        }

        if (minutes == _minutes)
        {
            _count++;
            return;
        }

        Keep();
        (_minutes, _count) = (minutes, 1);
    }

    /// <summary>Says so when there are several offsets.</summary>
    internal void Tell(Action<string> say)
    {
        Keep();
        _count = 0;
        if (1 < _rows.Count)
        {
            say("the times carry different offsets, each was taken as written: " + string.Join(", ", _rows.Select(static each => string.Create(
                CultureInfo.InvariantCulture, $"{(each.Key < 0 ? '-' : '+')}{Math.Abs(each.Key) / 60:00}:{Math.Abs(each.Key) % 60:00} in {each.Value} rows"))));
        }
    }

    private void Keep()
    {
        if (_minutes != int.MinValue)
        {
            _rows[_minutes] = _rows.GetValueOrDefault(_minutes) + _count;
        }
    }
}
