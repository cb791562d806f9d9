using System;
using System.CommandLine;
using System.CommandLine.Help;
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

/// <summary><c>probecal calibrate</c> and <c>probecal check</c>: a probe against a reference, into the calibration log.</summary>
internal static class CalibrateCommand
{
    /// <summary>The data folder where none is named.</summary>
    internal const string UsualData = "probecal-data";

    internal static Command Create(Terminal terminal)
    {
        return Create(terminal, "calibrate", CalibrationRecord.CalibrationPurpose, CalibrateHelp.OfCalibrate);
    }

    /// <summary><c>probecal check</c>: the same options, guards and record, and no change of coefficients.</summary>
    internal static Command CreateCheck(Terminal terminal)
    {
        return Create(terminal, "check", CalibrationRecord.CheckPurpose, CalibrateHelp.OfCheck);
    }

    private static Command Create(Terminal terminal, string name, string purpose, string description)
    {
        CalibrateOptions options = new(purpose == CalibrationRecord.CheckPurpose);
        Command command = new(name, description);
        foreach (Option option in options.All)
        {
            command.Options.Add(option);
        }

        command.Options.Add(new HelpOption { Action = new CalibrateHelp(name, description, options, terminal, whole: false) });
        command.SetAction((parsed, cancellationToken) => RunAsync(options, purpose, parsed, terminal, cancellationToken));
        return command;
    }

    private static async Task<int> RunAsync(CalibrateOptions options, string purpose, ParseResult parsed, Terminal terminal, CancellationToken cancellationToken)
    {
        if (parsed.GetValue(options.Options))
        {
            CalibrateHelp.WriteAll(terminal.Output, options);
            return ExitCode.Done;
        }

        if (parsed.GetValue(options.Steps))
        {
            return CalibrateHelp.WriteSteps(terminal.Output, options, purpose, parsed);
        }

        bool json = OutputShape.IsJson(parsed.GetValue(options.Format));
        bool manual = parsed.GetValue(options.Manual);
        SourceAddress? address = Address(parsed.GetValue(options.Source), manual);
        LineTemplate? line = address == null ? null : LineTemplate.Parse("--line", parsed.GetValue(options.Line) ?? LineTemplate.UsualText);
        Questions? questions = Asks(parsed.GetValue(options.Unattended), address, terminal) ? new Questions(terminal) : null;
        string folder = parsed.GetValue(options.Data) ?? UsualData;
        EquipmentValues register = EquipmentValues.In(folder, terminal.Time.GetUtcNow());
        CalibrateSetup entries = new(options, purpose, register, parsed, questions);
        CalibrationSetup setup = await entries.BuildAsync(address, line, cancellationToken).ConfigureAwait(false);
        if (entries.Answered.Count != 0)
        {
            terminal.Error.WriteLine("The same without these questions, also to go on after an interruption:");
            terminal.Error.WriteLine(CommandLineText.Of(parsed.Tokens.Select(static token => token.Value).Concat(entries.Answered), OperatingSystem.IsWindows()));
        }

        ICalibrationDialogue dialogue = Dialogue(options, parsed, terminal, questions, setup, register);

        using DataDirectory data = DataDirectory.OpenForWriting(folder);
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
                : $"stopped before the {purpose} was finished; the points taken are kept, and the same command goes on with them", stopped);
        }

        Print(stored, json, log, terminal, parsed.CommandResult.Command.Name);
        return stored.Record.Result.Pass ? ExitCode.Done : ExitCode.WorkFailed;
    }

    private static void Print(StoredCalibration stored, bool json, CalibrationLogStore log, Terminal terminal, string command)
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
            terminal.Error.WriteLine($"probecal: {command}: failed: {reason}");
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
            : throw new InputException("this command asks questions and there is no terminal to answer at; give every option and --unattended");
    }

    private static ICalibrationDialogue Dialogue(CalibrateOptions options, ParseResult parsed, Terminal terminal, Questions? questions, CalibrationSetup setup, EquipmentValues register)
    {
        CalibrationProgress progress = new(terminal.Error, ErrorScale.IsHectopascal(GasNames.NameOf(setup.Gas), setup.Probe.Model));
        return questions == null
            ? new UnattendedDialogue(progress, Reading)
            : new InteractiveDialogue(progress, questions, Reading, text => Shown("reading", text, setup), Reference);

        double? Reading(ProcedureStep step)
        {
            Option<string>? option = step.Role switch
            {
                CalibrationIds.ZeroPoint => options.ZeroReading,
                CalibrationIds.AsLeftPoint => options.AsLeft,
                CalibrationIds.SpanPoint => options.AsFound,
                _ => null,
            };
            return option != null
                ? parsed.GetValue(option) is string given ? Shown(option.Name, given, setup) : null
                : LevelReading(parsed.GetValue(options.Reading) ?? [], step.Role!, setup);
        }

        PlannedPoint? Reference(PlannedPoint planned, string text)
        {
            return PlanText.Read(planned.Method == MethodIds.Titration ? options.Titration.Name : options.Transfer.Name, planned, text, setup.Gas, register);
        }
    }

    private static double? LevelReading(string[] readings, string role, CalibrationSetup setup)
    {
        foreach (string reading in readings)
        {
            int equals = reading.IndexOf('=', StringComparison.Ordinal);
            if (equals < 0)
            {
                throw Wrong.Input("--reading", reading, "write ROLE=VALUE, for example level-1=4.2mg/L");
            }

            string named = reading[..equals].Trim();
            string[] roles = [.. setup.Plan.Select(static point => point.Role)];
            if (Array.IndexOf(roles, named) < 0)
            {
                throw Wrong.Input("--reading", reading, $"there is no point {named}{NearestName.DidYouMean(named, roles)}; the points are {string.Join(", ", roles)}");
            }

            if (named == role)
            {
                return Shown("--reading", reading[(equals + 1)..].Trim(), setup);
            }
        }

        return null;
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
