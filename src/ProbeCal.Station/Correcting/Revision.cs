using System;
using System.Collections.Generic;
using System.IO;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Correcting;

/// <summary>
/// What one correction run did: from which bytes, with which calibrations, visits, forms and limits, to which bytes. It stands beside the output
/// and is never overwritten; paths in it are relative to its own folder.
/// </summary>
internal sealed record Revision
{
    internal const string FormatName = "probecal-revision";
    internal const int CurrentVersion = 1;

    /// <summary>What the name of a revision's file ends in, behind the name of the output.</summary>
    internal const string Suffix = ".revision.json";

    public string Format { get; init; } = FormatName;

    public int Version { get; init; } = CurrentVersion;

    /// <summary>1 for the first of an input and probe; one more for each that follows.</summary>
    public required int Number { get; init; }

    /// <summary>The revision before; none for the first.</summary>
    public RevisionFile? Previous { get; init; }

    /// <summary>Why it was made; none for one that a person asked for.</summary>
    public string[] Because { get; init => field = value ?? []; } = [];

    public required DateTimeOffset MadeUtc { get; init; }

    public required string Software { get; init; }

    /// <summary>The probe.</summary>
    public required string Probe { get; init; }

    public required RevisionFile Input { get; init; }

    public required RevisionFile Output { get; init; }

    /// <summary>Earliest time of a corrected row, UTC.</summary>
    public required DateTimeOffset FirstUtc { get; init; }

    /// <summary>Latest time of a corrected row, UTC.</summary>
    public required DateTimeOffset LastUtc { get; init; }

    /// <summary>What was asked for, as the options' texts.</summary>
    public required CorrectionRequest Request { get; init; }

    public required RevisionLog Log { get; init; }

    public required RevisionCalibration[] Calibrations { get; init; }

    /// <summary>Columns behind each row, the status last.</summary>
    public required RevisionColumn[] Columns { get; init; }

    public required RevisionService Service { get; init; }

    public required RevisionCounts Counts { get; init; }

    /// <summary>Days by the clock of <see cref="CorrectionRequest.TimeOffset"/>, or of UTC, with their lowest rating; empty where nothing was rated.</summary>
    public required RevisionDay[] Days { get; init; }

    /// <summary>The file of the revision that belongs to an output.</summary>
    internal static string PathFor(string output)
    {
        return output + Suffix;
    }
}

/// <summary>A file by its name and its bytes.</summary>
/// <param name="File">Path, relative to the revision's folder.</param>
/// <param name="Sha256">SHA-256 of its bytes, lower-case hex.</param>
internal sealed record RevisionFile(string File, string Sha256);

/// <summary>The calibration log as it stood.</summary>
internal sealed record RevisionLog(string LogId, long Count, string HeadSha256);

/// <summary>A calibration with the time in which it corrected.</summary>
/// <param name="Id">Its id.</param>
/// <param name="Sha256">Hash of its record.</param>
/// <param name="FromUtc">From when on; none where it was named for all rows.</param>
/// <param name="ToUtc">When the next took over; none for the last.</param>
/// <param name="Rows">How many rows it corrected.</param>
internal sealed record RevisionCalibration(string Id, string Sha256, DateTimeOffset? FromUtc, DateTimeOffset? ToUtc, long Rows);

/// <summary>A column behind each row.</summary>
/// <param name="Name">As <c>--write</c> names it.</param>
/// <param name="Header">As the output's header has it.</param>
/// <param name="Decimals">Decimals; none for the shortest text that reads back, and for texts.</param>
internal sealed record RevisionColumn(string Name, string Header, int? Decimals);

/// <summary>How drift and fouling were taken back.</summary>
internal sealed record RevisionService
{
    /// <summary>Form for drift.</summary>
    public required string DriftForm { get; init; }

    /// <summary>What drift was told from.</summary>
    public required string DriftFrom { get; init; }

    /// <summary>Form for fouling.</summary>
    public required string FoulingForm { get; init; }

    public required ServiceLimits Limits { get; init; }

    /// <summary>What was looked at and what it said.</summary>
    public required RevisionFinding[] Findings { get; init; }

    public required RevisionRamp[] Drift { get; init; }

    public required RevisionRamp[] Fouling { get; init; }

    /// <summary>Times in which somebody was at the probe.</summary>
    public required RevisionSpan[] AtService { get; init; }

    /// <summary>When it was last cleaned; none where fouling plays no part.</summary>
    public DateTimeOffset? LastVisitUtc { get; init; }
}

