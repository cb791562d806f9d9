namespace ProbeCal;

/// <summary>Methane, carbon monoxide and hydrogen in water: C/x in nmol/kg for water-saturated air at 1 atm, and Bunsen coefficients: ln C = A1 + A2·(100/T) + A3·ln(T/100) + A4·(T/100) + S·[B1 + B2·(T/100) + B3·(T/100)²].</summary>
/// <remarks>
/// Wiesenburg, D.A., Guinasso, N.L. (1979) J. Chem. Eng. Data 24(4), 356–360, doi:10.1021/je60083a006. Range −2 to 30 °C, S 0–40. Accuracy about 1 %,
/// carbon monoxide 1–2 %: at 25 °C in fresh water 0.8 to 1.7 % below the international guideline (FernandezPrini2003). The ITS-90 input is converted.
/// </remarks>
internal static class WiesenburgGuinasso1979
{
    /// <summary>Lowest temperature, °C.</summary>
    internal const double LowestCelsius = -2.0;
    /// <summary>Highest temperature, °C.</summary>
    internal const double HighestCelsius = 30.0;
    /// <summary>Highest practical salinity.</summary>
    internal const double HighestSalinity = 40.0;

    /// <summary>ln of C/x, nmol/kg. ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double AirLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.Methane: // Coefficients seen in four second-hand places, a published value is reproduced.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -417.5053, 599.8626, 380.3636, -62.0764, false,
                    -0.064236, 0.03498, -0.0052732, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.CarbonMonoxide: // Coefficients seen in two second-hand places, a published value is reproduced.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -175.6092, 267.6796, 161.0862, -25.6218, false,
                    0.046103, -0.041767, 0.008189, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.Hydrogen: // Coefficients seen in two second-hand places, a published value is reproduced.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -320.3079, 459.7398, 299.26, -49.3946, false,
                    -0.074474, 0.043363, -0.006742, 0.0,
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
            case Gas.Methane: // Coefficients seen in three second-hand places, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -68.8862, 101.4956, 28.7314, 0.0, false,
                    -0.076146, 0.04397, -0.0068672, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.CarbonMonoxide: // Coefficients seen in two second-hand places, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -47.6148, 69.5068, 18.7397, 0.0, false,
                    0.045657, -0.040721, 0.00797, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.Hydrogen: // Coefficients seen in two second-hand places, no published value at hand.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -47.8948, 65.0368, 20.1709, 0.0, false,
                    -0.082225, 0.049564, -0.0078689, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }
}
