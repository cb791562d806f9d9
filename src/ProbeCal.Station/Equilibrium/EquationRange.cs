using System.Globalization;

namespace ProbeCal.Station.Equilibrium;

/// <summary>Where one equation holds for one gas.</summary>
/// <param name="LowestCelsius">Lowest temperature, °C.</param>
/// <param name="HighestCelsius">Highest temperature, °C.</param>
/// <param name="HighestSalinity">Highest practical salinity.</param>
/// <param name="HighestHectopascal">Highest total pressure, hPa.</param>
public sealed record EquationRange(double LowestCelsius, double HighestCelsius, double HighestSalinity, double HighestHectopascal)
{
    /// <summary>Lowest total pressure, hPa: 0.5 atm.</summary>
    public const double LowestHectopascal = BensonKrause1984.LowestHectopascal;

    /// <summary>Highest total pressure that is computed without fugacity, hPa: 1.1 atm.</summary>
    internal const double HighestMoistAirHectopascal = BensonKrause1984.HighestHectopascal;

    /// <summary>The range of temperature in words.</summary>
    internal string Temperatures => string.Create(CultureInfo.InvariantCulture, $"{LowestCelsius:0.##} to {HighestCelsius:0.##} °C");

    /// <summary>The range of an equation that covers the gas.</summary>
    internal static EquationRange Of(Gas gas, SolubilityEquation equation, double salinity)
    {
        SolubilityEntry entry = Catalogue.Solubility(gas, equation)!;
        return new EquationRange(entry.LowestCelsius(salinity), entry.HighestCelsius, entry.HighestSalinity, entry.HighestHectopascal);
    }
}
