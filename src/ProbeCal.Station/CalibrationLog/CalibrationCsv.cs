using System;
using System.Globalization;
using System.IO;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>Calibrations and checks as CSV, one row each, for a spreadsheet. The columns are described in <c>docs/protocols.md</c>.</summary>
public static class CalibrationCsv
{
    private static readonly (string Name, Func<CalibrationLogStore, StoredCalibration, string> Cell)[] Columns =
    [
        ("id", static (_, stored) => stored.Record.Id),
        ("log_id", static (_, stored) => stored.Record.LogId),
        ("purpose", static (_, stored) => stored.Record.Purpose),
        ("check_kind", static (_, stored) => stored.Record.CheckKind ?? ""),
        ("completed_utc", static (_, stored) => stored.Record.CompletedUtc.UtcDateTime.ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture)),
        ("simulated", static (_, stored) => stored.Record.Simulated ? "yes" : "no"),
        ("probe", static (_, stored) => stored.Record.Probe.Id),
        ("model", static (_, stored) => stored.Record.Probe.Model),
        ("membrane", static (_, stored) => stored.Record.Probe.Membrane?.Id ?? ""),
        ("gas", static (_, stored) => stored.Record.Gas),
        ("method", static (_, stored) => stored.Record.Method),
        ("site", static (_, stored) => stored.Record.Site ?? ""),
        ("by", static (_, stored) => stored.Record.By ?? ""),
        ("temperature_C", static (_, stored) => Main(stored, static point => point.Temperature.Value)),
        ("pressure_hPa", static (_, stored) => Main(stored, static point => point.Pressure.Value)),
        ("salinity", static (_, stored) => Main(stored, static point => point.Salinity.Value)),
        ("signal_unit", static (_, stored) => stored.Record.Probe.SignalUnit),
        ("signal", static (_, stored) => Main(stored, static point => point.Signal.Mean)),
        ("reference_hPa", static (_, stored) => Main(stored, static point => point.ReferencePartialPressureHectopascal)),
        ("reference_mg_L", static (_, stored) => Main(stored, static point => point.ReferenceMilligramsPerLitre)),
        ("as_found_error_mg_L", static (_, stored) => Error(stored, "span")),
        ("as_left_error_mg_L", static (_, stored) => Error(stored, "as-left")),
        ("slope_per_hPa", static (_, stored) => Number.Print(stored.Record.Result.Slope)),
        ("slope_u_per_hPa", static (_, stored) => Number.Print(stored.Record.Result.SlopeStandardUncertainty)),
        ("zero", static (_, stored) => Number.Print(stored.Record.Result.Zero)),
        ("zero_u", static (_, stored) => Number.Print(stored.Record.Result.ZeroStandardUncertainty)),
        ("points", static (_, stored) => stored.Record.Points.Length.ToString(CultureInfo.InvariantCulture)),
        ("result", static (_, stored) => stored.Record.Result.Pass ? "pass" : "fail"),
        ("withdrawn_by", static (log, stored) => log.WithdrawalOf(stored.Record.Id)?.Id ?? ""),
        ("replaced_by", static (log, stored) => log.ReplacementOf(stored.Record.Id)?.Id ?? ""),
        ("sha256", static (_, stored) => stored.Sha256),
    ];

    /// <summary>Writes the calibrations and checks of a log.</summary>
    /// <param name="log">The open log.</param>
    /// <param name="logId">An imported log; null for the log of the folder.</param>
    /// <param name="output">Where to.</param>
    /// <returns>Number of rows.</returns>
    /// <exception cref="InputException">There is no such log.</exception>
    public static long Write(CalibrationLogStore log, string? logId, TextWriter output)
    {
        output.Write(string.Join(',', Columns.Select(static column => column.Name)) + "\r\n");
        long rows = 0;
        foreach (StoredEntry stored in log.EntriesOf(logId ?? log.LogId))
        {
            if (stored.Entry is CalibrationRecord record)
            {
                StoredCalibration calibration = new(record, stored.Sha256);
                output.Write(string.Join(',', Columns.Select(column => Quoted(column.Cell(log, calibration)))) + "\r\n");
                rows++;
            }
        }

        return rows;
    }

    private static string Main(StoredCalibration stored, Func<RecordedPoint, double> value)
    {
        RecordedPoint[] points = stored.Record.Points;
        RecordedPoint? point = Array.Find(points, static each => each.Role == "span") ?? points.FirstOrDefault();
        return point == null ? "" : Number.Print(value(point));
    }

    private static string Error(StoredCalibration stored, string role)
    {
        return Array.Find(stored.Record.Points, point => point.Role == role)?.ErrorMilligramsPerLitre is double error ? Number.Print(error) : "";
    }

    /// <summary>RFC 4180; a cell that a spreadsheet would take for a formula gets an apostrophe.</summary>
    private static string Quoted(string cell)
    {
        bool formula = cell.Length != 0 && "=+-@".Contains(cell[0], StringComparison.Ordinal) && !double.TryParse(cell, NumberStyles.Float, CultureInfo.InvariantCulture, out _);
        string text = formula ? "'" + cell : cell;
        return text.AsSpan().IndexOfAny(",\"\r\n") < 0 ? text : "\"" + text.Replace("\"", "\"\"", StringComparison.Ordinal) + "\"";
    }
}
