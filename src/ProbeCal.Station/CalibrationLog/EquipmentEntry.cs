using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>A piece of equipment as a person enters it: texts in, one entry of the register out.</summary>
public sealed record EquipmentEntry
{
    /// <summary>Its id.</summary>
    public required string Id { get; init; }

    /// <summary>One of <see cref="EquipmentRecord.Kinds"/>.</summary>
    public string? Kind { get; init; }

    /// <summary>What it is.</summary>
    public string? Description { get; init; }

    /// <summary>Number of its certificate.</summary>
    public string? Certificate { get; init; }

    /// <summary>What the certificate states: <c>10.02% U 0.10% k 2</c>.</summary>
    public string? Value { get; init; }

    /// <summary>What is added to what it shows: <c>-0.4hPa u 0.3hPa</c>.</summary>
    public string? Correction { get; init; }

    /// <summary>Day of its calibration.</summary>
    public string? CalibratedOn { get; init; }

    /// <summary>Day it was made, opened or put into service.</summary>
    public string? MadeOn { get; init; }

    /// <summary>Last day of its certificate.</summary>
    public string? DueOn { get; init; }

    /// <summary>How long it lasts from the day it was made: <c>180d</c>.</summary>
    public string? Life { get; init; }

    /// <summary>Id of the probe that it belongs to.</summary>
    public string? BelongsTo { get; init; }

    /// <summary>Remarks.</summary>
    public string? Remarks { get; init; }

    /// <summary>Who enters it.</summary>
    public string? By { get; init; }

    /// <summary>Reads the texts.</summary>
    /// <param name="log">The log that it goes into: an id keeps its kind. Null where there is none yet.</param>
    /// <param name="software">Program and version.</param>
    /// <exception cref="InputException">One of them is wrong.</exception>
    public EquipmentRecord Read(CalibrationLogStore? log, string software)
    {
        string id = PlainText.Id("id", Id);
        EquipmentRecord? known = log?.AllEquipment(DateTimeOffset.MaxValue).FirstOrDefault(each => each.Equipment == id);
        string kind = ReadKind(id, known);
        DateOnly? calibrated = Day("--calibrated", CalibratedOn);
        DateOnly? made = Day("--made", MadeOn);
        DateOnly? due = Day("--due", DueOn);
        double? life = Life == null ? null : Quantity.Duration("--life", Life).TotalDays;
        if (life != null && made == null)
        {
            throw Wrong.Input("--life", Life!, "it counts from the day the thing was made or opened; give --made too");
        }

        if (due < calibrated)
        {
            throw Wrong.Input("--due", DueOn!, "it lies before --calibrated " + CalibratedOn);
        }

        if (due < made)
        {
            throw Wrong.Input("--due", DueOn!, "it lies before --made " + MadeOn);
        }

        return new EquipmentRecord
        {
            Equipment = id,
            EquipmentKind = kind,
            Description = Line("--description", Description),
            Certificate = Line("--certificate", Certificate),
            CertificateValue = Value == null ? null : CertificateText.Value("--value", Value, kind),
            Correction = Correction == null ? null : CertificateText.Correction("--correction", Correction, kind),
            CalibratedOn = calibrated,
            MadeOn = made,
            DueOn = due,
            LifeDays = life,
            BelongsTo = BelongsTo == null ? null : PlainText.Id("--belongs-to", BelongsTo),
            Remarks = Line("--remarks", Remarks),
            By = Line("--by", By),
            Software = software,
        };
    }

    private string ReadKind(string id, EquipmentRecord? known)
    {
        if (Kind == null)
        {
            return known?.EquipmentKind ?? throw new InputException("--kind is missing: one of " + string.Join(", ", EquipmentRecord.Kinds));
        }

        if (!EquipmentRecord.Kinds.Contains(Kind))
        {
            throw Wrong.Input("--kind", Kind, $"there is no such kind{NearestName.DidYouMean(Kind, EquipmentRecord.Kinds)}; there are {string.Join(", ", EquipmentRecord.Kinds)}");
        }

        return known == null || known.EquipmentKind == Kind
            ? Kind
            : throw Wrong.Input("--kind", Kind, $"{id} is a {known.EquipmentKind} in the register; give the new thing another id, or withdraw entry {known.Id} first if that was a mistake");
    }

    private static string? Line(string what, string? text)
    {
        return string.IsNullOrWhiteSpace(text) ? null : PlainText.OneLine(what, text.Trim());
    }

    private static DateOnly? Day(string what, string? text)
    {
        if (text == null)
        {
            return null;
        }

        return DateOnly.TryParseExact(text, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out DateOnly day)
            ? day
            : throw Wrong.Input(what, text, "write the day as 2026-05-01");
    }
}

