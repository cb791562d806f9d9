namespace ProbeCal;

/// <summary>
/// The one place where inputs are judged. Each check reports the first input that is not finite, and only then the first
/// that is out of range, so that a NaN is never hidden behind a range message.
/// </summary>
internal static class InputCheck
{
    /// <summary>True when the value must be NaN: a NaN or unknown input always, a range fault unless extrapolation was asked for.</summary>
    internal static bool Refuses(Status status, RangeRule rule)
    {
        if (status == Status.Ok) { return false; }
        if (rule != RangeRule.Extrapolate) { return true; }
        RefusalReason reason = StatusParts.Reason(status);
        return reason != RefusalReason.BelowRange && reason != RefusalReason.AboveRange;
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
        if (NotFinite(celsius)) { return Status.TemperatureNotFinite; }
        if (celsius < lowest) { return Status.TemperatureBelowRange; }
        if (highest < celsius) { return Status.TemperatureAboveRange; }
        return Status.Ok;
    }

    internal static Status Salinity(double salinity, double highest)
    {
        if (NotFinite(salinity)) { return Status.SalinityNotFinite; }
        if (salinity < 0.0) { return Status.SalinityBelowRange; }
        if (highest < salinity) { return Status.SalinityAboveRange; }
        return Status.Ok;
    }

    internal static Status Pressure(double hectopascal, double lowest, double highest)
    {
        if (NotFinite(hectopascal)) { return Status.PressureNotFinite; }
        if (hectopascal < lowest) { return Status.PressureBelowRange; }
        if (highest < hectopascal) { return Status.PressureAboveRange; }
        return Status.Ok;
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

    /// <summary>The graver of two findings: not finite (or unknown) before out of range, and the first before the second.</summary>
    internal static Status Graver(Status first, Status second)
    {
        if (first == Status.Ok) { return second; }
        if (second == Status.Ok) { return first; }
        return IsRangeFault(first) && !IsRangeFault(second) ? second : first;
    }

    private static bool IsRangeFault(Status status)
    {
        RefusalReason reason = StatusParts.Reason(status);
        return reason == RefusalReason.BelowRange || reason == RefusalReason.AboveRange;
    }
}
