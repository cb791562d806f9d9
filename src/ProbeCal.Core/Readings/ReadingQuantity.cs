namespace ProbeCal;

/// <summary>The quantities that a corrected reading holds. The numbers are indices of its arrays.</summary>
public enum ReadingQuantity
{
    /// <summary>Partial pressure of the gas at the probe, or the total pressure of a total-gas probe, hPa.</summary>
    PartialPressure = 0,
    /// <summary>Concentration, mg/L.</summary>
    MilligramsPerLitre = 1,
    /// <summary>Concentration, µmol/L.</summary>
    MicromolesPerLitre = 2,
    /// <summary>Content, µmol/kg.</summary>
    MicromolesPerKilogram = 3,
    /// <summary>Saturation relative to air at the local pressure, %; of a total-gas probe its pressure over the local one.</summary>
    PercentLocal = 4,
    /// <summary>Saturation relative to air at 1 atm, %; of a total-gas probe its pressure over 1 atm.</summary>
    PercentOneAtmosphere = 5,
}

/// <summary>What contributes to the uncertainty of a reading. The numbers are indices of its arrays.</summary>
public enum UncertaintySource
{
    /// <summary>Offset of the thermometer, common to calibration and reading; zero when two thermometers were used.</summary>
    ThermometerOffset = 0,
    /// <summary>Temperature at the 100 % point, what is not common.</summary>
    TemperatureAtCalibration = 1,
    /// <summary>Temperature at the reading, what is not common.</summary>
    TemperatureAtReading = 2,
    /// <summary>Pressure at the 100 % point.</summary>
    PressureAtCalibration = 3,
    /// <summary>Pressure at the reading.</summary>
    PressureAtReading = 4,
    /// <summary>Salinity at the reading.</summary>
    SalinityAtReading = 5,
    /// <summary>The solubility equation itself.</summary>
    Equation = 6,
    /// <summary>Signal at the 100 % point.</summary>
    SignalAtCalibration = 7,
    /// <summary>Signal at the reading.</summary>
    SignalAtReading = 8,
    /// <summary>Zero, which enters the slope and the reading.</summary>
    Zero = 9,
    /// <summary>Temperature coefficient of the membrane.</summary>
    TemperatureCoefficient = 10,
    /// <summary>Air-to-water ratio.</summary>
    AirToWaterRatio = 11,
    /// <summary>How near the reference was to its ideal state.</summary>
    ReferenceState = 12,
    /// <summary>Stirring at the reading against that at the calibration.</summary>
    Stirring = 13,
    /// <summary>The parameters of a fit through several points, with their covariance.</summary>
    Fit = 14,
    /// <summary>Drift of the probe since its calibration, see <see cref="ReadingGrowth"/>.</summary>
    Drift = 15,
    /// <summary>What grew on the probe since it was cleaned, see <see cref="ReadingGrowth"/>.</summary>
    Fouling = 16,
}
