using System;
using System.CommandLine;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using Microsoft.Extensions.Logging.Abstractions;
using ProbeCal.Station;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Sources;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal calibrate</c>: a probe against water or air in equilibrium, into the calibration log.</summary>
internal static class CalibrateCommand
{
    /// <summary>The data folder where none is named.</summary>
    internal const string UsualData = "probecal-data";

    internal static Command Create(Terminal terminal)
    {
        CalibrateOptions options = new();
        Command command = new(
            "calibrate",
            """
            Calibrate a probe in air-saturated water or water-saturated air, from a live source or a meter's display.
            Asks for what is missing, waits for steady readings, and writes the record into the calibration log.

            Examples:
              probecal calibrate --source serial:/dev/ttyUSB0 --line "{time},{signal:nA},{temperature}" --probe P-17 \
                --method air-saturated-water --pressure 706mmHg --pressure-source barometer:B-12 --altitude 640m \
                --salinity 0 --stirring stirred --coefficient "exponential 0.03/K at 25C fitted 5..35C"
              probecal calibrate --manual --probe M-3 --meter-shows mg/L --method water-saturated-air \
                --temperature 20.1C --pressure 706mmHg --pressure-source barometer:B-12 --altitude 640m
            """);
        foreach (Option option in options.All)
        {
            command.Options.Add(option);
        }

        command.SetAction((parsed, cancellationToken) => RunAsync(options, parsed, terminal, cancellationToken));
        return command;
    }

    private static async Task<int> RunAsync(CalibrateOptions options, ParseResult parsed, Terminal terminal, CancellationToken cancellationToken)
    {
        bool json = OutputShape.IsJson(parsed.GetValue(options.Format));
        bool manual = parsed.GetValue(options.Manual);
        SourceAddress? address = Address(parsed.GetValue(options.Source), manual);
        LineTemplate? line = address == null ? null : LineTemplate.Parse("--line", parsed.GetValue(options.Line) ?? LineTemplate.UsualText);
        Questions? questions = Asks(parsed.GetValue(options.Unattended), address, terminal) ? new Questions(terminal) : null;
        CalibrateSetup entries = new(options, parsed, questions);
        CalibrationSetup setup = await entries.BuildAsync(address, line, cancellationToken).ConfigureAwait(false);
        if (entries.Answered.Count != 0)
        {
            terminal.Error.WriteLine("The same without these questions, also to go on after an interruption:");
            terminal.Error.WriteLine(CommandLineText.Of(parsed.Tokens.Select(static token => token.Value).Concat(entries.Answered), OperatingSystem.IsWindows()));
        }

        ICalibrationDialogue dialogue = Dialogue(options, parsed, terminal, questions, setup);

        using DataDirectory data = DataDirectory.OpenForWriting(parsed.GetValue(options.Data) ?? UsualData);
        using CalibrationLogStore log = CalibrationLogStore.OpenForWriting(data.CalibrationLogFile, terminal.Time, Guid.NewGuid);
        CalibrationSession session = CalibrationSession.Begin(setup, data, log, terminal.Time, parsed.GetValue(options.StartOver), dialogue.Say);
        CalibrationRun run = new(session, dialogue, terminal.Time);
        StoredCalibration stored;
        try
        {
            if (address == null)
            {
                stored = await run.RunTypedAsync(ProgramIdentity.Text, cancellationToken).ConfigureAwait(false);
            }
            else
            {
                await using ISampleSource source = SourceFactory.Create(address, line!, terminal.Time, NullLogger.Instance, terminal.Input, mustOpen: true);
                bool goesOnByItself = address is SerialAddress or TcpAddress;
                stored = await run.RunAsync(source, goesOnByItself, ProgramIdentity.Text, cancellationToken).ConfigureAwait(false);
            }
        }
        catch (OperationCanceledException stopped)
        {
            throw new WorkFailedException(session.State.Points.Count == 0
                ? "stopped before a point was taken; nothing was recorded"
                : "stopped before the calibration was finished; the points taken are kept, and the same command goes on with them", stopped);
        }

        Print(stored, json, log, terminal);
        return stored.Record.Result.Pass ? ExitCode.Done : ExitCode.WorkFailed;
    }

    private static void Print(StoredCalibration stored, bool json, CalibrationLogStore log, Terminal terminal)
    {
        if (json)
        {
            terminal.Output.WriteLine(System.Text.Encoding.UTF8.GetString(log.BytesOf(stored)));
        }
        else
        {
            CalibrationText.Write(terminal.Output, stored.Record);
        }

        foreach (string reason in stored.Record.Result.Reasons)
        {
            terminal.Error.WriteLine("probecal: calibrate: failed: " + reason);
        }
    }

    private static SourceAddress? Address(string? source, bool manual)
    {
        if (source == null)
        {
            return manual ? null : throw new InputException("--source is missing: name where readings come from, for example --source serial:/dev/ttyUSB0, or --manual for a meter that you read yourself");
        }

        return manual
            ? throw new InputException($"--source {Wrong.Shown(source)}: with --manual the readings are typed; leave one of them out")
            : SourceAddress.Parse("--source", source);
    }

    private static bool Asks(bool unattended, SourceAddress? address, Terminal terminal)
    {
        if (unattended)
        {
            return false;
        }

        if (address is StandardInputAddress)
        {
            throw new InputException("--source stdin: standard input carries the readings, so no question can be answered there; add --unattended");
        }

        return terminal.IsInteractive
            ? true
            : throw new InputException("calibrate asks questions and there is no terminal to answer at; give every option and --unattended");
    }

    private static ICalibrationDialogue Dialogue(CalibrateOptions options, ParseResult parsed, Terminal terminal, Questions? questions, CalibrationSetup setup)
    {
        CalibrationProgress progress = new(terminal.Error);
        return questions == null
            ? new UnattendedDialogue(progress, Reading)
            : new InteractiveDialogue(progress, questions, Reading, text => Shown("reading", text, setup));

        double? Reading(CalibrationStep step)
        {
            Option<string> option = step switch
            {
                CalibrationStep.Zero => options.ZeroReading,
                CalibrationStep.AsLeft => options.AsLeft,
                _ => options.AsFound,
            };
            return parsed.GetValue(option) is string given ? Shown(option.Name, given, setup) : null;
        }
    }

    /// <summary>Reads what a meter shows: with its unit, or a bare number in the unit that was stated for it.</summary>
    private static double Shown(string what, string text, CalibrationSetup setup)
    {
        QuantityKind kind = setup.Probe.MeterSettings?.Shows == "mg/L" ? QuantityKind.MassConcentration : QuantityKind.Percent;
        return Quantity.TryParse(kind, text, kind.CanonicalUnit, out double value, out string? problem)
            ? value
            : throw Wrong.Input(what, text, problem);
    }
}
