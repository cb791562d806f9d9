using System.CommandLine;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal simulate</c>.</summary>
internal static class SimulateCommand
{
    internal static Command Create(Terminal terminal)
    {
        Command command = new("simulate", "(being built)");
        command.SetAction(int (_) => throw new WorkFailedException("simulate: not built yet at " + terminal.Time.GetUtcNow().ToString("O", System.Globalization.CultureInfo.InvariantCulture)));
        return command;
    }
}
