namespace ProbeCal;

/// <summary>
/// The quantities that a computation passes on its way. A coefficient is a step too: the equation hands out what it used, so that no table of
/// coefficients stands beside it. How a step is written and computed by hand is the catalogue's matter.
/// </summary>
public enum StepQuantity
{
    /// <summary>No step.</summary>
    None = 0,

    /// <summary>Temperature as given, °C (ITS-90).</summary>
    Celsius = 1,
    /// <summary>Practical salinity as given.</summary>
    Salinity = 2,
    /// <summary>Total pressure as given, hPa.</summary>
    PressureHectopascal = 3,
    /// <summary>Mole fraction of the gas in the dry gas phase as given.</summary>
    MoleFraction = 4,
    /// <summary>Relative humidity of the gas phase as given, %.</summary>
    HumidityPercent = 5,
    /// <summary>Partial pressure of the gas as given, hPa.</summary>
    GivenPartialPressureHectopascal = 6,
    /// <summary>Concentration as given, mg/L.</summary>
    GivenMilligramsPerLitre = 7,

    /// <summary>Temperature on IPTS-68, °C.</summary>
    CelsiusIpts68 = 10,
    /// <summary>Absolute temperature on the scale of the equation, K.</summary>
    Kelvin = 11,
    /// <summary>1/T, 1/K.</summary>
    ReciprocalKelvin = 12,
    /// <summary>T/100 K.</summary>
    HundredKelvin = 13,
    /// <summary>ln[(298.15 − t)/(273.15 + t)].</summary>
    ScaledTemperature = 14,
    /// <summary>The fresh-water part of ln C.</summary>
    FreshTerm = 15,
    /// <summary>The part of ln C that salinity adds.</summary>
    SaltTerm = 16,
    /// <summary>Natural logarithm of the equation's value.</summary>
    LogarithmOfEquation = 17,
    /// <summary>The equation's value in its own unit.</summary>
    EquationValue = 18,

    /// <summary>T over the critical temperature of water, 647.096 K.</summary>
    ReducedTemperature = 19,

    /// <summary>Density of the water, kg/m³.</summary>
    Density = 20,
    /// <summary>Molar mass of the gas, g/mol.</summary>
    GramsPerMole = 21,
    /// <summary>Molar volume of the gas at 0 °C and 1 atm, L/mol.</summary>
    LitresPerMole = 22,
    /// <summary>Concentration at the reference of the equation, mg/L.</summary>
    ReferenceMilligramsPerLitre = 23,
    /// <summary>Solubility, mg/L per hPa of the gas.</summary>
    Solubility = 24,
    /// <summary>Dry-air mole fraction that the equation is tied to.</summary>
    ReferenceMoleFraction = 25,

    /// <summary>Mass of one mL of the gas at 0 °C and 1 atm, mg.</summary>
    MilligramsPerMillilitre = 26,
    /// <summary>Power of ten and unit factor between the equation's unit and mg/L, apart from molar mass or gas density, and water density.</summary>
    UnitFactor = 27,
    /// <summary>mg/L per hPa of fugacity (of partial pressure where the equation knows no fugacity), up to 1.1 atm.</summary>
    ReferenceSolubility = 28,

    /// <summary>Total pressure, atm.</summary>
    Atmospheres = 30,
    /// <summary>Vapour pressure over the water, atm.</summary>
    VapourAtmospheres = 31,
    /// <summary>Vapour pressure over the water, hPa.</summary>
    VapourHectopascal = 32,
    /// <summary>The virial term of oxygen, 1/atm.</summary>
    Theta = 33,
    /// <summary>Pressure factor on the value at 1 atm.</summary>
    PressureFactor = 34,
    /// <summary>Second virial coefficient of the gas, cm³/mol.</summary>
    SecondVirial = 35,
    /// <summary>Cross-virial term δ, cm³/mol.</summary>
    CrossVirial = 36,
    /// <summary>Fugacity coefficient.</summary>
    FugacityCoefficient = 37,
    /// <summary>Poynting factor: what pressure does to the dissolved gas above 1.1 atm.</summary>
    PoyntingFactor = 38,
    /// <summary>Fugacity of the gas, hPa.</summary>
    FugacityHectopascal = 39,
    /// <summary>Partial molar volume of the dissolved gas, cm³/mol.</summary>
    PartialMolarVolume = 40,

