using System;
using System.IO;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Configuration;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Engine;

/// <summary>The calibration that a station corrects with, as it stands in the log.</summary>
internal sealed class LoadedCalibration
{
    /// <summary>Takes a record apart.</summary>
    /// <param name="record">The record.</param>
    /// <param name="sha256">SHA-256 of its stored bytes, lower-case hex.</param>
    /// <param name="bytes">Its stored bytes.</param>
    /// <exception cref="WorkFailedException">Its figures make no calibration.</exception>
    public LoadedCalibration(CalibrationRecord record, string sha256, ReadOnlyMemory<byte> bytes)
    {
        Record = record;
        Sha256 = sha256;
        Bytes = bytes;
        Core = record.ToProbeCalibration();
    }

    /// <summary>The record.</summary>
    public CalibrationRecord Record { get; }

    /// <summary>SHA-256 of <see cref="Bytes"/>, lower-case hex.</summary>
    public string Sha256 { get; }

    /// <summary>The record's JSON exactly as the log keeps it.</summary>
    public ReadOnlyMemory<byte> Bytes { get; }

    /// <summary>Count and hash of the log when it was loaded, as <c>COUNT:HASH</c>; null when it was not taken from a log.</summary>
    public string? LogHead { get; init; }

    /// <summary>What time adds to the uncertainty of readings.</summary>
    public UncertaintyGrowth Growth { get; init; } = UncertaintyGrowth.Unknown;

    /// <summary>What Core corrects with.</summary>
    public ProbeCalibration Core { get; }

    /// <summary>
    /// Standard uncertainty of one signal when nobody entered one: the scatter of the samples at the 100 % point (the largest of the points
    /// of a fit) and the rectangular width of the converter's or display's last digit.
    /// </summary>
    public double SignalUncertainty
    {
        get
        {
            double scatter = Record.Fit == null
                ? Record.Points.First(point => point.Role == Record.SlopeFrom).Signal.StandardDeviation
                : Record.Points.Max(point => point.Signal.StandardDeviation);
            double resolution = Record.Probe.MeterSettings?.Resolution ?? Record.Probe.SignalResolution ?? 0;
            return Math.Sqrt((scatter * scatter) + (resolution * resolution / 12));
        }
    }

    /// <summary>Finds the calibration that a configuration asks for.</summary>
    /// <param name="logFile">The calibration log.</param>
    /// <param name="configuration">Says which.</param>
    /// <param name="now">A calibration completed later than this is not in force.</param>
    /// <returns>Null when the configuration wants none.</returns>
    /// <exception cref="InputException">There is no such calibration, or it does not belong to this probe and line.</exception>
    /// <exception cref="WorkFailedException">The log is damaged or its chain broken.</exception>
    public static LoadedCalibration? Find(string logFile, StationConfiguration configuration, DateTimeOffset now)
    {
        if (configuration.Calibration.UseNone)
        {
            return null;
        }

        if (!File.Exists(logFile))
        {
            throw None(logFile, configuration);
        }

        using CalibrationLogStore log = CalibrationLogStore.OpenForReading(logFile);
        log.RequireWhole();
        StoredCalibration stored = configuration.Calibration.Id is { } id
            ? log.Find(id) ?? throw Wrong.Input("calibration", id, "there is no such record in " + logFile + "; 'probecal calibrations list' shows what there is")
            : log.LatestFor(configuration.Probe, now) ?? throw None(logFile, configuration);
        Check(stored.Record, configuration);
        RefuseWhatNoLongerHolds(stored.Record, log);
        return new LoadedCalibration(stored.Record, stored.Sha256, log.BytesOf(stored))
        {
            LogHead = log.Chain.Head,
            Growth = UncertaintyGrowth.Of(log, stored.Record, configuration.Drift, configuration.Fouling),
        };
    }

    private static InputException None(string logFile, StationConfiguration configuration)
    {
        return Wrong.Input("probe", configuration.Probe, "no calibration of it that passed is in " + logFile + "; run 'probecal calibrate' first, or set \"calibration\": \"none\" to keep raw samples only");
    }

    private static void RefuseWhatNoLongerHolds(CalibrationRecord record, CalibrationLogStore log)
    {
        if (log.WithdrawalOf(record.Id) is AmendmentRecord withdrawal)
        {
            throw Wrong.Input("calibration", record.Id, "it was withdrawn by entry " + withdrawal.Id + " (" + withdrawal.Reason + "); name another, or \"latest\"");
        }

        if (log.ReplacementOf(record.Id) is CalibrationRecord replacement)
        {
            throw Wrong.Input("calibration", record.Id, "it was replaced by " + replacement.Id + "; name that one, or \"latest\"");
        }
    }

    private static void Check(CalibrationRecord record, StationConfiguration configuration)
    {
        if (record.Probe.Id != configuration.Probe)
        {
            throw Wrong.Input("calibration", record.Id, "it is of probe " + record.Probe.Id + ", and this station has " + configuration.Probe);
        }

        if (record.Purpose != CalibrationRecord.CalibrationPurpose)
        {
            throw Wrong.Input("calibration", record.Id, "it is a check, which changes no coefficients; name a calibration, or \"latest\"");
        }

        if (!record.Result.Pass)
        {
            throw Wrong.Input("calibration", record.Id, "it did not pass; calibrate again, or name one that did");
        }

        string line = configuration.Line.SignalUnit;
        if (line.Length != 0 && record.Probe.SignalUnit.Length != 0 && line != record.Probe.SignalUnit)
        {
            throw Wrong.Input("line", configuration.Line.Text, "the signal comes in " + line + ", and calibration " + record.Id + " was made in " + record.Probe.SignalUnit + "; they must be the same");
        }
    }
}
