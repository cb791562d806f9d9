using System;
using System.CommandLine;
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
        RootCommand root = new("ProbeCal: what the water holds at equilibrium, the probe calibrated in it, and corrected readings sent home.")
        {
            EquilibriumCommand.Create(terminal),
            CalibrateCommand.Create(terminal),
            CalibrationsCommand.Create(terminal),
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

        ParseResult parsed = root.Parse(args);
        if (parsed.Errors.Count != 0)
        {
            terminal.Error.WriteLine("probecal: " + UsageErrors.Line(parsed));
            return ExitCode.InputWrong;
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
            terminal.Error.WriteLine("probecal: " + wrong.Message);
            return ExitCode.InputWrong;
        }
        catch (WorkFailedException failed)
        {
            terminal.Error.WriteLine("probecal: " + failed.Message);
            return ExitCode.WorkFailed;
        }
        catch (OperationCanceledException)
        {
            terminal.Error.WriteLine("probecal: stopped before the work was finished");
            return ExitCode.WorkFailed;
        }
    }
}

/// <summary>The exit codes, as others may rely on them.</summary>
internal static class ExitCode
{
    internal const int Done = 0;
    internal const int WorkFailed = 1;
    internal const int InputWrong = 2;
}
