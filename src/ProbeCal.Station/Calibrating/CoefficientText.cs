using System;
using System.Collections.Generic;
using System.Globalization;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// The temperature coefficient of a membrane as one line of text:
/// <c>FORM VALUE at REFERENCE fitted LOW..HIGH [u UNCERTAINTY]</c>, for example
/// <c>exponential 0.03/K at 25C fitted 5..35C u 0.002/K</c> or <c>arrhenius 22kJ/mol at 25C fitted 0..40C</c>.
/// </summary>
/// <remarks>
/// The form is never guessed: away from the reference temperature the forms part by tens of percent at a steep coefficient,
/// and a bare %/K does not say which one its maker used.
/// </remarks>
public static class CoefficientText
{
    /// <summary>Distance from the reference temperature at which a refusal shows how far the forms differ, K.</summary>
    public const double ShownDistanceKelvin = 15;

    private const string Wanted = "write FORM VALUE at REFERENCE fitted LOW..HIGH, for example 'exponential 0.03/K at 25C fitted 5..35C'";
    private const double DefaultReferenceCelsius = 25;

    private static readonly (string Name, TemperatureCoefficientForm Form)[] Forms =
    [
        ("exponential", TemperatureCoefficientForm.Exponential),
        ("compound", TemperatureCoefficientForm.Compound),
        ("linear", TemperatureCoefficientForm.Linear),
        ("arrhenius", TemperatureCoefficientForm.Arrhenius),
    ];

    /// <summary>Reads a coefficient or refuses it in one line.</summary>
    /// <param name="what">The option or key it was given for.</param>
    /// <param name="text">What was given.</param>
    /// <exception cref="InputException">It names no form, or something of it is missing or wrong.</exception>
    public static RecordedTemperatureCoefficient Parse(string what, string text)
    {
        string[] words = text.Split(' ', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries);
        if (words.Length == 0)
        {
            throw Wrong.Input(what, text, Wanted);
        }

        if (BareRate(words[0]) is double rate)
        {
            throw Wrong.Input(what, text, BareRateAdvice(rate));
        }

        TemperatureCoefficientForm form = FormOf(what, text, words[0]);
        if (words.Length < 2)
        {
            throw Wrong.Input(what, text, "the value is missing; " + Wanted);
        }

        bool arrhenius = form == TemperatureCoefficientForm.Arrhenius;
        double value = Coefficient(what, text, words[1], arrhenius);
        if (value <= 0)
        {
            throw Wrong.Input(what, text, $"{words[1]}: a membrane lets more through when it is warmer, so the coefficient is above 0");
        }

        RecordedTemperatureCoefficient read = new()
        {
            Form = words[0].ToLowerInvariant(),
            Value = value,
            Unit = arrhenius ? "J/mol" : "1/K",
            StandardUncertainty = DefaultUncertainty(form),
            UncertaintySource = "0.024 % per kelvin away from the calibration (published budget, Helm et al. 2018)",
            ReferenceCelsius = double.NaN,
            FittedLowCelsius = double.NaN,
            FittedHighCelsius = double.NaN,
        };
        for (int at = 2; at < words.Length; at += 2)
        {
            read = Clause(what, text, words, at, arrhenius, read);
        }

        return Complete(what, text, form, read);
    }

    /// <summary>The coefficient as text that <see cref="Parse"/> reads back.</summary>
    public static string Print(RecordedTemperatureCoefficient coefficient)
    {
        string unit = coefficient.Unit == "J/mol" ? "J/mol" : "/K";
        string sure = coefficient.UncertaintySource != null ? "" : " u " + Number.Print(coefficient.StandardUncertainty) + unit;
        return $"{coefficient.Form} {Number.Print(coefficient.Value)}{unit} at {Number.Print(coefficient.ReferenceCelsius)}C"
            + $" fitted {Number.Print(coefficient.FittedLowCelsius)}..{Number.Print(coefficient.FittedHighCelsius)}C{sure}";
    }

    /// <summary>What to write instead of a bare rate, with the factor that each form would give 15 K below the reference.</summary>
    private static string BareRateAdvice(double ratePerKelvin)
    {
        List<string> factors = [];
        double cold = DefaultReferenceCelsius - ShownDistanceKelvin;
        foreach ((string name, TemperatureCoefficientForm form) in Forms)
        {
            TemperatureCoefficient.FromRate(form, ratePerKelvin, DefaultReferenceCelsius, out double coefficient);
            Status status = TemperatureCoefficient.Factor(form, coefficient, DefaultReferenceCelsius, cold, DefaultReferenceCelsius, cold, RangeRule.Refuse, out double factor);
            factors.Add(status == Status.Ok ? name + " " + Number.Fixed(factor, 3) : name + " none at all");
        }

        return "a rate alone does not say its form, and 15 K below a reference of 25 C the forms make of it "
            + string.Join(", ", factors) + "; " + Wanted;
    }

    private static double DefaultUncertainty(TemperatureCoefficientForm form)
    {
        TemperatureCoefficient.FromRate(form, UncertaintyDefaults.TemperatureCoefficientPerKelvin, DefaultReferenceCelsius, out double uncertainty);
        return uncertainty;
    }

