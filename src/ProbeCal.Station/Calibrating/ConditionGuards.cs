using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using static ProbeCal.Station.Calibrating.Finding;

namespace ProbeCal.Station.Calibrating;

/// <summary>The guards on what was entered and on the conditions, before any point is accepted.</summary>
internal static class ConditionGuards
{
    /// <summary>Difference from the last pressure at the site that wants a reason, hPa: an uncommonly deep change of weather (our choice, no source).</summary>
    public const double PressureChangeHectopascal = 30;

    /// <summary>Difference of a typed temperature from the probe's own that wants a reason, K: the limit of a thermistor check (TM 9-A6.8).</summary>
    public const double ThermometerDifferenceKelvin = 0.2;

    /// <summary>How near a typed °F value, taken as °F, must come to the probe's thermometer to be called one, K (our choice, no source).</summary>
    private const double FahrenheitLikenessKelvin = 2;

    /// <summary>A sea-level value would put an error of this size into readings before a reported pressure wants a reason, mg/L: a quarter of the published limit.</summary>
    private const double WorthAskingMilligramsPerLitre = StabilityCriterion.DefaultMilligramsPerLitre;

    /// <summary>All of them.</summary>
    public static IReadOnlyList<Guard> All { get; } =
    [
        new(GuardNames.Clock, "the clock against the last calibration of this probe", Clock),
        new(GuardNames.TemperatureRange, "temperature against the range of the equation, and °F typed as °C", TemperatureRange),
        new(GuardNames.TemperatureTwice, "a typed temperature against the probe's own thermometer", TemperatureTwice),
        new(GuardNames.CoefficientRange, "temperature against the fitted range of the coefficient", CoefficientRange),
        new(GuardNames.PressureAtAltitude, "pressure against what is possible at the altitude", PressureAtAltitude),
        new(GuardNames.PressureReduced, "pressure that may have been reduced to sea level", PressureReduced),
        new(GuardNames.PressureHere, "pressure against the last one at this site", PressureHere),
        new(GuardNames.StirringStill, "still water with a probe that needs stirring", StillWater),
    ];

    private static Finding? Clock(Situation now)
    {
        if (now.Previous is not CalibrationRecord previous || previous.CompletedUtc <= now.NowUtc)
        {
            return null;
        }

        return new Finding(GuardNames.Clock, FindingSeverity.Refuse, Text(
            $"the clock says {now.NowUtc:yyyy-MM-dd HH:mm}Z and the last calibration of this probe is from {previous.CompletedUtc:yyyy-MM-dd HH:mm}Z"),
            PossibleError.Unknown("readings would be computed by the wrong calibration, so no size can be given"),
            "set the clock right first");
    }

    private static Finding? TemperatureRange(Situation now)
    {
        if (now.TemperatureCelsius is not double celsius)
        {
            return null;
        }

        Status status = OxygenEquilibrium.MilligramsPerLitre(now.Setup.Equation, celsius, 0, PressureUnits.HectopascalPerAtmosphere, RangeRule.Refuse, out _);
        if (status == Status.Ok)
        {
            return null;
        }

        double asFahrenheit = (celsius - 32) / 1.8;
        string hint = celsius > OxygenEquilibrium.HighestCelsius && asFahrenheit <= OxygenEquilibrium.HighestCelsius
            ? Text($"if {Number.Print(celsius)} was in degrees Fahrenheit, write {Number.Print(celsius)}F ({Number.Fixed(asFahrenheit, 1)} C)")
            : "check the temperature and its unit; liquid water outside this range cannot be calibrated in";
        return new Finding(GuardNames.TemperatureRange, FindingSeverity.Refuse, Text(
            $"temperature {Number.Print(celsius)} C is outside the range of the solubility equation (0 to 40 C)"),
            PossibleError.Unknown("no reference can be computed there"),
            hint);
    }

    private static Finding? TemperatureTwice(Situation now)
    {
        if (now.Setup.TypedTemperatureCelsius is not double typed || now.ProbeTemperatureCelsius is not double own)
        {
            return null;
        }

        double difference = typed - own;
        if (Math.Abs(difference) <= ThermometerDifferenceKelvin)
        {
            return null;
        }

        double asFahrenheit = (typed - 32) / 1.8;
        string hint = Math.Abs(asFahrenheit - own) < FahrenheitLikenessKelvin
            ? Text($"{Number.Print(typed)} degrees Fahrenheit would be {Number.Fixed(asFahrenheit, 1)} C: write {Number.Print(typed)}F if that was meant")
            : "check both against a third before going on";
        return new Finding(GuardNames.TemperatureTwice, FindingSeverity.NeedsReason, Text(
            $"temperature typed is {Number.Fixed(typed, 2)} C and the probe's own thermometer says {Number.Fixed(own, 2)} C, {Number.Fixed(Math.Abs(difference), 2)} K apart (limit {Number.Print(ThermometerDifferenceKelvin)} K, TM 9-A6.8); were the probe's the right one"),
            PossibleError.OfReference(now.SaturationAt(typed, now.PressureHectopascal), now.SaturationAt(own, now.PressureHectopascal)),
            hint);
    }

    private static Finding? CoefficientRange(Situation now)
    {
        RecordedTemperatureCoefficient coefficient = now.Setup.Probe.TemperatureCoefficient;
        bool inside = now.TemperatureCelsius is not double celsius
            || (coefficient.FittedLowCelsius <= celsius && celsius <= coefficient.FittedHighCelsius);
        return inside ? null : new Finding(GuardNames.CoefficientRange, FindingSeverity.Refuse, Text(
            $"temperature {Number.Fixed(now.TemperatureCelsius ?? double.NaN, 2)} C is outside the range over which the temperature coefficient was fitted ({Number.Print(coefficient.FittedLowCelsius)} to {Number.Print(coefficient.FittedHighCelsius)} C)"),
            PossibleError.Unknown("how far the membrane departs from its coefficient there is not known"),
            "calibrate inside it, or enter a coefficient that was fitted there");
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

    private static Finding? StillWater(Situation now)
    {
        bool still = now.Setup.Stirring == Stirring.Still && now.Setup.Method == CalibrationIds.AirSaturatedWater;
        return still ? new Finding(GuardNames.StirringStill, FindingSeverity.Note,
            "the water is still, in which an amperometric probe reads 10 to 50 % low (from memory); at 10 %",
            PossibleError.OfSignal(now.SaturationMilligramsPerLitre, 0.9),
            "keep the water moving as it does where the probe will hang; readings in moving water will be flagged against this calibration") : null;
    }
}
