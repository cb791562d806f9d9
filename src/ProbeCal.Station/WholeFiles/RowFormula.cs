using System;
using System.Collections.Generic;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.WholeFiles;

/// <summary>A quantity that may come from a column, and the kinds that its unit may be of.</summary>
/// <param name="Name">As the option for a single value is called, without its dashes.</param>
/// <param name="Kinds">Most have one; a concentration may be a mass or an amount; a raw signal and a time have none and are taken as they stand.</param>
public sealed record ColumnQuantity(string Name, params QuantityKind[] Kinds);

/// <summary>A column that is appended to each row.</summary>
/// <param name="Name">Its name in the header, with the unit.</param>
/// <param name="Key">Its name in JSON.</param>
public sealed record ResultColumn(string Name, string Key);

/// <summary>How a row came out.</summary>
public enum RowState
{
    /// <summary>Computed.</summary>
    Computed,
    /// <summary>Computed, with something to know about it.</summary>
    Flagged,
    /// <summary>Not computed.</summary>
    Refused,
}

/// <summary>How a row came out, and why.</summary>
/// <param name="State">Computed, flagged or refused.</param>
/// <param name="Reason">The same words for the same reason, by which rows are counted; empty for a plain row.</param>
/// <param name="Text">The reason with the numbers of this row.</param>
public readonly record struct RowOutcome(RowState State, string Reason, string Text)
{
    /// <summary>A row with nothing to say about it.</summary>
    public static RowOutcome Ok => new(RowState.Computed, "", "");

    /// <summary>A computed row with something to know about it.</summary>
    public static RowOutcome Flagged(string reason, string text)
    {
        return new RowOutcome(RowState.Flagged, reason, text);
    }

    /// <summary>A row that gave no result.</summary>
    public static RowOutcome Refused(string reason, string text)
    {
        return new RowOutcome(RowState.Refused, reason, text);
    }
}

/// <summary>What is computed for each row: the very call that a single value takes.</summary>
public interface IRowFormula
{
    /// <summary>What may come from columns.</summary>
    IReadOnlyList<ColumnQuantity> Quantities { get; }

    /// <summary>What is appended; known after <see cref="Begin"/>.</summary>
    IReadOnlyList<ResultColumn> Results { get; }

    /// <summary>What holds for all rows, by the name it has in JSON: the gas, the equation; known after <see cref="Begin"/>.</summary>
    IReadOnlyList<(string Key, string Value)> About { get; }

    /// <summary>Told once which quantities come from columns, in the order in which their values will be given.</summary>
    /// <param name="quantities">Their names.</param>
    /// <param name="units">Name of a unit of each, of the kind that its values come in.</param>
    /// <exception cref="InputException">With the other options they are too few, or say a thing twice.</exception>
    void Begin(IReadOnlyList<string> quantities, IReadOnlyList<string> units);

    /// <summary>Computes one row.</summary>
    /// <param name="values">The values of the columns with their units, as a person types them, in the order of <see cref="Begin"/>.</param>
    /// <param name="results">The results, in the order of <see cref="Results"/>; NaN for none.</param>
    RowOutcome Compute(ReadOnlySpan<string> values, Span<double> results);
}
