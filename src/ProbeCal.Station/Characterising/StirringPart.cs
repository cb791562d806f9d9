using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Uncertainty;

namespace ProbeCal.Station.Characterising;

/// <summary>How much more the probe gives in stirred water than in still water at one partial pressure.</summary>
internal static class StirringPart
{
    internal const string Name = "stirring";

    private const int Least = 3;

    /// <summary>Without a temperature coefficient or a partial pressure the two may differ by this much, K; more, and the ratio would hold it.</summary>
    private const double AllowedKelvin = 0.5;

    internal static CharacterisedPart Fit(LabRun run, ZeroSignal zero, ProbeGain? gain)
    {
        IReadOnlyList<LabRow> points = run.Columns.Contains(LabRun.Level) ? run.Points() : run.Rows;
        LabRow[] stirred = [.. points.Where(static point => point.Stirring == "stirred")];
        LabRow[] still = [.. points.Where(static point => point.Stirring == "still")];
        if (stirred.Length < Least || still.Length < Least)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{run.Name}: {stirred.Length} stirred and {still.Length} still readings; the ratio needs at least {Least} of each"));
        }

        string note = Compare(run, stirred, still, gain);
        double ratio = Ratio(run, stirred, still, gain, zero.Value, out Scatter moving, out Scatter quiet);
        double ofMoving = moving.StandardUncertainty / moving.Mean;
        double ofQuiet = quiet.StandardUncertainty / quiet.Mean;
        double ofZero = zero.StandardUncertainty == 0 ? 0 : (Ratio(run, stirred, still, gain, zero.Value + zero.StandardUncertainty, out _, out _) - ratio) / ratio;
        double relative = Math.Sqrt((ofMoving * ofMoving) + (ofQuiet * ofQuiet) + (ofZero * ofZero));
        double effective = Math.Pow(relative, 4) / ((Math.Pow(ofMoving, 4) / moving.DegreesOfFreedom) + (Math.Pow(ofQuiet, 4) / quiet.DegreesOfFreedom));
        int free = double.IsFinite(effective) ? (int)Math.Clamp(effective, 1, 1e6) : 1;
        return new CharacterisedPart
        {
            Part = Name,
            Model = "(stirred - zero)/(still - zero)",
            Parameters = [new("stirring-ratio", ratio, ratio * relative, "")],
            Covariance = [ratio * ratio * relative * relative],
            Derived = [new("flow-factor-still", 1 / ratio, relative / ratio, "")],
            Rows = run.Rows.Count,
            Points = stirred.Length + still.Length,
            DegreesOfFreedom = free,
            ResidualStandardDeviation = Math.Sqrt(0.5 * (Square(moving.StandardDeviation / moving.Mean) + Square(quiet.StandardDeviation / quiet.Mean))),
            ResidualUnit = "relative",
            CoverageFactor = Quantiles.StudentHalfWidth(0.95, free),
            Notes = [note, "zero: " + zero.Source],
        };
    }

    private static double Square(double value)
    {
        return value * value;
    }

    private static double Ratio(LabRun run, LabRow[] stirred, LabRow[] still, ProbeGain? gain, double zero, out Scatter moving, out Scatter quiet)
    {
        double Net(LabRow row) => (row.Signal - zero)
            / (gain is not null && run.Columns.Contains(LabRun.Temperature) ? gain.At(row.Celsius) : 1)
            / (double.IsNaN(row.Hectopascal) ? 1 : row.Hectopascal);

        moving = Scatter.Of([.. stirred.Select(Net)]);
        quiet = Scatter.Of([.. still.Select(Net)]);
        return 0 < moving.Mean && 0 < quiet.Mean
            ? moving.Mean / quiet.Mean
            : throw new InputException($"{run.Name}: the mean signals are not above the zero of {Number.Significant(zero, 5)}; check the zero");
    }

    private static string Compare(LabRun run, LabRow[] stirred, LabRow[] still, ProbeGain? gain)
    {
        List<string> corrected = [];
        if (run.Columns.Contains(LabRun.Temperature))
        {
            double apart = stirred.Average(static row => row.Celsius) - still.Average(static row => row.Celsius);
            if (gain is null && AllowedKelvin < Math.Abs(apart))
            {
                throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{run.Name}: stirred and still were {Math.Abs(apart):F1} K apart, and no temperature coefficient is known; add a temperature part or --coefficient"));
            }

            if (gain is not null)
            {
                corrected.Add("temperature");
            }
        }

        if (!double.IsNaN(stirred[0].Hectopascal))
        {
            corrected.Add("partial pressure");
        }

        return corrected.Count == 0 ? "taken as at one temperature and one partial pressure" : "corrected for " + string.Join(" and ", corrected);
    }
}
