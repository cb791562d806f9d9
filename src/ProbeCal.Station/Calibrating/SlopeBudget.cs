using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Uncertainty;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// The uncertainty budget of a slope from one point and a zero: what each input adds by the law of propagation (JCGM 100), through Core's own
/// sensitivities, and a check by drawing (JCGM 101), which knows no sensitivity.
/// </summary>
internal static class SlopeBudget
{
    /// <summary>Trials of the check: enough for a standard deviation to 0.5 %, and about 30 ms.</summary>
    public const int Trials = 20_000;

    /// <summary>
    /// Difference of the two standard uncertainties that becomes a finding, %: three times what chance does at this number of trials (1.5 %),
    /// and as much for what a first-order law leaves out (our choice, no source).
    /// </summary>
    public const double TolerancePercent = 3;

    /// <summary>The table, largest contribution first.</summary>
    internal static RecordedContribution[] Of(CalibrationSetup setup, RecordedPoint point, RecordedZero zero, ProbeCalibration fit)
    {
        RecordedThermometer thermometer = setup.Probe.Thermometer;
        RecordedTemperatureCoefficient coefficient = setup.Probe.TemperatureCoefficient;
        bool compensates = fit.Model.CompensatesTemperature;
        string unit = setup.Probe.SignalUnit.Length == 0 ? "signal" : setup.Probe.SignalUnit;
        bool air = setup.AirToWaterRatio != null;
        List<RecordedContribution> lines =
        [
            Line("thermometer offset", UncertaintySource.ThermometerOffset, 0, thermometer.CommonStandardUncertaintyCelsius, "K", thermometer.Source,
                thermometer.CommonStandardUncertaintyCelsius == UncertaintyDefaults.ThermometerOffsetKelvin),
            Line("temperature at the point", UncertaintySource.TemperatureAtCalibration, point.Temperature.Value, point.Temperature.StandardUncertainty, "K", "reading and scatter over the window",
                point.Temperature.StandardUncertainty == UncertaintyDefaults.TemperatureKelvin),
            Line("pressure", UncertaintySource.PressureAtCalibration, point.Pressure.Value, point.Pressure.StandardUncertainty, "hPa", point.Pressure.UncertaintySource ?? "entered",
                point.Pressure.UncertaintySource?.Contains("rectangular", StringComparison.Ordinal) == true),
            Line("signal at the point", UncertaintySource.SignalAtCalibration, point.Signal.Mean, point.SignalStandardUncertainty, unit,
                point.Typed ? "last digit of the display" : "scatter, drift and resolution over the window", point.Typed),
            Line("zero", UncertaintySource.Zero, zero.Signal, zero.SignalStandardUncertainty, unit, ZeroSource(zero), !zero.IsMeasured),
            Line("temperature coefficient", UncertaintySource.TemperatureCoefficient, coefficient.Value, coefficient.StandardUncertainty, coefficient.Unit,
                compensates ? "acts only away from the temperature of the calibration" : coefficient.UncertaintySource ?? coefficient.Source, rectangular: false),
            Line("state of the reference", UncertaintySource.ReferenceState, 100, setup.ReferenceStateRelative * 100, "%", Judgement.ReferenceStateSource(setup),
                air && setup.ReferenceStateRelative == UncertaintyDefaults.WaterSaturatedAirRelative),
        ];
        if (setup.AirToWaterRatio is RecordedQuantity ratio)
        {
            lines.Add(Line("air-to-water ratio", UncertaintySource.AirToWaterRatio, ratio.Value, ratio.StandardUncertainty, "1", ratio.UncertaintySource ?? ratio.Source, rectangular: false));
        }

        return Sorted(lines);

        RecordedContribution Line(string input, UncertaintySource what, double value, double uncertainty, string itsUnit, string source, bool rectangular)
        {
            double percent = 100 * fit.SlopeContribution(what);
            return new RecordedContribution
            {
                Input = input,
                Value = value,
                StandardUncertainty = uncertainty,
                Unit = itsUnit,
                Distribution = rectangular ? "rectangular" : "normal",
                SensitivityPercent = uncertainty == 0 ? null : percent / uncertainty,
                SlopePercent = Math.Abs(percent),
                Source = source,
            };
        }
    }

    /// <summary>The lines with their shares of the variance, largest first.</summary>
    internal static RecordedContribution[] Sorted(IEnumerable<RecordedContribution> lines)
    {
        RecordedContribution[] all = [.. lines.OrderByDescending(static line => line.SlopePercent)];
        double variance = all.Sum(static line => line.SlopePercent * line.SlopePercent);
        return [.. all.Select(line => line with { SharePercent = variance == 0 ? 0 : 100 * line.SlopePercent * line.SlopePercent / variance })];
    }

