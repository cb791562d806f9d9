using System;
using System.Globalization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Equilibrium;

/// <summary>
/// The station pressure of a computation as a person gives it: from a barometer, or an altitude that stands in for one.
/// </summary>
/// <param name="Hectopascal">Absolute station pressure, hPa.</param>
/// <param name="Source"><c>given</c> or <c>altitude</c>.</param>
/// <param name="UncertaintyHectopascal">Standard uncertainty, hPa.</param>
public sealed record StationPressure(double Hectopascal, string Source, double UncertaintyHectopascal)
{
    /// <summary>
    /// Least standard uncertainty of a pressure taken from the altitude alone, hPa: the weather moves it by some 3 % about
    /// the mean at most (from memory), which is about 10 hPa as a standard uncertainty (our choice).
    /// </summary>
    public const double AltitudeOnlyUncertaintyHectopascal = 10;

    /// <summary>What is unusual about the pressure, for a person to look at; null when nothing is.</summary>
    public string? Note { get; private init; }

    /// <summary>Reads the options; one of pressure and altitude must be there.</summary>
    /// <exception cref="InputException">Neither is given, one cannot be read, or the pressure is impossible at the altitude.</exception>
    public static StationPressure Parse(string? pressure, string? altitude, string? uncertainty)
    {
        double? stated = uncertainty is null ? null : Quantity.PressureHectopascal("--pressure-uncertainty", uncertainty);
        if (stated < 0)
        {
            throw new InputException($"--pressure-uncertainty {uncertainty}: a standard uncertainty is zero or above");
        }

        double? metres = altitude is null ? null : Quantity.AltitudeMetres("--altitude", altitude);
        if (pressure is null)
        {
            if (metres is not double height)
            {
                throw new InputException("--pressure is missing: give the absolute station pressure with its unit, for example --pressure 938hPa; without a barometer, --altitude 640m stands in for it");
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
