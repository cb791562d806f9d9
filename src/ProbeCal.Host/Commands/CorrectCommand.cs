using System.CommandLine;
using ProbeCal.Station;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Correcting;

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
              probecal correct --input june.csv --output june-r1.csv --probe do-1 --time-offset +02:00 --column "time=Time" --column "signal=DO raw [nA]" --column "temperature=Water temp [C]" --pressure 742mmHg --salinity 0
              probecal correct --input june.csv --output june-r1.csv --calibration 3f6c1d2e9a41-0007 --column time=Time --column signal=nA --column temperature=T --column "pressure=Baro [hPa]" --salinity 0 --write "mg/L:2,u(mg/L):2,percent-local:1"
              probecal correct --again june-r1.csv.revision.json
              probecal correct explain --revision june-r1.csv.revision.json --row 1200
              probecal correct report --input june.csv --time-offset -04:00 --column "time=Time" --column "concentration=DO [mg/L]" --column "percent=DO sat [%]" --column "temperature=Temp [C]" --salinity 0
            """);
        options.AddTo(command);
        command.SetAction(parsed =>
        {
            using DataDirectory data = DataDirectory.OpenForReading(options.Data(parsed));
            using CalibrationLogStore log = CalibrationLogStore.OpenForReading(data.CalibrationLogFile);
            ProgressBar bar = new(terminal);
            CorrectionSurroundings surroundings = new(terminal.Time, ProgramIdentity.Text, bar.Say, bar.Show);
            CorrectionRun.Run(options.Request(parsed), log, surroundings, terminal.Stop);
            return ExitCode.Done;
        });
        return command;
    }
}
