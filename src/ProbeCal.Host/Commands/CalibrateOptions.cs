using System.Collections.Generic;
using System.CommandLine;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Host.Commands;

/// <summary>
/// The options of <c>probecal calibrate</c> and <c>probecal check</c>: names, groups and help only. Every value is text;
/// Station's parsers read it.
/// </summary>
internal sealed class CalibrateOptions
{
    private readonly List<Option> _all = [];
    private readonly List<(string Title, List<Option> Options)> _groups = [];

    /// <param name="check">True for a check, which also says when in the day it is.</param>
    internal CalibrateOptions(bool check)
    {
        Begin("Where readings come from");
        Data = Text("--data", "DIR", "Folder of the calibration log and of unfinished calibrations (default probecal-data).");
        Source = Text("--source", "ADDRESS", "Where readings come from: serial:/dev/ttyUSB0?baud=9600, tcp:HOST:PORT, file:PATH, stdin, simulated.");
        Line = Text("--line", "TEMPLATE", "How a line reads (default {time},{signal},{temperature},{pressure}).");
        Manual = Flag("--manual", "Readings are typed from a meter that shows only mg/L or %.");
        Unattended = Flag("--unattended", "Ask nothing; for scripts. Exit code 0 pass, 1 fail or not finished, 2 wrong input.");
        StartOver = Flag("--start-over", "Set an unfinished calibration of this probe aside and begin anew.");
        Simulated = Flag("--simulated", "Mark the record as simulated, for a line that a simulation writes.");
        Format = Text("--format", "text|json", "Result as text (default) or as the record in JSON.");

        Begin("The probe");
        Probe = Text("--probe", "ID", "The probe.");
        Model = Text("--model", "TEXT", "Response model (default amperometric; meter-display with --manual) with the coefficients that a calibration does not change: 'uchida-2008 c0=0.0028 c1=…'. Models: " + string.Join(", ", ModelNames.All) + ".");
        GasOption = Text("--gas", "GAS", "Gas that the probe answers to (default O2).");
        Membrane = Text("--membrane", "ID", "Membrane or cap on it.");
        MembraneInstalled = Text("--membrane-installed", "DATE", "Day it was put on: 2026-05-01.");
        Coefficient = Text("--coefficient", "TEXT", "Temperature coefficient with its form: 'exponential 0.03/K at 25C fitted 5..35C u 0.002/K'; also compound, linear, arrhenius 22kJ/mol.");
        SignalResolution = Text("--signal-resolution", "X", "Smallest step of the signal, in its unit.");
        SignalRange = Text("--signal-range", "LOW..HIGH", "Ends of the input's range, in the signal's unit.");
        SignalUnit = Text("--signal-unit", "UNIT", "Unit of the signal, a label, where --line names none.");
        Thermometer = Text("--thermometer", "ID", "Thermometer that gives the temperature (default: the probe's own; for a --temperature typed beside live signals, one without a name).");
        ThermometerUncertainty = Text("--thermometer-uncertainty", "u", "Standard uncertainty of its offset, common to calibration and readings: 0.05K.");

        Begin("The method, and what its truth rests on");
        Method = Text("--method", "NAME", string.Join(", ", MethodIds.All) + ".");
        Mixture = Text("--mixture", "TEXT", "For gas-mixture: cylinder, content, dry or humid: 'CYL-21 20.95% u 0.02% dry'.");
        Titration = Text("--titration", "TEXT", "For titration: '8.02mL,8.05mL,8.03mL flask 300.2mL titrant 0.025mol/L u 0.0001mol/L drawn 20.1C'; also blank, aliquot, displaced, reagents, burette, standard. Left out while the samples wait to be titrated (24 h).");
        Transfer = Text("--transfer", "TEXT", "For transfer-standard: what it showed beside the probe: 'STD-3 8.41mg/L u 0.05mg/L'.");
        Level = Many("--level", "METHOD: TEXT", "One more point of a fit: 'gas-mixture: CYL-22 10.02% u 0.02% dry'. May be given several times.");
        Form = Text("--form", "FORM", "Fit through several points: line (default) or quadratic.");
        Zero = Text("--zero", "PLAN", "keep (default): the last measured zero of this membrane; assume; check: read and judge; adjust: read and use.");
        ZeroMethod = Text("--zero-method", "NAME", "zero-solution (default, sulfite) or zero-gas (nitrogen).");
        ZeroMixture = Text("--zero-mixture", "TEXT", "Purity of the zero gas, where it is certified: 'CYL-2 0ppm u 1ppm dry'.");
        Equipment = Many("--equipment", "ID", "Reference equipment used, by its id in the register (barometers, cylinders and standards named elsewhere are added). May be given several times.");
        Begin("Conditions");
        Pressure = Text("--pressure", "P", "Absolute station pressure with its unit: 742mmHg. Left out when the line carries it.");
        PressureSource = Text("--pressure-source", "SOURCE", "barometer:ID, weather-service:NAME, airport:NAME, telephone, or altitude when there is no pressure at all.");
        PressureUncertainty = Text("--pressure-uncertainty", "u", "Standard uncertainty of the pressure: 1hPa.");
        Altitude = Text("--altitude", "Z", "Altitude with its unit: 640m, 2100ft. The pressure is judged against it.");
        Temperature = Text("--temperature", "T", "Temperature at the probe, where the line carries none or another thermometer counts.");
        TemperatureUncertainty = Text("--temperature-uncertainty", "u", "Standard uncertainty of one temperature without the thermometer's offset: 0.03K.");
        Salinity = Text("--salinity", "S", "Practical salinity of the water; 0 for fresh water.");
        SalinityUncertainty = Text("--salinity-uncertainty", "u", "Standard uncertainty of the salinity: 0.1.");
        StirringOption = Text("--stirring", "HOW", "stirred, still, or flow-insensitive for a probe that does not need it.");
        AirToWaterRatio = Text("--air-to-water-ratio", "X", "Signal in air over signal in stirred water (default 1.00, from memory).");
        AirToWaterUncertainty = Text("--air-to-water-uncertainty", "u", "Its standard uncertainty: 1.5%.");
        ReferenceUncertainty = Text("--reference-uncertainty", "u", "How near to equilibrium the bath or chamber is, standard uncertainty: 0.5%.");
        Equation = Text("--equation", "NAME", "benson-krause-1984 (default) or garcia-gordon-1992.");

        Begin("Limits and waiting");
        Limit = Text("--limit", "X", "Limit of the error: 0.2mg/L (default for oxygen, TM 9-A6.2). Other gases and total gas have no default: 5hPa.");
        LimitPercent = Text("--limit-percent", "X", "The same in % of the reference; the larger of the two applies: 2% (default for oxygen).");
        ZeroLimit = Text("--zero-limit", "X", "Limit of the zero reading: 0.2mg/L (default for oxygen, TM 9-A6.2); for other gases in hPa (default that of --limit).");
        GuardBand = Flag("--guard-band", "Accept only what lies within a limit by its whole expanded uncertainty (default: simple acceptance).");
        ZeroWindow = Text("--zero-window", "LOW..HIGH", "Zero signal that the probe's maker allows, in the signal's unit; none unless entered.");
        StoneDepth = Text("--stone-depth", "Z", "Depth at which bubbles are released into the bath: 0.3m; bubbles under water supersaturate it.");
        EquilibratedAt = Text("--equilibrated-at", "T", "Temperature at which the water of the bath was last in equilibrium with air: 12C.");
        AirTemperature = Text("--air-temperature", "T", "Temperature of the air in the chamber: 21C.");
        SlopeWindow = Text("--slope-window", "LOW..HIGH", "Slope that the probe's maker allows, per hPa; none unless entered.");
        Window = Text("--window", "TIME", "Length of a steady window: 3min (default).");
        Samples = Text("--samples", "N", "Least number of samples in it: 30 (default).");
        StableWithin = Text("--stable-within", "X", "What may still move over a window: by default a quarter of --limit, 0.05mg/L.");
        StableTemperature = Text("--stable-temperature", "X", "The same for temperature: 0.05K (default).");
        GiveUpAfter = Text("--give-up-after", "TIME", "Longest wait for one point: 30min (default).");

        Begin("Reasons and the record");
        Confirm = Many("--confirm", "GUARD=REASON", "Reason for going on past a guard; it goes into the record. May be given several times.");
        ConfirmPressure = Text("--confirm-pressure", "REASON", "The same for all guards on the pressure.");
        By = Text("--by", "NAME", "Who calibrates.");
        Site = Text("--site", "NAME", "Site; the pressure is compared with the last one here.");
        Remarks = Text("--remarks", "TEXT", "Remarks for the record.");

        Begin("A meter that you read (--manual)");
        MeterShows = Text("--meter-shows", "UNIT", "With --manual: mg/L, %local (100 % is equilibrium at the pressure here) or %1atm (at 1 atm).");
        MeterSalinity = Text("--meter-salinity", "S", "Salinity set in the meter (default 0).");
        MeterPressure = Text("--meter-pressure", "P", "Pressure set in the meter; left out when it has its own barometer.");
        MeterTemperature = Text("--meter-temperature", "T", "Temperature set in the meter by hand; left out when it has its own thermometer.");
        MeterResolution = Text("--meter-resolution", "X", "Last digit of the display (default 0.01 mg/L or 0.1 %).");
        AsFound = Text("--as-found", "X", "What the meter shows before it is set: 8.61mg/L or 98.2%.");
        AsLeft = Text("--as-left", "X", "What it shows after it was set.");
        ZeroReading = Text("--zero-reading", "X", "What it shows in the zero solution.");
        Reading = Many("--reading", "ROLE=X", "What it shows at another point: level-1=4.2mg/L. May be given several times.");

        Begin("Help");
        As = Text("--as", "KIND", "initial, continuing or end-of-day: which readings of the day the check brackets.", listed: check);
        Steps = Flag("--steps", "Print the guided procedure of --method and do nothing.");
        Options = Flag("--options", "Print all options by group and do nothing.");
    }

