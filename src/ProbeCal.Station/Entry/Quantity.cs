using System;
using System.Diagnostics.CodeAnalysis;

namespace ProbeCal.Station.Entry;

/// <summary>
/// Text to quantity and back: a number as <see cref="Number"/> reads it, then its unit, with or without a blank between.
/// Used by the command line, the configuration, CSV files and line templates, so that all of them agree.
/// </summary>
public static class Quantity
{
    /// <summary>Reads <paramref name="text"/> as a quantity of a kind.</summary>
    /// <param name="kind">What sort of quantity.</param>
    /// <param name="text">What was given, for example <c>760 mmHg</c>.</param>
    /// <param name="canonical">The value in the canonical unit of the kind; NaN when there is none.</param>
    /// <param name="problem">What is wrong and what would be right, for the end of a sentence that names the text.</param>
    public static bool TryParse(QuantityKind kind, string text, out double canonical, [NotNullWhen(false)] out string? problem)
    {
        return TryParse(kind, text, kind.BareUnit, out canonical, out problem);
    }

    /// <summary>The same with another meaning for a number without a unit; null refuses it.</summary>
    public static bool TryParse(
        QuantityKind kind, ReadOnlySpan<char> text, QuantityUnit? bareUnit, out double canonical, [NotNullWhen(false)] out string? problem)
    {
        canonical = double.NaN;
        if (!TrySplit(kind, text, bareUnit, out double number, out QuantityUnit? unit, out problem))
        {
            return false;
        }

        double converted = unit.ToCanonical(number);
        if (!double.IsFinite(converted))
        {
            problem = "the number is too large";
            return false;
        }

        canonical = converted;
        return true;
    }

    /// <summary>The number as it stands and its unit, before any conversion.</summary>
    public static bool TrySplit(
        QuantityKind kind,
        ReadOnlySpan<char> text,
        QuantityUnit? bareUnit,
        out double number,
        [NotNullWhen(true)] out QuantityUnit? unit,
        [NotNullWhen(false)] out string? problem)
    {
        ReadOnlySpan<char> trimmed = text.Trim();
        number = double.NaN;
        unit = null;
        int length = Number.LeadingLength(trimmed);
        if (length == 0)
        {
            problem = trimmed.IsEmpty ? "there is nothing there; write for example " + kind.Example : Number.Misfit(trimmed);
            return false;
        }

        ReadOnlySpan<char> name = trimmed[length..].TrimStart();
        unit = name.IsEmpty ? bareUnit : kind.Unit(name);
        if (unit is null)
        {
            problem = name.IsEmpty ? MissingUnit(kind) : UnknownUnit(kind, trimmed, name);
            return false;
        }

        return Number.TryConvert(trimmed[..length], out number, out problem);
    }

    /// <summary>Reads a quantity of a kind, in its canonical unit, or refuses it in one line.</summary>
    /// <param name="kind">What sort of quantity.</param>
    /// <param name="what">The option, key or column that it was given for.</param>
    /// <param name="text">What was given.</param>
    /// <exception cref="InputException">The text is no such quantity.</exception>
    public static double Parse(QuantityKind kind, string what, string text)
    {
        return TryParse(kind, text, out double canonical, out string? problem) ? canonical : throw Wrong.Input(what, text, problem);
    }

    /// <summary>Temperature in °C; a bare number is °C.</summary>
    /// <exception cref="InputException">The text is no temperature.</exception>
    public static double TemperatureCelsius(string what, string text)
    {
        return Parse(QuantityKind.Temperature, what, text);
    }

    /// <summary>Pressure in hPa; the unit is required.</summary>
    /// <exception cref="InputException">The text is no pressure.</exception>
    public static double PressureHectopascal(string what, string text)
    {
        return Parse(QuantityKind.Pressure, what, text);
    }

    /// <summary>Altitude in m; the unit is required.</summary>
    /// <exception cref="InputException">The text is no altitude.</exception>
    public static double AltitudeMetres(string what, string text)
    {
        return Parse(QuantityKind.Altitude, what, text);
    }

    /// <summary>Practical salinity.</summary>
    /// <exception cref="InputException">The text is no practical salinity.</exception>
    public static double Salinity(string what, string text)
    {
        return Parse(QuantityKind.Salinity, what, text);
    }

    /// <summary>A duration longer than zero and no longer than ten years; the unit is required.</summary>
    /// <exception cref="InputException">The text is no such duration.</exception>
    public static TimeSpan Duration(string what, string text)
    {
        double seconds = Parse(QuantityKind.Duration, what, text);
        if (seconds < 0.001 || 315_576_000 < seconds)
        {
            throw Wrong.Input(what, text, "this takes a duration from 1ms to 3652d");
        }

        return TimeSpan.FromSeconds(seconds);
    }

    /// <summary>A rate above zero in Hz; the unit is required.</summary>
    /// <exception cref="InputException">The text is no such rate.</exception>
    public static double FrequencyHertz(string what, string text)
    {
        double hertz = Parse(QuantityKind.Frequency, what, text);
        return hertz < 1e-6 || 1e6 < hertz ? throw Wrong.Input(what, text, "this takes a rate from 0.001mHz to 1000kHz") : hertz;
    }

    /// <summary>Prints a canonical value in its canonical unit so that it reads back as the same double: <c>1013.25 hPa</c>.</summary>
    public static string Print(QuantityKind kind, double canonical)
    {
        return WithUnit(Number.Print(canonical), kind.CanonicalUnit);
    }

    /// <summary>Prints a canonical value in a unit with a fixed number of decimals: <c>760.0 mmHg</c>.</summary>
    public static string Print(double canonical, QuantityUnit unit, int decimals)
    {
        return WithUnit(Number.Fixed(unit.FromCanonical(canonical), decimals), unit);
    }

    private static string WithUnit(string number, QuantityUnit unit)
    {
        return unit.Name.Length == 0 ? number : number + (unit.Name == "%" ? "" : " ") + unit.Name;
    }

    private static string MissingUnit(QuantityKind kind)
    {
        return $"{kind.Article} {kind.Name} carries its unit; write for example {kind.Example} (units: {kind.UnitList()})";
    }

    private static string UnknownUnit(QuantityKind kind, ReadOnlySpan<char> text, ReadOnlySpan<char> name)
    {
        string given = text.ToString();
        if (Number.CommaAdvice(given) is string advice)
        {
            return advice;
        }

        if (char.IsAsciiDigit(name[0]) || name[0] is '.' or '\'' or '_')
        {
            return "digits are not grouped here; write the number in one piece with a point as decimal mark, for example " + kind.Example;
        }

        string unit = name.ToString();
        if (kind.UnitList().Length == 0)
        {
            return $"{kind.Article} {kind.Name} has no unit; write the bare number, for example {kind.Example}";
        }

        return $"{Wrong.Shown(unit)} is no unit of {kind.Article} {kind.Name}{NearestName.DidYouMean(unit, kind.Spellings())}; write for example {kind.Example} (units: {kind.UnitList()})";
    }
}
