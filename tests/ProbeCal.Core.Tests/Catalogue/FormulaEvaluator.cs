using System;
using System.Collections.Generic;
using System.Globalization;

namespace ProbeCal.Core.Tests.CatalogueOfCore;

/// <summary>
/// Computes a formula text with System.Math and bounds its own rounding error on the way (running error analysis: every operation adds half a unit
/// in the last place, and errors of its operands are carried on by the derivative). Numbers and symbols count as exact.
/// </summary>
internal sealed class FormulaEvaluator
{
    // Half a unit in the last place, relative; functions of System.Math are taken to be within one.
    private const double Half = 1.2e-16;

    private readonly string _text;
    private readonly IReadOnlyDictionary<string, double> _symbols;
    private int _at;

    private FormulaEvaluator(string text, IReadOnlyDictionary<string, double> symbols)
    {
        _text = text;
        _symbols = symbols;
    }

    /// <summary>A value and the most that it may be off.</summary>
    internal readonly record struct Bounded(double Value, double Error);

    internal static Bounded Evaluate(string text, IReadOnlyDictionary<string, double> symbols)
    {
        FormulaEvaluator evaluator = new(text, symbols);
        Bounded value = evaluator.Sum();
        if (evaluator._at != text.Length)
        {
            throw new FormatException($"'{text}' does not end at {evaluator._at}");
        }

        return value;
    }

    private Bounded Sum()
    {
        Bounded left = Product();
        while (true)
        {
            if (Takes('+'))
            {
                left = Rounded(left.Value, Product(), static (a, b) => a + b, left.Error);
            }
            else if (Takes('-'))
            {
                left = Rounded(left.Value, Product(), static (a, b) => a - b, left.Error);
            }
            else
            {
                return left;
            }
        }
    }

    private static Bounded Rounded(double a, Bounded b, Func<double, double, double> operation, double error)
    {
        double value = operation(a, b.Value);
        return new Bounded(value, error + b.Error + (Half * Math.Abs(value)));
    }

    private Bounded Product()
    {
        Bounded left = Signed();
        while (true)
        {
            if (Takes('*'))
            {
                Bounded right = Signed();
                double value = left.Value * right.Value;
                left = new Bounded(value, (Math.Abs(left.Value) * right.Error) + (Math.Abs(right.Value) * left.Error) + (Half * Math.Abs(value)));
            }
            else if (Takes('/'))
            {
                Bounded right = Signed();
                double value = left.Value / right.Value;
                left = new Bounded(value, ((left.Error + (Math.Abs(value) * right.Error)) / Math.Abs(right.Value)) + (Half * Math.Abs(value)));
            }
            else
            {
                return left;
            }
        }
    }

    private Bounded Signed()
    {
        if (Takes('-'))
        {
            Bounded operand = Signed();
            return operand with { Value = -operand.Value };
        }

        Bounded power = Power();
        return power;
    }

    private Bounded Power()
    {
        Bounded number = Atom();
        if (!Takes('^'))
        {
            return number;
        }

        Bounded exponent = Atom();
        double value = Math.Pow(number.Value, exponent.Value);
        double carried = number.Value == 0 ? 0 : Math.Abs(value * exponent.Value / number.Value) * number.Error;
        return new Bounded(value, carried + (2 * Half * Math.Abs(value)));
    }

    private Bounded Atom()
    {
        Blank();
        if (Takes('('))
        {
            Bounded inner = Sum();
            Expect(')');
            return inner;
        }

        int start = _at;
        if (_at < _text.Length && char.IsLetter(_text[_at]))
        {
            while (_at < _text.Length && char.IsLetterOrDigit(_text[_at]))
            {
                _at++;
            }

            string word = _text[start.._at];
            return word is "ln" or "exp" ? Function(word) : new Bounded(_symbols[word], 0);
        }

        while (_at < _text.Length && (char.IsAsciiDigit(_text[_at]) || _text[_at] == '.' || _text[_at] == 'E' || (_text[_at] == '-' && _text[_at - 1] == 'E') || (_text[_at] == '+' && _text[_at - 1] == 'E')))
        {
            _at++;
        }

        return new Bounded(double.Parse(_text.AsSpan(start, _at - start), NumberStyles.Float, CultureInfo.InvariantCulture), 0);
    }

    private Bounded Function(string word)
    {
        Expect('(');
        Bounded operand = Sum();
        Expect(')');
        if (word == "ln")
        {
            double logarithm = Math.Log(operand.Value);
            return new Bounded(logarithm, (operand.Error / Math.Abs(operand.Value)) + (2 * Half * Math.Abs(logarithm)));
        }

        double power = Math.Exp(operand.Value);
        return new Bounded(power, power * (operand.Error + (2 * Half)));
    }

    private void Expect(char sign)
    {
        if (!Takes(sign))
        {
            throw new FormatException($"'{_text}': {sign} missing at {_at}");
        }
    }

    private bool Takes(char sign)
    {
        Blank();
        if (_at < _text.Length && _text[_at] == sign)
        {
            _at++;
            Blank();
            return true;
        }

        return false;
    }

    private void Blank()
    {
        while (_at < _text.Length && _text[_at] == ' ')
        {
            _at++;
        }
    }
}
