using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>A concentration as it was measured in the water, in whatever unit.</summary>
/// <param name="Kind">Mass or amount per litre, amount per kilogram, or volume of gas per litre: the kind whose canonical unit the value is in.</param>
/// <param name="Given">The value in the canonical unit of the kind.</param>
/// <param name="Text">What was typed.</param>
public sealed record MeasuredConcentration(QuantityKind Kind, UncertainQuantity Given, string Text)
{
    private const string Option = "--concentration";

    private static readonly QuantityKind[] Kinds =
        [QuantityKind.MassConcentration, QuantityKind.AmountConcentration, QuantityKind.AmountPerKilogram, QuantityKind.VolumeConcentration];

    /// <summary>Reads it; null when none is given.</summary>
    /// <exception cref="InputException">It cannot be read, or its uncertainty is of another kind.</exception>
    public static MeasuredConcentration? Read(EquilibriumEntry entry, WaterSalinity water)
    {
        if (entry.Concentration is not string text)
        {
            return entry.ConcentrationUncertainty is null
                ? null
                : throw new InputException($"{Option}-uncertainty belongs to {Option}, which is not given");
        }

        QuantityKind kind = KindOf(text);
        if (kind == QuantityKind.AmountPerKilogram && water.Brine is not null)
        {
            throw Wrong.Input(Option, text, "the density of a brine (--ions) is not known here; give the concentration per litre");
        }

        double value = Quantity.Parse(kind, Option, text);
        return new MeasuredConcentration(kind, UncertainQuantity.Read(value, kind, Option, entry.ConcentrationUncertainty, null), text.Trim());
    }

    /// <summary>Converts a value of one of the kinds.</summary>
    /// <param name="gas">The gas.</param>
    /// <param name="kind">The kind in whose canonical unit the value is.</param>
    /// <param name="given">The value.</param>
    /// <param name="density">Density of the water, kg/m³; of use for amounts per kilogram only.</param>
    internal static double MilligramsPerLitre(Gas gas, QuantityKind kind, double given, double density)
    {
        return kind == QuantityKind.MassConcentration ? given
            : kind == QuantityKind.VolumeConcentration ? GasUnits.MilligramsPerLitreFromMillilitresPerLitre(gas, given)
            : GasUnits.MilligramsPerLitreFromMicromolesPerLitre(gas, kind == QuantityKind.AmountPerKilogram ? given * density / 1000 : given);
    }

    private static QuantityKind KindOf(string text)
    {
        string trimmed = text.Trim();
        string unit = trimmed[Number.LeadingLength(trimmed)..].TrimStart();
        if (unit.Length == trimmed.Length)
        {
            // No number at all: the first kind says so.
            return Kinds[0];
        }

        if (Array.Find(Kinds, kind => kind.Unit(unit) is not null) is QuantityKind found)
        {
            return found;
        }

        IEnumerable<string> spellings = Kinds.SelectMany(static kind => kind.Spellings());
        string units = string.Join(", ", Kinds.SelectMany(static kind => kind.Units).Select(static known => known.Name));
        string problem = Number.CommaAdvice(trimmed)
            ?? (unit.Length == 0 ? "a concentration carries its unit" : $"{Wrong.Shown(unit)} is no unit of a concentration{NearestName.DidYouMean(unit, spellings)}") + $"; write for example 8.1mg/L or 250umol/kg (units: {units})";
        throw Wrong.Input(Option, text, problem);
    }
}
