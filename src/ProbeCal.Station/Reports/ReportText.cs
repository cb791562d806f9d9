using System;
using System.Globalization;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>Figures and names of records in the words of a report.</summary>
internal static class ReportText
{
    /// <summary>Significant digits of slopes, signals and uncertainties: enough for people, the record keeps all.</summary>
    internal const int Digits = 5;

    internal static string Time(DateTimeOffset time)
    {
        return time.UtcDateTime.ToString("yyyy-MM-dd HH:mm:ss", CultureInfo.InvariantCulture);
    }

    internal static string Day(DateOnly day)
    {
        return day.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);
    }

    internal static string Few(double value)
    {
        return Number.Significant(value, Digits);
    }

    internal static string? Few(double? value)
    {
        return value is double known ? Few(known) : null;
    }

    /// <summary>A value to the decimals that its uncertainty leaves a meaning.</summary>
    internal static string Known(double value, double uncertainty)
    {
        return 0 < uncertainty ? Number.Fixed(value, Math.Clamp(1 - (int)Math.Floor(Math.Log10(uncertainty)), 0, 12)) : Few(value);
    }

    /// <summary>An uncertainty: two significant digits are all it has.</summary>
    internal static string Uncertainty(double value)
    {
        return Number.Significant(value, 2);
    }

    internal static string? Fixed(double? value, int decimals)
    {
        return value is double known ? Number.Fixed(known, decimals) : null;
    }

    internal static string Signed(double value, int decimals)
    {
        string text = Number.Fixed(value, decimals);
        return text.StartsWith('-') ? text : "+" + text;
    }

    internal static string? Signed(double? value, int decimals)
    {
        return value is double known ? Signed(known, decimals) : null;
    }

    internal static string Quantity(RecordedQuantity quantity)
    {
        string unit = quantity.Unit switch
        {
            "1" => "",
            "degC" => " °C",
            _ => " " + quantity.Unit,
        };
        return $"{Number.Print(quantity.Value)}{unit}, u {Uncertainty(quantity.StandardUncertainty)}{unit} ({quantity.Source})";
    }

    /// <summary>The role of a point in the words of the trade; the record says <c>span</c> for the 100 % point.</summary>
    internal static string Role(string role)
    {
        return role switch
        {
            "span" => "100 %",
            "as-left" => "as left",
            _ => role,
        };
    }
}
