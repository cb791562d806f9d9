using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>Limits against what was found, and the budget of the slope.</summary>
internal static class Judgement
{
    internal const string DecisionRule = "simple acceptance: an error within its limit passes, whatever its uncertainty";

    internal static List<RecordedLimit> Limits(CalibrationSetup setup, IReadOnlyList<RecordedPoint> points, ProbeCalibration calibration)
    {
        List<RecordedLimit> limits = [];
        if (Fitting.Point(points, CalibrationIds.SpanPoint) is RecordedPoint span)
        {
            limits.Add(Saturation("as-found", setup, span, decides: false));
            limits.Add(AsFoundBand(span));
        }

        if (Fitting.Point(points, CalibrationIds.AsLeftPoint) is RecordedPoint asLeft)
        {
            limits.Add(Saturation(CalibrationIds.AsLeftPoint, setup, asLeft, decides: true));
        }

        if (Fitting.Point(points, CalibrationIds.ZeroPoint) is RecordedPoint zero)
        {
            limits.Add(Zero(setup, zero));
        }

        if (setup.Limits.SlopeLow is double low && setup.Limits.SlopeHigh is double high)
        {
            limits.Add(Slope(low, high, calibration.Slope, setup.Probe.SignalUnit));
        }

        return limits;
    }

    internal static string[] Reasons(IEnumerable<RecordedLimit> limits)
    {
        return [.. limits.Where(static limit => limit.Decides && limit.Verdict != "pass").Select(Sentence)];
    }

    internal static RecordedContribution[] Budget(CalibrationSetup setup, RecordedPoint point, RecordedZero zero, ProbeCalibration fit)
    {
        RecordedThermometer thermometer = setup.Probe.Thermometer;
        RecordedTemperatureCoefficient coefficient = setup.Probe.TemperatureCoefficient;
        bool compensates = fit.Model.CompensatesTemperature;
        string unit = setup.Probe.SignalUnit.Length == 0 ? "signal" : setup.Probe.SignalUnit;
        List<RecordedContribution> lines =
        [
            Line("thermometer offset", UncertaintySource.ThermometerOffset, thermometer.CommonStandardUncertaintyCelsius, "K", thermometer.Source),
            Line("temperature at the point", UncertaintySource.TemperatureAtCalibration, point.Temperature.StandardUncertainty, "K", "reading and scatter over the window"),
            Line("pressure", UncertaintySource.PressureAtCalibration, point.Pressure.StandardUncertainty, "hPa", point.Pressure.UncertaintySource ?? "entered"),
            Line("signal at the point", UncertaintySource.SignalAtCalibration, point.SignalStandardUncertainty, unit, "scatter, drift and resolution over the window"),
            Line("zero", UncertaintySource.Zero, zero.SignalStandardUncertainty, unit, ZeroSource(zero)),
            Line("temperature coefficient", UncertaintySource.TemperatureCoefficient, coefficient.StandardUncertainty, coefficient.Unit,
                compensates ? "acts only away from the temperature of the calibration" : coefficient.UncertaintySource ?? coefficient.Source),
            Line("state of the reference", UncertaintySource.ReferenceState, setup.ReferenceStateRelative * 100, "%", ReferenceStateSource(setup)),
        ];
        if (setup.AirToWaterRatio is RecordedQuantity ratio)
        {
            lines.Add(Line("air-to-water ratio", UncertaintySource.AirToWaterRatio, ratio.StandardUncertainty, "1", ratio.UncertaintySource ?? ratio.Source));
        }

        return [.. lines];

        RecordedContribution Line(string input, UncertaintySource what, double uncertainty, string itsUnit, string source)
        {
            return new RecordedContribution
            {
                Input = input,
                StandardUncertainty = uncertainty,
                Unit = itsUnit,
                SlopePercent = Math.Abs(fit.SlopeContribution(what)) * 100,
                Source = source,
            };
        }
    }

