using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Uncertainty;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// The budget of the slope of a fit through several points: what its covariance is made of. Each input is moved by its standard uncertainty and the fit
/// made again, so that the table knows no formula of the fit; what the table and the covariance differ by is a line of its own.
/// </summary>
internal static class SeveralPointsBudget
{
    /// <summary>Trials of the check by drawing; each is a fit of its own.</summary>
    public const int Trials = 2_000;

    /// <summary>Difference of the two standard uncertainties that becomes a finding, %: three times what chance does at this number of trials is 4.7 % (our choice, no source).</summary>
    public const double TolerancePercent = 8;

    /// <summary>A rest smaller than this share of the variance is not worth a line, %.</summary>
    private const double LeastSharePercent = 0.5;

    /// <summary>The table, largest contribution first.</summary>
    internal static RecordedContribution[] Of(CalibrationSetup setup, IReadOnlyList<RecordedPoint> fitted, RecordedFit fit)
    {
        List<RecordedContribution> lines = [];
        foreach (Shift shift in Shifts(setup, fitted))
        {
            double percent = 100 * (SlopeOf(setup, fitted, fit, [shift], [1]) - SlopeOf(setup, fitted, fit, [shift], [-1])) / (2 * fit.Slope);
            lines.Add(new RecordedContribution
            {
                Input = shift.Input,
                Value = shift.Value,
                StandardUncertainty = shift.StandardUncertainty,
                Unit = shift.Unit,
                Distribution = shift.Distribution,
                SensitivityPercent = percent / shift.StandardUncertainty,
                SlopePercent = Math.Abs(percent),
                Source = shift.Source,
            });
        }

        double whole = TotalPercent(setup, fit);
        double rest = (whole * whole) - lines.Sum(static line => line.SlopePercent * line.SlopePercent);
        if (LeastSharePercent / 100 * whole * whole < rest)
        {
            lines.Add(new RecordedContribution
            {
                Input = "rest of the fit's covariance",
                StandardUncertainty = Math.Sqrt(rest),
                Unit = "%",
                SlopePercent = Math.Sqrt(rest),
                Source = "what the covariance holds beyond the lines above",
            });
        }

        return SlopeBudget.Sorted(lines);
    }

    /// <summary>Standard uncertainty of the slope by the fit's covariance, the thermometer's offset and the temperature coefficient, % of the slope.</summary>
    internal static double TotalPercent(CalibrationSetup setup, RecordedFit fit)
    {
        double offset = fit.PerThermometerKelvin[1] * setup.Probe.Thermometer.CommonStandardUncertaintyCelsius;
        double coefficient = fit.PerTemperatureCoefficient[1] * setup.Probe.TemperatureCoefficient.StandardUncertainty;
        return 100 * Math.Sqrt(fit.Covariance[2] + (offset * offset) + (coefficient * coefficient)) / Math.Abs(fit.Slope);
    }

    /// <summary>Standard deviation of the slope over trials in which every input is drawn and the fit made again, % of the slope; null when too many trials have no fit.</summary>
    internal static double? DrawnPercent(CalibrationSetup setup, IReadOnlyList<RecordedPoint> fitted, RecordedFit fit, int trials, Random random)
    {
        Shift[] shifts = [.. Shifts(setup, fitted)];
        UncertaintyBudget inputs = UncertaintyBudget.Of(fit.Slope, "", [.. shifts.Select(static shift => new UncertaintyContribution(
            shift.Input, "", 0, 1, shift.Distribution == "rectangular" ? Distribution.Rectangular : Distribution.Normal, 0))]);
        try
        {
            return 100 * MonteCarlo.Run(inputs, drawn => SlopeOf(setup, fitted, fit, shifts, drawn), trials, random).StandardDeviation / Math.Abs(fit.Slope);
        }
        catch (InvalidOperationException)
        {
            return null;
        }
    }

    private static double SlopeOf(CalibrationSetup setup, IReadOnlyList<RecordedPoint> fitted, RecordedFit fit, IReadOnlyList<Shift> shifts, ReadOnlySpan<double> by)
    {
        RecordedPoint[] moved = [.. fitted];
        RecordedProbe probe = setup.Probe;
        for (int i = 0; i < shifts.Count; i++)
        {
            Shift shift = shifts[i];
            double share = by[i];
            if (shift.OfCoefficient)
            {
                probe = probe with { TemperatureCoefficient = probe.TemperatureCoefficient with { Value = probe.TemperatureCoefficient.Value + (share * shift.StandardUncertainty) } };
                continue;
            }

            for (int point = 0; point < moved.Length; point++)
            {
                moved[point] = Moved(moved[point], share * shift.Signal[point], share * shift.Kelvin[point], share * shift.Hectopascal[point]);
            }
        }

        return SeveralPoints.Of(probe, setup.Gas, moved, fit.Form).Fit?.Slope ?? double.NaN;
    }

