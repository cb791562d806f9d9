namespace ProbeCal;

/// <summary>
/// The two temperature scales that the equations were written on. Inputs of Core are in °C on ITS-90. The scales differ by
/// 0.24 mK per kelvin (UNESCO practice: t68 = 1.00024·t90; Saunders, P.M. 1990, WOCE Newsletter 10, from memory), which moves
/// the oxygen value by 0.003 % at 5 °C and 0.015 % at 40 °C.
/// </summary>
public static class TemperatureScale
{
    /// <summary>Kelvin at 0 °C.</summary>
    public const double KelvinAtZeroCelsius = 273.15;
    /// <summary>IPTS-68 Celsius temperature for each degree of ITS-90, −2 to 40 °C.</summary>
    public const double Ipts68PerIts90 = 1.00024;

    /// <summary>°C on ITS-90 to °C on IPTS-68. NaN gives NaN; nothing is refused.</summary>
    public static double Ipts68FromIts90(double its90Celsius)
    {
        return its90Celsius * Ipts68PerIts90;
    }

    /// <summary>°C on IPTS-68 to °C on ITS-90. NaN gives NaN; nothing is refused.</summary>
    public static double Its90FromIpts68(double ipts68Celsius)
    {
        return ipts68Celsius / Ipts68PerIts90;
    }
}
