using System;
using System.Collections.Generic;
using System.CommandLine;
using System.CommandLine.Invocation;
using System.IO;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>Help of <c>calibrate</c> and <c>check</c>: what every run needs and an example for each method; the rest on request.</summary>
internal sealed class CalibrateHelp(string name, string description, CalibrateOptions options, Terminal terminal, bool whole) : SynchronousCommandLineAction
{
    internal const string OfCalibrate =
        """
        Calibrate a probe by any method, live or by a meter's display.
        Asks for what is missing, guides through the steps, waits for steady readings. An interrupted
        calibration goes on with the same command within 4 h.
        """;

    internal const string OfCheck =
        """
        Check a probe by any method: judged by the calibration in force, recorded, and nothing adjusted.
        A check takes the options, guards and steps of a calibration. One that fails exits with 1.
        """;

    public override int Invoke(ParseResult parseResult)
    {
        TextWriter output = terminal.Output;
        output.WriteLine(description);
        output.WriteLine();
        output.WriteLine($"Usage: probecal {name} [options]");
        if (whole)
        {
            WriteAll(output, options);
            return ExitCode.Done;
        }

        output.WriteLine();
        output.WriteLine("What every run needs (asked for where it is missing):");
        Write(output, Essentials(options));
        output.WriteLine();
        output.WriteLine("Examples:");
        foreach (string example in Examples(name))
        {
            output.WriteLine("  " + example);
        }

        output.WriteLine();
        output.WriteLine("The same with another method (to practise without a probe: --source simulated, no --line):");
        foreach (string ending in Endings(name))
        {
            output.WriteLine("  " + ending);
        }

        output.WriteLine();
        TextTable.WriteWrapped(output, "", "", $"'probecal {name} --method NAME --steps' prints the guided procedure of a method; 'probecal {name} --options' lists all options: zero, several points, limits, waiting, uncertainties, reasons, meters.");
        return ExitCode.Done;
    }

    /// <summary>Writes every option, by group.</summary>
    internal static void WriteAll(TextWriter output, CalibrateOptions options)
    {
        foreach ((string title, List<Option> group) in options.Groups)
        {
            output.WriteLine();
            output.WriteLine(title);
            Write(output, group);
        }
    }

    /// <summary>Writes the guided procedure of the method that was named.</summary>
    internal static int WriteSteps(TextWriter output, CalibrateOptions options, string purpose, ParseResult parsed)
    {
        string method = parsed.GetValue(options.Method) is string given
            ? OptionReader.Choice(options.Method, MethodIds.All)(given)
            : throw new InputException("--steps: name the method too, for example --method titration; there are " + string.Join(", ", MethodIds.All));
        string zero = parsed.GetValue(options.Zero) ?? CalibrationIds.ZeroKeep;
        string? zeroMethod = parsed.GetValue(options.ZeroMethod);
        int levels = (parsed.GetValue(options.Level) ?? []).Length;
        ProcedureText.Write(output, GuidedProcedure.Of(method, purpose, zero, zeroMethod, levels, parsed.GetValue(options.Manual)));
        return ExitCode.Done;
    }

    private static Option[] Essentials(CalibrateOptions options)
    {
        return
        [
            options.Source, options.Line, options.Manual, options.Unattended, options.Probe, options.Model, options.Coefficient, options.Method,
            options.Pressure, options.PressureSource, options.Altitude, options.Temperature, options.Salinity, options.StirringOption,
        ];
    }

    private static IEnumerable<string> Examples(string name)
    {
        yield return $"probecal {name} --source serial:/dev/ttyUSB0 --line \"{{time}},{{signal:nA}},{{temperature}}\" \\";
        yield return "  --probe P-17 --coefficient \"exponential 0.03/K at 25C fitted 5..35C\" \\";
        yield return "  --pressure 706mmHg --pressure-source barometer:B-12 --altitude 640m --salinity 0 \\";
        yield return "  --stirring stirred --method air-saturated-water";
        yield return $"probecal {name} --manual --probe M-3 --meter-shows mg/L --temperature 20.1C \\";
        yield return "  --pressure 706mmHg --pressure-source barometer:B-12 --altitude 640m --method water-saturated-air";
    }

    private static IEnumerable<string> Endings(string name)
    {
        yield return "--method water-saturated-air --zero check --zero-method zero-solution";
        yield return "--method titration   (the titration may follow within 24 h)";
        yield return "--method transfer-standard --transfer \"STD-3 8.41mg/L u 0.05mg/L\"";
        yield return "--method gas-mixture --mixture \"CYL-21 20.95% u 0.02% dry\"";
        yield return name == "check"
            ? "--method zero-solution --as end-of-day"
            : "--method air-saturated-water --zero adjust --zero-method zero-gas";
    }

    private static void Write(TextWriter output, IEnumerable<Option> group)
    {
        TextTable.Write(output, [.. group.Select(static option => new[] { option.HelpName is string value ? option.Name + " " + value : option.Name, option.Description ?? "" })], "  ");
    }
}
