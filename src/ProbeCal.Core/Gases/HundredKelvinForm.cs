namespace ProbeCal;

/// <summary>
/// The form that Weiss gave to solubility equations and most since have kept:
/// ln C = A1 + A2·(100/T) + A3·ln(T/100) + A4·(T/100)^p + S·[B1 + B2·(T/100) + B3·(T/100)²] + C1·S², T in K, p = 1 or 2.
/// Each equation file holds its coefficients and calls it; ranges are the equation's.
/// </summary>
internal static class HundredKelvinForm
{
    private const double KelvinPerUnit = 100.0;

    /// <summary>ln C and its derivatives; NaN at or below absolute zero.</summary>
    /// <param name="celsius">Temperature on the equation's own scale, °C.</param>
    /// <param name="salinity">Practical salinity.</param>
    /// <param name="a1">Coefficient A1, and so on.</param>
    /// <param name="a2">A2.</param>
    /// <param name="a3">A3.</param>
    /// <param name="a4">A4.</param>
    /// <param name="squared">True where A4 multiplies (T/100)², false where T/100.</param>
    /// <param name="b1">B1.</param>
    /// <param name="b2">B2.</param>
    /// <param name="b3">B3.</param>
    /// <param name="c1">C1, zero where the equation has none.</param>
    /// <param name="steps">Filled when not null.</param>
    /// <param name="perKelvin">∂(ln C)/∂T, 1/K of the given scale.</param>
    /// <param name="perSalinity">∂(ln C)/∂S.</param>
    internal static double Logarithm(
        double celsius, double salinity,
        double a1, double a2, double a3, double a4, bool squared, double b1, double b2, double b3, double c1,
        CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        double kelvin = celsius + TemperatureScale.KelvinAtZeroCelsius;
        if (kelvin <= 0.0) { return double.NaN; }
        double h = kelvin / KelvinPerUnit;
        double r = KelvinPerUnit / kelvin;
        double power = squared ? h * h : h;
        double fresh = a1 + (a2 * r) + (a3 * Numerics.Ln(h)) + (a4 * power);
        double saltSlope = b1 + (h * (b2 + (h * b3)));
        double salt = salinity * (saltSlope + (c1 * salinity));
        double logarithm = fresh + salt;
        perSalinity = saltSlope + (2.0 * c1 * salinity);
        double powerSlope = squared ? 2.0 * h : 1.0;
        perKelvin = ((-a2 * r * r) + (a3 * r) + (a4 * powerSlope) + (salinity * (b2 + (2.0 * b3 * h)))) / KelvinPerUnit;
        if (steps != null)
        {
            steps.Add(StepQuantity.CoefficientA1, a1);
            steps.Add(StepQuantity.CoefficientA2, a2);
            steps.Add(StepQuantity.CoefficientA3, a3);
            steps.Add(StepQuantity.CoefficientA4, a4);
            steps.Add(StepQuantity.CoefficientB1, b1);
            steps.Add(StepQuantity.CoefficientB2, b2);
            steps.Add(StepQuantity.CoefficientB3, b3);
            steps.Add(StepQuantity.CoefficientC0, c1);
            steps.Add(StepQuantity.Kelvin, kelvin);
            steps.Add(StepQuantity.HundredKelvin, h);
            steps.Add(StepQuantity.FreshTerm, fresh);
            steps.Add(StepQuantity.SaltTerm, salt);
            steps.Add(StepQuantity.LogarithmOfEquation, logarithm);
        }

        return logarithm;
    }

    /// <summary>The same with a temperature on ITS-90 for an equation on IPTS-68; the slope is per kelvin of ITS-90.</summary>
    internal static double LogarithmIpts68(
        double celsius, double salinity,
        double a1, double a2, double a3, double a4, bool squared, double b1, double b2, double b3, double c1,
        CalculationSteps? steps, out double perKelvin, out double perSalinity)
    {
        double t = TemperatureScale.Ipts68FromIts90(celsius);
        steps?.Add(StepQuantity.CelsiusIpts68, t);
        double logarithm = Logarithm(t, salinity, a1, a2, a3, a4, squared, b1, b2, b3, c1, steps, out perKelvin, out perSalinity);
        perKelvin *= TemperatureScale.Ipts68PerIts90;
        return logarithm;
    }

    /// <summary>What an equation gives for a gas that it does not cover.</summary>
    internal static double None(out double perKelvin, out double perSalinity)
    {
        perKelvin = double.NaN;
        perSalinity = double.NaN;
        return double.NaN;
    }
}
