using ProbeCal.Station.Entry;
using ProbeCal.Station.Equilibrium;

namespace ProbeCal.Station.InWater;

/// <summary>The words in which a person describes a total-gas reading: each as typed, with its unit; null for what was not said.</summary>
public sealed record TotalGasEntry
{
    /// <summary>Total pressure of the dissolved gases, absolute. It or <see cref="DeltaPressure"/> is required.</summary>
    public string? TotalPressure { get; init; }

    /// <summary>Total pressure less that of the air, ΔP.</summary>
    public string? DeltaPressure { get; init; }

    /// <summary>Standard uncertainty of the total pressure or of ΔP, whichever was given.</summary>
    public string? TotalPressureUncertainty { get; init; }

    /// <summary>Absolute station pressure.</summary>
    public string? Pressure { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? PressureUncertainty { get; init; }

    /// <summary>Pressure reduced to sea level, with the altitude: second best.</summary>
    public string? SeaLevelPressure { get; init; }

    /// <summary>Air temperature for it.</summary>
    public string? AirTemperature { get; init; }

    /// <summary>Altitude of the station.</summary>
    public string? Altitude { get; init; }

    /// <summary>Water temperature. Required.</summary>
    public string? Temperature { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? TemperatureUncertainty { get; init; }

    /// <summary>Practical salinity. Required.</summary>
    public string? Salinity { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? SalinityUncertainty { get; init; }

    /// <summary>Oxygen in the water, by which the total is split; may be left out.</summary>
    public string? Concentration { get; init; }

    /// <summary>Its standard uncertainty.</summary>
    public string? ConcentrationUncertainty { get; init; }

    /// <summary>Partial pressure of carbon dioxide; neglected when left out.</summary>
    public string? CarbonDioxide { get; init; }

    /// <summary>A depth at which ΔP is wanted.</summary>
    public string? Depth { get; init; }

    /// <summary>Understands the words and computes.</summary>
    /// <exception cref="InputException">Something is missing, said twice, cannot be read or is impossible; one line says what.</exception>
    public TotalGas Read()
    {
        if (TotalPressure is null == (DeltaPressure is null))
        {
            throw new InputException(TotalPressure is null
                ? "--total-pressure is missing: the absolute pressure of all dissolved gases, for example --total-pressure 780mmHg, or in its place their excess over the air, --delta-p 25mmHg"
                : "--total-pressure and --delta-p say the same thing in two ways; give one of them");
        }

        if (Salinity is null)
        {
            throw new InputException("--salinity is missing: the practical salinity, 0 for fresh water");
        }

        StationPressure air = StationPressure.Parse(Pressure, Altitude, PressureUncertainty, SeaLevelPressure, AirTemperature);
        bool isTotal = TotalPressure is not null;
        double given = isTotal ? Quantity.PressureHectopascal("--total-pressure", TotalPressure!) : Quantity.PressureHectopascal("--delta-p", DeltaPressure!);
        EquilibriumEntry words = new()
        {
            Temperature = Temperature,
            TemperatureUncertainty = TemperatureUncertainty,
            Salinity = Salinity,
            SalinityUncertainty = SalinityUncertainty,
            Concentration = Concentration,
            ConcentrationUncertainty = ConcentrationUncertainty,
        };
        UncertainQuantity temperature = words.ReadTemperature();
        WaterSalinity water = WaterSalinity.Read(words, temperature.Value);
        MeasuredConcentration? oxygen = MeasuredConcentration.Read(words, water);
        double? carbonDioxide = CarbonDioxide is null ? null : UncertainQuantity.NotNegative(QuantityKind.Pressure, "--carbon-dioxide", CarbonDioxide, "a partial pressure is zero or above");
        if (carbonDioxide is not null && oxygen is null)
        {
            throw new InputException("--carbon-dioxide plays its part where the total is split, which takes --concentration, the oxygen in the water");
        }

        return TotalGas.Compute(
            new TotalGasReading
            {
                Air = air,
                IsTotalMeasured = isTotal,
                Delta = UncertainQuantity.Read(isTotal ? given - air.Hectopascal : given, QuantityKind.Pressure, "--total-pressure", TotalPressureUncertainty, null),
                Temperature = temperature,
                Salinity = water.Given,
                Oxygen = oxygen,
                CarbonDioxideHectopascal = carbonDioxide,
                DepthMetres = Depth is null ? null : ProbeDepth.Read(Depth, water),
            });
    }
}
