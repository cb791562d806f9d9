using System;
using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using static ProbeCal.Station.Calibrating.Finding;

namespace ProbeCal.Station.Calibrating;

/// <summary>The guards on temperature.</summary>
internal static class TemperatureGuards
{
    /// <summary>Difference of a typed temperature from the probe's own that wants a reason, K: the limit of a thermistor check (TM 9-A6.8).</summary>
    public const double ThermometerDifferenceKelvin = 0.2;

    /// <summary>Below it water is called very cold, °C (our choice, no source): membranes are slow there and their coefficient counts most.</summary>
    public const double ColdCelsius = 5;

    /// <summary>Above it water is called very warm, °C (our choice, no source).</summary>
    public const double WarmCelsius = 30;

    /// <summary>From here on a typed figure looks as if it were °F, °C: 32 °F is freezing (our choice, no source).</summary>
    public const double LooksLikeFahrenheitFrom = 32;

    /// <summary>From here on it wants a reason, °C: open water is hardly ever warmer (our choice, no source).</summary>
    public const double HardlyWaterFrom = 35;

    /// <summary>How near a typed °F value, taken as °F, must come to the probe's thermometer to be called one, K (our choice, no source).</summary>
    private const double FahrenheitLikenessKelvin = 2;

    /// <summary>Temperature of readings that the size of a wrong coefficient is shown for when there is no earlier calibration, °C.</summary>
    private const double UsualReadingCelsius = 20;

    /// <summary>All of them.</summary>
    public static IReadOnlyList<Guard> All { get; } =
    [
        new(GuardNames.TemperatureRange, "temperature against the range of the equation, and °F typed as °C", TemperatureRange)
        {
            Limit = "0 to 40 °C",
            Source = "range of the solubility equation (Benson and Krause 1984)",
            Severities = [FindingSeverity.Refuse],
        },
        new(GuardNames.TemperatureTwice, "a typed temperature against the probe's own thermometer", TemperatureTwice)
        {
            Limit = "0.2 K",
            Source = LimitSources.Multiparameter,
            Severities = [FindingSeverity.NeedsReason],
        },
        new(GuardNames.TemperatureUnit, "a typed temperature that nothing can be compared with and that looks like °F", TemperatureUnit)
        {
            Limit = "a note from 32 °C, reason from 35 °C",
            Source = LimitSources.OurChoice,
            Severities = [FindingSeverity.Note, FindingSeverity.NeedsReason],
        },
        new(GuardNames.CoefficientRange, "temperature against the fitted range of the coefficient", CoefficientRange)
        {
            Limit = "the range that was entered with the coefficient",
            Source = LimitSources.Entered,
            Severities = [FindingSeverity.Refuse],
        },
        new(GuardNames.TemperatureExtreme, "very cold or very warm water", TemperatureExtreme)
        {
            Limit = "below 5 °C, above 30 °C",
            Source = LimitSources.OurChoice,
            Severities = [FindingSeverity.Note],
        },
    ];

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

    private static Finding? TemperatureUnit(Situation now)
    {
        if (now.Setup.TypedTemperatureCelsius is not double typed || now.ProbeTemperatureCelsius != null || typed < LooksLikeFahrenheitFrom)
        {
            return null;
        }

        double asFahrenheit = (typed - 32) / 1.8;
        return new Finding(GuardNames.TemperatureUnit, typed < HardlyWaterFrom ? FindingSeverity.Note : FindingSeverity.NeedsReason, Text(
            $"temperature {Number.Print(typed)} C is uncommonly warm for water, and {Number.Print(typed)} F would be {Number.Fixed(asFahrenheit, 1)} C"),
            PossibleError.OfReference(now.SaturationAt(typed, now.PressureHectopascal), now.SaturationAt(asFahrenheit, now.PressureHectopascal)),
            Text($"look at the thermometer; write {Number.Print(typed)}F if that was meant"));
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

    private static Finding? TemperatureExtreme(Situation now)
    {
        if (now.TemperatureCelsius is not double celsius || (ColdCelsius <= celsius && celsius <= WarmCelsius))
        {
            return null;
        }

        double reading = now.Previous is { Points.Length: > 0 } previous ? previous.Points[0].Temperature.Value : UsualReadingCelsius;
        return new Finding(GuardNames.TemperatureExtreme, FindingSeverity.Note, Text(
            $"temperature {Number.Fixed(celsius, 1)} C is {(celsius < ColdCelsius ? "below 5 C, where membranes answer slowly" : "above 30 C, where water loses gas quickly")}; readings at {Number.Fixed(reading, 0)} C lean on the temperature coefficient, and were it too large by twice its uncertainty"),
            CoefficientError(now, celsius, reading),
            "wait longer than usual, and check the probe at a second temperature that spans those of the readings");
    }

    /// <summary>What a coefficient that is too large by twice its uncertainty does between two temperatures.</summary>
    private static PossibleError CoefficientError(Situation now, double celsius, double reading)
    {
        IProbeModel model = RecordConversion.Model(now.Setup.Probe);
        bool known = model.GainPerCoefficient(celsius, out double here) == Status.Ok & model.GainPerCoefficient(reading, out double there) == Status.Ok;
        double twice = 2 * now.Setup.Probe.TemperatureCoefficient.StandardUncertainty;
        // The gain taken for here is too large by this factor against the one at the readings, so that the probe reads low by it.
        return known
            ? PossibleError.OfSignal(now.SaturationMilligramsPerLitre, Math.Exp(-twice * (here - there)))
            : PossibleError.Unknown("a probe without a temperature coefficient has no such error");
    }
}
