namespace ProbeCal;

/// <summary>
/// Air pressure as a function of altitude in the lowest layer of the standard atmosphere: the second-best answer, for a
/// person without a barometer.
/// </summary>
/// <remarks>
/// US Standard Atmosphere 1976 (same layer in ISO 2533 and ICAO Doc 7488): p = p₀·(1 − L·H/T₀)^n with n = g₀·M₀/(R*·L), and
/// geopotential H = r·z/(r + z) for altitude z. Constants from the published standard, seen second-hand; table values used
/// as checks are recalled from memory. Range −610 to 11 000 m geopotential. Real pressure departs from it with the weather
/// by about ±3 % (limits) about the mean.
/// </remarks>
public static class StandardAtmosphere
{
    /// <summary>Pressure at altitude zero, hPa.</summary>
    public const double SeaLevelHectopascal = 1013.25;
    /// <summary>Lowest altitude taken, metres above sea level.</summary>
    public const double LowestAltitudeMetres = -610.0;
    /// <summary>Highest altitude taken, metres above sea level.</summary>
    public const double HighestAltitudeMetres = 11000.0;

    internal const double LapseKelvinPerMetre = 0.0065;
    internal const double SeaLevelKelvin = 288.15;
    // 9.80665 · 0.0289644 / (8.31432 · 0.0065): the constants of the 1976 standard.
    internal const double Exponent = 9.80665 * 0.0289644 / (8.31432 * LapseKelvinPerMetre);
    private const double EarthRadiusMetres = 6356766.0;

    /// <summary>Standard pressure at an altitude.</summary>
    /// <param name="altitudeMetres">Altitude above sea level (geometric, as on a map), −610 to 11 000 m.</param>
    /// <param name="hectopascal">Absolute pressure, hPa; NaN unless the status is Ok.</param>
    public static Status Pressure(double altitudeMetres, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = CheckAltitude(altitudeMetres);
        if (status != Status.Ok) { return status; }
        hectopascal = SeaLevelHectopascal * Ratio(altitudeMetres);
        return Status.Ok;
    }

    /// <summary>The pressure that a station pressure becomes when reduced to sea level by the standard atmosphere.</summary>
    /// <param name="stationHectopascal">Absolute pressure at the station, hPa, above zero.</param>
    /// <param name="altitudeMetres">Altitude of the station, −610 to 11 000 m.</param>
    /// <param name="hectopascal">Sea-level pressure, hPa; NaN unless the status is Ok.</param>
    /// <remarks>
    /// Weather services reduce with the temperature of the day: at 1000 m a day 15 K colder than standard gives about 0.7 %
    /// more. This function judges whether a pressure is possible at an altitude; it does not replace a barometer.
    /// </remarks>
    public static Status ReduceToSeaLevel(double stationHectopascal, double altitudeMetres, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = InputCheck.Graver(CheckPressure(stationHectopascal), CheckAltitude(altitudeMetres));
        if (status != Status.Ok) { return status; }
        return InputCheck.Deliver(stationHectopascal / Ratio(altitudeMetres), status, Status.PressureAboveRange, out hectopascal);
    }

    /// <summary>The station pressure that stands behind a sea-level pressure, by the standard atmosphere.</summary>
    /// <param name="seaLevelHectopascal">Pressure reduced to sea level, hPa, above zero.</param>
    /// <param name="altitudeMetres">Altitude of the station, −610 to 11 000 m.</param>
    /// <param name="hectopascal">Absolute pressure at the station, hPa; NaN unless the status is Ok.</param>
    public static Status FromSeaLevel(double seaLevelHectopascal, double altitudeMetres, out double hectopascal)
    {
        hectopascal = double.NaN;
        Status status = InputCheck.Graver(CheckPressure(seaLevelHectopascal), CheckAltitude(altitudeMetres));
        if (status != Status.Ok) { return status; }
        return InputCheck.Deliver(seaLevelHectopascal * Ratio(altitudeMetres), status, Status.PressureAboveRange, out hectopascal);
    }

    // Inside the range the base lies between 0.75 and 1.02, so the ratio is never zero.
    private static double Ratio(double altitudeMetres)
    {
        return Numerics.Pow(1.0 - (LapseKelvinPerMetre * Geopotential(altitudeMetres) / SeaLevelKelvin), Exponent);
    }

    /// <summary>Geopotential height in m of an altitude inside the range.</summary>
    internal static double Geopotential(double altitudeMetres)
    {
        return EarthRadiusMetres * altitudeMetres / (EarthRadiusMetres + altitudeMetres);
    }

    /// <summary>m of geopotential height per m of altitude.</summary>
    internal static double GeopotentialSlope(double altitudeMetres)
    {
        double share = EarthRadiusMetres / (EarthRadiusMetres + altitudeMetres);
        return share * share;
    }

    internal static Status CheckAltitude(double metres)
    {
        if (InputCheck.NotFinite(metres)) { return Status.AltitudeNotFinite; }
        if (metres < LowestAltitudeMetres) { return Status.AltitudeBelowRange; }
        if (HighestAltitudeMetres < metres) { return Status.AltitudeAboveRange; }
        return Status.Ok;
    }

    internal static Status CheckPressure(double hectopascal)
    {
        if (InputCheck.NotFinite(hectopascal)) { return Status.PressureNotFinite; }
        if (hectopascal <= 0.0) { return Status.PressureBelowRange; }
        return Status.Ok;
    }
}
