using System.CommandLine;
using System.IO;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal equilibrium</c>: what water in equilibrium with air holds there.</summary>
internal static class EquilibriumCommand
{
    private static readonly string[] Formats = ["text", "json"];

    internal static Command Create(Terminal terminal)
    {
        Option<string> gas = new("--gas") { Description = "The gas. Oxygen (O2) so far.", DefaultValueFactory = static _ => "O2", HelpName = "O2" };
        Option<string> temperature = new("--temperature") { Description = "Water temperature: 20, 20C, 68F.", Required = true, HelpName = "T" };
        Option<string> salinity = new("--salinity") { Description = "Practical salinity; 0 for fresh water.", Required = true, HelpName = "S" };
        Option<string> pressure = new("--pressure") { Description = "Absolute station pressure with its unit: 760mmHg, 938hPa, 27.7inHg. Not the sea-level value of a weather service.", HelpName = "P" };
        Option<string> altitude = new("--altitude") { Description = "Altitude with its unit: 640m, 2100ft. Stands in for a barometer where --pressure is missing; with it, the pressure is judged.", HelpName = "Z" };
        Option<string> equation = new("--equation") { Description = "benson-krause-1984 or garcia-gordon-1992.", DefaultValueFactory = static _ => EquationNames.NameOf(EquationNames.Default), HelpName = "NAME" };
        Option<string> temperatureUncertainty = new("--temperature-uncertainty") { Description = "Standard uncertainty of the temperature: 0.1K.", HelpName = "u" };
        Option<string> salinityUncertainty = new("--salinity-uncertainty") { Description = "Standard uncertainty of the salinity: 0.1.", HelpName = "u" };
        Option<string> pressureUncertainty = new("--pressure-uncertainty") { Description = "Standard uncertainty of the pressure: 1hPa.", HelpName = "u" };
        Option<string> format = new("--format") { Description = "text or json.", DefaultValueFactory = static _ => "text", HelpName = "text|json" };
        Command command = new(
            "equilibrium",
            """
            What water in equilibrium with air holds of a gas, and how sure that is.

            Examples:
              probecal equilibrium --temperature 20 --salinity 0 --pressure 760mmHg
              probecal equilibrium --temperature 68F --salinity 35 --pressure 1009hPa --temperature-uncertainty 0.1K
              probecal equilibrium --temperature 8.4 --salinity 0 --altitude 640m --format json
            """)
        {
            gas, temperature, salinity, pressure, altitude, equation, temperatureUncertainty, salinityUncertainty, pressureUncertainty, format,
        };
        command.SetAction(parsed =>
        {
            string gasName = parsed.GetValue(gas)!;
            if (!string.Equals(gasName, "O2", System.StringComparison.OrdinalIgnoreCase))
            {
                throw new InputException($"--gas '{gasName}': no equation for it yet; there is O2");
            }

            string shape = parsed.GetValue(format)!;
            if (System.Array.IndexOf(Formats, shape) < 0)
            {
                throw new InputException($"--format '{shape}': there are text and json");
            }

            StationPressure air = StationPressure.Parse(parsed.GetValue(pressure), parsed.GetValue(altitude), parsed.GetValue(pressureUncertainty));
            WaterConditions conditions = new(
                Quantity.TemperatureCelsius("--temperature", parsed.GetValue(temperature)!),
                Quantity.Salinity("--salinity", parsed.GetValue(salinity)!),
                air.Hectopascal,
                air.Source,
                Uncertainty(QuantityKind.TemperatureDifference, "--temperature-uncertainty", parsed.GetValue(temperatureUncertainty)),
                Uncertainty(QuantityKind.Salinity, "--salinity-uncertainty", parsed.GetValue(salinityUncertainty)),
                air.UncertaintyHectopascal);
            OxygenAtEquilibrium result = OxygenAtEquilibrium.Compute(EquationNames.Parse("--equation", parsed.GetValue(equation)!), conditions);
            if (air.Note is string note)
            {
                terminal.Error.WriteLine("note: " + note);
            }

            TextWriter output = terminal.Output;
            if (shape == "json")
            {
                output.WriteLine(EquilibriumJson.Of(result));
            }
            else
            {
                EquilibriumText.Write(output, result);
            }

            return ExitCode.Done;
        });
        return command;
    }

    private static double Uncertainty(QuantityKind kind, string option, string? text)
    {
        if (text is null)
        {
            return 0;
        }

        double value = Quantity.Parse(kind, option, text);
        return 0 <= value ? value : throw new InputException($"{option} {text}: a standard uncertainty is zero or above");
    }
}
