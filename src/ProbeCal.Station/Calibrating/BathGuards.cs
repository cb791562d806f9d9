using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using static ProbeCal.Station.Calibrating.Finding;

namespace ProbeCal.Station.Calibrating;

/// <summary>The guards on how near a bath or a chamber is to equilibrium; their sizes are computed from the equations.</summary>
internal static class BathGuards
{
    /// <summary>Air in the chamber and the probe may differ by this much, K (our choice, no source): 0.5 K is 0.1 % at 20 °C.</summary>
    public const double CupDifferenceKelvin = 0.5;

    /// <summary>An error from here on wants a reason, mg/L: a quarter of the published limit.</summary>
    private const double WorthAsking = PressureGuards.WorthAskingMilligramsPerLitre;

    /// <summary>An as-found error from here on can be told from the drift of a probe, mg/L: half the published limit (our choice, no source).</summary>
    private const double WorthAskingOfAProbe = AcceptanceLimit.SaturationMilligramsPerLitre / 2;

    /// <summary>An as-found error up to this multiple of that of dry air is taken for dry air (our choice, no source).</summary>
    private const double DryAirReach = 1.25;

    /// <summary>The guard on bubbles looks before the wait: what was entered decides.</summary>
    public static Guard Bubbles { get; } = new(GuardNames.BubblesAtDepth, "water supersaturated by bubbles released at depth", BubblesAtDepth)
    {
        Limit = "half to all of the water's weight above the stone, over the pressure; a note below 0.05 mg/L, reason from there on",
        Source = "supersaturation: " + LimitSources.OceanGliders + "; size " + LimitSources.Computed + "; 0.05 mg/L " + LimitSources.OurChoice,
        Severities = [FindingSeverity.Note, FindingSeverity.NeedsReason],
    };

    /// <summary>Those that look at a point before it is accepted.</summary>
    public static IReadOnlyList<Guard> All { get; } =
    [
        new(GuardNames.WarmedWater, "water that warmed since it was in equilibrium with air", WarmedWater)
        {
            Limit = "a note from 0.02 mg/L, reason from 0.05 mg/L",
            Source = "symptom: " + LimitSources.VolunteerManual + "; size " + LimitSources.Computed + "; 0.02 and 0.05 mg/L " + LimitSources.OurChoice,
            Severities = [FindingSeverity.Note, FindingSeverity.NeedsReason],
        },
        new(GuardNames.CupTemperature, "the air of a chamber against the probe in it", CupTemperature)
        {
            Limit = "0.5 K; a note below 0.05 mg/L, reason from there on",
            Source = LimitSources.OurChoice,
            Severities = [FindingSeverity.Note, FindingSeverity.NeedsReason],
        },
        new(GuardNames.CupDry, "a chamber that is not saturated with vapour, told by a reading that is too high by what dry air is", CupDry)
        {
            Limit = "half to 1.25 times the excess of dry air; a note from 0.05 mg/L, reason from 0.1 mg/L",
            Source = "dry air reads 2 % high: " + LimitSources.OceanGliders + "; size " + LimitSources.Computed + "; the rest " + LimitSources.OurChoice,
            Severities = [FindingSeverity.Note, FindingSeverity.NeedsReason],
        },
    ];

    private static Finding? BubblesAtDepth(Situation now)
    {
        bool known = now.Setup.Surroundings?.StoneDepthMetres is > 0 && now.Setup.Method == CalibrationIds.AirSaturatedWater;
        if (!known || now.TemperatureCelsius is not double celsius || now.PressureHectopascal is not double pressure)
        {
            return null;
        }

        double depth = now.Setup.Surroundings!.StoneDepthMetres!.Value;
        bool computed = DensityEos80.Density(celsius, now.Setup.Salinity.Value, RangeRule.Refuse, out double density) == Status.Ok
            & HydrostaticPressure.Hectopascal(depth, density, RangeRule.Refuse, out double weight) == Status.Ok
            & VapourBensonKrause1980.Pressure(celsius, RangeRule.Refuse, out double vapour) == Status.Ok;
        if (!computed)
        {
            return null;
        }

        double percent = 100 * weight / (pressure - vapour);
        PossibleError error = PossibleError.OfExcess(now.SaturationMilligramsPerLitre, percent);
        return new Finding(GuardNames.BubblesAtDepth, error.AsFound < WorthAsking ? FindingSeverity.Note : FindingSeverity.NeedsReason, Text(
            $"bubbles from {Number.Print(depth)} m depth stand under {Number.Fixed(weight, 1)} hPa more than the air, and the water may hold {Number.Fixed(percent / 2, 1)} to {Number.Fixed(percent, 1)} % more than saturation; at the upper end"),
            error,
            "stop the air, stir gently and wait before the point, or release the bubbles just below the surface; then lift the probe out for a moment: the reading must not change");
    }

