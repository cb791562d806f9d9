using System.CommandLine;
using ProbeCal.Station.Equilibrium;
using ProbeCal.Station.InWater;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal water</c>: what a water of a temperature and a salinity is like.</summary>
internal static class WaterCommand
{
    internal static Command Create(Terminal terminal)
    {
        Option<string> temperature = Of("--temperature", "T", "Water temperature: 20, 20C, 68F.");
        Option<string> salinity = Of("--salinity", "S", "Practical salinity; 0 for fresh water.");
        Option<string> conductivity = Of("--conductivity", "C", "In place of a salinity: conductivity as measured, 42mS/cm (PSS-78).");
        Option<string> conductivityTemperature = Of("--conductivity-temperature", "T", "The temperature it was measured at, where it is not the water's.");
        Option<string> specific = Of("--specific-conductance", "SC", "In place of a salinity: conductivity compensated to 25 °C, 500uS/cm.");
        Option<string> chlorinity = Of("--chlorinity", "Cl", "In place of a salinity: chlorinity in g/kg, 19.4.");
        Option<string> temperatureUncertainty = Of("--temperature-uncertainty", "u", "Standard uncertainty of the temperature: 0.1K.");
        Option<string> salinityUncertainty = Of("--salinity-uncertainty", "u", "Standard uncertainty of the salinity: 0.1.");
        Option<string> conductivityUncertainty = Of("--conductivity-uncertainty", "u", "Standard uncertainty of the conductivity: 5uS/cm.");
        Option<string> conductivityTemperatureUncertainty = Of("--conductivity-temperature-uncertainty", "u", "Standard uncertainty of the temperature it was measured at: 0.1K.");
        Option<string> chlorinityUncertainty = Of("--chlorinity-uncertainty", "u", "Standard uncertainty of the chlorinity: 0.01.");
        Option<string> format = new("--format") { Description = "text or json.", DefaultValueFactory = static _ => "text", HelpName = "text|json" };
        Command command = new(
            "water",
            """
            Salinity, density, freezing point and vapour pressure of a water: each by its published equation.

            Examples:
              probecal water --temperature 20 --salinity 35
              probecal water --temperature 12.4C --conductivity 310uS/cm
              probecal water --temperature 59F --specific-conductance 48mS/cm --format json
            """)
        {
            temperature, salinity, conductivity, conductivityTemperature, specific, chlorinity,
            temperatureUncertainty, salinityUncertainty, conductivityUncertainty, conductivityTemperatureUncertainty, chlorinityUncertainty, format,
        };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format)!);
            WaterProperties water = WaterDescription.Read(new EquilibriumEntry
            {
                Temperature = parsed.GetValue(temperature),
                TemperatureUncertainty = parsed.GetValue(temperatureUncertainty),
                Salinity = parsed.GetValue(salinity),
                SalinityUncertainty = parsed.GetValue(salinityUncertainty),
                Conductivity = parsed.GetValue(conductivity),
                ConductivityTemperature = parsed.GetValue(conductivityTemperature),
                ConductivityTemperatureUncertainty = parsed.GetValue(conductivityTemperatureUncertainty),
                SpecificConductance = parsed.GetValue(specific),
                ConductivityUncertainty = parsed.GetValue(conductivityUncertainty),
                Chlorinity = parsed.GetValue(chlorinity),
                ChlorinityUncertainty = parsed.GetValue(chlorinityUncertainty),
            });
            if (json)
            {
                terminal.Output.WriteLine(WaterJson.Of(water));
            }
            else
            {
                WaterText.Write(terminal.Page(), water);
            }

            return ExitCode.Done;
        });
        return command;
    }

    private static Option<string> Of(string name, string shown, string description)
    {
        return new Option<string>(name) { Description = description, HelpName = shown };
    }
}
