namespace ProbeCal.Station.Equilibrium;

/// <summary>What an equilibrium is computed from, each the root of an uncertainty of its own. The numbers are places in an array.</summary>
internal enum EquilibriumInput
{
    /// <summary>Water temperature, °C.</summary>
    Temperature = 0,
    /// <summary>What says how salty the water is: a salinity, or what it comes from.</summary>
    Water = 1,
    /// <summary>Total pressure, hPa.</summary>
    Pressure = 2,
    /// <summary>Mole fraction of the gas.</summary>
    MoleFraction = 3,
    /// <summary>Humidity, %.</summary>
    Humidity = 4,
    /// <summary>Partial pressure as given, hPa.</summary>
    PartialPressure = 5,
    /// <summary>Concentration measured, in the canonical unit of its kind.</summary>
    Concentration = 6,
    /// <summary>The equation's own error: a factor about 1 on the concentration.</summary>
    Equation = 7,
    /// <summary>The vapour formula's own error: a factor about 1 on the vapour pressure.</summary>
    Vapour = 8,
    /// <summary>Temperature of a conductivity where it is not that of the water, °C.</summary>
    ConductivityTemperature = 9,
    /// <summary>Error of the relation that the salinity was got by, in salinity about 0.</summary>
    SalinityRelation = 10,
    /// <summary>Error of what the ions leave: a factor about 1 on it.</summary>
    SaltingOut = 11,
    /// <summary>How many there are.</summary>
    Count = 12,
}
