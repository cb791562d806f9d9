using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// A response model with its coefficients as one line of text: <c>MODEL NAME=VALUE …</c>, for example <c>uchida-2008 c0=0.0028 c1=0.0001 …</c>
/// or <c>stern-volmer signal-kind=phase lifetime-per-kelvin=-0.003</c>. The temperature coefficient of a membrane or of the quenching is a text of its own
/// (<see cref="CoefficientText"/>).
/// </summary>
internal static class ModelText
{
    /// <summary>Puts a model and its coefficients into a probe, or refuses the text in one line.</summary>
    /// <param name="what">The option or key it was given for.</param>
    /// <param name="text">The model's name and its coefficients.</param>
    /// <param name="probe">The probe; its temperature coefficient stays where the model takes one.</param>
    /// <exception cref="InputException">The model or a coefficient is unknown, missing, given twice or no number.</exception>
    internal static RecordedProbe Apply(string what, string text, RecordedProbe probe)
    {
        string[] words = text.Split(' ', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries);
        if (words.Length == 0)
        {
            throw Wrong.Input(what, text, "the model is missing; there are " + string.Join(", ", ModelNames.All));
        }

        string model = words[0].ToLowerInvariant();
        if (!ModelNames.All.Contains(model))
        {
            throw Wrong.Input(what, text, $"there is no model '{Wrong.Shown(words[0])}'{NearestName.DidYouMean(model, ModelNames.All)}; there are {string.Join(", ", ModelNames.All)}");
        }

        ModelCoefficient[] known = ModelCoefficients.Of(model);
        List<RecordedCoefficient> given = [];
        foreach (string word in words.Skip(1))
        {
            RecordedCoefficient read = Read(what, text, word, model, known);
            if (given.Exists(each => each.Name == read.Name))
            {
                throw Wrong.Input(what, text, $"{read.Name} is given twice");
            }

            given.Add(read);
        }

        ModelCoefficient[] missing = [.. known.Where(each => each.Default == null && !given.Exists(read => read.Name == each.Name))];
        if (missing.Length != 0)
        {
            throw Wrong.Input(what, text, $"{model} lacks {string.Join(", ", missing.Select(Described))}");
        }

        RecordedProbe made = probe with { Model = model, Coefficients = [.. given] };
        made = made with { TemperatureCoefficient = TemperatureCoefficientOf(what, text, made) };
        Try(what, text, made);
        return made;
    }

    /// <summary>The model and its coefficients as text that <see cref="Apply"/> reads back.</summary>
    internal static string Print(RecordedProbe probe)
    {
        ModelCoefficient[] known = ModelCoefficients.Of(probe.Model);
        return string.Join(' ', probe.Coefficients.Select(each =>
        {
            ModelCoefficient? kind = Array.Find(known, one => one.Name == each.Name);
            bool isChoice = kind is { Choices.Length: > 0 };
            return each.Name + "=" + (isChoice ? kind!.Choices[(int)each.Value - 1] : Number.Print(each.Value));
        }).Prepend(probe.Model));
    }

    private static RecordedCoefficient Read(string what, string text, string word, string model, ModelCoefficient[] known)
    {
        int equals = word.IndexOf('=', StringComparison.Ordinal);
        string name = (equals < 0 ? word : word[..equals]).ToLowerInvariant();
        ModelCoefficient? found = Array.Find(known, each => each.Name == name);
        if (found == null)
        {
            string there = known.Length == 0 ? "it has none" : "there are " + string.Join(", ", known.Select(static each => each.Name));
            throw Wrong.Input(what, text, $"{model} has no coefficient '{Wrong.Shown(name)}'{NearestName.DidYouMean(name, known.Select(static each => each.Name))}; {there}");
        }

        string value = equals < 0 ? "" : word[(equals + 1)..];
        if (value.Length == 0)
        {
            throw Wrong.Input(what, text, $"'{Wrong.Shown(word)}' has no value; write NAME=VALUE, for example {found.Name}={(found.Choices.Length == 0 ? "0.01" : found.Choices[0])}");
        }

        if (found.Choices.Length != 0)
        {
            int place = Array.IndexOf(found.Choices, value.ToLowerInvariant());
            return place < 0
                ? throw Wrong.Input(what, text, $"{found.Name} is one of {string.Join(", ", found.Choices)}{NearestName.DidYouMean(value, found.Choices)}")
                : new RecordedCoefficient { Name = found.Name, Value = place + 1, Unit = found.Choices[place], Source = "entered" };
        }

        return new RecordedCoefficient { Name = found.Name, Value = Number.Parse($"{what} {Wrong.Shown(text)}: {found.Name}", value), Unit = found.Unit, Source = "entered" };
    }

    private static string Described(ModelCoefficient coefficient)
    {
        string unit = coefficient.Unit.Length == 0 ? "" : ", " + coefficient.Unit;
        return $"{coefficient.Name} ({coefficient.Meaning}{unit})";
    }

    /// <summary>The probe's own for a membrane, a polynomial where further terms are given; otherwise none, with the range of the model.</summary>
    private static RecordedTemperatureCoefficient TemperatureCoefficientOf(string what, string text, RecordedProbe probe)
    {
        if (!ModelCoefficients.HasTemperatureCoefficient(probe.Model))
        {
            return new RecordedTemperatureCoefficient
            {
                Form = RecordNames.NoForm,
                Value = 0,
                Unit = "1/K",
                StandardUncertainty = 0,
                ReferenceCelsius = 25,
                FittedLowCelsius = ModelCoefficients.Value(probe, ModelCoefficients.Lowest),
                FittedHighCelsius = ModelCoefficients.Value(probe, ModelCoefficients.Highest),
                Source = "the model's coefficients",
            };
        }

        RecordedTemperatureCoefficient own = probe.TemperatureCoefficient;
        bool furtherTerms = Array.Exists(probe.Coefficients, static each => each.Name is ModelCoefficients.Second or ModelCoefficients.Third && each.Value != 0);
        if (!furtherTerms || own.Form == "polynomial")
        {
            return own;
        }

        return own.Form == "exponential"
            ? own with { Form = "polynomial" }
            : throw Wrong.Input(what, text, $"further terms make a polynomial of an exponential temperature coefficient, and this one is {own.Form}");
    }

    /// <summary>Looks whether the coefficients make a gain at both ends of their range.</summary>
    private static void Try(string what, string text, RecordedProbe probe)
    {
        double low = probe.TemperatureCoefficient.FittedLowCelsius;
        double high = probe.TemperatureCoefficient.FittedHighCelsius;
        if (high <= low)
        {
            throw Wrong.Input(what, text, "the range of temperatures runs from low to high, for example lowest-celsius=0 highest-celsius=40");
        }

        IProbeModel model = RecordConversion.Model(probe);
        foreach (double end in new[] { low, high })
        {
            Status status = model.Gain(end, RangeRule.Refuse, out _);
            Status inverse = Status.Ok;
            if (probe.Model is ModelNames.Uchida2008 or ModelNames.Bittig2018)
            {
                // Saturated water at both ends must have a phase.
                inverse = model.Signal(200, end, double.NaN, 0, RangeRule.NearEdge, out _);
            }

            if (status != Status.Ok || (inverse != Status.Ok && StatusParts.Input(inverse) != InputQuantity.Temperature))
            {
                throw Wrong.Input(what, text, $"at {Number.Print(end)} C these coefficients make no response ({(status != Status.Ok ? status : inverse)}); compare them with the form in docs/methods.md");
            }
        }
    }
}
