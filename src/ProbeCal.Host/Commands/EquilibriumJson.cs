using System.Text.Json;
using System.Text.Json.Serialization;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Host.Commands;

/// <summary>An equilibrium value printed for programs; the fields are in <c>docs/schemas/equilibrium.schema.json</c>.</summary>
internal sealed record EquilibriumJson
{
    [JsonPropertyName("format")] public string Format { get; init; } = "probecal-equilibrium";
    [JsonPropertyName("version")] public int Version { get; init; } = 1;
    [JsonPropertyName("gas")] public string Gas { get; init; } = "O2";
    [JsonPropertyName("equation")] public required string Equation { get; init; }
    [JsonPropertyName("temperatureC")] public required double TemperatureC { get; init; }
    [JsonPropertyName("salinity")] public required double Salinity { get; init; }
    [JsonPropertyName("pressureHPa")] public required double PressureHPa { get; init; }
    [JsonPropertyName("pressureSource")] public required string PressureSource { get; init; }
    [JsonPropertyName("vapourPressureHPa")] public required double VapourPressureHPa { get; init; }
    [JsonPropertyName("partialPressureHPa")] public required double PartialPressureHPa { get; init; }
    [JsonPropertyName("mgPerL")] public required double MgPerL { get; init; }
    [JsonPropertyName("umolPerL")] public required double UmolPerL { get; init; }
    [JsonPropertyName("umolPerKg")] public required double UmolPerKg { get; init; }
    [JsonPropertyName("mLPerL")] public required double MLPerL { get; init; }
    [JsonPropertyName("percentOfOneAtmosphere")] public required double PercentOfOneAtmosphere { get; init; }
    [JsonPropertyName("standardUncertainty")] public required UncertaintyPart StandardUncertainty { get; init; }

    internal sealed record UncertaintyPart
    {
        [JsonPropertyName("mgPerL")] public required double MgPerL { get; init; }
        [JsonPropertyName("partialPressureHPa")] public required double PartialPressureHPa { get; init; }
        [JsonPropertyName("temperatureK")] public required double TemperatureK { get; init; }
        [JsonPropertyName("salinity")] public required double Salinity { get; init; }
        [JsonPropertyName("pressureHPa")] public required double PressureHPa { get; init; }
    }

    internal static string Of(OxygenAtEquilibrium r)
    {
        WaterConditions c = r.Conditions;
        EquilibriumJson json = new()
        {
            Equation = EquationNames.NameOf(r.Equation),
            TemperatureC = c.TemperatureCelsius,
            Salinity = c.Salinity,
            PressureHPa = c.PressureHectopascal,
            PressureSource = c.PressureSource,
            VapourPressureHPa = r.VapourPressureHectopascal,
            PartialPressureHPa = r.PartialPressureHectopascal,
            MgPerL = r.MilligramsPerLitre,
            UmolPerL = r.MicromolesPerLitre,
            UmolPerKg = r.MicromolesPerKilogram,
            MLPerL = r.MillilitresPerLitre,
            PercentOfOneAtmosphere = r.PercentOfOneAtmosphere,
            StandardUncertainty = new UncertaintyPart
            {
                MgPerL = r.MilligramsPerLitreUncertainty,
                PartialPressureHPa = r.PartialPressureUncertaintyHectopascal,
                TemperatureK = c.TemperatureUncertaintyKelvin,
                Salinity = c.SalinityUncertainty,
                PressureHPa = c.PressureUncertaintyHectopascal,
            },
        };
        return JsonSerializer.Serialize(json, HostJson.Default.EquilibriumJson);
    }
}

/// <summary>The JSON that Host itself writes, generated at build time so that the native program needs no reflection.</summary>
[JsonSerializable(typeof(EquilibriumJson))]
[JsonSourceGenerationOptions(WriteIndented = false)]
internal sealed partial class HostJson : JsonSerializerContext;
