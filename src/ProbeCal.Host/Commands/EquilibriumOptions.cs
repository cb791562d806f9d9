using System.CommandLine;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Host.Commands;

/// <summary>
/// The options that describe one equilibrium: gas, water, gas phase, and how well each is known. Made once for each command that takes them.
/// None is required here: what is missing, <see cref="EquilibriumEntry.Read"/> says, for a file may hold it.
/// </summary>
internal sealed class EquilibriumOptions
{
    private readonly Option<string> _gas = Of("--gas", "GAS", "The gas by formula or name: O2, nitrogen, CO2, CH4. O2 when left out.");
    private readonly Option<string> _equation = Of("--equation", "NAME", "Solubility equation by author and year; each gas has its default.");
    private readonly Option<string> _temperature = Of("--temperature", "T", "Water temperature: 20, 20C, 68F.");
    private readonly Option<string> _temperatureUncertainty = Of("--temperature-uncertainty", "u", "Standard uncertainty of the temperature: 0.1K.");
    private readonly Option<string> _temperatureWithin = Of("--temperature-within", "a", "Or the limits of its specification: 0.2K to either side.");
    private readonly Option<string> _salinity = Of("--salinity", "S", "Practical salinity; 0 for fresh water.");
    private readonly Option<string> _salinityUncertainty = Of("--salinity-uncertainty", "u", "Standard uncertainty of the salinity: 0.1.");
    private readonly Option<string> _salinityWithin = Of("--salinity-within", "a", "Or its limits to either side.");
    private readonly Option<string> _conductivity = Of("--conductivity", "C", "In place of a salinity: conductivity as measured, 42mS/cm (PSS-78).");
    private readonly Option<string> _conductivityTemperature = Of("--conductivity-temperature", "T", "The temperature it was measured at, where it is not the water's.");
    private readonly Option<string> _conductivityTemperatureUncertainty = Of("--conductivity-temperature-uncertainty", "u", "Standard uncertainty of that temperature: 0.1K.");
    private readonly Option<string> _chlorinity = Of("--chlorinity", "CL", "In place of a salinity: chlorinity of sea water in g/kg, 19.4.");
    private readonly Option<string> _chlorinityUncertainty = Of("--chlorinity-uncertainty", "u", "Standard uncertainty of the chlorinity: 0.01.");
    private readonly Option<string> _ions = Of("--ions", "IONS", "In place of a salinity: the ions of a brine that is not sea salt, \"Na+=0.5mol/L, Cl-=0.5mol/L\".");
    private readonly Option<string> _specificConductance = Of("--specific-conductance", "SC", "In place of a salinity: conductivity at 25 °C of field water, 500uS/cm.");
    private readonly Option<string> _conductivityUncertainty = Of("--conductivity-uncertainty", "u", "Standard uncertainty of the conductivity: 5uS/cm.");
    private readonly Option<string> _pressure = Of("--pressure", "P", "Absolute station pressure with its unit: 760mmHg, 938hPa, 27.7inHg. Not the sea-level value of a weather service.");
    private readonly Option<string> _pressureUncertainty = Of("--pressure-uncertainty", "u", "Standard uncertainty of the pressure: 1hPa.");
    private readonly Option<string> _pressureWithin = Of("--pressure-within", "a", "Or its limits to either side: 2hPa.");
    private readonly Option<string> _altitude = Of("--altitude", "Z", "Altitude with its unit: 640m, 2100ft. Stands in for a barometer where --pressure is missing; with it, the pressure is judged.");
    private readonly Option<string> _seaLevelPressure = Of("--sea-level-pressure", "P", "Second best, with --altitude: a pressure reduced to sea level, as weather services tell it, 1021hPa.");
    private readonly Option<string> _airTemperature = Of("--air-temperature", "T", "Air temperature at the station, for --sea-level-pressure; the standard atmosphere's when left out.");
    private readonly Option<string> _depth = Of("--depth", "Z", "Depth of a probe under water: adds the partial pressure that it feels there, 15m.");
    private readonly Option<string> _moleFraction = Of("--mole-fraction", "X", "Fraction of the gas in dry air where it is not the usual one: 420ppm, 1.9ppm, 21%.");
    private readonly Option<string> _moleFractionUncertainty = Of("--mole-fraction-uncertainty", "u", "Standard uncertainty of the fraction: 5ppm.");
    private readonly Option<string> _moleFractionWithin = Of("--mole-fraction-within", "a", "Or its limits to either side: 10ppm.");
    private readonly Option<string> _mixture = Of("--mixture", "GASES", "A gas mixture in place of air: \"O2=5%, N2=95%\".");
    private readonly Option<string> _partialPressure = Of("--partial-pressure", "p", "Partial pressure of the gas in place of a gas phase: 200hPa.");
    private readonly Option<string> _partialPressureUncertainty = Of("--partial-pressure-uncertainty", "u", "Its standard uncertainty: 1hPa.");
    private readonly Option<string> _humidity = Of("--humidity", "RH", "Relative humidity of the gas phase; 100% when left out.");
    private readonly Option<string> _humidityUncertainty = Of("--humidity-uncertainty", "u", "Standard uncertainty of the humidity: 2%.");
    private readonly Option<string> _humidityWithin = Of("--humidity-within", "a", "Or its limits to either side: 5%.");
    private readonly Option<string> _concentration = Of("--concentration", "C", "The other way round: what was measured in the water, 8.1mg/L, 250umol/L, 250umol/kg, 5.7mL/L.");
    private readonly Option<string> _concentrationUncertainty = Of("--concentration-uncertainty", "u", "Its standard uncertainty: 0.1mg/L.");