    private static RecordedPoint Moved(RecordedPoint point, double signal, double kelvin, double hectopascal)
    {
        return point with
        {
            Signal = point.Signal with { Mean = point.Signal.Mean + signal },
            Temperature = point.Temperature with { Value = point.Temperature.Value + kelvin },
            ReferencePartialPressureHectopascal = point.ReferencePartialPressureHectopascal + hectopascal,
        };
    }

    /// <summary>Every input of the points: own ones of each, and those that several share, moved together.</summary>
    private static IEnumerable<Shift> Shifts(CalibrationSetup setup, IReadOnlyList<RecordedPoint> fitted)
    {
        int count = fitted.Count;
        Dictionary<string, Shift> references = [];
        List<Shift> own = [];
        RecordedThermometer thermometer = setup.Probe.Thermometer;
        Shift offset = new("thermometer offset", 0, thermometer.CommonStandardUncertaintyCelsius, "K",
            thermometer.CommonStandardUncertaintyCelsius == UncertaintyDefaults.ThermometerOffsetKelvin ? "rectangular" : "normal", thermometer.Source, count);
        for (int i = 0; i < count; i++)
        {
            RecordedPoint point = fitted[i];
            Shift signal = new($"signal, {point.Role}", point.Signal.Mean, point.SignalStandardUncertainty, setup.Probe.SignalUnit, "normal", "scatter, drift and resolution over the window", count);
            signal.Signal[i] = point.SignalStandardUncertainty;
            Shift temperature = new($"temperature, {point.Role}", point.Temperature.Value, point.Temperature.StandardUncertainty, "K", "normal", "reading and scatter over the window", count);
            temperature.Kelvin[i] = point.Temperature.StandardUncertainty;
            offset.Kelvin[i] = offset.StandardUncertainty;
            own.Add(signal);
            own.Add(temperature);
            RecordedReferenceContribution[] budget = point.Reference?.Budget ?? [];
            if (budget.Length == 0)
            {
                Shift whole = new($"reference, {point.Role}", point.ReferencePartialPressureHectopascal, point.ReferencePartialPressureUncertaintyHectopascal, "hPa", "normal", "all of it taken as this point's own", count);
                whole.Hectopascal[i] = point.ReferencePartialPressureUncertaintyHectopascal;
                own.Add(whole);
                continue;
            }

            foreach (RecordedReferenceContribution input in budget)
            {
                if (input.Input == ReferenceInputs.ThermometerOffset)
                {
                    offset.Hectopascal[i] += input.Hectopascal;
                }
                else if (input.Input == ReferenceInputs.Temperature)
                {
                    temperature.Hectopascal[i] += input.Hectopascal;
                }
                else
                {
                    bool common = ReferenceInputs.IsCommon(input.Input);
                    string key = common ? input.Input + "|" + input.Source : $"{input.Input}|{i}";
                    if (!references.TryGetValue(key, out Shift? shift))
                    {
                        shift = new(common ? input.Input : $"{input.Input}, {point.Role}", input.Value, input.StandardUncertainty, input.Unit, input.Distribution, input.Source, count);
                        references.Add(key, shift);
                    }

                    shift.Hectopascal[i] += input.Hectopascal;
                }
            }
        }

        RecordedTemperatureCoefficient coefficient = setup.Probe.TemperatureCoefficient;
        Shift ofCoefficient = new("temperature coefficient", coefficient.Value, coefficient.StandardUncertainty, coefficient.Unit, "normal", coefficient.UncertaintySource ?? coefficient.Source, count) { OfCoefficient = true };
        return own.Concat(references.Values).Append(offset).Append(ofCoefficient).Where(static shift => shift.StandardUncertainty != 0);
    }

    /// <summary>An input and what one standard uncertainty of it moves, point by point.</summary>
    private sealed record Shift(string Input, double Value, double StandardUncertainty, string Unit, string Distribution, string Source, int Points)
    {
        internal double[] Signal { get; } = new double[Points];

        internal double[] Kelvin { get; } = new double[Points];

        internal double[] Hectopascal { get; } = new double[Points];

        internal bool OfCoefficient { get; init; }
    }
}
