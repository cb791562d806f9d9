using System;
using System.Collections.Generic;
using System.CommandLine;
using System.Globalization;
using System.IO;
using System.Text;
using System.Threading;
using System.Threading.Tasks;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Simulation;
using ProbeCal.Station.Sources;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal simulate</c>: lines of a simulated probe to standard output, a pseudo-terminal or a TCP port.</summary>
internal static class SimulateCommand
{
    internal static Command Create(Terminal terminal)
    {
        Options options = new();
        Command command = new(
            "simulate",
            """
            Write the lines of a simulated probe in water, whose truth is known. Nothing of it is measured.

            Examples:
              probecal simulate --altitude 640m --count 5
              probecal simulate --phase air-saturated-water:15min,lake --faster 60 --pty ./probe
              probecal simulate --tcp 4001 --truth truth.csv
            """)
        {
            options.Temperature, options.Salinity, options.Pressure, options.Altitude, options.Phase, options.Rate, options.Faster,
            options.Count, options.Duration, options.Seed, options.Line, options.Truth, options.Pty, options.Tcp,
        };
        command.SetAction((parsed, stop) => RunAsync(new Given(parsed, options), terminal, stop));
        return command;
    }

    private static async Task<int> RunAsync(Given given, Terminal terminal, CancellationToken stop)
    {
        SimulationSettings settings = Settings(given);
        long? count = Limit(given, settings);
        LineTemplate template = LineTemplate.Parse("--line", given[o => o.Line] ?? LineTemplate.UsualText);
        if (given[o => o.Pty] is not null && given[o => o.Tcp] is not null)
        {
            throw new InputException("--pty and --tcp: the lines go to one place; leave one out");
        }

        await using StreamWriter? truth = OpenTruth(given[o => o.Truth]);
        await using ILineOutput output = Output(given, terminal);
        SimulatedSource source = new(settings, template, terminal.Time);
        terminal.Error.WriteLine($"simulated probe (nothing here is measured) on {output.Description}");
        foreach (string explanation in template.Explanation)
        {
            terminal.Error.WriteLine("  " + explanation);
        }

        terminal.Error.Flush();
        long sent = await SimulationRun.WriteAsync(source, output, truth, count, stop).ConfigureAwait(false);
        terminal.Error.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{sent} simulated lines written"));
        return ExitCode.Done;
    }

    private static SimulationSettings Settings(Given given)
    {
        SimulationSettings usual = new();
        double hertz = given[o => o.Rate] is string rate ? Quantity.FrequencyHertz("--rate", rate) : 1;
        IReadOnlyList<SimulationStep> script = given[o => o.Phase] is string phase ? SimulationScript.Parse("--phase", phase) : usual.Script;
        SimulationSettings settings = usual with
        {
            Seed = given[o => o.Seed] is string seed ? (int)Number.ParseWhole("--seed", seed, 0, int.MaxValue) : usual.Seed,
            Interval = SimulationSettings.IntervalOf("--rate", hertz),
            Faster = given[o => o.Faster] is string faster ? Factor("--faster", faster) : usual.Faster,
            TemperatureCelsius = given[o => o.Temperature] is string celsius ? Quantity.TemperatureCelsius("--temperature", celsius) : usual.TemperatureCelsius,
            Salinity = given[o => o.Salinity] is string salinity ? Quantity.Salinity("--salinity", salinity) : usual.Salinity,
            PressureHectopascal = StationPressure(given[o => o.Pressure], given[o => o.Altitude]) ?? usual.PressureHectopascal,
            Script = script,
        };
        return settings.Checked("simulate");
    }

    private static double Factor(string what, string text)
    {
        double factor = Number.Parse(what, text);
        return factor < 0 ? throw Wrong.Input(what, text, "this takes 0 or a number above it, for example 60") : factor;
    }

