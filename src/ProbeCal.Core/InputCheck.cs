namespace ProbeCal;

/// <summary>
/// The one place where inputs are judged. Each check reports the first input that is not finite, and only then the first
/// that is out of range, so that a NaN is never hidden behind a range message.
/// </summary>
internal static class InputCheck
{
    // The checks ask first for the common answer, a value within (a NaN is within nothing), and are then short enough that a compiler puts them
    // into their callers.

    /// <summary>How far outside its range a temperature still counts as near the edge, K (common practice, no source).</summary>
    internal const double NearEdgeKelvin = 0.2;

    /// <summary>True when the value must be NaN: a NaN or unknown input always, a range fault unless the rule lets it pass.</summary>
    internal static bool Refuses(Status status, RangeRule rule)
    {
        return status != Status.Ok && RefusesFault(status, rule);
    }

    private static bool RefusesFault(Status status, RangeRule rule)
    {
        if (rule != RangeRule.Extrapolate && rule != RangeRule.NearEdge) { return true; }
        RefusalReason reason = StatusParts.Reason(status);
        if (reason == RefusalReason.JustBelowRange || reason == RefusalReason.JustAboveRange) { return false; }
        return rule == RangeRule.NearEdge || (reason != RefusalReason.BelowRange && reason != RefusalReason.AboveRange);
    }

    /// <summary>What an extrapolation may hand out: a finite number or NaN, never an infinity.</summary>
    internal static double FiniteOrNaN(double value)
    {
        return double.IsInfinity(value) ? double.NaN : value;
    }

    /// <summary>
    /// Hands out a result. One that overflowed is NaN, and where no input was at fault before, the status given says which one
    /// was too large: Ok always comes with a finite value.
    /// </summary>
    internal static Status Deliver(double result, Status status, Status overflow, out double value)
    {
        value = double.NaN;
        if (NotFinite(result)) { return status == Status.Ok ? overflow : status; }
        value = result;
        return status;
    }

    internal static bool NotFinite(double value)
    {
        return double.IsNaN(value) || double.IsInfinity(value);
    }

    internal static Status Temperature(double celsius, double lowest, double highest)
    {
        return lowest <= celsius && celsius <= highest ? Status.Ok : TemperatureFault(celsius, lowest, highest);
    }

    private static Status TemperatureFault(double celsius, double lowest, double highest)
    {
        if (NotFinite(celsius)) { return Status.TemperatureNotFinite; }
        if (celsius < lowest)
        {
            return celsius < lowest - NearEdgeKelvin ? Status.TemperatureBelowRange : Status.TemperatureJustBelowRange;
        }

        return highest + NearEdgeKelvin < celsius ? Status.TemperatureAboveRange : Status.TemperatureJustAboveRange;
    }

    internal static Status Salinity(double salinity, double highest)
    {
        return 0.0 <= salinity && salinity <= highest ? Status.Ok : SalinityFault(salinity);
    }

    private static Status SalinityFault(double salinity)
    {
        if (NotFinite(salinity)) { return Status.SalinityNotFinite; }
        return salinity < 0.0 ? Status.SalinityBelowRange : Status.SalinityAboveRange;
    }

    internal static Status Pressure(double hectopascal, double lowest, double highest)
    {
        return lowest <= hectopascal && hectopascal <= highest ? Status.Ok : PressureFault(hectopascal, lowest);
    }

    private static Status PressureFault(double hectopascal, double lowest)
    {
        if (NotFinite(hectopascal)) { return Status.PressureNotFinite; }
        return hectopascal < lowest ? Status.PressureBelowRange : Status.PressureAboveRange;
    }

    internal static Status PartialPressure(double hectopascal, double highest)
    {
        if (NotFinite(hectopascal)) { return Status.PartialPressureNotFinite; }
        if (highest < hectopascal) { return Status.PartialPressureAboveRange; }
        return Status.Ok;
    }

    internal static Status Density(double kilogramsPerCubicMetre)
    {
        if (NotFinite(kilogramsPerCubicMetre)) { return Status.DensityNotFinite; }
        if (kilogramsPerCubicMetre <= 0.0) { return Status.DensityBelowRange; }
        return Status.Ok;
    }

    internal static Status Uncertainty(double standardUncertainty)
    {
        if (NotFinite(standardUncertainty)) { return Status.UncertaintyNotFinite; }
        if (standardUncertainty < 0.0) { return Status.UncertaintyBelowRange; }
        return Status.Ok;
    }

    internal static Status MoleFraction(double fraction)
    {
        if (NotFinite(fraction)) { return Status.MoleFractionNotFinite; }
        if (fraction < 0.0) { return Status.MoleFractionBelowRange; }
        if (1.0 < fraction) { return Status.MoleFractionAboveRange; }
        return Status.Ok;
    }

    internal static Status Humidity(double percent)
    {
        if (NotFinite(percent)) { return Status.HumidityNotFinite; }
        if (percent < 0.0) { return Status.HumidityBelowRange; }
        if (100.0 < percent) { return Status.HumidityAboveRange; }
        return Status.Ok;
    }

    /// <summary>A depth or a hydrostatic pressure, from 0 on.</summary>
    internal static Status Depth(double depth, double highest)
    {
        if (NotFinite(depth)) { return Status.DepthNotFinite; }
        if (depth < 0.0) { return Status.DepthBelowRange; }
        if (highest < depth) { return Status.DepthAboveRange; }
        return Status.Ok;
    }

    /// <summary>Pressure of the water above a probe, dbar, from 0 to that of the deepest trench.</summary>
    internal static Status Hydrostatic(double decibar)
    {
        return Depth(decibar, 11000.0);
    }

    /// <summary>
    /// The graver of two findings: not finite (or unknown) before out of range, out of range before just outside it, and the first before the second.
    /// </summary>
    internal static Status Graver(Status first, Status second)
    {
        return second == Status.Ok ? first : GraverThan(first, second);
    }

    private static Status GraverThan(Status first, Status second)
    {
        if (first == Status.Ok) { return second; }
        return Gravity(second) <= Gravity(first) ? first : second;
    }

    private static int Gravity(Status status)
    {
        RefusalReason reason = StatusParts.Reason(status);
        if (reason == RefusalReason.JustBelowRange || reason == RefusalReason.JustAboveRange) { return 1; }
        return reason == RefusalReason.BelowRange || reason == RefusalReason.AboveRange ? 2 : 3;
    }
}
