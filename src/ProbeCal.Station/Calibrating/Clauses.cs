using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// A line of words that name values, as <c>flask 300.2mL u 0.1mL titrant 0.025mol/L</c>: a keyword, its value, and how well it is known, by <c>u</c> (standard uncertainty) or
/// <c>within</c> (limits to both sides, all between them alike: u = a/√3). Commas and semicolons between them count as blanks.
/// </summary>
internal sealed class Clauses
{
    private const string Within = "within";
    private const string Uncertainty = "u";

    private readonly string _what;
    private readonly string _text;
    private readonly string _wanted;
    private readonly string[] _words;
    private int _at;

    internal Clauses(string what, string text, string wanted)
    {
        _what = what;
        _text = text;
        _wanted = wanted;
        _words = PlainText.OneLine(what, text).Split([' ', ',', ';'], StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries);
        if (_words.Length == 0)
        {
            throw Wrong("there is nothing there");
        }

        for (int i = 1; i + 1 < text.Length; i++)
        {
            // Behind a unit a comma parts two values; between digits somebody meant a decimal mark or left the unit out.
            if (text[i] == ',' && char.IsAsciiDigit(text[i - 1]) && char.IsAsciiDigit(text[i + 1]))
            {
                throw Wrong("a comma between digits is no decimal mark here; write a point, and its unit behind every value");
            }
        }
    }

    internal bool IsAtEnd => _at == _words.Length;

    /// <summary>The next word, which must be there.</summary>
    internal string Next(string missing)
    {
        return IsAtEnd ? throw Wrong(missing) : _words[_at++];
    }

    /// <summary>Takes the next word if it is this one, whatever the case.</summary>
    internal bool Takes(string word)
    {
        bool isIt = !IsAtEnd && string.Equals(_words[_at], word, StringComparison.OrdinalIgnoreCase);
        _at += isIt ? 1 : 0;
        return isIt;
    }

    /// <summary>True when the next word begins with a number.</summary>
    internal bool IsNumberNext => !IsAtEnd && Number.LeadingLength(_words[_at]) != 0;

    /// <summary>The next keyword of those known; one that was read before is refused.</summary>
    internal string Keyword(IReadOnlyList<string> known, HashSet<string> read)
    {
        string word = Next("");
        foreach (string keyword in known)
        {
            if (string.Equals(keyword, word, StringComparison.OrdinalIgnoreCase))
            {
                return read.Add(keyword) ? keyword : throw Wrong($"'{keyword}' is there twice");
            }
        }

        throw Wrong($"'{Entry.Wrong.Shown(word)}' is not understood there{NearestName.DidYouMean(word, known)}; there are {string.Join(", ", known)}");
    }

    /// <summary>A value of a kind with how well it is known, in the kind's canonical unit.</summary>
    /// <param name="name">What it is called in messages.</param>
    /// <param name="kind">Its kind.</param>
    /// <param name="unit">The unit as records write it.</param>
    /// <param name="usualUncertainty">Standard uncertainty that stands in, from the value; null refuses a value without one.</param>
    /// <param name="usualSource">Source of that.</param>
    internal RecordedQuantity Value(string name, QuantityKind kind, string unit, Func<double, double>? usualUncertainty, string? usualSource)
    {
        double value = Plain(name, kind);
        return Known(name, kind, value, unit, usualUncertainty, usualSource);
    }

    /// <summary>The same for a value that was read already.</summary>
    internal RecordedQuantity Known(string name, QuantityKind kind, double value, string unit, Func<double, double>? usualUncertainty, string? usualSource)
    {
        RecordedQuantity quantity = new() { Value = value, Unit = unit, StandardUncertainty = 0, Source = "entered" };
        if (Takes(Uncertainty))
        {
            return quantity with { StandardUncertainty = NotNegative(name, kind) };
        }

        if (Takes(Within))
        {
            double limits = NotNegative(name, kind);
            return quantity with { StandardUncertainty = limits / Math.Sqrt(3), UncertaintySource = "entered as limits, rectangular" };
        }

        return usualUncertainty == null
            ? throw Wrong($"how well is '{name}' known? Write u with its standard uncertainty (half of a certificate's U at k = 2), or within with its limits")
            : quantity with { StandardUncertainty = usualUncertainty(value), UncertaintySource = usualSource };
    }

    /// <summary>A value without an uncertainty; its unit may stand apart.</summary>
    internal double Plain(string name, QuantityKind kind)
    {
        string word = Next($"the value of '{name}' is missing");
        if (!IsAtEnd && word.Length == Number.LeadingLength(word) && kind.Unit(_words[_at]) != null)
        {
            word += _words[_at++];
        }

        return Parse(name, kind, word);
    }

    internal double Parse(string name, QuantityKind kind, string word)
    {
        return Quantity.TryParse(kind, word, out double value, out string? problem) ? value : throw Wrong($"'{name}' {Entry.Wrong.Shown(word)}: {problem}");
    }

    internal InputException Wrong(string problem)
    {
        return Entry.Wrong.Input(_what, _text, problem + "; " + _wanted);
    }

    private double NotNegative(string name, QuantityKind kind)
    {
        if (IsAtEnd)
        {
            throw Wrong($"the uncertainty of '{name}' is missing");
        }

        double value = Plain("uncertainty of " + name, kind);
        return 0 <= value ? value : throw Wrong($"an uncertainty of {Number.Print(value)} cannot be; it is zero or above");
    }
}
