namespace ProbeCal;

/// <summary>Krypton in water: mL of gas (0 °C, 1 atm) per kg in equilibrium with water-saturated air at 1 atm, and the Bunsen coefficient: ln C = A1 + A2·(100/T) + A3·ln(T/100) + A4·(T/100) + S·[B1 + B2·(T/100) + B3·(T/100)²].</summary>
/// <remarks>
/// Weiss, R.F., Kyser, T.K. (1978) J. Chem. Eng. Data 23(1), 69–72, doi:10.1021/je60076a014. Range −2 to 40 °C, S 0–40. Stated accuracy 0.4 %. The ITS-90 input is converted.
/// </remarks>
internal static class WeissKyser1978
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
            case Gas.Krypton: // Coefficients seen in four second-hand places, only the output of other programs is reproduced.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -112.684, 153.5817, 74.469, -10.0189, false,
                    -0.011213, -0.001844, 0.0011201, 0.0,
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
            case Gas.Krypton: // Coefficients seen in two second-hand places, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -57.2596, 87.4242, 22.9332, 0.0, false,
                    -0.008723, -0.002793, 0.0012398, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }
}
