using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using static ProbeCal.Station.Calibrating.Finding;

namespace ProbeCal.Station.Calibrating;

/// <summary>The guards on pressure and altitude.</summary>
internal static class PressureGuards
{
    /// <summary>Difference from the last pressure at the site that wants a reason, hPa: an uncommonly deep change of weather (our choice, no source).</summary>
    public const double PressureChangeHectopascal = 30;

    /// <summary>A pressure whose unit was mistaken comes this near to the usual one of the place, % (our choice, no source): strong weather is 3 to 4 %.</summary>
    public const double UnitLikenessPercent = 5;

    /// <summary>
    /// Where no altitude is known, hPa below which a figure is taken for mmHg that lost its unit: 700 to 790 are usual in mmHg, while
    /// in hPa they would be a station at 2000 to 3000 m (our choice, no source).
    /// </summary>
    public const double LooksLikeMillimetresBelow = 790;

    private const double LooksLikeMillimetresFrom = 700;
    private const double MetresPerFoot = 0.3048;

    /// <summary>A sea-level value would put an error of this size into readings before a reported pressure wants a reason, mg/L: a quarter of the published limit.</summary>
    internal const double WorthAskingMilligramsPerLitre = StabilityCriterion.DefaultMilligramsPerLitre;

    /// <summary>All of them; a wrong unit is named before the pressure is called impossible.</summary>
    public static IReadOnlyList<Guard> All { get; } =
    [
        new(GuardNames.PressureUnit, "a pressure whose unit was mistaken, told by its value: mmHg, inHg, hPa, kPa, psi", PressureUnit)
        {
            Limit = "impossible at the altitude (or, without one, from 700 to 790 hPa), and within 5 % of the usual pressure there in another unit",
            Source = LimitSources.OurChoice,
            Severities = [FindingSeverity.NeedsReason, FindingSeverity.Refuse],
        },
        new(GuardNames.AltitudeUnit, "an altitude in feet taken for metres, or the other way round", AltitudeUnit)
        {
            Limit = "pressure possible at the altitude in the other unit alone, or 3.28 times that of the last record here, within 2 %",
            Source = LimitSources.OurChoice,
            Severities = [FindingSeverity.NeedsReason, FindingSeverity.Refuse],
        },
        new(GuardNames.PressureAtAltitude, "pressure against what is possible at the altitude", PressureAtAltitude)
        {
            Limit = "reduced to sea level: refused above 1050 and below 870 hPa, reason above 1035 and below 950 hPa",
            Source = "1050 and 870 hPa from memory; 1035 and 950 hPa " + LimitSources.OurChoice,
            Severities = [FindingSeverity.NeedsReason, FindingSeverity.Refuse],
        },
        new(GuardNames.PressureReduced, "pressure that may have been reduced to sea level", PressureReduced)
        {
            Limit = "a note where it could be one; reason where the source reports such values and the error would be 0.05 mg/L or more",
            Source = "only absolute station pressure: " + LimitSources.FieldManual + "; 0.05 mg/L " + LimitSources.OurChoice,
            Severities = [FindingSeverity.Note, FindingSeverity.NeedsReason],
        },
        new(GuardNames.PressureHere, "pressure against the last one at this site", PressureHere)
        {
            Limit = "30 hPa",
            Source = LimitSources.OurChoice,
            Severities = [FindingSeverity.NeedsReason],
        },
    ];

    private static Finding? PressureUnit(Situation now)
    {
        if (now.PressureHectopascal is not double pressure)
        {
            return null;
        }

        FindingSeverity severity = FindingSeverity.NeedsReason;
        double usual = PressureUnits.HectopascalPerAtmosphere;
        if (now.Setup.Altitude is RecordedQuantity altitude)
        {
            bool judged = PressurePlausibility.Judge(pressure, altitude.Value, out PressureVerdict verdict, out double _) == Status.Ok
                && StandardAtmosphere.FromSeaLevel(PressureUnits.HectopascalPerAtmosphere, altitude.Value, out usual) == Status.Ok;
            if (!judged || verdict == PressureVerdict.Plausible)
            {
                return null;
            }

            severity = verdict is PressureVerdict.RefusedHigh or PressureVerdict.RefusedLow ? FindingSeverity.Refuse : severity;
        }
        else if (pressure < LooksLikeMillimetresFrom || LooksLikeMillimetresBelow < pressure)
        {
            return null;
        }

        return Slip(pressure, usual) is not (double meant, string words)
            ? null
            : new Finding(GuardNames.PressureUnit, severity, Text(
                $"pressure {Number.Fixed(pressure, 1)} hPa {(now.Setup.Altitude is RecordedQuantity known ? Text($"hardly fits the altitude of {Number.Print(known.Value)} m") : "would be a station at more than 2000 m")}, and {words} fits"),
                PossibleError.OfReference(now.SaturationAt(now.TemperatureCelsius, pressure), now.SaturationAt(now.TemperatureCelsius, meant)),
                "look at the barometer's unit and enter the pressure with it; enter the altitude, so that it can be judged");
    }

