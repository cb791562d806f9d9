using System.Collections.Generic;
using System.Linq;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;

namespace ProbeCal.Host.Commands;

/// <summary>The catalogue printed for programs; the fields are in <c>docs/schemas/equations.schema.json</c>.</summary>
internal sealed record EquationsJson
{
    [JsonPropertyName("format")] public string Format { get; init; } = "probecal-equations";
    [JsonPropertyName("version")] public int Version { get; init; } = 1;
    [JsonPropertyName("gases")] public required IReadOnlyList<GasPart> Gases { get; init; }

    internal sealed record GasPart
    {
        [JsonPropertyName("gas")] public required string Gas { get; init; }
        [JsonPropertyName("name")] public required string Name { get; init; }
        [JsonPropertyName("formula")] public required string Formula { get; init; }
        [JsonPropertyName("aliases")] public required IReadOnlyList<string> Aliases { get; init; }
        [JsonPropertyName("gramsPerMole")] public required double GramsPerMole { get; init; }
        [JsonPropertyName("dryAirMoleFraction")] public double? DryAirMoleFraction { get; init; }
        [JsonPropertyName("equations")] public required IReadOnlyList<EquationPart> Equations { get; init; }
    }

    internal sealed record EquationPart
    {
        [JsonPropertyName("equation")] public required string Equation { get; init; }
        [JsonPropertyName("aliases")] public required IReadOnlyList<string> Aliases { get; init; }
        [JsonPropertyName("default")] public required bool Default { get; init; }
        [JsonPropertyName("why")] public required string Why { get; init; }
        [JsonPropertyName("quantity")] public required string Quantity { get; init; }
        [JsonPropertyName("unit")] public required string Unit { get; init; }
        [JsonPropertyName("lowestTemperatureC")] public required double LowestTemperatureC { get; init; }
        [JsonPropertyName("highestTemperatureC")] public required double HighestTemperatureC { get; init; }
        [JsonPropertyName("highestSalinity")] public required double HighestSalinity { get; init; }
        [JsonPropertyName("lowestPressureHPa")] public required double LowestPressureHPa { get; init; }
        [JsonPropertyName("highestPressureHPa")] public required double HighestPressureHPa { get; init; }
        [JsonPropertyName("statedAccuracy")] public required string StatedAccuracy { get; init; }
        [JsonPropertyName("evidence")] public required EvidencePart Evidence { get; init; }
        [JsonPropertyName("citation")] public required string Citation { get; init; }
        [JsonPropertyName("doi")] public required string Doi { get; init; }
    }

    internal sealed record EvidencePart
    {
        [JsonPropertyName("grade")] public required string Grade { get; init; }
        [JsonPropertyName("places")] public required int Places { get; init; }
        [JsonPropertyName("check")] public required string Check { get; init; }
    }

    internal static string Of(IEnumerable<GasEntry> gases)
    {
        EquationsJson json = new() { Gases = [.. gases.Select(Of)] };
        return JsonSerializer.Serialize(json, EquationsJsonContext.Plain.EquationsJson);
    }

    private static GasPart Of(GasEntry gas)
    {
        return new GasPart
        {
            Gas = gas.Symbol,
            Name = gas.Name,
            Formula = gas.Formula,
            Aliases = gas.Aliases,
            GramsPerMole = gas.GramsPerMole,
            DryAirMoleFraction = double.IsNaN(gas.DryAirMoleFraction) ? null : gas.DryAirMoleFraction,
            Equations = [.. Catalogue.SolubilitiesOf(gas.Gas).Select(Of)],
        };
    }

    private static EquationPart Of(SolubilityEntry entry)
    {
        return new EquationPart
        {
            Equation = entry.Source.Name,
            Aliases = entry.Source.Aliases,
            Default = entry.IsDefault,
            Why = entry.Why,
            Quantity = entry.Quantity,
            Unit = entry.Unit,
            // With the freezing point as lower end: that of the saltiest water.
            LowestTemperatureC = entry.LowestCelsius(entry.HighestSalinity),
            HighestTemperatureC = entry.HighestCelsius,
            HighestSalinity = entry.HighestSalinity,
            LowestPressureHPa = GasEquilibrium.LowestHectopascal,
            HighestPressureHPa = entry.HighestHectopascal,
            StatedAccuracy = entry.StatedAccuracy,
            Evidence = new EvidencePart
            {
                Grade = entry.Evidence.Grade switch
                {
                    EvidenceGrade.Read => "read",
                    EvidenceGrade.SecondHand => "second-hand",
                    EvidenceGrade.OnePlace => "one place",
                    _ => "memory",
                },
                Places = entry.Evidence.Places,
                Check = entry.Evidence.Check,
            },
            Citation = entry.Source.Citation,
            Doi = entry.Source.Doi,
        };
    }
}

/// <summary>Generated at build time so that the native program needs no reflection.</summary>
[JsonSerializable(typeof(EquationsJson))]
internal sealed partial class EquationsJsonContext : JsonSerializerContext
{
    internal static EquationsJsonContext Plain { get; } = new(
        new JsonSerializerOptions { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping, DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull });
}
