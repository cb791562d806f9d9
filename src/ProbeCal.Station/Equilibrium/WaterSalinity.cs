using System;
using System.Collections.Generic;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>How the salinity of the water was got.</summary>
public enum SalinitySource
{
    /// <summary>It was given.</summary>
    Given = 1,
    /// <summary>From the specific conductance at 25 °C, by the relation of the national field manual.</summary>
    SpecificConductance = 2,
    /// <summary>From the conductivity at its temperature, by the practical salinity scale of 1978.</summary>
    Conductivity = 3,
    /// <summary>From the chlorinity.</summary>
    Chlorinity = 4,
    /// <summary>A brine of given ions, which act on the value of fresh water.</summary>
    Ions = 5,
}

/// <summary>The salinity of the water and where it comes from.</summary>
public sealed record WaterSalinity
{
    internal const double MicrosiemensPerMillisiemens = 1000;

    /// <summary>Standard uncertainty of the practical salinity scale itself (0.002–0.003 as stated with it, the larger taken).</summary>
    private const double ScaleUncertainty = 0.003;

    /// <summary>
    /// Standard uncertainty of the field manual's relation, as a part of the salinity and at most. The relation gives 0.559 where water of sea-salt ions has 0.492,
    /// 14 % more, and 35.26 where sea water has 35. Inland water holds other ions, so which of the two is nearer is not known: the whole difference is taken.
    /// </summary>
    private const double FieldRelationRelative = 0.14;
    private const double FieldRelationHighest = 0.3;

    private WaterSalinity() { }

    /// <summary>Practical salinity.</summary>
    public required double Salinity { get; init; }

    /// <summary>How it was got.</summary>
    public required SalinitySource Source { get; init; }

    /// <summary>What was given: a salinity, mS/cm, or a chlorinity in g/kg.</summary>
    public required UncertainQuantity Given { get; init; }

    /// <summary>Temperature at which a conductivity was measured where it is not that of the water, °C; null for the water's own.</summary>
    public UncertainQuantity? ConductivityTemperature { get; private init; }

    /// <summary>Standard uncertainty of the relation between what was given and the salinity, in salinity.</summary>
    public double RelationUncertainty { get; private init; }

    /// <summary>The ions where the water is a brine; its salinity is 0 then.</summary>
    public Brine? Brine { get; private init; }

    /// <summary>Change of the salinity with what was given.</summary>
    internal double PerGiven { get; private init; } = 1;

    /// <summary>Change of the salinity with the temperature of the conductivity, 1/K.</summary>
    internal double PerKelvin { get; private init; }

    /// <summary>What was given, for a budget.</summary>
    internal string GivenName => Source switch
    {
        SalinitySource.SpecificConductance => "specific conductance",
        SalinitySource.Conductivity => "conductivity",
        SalinitySource.Chlorinity => "chlorinity",
        _ => "salinity",
    };

    /// <summary>The unit that <see cref="Given"/> is in.</summary>
    public string GivenUnit => Source switch
    {
        SalinitySource.SpecificConductance or SalinitySource.Conductivity => "mS/cm",
        SalinitySource.Chlorinity => "g/kg",
        _ => "",
    };

    /// <summary>Standard uncertainty of the salinity by what it was got from; the temperature that is shared with the water is not in it.</summary>
    public double SalinityUncertainty
    {
        get
        {
            double given = PerGiven * Given.StandardUncertainty;
            double temperature = PerKelvin * (ConductivityTemperature?.StandardUncertainty ?? 0);
            return Math.Sqrt((given * given) + (temperature * temperature) + (RelationUncertainty * RelationUncertainty));
        }
    }

    /// <summary>The salinity with the option that it came by, for the beginning of a sentence.</summary>
    internal string Described => Source == SalinitySource.Given
        ? "--salinity " + Number.Print(Salinity)
        : $"the salinity {Number.Significant(Salinity, 5)} of --{GivenName.Replace(' ', '-')} {Number.Print(Given.Value)} {GivenUnit}";

