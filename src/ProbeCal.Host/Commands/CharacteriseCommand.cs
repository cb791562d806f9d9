using System.CommandLine;
using ProbeCal.Station.Characterising;

namespace ProbeCal.Host.Commands;

/// <summary><c>probecal characterise</c>: what a laboratory run says of a probe, for its maker.</summary>
internal static class CharacteriseCommand
{
    internal static Command Create(Terminal terminal)
    {
        Option<string[]> input = new("--input") { Description = "A part of the run and its table: temperature, linearity, step-up, step-down, zero or stirring. Once for each.", HelpName = "PART=FILE" };
        Option<string[]> columns = new("--column") { Description = "Which quantity is which column, in which unit: signal, temperature, partial-pressure, pressure, time, level, stirring. Once for each.", HelpName = "Q=COLUMN [UNIT]" };
        Option<string> form = new("--form") { Description = "Form of the temperature coefficient.", HelpName = "exponential|compound|linear|arrhenius|polynomial-2|polynomial-3", DefaultValueFactory = static _ => "exponential" };
        Option<string> reference = new("--reference-temperature") { Description = "Temperature at which its factor is 1.", HelpName = "T", DefaultValueFactory = static _ => "25C" };
        Option<string> coefficient = new("--coefficient") { Description = "A temperature coefficient that is known already, as calibrate takes it; in place of a temperature part.", HelpName = "TEXT" };
        Option<string> zero = new("--zero") { Description = "Signal without the gas, in place of a zero part: 0.4 or \"0.4 u 0.1\".", HelpName = "SIGNAL" };
        Option<string> stepAfter = new("--step-after") { Description = "Leave out the rows of a step before this time after the first row: 12s.", HelpName = "TIME" };
        Option<string> separator = new("--separator") { Description = "comma, semicolon or tab; told from each header when left out.", HelpName = "NAME" };
        Option<bool> decimalComma = new("--decimal-comma") { Description = "Commas are the decimal marks of the files." };
        Option<string> probe = new("--probe") { Description = "Id or type of the probe, for the report.", HelpName = "ID" };
        Option<string> output = new("--output") { Description = "Write everything as JSON (format probecal-characterisation).", HelpName = "FILE" };
        Option<string> firmware = new("--firmware") { Description = "Write the coefficients for a firmware: a C header when it ends in .h, otherwise lines of key=value.", HelpName = "FILE" };
        Option<bool> force = new("--force") { Description = "Replace existing outputs." };
        Command command = new(
            "characterise",
            """
            A probe's coefficients from a laboratory run: temperature, linearity, time constant, residual current, stirring.

            temperature and linearity need a signal and its reference: a partial-pressure column, or the station pressure of air-saturated
            water (or water-saturated air) with its temperature. Rows that share a level are averaged first. A step begins with its file.

            Examples:
              probecal characterise --input zero=zero.csv --input temperature=temps.csv \
                --column "signal=I [nA]" --column "temperature=T [C]" --column "pressure=Baro [hPa]" \
                --output p17.json
              probecal characterise --input step-up=up.csv --input step-down=down.csv \
                --column "signal=I [nA]" --column "time=t [s]" --firmware p17.h
              probecal characterise --input linearity=gas.csv --input stirring=stir.csv --zero "0.4 u 0.1" \
                --column signal=mV --column "partial-pressure=pO2 [hPa]" --column stirring=Stirrer
            """)
        {
            input, columns, form, reference, coefficient, zero, stepAfter, separator, decimalComma, probe, output, firmware, force,
        };
        command.SetAction(parsed =>
        {
            Characterisation found = LabCharacterisation.Run(new CharacterisationRequest
            {
                Inputs = parsed.GetValue(input) ?? [],
                Columns = parsed.GetValue(columns) ?? [],
                Separator = parsed.GetValue(separator),
                DecimalComma = parsed.GetValue(decimalComma),
                Probe = parsed.GetValue(probe),
                Form = parsed.GetValue(form)!,
                ReferenceTemperature = parsed.GetValue(reference)!,
                Coefficient = parsed.GetValue(coefficient),
                Zero = parsed.GetValue(zero),
                StepAfter = parsed.GetValue(stepAfter),
            });
            bool replace = parsed.GetValue(force);
            if (parsed.GetValue(output) is string json)
            {
                CharacterisationFiles.WriteJson(found, json, replace, terminal.Time.GetUtcNow(), ProgramIdentity.Text);
                terminal.Error.WriteLine("written: " + json);
            }

            if (parsed.GetValue(firmware) is string load)
            {
                CharacterisationFiles.WriteFirmware(found, load, replace);
                terminal.Error.WriteLine("written: " + load);
            }

            CharacterisationText.Write(terminal.Page(), found);
            return ExitCode.Done;
        });
        return command;
    }
}
