using System.Collections.Generic;
using System.Linq;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Host.Commands;

/// <summary>An explanation printed for programs; the fields are in <c>docs/schemas/explanation.schema.json</c>.</summary>
internal sealed record ExplanationJson
{
    [JsonPropertyName("format")] public string Format { get; init; } = "probecal-explanation";
    [JsonPropertyName("version")] public int Version { get; init; } = 1;
    [JsonPropertyName("gas")] public required string Gas { get; init; }
    [JsonPropertyName("equation")] public required string Equation { get; init; }
    [JsonPropertyName("result")] public required string Result { get; init; }
    [JsonPropertyName("value")] public required double Value { get; init; }
    [JsonPropertyName("unit")] public required string Unit { get; init; }
    [JsonPropertyName("nearEdge")] public required bool NearEdge { get; init; }
    [JsonPropertyName("origins")] public required IReadOnlyList<string> Origins { get; init; }
    [JsonPropertyName("steps")] public required IReadOnlyList<Step> Steps { get; init; }
    [JsonPropertyName("sources")] public required IReadOnlyList<Source> Sources { get; init; }

    internal sealed record Step
    {
        [JsonPropertyName("symbol")] public required string Symbol { get; init; }
        [JsonPropertyName("kind")] public required string Kind { get; init; }
        [JsonPropertyName("name")] public required string Name { get; init; }
        [JsonPropertyName("value")] public required double Value { get; init; }
        [JsonPropertyName("unit")] public required string Unit { get; init; }
        [JsonPropertyName("formula")] public string? Formula { get; init; }
        [JsonPropertyName("withNumbers")] public string? WithNumbers { get; init; }
        [JsonPropertyName("source")] public string? Source { get; init; }
    }

    internal sealed record Source
    {
        [JsonPropertyName("name")] public required string Name { get; init; }
        [JsonPropertyName("citation")] public required string Citation { get; init; }
        [JsonPropertyName("doi")] public string? Doi { get; init; }
    }

    internal static string Of(ExplainedEquilibrium explained)
    {
        Explanation explanation = explained.Explanation;
        ExplainedStep last = explanation.Steps[^1];
        ExplanationJson json = new()
        {
            Gas = GasNames.NameOf(explanation.Gas),
            Equation = EquationNames.NameOf(explanation.Equation),
            Result = last.Symbol,
            Value = last.Value,
            Unit = last.Unit,
            NearEdge = explained.NearEdge,
            Origins = ExplanationOrigins.Of(explained.Asked),
            Steps = [.. explanation.Steps.Select(Of)],
            Sources = [.. explanation.Sources.Select(static source => new Source { Name = source.Name, Citation = source.Citation, Doi = OrNull(source.Doi) })],
        };
        return JsonSerializer.Serialize(json, ExplanationJsonContext.Plain.ExplanationJson);
    }

    private static Step Of(ExplainedStep step)
    {
        return new Step
        {
            Symbol = step.Symbol,
            Kind = step.Kind switch
            {
                StepKind.Input => "input",
                StepKind.Coefficient => "coefficient",
                StepKind.Iterated => "iterated",
                _ => "computed",
            },
            Name = step.Name,
            Value = step.Value,
            Unit = step.Unit,
            Formula = OrNull(step.Formula),
            WithNumbers = OrNull(step.WithNumbers),
            Source = OrNull(step.Source),
        };
    }

    private static string? OrNull(string text)
    {
        return text.Length == 0 ? null : text;
    }
}

/// <summary>Generated at build time so that the native program needs no reflection. A plus sign stays a plus sign.</summary>
[JsonSerializable(typeof(ExplanationJson))]
internal sealed partial class ExplanationJsonContext : JsonSerializerContext
{
    internal static ExplanationJsonContext Plain { get; } = new(
        new JsonSerializerOptions { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping, DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull });
}