    /// <summary>Vapour pressure of pure water within an equation, Pa (Wagner and Pruss 1993).</summary>
    PureWaterVapourPascal = 41,
    /// <summary>Absolute temperature as given (ITS-90) in the fugacity and Poynting terms, K.</summary>
    GasKelvin = 42,
    /// <summary>Fugacity coefficient at 1 atm, in which a moist-air equation is contained.</summary>
    ReferenceFugacityCoefficient = 43,
    /// <summary>Mole fraction of the gas in the gas phase with its vapour: partial over total pressure.</summary>
    WetMoleFraction = 44,
    /// <summary>Critical temperature of the gas, K.</summary>
    CriticalKelvin = 45,
    /// <summary>Critical pressure of the gas, atm.</summary>
    CriticalAtmospheres = 46,
    /// <summary>Acentric factor of the gas.</summary>
    AcentricFactor = 47,
    /// <summary>Total pressure above 1.1 atm, atm.</summary>
    ExcessAtmospheres = 48,

    /// <summary>Absolute temperature in the vapour formula, on its own scale, K.</summary>
    VapourKelvin = 49,

    /// <summary>Partial pressure of the gas, hPa.</summary>
    PartialPressureHectopascal = 50,
    /// <summary>Concentration, mg/L.</summary>
    MilligramsPerLitre = 51,
    /// <summary>Saturation against water in equilibrium with air under the local pressure, %.</summary>
    PercentLocal = 52,

    /// <summary>1 − T over the critical temperature of water.</summary>
    CriticalDistance = 70,
    /// <summary>Critical pressure of water, Pa.</summary>
    CriticalPascal = 71,
    /// <summary>Density of pure water in the density of sea water, kg/m³.</summary>
    PureWaterDensity = 72,
    /// <summary>What multiplies S in the density of sea water, kg/m³.</summary>
    DensityTermA = 73,
    /// <summary>What multiplies S^1.5 in the density of sea water, kg/m³.</summary>
    DensityTermB = 74,

    /// <summary>Coefficient A0 of the equation. A1 to A5 follow.</summary>
    CoefficientA0 = 100,
    /// <summary>Coefficient A1.</summary>
    CoefficientA1 = 101,
    /// <summary>Coefficient A2.</summary>
    CoefficientA2 = 102,
    /// <summary>Coefficient A3.</summary>
    CoefficientA3 = 103,
    /// <summary>Coefficient A4.</summary>
    CoefficientA4 = 104,
    /// <summary>Coefficient A5.</summary>
    CoefficientA5 = 105,
    /// <summary>Coefficient B0 of the salinity term. B1 to B3 follow.</summary>
    CoefficientB0 = 110,
    /// <summary>Coefficient B1.</summary>
    CoefficientB1 = 111,
    /// <summary>Coefficient B2.</summary>
    CoefficientB2 = 112,
    /// <summary>Coefficient B3.</summary>
    CoefficientB3 = 113,
    /// <summary>Coefficient C0 (or C1) of the squared salinity.</summary>
    CoefficientC0 = 120,

