namespace ProbeCal;

/// <summary>
/// Units of pressure. Core works in hectopascal (hPa) throughout; these functions carry a value across its boundary.
/// They are plain proportionalities: NaN gives NaN, an infinity gives an infinity, and nothing is refused.
/// </summary>
/// <remarks>
/// The atmosphere is 1013.25 hPa, the bar 1000 hPa and the pound-force per square inch 68.94757293168 hPa by definition
/// (BIPM SI Brochure; NIST SP 811, both from memory). One mmHg is taken as 1/760 atmosphere, so that 760 mmHg is 1 atm
/// exactly; the conventional millimetre of mercury (133.322387415 Pa) is larger by a factor of 1 + 1.4·10⁻⁷. One inHg is 25.4 mmHg.
/// The functions multiply before they divide, which keeps round values round.
/// </remarks>
public static class PressureUnits
{
    /// <summary>Hectopascal in one standard atmosphere.</summary>
    public const double HectopascalPerAtmosphere = 1013.25;
    /// <summary>Hectopascal in one kilopascal.</summary>
    public const double HectopascalPerKilopascal = 10.0;
    /// <summary>Hectopascal in one bar.</summary>
    public const double HectopascalPerBar = 1000.0;
    /// <summary>Millimetres of mercury in one standard atmosphere.</summary>
    public const double MillimetresOfMercuryPerAtmosphere = 760.0;
    /// <summary>Hectopascal in one millimetre of mercury (1/760 atm).</summary>
    public const double HectopascalPerMillimetreOfMercury = HectopascalPerAtmosphere / MillimetresOfMercuryPerAtmosphere;
    /// <summary>Millimetres of mercury in one inch of mercury.</summary>
    public const double MillimetresPerInch = 25.4;
    /// <summary>Hectopascal in one inch of mercury (25.4 mmHg).</summary>
    public const double HectopascalPerInchOfMercury = HectopascalPerAtmosphere * MillimetresPerInch / MillimetresOfMercuryPerAtmosphere;
    /// <summary>Hectopascal in one pound-force per square inch.</summary>
    public const double HectopascalPerPsi = 68.94757293168;

    /// <summary>Atmospheres to hectopascal.</summary>
    public static double HectopascalFromAtmospheres(double atmospheres)
    {
        return atmospheres * HectopascalPerAtmosphere;
    }

    /// <summary>Hectopascal to atmospheres.</summary>
    public static double AtmospheresFromHectopascal(double hectopascal)
    {
        return hectopascal / HectopascalPerAtmosphere;
    }

    /// <summary>Kilopascal to hectopascal.</summary>
    public static double HectopascalFromKilopascal(double kilopascal)
    {
        return kilopascal * HectopascalPerKilopascal;
    }

    /// <summary>Hectopascal to kilopascal.</summary>
    public static double KilopascalFromHectopascal(double hectopascal)
    {
        return hectopascal / HectopascalPerKilopascal;
    }

    /// <summary>Bar to hectopascal.</summary>
    public static double HectopascalFromBar(double bar)
    {
        return bar * HectopascalPerBar;
    }

    /// <summary>Hectopascal to bar.</summary>
    public static double BarFromHectopascal(double hectopascal)
    {
        return hectopascal / HectopascalPerBar;
    }

    /// <summary>Millimetres of mercury (1/760 atm) to hectopascal; 760 gives 1013.25 exactly.</summary>
    public static double HectopascalFromMillimetresOfMercury(double millimetresOfMercury)
    {
        return millimetresOfMercury * HectopascalPerAtmosphere / MillimetresOfMercuryPerAtmosphere;
    }

    /// <summary>Hectopascal to millimetres of mercury (1/760 atm); 1013.25 gives 760 exactly.</summary>
    public static double MillimetresOfMercuryFromHectopascal(double hectopascal)
    {
        return hectopascal * MillimetresOfMercuryPerAtmosphere / HectopascalPerAtmosphere;
    }

    /// <summary>Inches of mercury to hectopascal.</summary>
    public static double HectopascalFromInchesOfMercury(double inchesOfMercury)
    {
        return inchesOfMercury * MillimetresPerInch * HectopascalPerAtmosphere / MillimetresOfMercuryPerAtmosphere;
    }

    /// <summary>Hectopascal to inches of mercury.</summary>
    public static double InchesOfMercuryFromHectopascal(double hectopascal)
    {
        return hectopascal * MillimetresOfMercuryPerAtmosphere / HectopascalPerAtmosphere / MillimetresPerInch;
    }

    /// <summary>Pounds-force per square inch to hectopascal.</summary>
    public static double HectopascalFromPsi(double psi)
    {
        return psi * HectopascalPerPsi;
    }

    /// <summary>Hectopascal to pounds-force per square inch.</summary>
    public static double PsiFromHectopascal(double hectopascal)
    {
        return hectopascal / HectopascalPerPsi;
    }
}
