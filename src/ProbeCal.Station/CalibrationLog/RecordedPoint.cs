using System;

namespace ProbeCal.Station.CalibrationLog;

/// <summary>Statistics of one quantity over the window in which a point was taken.</summary>
public sealed record RecordedStatistics
{
    /// <summary>Number of samples.</summary>
    public required int Count { get; init; }

    /// <summary>Mean.</summary>
    public required double Mean { get; init; }

    /// <summary>Standard deviation of the samples about the straight line through them.</summary>
    public required double StandardDeviation { get; init; }

    /// <summary>Slope of the straight line through the samples, per minute.</summary>
    public required double SlopePerMinute { get; init; }

    /// <summary>Standard error of <see cref="SlopePerMinute"/>, the correlation between neighbouring samples counted in.</summary>
    public required double SlopeStandardErrorPerMinute { get; init; }

    /// <summary>Smallest sample.</summary>
    public required double Minimum { get; init; }

    /// <summary>Largest sample.</summary>
    public required double Maximum { get; init; }

    /// <summary>Time from the first sample of the window to the last, s.</summary>
    public required double WindowSeconds { get; init; }
}

/// <summary>One point: what the probe gave in a steady window, and what was true there.</summary>
public sealed record RecordedPoint
{
    /// <summary>
    /// <c>span</c> (the 100 % point, also as found), <c>as-left</c>, <c>zero</c>, or <c>level-1</c>, <c>level-2</c> … for
    /// further points of a fit over several.
    /// </summary>
    public required string Role { get; init; }

    /// <summary>The method by which the truth of this point is known; none where it is the record's.</summary>
    public string? Method { get; init; }

    /// <summary>What the truth of this point rests on, where it is more than temperature and pressure; none otherwise.</summary>
    public RecordedReference? Reference { get; init; }

    /// <summary>Time of the first sample of the window, UTC; the time of typing for a typed reading.</summary>
    public required DateTimeOffset FirstUtc { get; init; }

    /// <summary>Time of the last sample of the window, UTC.</summary>
    public required DateTimeOffset LastUtc { get; init; }

    /// <summary>True when a person typed the reading and there is no window behind it.</summary>
    public required bool Typed { get; init; }

    /// <summary>The raw signal, or what the meter showed.</summary>
    public required RecordedStatistics Signal { get; init; }

    /// <summary>Standard uncertainty of the mean signal, with resolution and drift over the window.</summary>
    public required double SignalStandardUncertainty { get; init; }

    /// <summary>Statistics of the temperature over the window; none when it was typed.</summary>
    public RecordedStatistics? TemperatureStatistics { get; init; }

    /// <summary>Water (or chamber) temperature. Its uncertainty leaves out the thermometer's offset, which the probe's part of the record states.</summary>
    public required RecordedQuantity Temperature { get; init; }

    /// <summary>Absolute station pressure.</summary>
    public required RecordedQuantity Pressure { get; init; }

    /// <summary>Practical salinity set for the concentration.</summary>
    public required RecordedQuantity Salinity { get; init; }

    /// <summary><c>stirred</c>, <c>still</c> or <c>flow-insensitive</c>.</summary>
    public required string Stirring { get; init; }

    /// <summary>Flow factor at the point: 1 where the slope is meant for the same stirring.</summary>
    public required double FlowFactor { get; init; }

    /// <summary>True partial pressure of the gas, hPa.</summary>
    public required double ReferencePartialPressureHectopascal { get; init; }

    /// <summary>Its standard uncertainty, hPa.</summary>
    public required double ReferencePartialPressureUncertaintyHectopascal { get; init; }

    /// <summary>The same as a concentration, mg/L; 0 for a total gas pressure, which is no concentration.</summary>
    public required double ReferenceMilligramsPerLitre { get; init; }

    /// <summary>Its standard uncertainty, mg/L, the equation's own included.</summary>
    public required double ReferenceUncertaintyMilligramsPerLitre { get; init; }

    /// <summary>What the calibration then in force made of the signal, mg/L; none when there was none.</summary>
    public double? ReadingMilligramsPerLitre { get; init; }

    /// <summary>Reading minus reference, mg/L; none when there was no calibration to read by.</summary>
    public double? ErrorMilligramsPerLitre { get; init; }

    /// <summary>The reading as a partial pressure (or total pressure), hPa; none where it was only worked out in mg/L.</summary>
    public double? ReadingHectopascal { get; init; }

    /// <summary>The error as a pressure: reading minus reference, hPa; none where it was only worked out in mg/L.</summary>
    public double? ErrorHectopascal { get; init; }

    /// <summary>The calibration by which <see cref="ReadingMilligramsPerLitre"/> was computed; <c>this</c> for the new one.</summary>
    public string? ReadBy { get; init; }
}
