using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Characterising;

/// <summary>Signal without the gas, and where it comes from.</summary>
internal sealed record ZeroSignal(double Value, double StandardUncertainty, string Source);

/// <summary>The residual current: the mean of readings without the gas.</summary>
internal static class ZeroPart
{
    internal const string Name = "zero";

    private const int Least = 3;

    internal static CharacterisedPart Fit(LabRun run, out ZeroSignal zero)
    {
        IReadOnlyList<LabRow> points = run.Points();
        if (points.Count < Least)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{run.Name}: {points.Count} readings without the gas; a residual current with its uncertainty needs at least {Least}"));
        }

        Scatter scatter = Scatter.Of([.. points.Select(static point => point.Signal)]);
        string unit = run.SignalUnit.Length == 0 ? "1" : run.SignalUnit;
        zero = new ZeroSignal(scatter.Mean, scatter.StandardUncertainty, "the zero part");
        return new CharacterisedPart
        {
            Part = Name,
            Model = "mean",
            Parameters = [new("residual-current", scatter.Mean, scatter.StandardUncertainty, unit)],
            Covariance = [scatter.StandardUncertainty * scatter.StandardUncertainty],
            Rows = run.Rows.Count,
            Points = points.Count,
            DegreesOfFreedom = scatter.DegreesOfFreedom,
            ResidualStandardDeviation = scatter.StandardDeviation,
            ResidualUnit = unit,
            CoverageFactor = scatter.CoverageFactor,
            Notes = ["what gas was left in the zero medium is not in the uncertainty"],
        };
    }

    /// <summary>A zero that was typed: <c>0.4</c> or <c>0.4 u 0.1</c>.</summary>
    internal static ZeroSignal Parse(string text)
    {
        string[] words = text.Split(' ', StringSplitOptions.RemoveEmptyEntries);
        if (words.Length is not (1 or 3) || (words.Length == 3 && words[1] != "u"))
        {
            throw Wrong.Input("--zero", text, "write the signal without the gas, with its standard uncertainty if it is known: 0.4 or \"0.4 u 0.1\"");
        }

        double uncertainty = words.Length == 3 ? Number.Parse("--zero " + Wrong.Shown(text) + ":", words[2]) : 0;
        return uncertainty < 0
            ? throw Wrong.Input("--zero", text, "a standard uncertainty is not negative")
            : new ZeroSignal(Number.Parse("--zero", words[0]), uncertainty, words.Length == 3 ? "entered" : "entered, taken as exact");
    }
}
