using System.Collections.Generic;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>
/// The words in which a person, or a row of a file, describes one equilibrium: each as typed, with its unit; null for what was not said.
/// The options of the command line carry the same names.
/// </summary>
public sealed record EquilibriumEntry
{
    /// <summary>Formula or English name of the gas; oxygen when not said.</summary>
    public string? Gas { get; init; }

    /// <summary>Name of the solubility equation; the default of the gas when not said.</summary>
    public string? Equation { get; init; }

    /// <summary>Water temperature: <c>20</c>, <c>68F</c>. Required.</summary>
    public string? Temperature { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? TemperatureUncertainty { get; init; }

    /// <summary>Or its limits: half the width.</summary>
    public string? TemperatureWithin { get; init; }

    /// <summary>Practical salinity. Required unless another of the water is given.</summary>
    public string? Salinity { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? SalinityUncertainty { get; init; }

    /// <summary>Or its limits: half the width.</summary>
    public string? SalinityWithin { get; init; }

    /// <summary>Conductivity as measured, in place of a salinity.</summary>
    public string? Conductivity { get; init; }

    /// <summary>The temperature it was measured at; that of the water when not said.</summary>
    public string? ConductivityTemperature { get; init; }

    /// <summary>Standard uncertainty of that temperature.</summary>
    public string? ConductivityTemperatureUncertainty { get; init; }

    /// <summary>Chlorinity of sea water, in place of a salinity.</summary>
    public string? Chlorinity { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? ChlorinityUncertainty { get; init; }

    /// <summary>The ions of a brine that is not sea salt, in place of a salinity: <c>Na+=0.5mol/L, Cl-=0.5mol/L</c>.</summary>
    public string? Ions { get; init; }

    /// <summary>Conductivity at 25 °C in place of a salinity.</summary>
    public string? SpecificConductance { get; init; }

    /// <summary>Standard uncertainty of the conductivity given.</summary>
    public string? ConductivityUncertainty { get; init; }

    /// <summary>Absolute station pressure with its unit. It or the altitude is required.</summary>
    public string? Pressure { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? PressureUncertainty { get; init; }

    /// <summary>Or its limits: half the width.</summary>
    public string? PressureWithin { get; init; }

    /// <summary>Altitude with its unit.</summary>
    public string? Altitude { get; init; }

    /// <summary>Pressure reduced to sea level, in place of a station pressure; takes the altitude with it.</summary>
    public string? SeaLevelPressure { get; init; }

    /// <summary>Air temperature at the station, for the sea-level pressure.</summary>
    public string? AirTemperature { get; init; }

    /// <summary>Mole fraction of the gas in dry air, in place of the usual one.</summary>
    public string? MoleFraction { get; init; }

    /// <summary>Its standard uncertainty, also for the fraction in a mixture.</summary>
    public string? MoleFractionUncertainty { get; init; }

    /// <summary>Or its limits: half the width.</summary>
    public string? MoleFractionWithin { get; init; }

    /// <summary>A gas mixture in place of air: <c>O2=5%, N2=95%</c>.</summary>
    public string? Mixture { get; init; }

    /// <summary>Partial pressure of the gas in place of a gas phase.</summary>
    public string? PartialPressure { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? PartialPressureUncertainty { get; init; }

    /// <summary>Relative humidity of the gas phase; 100 % when not said.</summary>
    public string? Humidity { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? HumidityUncertainty { get; init; }

    /// <summary>Or its limits: half the width.</summary>
    public string? HumidityWithin { get; init; }

    /// <summary>What was measured in the water, for the other way round: <c>8.1mg/L</c>, <c>250umol/kg</c>.</summary>
    public string? Concentration { get; init; }

    /// <summary>Its standard uncertainty, in a unit of the same kind.</summary>
    public string? ConcentrationUncertainty { get; init; }

    /// <summary>Depth of a probe under water, for the partial pressure that it feels there.</summary>
    public string? Depth { get; init; }

    /// <summary>Understands the words.</summary>
    /// <exception cref="InputException">Something is missing, cannot be read or contradicts something else; one line says what.</exception>
    public EquilibriumCase Read()
    {
        Gas gas = Gas is null ? ProbeCal.Gas.Oxygen : GasNames.Parse("--gas", Gas);
        UncertainQuantity temperature = ReadTemperature();
        WaterSalinity water = WaterSalinity.Read(this, temperature.Value);
        StationPressure pressure = StationPressure.Parse(Pressure, Altitude, PressureUncertainty, SeaLevelPressure, AirTemperature);
        UncertainQuantity stated = UncertainQuantity.Read(pressure.Hectopascal, QuantityKind.Pressure, "--pressure", PressureUncertainty, PressureWithin);
        List<string> notes = [];
        if (pressure.Note is string note)
        {
            notes.Add(note);
        }

        if (water.Brine?.Note is string charges)
        {
            notes.Add(charges);
        }

        return new EquilibriumCase
        {
            Gas = gas,
            Equation = EquationNames.ParseOrDefault("--equation", Equation, gas),
            EquationAssumed = Equation is null,
            Temperature = temperature,
            Water = water,
            // A stand-in for the barometer is never better than it is, whatever limits are stated.
            Pressure = stated.StandardUncertainty < pressure.UncertaintyHectopascal ? new UncertainQuantity(pressure.Hectopascal, pressure.UncertaintyHectopascal) : stated,
            PressureSource = pressure.Source,
            Phase = GasPhase.Read(gas, this),
            Measured = MeasuredConcentration.Read(this, water),
            DepthMetres = Depth is null ? null : ProbeDepth.Read(Depth, water),
            Notes = notes,
        };
    }

    /// <summary>Understands the temperature of the water.</summary>
    /// <exception cref="InputException">It is missing or cannot be read.</exception>
    internal UncertainQuantity ReadTemperature()
    {
        if (Temperature is null)
        {
            throw new InputException("--temperature is missing: the temperature of the water, for example --temperature 20 or 68F");
        }

        double celsius = Quantity.TemperatureCelsius("--temperature", Temperature);
        return UncertainQuantity.Read(celsius, QuantityKind.TemperatureDifference, "--temperature", TemperatureUncertainty, TemperatureWithin);
    }
}