    /// <summary>Coefficient 0 of the second virial coefficient. 1 to 3 follow.</summary>
    VirialCoefficient0 = 130,
    /// <summary>Coefficient 1 of the second virial coefficient.</summary>
    VirialCoefficient1 = 131,
    /// <summary>Coefficient 2 of the second virial coefficient.</summary>
    VirialCoefficient2 = 132,
    /// <summary>Coefficient 3 of the second virial coefficient.</summary>
    VirialCoefficient3 = 133,
    /// <summary>Coefficient 0 of the cross-virial term.</summary>
    CrossVirialCoefficient0 = 140,
    /// <summary>Coefficient 1 of the cross-virial term.</summary>
    CrossVirialCoefficient1 = 141,
    /// <summary>Coefficient 0 of θ. 1 and 2 follow.</summary>
    ThetaCoefficient0 = 150,
    /// <summary>Coefficient 1 of θ.</summary>
    ThetaCoefficient1 = 151,
    /// <summary>Coefficient 2 of θ.</summary>
    ThetaCoefficient2 = 152,

    /// <summary>Coefficient 0 of the logarithm of the vapour pressure. 1 to 3 follow.</summary>
    VapourCoefficient0 = 160,
    /// <summary>Coefficient 1 of the logarithm of the vapour pressure.</summary>
    VapourCoefficient1 = 161,
    /// <summary>Coefficient 2 of the logarithm of the vapour pressure.</summary>
    VapourCoefficient2 = 162,
    /// <summary>Coefficient 3 of the logarithm of the vapour pressure.</summary>
    VapourCoefficient3 = 163,

    /// <summary>Coefficient 0 of the density of pure water. 1 to 5 follow.</summary>
    DensityCoefficientW0 = 170,
    /// <summary>Coefficient 1 of the density of pure water.</summary>
    DensityCoefficientW1 = 171,
    /// <summary>Coefficient 2 of the density of pure water.</summary>
    DensityCoefficientW2 = 172,
    /// <summary>Coefficient 3 of the density of pure water.</summary>
    DensityCoefficientW3 = 173,
    /// <summary>Coefficient 4 of the density of pure water.</summary>
    DensityCoefficientW4 = 174,
    /// <summary>Coefficient 5 of the density of pure water.</summary>
    DensityCoefficientW5 = 175,

    /// <summary>Coefficient 0 of the first salinity term of the density. 1 to 4 follow.</summary>
    DensityCoefficientA0 = 180,
    /// <summary>Coefficient 1 of the first salinity term of the density.</summary>
    DensityCoefficientA1 = 181,
    /// <summary>Coefficient 2 of the first salinity term of the density.</summary>
    DensityCoefficientA2 = 182,
    /// <summary>Coefficient 3 of the first salinity term of the density.</summary>
    DensityCoefficientA3 = 183,
    /// <summary>Coefficient 4 of the first salinity term of the density.</summary>
    DensityCoefficientA4 = 184,

    /// <summary>Coefficient 0 of the second salinity term of the density. 1 to 2 follow.</summary>
    DensityCoefficientB0 = 185,
    /// <summary>Coefficient 1 of the second salinity term of the density.</summary>
    DensityCoefficientB1 = 186,
    /// <summary>Coefficient 2 of the second salinity term of the density.</summary>
    DensityCoefficientB2 = 187,

    /// <summary>Coefficient 0 of the squared salinity in the density.</summary>
    DensityCoefficientC0 = 188,

    /// <summary>Coefficient 1 of the logarithm of the vapour pressure of pure water. 2 to 6 follow.</summary>
    PureVapourCoefficient1 = 190,
    /// <summary>Coefficient 2 of the logarithm of the vapour pressure of pure water.</summary>
    PureVapourCoefficient2 = 191,
    /// <summary>Coefficient 3 of the logarithm of the vapour pressure of pure water.</summary>
    PureVapourCoefficient3 = 192,
    /// <summary>Coefficient 4 of the logarithm of the vapour pressure of pure water.</summary>
    PureVapourCoefficient4 = 193,
    /// <summary>Coefficient 5 of the logarithm of the vapour pressure of pure water.</summary>
    PureVapourCoefficient5 = 194,
    /// <summary>Coefficient 6 of the logarithm of the vapour pressure of pure water.</summary>
    PureVapourCoefficient6 = 195,
}
