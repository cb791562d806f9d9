using System.CommandLine;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal calibrate</c>.</summary>
internal static class CalibrateCommand
{
    internal static Command Create(Terminal terminal)
    {
        Command command = new("calibrate", "(being built)");
        command.SetAction(int (_) => throw new WorkFailedException("calibrate: not built yet at " + terminal.Time.GetUtcNow().ToString("O", System.Globalization.CultureInfo.InvariantCulture)));
        return command;
    }
}
