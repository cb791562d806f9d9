using System;
using System.CommandLine;
using System.IO;
using System.Runtime.InteropServices;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Host.Commands;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host;

/// <summary>
/// The <c>probecal</c> program: parse, call one entry point of Station, print. Results go to standard output, everything
/// else to standard error. Exit code 0 done, 1 the work failed, 2 the input is wrong.
/// </summary>
internal static class Program
{
    private static async Task<int> Main(string[] args)
    {
        using CancellationTokenSource stop = new();
        using PosixSignalRegistration interrupt = PosixSignalRegistration.Create(PosixSignal.SIGINT, Ask);
        using PosixSignalRegistration terminate = PosixSignalRegistration.Create(PosixSignal.SIGTERM, Ask);
        return await RunAsync(args, Terminal.OfProcess(stop.Token)).ConfigureAwait(false);

        // The first signal asks for an orderly end; a second one ends the process as it would any other.
        void Ask(PosixSignalContext signal)
        {
            if (!stop.IsCancellationRequested)
            {
                signal.Cancel = true;
                stop.Cancel();
            }
        }
    }

    /// <summary>Runs one command line against a given terminal and clock: what the tests call.</summary>
    internal static async Task<int> RunAsync(string[] args, Terminal terminal)
    {
        RootCommand root = new("ProbeCal: what water holds at equilibrium, a probe calibrated in it, corrected readings sent home.")
        {
            EquilibriumCommand.Create(terminal),
            TablesCommand.Create(terminal),
            ExplainCommand.Create(terminal),
            EquationsCommand.Create(terminal),
            WaterCommand.Create(terminal),
            TotalGasCommand.Create(terminal),
            HenryCommand.Create(terminal),
            CalibrateCommand.Create(terminal),
            CalibrateCommand.CreateCheck(terminal),
            CalibrationsCommand.Create(terminal),
            RegisterCommand.Create(terminal),
            ServiceCommand.Create(terminal),
            CharacteriseCommand.Create(terminal),
            CorrectCommand.Create(terminal),
            VisitCommand.Create(terminal),
            StationCommand.Create(terminal),
            SimulateCommand.Create(terminal),
            DemoCommand.Create(terminal),
        };
        if (args.Length == 0)
        {
            // Whoever types the bare name wants to know what there is; nothing was done all the same.
            UsageErrors.Overview(root, terminal.Error);
            return ExitCode.InputWrong;
        }

        if (args is ["--help" or "-h" or "-?"])
        {
            // The examples of every command at once would fill three screens.
            UsageErrors.Overview(root, terminal.Output);
            return ExitCode.Done;
        }

        ParseResult parsed = root.Parse(args);
        if (parsed.Errors.Count != 0)
        {
            return Say(terminal, ExitCode.InputWrong, UsageErrors.Line(parsed));
        }

        InvocationConfiguration configuration = new()
        {
            Output = terminal.Output,
            Error = terminal.Error,
            EnableDefaultExceptionHandler = false,
            // Signals are Main's: the demo runs several commands in one process.
            ProcessTerminationTimeout = null,
        };
        try
        {
            return await parsed.InvokeAsync(configuration, terminal.Stop).ConfigureAwait(false);
        }
        catch (InputException wrong)
        {
            return Say(terminal, ExitCode.InputWrong, wrong.Message);
        }
        catch (WorkFailedException failed)
        {
            return Say(terminal, ExitCode.WorkFailed, failed.Message);
        }
        catch (OperationCanceledException)
        {
            return Say(terminal, ExitCode.WorkFailed, "stopped before the work was finished");
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            // Standard output on a full disk, a file beside the work that could not be written.
            return Say(terminal, ExitCode.WorkFailed, "the system refused to read or write: " + fault.Message);
        }
    }

    /// <summary>Says why it ended, in one line that shows what was given and does not obey it.</summary>
    private static int Say(Terminal terminal, int code, string message)
    {
        try
        {
            terminal.Error.WriteLine("probecal: " + Wrong.OneLine(message));
        }
        catch (IOException)
        {
            // Nothing is left to say it on; the exit code still does.
            return code;
        }

        return code;
    }
}

/// <summary>The exit codes, as others may rely on them.</summary>
internal static class ExitCode
{
    internal const int Done = 0;
    internal const int WorkFailed = 1;
    internal const int InputWrong = 2;
}
