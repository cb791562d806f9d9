namespace ProbeCal;

/// <summary>
/// Standard uncertainties (k = 1) that stand in where the person gives none, each with its source. A rectangular limit of
/// ±a is a/√3. docs/uncertainty.md lists them together; the solubility equation's own is in <see cref="OxygenUncertainty"/>.
/// </summary>
public static class UncertaintyDefaults
{
    /// <summary>Offset of a field thermometer that passed its check of ±0.2 °C (USGS TM 9-A6.8), rectangular: 0.2/√3 °C.</summary>
    public const double ThermometerOffsetKelvin = 0.11547005383792516;
    /// <summary>Independent part of one temperature: a reading to 0.1 °C, rectangular ±0.05 °C (reading resolution of USGS TM 9-A6.2).</summary>
    public const double TemperatureKelvin = 0.028867513459481288;
    /// <summary>Own barometer read to 1 mmHg (USGS TM 9-A6.2), ±1 mmHg rectangular, hPa.</summary>
    public const double BarometerHectopascal = 0.76972;
    /// <summary>Pressure of a weather service, airport or telephone, brought to station level: ±5 hPa rectangular (our choice, no source), hPa.</summary>
    public const double ReportedPressureHectopascal = 2.886751345948129;
    /// <summary>Altitude alone: the weather, about 1 % (from memory), hPa. Never less.</summary>
    public const double AltitudeOnlyHectopascal = 10.0;
    /// <summary>Salinity taken as fresh or from a map: 0.25 (from memory).</summary>
    public const double Salinity = 0.25;
    /// <summary>State of "air-saturated" water: middle of the 0.5–1 % typical of aerated baths (from memory), relative.</summary>
    public const double AirSaturatedWaterRelative = 0.0075;
    /// <summary>Humidity of 95–100 % in a wet chamber: 0.12 % bias at most at 20 °C, rectangular over that width (computed), relative.</summary>
    public const double WaterSaturatedAirRelative = 0.00035;
    /// <summary>Air-to-water ratio of a probe that was not characterised: 1.5 % (from memory), relative.</summary>
    public const double AirToWaterRatioRelative = 0.015;
    /// <summary>Stirring in a stirred sample or current: 1 % (from memory; 1–2 % typical), relative.</summary>
    public const double StirredRelative = 0.01;
    /// <summary>Still water: low by 10–50 % (from memory), rectangular over the 40 % between, relative.</summary>
    public const double StillRelative = 0.11547005383792516;
    /// <summary>Temperature coefficient: 0.024 % per kelvin away from the calibration (published budget, Helm et al. 2018), 1/K.</summary>
    public const double TemperatureCoefficientPerKelvin = 0.00024;
    /// <summary>Zero that was not measured: residual current up to 1 % of the 100 % signal (from memory), rectangular ±1 %, relative to the span.</summary>
    public const double AssumedZeroRelative = 0.005773502691896258;

    /// <summary>The default for stirring at the reading, relative.</summary>
    /// <param name="stirring">How the water moves.</param>
    /// <returns>0 for a flow-insensitive probe; NaN for an unknown value.</returns>
    public static double StirringRelative(Stirring stirring)
    {
        switch (stirring)
        {
            case Stirring.Stirred: return StirredRelative;
            case Stirring.Still: return StillRelative;
            case Stirring.FlowInsensitive: return 0.0;
            default: return double.NaN;
        }
    }

    /// <summary>The default for the state of the reference, relative.</summary>
    /// <param name="method">The method of calibration.</param>
    /// <returns>NaN for an unknown method.</returns>
    public static double ReferenceStateRelative(CalibrationMethod method)
    {
        switch (method)
        {
            case CalibrationMethod.AirSaturatedWater: return AirSaturatedWaterRelative;
            case CalibrationMethod.WaterSaturatedAir: return WaterSaturatedAirRelative;
            default: return double.NaN;
        }
    }
}
