using System;
using System.Collections.Generic;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Sources;

/// <summary>What a field of a line means.</summary>
internal enum LineFieldKind
{
    Skip,
    Date,
    Time,
    Signal,
    Temperature,
    Pressure,
    Salinity,
}

/// <summary>How the text of a time field is to be understood.</summary>
internal enum TimeForm
{
    /// <summary>ISO 8601 that says its offset.</summary>
    WithOffset,
    /// <summary>ISO 8601; where it says no offset, the template's holds.</summary>
    OffsetFromTemplate,
    /// <summary>Seconds since 1970-01-01T00:00:00Z.</summary>
    EpochSeconds,
    /// <summary>Milliseconds since 1970-01-01T00:00:00Z.</summary>
    EpochMilliseconds,
}

/// <summary>One field of a template: what it means and how its text becomes a number.</summary>
internal sealed record LineField(LineFieldKind Kind, string Name)
{
    /// <summary>Unit that the template gives; null when it gives none.</summary>
    internal string? UnitText { get; init; }

    /// <summary>Unit of a number that carries none in the line; null for the signal.</summary>
    internal QuantityUnit? Unit { get; init; }

    /// <summary>The number in the line times this is the number in the unit.</summary>
    internal double Scale { get; init; } = 1;

    internal TimeForm TimeForm { get; init; }

    internal TimeSpan Offset { get; init; }

    /// <summary>Texts that stand for a missing value, besides the usual ones.</summary>
    internal IReadOnlyList<string> MissingTokens { get; init; } = [];

    /// <summary>The quantity behind the field; null for signal, time and skip.</summary>
    internal QuantityKind? Quantity => Kind switch
    {
        LineFieldKind.Temperature => QuantityKind.Temperature,
        LineFieldKind.Pressure => QuantityKind.Pressure,
        LineFieldKind.Salinity => QuantityKind.Salinity,
        _ => null,
    };

    /// <summary>True for texts that say that there is no value.</summary>
    internal bool IsMissing(string text)
    {
        if (text.Length == 0)
        {
            return true;
        }

        foreach (string token in UsualMissingTokens)
        {
            if (string.Equals(token, text, StringComparison.OrdinalIgnoreCase))
            {
                return true;
            }
        }

        foreach (string token in MissingTokens)
        {
            if (token == text)
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>What loggers commonly write for no value. Numbers such as -9999 must be named in the template.</summary>
    internal static readonly string[] UsualMissingTokens = ["NaN", "NA", "N/A", "null", "none", "-", "--", "---"];
}

/// <summary>A piece of a template in its order: either literal text or a field.</summary>
internal readonly record struct LinePiece(string? Literal, LineField? Field);
