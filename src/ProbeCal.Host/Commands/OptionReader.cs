using System;
using System.Collections.Generic;
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
    private readonly List<string> _answered = [];

    /// <param name="parsed">What was given.</param>
    /// <param name="questions">Who asks for what is missing; null refuses instead.</param>
    internal OptionReader(ParseResult parsed, Questions? questions)
    {
        _parsed = parsed;
        _questions = questions;
    }

    internal bool CanAsk => _questions != null;

    /// <summary>Options and answers of the questions that were asked, in order, as words of a command line.</summary>
    internal IReadOnlyList<string> Answered => _answered;

    internal bool IsSet(Option<bool> flag)
    {
        return _parsed.GetValue(flag);
    }

    internal string[] Many(Option<string[]> option)
    {
        return _parsed.GetValue(option) ?? [];
    }

    /// <summary>What was given, one line of it, or null.</summary>
    internal string? Given(Option<string> option)
    {
        return _parsed.GetValue(option) is string given ? PlainText.OneLine(option.Name, given) : null;
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
            : await AskAsync(option, question, read, cancellationToken).ConfigureAwait(false);
    }

    /// <summary>What was given, or the answer to a question that may be passed over with Enter; null when nobody said.</summary>
    internal async Task<string?> WishAsync(Option<string> option, string question, Action<string> check, CancellationToken cancellationToken)
    {
        if (Given(option) is string given)
        {
            check(given);
            return given;
        }

        if (_questions == null)
        {
            return null;
        }

        return await AskAsync(option, question, Read, cancellationToken).ConfigureAwait(false);

        string? Read(string text)
        {
            if (text.Length == 0)
            {
                return null;
            }

            check(text);
            return text;
        }
    }

    /// <summary>What was given, or one of numbered choices: a person at the water answers with the number or the word.</summary>
    internal async Task<string> NeedChoiceAsync(Option<string> option, string question, string[] choices, CancellationToken cancellationToken)
    {
        string numbered = question;
        for (int i = 0; i < choices.Length; i++)
        {
            numbered += $"{(i == 0 ? " " : ", ")}{Number.Print(i + 1)} {choices[i]}";
        }

        return await NeedAsync(option, numbered + "?", Read, cancellationToken).ConfigureAwait(false);

        string Read(string text)
        {
            for (int i = 0; i < choices.Length; i++)
            {
                if (Given(option) == null && text == Number.Print(i + 1))
                {
                    return choices[i];
                }
            }

            return Choice(option, choices)(text);
        }
    }

    private async Task<T> AskAsync<T>(Option<string> option, string question, Func<string, T> read, CancellationToken cancellationToken)
    {
        string answer = "";
        T value = await _questions!.AskAsync(question, Keep, cancellationToken).ConfigureAwait(false);
        if (answer.Length != 0)
        {
            _answered.AddRange([option.Name, answer]);
        }

        return value;

        T Keep(string text)
        {
            T understood = read(text);
            // A choice by its number is kept as the word.
            answer = understood as string ?? text;
            return understood;
        }
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
        return text => text.Trim().Length == 0 ? throw Wrong.Input(option.Name, text, "write something") : PlainText.OneLine(option.Name, text.Trim());
    }

    /// <summary>Reads the id of a probe.</summary>
    internal static Func<string, string> Id(Option<string> option)
    {
        return text => PlainText.Id(option.Name, text.Trim());
    }
}
