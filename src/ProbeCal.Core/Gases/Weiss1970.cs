namespace ProbeCal;

/// <summary>Oxygen, nitrogen and argon in water: mL of gas (0 °C, 1 atm) per litre in equilibrium with water-saturated air at 1 atm, and Bunsen coefficients: ln C = A1 + A2·(100/T) + A3·ln(T/100) + A4·(T/100) + S·[B1 + B2·(T/100) + B3·(T/100)²].</summary>
/// <remarks>
/// Weiss, R.F. (1970) Deep-Sea Res. 17, 721–735, doi:10.1016/0011-7471(70)90037-9. Range −1 to 40 °C, S 0–40. Stated accuracy 0.02 mL/L for oxygen
/// (second-hand); nitrogen lies 0.8–1.6 % below Hamme and Emerson 2004, and its two forms differ by 0.36 % between themselves. The ITS-90 input is converted.
/// </remarks>
internal static class Weiss1970
{
    /// <summary>Lowest temperature, °C.</summary>
    internal const double LowestCelsius = -1.0;
    /// <summary>Highest temperature, °C.</summary>
    internal const double HighestCelsius = 40.0;
    /// <summary>Highest practical salinity.</summary>
    internal const double HighestSalinity = 40.0;

    /// <summary>ln of mL/L in equilibrium with moist air. ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double AirLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.Oxygen: // Coefficients seen in three second-hand places, a published value is reproduced.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -173.4292, 249.6339, 143.3483, -21.8492, false,
                    -0.033096, 0.014259, -0.0017, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.Nitrogen: // Coefficients seen in three second-hand places, a published value is reproduced.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -172.4965, 248.4262, 143.0738, -21.712, false,
                    -0.049781, 0.025018, -0.0034861, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.Argon: // Coefficients seen in three second-hand places, a published value is reproduced.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -173.5146, 245.451, 141.8222, -21.802, false,
                    -0.034474, 0.014934, -0.0017729, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }

    /// <summary>ln of the Bunsen coefficient, mL of gas (0 °C, 1 atm) per mL of water at 1 atm of the gas. ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double BunsenLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.Oxygen: // Coefficients seen in one second-hand place, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -58.3877, 85.8079, 23.8439, 0.0, false,
                    -0.034892, 0.015568, -0.0019387, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.Nitrogen: // Coefficients seen in one second-hand place, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -59.6274, 85.7761, 24.3696, 0.0, false,
                    -0.05158, 0.026329, -0.0037252, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.Argon: // Coefficients seen in one second-hand place, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -55.6578, 82.0262, 22.5929, 0.0, false,
                    -0.036267, 0.016241, -0.0020114, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }
}