    private static Finding? WarmedWater(Situation now)
    {
        if (now.PointMethod != MethodIds.AirSaturatedWater || now.Point is not RecordedPoint point)
        {
            return null;
        }

        // Without an entry, the same water at the point before tells how much it warmed since.
        bool entered = now.Setup.Surroundings?.EquilibratedCelsius != null;
        double? before = now.Setup.Surroundings?.EquilibratedCelsius ?? now.Span?.Temperature.Value;
        double? held = now.SaturationAt(before, point.Pressure.Value);
        double? reference = now.SaturationAt(point.Temperature.Value, point.Pressure.Value);
        if (held is not double there || reference is not double here || there - here < NoteFrom)
        {
            return null;
        }

        double percent = 100 * ((there / here) - 1);
        return new Finding(GuardNames.WarmedWater, there - here < WorthAsking ? FindingSeverity.Note : FindingSeverity.NeedsReason, Text(
            $"the water warmed from {Number.Fixed(before!.Value, 1)} C {(entered ? "in equilibrium" : "at the point before")} to {Number.Fixed(point.Temperature.Value, 1)} C and would hold {Number.Fixed(percent, 1)} % more than saturation if nothing had left it"),
            PossibleError.OfReference(here, there),
            "aerate it at the temperature of the point, or pour it over several times, and wait until the temperature is steady");
    }

    private const double NoteFrom = 0.02;

    private static Finding? CupTemperature(Situation now)
    {
        bool air = now.PointMethod == MethodIds.WaterSaturatedAir && now.Setup.Surroundings?.AirCelsius != null;
        if (!air || now.Point is not RecordedPoint point)
        {
            return null;
        }

        double airCelsius = now.Setup.Surroundings!.AirCelsius!.Value;
        double difference = airCelsius - point.Temperature.Value;
        bool computed = OxygenEquilibrium.PartialPressure(point.Temperature.Value, point.Pressure.Value, RangeRule.Refuse, out double taken) == Status.Ok
            & OxygenEquilibrium.PartialPressure(airCelsius, point.Pressure.Value, RangeRule.Refuse, out double right) == Status.Ok;
        if (Math.Abs(difference) <= CupDifferenceKelvin || !computed)
        {
            return null;
        }

        double? concentration = now.SaturationAt(point.Temperature.Value, point.Pressure.Value);
        PossibleError error = PossibleError.OfReference(concentration, concentration * right / taken);
        bool small = error.Later is double later && Math.Abs(later) < WorthAsking;
        return new Finding(GuardNames.CupTemperature, small ? FindingSeverity.Note : FindingSeverity.NeedsReason, Text(
            $"the air of the chamber ({Number.Fixed(airCelsius, 1)} C) is {Number.Fixed(Math.Abs(difference), 1)} K {(difference < 0 ? "colder" : "warmer")} than the probe ({Number.Fixed(point.Temperature.Value, 1)} C); were it saturated with vapour at its own temperature"),
            error,
            "keep sun and wind off, and wait until air and probe have one temperature");
    }

    private static Finding? CupDry(Situation now)
    {
        bool air = now.PointMethod == MethodIds.WaterSaturatedAir && now.Point?.Role == CalibrationIds.SpanPoint;
        if (!air || now.Point is not { ErrorMilligramsPerLitre: double error } point || error < WorthAsking)
        {
            return null;
        }

        double percent = 100 * error / point.ReferenceMilligramsPerLitre;
        Status status = ExpectedEffect.DryChamber(point.Temperature.Value, point.Pressure.Value, 0, out double dry);
        if (status != Status.Ok || percent < dry / 2 || DryAirReach * dry < percent)
        {
            return null;
        }

        return new Finding(GuardNames.CupDry, error < WorthAskingOfAProbe ? FindingSeverity.Note : FindingSeverity.NeedsReason, Text(
            $"the probe read {Number.Fixed(percent, 1)} % too high before adjustment, and air of 50 to 0 % humidity at {Number.Fixed(point.Temperature.Value, 1)} C is {Number.Fixed(dry / 2, 1)} to {Number.Fixed(dry, 1)} % above saturated air; were the chamber dry"),
            PossibleError.Known(error, -error),
            "wet the chamber, leave the cap loose, wait 5 to 10 min for the vapour, and take the point again");
    }
}
