namespace ProbeCal;

/// <summary>CFC-11 and CFC-12 in water as F = C/x in mol/(L·atm) for water-saturated air at 1 atm: ln C = A1 + A2·(100/T) + A3·ln(T/100) + A4·(T/100)² + S·[B1 + B2·(T/100) + B3·(T/100)²].</summary>
/// <remarks>
/// Warner, M.J., Weiss, R.F. (1985) Deep-Sea Res. 32(12), 1485–1497, doi:10.1016/0198-0149(85)90099-8, Table 5. Range −1 to 40 °C, S 0–40. Stated accuracy 1.5 %.
/// A4 multiplies the square. The ITS-90 input is converted.
/// </remarks>
internal static class WarnerWeiss1985
{
    /// <summary>Lowest temperature, °C.</summary>
    internal const double LowestCelsius = -1.0;
    /// <summary>Highest temperature, °C.</summary>
    internal const double HighestCelsius = 40.0;
    /// <summary>Highest practical salinity.</summary>
    internal const double HighestSalinity = 40.0;

    /// <summary>ln of F, mol/(L·atm). ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double AirLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.Cfc11: // Coefficients seen in three second-hand places, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -229.9261, 319.6552, 119.4471, -1.39165, true,
                    -0.142382, 0.091459, -0.0157274, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.Cfc12: // Coefficients seen in three second-hand places, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -218.0971, 298.9702, 113.8049, -1.39165, true,
                    -0.143566, 0.091015, -0.0153924, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }
}
