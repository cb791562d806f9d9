using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.InWater;

/// <summary>The words in which a person describes a water: each as typed, with its unit; null for what was not said.</summary>
public sealed record WaterDescription
{
    /// <summary>Water temperature: <c>20</c>, <c>68F</c>. Required.</summary>
    public string? Temperature { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? TemperatureUncertainty { get; init; }

    /// <summary>Practical salinity. Exactly one of this and the three below is required.</summary>
    public string? Salinity { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? SalinityUncertainty { get; init; }

    /// <summary>Conductivity at the temperature of the water, not compensated.</summary>
    public string? Conductivity { get; init; }

    /// <summary>Conductivity compensated to 25 °C.</summary>
    public string? SpecificConductance { get; init; }

    /// <summary>Standard uncertainty of the conductivity, whichever was given.</summary>
    public string? ConductivityUncertainty { get; init; }

    /// <summary>Chlorinity, g/kg.</summary>
    public string? Chlorinity { get; init; }

    /// <summary>Understands the words and computes.</summary>
    /// <exception cref="InputException">Something is missing, said twice, cannot be read or lies outside every range; one line says what.</exception>
    public WaterProperties Read()
    {
        if (Temperature is null)
        {
            throw new InputException("--temperature is missing: the temperature of the water, for example --temperature 20 or 68F");
        }

        double celsius = Quantity.TemperatureCelsius("--temperature", Temperature);
        if (!(WaterProperties.LowestCelsius <= celsius && celsius <= WaterProperties.HighestCelsius))
        {
            throw Wrong.Input("--temperature", Temperature, string.Create(CultureInfo.InvariantCulture,
                $"water is described here from {WaterProperties.LowestCelsius} to {WaterProperties.HighestCelsius} °C"));
        }

        double uCelsius = Uncertainty(QuantityKind.TemperatureDifference, "--temperature-uncertainty", TemperatureUncertainty, true, "");
        (string Option, string Text)[] given = [.. new[]
        {
            ("--salinity", Salinity), ("--conductivity", Conductivity), ("--specific-conductance", SpecificConductance), ("--chlorinity", Chlorinity),
        }.Where(static each => each.Item2 is not null).Select(static each => (each.Item1, each.Item2!))];
        if (given.Length != 1)
        {
            throw new InputException(given.Length == 0
                ? "--salinity is missing: 0 for fresh water, or in its place --conductivity 42mS/cm (not compensated), --specific-conductance 500uS/cm (at 25 °C) or --chlorinity 19.4"
                : string.Join(" and ", given.Select(static each => each.Option)) + " each say how salty the water is; give one of them");
        }

        bool conducts = given[0].Option is "--conductivity" or "--specific-conductance";
        double uSalinity = Uncertainty(QuantityKind.Salinity, "--salinity-uncertainty", SalinityUncertainty, given[0].Option == "--salinity", "--salinity");
        double uConductivity = Uncertainty(QuantityKind.Conductivity, "--conductivity-uncertainty", ConductivityUncertainty, conducts, "a conductivity");
        WaterSalt salt = given[0].Option switch
        {
            "--salinity" => WaterSalt.Given(given[0].Text, uSalinity),
            "--conductivity" => WaterSalt.OfConductivity(given[0].Text, uConductivity, celsius, Temperature, uCelsius),
            "--specific-conductance" => WaterSalt.OfSpecificConductance(given[0].Text, uConductivity),
            _ => WaterSalt.OfChlorinity(given[0].Text),
        };
        return WaterProperties.Compute(celsius, uCelsius, salt);
    }

    private static double Uncertainty(QuantityKind kind, string option, string? text, bool belongs, string to)
    {
        if (text is null)
        {
            return 0;
        }

        if (!belongs)
        {
            throw new InputException($"{option} belongs to {to}, which is not given");
        }

        double value = Quantity.Parse(kind, option, text);
        return 0 <= value ? value : throw Wrong.Input(option, text, "a standard uncertainty is zero or above");
    }
}
