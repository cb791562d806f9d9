using System;
using System.Collections.Generic;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>Where an axis has its marks: round numbers, or firsts of months and days.</summary>
internal static class PlotTicks
{
    private static readonly int[] _monthSteps = [1, 2, 3, 6, 12, 24, 60, 120, 240, 600];
    private static readonly int[] _daySteps = [1, 2, 5, 10];

    /// <summary>The marks within the axis and their texts.</summary>
    /// <param name="low">Lower end.</param>
    /// <param name="high">Upper end, above it.</param>
    /// <param name="isTime">True for days since 1970.</param>
    /// <param name="most">About how many have room.</param>
    internal static List<(double At, string Text)> Of(double low, double high, bool isTime, int most)
    {
        return isTime ? Times(low, high, most) : Numbers(low, high, most);
    }

    /// <summary>Days since 1970-01-01 UTC.</summary>
    internal static double Days(DateTimeOffset time)
    {
        return (time.UtcDateTime - DateTime.UnixEpoch).TotalDays;
    }

    private static List<(double At, string Text)> Numbers(double low, double high, int most)
    {
        double rough = (high - low) / most;
        double power = Math.Pow(10, Math.Floor(Math.Log10(rough)));
        double step = power;
        foreach (double times in new[] { 1.0, 2, 5, 10 })
        {
            step = times * power;
            if (rough <= step * 1.000001)
            {
                break;
            }
        }

        int decimals = Math.Clamp((int)-Math.Floor(Math.Log10(step) + 1e-9), 0, 12);
        List<(double, string)> marks = [];
        double first = Math.Ceiling((low / step) - 1e-6);
        for (int i = 0; (first + i) * step <= high + (1e-6 * step); i++)
        {
            double at = (first + i) * step;
            marks.Add((at, 1e6 <= Math.Abs(at) || 6 < decimals ? Number.Significant(at, 6) : Number.Fixed(at, decimals)));
        }

        return marks;
    }

    private static List<(double At, string Text)> Times(double low, double high, int most)
    {
        List<(double, string)> marks = [];
        double rough = (high - low) / most;
        if (rough < 20)
        {
            int step = Array.Find(_daySteps, days => rough <= days);
            step = step == 0 ? 20 : step;
            for (double day = Math.Ceiling(low / step) * step; day <= high; day += step)
            {
                marks.Add((day, DateTime.UnixEpoch.AddDays(day).ToString("yyyy-MM-dd", CultureInfo.InvariantCulture)));
            }

            return marks;
        }

        int months = Array.Find(_monthSteps, step => rough <= step * 30.4);
        months = months == 0 ? 1200 : months;
        DateTime start = DateTime.UnixEpoch.AddDays(low);
        int count = (start.Year * 12) + start.Month - 1;
        for (count -= count % months; ; count += months)
        {
            DateTime first = new(Math.Clamp(count / 12, 1, 9998), (count % 12) + 1, 1, 0, 0, 0, DateTimeKind.Utc);
            double day = (first - DateTime.UnixEpoch).TotalDays;
            if (high < day || 9998 <= first.Year)
            {
                return marks;
            }

            if (low <= day)
            {
                marks.Add((day, first.ToString(months % 12 == 0 ? "yyyy" : "yyyy-MM", CultureInfo.InvariantCulture)));
            }
        }
    }
}
