using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Linq;
using System.Threading;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Correcting;

/// <summary>Makes the next revision of what a changed log touched: calibrations and visits that were withdrawn, replaced or added.</summary>
public static class CorrectionAgain
{
    /// <summary>Does again what needs it.</summary>
    /// <param name="path">A revision, or a folder with revisions: of each input and probe the latest counts.</param>
    /// <param name="output">Where the next output goes; null for the name of the old one with its number. Not for a folder.</param>
    /// <param name="log">The calibration log as it stands now.</param>
    /// <param name="surroundings">Clock, program and ways to tell a person.</param>
    /// <param name="stop">Stops the work.</param>
    /// <returns>Paths of the revisions that were made.</returns>
    /// <exception cref="InputException">There is no such revision, its input has changed, or a later one exists.</exception>
    public static IReadOnlyList<string> Run(string path, string? output, CalibrationLogStore log, CorrectionSurroundings surroundings, CancellationToken stop)
    {
        bool isFolder = Directory.Exists(path);
        if (isFolder && output is not null)
        {
            throw Wrong.Input("--output", output, "a folder of revisions makes as many outputs as it needs, each with the next number in its name");
        }

        List<string> made = [];
        foreach ((string file, Revision revision) in isFolder ? Latest(path) : [(path, One(path))])
        {
            IReadOnlyList<string> because = Reasons(log, revision);
            if (because.Count == 0)
            {
                surroundings.Say($"{Wrong.Shown(file)}: nothing that it rests on has changed");
                continue;
            }

            foreach (string reason in because)
            {
                surroundings.Say($"{Wrong.Shown(file)}: {reason}");
            }

            string folder = Path.GetDirectoryName(Path.GetFullPath(file))!;
            string input = Path.GetFullPath(Path.Combine(folder, revision.Input.File));
            RequireSameInput(input, revision, file);
            CorrectionRequest request = Renewed(log, revision) with { Input = input, Output = output ?? Path.Combine(folder, NextName(revision)) };
            made.Add(CorrectionRun.Run(request, log, surroundings, because, stop));
        }

        return made;
    }

    /// <summary>Why a revision no longer says what the log says; empty when it does.</summary>
    internal static IReadOnlyList<string> Reasons(CalibrationLogStore log, Revision revision)
    {
        List<string> reasons = [];
        foreach (string id in revision.Calibrations.Where(static each => each.Rows != 0).Select(static each => each.Id).Concat(revision.Service.Findings.Select(static each => each.Entry)).Distinct())
        {
            if (log.WithdrawalOf(id) is AmendmentRecord withdrawal)
            {
                reasons.Add($"{id} was withdrawn: {withdrawal.Reason}");
            }
            else if (log.ReplacementOf(id) is CalibrationRecord replacement)
            {
                reasons.Add($"{id} was replaced by {replacement.Id}{(replacement.ReplacesReason is string why ? ": " + why : "")}");
            }
        }

        if (revision.Request.Calibration is null)
        {
            HashSet<string> used = [.. revision.Calibrations.Select(static each => each.Id)];
            foreach (CalibrationInUse each in InForceNow(log, revision))
            {
                if (!used.Contains(each.Record.Id) && each.FromTicks <= revision.LastUtc.UtcTicks && revision.FirstUtc.UtcTicks < each.ToTicks)
                {
                    reasons.Add($"{each.Record.Id} is in force for some of the rows and was not in the log then");
                }
            }
        }

        HashSet<string> seen = [.. revision.Service.Findings.Select(static each => each.Entry)];
        foreach (VisitRecord visit in log.Entries.Select(static each => each.Entry).OfType<VisitRecord>())
        {
            bool isNew = visit.Probe == revision.Probe && revision.Log.Count < visit.Index && visit.LogId == revision.Log.LogId && !log.IsWithdrawn(visit.Id);
            if (isNew && !seen.Contains(visit.Id) && revision.FirstUtc < visit.AfterUtc)
            {
                reasons.Add($"visit {visit.Id} was added");
            }
        }

        bool unbracketed = revision.Counts.Reasons.Any(static each => each.Text == RowFlags.NotBracketed);
        StoredCalibration? check = log.Records.FirstOrDefault(each => each.Record.Probe.Id == revision.Probe && revision.Log.Count < each.Record.Index && revision.FirstUtc < each.Record.CompletedUtc);
        if (unbracketed && check is not null)
        {
            reasons.Add($"{check.Record.Id} was added, which bears on rows that were not between two passing checks");
        }

        return reasons;
    }

