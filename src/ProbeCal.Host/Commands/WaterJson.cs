using System.Collections.Generic;
using System.Linq;
using System.Text.Json;
using System.Text.Json.Serialization;
using ProbeCal.Station.InWater;

namespace ProbeCal.Host.Commands;

/// <summary>The properties of a water printed for programs; the fields are in <c>docs/schemas/water.schema.json</c>.</summary>
internal sealed record WaterJson
{
    [JsonPropertyName("format")] public string Format { get; init; } = "probecal-water";
    [JsonPropertyName("version")] public int Version { get; init; } = 1;
    [JsonPropertyName("temperatureC")] public required double TemperatureC { get; init; }
    [JsonPropertyName("salinity")] public required double Salinity { get; init; }
    [JsonPropertyName("salinitySource")] public required string SalinitySource { get; init; }
    [JsonPropertyName("chlorinityGPerKg")] public required double ChlorinityGPerKg { get; init; }
    [JsonPropertyName("conductivityUSPerCm")] public required double? ConductivityUSPerCm { get; init; }
    [JsonPropertyName("specificConductanceUSPerCm")] public required double? SpecificConductanceUSPerCm { get; init; }
    [JsonPropertyName("specificConductanceNaturalWaterUSPerCm")] public required double? SpecificConductanceNaturalWaterUSPerCm { get; init; }
    [JsonPropertyName("fieldRelationSalinity")] public required double? FieldRelationSalinity { get; init; }
    [JsonPropertyName("densityKgPerM3")] public required double? DensityKgPerM3 { get; init; }
    [JsonPropertyName("pureWaterDensityKgPerM3")] public required double? PureWaterDensityKgPerM3 { get; init; }
    [JsonPropertyName("freezingPointC")] public required double? FreezingPointC { get; init; }
    [JsonPropertyName("vapourPressureHPa")] public required double? VapourPressureHPa { get; init; }
    [JsonPropertyName("vapourEquation")] public required string VapourEquation { get; init; }
    [JsonPropertyName("vapourForms")] public required IReadOnlyList<VapourPart> VapourForms { get; init; }
    [JsonPropertyName("standardUncertainty")] public required UncertaintyPart StandardUncertainty { get; init; }
    [JsonPropertyName("notes")] public required IReadOnlyList<string> Notes { get; init; }

    internal sealed record VapourPart
    {
        [JsonPropertyName("equation")] public required string Equation { get; init; }
        [JsonPropertyName("freshHPa")] public required double? FreshHPa { get; init; }
        [JsonPropertyName("deviationPercent")] public required double? DeviationPercent { get; init; }
        [JsonPropertyName("thisWaterHPa")] public required double? ThisWaterHPa { get; init; }
    }

    internal sealed record UncertaintyPart
    {
        [JsonPropertyName("temperatureK")] public required double TemperatureK { get; init; }
        [JsonPropertyName("salinity")] public required double Salinity { get; init; }
        [JsonPropertyName("densityKgPerM3")] public required double? DensityKgPerM3 { get; init; }
        [JsonPropertyName("pureWaterDensityKgPerM3")] public required double? PureWaterDensityKgPerM3 { get; init; }
        [JsonPropertyName("freezingPointK")] public required double? FreezingPointK { get; init; }
        [JsonPropertyName("vapourPressureHPa")] public required double? VapourPressureHPa { get; init; }
    }

    internal static string Of(WaterProperties w)
    {
        WaterJson json = new()
        {
            TemperatureC = w.TemperatureCelsius,
            Salinity = w.Salt.Salinity,
            SalinitySource = WaterWords.SourceName(w.Salt.Source),
            ChlorinityGPerKg = w.Salt.ChlorinityGramsPerKilogram,
            ConductivityUSPerCm = w.Salt.ConductivityMillisiemensPerCentimetre * 1000,
            SpecificConductanceUSPerCm = w.Salt.LinearAt25MicrosiemensPerCentimetre,
            SpecificConductanceNaturalWaterUSPerCm = w.Salt.NaturalAt25MicrosiemensPerCentimetre,
            FieldRelationSalinity = w.Salt.FieldRelationSalinity,
            DensityKgPerM3 = w.Density.Value,
            PureWaterDensityKgPerM3 = w.PureWaterDensity.Value,
            FreezingPointC = w.FreezingPoint.Value,
            VapourPressureHPa = w.VapourPressure.Value,
            VapourEquation = w.VapourEquation,
            VapourForms = [.. w.VapourForms.Select(static form => new VapourPart
            {
                Equation = form.Equation,
                FreshHPa = form.FreshHectopascal,
                DeviationPercent = form.DeviationPercent,
                ThisWaterHPa = form.SaltHectopascal,
            })],
            StandardUncertainty = new UncertaintyPart
            {
                TemperatureK = w.TemperatureUncertaintyKelvin,
                Salinity = w.Salt.Uncertainty,
                DensityKgPerM3 = w.Density.Uncertainty,
                PureWaterDensityKgPerM3 = w.PureWaterDensity.Uncertainty,
                FreezingPointK = w.FreezingPoint.Uncertainty,
                VapourPressureHPa = w.VapourPressure.Uncertainty,
            },
            Notes = w.Notes,
        };
        return JsonSerializer.Serialize(json, WaterJsonContext.Default.WaterJson);
    }
}

/// <summary>Generated at build time, so that the native program needs no reflection.</summary>
[JsonSerializable(typeof(WaterJson))]
[JsonSourceGenerationOptions(WriteIndented = false)]
internal sealed partial class WaterJsonContext : JsonSerializerContext;
