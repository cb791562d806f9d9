using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Station.WholeFiles;

/// <summary>
/// An equilibrium for each row: the cells take the place of the options of the same name, and what comes of it is read and
/// computed by the call that a single value takes, so that both agree bit for bit.
/// </summary>
public sealed class EquilibriumRows : IRowFormula
{
    /// <summary>What may come from a column, the option it stands for, and a value by which the options are tried before the first row.</summary>
    private static readonly (ColumnQuantity Quantity, Func<EquilibriumEntry, string?, EquilibriumEntry> With, Func<EquilibriumEntry, string?> Given, string Example)[] Known =
    [
        (new("temperature", QuantityKind.Temperature), static (e, text) => e with { Temperature = text }, static e => e.Temperature, "20"),
        (new("salinity", QuantityKind.Salinity), static (e, text) => e with { Salinity = text }, static e => e.Salinity, "0"),
        (new("conductivity", QuantityKind.Conductivity), static (e, text) => e with { Conductivity = text }, static e => e.Conductivity, "0.1"),
        (new("chlorinity", QuantityKind.Chlorinity), static (e, text) => e with { Chlorinity = text }, static e => e.Chlorinity, "0"),
        (new("specific-conductance", QuantityKind.Conductivity), static (e, text) => e with { SpecificConductance = text }, static e => e.SpecificConductance, "0.1"),
        (new("pressure", QuantityKind.Pressure), static (e, text) => e with { Pressure = text }, static e => e.Pressure, "1013.25"),
        (new("sea-level-pressure", QuantityKind.Pressure), static (e, text) => e with { SeaLevelPressure = text }, static e => e.SeaLevelPressure, "1013.25"),
        (new("altitude", QuantityKind.Altitude), static (e, text) => e with { Altitude = text }, static e => e.Altitude, "0"),
        (new("air-temperature", QuantityKind.Temperature), static (e, text) => e with { AirTemperature = text }, static e => e.AirTemperature, "10"),
        (new("mole-fraction", QuantityKind.MoleFraction), static (e, text) => e with { MoleFraction = text }, static e => e.MoleFraction, "0.1"),
        (new("partial-pressure", QuantityKind.Pressure), static (e, text) => e with { PartialPressure = text }, static e => e.PartialPressure, "100"),
        (new("humidity", QuantityKind.Percent), static (e, text) => e with { Humidity = text }, static e => e.Humidity, "100"),
        (new("concentration", QuantityKind.MassConcentration, QuantityKind.AmountConcentration, QuantityKind.AmountPerKilogram, QuantityKind.VolumeConcentration),
            static (e, text) => e with { Concentration = text }, static e => e.Concentration, "0"),
        (new("depth", QuantityKind.Depth), static (e, text) => e with { Depth = text }, static e => e.Depth, "1"),
    ];

    /// <summary>Each result: its column, its key, and where it is in the result of a single value.</summary>
    private static readonly (string Name, string Key, EquilibriumQuantity Quantity, bool Uncertainty)[] Equilibrium =
    [
        ("[mg/L]", "mgPerL", EquilibriumQuantity.MilligramsPerLitre, false),
        ("u [mg/L]", "mgPerLUncertainty", EquilibriumQuantity.MilligramsPerLitre, true),
        ("[umol/L]", "umolPerL", EquilibriumQuantity.MicromolesPerLitre, false),
        ("[umol/kg]", "umolPerKg", EquilibriumQuantity.MicromolesPerKilogram, false),
        ("[mL/L]", "mLPerL", EquilibriumQuantity.MillilitresPerLitre, false),
        ("partial pressure [hPa]", "partialPressureHPa", EquilibriumQuantity.PartialPressure, false),
        ("partial pressure u [hPa]", "partialPressureHPaUncertainty", EquilibriumQuantity.PartialPressure, true),
    ];

    private static readonly (string Name, string Key, EquilibriumQuantity Quantity, bool Uncertainty)[] Measured =
    [
        ("measured [mg/L]", "measuredMgPerL", EquilibriumQuantity.MeasuredMilligramsPerLitre, false),
        ("measured partial pressure [hPa]", "measuredPartialPressureHPa", EquilibriumQuantity.MeasuredPartialPressure, false),
        ("measured partial pressure u [hPa]", "measuredPartialPressureHPaUncertainty", EquilibriumQuantity.MeasuredPartialPressure, true),
        ("saturation local [%]", "percentLocal", EquilibriumQuantity.PercentLocal, false),
        ("saturation local u [%]", "percentLocalUncertainty", EquilibriumQuantity.PercentLocal, true),
        ("saturation at 1 atm [%]", "percentOneAtmosphere", EquilibriumQuantity.PercentOneAtmosphere, false),
        ("excess [mg/L]", "excessMgPerL", EquilibriumQuantity.ExcessMilligramsPerLitre, false),
    ];

    private readonly EquilibriumEntry _options;
    private Func<EquilibriumEntry, string?, EquilibriumEntry>[] _with = [];
    private (string Name, string Key, EquilibriumQuantity Quantity, bool Uncertainty)[] _results = [];
    private ResultColumn[] _columns = [];

    /// <param name="options">What the options say; the columns fill in the rest.</param>
    public EquilibriumRows(EquilibriumEntry options)
    {
        _options = options;
    }

