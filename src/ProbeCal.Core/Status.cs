namespace ProbeCal;

/// <summary>
/// What became of a computation. Every function of Core that can refuse its input returns one of these and gives its
/// value by <c>out</c>; the value is NaN unless the status is <see cref="Ok"/> or the caller asked for
/// <see cref="RangeRule.Extrapolate"/>. Each refusal names the input at fault.
/// </summary>
/// <remarks>
/// The number is built from two parts so that a device, which prints an enum as a number, still tells both: the high byte
/// is the input (<see cref="StatusParts.Input"/>), the low byte the reason (<see cref="StatusParts.Reason"/>).
/// </remarks>
public enum Status
{
    /// <summary>The value is inside every stated range.</summary>
    Ok = 0,

    /// <summary>Temperature is NaN or infinite.</summary>
    TemperatureNotFinite = 0x0101,
    /// <summary>Temperature is below the range of the equation.</summary>
    TemperatureBelowRange = 0x0102,
    /// <summary>Temperature is above the range of the equation.</summary>
    TemperatureAboveRange = 0x0103,
    /// <summary>Temperature is below the range of the equation by no more than the 0.2 K of <see cref="RangeRule.NearEdge"/>.</summary>
    TemperatureJustBelowRange = 0x0105,
    /// <summary>Temperature is above the range of the equation by no more than the 0.2 K of <see cref="RangeRule.NearEdge"/>.</summary>
    TemperatureJustAboveRange = 0x0106,

    /// <summary>Salinity is NaN or infinite.</summary>
    SalinityNotFinite = 0x0201,
    /// <summary>Salinity is negative.</summary>
    SalinityBelowRange = 0x0202,
    /// <summary>Salinity is above the range of the equation.</summary>
    SalinityAboveRange = 0x0203,

    /// <summary>Total pressure is NaN or infinite.</summary>
    PressureNotFinite = 0x0301,
    /// <summary>Total pressure is below the range of the equation.</summary>
    PressureBelowRange = 0x0302,
    /// <summary>Total pressure is above the range of the equation.</summary>
    PressureAboveRange = 0x0303,

    /// <summary>Partial pressure is NaN or infinite.</summary>
    PartialPressureNotFinite = 0x0401,
    /// <summary>Partial pressure is below what the function takes.</summary>
    PartialPressureBelowRange = 0x0402,
    /// <summary>Partial pressure is above what the function takes.</summary>
    PartialPressureAboveRange = 0x0403,

    /// <summary>Concentration is NaN or infinite.</summary>
    ConcentrationNotFinite = 0x0501,
    /// <summary>Concentration is below what the function takes.</summary>
    ConcentrationBelowRange = 0x0502,
    /// <summary>Concentration is above what the function takes.</summary>
    ConcentrationAboveRange = 0x0503,

    /// <summary>The raw signal is NaN or infinite.</summary>
    SignalNotFinite = 0x0601,
    /// <summary>The raw signal is below what the probe can give.</summary>
    SignalBelowRange = 0x0602,
    /// <summary>The raw signal is above what the probe can give.</summary>
    SignalAboveRange = 0x0603,

    /// <summary>The slope is NaN or infinite.</summary>
    SlopeNotFinite = 0x0701,
    /// <summary>The slope is zero or has the wrong sign.</summary>
    SlopeBelowRange = 0x0702,
    /// <summary>The slope is above what the function takes.</summary>
    SlopeAboveRange = 0x0703,

    /// <summary>The zero signal is NaN or infinite.</summary>
    ZeroNotFinite = 0x0801,
    /// <summary>The zero signal is below what the function takes.</summary>
    ZeroBelowRange = 0x0802,
    /// <summary>The zero signal is above what the function takes.</summary>
    ZeroAboveRange = 0x0803,

