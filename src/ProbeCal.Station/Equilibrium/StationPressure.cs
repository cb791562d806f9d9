using System;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>
/// The station pressure of a computation as a person gives it: from a barometer; second best, from a pressure reduced to sea
/// level and the altitude; or from the altitude alone.
/// </summary>
/// <param name="Hectopascal">Absolute station pressure, hPa.</param>
/// <param name="Source"><c>given</c>, <c>sea-level</c> or <c>altitude</c>.</param>
/// <param name="UncertaintyHectopascal">Standard uncertainty, hPa.</param>
public sealed record StationPressure(double Hectopascal, string Source, double UncertaintyHectopascal)
{
    /// <summary>
    /// Least standard uncertainty of a pressure taken from the altitude alone, hPa: the weather moves it by some 3 % about
    /// the mean at most (from memory), which is about 10 hPa as a standard uncertainty (our choice).
    /// </summary>
    public const double AltitudeOnlyUncertaintyHectopascal = 10;

    /// <summary>
    /// Standard uncertainty of the air temperature that a service reduced with, where nobody read one and the standard atmosphere's stands in, K: the seasons about it,
    /// some 10 K, with the 5 K by which conventions of reduction differ (our choice).
    /// </summary>
    public const double AssumedAirTemperatureUncertaintyKelvin = 11;

    /// <summary>Standard uncertainty of an altitude beside a sea-level pressure, m: read off a map, ±10 m rectangular (our choice).</summary>
    public const double AltitudeUncertaintyMetres = 5.773502691896258;

    /// <summary>What is unusual about the pressure, for a person to look at; null when nothing is.</summary>
    public string? Note { get; private init; }

    /// <summary>Reads the options; exactly one source of a pressure must be there.</summary>
    /// <param name="pressure">Absolute station pressure, or null.</param>
    /// <param name="altitude">Altitude: alone it stands in for a barometer, beside a pressure it judges it, beside a sea-level pressure it is required.</param>
    /// <param name="uncertainty">Standard uncertainty of the pressure that is given; a stand-in keeps its own least one.</param>
    /// <param name="seaLevelPressure">Pressure reduced to sea level, or null.</param>
    /// <param name="airTemperature">Air temperature at the station, for a sea-level pressure only; the standard atmosphere's when null.</param>
    /// <exception cref="InputException">None or two sources are given, one cannot be read, or the pressure is impossible at the altitude.</exception>
    public static StationPressure Parse(string? pressure, string? altitude, string? uncertainty, string? seaLevelPressure = null, string? airTemperature = null)
    {
        double? stated = uncertainty is null ? null : Quantity.PressureHectopascal("--pressure-uncertainty", uncertainty);
        if (stated < 0)
        {
            throw new InputException($"--pressure-uncertainty {uncertainty}: a standard uncertainty is zero or above");
        }

        if (airTemperature is not null && seaLevelPressure is null)
        {
            throw new InputException("--air-temperature belongs to --sea-level-pressure, which is not given; leave it out");
        }

        if (seaLevelPressure is not null)
        {
            return OfSeaLevel(pressure, altitude, stated, seaLevelPressure, airTemperature);
        }

        double? metres = altitude is null ? null : Quantity.AltitudeMetres("--altitude", altitude);
        if (pressure is null)
        {
            if (metres is not double height)
            {
                throw new InputException("--pressure is missing: give the absolute station pressure with its unit, for example --pressure 938hPa; without a barometer, --altitude 640m stands in for it, or better --sea-level-pressure 1016hPa with --altitude 640m");
            }

            if (StandardAtmosphere.Pressure(height, out double standard) != Status.Ok)
            {
                throw OutsideAtmosphere(altitude!);
            }

            return new StationPressure(standard, "altitude", Math.Max(AltitudeOnlyUncertaintyHectopascal, stated ?? 0));
        }

        double hectopascal = Quantity.PressureHectopascal("--pressure", pressure);
        string? note = metres is double above ? Judge(pressure, hectopascal, altitude!, above) : null;
        return new StationPressure(hectopascal, "given", stated ?? 0) { Note = note };
    }

