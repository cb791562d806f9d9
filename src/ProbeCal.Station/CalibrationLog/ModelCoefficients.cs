using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>One coefficient of a response model as records and options name it.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Unit">Its unit; for a choice what may be chosen, in the order of its values from 1 on.</param>
/// <param name="Default">What stands where it is not given; none when it must be.</param>
/// <param name="Meaning">What it is, for people.</param>
/// <param name="Choices">The words of a choice, whose value is their place from 1 on; empty for a number.</param>
internal sealed record ModelCoefficient(string Name, string Unit, double? Default, string Meaning, string[] Choices)
{
    /// <summary>A number.</summary>
    public ModelCoefficient(string name, string unit, double? standard, string meaning)
        : this(name, unit, standard, meaning, [])
    {
    }
}

/// <summary>
/// Which coefficients each response model has beside the temperature coefficient: <c>uchida-2008</c> and <c>bittig-2018</c> c0 …, the solubility equation (Uchida) and the
/// correction for depth; <c>stern-volmer</c> what the signal is and how τ0 follows temperature; <c>severinghaus</c> the drift of E0; all but the first and the
/// meter the range of temperatures. The names never change.
/// </summary>
internal static class ModelCoefficients
{
    internal const string SignalKind = "signal-kind";
    internal const string Solubility = "solubility-equation";
    internal const string DepthCorrection = "depth-correction";
    internal const string PhasePerDepth = "phase-per-1000-dbar";
    internal const string Pressure = "pressure-coefficient";
    internal const string Second = "second-coefficient";
    internal const string Third = "third-coefficient";
    internal const string Residual = "residual-signal";
    internal const string ResidualPerKelvin = "residual-per-kelvin";
    internal const string Flow = "flow-factor";
    internal const string LifetimePerKelvin = "lifetime-per-kelvin";
    internal const string LifetimePerSquareKelvin = "lifetime-per-square-kelvin";
    internal const string ZeroPerKelvin = "zero-per-kelvin";
    internal const string PerKelvin = "per-kelvin";
    internal const string Reference = "reference-celsius";
    internal const string Lowest = "lowest-celsius";
    internal const string Highest = "highest-celsius";

    private static readonly ModelCoefficient[] Range =
    [
        new(Lowest, "degC", null, "lower end of the range of temperatures that they hold for"),
        new(Highest, "degC", null, "upper end of that range"),
    ];

    private static readonly ModelCoefficient[] Membrane =
    [
        new(Second, "1/K2", 0, "c2 of a polynomial temperature coefficient"),
        new(Third, "1/K3", 0, "c3 of a polynomial temperature coefficient"),
        new(Pressure, "1 per 100 dbar", 0, "relative change of the signal per 100 dbar of water above"),
    ];

    private static readonly Dictionary<string, ModelCoefficient[]> Models = new()
    {
        [ModelNames.Amperometric] =
        [
            .. Membrane,
            new(Residual, "signal", 0, "signal without gas at the reference temperature"),
            new(ResidualPerKelvin, "1/K", 0, "relative change of the residual signal per kelvin"),
            new(Flow, "1", 1, "signal in still water over signal in stirred water"),
        ],
        [ModelNames.MeterDisplay] = [],
        [ModelNames.SternVolmer] =
        [
            new(SignalKind, "phase, lifetime or intensity", null, "what the signal is", ["phase", "lifetime", "intensity"]),
            new(LifetimePerKelvin, "1/K", null, "relative change of the unquenched lifetime per kelvin"),
            new(LifetimePerSquareKelvin, "1/K2", 0, "its curvature"),
            .. Membrane,
        ],
        [ModelNames.Uchida2008] =
        [
            .. Phases(7),
            new(Solubility, "benson-krause-1984 or garcia-gordon-1992", 2, "equation by which the maker's µmol/L became a partial pressure", ["benson-krause-1984", "garcia-gordon-1992"]),
            new(DepthCorrection, "uchida-2008 or bittig-2015", 1, "published correction for depth", ["uchida-2008", "bittig-2015"]),
            new(PhasePerDepth, "degree", 0, "degrees that the phase loses per 1000 dbar"),
            .. Range,
        ],
        [ModelNames.Bittig2018] =
        [
            .. Phases(7),
            new("c7", "", 0, "eighth coefficient"),
            new(DepthCorrection, "uchida-2008 or bittig-2015", 2, "published correction for depth", ["uchida-2008", "bittig-2015"]),
            new(PhasePerDepth, "degree", 0, "degrees that the phase loses per 1000 dbar"),
            .. Range,
        ],
        [ModelNames.Severinghaus] = [new(ZeroPerKelvin, "mV/K", 0, "change of E0 per kelvin"), new(Reference, "degC", 25, "temperature of E0 and slope"), .. Range],
        [ModelNames.TotalGas] = Range,
        [ModelNames.Linear] = [new(PerKelvin, "1/K", 0, "relative change of the slope per kelvin"), new(Reference, "degC", 25, "temperature of the slope"), .. Range],
        [ModelNames.Quadratic] = [new(PerKelvin, "1/K", 0, "relative change of the slope per kelvin"), new(Reference, "degC", 25, "temperature of the slope"), .. Range],
    };

    /// <summary>The models whose coefficients are described here.</summary>
    internal static IEnumerable<string> Described => Models.Keys;

    /// <summary>The coefficients of a model.</summary>
    /// <exception cref="InputException">There is no such model.</exception>
    internal static ModelCoefficient[] Of(string model)
    {
        return Models.TryGetValue(model, out ModelCoefficient[]? found)
            ? found
            : throw Wrong.Input("model", model, "there is no such response model" + NearestName.DidYouMean(model, Models.Keys) + "; there are " + string.Join(", ", Models.Keys));
    }

    /// <summary>True when the model takes its temperature coefficient from a text of its own, as a membrane does.</summary>
    internal static bool HasTemperatureCoefficient(string model)
    {
        return model is ModelNames.Amperometric or ModelNames.MeterDisplay or ModelNames.SternVolmer;
    }

    /// <summary>A coefficient of a probe, or what stands where it is not given.</summary>
    /// <exception cref="InputException">It is not given and must be.</exception>
    internal static double Value(RecordedProbe probe, string name)
    {
        RecordedCoefficient? given = Array.Find(probe.Coefficients, each => each.Name == name);
        return given?.Value ?? Of(probe.Model).FirstOrDefault(each => each.Name == name)?.Default
            ?? throw new InputException($"probe {Wrong.Shown(probe.Id)}: its model {probe.Model} lacks the coefficient {name}");
    }

    private static IEnumerable<ModelCoefficient> Phases(int count)
    {
        string[] meanings = ["Ksv at 0 C", "change of Ksv per kelvin", "curvature of Ksv", "P0 at 0 C", "change of P0 per kelvin", "constant of Pc", "Pc per degree of phase"];
        return meanings.Take(count).Select((meaning, i) => new ModelCoefficient("c" + (char)('0' + i), "", null, meaning));
    }
}