    /// <summary>The pressure that was meant, when one unit was taken for another, and the words for it; null when none fits.</summary>
    private static (double Meant, string Words)? Slip(double taken, double usual)
    {
        (string Name, double Hectopascal)[] units =
        [
            ("hPa", 1),
            ("mmHg", PressureUnits.HectopascalPerMillimetreOfMercury),
            ("inHg", PressureUnits.HectopascalPerInchOfMercury),
            ("kPa", PressureUnits.HectopascalPerKilopascal),
            ("psi", PressureUnits.HectopascalPerPsi),
        ];
        (double Meant, string Words)? nearest = null;
        double distance = UnitLikenessPercent / 100;
        foreach ((string from, double hectopascalFrom) in units)
        {
            foreach ((string to, double hectopascalTo) in units)
            {
                double figure = taken / hectopascalFrom;
                double meant = figure * hectopascalTo;
                double off = Math.Abs((meant / usual) - 1);
                if (from != to && off < distance)
                {
                    distance = off;
                    nearest = (meant, Text($"{Number.Significant(figure, 5)} {to} taken for {from} ({Number.Fixed(meant, 1)} hPa)"));
                }
            }
        }

        return nearest;
    }

    private static Finding? AltitudeUnit(Situation now)
    {
        if (now.Setup.Altitude is not RecordedQuantity altitude)
        {
            return null;
        }

        double metres = altitude.Value;
        if (now.PressureHectopascal is double pressure && !PressureSource.Parse("pressure source", now.Setup.Pressure.Source).IsAltitudeOnly)
        {
            bool impossible = PressurePlausibility.Judge(pressure, metres, out PressureVerdict verdict, out double _) == Status.Ok
                && verdict is PressureVerdict.RefusedHigh or PressureVerdict.RefusedLow;
            double? other = !impossible ? null : Fits(pressure, metres * MetresPerFoot) ? metres * MetresPerFoot : Fits(pressure, metres / MetresPerFoot) ? metres / MetresPerFoot : null;
            return other is not double meant ? null : new Finding(GuardNames.AltitudeUnit, FindingSeverity.Refuse, Text(
                $"pressure {Number.Fixed(pressure, 1)} hPa cannot be at {Number.Print(metres)} m, but fits {Number.Fixed(meant, 0)} m, which is what {(meant < metres ? "feet taken for metres" : "metres taken for feet")} would be"),
                PossibleError.Unknown("where the pressure was measured the altitude enters no reading; it only guards"),
                Text($"enter the altitude with its unit, for example {Number.Fixed(meant, 0)}m, or correct the pressure"));
        }

        if (now.LastHere?.Altitude is not RecordedQuantity last || last.Value <= 0)
        {
            return null;
        }

        double ratio = metres / last.Value;
        bool slip = Math.Abs((ratio * MetresPerFoot) - 1) < 0.02 || Math.Abs((ratio / MetresPerFoot) - 1) < 0.02;
        if (!slip)
        {
            return null;
        }

        bool both = StandardAtmosphere.FromSeaLevel(PressureUnits.HectopascalPerAtmosphere, metres, out double taken) == Status.Ok
            & StandardAtmosphere.FromSeaLevel(PressureUnits.HectopascalPerAtmosphere, last.Value, out double right) == Status.Ok;
        return new Finding(GuardNames.AltitudeUnit, FindingSeverity.NeedsReason, Text(
            $"altitude {Number.Print(metres)} m is {(1 < ratio ? "3.28 times" : "0.305 times")} that of the last record here ({Number.Print(last.Value)} m), as feet and metres are; were the pressure taken from it"),
            both ? PossibleError.OfReference(now.SaturationAt(now.TemperatureCelsius, taken), now.SaturationAt(now.TemperatureCelsius, right)) : PossibleError.OfReference(null, null),
            "look at the unit of the altitude and enter it with it");
    }

    private static bool Fits(double pressure, double metres)
    {
        return PressurePlausibility.Judge(pressure, metres, out PressureVerdict verdict, out double _) == Status.Ok && verdict == PressureVerdict.Plausible;
    }

