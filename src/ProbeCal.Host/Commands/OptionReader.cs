using System;
using System.CommandLine;
using System.Globalization;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>Reads options through Station's parsers, and asks for what is missing where somebody can answer.</summary>
internal sealed class OptionReader
{
    private readonly ParseResult _parsed;
    private readonly Questions? _questions;

    /// <param name="parsed">What was given.</param>
    /// <param name="questions">Who asks for what is missing; null refuses instead.</param>
    internal OptionReader(ParseResult parsed, Questions? questions)
    {
        _parsed = parsed;
        _questions = questions;
    }

    internal bool CanAsk => _questions != null;

    internal bool IsSet(Option<bool> flag)
    {
        return _parsed.GetValue(flag);
    }

    internal string[] Many(Option<string[]> option)
    {
        return _parsed.GetValue(option) ?? [];
    }

    /// <summary>What was given, or null.</summary>
    internal string? Given(Option<string> option)
    {
        return _parsed.GetValue(option);
    }

    /// <summary>What was given, or the answer to the question; refused when nobody can answer.</summary>
    internal async Task<T> NeedAsync<T>(Option<string> option, string question, Func<string, T> read, CancellationToken cancellationToken)
    {
        if (Given(option) is string given)
        {
            return read(given);
        }

        return _questions == null
            ? throw new InputException($"{option.Name} is missing: {option.Description}")
            : await _questions.AskAsync(question, read, cancellationToken).ConfigureAwait(false);
    }

    /// <summary>A day, or null.</summary>
    internal DateOnly? Day(Option<string> option)
    {
        if (Given(option) is not string given)
        {
            return null;
        }

        return DateOnly.TryParseExact(given, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out DateOnly day)
            ? day
            : throw Wrong.Input(option.Name, given, "write the day as 2026-05-01");
    }

    /// <summary>A number above zero, or null.</summary>
    internal double? Positive(Option<string> option)
    {
        if (Given(option) is not string given)
        {
            return null;
        }

        double value = Number.Parse(option.Name, given);
        return 0 < value ? value : throw Wrong.Input(option.Name, given, "this is above zero");
    }

    /// <summary>A quantity of zero or above in its canonical unit, or null.</summary>
    internal double? NotNegative(Option<string> option, QuantityKind kind)
    {
        if (Given(option) is not string given)
        {
            return null;
        }

        double value = Quantity.Parse(kind, option.Name, given);
        return 0 <= value ? value : throw Wrong.Input(option.Name, given, "this is zero or above");
    }

    /// <summary>A quantity above zero in its canonical unit, or null.</summary>
    internal double? AboveZero(Option<string> option, QuantityKind kind)
    {
        double? value = NotNegative(option, kind);
        return value == 0 ? throw Wrong.Input(option.Name, Given(option)!, "this is above zero") : value;
    }

    /// <summary>A range <c>LOW..HIGH</c>, or null.</summary>
    internal (double Low, double High)? Range(Option<string> option)
    {
        if (Given(option) is not string given)
        {
            return null;
        }

        int dots = given.IndexOf("..", StringComparison.Ordinal);
        if (dots < 0)
        {
            throw Wrong.Input(option.Name, given, "write a range as 0.2..0.6");
        }

        double low = Number.Parse(option.Name + " " + Wrong.Shown(given) + ":", given[..dots]);
        double high = Number.Parse(option.Name + " " + Wrong.Shown(given) + ":", given[(dots + 2)..]);
        return low < high ? (low, high) : throw Wrong.Input(option.Name, given, "the range runs from low to high");
    }

    /// <summary>Reads one of some words.</summary>
    internal static Func<string, string> Choice(Option<string> option, string[] choices)
    {
        return text => Array.IndexOf(choices, text) >= 0
            ? text
            : throw Wrong.Input(option.Name, text, $"there is no such choice{NearestName.DidYouMean(text, choices)}; there are {string.Join(", ", choices)}");
    }

    /// <summary>Reads any text but an empty one.</summary>
    internal static Func<string, string> NotEmpty(Option<string> option)
    {
        return text => text.Trim().Length == 0 ? throw Wrong.Input(option.Name, text, "write something") : text.Trim();
    }
}
