using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Security.Cryptography;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.WholeFiles;

namespace ProbeCal.Station.PastCalibrations;

/// <summary>
/// A table of past calibrations, a row each, taken into the log. What a row does not say is left out; nothing is judged again. One
/// wrong row refuses the whole file, and a row that is in the log already is passed over.
/// </summary>
public sealed record PastTable
{
    private static readonly ColumnQuantity[] Known =
    [
        new("date"), new("probe"), new("method"), new("membrane"), new("verdict"), new("by"), new("remarks"),
        new("temperature", QuantityKind.Temperature), new("pressure", QuantityKind.Pressure), new("salinity", QuantityKind.Salinity),
        new("signal"), new("slope"), new("zero"),
        new("reference", QuantityKind.MassConcentration), new("before", QuantityKind.MassConcentration), new("after", QuantityKind.MassConcentration),
    ];

    /// <summary>The file.</summary>
    public required string Path { get; init; }

    /// <summary>Its mapping, <c>date=Datum</c>, <c>before=Anzeige vor [mg/L]</c>; <c>date</c> must be there.</summary>
    public required IReadOnlyList<string> Columns { get; init; }

    /// <summary>The probe, for a table that has no column for it.</summary>
    public string? Probe { get; init; }

    /// <summary>Unit of the signal, as a label.</summary>
    public string? SignalUnit { get; init; }

    /// <summary>Offset from UTC of times that state none.</summary>
    public string? UtcOffset { get; init; }

    /// <summary>Name of the separator.</summary>
    public string? Separator { get; init; }

    /// <summary>True when commas are decimal marks.</summary>
    public bool DecimalComma { get; init; }

    /// <summary>Reads the file.</summary>
    /// <param name="now">The time by the clock; a calibration after it is a mistake in the table.</param>
    /// <param name="software">Program and version.</param>
    /// <returns>An entry for each row, in order.</returns>
    /// <exception cref="InputException">The file, its mapping or a row is wrong.</exception>
    public IReadOnlyList<PastCalibrationRecord> Read(DateTimeOffset now, string software)
    {
        byte[] bytes = ReadAll();
        string name = System.IO.Path.GetFileName(Path);
        MappedRows rows = new(new MemoryStream(bytes), name, Columns, Known, Separator, DecimalComma);
        if (!rows.Has("date"))
        {
            throw new InputException("--column is missing: the date of a calibration, for example --column date=Date");
        }

        if (rows.Has("probe") == (Probe != null))
        {
            throw new InputException(Probe == null
                ? "--probe is missing: the table has no column for it; name the probe, or map one with --column probe=..."
                : $"--probe {Wrong.Shown(Probe)}: the table has a column for the probe; leave one of them out");
        }

        TimeSpan? offset = UtcOffset == null ? null : UtcTime.Offset("--time-offset", UtcOffset);
        string sha = Convert.ToHexStringLower(SHA256.HashData(bytes));
        PastCalibrationRecord[] read = [.. rows.Read().Select(row => Read(row, offset, now, name, sha, software))];
        return read.Length != 0 ? read : throw new InputException($"{name}: there is no row below the header; nothing was added");
    }

    /// <summary>Adds entries to a log, all of them or none; those that are there already are passed over.</summary>
    /// <returns>How many were added and how many were there already.</returns>
    public static (long Added, long Known) Add(CalibrationLogStore log, IReadOnlyList<PastCalibrationRecord> read)
    {
        HashSet<(string Probe, DateTimeOffset At, string Row)> there = [.. log.Entries.Select(static stored => stored.Entry).OfType<PastCalibrationRecord>().Select(Identity)];
        LogEntry[] added = [.. read.Where(record => there.Add(Identity(record)))];
        if (added.Length != 0)
        {
            log.AppendAll(added);
        }

        return (added.Length, read.Count - added.Length);

        static (string Probe, DateTimeOffset At, string Row) Identity(PastCalibrationRecord record)
        {
            return (record.Probe, record.At, record.Row);
        }
    }

    private PastCalibrationRecord Read(MappedRow row, TimeSpan? offset, DateTimeOffset now, string name, string sha, string software)
    {
        string date = row.Text("date") ?? throw new InputException(row.Where + ": the date is missing");
        bool dayOnly = date.Length == 10;
        // A day is a day wherever it was; without an offset its beginning is taken in UTC, and the record says that it is a day.
        DateTimeOffset at = UtcTime.Parse(row.Where + ": date", date, offset ?? (dayOnly ? TimeSpan.Zero : null));
        if (now < at)
        {
            throw Wrong.Input(row.Where + ": date", date, "this lies in the future of this computer's clock");
        }

        return new PastCalibrationRecord
        {
            Probe = PlainText.Id(row.Where + ": probe", Probe ?? row.Text("probe") ?? throw new InputException(row.Where + ": the probe is missing")),
            At = at,
            DayOnly = dayOnly,
            File = name,
            FileSha256 = sha,
            Line = row.Line,
            Row = row.Whole,
            Method = row.Text("method"),
            Membrane = row.Text("membrane"),
            TemperatureCelsius = row.Value("temperature"),
            PressureHectopascal = row.Value("pressure"),
            Salinity = row.Value("salinity"),
            Signal = row.Value("signal"),
            SignalUnit = SignalUnit == null ? null : PlainText.OneLine("--signal-unit", SignalUnit),
            Slope = row.Value("slope"),
            Zero = row.Value("zero"),
            ReferenceMilligramsPerLitre = row.Value("reference"),
            BeforeMilligramsPerLitre = row.Value("before"),
            AfterMilligramsPerLitre = row.Value("after"),
            StatedVerdict = row.Text("verdict"),
            By = row.Text("by"),
            Remarks = row.Text("remarks"),
            Software = software,
        };
    }

    private byte[] ReadAll()
    {
        try
        {
            return File.ReadAllBytes(Path);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or ArgumentException)
        {
            throw Wrong.Input("file", Path, "it cannot be read: " + fault.Message);
        }
    }
}
