using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using ProbeCal.Station.Calibrating;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Host.Commands;

/// <summary>A calibration record as plain text for people.</summary>
internal static class CalibrationText
{
    /// <summary>Significant digits of slope and uncertainties: enough for people, the record keeps all.</summary>
    internal const int Digits = 5;

    /// <summary>Writes the whole record.</summary>
    internal static void Write(TextWriter output, CalibrationRecord record)
    {
        output.WriteLine($"{(record.Purpose == CalibrationRecord.CheckPurpose ? "Check" : "Calibration")} {record.Id}: {Decision.Of(record).ToUpperInvariant()}{(record.Simulated ? "   (SIMULATED: no real probe was calibrated)" : "")}");
        foreach (string reason in record.Result.Reasons)
        {
            TextTable.WriteWrapped(output, "  ", "    ", reason);
        }

        output.WriteLine();
        WriteIdentity(output, record);
        output.WriteLine();
        WritePoints(output, record);
        output.WriteLine();
        WriteResult(output, record);
        WriteLimits(output, record);
        WriteBudget(output, record);
        WriteFindings(output, record);
        output.WriteLine("This is a field calibration record and no accredited certificate.");
    }

    private static void WriteIdentity(TextWriter output, CalibrationRecord record)
    {
        RecordedProbe probe = record.Probe;
        Line("probe", probe.Id + ", " + probe.Model);
        if (probe.Membrane is RecordedMembrane membrane)
        {
            Line("membrane", membrane.Id + (membrane.InstalledOn is DateOnly day ? ", on since " + day.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture) : ""));
        }

        RecordedTemperatureCoefficient coefficient = probe.TemperatureCoefficient;
        Line("temperature coefficient", $"{coefficient.Form} {Number.Print(coefficient.Value)} {coefficient.Unit} at {Number.Print(coefficient.ReferenceCelsius)} °C, fitted {Number.Print(coefficient.FittedLowCelsius)} to {Number.Print(coefficient.FittedHighCelsius)} °C ({coefficient.Source})");
        Line("", $"u {Number.Significant(coefficient.StandardUncertainty, Digits)} {coefficient.Unit} ({(coefficient.UncertaintySource is string usual ? "default: " + usual : "entered")})");
        if (probe.MeterSettings is RecordedMeterSettings meter)
        {
            Line("set in the meter", $"shows {meter.Shows}, salinity {Number.Print(meter.Salinity)}, pressure {(meter.PressureHectopascal is double set ? Number.Print(set) + " hPa" : "its own barometer")}, temperature {(meter.TemperatureCelsius is double by ? Number.Print(by) + " °C by hand" : "its own thermometer")}");
        }

        Line("thermometer", $"{probe.Thermometer.Id}, offset u {Number.Fixed(probe.Thermometer.CommonStandardUncertaintyCelsius, 3)} K ({probe.Thermometer.Source})");
        Line("method", $"{record.Method}, readings {record.Readings} from {record.Source}");
        Line("place", $"{record.Site ?? "not stated"}, altitude {(record.Altitude is RecordedQuantity altitude ? Number.Print(altitude.Value) + " m" : "not stated")}");
        Line("time (UTC)", $"{Time(record.StartedUtc)} to {Time(record.CompletedUtc)}{(record.By is string by2 ? ", by " + by2 : "")}");
        Line("previous calibration", record.PreviousCalibration ?? "none");
        Line("droplets", Looked(record.DropletCheck));
        if (record.AirToWaterRatio is RecordedQuantity ratio)
        {
            Line("air-to-water ratio", $"{Number.Print(ratio.Value)}, u {Number.Fixed(ratio.StandardUncertainty, 4)} ({ratio.Source})");
        }

        Line("equation", record.Equation);
        foreach (string formula in record.Formulas)
        {
            Line("", formula);
        }

        Line("software", record.Software);
        if (record.Remarks is string remarks)
        {
            Line("remarks", remarks);
        }

