using System.Collections.Generic;
using System.Linq;
using System.Text.Json;
using System.Text.Json.Serialization;
using ProbeCal.Station.Entry;
using ProbeCal.Station.InWater;

namespace ProbeCal.Host.Commands;

/// <summary>A Henry's-law constant printed for programs; the fields are in <c>docs/schemas/henry.schema.json</c>.</summary>
internal sealed record HenryJson
{
    [JsonPropertyName("format")] public string Format { get; init; } = "probecal-henry";
    [JsonPropertyName("version")] public int Version { get; init; } = 1;
    [JsonPropertyName("gas")] public required string? Gas { get; init; }
    [JsonPropertyName("equation")] public required string? Equation { get; init; }
    [JsonPropertyName("given")] public required GivenPart? Given { get; init; }
    [JsonPropertyName("temperatureC")] public required double TemperatureC { get; init; }
    [JsonPropertyName("salinity")] public required double Salinity { get; init; }
    [JsonPropertyName("densityKgPerM3")] public required double DensityKgPerM3 { get; init; }
    [JsonPropertyName("constants")] public required IReadOnlyList<ConstantPart> Constants { get; init; }
    [JsonPropertyName("standardUncertainty")] public required UncertaintyPart StandardUncertainty { get; init; }
    [JsonPropertyName("notes")] public required IReadOnlyList<string> Notes { get; init; }

    internal sealed record GivenPart
    {
        [JsonPropertyName("form")] public required string Form { get; init; }
        [JsonPropertyName("value")] public required double Value { get; init; }
    }

    internal sealed record ConstantPart
    {
        [JsonPropertyName("form")] public required string Form { get; init; }
        [JsonPropertyName("unit")] public required string Unit { get; init; }
        [JsonPropertyName("value")] public required double Value { get; init; }
        [JsonPropertyName("standardUncertainty")] public required double StandardUncertainty { get; init; }
    }

    internal sealed record UncertaintyPart
    {
        [JsonPropertyName("temperatureK")] public required double TemperatureK { get; init; }
        [JsonPropertyName("equationPercent")] public required double? EquationPercent { get; init; }
    }

    internal static string Of(HenryConstant h)
    {
        HenryJson json = new()
        {
            Gas = h.Gas is Gas gas ? GasNames.NameOf(gas) : null,
            Equation = h.Equation is SolubilityEquation equation ? EquationNames.NameOf(equation) : null,
            Given = h.GivenValue is double given ? new GivenPart { Form = h.GivenForm!, Value = given } : null,
            TemperatureC = h.Temperature.Value,
            Salinity = h.Salinity,
            DensityKgPerM3 = h.DensityKilogramsPerCubicMetre,
            Constants = [.. h.Forms.Select(static form => new ConstantPart
            {
                Form = form.Form,
                Unit = form.Unit,
                Value = form.Value,
                StandardUncertainty = form.StandardUncertainty,
            })],
            StandardUncertainty = new UncertaintyPart
            {
                TemperatureK = h.Temperature.StandardUncertainty,
                EquationPercent = h.EquationRelative * 100,
            },
            Notes = h.Notes,
        };
        return JsonSerializer.Serialize(json, HenryJsonContext.Default.HenryJson);
    }
}

/// <summary>Generated at build time, so that the native program needs no reflection.</summary>
[JsonSerializable(typeof(HenryJson))]
[JsonSourceGenerationOptions(WriteIndented = false)]
internal sealed partial class HenryJsonContext : JsonSerializerContext;
