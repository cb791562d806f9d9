using System;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Station.InWater;

/// <summary>The words in which a person asks for a Henry's-law constant: each as typed, with its unit; null for what was not said.</summary>
public sealed record HenryEntry
{
    /// <summary>Formula or English name of the gas; oxygen when not said.</summary>
    public string? Gas { get; init; }

    /// <summary>Name of the solubility equation; the default of the gas when not said.</summary>
    public string? Equation { get; init; }

    /// <summary>In place of a gas: a constant with its form, <c>Bunsen=0.0283</c>.</summary>
    public string? Given { get; init; }

    /// <summary>Water temperature: <c>20</c>, <c>68F</c>. Required.</summary>
    public string? Temperature { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? TemperatureUncertainty { get; init; }

    /// <summary>Practical salinity. Required.</summary>
    public string? Salinity { get; init; }

    /// <summary>Understands the words and computes.</summary>
    /// <exception cref="InputException">Something is missing, said twice, cannot be read or lies outside the range; one line says what.</exception>
    public HenryConstant Read()
    {
        EquilibriumEntry words = new() { Temperature = Temperature, TemperatureUncertainty = TemperatureUncertainty, Salinity = Salinity };
        UncertainQuantity temperature = words.ReadTemperature();
        if (Salinity is null)
        {
            throw new InputException("--salinity is missing: the practical salinity, 0 for fresh water");
        }

        double salinity = WaterSalinity.Read(words, temperature.Value).Salinity;
        if (Given is null)
        {
            Gas gas = Gas is null ? ProbeCal.Gas.Oxygen : GasNames.Parse("--gas", Gas);
            return HenryConstant.Of(gas, EquationNames.ParseOrDefault("--equation", Equation, gas), temperature, salinity);
        }

        if (Gas is not null || Equation is not null)
        {
            throw new InputException($"--given and {(Gas is null ? "--equation" : "--gas")} each say which constant it is; give one of them");
        }

        int sign = Given.IndexOf('=', StringComparison.Ordinal);
        if (sign < 0)
        {
            throw Wrong.Input("--given", Given, "write the form and the constant, for example Bunsen=0.0283 or Hcp=1.3e-5");
        }

        HenryFormEntry form = HenryForms.Parse("--given", Given, Given[..sign].Trim());
        return Number.TryParse(Given.AsSpan(sign + 1), out double constant, out string? problem)
            ? HenryConstant.OfGiven(form, constant, Given, temperature, salinity)
            : throw Wrong.Input("--given", Given, problem);
    }
}
