using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Text;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Engine;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Correcting;

/// <summary>A calibration with the time in which it corrects.</summary>
internal sealed class CalibrationInUse
{
    private CalibrationInUse(StoredCalibration stored, LoadedCalibration loaded, ReadingConditions conditions, long fromTicks)
    {
        Stored = stored;
        Loaded = loaded;
        Conditions = conditions;
        FromTicks = fromTicks;
        IdBytes = Encoding.UTF8.GetBytes(stored.Record.Id);
        StirringDiffers = conditions.IsStirringMismatch(loaded.Core);
    }

    internal StoredCalibration Stored { get; }

    internal CalibrationRecord Record => Stored.Record;

    internal LoadedCalibration Loaded { get; }

    internal ProbeCalibration Core => Loaded.Core;

    internal ReadingConditions Conditions { get; }

    /// <summary>Ticks of UTC from which on it corrects.</summary>
    internal long FromTicks { get; }

    /// <summary>Ticks of UTC at which the next one takes over.</summary>
    internal long ToTicks { get; private set; } = long.MaxValue;

    internal byte[] IdBytes { get; }

    /// <summary>True when the water moves otherwise than at the calibration.</summary>
    internal bool StirringDiffers { get; }

    /// <summary>How many rows it corrected.</summary>
    internal long Rows { get; set; }

    /// <summary>The calibrations that a request wants, by time.</summary>
    /// <exception cref="InputException">There is none.</exception>
    internal static IReadOnlyList<CalibrationInUse> Find(CalibrationLogStore log, CorrectionRequest request)
    {
        if ((request.Probe is null) == (request.Calibration is null))
        {
            throw new InputException("say either --probe ID, for the calibration in force at each reading's time, or --calibration ID, for one calibration throughout");
        }

        log.RequireWhole();
        return request.Calibration is string id ? [Of(ById(log, id), log, request, 0)] : InForce(log, request, request.Probe!);
    }

    /// <summary>The calibrations that a revision corrected with, whether or not they still hold.</summary>
    /// <exception cref="InputException">This log does not have one of them, or has it with other bytes.</exception>
    internal static IReadOnlyList<CalibrationInUse> Of(CalibrationLogStore log, Revision revision)
    {
        List<CalibrationInUse> all = [];
        foreach (RevisionCalibration each in revision.Calibrations)
        {
            StoredCalibration stored = log.Find(each.Id) is { } found && found.Sha256 == each.Sha256 ? found
                : throw new InputException($"calibration {each.Id}: this log does not have it as the revision used it; name with --data the folder of log {revision.Log.LogId}");
            CalibrationInUse use = Of(stored, log, revision.Request, each.FromUtc?.UtcTicks ?? 0);
            use.ToTicks = each.ToUtc?.UtcTicks ?? long.MaxValue;
            all.Add(use);
        }

        return all;
    }

    private static StoredCalibration ById(CalibrationLogStore log, string id)
    {
        StoredCalibration stored = log.Find(id)
            ?? throw Wrong.Input("--calibration", id, $"there is no such record in this log{NearestName.DidYouMean(id, log.Records.Select(static known => known.Record.Id))}; 'probecal calibrations list' shows the ids");
        return stored.Record.Purpose != CalibrationRecord.CalibrationPurpose
            ? throw Wrong.Input("--calibration", id, "this is a check, which changes no coefficients; name a calibration")
            : !stored.Record.Result.Pass
            ? throw Wrong.Input("--calibration", id, "it did not pass; name one that did")
            : stored;
    }

    private static List<CalibrationInUse> InForce(CalibrationLogStore log, CorrectionRequest request, string probe)
    {
        List<CalibrationInUse> all = [];
        foreach (DateTimeOffset at in log.Records.Where(each => each.Record.Probe.Id == probe).Select(static each => each.Record.CompletedUtc).Distinct().Order())
        {
            StoredCalibration? stored = log.LatestFor(probe, at);
            if (stored is null || (all.Count != 0 && all[^1].Record.Id == stored.Record.Id))
            {
                continue;
            }

            if (all.Count != 0)
            {
                all[^1].ToTicks = at.UtcTicks;
            }

            all.Add(Of(stored, log, request, at.UtcTicks));
        }

        string[] probes = [.. log.Records.Select(static each => each.Record.Probe.Id).Distinct().Order(StringComparer.Ordinal)];
        return all.Count != 0 ? all : throw Wrong.Input("--probe", probe, Array.IndexOf(probes, probe) < 0
            ? $"no calibration of it is in this log{NearestName.DidYouMean(probe, probes)}; there {(probes.Length == 1 ? "is" : "are")} {(probes.Length == 0 ? "none at all" : string.Join(", ", probes))}"
            : "none of its calibrations passed and still holds; 'probecal calibrations list' shows them");
    }

    private static CalibrationInUse Of(StoredCalibration stored, CalibrationLogStore log, CorrectionRequest request, long fromTicks)
    {
        LoadedCalibration loaded = new(stored.Record, stored.Sha256, log.BytesOf(stored)) { Growth = UncertaintyGrowth.Of(log, stored.Record, null, null) };
        Stirring stirring = request.Stirring is string name ? StirringOf(name) : loaded.Core.Stirring;
        ReadingConditions conditions = ReadingCircumstances.Of(
            loaded,
            request.Equation is string equation ? EquationNames.Parse("--equation", equation) : EquationNames.Default,
            request.SignalUncertainty is string signal ? NotNegative("--signal-uncertainty", signal, Number.Parse("--signal-uncertainty", signal)) : null,
            ReadingCircumstances.IsSameThermometer(null, stored.Record),
            UncertaintyDefaults.ThermometerOffsetKelvin,
            Uncertainty("--temperature-uncertainty", request.TemperatureUncertainty, QuantityKind.TemperatureDifference, UncertaintyDefaults.TemperatureKelvin),
            Uncertainty("--pressure-uncertainty", request.PressureUncertainty, QuantityKind.Pressure, UncertaintyDefaults.BarometerHectopascal),
            Uncertainty("--salinity-uncertainty", request.SalinityUncertainty, QuantityKind.Salinity, UncertaintyDefaults.Salinity),
            stirring);
        return new CalibrationInUse(stored, loaded, conditions, fromTicks);
    }

    private static double Uncertainty(string option, string? text, QuantityKind kind, double usual)
    {
        return text is null ? usual : NotNegative(option, text, Quantity.Parse(kind, option, text));
    }

    private static double NotNegative(string option, string text, double value)
    {
        return 0 <= value ? value : throw Wrong.Input(option, text, "an uncertainty is zero or above");
    }

    private static Stirring StirringOf(string name)
    {
        string[] names = ["stirred", "still", "flow-insensitive"];
        return Array.IndexOf(names, name) < 0
            ? throw Wrong.Input("--stirring", name, $"there is no such choice{NearestName.DidYouMean(name, names)}; there are {string.Join(", ", names)}")
            : RecordNames.StirringOf(name);
    }

    /// <summary>A time as records write it.</summary>
    internal static string Utc(long ticks)
    {
        return new DateTime(ticks, DateTimeKind.Utc).ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture);
    }
}
