using System.Diagnostics.CodeAnalysis;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Sources;

/// <summary>Text of a field to its number in canonical units, and the limits outside which it cannot be what it is taken for.</summary>
internal static class LineValue
{
    /// <summary>°C. Water is liquid between these; what is outside is no water temperature, whatever the unit.</summary>
    private const double LowestTemperature = -5, HighestTemperature = 100;

    /// <summary>hPa. Wider than any air pressure at a lake, narrow enough to catch kPa, psi, inHg, bar and Pa without their name.</summary>
    private const double LowestPressure = 300, HighestPressure = 1300;

    /// <summary>Practical salinity. A sensor in fresh water may read a little below 0; no natural brine is above 300.</summary>
    private const double LowestSalinity = -1, HighestSalinity = 300;

    /// <summary>Reads a value.</summary>
    /// <param name="field">What the text is taken for.</param>
    /// <param name="text">The text, not a missing one.</param>
    /// <param name="value">The value; of no use when there is a reason.</param>
    /// <returns>Why the line is to be rejected; null when the value is good.</returns>
    internal static string? Read(LineField field, string text, out double value)
    {
        if (!TryValue(field, text, out value, out string? problem))
        {
            return Wrong.Shown(text) + ": " + problem;
        }

        return field.Kind switch
        {
            LineFieldKind.Temperature => Outside(text, value, LowestTemperature, HighestTemperature, "°C is no temperature of water"),
            LineFieldKind.Pressure => Outside(text, value, LowestPressure, HighestPressure, "hPa is no air pressure; name the unit that the line gives, for example {pressure:mmHg}"),
            LineFieldKind.Salinity => Outside(text, value, LowestSalinity, HighestSalinity, "is no practical salinity"),
            _ => null,
        };
    }

    private static bool TryValue(LineField field, string text, out double value, [NotNullWhen(false)] out string? problem)
    {
        if (field.Quantity is not QuantityKind kind)
        {
            return Number.TryParse(text, out value, out problem) && TryScale(field, ref value, out problem);
        }

        value = double.NaN;
        if (!Quantity.TrySplit(kind, text, field.Unit, out double number, out QuantityUnit? unit, out problem))
        {
            return false;
        }

        if (field.UnitText is not null && unit != field.Unit)
        {
            problem = $"the line says {unit.Name} and the template {field.Unit!.Name}; one of them is wrong";
            return false;
        }

        value = unit.ToCanonical(number * field.Scale);
        return true;
    }

    private static bool TryScale(LineField field, ref double value, [NotNullWhen(false)] out string? problem)
    {
        value *= field.Scale;
        problem = double.IsFinite(value) ? null : "with its scale the number is too large";
        return problem is null;
    }

    private static string? Outside(string text, double value, double lowest, double highest, string sentence)
    {
        // Written so that NaN and infinity, which a scale can produce, are outside too.
        return lowest <= value && value <= highest ? null : $"{Wrong.Shown(text)}: {Number.Print(value)} {sentence}";
    }
}
