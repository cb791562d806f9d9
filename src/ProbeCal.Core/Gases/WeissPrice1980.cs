namespace ProbeCal;

/// <summary>Nitrous oxide as K0 in mol/(kg·atm of fugacity); nitrous oxide and carbon dioxide as F = C/x in mol/(kg·atm) for water-saturated air at 1 atm, with the virial term in it: ln C = A1 + A2·(100/T) + A3·ln(T/100) + A4·(T/100)² + S·[B1 + B2·(T/100) + B3·(T/100)²].</summary>
/// <remarks>
/// Weiss, R.F., Price, B.A. (1980) Mar. Chem. 8, 347–359, doi:10.1016/0304-4203(80)90024-9. Range −1 to 40 °C, S 0–40. Stated accuracy: nitrous oxide 0.14 %,
/// carbon dioxide 0.3 %. A4 multiplies the square here, and is zero in K0. The ITS-90 input is converted.
/// </remarks>
internal static class WeissPrice1980
{
    /// <summary>Lowest temperature, °C.</summary>
    internal const double LowestCelsius = -1.0;
    /// <summary>Highest temperature, °C.</summary>
    internal const double HighestCelsius = 40.0;
    /// <summary>Highest practical salinity.</summary>
    internal const double HighestSalinity = 40.0;

    /// <summary>ln of K0, mol/(kg·atm). ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double FugacityLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.NitrousOxide: // Coefficients seen in four second-hand places, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -64.8539, 100.252, 25.2049, 0.0, false,
                    -0.062544, 0.035337, -0.0054699, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }

    /// <summary>ln of F, mol/(kg·atm): concentration for the whole of the dry air at 1 atm. ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double AirLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.NitrousOxide: // Coefficients seen in two second-hand places, a published value is reproduced.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -168.2459, 226.0894, 93.2817, -1.48693, true,
                    -0.060361, 0.033765, -0.0051862, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.CarbonDioxide: // Coefficients seen in three second-hand places, a published value is reproduced.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -162.8301, 218.2968, 90.9241, -1.47696, true,
                    0.025695, -0.025225, 0.0049867, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }
}
