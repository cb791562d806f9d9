using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>
/// The limits a calibration is judged by, each with its source. The defaults are published ones; whoever enters another
/// becomes its source.
/// </summary>
public sealed record CalibrationLimits
{
    /// <summary>Source of the published limits.</summary>
    public const string FieldManual = "USGS 2020, National Field Manual A6.2 (TM 9-A6.2)";

    /// <summary>Source of a limit that the person entered.</summary>
    public const string Entered = "entered for this calibration";

    /// <summary>Source of the band before adjustment.</summary>
    public const string OceanPractice = "OceanGliders oxygen SOP";

    /// <summary>Limit of the as-left and as-found error in mg/L.</summary>
    public double SaturationMilligramsPerLitre { get; init; } = AcceptanceLimit.SaturationMilligramsPerLitre;

    /// <summary>Limit of the as-left and as-found error in % of the reference; either of the two is enough.</summary>
    public double SaturationPercent { get; init; } = AcceptanceLimit.SaturationPercent;

    /// <summary>Source of the two.</summary>
    public string SaturationSource { get; init; } = FieldManual;

    /// <summary>Limit of the zero reading, either sign, mg/L.</summary>
    public double ZeroMilligramsPerLitre { get; init; } = AcceptanceLimit.ZeroMilligramsPerLitre;

    /// <summary>Source of it.</summary>
    public string ZeroSource { get; init; } = FieldManual;

    /// <summary>The limits in hPa of a gas other than oxygen or of total gas pressure; none when none was entered, and then nothing is measured.</summary>
    public PressureLimits? Pressure { get; init; }

    /// <summary>Lower end of the slope window that the person entered; none when not entered. None is ever made up.</summary>
    public double? SlopeLow { get; init; }

    /// <summary>Upper end of it.</summary>
    public double? SlopeHigh { get; init; }

    /// <summary>Lower end of the window of the zero signal that the person entered; none when not entered.</summary>
    public double? ZeroSignalLow { get; init; }

    /// <summary>Upper end of it.</summary>
    public double? ZeroSignalHigh { get; init; }

    /// <summary>True to draw the limits in by the expanded uncertainty of what is judged; false for simple acceptance.</summary>
    public bool GuardBand { get; init; }

    /// <summary>The saturation limit in words.</summary>
    internal string SaturationText => $"{Number.Print(SaturationMilligramsPerLitre)} mg/L or {Number.Print(SaturationPercent)} %, the larger";

    /// <summary>The zero limit in words.</summary>
    internal string ZeroText => Number.Print(ZeroMilligramsPerLitre) + " mg/L";
}
