namespace ProbeCal.Station.CalibrationLog;

/// <summary>A limit that was applied, with its source, what was found and how it came out.</summary>
public sealed record RecordedLimit
{
    /// <summary>What was judged: <c>as-left</c>, <c>zero</c>, <c>as-found</c>, <c>slope</c> ….</summary>
    public required string Check { get; init; }

    /// <summary>The limit in words with its unit: <c>0.2 mg/L or 2 %</c>.</summary>
    public required string Limit { get; init; }

    /// <summary>Which part of the limit applied, when it has several.</summary>
    public string? Applied { get; init; }

    /// <summary>Where the limit comes from.</summary>
    public required string Source { get; init; }

    /// <summary>What was found, in the unit of the limit; none when it could not be judged.</summary>
    public double? Found { get; init; }

    /// <summary>Unit of <see cref="Found"/>.</summary>
    public required string Unit { get; init; }

    /// <summary>Expanded uncertainty of <see cref="Found"/>, in <see cref="Unit"/>; none in records of version 1.</summary>
    public double? ExpandedUncertainty { get; init; }

    /// <summary>Coverage factor of <see cref="ExpandedUncertainty"/>.</summary>
    public double? CoverageFactor { get; init; }

    /// <summary>Limit over <see cref="ExpandedUncertainty"/>.</summary>
    public double? LimitToUncertainty { get; init; }

    /// <summary>Width by which the limit was drawn in, in <see cref="Unit"/>; none for simple acceptance.</summary>
    public double? GuardBand { get; init; }

    /// <summary><c>pass</c>, <c>fail</c>, <c>inconclusive</c> (between the guarded limit and the limit), <c>not-judged</c>.</summary>
    public required string Verdict { get; init; }

    /// <summary>True when the verdict decides about the whole; false when it only informs.</summary>
    public required bool Decides { get; init; }
}

/// <summary>What a guard saw, and why the person went on all the same, where they did.</summary>
public sealed record RecordedFinding
{
    /// <summary>The guard, for example <c>pressure-near-sea-level-value</c>.</summary>
    public required string Guard { get; init; }

    /// <summary><c>note</c>, <c>overridden</c> or <c>refused</c>.</summary>
    public required string Severity { get; init; }

    /// <summary>What it saw, in one sentence.</summary>
    public required string Saw { get; init; }

    /// <summary>The error this could cause in a reading at the calibration's conditions, mg/L; none when it cannot be said.</summary>
    public double? PossibleErrorMilligramsPerLitre { get; init; }

    /// <summary>Error of the reading as found at this point, if the finding is true: reading less truth, mg/L; none when it cannot be said.</summary>
    public double? ErrorAsFoundMilligramsPerLitre { get; init; }

    /// <summary>Error of later readings after adjusting here, if the finding is true: of the opposite sign, mg/L; none when it cannot be said.</summary>
    public double? ErrorLaterMilligramsPerLitre { get; init; }

    /// <summary>What to do about it, in one sentence; none in records of version 1.</summary>
    public string? WhatToDo { get; init; }

    /// <summary>The reason the person gave for going on; none for a note.</summary>
    public string? Reason { get; init; }
}

/// <summary>One line of the uncertainty budget.</summary>
public sealed record RecordedContribution
{
    /// <summary>What contributes.</summary>
    public required string Input { get; init; }

    /// <summary>Standard uncertainty of the input, in <see cref="Unit"/>.</summary>
    public required double StandardUncertainty { get; init; }

    /// <summary>Unit of the input.</summary>
    public required string Unit { get; init; }

    /// <summary>Value of the input, in <see cref="Unit"/>; none in records of version 1.</summary>
    public double? Value { get; init; }

    /// <summary>Distribution of the input: <c>normal</c>, <c>rectangular</c>, <c>triangular</c>; none in records of version 1.</summary>
    public string? Distribution { get; init; }

    /// <summary>Relative change of the slope per unit of the input, in % per <see cref="Unit"/>, with its sign; none in records of version 1.</summary>
    public double? SensitivityPercent { get; init; }

    /// <summary>Contribution to the slope, % of the slope (k = 1).</summary>
    public required double SlopePercent { get; init; }

    /// <summary>Share of the variance, %; none in records of version 1.</summary>
    public double? SharePercent { get; init; }

    /// <summary>Where the input's uncertainty comes from.</summary>
    public required string Source { get; init; }
}

/// <summary>Slope and zero as left, and the verdict.</summary>
public sealed record RecordedResult
{
    /// <summary>Slope: signal per hPa of oxygen at the reference temperature of the coefficient.</summary>
    public required double Slope { get; init; }

    /// <summary>Standard uncertainty of <see cref="Slope"/>, all contributions.</summary>
    public required double SlopeStandardUncertainty { get; init; }

    /// <summary>Zero signal: what the probe gives in oxygen-free water.</summary>
    public required double Zero { get; init; }

    /// <summary>Standard uncertainty of <see cref="Zero"/>.</summary>
    public required double ZeroStandardUncertainty { get; init; }

    /// <summary>True when every limit that decides was kept.</summary>
    public required bool Pass { get; init; }

    /// <summary>Why it failed, one sentence each; empty when it passed.</summary>
    public required string[] Reasons { get; init; }

    /// <summary>How the limits were applied.</summary>
    public required string DecisionRule { get; init; }
}

/// <summary>The zero that the slope rests on.</summary>
public sealed record RecordedZero
{
    /// <summary>True when it was read in oxygen-free water, now or at an earlier calibration; false when it is assumed.</summary>
    public required bool IsMeasured { get; init; }

    /// <summary>Raw signal at zero.</summary>
    public required double Signal { get; init; }

    /// <summary>Its standard uncertainty, the oxygen left in the solution counted in.</summary>
    public required double SignalStandardUncertainty { get; init; }

    /// <summary>Temperature at which it was read, °C.</summary>
    public required double TemperatureCelsius { get; init; }

    /// <summary>Absolute pressure at which it was read, hPa.</summary>
    public required double PressureHectopascal { get; init; }

    /// <summary><c>measured</c>, <c>assumed</c>, <c>fit</c> for one that a fit over several points gave, or <c>previous:ID</c> for one carried over from an earlier calibration.</summary>
    public required string Source { get; init; }
}
