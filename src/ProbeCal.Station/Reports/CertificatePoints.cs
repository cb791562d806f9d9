using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>What was read at which reference, and what came of it.</summary>
internal static class CertificatePoints
{
    internal static List<ReportBlock> Points(CalibrationRecord record)
    {
        RecordedResidual?[] residuals = Residuals(record);
        bool several = record.Points.Any(point => point.Method is not null && point.Method != record.Method);
        ReportTable table = ColumnChoice.Table(
            [
                CertificateNames.Words("point-role"), CertificateNames.Words("point-time"), CertificateNames.Words("point-method"), CertificateNames.Figures("point-samples"),
                CertificateNames.Figures("point-signal"), CertificateNames.Figures("point-signal-uncertainty"), CertificateNames.Figures("point-temperature"), CertificateNames.Figures("point-pressure"),
                CertificateNames.Figures("point-reference-pressure"), CertificateNames.Figures("point-reference-pressure-uncertainty"),
                CertificateNames.Figures("point-reference"), CertificateNames.Figures("point-reference-uncertainty"),
                CertificateNames.Figures("point-reading"), CertificateNames.Figures("point-error"),
                CertificateNames.Figures("point-reading-pressure"), CertificateNames.Figures("point-error-pressure"),
                CertificateNames.Figures("point-residual"), CertificateNames.Figures("point-standardised"),
            ],
            record.Points.Select((point, i) => Row(record, several ? point : point with { Method = null }, residuals[i])));
        string signal = record.Probe.SignalUnit.Length == 0 ? "" : " in " + record.Probe.SignalUnit;
        List<ReportBlock> blocks = [table, new ReportSentence("points-note", $"Signal{signal}: mean of the samples, or what a meter showed; u: standard uncertainty; error: reading less reference.")];
        RecordedPoint[] read = [.. record.Points.Where(static point => point.ReadBy is not null)];
        if (read.Length != 0)
        {
            blocks.Add(new ReportSentence("point-read-by", "Read by " + string.Join("; ", read.GroupBy(static point => point.ReadBy!)
                .Select(static group => $"{(group.Key == "this" ? "the new calibration" : group.Key)}: {string.Join(", ", group.Select(static point => ReportText.Role(point.Role)))}")) + ".", RunsOn: true));
        }

        double[] windows = [.. record.Points.Where(static point => !point.Typed).Select(static point => point.Signal.WindowSeconds)];
        if (windows.Length != 0)
        {
            string least = Number.Fixed(windows.Min(), 0);
            string most = Number.Fixed(windows.Max(), 0);
            blocks.Add(new ReportSentence("point-windows", $"Samples were taken over {(least == most ? least : least + " to " + most)} s.", RunsOn: true));
        }

        return blocks;
    }

