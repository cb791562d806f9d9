using System.CommandLine;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal demo</c>.</summary>
internal static class DemoCommand
{
    internal static Command Create(Terminal terminal)
    {
        Command command = new("demo", "(being built)");
        command.SetAction(int (_) => throw new WorkFailedException("demo: not built yet at " + terminal.Time.GetUtcNow().ToString("O", System.Globalization.CultureInfo.InvariantCulture)));
        return command;
    }
}