    internal IReadOnlyList<Option> All => _all;

    /// <summary>The options in groups, for help.</summary>
    internal IReadOnlyList<(string Title, List<Option> Options)> Groups => _groups;

    internal Option<string> Data { get; }
    internal Option<string> Source { get; }
    internal Option<string> Line { get; }
    internal Option<bool> Manual { get; }
    internal Option<bool> Unattended { get; }
    internal Option<bool> StartOver { get; }
    internal Option<bool> Simulated { get; }
    internal Option<string> Format { get; }
    internal Option<string> Probe { get; }
    internal Option<string> Membrane { get; }
    internal Option<string> MembraneInstalled { get; }
    internal Option<string> Coefficient { get; }
    internal Option<string> SignalResolution { get; }
    internal Option<string> SignalRange { get; }
    internal Option<string> SignalUnit { get; }
    internal Option<string> Thermometer { get; }
    internal Option<string> ThermometerUncertainty { get; }
    internal Option<string> Method { get; }
    internal Option<string> Pressure { get; }
    internal Option<string> PressureSource { get; }
    internal Option<string> PressureUncertainty { get; }
    internal Option<string> Altitude { get; }
    internal Option<string> Temperature { get; }
    internal Option<string> TemperatureUncertainty { get; }
    internal Option<string> Salinity { get; }
    internal Option<string> SalinityUncertainty { get; }
    internal Option<string> StirringOption { get; }
    internal Option<string> AirToWaterRatio { get; }
    internal Option<string> AirToWaterUncertainty { get; }
    internal Option<string> ReferenceUncertainty { get; }
    internal Option<string> Equation { get; }
    internal Option<string> Zero { get; }
    internal Option<string> Limit { get; }
    internal Option<string> LimitPercent { get; }
    internal Option<string> ZeroLimit { get; }
    internal Option<string> SlopeWindow { get; }
    internal Option<string> ZeroWindow { get; }
    internal Option<string> StoneDepth { get; }
    internal Option<string> EquilibratedAt { get; }
    internal Option<string> AirTemperature { get; }
    internal Option<string> Window { get; }
    internal Option<string> Samples { get; }
    internal Option<string> StableWithin { get; }
    internal Option<string> StableTemperature { get; }
    internal Option<string> GiveUpAfter { get; }
    internal Option<string[]> Confirm { get; }
    internal Option<string> ConfirmPressure { get; }
    internal Option<string> By { get; }
    internal Option<string> Site { get; }
    internal Option<string> Remarks { get; }
    internal Option<string> MeterShows { get; }
    internal Option<string> MeterSalinity { get; }
    internal Option<string> MeterPressure { get; }
    internal Option<string> MeterTemperature { get; }
    internal Option<string> MeterResolution { get; }
    internal Option<string> AsFound { get; }
    internal Option<string> AsLeft { get; }
    internal Option<string> ZeroReading { get; }
    internal Option<bool> Options { get; }
    internal Option<bool> Steps { get; }
    internal Option<string> As { get; }
    internal Option<string[]> Reading { get; }
    internal Option<bool> GuardBand { get; }
    internal Option<string[]> Equipment { get; }
    internal Option<string> ZeroMixture { get; }
    internal Option<string> ZeroMethod { get; }
    internal Option<string> Form { get; }
    internal Option<string[]> Level { get; }
    internal Option<string> Transfer { get; }
    internal Option<string> Titration { get; }
    internal Option<string> Mixture { get; }
    internal Option<string> GasOption { get; }
    internal Option<string> Model { get; }

    private void Begin(string title)
    {
        _groups.Add((title, []));
    }

    private Option<string> Text(string name, string placeholder, string help, bool listed = true)
    {
        Option<string> option = new(name) { Description = help, HelpName = placeholder };
        return listed ? Add(option) : option;
    }

    private Option<string[]> Many(string name, string placeholder, string help)
    {
        return Add(new Option<string[]>(name) { Description = help, HelpName = placeholder, Arity = ArgumentArity.ZeroOrMore });
    }

    private Option<bool> Flag(string name, string help)
    {
        return Add(new Option<bool>(name) { Description = help });
    }

    private T Add<T>(T option)
        where T : Option
    {
        _all.Add(option);
        _groups[^1].Options.Add(option);
        return option;
    }
}