    private static IReadOnlyList<CalibrationInUse> InForceNow(CalibrationLogStore log, Revision revision)
    {
        try
        {
            return CalibrationInUse.Find(log, revision.Request);
        }
        catch (InputException)
        {
            // None holds any more: the withdrawals say so already, and the run itself will.
            return [];
        }
    }

    /// <summary>The request with a calibration that still holds in place of one that was named and does not.</summary>
    private static CorrectionRequest Renewed(CalibrationLogStore log, Revision revision)
    {
        string? id = revision.Request.Calibration;
        while (id is not null && log.ReplacementOf(id) is CalibrationRecord replacement)
        {
            id = replacement.Id;
        }

        return id is not null && !log.IsWithdrawn(id)
            ? revision.Request with { Calibration = id }
            : revision.Request with { Calibration = null, Probe = revision.Probe };
    }

    private static (string File, Revision Revision)[] Latest(string folder)
    {
        (string File, Revision Revision)[] latest = [.. RevisionJson.In(folder)
            .GroupBy(static each => (each.Revision.Input.Sha256, each.Revision.Probe))
            .Select(static group => group.MaxBy(static each => each.Revision.Number))
            .Select(static each => (each.Path, each.Revision))];
        return latest.Length != 0 ? latest : throw Wrong.Input("--again", folder, "no revision stands in this folder; their names end in " + Revision.Suffix);
    }

    private static Revision One(string path)
    {
        Revision revision = RevisionJson.Read("--again", path);
        string folder = Path.GetDirectoryName(Path.GetFullPath(path))!;
        (string Path, Revision Revision) later = RevisionJson.In(folder)
            .Where(each => each.Revision.Input.Sha256 == revision.Input.Sha256 && each.Revision.Probe == revision.Probe && revision.Number < each.Revision.Number)
            .Select(static each => (each.Path, each.Revision))
            .FirstOrDefault();
        return later.Revision is null ? revision : throw Wrong.Input("--again", path, $"revision {Number.Print(later.Revision.Number)} has followed it already; name {Wrong.Shown(Path.GetFileName(later.Path))}, or the folder");
    }

    private static void RequireSameInput(string input, Revision revision, string file)
    {
        if (!File.Exists(input))
        {
            throw new InputException($"{Wrong.Shown(file)}: its input {Wrong.Shown(revision.Input.File)} is not there any more");
        }

        using FileStream stream = File.OpenRead(input);
        if (Convert.ToHexStringLower(System.Security.Cryptography.SHA256.HashData(stream)) != revision.Input.Sha256)
        {
            throw new InputException($"{Wrong.Shown(file)}: its input {Wrong.Shown(revision.Input.File)} has other bytes now; raw readings are never altered, so put the old file back, or correct the new one as an input of its own");
        }
    }

    /// <summary>june-r1.csv becomes june-r2.csv, june.csv becomes june-r2.csv.</summary>
    private static string NextName(Revision revision)
    {
        string stem = Path.GetFileNameWithoutExtension(revision.Output.File);
        int dash = stem.LastIndexOf("-r", StringComparison.Ordinal);
        bool numbered = 0 < dash && dash + 2 < stem.Length && stem.AsSpan(dash + 2).IndexOfAnyExceptInRange('0', '9') < 0;
        return string.Create(CultureInfo.InvariantCulture, $"{(numbered ? stem[..dash] : stem)}-r{revision.Number + 1}{Path.GetExtension(revision.Output.File)}");
    }
}