/// <summary>
/// A value with its uncertainty as a certificate states it: <c>10.02% u 0.05%</c> (standard), <c>10.02% U 0.10% k 2</c> (expanded with
/// its coverage factor).
/// </summary>
internal static class CertificateText
{
    private static readonly QuantityKind[] Any =
    [
        QuantityKind.MassConcentration, QuantityKind.AmountConcentration, QuantityKind.Pressure, QuantityKind.TemperatureDifference, QuantityKind.Percent,
    ];

    internal static RecordedQuantity Value(string what, string text, string kind)
    {
        return Read(what, text, kind switch
        {
            "cylinder" => [QuantityKind.MoleFraction],
            "titrant" => [QuantityKind.AmountConcentration],
            "barometer" => [QuantityKind.Pressure],
            "thermometer" => [QuantityKind.Temperature],
            _ => Any,
        });
    }

    internal static RecordedQuantity Correction(string what, string text, string kind)
    {
        return Read(what, text, kind switch
        {
            "cylinder" => [QuantityKind.MoleFraction],
            "titrant" => [QuantityKind.AmountConcentration],
            "barometer" => [QuantityKind.Pressure],
            "thermometer" => [QuantityKind.TemperatureDifference],
            _ => Any,
        });
    }

    private static string ExampleOf(QuantityKind kind)
    {
        return kind == QuantityKind.Pressure ? "-0.4hPa u 0.3hPa"
            : kind == QuantityKind.TemperatureDifference ? "0.1K u 0.05K"
            : kind == QuantityKind.AmountConcentration ? "0.025mol/L u 0.0001mol/L"
            : "10.02% u 0.05%";
    }

    private static RecordedQuantity Read(string what, string text, QuantityKind[] kinds)
    {
        string example = $"write the value, then its standard uncertainty behind u, or the expanded one behind U with its factor behind k, for example \"{ExampleOf(kinds[0])}\"";
        List<string> words = [.. text.Split(' ', StringSplitOptions.RemoveEmptyEntries)];
        int at = words.FindIndex(static word => word is "u" or "U");
        if (at <= 0 || at == words.Count - 1)
        {
            throw Wrong.Input(what, text, at <= 0 ? "its uncertainty is missing; " + example : example);
        }

        bool expanded = words[at] == "U";
        int k = words.FindIndex(at + 1, static word => word == "k");
        if (expanded && (k < 0 || k != words.Count - 2))
        {
            throw Wrong.Input(what, text, "an expanded uncertainty needs its coverage factor behind it: U 0.1% k 2");
        }

        double factor = expanded ? Number.Parse(what + " k", words[^1]) : 1;
        if (!(1 <= factor && factor <= 10))
        {
            throw Wrong.Input(what, text, "a coverage factor lies between 1 and 10");
        }

        string value = string.Join(' ', words.Take(at));
        string uncertainty = string.Join(' ', words.Skip(at + 1).Take((expanded ? k : words.Count) - at - 1));
        foreach (QuantityKind kind in kinds)
        {
            if (Quantity.TryParse(kind, value, out double number, out _))
            {
                if (what == "--value" && kind == QuantityKind.MoleFraction && !(0 <= number && number <= 1))
                {
                    throw Wrong.Input(what, text, "a gas holds from 0 to 100 % of another");
                }

                if (what == "--value" && kind == QuantityKind.AmountConcentration && number < 0)
                {
                    throw Wrong.Input(what, text, "a titrant holds nothing or more");
                }

                return Of(what, text, kind, number, uncertainty, factor);
            }
        }

        // The first kind says what is wrong with it.
        Quantity.Parse(kinds[0], what, value);
        throw Wrong.Input(what, text, example);
    }

    private static RecordedQuantity Of(string what, string text, QuantityKind kind, double value, string uncertainty, double factor)
    {
        QuantityKind difference = kind == QuantityKind.Temperature ? QuantityKind.TemperatureDifference : kind;
        double u = Quantity.Parse(difference, what + " uncertainty", uncertainty) / factor;
        if (u < 0)
        {
            throw Wrong.Input(what, text, "an uncertainty is zero or above");
        }

        // A titrant is spoken of in mol/L, and so is its record.
        bool molar = kind == QuantityKind.AmountConcentration;
        return new RecordedQuantity
        {
            Value = molar ? value / 1e6 : value,
            Unit = molar ? "mol/L" : kind == QuantityKind.MoleFraction ? "1" : kind == QuantityKind.Temperature ? "degC" : kind.CanonicalUnit.Name,
            StandardUncertainty = molar ? u / 1e6 : u,
            Source = "certificate",
        };
    }
}
