using System.CommandLine;
using System.Linq;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>The options of <c>probecal correct</c>: which table, which calibration, what is written, how drift and fouling are taken back.</summary>
internal sealed class CorrectOptions
{
    private readonly Option<string> _input = Of("--input", "FILE", "The table of raw readings; it is only read.");
    private readonly Option<string> _output = Of("--output", "FILE", "Where the rows go with the results behind them; never over something that is there.");
    private readonly Option<string[]> _columns = new("--column") { Description = "Which quantity is which column: \"signal=DO raw [nA]\". Once for each of time, signal, temperature, pressure, salinity, depth.", HelpName = "Q=COLUMN [UNIT]" };
    private readonly Option<string> _probe = Of("--probe", "ID", "The probe: each row is corrected by its calibration in force then.");
    private readonly Option<string> _calibration = Of("--calibration", "ID", "Or one calibration for all rows.");
    private readonly Option<string> _timeOffset = Of("--time-offset", "OFFSET", "How the clock of the table was set, where the times do not say so: +02:00, -0330, UTC.");
    private readonly Option<string> _timeForm = Of("--time-form", "PATTERN", "Pattern of the times where the year does not come first: \"MM/dd/yyyy HH:mm\"; epoch and epoch-ms for seconds and milliseconds since 1970.");
    private readonly Option<string> _temperature = Of("--temperature", "T", "Water temperature of all rows, where no column has it: 12.5C.");
    private readonly Option<string> _pressure = Of("--pressure", "P", "Absolute station pressure of all rows: 742mmHg, 989hPa; none goes without, which costs % of local pressure.");
    private readonly Option<string> _salinity = Of("--salinity", "S", "Practical salinity of all rows, 0 for fresh water; none goes without, which costs concentrations.");
    private readonly Option<string> _depth = Of("--depth", "Z", "Depth of the probe in all rows: 9m; a column may have it too. The surface when nothing says it.");
    private readonly Option<string> _altitude = Of("--altitude", "Z", "Judge the pressures by it, as a station does: 640m.");
    private readonly Option<string> _equation = Of("--equation", "NAME", "Solubility equation by author and year (default benson-krause-1984).");
    private readonly Option<string> _stirring = Of("--stirring", "HOW", "How the water moved: stirred, still, flow-insensitive; as at the calibration when left out.");
    private readonly Option<string> _signalUncertainty = Of("--signal-uncertainty", "u", "Standard uncertainty of one signal, in its unit; from the calibration when left out.");
    private readonly Option<string> _temperatureUncertainty = Of("--temperature-uncertainty", "u", "Of one temperature, without its thermometer's offset: 0.03K.");
    private readonly Option<string> _pressureUncertainty = Of("--pressure-uncertainty", "u", "Of the pressure: 1hPa.");
    private readonly Option<string> _salinityUncertainty = Of("--salinity-uncertainty", "u", "Of the salinity: 0.1.");
    private readonly Option<string[]> _write = new("--write") { Description = "Columns to write, with their decimals: \"mg/L:3,percent-local:1,u(mg/L):shortest\". shortest is the shortest text that reads back as the same number.", HelpName = "COLUMN[:N]" };
    private readonly Option<string> _drift = Of("--drift", "FORM", "How drift is taken back: slope-and-zero (default, scales with the reading), percent, constant (both TM 1-D3), none.");
    private readonly Option<string> _driftFrom = Of("--drift-from", "WHAT", "What tells the drift: visits (default), or calibrations: from one calibration to the next.");
    private readonly Option<string> _fouling = Of("--fouling", "FORM", "How fouling is taken back: the same forms.");
    private readonly Option<string> _applyAbove = Of("--apply-above", "C", "Take errors back where their sum is above this (default 0.3mg/L, TM 1-D3).");
    private readonly Option<string> _ratings = Of("--ratings", "A,B,C", "Largest sums of excellent, good and fair values, mg/L (default 0.3,0.5,0.8, TM 1-D3).");
    private readonly Option<string> _largest = Of("--largest", "C", "Largest correction that is published, mg/L (default 2.0mg/L, TM 1-D3), or --largest-percent where that is more.");
    private readonly Option<string> _largestPercent = Of("--largest-percent", "P", "The same in per cent of the value (default 20%, TM 1-D3).");
    private readonly Option<string> _separator = Of("--separator", "NAME", "comma, semicolon or tab; told from the header when left out.");
    private readonly Option<string> _headerLine = Of("--header-line", "N", "Line that names the columns; the first that is neither blank nor a comment (#) when left out.");
    private readonly Option<bool> _decimalComma = new("--decimal-comma") { Description = "Commas are the decimal marks of the table." };
    private readonly Option<string> _again = Of("--again", "REVISION", "Make the next revision of one, or of all in a folder, whose calibrations or visits were withdrawn, replaced or added to.");
    private readonly Option<string> _data = Of("--data", "DIR", "Folder of the calibration log (default probecal-data).");

