using System;
using System.Globalization;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Calibrating;

/// <summary>How much weight a finding has.</summary>
public enum FindingSeverity
{
    /// <summary>Written down; the work goes on.</summary>
    Note,

    /// <summary>The work goes on only with a reason, which the record keeps.</summary>
    NeedsReason,

    /// <summary>No reason helps: it cannot be true, or nothing can be calibrated from it.</summary>
    Refuse,
}

/// <summary>What a guard saw.</summary>
/// <param name="Guard">Which guard: one of <see cref="GuardNames"/>.</param>
/// <param name="Severity">Its weight.</param>
/// <param name="Saw">What it saw, in one sentence without an end.</param>
/// <param name="Error">What this would do to readings.</param>
/// <param name="WhatToDo">What to do about it, in one sentence without an end.</param>
public sealed record Finding(string Guard, FindingSeverity Severity, string Saw, PossibleError Error, string WhatToDo)
{
    /// <summary>All of it for a person: what was seen, how large the error would be and in which direction, what to do.</summary>
    public string Sentence => $"{Saw}{(NamesAnError ? ", " + Error.WordsIfSo : "; " + Error.Words)}; {WhatToDo}";

    /// <summary>True when what was seen ends with an error that is only taken as an example: "were it 1 hPa too high".</summary>
    private bool NamesAnError
    {
        get
        {
            string last = Saw[(Saw.LastIndexOf("; ", StringComparison.Ordinal) is int at and not -1 ? at + 2 : 0)..];
            return last.StartsWith("were ", StringComparison.Ordinal) || last.StartsWith("had ", StringComparison.Ordinal);
        }
    }

    /// <summary>The finding as the record keeps it.</summary>
    /// <param name="reason">The reason for going on, or null.</param>
    public RecordedFinding ToRecord(string? reason)
    {
        string severity = Severity switch
        {
            FindingSeverity.Note => "note",
            FindingSeverity.NeedsReason when reason != null => "overridden",
            _ => "refused",
        };
        return new RecordedFinding
        {
            Guard = Guard,
            Severity = severity,
            Saw = Error.WhyUnknown is string why ? $"{Saw}; {why}" : Saw,
            PossibleErrorMilligramsPerLitre = Error.Later,
            ErrorAsFoundMilligramsPerLitre = Error.AsFound,
            ErrorLaterMilligramsPerLitre = Error.Later,
            WhatToDo = WhatToDo,
            Reason = Severity == FindingSeverity.NeedsReason ? reason : null,
        };
    }

    /// <summary>Text with numbers in it, the same in every culture.</summary>
    internal static string Text(FormattableString text)
    {
        return text.ToString(CultureInfo.InvariantCulture);
    }
}
