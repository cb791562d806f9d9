using System.CommandLine;
using ProbeCal.Station.InWater;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal total-gas</c>: what a total-gas reading says of the water.</summary>
internal static class TotalGasCommand
{
    internal static Command Create(Terminal terminal)
    {
        Option<string> total = Of("--total-pressure", "P", "Absolute pressure of all dissolved gases: 780mmHg, 1040hPa.");
        Option<string> delta = Of("--delta-p", "dP", "In place of it: their excess over the air, 25mmHg, below 0 where the water holds less.");
        Option<string> totalUncertainty = Of("--total-pressure-uncertainty", "u", "Standard uncertainty of the one that is given: 2hPa.");
        Option<string> pressure = Of("--pressure", "P", "Absolute station pressure with its unit: 760mmHg, 938hPa.");
        Option<string> pressureUncertainty = Of("--pressure-uncertainty", "u", "Standard uncertainty of the pressure: 1hPa.");
        Option<string> seaLevel = Of("--sea-level-pressure", "P", "Second best, with --altitude: a pressure reduced to sea level, as weather services tell it.");
        Option<string> airTemperature = Of("--air-temperature", "T", "Air temperature at the station, for --sea-level-pressure.");
        Option<string> altitude = Of("--altitude", "Z", "Altitude with its unit: 640m, 2100ft. Alone it stands in for a barometer.");
        Option<string> temperature = Of("--temperature", "T", "Water temperature: 20, 20C, 68F.");
        Option<string> temperatureUncertainty = Of("--temperature-uncertainty", "u", "Standard uncertainty of the temperature: 0.1K.");
        Option<string> salinity = Of("--salinity", "S", "Practical salinity; 0 for fresh water.");
        Option<string> salinityUncertainty = Of("--salinity-uncertainty", "u", "Standard uncertainty of the salinity: 0.1.");
        Option<string> concentration = Of("--concentration", "C", "Oxygen in the water, which splits the total: 9.8mg/L, 300umol/L.");
        Option<string> concentrationUncertainty = Of("--concentration-uncertainty", "u", "Its standard uncertainty: 0.1mg/L.");
        Option<string> carbonDioxide = Of("--carbon-dioxide", "p", "Partial pressure of carbon dioxide: 5hPa. Neglected when left out.");
        Option<string> depth = Of("--depth", "Z", "A depth at which the excess is wanted: 2m.");
        Option<string> format = new("--format") { Description = "text or json.", DefaultValueFactory = static _ => "text", HelpName = "text|json" };
        Command command = new(
            "total-gas",
            """
            Total dissolved gas: excess pressure, percent, compensation depth, and what of it is oxygen.

            Examples:
              probecal total-gas --total-pressure 780mmHg --pressure 745mmHg --temperature 12 --salinity 0
              probecal total-gas --delta-p 48hPa --pressure 993hPa --temperature 14.2 --salinity 0 \
                --concentration 11.2mg/L --depth 1.5m
              probecal total-gas --total-pressure 1058hPa --total-pressure-uncertainty 2hPa --altitude 220m \
                --temperature 9 --salinity 0 --format json
            """)
        {
            total, delta, totalUncertainty, pressure, pressureUncertainty, seaLevel, airTemperature, altitude, temperature, temperatureUncertainty,
            salinity, salinityUncertainty, concentration, concentrationUncertainty, carbonDioxide, depth, format,
        };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format)!);
            TotalGas gas = new TotalGasEntry
            {
                TotalPressure = parsed.GetValue(total),
                DeltaPressure = parsed.GetValue(delta),
                TotalPressureUncertainty = parsed.GetValue(totalUncertainty),
                Pressure = parsed.GetValue(pressure),
                PressureUncertainty = parsed.GetValue(pressureUncertainty),
                SeaLevelPressure = parsed.GetValue(seaLevel),
                AirTemperature = parsed.GetValue(airTemperature),
                Altitude = parsed.GetValue(altitude),
                Temperature = parsed.GetValue(temperature),
                TemperatureUncertainty = parsed.GetValue(temperatureUncertainty),
                Salinity = parsed.GetValue(salinity),
                SalinityUncertainty = parsed.GetValue(salinityUncertainty),
                Concentration = parsed.GetValue(concentration),
                ConcentrationUncertainty = parsed.GetValue(concentrationUncertainty),
                CarbonDioxide = parsed.GetValue(carbonDioxide),
                Depth = parsed.GetValue(depth),
            }.Read();
            if (gas.Reading.Air.Note is string note)
            {
                terminal.Error.WriteLine("note: " + note);
            }

            if (json)
            {
                terminal.Output.WriteLine(TotalGasJson.Of(gas));
            }
            else
            {
                TotalGasText.Write(terminal.Page(), gas);
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