    /// <summary>Gives the options to a command, in the order of its help.</summary>
    internal void AddTo(Command command)
    {
        foreach (Option option in new Option[]
        {
            _input, _output, _columns, _probe, _calibration, _timeOffset, _timeForm, _temperature, _pressure, _salinity, _depth, _altitude, _write, _separator, _headerLine,
            _decimalComma, _drift, _driftFrom, _fouling, _applyAbove, _ratings, _largest, _largestPercent, _equation, _stirring, _signalUncertainty,
            _temperatureUncertainty, _pressureUncertainty, _salinityUncertainty, _again, _data,
        })
        {
            command.Options.Add(option);
        }
    }

    /// <summary>Folder of the calibration log.</summary>
    internal string Data(ParseResult parsed)
    {
        return parsed.GetValue(_data) ?? CalibrateCommand.UsualData;
    }

    /// <summary>The revision or folder to do again; null when a table is to be corrected.</summary>
    internal string? Again(ParseResult parsed)
    {
        return parsed.GetValue(_again);
    }

    /// <summary>Where the output was said to go; null when nobody said.</summary>
    internal string? Output(ParseResult parsed)
    {
        return parsed.GetValue(_output);
    }

    /// <summary>Refuses options that play no part beside --again.</summary>
    internal void RefuseBesideAgain(ParseResult parsed)
    {
        Option? other = new Option[] { _input, _columns, _probe, _calibration, _timeOffset, _timeForm, _temperature, _pressure, _salinity, _write, _drift, _fouling }
            .FirstOrDefault(each => parsed.GetResult(each) is { Implicit: false });
        if (other is not null)
        {
            throw new InputException($"{other.Name} plays no part beside --again, which does again what the revision says");
        }
    }

    /// <summary>What is asked.</summary>
    internal CorrectionRequest Request(ParseResult parsed)
    {
        return new CorrectionRequest
        {
            Input = parsed.GetValue(_input) ?? throw new InputException("--input is missing: the table of raw readings"),
            Output = parsed.GetValue(_output) ?? throw new InputException("--output is missing: where the rows go with their results, for example --output june-r1.csv"),
            Columns = parsed.GetValue(_columns) ?? [],
            Probe = parsed.GetValue(_probe),
            Calibration = parsed.GetValue(_calibration),
            TimeOffset = parsed.GetValue(_timeOffset),
            TimeForm = parsed.GetValue(_timeForm),
            Temperature = parsed.GetValue(_temperature),
            Pressure = parsed.GetValue(_pressure),
            Salinity = parsed.GetValue(_salinity),
            Depth = parsed.GetValue(_depth),
            Altitude = parsed.GetValue(_altitude),
            Equation = parsed.GetValue(_equation),
            Stirring = parsed.GetValue(_stirring),
            SignalUncertainty = parsed.GetValue(_signalUncertainty),
            TemperatureUncertainty = parsed.GetValue(_temperatureUncertainty),
            PressureUncertainty = parsed.GetValue(_pressureUncertainty),
            SalinityUncertainty = parsed.GetValue(_salinityUncertainty),
            Write = parsed.GetValue(_write) ?? [],
            Drift = parsed.GetValue(_drift) ?? CorrectionForms.SlopeAndZero,
            DriftFrom = parsed.GetValue(_driftFrom) ?? CorrectionForms.Visits,
            Fouling = parsed.GetValue(_fouling) ?? CorrectionForms.SlopeAndZero,
            Limits = Limits(parsed),
            Separator = parsed.GetValue(_separator),
            HeaderLine = parsed.GetValue(_headerLine),
            DecimalComma = parsed.GetValue(_decimalComma),
        };
    }

    private ServiceLimits Limits(ParseResult parsed)
    {
        ServiceLimits limits = new();
        bool entered = false;
        if (parsed.GetValue(_applyAbove) is string above)
        {
            (limits, entered) = (limits with { ApplyAbove = NotNegative(_applyAbove, above, QuantityKind.MassConcentration) }, true);
        }

        if (parsed.GetValue(_ratings) is string ratings)
        {
            string[] parts = ratings.Split(',');
            double[] ends = [.. parts.Select(each => Number.Parse(_ratings.Name, each))];
            if (ends.Length != 3 || !(0 <= ends[0] && ends[0] < ends[1] && ends[1] < ends[2]))
            {
                throw Wrong.Input(_ratings.Name, ratings, "write three rising numbers in mg/L, for example 0.3,0.5,0.8");
            }

            (limits, entered) = (limits with { ExcellentUpTo = ends[0], GoodUpTo = ends[1], FairUpTo = ends[2] }, true);
        }

        if (parsed.GetValue(_largest) is string largest)
        {
            (limits, entered) = (limits with { LargestMilligramsPerLitre = NotNegative(_largest, largest, QuantityKind.MassConcentration) }, true);
        }

        if (parsed.GetValue(_largestPercent) is string percent)
        {
            (limits, entered) = (limits with { LargestPercent = NotNegative(_largestPercent, percent, QuantityKind.Percent) }, true);
        }

        return entered ? limits with { Source = "entered, the rest " + ServiceLimits.DefaultSource } : limits;
    }

    private static double NotNegative(Option<string> option, string text, QuantityKind kind)
    {
        double value = Quantity.Parse(kind, option.Name, text);
        return 0 <= value ? value : throw Wrong.Input(option.Name, text, "this is zero or above");
    }

    private static Option<string> Of(string name, string help, string description)
    {
        return new Option<string>(name) { Description = description, HelpName = help };
    }
}
