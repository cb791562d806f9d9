namespace ProbeCal;

/// <summary>
/// The form of Garcia and Gordon, also taken by Hamme and Emerson: ln C = ΣAi·Ts^i (i = 0–5) + S·(B0 + B1·Ts + B2·Ts² + B3·Ts³) + C0·S²,
/// Ts = ln[(298.15 − t)/(273.15 + t)]. Each equation file holds its coefficients and calls it; missing ones are zero. Ranges are the equation's.
/// </summary>
internal static class ScaledTemperatureForm
{
    /// <summary>298.15: the scaled temperature exists below 298.15 °C.</summary>
    internal const double UpperKelvin = 298.15;

    /// <summary>ln C and its derivatives; NaN where the scaled temperature does not exist.</summary>
    /// <param name="celsius">Temperature on the equation's own scale, °C.</param>
    /// <param name="salinity">Practical salinity.</param>
    /// <param name="a0">Coefficient A0, and so on.</param>
    /// <param name="a1">A1.</param>
    /// <param name="a2">A2.</param>
    /// <param name="a3">A3.</param>
    /// <param name="a4">A4.</param>
    /// <param name="a5">A5.</param>
    /// <param name="b0">B0.</param>
    /// <param name="b1">B1.</param>
    /// <param name="b2">B2.</param>
    /// <param name="b3">B3.</param>
    /// <param name="c0">C0.</param>
    /// <param name="steps">Filled when not null.</param>
    /// <param name="perKelvin">∂(ln C)/∂T, 1/K of the given scale.</param>
    /// <param name="perSalinity">∂(ln C)/∂S.</param>
    internal static double Logarithm(
        double celsius, double salinity,
        double a0, double a1, double a2, double a3, double a4, double a5, double b0, double b1, double b2, double b3, double c0,
        CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        double above = UpperKelvin - celsius;
        double kelvin = TemperatureScale.KelvinAtZeroCelsius + celsius;
        if (above <= 0.0 || kelvin <= 0.0) { return double.NaN; }
        double ts = Numerics.Ln(above / kelvin);
        double fresh = a0 + (ts * (a1 + (ts * (a2 + (ts * (a3 + (ts * (a4 + (ts * a5)))))))));
        double saltSlope = b0 + (ts * (b1 + (ts * (b2 + (ts * b3)))));
        double salt = salinity * (saltSlope + (c0 * salinity));
        double logarithm = fresh + salt;
        double tsSlope = -((1.0 / above) + (1.0 / kelvin));
        double freshSlope = a1 + (ts * ((2.0 * a2) + (ts * ((3.0 * a3) + (ts * ((4.0 * a4) + (ts * 5.0 * a5)))))));
        double saltTsSlope = b1 + (ts * ((2.0 * b2) + (ts * 3.0 * b3)));
        perKelvin = (freshSlope + (salinity * saltTsSlope)) * tsSlope;
        perSalinity = saltSlope + (2.0 * c0 * salinity);
        if (steps != null)
        {
            steps.Add(StepQuantity.CoefficientA0, a0);
            steps.Add(StepQuantity.CoefficientA1, a1);
            steps.Add(StepQuantity.CoefficientA2, a2);
            steps.Add(StepQuantity.CoefficientA3, a3);
            steps.Add(StepQuantity.CoefficientA4, a4);
            steps.Add(StepQuantity.CoefficientA5, a5);
            steps.Add(StepQuantity.CoefficientB0, b0);
            steps.Add(StepQuantity.CoefficientB1, b1);
            steps.Add(StepQuantity.CoefficientB2, b2);
            steps.Add(StepQuantity.CoefficientB3, b3);
            steps.Add(StepQuantity.CoefficientC0, c0);
            steps.Add(StepQuantity.ScaledTemperature, ts);
            steps.Add(StepQuantity.FreshTerm, fresh);
            steps.Add(StepQuantity.SaltTerm, salt);
            steps.Add(StepQuantity.LogarithmOfEquation, logarithm);
        }

        return logarithm;
    }
}
