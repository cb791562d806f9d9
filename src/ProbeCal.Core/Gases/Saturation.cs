namespace ProbeCal;

/// <summary>
/// Percentage of saturation: the partial pressure of oxygen in the water over that of water-saturated air of the same
/// temperature, at the local pressure or at 1 atm. The two differ by the whole pressure ratio, so each has its own name.
/// Salinity enters neither. Negative values pass through.
/// </summary>
/// <remarks>
/// At the local pressure the ratio of concentrations is the same; at 1 atm it differs by up to 0.05 % (the virial term, at 0.5 atm). Range −2 to 40 °C, 506.625–1114.575 hPa;
/// accuracy is that of the partial pressure given: the vapour formula adds less than 0.01 %.
/// </remarks>
public static class Saturation
{
    private const double PerCent = 100.0;

    /// <summary>Percentage of saturation at the local pressure.</summary>
    /// <param name="partialPressureHectopascal">Partial pressure of oxygen in the water, hPa, at most 1114.575.</param>
    /// <param name="celsius">Temperature of the water, −2 to 40 °C.</param>
    /// <param name="pressureHectopascal">Absolute local pressure, 506.625–1114.575 hPa.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="percent">Saturation at local pressure, %; NaN unless Ok or extrapolated.</param>
    public static Status PercentLocal(
        double partialPressureHectopascal, double celsius, double pressureHectopascal, RangeRule rule, out double percent)
    {
        percent = double.NaN;
        Status status = Check(partialPressureHectopascal, celsius, pressureHectopascal);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double air = OxygenEquilibrium.AirPartialPressure(celsius, pressureHectopascal);
        if (air <= 0.0) { return status; }
        return InputCheck.Deliver(
            PerCent * partialPressureHectopascal / air, status, Status.PartialPressureBelowRange, out percent);
    }

    /// <summary>Percentage of saturation at 1 atm (1013.25 hPa), whatever the local pressure.</summary>
    /// <param name="partialPressureHectopascal">Partial pressure of oxygen in the water, hPa, at most 1114.575.</param>
    /// <param name="celsius">Temperature of the water, −2 to 40 °C.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="percent">Saturation at 1 atm, %; NaN unless Ok or extrapolated.</param>
    public static Status PercentOneAtmosphere(double partialPressureHectopascal, double celsius, RangeRule rule, out double percent)
    {
        return PercentLocal(partialPressureHectopascal, celsius, PressureUnits.HectopascalPerAtmosphere, rule, out percent);
    }

    /// <summary>How the percentage at the local pressure answers to its inputs.</summary>
    /// <param name="partialPressureHectopascal">Partial pressure of oxygen in the water, hPa, at most 1114.575.</param>
    /// <param name="celsius">Temperature of the water, −2 to 40 °C.</param>
    /// <param name="pressureHectopascal">Absolute local pressure, 506.625–1114.575 hPa.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="perPartialPressure">% per hPa of oxygen; NaN unless Ok or extrapolated.</param>
    /// <param name="perKelvin">% per K at constant pO2; NaN unless Ok or extrapolated.</param>
    /// <param name="perHectopascal">% per hPa of total pressure at constant pO2; NaN unless Ok or extrapolated.</param>
    public static Status PercentLocalSensitivities(
        double partialPressureHectopascal, double celsius, double pressureHectopascal, RangeRule rule,
        out double perPartialPressure, out double perKelvin, out double perHectopascal)
    {
        perPartialPressure = double.NaN;
        perKelvin = double.NaN;
        perHectopascal = double.NaN;
        Status status = Check(partialPressureHectopascal, celsius, pressureHectopascal);
        if (InputCheck.Refuses(status, rule)) { return status; }
        double air = OxygenEquilibrium.AirPartialPressure(celsius, pressureHectopascal);
        if (air <= 0.0) { return status; }
        double percentPerAir = -PerCent * partialPressureHectopascal / air / air;
        double slope = percentPerAir * OxygenEquilibrium.AirPartialPressureSlope(celsius);
        if (InputCheck.NotFinite(percentPerAir) || InputCheck.NotFinite(slope))
        {
            return status == Status.Ok ? Status.PartialPressureBelowRange : status;
        }
        perPartialPressure = InputCheck.FiniteOrNaN(PerCent / air);
        perKelvin = slope;
        perHectopascal = percentPerAir * DryAir.OxygenMoleFraction;
        return status;
    }