    /// <summary>Reads the options that say how salty the water is: exactly one of them.</summary>
    /// <param name="entry">The words.</param>
    /// <param name="celsius">Temperature of the water, °C.</param>
    /// <exception cref="InputException">None or several are given, or one cannot be read.</exception>
    public static WaterSalinity Read(EquilibriumEntry entry, double celsius)
    {
        List<string> given = [];
        Note("--salinity", entry.Salinity);
        Note("--conductivity", entry.Conductivity);
        Note("--specific-conductance", entry.SpecificConductance);
        Note("--chlorinity", entry.Chlorinity);
        Note("--ions", entry.Ions);
        if (given.Count == 0)
        {
            throw new InputException("--salinity is missing: 0 for fresh water; in its place --conductivity 42mS/cm, --specific-conductance 500uS/cm (at 25 °C), --chlorinity 19.4 or --ions");
        }

        if (1 < given.Count)
        {
            throw new InputException($"{string.Join(" and ", given)} each say how salty the water is; give one of them");
        }

        Belongs(entry.Salinity, "--salinity", ("--salinity-uncertainty", entry.SalinityUncertainty), ("--salinity-within", entry.SalinityWithin));
        Belongs(entry.Conductivity, "--conductivity", ("--conductivity-temperature", entry.ConductivityTemperature), ("--conductivity-temperature-uncertainty", entry.ConductivityTemperatureUncertainty));
        Belongs(entry.Conductivity ?? entry.SpecificConductance, "--conductivity or --specific-conductance", ("--conductivity-uncertainty", entry.ConductivityUncertainty));
        Belongs(entry.Chlorinity, "--chlorinity", ("--chlorinity-uncertainty", entry.ChlorinityUncertainty));
        return entry.Salinity is not null ? OfSalinity(entry)
            : entry.Conductivity is not null ? OfConductivity(entry, celsius)
            : entry.Chlorinity is not null ? OfChlorinity(entry)
            : entry.Ions is not null ? OfIons(entry.Ions)
            : OfSpecificConductance(entry);

        void Note(string option, string? text)
        {
            if (text is not null)
            {
                given.Add(option);
            }
        }
    }

    /// <summary>The salinity that other inputs would make; what the model draws its trials through.</summary>
    /// <param name="given">In place of <see cref="Given"/>.</param>
    /// <param name="celsius">Temperature at which a conductivity was measured.</param>
    internal double SalinityOf(double given, double celsius)
    {
        double salinity = given;
        switch (Source)
        {
            case SalinitySource.SpecificConductance:
                ProbeCal.SpecificConductance.Salinity(given * MicrosiemensPerMillisiemens, RangeRule.Extrapolate, out salinity);
                break;
            case SalinitySource.Conductivity:
                PracticalSalinity.FromConductivity(given, celsius, 0, RangeRule.Extrapolate, out salinity);
                break;
            case SalinitySource.Chlorinity:
                salinity = given * ProbeCal.Chlorinity.SalinityPerGramPerKilogram;
                break;
            default:
                break;
        }

        return salinity;
    }

    private static WaterSalinity OfSalinity(EquilibriumEntry entry)
    {
        double salinity = Quantity.Salinity("--salinity", entry.Salinity!);
        return new WaterSalinity
        {
            Salinity = salinity,
            Source = SalinitySource.Given,
            Given = UncertainQuantity.Read(salinity, QuantityKind.Salinity, "--salinity", entry.SalinityUncertainty, entry.SalinityWithin),
        };
    }

    private static WaterSalinity OfIons(string ions)
    {
        return new WaterSalinity { Salinity = 0, Source = SalinitySource.Ions, Given = new UncertainQuantity(0, 0), Brine = Brine.Read(ions) };
    }

