namespace ProbeCal;

/// <summary>Whether a pressure can be the absolute pressure at an altitude.</summary>
public enum PressureVerdict
{
    /// <summary>Possible at this altitude.</summary>
    Plausible = 1,
    /// <summary>Possible, but unusually high: wants confirmation with a reason.</summary>
    ConfirmHigh = 2,
    /// <summary>Possible, but unusually low: wants confirmation with a reason.</summary>
    ConfirmLow = 3,
    /// <summary>Higher than the air ever is there: a sea-level value, a wrong unit, or feet typed as metres.</summary>
    RefusedHigh = 4,
    /// <summary>Lower than the air ever is there: a wrong unit, or metres typed as feet.</summary>
    RefusedLow = 5,
}

/// <summary>
/// Judges a typed or measured pressure against the altitude: reduced to sea level by the standard atmosphere, it must be a
/// pressure that weather makes.
/// </summary>
/// <remarks>
/// Bands on the reduced pressure: above 1050 hPa refused, 1035–1050 confirmed; below 950 confirmed, below 870 refused. Only
/// strong cold anticyclones pass 1050, and 870 is the lowest sea-level pressure on record, in a typhoon (both from memory);
/// 950 is a deep storm, in which hardly anyone calibrates (our choice, no source). The reduction uses the standard
/// temperature: a day 15 K colder at 1000 m shifts the reduced value by about +0.7 %.
/// </remarks>
public static class PressurePlausibility
{
    /// <summary>Reduced pressure above which a value is refused, hPa.</summary>
    public const double HighestSeaLevelHectopascal = 1050.0;
    /// <summary>Reduced pressure above which a value wants confirmation, hPa.</summary>
    public const double UsualHighestSeaLevelHectopascal = 1035.0;
    /// <summary>Reduced pressure below which a value wants confirmation, hPa.</summary>
    public const double UsualLowestSeaLevelHectopascal = 950.0;
    /// <summary>Reduced pressure below which a value is refused, hPa.</summary>
    public const double LowestSeaLevelHectopascal = 870.0;

    /// <summary>The verdict on a pressure at an altitude.</summary>
    /// <param name="pressureHectopascal">Pressure said to be the absolute station pressure, hPa.</param>
    /// <param name="altitudeMetres">Altitude of the station, m.</param>
    /// <param name="verdict">The verdict; <see cref="PressureVerdict.RefusedHigh"/> stands there without meaning unless Ok.</param>
    /// <param name="seaLevelHectopascal">The pressure reduced to sea level, hPa; NaN unless Ok.</param>
    /// <returns>A status of the pressure or the altitude.</returns>
    public static Status Judge(double pressureHectopascal, double altitudeMetres, out PressureVerdict verdict, out double seaLevelHectopascal)
    {
        verdict = PressureVerdict.RefusedHigh;
        Status status = StandardAtmosphere.ReduceToSeaLevel(pressureHectopascal, altitudeMetres, out seaLevelHectopascal);
        if (status != Status.Ok) { return status; }
        if (double.IsInfinity(seaLevelHectopascal))
        {
            seaLevelHectopascal = double.NaN;
            return Status.PressureAboveRange;
        }

        if (HighestSeaLevelHectopascal < seaLevelHectopascal) { verdict = PressureVerdict.RefusedHigh; }
        else if (seaLevelHectopascal < LowestSeaLevelHectopascal) { verdict = PressureVerdict.RefusedLow; }
        else if (UsualHighestSeaLevelHectopascal < seaLevelHectopascal) { verdict = PressureVerdict.ConfirmHigh; }
        else if (seaLevelHectopascal < UsualLowestSeaLevelHectopascal) { verdict = PressureVerdict.ConfirmLow; }
        else { verdict = PressureVerdict.Plausible; }
        return Status.Ok;
    }

    /// <summary>
    /// True when the value could be a sea-level value and a station value alike, so that it alone cannot tell, and the person
    /// must say where it came from. At usual weather this is so below about 500 m.
    /// </summary>
    /// <param name="pressureHectopascal">The pressure, hPa.</param>
    /// <param name="altitudeMetres">Altitude of the station, m.</param>
    /// <returns>False for input that <see cref="Judge"/> refuses.</returns>
    public static bool MayBeSeaLevelValue(double pressureHectopascal, double altitudeMetres)
    {
        Status status = Judge(pressureHectopascal, altitudeMetres, out PressureVerdict verdict, out double _);
        if (status != Status.Ok) { return false; }
        if (verdict == PressureVerdict.RefusedHigh || verdict == PressureVerdict.RefusedLow) { return false; }
        return UsualLowestSeaLevelHectopascal <= pressureHectopascal && pressureHectopascal <= HighestSeaLevelHectopascal;
    }

    /// <summary>
    /// The error that a sea-level value would cause if it were taken as station pressure: the reference computed with it less
    /// the reference at the pressure that stands behind it.
    /// </summary>
    /// <param name="equation">Solubility equation.</param>
    /// <param name="temperatureCelsius">Temperature, °C.</param>
    /// <param name="salinity">Practical salinity.</param>
    /// <param name="pressureHectopascal">The pressure in doubt, hPa.</param>
    /// <param name="altitudeMetres">Altitude of the station, m.</param>
    /// <param name="milligramsPerLitre">
    /// Error of the reference, mg/L; NaN unless Ok. Positive above sea level: as found, the probe seems to read low by it, and
    /// once adjusted, later readings are high by it (at saturation; in proportion below).
    /// </param>
    /// <returns>The input at fault, or Ok.</returns>
    public static Status SeaLevelValueError(
        SolubilityEquation equation,
        double temperatureCelsius,
        double salinity,
        double pressureHectopascal,
        double altitudeMetres,
        out double milligramsPerLitre)
    {
        milligramsPerLitre = double.NaN;
        Status status = StandardAtmosphere.FromSeaLevel(pressureHectopascal, altitudeMetres, out double station);
        if (status != Status.Ok) { return status; }
        return ExpectedEffect.ReferenceError(
            equation, salinity, temperatureCelsius, station, temperatureCelsius, pressureHectopascal, out milligramsPerLitre);
    }
}
