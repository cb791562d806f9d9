using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.WholeFiles;

namespace ProbeCal.Station.Characterising;

/// <summary>One row of a run, or the mean of the rows of a level.</summary>
/// <param name="Level">What the level column says; empty without one.</param>
/// <param name="Signal">The raw signal.</param>
/// <param name="Celsius">Temperature, °C; NaN without a column.</param>
/// <param name="Hectopascal">Partial pressure of the gas, hPa; NaN where neither it nor a station pressure is known.</param>
/// <param name="Seconds">Time since the first row, s; NaN without a column.</param>
/// <param name="Stirring"><c>stirred</c> or <c>still</c>; empty without a column.</param>
internal sealed record LabRow(string Level, double Signal, double Celsius, double Hectopascal, double Seconds, string Stirring);

/// <summary>One file of a laboratory run.</summary>
internal sealed class LabRun
{
    internal const string Signal = "signal";
    internal const string Temperature = "temperature";
    internal const string PartialPressure = "partial-pressure";
    internal const string Pressure = "pressure";
    internal const string Time = "time";
    internal const string Level = "level";
    internal const string Stirring = "stirring";

    private static readonly ColumnQuantity[] Known =
    [
        new(Signal), new(Temperature, QuantityKind.Temperature), new(PartialPressure, QuantityKind.Pressure), new(Pressure, QuantityKind.Pressure),
        new(Time), new(Level), new(Stirring),
    ];

    private LabRun(string part, string name, string signalUnit, IReadOnlyList<LabRow> rows, IReadOnlyList<string> columns)
    {
        Part = part;
        Name = name;
        SignalUnit = signalUnit;
        Rows = rows;
        Columns = columns;
    }

    internal string Part { get; }

    /// <summary>The file, for messages.</summary>
    internal string Name { get; }

    internal string SignalUnit { get; }

    internal IReadOnlyList<LabRow> Rows { get; }

    /// <summary>The quantities that the file has columns for.</summary>
    internal IReadOnlyList<string> Columns { get; }

    /// <summary>Reads a file whole; a row that cannot be read is named and stops everything, for a fit must not pass over what it does not like.</summary>
    /// <param name="part">The part it is for.</param>
    /// <param name="path">The file.</param>
    /// <param name="request">Columns, separator, decimal mark.</param>
    /// <param name="required">Quantities that the part cannot do without; one of several alternatives is written <c>a|b</c>.</param>
    /// <exception cref="InputException">The file, its header or one of its rows cannot be used.</exception>
    internal static LabRun Read(string part, string path, CharacterisationRequest request, params string[] required)
    {
        ColumnMapping[] all = [.. request.Columns.Select(static text => ColumnMapping.Parse(text, Known))];
        using FileStream stream = Open(part, path);
        string name = Wrong.Shown(path);
        using TableLines lines = new(stream, name);
        TableHeader header = TableHeader.Read(lines, name, request.Separator, null, [.. all.Where(static each => each.Quantity.Name == Signal).Take(1)]);
        List<ColumnMapping> mappings = [];
        foreach (ColumnMapping mapping in all.Where(mapping => mapping.IsIn(header.Names)))
        {
            if (!mappings.Any(each => each.Quantity.Name == mapping.Quantity.Name))
            {
                mapping.Resolve(header.Names);
                mappings.Add(mapping);
            }
        }

        string[] columns = [.. mappings.Select(static each => each.Quantity.Name)];
        foreach (string need in required)
        {
            string[] either = need.Split('|');
            if (!either.Any(columns.Contains))
            {
                throw new InputException($"{name}: the {part} part needs a column for {string.Join(" or ", either)}, for example --column \"{either[0]}={Example(either[0])}\"; the file has {string.Join(", ", header.Names.Take(20).Select(Wrong.Shown))}");
            }
        }

        ColumnMapping? signal = mappings.FirstOrDefault(static each => each.Quantity.Name == Signal);
        LabRun run = new(part, name, signal?.UnitText ?? "", ReadRows(lines, header, mappings, name, request.DecimalComma), columns);
        return run.Rows.Count == 0 ? throw new InputException($"{name}: there are no rows under the header") : run;
    }

    /// <summary>The means of the levels, in the order in which they come; the rows themselves without a level column.</summary>
    internal IReadOnlyList<LabRow> Points()
    {
        if (!Columns.Contains(Level))
        {
            return Rows;
        }

        return [.. Rows.GroupBy(static row => row.Level).Select(static level => new LabRow(
            level.Key, level.Average(static row => row.Signal), level.Average(static row => row.Celsius), level.Average(static row => row.Hectopascal),
            level.Average(static row => row.Seconds), level.First().Stirring))];
    }

