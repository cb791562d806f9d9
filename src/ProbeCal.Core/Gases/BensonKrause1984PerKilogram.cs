namespace ProbeCal;

/// <summary>
/// Oxygen in water in equilibrium with water-saturated air at 1 atm, µmol/kg:
/// ln C = A0 + A1/T + A2/T² + A3/T³ + A4/T⁴ − S·(B0 + B1/T + B2/T²), T in K.
/// </summary>
/// <remarks>
/// Benson, B.B., Krause, D. (1984) Limnol. Oceanogr. 29(3), 620–632, doi:10.4319/lo.1984.29.3.0620, Eq. 31. Coefficients seen in four second-hand places, no published value
/// at hand; within 0.016 % of Garcia and Gordon's fit to the same data. Range 0–40 °C, S 0–40. Accuracy about 0.1 % in fresh and 0.2 % in sea water (from memory).
/// The temperature enters as given, as in <see cref="BensonKrause1984"/>.
/// </remarks>
internal static class BensonKrause1984PerKilogram
{
    private const double A0 = -135.29996;
    private const double A1 = 157228.8;
    private const double A2 = -66371490.0;
    private const double A3 = 12436780000.0;
    private const double A4 = -862106100000.0;
    private const double B0 = 0.020573;
    private const double B1 = -12.142;
    private const double B2 = 2363.1;

    /// <summary>ln of µmol/kg and its slopes, without a range; NaN at or below absolute zero.</summary>
    internal static double AirLogarithm(double celsius, double salinity, CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return HundredKelvinForm.None(out perKelvin, out perSalinity); }
        double r = 1.0 / kelvin;
        double fresh = A0 + (r * (A1 + (r * (A2 + (r * (A3 + (r * A4)))))));
        perSalinity = -(B0 + (r * (B1 + (r * B2))));
        double salt = salinity * perSalinity;
        perKelvin = -r * r * (A1 + (r * ((2.0 * A2) + (r * ((3.0 * A3) + (r * 4.0 * A4))))) - (salinity * (B1 + (2.0 * B2 * r))));
        if (steps != null)
        {
            steps.Add(StepQuantity.CoefficientA0, A0);
            steps.Add(StepQuantity.CoefficientA1, A1);
            steps.Add(StepQuantity.CoefficientA2, A2);
            steps.Add(StepQuantity.CoefficientA3, A3);
            steps.Add(StepQuantity.CoefficientA4, A4);
            steps.Add(StepQuantity.CoefficientB0, B0);
            steps.Add(StepQuantity.CoefficientB1, B1);
            steps.Add(StepQuantity.CoefficientB2, B2);
            steps.Add(StepQuantity.Kelvin, kelvin);
            steps.Add(StepQuantity.ReciprocalKelvin, r);
            steps.Add(StepQuantity.FreshTerm, fresh);
            steps.Add(StepQuantity.SaltTerm, salt);
            steps.Add(StepQuantity.LogarithmOfEquation, fresh + salt);
        }

        return fresh + salt;
    }
}
