namespace ProbeCal;

/// <summary>Helium, neon, argon, krypton and xenon in water in equilibrium with water-saturated air at 1 atm, mol/kg: ln C = A1 + A2·(100/T) + A3·ln(T/100) + A4·(T/100) + S·[B1 + B2·(T/100) + B3·(T/100)²] + C1·S², T on ITS-90.</summary>
/// <remarks>
/// Jenkins, W.J., Lott, D.E., Cahill, K.L. (2019) Mar. Chem. 211, 94–107, doi:10.1016/j.marchem.2019.03.007. Range −2 to 35 °C, S 0–40. Accuracy 0.1–0.3 % (from memory).
/// </remarks>
internal static class Jenkins2019
{
    /// <summary>Lowest temperature, °C.</summary>
    internal const double LowestCelsius = -2.0;
    /// <summary>Highest temperature, °C.</summary>
    internal const double HighestCelsius = 35.0;
    /// <summary>Highest practical salinity.</summary>
    internal const double HighestSalinity = 40.0;

    /// <summary>ln of mol/kg in equilibrium with moist air. ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double AirLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.Helium: // Coefficients seen in four second-hand places, a published value is reproduced.
                return HundredKelvinForm.Logarithm(
                    celsius, salinity, -178.1424, 217.5991, 140.7506, -23.01954, false,
                    -0.038129, 0.01919, -0.0026898, -2.55157e-06,
                    steps, out perKelvin, out perSalinity);
            case Gas.Neon: // Coefficients seen in four second-hand places, no published value at hand.
                return HundredKelvinForm.Logarithm(
                    celsius, salinity, -274.1329, 352.6201, 226.9676, -37.13393, false,
                    -0.06386, 0.035326, -0.0053258, 1.28233e-05,
                    steps, out perKelvin, out perSalinity);
            case Gas.Argon: // Coefficients seen in four second-hand places, no published value at hand.
                return HundredKelvinForm.Logarithm(
                    celsius, salinity, -227.4607, 305.4347, 180.5278, -27.9945, false,
                    -0.066942, 0.037201, -0.0056364, -5.30325e-06,
                    steps, out perKelvin, out perSalinity);
            case Gas.Krypton: // Coefficients seen in four second-hand places, a published value is reproduced.
                return HundredKelvinForm.Logarithm(
                    celsius, salinity, -122.4694, 153.5654, 70.1969, -8.52524, false,
                    -0.049522, 0.024434, -0.0033968, 4.19208e-06,
                    steps, out perKelvin, out perSalinity);
            case Gas.Xenon: // Coefficients seen in four second-hand places, a published value is reproduced.
                return HundredKelvinForm.Logarithm(
                    celsius, salinity, -224.51, 292.8234, 157.6127, -22.66895, false,
                    -0.084915, 0.047996, -0.0073595, 6.69292e-06,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }
}
