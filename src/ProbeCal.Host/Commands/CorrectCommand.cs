using System.CommandLine;
using ProbeCal.Station;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal correct</c>: recorded raw readings to corrected ones, by the call that live readings take.</summary>
internal static class CorrectCommand
{
    internal static Command Create(Terminal terminal)
    {
        CorrectOptions options = new();
        Command command = new(
            "correct",
            """
            Corrects a table of recorded raw readings: calibration, drift and fouling.

            The rows come out as they are with the results behind them; the raw table is only read. Each run leaves a revision beside its output
            (OUTPUT.revision.json): what was done, with which calibrations, visits, forms and limits. Nothing is overwritten.

            Examples:
              probecal correct --input june.csv --output june-r1.csv --probe do-1 --time-offset +02:00 \
                --column "time=Time" --column "signal=DO raw [nA]" --column "temperature=Water temp [C]" \
                --pressure 742mmHg --salinity 0
              probecal correct --input june.csv --output june-r1.csv --calibration 3f6c1d2e9a41-0007 \
                --column time=Time --column signal=nA --column temperature=T --column "pressure=Baro [hPa]" \
                --salinity 0 --write "mg/L:2,u(mg/L):2,percent-local:1"
              probecal correct --again june-r1.csv.revision.json
              probecal correct explain --revision june-r1.csv.revision.json --row 1200
              probecal correct report --input june.csv --time-offset -04:00 --column "time=Time" \
                --column "concentration=DO [mg/L]" --column "percent=DO sat [%]" \
                --column "temperature=Temp [C]" --salinity 0
            """);
        options.AddTo(command);
        command.Subcommands.Add(Explain(terminal));
        command.Subcommands.Add(Report(terminal));
        command.SetAction(parsed =>
        {
            using DataDirectory data = DataDirectory.OpenForReading(options.Data(parsed));
            using CalibrationLogStore log = CalibrationLogStore.OpenForReading(data.CalibrationLogFile);
            ProgressBar bar = new(terminal);
            CorrectionSurroundings surroundings = new(terminal.Time, ProgramIdentity.Text, bar.Say, bar.Show);
            if (options.Again(parsed) is string again)
            {
                options.RefuseBesideAgain(parsed);
                CorrectionAgain.Run(again, options.Output(parsed), log, surroundings, terminal.Stop);
            }
            else
            {
                CorrectionRun.Run(options.Request(parsed), log, surroundings, terminal.Stop);
            }

            return ExitCode.Done;
        });
        return command;
    }

    private static Command Explain(Terminal terminal)
    {
        Option<string> revision = new("--revision") { Description = "The revision beside the output.", Required = true, HelpName = "FILE" };
        Option<string> row = new("--row") { Description = "Which row under the header, from 1; blank lines do not count.", Required = true, HelpName = "N" };
        Option<string> data = new("--data") { Description = "Folder of the calibration log (default probecal-data).", HelpName = "DIR" };
        Command command = new("explain", "How one value of a revision came about: raw, calibration, partial pressure, concentration, drift, fouling, with numbers that can be computed again.")
        {
            revision, row, data,
        };
        command.SetAction(parsed =>
        {
            long number = Number.ParseWhole("--row", parsed.GetValue(row)!, 1, long.MaxValue);
            using DataDirectory folder = DataDirectory.OpenForReading(parsed.GetValue(data) ?? CalibrateCommand.UsualData);
            using CalibrationLogStore log = CalibrationLogStore.OpenForReading(folder.CalibrationLogFile);
            CorrectText.Write(terminal.Page(), ExplainedRow.Of(parsed.GetValue(revision)!, number, log));
            return ExitCode.Done;
        });
        return command;
    }

    private static Command Report(Terminal terminal)
    {
        Option<string> input = new("--input") { Description = "The table; it is only read.", Required = true, HelpName = "FILE" };
        Option<string[]> columns = new("--column") { Description = "Which quantity is which column: time, concentration, percent, temperature, pressure, salinity.", HelpName = "Q=COLUMN [UNIT]" };
        Option<string> timeOffset = new("--time-offset") { Description = "How the clock of the table was set, where the times do not say so.", HelpName = "OFFSET" };
        Option<string> timeForm = new("--time-form") { Description = "Pattern of the times where the year does not come first.", HelpName = "PATTERN" };
        Option<string> pressure = new("--pressure") { Description = "Absolute station pressure of all rows, to judge a % column by.", HelpName = "P" };
        Option<string> salinity = new("--salinity") { Description = "Practical salinity of all rows, 0 for fresh water.", HelpName = "S" };
        Option<string> separator = new("--separator") { Description = "comma, semicolon or tab; told from the header when left out.", HelpName = "NAME" };
        Option<string> headerLine = new("--header-line") { Description = "Line that names the columns.", HelpName = "N" };
        Option<bool> decimalComma = new("--decimal-comma") { Description = "Commas are the decimal marks of the table." };
        Command command = new("report", "What a table of readings shows of itself: gaps, a plateau below zero, whether its % column stands on 1 atm or on the local pressure.")
        {
            input, columns, timeOffset, timeForm, pressure, salinity, separator, headerLine, decimalComma,
        };
        command.SetAction(parsed =>
        {
            RecordReport report = RecordReport.Of(
                new RecordReportRequest
                {
                    Input = parsed.GetValue(input)!,
                    Columns = parsed.GetValue(columns) ?? [],
                    TimeOffset = parsed.GetValue(timeOffset),
                    TimeForm = parsed.GetValue(timeForm),
                    Pressure = parsed.GetValue(pressure),
                    Salinity = parsed.GetValue(salinity),
                    Separator = parsed.GetValue(separator),
                    HeaderLine = parsed.GetValue(headerLine),
                    DecimalComma = parsed.GetValue(decimalComma),
                },
                terminal.Stop);
            CorrectText.Write(terminal.Page(), report);
            return ExitCode.Done;
        });
        return command;
    }
}
