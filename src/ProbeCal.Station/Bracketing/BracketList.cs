using System;
using System.Collections.Generic;
using System.IO;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Journal;
using ProbeCal.Station.WholeFiles;

namespace ProbeCal.Station.Bracketing;

/// <summary>Consecutive readings that are not bracketed, for one reason.</summary>
/// <param name="First">Time of the first, UTC.</param>
/// <param name="Last">Time of the last, UTC.</param>
/// <param name="Count">How many.</param>
/// <param name="InTime">True when the checks around them passed and only the range is wrong.</param>
/// <param name="Before">Record of the check before them; null when there is none.</param>
/// <param name="After">Record of the check after them; null when there is none.</param>
/// <param name="Reason">Why, time first.</param>
public sealed record UnbracketedSpan(DateTimeOffset First, DateTimeOffset Last, long Count, bool InTime, string? Before, string? After, string Reason);

/// <summary>The readings of a probe against its checks.</summary>
/// <param name="Readings">Readings with a value.</param>
/// <param name="Bracketed">Those that lie between two passing checks, in time and range.</param>
/// <param name="Spans">The others, in order of time.</param>
public sealed record BracketList(long Readings, long Bracketed, IReadOnlyList<UnbracketedSpan> Spans)
{
    /// <summary>How the rule is read.</summary>
    public static string Rule => Brackets.Rule;

    private static readonly ColumnQuantity[] Known = [new("time"), new("concentration", QuantityKind.MassConcentration)];

    /// <summary>The readings that a station journaled.</summary>
    /// <exception cref="InputException">There is no journal, or it is from another version.</exception>
    /// <exception cref="WorkFailedException">It is damaged.</exception>
    public static BracketList OfJournal(CalibrationLogStore log, string probe, string journal)
    {
        return Of(Brackets.Of(log, probe), JournalReadings.Of(journal, probe));
    }

    /// <summary>Readings from a table.</summary>
    /// <param name="log">The log.</param>
    /// <param name="probe">Id of the probe.</param>
    /// <param name="path">The table.</param>
    /// <param name="columns">Its mapping: <c>time=Column</c> and <c>concentration=Column [mg/L]</c>.</param>
    /// <param name="utcOffset">Offset from UTC of times that state none; null refuses them.</param>
    /// <exception cref="InputException">The table, its mapping or a row is wrong.</exception>
    public static BracketList OfTable(CalibrationLogStore log, string probe, string path, IReadOnlyList<string> columns, string? utcOffset)
    {
        TimeSpan? offset = utcOffset == null ? null : UtcTime.Offset("--time-offset", utcOffset);
        Stream input;
        try
        {
            input = File.OpenRead(path);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or ArgumentException)
        {
            throw Wrong.Input("--input", path, "it cannot be read: " + fault.Message);
        }

        using (input)
        {
            MappedRows rows = new(input, System.IO.Path.GetFileName(path), columns, Known, separator: null, decimalComma: false);
            if (!rows.Has("time") || !rows.Has("concentration"))
            {
                throw new InputException("--column is missing: both are needed, --column time=... and --column \"concentration=... [mg/L]\"");
            }

            return Of(Brackets.Of(log, probe), Read(rows, offset));
        }
    }

    private static IEnumerable<(DateTimeOffset Time, double MilligramsPerLitre)> Read(MappedRows rows, TimeSpan? offset)
    {
        foreach (MappedRow row in rows.Read())
        {
            string time = row.Text("time") ?? throw new InputException(row.Where + ": the time is missing");
            yield return (UtcTime.Parse(row.Where + ": time", time, offset), row.Value("concentration") ?? double.NaN);
        }
    }

    private static BracketList Of(Brackets brackets, IEnumerable<(DateTimeOffset Time, double MilligramsPerLitre)> readings)
    {
        long count = 0;
        long bracketed = 0;
        List<UnbracketedSpan> spans = [];
        bool open = false;
        foreach ((DateTimeOffset time, double value) in readings)
        {
            if (double.IsNaN(value))
            {
                continue;
            }

            count++;
            BracketVerdict verdict = brackets.At(time, value);
            if (verdict.IsBracketed)
            {
                bracketed++;
                open = false;
                continue;
            }

            UnbracketedSpan? last = open ? spans[^1] : null;
            if (last != null && last.Reason == verdict.Reason && last.Before == verdict.Before && last.After == verdict.After)
            {
                spans[^1] = last with { Last = time, Count = last.Count + 1 };
            }
            else
            {
                spans.Add(new UnbracketedSpan(time, time, 1, verdict.InTime, verdict.Before, verdict.After, verdict.Reason!));
                open = true;
            }
        }

        return new BracketList(count, bracketed, spans);
    }
}