    private static double? BareRate(string word)
    {
        int length = Number.LeadingLength(word);
        bool readable = length != 0 && Number.TryConvert(word.AsSpan(0, length), out _, out _);
        if (!readable)
        {
            return null;
        }

        double value = Number.Parse("", word[..length]);
        return word[length..].StartsWith('%') ? value / 100 : value;
    }

    private static TemperatureCoefficientForm FormOf(string what, string text, string word)
    {
        foreach ((string known, TemperatureCoefficientForm form) in Forms)
        {
            if (string.Equals(known, word, StringComparison.OrdinalIgnoreCase))
            {
                return form;
            }
        }

        string near = NearestName.DidYouMean(word, Array.ConvertAll(Forms, entry => entry.Name));
        throw Wrong.Input(what, text, $"there is no form '{word}'{near}; the forms are exponential, compound, linear and arrhenius; {Wanted}");
    }

    private static RecordedTemperatureCoefficient Clause(string what, string text, string[] words, int at, bool arrhenius, RecordedTemperatureCoefficient read)
    {
        string keyword = words[at];
        if (at + 1 == words.Length)
        {
            throw Wrong.Input(what, text, $"nothing follows '{keyword}'; {Wanted}");
        }

        string given = words[at + 1];
        switch (keyword.ToLowerInvariant())
        {
            case "at":
                return read with { ReferenceCelsius = Celsius(what, text, given) };
            case "fitted":
                int dots = given.IndexOf("..", StringComparison.Ordinal);
                if (dots < 0)
                {
                    throw Wrong.Input(what, text, $"'{given}' is no range; write it as 5..35C");
                }

                double high = Celsius(what, text, given[(dots + 2)..]);
                string low = given[..dots];
                return read with { FittedLowCelsius = EndsInNumber(low) ? Plain(what, text, low) : Celsius(what, text, low), FittedHighCelsius = high };
            case "u":
                double uncertainty = Coefficient(what, text, given, arrhenius);
                return uncertainty < 0
                    ? throw Wrong.Input(what, text, $"{given}: a standard uncertainty is not negative")
                    : read with { StandardUncertainty = uncertainty, UncertaintySource = null };
            default:
                throw Wrong.Input(what, text, $"'{keyword}' is not understood there; {Wanted}");
        }
    }

    private static RecordedTemperatureCoefficient Complete(string what, string text, TemperatureCoefficientForm form, RecordedTemperatureCoefficient read)
    {
        if (double.IsNaN(read.ReferenceCelsius))
        {
            throw Wrong.Input(what, text, "the reference temperature is missing; " + Wanted);
        }

        if (double.IsNaN(read.FittedLowCelsius))
        {
            throw Wrong.Input(what, text, "the range it was fitted over is missing; " + Wanted);
        }

        if (read.FittedHighCelsius <= read.FittedLowCelsius)
        {
            throw Wrong.Input(what, text, "the fitted range runs from low to high, for example 5..35C");
        }

        foreach (double end in new[] { read.FittedLowCelsius, read.FittedHighCelsius })
        {
            Status status = TemperatureCoefficient.Factor(form, read.Value, read.ReferenceCelsius, read.FittedLowCelsius, read.FittedHighCelsius, end, RangeRule.Refuse, out _);
            if (status != Status.Ok)
            {
                throw Wrong.Input(what, text, $"at {Number.Print(end)} C this gives no usable factor; check the coefficient, its unit and the range");
            }
        }

        return read;
    }

    private static double Coefficient(string what, string text, string word, bool arrhenius)
    {
        int length = Number.LeadingLength(word);
        if (length == 0 || !Number.TryConvert(word.AsSpan(0, length), out double value, out _))
        {
            throw Wrong.Input(what, text, Number.CommaAdvice(word) ?? $"'{word}' is no coefficient; {Wanted}");
        }

        string unit = word[length..];
        double scale = (arrhenius, unit) switch
        {
            // A difference of 1 °C is 1 K, and data sheets write it either way.
            (false, "/K" or "1/K" or "/C" or "/°C" or "1/°C" or "/degC") => 1,
            (false, "%/K" or "%/C" or "%/°C" or "%/degC") => 0.01,
            (true, "J/mol") => 1,
            (true, "kJ/mol") => 1000,
            (true, _) => throw Wrong.Input(what, text, Number.CommaAdvice(word) ?? $"'{word}': the arrhenius form takes an activation energy, for example 22kJ/mol"),
            _ => throw Wrong.Input(what, text, Number.CommaAdvice(word) ?? $"'{word}': this form takes a value per kelvin, for example 0.03/K or 3%/K"),
        };
        return value * scale;
    }

    private static bool EndsInNumber(string word)
    {
        return word.Length != 0 && Number.LeadingLength(word) == word.Length;
    }

    private static double Plain(string what, string text, string word)
    {
        return Number.Parse(what + " " + Wrong.Shown(text) + ":", word);
    }

    private static double Celsius(string what, string text, string word)
    {
        string number = word.EndsWith("degC", StringComparison.Ordinal) ? word[..^4] : word.TrimEnd('C').TrimEnd('°');
        if (number == word)
        {
            throw Wrong.Input(what, text, Number.CommaAdvice(word) ?? $"'{word}' is no temperature; write it in degrees Celsius, for example 25C");
        }

        return Plain(what, text, number);
    }
}
