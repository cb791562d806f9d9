using System.Collections.Generic;

namespace ProbeCal.Station.Calibrating;

/// <summary>The names of the guards, as records, options and messages use them.</summary>
public static class GuardNames
{
    /// <summary>Pressure that cannot be, or hardly can be, at the altitude.</summary>
    public const string PressureAtAltitude = "pressure-at-altitude";

    /// <summary>Pressure that may have been reduced to sea level.</summary>
    public const string PressureReduced = "pressure-reduced-to-sea-level";

    /// <summary>Pressure far from the last one at this site.</summary>
    public const string PressureHere = "pressure-against-last-here";

    /// <summary>Temperature outside what water or the equation allows.</summary>
    public const string TemperatureRange = "temperature-range";

    /// <summary>Typed temperature against the probe's own thermometer.</summary>
    public const string TemperatureTwice = "temperature-against-probe";

    /// <summary>Temperature outside the fitted range of the coefficient.</summary>
    public const string CoefficientRange = "coefficient-range";

    /// <summary>An input that does not move at all.</summary>
    public const string DeadInput = "dead-input";

    /// <summary>An input at the end of its range.</summary>
    public const string SaturatedInput = "saturated-input";

    /// <summary>A slope that has no right sign, or is far from the last one.</summary>
    public const string Slope = "slope";

    /// <summary>A zero that is above the 100 % point or larger than the limit.</summary>
    public const string Zero = "zero";

    /// <summary>Stirring that a probe of this kind needs and did not get.</summary>
    public const string StirringStill = "stirring";

    /// <summary>A reading before adjustment far from saturation.</summary>
    public const string AsFound = "as-found";

    /// <summary>A clock that stands before the last calibration of this probe.</summary>
    public const string Clock = "clock";

    /// <summary>The guards that a reason can get past.</summary>
    public static IReadOnlyList<string> WithReason { get; } = [PressureAtAltitude, PressureReduced, PressureHere, TemperatureTwice, Slope];
}