    /// <summary>A coefficient (temperature coefficient, Henry's-law constant, flow factor, air-to-water ratio) is NaN or infinite.</summary>
    CoefficientNotFinite = 0x0901,
    /// <summary>A coefficient is below what the function takes.</summary>
    CoefficientBelowRange = 0x0902,
    /// <summary>A coefficient is above what the function takes.</summary>
    CoefficientAboveRange = 0x0903,
    /// <summary>The form of a coefficient is not one of those that Core knows.</summary>
    CoefficientUnknown = 0x0904,

    /// <summary>Altitude is NaN or infinite.</summary>
    AltitudeNotFinite = 0x0A01,
    /// <summary>Altitude is below the range of the standard atmosphere.</summary>
    AltitudeBelowRange = 0x0A02,
    /// <summary>Altitude is above the range of the standard atmosphere.</summary>
    AltitudeAboveRange = 0x0A03,

    /// <summary>A standard uncertainty is NaN or infinite.</summary>
    UncertaintyNotFinite = 0x0B01,
    /// <summary>A standard uncertainty is negative.</summary>
    UncertaintyBelowRange = 0x0B02,
    /// <summary>A standard uncertainty is above what the function takes.</summary>
    UncertaintyAboveRange = 0x0B03,

    /// <summary>One of the samples or points is NaN or infinite.</summary>
    PointsNotFinite = 0x0C01,
    /// <summary>There are fewer samples or points than the computation needs.</summary>
    PointsBelowRange = 0x0C02,
    /// <summary>There are more samples or points than the caller's arrays hold.</summary>
    PointsAboveRange = 0x0C03,
    /// <summary>The points are identical or otherwise do not determine the result.</summary>
    PointsDegenerate = 0x0C04,

    /// <summary>Density is NaN or infinite.</summary>
    DensityNotFinite = 0x0D01,
    /// <summary>Density is zero or negative.</summary>
    DensityBelowRange = 0x0D02,
    /// <summary>Density is above what the function takes.</summary>
    DensityAboveRange = 0x0D03,

    /// <summary>The equation is not one of those that Core knows.</summary>
    EquationUnknown = 0x0E04,

    /// <summary>The percentage of saturation is NaN or infinite.</summary>
    SaturationNotFinite = 0x0F01,
    /// <summary>The percentage of saturation is below what the function takes.</summary>
    SaturationBelowRange = 0x0F02,
    /// <summary>The percentage of saturation is above what the function takes.</summary>
    SaturationAboveRange = 0x0F03,

    /// <summary>Specific conductance is NaN or infinite.</summary>
    ConductanceNotFinite = 0x1001,
    /// <summary>Specific conductance is negative.</summary>
    ConductanceBelowRange = 0x1002,
    /// <summary>Specific conductance is above the range of the relation.</summary>
    ConductanceAboveRange = 0x1003,

    /// <summary>Mole fraction is NaN or infinite, or the gas has no usual one.</summary>
    MoleFractionNotFinite = 0x1101,
    /// <summary>Mole fraction is negative.</summary>
    MoleFractionBelowRange = 0x1102,
    /// <summary>Mole fraction is above 1.</summary>
    MoleFractionAboveRange = 0x1103,

    /// <summary>Relative humidity is NaN or infinite.</summary>
    HumidityNotFinite = 0x1201,
    /// <summary>Relative humidity is negative.</summary>
    HumidityBelowRange = 0x1202,
    /// <summary>Relative humidity is above 100 %.</summary>
    HumidityAboveRange = 0x1203,

    /// <summary>Depth or hydrostatic pressure is NaN or infinite.</summary>
    DepthNotFinite = 0x1301,
    /// <summary>Depth or hydrostatic pressure is negative.</summary>
    DepthBelowRange = 0x1302,
    /// <summary>Depth or hydrostatic pressure is above what the relation takes.</summary>
    DepthAboveRange = 0x1303,

    /// <summary>The gas is not one of those that Core knows, or the function has no data for it.</summary>
    GasUnknown = 0x1404,

    /// <summary>The ion is not one of those that the salting-out constants cover.</summary>
    IonUnknown = 0x1504,