    private static Finding? PressureAtAltitude(Situation now)
    {
        if (now.PressureHectopascal is not double pressure || now.Setup.Altitude is not RecordedQuantity altitude)
        {
            return null;
        }

        Status status = PressurePlausibility.Judge(pressure, altitude.Value, out PressureVerdict verdict, out double reduced);
        if (status != Status.Ok)
        {
            return new Finding(GuardNames.PressureAtAltitude, FindingSeverity.Refuse, Text(
                $"pressure {Number.Fixed(pressure, 1)} hPa with altitude {Number.Print(altitude.Value)} m cannot be judged ({status})"),
                PossibleError.Unknown("no station pressure is like this, so no size can be given"),
                "check both and their units");
        }

        string seen = Text($"pressure {Number.Fixed(pressure, 1)} hPa at {Number.Print(altitude.Value)} m is {Number.Fixed(reduced, 1)} hPa at sea level");
        return verdict switch
        {
            PressureVerdict.RefusedHigh => new Finding(GuardNames.PressureAtAltitude, FindingSeverity.Refuse,
                seen + ", higher than weather makes it (above 1050 hPa): a sea-level value, a wrong unit, or feet entered as metres",
                SeaLevelError(now, pressure, altitude.Value), "enter the absolute pressure of the station"),
            PressureVerdict.RefusedLow => new Finding(GuardNames.PressureAtAltitude, FindingSeverity.Refuse,
                seen + ", lower than weather makes it (below 870 hPa): a wrong unit or a wrong altitude",
                StandardPressureError(now, pressure, altitude.Value), "enter the absolute pressure of the station with its unit, and the altitude with its own"),
            PressureVerdict.ConfirmHigh => new Finding(GuardNames.PressureAtAltitude, FindingSeverity.NeedsReason,
                seen + ", which only a strong high makes (1035 to 1050 hPa); were it a sea-level value",
                SeaLevelError(now, pressure, altitude.Value), "make sure that it is the absolute pressure of the station"),
            PressureVerdict.ConfirmLow => new Finding(GuardNames.PressureAtAltitude, FindingSeverity.NeedsReason,
                seen + ", which only a deep storm makes (870 to 950 hPa); were the pressure the usual one of that altitude",
                StandardPressureError(now, pressure, altitude.Value), "check the unit and the altitude"),
            _ => null,
        };
    }

    private static Finding? PressureReduced(Situation now)
    {
        PressureSource source = PressureSource.Parse("pressure source", now.Setup.Pressure.Source);
        if (now.PressureHectopascal is not double pressure || source.IsAltitudeOnly)
        {
            return null;
        }

        if (now.Setup.Altitude is not RecordedQuantity altitude)
        {
            return source.IsReported
                ? new Finding(GuardNames.PressureReduced, FindingSeverity.NeedsReason, Text(
                    $"pressure {Number.Fixed(pressure, 1)} hPa comes from {source.Text}, and reported pressures are nearly always reduced to sea level"),
                    PossibleError.Unknown("a reduced one would make readings about 1.2 % too high per 100 m of altitude, which is not known here"),
                    "enter the altitude so that it can be judged, or say how you know that it is the station's own")
                : null;
        }

        bool undecided = PressurePlausibility.MayBeSeaLevelValue(pressure, altitude.Value);
        PossibleError error = SeaLevelError(now, pressure, altitude.Value);
        if (!undecided || error.Later is not double later)
        {
            return null;
        }

        string seen = Text($"pressure {Number.Fixed(pressure, 1)} hPa could be a sea-level value as well as that of {Number.Print(altitude.Value)} m; its source is {source.Text}");
        bool ask = source.IsReported && WorthAskingMilligramsPerLitre <= Math.Abs(later);
        return ask
            ? new Finding(GuardNames.PressureReduced, FindingSeverity.NeedsReason, seen + ", which usually reports reduced values", error, "say how you know that it is the station's own")
            : new Finding(GuardNames.PressureReduced, FindingSeverity.Note, seen, error, "make sure that it is the absolute pressure of the station");
    }

    /// <summary>What it would do if the pressure had been reduced to sea level.</summary>
    private static PossibleError SeaLevelError(Situation now, double pressure, double altitude)
    {
        Status status = StandardAtmosphere.FromSeaLevel(pressure, altitude, out double station);
        return PossibleError.OfReference(now.SaturationAt(now.TemperatureCelsius, pressure), status == Status.Ok ? now.SaturationAt(now.TemperatureCelsius, station) : null);
    }

    /// <summary>What it would do if the pressure were the one of the standard atmosphere there.</summary>
    private static PossibleError StandardPressureError(Situation now, double pressure, double altitude)
    {
        Status status = StandardAtmosphere.FromSeaLevel(PressureUnits.HectopascalPerAtmosphere, altitude, out double usual);
        return PossibleError.OfReference(now.SaturationAt(now.TemperatureCelsius, pressure), status == Status.Ok ? now.SaturationAt(now.TemperatureCelsius, usual) : null);
    }

    private static Finding? PressureHere(Situation now)
    {
        if (now.PressureHectopascal is not double pressure || now.LastHere is not CalibrationRecord last || last.Points.Length == 0)
        {
            return null;
        }

        double before = last.Points[0].Pressure.Value;
        double difference = pressure - before;
        if (Math.Abs(difference) <= PressureChangeHectopascal)
        {
            return null;
        }

        return new Finding(GuardNames.PressureHere, FindingSeverity.NeedsReason, Text(
            $"pressure {Number.Fixed(pressure, 1)} hPa is {Number.Fixed(Math.Abs(difference), 1)} hPa {(difference < 0 ? "below" : "above")} the last one here ({Number.Fixed(before, 1)} hPa on {last.CompletedUtc:yyyy-MM-dd}, {last.Points[0].Pressure.Source}), more than weather changes; were the last one still right"),
            PossibleError.OfReference(now.SaturationAt(now.TemperatureCelsius, pressure), now.SaturationAt(now.TemperatureCelsius, before)),
            "check unit, altitude and source");
    }
}