    private static StationPressure OfSeaLevel(string? pressure, string? altitude, double? stated, string seaLevelPressure, string? airTemperature)
    {
        if (pressure is not null)
        {
            throw new InputException("--pressure and --sea-level-pressure: the one is at the station, the other reduced to sea level; give the barometer's, or leave out --pressure");
        }

        if (altitude is null)
        {
            throw new InputException("--sea-level-pressure needs the altitude of the station beside it, for example --altitude 640m");
        }

        double metres = Quantity.AltitudeMetres("--altitude", altitude);
        double seaLevel = Quantity.PressureHectopascal("--sea-level-pressure", seaLevelPressure);
        if (!(PressurePlausibility.LowestSeaLevelHectopascal <= seaLevel && seaLevel <= PressurePlausibility.HighestSeaLevelHectopascal))
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture,
                $"--sea-level-pressure {seaLevelPressure}: sea level sees {PressurePlausibility.LowestSeaLevelHectopascal} to {PressurePlausibility.HighestSeaLevelHectopascal} hPa (is it a station pressure, which is --pressure, or another unit?)"));
        }

        if (SeaLevelReduction.StandardCelsius(metres, out double standardCelsius) != Status.Ok)
        {
            throw OutsideAtmosphere(altitude);
        }

        double celsius = airTemperature is null ? standardCelsius : Quantity.TemperatureCelsius("--air-temperature", airTemperature);
        double uCelsius = airTemperature is null ? AssumedAirTemperatureUncertaintyKelvin : SeaLevelReduction.DefaultTemperatureUncertaintyKelvin;
        Status status = SeaLevelReduction.StationPressure(seaLevel, metres, celsius, out double hectopascal);
        if (status == Status.Ok)
        {
            status = SeaLevelReduction.StandardUncertainty(
                seaLevel, metres, celsius, stated ?? UncertaintyDefaults.ReportedPressureHectopascal, AltitudeUncertaintyMetres, uCelsius, out double u);
            if (status == Status.Ok)
            {
                bool rare = seaLevel is < PressurePlausibility.UsualLowestSeaLevelHectopascal or > PressurePlausibility.UsualHighestSeaLevelHectopascal;
                return new StationPressure(hectopascal, "sea-level", Math.Max(u, stated ?? 0))
                {
                    Note = rare ? $"--sea-level-pressure {seaLevelPressure} is rare: make sure of the unit, and that it is reduced to sea level" : null,
                };
            }
        }

        throw StatusParts.Input(status) == InputQuantity.Temperature
            ? new InputException(string.Create(CultureInfo.InvariantCulture, $"--air-temperature {airTemperature}: this is the air at the station, {SeaLevelReduction.LowestCelsius} to {SeaLevelReduction.HighestCelsius} °C"))
            : OutsideAtmosphere(altitude);
    }

    /// <summary>Judges a pressure as a person typed it against the altitude.</summary>
    /// <param name="pressure">The pressure as typed.</param>
    /// <param name="hectopascal">The same, hPa.</param>
    /// <param name="altitude">The altitude as typed.</param>
    /// <param name="metres">The same, m.</param>
    /// <returns>What is unusual about it, or null.</returns>
    /// <exception cref="InputException">The pressure is impossible there, or the altitude is outside the standard atmosphere.</exception>
    public static string? Judge(string pressure, double hectopascal, string altitude, double metres)
    {
        Status status = PressurePlausibility.Judge(hectopascal, metres, out PressureVerdict verdict, out double seaLevel);
        if (StatusParts.Input(status) == InputQuantity.Altitude)
        {
            throw OutsideAtmosphere(altitude);
        }

        StandardAtmosphere.Pressure(metres, out double usual);
        if (status != Status.Ok || verdict is PressureVerdict.RefusedHigh or PressureVerdict.RefusedLow)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture,
                $"--pressure {pressure} is not possible at {altitude}: reduced to sea level it is {seaLevel:F0} hPa, and sea level sees {PressurePlausibility.LowestSeaLevelHectopascal} to {PressurePlausibility.HighestSeaLevelHectopascal} hPa; about {usual:F0} hPa ({PressureUnits.MillimetresOfMercuryFromHectopascal(usual):F0} mmHg) is usual there (is it a sea-level value, or another unit?)"));
        }

        return verdict is PressureVerdict.ConfirmHigh or PressureVerdict.ConfirmLow
            ? string.Create(CultureInfo.InvariantCulture, $"--pressure {pressure} at {altitude} is {seaLevel:F0} hPa reduced to sea level, which is rare; about {usual:F0} hPa is usual there: make sure of unit and altitude, and that it is no sea-level value")
            : null;
    }

    private static InputException OutsideAtmosphere(string altitude)
    {
        return new InputException(string.Create(CultureInfo.InvariantCulture,
            $"--altitude {altitude} is outside the standard atmosphere used here, {StandardAtmosphere.LowestAltitudeMetres} to {StandardAtmosphere.HighestAltitudeMetres} m"));
    }
}
