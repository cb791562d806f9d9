using System;
using System.CommandLine;
using System.Threading;
using System.Threading.Tasks;
using Microsoft.Extensions.Logging;
using ProbeCal.Station;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Engine;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal station</c>: streams corrected readings until it is stopped.</summary>
internal static class StationCommand
{
    internal static Command Create(Terminal terminal)
    {
        Option<string> config = new("--config") { Description = "Configuration file; docs/protocols.md describes it.", Required = true, HelpName = "FILE" };
        Option<string> data = new("--data") { Description = "Folder with the calibrations, the journal and the lock.", DefaultValueFactory = static _ => CalibrateCommand.UsualData, HelpName = "DIR" };
        Option<string> duration = new("--duration") { Description = "Stop after this long: 10min, 24h. Without it, Ctrl-C or SIGTERM stops.", HelpName = "TIME" };
        Option<bool> print = new("--print") { Description = "Print each reading, once it is on the disk, as one line of JSON." };
        Command command = new(
            "station",
            """
            Reads a calibrated probe, corrects, journals and sends every reading.

            Nothing that was journaled is lost when the broker or the power fails; it is sent later.
            Stopping by Ctrl-C or SIGTERM writes down what has come and exits with 0.

            Examples:
              probecal station --config station.json --data ./north-pier
              probecal station --config station.json --data ./north-pier --duration 10min --print
            """)
        {
            config, data, duration, print,
        };
        command.SetAction((parsed, stop) => RunAsync(
            terminal,
            parsed.GetValue(config)!,
            parsed.GetValue(data)!,
            parsed.GetValue(duration),
            parsed.GetValue(print),
            stop));
        return command;
    }

    private static async Task<int> RunAsync(Terminal terminal, string config, string data, string? duration, bool print, CancellationToken stop)
    {
        StationConfiguration configuration = ConfigurationFile.Read(config);
        TimeSpan? length = duration == null ? null : Quantity.Duration("--duration", duration);
        using DataDirectory folder = DataDirectory.OpenForWriting(data);
        using ILoggerFactory logs = TerminalLog.FactoryFor(terminal);
        StationSurroundings around = new()
        {
            Time = terminal.Time,
            Random = Random.Shared,
            Logs = logs,
            Software = ProgramIdentity.Text,
            Environment = Environment.GetEnvironmentVariable,
            StandardInput = terminal.Input,
            Reading = print ? new ReadingPrinter(terminal.Output, logs.CreateLogger("print")).Print : static _ => { },
        };
        await StationRun.RunAsync(configuration, folder, around, length, stop).ConfigureAwait(false);
        return ExitCode.Done;
    }
}
