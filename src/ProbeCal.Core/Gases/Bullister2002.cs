namespace ProbeCal;

/// <summary>Sulfur hexafluoride in water: K0′ in mol/(L·atm of the gas), and F = C/x in mol/(L·atm) for water-saturated air at 1 atm: ln C = A1 + A2·(100/T) + A3·ln(T/100) + S·[B1 + B2·(T/100) + B3·(T/100)²].</summary>
/// <remarks>
/// Bullister, J.L., Wisegarver, D.P., Menzia, F.A. (2002) Deep-Sea Res. I 49, 175–187, doi:10.1016/S0967-0637(01)00051-6, Tables 2 and 3. Range −1 to 40 °C, S 0–40.
/// Stated accuracy 2 %. The printed example is met to 0.05 % only, unresolved. The ITS-90 input is converted.
/// </remarks>
internal static class Bullister2002
{
    /// <summary>Lowest temperature, °C.</summary>
    internal const double LowestCelsius = -1.0;
    /// <summary>Highest temperature, °C.</summary>
    internal const double HighestCelsius = 40.0;
    /// <summary>Highest practical salinity.</summary>
    internal const double HighestSalinity = 40.0;

    /// <summary>ln of K0′, mol/(L·atm). ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double PressureLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.SulfurHexafluoride: // Coefficients seen in three second-hand places, a published value is reproduced.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -96.5975, 139.883, 37.8193, 0.0, false,
                    0.0310693, -0.0356385, 0.00743254, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }

    /// <summary>ln of F, mol/(L·atm). ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double AirLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.SulfurHexafluoride: // Coefficients seen in four second-hand places, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -80.0343, 117.232, 29.5817, 0.0, false,
                    0.0335183, -0.0373942, 0.00774862, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }
}
