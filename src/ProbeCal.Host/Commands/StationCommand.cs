using System.CommandLine;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal station</c>.</summary>
internal static class StationCommand
{
    internal static Command Create(Terminal terminal)
    {
        Command command = new("station", "(being built)");
        command.SetAction(int (_) => throw new WorkFailedException("station: not built yet at " + terminal.Time.GetUtcNow().ToString("O", System.Globalization.CultureInfo.InvariantCulture)));
        return command;
    }
}
