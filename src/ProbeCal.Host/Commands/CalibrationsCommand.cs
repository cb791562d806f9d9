using System.CommandLine;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal calibrations</c>.</summary>
internal static class CalibrationsCommand
{
    internal static Command Create(Terminal terminal)
    {
        Command command = new("calibrations", "(being built)");
        command.SetAction(int (_) => throw new WorkFailedException("calibrations: not built yet at " + terminal.Time.GetUtcNow().ToString("O", System.Globalization.CultureInfo.InvariantCulture)));
        return command;
    }
}
