using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>What was calibrated, where, how and with what.</summary>
internal static class CertificateIdentity
{
    private static readonly ReportColumn[] _register =
    [
        CertificateNames.Words("equipment-id"), CertificateNames.Words("equipment-kind"), CertificateNames.Words("equipment-description"), CertificateNames.Words("equipment-certificate"),
        CertificateNames.Words("equipment-value"), CertificateNames.Words("equipment-correction"), CertificateNames.Words("equipment-last-day"),
    ];

    internal static ReportFields Identification(CalibrationRecord record)
    {
        List<ReportField> fields = [];
        Add("record-id", record.Id);
        Add("log-id", $"{record.LogId}, entry {Number.Print(record.Index)}");
        Add("purpose", record.Purpose + (record.CheckKind is string kind ? ", " + kind : ""));
        Add("probe", record.Probe.Id);
        Add("model", record.Probe.Model + (record.Probe.SignalUnit.Length == 0 ? "" : ", signal in " + record.Probe.SignalUnit));
        Add("gas", record.Gas);
        Add("membrane", record.Probe.Membrane is RecordedMembrane membrane ? membrane.Id + (membrane.InstalledOn is DateOnly day ? ", on since " + ReportText.Day(day) : "") : null);
        Add("thermometer", $"{record.Probe.Thermometer.Id}, offset u {ReportText.Uncertainty(record.Probe.Thermometer.CommonStandardUncertaintyCelsius)} K ({record.Probe.Thermometer.Source})");
        Add("site", record.Site);
        Add("altitude", record.Altitude is RecordedQuantity altitude ? ReportText.Quantity(altitude) : null);
        Add("started", ReportText.Time(record.StartedUtc));
        Add("completed", ReportText.Time(record.CompletedUtc));
        Add("by", record.By);
        Add("previous", record.PreviousCalibration);
        Add("replaces", record.Replaces is string old ? old + (record.ReplacesReason is string why ? ": " + why : "") : null);
        Add("imported-from", record.ImportedFrom);
        Add("software", record.Software);
        Add("remarks", record.Remarks);
        return new ReportFields(fields);

        void Add(string id, string? value)
        {
            if (!string.IsNullOrEmpty(value))
            {
                fields.Add(CertificateNames.Field(id, value));
            }
        }
    }

    internal static ReportFields Method(CalibrationRecord record)
    {
        List<ReportField> fields = [];
        RecordedPoint[] points = record.Points;
        Add("method", record.Method);
        Add("readings", $"{record.Readings}, {record.Source}");
        Add("steps", record.Steps.Length == 0 ? null : $"{Number.Print(record.Steps.Length)} steps from {ReportText.Time(record.Steps.Min(static step => step.DoneUtc))} on");
        Add("temperature", Over(points, static point => point.Temperature, 2, "°C"));
        Add("pressure", Over(points, static point => point.Pressure, 1, "hPa"));
        Add("salinity", Over(points, static point => point.Salinity, 2, ""));
        Add("stirring", string.Join(", ", points.Select(static point => point.Stirring + (point.FlowFactor == 1 ? "" : ", flow factor " + Number.Print(point.FlowFactor))).Distinct()));
        Add("reference-state", ReportText.Quantity(record.ReferenceState));
        Add("air-to-water", record.AirToWaterRatio is RecordedQuantity ratio ? ReportText.Quantity(ratio) : null);
        Add("droplets", record.DropletCheck switch { "none-seen" => "looked for, none seen", "not-checked" => "nobody looked", "not-needed" => "not needed in water", _ => record.DropletCheck });
        Add("equation", record.Equation);
        Add("temperature-coefficient", Coefficient(record.Probe.TemperatureCoefficient));
        Add("coefficients", string.Join("; ", record.Probe.Coefficients.Select(static c => $"{c.Name} {Number.Print(c.Value)}{(c.Unit is "" or "1" ? "" : " " + c.Unit)}{(c.StandardUncertainty is double u ? ", u " + ReportText.Uncertainty(u) : "")} ({c.Source})")));
        Add("meter-settings", record.Probe.MeterSettings is RecordedMeterSettings meter ? Settings(meter) : null);
        Add("formulas", string.Join("; ", record.Formulas));
        return new ReportFields(fields);

        void Add(string id, string? value)
        {
            if (!string.IsNullOrEmpty(value))
            {
                fields.Add(CertificateNames.Field(id, value));
            }
        }
    }