    internal static List<ReportBlock> Result(CalibrationRecord record, string verdict)
    {
        RecordedResult result = record.Result;
        List<ReportField> fields = [];
        Add("verdict", verdict);
        Add("reasons", string.Join("; ", result.Reasons));
        bool meter = record.Probe.MeterSettings != null;
        string signal = record.Probe.SignalUnit.Length == 0 ? "signal" : record.Probe.SignalUnit;
        double percent = 100 * result.SlopeStandardUncertainty / Math.Abs(result.Slope);
        Add("slope", $"{ReportText.Few(result.Slope)}{(meter ? " (1 is a meter that shows the truth)" : $" {signal}/{(ModelNames.IsLogarithmic(record.Probe.Model) ? "decade" : "hPa")}")}, u {ReportText.Uncertainty(result.SlopeStandardUncertainty)}{(double.IsFinite(percent) ? $" ({Number.Fixed(percent, 2)} %)" : "")}");
        Add("zero", $"{ReportText.Few(result.Zero)} {(meter ? "hPa" : signal)}, u {ReportText.Uncertainty(result.ZeroStandardUncertainty)} ({record.Zero.Source})");
        Add("as-found", Error(record, "span"));
        Add("as-left", Error(record, "as-left"));
        Add("zero-error", Error(record, "zero"));
        if (record.Fit is RecordedFit fit)
        {
            Add("fit", $"{fit.Form}, {fit.Method}");
            Add("curvature", fit.Curvature == 0 ? null : ReportText.Few(fit.Curvature));
            Add("fit-range", $"{Number.Fixed(fit.LowestHectopascal, 1)} to {Number.Fixed(fit.HighestHectopascal, 1)} hPa; readings beyond are flagged");
            Add("fit-freedom", Number.Print(fit.DegreesOfFreedom));
            Add("fit-residual", ReportText.Few(fit.ResidualStandardDeviation));
            Add("fit-chi-squared", $"{ReportText.Few(fit.ChiSquared)}{(fit.ChiSquaredProbability is double p ? ", probability " + Number.Fixed(p, 3) : "")}");
            Add("fit-lack", fit.LackOfFit is RecordedLackOfFit lack ? $"F({Number.Print(lack.DegreesOfFreedomLack)}, {Number.Print(lack.DegreesOfFreedomPure)}) = {ReportText.Few(lack.F)}, probability {Number.Fixed(lack.Probability, 3)}" : null);
        }

        List<ReportBlock> blocks = [new ReportFields(fields)];
        if (Plot(record) is ReportPlot plot)
        {
            blocks.Add(plot);
        }

        return blocks;

        void Add(string id, string? value)
        {
            if (!string.IsNullOrEmpty(value))
            {
                fields.Add(CertificateNames.Field(id, value));
            }
        }
    }

    /// <summary>Residuals of a fit over several points; else the errors before and after, since one point and a zero leave no residual.</summary>
    internal static ReportPlot? Plot(CalibrationRecord record)
    {
        return record.Fit is RecordedFit fit && fit.Residuals.Length != 0 ? ResidualPlot(record, fit) : ErrorPlot(record);
    }

    private static ReportPlot ResidualPlot(CalibrationRecord record, RecordedFit fit)
    {
        PlotPoint[] points = [.. fit.Residuals.Select(static residual => new PlotPoint(residual.ReferenceHectopascal, residual.ResidualHectopascal, 0))];
        double largest = fit.Residuals.Max(static residual => Math.Abs(residual.ResidualHectopascal));
        return new ReportPlot(
            "residual-plot", $"Residuals of the fit of {record.Id}",
            $"{Number.Print(points.Length)} residuals, fitted value less reference, over the reference partial pressure; the largest is {Number.Fixed(largest, 3)} hPa. The table of points has each of them.",
            new PlotAxis("reference, hPa", false), new PlotAxis("residual, hPa", false),
            [new PlotSeries("residual", PlotMark.Disc, points)],
            [new PlotLine("", PlotStroke.Thin, [new(points.Min(static point => point.X), 0, 0), new(points.Max(static point => point.X), 0, 0)])]);
    }