        void Line(string name, string value)
        {
            string first = "  " + name.PadRight(24);
            TextTable.WriteWrapped(output, first, new string(' ', first.Length), value);
        }
    }

    private static void WritePoints(TextWriter output, CalibrationRecord record)
    {
        RecordedPoint[] points = record.Points;
        string unit = record.Probe.SignalUnit.Length == 0 ? "" : " " + record.Probe.SignalUnit;
        bool total = ModelNames.IsTotalPressure(record.Probe.Model);
        bool inHectopascal = ErrorScale.IsHectopascal(record);
        List<string[]> rows =
        [
            ["point", .. points.Select(Role)],
            ["taken (UTC)", .. points.Select(static point => point.LastUtc.ToString("HH:mm:ss", CultureInfo.InvariantCulture))],
            ["samples in window", .. points.Select(static point => point.Typed ? "typed" : $"{Number.Print(point.Signal.Count)} in {Number.Fixed(point.Signal.WindowSeconds, 0)} s")],
            [(points.Length != 0 && points[0].Typed ? "shown" : "signal") + unit, .. points.Select(static point => Number.Fixed(point.Signal.Mean, 3))],
            ["  scatter", .. points.Select(static point => point.Typed ? "-" : Number.Fixed(point.Signal.StandardDeviation, 4))],
            ["  drift a minute", .. points.Select(static point => point.Typed ? "-" : Number.Fixed(point.Signal.SlopePerMinute, 4))],
            ["temperature °C", .. points.Select(static point => $"{Number.Fixed(point.Temperature.Value, 2)} ({point.Temperature.Source})")],
            ["pressure hPa", .. points.Select(static point => $"{Number.Fixed(point.Pressure.Value, 1)} u {Number.Fixed(point.Pressure.StandardUncertainty, 1)}")],
            ["  source", .. points.Select(static point => point.Pressure.Source)],
            ["salinity", .. points.Select(static point => Number.Print(point.Salinity.Value))],
            ["stirring", .. points.Select(static point => point.Stirring)],
            [total ? "total gas pressure hPa" : "reference hPa " + record.Gas, .. points.Select(static point => $"{Number.Fixed(point.ReferencePartialPressureHectopascal, 2)} u {Number.Fixed(point.ReferencePartialPressureUncertaintyHectopascal, 2)}")],
            ["reference mg/L", .. points.Select(static point => $"{Number.Fixed(point.ReferenceMilligramsPerLitre, 3)} u {Number.Fixed(point.ReferenceUncertaintyMilligramsPerLitre, 3)}")],
            ["reading " + ErrorScale.Unit(record), .. points.Select(point => ErrorScale.Reading(record, point) is double reading ? Number.Fixed(reading, inHectopascal ? 2 : 3) : "-")],
            [total ? "error of ΔP hPa" : "error " + ErrorScale.Unit(record), .. points.Select(point => ErrorScale.Error(record, point) is double error ? Signed(error, inHectopascal ? 2 : 3) : "-")],
            ["  read by", .. points.Select(static point => point.ReadBy ?? "-")],
        ];
        // A total gas pressure is no concentration.
        TextTable.Write(output, [.. rows.Where(row => !total || row[0] != "reference mg/L")], "  ");
    }

    private static void WriteResult(TextWriter output, CalibrationRecord record)
    {
        string unit = " " + (record.Probe.SignalUnit.Length == 0 ? "signal" : record.Probe.SignalUnit);
        RecordedResult result = record.Result;
        double percent = 100 * result.SlopeStandardUncertainty / Math.Abs(result.Slope);
        output.WriteLine($"  slope {Number.Significant(result.Slope, Digits)}{(record.Probe.MeterSettings == null ? unit + (ModelNames.IsLogarithmic(record.Probe.Model) ? "/decade" : "/hPa") : " (1 is a meter that shows the truth)")}, u {Number.Significant(result.SlopeStandardUncertainty, Digits)} ({Number.Fixed(percent, 2)} %)");
        output.WriteLine($"  zero  {Number.Significant(result.Zero, Digits)}{(record.Probe.MeterSettings == null ? unit : " hPa")}, u {Number.Significant(result.ZeroStandardUncertainty, Digits)} ({record.Zero.Source})");
        output.WriteLine();
    }

    private static void WriteLimits(TextWriter output, CalibrationRecord record)
    {
        output.WriteLine("Limits");
        TextTable.WriteWrapped(output, "  ", "  ", "Decision rule: " + record.Result.DecisionRule + ".");
        List<string[]> rows = [["check", "found", "U (k = 2)", "limit", "limit/U", "verdict"]];
        List<string> sources = [];
        foreach (RecordedLimit limit in record.Limits)
        {
            string found = limit.Found is double value ? Number.Fixed(value, 3) + " " + limit.Unit : "-";
            string expanded = limit.ExpandedUncertainty is double u ? Number.Fixed(u, 3) : "-";
            string ratio = limit.LimitToUncertainty is double times ? Number.Fixed(times, 1) : "-";
            string width = (limit.Applied ?? limit.Limit).Split("; ")[0];
            rows.Add([limit.Check, found, expanded, $"{width} [{Reference(sources, $"{limit.Limit} ({limit.Source})")}]", ratio, limit.Verdict + (limit.Decides ? "" : ", for information")]);
        }

        TextTable.Write(output, rows, "  ");
        WriteReferences(output, sources);
        output.WriteLine();
    }

    private static void WriteBudget(TextWriter output, CalibrationRecord record)
    {
        output.WriteLine("Uncertainty of the slope (k = 1), largest first");
        List<string[]> rows = [["input", "value", "u", "unit", "distribution", "%/unit", "% of slope", "share %", ""]];
        List<string> sources = [];
        foreach (RecordedContribution line in record.Budget)
        {
            rows.Add(
            [
                line.Input,
                line.Value is double value ? Number.Significant(value, Digits) : "-",
                Number.Significant(line.StandardUncertainty, 3),
                line.Unit,
                line.Distribution ?? "-",
                line.SensitivityPercent is double per ? Number.Significant(per, 3) : "-",
                Number.Fixed(line.SlopePercent, 3),
                line.SharePercent is double share ? Number.Fixed(share, 1) : "-",
                $"[{Reference(sources, line.Source)}]",
            ]);
        }

        TextTable.Write(output, rows, "  ");
        WriteReferences(output, sources);
        output.WriteLine();
    }

    /// <summary>Number of a text in a list of references, which takes it up when it is new.</summary>
    private static string Reference(List<string> references, string text)
    {
        if (!references.Contains(text))
        {
            references.Add(text);
        }

        return Number.Print(1 + references.IndexOf(text));
    }

    private static void WriteReferences(TextWriter output, List<string> references)
    {
        for (int i = 0; i < references.Count; i++)
        {
            TextTable.WriteWrapped(output, $"  [{Number.Print(i + 1)}] ", "      ", references[i]);
        }
    }

    private static void WriteFindings(TextWriter output, CalibrationRecord record)
    {
        if (record.Findings.Length == 0)
        {
            return;
        }

        output.WriteLine("What the guards saw");
        foreach (RecordedFinding finding in record.Findings)
        {
            TextTable.WriteWrapped(output, "  ", "    ", $"{finding.Guard} ({finding.Severity}): {finding.Saw}");
            if (PossibleError.WordsOf(finding) is string size)
            {
                TextTable.WriteWrapped(output, "    ", "      ", size);
            }

            if (finding.WhatToDo is string advice)
            {
                TextTable.WriteWrapped(output, "    ", "      ", "what to do: " + advice);
            }

            if (finding.Reason is string reason)
            {
                TextTable.WriteWrapped(output, "    ", "      ", "reason for going on: " + reason);
            }
        }

        output.WriteLine();
    }

    /// <summary>The role of a point in the words of the trade; the record says <c>span</c> for the 100 % point.</summary>
    internal static string Role(RecordedPoint point)
    {
        return point.Role switch
        {
            CalibrationIds.SpanPoint => "100 %",
            CalibrationIds.AsLeftPoint => "as left",
            _ => point.Role,
        };
    }

    private static string Looked(string check)
    {
        return check switch
        {
            Droplets.NoneSeen => "looked for, none seen",
            Droplets.NotChecked => "nobody looked",
            Droplets.NotNeeded => "not needed in water",
            _ => check,
        };
    }

    /// <summary>A time for people.</summary>
    internal static string Time(DateTimeOffset time)
    {
        return time.UtcDateTime.ToString("yyyy-MM-dd HH:mm", CultureInfo.InvariantCulture);
    }

    /// <summary>A value with its sign.</summary>
    internal static string Signed(double value, int decimals)
    {
        string text = Number.Fixed(value, decimals);
        return text.StartsWith('-') ? text : "+" + text;
    }
}