    private static List<LabRow> ReadRows(TableLines lines, TableHeader header, List<ColumnMapping> mappings, string name, bool decimalComma)
    {
        List<LabRow> rows = [];
        TableRow row = new();
        double first = double.NaN;
        while (row.Read(lines, header.Separator))
        {
            if (row.IsBlank || row.Bytes.TrimStart().StartsWith('#'))
            {
                continue;
            }

            string at = string.Create(CultureInfo.InvariantCulture, $"{name}, line {row.Line}");
            if (row.Problem is string problem)
            {
                throw new InputException($"{at}: {problem}");
            }

            if (row.Count != header.Names.Count)
            {
                throw new InputException(string.Create(CultureInfo.InvariantCulture, $"{at}: {row.Count} cells where the header has {header.Names.Count}"));
            }

            LabRow read = new("", double.NaN, double.NaN, double.NaN, double.NaN, "");
            double station = double.NaN;
            foreach (ColumnMapping mapping in mappings)
            {
                string cell = row.Cell(mapping.Index).Trim();
                switch (mapping.Quantity.Name)
                {
                    case Signal:
                        read = read with { Signal = Number.Parse($"{at}: signal", Decimal(at, cell, decimalComma)) };
                        break;
                    case Level:
                        read = read with { Level = cell };
                        break;
                    case Stirring:
                        read = read with
                        {
                            Stirring = cell.ToLowerInvariant() switch
                            {
                                "stirred" => "stirred",
                                "still" => "still",
                                _ => throw Wrong.Input(at + ": stirring", cell, "write stirred or still" + NearestName.DidYouMean(cell, ["stirred", "still"])),
                            },
                        };
                        break;
                    case Time:
                        double seconds = Seconds(at, cell, mapping.UnitText, decimalComma);
                        first = double.IsNaN(first) ? seconds : first;
                        read = read with { Seconds = seconds - first };
                        break;
                    default:
                        if (!mapping.TryRead(cell, decimalComma, out string value, out RowOutcome outcome))
                        {
                            throw new InputException($"{at}: {outcome.Reason}{(outcome.Text.Length == 0 ? "" : ", " + outcome.Text)}");
                        }

                        double canonical = Quantity.Parse(mapping.Kind!, $"{at}: {mapping.Quantity.Name}", value);
                        (read, station) = mapping.Quantity.Name switch
                        {
                            Temperature => (read with { Celsius = canonical }, station),
                            PartialPressure => (read with { Hectopascal = canonical }, station),
                            _ => (read, canonical),
                        };
                        break;
                }
            }

            rows.Add(double.IsNaN(read.Hectopascal) && !double.IsNaN(station) ? read with { Hectopascal = AirSaturated(at, read.Celsius, station) } : read);
        }

        return rows;
    }

    /// <summary>Oxygen in water (or air) that is saturated at the temperature and the station pressure.</summary>
    private static double AirSaturated(string at, double celsius, double station)
    {
        if (double.IsNaN(celsius))
        {
            throw new InputException($"{at}: a station pressure gives the oxygen of air-saturated water only with a temperature; name its column, or give --column partial-pressure=…");
        }

        Status status = OxygenEquilibrium.PartialPressure(celsius, station, RangeRule.Refuse, out double hectopascal);
        return status == Status.Ok
            ? hectopascal
            : throw new InputException($"{at}: temperature {Number.Print(celsius)} C, pressure {Number.Print(station)} hPa: no reference can be computed there ({status}); the equation holds from 0 to 40 C and from 507 to 1114 hPa");
    }

    private static string Decimal(string at, string cell, bool decimalComma)
    {
        if (!decimalComma)
        {
            return cell;
        }

        return cell.Contains('.', StringComparison.Ordinal) ? throw Wrong.Input(at, cell, "a point where --decimal-comma promises commas") : cell.Replace(',', '.');
    }

    /// <summary>A time as seconds: a number in the unit that the mapping names, or a date with a time of day.</summary>
    private static double Seconds(string at, string cell, string? unit, bool decimalComma)
    {
        if (unit is not null)
        {
            double number = Number.Parse($"{at}: time", Decimal(at, cell, decimalComma));
            return unit switch
            {
                "s" => number,
                "ms" => number / 1000,
                "min" => number * 60,
                _ => throw new InputException($"--column time=… [{Wrong.Shown(unit)}]: a time is in s, ms or min, or a date without a unit in brackets"),
            };
        }

        return DateTimeOffset.TryParseExact(
            cell, ["yyyy-MM-dd'T'HH:mm:ss.FFFFFFFK", "yyyy-MM-dd HH:mm:ss.FFFFFFFK", "yyyy-MM-dd'T'HH:mm:ssK"], CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal, out DateTimeOffset time)
            ? (time - DateTimeOffset.UnixEpoch).TotalSeconds
            : throw Wrong.Input(at + ": time", cell, "write 2026-06-01T12:30:00Z, or name the unit of a number: --column \"time=t [s]\"");
    }

    private static string Example(string quantity)
    {
        return quantity switch
        {
            Signal => "I [nA]",
            Temperature => "T [C]",
            Time => "t [s]",
            PartialPressure => "pO2 [hPa]",
            Pressure => "Baro [hPa]",
            _ => quantity,
        };
    }

    private static FileStream Open(string part, string path)
    {
        string what = "--input " + part;
        if (Directory.Exists(path))
        {
            throw Wrong.Input(what, path, "this is a folder; name a file with columns");
        }

        try
        {
            return new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite);
        }
        catch (Exception fault) when (fault is FileNotFoundException or DirectoryNotFoundException)
        {
            throw Wrong.Input(what, path, "there is no such file");
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or ArgumentException)
        {
            throw new WorkFailedException($"{what} {Wrong.Shown(path)}: cannot be read ({fault.Message})", fault);
        }
    }
}