    /// <summary>Standard deviation of the slope over trials in which every input of the table is drawn from its distribution, % of the slope.</summary>
    /// <returns>The share, %; null when too many trials have no slope.</returns>
    internal static double? DrawnPercent(CalibrationSetup setup, RecordedPoint point, RecordedZero zero, ProbeCalibration fit, IReadOnlyList<RecordedContribution> table, int trials, Random random)
    {
        // The sensitivities are not used by the trials.
        UncertaintyBudget inputs = UncertaintyBudget.Of(fit.Slope, "", [.. table.Select(static line => new UncertaintyContribution(
            line.Input, line.Unit, line.Value ?? 0, line.StandardUncertainty, line.Distribution == "rectangular" ? Distribution.Rectangular : Distribution.Normal, 0))]);
        Drawing drawing = new(setup, point, zero, [.. table.Select(static line => line.Input)]);
        try
        {
            return 100 * MonteCarlo.Run(inputs, drawing.Slope, trials, random).StandardDeviation / Math.Abs(fit.Slope);
        }
        catch (InvalidOperationException)
        {
            return null;
        }
    }

    private static string ZeroSource(RecordedZero zero)
    {
        return zero.IsMeasured
            ? "scatter over the window, and oxygen left in the zero solution (our choice, no source)"
            : "residual current of up to 1 % of the 100 % signal, rectangular (from memory)";
    }

    /// <summary>The full model of a slope, from drawn inputs.</summary>
    private sealed class Drawing(CalibrationSetup setup, RecordedPoint point, RecordedZero zero, string[] names)
    {
        private readonly IProbeModel _model = RecordConversion.Model(setup.Probe);
        private readonly AmperometricProbe? _membrane = setup.Probe.MeterSettings == null ? null : Membrane(setup.Probe);

        internal double Slope(ReadOnlySpan<double> inputs)
        {
            double offset = Drawn(inputs, "thermometer offset", 0);
            double celsius = Drawn(inputs, "temperature at the point", point.Temperature.Value) + offset;
            double hectopascal = Drawn(inputs, "pressure", point.Pressure.Value);
            RecordedTemperatureCoefficient coefficient = setup.Probe.TemperatureCoefficient with { Value = Drawn(inputs, "temperature coefficient", setup.Probe.TemperatureCoefficient.Value) };
            bool meter = _membrane != null;
            // What a meter shows was made with its own thermometer and barometer, so that their errors went into both ways of it.
            IProbeModel model = meter ? _model : RecordConversion.Model(setup.Probe with { TemperatureCoefficient = coefficient });
            double shownAt = meter ? point.Temperature.Value : celsius;
            // The same thermometer read at the zero.
            double zeroAt = meter ? zero.TemperatureCelsius : zero.TemperatureCelsius + offset;
            double shownUnder = meter ? point.Pressure.Value : hectopascal;
            // Outside a range the value goes on as it does in readings; where there is none it is NaN, and so is the slope.
            _ = model.Response(Drawn(inputs, "signal at the point", point.Signal.Mean), shownAt, shownUnder, 0, RangeRule.Extrapolate, out double response);
            _ = model.Response(Drawn(inputs, "zero", zero.Signal), zeroAt, zero.PressureHectopascal, 0, RangeRule.Extrapolate, out double zeroResponse);
            _ = OxygenEquilibrium.PartialPressure(celsius, hectopascal, RangeRule.Extrapolate, out double reference);
            _ = model.Gain(shownAt, RangeRule.Extrapolate, out double gain);
            if (meter)
            {
                _ = _membrane!.Gain(celsius, RangeRule.Extrapolate, out double taken);
                _ = _membrane.Gain(point.Temperature.Value, RangeRule.Extrapolate, out double right);
                gain *= taken / right;
            }

            double state = Drawn(inputs, "state of the reference", 100) / 100;
            double ratio = Drawn(inputs, "air-to-water ratio", setup.AirToWaterRatio?.Value ?? 1);
            return CalibrationFit.Slope(response, zeroResponse, gain, point.FlowFactor, ratio, reference * state, out double slope) == Status.Ok ? slope : double.NaN;
        }

        private double Drawn(ReadOnlySpan<double> inputs, string name, double otherwise)
        {
            int i = Array.IndexOf(names, name);
            return i < 0 ? otherwise : inputs[i];
        }

        private static AmperometricProbe Membrane(RecordedProbe probe)
        {
            RecordedTemperatureCoefficient coefficient = probe.TemperatureCoefficient;
            return new AmperometricProbe(RecordNames.Form(coefficient.Form), coefficient.Value, coefficient.ReferenceCelsius, coefficient.FittedLowCelsius, coefficient.FittedHighCelsius);
        }
    }
}
