using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Uncertainty;

namespace ProbeCal.Station.Characterising;

/// <summary>Straightness: a line, and a quadratic beside it, through signals at several partial pressures.</summary>
internal static class LinearityPart
{
    internal const string Name = "linearity";

    private const int LeastLevels = 3;

    /// <summary>Partial pressures nearer than this share of their span are one level.</summary>
    private const double OneLevelShare = 0.02;

    /// <summary>A spread of temperature up to this, K, is taken as one temperature where no coefficient is known.</summary>
    private const double OneTemperatureKelvin = 0.5;

    internal static CharacterisedPart Fit(LabRun run, ProbeGain? gain)
    {
        IReadOnlyList<LabRow> points = run.Points();
        double[] p = [.. points.Select(static point => point.Hectopascal)];
        double span = p.Max() - p.Min();
        int[] level = TemperaturePart.Grouped(p, OneLevelShare * span);
        int levels = level.Max();
        if (levels < LeastLevels)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{run.Name}: linearity needs at least {LeastLevels} levels of partial pressure, and there {(levels == 1 ? "is 1" : $"are {levels}")}; add levels, for example nitrogen, air and a mixture between"));
        }

        double[] gains = Gains(run, points, gain, out string note);
        double[] y = [.. points.Select(static point => point.Signal)];
        FitResult line = Solve(run, p, gains, y, 1);
        if (y.Max() == y.Min())
        {
            throw new InputException($"{run.Name}: the signal does not change with the partial pressure; is it the right column?");
        }

        string unit = run.SignalUnit.Length == 0 ? "1" : run.SignalUnit;
        List<Estimate> derived = [LinearityError(line, level, levels, p, gains, span)];
        double[] covariance = [line.Covariance(0, 0), line.Covariance(0, 1), line.Covariance(1, 0), line.Covariance(1, 1)];
        List<string> notes = [note];
        if (LeastLevels < points.Count)
        {
            FitResult curve = Solve(run, p, gains, y, 2);
            double k = Quantiles.StudentHalfWidth(0.95, curve.DegreesOfFreedom);
            derived.Add(new("curvature", curve.Parameter(2), curve.StandardUncertainty(2), unit + "/hPa2") { CoverageFactor = k });
            double t = Math.Abs(curve.Parameter(2)) / curve.StandardUncertainty(2);
            if (k < t && double.IsFinite(t))
            {
                notes.Add(string.Create(CultureInfo.InvariantCulture, $"the curvature is {t:F1} times its standard uncertainty: the probe is bent, and a quadratic calibration serves it better"));
            }
        }

        return new CharacterisedPart
        {
            Part = Name,
            Model = "signal = zero + slope · f(T) · p",
            Parameters = [new("zero-intercept", line.Parameter(0), line.StandardUncertainty(0), unit), new("slope", line.Parameter(1), line.StandardUncertainty(1), unit + "/hPa")],
            Covariance = covariance,
            Derived = derived,
            Rows = run.Rows.Count,
            Points = points.Count,
            DegreesOfFreedom = line.DegreesOfFreedom,
            ResidualStandardDeviation = line.ResidualStandardDeviation,
            ResidualUnit = unit,
            CoverageFactor = Quantiles.StudentHalfWidth(0.95, line.DegreesOfFreedom),
            LackOfFitProbability = LackOfFit.Test(line, level, null, out double f, out int lack, out int pure) == Status.Ok ? Quantiles.FisherAbove(f, lack, pure) : null,
            Notes = notes,
        };
    }

    /// <summary>The largest distance of a level's mean from the line, in percent of what the span makes.</summary>
    private static Estimate LinearityError(FitResult line, int[] level, int levels, double[] p, double[] gains, double span)
    {
        double whole = Math.Abs(line.Parameter(1)) * span;
        double worst = 0;
        double uncertainty = 0;
        for (int number = 1; number <= levels; number++)
        {
            int[] at = [.. Enumerable.Range(0, p.Length).Where(i => level[i] == number)];
            double off = at.Average(i => line.Residual(i) / gains[i]);
            if (Math.Abs(worst) <= Math.Abs(off))
            {
                worst = off;
                uncertainty = line.ResidualStandardDeviation / at.Average(i => gains[i]) / Math.Sqrt(at.Length);
            }
        }

        return new Estimate("linearity-error", 100 * worst / whole, 100 * uncertainty / whole, "% of span");
    }

    private static double[] Gains(LabRun run, IReadOnlyList<LabRow> points, ProbeGain? gain, out string note)
    {
        note = "all at one temperature";
        if (!run.Columns.Contains(LabRun.Temperature))
        {
            note = "no temperature column: taken as all at one temperature";
            return [.. points.Select(static _ => 1.0)];
        }

        double low = points.Min(static point => point.Celsius);
        double high = points.Max(static point => point.Celsius);
        if (gain is null)
        {
            return high - low <= OneTemperatureKelvin
                ? [.. points.Select(static _ => 1.0)]
                : throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{run.Name}: the temperature runs from {low:F1} to {high:F1} C, and no temperature coefficient is known; add a temperature part or --coefficient"));
        }

        note = "brought to the reference temperature by f(T)";
        double[] factors = [.. points.Select(point => gain.At(point.Celsius))];
        return factors.All(double.IsFinite) ? factors : throw new InputException($"{run.Name}: the temperature coefficient gives no factor at one of the temperatures");
    }

    private static FitResult Solve(LabRun run, double[] p, double[] gains, double[] y, int degree)
    {
        double[] design = new double[p.Length * (degree + 1)];
        for (int i = 0; i < p.Length; i++)
        {
            design[i * (degree + 1)] = 1;
            for (int k = 1; k <= degree; k++)
            {
                design[(i * (degree + 1)) + k] = gains[i] * Math.Pow(p[i], k);
            }
        }

        Status status = LeastSquares.Linear(design, degree + 1, y, null, out FitResult? fit);
        return status == Status.Ok ? fit! : throw new InputException($"{run.Name}: the levels cannot be fitted ({status}); look at the signals and the partial pressures");
    }
}
