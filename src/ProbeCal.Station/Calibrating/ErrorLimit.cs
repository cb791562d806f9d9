using ProbeCal.Station.CalibrationLog;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Calibrating;

/// <summary>The limit of the error at one point, in the unit of the gas, and how well that error is known.</summary>
/// <param name="Width">The limit, either sign; NaN where none applies.</param>
/// <param name="Text">The limit in words.</param>
/// <param name="Applied">Which part of it applied; null when it has only one.</param>
/// <param name="Source">Where it comes from.</param>
/// <param name="Unit">mg/L or hPa.</param>
/// <param name="Found">The error; null when there was nothing to read the point by.</param>
/// <param name="StandardUncertainty">Its standard uncertainty; null where it cannot be said.</param>
internal sealed record ErrorLimit(double Width, string Text, string? Applied, string Source, string Unit, double? Found, double? StandardUncertainty)
{
    /// <summary>The limit at a point.</summary>
    /// <param name="setup">The set-up.</param>
    /// <param name="point">The point.</param>
    /// <param name="calibration">A calibration of the probe, for the sensitivities of the reading.</param>
    internal static ErrorLimit Of(CalibrationSetup setup, RecordedPoint point, ProbeCalibration calibration)
    {
        bool zero = point.Role == CalibrationIds.ZeroPoint;
        return PlanCheck.IsOxygen(setup)
            ? zero ? OxygenAtZero(setup, point, calibration) : Oxygen(setup, point, calibration)
            : Pressure(setup, point, calibration, zero);
    }

    private static ErrorLimit Oxygen(CalibrationSetup setup, RecordedPoint point, ProbeCalibration calibration)
    {
        CalibrationLimits limits = setup.Limits;
        Status status = AcceptanceLimit.AtSaturation(
            point.ReferenceMilligramsPerLitre, limits.SaturationMilligramsPerLitre, limits.SaturationPercent, out double width, out AppliedLimit applied);
        return new ErrorLimit(
            width,
            limits.SaturationText,
            status == Status.Ok ? Number.Fixed(width, 3) + (applied == AppliedLimit.Relative ? " mg/L, the % limit" : " mg/L, the mg/L limit") : null,
            limits.SaturationSource,
            "mg/L",
            status == Status.Ok ? point.ErrorMilligramsPerLitre : null,
            ErrorUncertainty.InMilligramsPerLitre(setup, point, calibration));
    }

    private static ErrorLimit OxygenAtZero(CalibrationSetup setup, RecordedPoint point, ProbeCalibration calibration)
    {
        CalibrationLimits limits = setup.Limits;
        return new ErrorLimit(
            limits.ZeroMilligramsPerLitre, limits.ZeroText, null, limits.ZeroSource, "mg/L", point.ErrorMilligramsPerLitre,
            ErrorUncertainty.InMilligramsPerLitre(setup, point, calibration));
    }

    private static ErrorLimit Pressure(CalibrationSetup setup, RecordedPoint point, ProbeCalibration calibration, bool zero)
    {
        PressureLimits limits = setup.Limits.Pressure ?? new PressureLimits();
        double? uncertainty = ErrorUncertainty.Of(setup, point, calibration, 1);
        if (zero || point.ReferencePartialPressureHectopascal == 0)
        {
            return limits.AtZero is double atZero
                ? new ErrorLimit(atZero, Number.Print(atZero) + " hPa", null, CalibrationLimits.Entered, "hPa", point.ErrorHectopascal, uncertainty)
                : new ErrorLimit(double.NaN, limits.Text, null, CalibrationLimits.Entered, "hPa", null, uncertainty);
        }

        // The larger of an absolute and a relative limit is the same arithmetic in hPa.
        Status status = AcceptanceLimit.AtSaturation(
            point.ReferencePartialPressureHectopascal, limits.Hectopascal ?? 0, limits.Percent ?? 0, out double width, out AppliedLimit applied);
        bool two = limits.Hectopascal != null && limits.Percent != null;
        string which = Number.Fixed(width, 3) + " hPa" + (two ? applied == AppliedLimit.Relative ? ", the % limit" : ", the hPa limit" : "");
        return new ErrorLimit(
            width, limits.Text, status == Status.Ok ? which : null, CalibrationLimits.Entered, "hPa", status == Status.Ok ? point.ErrorHectopascal : null, uncertainty);
    }
}