/// <summary>What a visit or a later calibration said; numbers are none where they were not determined.</summary>
internal sealed record RevisionFinding(
    string Entry, string Sha256, DateTimeOffset AtUtc, double? FoulingMilligramsPerLitre, double? FoulingPercent, double? DriftMilligramsPerLitre,
    double? DriftPercent, double TotalMilligramsPerLitre, bool Applied);

/// <summary>An error that grew from an onset to the moment at which it was found.</summary>
internal sealed record RevisionRamp(
    DateTimeOffset FromUtc, DateTimeOffset? ToUtc, DateTimeOffset OnsetUtc, DateTimeOffset FoundUtc, ErrorState Start, ErrorState End, string Found, bool Held);

/// <summary>A span of time.</summary>
internal sealed record RevisionSpan(DateTimeOffset FromUtc, DateTimeOffset ToUtc);

/// <summary>How the rows came out.</summary>
internal sealed record RevisionCounts(long Rows, long Corrected, long Flagged, long Refused, long Blank, RevisionReason[] Reasons);

/// <summary>A reason by which rows were flagged or refused.</summary>
internal sealed record RevisionReason(string Word, string Text, long Rows, long FirstLine);

/// <summary>A day with the lowest rating in it.</summary>
/// <param name="Day">The day.</param>
/// <param name="Rating">Its lowest rating.</param>
/// <param name="Rows">Rated rows.</param>
/// <param name="LargestSum">Largest sum of absolute corrections, mg/L.</param>
internal sealed record RevisionDay(DateOnly Day, string Rating, long Rows, double LargestSum);

/// <summary>Revisions as files.</summary>
internal static class RevisionJson
{
    private static readonly RevisionJsonContext Context = new(new JsonSerializerOptions
    {
        PropertyNamingPolicy = JsonNamingPolicy.CamelCase,
        DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull,
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
        WriteIndented = true,
        NewLine = "\n",
    });

    internal static byte[] ToBytes(Revision revision)
    {
        return JsonSerializer.SerializeToUtf8Bytes(revision, Context.Revision);
    }

    /// <summary>Reads a revision.</summary>
    /// <exception cref="InputException">There is none at that path, or it is of a newer version.</exception>
    internal static Revision Read(string option, string path)
    {
        byte[] bytes;
        try
        {
            bytes = File.ReadAllBytes(path);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            throw Wrong.Input(option, path, "cannot be read; name the file that stands beside a corrected output and ends in " + Revision.Suffix);
        }

        return TryRead(bytes, out string problem) ?? throw Wrong.Input(option, path, problem);
    }

    /// <summary>The revision in some bytes; null with the problem when there is none.</summary>
    internal static Revision? TryRead(ReadOnlySpan<byte> bytes, out string problem)
    {
        problem = "this is no revision of a correction; its name ends in " + Revision.Suffix;
        try
        {
            RevisionHead? head = JsonSerializer.Deserialize(bytes, Context.RevisionHead);
            if (head?.Format != Revision.FormatName)
            {
                return null;
            }

            if (Revision.CurrentVersion < head.Version)
            {
                problem = $"version {Number.Print(head.Version)} of the revision is newer than this program, which reads up to {Number.Print(Revision.CurrentVersion)}; use a newer probecal";
                return null;
            }

            return JsonSerializer.Deserialize(bytes, Context.Revision);
        }
        catch (JsonException damaged)
        {
            problem = "this revision cannot be read (" + damaged.Message.ReplaceLineEndings(" ") + ")";
            return null;
        }
    }

    /// <summary>Revisions that stand in a folder, with their files; what is no revision is passed over.</summary>
    internal static IEnumerable<(string Path, Revision Revision, byte[] Bytes)> In(string folder)
    {
        string[] paths = Directory.Exists(folder) ? Directory.GetFiles(folder, "*" + Revision.Suffix) : [];
        Array.Sort(paths, StringComparer.Ordinal);
        foreach (string path in paths)
        {
            byte[] bytes = File.ReadAllBytes(path);
            if (TryRead(bytes, out _) is Revision revision)
            {
                yield return (path, revision, bytes);
            }
        }
    }
}

/// <summary>The two properties that decide whether the rest can be read.</summary>
internal sealed record RevisionHead
{
    public string? Format { get; init; }

    public int Version { get; init; }
}

[JsonSerializable(typeof(Revision))]
[JsonSerializable(typeof(RevisionHead))]
internal sealed partial class RevisionJsonContext : JsonSerializerContext;
