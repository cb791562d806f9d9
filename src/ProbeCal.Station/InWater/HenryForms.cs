using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.InWater;

/// <summary>One way in which a Henry's-law constant is written.</summary>
/// <param name="Name">What it is called in commands and outputs.</param>
/// <param name="Unit">Its unit; 1 for a ratio.</param>
/// <param name="Meaning">What is divided by what.</param>
/// <param name="Form">The form of Core.</param>
/// <param name="PerSi">What the constant in the SI unit of the form is multiplied with.</param>
internal sealed record HenryFormEntry(string Name, string Unit, string Meaning, HenryForm Form, double PerSi = 1);

/// <summary>The ways in which a Henry's-law constant is written, by name.</summary>
internal static class HenryForms
{
    private const string LitreAtmosphere = "mol/(L·atm)";

    /// <summary>1 mol/(m³·Pa) is 101.325 mol/(L·atm): pascals in an atmosphere over litres in a cubic metre.</summary>
    private const double LitreAtmospherePerSi = PressureUnits.HectopascalPerAtmosphere * 100 / 1000;

    internal static IReadOnlyList<HenryFormEntry> All { get; } =
    [
        new("Hcp", "mol/(m³·Pa)", "concentration over partial pressure", HenryForm.Hcp),
        new(LitreAtmosphere, LitreAtmosphere, "the same in the usual unit", HenryForm.Hcp, LitreAtmospherePerSi),
        new("Hcc", "1", "concentration over that in the gas", HenryForm.Hcc),
        new("Hbp", "mol/(kg·Pa)", "molality over partial pressure", HenryForm.Hbp),
        new("Hxp", "1/Pa", "mole fraction over partial pressure", HenryForm.Hxp),
        new("Kpc", "Pa·m³/mol", "partial pressure over concentration", HenryForm.Kpc),
        new("Kpx", "Pa", "partial pressure over mole fraction", HenryForm.Kpx),
        new("Kcc", "1", "concentration in the gas over that in water", HenryForm.Kcc),
        new("Bunsen", "1", "volume of gas, at 0 °C, over that of water", HenryForm.Bunsen),
        new("Ostwald", "1", "volume of gas, as warm as the water, over it", HenryForm.Ostwald),
    ];

    /// <summary>The form of a name, whatever the case; a star or a dot may stand for the raised dot.</summary>
    internal static HenryFormEntry Parse(string what, string text, string name)
    {
        string plain = name.Replace('*', '·').Replace('.', '·');
        string[] names = [.. All.Select(static form => form.Name)];
        return All.FirstOrDefault(form => string.Equals(form.Name, plain, StringComparison.OrdinalIgnoreCase))
            ?? throw Wrong.Input(what, text, $"no such form of Henry's law is known here{NearestName.DidYouMean(name, names)}; there are {string.Join(", ", names)}");
    }
}