    /// <summary>Gives the options to a command, in the order of its help.</summary>
    internal void AddTo(Command command)
    {
        foreach (Option<string> option in new[]
        {
            _gas, _equation, _temperature, _salinity, _conductivity, _conductivityTemperature, _specificConductance, _chlorinity, _ions,
            _pressure, _altitude, _seaLevelPressure, _airTemperature, _moleFraction, _mixture, _partialPressure, _humidity, _concentration, _depth,
            _temperatureUncertainty, _temperatureWithin, _salinityUncertainty, _salinityWithin, _conductivityUncertainty, _conductivityTemperatureUncertainty, _chlorinityUncertainty,
            _pressureUncertainty, _pressureWithin, _moleFractionUncertainty, _moleFractionWithin, _partialPressureUncertainty,
            _humidityUncertainty, _humidityWithin, _concentrationUncertainty,
        })
        {
            command.Options.Add(option);
        }
    }

    /// <summary>What was given for them.</summary>
    internal EquilibriumEntry Entry(ParseResult parsed)
    {
        return new EquilibriumEntry
        {
            Gas = parsed.GetValue(_gas),
            Equation = parsed.GetValue(_equation),
            Temperature = parsed.GetValue(_temperature),
            TemperatureUncertainty = parsed.GetValue(_temperatureUncertainty),
            TemperatureWithin = parsed.GetValue(_temperatureWithin),
            Salinity = parsed.GetValue(_salinity),
            SalinityUncertainty = parsed.GetValue(_salinityUncertainty),
            SalinityWithin = parsed.GetValue(_salinityWithin),
            Conductivity = parsed.GetValue(_conductivity),
            ConductivityTemperature = parsed.GetValue(_conductivityTemperature),
            ConductivityTemperatureUncertainty = parsed.GetValue(_conductivityTemperatureUncertainty),
            Chlorinity = parsed.GetValue(_chlorinity),
            ChlorinityUncertainty = parsed.GetValue(_chlorinityUncertainty),
            Ions = parsed.GetValue(_ions),
            SpecificConductance = parsed.GetValue(_specificConductance),
            ConductivityUncertainty = parsed.GetValue(_conductivityUncertainty),
            Pressure = parsed.GetValue(_pressure),
            PressureUncertainty = parsed.GetValue(_pressureUncertainty),
            PressureWithin = parsed.GetValue(_pressureWithin),
            Altitude = parsed.GetValue(_altitude),
            SeaLevelPressure = parsed.GetValue(_seaLevelPressure),
            AirTemperature = parsed.GetValue(_airTemperature),
            Depth = parsed.GetValue(_depth),
            MoleFraction = parsed.GetValue(_moleFraction),
            MoleFractionUncertainty = parsed.GetValue(_moleFractionUncertainty),
            MoleFractionWithin = parsed.GetValue(_moleFractionWithin),
            Mixture = parsed.GetValue(_mixture),
            PartialPressure = parsed.GetValue(_partialPressure),
            PartialPressureUncertainty = parsed.GetValue(_partialPressureUncertainty),
            Humidity = parsed.GetValue(_humidity),
            HumidityUncertainty = parsed.GetValue(_humidityUncertainty),
            HumidityWithin = parsed.GetValue(_humidityWithin),
            Concentration = parsed.GetValue(_concentration),
            ConcentrationUncertainty = parsed.GetValue(_concentrationUncertainty),
        };
    }

    private static Option<string> Of(string name, string shown, string description)
    {
        return new Option<string>(name) { Description = description, HelpName = shown };
    }
}