    private static ReportPlot? ErrorPlot(CalibrationRecord record)
    {
        string unit = ErrorScale.Unit(record);
        RecordedPoint[] known = [.. record.Points.Where(point => ErrorScale.Error(record, point) is not null)];
        if (known.Length == 0)
        {
            return null;
        }

        (string Role, string Name, PlotMark Mark)[] kinds = [("span", "as found", PlotMark.Ring), ("as-left", "as left", PlotMark.Disc), ("zero", "zero", PlotMark.Diamond), ("", "other points", PlotMark.Square)];
        List<PlotSeries> series = [];
        foreach ((string role, string name, PlotMark mark) in kinds)
        {
            PlotPoint[] points = [.. known.Where(point => kinds.Any(kind => kind.Role == point.Role) ? point.Role == role : role.Length == 0)
                .Select(point => new PlotPoint(ErrorScale.Reference(record, point), ErrorScale.Error(record, point)!.Value, ErrorScale.ReferenceUncertainty(record, point)))];
            if (points.Length != 0)
            {
                series.Add(new PlotSeries(name, mark, points));
            }
        }

        PlotPoint[] all = [.. series.SelectMany(static one => one.Points)];
        double low = Math.Min(0, all.Min(static point => point.X));
        double high = all.Max(static point => point.X);
        string told = string.Join("; ", known.Select(point => $"{ReportText.Role(point.Role)}: {ReportText.Signed(ErrorScale.Error(record, point)!.Value, 3)} {unit} at {Number.Fixed(ErrorScale.Reference(record, point), 3)} {unit}"));
        return new ReportPlot(
            "residual-plot", $"Errors of {record.Id} before and after",
            $"Reading less reference over the reference, bars one standard uncertainty of the reference. {told}.",
            new PlotAxis("reference, " + unit, false), new PlotAxis("error, " + unit, false), series,
            [new PlotLine("", PlotStroke.Thin, [new(low, 0, 0), new(high, 0, 0)])]);
    }

    private static string?[] Row(CalibrationRecord record, RecordedPoint point, RecordedResidual? residual)
    {
        // A row is in one unit: what is judged in hPa is not shown in mg/L beside it.
        bool inHectopascal = ErrorScale.IsHectopascal(record);
        return
        [
            ReportText.Role(point.Role),
            point.LastUtc.UtcDateTime.ToString("MM-dd HH:mm:ss", CultureInfo.InvariantCulture),
            point.Method?.Replace('-', ' '),
            point.Typed ? "typed" : Number.Print(point.Signal.Count),
            ReportText.Few(point.Signal.Mean),
            ReportText.Uncertainty(point.SignalStandardUncertainty),
            Number.Fixed(point.Temperature.Value, 2),
            Number.Fixed(point.Pressure.Value, 1),
            Number.Fixed(point.ReferencePartialPressureHectopascal, 2),
            ReportText.Uncertainty(point.ReferencePartialPressureUncertaintyHectopascal),
            inHectopascal ? null : Number.Fixed(point.ReferenceMilligramsPerLitre, 3),
            inHectopascal ? null : ReportText.Uncertainty(point.ReferenceUncertaintyMilligramsPerLitre),
            inHectopascal ? null : ReportText.Fixed(point.ReadingMilligramsPerLitre, 3),
            inHectopascal ? null : ReportText.Signed(point.ErrorMilligramsPerLitre, 3),
            inHectopascal ? ReportText.Fixed(point.ReadingHectopascal, 2) : null,
            inHectopascal ? ReportText.Signed(point.ErrorHectopascal, 2) : null,
            ReportText.Signed(residual?.ResidualHectopascal, 3),
            ReportText.Signed(residual?.Standardised, 2),
        ];
    }

    /// <summary>The residual of each point: they stand in the order of the points, though not every point need be in the fit.</summary>
    private static RecordedResidual?[] Residuals(CalibrationRecord record)
    {
        RecordedResidual?[] found = new RecordedResidual?[record.Points.Length];
        List<RecordedResidual> left = [.. record.Fit?.Residuals ?? []];
        for (int i = 0; i < found.Length; i++)
        {
            int at = left.FindIndex(residual => residual.Role == record.Points[i].Role);
            if (0 <= at)
            {
                found[i] = left[at];
                left.RemoveAt(at);
            }
        }

        return found;
    }

    private static string? Error(CalibrationRecord record, string role)
    {
        string unit = ErrorScale.Unit(record);
        return Array.Find(record.Points, point => point.Role == role) is RecordedPoint point && ErrorScale.Error(record, point) is double error
            ? $"{ReportText.Signed(error, 3)} {unit}: {Number.Fixed(ErrorScale.Reading(record, point) ?? double.NaN, 3)} at {Number.Fixed(ErrorScale.Reference(record, point), 3)} {unit}"
            : null;
    }
}
