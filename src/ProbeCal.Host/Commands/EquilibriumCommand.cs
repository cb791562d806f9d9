using System.CommandLine;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal equilibrium</c>.</summary>
internal static class EquilibriumCommand
{
    internal static Command Create(Terminal terminal)
    {
        Command command = new("equilibrium", "(being built)");
        command.SetAction(int (_) => throw new WorkFailedException("equilibrium: not built yet at " + terminal.Time.GetUtcNow().ToString("O", System.Globalization.CultureInfo.InvariantCulture)));
        return command;
    }
}
