using System;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// A certified gas mixture as one line: <c>[cylinder] ID [FRACTION u UNCERTAINTY] dry|humid [HUMIDITY u UNCERTAINTY]</c>. Examples:
/// <c>CYL-21 20.95% u 0.02% dry</c>, <c>cylinder CYL-7 420ppm u 2ppm humid</c>, <c>CYL-21 dry</c> for a cylinder of the register, and <c>air humid 97% u 1%</c> for the air of a chamber whose
/// humidity was measured.
/// </summary>
/// <remarks>
/// Fraction: of the gas in the dry mixture. <c>dry</c>: as it leaves the cylinder; <c>humid</c>: after bubbling through water, 95 to 100 % unless said otherwise. Uncertainties by <c>u</c> (standard) or
/// <c>within</c> (limits). The option is <c>--mixture</c>, or the text behind <c>gas-mixture:</c> of a further level.
/// </remarks>
internal static class MixtureText
{
    /// <summary>The cylinder's id for the air of the place.</summary>
    public const string Air = "air";

    private const string Wanted = "write ID FRACTION u UNCERTAINTY dry, for example 'CYL-21 20.95% u 0.02% dry' (or humid, or humid 97% u 1%)";

    /// <summary>Reads a mixture or refuses it in one line.</summary>
    /// <param name="what">The option or key it was given for.</param>
    /// <param name="text">What was given.</param>
    /// <param name="gas">The gas of the probe.</param>
    /// <param name="register">Certified mole fraction of a cylinder by its id; null from it for one that is not there, and null when there is no register.</param>
    /// <exception cref="InputException">Something of it is missing or wrong.</exception>
    public static RecordedMixture Parse(string what, string text, Gas gas, Func<string, RecordedQuantity?>? register = null)
    {
        Clauses clauses = new(what, text, Wanted);
        _ = clauses.Takes("cylinder");
        string id = clauses.Next("the id of the cylinder is missing");
        if (0 < Number.LeadingLength(id) && id.EndsWith('%'))
        {
            throw clauses.Wrong($"a mixture begins with the id of its cylinder, and {id} is a fraction");
        }

        bool air = string.Equals(id, Air, StringComparison.OrdinalIgnoreCase);
        id = air ? Air : PlainText.Id(what, id);
        RecordedQuantity fraction = Fraction(clauses, id, air, gas, register);
        if (!(0 <= fraction.Value && fraction.Value <= 1))
        {
            throw clauses.Wrong($"a mole fraction of {Number.Print(fraction.Value)} cannot be; it is from 0 to 1 (100%)");
        }

        RecordedQuantity humidity = Humidity(clauses);
        return clauses.IsAtEnd
            ? new RecordedMixture { Cylinder = id, MoleFraction = fraction, RelativeHumidityPercent = humidity }
            : throw clauses.Wrong($"'{Wrong.Shown(clauses.Next(""))}' is too much");
    }

    /// <summary>The mixture as text that <see cref="Parse"/> reads back to the same values.</summary>
    public static string Print(RecordedMixture mixture)
    {
        RecordedQuantity x = mixture.MoleFraction;
        RecordedQuantity h = mixture.RelativeHumidityPercent;
        string state = h is { Value: 0, StandardUncertainty: 0 } ? "dry" : $"humid {Number.Print(h.Value)}% u {Number.Print(h.StandardUncertainty)}%";
        return $"{mixture.Cylinder} {Number.Print(x.Value)} u {Number.Print(x.StandardUncertainty)} {state}";
    }

    private static RecordedQuantity Fraction(Clauses clauses, string id, bool air, Gas gas, Func<string, RecordedQuantity?>? register)
    {
        if (clauses.IsNumberNext)
        {
            return clauses.Value("mole fraction", QuantityKind.MoleFraction, "1", null, null);
        }

        if (air)
        {
            double fraction = DryAir.MoleFraction(gas);
            return double.IsNaN(fraction)
                ? throw clauses.Wrong($"air holds no settled amount of {GasNames.NameOf(gas)}; write its mole fraction")
                : new RecordedQuantity { Value = fraction, Unit = "1", StandardUncertainty = 0, Source = "dry air", UncertaintySource = "taken as exact (docs/methods.md)" };
        }

        return register?.Invoke(id) ?? throw clauses.Wrong(register == null
            ? "the mole fraction is missing"
            : $"the mole fraction is missing, and the register holds none for '{id}'");
    }

    private static RecordedQuantity Humidity(Clauses clauses)
    {
        if (clauses.IsAtEnd)
        {
            throw clauses.Wrong("is it dry or humid? Oxygen of humid gas is 2 % less at 20 C");
        }

        if (clauses.Takes("dry"))
        {
            return new RecordedQuantity { Value = 0, Unit = "%", StandardUncertainty = 0, Source = "dry from the cylinder" };
        }

        if (!clauses.Takes("humid"))
        {
            string word = clauses.Next("");
            throw clauses.Wrong($"'{Wrong.Shown(word)}' is not understood there{NearestName.DidYouMean(word, ["dry", "humid", "within"])}");
        }

        if (!clauses.IsNumberNext)
        {
            return new RecordedQuantity
            {
                Value = MethodDefaults.HumidifiedPercent,
                Unit = "%",
                StandardUncertainty = MethodDefaults.HumidifiedUncertaintyPercent,
                Source = "bubbled through water",
                UncertaintySource = MethodDefaults.HumidifiedSource,
            };
        }

        RecordedQuantity humidity = clauses.Value("humidity", QuantityKind.Percent, "%", null, null);
        return humidity.Value is >= 0 and <= 100 ? humidity : throw clauses.Wrong($"a humidity of {Number.Print(humidity.Value)} % cannot be; it is from 0% to 100%");
    }
}
