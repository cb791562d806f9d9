using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.WholeFiles;

/// <summary>
/// One <c>quantity=Column [unit]</c>: which quantity a column holds. <c>#3</c> in place of a name is the third column. A
/// column whose name ends in brackets may be written as it stands: the brackets then are both.
/// </summary>
internal sealed class ColumnMapping
{
    private const string What = "--column";

    /// <summary>Texts that stand for a missing value, as in lines of a probe.</summary>
    private static readonly string[] Missing = ["NaN", "NA", "N/A", "null", "none", "-", "--", "---"];

    private readonly string _given;
    private readonly string _column;
    private readonly string? _unitText;
    private QuantityUnit? _unit;

    private ColumnMapping(string given, ColumnQuantity quantity, string column, string? unitText)
    {
        _given = given;
        Quantity = quantity;
        _column = column;
        _unitText = unitText;
        Kind = quantity.Kinds.Length == 0 ? null : quantity.Kinds[0];
    }

    internal ColumnQuantity Quantity { get; }

    /// <summary>The kind of the unit; of use after <see cref="Resolve"/>. Null for a column that is taken as it stands.</summary>
    internal QuantityKind? Kind { get; private set; }

    /// <summary>The unit; of use after <see cref="Resolve"/>. Null for a column that is taken as it stands.</summary>
    internal QuantityUnit? Unit => _unit;

    /// <summary>The text in brackets; null when there is none.</summary>
    internal string? UnitText => _unitText;

    /// <summary>Which column, from 0; of use after <see cref="Resolve"/>.</summary>
    internal int Index { get; private set; } = -1;

    /// <summary>Name of the unit; of use after <see cref="Resolve"/>.</summary>
    internal string UnitName => _unit?.Name ?? _unitText ?? "";

    /// <summary>What was understood, for a person to look at.</summary>
    internal string Explanation => Quantity.Name + " from column " + (Index + 1).ToString(CultureInfo.InvariantCulture)
        + (UnitName.Length == 0 ? "" : ", " + UnitName);

    /// <summary>Reads a mapping.</summary>
    /// <exception cref="InputException">It is none, or its quantity is unknown.</exception>
    internal static ColumnMapping Parse(string text, IReadOnlyList<ColumnQuantity> known)
    {
        int equals = text.IndexOf('=', StringComparison.Ordinal);
        string[] names = [.. known.Select(static each => each.Name)];
        if (equals <= 0 || text.AsSpan(equals + 1).Trim().IsEmpty)
        {
            throw Wrong.Input(What, text, "write which quantity is which column, for example \"temperature=Water temp [C]\"");
        }

        string name = text[..equals].Trim();
        ColumnQuantity quantity = known.FirstOrDefault(each => each.Name == name)
            ?? throw Wrong.Input(What, text, $"{Wrong.Shown(name)} is no quantity that a column can hold{NearestName.DidYouMean(name, names)}; there are {string.Join(", ", names)}");
        string column = text[(equals + 1)..].Trim();
        int bracket = column.EndsWith(']') ? column.LastIndexOf('[') : -1;
        return bracket <= 0
            ? new ColumnMapping(text, quantity, column, null)
            : new ColumnMapping(text, quantity, column[..bracket].TrimEnd(), column[(bracket + 1)..^1].Trim());
    }

    /// <summary>Reads all of them.</summary>
    /// <exception cref="InputException">One is wrong, or a quantity is mapped twice.</exception>
    internal static ColumnMapping[] ParseAll(IReadOnlyList<string> texts, IReadOnlyList<ColumnQuantity> known)
    {
        if (texts.Count == 0)
        {
            throw new InputException($"--column is missing: say which quantity is which column, for example --column \"temperature=Water temp [C]\" (quantities: {string.Join(", ", known.Select(static each => each.Name))})");
        }

        ColumnMapping[] all = [.. texts.Select(each => Parse(each, known))];
        for (int i = 0; i < all.Length; i++)
        {
            if (Array.FindIndex(all, each => each.Quantity.Name == all[i].Quantity.Name) < i)
            {
                throw Wrong.Input(What, texts[i], all[i].Quantity.Name + " is mapped twice; leave one out");
            }
        }

        return all;
    }

    /// <summary>True when the header has its column.</summary>
    internal bool IsIn(IReadOnlyList<string> header)
    {
        return NumberOf(out int number) ? number <= header.Count : header.Contains(_column) || header.Contains(Literal);
    }