    internal static string ReferenceStateSource(CalibrationSetup setup)
    {
        return setup.Method == CalibrationIds.WaterSaturatedAir
            ? "humidity of 95 to 100 % in a wet chamber, rectangular (computed)"
            : "aerated baths are typically within 0.5 to 1 % of saturation (from memory)";
    }

    private static string Sentence(RecordedLimit limit)
    {
        if (limit.Found is not double found)
        {
            return $"{limit.Check}: could not be judged against {limit.Limit}";
        }

        return $"{limit.Check} {Number.Fixed(found, 3)} {limit.Unit} is outside its limit, {limit.Limit} ({limit.Source})";
    }

    private static RecordedLimit Saturation(string check, CalibrationSetup setup, RecordedPoint point, bool decides)
    {
        CalibrationLimits limits = setup.Limits;
        Status status = AcceptanceLimit.AtSaturation(
            point.ReferenceMilligramsPerLitre, limits.SaturationMilligramsPerLitre, limits.SaturationPercent, out double limit, out AppliedLimit applied);
        string verdict = point.ErrorMilligramsPerLitre is not double error || status != Status.Ok
            ? "not-judged"
            : AcceptanceLimit.Passes(error, limit) ? "pass" : "fail";
        return new RecordedLimit
        {
            Check = check,
            Limit = limits.SaturationText,
            Applied = status == Status.Ok ? Number.Fixed(limit, 3) + " mg/L" + (applied == AppliedLimit.Relative ? " (the % limit)" : "") : null,
            Source = limits.SaturationSource,
            Found = point.ErrorMilligramsPerLitre,
            Unit = "mg/L",
            Verdict = verdict,
            Decides = decides,
        };
    }

    private static RecordedLimit AsFoundBand(RecordedPoint span)
    {
        double? percent = 100 + (100 * span.ErrorMilligramsPerLitre / span.ReferenceMilligramsPerLitre);
        return new RecordedLimit
        {
            Check = "as-found saturation",
            Limit = "95 to 105 %",
            Source = CalibrationLimits.OceanPractice,
            Found = percent,
            Unit = "%",
            Verdict = percent is not double read ? "not-judged" : Math.Abs(read - 100) <= FitGuards.AsFoundPercent ? "pass" : "fail",
            Decides = false,
        };
    }

    private static RecordedLimit Zero(CalibrationSetup setup, RecordedPoint zero)
    {
        string verdict = zero.ErrorMilligramsPerLitre is not double error
            ? "not-judged"
            : AcceptanceLimit.Passes(error, setup.Limits.ZeroMilligramsPerLitre) ? "pass" : "fail";
        return new RecordedLimit
        {
            Check = CalibrationIds.ZeroPoint,
            Limit = setup.Limits.ZeroText,
            Source = setup.Limits.ZeroSource,
            Found = zero.ErrorMilligramsPerLitre,
            Unit = "mg/L",
            Verdict = verdict,
            // A zero that is adjusted was out of its limit for a reason; a check that fails fails the calibration.
            Decides = setup.ZeroPlan == CalibrationIds.ZeroCheck,
        };
    }

    private static RecordedLimit Slope(double low, double high, double slope, string signalUnit)
    {
        string unit = (signalUnit.Length == 0 ? "signal" : signalUnit) + "/hPa";
        return new RecordedLimit
        {
            Check = "slope",
            Limit = $"{Number.Print(low)} to {Number.Print(high)} {unit}",
            Source = CalibrationLimits.Entered,
            Found = slope,
            Unit = unit,
            Verdict = low <= slope && slope <= high ? "pass" : "fail",
            Decides = true,
        };
    }

    private static string ZeroSource(RecordedZero zero)
    {
        return zero.IsMeasured
            ? "scatter over the window, and oxygen left in the zero solution (our choice, no source)"
            : "residual current of up to 1 % of the 100 % signal, rectangular (from memory)";
    }
}
