namespace ProbeCal;

/// <summary>Helium and neon in water: mL of gas (0 °C, 1 atm) per kg in equilibrium with water-saturated air at 1 atm, and Bunsen coefficients: ln C = A1 + A2·(100/T) + A3·ln(T/100) + A4·(T/100) + S·[B1 + B2·(T/100) + B3·(T/100)²].</summary>
/// <remarks>
/// Weiss, R.F. (1971) J. Chem. Eng. Data 16(2), 235–241, doi:10.1021/je60049a019. Range −2 to 40 °C, S 0–40. Stated accuracy 0.5 %. The ITS-90 input is converted.
/// </remarks>
internal static class Weiss1971
{
    /// <summary>Lowest temperature, °C.</summary>
    internal const double LowestCelsius = -2.0;
    /// <summary>Highest temperature, °C.</summary>
    internal const double HighestCelsius = 40.0;
    /// <summary>Highest practical salinity.</summary>
    internal const double HighestSalinity = 40.0;

    /// <summary>ln of mL/kg in equilibrium with moist air. ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double AirLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.Helium: // Coefficients seen in four second-hand places, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -167.2178, 216.3442, 139.2032, -22.6202, false,
                    -0.044781, 0.023541, -0.0034266, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.Neon: // Coefficients seen in two second-hand places, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -170.6018, 225.1946, 140.8863, -22.629, false,
                    -0.127113, 0.079277, -0.0129095, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }

    /// <summary>ln of the Bunsen coefficient. ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double BunsenLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.Helium: // Coefficients seen in one second-hand place, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -34.6261, 43.0285, 14.1391, 0.0, false,
                    -0.04234, 0.022624, -0.003312, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.Neon: // Coefficients seen in one second-hand place, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -39.1971, 51.8013, 15.7699, 0.0, false,
                    -0.124695, 0.078374, -0.0127972, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }
}
