using System;
using System.CommandLine;
using System.Globalization;
using System.Threading;
using ProbeCal.Station.Entry;
using ProbeCal.Station.TableWriting;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal tables</c>: tables for controllers, spreadsheets and the wall of the hut.</summary>
internal static class TablesCommand
{
    /// <summary>A person waits this long without being told anything.</summary>
    private static readonly TimeSpan Silence = TimeSpan.FromSeconds(2);

    internal static Command Create(Terminal terminal)
    {
        Option<string> format = new("--format") { Description = "csv, json, c-float or c-double (a C99 header with its reader), csharp, card (one printed page).", Required = true, HelpName = "FORM" };
        Option<string> output = new("--output") { Description = "Folder that the file goes into, or - for standard output.", DefaultValueFactory = static _ => "-", HelpName = "DIR|-" };
        Option<string> quantity = new("--quantity") { Description = "concentration (when left out), salinity-factor or vapour-pressure.", HelpName = "WHAT" };
        Option<string> gas = new("--gas") { Description = "The gas; O2 when left out.", HelpName = "GAS" };
        Option<string> equation = new("--equation") { Description = "The solubility equation; the gas's default when left out.", HelpName = "NAME" };
        Option<string> temperature = new("--temperature") { Description = "Range of the temperatures: 0..40C.", HelpName = "LOW..HIGH" };
        Option<string> temperatureStep = new("--temperature-step") { Description = "Their step: 0.5K. Chosen by --error when left out.", HelpName = "STEP" };
        Option<string> pressure = new("--pressure") { Description = "Absolute pressure, one or a range: 1atm, 600..1100hPa.", HelpName = "P|LOW..HIGH" };
        Option<string> pressureStep = new("--pressure-step") { Description = "Step of the range: 50hPa. Chosen by --error when left out.", HelpName = "STEP" };
        Option<string> salinity = new("--salinity") { Description = "Practical salinity, one or a range: 0, 0..40.", HelpName = "S|LOW..HIGH" };
        Option<string> salinityStep = new("--salinity-step") { Description = "Step of the range: 5. Chosen by --error when left out.", HelpName = "STEP" };
        Option<string> moleFraction = new("--mole-fraction") { Description = "Mole fraction of the gas in dry air; the usual one when left out.", HelpName = "x" };
        Option<string> error = new("--error") { Description = "Interpolation error that is allowed: 0.01mg/L or 0.05%. Steps left out are chosen as coarse as it allows.", HelpName = "E" };
        Option<string> name = new("--name") { Description = "Name of the table, from which its file and its identifiers are called.", HelpName = "NAME" };
        Option<string> siteAltitude = new("--site-altitude") { Description = "Card: altitude of the site, about whose pressure the columns lie: 640m, 2100ft.", HelpName = "Z" };
        Option<string> site = new("--site") { Description = "Card: name of the site.", HelpName = "TEXT" };
        Option<string> pressureUnit = new("--pressure-unit") { Description = "Card: hPa (when left out), mmHg, kPa or inHg.", HelpName = "UNIT" };
        Option<bool> force = new("--force") { Description = "Replace a file that is there and differs." };
        Command command = new(
            "tables",
            """
            Tables of what water holds: CSV, JSON, C, C# and a printed field card, with the interpolation error proved.

            The largest distance from the equation over a dense grid, read as the reader will read it, stands in the header.

            Examples:
              probecal tables --temperature 0..40C --pressure 600..1100hPa --salinity 0 --error 0.01mg/L \
                --format c-float --name oxygen-fresh
              probecal tables --temperature 0..40C --salinity 0..40 --pressure 1atm --error 0.05% \
                --format csv --output tables
              probecal tables --quantity salinity-factor --temperature 0..35C --salinity 0..40 \
                --error 0.0005 --format json
              probecal tables --quantity vapour-pressure --temperature 0..50C --temperature-step 1K \
                --format csv
              probecal tables --temperature 0..30C --salinity 0 --site-altitude 640m --site "North pond" \
                --format card --output cards
            """)
        {
            format, output, quantity, gas, equation, temperature, temperatureStep, pressure, pressureStep, salinity, salinityStep, moleFraction,
            error, name, siteAltitude, site, pressureUnit, force,
        };
        command.SetAction((parsed, stop) =>
        {
            OptionReader options = new(parsed, null);
            TableOptions wanted = new()
            {
                Format = options.Given(format)!,
                Quantity = options.Given(quantity),
                Gas = options.Given(gas),
                Equation = options.Given(equation),
                Temperature = options.Given(temperature),
                TemperatureStep = options.Given(temperatureStep),
                Pressure = options.Given(pressure),
                PressureStep = options.Given(pressureStep),
                Salinity = options.Given(salinity),
                SalinityStep = options.Given(salinityStep),
                MoleFraction = options.Given(moleFraction),
                Error = options.Given(error),
                Name = options.Given(name),
                SiteAltitude = options.Given(siteAltitude),
                Site = options.Given(site),
                PressureUnit = options.Given(pressureUnit),
                Program = ProgramIdentity.Release,
            };
            string folder = options.Given(output)!;
            WrittenTable table = TableWriter.Make(wanted, Progress(terminal), stop);
            if (folder == "-")
            {
                terminal.Output.Write(table.Content);
            }
            else
            {
                bool written = TableFile.Write(folder, table, options.IsSet(force));
                terminal.Output.WriteLine(System.IO.Path.Combine(folder, table.FileName) + (written ? "" : " (was there already, the same to the byte)"));
            }

            terminal.Error.WriteLine(table.Summary);
            return System.Threading.Tasks.Task.FromResult(ExitCode.Done);
        });
        return command;
    }

    /// <summary>Says how far it is, every two seconds from the second on.</summary>
    private static Action<double> Progress(Terminal terminal)
    {
        long told = terminal.Time.GetTimestamp();
        return share =>
        {
            long now = terminal.Time.GetTimestamp();
            if (Silence <= terminal.Time.GetElapsedTime(told, now))
            {
                told = now;
                terminal.Error.WriteLine(string.Create(CultureInfo.InvariantCulture, $"comparing table and equation: {100 * share:F0} %"));
            }
        };
    }
}
