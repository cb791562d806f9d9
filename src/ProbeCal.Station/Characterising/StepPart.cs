using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Uncertainty;

namespace ProbeCal.Station.Characterising;

/// <summary>
/// The time constant from one step: signal = end + jump·exp(−t/τ) through all rows after the step. It needs no time of the step itself, for an exponential looks alike from everywhere.
/// </summary>
internal static class StepPart
{
    internal const string Up = "step-up";
    internal const string Down = "step-down";

    private const int LeastRows = 10;
    private const double LnTen = 2.302585092994046;

    /// <summary>Shortest record, in time constants, from which the end can be told.</summary>
    private const double LeastSpan = 2;

    /// <summary>Fewest rows within the first two time constants.</summary>
    private const int LeastEarly = 3;

    /// <summary>Lag-1 correlation of the residuals from which on the curve is no plain exponential, or the noise is slow.</summary>
    private const double NoticeableCorrelation = 0.3;

    internal static CharacterisedPart Fit(LabRun run, double afterSeconds)
    {
        LabRow[] rows = [.. run.Rows.Where(row => afterSeconds <= row.Seconds)];
        if (rows.Length < LeastRows)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{run.Name}: {rows.Length} rows after the step; a time constant needs at least {LeastRows}"));
        }

        for (int i = 1; i < rows.Length; i++)
        {
            if (rows[i].Seconds <= rows[i - 1].Seconds)
            {
                throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{run.Name}: the time of row {i + 1} after the step does not go on from the one before ({rows[i].Seconds:R} s after {rows[i - 1].Seconds:R} s)"));
            }
        }

        double[] t = [.. rows.Select(row => row.Seconds - rows[0].Seconds)];
        double[] y = [.. rows.Select(static row => row.Signal)];
        FitResult fit = Solve(run, t, y);
        double tau = fit.Parameter(2);
        Judge(run, t, fit.Parameter(1), tau);
        double enlarged = Scatter.Enlargement([.. Enumerable.Range(0, y.Length).Select(fit.Residual)], out double correlation);
        double[] covariance = new double[9];
        for (int i = 0; i < 9; i++)
        {
            covariance[i] = enlarged * fit.Covariance(i / 3, i % 3);
        }

        string direction = run.Part == Up ? "up" : "down";
        string unit = run.SignalUnit.Length == 0 ? "1" : run.SignalUnit;
        double uncertainty = Math.Sqrt(covariance[8]);
        int free = Math.Max(1, (int)(fit.DegreesOfFreedom / enlarged));
        return new CharacterisedPart
        {
            Part = run.Part,
            Model = "signal = end + jump · exp(-t/tau)",
            Parameters =
            [
                new("end", fit.Parameter(0), Math.Sqrt(covariance[0]), unit), new("jump", fit.Parameter(1), Math.Sqrt(covariance[4]), unit), new("tau-" + direction, tau, uncertainty, "s"),
            ],
            Covariance = covariance,
            Derived = [new("t90-" + direction, LnTen * tau, LnTen * uncertainty, "s")],
            Rows = run.Rows.Count,
            Points = rows.Length,
            DegreesOfFreedom = free,
            ResidualStandardDeviation = fit.ResidualStandardDeviation,
            ResidualUnit = unit,
            CoverageFactor = Quantiles.StudentHalfWidth(0.95, free),
            Notes = correlation < NoticeableCorrelation
                ? []
                : [string.Create(CultureInfo.InvariantCulture, $"neighbouring residuals go together (lag-1 correlation {correlation:F2}): the response is no plain exponential, or its noise is slow; the uncertainty is enlarged for it")],
        };
    }

    private static void Judge(LabRun run, double[] t, double jump, double tau)
    {
        bool up = run.Part == Up;
        if (jump < 0 != up)
        {
            throw new InputException($"{run.Name}: the signal {(up ? "falls" : "rises")} in the {run.Part} part; were the two files exchanged?");
        }

        if (t[^1] < LeastSpan * tau)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{run.Name}: the record ends {t[^1]:F1} s after the step, with a time constant of about {tau:F1} s; go on for at least {LeastSpan:F0} of them, better five"));
        }

        if (t.Count(seconds => seconds <= 2 * tau) < LeastEarly)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{run.Name}: the step is over before the third row (time constant about {tau:F1} s); record faster"));
        }
    }

    private static FitResult Solve(LabRun run, double[] t, double[] y)
    {
        // The start: the end from the last twentieth, the time constant from where the rest has fallen to 1/e.
        double end = y[^Math.Max(1, y.Length / 20)..].Average();
        double jump = y[0] - end;
        double tau = t[^1] / 5;
        for (int i = 0; i < t.Length; i++)
        {
            if (Math.Abs(y[i] - end) < Math.Abs(jump) / Math.E)
            {
                tau = Math.Max(t[i], t[1]);
                break;
            }
        }

        FitModel model = (parameters, values, jacobian) =>
        {
            if (!(0 < parameters[2]))
            {
                return false;
            }

            for (int i = 0; i < t.Length; i++)
            {
                double rest = Math.Exp(-t[i] / parameters[2]);
                values[i] = parameters[0] + (parameters[1] * rest);
                jacobian[3 * i] = 1;
                jacobian[(3 * i) + 1] = rest;
                jacobian[(3 * i) + 2] = parameters[1] * rest * t[i] / (parameters[2] * parameters[2]);
            }

            return true;
        };
        Status status = LevenbergMarquardt.Fit(model, y, null, [end, jump, tau], out FitResult? fit);
        return status == Status.Ok
            ? fit!
            : throw new InputException($"{run.Name}: no time constant can be fitted ({status}); is there a step in the rows, and does the record go on until the signal stands?");
    }
}