    internal static List<ReportBlock> Equipment(CalibrationRecord record, Func<string, EquipmentRecord?> registered)
    {
        List<ReportBlock> blocks = [];
        string[] ids = [.. record.Equipment.Concat(record.Points.SelectMany(static point => point.Reference?.Equipment ?? [])).Distinct()];
        blocks.Add(ids.Length == 0
            ? new ReportSentence("no-equipment", "No reference equipment is named in the record.")
            : ColumnChoice.Table(
                _register,
                Items(ids, registered)));
        RecordedPoint[] referred = [.. record.Points.Where(static point => Basis(point.Reference).Length != 0)];
        if (referred.Length != 0)
        {
            blocks.Add(new ReportTable(
                [CertificateNames.Words("reference-point"), CertificateNames.Words("reference-basis")],
                [.. referred.Select(static point => new[] { ReportText.Role(point.Role), Basis(point.Reference) })]));
        }

        // Where the reference rests on temperature and pressure alone, the budget of the slope has all that is in it.
        RecordedPoint[] budgeted = [.. referred.Where(static point => point.Reference is { Budget.Length: not 0 })];
        if (budgeted.Length != 0)
        {
            blocks.Add(ColumnChoice.Table(
                [
                    CertificateNames.Words("reference-budget-point"), CertificateNames.Words("reference-budget-input"), CertificateNames.Figures("reference-budget-value"),
                    CertificateNames.Figures("reference-budget-uncertainty"), CertificateNames.Words("reference-budget-distribution"), CertificateNames.Figures("reference-budget-contribution"),
                    CertificateNames.Words("reference-budget-source"),
                ],
                budgeted.SelectMany(static point => point.Reference!.Budget.Select(line => new[]
                {
                    ReportText.Role(point.Role), line.Input, ReportText.Few(line.Value) + " " + line.Unit, ReportText.Uncertainty(line.StandardUncertainty) + " " + line.Unit, line.Distribution,
                    ReportText.Uncertainty(line.Hectopascal), line.Source,
                }))));
        }

        return blocks;
    }

    private static IEnumerable<string?[]> Items(string[] ids, Func<string, EquipmentRecord?> registered)
    {
        foreach (string id in ids)
        {
            if (registered(id) is EquipmentRecord item)
            {
                yield return
                [
                    id, item.EquipmentKind, item.Description, item.Certificate, item.CertificateValue is { } value ? ReportText.Quantity(value) : null,
                    item.Correction is { } correction ? ReportText.Quantity(correction) : null, item.LastDay is DateOnly day ? ReportText.Day(day) : null,
                ];
            }
        }

        string[] unknown = [.. ids.Where(id => registered(id) is null)];
        if (unknown.Length != 0)
        {
            yield return [string.Join(", ", unknown), "not in the register", null, null, null, null, null];
        }
    }

    private static string Basis(RecordedReference? reference)
    {
        List<string> parts = [];
        if (reference?.Titration is RecordedTitration titration)
        {
            parts.Add($"titration: {string.Join(", ", titration.TitreMillilitres.Select(Number.Print))} mL, blank {ReportText.Quantity(titration.Blank)}, thiosulfate {ReportText.Quantity(titration.Titrant)}, flask {ReportText.Quantity(titration.Flask)}"
                + $"{(titration.Aliquot is RecordedQuantity aliquot ? ", of which titrated " + ReportText.Quantity(aliquot) : "")}, displaced {ReportText.Quantity(titration.Displaced)}, oxygen of the reagents {ReportText.Quantity(titration.ReagentOxygenMilligrams)}, drawn at {Number.Print(titration.DrawCelsius)} °C");
        }

        if (reference?.Mixture is RecordedMixture mixture)
        {
            parts.Add($"gas mixture {mixture.Cylinder}: mole fraction {ReportText.Quantity(mixture.MoleFraction)}, relative humidity {ReportText.Quantity(mixture.RelativeHumidityPercent)}");
        }

        if (reference?.Transfer is RecordedTransfer transfer)
        {
            parts.Add($"transfer standard {transfer.Standard} showed {ReportText.Quantity(transfer.Shown)}{(transfer.Correction is RecordedQuantity correction ? ", correction " + ReportText.Quantity(correction) : "")}");
        }

        return string.Join("; ", parts);
    }

    private static string Over(RecordedPoint[] points, Func<RecordedPoint, RecordedQuantity> quantity, int decimals, string unit)
    {
        if (points.Length == 0)
        {
            return "";
        }

        RecordedQuantity[] all = [.. points.Select(quantity)];
        string low = Number.Fixed(all.Min(static one => one.Value), decimals);
        string high = Number.Fixed(all.Max(static one => one.Value), decimals);
        string sources = string.Join(", ", all.Select(static one => one.Source).Distinct());
        return $"{(low == high ? low : low + " to " + high)}{(unit.Length == 0 ? "" : " " + unit)}, u {ReportText.Uncertainty(all.Max(static one => one.StandardUncertainty))} ({sources})";
    }

    private static string? Coefficient(RecordedTemperatureCoefficient c)
    {
        return c.Form == "none"
            ? null
            : $"{c.Form} {Number.Print(c.Value)} {c.Unit} at {Number.Print(c.ReferenceCelsius)} °C, fitted {Number.Print(c.FittedLowCelsius)} to {Number.Print(c.FittedHighCelsius)} °C, u {ReportText.Uncertainty(c.StandardUncertainty)} {c.Unit} ({c.UncertaintySource ?? c.Source})";
    }

    private static string Settings(RecordedMeterSettings meter)
    {
        return $"shows {meter.Shows}, salinity {Number.Print(meter.Salinity)}, pressure {(meter.PressureHectopascal is double set ? Number.Print(set) + " hPa" : "its own barometer")}, temperature {(meter.TemperatureCelsius is double by ? Number.Print(by) + " °C by hand" : "its own thermometer")}, last digit {Number.Print(meter.Resolution)}";
    }
}
