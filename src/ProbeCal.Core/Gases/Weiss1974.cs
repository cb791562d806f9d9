namespace ProbeCal;

/// <summary>Carbon dioxide in water, K0 in mol/(kg·atm of fugacity): ln K0 = A1 + A2·(100/T) + A3·ln(T/100) + S·[B1 + B2·(T/100) + B3·(T/100)²].</summary>
/// <remarks>
/// Weiss, R.F. (1974) Mar. Chem. 2, 203–215, doi:10.1016/0304-4203(74)90015-2. Range −1 to 40 °C, S 0–40. Stated accuracy 0.2 %. The ITS-90 input is converted.
/// The gas is not ideal: what is multiplied is the fugacity (<see cref="FugacityCoefficient"/>). Gas and carbonic acid together, not total carbonate.
/// </remarks>
internal static class Weiss1974
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
            case Gas.CarbonDioxide: // Coefficients seen in four second-hand places, a published value is reproduced.
                return HundredKelvinForm.LogarithmIpts68(
                    celsius, salinity, -60.2409, 93.4517, 23.3585, 0.0, false,
                    0.023517, -0.023656, 0.0047036, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }
}
