using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Text;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.WholeFiles;

/// <summary>
/// A table read row by row through a mapping of its columns, every cell as a person would type it. Unlike a computation over a whole
/// file it refuses the first row that is wrong: what is taken into a record is right or not taken at all.
/// </summary>
internal sealed class MappedRows
{
    private readonly Stream _input;
    private readonly string _name;
    private readonly string? _separator;
    private readonly bool _decimalComma;
    private readonly ColumnMapping[] _mappings;

    /// <param name="input">The file's bytes.</param>
    /// <param name="name">What it is called in a message.</param>
    /// <param name="columns">The mappings, <c>quantity=Column [unit]</c>.</param>
    /// <param name="known">What a column can hold.</param>
    /// <param name="separator">Name of the separator; null to tell it from the header.</param>
    /// <param name="decimalComma">True when commas are decimal marks.</param>
    /// <exception cref="InputException">A mapping is wrong.</exception>
    internal MappedRows(Stream input, string name, IReadOnlyList<string> columns, IReadOnlyList<ColumnQuantity> known, string? separator, bool decimalComma)
    {
        _input = input;
        _name = name;
        _separator = separator;
        _decimalComma = decimalComma;
        _mappings = ColumnMapping.ParseAll(columns, known);
    }

    /// <summary>True when a quantity is mapped to a column.</summary>
    internal bool Has(string quantity)
    {
        return _mappings.Any(mapping => mapping.Quantity.Name == quantity);
    }

    /// <summary>The rows in order.</summary>
    /// <exception cref="InputException">The header lacks a column, or a row cannot be taken apart.</exception>
    internal IEnumerable<MappedRow> Read()
    {
        using TableLines lines = new(_input, _name);
        TableHeader header = TableHeader.Read(lines, _name, _separator, null, _mappings);
        foreach (ColumnMapping mapping in _mappings)
        {
            mapping.Resolve(header.Names);
        }

        TableRow row = new();
        while (row.Read(lines, header.Separator))
        {
            if (row.IsBlank)
            {
                continue;
            }

            string where = string.Create(CultureInfo.InvariantCulture, $"{_name}, line {row.Line}");
            if (row.Problem is string problem)
            {
                throw new InputException(where + ": " + problem);
            }

            yield return new MappedRow(row, where, _mappings, _decimalComma);
        }
    }
}

/// <summary>One row of such a table; of use until the next is read.</summary>
internal sealed class MappedRow
{
    private readonly TableRow _row;
    private readonly ColumnMapping[] _mappings;
    private readonly bool _decimalComma;

    internal MappedRow(TableRow row, string where, ColumnMapping[] mappings, bool decimalComma)
    {
        _row = row;
        Where = where;
        _mappings = mappings;
        _decimalComma = decimalComma;
    }

    /// <summary>File and line, for a message.</summary>
    internal string Where { get; }

    /// <summary>The line, from 1.</summary>
    internal long Line => _row.Line;

    /// <summary>The row as it stands.</summary>
    internal string Whole => TableText.Decode(_row.Bytes);

    /// <summary>A cell as text; null when it is empty or no column is mapped.</summary>
    internal string? Text(string quantity)
    {
        return Find(quantity) is ColumnMapping mapping && mapping.Index < _row.Count && _row.Cell(mapping.Index).Trim() is { Length: not 0 } text ? text : null;
    }

    /// <summary>A cell as a number in the canonical unit of its kind; null when it is missing or no column is mapped.</summary>
    /// <exception cref="InputException">It is no such quantity.</exception>
    internal double? Value(string quantity)
    {
        if (Find(quantity) is not ColumnMapping mapping || Text(quantity) is not string text)
        {
            return null;
        }

        if (mapping.Kind is not QuantityKind kind)
        {
            return Plain(quantity, text);
        }

        if (!mapping.TryRead(text, _decimalComma, out string value, out RowOutcome outcome))
        {
            return outcome.Text.StartsWith("the cell says", System.StringComparison.Ordinal) ? null : throw new InputException($"{Where}: {quantity} {outcome.Text}");
        }

        return Quantity.TryParse(kind, value, out double canonical, out string? problem) ? canonical : throw new InputException($"{Where}: {quantity} {Wrong.Shown(text)}: {problem}");
    }

    /// <summary>A number without a unit of ours: a signal, its slope.</summary>
    private double? Plain(string quantity, string text)
    {
        if (_decimalComma && text.Contains('.', System.StringComparison.Ordinal))
        {
            throw new InputException($"{Where}: {quantity} {Wrong.Shown(text)}: a point where --decimal-comma promises commas");
        }

        return Number.TryParse(_decimalComma ? text.Replace(',', '.') : text, out double value, out string? problem)
            ? value
            : throw new InputException($"{Where}: {quantity} {Wrong.Shown(text)}: {problem}");
    }

    private ColumnMapping? Find(string quantity)
    {
        return _mappings.FirstOrDefault(mapping => mapping.Quantity.Name == quantity);
    }
}
