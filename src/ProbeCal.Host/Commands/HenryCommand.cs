using System.CommandLine;
using ProbeCal.Station.InWater;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal henry</c>: a Henry's-law constant in every form it is written in.</summary>
internal static class HenryCommand
{
    internal static Command Create(Terminal terminal)
    {
        Option<string> gas = Of("--gas", "gas", "Formula or English name: O2, CO2, methane. Oxygen when left out.");
        Option<string> equation = Of("--equation", "name", "Solubility equation by author and year; the gas's default when left out (probecal equations).");
        Option<string> given = Of("--given", "form=constant", "In place of a gas: a constant to convert, Bunsen=0.0283, Hcp=1.3e-5, \"mol/(L·atm)=1.3e-3\".");
        Option<string> temperature = Of("--temperature", "T", "Water temperature: 20, 20C, 68F.");
        Option<string> temperatureUncertainty = Of("--temperature-uncertainty", "u", "Standard uncertainty of the temperature: 0.1K.");
        Option<string> salinity = Of("--salinity", "S", "Practical salinity; 0 for fresh water.");
        Option<string> format = new("--format") { Description = "text or json.", DefaultValueFactory = static _ => "text", HelpName = "text|json" };
        Command command = new(
            "henry",
            """
            The Henry's-law constant of a gas in every form it is written in: the gas's own, or a given one.

            Examples:
              probecal henry --gas CO2 --temperature 20 --salinity 35
              probecal henry --gas CH4 --equation sander-2023 --temperature 77F --salinity 0 \
                --temperature-uncertainty 0.1K
              probecal henry --given Bunsen=0.0283 --temperature 25 --salinity 0 --format json
            """)
        {
            gas, equation, given, temperature, temperatureUncertainty, salinity, format,
        };
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format)!);
            HenryConstant constant = new HenryEntry
            {
                Gas = parsed.GetValue(gas),
                Equation = parsed.GetValue(equation),
                Given = parsed.GetValue(given),
                Temperature = parsed.GetValue(temperature),
                TemperatureUncertainty = parsed.GetValue(temperatureUncertainty),
                Salinity = parsed.GetValue(salinity),
            }.Read();
            if (json)
            {
                terminal.Output.WriteLine(HenryJson.Of(constant));
            }
            else
            {
                HenryText.Write(terminal.Page(), constant);
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