    private static double? StationPressure(string? pressure, string? altitude)
    {
        if (pressure is not null && altitude is not null)
        {
            throw new InputException("--pressure and --altitude: the one gives the other; leave one out");
        }

        if (altitude is null)
        {
            return pressure is null ? null : Quantity.PressureHectopascal("--pressure", pressure);
        }

        Status status = StandardAtmosphere.Pressure(Quantity.AltitudeMetres("--altitude", altitude), out double hectopascal);
        return status == Status.Ok ? hectopascal : throw Wrong.Input("--altitude", altitude, "the standard atmosphere is used from "
            + Number.Print(StandardAtmosphere.LowestAltitudeMetres) + " to " + Number.Print(StandardAtmosphere.HighestAltitudeMetres) + " m");
    }

    private static long? Limit(Given given, SimulationSettings settings)
    {
        long? count = given[o => o.Count] is string lines ? Number.ParseWhole("--count", lines, 1, long.MaxValue) : null;
        if (given[o => o.Duration] is not string duration)
        {
            return count;
        }

        long within = Math.Max(1, (long)(Quantity.Duration("--duration", duration) / settings.Interval));
        return count is long most ? Math.Min(most, within) : within;
    }

    private static StreamWriter? OpenTruth(string? path)
    {
        try
        {
            return path is null ? null : new StreamWriter(path, append: false, new UTF8Encoding(false));
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or ArgumentException)
        {
            throw new InputException($"--truth {Wrong.Shown(path!)}: this file cannot be written: {fault.Message}", fault);
        }
    }

    private static ILineOutput Output(Given given, Terminal terminal)
    {
        if (given[o => o.Pty] is string link)
        {
            return PseudoTerminalOutput.Open("--pty", link);
        }

        return given[o => o.Tcp] is string port
            ? TcpOutput.Open("--tcp", (int)Number.ParseWhole("--tcp", port, 0, 65535))
            : new TextOutput(terminal.Output);
    }

    /// <summary>The options of one command: they may not be shared between two.</summary>
    private sealed class Options
    {
        internal readonly Option<string?> Temperature = Text("--temperature", "T", "Mean temperature of the lake, and that of bath and air: 18C, 64F. Default: 18C.");
        internal readonly Option<string?> Salinity = Text("--salinity", "S", "Practical salinity. Default: 0.");
        internal readonly Option<string?> Pressure = Text("--pressure", "P", "Absolute station pressure with its unit: 1009hPa, 757mmHg. Default: 1013.25hPa.");
        internal readonly Option<string?> Altitude = Text("--altitude", "Z", "In place of --pressure: the standard atmosphere's pressure at 640m, 2100ft.");
        internal readonly Option<string?> Phase = Text("--phase", "PHASE", "Where the probe is: lake, lake-still, air-saturated-water, air, zero; or a script such as air-saturated-water:15min,zero:10min,lake. Default: lake.");
        internal readonly Option<string?> Rate = Text("--rate", "RATE", "Lines per simulated time: 1Hz, 6/min. Default: 1Hz.");
        internal readonly Option<string?> Faster = Text("--faster", "X", "Simulated seconds in a real one; 0 waits for nothing. Default: 1.");
        internal readonly Option<string?> Count = Text("--count", "N", "Stop after so many lines.");
        internal readonly Option<string?> Duration = Text("--duration", "TIME", "Stop after so much simulated time: 30min.");
        internal readonly Option<string?> Seed = Text("--seed", "N", "Seed of the noise: the same seed gives the same lines. Default: 1.");
        internal readonly Option<string?> Line = Text("--line", "TEMPLATE", "Form of the lines. Default: " + LineTemplate.UsualText);
        internal readonly Option<string?> Truth = Text("--truth", "FILE", "CSV file for the true values beside each line.");
        internal readonly Option<string?> Pty = Text("--pty", "PATH", "Make a pseudo-terminal and a link to it at this path, and write there.");
        internal readonly Option<string?> Tcp = Text("--tcp", "PORT", "Write to everyone who connects to this port of this machine; 0 takes a free port.");

        private static Option<string?> Text(string name, string value, string description)
        {
            return new Option<string?>(name) { Description = description, HelpName = value };
        }
    }

    /// <summary>What was given for an option; null when it was not.</summary>
    private sealed class Given(ParseResult parsed, Options options)
    {
        internal string? this[Func<Options, Option<string?>> option] => parsed.GetValue(option(options));
    }
}
