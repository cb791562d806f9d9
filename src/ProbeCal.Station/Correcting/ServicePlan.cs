using System.Collections.Generic;
using ProbeCal.Station.CalibrationLog;

namespace ProbeCal.Station.Correcting;

/// <summary>What service visits and later calibrations say about a deployment, as errors over time.</summary>
internal sealed class ServicePlan
{
    /// <summary>Form in which drift is taken back.</summary>
    internal required string DriftForm { get; init; }

    /// <summary>Form in which fouling is taken back.</summary>
    internal required string FoulingForm { get; init; }

    /// <summary>Drift over time.</summary>
    internal required IReadOnlyList<ErrorRamp> Drift { get; init; }

    /// <summary>Fouling over time.</summary>
    internal required IReadOnlyList<ErrorRamp> Fouling { get; init; }

    /// <summary>Limits of the corrections.</summary>
    internal required ServiceLimits Limits { get; init; }

    /// <summary>The visits and calibrations that were looked at, with what each said.</summary>
    internal required IReadOnlyList<ServiceFinding> Findings { get; init; }

    /// <summary>Times in which somebody was at the probe: from before to after cleaning.</summary>
    internal required IReadOnlyList<(long FromTicks, long ToTicks)> AtService { get; init; }

    /// <summary>When the last visit was; 0 when there was none.</summary>
    internal long LastVisitTicks { get; init; }

    /// <summary>Which readings lie between two passing checks.</summary>
    internal required Brackets Brackets { get; init; }

    /// <summary>True when nobody was there and no drift is asked for: values are as live.</summary>
    internal bool IsEmpty => Findings.Count == 0;
}

/// <summary>What one visit, or one later calibration, said.</summary>
/// <param name="Entry">Id of its entry in the log.</param>
/// <param name="Sha256">Hash of that entry.</param>
/// <param name="AtTicks">When.</param>
/// <param name="Fouling">Fouling error Ef, mg/L; NaN when none was determined.</param>
/// <param name="FoulingPercent">The same, % of the fouled reading.</param>
/// <param name="Drift">Drift error Ed, mg/L; NaN when none was determined.</param>
/// <param name="DriftPercent">The same, % of the reading in the standard.</param>
/// <param name="Total">Sum of the absolute errors, mg/L.</param>
/// <param name="Applied">True when it is above the limit from which errors are taken back.</param>
internal sealed record ServiceFinding(
    string Entry, string Sha256, long AtTicks, double Fouling, double FoulingPercent, double Drift, double DriftPercent, double Total, bool Applied);
