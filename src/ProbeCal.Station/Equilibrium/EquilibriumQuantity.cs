namespace ProbeCal.Station.Equilibrium;

/// <summary>What an equilibrium computation gives; each comes with its own standard uncertainty.</summary>
public enum EquilibriumQuantity
{
    /// <summary>Saturation vapour pressure over the water, hPa.</summary>
    VapourPressure = 1,
    /// <summary>Partial pressure of the gas in the gas phase, hPa.</summary>
    PartialPressure = 2,
    /// <summary>Concentration at equilibrium, mg/L.</summary>
    MilligramsPerLitre = 3,
    /// <summary>Concentration at equilibrium, µmol/L.</summary>
    MicromolesPerLitre = 4,
    /// <summary>Concentration at equilibrium, µmol per kilogram of water.</summary>
    MicromolesPerKilogram = 5,
    /// <summary>Concentration at equilibrium, mL of the real gas (0 °C, 1 atm) per litre.</summary>
    MillilitresPerLitre = 6,
    /// <summary>Partial pressure against that of the same gas phase at 1 atm, %: how far the local pressure moves "100 %".</summary>
    PercentOfOneAtmosphere = 7,

    /// <summary>Concentration measured, mg/L.</summary>
    MeasuredMilligramsPerLitre = 20,
    /// <summary>Concentration measured, µmol/L.</summary>
    MeasuredMicromolesPerLitre = 21,
    /// <summary>Concentration measured, µmol per kilogram of water.</summary>
    MeasuredMicromolesPerKilogram = 22,
    /// <summary>Concentration measured, mL of the real gas per litre.</summary>
    MeasuredMillilitresPerLitre = 23,
    /// <summary>Partial pressure of the gas in the water measured, hPa.</summary>
    MeasuredPartialPressure = 24,
    /// <summary>Partial pressure in the water against that of the gas phase at the local pressure, %.</summary>
    PercentLocal = 25,
    /// <summary>Partial pressure in the water against that of the same gas phase at 1 atm, %.</summary>
    PercentOneAtmosphere = 26,
    /// <summary>Concentration measured less the one at equilibrium, mg/L: above 0 the water is supersaturated.</summary>
    ExcessMilligramsPerLitre = 27,
}
