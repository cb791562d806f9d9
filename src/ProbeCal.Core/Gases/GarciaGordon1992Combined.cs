namespace ProbeCal;

/// <summary>
/// Oxygen in water in equilibrium with water-saturated air at 1 atm, µmol/kg, the combined fit (Benson–Krause and Carpenter data together); the form of
/// <see cref="GarciaGordon1992"/>. For compatibility with older records; the authors recommend the other column.
/// </summary>
/// <remarks>
/// Garcia, H.E., Gordon, L.I. (1992) Limnol. Oceanogr. 37(6), 1307–1312, doi:10.4319/lo.1992.37.6.1307, erratum 38, 656 (1993). Coefficients seen in four second-hand
/// places, a published value is reproduced. Range as the other column: freezing point (not below −2 °C) to 40 °C, S 0–42. It lies −0.14 to +0.24 % from the
/// Benson–Krause column (0–40 °C, S 0–40; +0.28 % at −1 °C, S 42). The ITS-90 input is converted.
/// </remarks>
internal static class GarciaGordon1992Combined
{
    /// <summary>ln of µmol/kg and its slopes, without a range.</summary>
    internal static double AirLogarithm(double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        double t = TemperatureScale.Ipts68FromIts90(celsius);
        steps?.Add(StepQuantity.CelsiusIpts68, t);
        double logarithm = ScaledTemperatureForm.Logarithm(
            t, salinity, 5.80818, 3.20684, 4.1189, 4.93845, 1.01567, 1.41575,
            -0.00701211, -0.00725958, -0.00793334, -0.00554491, -1.32412e-07,
            steps, out perKelvin, out perSalinity);
        perKelvin *= TemperatureScale.Ipts68PerIts90;
        return logarithm;
    }
}
