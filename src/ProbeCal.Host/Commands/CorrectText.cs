using System;
using System.Globalization;
using System.IO;
using System.Linq;
using ProbeCal.Station.Correcting;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>What <c>correct explain</c> and <c>correct report</c> print.</summary>
internal static class CorrectText
{
    private const int GapsShown = 20;

    internal static void Write(TextWriter output, ExplainedRow row)
    {
        output.WriteLine(row.Title);
        output.WriteLine("raw: " + row.Raw);
        foreach (CorrectionStep step in row.Steps)
        {
            output.WriteLine($"{step.Name} = {Value(step.Value)}{(step.Unit.Length == 0 ? "" : " " + step.Unit)}");
            if (step.Formula.Length != 0)
            {
                output.WriteLine("    = " + step.Formula);
            }

            if (step.Inputs.Count != 0)
            {
                output.WriteLine("    with " + string.Join(", ", step.Inputs.Select(static each => each.Name + " " + Value(each.Value))));
            }

            output.WriteLine("    " + step.From);
        }

        output.WriteLine("status: " + row.Status);
    }

    internal static void Write(TextWriter output, RecordReport report)
    {
        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{report.Rows} rows from {Time(report.Span.First)} to {Time(report.Span.Last)}, usually {report.Interval.TotalMinutes:0.###} min apart"));
        if (report.WithoutTime + report.Repeats + report.Backward != 0)
        {
            output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"  {report.WithoutTime} rows without a readable time, {report.Repeats} repeat the time before, {report.Backward} go back"));
        }

        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"gaps longer than 1.5 intervals: {report.Gaps.Count}"));
        foreach ((DateTimeOffset from, DateTimeOffset to) in report.Gaps.Take(GapsShown))
        {
            output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"  {Time(from)} to {Time(to)}: {(to - from).TotalMinutes:0.#} min, {Math.Round((to - from) / report.Interval) - 1:0} rows missing"));
        }

        if (GapsShown < report.Gaps.Count)
        {
            output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"  and {report.Gaps.Count - GapsShown} more"));
        }

        if (report.Concentrations != 0)
        {
            output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"concentration: {report.Concentrations} rows, {report.BelowZero} below zero"));
            output.WriteLine(report.LongestPlateau is Plateau plateau
                ? string.Create(CultureInfo.InvariantCulture, $"  plateau below zero from {Time(plateau.From)} to {Time(plateau.To)}: median {plateau.Median:0.0000} mg/L, mean {plateau.Mean:0.0000}, standard deviation {plateau.StandardDeviation:0.0000}, {plateau.Lowest:0.0000} to {plateau.Highest:0.0000} in {plateau.Rows} rows; if the water had no oxygen, this is the probe's zero offset")
                : "  no plateau below zero (6 h or more)");
        }

        Compare(output, "1 atm", report.AgainstOneAtmosphere);
        Compare(output, "the local pressure", report.AgainstLocal);
        if (report.AgainstOneAtmosphere is PercentComparison one && report.AgainstLocal is PercentComparison local)
        {
            output.WriteLine("  it stands on " + (one.RootMeanSquare < local.RootMeanSquare ? "1 atm" : "the local pressure"));
        }
    }

    private static void Compare(TextWriter output, string convention, PercentComparison? comparison)
    {
        if (comparison is not null)
        {
            output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"% column against % of {convention} from mg/L, temperature and salinity: largest difference {comparison.Largest:0.000} (where the column says {comparison.At:0.00}), root mean square {comparison.RootMeanSquare:0.000}, {comparison.Rows} rows"));
        }
    }

    private static string Value(double value)
    {
        return double.IsNaN(value) ? "none" : Number.Print(value);
    }

    private static string Time(DateTimeOffset time)
    {
        return time.UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture);
    }
}