    /// <summary>A volume (titre, flask, aliquot) is NaN or infinite.</summary>
    VolumeNotFinite = 0x1601,
    /// <summary>A volume is negative, or too small for what is taken from it.</summary>
    VolumeBelowRange = 0x1602,
    /// <summary>A volume is larger than what it is taken from.</summary>
    VolumeAboveRange = 0x1603,
}

/// <summary>Which input a <see cref="Status"/> is about: its high byte.</summary>
public enum InputQuantity
{
    /// <summary>No input is at fault.</summary>
    None = 0,
    /// <summary>Temperature.</summary>
    Temperature = 1,
    /// <summary>Salinity.</summary>
    Salinity = 2,
    /// <summary>Total pressure.</summary>
    Pressure = 3,
    /// <summary>Partial pressure of the gas.</summary>
    PartialPressure = 4,
    /// <summary>Concentration of the gas.</summary>
    Concentration = 5,
    /// <summary>Raw signal.</summary>
    Signal = 6,
    /// <summary>Slope of the probe.</summary>
    Slope = 7,
    /// <summary>Zero signal of the probe.</summary>
    Zero = 8,
    /// <summary>A coefficient of the probe or of a law.</summary>
    Coefficient = 9,
    /// <summary>Altitude.</summary>
    Altitude = 10,
    /// <summary>A standard uncertainty.</summary>
    Uncertainty = 11,
    /// <summary>The samples or points as a whole.</summary>
    Points = 12,
    /// <summary>Density of the water.</summary>
    Density = 13,
    /// <summary>The solubility equation asked for.</summary>
    Equation = 14,
    /// <summary>Percentage of saturation.</summary>
    Saturation = 15,
    /// <summary>Specific conductance of the water.</summary>
    Conductance = 16,
    /// <summary>Mole fraction of the gas in the dry gas phase.</summary>
    MoleFraction = 17,
    /// <summary>Relative humidity of the gas phase.</summary>
    Humidity = 18,
    /// <summary>Depth or hydrostatic pressure.</summary>
    Depth = 19,
    /// <summary>The gas asked for.</summary>
    Gas = 20,
    /// <summary>The dissolved ion asked for.</summary>
    Ion = 21,
    /// <summary>A volume of a titration.</summary>
    Volume = 22,
}

/// <summary>Why an input was refused: the low byte of a <see cref="Status"/>.</summary>
public enum RefusalReason
{
    /// <summary>Nothing was refused.</summary>
    None = 0,
    /// <summary>NaN or infinite.</summary>
    NotFinite = 1,
    /// <summary>Below the stated range.</summary>
    BelowRange = 2,
    /// <summary>Above the stated range.</summary>
    AboveRange = 3,
    /// <summary>Neither below nor above: unknown, or not enough to determine the result.</summary>
    Unusable = 4,
    /// <summary>Below the stated range by no more than the near-edge margin.</summary>
    JustBelowRange = 5,
    /// <summary>Above the stated range by no more than the near-edge margin.</summary>
    JustAboveRange = 6,
}

/// <summary>Takes a <see cref="Status"/> apart.</summary>
public static class StatusParts
{
    /// <summary>The input at fault.</summary>
    public static InputQuantity Input(Status status)
    {
        return (InputQuantity)((int)status >> 8);
    }

    /// <summary>Why it was refused.</summary>
    public static RefusalReason Reason(Status status)
    {
        return (RefusalReason)((int)status & 0xFF);
    }
}

/// <summary>What to do with a finite input outside an equation's stated range.</summary>
public enum RangeRule
{
    /// <summary>Refuse: the status names the input and the value is NaN.</summary>
    Refuse = 0,
    /// <summary>Compute all the same: the status still names the input, so that the value stays flagged.</summary>
    Extrapolate = 1,
    /// <summary>
    /// Compute a temperature up to 0.2 K outside the range (a thermistor at 0 °C in winter) and refuse what lies further: the status says
    /// just below or just above, so that the value stays flagged, and its uncertainty is enlarged.
    /// </summary>
    NearEdge = 2,
}
