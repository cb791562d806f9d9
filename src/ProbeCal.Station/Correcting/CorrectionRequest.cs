using System;
using System.Collections.Generic;

namespace ProbeCal.Station.Correcting;

/// <summary>What is asked of a correction run, as texts of options: the revision keeps them, so that the run can be done again.</summary>
public sealed record CorrectionRequest
{
    /// <summary>The table of raw readings. It is only read.</summary>
    public required string Input { get; init; }

    /// <summary>Where the rows go with the results behind them.</summary>
    public required string Output { get; init; }

    /// <summary>Which quantity is which column: <c>signal=DO raw [nA]</c>.</summary>
    public required IReadOnlyList<string> Columns { get; init; }

    /// <summary>The probe whose calibration in force at each reading's time corrects it; null where <see cref="Calibration"/> is given.</summary>
    public string? Probe { get; init; }

    /// <summary>Id of the one calibration for all rows; null where <see cref="Probe"/> is given.</summary>
    public string? Calibration { get; init; }

    /// <summary><c>comma</c>, <c>semicolon</c> or <c>tab</c>; null to tell it from the header.</summary>
    public string? Separator { get; init; }

    /// <summary>Number of the header's line; null for the first that is neither blank nor a comment.</summary>
    public string? HeaderLine { get; init; }

    /// <summary>True when commas are the decimal marks of the file.</summary>
    public bool DecimalComma { get; init; }

    /// <summary>Offset of the file's clock from UTC, <c>+02:00</c>; null when the times carry their own.</summary>
    public string? TimeOffset { get; init; }

    /// <summary>Pattern of the times, <c>epoch</c> or <c>epoch-ms</c>; null for year first.</summary>
    public string? TimeForm { get; init; }

    /// <summary>Temperature of all rows; null when a column has it.</summary>
    public string? Temperature { get; init; }

    /// <summary>Absolute station pressure of all rows with its unit, or <c>none</c>; null when a column has it.</summary>
    public string? Pressure { get; init; }

    /// <summary>Practical salinity of all rows, or <c>none</c>; null when a column has it.</summary>
    public string? Salinity { get; init; }

    /// <summary>Depth of the probe in all rows; null when a column has it, or for the surface.</summary>
    public string? Depth { get; init; }

    /// <summary>Altitude by which pressures are judged; null judges none.</summary>
    public string? Altitude { get; init; }

    /// <summary>Solubility equation; null for the usual one.</summary>
    public string? Equation { get; init; }

    /// <summary>How the water moved: <c>stirred</c>, <c>still</c>, <c>flow-insensitive</c>; null as at the calibration.</summary>
    public string? Stirring { get; init; }

    /// <summary>Standard uncertainty of one signal, in its unit; null takes it from the calibration.</summary>
    public string? SignalUncertainty { get; init; }

    /// <summary>Standard uncertainty of a temperature without its thermometer's offset; null for the usual one.</summary>
    public string? TemperatureUncertainty { get; init; }

    /// <summary>Standard uncertainty of the pressure; null for that of a barometer read to 1 mmHg.</summary>
    public string? PressureUncertainty { get; init; }

    /// <summary>Standard uncertainty of the salinity; null for the usual one.</summary>
    public string? SalinityUncertainty { get; init; }

    /// <summary>Which columns are written and with how many decimals: <c>mg/L:3</c>, <c>u(mg/L):shortest</c>; empty for the usual ones.</summary>
    public IReadOnlyList<string> Write { get; init => field = value ?? []; } = [];

    /// <summary>Form of the drift correction: <c>slope-and-zero</c>, <c>percent</c>, <c>constant</c> or <c>none</c>.</summary>
    public string Drift { get; init => field = value ?? CorrectionForms.SlopeAndZero; } = CorrectionForms.SlopeAndZero;

    /// <summary>What drift is told from: <c>visits</c> or <c>calibrations</c>.</summary>
    public string DriftFrom { get; init => field = value ?? CorrectionForms.Visits; } = CorrectionForms.Visits;

    /// <summary>Form of the fouling correction.</summary>
    public string Fouling { get; init => field = value ?? CorrectionForms.SlopeAndZero; } = CorrectionForms.SlopeAndZero;

    /// <summary>Limits of the record's corrections.</summary>
    public ServiceLimits Limits { get; init => field = value ?? new(); } = new();
}

/// <summary>The forms in which drift and fouling are taken back, by the names that options and revisions write.</summary>
public static class CorrectionForms
{
    /// <summary>Slope and zero move linearly in time, so that the correction scales with the reading.</summary>
    public const string SlopeAndZero = "slope-and-zero";

    /// <summary>The error in per cent, prorated (TM 1-D3).</summary>
    public const string Percent = "percent";

    /// <summary>The error in mg/L, prorated (TM 1-D3).</summary>
    public const string Constant = "constant";

    /// <summary>No correction.</summary>
    public const string None = "none";

    /// <summary>Drift from the standards of service visits.</summary>
    public const string Visits = "visits";

    /// <summary>Drift from one calibration to the next.</summary>
    public const string Calibrations = "calibrations";

    /// <summary>All forms.</summary>
    public static IReadOnlyList<string> Forms { get; } = [SlopeAndZero, Percent, Constant, None];

    /// <summary>All that drift can be told from.</summary>
    public static IReadOnlyList<string> DriftSources { get; } = [Visits, Calibrations];
}

/// <summary>What a run is done with.</summary>
/// <param name="Time">The clock: the time in the revision, and when progress is shown.</param>
/// <param name="Software">Program and version, as the revision keeps it.</param>
/// <param name="Say">Takes lines for a person.</param>
/// <param name="Progress">Told now and then how far the work is.</param>
public sealed record CorrectionSurroundings(TimeProvider Time, string Software, Action<string> Say, Action<CorrectionProgress> Progress);

/// <summary>How far a run is.</summary>
/// <param name="Bytes">Bytes of the input that were worked through.</param>
/// <param name="TotalBytes">Bytes of the input.</param>
/// <param name="Rows">Rows so far.</param>
/// <param name="Elapsed">Time since the first row.</param>
public readonly record struct CorrectionProgress(long Bytes, long TotalBytes, long Rows, TimeSpan Elapsed);