    private static WaterSalinity OfConductivity(EquilibriumEntry entry, double waterCelsius)
    {
        double conductivity = Quantity.Parse(QuantityKind.Conductivity, "--conductivity", entry.Conductivity!);
        double? own = entry.ConductivityTemperature is null ? null : Quantity.TemperatureCelsius("--conductivity-temperature", entry.ConductivityTemperature);
        double celsius = own ?? waterCelsius;
        Status status = PracticalSalinity.FromConductivity(conductivity, celsius, 0, RangeRule.NearEdge, out double salinity);
        if (double.IsNaN(salinity))
        {
            string option = own is null ? "--temperature" : "--conductivity-temperature";
            throw StatusParts.Input(status) == InputQuantity.Temperature
                ? new InputException($"{option} {Number.Print(celsius)} °C is outside the practical salinity scale (PSS-78), which holds from {Number.Print(PracticalSalinity.LowestCelsius)} to {Number.Print(PracticalSalinity.HighestCelsius)} °C")
                : Wrong.Input("--conductivity", entry.Conductivity!, $"at {Number.Print(celsius)} °C this is outside the practical salinity scale (PSS-78), which holds from S 0 to {Number.Print(PracticalSalinity.HighestSalinity)}; is it mS/cm or uS/cm, and not compensated to 25 °C?");
        }

        PracticalSalinity.Sensitivities(conductivity, celsius, 0, RangeRule.NearEdge, out double perConductivity, out double perKelvin);
        return new WaterSalinity
        {
            Salinity = salinity,
            Source = SalinitySource.Conductivity,
            Given = UncertainQuantity.Read(conductivity, QuantityKind.Conductivity, "--conductivity", entry.ConductivityUncertainty, null),
            ConductivityTemperature = own is null ? null
                : UncertainQuantity.Read(celsius, QuantityKind.TemperatureDifference, "--conductivity-temperature", entry.ConductivityTemperatureUncertainty, null),
            PerGiven = perConductivity,
            PerKelvin = perKelvin,
            RelationUncertainty = ScaleUncertainty,
        };
    }

    private static WaterSalinity OfChlorinity(EquilibriumEntry entry)
    {
        double chlorinity = Quantity.Parse(QuantityKind.Chlorinity, "--chlorinity", entry.Chlorinity!);
        if (ProbeCal.Chlorinity.Salinity(chlorinity, RangeRule.Refuse, out double salinity) != Status.Ok)
        {
            throw Wrong.Input("--chlorinity", entry.Chlorinity!, $"the chlorinity of sea water is from 0 to {Number.Significant(ProbeCal.Chlorinity.HighestGramsPerKilogram, 4)} g/kg (S 0 to 42; S = 1.80655 Cl)");
        }

        return new WaterSalinity
        {
            Salinity = salinity,
            Source = SalinitySource.Chlorinity,
            Given = UncertainQuantity.Read(chlorinity, QuantityKind.Chlorinity, "--chlorinity", entry.ChlorinityUncertainty, null),
            PerGiven = ProbeCal.Chlorinity.SalinityPerGramPerKilogram,
        };
    }

    private static WaterSalinity OfSpecificConductance(EquilibriumEntry entry)
    {
        double conductance = Quantity.Parse(QuantityKind.Conductivity, "--specific-conductance", entry.SpecificConductance!);
        double microsiemens = conductance * MicrosiemensPerMillisiemens;
        if (ProbeCal.SpecificConductance.Salinity(microsiemens, RangeRule.Refuse, out double salinity) != Status.Ok)
        {
            throw Wrong.Input("--specific-conductance", entry.SpecificConductance!, $"the relation of the field manual (TM 9-A6.2) holds from 0 to {Number.Print(ProbeCal.SpecificConductance.HighestMicrosiemensPerCentimetre)} uS/cm at 25 °C");
        }

        // The relation is a parabola: a step to either side gives its slope to the last digits.
        const double Step = 1;
        ProbeCal.SpecificConductance.Salinity(microsiemens + Step, RangeRule.Extrapolate, out double above);
        ProbeCal.SpecificConductance.Salinity(microsiemens - Step, RangeRule.Extrapolate, out double below);
        return new WaterSalinity
        {
            Salinity = salinity,
            Source = SalinitySource.SpecificConductance,
            Given = UncertainQuantity.Read(conductance, QuantityKind.Conductivity, "--conductivity", entry.ConductivityUncertainty, null),
            PerGiven = (above - below) / (2 * Step) * MicrosiemensPerMillisiemens,
            RelationUncertainty = Math.Min(FieldRelationRelative * salinity, FieldRelationHighest),
        };
    }

    private static void Belongs(string? owner, string option, params (string Option, string? Text)[] parts)
    {
        foreach ((string part, string? text) in parts)
        {
            if (text is not null && owner is null)
            {
                throw new InputException($"{part} belongs to {option}, which is not given");
            }
        }
    }
}
