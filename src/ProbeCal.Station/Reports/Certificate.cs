using System;
using System.Collections.Generic;
using System.Linq;
using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Reports;

/// <summary>Who puts a name to a certificate.</summary>
/// <param name="Name">Name as typed; none when not stated.</param>
/// <param name="Role">Role as typed; none when not stated.</param>
/// <param name="MadeUtc">When the certificate is made, UTC.</param>
/// <param name="Software">Program and version that makes it.</param>
public sealed record CertificateSignature(string? Name, string? Role, DateTimeOffset MadeUtc, string Software);

/// <summary>The certificate of a calibration or a check: what its record says, on a page, and what the log says about the record.</summary>
public static class Certificate
{
    /// <summary>What a certificate of this program is, and what it is not.</summary>
    internal const string Statement = "This is a field calibration record and no accredited certificate.";

    /// <summary>The certificate as a report.</summary>
    /// <param name="log">The log, whose chain must be whole.</param>
    /// <param name="stored">The record.</param>
    /// <param name="signature">Who makes it and when.</param>
    /// <exception cref="WorkFailedException">The chain of the log has a fault.</exception>
    public static Report Of(CalibrationLogStore log, StoredCalibration stored, CertificateSignature signature)
    {
        log.RequireWhole();
        CalibrationRecord record = stored.Record;
        string head = log.Chain.Head;
        string kind = record.Purpose == CalibrationRecord.CheckPurpose ? "Check record " : "Calibration record ";
        List<ReportSection> sections =
        [
            new("Identification", [CertificateIdentity.Identification(record)]),
            new("Method and conditions", [CertificateIdentity.Method(record)]),
            new("Reference equipment", CertificateIdentity.Equipment(record, id => log.EquipmentAt(id, record.CompletedUtc))),
            new("Points", CertificatePoints.Points(record)),
            new("Result", CertificatePoints.Result(record, VerdictOf(record))),
            new("Decision", CertificateDecision.Decision(record)),
            new("Uncertainty of the slope (k = 1)", [CertificateDecision.Budget(record)]),
            new("Findings that were overridden", [CertificateDecision.Findings(record)]),
            new("Made by", Signed(stored, head, signature)),
        ];
        return new Report
        {
            Title = kind + record.Id,
            Verdict = VerdictOf(record),
            Warnings = Warnings(log, record),
            Sections = [.. sections.Where(static section => section.Blocks.Count != 0)],
            Foot = $"{record.Id} · {Statement}",
        };
    }

    /// <summary>The outcome in one word.</summary>
    internal static string VerdictOf(CalibrationRecord record)
    {
        bool undecided = record.Limits.Any(static limit => limit.Decides && limit.Verdict == "inconclusive") && !record.Limits.Any(static limit => limit.Decides && limit.Verdict == "fail");
        return record.Result.Pass ? "PASS" : undecided ? "INCONCLUSIVE" : "FAIL";
    }

    private static List<string> Warnings(CalibrationLogStore log, CalibrationRecord record)
    {
        List<string> warnings = [];
        if (log.WithdrawalOf(record.Id) is AmendmentRecord withdrawal)
        {
            warnings.Add($"WITHDRAWN{(withdrawal.WrittenUtc is DateTimeOffset at ? " on " + ReportText.Time(at) + " UTC" : "")}{(withdrawal.By is string by ? " by " + by : "")} (entry {withdrawal.Id}): {withdrawal.Reason}. Nothing may rest on it.");
        }

        if (log.ReplacementOf(record.Id) is CalibrationRecord later)
        {
            warnings.Add($"REPLACED by record {later.Id}{(later.ReplacesReason is string reason ? ": " + reason : "")}.");
        }

        if (record.Simulated)
        {
            warnings.Add("SIMULATED: no real probe was calibrated.");
        }

        if (record.ImportedFrom is string origin)
        {
            warnings.Add($"IMPORTED from {origin}: this program did not see it being done.");
        }

        if (!record.Result.Pass)
        {
            warnings.Add($"{(VerdictOf(record) == "FAIL" ? "FAILED" : "INCONCLUSIVE")}: it never came into force.");
        }

        return warnings;
    }

    private static List<ReportBlock> Signed(StoredCalibration stored, string head, CertificateSignature signature)
    {
        return
        [
            new ReportFields(
            [
                CertificateNames.Field("signed-name", signature.Name ?? "not stated"),
                CertificateNames.Field("signed-role", signature.Role ?? "not stated"),
                CertificateNames.Field("signed-time", $"{ReportText.Time(signature.MadeUtc)} by {signature.Software}"),
            ]),
            new ReportInk("signature", CertificateNames.All["signature"]),
            new ReportFields(
            [
                CertificateNames.Field("record-sha256", stored.Sha256),
                CertificateNames.Field("log-head", head),
            ]),
            new ReportSentence("statement", Statement + " The hash is over the record as the log keeps it. Keep the head, COUNT:HASH: 'probecal calibrations verify --head' finds against it what was cut off or written anew in the log."),
        ];
    }
}
