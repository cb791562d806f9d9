namespace ProbeCal;

/// <summary>Published corrections for what the pressure of the water does to a luminescence sensor.</summary>
public enum OptodePressureCorrection
{
    /// <summary>O2 · (1 + 0.032·P/1000 dbar): Uchida et al. 2008.</summary>
    Uchida2008 = 1,
    /// <summary>O2 · (1 + (0.00022·t + 0.0419)·P/1000 dbar): Bittig et al. 2015, meant for a phase already corrected for pressure.</summary>
    Bittig2015 = 2,
}

/// <summary>
/// The factor by which the oxygen of a luminescence sensor at depth falls short, 3.2 to 4.7 % per 1000 dbar. It brings concentration, and so the partial
/// pressure that the water would have at the surface.
/// </summary>
/// <remarks>
/// Uchida, H., Kawano, T., Kaneko, I., Fukasawa, M. (2008) J. Atmos. Ocean. Technol. 25, 2271–2281, doi:10.1175/2008JTECHO549.1, and
/// Bittig, H.C., Fiedler, B., Fietzek, P., Körtzinger, A. (2015) J. Atmos. Ocean. Technol. 32, 2305–2317, doi:10.1175/JTECH-D-15-0108.1. The figures were seen in two
/// second-hand places and agree; no published check value. 0–11 000 dbar; the ranges of the publications were not seen.
/// </remarks>
public static class OptodePressure
{
    private const double PerThousandDecibar = 1.0e-3;
    private const double HectopascalPerDecibar = 100.0;

    /// <summary>The factor, 1 at the surface.</summary>
    /// <param name="correction">Which publication.</param>
    /// <param name="temperatureCelsius">Temperature of the water, °C.</param>
    /// <param name="hydrostaticDecibar">Pressure of the water above, dbar.</param>
    /// <param name="rule">What to do outside 0–11 000 dbar.</param>
    /// <param name="factor">Multiply the oxygen with it; NaN unless the status allows a value.</param>
    /// <returns><see cref="Status.CoefficientUnknown"/> for an unknown correction, else the input at fault, or Ok.</returns>
    public static Status Factor(
        OptodePressureCorrection correction, double temperatureCelsius, double hydrostaticDecibar, RangeRule rule, out double factor)
    {
        return Compute(correction, temperatureCelsius, hydrostaticDecibar, rule, out factor, out _);
    }

    /// <summary>
    /// From the sensor's oxygen to the partial pressure at the probe: the published factor, which gives that of the same water at the surface, times
    /// what depth adds to it (<see cref="Enns1965"/>). With its slope; exactly 1 and 0 at the surface.
    /// </summary>
    internal static Status AtProbe(
        OptodePressureCorrection correction, double temperatureCelsius, double hydrostaticDecibar, RangeRule rule, out double factor, out double perKelvin)
    {
        factor = 1.0;
        perKelvin = 0.0;
        if (hydrostaticDecibar == 0.0) { return Status.Ok; }
        Status status = Compute(correction, temperatureCelsius, hydrostaticDecibar, rule, out double ofSensor, out double sensorPerKelvin);
        factor = double.NaN;
        perKelvin = double.NaN;
        if (double.IsNaN(ofSensor)) { return status; }
        double hectopascal = hydrostaticDecibar * HectopascalPerDecibar;
        status = InputCheck.Graver(status, Enns1965.Factor(Gas.Oxygen, temperatureCelsius, hectopascal, rule, out double ofWater));
        Enns1965.Sensitivities(Gas.Oxygen, temperatureCelsius, hectopascal, rule, out double waterPerKelvin, out _);
        if (double.IsNaN(ofWater)) { return status; }
        factor = ofSensor * ofWater;
        perKelvin = (sensorPerKelvin * ofWater) + (ofSensor * waterPerKelvin);
        return status;
    }

    private static Status Compute(
        OptodePressureCorrection correction, double temperatureCelsius, double hydrostaticDecibar, RangeRule rule, out double factor, out double perKelvin)
    {
        factor = double.NaN;
        perKelvin = double.NaN;
        if (correction != OptodePressureCorrection.Uchida2008 && correction != OptodePressureCorrection.Bittig2015) { return Status.CoefficientUnknown; }
        if (InputCheck.NotFinite(temperatureCelsius)) { return Status.TemperatureNotFinite; }
        Status status = InputCheck.Hydrostatic(hydrostaticDecibar);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double perKelvinPerUnit = correction == OptodePressureCorrection.Uchida2008 ? 0.0 : 0.00022;
        double perUnit = correction == OptodePressureCorrection.Uchida2008 ? 0.032 : (perKelvinPerUnit * temperatureCelsius) + 0.0419;
        double value = 1.0 + (perUnit * hydrostaticDecibar * PerThousandDecibar);
        if (value <= 0.0) { return Status.DepthBelowRange; }
        perKelvin = perKelvinPerUnit * hydrostaticDecibar * PerThousandDecibar;
        return InputCheck.Deliver(value, status, Status.DepthAboveRange, out factor);
    }
}
