using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>What stands over the water.</summary>
public enum GasPhaseKind
{
    /// <summary>Air, or air with another fraction of the one gas.</summary>
    Air = 1,
    /// <summary>A gas mixture of stated mole fractions.</summary>
    Mixture = 2,
    /// <summary>Nothing but the partial pressure of the gas is known.</summary>
    PartialPressure = 3,
}

/// <summary>One gas of a mixture.</summary>
/// <param name="Gas">The gas.</param>
/// <param name="MoleFraction">Its mole fraction in the dry mixture, mol/mol.</param>
public readonly record struct MixturePart(Gas Gas, double MoleFraction);

/// <summary>The gas phase over the water as it was given.</summary>
public sealed record GasPhase
{
    /// <summary>
    /// How far the fractions of a mixture may add up to more than 1: fractions rounded to four figures of a per cent do so, and no more (our choice).
    /// </summary>
    private const double RoundingOfTheSum = 1e-4;

    private GasPhase() { }

    /// <summary>What it is.</summary>
    public required GasPhaseKind Kind { get; init; }

    /// <summary>Mole fraction of the gas in the dry phase, mol/mol; NaN where only the partial pressure is given.</summary>
    public UncertainQuantity MoleFraction { get; private init; } = new(double.NaN, 0);

    /// <summary>True when the mole fraction is the usual one of dry air and nobody gave it.</summary>
    public bool FractionAssumed { get; private init; }

    /// <summary>Relative humidity, %; NaN where only the partial pressure is given.</summary>
    public UncertainQuantity HumidityPercent { get; private init; } = new(double.NaN, 0);

    /// <summary>True when the humidity is 100 % because nobody gave one.</summary>
    public bool HumidityAssumed { get; private init; }

    /// <summary>Partial pressure of the gas as given, hPa; NaN unless <see cref="Kind"/> says so.</summary>
    public UncertainQuantity PartialPressureHectopascal { get; private init; } = new(double.NaN, 0);

    /// <summary>The named gases of a mixture in the order given; empty for the others.</summary>
    public IReadOnlyList<MixturePart> Parts { get; private init; } = [];

    /// <summary>What the named gases leave of a mixture, mol/mol; 0 when they fill it.</summary>
    public double Unnamed { get; private init; }

    /// <summary>Reads the options that describe the gas phase.</summary>
    /// <exception cref="InputException">They cannot be read, contradict one another, or say nothing of a gas that air has no usual fraction of.</exception>
    public static GasPhase Read(Gas gas, EquilibriumEntry entry)
    {
        int ways = (entry.MoleFraction is null ? 0 : 1) + (entry.Mixture is null ? 0 : 1) + (entry.PartialPressure is null ? 0 : 1);
        if (1 < ways)
        {
            throw new InputException("--mole-fraction, --mixture and --partial-pressure each say how much of the gas stands over the water; give one of them");
        }

        if (entry.PartialPressure is not null)
        {
            return OfPartialPressure(entry);
        }

        NeedsPartialPressure(entry.PartialPressureUncertainty, "--partial-pressure-uncertainty");
        UncertainQuantity humidity = UncertainQuantity.Read(
            entry.Humidity is null ? 100 : Humidity(entry.Humidity), QuantityKind.Percent, "--humidity", entry.HumidityUncertainty, entry.HumidityWithin);
        GasPhase phase = entry.Mixture is not null ? OfMixture(gas, entry) : OfAir(gas, entry);
        return phase with { HumidityPercent = humidity, HumidityAssumed = entry.Humidity is null };
    }

    private static GasPhase OfPartialPressure(EquilibriumEntry entry)
    {
        foreach ((string option, string? text) in new[]
        {
            ("--humidity", entry.Humidity), ("--humidity-uncertainty", entry.HumidityUncertainty), ("--humidity-within", entry.HumidityWithin),
            ("--mole-fraction-uncertainty", entry.MoleFractionUncertainty), ("--mole-fraction-within", entry.MoleFractionWithin),
        })
        {
            if (text is not null)
            {
                throw new InputException($"{option} plays no part beside --partial-pressure, which already is what the water answers to; leave it out");
            }
        }

        double given = Quantity.PressureHectopascal("--partial-pressure", entry.PartialPressure!);
        if (given < 0)
        {
            throw Wrong.Input("--partial-pressure", entry.PartialPressure!, "a partial pressure is zero or above");
        }

        return new GasPhase
        {
            Kind = GasPhaseKind.PartialPressure,
            PartialPressureHectopascal = UncertainQuantity.Read(given, QuantityKind.Pressure, "--partial-pressure", entry.PartialPressureUncertainty, null),
        };
    }

