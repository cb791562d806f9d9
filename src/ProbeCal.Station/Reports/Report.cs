using System.Collections.Generic;

namespace ProbeCal.Station.Reports;

/// <summary>
/// A document for people as plain data: what it says, not how it looks. The page (HTML), the PDF and the terminal all print
/// the same one, so that none of them says anything of its own.
/// </summary>
public sealed record Report
{
    /// <summary>What it is, for example <c>Calibration record c3a41f09b2e7-0001</c>.</summary>
    public required string Title { get; init; }

    /// <summary>The outcome in one word, for example <c>PASS</c>; empty for a document without one.</summary>
    public required string Verdict { get; init; }

    /// <summary>What must not be overlooked, one sentence each: withdrawn, simulated, failed.</summary>
    public required IReadOnlyList<string> Warnings { get; init; }

    /// <summary>The parts, in the order in which they are printed.</summary>
    public required IReadOnlyList<ReportSection> Sections { get; init; }

    /// <summary>The line at the foot of each page.</summary>
    public required string Foot { get; init; }
}

/// <summary>One part of a report under its own heading.</summary>
/// <param name="Title">The heading.</param>
/// <param name="Blocks">What stands under it.</param>
public sealed record ReportSection(string Title, IReadOnlyList<ReportBlock> Blocks);

/// <summary>Something that stands under a heading.</summary>
public abstract record ReportBlock;

/// <summary>Names with their values.</summary>
/// <param name="Fields">The fields; those without a value are left out beforehand.</param>
public sealed record ReportFields(IReadOnlyList<ReportField> Fields) : ReportBlock;

/// <summary>A name and its value.</summary>
/// <param name="Id">What the field is called in the mapping of docs/certificate.md; it never changes.</param>
/// <param name="Name">The name in print.</param>
/// <param name="Value">The value with its unit.</param>
public sealed record ReportField(string Id, string Name, string Value);

/// <summary>Rows under column heads.</summary>
/// <param name="Columns">The columns.</param>
/// <param name="Rows">The cells of each row, as many as there are columns.</param>
public sealed record ReportTable(IReadOnlyList<ReportColumn> Columns, IReadOnlyList<string[]> Rows) : ReportBlock;

/// <summary>One column of a table.</summary>
/// <param name="Id">As <see cref="ReportField.Id"/>.</param>
/// <param name="Name">The head in print.</param>
/// <param name="IsNumber">True for figures, which are set to the right.</param>
public sealed record ReportColumn(string Id, string Name, bool IsNumber);

/// <summary>A sentence of its own.</summary>
/// <param name="Id">As <see cref="ReportField.Id"/>.</param>
/// <param name="Text">The sentence.</param>
/// <param name="RunsOn">True when it stands in one paragraph with the sentence before.</param>
public sealed record ReportSentence(string Id, string Text, bool RunsOn = false) : ReportBlock;

/// <summary>A ruled line to write on in ink.</summary>
/// <param name="Id">As <see cref="ReportField.Id"/>.</param>
/// <param name="Name">What belongs there.</param>
public sealed record ReportInk(string Id, string Name) : ReportBlock;
