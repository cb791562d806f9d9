using System.Text.Json;
using System.Text.Json.Serialization;
using ProbeCal.Station.InWater;

namespace ProbeCal.Host.Commands;

/// <summary>A total-gas reading printed for programs; the fields are in <c>docs/schemas/total-gas.schema.json</c>.</summary>
internal sealed record TotalGasJson
{
    [JsonPropertyName("format")] public string Format { get; init; } = "probecal-total-gas";
    [JsonPropertyName("version")] public int Version { get; init; } = 1;
    [JsonPropertyName("temperatureC")] public required double TemperatureC { get; init; }
    [JsonPropertyName("salinity")] public required double Salinity { get; init; }
    [JsonPropertyName("pressureHPa")] public required double PressureHPa { get; init; }
    [JsonPropertyName("pressureSource")] public required string PressureSource { get; init; }
    [JsonPropertyName("measured")] public required string Measured { get; init; }
    [JsonPropertyName("totalPressureHPa")] public required double TotalPressureHPa { get; init; }
    [JsonPropertyName("deltaPHPa")] public required double DeltaPHPa { get; init; }
    [JsonPropertyName("totalGasPercent")] public required double TotalGasPercent { get; init; }
    [JsonPropertyName("vapourPressureHPa")] public required double VapourPressureHPa { get; init; }
    [JsonPropertyName("oxygenMgPerL")] public required double? OxygenMgPerL { get; init; }
    [JsonPropertyName("oxygenHPa")] public required double? OxygenHPa { get; init; }
    [JsonPropertyName("oxygenPercent")] public required double? OxygenPercent { get; init; }
    [JsonPropertyName("nitrogenArgonHPa")] public required double? NitrogenArgonHPa { get; init; }
    [JsonPropertyName("nitrogenArgonPercent")] public required double? NitrogenArgonPercent { get; init; }
    [JsonPropertyName("carbonDioxideHPa")] public required double? CarbonDioxideHPa { get; init; }
    [JsonPropertyName("compensationDepthM")] public required double CompensationDepthM { get; init; }
    [JsonPropertyName("depthM")] public required double? DepthM { get; init; }
    [JsonPropertyName("deltaPAtDepthHPa")] public required double? DeltaPAtDepthHPa { get; init; }
    [JsonPropertyName("nearEdge")] public required bool NearEdge { get; init; }
    [JsonPropertyName("caution")] public required string? Caution { get; init; }
    [JsonPropertyName("standardUncertainty")] public required UncertaintyPart StandardUncertainty { get; init; }

    internal sealed record UncertaintyPart
    {
        [JsonPropertyName("temperatureK")] public required double TemperatureK { get; init; }
        [JsonPropertyName("salinity")] public required double Salinity { get; init; }
        [JsonPropertyName("pressureHPa")] public required double PressureHPa { get; init; }
        [JsonPropertyName("totalPressureHPa")] public required double TotalPressureHPa { get; init; }
        [JsonPropertyName("deltaPHPa")] public required double DeltaPHPa { get; init; }
        [JsonPropertyName("totalGasPercent")] public required double TotalGasPercent { get; init; }
        [JsonPropertyName("oxygenMgPerL")] public required double? OxygenMgPerL { get; init; }
        [JsonPropertyName("oxygenHPa")] public required double? OxygenHPa { get; init; }
        [JsonPropertyName("oxygenPercent")] public required double? OxygenPercent { get; init; }
        [JsonPropertyName("nitrogenArgonHPa")] public required double? NitrogenArgonHPa { get; init; }
        [JsonPropertyName("nitrogenArgonPercent")] public required double? NitrogenArgonPercent { get; init; }
        [JsonPropertyName("compensationDepthM")] public required double CompensationDepthM { get; init; }
        [JsonPropertyName("deltaPAtDepthHPa")] public required double? DeltaPAtDepthHPa { get; init; }
    }

    internal static string Of(TotalGas g)
    {
        TotalGasReading r = g.Reading;
        TotalGasJson json = new()
        {
            TemperatureC = r.Temperature.Value,
            Salinity = r.Salinity.Value,
            PressureHPa = r.Air.Hectopascal,
            PressureSource = r.Air.Source,
            Measured = r.IsTotalMeasured ? "total-pressure" : "delta-p",
            TotalPressureHPa = g.Total.Value,
            DeltaPHPa = g.Delta.Value,
            TotalGasPercent = g.Percent.Value,
            VapourPressureHPa = g.VapourHectopascal,
            OxygenMgPerL = g.Parts?.OxygenMilligramsPerLitre.Value,
            OxygenHPa = g.Parts?.OxygenHectopascal.Value,
            OxygenPercent = g.Parts?.OxygenPercent.Value,
            NitrogenArgonHPa = g.Parts?.NitrogenArgonHectopascal.Value,
            NitrogenArgonPercent = g.Parts?.NitrogenArgonPercent.Value,
            CarbonDioxideHPa = r.CarbonDioxideHectopascal,
            CompensationDepthM = g.CompensationDepthMetres.Value,
            DepthM = r.DepthMetres,
            DeltaPAtDepthHPa = g.DeltaAtDepth?.Value,
            NearEdge = g.IsNearEdge,
            Caution = g.Caution,
            StandardUncertainty = new UncertaintyPart
            {
                TemperatureK = r.Temperature.StandardUncertainty,
                Salinity = r.Salinity.StandardUncertainty,
                PressureHPa = r.Air.UncertaintyHectopascal,
                TotalPressureHPa = g.Total.StandardUncertainty,
                DeltaPHPa = g.Delta.StandardUncertainty,
                TotalGasPercent = g.Percent.StandardUncertainty,
                OxygenMgPerL = g.Parts?.OxygenMilligramsPerLitre.StandardUncertainty,
                OxygenHPa = g.Parts?.OxygenHectopascal.StandardUncertainty,
                OxygenPercent = g.Parts?.OxygenPercent.StandardUncertainty,
                NitrogenArgonHPa = g.Parts?.NitrogenArgonHectopascal.StandardUncertainty,
                NitrogenArgonPercent = g.Parts?.NitrogenArgonPercent.StandardUncertainty,
                CompensationDepthM = g.CompensationDepthMetres.StandardUncertainty,
                DeltaPAtDepthHPa = g.DeltaAtDepth?.StandardUncertainty,
            },
        };
        return JsonSerializer.Serialize(json, TotalGasJsonContext.Default.TotalGasJson);
    }
}

/// <summary>Generated at build time, so that the native program needs no reflection.</summary>
[JsonSerializable(typeof(TotalGasJson))]
[JsonSourceGenerationOptions(WriteIndented = false)]
internal sealed partial class TotalGasJsonContext : JsonSerializerContext;
