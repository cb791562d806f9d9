namespace ProbeCal;

/// <summary>
/// Station pressure from a pressure that a weather service reduced to sea level: p = p₀·[1 − L·H/(T + L·H)]^n, T the air temperature at the station in K,
/// L = 0.0065 K/m, n = 5.25588, H the geopotential height. Second best, for a person without a barometer.
/// </summary>
/// <remarks>
/// WMO-No. 8, Guide to Instruments and Methods of Observation, chapter on atmospheric pressure (from memory; the conventions of the services differ: mean temperature of
/// twelve hours, humidity, plateau corrections). With the standard atmosphere's temperature it is <see cref="StandardAtmosphere.FromSeaLevel"/>. Altitude −610 to 11 000 m. What the conventions
/// differ by is taken as ±5 K in T (our choice), an uncertainty of 0.2 % of the pressure at 1000 m and 0.4 % at 2000 m; the service's weather map adds to it.
/// </remarks>
public static class SeaLevelReduction
{
    /// <summary>Standard uncertainty of the temperature where none is known better, K: what reduction conventions differ by (our choice).</summary>
    public const double DefaultTemperatureUncertaintyKelvin = 5.0;
    /// <summary>Lowest air temperature taken, °C.</summary>
    public const double LowestCelsius = -80.0;
    /// <summary>Highest air temperature taken, °C.</summary>
    public const double HighestCelsius = 60.0;

    /// <summary>The standard atmosphere's temperature at an altitude: what stands in for an air temperature that nobody read.</summary>
    /// <param name="altitudeMetres">Altitude of the station, −610 to 11 000 m.</param>
    /// <param name="celsius">Air temperature, °C; NaN unless the status is Ok.</param>
    public static Status StandardCelsius(double altitudeMetres, out double celsius)
    {
        celsius = double.NaN;
        Status status = StandardAtmosphere.CheckAltitude(altitudeMetres);
        if (status != Status.Ok) { return status; }
        celsius = StandardAtmosphere.SeaLevelKelvin - TemperatureScale.KelvinAtZeroCelsius
            - (StandardAtmosphere.LapseKelvinPerMetre * StandardAtmosphere.Geopotential(altitudeMetres));
        return status;
    }

    /// <summary>Absolute pressure at the station.</summary>
    /// <param name="seaLevelHectopascal">Pressure reduced to sea level, hPa, above zero.</param>
    /// <param name="altitudeMetres">Altitude of the station, −610 to 11 000 m. At 0 m the pressures are equal.</param>
    /// <param name="celsius">Air temperature at the station, −80 to 60 °C.</param>
    /// <param name="hectopascal">Absolute pressure at the station, hPa; NaN unless the status is Ok.</param>
    public static Status StationPressure(double seaLevelHectopascal, double altitudeMetres, double celsius, out double hectopascal)
    {
        return Compute(seaLevelHectopascal, altitudeMetres, celsius, out hectopascal, out _, out _, out _);
    }

    /// <summary>How the station pressure answers to each of its inputs.</summary>
    /// <param name="seaLevelHectopascal">Pressure reduced to sea level, hPa, above zero.</param>
    /// <param name="altitudeMetres">Altitude of the station, −610 to 11 000 m.</param>
    /// <param name="celsius">Air temperature at the station, −80 to 60 °C.</param>
    /// <param name="perSeaLevelHectopascal">∂p/∂p₀, hPa per hPa; NaN unless the status is Ok.</param>
    /// <param name="perMetre">∂p/∂altitude, hPa per m; NaN unless the status is Ok.</param>
    /// <param name="perKelvin">∂p/∂T, hPa per K; NaN unless the status is Ok.</param>
    public static Status Sensitivities(
        double seaLevelHectopascal, double altitudeMetres, double celsius,
        out double perSeaLevelHectopascal, out double perMetre, out double perKelvin)
    {
        return Compute(seaLevelHectopascal, altitudeMetres, celsius, out _, out perSeaLevelHectopascal, out perMetre, out perKelvin);
    }

