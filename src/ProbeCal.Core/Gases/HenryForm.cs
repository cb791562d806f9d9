namespace ProbeCal;

/// <summary>The ways in which a Henry's-law constant is written. Zero is none of them; the numbers never change.</summary>
public enum HenryForm
{
    /// <summary>Concentration over partial pressure, mol/(m³·Pa).</summary>
    Hcp = 1,
    /// <summary>Concentration over concentration in the gas, dimensionless.</summary>
    Hcc = 2,
    /// <summary>Molality over partial pressure, mol/(kg·Pa).</summary>
    Hbp = 3,
    /// <summary>Mole fraction over partial pressure, 1/Pa.</summary>
    Hxp = 4,
    /// <summary>Partial pressure over concentration, Pa·m³/mol.</summary>
    Kpc = 5,
    /// <summary>Partial pressure over mole fraction, Pa.</summary>
    Kpx = 6,
    /// <summary>Concentration in the gas over concentration, dimensionless.</summary>
    Kcc = 7,
    /// <summary>Volume of gas, reduced to 0 °C, over volume of water at one unit of pressure, dimensionless.</summary>
    Bunsen = 8,
    /// <summary>Volume of gas, at the temperature of the water, over volume of water, dimensionless: the same number as Hcc.</summary>
    Ostwald = 9,
}
