using System.CommandLine;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal explain</c>: an equilibrium value as a person would check it by hand.</summary>
internal static class ExplainCommand
{
    internal static Command Create(Terminal terminal)
    {
        EquilibriumOptions options = new();
        Option<string> format = new("--format") { Description = "text or json.", DefaultValueFactory = static _ => "text", HelpName = "text|json" };
        Command command = new(
            "explain",
            """
            The whole way to an equilibrium value, to be checked by hand: inputs, coefficients, every formula with its numbers, citations.

            Takes the conditions of 'probecal equilibrium'. With --concentration it goes the other way round, to partial pressure and saturation.

            Examples:
              probecal explain --temperature 20 --salinity 0 --pressure 760mmHg
              probecal explain --gas N2 --temperature 12 --salinity 30 --pressure 1009hPa
              probecal explain --gas CO2 --mole-fraction 420ppm --temperature 25 --salinity 35 \
                --pressure 1013hPa --format json
              probecal explain --temperature 14.2 --salinity 0 --pressure 961hPa --concentration 8.1mg/L
            """);
        options.AddTo(command);
        command.Options.Add(format);
        command.SetAction(parsed =>
        {
            bool json = OutputShape.IsJson(parsed.GetValue(format)!);
            EquilibriumCase asked = options.Entry(parsed).Read();
            ExplainedEquilibrium explained = ExplainedEquilibrium.Of(asked);
            foreach (string note in asked.Notes)
            {
                terminal.Error.WriteLine("note: " + note);
            }

            if (json)
            {
                terminal.Output.WriteLine(ExplanationJson.Of(explained));
            }
            else
            {
                ExplanationText.Write(terminal.Page(), explained);
            }

            return ExitCode.Done;
        });
        return command;
    }
}
