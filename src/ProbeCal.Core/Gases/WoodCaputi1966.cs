namespace ProbeCal;

/// <summary>Xenon in water in equilibrium with water-saturated air at 1 atm, µmol/kg: ln C = A0 + A1·Ts + A2·Ts² + S·(B0 + B1·Ts), Ts = ln[(298.15 − t)/(273.15 + t)].</summary>
/// <remarks>
/// Wood, D., Caputi, R. (1966) USNRDL-TR-988, as refitted by R. Hamme and used in Hamme, R.C., Severinghaus, J.P. (2007) Deep-Sea Res. I 54, 939–950,
/// doi:10.1016/j.dsr.2007.03.008. Range 0–30 °C, S 0–36. Accuracy about 1–2 %. The temperature enters as given (ITS-90); one second-hand place converts it.
/// </remarks>
internal static class WoodCaputi1966
{
    /// <summary>Lowest temperature, °C.</summary>
    internal const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    internal const double HighestCelsius = 30.0;
    /// <summary>Highest practical salinity.</summary>
    internal const double HighestSalinity = 36.0;

    /// <summary>ln of µmol/kg in equilibrium with moist air. ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double AirLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.Xenon: // Coefficients seen in two second-hand places, no published value at hand.
                return ScaledTemperatureForm.Logarithm(
                    celsius, salinity, -7.48588, 5.08763, 4.22078, 0.0, 0.0, 0.0,
                    -0.00817791, -0.0120172, 0.0, 0.0, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }
}
