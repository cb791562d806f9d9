namespace ProbeCal;

/// <summary>Nitrogen and argon (µmol/kg) and neon (nmol/kg) in water in equilibrium with water-saturated air at 1 atm: ln C = A0 + A1·Ts + A2·Ts² + A3·Ts³ + S·(B0 + B1·Ts + B2·Ts²), Ts = ln[(298.15 − t)/(273.15 + t)], t on ITS-90.</summary>
/// <remarks>
/// Hamme, R.C., Emerson, S.R. (2004) Deep-Sea Res. I 51(11), 1517–1528, doi:10.1016/j.dsr.2004.06.009. Range 0–30 °C, S 0–34.5. Stated accuracy: nitrogen
/// 0.14 %, argon 0.13 %, neon 0.30 %.
/// </remarks>
internal static class HammeEmerson2004
{
    /// <summary>Lowest temperature, °C.</summary>
    internal const double LowestCelsius = 0.0;
    /// <summary>Highest temperature, °C.</summary>
    internal const double HighestCelsius = 30.0;
    /// <summary>Highest practical salinity.</summary>
    internal const double HighestSalinity = 34.5;

    /// <summary>ln of µmol/kg (neon nmol/kg) in equilibrium with moist air. ln C and its slopes; NaN for a gas that it does not cover.</summary>
    internal static double AirLogarithm(
        Gas gas, double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        switch (gas)
        {
            case Gas.Nitrogen: // Coefficients seen in four second-hand places, a published value is reproduced.
                return ScaledTemperatureForm.Logarithm(
                    celsius, salinity, 6.42931, 2.92704, 4.32531, 4.69149, 0.0, 0.0,
                    -0.00744129, -0.00802566, -0.0146775, 0.0, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.Argon: // Coefficients seen in four second-hand places, a published value is reproduced.
                return ScaledTemperatureForm.Logarithm(
                    celsius, salinity, 2.7915, 3.17609, 4.13116, 4.90379, 0.0, 0.0,
                    -0.00696233, -0.0076667, -0.0116888, 0.0, 0.0,
                    steps, out perKelvin, out perSalinity);
            case Gas.Neon: // Coefficients seen in four second-hand places, a published value is reproduced.
                return ScaledTemperatureForm.Logarithm(
                    celsius, salinity, 2.18156, 1.29108, 2.12504, 0.0, 0.0, 0.0,
                    -0.00594737, -0.00513896, 0.0, 0.0, 0.0,
                    steps, out perKelvin, out perSalinity);
            default:
                return HundredKelvinForm.None(out perKelvin, out perSalinity);
        }
    }
}