    /// <summary>Finds the column and the unit.</summary>
    /// <exception cref="InputException">There is no such column, two of them, or the unit is missing or unknown.</exception>
    internal void Resolve(IReadOnlyList<string> header)
    {
        Index = Find(header);
        string? unitText = _unitText;
        if (Kind is null)
        {
            return;
        }

        if (unitText is null)
        {
            if (Kind.BareUnit is null)
            {
                throw Wrong.Input(What, _given, $"the unit is missing; write for example \"{Quantity.Name}={_column} [{Kind.CanonicalUnit.Name}]\" (units: {Units()})");
            }

            _unit = Kind.BareUnit;
            return;
        }

        foreach (QuantityKind kind in Quantity.Kinds)
        {
            if (kind.Unit(unitText) is QuantityUnit unit)
            {
                (Kind, _unit) = (kind, unit);
                return;
            }
        }

        throw Wrong.Input(What, _given, Units().Length == 0
            ? $"a {Quantity.Name} has no unit; write \"{Quantity.Name}={_column}\""
            : $"{Wrong.Shown(unitText)} is no unit of {Quantity.Name}{NearestName.DidYouMean(unitText, Quantity.Kinds.SelectMany(static kind => kind.Spellings()))}; there are {Units()}");
    }

    /// <summary>The value of a cell with its unit, as a person types it: a row then is read as a command is.</summary>
    /// <param name="cell">The cell as it stands.</param>
    /// <param name="decimalComma">True when commas are decimal marks and points are none.</param>
    /// <param name="value">The number and the unit; empty when there is none.</param>
    /// <param name="outcome">Why there is none.</param>
    internal bool TryRead(string cell, bool decimalComma, out string value, out RowOutcome outcome)
    {
        string text = cell.Trim();
        value = "";
        if (text.Length == 0 || Array.Exists(Missing, token => string.Equals(token, text, StringComparison.OrdinalIgnoreCase)))
        {
            outcome = RowOutcome.Refused($"{Quantity.Name} missing", text.Length == 0 ? "" : "the cell says " + Wrong.Shown(text));
            return false;
        }

        if (Problem(text, decimalComma) is string problem)
        {
            outcome = RowOutcome.Refused(Quantity.Name + " unreadable", Wrong.Shown(text) + ": " + problem);
            return false;
        }

        string number = decimalComma ? text.Replace(',', '.') : text;
        value = number[..Number.LeadingLength(number)] + _unit!.Name;
        outcome = RowOutcome.Ok;
        return true;
    }

    private string? Problem(string text, bool decimalComma)
    {
        if (decimalComma && text.Contains('.', StringComparison.Ordinal))
        {
            return "a point where --decimal-comma promises commas";
        }

        if (Entry.Quantity.TrySplit(Kind!, decimalComma ? text.Replace(',', '.') : text, _unit, out _, out QuantityUnit? unit, out string? problem))
        {
            return unit == _unit ? null : $"the cell says {unit.Name} and the mapping {_unit!.Name}; one of them is wrong";
        }

        return !decimalComma && Number.CommaAdvice(text) is not null ? "a comma is no decimal mark unless --decimal-comma says so" : problem;
    }

    private string Literal => _unitText is null ? _column : _given[(_given.IndexOf('=', StringComparison.Ordinal) + 1)..].Trim();

    private int Find(IReadOnlyList<string> header)
    {
        if (NumberOf(out int number))
        {
            return number <= header.Count
                ? number - 1
                : throw Wrong.Input(What, _given, string.Create(CultureInfo.InvariantCulture, $"the header has {header.Count} columns"));
        }

        string name = header.Contains(Literal) ? Literal : _column;
        int[] at = [.. Enumerable.Range(0, header.Count).Where(i => header[i] == name)];
        return at.Length switch
        {
            1 => at[0],
            0 => throw Wrong.Input(What, _given, $"there is no column {Wrong.Shown(name)}{NearestName.DidYouMean(name, header)}; there are {Columns(header)}"),
            _ => throw Wrong.Input(What, _given, string.Create(CultureInfo.InvariantCulture, $"{at.Length} columns are called {Wrong.Shown(name)}; say which by its number, for example \"{Quantity.Name}=#{at[0] + 1}\"")),
        };
    }

    /// <summary>The names of the columns, as many as a person reads.</summary>
    private static string Columns(IReadOnlyList<string> header)
    {
        const int Most = 40;
        string names = string.Join(", ", header.Take(Most).Select(Wrong.Shown));
        return header.Count <= Most ? names : string.Create(CultureInfo.InvariantCulture, $"{names} and {header.Count - Most} more");
    }

    private bool NumberOf(out int number)
    {
        number = 0;
        return _column.StartsWith('#') && int.TryParse(_column.AsSpan(1), NumberStyles.None, CultureInfo.InvariantCulture, out number) && 0 < number;
    }

    private string Units()
    {
        return string.Join(", ", Quantity.Kinds.Select(static kind => kind.UnitList()).Where(static list => list.Length != 0));
    }
}