    /// <summary>Standard uncertainty of the station pressure for independent inputs.</summary>
    /// <param name="seaLevelHectopascal">Pressure reduced to sea level, hPa, above zero.</param>
    /// <param name="altitudeMetres">Altitude of the station, −610 to 11 000 m.</param>
    /// <param name="celsius">Air temperature at the station, −80 to 60 °C.</param>
    /// <param name="pressureUncertaintyHectopascal">Standard uncertainty of the sea-level pressure, hPa.</param>
    /// <param name="altitudeUncertaintyMetres">Standard uncertainty of the altitude, m.</param>
    /// <param name="temperatureUncertaintyKelvin">Standard uncertainty of the temperature that the service reduced with, K (<see cref="DefaultTemperatureUncertaintyKelvin"/>).</param>
    /// <param name="hectopascal">Standard uncertainty, hPa; NaN unless the status is Ok.</param>
    public static Status StandardUncertainty(
        double seaLevelHectopascal, double altitudeMetres, double celsius,
        double pressureUncertaintyHectopascal, double altitudeUncertaintyMetres, double temperatureUncertaintyKelvin,
        out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = Compute(
            seaLevelHectopascal, altitudeMetres, celsius, out _, out double perPressure, out double perMetre, out double perKelvin);
        status = InputCheck.Graver(status, InputCheck.Uncertainty(pressureUncertaintyHectopascal));
        status = InputCheck.Graver(status, InputCheck.Uncertainty(altitudeUncertaintyMetres));
        status = InputCheck.Graver(status, InputCheck.Uncertainty(temperatureUncertaintyKelvin));
        if (status != Status.Ok) { return status; }
        double ofPressure = perPressure * pressureUncertaintyHectopascal;
        double ofAltitude = perMetre * altitudeUncertaintyMetres;
        double ofTemperature = perKelvin * temperatureUncertaintyKelvin;
        return InputCheck.Deliver(
            Numerics.Sqrt((ofPressure * ofPressure) + (ofAltitude * ofAltitude) + (ofTemperature * ofTemperature)),
            status, Status.UncertaintyAboveRange, out hectopascal);
    }

    private static Status Compute(
        double seaLevelHectopascal, double altitudeMetres, double celsius,
        out double hectopascal, out double perPressure, out double perMetre, out double perKelvin)
    {
        hectopascal = double.NaN;
        perPressure = double.NaN;
        perMetre = double.NaN;
        perKelvin = double.NaN;
        Status status = InputCheck.Graver(
            StandardAtmosphere.CheckPressure(seaLevelHectopascal), StandardAtmosphere.CheckAltitude(altitudeMetres));
        status = InputCheck.Graver(status, InputCheck.Temperature(celsius, LowestCelsius, HighestCelsius));
        if (status != Status.Ok) { return status; }
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        double warmer = StandardAtmosphere.LapseKelvinPerMetre * StandardAtmosphere.Geopotential(altitudeMetres);
        // Inside the ranges the temperature at sea level is at least 189 K and at most 405 K.
        double atSeaLevel = kelvin + warmer;
        if (atSeaLevel <= 0.0 || kelvin <= 0.0) { return Status.TemperatureBelowRange; }
        double ratio = Numerics.Pow(1.0 - (warmer / atSeaLevel), StandardAtmosphere.Exponent);
        status = InputCheck.Deliver(seaLevelHectopascal * ratio, status, Status.PressureAboveRange, out hectopascal);
        if (status != Status.Ok) { return status; }
        double log = StandardAtmosphere.Exponent / atSeaLevel;
        perPressure = ratio;
        perMetre = -hectopascal * log * StandardAtmosphere.LapseKelvinPerMetre * StandardAtmosphere.GeopotentialSlope(altitudeMetres);
        perKelvin = hectopascal * log * warmer / kelvin;
        return status;
    }
}