    /// <summary>How the percentage at 1 atm answers to its inputs.</summary>
    /// <param name="partialPressureHectopascal">Partial pressure of oxygen in the water, hPa, at most 1114.575.</param>
    /// <param name="celsius">Temperature of the water, −2 to 40 °C.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="perPartialPressure">% per hPa of oxygen; NaN unless Ok or extrapolated.</param>
    /// <param name="perKelvin">% per K at constant pO2; NaN unless Ok or extrapolated.</param>
    public static Status PercentOneAtmosphereSensitivities(
        double partialPressureHectopascal, double celsius, RangeRule rule, out double perPartialPressure, out double perKelvin)
    {
        return PercentLocalSensitivities(
            partialPressureHectopascal, celsius, PressureUnits.HectopascalPerAtmosphere, rule,
            out perPartialPressure, out perKelvin, out _);
    }

    /// <summary>Partial pressure behind a percentage at the local pressure: the inverse of <see cref="PercentLocal"/>.</summary>
    /// <param name="percent">Saturation at local pressure, %.</param>
    /// <param name="celsius">Temperature of the water, −2 to 40 °C.</param>
    /// <param name="pressureHectopascal">Absolute local pressure, 506.625–1114.575 hPa.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="partialPressureHectopascal">Partial pressure of oxygen, hPa; NaN unless Ok or extrapolated.</param>
    public static Status PartialPressureFromPercentLocal(
        double percent, double celsius, double pressureHectopascal, RangeRule rule, out double partialPressureHectopascal)
    {
        partialPressureHectopascal = double.NaN;
        Status finite = InputCheck.NotFinite(percent) ? Status.SaturationNotFinite : Status.Ok;
        Status status = InputCheck.Graver(finite, OxygenEquilibrium.CheckAir(celsius, pressureHectopascal));
        if (InputCheck.Refuses(status, rule)) { return status; }
        double value = percent / PerCent * OxygenEquilibrium.AirPartialPressure(celsius, pressureHectopascal);
        if (OxygenEquilibrium.HighestPartialPressureHectopascal < value)
        {
            status = InputCheck.Graver(status, Status.SaturationAboveRange);
            if (InputCheck.Refuses(status, rule)) { return status; }
        }
        return InputCheck.Deliver(value, status, Status.SaturationBelowRange, out partialPressureHectopascal);
    }

    /// <summary>Partial pressure behind a percentage at 1 atm: the inverse of <see cref="PercentOneAtmosphere"/>.</summary>
    /// <param name="percent">Saturation at 1 atm, %.</param>
    /// <param name="celsius">Temperature of the water, −2 to 40 °C.</param>
    /// <param name="rule">Refuse or extrapolate outside the range.</param>
    /// <param name="partialPressureHectopascal">Partial pressure of oxygen, hPa; NaN unless Ok or extrapolated.</param>
    public static Status PartialPressureFromPercentOneAtmosphere(
        double percent, double celsius, RangeRule rule, out double partialPressureHectopascal)
    {
        return PartialPressureFromPercentLocal(
            percent, celsius, PressureUnits.HectopascalPerAtmosphere, rule, out partialPressureHectopascal);
    }

    private static Status Check(double partialPressureHectopascal, double celsius, double pressureHectopascal)
    {
        Status status = InputCheck.PartialPressure(
            partialPressureHectopascal, OxygenEquilibrium.HighestPartialPressureHectopascal);
        return InputCheck.Graver(status, OxygenEquilibrium.CheckAir(celsius, pressureHectopascal));
    }
}
