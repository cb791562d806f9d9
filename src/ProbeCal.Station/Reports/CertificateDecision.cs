using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>How it was judged, what the uncertainty is made of, and what was overridden.</summary>
internal static class CertificateDecision
{
    internal static List<ReportBlock> Decision(CalibrationRecord record)
    {
        // The same few sources stand behind many limits: each is written once.
        List<string> sources = [.. record.Limits.Select(static limit => limit.Source).Distinct()];
        return
        [
            ColumnChoice.Table(
                [
                    CertificateNames.Words("limit-check"), CertificateNames.Figures("limit-found"), CertificateNames.Figures("limit-expanded"), CertificateNames.Figures("limit-coverage"),
                    CertificateNames.Words("limit-limit"), CertificateNames.Figures("limit-guard-band"), CertificateNames.Figures("limit-ratio"), CertificateNames.Words("limit-verdict"),
                    CertificateNames.Words("limit-source"),
                ],
                record.Limits.Select(limit => new[]
                {
                    limit.Check,
                    limit.Found is double found ? $"{ReportText.Signed(found, 3)} {limit.Unit}" : null,
                    limit.ExpandedUncertainty is double expanded ? $"{ReportText.Uncertainty(expanded)} {limit.Unit}" : null,
                    ReportText.Fixed(limit.CoverageFactor, 2),
                    limit.Limit + (limit.Applied is string applied ? ": " + applied : ""),
                    limit.GuardBand is double band ? $"{ReportText.Uncertainty(band)} {limit.Unit}" : null,
                    limit.LimitToUncertainty is double ratio ? ReportText.Uncertainty(ratio) : null,
                    limit.Verdict + (limit.Decides ? "" : " (informs)"),
                    $"[{Number.Print(1 + sources.IndexOf(limit.Source))}]",
                })),
            new ReportSentence("limit-sources", string.Join("; ", sources.Select(static (source, i) => $"[{Number.Print(i + 1)}] {source}")) + "."),
            new ReportSentence("decision-rule", "Decision rule: " + record.Result.DecisionRule + ". A check that informs does not decide.", RunsOn: true),
        ];
    }

    internal static ReportTable Budget(CalibrationRecord record)
    {
        return ColumnChoice.Table(
            [
                CertificateNames.Words("budget-input"), CertificateNames.Figures("budget-value"), CertificateNames.Figures("budget-uncertainty"), CertificateNames.Words("budget-unit"),
                CertificateNames.Words("budget-distribution"), CertificateNames.Figures("budget-sensitivity"), CertificateNames.Figures("budget-contribution"), CertificateNames.Figures("budget-share"),
                CertificateNames.Words("budget-source"),
            ],
            record.Budget.Select(static line => new[]
            {
                line.Input, ReportText.Few(line.Value), ReportText.Uncertainty(line.StandardUncertainty), line.Unit, line.Distribution, ReportText.Few(line.SensitivityPercent),
                Number.Fixed(line.SlopePercent, 3), ReportText.Fixed(line.SharePercent, 1), line.Source,
            }));
    }

    internal static ReportBlock Findings(CalibrationRecord record)
    {
        RecordedFinding[] overridden = [.. record.Findings.Where(static finding => finding.Severity != "note" || finding.Reason is not null)];
        int notes = record.Findings.Length - overridden.Length;
        string more = notes == 0 ? "" : $" {Number.Print(notes)} {(notes == 1 ? "note is" : "notes are")} in the record.";
        return overridden.Length == 0
            ? new ReportSentence("no-findings", "None." + more)
            : ColumnChoice.Table(
                [
                    CertificateNames.Words("finding-guard"), CertificateNames.Words("finding-saw"), CertificateNames.Figures("finding-error-as-found"), CertificateNames.Figures("finding-error-later"),
                    CertificateNames.Words("finding-what-to-do"), CertificateNames.Words("finding-reason"),
                ],
                overridden.Select(static finding => new[]
                {
                    finding.Guard, finding.Saw, ReportText.Signed(finding.ErrorAsFoundMilligramsPerLitre ?? finding.PossibleErrorMilligramsPerLitre, 2),
                    ReportText.Signed(finding.ErrorLaterMilligramsPerLitre, 2), finding.WhatToDo, finding.Reason ?? finding.Severity,
                }));
    }
}