    /// <inheritdoc/>
    public IReadOnlyList<ColumnQuantity> Quantities { get; } = [.. Known.Select(static each => each.Quantity)];

    /// <inheritdoc/>
    public IReadOnlyList<ResultColumn> Results => _columns;

    /// <inheritdoc/>
    public IReadOnlyList<(string Key, string Value)> About { get; private set; } = [];

    /// <inheritdoc/>
    public void Begin(IReadOnlyList<string> quantities, IReadOnlyList<string> units)
    {
        EquilibriumEntry tried = _options;
        _with = new Func<EquilibriumEntry, string?, EquilibriumEntry>[quantities.Count];
        for (int i = 0; i < quantities.Count; i++)
        {
            (ColumnQuantity quantity, _with[i], Func<EquilibriumEntry, string?> given, string example) = Known.First(each => each.Quantity.Name == quantities[i]);
            if (given(_options) is not null)
            {
                throw new InputException($"--{quantity.Name} and --column {quantity.Name}=… say the same thing; leave one out");
            }

            tried = _with[i](tried, Example(quantity.Name, example, units[i]));
        }

        // What the options lack or say twice is the same in every row: it is said once, before the first.
        EquilibriumCase asked = tried.Read();
        string gas = GasNames.NameOf(asked.Gas);
        _results = [.. Equilibrium, .. asked.Measured is null ? [] : Measured];
        List<ResultColumn> columns = [.. _results.Select(each => new ResultColumn(gas + " " + each.Name, each.Key))];
        if (asked.DepthMetres is not null)
        {
            columns.Add(new ResultColumn(gas + " partial pressure at depth [hPa]", "partialPressureAtDepthHPa"));
        }

        _columns = [.. columns];
        About =
        [
            ("gas", gas), ("equation", EquationNames.NameOf(asked.Equation)), ("pressureSource", asked.PressureSource),
        ];
    }

    /// <inheritdoc/>
    public RowOutcome Compute(ReadOnlySpan<string> values, Span<double> results)
    {
        EquilibriumEntry entry = _options;
        for (int i = 0; i < values.Length; i++)
        {
            entry = _with[i](entry, values[i]);
        }

        GasAtEquilibrium result;
        try
        {
            result = GasAtEquilibrium.Compute(entry.Read());
        }
        catch (InputException refused)
        {
            return RowOutcome.Refused(Subject(refused.Message), refused.Message);
        }

        for (int i = 0; i < _results.Length; i++)
        {
            EquilibriumResult? found = result.Find(_results[i].Quantity);
            results[i] = found is null ? double.NaN : _results[i].Uncertainty ? found.StandardUncertainty : found.Value;
        }

        if (_results.Length < _columns.Length)
        {
            results[_results.Length] = Felt(result);
        }

        return Outcome(result);
    }

    /// <summary>The partial pressure that a probe feels at its depth: of the water measured where something was measured.</summary>
    private static double Felt(GasAtEquilibrium result)
    {
        EquilibriumResult? surface = result.Find(EquilibriumQuantity.MeasuredPartialPressure) ?? result.Find(EquilibriumQuantity.PartialPressure);
        return surface is null || result.AtDepth is null ? double.NaN : result.AtDepth.Of(surface.Value, surface.StandardUncertainty).Value;
    }

    private static RowOutcome Outcome(GasAtEquilibrium result)
    {
        foreach (EquilibriumFlag flag in result.Flags)
        {
            // Where the pressure of all rows comes from is said once, beside the equation.
            if (!flag.Code.StartsWith("pressure-from-", StringComparison.Ordinal))
            {
                return RowOutcome.Flagged(flag.Code, flag.Text);
            }
        }

        return result.Asked.Notes.Count == 0 ? RowOutcome.Ok : RowOutcome.Flagged("unusual", result.Asked.Notes[0]);
    }

    /// <summary>What a refusal is about: the option at the head of its line, by which rows are counted.</summary>
    private static string Subject(string message)
    {
        string subject = message.StartsWith(UncertainQuantity.TooLarge, StringComparison.Ordinal) ? "uncertainties"
            : message.StartsWith("--", StringComparison.Ordinal) ? message.Split(' ', 2)[0].TrimStart('-')
            : message.Split(' ', 3) is ["the", string noun, ..] ? noun
            : "conditions";
        return subject + " not usable";
    }

    private string Example(string quantity, string example, string unit)
    {
        // A pressure that fits the altitude that is given, and the other way round.
        if (quantity == "pressure" && _options.Altitude is string altitude
            && Quantity.TryParse(QuantityKind.Altitude, altitude, out double metres, out _) && StandardAtmosphere.Pressure(metres, out double usual) == Status.Ok)
        {
            return Number.Print(usual) + "hPa";
        }

        if (quantity == "altitude" && _options.Pressure is string pressure && Quantity.TryParse(QuantityKind.Pressure, pressure, out double hectopascal, out _)
            && StandardAtmosphere.ReduceToSeaLevel(hectopascal, 0, out double _) == Status.Ok)
        {
            for (double at = 0; at <= StandardAtmosphere.HighestAltitudeMetres; at += 100)
            {
                if (StandardAtmosphere.Pressure(at, out double there) == Status.Ok && there <= hectopascal)
                {
                    return string.Create(CultureInfo.InvariantCulture, $"{at}m");
                }
            }
        }

        return example + unit;
    }
}
