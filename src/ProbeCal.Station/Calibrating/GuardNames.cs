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

    /// <summary>Pressure that looks as if it stood in another unit.</summary>
    public const string PressureUnit = "pressure-unit";

    /// <summary>Altitude that looks as if feet were taken for metres, or metres for feet.</summary>
    public const string AltitudeUnit = "altitude-unit";

    /// <summary>Temperature that looks as if °F were typed as °C.</summary>
    public const string TemperatureUnit = "temperature-unit";

    /// <summary>Water so cold or warm that the temperature coefficient counts.</summary>
    public const string TemperatureExtreme = "temperature-extreme";

    /// <summary>Salinity that looks like a conductivity.</summary>
    public const string SalinityUnit = "salinity-unit";

    /// <summary>Salinity set in the meter and entered as well.</summary>
    public const string SalinityTwice = "salinity-twice";

    /// <summary>Salinity that was left as it was at the last place.</summary>
    public const string SalinityLeftOver = "salinity-left-over";

    /// <summary>Water supersaturated by bubbles released at depth.</summary>
    public const string BubblesAtDepth = "bubbles-at-depth";

    /// <summary>Water that warmed since it was in equilibrium.</summary>
    public const string WarmedWater = "warmed-water";

    /// <summary>Air in the chamber warmer or colder than the probe.</summary>
    public const string CupTemperature = "cup-temperature";

    /// <summary>A chamber whose air is not saturated with vapour.</summary>
    public const string CupDry = "cup-dry";

    /// <summary>A window in which temperature or signal was not steady, or not watched.</summary>
    public const string Steady = "steady";

    /// <summary>A reading that looks as if mg/L and % were confused.</summary>
    public const string DisplayUnit = "display-unit";

    /// <summary>A percentage that looks as if it were on 1 atm.</summary>
    public const string PercentScale = "percent-scale";

    /// <summary>A titration of too little oxygen.</summary>
    public const string TitrationLow = "titration-low";

    /// <summary>A guard band that leaves nothing of the limit.</summary>
    public const string GuardBand = "guard-band";

    /// <summary>Slope or zero outside the window that the maker allows.</summary>
    public const string MakerWindow = "maker-window";

    /// <summary>A slope out of line with this probe's own history.</summary>
    public const string SlopeHistory = "slope-history";

    /// <summary>A zero out of line with this probe's own history.</summary>
    public const string ZeroHistory = "zero-history";

    /// <summary>A membrane older than its life.</summary>
    public const string MembraneLife = "membrane-life";

    /// <summary>Reference equipment whose certificate or life has run out.</summary>
    public const string EquipmentOverdue = "equipment-overdue";

    /// <summary>A barometer without a check against a reference.</summary>
    public const string BarometerUnchecked = "barometer-check";

    /// <summary>A thermometer without a check against a reference.</summary>
    public const string ThermometerUnchecked = "thermometer-check";

    /// <summary>A zero solution that is too old.</summary>
    public const string ZeroSolutionAge = "zero-solution-age";

    /// <summary>A probe whose polarisation has not settled.</summary>
    public const string Polarisation = "polarisation";

    /// <summary>A film or membrane that was stored dry and not wetted long enough.</summary>
    public const string Rewetting = "rewetting";

    /// <summary>A Monte-Carlo check that disagrees with the analytic uncertainty.</summary>
    public const string UncertaintyCheck = "uncertainty-check";

    /// <summary>The guards that a reason can get past.</summary>
    public static IReadOnlyList<string> WithReason => Guards.WithReason;

    /// <summary>Those of them that look at the pressure.</summary>
    public static IReadOnlyList<string> OnPressureWithReason => Guards.OnPressureWithReason;
}
