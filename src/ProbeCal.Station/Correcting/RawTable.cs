using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Sources;
using ProbeCal.Station.WholeFiles;

namespace ProbeCal.Station.Correcting;

/// <summary>A table of recorded readings: its header, which column is what, and its rows. It is only read.</summary>
internal sealed class RawTable : IDisposable
{
    private readonly FileStream _stream;

    private RawTable(FileStream stream, string name, TableHeader header, ColumnMapping[] mappings, CellTime time, bool decimalComma)
    {
        _stream = stream;
        Name = name;
        Header = header;
        Mappings = mappings;
        Time = time;
        DecimalMark = decimalComma ? (byte)',' : (byte)'.';
        Rows = new ByteRows(stream, name);
    }

    /// <summary>What it is called in a message.</summary>
    internal string Name { get; }

    internal TableHeader Header { get; }

    internal ColumnMapping[] Mappings { get; }

    internal CellTime Time { get; }

    internal byte DecimalMark { get; }

    internal byte Separator => (byte)Header.Separator;

    internal ByteRows Rows { get; }

    internal long Length => _stream.Length;

    /// <summary>Lines up to the header, the header's included.</summary>
    internal int HeaderLines => Header.Before.Count + 1;

    /// <summary>Opens a table and finds its columns.</summary>
    /// <exception cref="InputException">There is no such file or header, or a column is not found.</exception>
    /// <exception cref="WorkFailedException">The file cannot be read.</exception>
    internal static RawTable Open(
        string path, IReadOnlyList<string> columns, IReadOnlyList<ColumnQuantity> known, string? separator, string? headerLine, bool decimalComma,
        string? timeOffset, string? timeForm)
    {
        ColumnMapping[] mappings = ColumnMapping.ParseAll(columns, known);
        long? line = headerLine is null ? null : Number.ParseWhole("--header-line", headerLine, 1, 1000);
        CellTime time = new(timeOffset is null ? null : OffsetOf(timeOffset), timeForm is null ? null : FormOf(timeForm));
        string name = Wrong.Shown(path);
        FileStream stream = OpenFile(path);
        try
        {
            using TableLines lines = new(stream, name);
            if (stream.Length == 0)
            {
                throw new InputException($"{name}: this file is empty");
            }

            TableHeader header = TableHeader.Read(lines, name, separator, line, mappings);
            foreach (ColumnMapping mapping in mappings)
            {
                mapping.Resolve(header.Names);
            }

            if (decimalComma && header.Separator == ',')
            {
                throw new InputException($"{name}: commas separate its columns, so they cannot be decimal marks too; leave --decimal-comma out, or say which --separator it has");
            }

            stream.Position = 0;
            return new RawTable(stream, name, header, mappings, time, decimalComma);
        }
        catch
        {
            stream.Dispose();
            throw;
        }
    }

    /// <summary>Index of the column of a quantity; -1 where none is mapped.</summary>
    internal int IndexOf(string quantity)
    {
        return Array.Find(Mappings, each => each.Quantity.Name == quantity)?.Index ?? -1;
    }

    internal QuantityUnit? UnitOf(string quantity)
    {
        return Array.Find(Mappings, each => each.Quantity.Name == quantity)?.Unit;
    }

    /// <summary>True for a cell that stands for a missing value.</summary>
    internal static bool IsMissing(ReadOnlySpan<byte> cell)
    {
        ReadOnlySpan<byte> text = CellNumber.Trim(cell);
        return text.Length switch
        {
            0 => true,
            1 => text[0] == (byte)'-',
            2 => Same(text, "--"u8) || Same(text, "na"u8),
            3 => Same(text, "nan"u8) || Same(text, "n/a"u8) || Same(text, "---"u8),
            4 => Same(text, "null"u8) || Same(text, "none"u8),
            _ => false,
        };
    }

    public void Dispose()
    {
        Rows.Dispose();
        _stream.Dispose();
    }

    private static bool Same(ReadOnlySpan<byte> text, ReadOnlySpan<byte> token)
    {
        return System.Text.Ascii.EqualsIgnoreCase(text, token);
    }

    private static TimeSpan OffsetOf(string text)
    {
        return text is "Z" or "z" or "UTC" or "utc" ? TimeSpan.Zero
            : LineTime.TryOffset(text, out TimeSpan offset) ? offset
            : throw Wrong.Input("--time-offset", text, "write the clock's offset from UTC as +02:00, -0330 or UTC; a zone's name changes its offset twice a year");
    }

    private static string FormOf(string text)
    {
        if (text is "epoch" or "epoch-ms")
        {
            return text;
        }

        // A pattern must bring back what it writes, or else it leaves something out.
        DateTime known = new(2026, 11, 27, 13, 45, 0, DateTimeKind.Unspecified);
        try
        {
            string written = known.ToString(text, CultureInfo.InvariantCulture);
            if (DateTime.TryParseExact(written, text, CultureInfo.InvariantCulture, DateTimeStyles.None, out DateTime read) && read == known)
            {
                return text;
            }
        }
        catch (FormatException)
        {
            // Told below with all that does not fit.
        }

        throw Wrong.Input("--time-form", text, "write a pattern with year, month, day, hour and minute, for example \"MM/dd/yyyy HH:mm\" (MM month, mm minute, HH hour of 24), or epoch, or epoch-ms");
    }

    private static FileStream OpenFile(string path)
    {
        if (string.IsNullOrWhiteSpace(path) || path == "-")
        {
            throw Wrong.Input("--input", path, "name the file with the raw readings: a revision keeps its hash, so it must be a file");
        }

        if (Directory.Exists(path))
        {
            throw Wrong.Input("--input", path, "this is a folder; name a file with columns");
        }

        try
        {
            return new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.Read, 1, FileOptions.SequentialScan);
        }
        catch (Exception fault) when (fault is FileNotFoundException or DirectoryNotFoundException)
        {
            throw Wrong.Input("--input", path, "there is no such file");
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or ArgumentException)
        {
            throw new WorkFailedException($"--input {Wrong.Shown(path)}: cannot be read ({fault.Message})", fault);
        }
    }
}
