namespace ProbeCal;

/// <summary>
/// F(P) = [(P − u)(1 − θP)] / [(1 − u)(1 − θ)] without ranges, P in atm. u is the vapour pressure in atm, θ the second virial
/// term. Benson, B.B., Krause, D. (1980) Limnol. Oceanogr. 25(4), 662–671 and (1984) 29(3), 620–632.
/// </summary>
internal static partial class OxygenPressureFactor
{
    private const double Theta0 = 0.000975;
    private const double Theta1 = -1.426e-5;
    private const double Theta2 = 6.436e-8;

    /// <summary>θ in 1/atm.</summary>
    internal static double Theta(double celsius, CalculationSteps? steps = null)
    {
        double theta = Theta0 + (celsius * (Theta1 + (celsius * Theta2)));
        if (steps != null)
        {
            steps.Add(StepQuantity.ThetaCoefficient0, Theta0);
            steps.Add(StepQuantity.ThetaCoefficient1, Theta1);
            steps.Add(StepQuantity.ThetaCoefficient2, Theta2);
            steps.Add(StepQuantity.Theta, theta);
        }

        return theta;
    }

    /// <summary>dθ/dT in 1/(atm·K).</summary>
    internal static double ThetaSlope(double celsius)
    {
        return Theta1 + (2.0 * Theta2 * celsius);
    }

    /// <summary>F; 1 exactly at P = 1 atm. NaN where the denominator is not positive (boiling, far outside the range).</summary>
    internal static double Value(double celsius, double atmospheres)
    {
        double u = VapourBensonKrause1980.Atmospheres(celsius);
        double theta = Theta(celsius);
        double denominator = (1.0 - u) * (1.0 - theta);
        if (denominator <= 0.0) { return double.NaN; }
        return (atmospheres - u) * (1.0 - (theta * atmospheres)) / denominator;
    }

    /// <summary>∂F/∂T in 1/K and ∂F/∂P in 1/atm. NaN where <see cref="Value"/> is NaN.</summary>
    internal static void Slopes(double celsius, double atmospheres, out double perKelvin, out double perAtmosphere)
    {
        perKelvin = double.NaN;
        perAtmosphere = double.NaN;
        double u = VapourBensonKrause1980.Atmospheres(celsius);
        double uSlope = u * VapourBensonKrause1980.LogarithmicSlope(celsius);
        double theta = Theta(celsius);
        double thetaSlope = ThetaSlope(celsius);
        double denominator = (1.0 - u) * (1.0 - theta);
        if (denominator <= 0.0) { return; }
        double virial = 1.0 - (theta * atmospheres);
        double dry = atmospheres - u;
        double factor = dry * virial / denominator;
        double numeratorSlope = (-uSlope * virial) - (dry * thetaSlope * atmospheres);
        double denominatorSlope = (-uSlope * (1.0 - theta)) - ((1.0 - u) * thetaSlope);
        perKelvin = (numeratorSlope - (factor * denominatorSlope)) / denominator;
        perAtmosphere = (virial - (dry * theta)) / denominator;
    }
}
