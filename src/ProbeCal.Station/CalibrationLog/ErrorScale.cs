namespace ProbeCal.Station.CalibrationLog;

/// <summary>
/// The unit in which errors are judged and shown: mg/L for oxygen, which the published limits speak of; hPa for every other
/// gas and for total gas pressure. At a reference of the pressure here, the error of a total gas pressure is that of ΔP.
/// </summary>
public static class ErrorScale
{
    /// <summary>True when errors are those of a pressure.</summary>
    /// <param name="gas">Name of the gas as records have it.</param>
    /// <param name="model">Name of the response model.</param>
    public static bool IsHectopascal(string gas, string model)
    {
        return gas != "O2" || ModelNames.IsTotalPressure(model);
    }

    /// <summary>True when the errors of a record are those of a pressure.</summary>
    /// <param name="record">The record.</param>
    public static bool IsHectopascal(CalibrationRecord record)
    {
        return IsHectopascal(record.Gas, record.Probe.Model);
    }

    /// <summary>The unit: <c>mg/L</c> or <c>hPa</c>.</summary>
    /// <param name="record">The record.</param>
    public static string Unit(CalibrationRecord record)
    {
        return IsHectopascal(record) ? "hPa" : "mg/L";
    }

    /// <summary>Reading less reference at a point in <see cref="Unit"/>; null when there is no such point or nothing to read it by.</summary>
    /// <param name="record">The record.</param>
    /// <param name="point">The point.</param>
    public static double? Error(CalibrationRecord record, RecordedPoint? point)
    {
        return IsHectopascal(record) ? point?.ErrorHectopascal : point?.ErrorMilligramsPerLitre;
    }

    /// <summary>The reading at a point in <see cref="Unit"/>; null when there was nothing to read it by.</summary>
    /// <param name="record">The record.</param>
    /// <param name="point">The point.</param>
    public static double? Reading(CalibrationRecord record, RecordedPoint point)
    {
        return IsHectopascal(record) ? point.ReadingHectopascal : point.ReadingMilligramsPerLitre;
    }

    /// <summary>The reference at a point in <see cref="Unit"/>.</summary>
    /// <param name="record">The record.</param>
    /// <param name="point">The point.</param>
    public static double Reference(CalibrationRecord record, RecordedPoint point)
    {
        return IsHectopascal(record) ? point.ReferencePartialPressureHectopascal : point.ReferenceMilligramsPerLitre;
    }

    /// <summary>Standard uncertainty of the reference at a point in <see cref="Unit"/>.</summary>
    /// <param name="record">The record.</param>
    /// <param name="point">The point.</param>
    public static double ReferenceUncertainty(CalibrationRecord record, RecordedPoint point)
    {
        return IsHectopascal(record) ? point.ReferencePartialPressureUncertaintyHectopascal : point.ReferenceUncertaintyMilligramsPerLitre;
    }
}