    private static GasPhase OfAir(Gas gas, EquilibriumEntry entry)
    {
        double fraction = entry.MoleFraction is null ? DryAir.MoleFraction(gas) : Fraction("--mole-fraction", entry.MoleFraction);
        if (double.IsNaN(fraction))
        {
            throw new InputException($"air holds no settled amount of {GasNames.NameOf(gas)}: give --mole-fraction (for example 2ppm), --mixture \"{GasNames.NameOf(gas)}=1%, N2=99%\" or --partial-pressure (for example 0.5hPa)");
        }

        return new GasPhase
        {
            Kind = GasPhaseKind.Air,
            MoleFraction = UncertainQuantity.Read(fraction, QuantityKind.MoleFraction, "--mole-fraction", entry.MoleFractionUncertainty, entry.MoleFractionWithin),
            FractionAssumed = entry.MoleFraction is null,
        };
    }

    private static GasPhase OfMixture(Gas gas, EquilibriumEntry entry)
    {
        List<MixturePart> parts = Mixture(entry.Mixture!);
        if (!parts.Exists(part => part.Gas == gas))
        {
            throw Wrong.Input("--mixture", entry.Mixture!, $"--gas {GasNames.NameOf(gas)} is not in it; there are {string.Join(", ", parts.Select(static part => GasNames.NameOf(part.Gas)))}");
        }

        double sum = parts.Sum(static part => part.MoleFraction);
        if (1 + RoundingOfTheSum < sum)
        {
            throw Wrong.Input("--mixture", entry.Mixture!, $"the fractions add up to {Number.Significant(sum * 100, 6)} %, and there is no more than 100 %");
        }

        double fraction = parts.Find(part => part.Gas == gas).MoleFraction;
        double unnamed = 1 - sum;
        return new GasPhase
        {
            Kind = GasPhaseKind.Mixture,
            MoleFraction = UncertainQuantity.Read(fraction, QuantityKind.MoleFraction, "--mole-fraction", entry.MoleFractionUncertainty, entry.MoleFractionWithin),
            Parts = parts,
            Unnamed = RoundingOfTheSum < unnamed ? unnamed : 0,
        };
    }

    private static List<MixturePart> Mixture(string text)
    {
        List<MixturePart> parts = [];
        foreach (string part in text.Split([',', ';']))
        {
            int equals = part.IndexOf('=', StringComparison.Ordinal);
            if (equals < 0)
            {
                throw Wrong.Input("--mixture", text, "write each gas with its mole fraction, for example \"O2=5%, N2=95%\"");
            }

            Gas gas = GasNames.Parse("--mixture", part[..equals]);
            if (parts.Exists(known => known.Gas == gas))
            {
                throw Wrong.Input("--mixture", text, $"{GasNames.NameOf(gas)} is in it twice");
            }

            parts.Add(new MixturePart(gas, Fraction("--mixture " + GasNames.NameOf(gas), part[(equals + 1)..].Trim())));
        }

        return parts;
    }

    private static double Fraction(string what, string text)
    {
        double fraction = Quantity.Parse(QuantityKind.MoleFraction, what, text);
        return fraction is >= 0 and <= 1
            ? fraction
            : throw Wrong.Input(what, text, "a mole fraction is from 0 to 1; with a unit write for example 420ppm or 21%");
    }

    private static double Humidity(string text)
    {
        double humidity = Quantity.Parse(QuantityKind.Percent, "--humidity", text);
        return humidity is >= 0 and <= 100 ? humidity : throw Wrong.Input("--humidity", text, "a relative humidity is from 0% to 100%");
    }

    private static void NeedsPartialPressure(string? text, string option)
    {
        if (text is not null)
        {
            throw new InputException($"{option} belongs to --partial-pressure, which is not given");
        }
    }
}
